import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { CribWheel } from '../../src/calc/crib.ts';
import { type Candidate, PLAN_LENGTH, type Plan, plan } from '../../src/calc/plan/index.ts';
import { setUp } from '../../src/calc/setup/index.ts';
import { blankByStandard, dinCrib, dpCrib, finishLimits } from '../../src/calc/standards/index.ts';
import { degrees, inch, mm, OutOfRange } from '../../src/calc/units.ts';
import { planJob, planRequest, under } from '../support/planJob.ts';
import { between, mulberry32, oneOf } from '../support/random.ts';

const passing = ({ candidates }: Plan): readonly Candidate[] =>
  candidates.filter(({ state }) => state !== 'stop');
const kinds = ({ changes }: Plan): readonly string[] =>
  changes.map((change) => (change.kind === 'remedy' ? change.remedy.kind : change.kind));
const reasonsOf = (candidate: Candidate, name: string): string | undefined =>
  candidate.checks.find((check) => check.name === name)?.reason;

const RAISED = { kind: 'diamond', points: 'raised' } as const;

/** Growth over the pitch of a raised tooth, p·(x² − x³/3), at 90°: written out again. */
const raisedGrowth = (x: number): number => 0.8 * (x ** 2 - x ** 3 / 3);

describe('RGE 0.8 on 20 mm with h limits', () => {
  const job = planJob('steel-lowC-CD', { pattern: RAISED, length: mm(15) });
  const on = (tolerance: number) => planRequest(job, { limits: under(20, tolerance) });
  // The rim pitch of the standard's wheels: π·20/68, which is π·15/51 too.
  const step = 20 / 68;

  // evidence: tolerance of h11 on 18 to 30 mm: 0.130 (ISO 286, from memory).
  // One tooth is 0.294 mm of diameter, but a fill from 0.70 to the wheel's own covers only some
  // 0.2 mm of crest: a third of all diameters is out of reach, and 19.935 is one of them.
  it('does not come out in the middle of h11: it falls between 66 and 67 teeth', () => {
    const { candidates, fittingWheels } = plan(on(0.13));
    expect(fittingWheels).toBeGreaterThan(0);
    expect(candidates).toEqual([]);
    const middle = 19.935;
    expect(66 * step + 0.95 * raisedGrowth(0.97)).toBeLessThan(middle);
    expect(67 * step + 0.95 * raisedGrowth(0.7)).toBeGreaterThan(middle);
  });

  it('offers 67 teeth off the middle first: the crest is inside all the same', () => {
    const [first] = plan(on(0.13)).changes;
    expect(first?.kind).toBe('offMiddle');
    const { toothCount, fill, crestDiameter } = first!.candidate;
    expect(toothCount).toBe(67);
    expect(fill).toBeCloseTo(0.7, 6);
    expect(crestDiameter).toBeGreaterThan(19.87);
    expect(crestDiameter).toBeLessThan(20);
  });

  it('says how much wider one limit would have to be, and no more than that', () => {
    const wider = plan(on(0.13)).changes.find(({ kind }) => kind === 'widerLimits');
    if (wider?.kind !== 'widerLimits') throw new Error('no wider limits');
    expect(wider.side).toBe('below');
    expect(passing(plan(planRequest(job, { limits: wider.limits })))).not.toEqual([]);
    const short = { ...wider.limits, low: mm(wider.limits.low + 0.002) };
    expect(plan(planRequest(job, { limits: short })).candidates).toEqual([]);
  });

  // evidence: h13 is 0.330. The standard's own blank d1 − 0.67 t = 19.464 is no whole count; the
  // count nearest to it that can be turned, 66, is the one that comes out.
  it('comes out with 66 teeth at h13, near the blank of the standard', () => {
    const [best] = plan(on(0.33)).candidates;
    expect(best).toMatchObject({ toothCount: 66, limitedBy: 'wheel', process: 'form' });
    expect(best!.blankDiameter).toBeCloseTo(66 * step, 9);
    expect(best!.fill).toBeGreaterThan(0.7);
    expect(best!.fill).toBeLessThan(0.97);
    const standard = blankByStandard({ form: 'RGE', finished: mm(20), pitch: mm(0.8) });
    expect(Math.abs(best!.blankDiameter - standard)).toBeLessThan(step / 2);
  });

  // 15 mm is wider than any contact width, so a crossed wheel that only plunges is stopped.
  it('puts one-piece wheels last, stopped for travelling', () => {
    const { candidates } = plan(on(0.33));
    const single = candidates.filter(({ wheel }) => wheel.onePiece);
    expect(single.length).toBeGreaterThan(0);
    for (const candidate of single) expect(candidate).toMatchObject({ limitedBy: 'edge' });
    expect(candidates.slice(-single.length)).toEqual(single);
  });

  it('tracks better with a proven pair, and then growth is what limits it', () => {
    const proven = dinCrib()
      .filter(({ pattern, size }) => pattern.kind === 'diagonal' && size.face === 8)
      .filter(({ pitch }) => pitch?.value === 0.8)
      .map((wheel): CribWheel => ({ ...wheel, proven: mm(Math.PI * step), teeth: null }));
    const [counted] = plan(on(0.33)).candidates;
    const [sure] = plan({ ...on(0.33), crib: proven }).candidates;
    expect(sure!.toothCount).toBe(66);
    expect(sure!.chanceTracks).toBeGreaterThan(0.85);
    expect(sure!.chanceTracks).toBeGreaterThan(2 * counted!.chanceTracks);
    expect(sure!.limitedBy).toBe('growth');
  });
});

