import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { crestFlat, roundWheelToothHeight, sharpHeight } from '../../src/calc/growth/index.ts';
import { degrees, mm, OutOfRange, type Rad, rad } from '../../src/calc/units.ts';
import { FULL_FORM, ROUND_WHEEL } from '../reference/formed-growth.ts';
import { sixDigits } from '../support/digits.ts';

const pitch = fc.double({ min: 0.2, max: 3.2, noNaN: true }).map(mm);
const included = fc.double({ min: 60, max: 120, noNaN: true }).map(degrees);

describe('the tooth', () => {
  // evidence: worked examples A1
  it.each(FULL_FORM)('has a sharp height of $Hf at $included°', (example) => {
    expect(sixDigits(sharpHeight(mm(example.p), degrees(example.included)))).toBe(example.Hf);
  });

  // evidence: worked example A10
  it('is lower on a round wheel than on a rack', () => {
    const { p, teeth, height } = ROUND_WHEEL;
    const h = roundWheelToothHeight(mm(p), degrees(ROUND_WHEEL.included), teeth);
    expect(sixDigits(h)).toBe(height);
    expect(h).toBeLessThan(sharpHeight(mm(p), degrees(ROUND_WHEEL.included)));
  });

  it('comes back to the rack on a wheel of very many teeth', () => {
    const rack = sharpHeight(mm(1), degrees(70));
    expect(roundWheelToothHeight(mm(1), degrees(70), 10000)).toBeCloseTo(rack, 3);
  });

  // evidence: plane geometry, corners laid out and measured instead of the formula
  it('fills the pitch of a round wheel at the depth it says', () => {
    fc.assert(
      fc.property(pitch, included, fc.integer({ min: 20, max: 200 }), (p, angle, teeth) => {
        const depth = roundWheelToothHeight(p, angle, teeth);
        const tipRadius = (teeth * p) / (2 * Math.PI);
        const pitchAtDepth = (2 * Math.PI * (tipRadius - depth)) / teeth;
        expect(2 * depth * Math.tan(angle / 2)).toBeCloseTo(pitchAtDepth, 12);
      }),
    );
  });

  it('keeps the whole pitch as flat before it is pressed, and none when it is full', () => {
    expect(crestFlat(mm(0.8), 0)).toBe(0.8);
    expect(crestFlat(mm(0.8), 1)).toBe(0);
    expect(crestFlat(mm(0.8), 0.75)).toBeCloseTo(0.2, 12);
  });

  it('doubles every length with the pitch', () => {
    fc.assert(
      fc.property(pitch, included, fc.double({ min: 0, max: 1, noNaN: true }), (p, angle, x) => {
        const twice = mm(2 * p);
        expect(sharpHeight(twice, angle)).toBeCloseTo(2 * sharpHeight(p, angle), 12);
        expect(crestFlat(twice, x)).toBeCloseTo(2 * crestFlat(p, x), 12);
        expect(roundWheelToothHeight(twice, angle, 63)).toBeCloseTo(
          2 * roundWheelToothHeight(p, angle, 63),
          12,
        );
      }),
    );
  });

  it.each<[string, () => unknown]>([
    ['no pitch', () => sharpHeight(mm(0), degrees(90))],
    ['a pitch that is no number', () => sharpHeight(mm(Number.NaN), degrees(90))],
    ['an endless pitch', () => sharpHeight(mm(Number.POSITIVE_INFINITY), degrees(90))],
    ['an angle of nothing', () => sharpHeight(mm(1), rad(0))],
    ['a straight angle', () => sharpHeight(mm(1), degrees(180))],
    ['degrees taken for radians', () => sharpHeight(mm(1), rad(90))],
    ['a fill over 1', () => crestFlat(mm(1), 1.01)],
    ['a fill under 0', () => crestFlat(mm(1), -0.01)],
    ['a wheel of two teeth', () => roundWheelToothHeight(mm(1), degrees(90), 2)],
  ])('refuses %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });
});

describe('units', () => {
  it('that are swapped do not compile, since the call itself would answer', () => {
    const right = sharpHeight(mm(1), degrees(90));
    // @ts-expect-error an angle is no pitch, and a pitch no angle
    expect(sharpHeight(degrees(90), mm(1))).not.toBeCloseTo(right, 1);
    // @ts-expect-error a bare number has no unit
    expect(sharpHeight(1, degrees(90))).toBe(right);
    // @ts-expect-error the wheel's teeth are not an angle's place
    expect(() => roundWheelToothHeight(mm(1), 63, degrees(90))).toThrow(OutOfRange);
    const angle: Rad = degrees(90);
    // @ts-expect-error an angle is no pitch
    expect(crestFlat(angle, 0.5)).toBeCloseTo(angle / 2, 12);
  });
});
