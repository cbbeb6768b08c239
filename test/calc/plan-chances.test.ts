import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cribPitch } from '../../src/calc/crib.ts';
import {
  type Candidate,
  chanceOfLanding,
  chanceOfTracking,
  chanceOfTurning,
  type PlanRequest,
  plan,
  TURNING_SPREAD,
  toothErrorSpread,
} from '../../src/calc/plan/index.ts';
import { growthBelief } from '../../src/calc/shopGrowth.ts';
import { dinCrib, dpCrib, finishLimits } from '../../src/calc/standards/index.ts';
import { degrees, inch, mm, OutOfRange } from '../../src/calc/units.ts';
import { planJob, planRequest, under } from '../support/planJob.ts';
import { mulberry32, normalFrom } from '../support/random.ts';

const PARTS = 200_000;

/** What is not known of a wheel's pitch, as a share of it: half widths 2.5 % and 0.5 %, 0.1 tooth. */
const DOUBT = { label: 0.025, counted: 0.005, proven: 0.1 };

const doubtShare = ({ wheel, toothCount, blankDiameter }: Candidate): number => {
  const { knowledge } = cribPitch(wheel);
  if (knowledge === 'proven') return DOUBT.proven / toothCount;
  if (knowledge === 'counted') return DOUBT.counted;
  // evidence: 96 DP blanks go in steps of 1/32 in (reported)
  const own = Math.abs((blankDiameter / 25.4) * 32 - Math.round((blankDiameter / 25.4) * 32));
  return own < 1e-9 ? 0 : DOUBT.label;
};

/**
 * Growth of a sharp tooth on round work, written out again from its two integrals:
 * Rr = −I₀ + √(Rb² + I₀² − 2 I₁), crest 2 (Rr + H).
 */
const growthOn = (form: 'grooves' | 'raised', H: number, Hf: number) => {
  const x = H / Hf;
  const I0 = form === 'grooves' ? H - H ** 2 / (2 * Hf) : (Hf / 3) * (1 - (1 - x) ** 3);
  const I1 =
    form === 'grooves'
      ? H ** 2 / 2 - H ** 3 / (3 * Hf)
      : H ** 2 / 2 - (2 * H ** 3) / (3 * Hf) + H ** 4 / (4 * Hf ** 2);
  return (blank: number): number =>
    2 * (Math.sqrt((blank / 2) ** 2 + I0 ** 2 - 2 * I1) - I0 + H) - blank;
};

/** Parts turned, knurled and brought to the middle by measuring, one after another. */
const simulate = (candidate: Candidate, request: PlanRequest, seed: number) => {
  const { wheel, toothCount, blankDiameter } = candidate;
  const random = mulberry32(seed);
  const { transverse, normal } = cribPitch(wheel);
  // evidence: sharp height p/2 at 90°, and a round wheel's own tooth is p/(2 (1 + π/Nw))
  const sharp = normal / 2;
  const own = wheel.teeth === null ? 1 : 1 / (1 + Math.PI / wheel.teeth);
  const form = wheel.pattern.kind === 'straight' ? 'grooves' : 'raised';
  const shallow = growthOn(form, 0.7 * sharp, sharp);
  const full = growthOn(form, Math.min(0.97, own) * sharp, sharp);
  const middle = (request.limits.low + request.limits.high) / 2;
  const { mean, sd } = request.job.growth;
  let [tracks, lands] = [0, 0];
  for (let part = 0; part < PARTS; part++) {
    const turned = blankDiameter + request.turningSpread * normalFrom(random);
    const pitch = transverse * (1 + (doubtShare(candidate) / Math.sqrt(3)) * normalFrom(random));
    if (Math.abs((Math.PI * turned) / pitch - toothCount) <= 0.1) tracks += 1;
    const share = mean + sd * normalFrom(random);
    const shallowest = turned + share * shallow(turned);
    const fullest = turned + share * full(turned);
    if (shallowest <= middle && middle <= fullest) lands += 1;
  }
  return { tracks: tracks / PARTS, lands: lands / PARTS };
};

describe('both chances against 200 000 parts', () => {
  const shop = growthBelief(
    [0.88, 0.91, 0.9, 0.86].map((share) => ({
      family: 'diamond raised × steel',
      share,
      confirmed: false,
    })),
    'diamond raised × steel',
  );
  const diamond = planJob('steel-lowC-CD', {
    pattern: { kind: 'diamond', points: 'raised' },
    pitch: { system: 'metric', value: 1 },
    growth: shop,
  });
  const [proven] = dinCrib().filter(({ pattern }) => pattern.kind === 'diamond');

  it.each<[string, PlanRequest]>([
    ['a wheel counted', planRequest(planJob(), { limits: under(20, 0.13) })],
    [
      'a diametral wheel on its own blank',
      planRequest(planJob('brass360', { pitch: { system: 'dp', value: 96 } }), {
        limits: finishLimits({ dp: 96, knurlClass: 'II', nominal: inch(0.986) }),
        crib: dpCrib(),
      }),
    ],
    [
      'a diametral wheel by its label',
      planRequest(planJob('brass360', { pitch: { system: 'dp', value: 96 } }), {
        limits: under(25.24, 0.1),
        crib: dpCrib(),
      }),
    ],
    [
      'a proven diamond wheel, the shop known, a worn lathe',
      planRequest(diamond, {
        limits: under(20.05, 0.1),
        crib: [{ ...proven!, proven: mm(1.16), pitch: { system: 'metric', value: 1 } }],
        turningSpread: mm(0.02),
      }),
    ],
  ])('%s', (_, request) => {
    const [candidate] = plan(request).candidates;
    expect(candidate).toBeDefined();
    const { tracks, lands } = simulate(candidate!, request, 2024);
    expect(Math.abs(candidate!.chanceTracks - tracks)).toBeLessThan(0.005);
    expect(Math.abs(candidate!.chanceLands - lands)).toBeLessThan(0.005);
  });
});