describe('96 DP class II straight for a fit', () => {
  const job = planJob('steel-lowC-CD', {
    pitch: { system: 'dp', value: 96 },
    knurlClass: 'II',
    length: inch(0.25),
  });
  const on = (nominal: number) =>
    planRequest(job, {
      limits: finishLimits({ dp: 96, knurlClass: 'II', nominal: inch(nominal) }),
      crib: dpCrib(),
    });

  // evidence: N = P·D (handbook): 93 teeth are 93/96 = 31/32 in, one of the blanks 96 DP is made
  // for (reported), so the label is to be trusted and only the growth is left to chance.
  it('takes 93 teeth on a 31/32 in blank for 0.986 in', () => {
    const { candidates, changes } = plan(on(0.986));
    expect(changes).toEqual([]);
    expect(candidates[0]).toMatchObject({ toothCount: 93, limitedBy: 'growth', state: 'fine' });
    expect(candidates[0]!.blankDiameter / 25.4).toBeCloseTo(31 / 32, 9);
    expect(candidates[0]!.chanceTracks).toBeGreaterThan(0.999);
    const { crestDiameter } = candidates[0]!;
    expect(crestDiameter / 25.4).toBeCloseTo(0.986 - 0.0045, 9);
  });

  // 94 teeth are too small and 95 too large for the middle of 0.991 to 1.000 in.
  it('has none for 1.000 in, and says what would do', () => {
    const none = plan(on(1));
    expect(none.candidates).toEqual([]);
    expect(kinds(none)).toContain('widerLimits');
    expect(kinds(none)).toContain('cut');
    const cut = none.changes.find(({ kind }) => kind === 'cut')!;
    // A cut knurl does not grow: 96 teeth, 1.000 in, the top of the limits itself.
    expect(cut.candidate.toothCount).toBe(96);
    expect(cut.candidate.chanceLands).toBeCloseTo(0.5, 6);
  });
});

