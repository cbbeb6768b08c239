/** When a day begins where the shop is, also in nights in which the clock is set. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { startOfDay, startOfYesterday } from '../../src/shop/dayStart.ts';

const at = (moment: string): number => Date.parse(moment);
const said = (moment: number): string => new Date(moment).toISOString();

describe('a day', () => {
  it.each([
    ['UTC', '2025-01-06T00:00:00Z', '2025-01-06T00:00:00.000Z'],
    ['UTC', '2025-01-06T23:59:59.999Z', '2025-01-06T00:00:00.000Z'],
    // evidence: six hours behind UTC in winter, five in summer
    ['America/Chicago', '2025-01-06T04:00:00Z', '2025-01-05T06:00:00.000Z'],
    ['America/Chicago', '2025-07-01T12:00:00Z', '2025-07-01T05:00:00.000Z'],
    // evidence: 5 h 45 min ahead of UTC
    ['Asia/Kathmandu', '2025-01-06T12:00:00Z', '2025-01-05T18:15:00.000Z'],
    // evidence: set forward on 30 March 2025 at 01:00 UTC, back on 26 October 2025 at 01:00 UTC
    ['Europe/Berlin', '2025-03-30T20:00:00Z', '2025-03-29T23:00:00.000Z'],
    ['Europe/Berlin', '2025-10-26T22:30:00Z', '2025-10-25T22:00:00.000Z'],
    // evidence: set forward at midnight of 30 March 2025: the day begins at one o'clock
    ['Asia/Beirut', '2025-03-30T12:00:00Z', '2025-03-29T22:00:00.000Z'],
  ])('in %s, at %s, began at %s', (zone, moment, began) => {
    expect(said(startOfDay(at(moment), zone))).toBe(began);
  });

  it('and the one before: twenty-three hours where the clock is set forward', () => {
    expect(said(startOfYesterday(at('2025-03-31T06:00:00Z'), 'Europe/Berlin'))).toBe(
      '2025-03-29T23:00:00.000Z',
    );
  });

  it('begins before now, is one day, and the moment before is another', () => {
    const zones = ['UTC', 'Europe/Berlin', 'America/St_Johns', 'Pacific/Apia', 'Asia/Beirut'];
    const moments = fc.integer({ min: at('2015-01-01T00:00Z'), max: at('2030-01-01T00:00Z') });
    fc.assert(
      fc.property(fc.constantFrom(...zones), moments, (zone, moment) => {
        const day = (of: number): string =>
          new Intl.DateTimeFormat('en-GB', { timeZone: zone, dateStyle: 'short' }).format(of);
        const began = startOfDay(moment, zone);
        expect(began).toBeLessThanOrEqual(moment);
        expect(day(began)).toBe(day(moment));
        expect(day(began - 1)).not.toBe(day(moment));
      }),
      { numRuns: 200 },
    );
  });
});