describe('the chance of tracking', () => {
  const tracking = { turningSpread: TURNING_SPREAD, transversePitch: mm(0.8) };

  // evidence: (π·0.006/0.8)² + 0.1²/3 by hand: sd 0.06236; ±0.10 is ±1.6036 sd, 89.1 % (tables)
  it('of a proven pair at 0.8 mm is 89 %', () => {
    expect(toothErrorSpread({ ...tracking, countDoubt: 0.1 }).toFixed(5)).toBe('0.06236');
    expect(chanceOfTracking({ ...tracking, countDoubt: 0.1 })).toBeCloseTo(0.8912, 4);
  });

  it('falls with the doubt, with the turning spread and with a finer pitch', () => {
    const at = (spread: number, pitch: number, countDoubt: number) =>
      chanceOfTracking({ turningSpread: mm(spread), transversePitch: mm(pitch), countDoubt });
    fc.assert(
      fc.property(
        fc.double({ min: 0.001, max: 0.05, noNaN: true }),
        fc.double({ min: 0.5, max: 2, noNaN: true }),
        fc.double({ min: 0, max: 2, noNaN: true }),
        (spread, pitch, doubt) => {
          const chance = at(spread, pitch, doubt);
          expect(at(2 * spread, pitch, doubt)).toBeLessThanOrEqual(chance);
          expect(at(spread, pitch / 2, doubt)).toBeLessThanOrEqual(chance);
          expect(at(spread, pitch, doubt + 0.1)).toBeLessThanOrEqual(chance);
        },
      ),
    );
  });

  it('is certain where nothing errs', () => {
    const nothing = { ...tracking, turningSpread: mm(0), countDoubt: 0 };
    expect(chanceOfTracking(nothing)).toBe(1);
  });
});

describe('the chance of landing', () => {
  const belief = { mean: 0.95, sd: 0.1, results: 0 };
  const landing = (wanted: number) =>
    chanceOfLanding({
      wanted: { low: mm(wanted), high: mm(wanted) },
      shallow: mm(0.2),
      full: mm(0.4),
      belief,
    });

  // evidence: g between 0.75 and 1.5 of N(0.95, 0.1): beyond 2 sd below, 2.28 % (tables)
  it('is what is left of the spread of the growth', () => {
    expect(landing(0.3)).toBeCloseTo(0.9772, 4);
  });

  it('is a half where the expected growth only just reaches', () => {
    expect(landing(0.95 * 0.4)).toBeCloseTo(0.5, 5);
    expect(landing(0.95 * 0.2)).toBeCloseTo(0.5, 5);
  });

  it('is nearly nothing where no fill reaches', () => {
    expect(landing(0.8)).toBeLessThan(1e-9);
    expect(landing(0)).toBeLessThan(1e-9);
  });

  it('is greater for anywhere between two crests than for either', () => {
    const wanted = { low: mm(0.2), high: mm(0.3) };
    const anywhere = chanceOfLanding({ wanted, shallow: mm(0.2), full: mm(0.4), belief });
    expect(anywhere).toBeGreaterThan(Math.max(landing(0.2), landing(0.3)));
  });
});

describe('the chance that a turned diameter is inside', () => {
  // evidence: ±1 sd holds 68.27 % (tables)
  it('is 68 % at one spread either side', () => {
    const limits = { low: mm(19.994), high: mm(20.006) };
    const chance = chanceOfTurning({ diameter: mm(20), limits, turningSpread: mm(0.006) });
    expect(chance).toBeCloseTo(0.6827, 4);
  });

  it('is yes or no for a lathe without spread', () => {
    const turned = (diameter: number) =>
      chanceOfTurning({
        diameter: mm(diameter),
        limits: under(20, 0.1),
        turningSpread: mm(0),
      });
    expect([turned(19.95), turned(20.01)]).toEqual([1, 0]);
  });
});

describe('senseless arguments', () => {
  const belief = { mean: 0.95, sd: 0.1, results: 0 };
  it.each<[string, () => unknown]>([
    [
      'a spread under nothing',
      () => toothErrorSpread({ turningSpread: mm(-1), transversePitch: mm(1), countDoubt: 0 }),
    ],
    [
      'a doubt under nothing',
      () => chanceOfTracking({ turningSpread: mm(0), transversePitch: mm(1), countDoubt: -1 }),
    ],
    [
      'a fullest growth under the shallowest',
      () =>
        chanceOfLanding({
          wanted: { low: mm(0), high: mm(0) },
          shallow: mm(0.4),
          full: mm(0.2),
          belief,
        }),
    ],
    [
      'no diameter',
      () => chanceOfTurning({ diameter: mm(0), limits: under(1, 0.1), turningSpread: mm(0.006) }),
    ],
  ])('refuse %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });

  it('do not compile when their unit is another', () => {
    const angle = degrees(1);
    expect(() =>
      // @ts-expect-error an angle is no spread
      toothErrorSpread({ turningSpread: angle, transversePitch: mm(1), countDoubt: 0 }),
    ).not.toThrow();
  });
});