describe('a thin tube', () => {
  const tube = (wall: number) =>
    plan(
      planRequest(planJob('al6061-T6', { bore: mm(29.7 - 2 * wall), length: mm(8) }), {
        limits: under(30, 0.1),
        crib: dinCrib(),
      }),
    );

  // A wall of 1 mm on 30 mm gives under any of these wheels: a plug carries it, or the knurl is cut.
  it('of 1 mm passes only plugged or cut', () => {
    const { candidates } = tube(1);
    expect(candidates.length).toBeGreaterThan(0);
    for (const { state, limitedBy } of candidates)
      expect({ state, limitedBy }).toEqual({ state: 'stop', limitedBy: 'ring' });
    expect(kinds(tube(1))).toEqual(['plug', 'cut']);
  });

  // At 2 mm the narrowest wheel, which presses least, is the only one that still may.
  it('of 2 mm passes with the narrowest wheel, the wider ones last', () => {
    const [first, ...rest] = tube(2).candidates;
    expect(first?.wheel.size.face).toBe(4);
    expect(first?.state).toBe('watch');
    for (const { wheel, state } of rest) {
      expect(wheel.size.face).toBeGreaterThan(4);
      expect(state).toBe('stop');
    }
  });

  it('thinner than the tooth is refused with both values', () => {
    expect(() => tube(0.2)).toThrow(expect.objectContaining({ what: 'wall' }));
  });
});

describe('a slender pin', () => {
  // 4 mm, knurled over 30 mm in a chuck: one wheel pushes it away, a tailstock does not hold the
  // middle, and the stickout cannot be shorter than the knurl.
  const job = planJob('steel-lowC-CD', {
    pitch: { system: 'metric', value: 0.5 },
    length: mm(30),
    stickout: mm(32),
  });
  const request = planRequest(job, { limits: under(4, 0.1) });

  it('passes only with an opposed tool or cut', () => {
    const found = plan(request);
    expect(found.candidates.length).toBeGreaterThan(0);
    for (const { limitedBy } of found.candidates) expect(limitedBy).toBe('bending');
    expect(kinds(found)).toEqual(['opposed', 'cut']);
  });

  it('does pass that way', () => {
    const opposed = plan({ ...request, job: { ...job, layout: 'opposed' } });
    expect(passing(opposed)).not.toEqual([]);
    expect(opposed.changes).toEqual([]);
    expect(passing(plan({ ...request, job: { ...job, process: 'cut' } }))).not.toEqual([]);
    expect(passing(plan({ ...request, job: { ...job, support: 'tailstock' } }))).toEqual([]);
  });
});

describe('where the print does not come out and the work gives way too', () => {
  // 3 mm, 50 mm long: no wheel brings the middle of the limits, and none holds without help.
  const slender = planRequest(
    planJob('steel-lowC-CD', {
      pitch: { system: 'metric', value: 0.5 },
      length: mm(50),
      stickout: mm(52),
    }),
    { limits: under(3, 0.1) },
  );

  it('every change names the aid it needs as well, and passes with it', () => {
    const { candidates, changes } = plan(slender);
    expect(candidates).toEqual([]);
    expect(changes.map(({ kind }) => kind)).toEqual([
      'offMiddle',
      'widerLimits',
      'otherPitch',
      'cut',
    ]);
    for (const { aid, candidate } of changes) {
      expect(aid).toBe('opposed');
      expect(candidate.state).not.toBe('stop');
      expect(candidate.request.layout).toBe('opposed');
    }
  });
});

describe('a stainless that hardens', () => {
  const job = planJob('ss304', { pitch: { system: 'metric', value: 1.2 }, length: mm(18) });
  const with1 = (face: number) =>
    plan(
      planRequest(job, {
        crib: dinCrib().filter(({ size }) => size.diameter === 20 && size.face === face),
      }),
    ).candidates;

  // evidence: at most 10 turns on a spot where the metal hardens (common practice). A wheel of
  // 10 mm rolls on 8: 8/10 = 0.8 mm/rev, faster than the 0.76/1.2 = 0.63 a 1.2 pitch may go.
  it('has no feed left under a 10 mm wheel', () => {
    const candidates = with1(10);
    expect(candidates.length).toBeGreaterThan(0);
    for (const candidate of candidates) expect(reasonsOf(candidate, 'feed')).toBe('noWindow');
  });

  // 4/10 to 4/5 mm/rev leaves 0.4 to 0.63.
  it('has one under a 6 mm wheel, which is put first of the two', () => {
    for (const candidate of with1(6)) expect(reasonsOf(candidate, 'feed')).toBe('within');
    const both = plan(
      planRequest(job, {
        crib: dinCrib().filter(({ size }) => size.diameter === 20 && size.face !== 8),
      }),
    ).candidates;
    expect(both.map(({ wheel }) => wheel.size.face)).toEqual([6, 10]);
  });

  // evidence: 17-4 in condition A has 5 to 8 % elongation at over 300 HB: it is not formed.
  it('is cut where it does not form at all', () => {
    const hard = plan(planRequest(planJob('ss17-4-A')));
    expect(hard.candidates.length).toBeGreaterThan(0);
    for (const { process, blankDiameter, crestDiameter } of hard.candidates) {
      expect(process).toBe('cut');
      expect(crestDiameter).toBe(blankDiameter);
    }
  });
});

