import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { normalShare, normalShareSum } from '../../src/calc/normal.ts';
import { simpson } from '../support/simpson.ts';

const curve = (t: number): number => Math.exp(-(t ** 2) / 2) / Math.sqrt(2 * Math.PI);

describe('the normal spread', () => {
  // evidence: quantiles as every statistics table prints them (z of 0.90, 0.95, 0.975, 0.99, 0.995)
  it.each([
    [1.2816, 0.9],
    [1.6449, 0.95],
    [1.96, 0.975],
    [2.3263, 0.99],
    [2.5758, 0.995],
  ])('below %f lies %f', (z, share) => {
    expect(normalShare(z)).toBeCloseTo(share, 4);
  });

  it('agrees with the area under its curve, added up strip by strip', () => {
    for (const z of [-6, -4.5, -3.99, -2, -0.3, 0, 0.7, 2, 3.99, 4.01, 5])
      expect(normalShare(z)).toBeCloseTo(simpson(curve, -12, z, 20_000), 12);
  });

  it('is as accurate in the far tail as near the middle', () => {
    // evidence: the tail's own asymptotic series, φ/z (1 − 1/z² + 3/z⁴ − 15/z⁶ + 105/z⁸ − …)
    const z = 15;
    const series = 1 - z ** -2 + 3 * z ** -4 - 15 * z ** -6 + 105 * z ** -8 - 945 * z ** -10;
    expect(normalShare(-z) / ((curve(z) / z) * series)).toBeCloseTo(1, 6);
  });

  it('is the same from both ends and never falls', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -45, max: 45, noNaN: true }),
        fc.double({ min: 0, max: 5, noNaN: true }),
        (z, step) => {
          expect(normalShare(z) + normalShare(-z)).toBeCloseTo(1, 13);
          expect(normalShare(z + step)).toBeGreaterThanOrEqual(normalShare(z) - 1e-15);
        },
      ),
    );
  });

  it('its sum is the area under the share', () => {
    for (const z of [-5, -2, 0, 1, 3])
      expect(normalShareSum(z)).toBeCloseTo(simpson(normalShare, -9, z, 4000), 10);
  });
});
