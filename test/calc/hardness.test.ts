import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { brinellFromRockwellC } from '../../src/calc/hardness.ts';
import { SOURCES } from '../../src/calc/sources.ts';
import { OutOfRange } from '../../src/calc/units.ts';
import { near } from '../support/near.ts';

describe('Brinell from Rockwell C', () => {
  // evidence: the ASTM tables as a steel house reproduces them
  it.each([
    [20, 226],
    [28, 271],
    [40, 371],
    [50, 481],
    [60, 654],
  ])('HRC %d is HB %d, as printed', (hrc, hb) => {
    expect(brinellFromRockwellC(hrc)).toBe(hb);
  });

  // evidence: another table, ordered by the 10 mm ball's impression, of a chart in the trade
  it.each([
    [22.8, 241],
    [25.4, 255],
    [27.6, 269],
    [29.9, 285],
    [32.1, 302],
    [34.3, 321],
    [36.6, 341],
    [39.1, 363],
    [41.8, 388],
    [44.5, 415],
  ])('HRC %f agrees with HB %d of the impression table within 1 %%', (hrc, hb) => {
    near(brinellFromRockwellC(hrc), hb, 0.01);
  });

  it('rises all the way', () => {
    const scale = fc.double({ min: 20, max: 63.9, noNaN: true });
    fc.assert(
      fc.property(scale, (hrc) => {
        expect(brinellFromRockwellC(hrc + 0.1)).toBeGreaterThan(brinellFromRockwellC(hrc));
      }),
    );
  });

  it('is reported, not read', () => {
    expect(SOURCES['hardness-conversion'].mark).toBe('reported');
  });

  it('refuses what the table does not hold', () => {
    expect(() => brinellFromRockwellC(19)).toThrow(OutOfRange);
    expect(() => brinellFromRockwellC(65)).toThrow(
      expect.objectContaining({ what: 'hardness', value: 65, max: 64, unit: 'HRC' }),
    );
  });
});
