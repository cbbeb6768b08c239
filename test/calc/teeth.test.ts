import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { countedWheelPitch, labelledPitch, workPitch } from '../../src/calc/pitch.ts';
import {
  FEWEST_SENSIBLE_TEETH,
  FEWEST_TEETH,
  largestWholeCount,
  swivelForCount,
  toothCount,
  toothError,
  wholeToothDiameter,
} from '../../src/calc/teeth.ts';
import { degrees, inch, type Mm, mm, OutOfRange } from '../../src/calc/units.ts';
import { SET_OVER, WHOLE_TEETH } from '../reference/whole-teeth.ts';
import { sixDigits } from '../support/digits.ts';

const transverseOf = ({ wheel }: (typeof WHOLE_TEETH)[number]): Mm => {
  if (wheel.kind === 'counted') return countedWheelPitch(mm(wheel.diameter), wheel.teeth);
  const { pitch, helix } = wheel;
  return workPitch({ pitch: mm(pitch), basis: 'normal', helix: degrees(helix), setOver: false })
    .transverse;
};

describe('teeth round the work', () => {
  // evidence: worked examples B1 to B3
  it.each(WHOLE_TEETH)('$name', (example) => {
    const diameter = mm(example.diameter);
    const transverse = transverseOf(example);
    const whole = wholeToothDiameter(example.nearest, transverse);
    const largest = largestWholeCount(diameter, transverse);
    const error = toothError(diameter, transverse);
    expect({
      transverse: sixDigits(transverse),
      count: sixDigits(toothCount(diameter, transverse)),
      error: sixDigits(error),
      exact: sixDigits(whole),
      step: sixDigits(wholeToothDiameter(1, transverse)),
      down: sixDigits(wholeToothDiameter(largest, transverse)),
      up: sixDigits(wholeToothDiameter(largest + 1, transverse)),
      gap: sixDigits(error * transverse),
      slip: sixDigits(whole / diameter - 1),
    }).toEqual({
      transverse: example.transverse,
      count: example.count,
      error: example.error,
      exact: example.exact,
      step: example.step,
      down: example.down,
      up: example.up,
      gap: example.gap,
      slip: example.slip,
    });
    expect(Math.round(toothCount(diameter, transverse))).toBe(example.nearest);
  });
});

describe('a 160 DP straight wheel set over 30° on a 1.000 in blank', () => {
  const pitch = labelledPitch({ system: 'dp', value: SET_OVER.dp });
  const blank = inch(SET_OVER.diameterIn);
  const { transverse } = workPitch({
    pitch,
    basis: 'rim',
    helix: degrees(SET_OVER.tilt),
    setOver: true,
  });
  const inDegrees = (swivel: number): number => (swivel * 180) / Math.PI;

  it('does not come out whole, and comes out for 138 at another swivel or diameter', () => {
    // evidence: Machinery's Handbook 31 p. 1059, as printed: 138.56 teeth; 138 at about 30½° or 0.996 in
    expect(toothCount(blank, transverse).toFixed(2)).toBe('138.56');
    expect(Math.round(2 * inDegrees(swivelForCount(138, blank, pitch))) / 2).toBe(30.5);
    expect((wholeToothDiameter(138, transverse) / 25.4).toFixed(3)).toBe('0.996');
  });

  it('to six digits', () => {
    // evidence: worked example B4
    expect(sixDigits(toothCount(blank, transverse))).toBe(SET_OVER.count);
    expect(sixDigits(inDegrees(swivelForCount(SET_OVER.whole, blank, pitch)))).toBe(
      SET_OVER.tiltForWhole,
    );
    expect(sixDigits(wholeToothDiameter(SET_OVER.whole, transverse) / 25.4)).toBe(
      SET_OVER.diameterForWholeIn,
    );
  });
});

describe('laws of whole teeth', () => {
  const pitches = fc.double({ min: 0.2, max: 3.2, noNaN: true }).map(mm);
  const bars = fc.double({ min: 1, max: 500, noNaN: true }).map(mm);
  const counts = fc.integer({ min: FEWEST_TEETH, max: 5000 });

  it('the diameter of a whole count has that count', () => {
    fc.assert(
      fc.property(counts, pitches, (teeth, pitch) => {
        const diameter = wholeToothDiameter(teeth, pitch);
        expect(Math.abs(toothCount(diameter, pitch) - teeth)).toBeLessThan(1e-9);
        expect(Math.abs(toothError(diameter, pitch))).toBeLessThan(1e-9);
        // Rounding does not cost a bar that is exactly whole its last tooth.
        expect(largestWholeCount(diameter, pitch)).toBe(teeth);
      }),
    );
  });

  it('the largest whole count lies under the bar, and the next one above it', () => {
    fc.assert(
      fc.property(bars, pitches, (bar, pitch) => {
        const teeth = largestWholeCount(bar, pitch);
        expect(Number.isInteger(teeth)).toBe(true);
        expect(wholeToothDiameter(teeth, pitch)).toBeLessThanOrEqual(bar * (1 + 1e-9));
        expect(wholeToothDiameter(teeth + 1, pitch)).toBeGreaterThan(bar);
      }),
    );
  });

  it('the error is at most half a tooth, and nothing once a whole tooth is added', () => {
    fc.assert(
      fc.property(bars, pitches, (bar, pitch) => {
        const error = toothError(bar, pitch);
        expect(Math.abs(error)).toBeLessThanOrEqual(0.5);
        const trued = mm(bar - wholeToothDiameter(1, pitch) * error);
        expect(Math.abs(toothError(trued, pitch))).toBeLessThan(1e-6);
      }),
    );
  });

  it('twice the bar holds twice the teeth, and twice the pitch half of them', () => {
    fc.assert(
      fc.property(bars, pitches, (bar, pitch) => {
        const teeth = toothCount(bar, pitch);
        expect(toothCount(mm(2 * bar), pitch)).toBeCloseTo(2 * teeth, 9);
        expect(toothCount(bar, mm(2 * pitch))).toBeCloseTo(teeth / 2, 9);
      }),
    );
  });

  it('a straight wheel swivelled for a count has that count', () => {
    fc.assert(
      fc.property(bars, pitches, fc.double({ min: 0.5, max: 1, noNaN: true }), (bar, p, share) => {
        const teeth = share * toothCount(bar, p);
        const helix = swivelForCount(teeth, bar, p);
        fc.pre(helix <= 1.2);
        const { transverse } = workPitch({ pitch: p, basis: 'rim', helix, setOver: true });
        expect(toothCount(bar, transverse) / teeth).toBeCloseTo(1, 9);
      }),
    );
  });
});

describe('what makes no sense round a bar', () => {
  it.each<[string, () => unknown]>([
    ['no bar', () => toothCount(mm(0), mm(1))],
    ['a bar of less than nothing', () => toothCount(mm(-5), mm(1))],
    ['no pitch', () => toothCount(mm(5), mm(0))],
    ['a bar that is no number', () => toothError(mm(Number.NaN), mm(1))],
    ['an endless bar', () => largestWholeCount(mm(Number.POSITIVE_INFINITY), mm(1))],
    ['fewer than no teeth', () => wholeToothDiameter(-1, mm(1))],
    ['more teeth than fit without a swivel', () => swivelForCount(140, inch(1), mm(0.6))],
  ])('%s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });

  it('three teeth are the fewest, twelve the fewest that roll', () => {
    // evidence: common practice (12)
    expect([FEWEST_TEETH, FEWEST_SENSIBLE_TEETH]).toEqual([3, 12]);
  });
});
