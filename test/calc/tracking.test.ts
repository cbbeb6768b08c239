import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { State } from '../../src/calc/check.ts';
import { formedFlat, sharpHeight } from '../../src/calc/growth/index.ts';
import { STANDARD_DP, type StandardDp } from '../../src/calc/pitch.ts';
import { wholeToothDiameter } from '../../src/calc/teeth.ts';
import {
  caughtShare,
  classBlankTolerance,
  countDoubt,
  firstBite,
  type KnurlClass,
  runoutCheck,
  trackingCheck,
  trackingWindow,
  type WheelKnowledge,
  wheelCheck,
} from '../../src/calc/tracking.ts';
import { degrees, inch, type Mm, mm, OutOfRange } from '../../src/calc/units.ts';
import { CLASS_I_SHARE, FIRST_BITE } from '../reference/whole-teeth.ts';
import { sixDigits } from '../support/digits.ts';

const NO_CLASS = { dp: null, knurlClass: null } as const;
/** Pitch along the rim of a diametral wheel: one tooth is 1/P in of diameter. */
const rimOf = (dp: number): Mm => inch(Math.PI / dp);

describe('Class I blanks', () => {
  // evidence: Machinery's Handbook 31 p. 1060 (tolerances read, share derived); worked example B5
  it.each(STANDARD_DP)('of %d DP allow a tenth of a tooth or a little less', (dp) => {
    const { above, below } = classBlankTolerance(dp, 'I');
    const step = wholeToothDiameter(1, rimOf(dp));
    expect(sixDigits(above / step)).toBe(CLASS_I_SHARE[dp]);
    expect(below).toBe(above);
  });

  it('as printed in per cent: 9.6, 9.6, 8.96, 8.0', () => {
    const shares = STANDARD_DP.map((dp) => classBlankTolerance(dp, 'I').above * (dp / 25.4));
    expect(shares.map((share) => Number((100 * share).toFixed(6)))).toEqual([9.6, 9.6, 8.96, 8]);
  });
});

describe('the first turn', () => {
  // evidence: worked example B6
  it.each(FIRST_BITE.caught)('of $bite mm catches $share of a tooth', (of) => {
    const sharp = sharpHeight(mm(1), degrees(of.included));
    expect(sixDigits(caughtShare(sharp, mm(of.bite)))).toBe(of.share);
  });

  // evidence: worked example B6; 0.18 of the sharp height
  it.each(FIRST_BITE.biteForATenth)('of $bite mm catches a tenth at $included°', (of) => {
    const sharp = sharpHeight(mm(1), degrees(of.included));
    expect(sixDigits(firstBite(sharp, 0.1))).toBe(of.bite);
    expect(firstBite(sharp, 0.1) / sharp).toBeCloseTo(0.18, 12);
  });

  const sharps = fc.double({ min: 0.05, max: 2, noNaN: true }).map(mm);
  const shares = fc.double({ min: 0, max: 0.5, noNaN: true });

  it('a bite and the share it catches are one another’s inverse', () => {
    fc.assert(
      fc.property(sharps, shares, (sharp, share) => {
        // Half a tooth is caught by the full groove, where the slope is endless.
        expect(caughtShare(sharp, firstBite(sharp, share))).toBeCloseTo(share, 6);
      }),
    );
  });

  it('is the infeed of a straight groove as high as twice the share', () => {
    fc.assert(
      fc.property(sharps, shares, (sharp, share) => {
        const height = mm(2 * share * sharp);
        expect(firstBite(sharp, share)).toBeCloseTo(
          formedFlat('grooves', height, sharp).infeed,
          12,
        );
      }),
    );
  });

  it('no bite catches nothing, a deeper one more', () => {
    fc.assert(
      fc.property(sharps, shares, shares, (sharp, a, b) => {
        expect(firstBite(sharp, 0)).toBe(0);
        const [less, more] = a < b ? [a, b] : [b, a];
        expect(firstBite(sharp, more)).toBeGreaterThanOrEqual(firstBite(sharp, less));
      }),
    );
  });
});