describe('every candidate', () => {
  const materials = ['steel-lowC-CD', 'al6061-T6', 'brass360', 'ss303'] as const;
  const patterns = [{ kind: 'straight' }, RAISED, { kind: 'diagonal', hand: null }] as const;

  it('is a whole count whose expected crest is the middle, at a fill from 0.70 to 0.97', () => {
    const random = mulberry32(31);
    let seen = 0;
    for (let i = 0; i < 60; i++) {
      const size = between(random, 8, 60);
      const request = planRequest(
        planJob(oneOf(random, materials), { pattern: oneOf(random, patterns), pitch: null }),
        { limits: under(size, between(random, 0.05, 0.3)) },
      );
      const middle = (request.limits.low + request.limits.high) / 2;
      for (const candidate of plan(request).candidates) {
        const { figures } = setUp(candidate.request);
        seen += 1;
        expect(figures.crestDiameter!.value).toBeCloseTo(middle, 6);
        expect(candidate.crestDiameter).toBeCloseTo(middle, 9);
        expect(figures.blankDiameter!.value).toBeCloseTo(candidate.blankDiameter, 9);
        expect(figures.toothCount!.value).toBe(candidate.toothCount);
        expect(candidate.fill).toBeGreaterThanOrEqual(0.7 - 1e-6);
        expect(candidate.fill).toBeLessThanOrEqual(0.97 + 1e-6);
        expect(candidate.product).toBe(candidate.chanceTracks * candidate.chanceLands);
      }
    }
    expect(seen).toBeGreaterThan(150);
  });

  it('is ranked: passing before stopped, the likelier before the less likely', () => {
    const random = mulberry32(77);
    for (let i = 0; i < 60; i++) {
      const size = between(random, 10, 40);
      const { candidates } = plan(
        planRequest(planJob('steel-medC-CD', { pitch: null, bore: mm(size - 6) }), {
          limits: under(size, 0.2),
        }),
      );
      const stopped = candidates.map(({ state }) => state === 'stop');
      expect(stopped).toEqual([...stopped].sort((a, b) => Number(a) - Number(b)));
      for (const part of [true, false]) {
        const products = candidates.filter((_, k) => stopped[k] === part).map((c) => c.product);
        expect(products.length).toBeLessThanOrEqual(PLAN_LENGTH);
        for (const [k, product] of products.slice(1).entries())
          expect(product).toBeLessThanOrEqual(products[k]! + 1e-3);
      }
    }
  });

  it('comes from a bar that is to be had', () => {
    const all = plan(planRequest(planJob('steel-lowC-CD', { pitch: null }))).candidates;
    expect(all.some(({ blankDiameter }) => blankDiameter > 19.6)).toBe(true);
    const capped = planJob('steel-lowC-CD', { pitch: null, stock: mm(19.6) });
    const { candidates } = plan(planRequest(capped));
    expect(candidates.length).toBeGreaterThan(0);
    for (const { blankDiameter } of candidates) expect(blankDiameter).toBeLessThanOrEqual(19.6);
  });

  it('has the pitch, the hand and the tooth angle that were asked for', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 0.2, noNaN: true }), (pitchTolerance) => {
        const { candidates } = plan(planRequest(planJob(), { pitchTolerance }));
        for (const { pitchError } of candidates)
          expect(Math.abs(pitchError!)).toBeLessThanOrEqual(pitchTolerance + 1e-9);
      }),
      { numRuns: 20 },
    );
    const left = planJob('brass360', { pattern: { kind: 'diagonal', hand: 'left' }, pitch: null });
    const { candidates } = plan(planRequest(left));
    expect(candidates.length).toBeGreaterThan(0);
    for (const { wheel } of candidates)
      expect(wheel.pattern).toEqual({ kind: 'diagonal', hand: 'left' });
    expect(plan(planRequest(planJob(), { included: degrees(70) })).fittingWheels).toBe(0);
  });

  it('is less likely on a lathe that turns less truly', () => {
    const product = (spread: number) =>
      plan(planRequest(planJob(), { turningSpread: mm(spread) })).candidates[0]!.product;
    expect(product(0.02)).toBeLessThan(product(0.006));
    expect(product(0.006)).toBeLessThan(product(0.001));
  });
});

