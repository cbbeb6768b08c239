/** Quiet hours: as the clock on the shop's wall shows them, also in the nights it is set. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { afterQuiet, minutesBetween, type QuietHours } from '../../src/shop/quiet.ts';

const clock = (hour: number, minute = 0): number => hour * 60 + minute;
const NIGHT: QuietHours = { from: clock(22), to: clock(6) };
const at = (iso: string): number => Date.parse(iso);

/** What a person who lives there reads off the wall. */
const wall = (moment: number, zone: string): string =>
  new Intl.DateTimeFormat('sv-SE', { timeZone: zone, dateStyle: 'short', timeStyle: 'medium' })
    .format(moment)
    .slice(0, 16);

describe('quiet hours', () => {
  it.each([
    // source: IANA time zone database: Europe/Berlin goes from +1 to +2 on 30 March 2025, 01:00 UTC,
    // and back on 26 October 2025, 01:00 UTC.
    ['in the day nothing waits', '2025-01-07T12:00:30Z', 'Europe/Berlin', '2025-01-07T12:00:30Z'],
    ['the last minute before', '2025-01-07T20:59:59Z', 'Europe/Berlin', '2025-01-07T20:59:59Z'],
    ['the first minute of it', '2025-01-07T21:00:00Z', 'Europe/Berlin', '2025-01-08T05:00:00Z'],
    ['past midnight', '2025-01-08T00:30:45Z', 'Europe/Berlin', '2025-01-08T05:00:00Z'],
    ['the last minute of it', '2025-01-08T04:59:59Z', 'Europe/Berlin', '2025-01-08T05:00:00Z'],
    ['the minute it ends', '2025-01-08T05:00:00Z', 'Europe/Berlin', '2025-01-08T05:00:00Z'],
    ['a night of seven hours', '2025-03-29T21:00:00Z', 'Europe/Berlin', '2025-03-30T04:00:00Z'],
    ['after the clock was set', '2025-03-30T01:10:00Z', 'Europe/Berlin', '2025-03-30T04:00:00Z'],
    ['a night of nine hours', '2025-10-25T20:00:00Z', 'Europe/Berlin', '2025-10-26T05:00:00Z'],
    ['in the hour that comes twice', '2025-10-26T00:30:00Z', 'Europe/Berlin', '2025-10-26T05:00Z'],
    // America/Chicago goes from -6 to -5 on 9 March 2025, 08:00 UTC, and back on 2 November, 07:00.
    ['in Chicago in spring', '2025-03-09T04:00:00Z', 'America/Chicago', '2025-03-09T11:00:00Z'],
    ['in Chicago in autumn', '2025-11-02T03:00:00Z', 'America/Chicago', '2025-11-02T12:00:00Z'],
    // Australia/Lord_Howe sets its clock by half an hour: +10:30 to +11 on 4 October 2025, 15:30 UTC.
    ['by half an hour', '2025-10-04T12:00:00Z', 'Australia/Lord_Howe', '2025-10-04T19:00:00Z'],
    ['in India', '2025-01-07T16:30:00Z', 'Asia/Kolkata', '2025-01-08T00:30:00Z'],
  ])('%s', (_, from, zone, wanted) => {
    expect(new Date(afterQuiet(at(from), NIGHT, zone)).toISOString()).toBe(
      new Date(wanted).toISOString(),
    );
  });

  it('end where the clock jumps past their end', () => {
    // 02:30 does not exist in Berlin on 30 March 2025: the clock goes from 01:59 to 03:00.
    const untilHalfPastTwo = { from: clock(22), to: clock(2, 30) };
    const end = afterQuiet(at('2025-03-29T22:00:00Z'), untilHalfPastTwo, 'Europe/Berlin');
    expect(wall(end, 'Europe/Berlin')).toBe('2025-03-30 03:00');
  });

  it('begin again where the clock is set back into them', () => {
    // In Berlin 02:10 comes twice on 26 October 2025, an hour apart: both are before half past two.
    const untilHalfPastTwo = { from: clock(22), to: clock(2, 30) };
    const first = at('2025-10-26T00:10:00Z');
    const second = at('2025-10-26T01:10:00Z');
    for (const moment of [first, second]) {
      const end = afterQuiet(moment, untilHalfPastTwo, 'Europe/Berlin');
      expect(wall(end, 'Europe/Berlin')).toBe('2025-10-26 02:30');
    }
  });

  it('are none where none are set', () => {
    expect(afterQuiet(at('2025-01-08T00:30:45Z'), null, 'UTC')).toBe(at('2025-01-08T00:30:45Z'));
  });

  it('hold at every minute up to their end, and not at the end', () => {
    const zones = [
      'UTC',
      'Europe/Berlin',
      'America/Chicago',
      'Asia/Kolkata',
      'Australia/Lord_Howe',
    ];
    // Weeks in which one of these zones sets its clock, and others.
    const weeks = [
      '2025-03-08',
      '2025-03-29',
      '2025-04-04',
      '2025-10-04',
      '2025-10-25',
      '2025-11-01',
    ];
    const isQuiet = (moment: number, zone: string, { from, to }: QuietHours): boolean => {
      const [hour = 0, minute = 0] = wall(moment, zone).slice(11).split(':').map(Number);
      return minutesBetween(from, clock(hour, minute)) < minutesBetween(from, to);
    };
    fc.assert(
      fc.property(
        fc.constantFrom(...zones),
        fc.constantFrom(...weeks),
        fc.integer({ min: 0, max: 3 * 1440 - 1 }),
        fc.integer({ min: 0, max: 1439 }),
        fc.integer({ min: 1, max: 20 * 60 }),
        (zone, week, minutes, from, length) => {
          const quiet = { from, to: (from + length) % 1440 };
          const start = at(`${week}T00:00:00Z`) + minutes * 60_000;
          const end = afterQuiet(start, quiet, zone);
          expect(isQuiet(end, zone, quiet)).toBe(false);
          for (let moment = start; moment < end; moment += 60_000)
            expect([moment, isQuiet(moment, zone, quiet)]).toEqual([moment, true]);
        },
      ),
      { numRuns: 60 },
    );
  });
});