const pitches = fc.double({ min: 0.2, max: 3.2, noNaN: true }).map(mm);
const counts = fc.integer({ min: 12, max: 2000 });

/** A blank that is a share of a tooth off whole. */
const offBy = (teeth: number, share: number, transversePitch: Mm): Mm =>
  wholeToothDiameter(teeth + share, transversePitch);

describe('tracking without a class', () => {
  // evidence: judgement: ±0.10 of a tooth tracks, above 0.20 does not
  it.each<[number, State, string]>([
    [0, 'fine', 'whole'],
    [0.0999, 'fine', 'inWindow'],
    [-0.1, 'fine', 'inWindow'],
    [0.1001, 'watch', 'nearEdge'],
    [-0.1999, 'watch', 'nearEdge'],
    [0.2001, 'stop', 'offWhole'],
    [-0.2001, 'stop', 'offWhole'],
    [0.4999, 'stop', 'offWhole'],
  ])('%d of a tooth off: %s', (share, state, reason) => {
    fc.assert(
      fc.property(counts, pitches, (teeth, transversePitch) => {
        const diameter = offBy(teeth, share, transversePitch);
        const found = trackingCheck({ diameter, transversePitch, ...NO_CLASS });
        expect([found.state, found.reason]).toEqual([state, reason]);
        expect(found.figures['toothError']?.value).toBeCloseTo(share, 6);
      }),
    );
  });

  it('the window is a tenth of a tooth either way, and its ends track', () => {
    fc.assert(
      fc.property(counts, pitches, (teeth, transversePitch) => {
        const whole = wholeToothDiameter(teeth, transversePitch);
        const { low, high } = trackingWindow({ teeth, transversePitch, ...NO_CLASS });
        expect(high - whole).toBeCloseTo(whole - low, 9);
        expect(high - low).toBeCloseTo(0.2 * wholeToothDiameter(1, transversePitch), 9);
        for (const diameter of [low, high])
          expect(trackingCheck({ diameter, transversePitch, ...NO_CLASS }).state).toBe('fine');
      }),
    );
  });

  it('eleven teeth stop, with the diameter of twelve', () => {
    // evidence: common practice
    const of = (teeth: number) =>
      trackingCheck({
        diameter: wholeToothDiameter(teeth, mm(1)),
        transversePitch: mm(1),
        ...NO_CLASS,
      });
    expect(of(12).state).toBe('fine');
    expect(of(11)).toMatchObject({
      state: 'stop',
      reason: 'fewTeeth',
      figures: { smallestDiameter: { value: wholeToothDiameter(12, mm(1)), unit: 'mm' } },
    });
  });
});

describe('tracking within a class', () => {
  const at = (dp: StandardDp, knurlClass: KnurlClass, offIn: number) =>
    trackingCheck({
      diameter: mm(wholeToothDiameter(dp, rimOf(dp)) + inch(offIn)),
      transversePitch: rimOf(dp),
      dp,
      knurlClass,
    });

  // evidence: Class I ±0.0015/0.0010/0.0007/0.0005 in (read); Class II the same (from memory)
  it.each<[StandardDp, KnurlClass, number]>([
    [64, 'I', 0.0015],
    [96, 'I', 0.001],
    [128, 'I', 0.0007],
    [160, 'I', 0.0005],
    [96, 'II', 0.001],
  ])('%d DP class %s: ±%d in', (dp, knurlClass, tolerance) => {
    for (const sign of [1, -1]) {
      expect(at(dp, knurlClass, 0.99 * sign * tolerance).state).toBe('fine');
      expect(at(dp, knurlClass, 1.01 * sign * tolerance).state).toBe('watch');
      expect(at(dp, knurlClass, 2.01 * sign * tolerance).state).toBe('stop');
    }
  });

  it('class III goes below the blank only', () => {
    // evidence: +0/−0.0010 in at 96 DP, from memory
    expect(at(96, 'III', -0.00099).state).toBe('fine');
    expect(at(96, 'III', 0.0001).state).toBe('stop');
    const window = trackingWindow({
      teeth: 96,
      transversePitch: rimOf(96),
      dp: 96,
      knurlClass: 'III',
    });
    expect([window.low / 25.4, window.high / 25.4].map((d) => d.toFixed(4))).toEqual([
      '0.9990',
      '1.0000',
    ]);
  });

  it('a class without a diametral pitch leaves the window as it is', () => {
    const of = { teeth: 60, transversePitch: mm(1), dp: null } as const;
    expect(trackingWindow({ ...of, knurlClass: 'I' })).toEqual(
      trackingWindow({ ...of, knurlClass: null }),
    );
  });
});