describe('what the shop has', () => {
  const own = (name: string, hand: 'left' | 'right', teeth: number): CribWheel => {
    const [base] = dinCrib().filter(
      ({ pattern, pitch, size }) =>
        pattern.kind === 'diagonal' &&
        pattern.hand === hand &&
        pitch?.value === 1 &&
        size.face === 8,
    );
    return { ...base!, name, teeth };
  };
  const job = planJob('brass360', {
    pattern: RAISED,
    pitch: { system: 'metric', value: 1 },
  });

  it('a left and a right wheel of one count are offered as a pair', () => {
    const crib = [own('L1', 'left', 54), own('R1', 'right', 54)];
    const { candidates } = plan(planRequest(job, { limits: under(20.25, 0.3), crib }));
    expect(candidates[0]?.wheel.name).toBe('L1 + R1');
  });

  it('wheels of different counts are not', () => {
    const crib = [own('L1', 'left', 54), own('R1', 'right', 55)];
    const { fittingWheels, candidates, changes } = plan(planRequest(job, { crib }));
    expect({ fittingWheels, candidates, changes }).toEqual({
      fittingWheels: 0,
      candidates: [],
      changes: [],
    });
  });
});

describe('a crib of five hundred wheels', () => {
  const random = mulberry32(500);
  const crib = Array.from({ length: 500 }, (_, i): CribWheel => {
    const base = oneOf(
      random,
      dinCrib().filter(({ pattern }) => pattern.kind === 'straight'),
    );
    const diameter = mm(between(random, 14, 26));
    const teeth = Math.round((Math.PI * diameter) / between(random, 0.5, 1.6));
    return { ...base, name: `wheel ${i}`, teeth, size: { ...base.size, diameter } };
  });
  const hopeless = { bore: mm(17.2), stickout: mm(400), length: mm(20) };

  it.each([
    ['of which many pass', {}],
    ['of which none passes', hopeless],
  ])('%s is planned', (_, said) => {
    const request = planRequest(planJob('steel-medC-CD', { pitch: null, ...said }), {
      crib,
      limits: under(20, 0.1),
    });
    const { candidates, fittingWheels } = plan(request);
    expect(fittingWheels).toBe(500);
    expect(candidates.length).toBeGreaterThan(0);
  });
});

describe('senseless jobs', () => {
  it.each<[string, () => unknown, object]>([
    [
      'limits the wrong way round',
      () => plan(planRequest(planJob(), { limits: { low: mm(20), high: mm(19.9) } })),
      { what: 'finish', value: 20, max: 19.9 },
    ],
    [
      'limits of nothing',
      () => plan(planRequest(planJob(), { limits: { low: mm(0), high: mm(1) } })),
      { what: 'finish', value: 0 },
    ],
    [
      'a tolerance under nothing',
      () => plan(planRequest(planJob(), { pitchTolerance: -0.1 })),
      { what: 'tolerance' },
    ],
    [
      'a stickout shorter than the knurl',
      () => plan(planRequest(planJob('brass360', { length: mm(20), stickout: mm(10) }))),
      { what: 'stickout', value: 10, min: 20 },
    ],
  ])('refuse %s', (_, call, refusal) => {
    expect(call).toThrow(OutOfRange);
    expect(call).toThrow(expect.objectContaining(refusal));
  });
});
