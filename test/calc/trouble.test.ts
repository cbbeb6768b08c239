import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { checkAfter } from '../../src/calc/checking/index.ts';
import { materialById } from '../../src/calc/materials/index.ts';
import { type SetupRequest, setUp } from '../../src/calc/setup/index.ts';
import {
  CAUSE_IDS,
  CAUSES,
  type CauseId,
  LEAST_FACTOR,
  learnedPrior,
  MOVE_NUMBERS,
  NO_FACTS,
  NOTHING_SEEN,
  numberFactor,
  PRIORS,
  rankCauses,
  SYMPTOMS,
  type SymptomId,
  type TroubleFacts,
  type TroubleSeen,
  troubleFacts,
} from '../../src/calc/trouble/index.ts';
import { feetPerMinute, inch, mm, mmPerRev } from '../../src/calc/units.ts';
import { requestOf } from '../support/setupRequest.ts';

const firstOf = (symptom: SymptomId, facts: TroubleFacts): CauseId =>
  rankCauses(symptom, facts, {})[0]!.cause;

const factsOf = (said: Partial<SetupRequest>, seen: Partial<TroubleSeen> = {}): TroubleFacts => {
  const request = requestOf(said);
  return troubleFacts(request, setUp(request), { ...NOTHING_SEEN, ...seen });
};

/** A wheel proven to 65 teeth on the card's own blank. */
const PROVEN = mm(25.4 / 21);

const candidates = (symptom: SymptomId): CauseId[] => Object.keys(PRIORS[symptom]) as CauseId[];

describe('the tables', () => {
  it('hold at least 15 symptoms and 25 causes, and use every cause', () => {
    expect(SYMPTOMS.length).toBeGreaterThanOrEqual(15);
    expect(CAUSE_IDS.length).toBeGreaterThanOrEqual(25);
    const used = new Set(SYMPTOMS.flatMap(candidates));
    expect(CAUSE_IDS.filter((cause) => !used.has(cause))).toEqual([]);
  });

  it.each(SYMPTOMS)('%s has at least two causes that numbers can tell apart', (symptom) => {
    // One number at a time, put well past its limit: does it bring its own cause to the top of two?
    const speaking = candidates(symptom).flatMap((cause) =>
      CAUSES[cause].numbers.map((says) => ({ cause, says })),
    );
    const far = (cause: CauseId) => {
      const bad = speaking.filter((each) => each.cause === cause);
      const numbers = Object.fromEntries(
        speaking.map(({ says: { number, limit, side } }) => {
          const own = bad.some(({ says }) => says.number === number);
          return [number, own === (side === 'over') ? 4 * limit : limit / 4];
        }),
      );
      return rankCauses(symptom, { ...NO_FACTS, numbers }, {});
    };
    const place = (ranked: ReturnType<typeof rankCauses>, cause: CauseId) =>
      ranked.findIndex((each) => each.cause === cause);
    const pairs = speaking.flatMap((a) =>
      speaking
        .filter((b) => a.cause < b.cause)
        .filter((b) => place(far(a.cause), a.cause) < place(far(a.cause), b.cause))
        .filter((b) => place(far(b.cause), b.cause) < place(far(b.cause), a.cause)),
    );
    expect(pairs.length).toBeGreaterThan(0);
  });

  it.each(CAUSE_IDS)('%s has one next move, with a unit', (cause) => {
    const { move } = CAUSES[cause];
    if ('of' in move) expect(MOVE_NUMBERS[move.of]).toBeTruthy();
    else expect(move.number).toBeGreaterThan(0);
  });
});

describe('a number', () => {
  const says = {
    number: 'pinHeatIndex',
    limit: 1.4,
    spread: 0.5,
    scale: 'ratio',
    side: 'over',
    usual: 0.2,
    insteadOf: 'pinHeat',
  } as const;

  it('at its limit is as likely as not to be past it', () => {
    // By hand: ½ / 0.2
    expect(numberFactor(1.4, says)).toBeCloseTo(2.5, 9);
  });

  it('speaks smoothly, never less the further it is past, and never for good', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 20, noNaN: true }),
        fc.double({ min: 1.0001, max: 1.2, noNaN: true }),
        (value, more) => {
          const one = numberFactor(value, says);
          const other = numberFactor(value * more, says);
          expect(other).toBeGreaterThanOrEqual(one - 1e-12);
          expect(one).toBeGreaterThanOrEqual(LEAST_FACTOR);
          expect(other - one).toBeLessThan(1);
        },
      ),
    );
  });

  it('turned round speaks against', () => {
    const under = { ...says, side: 'under' } as const;
    expect(numberFactor(0.1, under)).toBeCloseTo(5, 6);
    expect(numberFactor(10, under)).toBe(LEAST_FACTOR);
  });
});