describe('how well the wheel is known', () => {
  // evidence: half widths 2.5 % label, 0.5 % counted, 0.1 of a tooth proven (judgement, derived)
  it.each<[WheelKnowledge, boolean, number, number]>([
    ['label', false, 65, 1.625],
    ['label', true, 96, 0],
    ['counted', false, 65, 0.325],
    ['proven', false, 65, 0.1],
    ['proven', false, 1000, 0.1],
  ])('%s, on its own blank %s: %d teeth are out by %d', (knowledge, own, teeth, doubt) => {
    expect(countDoubt(teeth, knowledge, own)).toBeCloseTo(doubt, 12);
  });

  const check = (of: Partial<Parameters<typeof wheelCheck>[0]>) => {
    const { state, reason } = wheelCheck({
      blankDiameter: inch(1),
      teeth: 65,
      pitch: { system: 'tpi', value: 21 },
      knowledge: 'label',
      setOver: false,
      ...of,
    });
    return `${state} ${reason}`;
  };
  const dp = (value: number) => ({ pitch: { system: 'dp', value }, teeth: value }) as const;

  it('watches from a quarter of a tooth on', () => {
    // evidence: judgement
    expect(check({ teeth: 10 })).toBe('fine label');
    expect(check({ teeth: 11 })).toBe('watch label');
    expect(check({ teeth: 50, knowledge: 'counted' })).toBe('fine counted');
    expect(check({ teeth: 51, knowledge: 'counted' })).toBe('watch counted');
    expect(check({ teeth: 5000, knowledge: 'proven' })).toBe('fine proven');
  });

  it('trusts a diametral wheel on its own blanks only, and only unswivelled', () => {
    // evidence: blanks in steps of 1/32 in for 96 DP (reported)
    expect(check(dp(96))).toBe('fine ownBlank');
    expect(check({ ...dp(96), setOver: true })).toBe('watch label');
    expect(check({ ...dp(96), blankDiameter: inch(1 - 1 / 96), teeth: 95 })).toBe('watch label');
    expect(check(dp(100))).toBe('watch label');
    expect(check({ ...dp(96), knowledge: 'counted' })).toBe('watch counted');
  });
});

describe('a bar that runs out', () => {
  // evidence: judgement: half the reading against the first bite, fine to a half, watch to one
  it.each<[number, State]>([
    [0, 'fine'],
    [0.1, 'fine'],
    [0.1001, 'watch'],
    [0.2, 'watch'],
    [0.2001, 'stop'],
  ])('by %d mm on a first bite of 0.1 mm: %s', (reading, state) => {
    const found = runoutCheck(mm(reading), mm(0.1));
    expect(found.state).toBe(state);
    expect(found.figures['eccentricity']?.value).toBe(reading / 2);
  });
});

describe('what makes no sense of tracking', () => {
  it.each<[string, () => unknown]>([
    ['a first turn deeper than full form', () => caughtShare(mm(0.5), mm(0.26))],
    ['a first turn outwards', () => caughtShare(mm(0.5), mm(-0.01))],
    ['more than half a tooth', () => firstBite(mm(0.5), 0.51)],
    ['no tooth', () => firstBite(mm(0), 0.1)],
    ['less than no teeth', () => countDoubt(-1, 'label', false)],
    ['a reading of less than nothing', () => runoutCheck(mm(-0.01), mm(0.1))],
  ])('%s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });
});