describe('the ranking', () => {
  it.each(SYMPTOMS)(
    'of %s by words alone follows the first guess and adds up to one',
    (symptom) => {
      const ranked = rankCauses(symptom, NO_FACTS, {});
      const guess = PRIORS[symptom];
      for (const [i, { cause }] of ranked.entries()) {
        const next = ranked[i + 1];
        if (next !== undefined) expect(guess[cause]).toBeGreaterThanOrEqual(guess[next.cause]!);
      }
      expect(ranked.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(1, 12);
      expect(ranked.flatMap(({ evidence }) => evidence)).toEqual([]);
    },
  );

  it.each(
    CAUSE_IDS.flatMap((cause) =>
      CAUSES[cause].checks
        .filter(({ stop, fine }) => stop > fine)
        .map(({ check }) => [cause, check] as const),
    ),
  )('%s stands higher when the check %s stops than when it is fine', (cause, check) => {
    const symptom = SYMPTOMS.find((each) => candidates(each).includes(cause))!;
    const ending = (state: 'fine' | 'stop') =>
      rankCauses(symptom, { ...NO_FACTS, states: { [check]: state } }, {}).find(
        (each) => each.cause === cause,
      )!.chance;
    expect(ending('stop')).toBeGreaterThan(ending('fine'));
  });

  it('lets a number speak instead of the check it belongs to, not beside it', () => {
    const ranked = rankCauses(
      'doublePattern',
      { ...NO_FACTS, numbers: { toothError: 0.4 }, states: { tracking: 'stop' } },
      {},
    );
    const { evidence } = ranked.find(({ cause }) => cause === 'wrongCount')!;
    expect(evidence).toHaveLength(1);
    // By hand: Φ((0.4 − 0.12)/0.03) / 0.25, as good as 1/0.25
    expect(evidence[0]).toMatchObject({ kind: 'number', number: 'toothError', value: 0.4 });
    expect(evidence[0]!.factor).toBeCloseTo(4, 9);
  });

  it('leaves no room for what the set-up does not have', () => {
    const solid = rankCauses('shallowOneSide', factsOf({ proven: PROVEN, pitch: null }), {});
    const place = (cause: CauseId) => solid.findIndex((each) => each.cause === cause);
    expect(place('runOut')).toBe(0);
    expect(place('thinWall')).toBeGreaterThan(4);
    expect(place('jawsTooTight')).toBeGreaterThan(4);
    expect(solid.find(({ cause }) => cause === 'thinWall')!.evidence).toContainEqual({
      kind: 'need',
      need: 'tube',
      there: false,
      factor: LEAST_FACTOR,
    });
  });
});

describe('what the numbers of a set-up say', () => {
  it('a bar left 0.36 of a tooth off, on a proven wheel: the count', () => {
    const facts = factsOf({ proven: PROVEN, pitch: null, stock: inch(0.995), asIs: true });
    expect(facts.numbers.toothError).toBeCloseTo(0.356, 3);
    const [first] = rankCauses('doublePattern', facts, {});
    expect(first!.cause).toBe('wrongCount');
    // The next whole count below is 65: 65 × 1.209524/π
    expect(first!.move.id).toBe('turnToWhole');
    expect(first!.move.number!).toBeCloseTo(25.0252, 4);
  });

  it('a whole count by an unproven label: the label', () => {
    const [first] = rankCauses('doublePattern', factsOf({}), {});
    expect(first!.cause).toBe('wheelOffLabel');
    // First bite of 21 TPI: 0.09 × 1.209524
    expect(first!.move).toMatchObject({ id: 'seamTest', unit: 'mm' });
    expect(first!.move.number!).toBeCloseTo(0.108857, 6);
  });

  it('a proven wheel and a light first turn: the first turn', () => {
    const facts = factsOf({ proven: PROVEN, pitch: null }, { firstBite: mm(0.03) });
    expect(facts.numbers.biteShare).toBeCloseTo(0.03 / 0.108857, 4);
    expect(firstOf('doublePattern', facts)).toBe('lightFirstBite');
  });

  it('a reading of 0.25 mm: the run-out, and how true it has to be', () => {
    const [first] = rankCauses('shallowOneSide', factsOf({ runout: mm(0.25) }), {});
    expect(first!.cause).toBe('runOut');
    expect(first!.move).toMatchObject({ id: 'trueUpTo', unit: 'mm' });
    expect(first!.evidence[0]).toMatchObject({ number: 'eccentricityOverBite' });
  });

  it('120 ft/min and more: the speed, back to its limit', () => {
    const [first] = rankCauses('pinSeized', factsOf({ speed: feetPerMinute(220) }), {});
    expect(['tooFast', 'hotPin']).toContain(first!.cause);
    expect(first!.move.id).toBe('runSlower');
    expect(first!.move.number!).toBeLessThanOrEqual(30.48);
  });

  it('a fill of 0.98: the fill, down to the flat of 0.90', () => {
    const [first] = rankCauses('flaking', factsOf({ fill: 0.98 }), {});
    expect(first!.cause).toBe('overFilled');
    // By hand: 1.209524 × (1 − 0.9)
    expect(first!.move.number!).toBeCloseTo(0.120952, 6);
  });

  it('a slender bar far out of the chuck: the bar, and how short it has to be', () => {
    const slender = { stock: mm(8), length: mm(5), stickout: mm(80) };
    const [first] = rankCauses('bentPart', factsOf(slender), {});
    expect(first!.cause).toBe('barGivesWay');
    expect(first!.move.id).toBe('shortenTo');
    expect(first!.move.number!).toBeLessThan(80);
    expect(first!.move.number!).toBeGreaterThanOrEqual(5);
  });

  it('a material that does not form: the material', () => {
    const hard = { material: materialById('ss17-4-A')!, process: 'form' } as const;
    expect(firstOf('tornCrests', factsOf(hard))).toBe('materialTears');
  });

  it('a feed twice as fast as it should be: the feed', () => {
    const fast = { length: mm(30), feed: mmPerRev(1.5) };
    const [first] = rankCauses('ridgeAtEnd', factsOf(fast), {});
    expect(first!.cause).toBe('feedTooFast');
    expect(first!.move).toMatchObject({ id: 'feedAt', unit: 'mm/rev' });
    expect(first!.move.number!).toBeLessThan(0.77);
  });

  it('a wheel of 9000 parts: the wheel is dull', () => {
    expect(firstOf('shallowAllRound', factsOf({}, { partsOnWheel: 9000 }))).toBe('dullWheel');
    expect(firstOf('shallowAllRound', factsOf({}, { partsOnWheel: 50 }))).not.toBe('dullWheel');
  });

  it('a part that was measured: fill or growth, as they were found', () => {
    const request = requestOf({ growth: { mean: 0.95, sd: 0.06, results: 12 } });
    const blank = setUp(request).blank.diameter;
    const p = 25.4 / 21;
    const measure = (fill: number, share: number) => {
      const after = checkAfter(request, {
        blank,
        teeth: null,
        crest: mm(blank + share * fill ** 2 * (p / 2)),
        toothHeight: null,
        flat: mm(p * (1 - fill)),
        ends: null,
      });
      return troubleFacts(request, setUp(request), { ...NOTHING_SEEN, after });
    };
    expect(firstOf('undersize', measure(0.65, 0.95))).toBe('underFilled');
    expect(firstOf('undersize', measure(0.9, 0.5))).toBe('growthUnlike');
    expect(firstOf('oversize', measure(0.9, 1.4))).toBe('growthUnlike');
    expect(firstOf('oversize', measure(0.99, 0.95))).toBe('overFilled');
  });

  it('every move that a set-up can work out is a number', () => {
    const whole = factsOf({ length: mm(30), stickout: mm(60), bore: mm(12) });
    for (const symptom of SYMPTOMS)
      for (const { cause, move } of rankCauses(symptom, whole, {}))
        expect(`${cause} ${String(Number.isFinite(move.number))}`).toBe(`${cause} true`);
  });

  it('a cut knurl brings none that only forming has', () => {
    const cut = factsOf({ process: 'cut', length: mm(20), wheel: requestOf().wheel });
    expect(cut.has.formed).toBe(false);
    expect(firstOf('tornCrests', cut)).not.toBe('materialTears');
  });
});

describe('what a shop has logged', () => {
  it('moves its priors by counting, and nothing else does', () => {
    // By hand, the weights of this symptom adding up to 100: (12 × 0.12 + 6)/18 and 12 × 0.22/18
    const after = learnedPrior('doublePattern', { dullWheel: 6 });
    const of = (cause: CauseId) => after.find((each) => each.cause === cause)!.chance;
    expect(of('dullWheel')).toBeCloseTo(0.413333, 6);
    expect(of('wrongCount')).toBeCloseTo(0.146667, 6);
    expect(after.reduce((sum, { chance }) => sum + chance, 0)).toBeCloseTo(1, 12);
  });

  it('makes room for a cause nobody had thought of', () => {
    const ranked = rankCauses('bentPart', NO_FACTS, { poorGrip: 40 });
    expect(ranked[0]!.cause).toBe('poorGrip');
  });

  it('comes to the shop’s own shares in the end', () => {
    const many = learnedPrior('flaking', { chipsInMesh: 7000, overFilled: 3000 });
    expect(many.find(({ cause }) => cause === 'chipsInMesh')!.chance).toBeCloseTo(0.7, 2);
  });

  it('never comes to less than nothing', () => {
    expect(() => learnedPrior('flaking', { overFilled: -1 })).toThrow(/overFilled -1/);
  });
});
