/** Results: what was logged is kept, learned from in order, and forgotten exactly when withdrawn. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type GrowthResult,
  growthBelief,
  growthFamily,
  materialById,
  mm,
  type Pattern,
  type SetupRequest,
  setUp,
} from '../../../src/calc/index.ts';
import { escaped } from '../../../src/shop/csv/escape.ts';
import {
  addTo,
  cardById,
  causeCounts,
  confirmResult,
  correctResult,
  exportCsv,
  exportJson,
  findEntries,
  findIn,
  findResult,
  growthIn,
  growthTallies,
  historyOf,
  type KeptCard,
  keepCard,
  type Logged,
  latestResults,
  logResult,
  type ResultContent,
  WHEELS,
  withdrawResult,
} from '../../../src/shop/index.ts';
import type { Engine } from '../../../src/store/index.ts';
import {
  good,
  newRecords,
  newShop,
  person,
  refusalOf,
  START,
  type TestShop,
} from '../../support/records.ts';
import { grown, keptFor, NOTHING_SAID } from '../../support/results.ts';
import { requestOf } from '../../support/setupRequest.ts';
import { CARD, STRAIGHT } from './samples.ts';

const PATTERNS: readonly Pattern[] = [{ kind: 'straight' }, { kind: 'diamond', points: 'raised' }];
const MATERIALS = ['steel-lowC-CD', 'brass360'];

const requestFor = (pattern = PATTERNS[0], material = MATERIALS[0]): SetupRequest => ({
  ...requestOf({ stock: mm(25.4) }),
  ...(pattern === undefined ? {} : { pattern }),
  ...(materialById(material ?? '') === undefined
    ? {}
    : { material: materialById(material ?? '')! }),
});

const shopOn = async (engine: Engine): Promise<TestShop> =>
  newShop((await newRecords(engine)).store);

const logOne = (shop: TestShop, content: ResultContent, request = requestFor()) =>
  shop.change(async (change) =>
    good(await logResult(change, await keptFor(change, request), content)),
  );

const numberOf = ({ result }: Logged): number => result.number;

export const results = (engine: Engine): void => {
  describe('results', () => {
    logging(engine);
    leaving(engine);
    finding(engine);
    refusing(engine);
    changing(engine);
    learning(engine);
    wearing(engine);
    causes(engine);
  });
};

const logging = (engine: Engine): void => {
  it('are kept as they were said, numbered one by one, and remembered', async () => {
    const shop = await shopOn(engine);
    const said: ResultContent = {
      ...grown(0.93),
      outcome: 'other',
      symptom: 'oversize',
      teeth: 66,
      partsRun: 12,
      cause: 'dullWheel',
      note: ' Ümlaut "quoted" \0 <!channel> ',
    };
    const first = await logOne(shop, said);
    const second = await logOne(shop, grown(0.95));
    expect([numberOf(first), numberOf(second)]).toEqual([1, 2]);
    const note = 'Ümlaut "quoted" <!channel>';
    expect(first.result).toMatchObject({ ...said, note, version: 1, standing: 'learned' });
    expect(good(await findResult(shop.view, { number: 1 }))).toEqual(first.result);
    const last = good(await findResult(shop.view, { card: second.result.card }));
    expect(last).toEqual(second.result);
    expect(await historyOf(shop.view, 'result', { id: first.result.id })).toMatchObject([
      { verb: 'added', before: null, after: { outcome: 'other', teeth: 66, note } },
    ]);
  });

  it('are numbered without a gap, however many come at once', async () => {
    const shop = await shopOn(engine);
    const logged = await Promise.all(Array.from({ length: 6 }, () => logOne(shop, grown(0.95))));
    expect(logged.map(numberOf).sort()).toEqual([1, 2, 3, 4, 5, 6]);
    expect(await growthTallies(shop.view)).toMatchObject([{ count: 6 }]);
  });

  it('say of the growth only what was measured', async () => {
    const shop = await shopOn(engine);
    const whole = grown(0.9);
    const said = async (content: ResultContent, request = requestFor()) =>
      (await logOne(shop, content, request)).compared.growth;
    const family = growthFamily({ kind: 'straight' }, 'steel');
    expect(await said(whole)).toMatchObject({ family, share: expect.closeTo(0.9, 9) as unknown });
    expect(await said({ ...whole, crest: null })).toBe('noCrest');
    expect(await said({ ...whole, outcome: 'flaking' })).toBe('spoiled');
    expect(await said({ ...whole, toothHeight: null })).toBe('noHeight');
    expect(await said({ ...whole, crest: mm(25.2) }, { ...requestFor(), process: 'cut' })).toBe(
      'cut',
    );
    // evidence: H = (1 − w/p) Hf, so the flat that the fill leaves says the same height
    const { pitch, blank } = setUp(requestFor());
    const flat = mm(pitch.normal * (1 - blank.tooth.fill));
    expect(await said({ ...whole, toothHeight: null, flat })).toMatchObject({
      family,
      share: expect.closeTo(0.9, 9) as unknown,
    });
  });

  it('of a card of another form are kept, and nothing is made of them', async () => {
    const shop = await shopOn(engine);
    const logged = await shop.change(async (change) => {
      const { id } = await keepCard(change, CARD);
      const card = await cardById(change, id);
      return good(await logResult(change, card as KeptCard, { ...grown(0.9), teeth: 65 }));
    });
    expect(logged.compared).toEqual({ base: null, after: null, growth: 'oldCard' });
    expect(logged.result).toMatchObject({ teeth: 65, standing: 'silent' });
  });

  it('are listed newest first, of a person, of a card, since a moment, and those that wait', async () => {
    const shop = await shopOn(engine);
    const one = await logOne(shop, grown(0.95));
    const kim = await shop.changeBy(
      person('Kim'),
      async (change) => good(await logResult(change, await keptFor(change), grown(1.6))),
      START + 1000,
    );
    const numbers = async (wanted: object) =>
      (await latestResults(shop.view, { limit: 9, ...wanted })).map(({ number }) => number);
    expect(await numbers({})).toEqual([2, 1]);
    expect(await numbers({ limit: 1 })).toEqual([2]);
    expect(await numbers({ madeBy: kim.result.madeBy })).toEqual([2]);
    expect(await numbers({ card: one.result.card })).toEqual([1]);
    expect(await numbers({ since: START + 1 })).toEqual([2]);
    expect(await numbers({ doubted: true })).toEqual([2]);
  });
};

const leaving = (engine: Engine): void => {
  it('go along when the shop takes its records with it, as JSON and as a table', async () => {
    const shop = await shopOn(engine);
    await logOne(shop, { ...grown(0.93), teeth: 65, note: '=SUM(A1)' });
    const pieces: string[] = [];
    for await (const piece of exportJson(shop.view)) pieces.push(piece);
    const all = JSON.parse(pieces.join('')) as Record<string, readonly object[]>;
    expect(all['result']).toMatchObject([{ number: 1, teeth: 65, note: '=SUM(A1)', learned: 1 }]);
    expect(all['growth']).toMatchObject([{ family: 'straight × steel', count: 1 }]);
    const file = exportCsv(shop.view).find(({ name }) => name === 'result.csv');
    let text = '';
    for await (const piece of file?.pieces ?? []) text += piece;
    const [heading = '', line = ''] = text.split('\r\n');
    expect(heading.split(',')).toContain('tooth_height');
    // No cell is a formula to the spreadsheet that opens it.
    expect(line).toContain(escaped('=SUM(A1)'));
    expect(escaped('=SUM(A1)')).not.toBe('=SUM(A1)');
  });
};

const finding = (engine: Engine): void => {
  it('are found by what was said of them, and no more once they are withdrawn', async () => {
    const shop = await shopOn(engine);
    const said: ResultContent = { ...NOTHING_SAID, outcome: 'double', symptom: 'doublePattern' };
    const { result } = await logOne(shop, {
      ...said,
      cause: 'dullWheel',
      note: 'burr by the jaws',
    });
    const found = async (words: string) =>
      (await findEntries(shop.view, words, { limit: 9, kind: 'result' })).map(({ id }) => id);
    for (const words of ['burr', 'dull wheel', 'double straight', 'R1'])
      expect([words, await found(words)]).toEqual([words, [result.id]]);
    await shop.change(async (change) => {
      good(await correctResult(change, { id: result.id }, { note: 'scratch by the jaws' }));
    });
    expect([await found('scratch'), await found('burr')]).toEqual([[result.id], []]);
    await shop.change(async (change) => {
      good(await withdrawResult(change, { id: result.id }));
    });
    expect(await found('scratch')).toEqual([]);
  });
};

const refusing = (engine: Engine): void => {
  it.each([
    ['a crest smaller than the blank', { crest: mm(25) }, { what: 'crestDiameter', value: 25 }],
    ['a crest no tooth can raise', { crest: mm(29) }, { what: 'crestDiameter', value: 29 }],
    ['a tooth above the sharp one', { toothHeight: mm(0.7) }, { what: 'toothHeight' }],
    ['a tooth that could not have raised it', { toothHeight: mm(0.19) }, { what: 'crestDiameter' }],
    ['a flat wider than the pitch', { flat: mm(1.3) }, { what: 'flat' }],
    ['a count of another wheel', { teeth: 9000 }, { what: 'counted' }],
    ['half a tooth', { teeth: 65.5 }, { what: 'counted' }],
    ['parts run backwards', { partsRun: -1 }, { what: 'partsRun' }],
    ['half a part', { partsRun: 1.5 }, { what: 'partsRun' }],
    ['a letter for a note', { note: 'x'.repeat(501) }, { what: 'note', value: 501 }],
  ] as const)('refuse %s, and nothing is left of it', async (_, wrong, refusal) => {
    const shop = await shopOn(engine);
    const content = { ...grown(0.95), ...wrong };
    const refused = await shop.change(async (change) =>
      logResult(change, await keptFor(change), content),
    );
    expect(refusalOf(refused)).toMatchObject({ code: 'outOfRange', ...refusal });
    expect(await latestResults(shop.view, { limit: 9 })).toEqual([]);
    expect(await historyOf(shop.view, 'result')).toEqual([]);
    const { result } = await logOne(shop, grown(0.95));
    const late = await shop.change((change) => correctResult(change, result, wrong));
    expect(refusalOf(late)).toMatchObject({ code: 'outOfRange', ...refusal });
    expect(await latestResults(shop.view, { limit: 9 })).toEqual([result]);
  });
};

const changing = (engine: Engine): void => {
  it('are corrected with what they were kept, and who did it', async () => {
    const shop = await shopOn(engine);
    const { result } = await logOne(shop, grown(0.95));
    const corrected = await shop.changeBy(
      person('Kim'),
      async (change) => good(await correctResult(change, result, { ...grown(0.9), teeth: 65 })),
      START + 5,
    );
    expect(corrected.result).toMatchObject({ teeth: 65, version: 2, changedAt: START + 5 });
    expect(corrected.result.share).toBeCloseTo(0.9, 9);
    const [line] = await historyOf(shop.view, 'result', { id: result.id });
    expect(line).toMatchObject({
      verb: 'changed',
      by: corrected.result.changedBy,
      before: { teeth: null, crest: result.crest },
      after: { teeth: 65, crest: corrected.result.crest },
    });
  });

  it('are not written over by whoever saw an older one, nor once they are withdrawn', async () => {
    const shop = await shopOn(engine);
    const { result } = await logOne(shop, grown(0.95));
    const { id, version } = result;
    const both = await Promise.all(
      [0.9, 0.91].map((share) =>
        shop.change((change) => correctResult(change, { id, version }, grown(share))),
      ),
    );
    expect(both.filter(({ ok }) => ok)).toHaveLength(1);
    const refusal = both.flatMap((each) => (each.ok ? [] : [each.refusal]));
    expect(refusal).toMatchObject([{ code: 'stale', what: 'R1', by: 'Ada' }]);
    await shop.change(async (change) => good(await withdrawResult(change, { id })));
    for (const late of [
      await shop.change((change) => correctResult(change, { id }, grown(0.9))),
      await shop.change((change) => withdrawResult(change, { id })),
      await shop.change((change) => confirmResult(change, { id })),
    ]) {
      expect(refusalOf(late)).toMatchObject({ code: 'stale', what: 'R1', by: 'Ada' });
    }
    expect(await latestResults(shop.view, { limit: 9 })).toEqual([]);
    expect(good(await findResult(shop.view, { number: 1 })).standing).toBe('withdrawn');
  });
};

/** What may be done, one after the other, with the results there are by then. */
type Deed =
  | { readonly do: 'log'; readonly share: number; readonly family: number }
  | { readonly do: 'correct'; readonly share: number; readonly which: number }
  | { readonly do: 'withdraw'; readonly which: number }
  | { readonly do: 'confirm'; readonly which: number };

const share = fc.oneof(
  { weight: 4, arbitrary: fc.double({ min: 0.8, max: 1.05, noNaN: true }) },
  { weight: 1, arbitrary: fc.constantFrom(1.3, 1.5, 0.5) },
);
const which = fc.nat(20);
const deed: fc.Arbitrary<Deed> = fc.oneof(
  {
    weight: 5,
    arbitrary: fc.record({ do: fc.constant('log' as const), share, family: fc.nat(3) }),
  },
  { weight: 2, arbitrary: fc.record({ do: fc.constant('correct' as const), share, which }) },
  {
    weight: 2,
    arbitrary: fc.record({ do: fc.constantFrom('withdraw' as const, 'confirm' as const), which }),
  },
);

const FAMILIES = [0, 1, 2, 3].map((at) =>
  requestFor(PATTERNS[at % 2], MATERIALS[Math.floor(at / 2)]),
);

const learning = (engine: Engine): void => {
  /** All that stands and speaks of growth, in the order in which it came. */
  const asLogged = async (shop: TestShop): Promise<GrowthResult[]> => {
    const all = await latestResults(shop.view, { limit: 100 });
    return [...all]
      .reverse()
      .flatMap(({ family, share: seen, confirmedBy }) =>
        family === null || seen === null
          ? []
          : [{ family, share: seen, confirmed: confirmedBy !== null }],
      );
  };

  const sameAsPure = async (shop: TestShop): Promise<void> => {
    const pure = await asLogged(shop);
    for (const request of FAMILIES) {
      const family = growthFamily(request.pattern, request.material.group);
      expect(await growthIn(shop.view, family)).toEqual(growthBelief(pure, family));
    }
  };

  it('teach what the pure calculation makes of the same results, to the last digit', async () => {
    const shop = await shopOn(engine);
    for (const [at, one] of [0.93, 0.97, 0.88, 1.5, 0.91, 0.94].entries()) {
      const request = FAMILIES[at % 3] ?? requestFor();
      await logOne(shop, grown(one, request), request);
      await sameAsPure(shop);
    }
    expect(await latestResults(shop.view, { limit: 9, doubted: true })).toHaveLength(1);
  });

  it('teach the same whatever was corrected, withdrawn and confirmed in between', async () => {
    const act = async (shop: TestShop, one: Deed): Promise<void> => {
      if (one.do === 'log') {
        const request = FAMILIES[one.family] ?? requestFor();
        await logOne(shop, grown(one.share, request), request);
        return;
      }
      const standing = await latestResults(shop.view, { limit: 100 });
      const result = standing[one.which % Math.max(1, standing.length)];
      if (result === undefined) return;
      await shop.change(async (change) => {
        if (one.do === 'withdraw') return good(await withdrawResult(change, result));
        if (one.do === 'confirm') return good(await confirmResult(change, result));
        const card = await cardById(change, result.card);
        const { crest } = grown(one.share, card?.request as SetupRequest);
        return good(await correctResult(change, result, { crest }));
      });
    };
    await fc.assert(
      fc.asyncProperty(fc.array(deed, { minLength: 4, maxLength: 14 }), async (deeds) => {
        const shop = await newShop((await newRecords(engine)).store);
        for (const one of deeds) await act(shop, one);
        await sameAsPure(shop);
      }),
      { numRuns: 12 },
    );
  });

  it('are forgotten exactly when they are withdrawn', async () => {
    const shop = await shopOn(engine);
    const without = await shopOn(engine);
    const shares = [0.93, 0.97, 0.88, 0.91];
    for (const one of shares) {
      await logOne(shop, grown(one));
      if (one !== 0.97) await logOne(without, grown(one));
    }
    await shop.change(async (change) => {
      const { id } = good(await findResult(change, { number: 2 }));
      good(await withdrawResult(change, { id }));
    });
    expect(await growthTallies(shop.view)).toEqual(await growthTallies(without.view));
    for (const { id } of await latestResults(shop.view, { limit: 9 }))
      await shop.change(async (change) => good(await withdrawResult(change, { id })));
    const family = growthFamily({ kind: 'straight' }, 'steel');
    expect(await growthIn(shop.view, family)).toEqual(growthBelief([], family));
    expect(await growthTallies(shop.view)).toEqual([]);
  });

  it('wait when they are far from what was expected, until someone confirms them', async () => {
    const shop = await shopOn(engine);
    await logOne(shop, grown(0.95));
    const odd = await logOne(shop, grown(1.6));
    expect(odd.result.standing).toBe('doubted');
    expect(odd.growth).toMatchObject({ results: 1, doubted: 1 });
    const confirmed = await shop.changeBy(person('Kim'), async (change) =>
      good(await confirmResult(change, odd.result)),
    );
    expect(confirmed.result).toMatchObject({ standing: 'learned', version: 2 });
    expect(confirmed.result.confirmedBy).not.toBe(confirmed.result.madeBy);
    expect(confirmed.growth).toMatchObject({ results: 2, doubted: 0 });
    // Other numbers than those that were confirmed wait again.
    const corrected = await shop.change(async (change) =>
      good(await correctResult(change, { id: odd.result.id }, grown(1.7))),
    );
    expect(corrected.result).toMatchObject({ standing: 'doubted', confirmedBy: null });
    const noted = await shop.change(async (change) =>
      good(await correctResult(change, { id: odd.result.id }, { note: 'burr' })),
    );
    expect(noted.result).toMatchObject({ standing: 'doubted', note: 'burr' });
  });

  it('name the others that stand otherwise because of one', async () => {
    const shop = await shopOn(engine);
    const first = await logOne(shop, grown(1.6));
    const second = await logOne(shop, grown(1.55));
    expect(second.result.standing).toBe('doubted');
    const confirmed = await shop.change(async (change) =>
      good(await confirmResult(change, first.result)),
    );
    expect(confirmed.others).toEqual({ learned: [second.result.id], doubted: [] });
    const withdrawn = await shop.change(async (change) =>
      good(await withdrawResult(change, { id: first.result.id })),
    );
    expect(withdrawn.others).toEqual({ learned: [], doubted: [second.result.id] });
  });

  it('stand in the order of their moments, whichever program logged them', async () => {
    const shop = await shopOn(engine);
    const late = (content: ResultContent, at: number) =>
      shop.changeBy(
        person('Ada'),
        async (change) => good(await logResult(change, await keptFor(change), content)),
        at,
      );
    await late(grown(0.93), START + 9000);
    // A program whose clock is behind.
    const odd = await late(grown(1.27), START + 1000);
    await sameAsPure(shop);
    expect(odd.result.number).toBe(2);
  });
};

const wearing = (engine: Engine): void => {
  it('count on the wheel, and what was taken back is taken back exactly', async () => {
    const shop = await shopOn(engine);
    const { wheel, logged } = await shop.change(async (change) => {
      const kept = good(await addTo(change, WHEELS, STRAIGHT));
      const card = await keptFor(change, requestFor(), kept.id);
      const content = { ...NOTHING_SAID, partsRun: 40 };
      return { wheel: kept, logged: good(await logResult(change, card, content)) };
    });
    const parts = async () => good(await findIn(shop.view, WHEELS, wheel.id)).partsRun;
    expect([logged.partsOnWheel, await parts()]).toEqual([1290, 1290]);
    const { id } = logged.result;
    const corrected = await shop.change(async (change) =>
      good(await correctResult(change, { id }, { partsRun: 25 })),
    );
    expect([corrected.partsOnWheel, await parts()]).toEqual([1275, 1275]);
    const withdrawn = await shop.change(async (change) =>
      good(await withdrawResult(change, { id })),
    );
    expect([withdrawn.partsOnWheel, await parts()]).toEqual([STRAIGHT.partsRun, 1250]);
  });

  it('lose no part where many come at once', async () => {
    const shop = await shopOn(engine);
    const { card, wheel } = await shop.change(async (change) => {
      const kept = good(await addTo(change, WHEELS, { ...STRAIGHT, partsRun: 0 }));
      return { card: await keptFor(change, requestFor(), kept.id), wheel: kept.id };
    });
    const content = { ...NOTHING_SAID, partsRun: 3 };
    await Promise.all(
      Array.from({ length: 8 }, () =>
        shop.change(async (change) => good(await logResult(change, card, content))),
      ),
    );
    expect(good(await findIn(shop.view, WHEELS, wheel)).partsRun).toBe(24);
  });
};

const causes = (engine: Engine): void => {
  it('count what was behind a symptom, until they are withdrawn or said otherwise', async () => {
    const shop = await shopOn(engine);
    const double = { ...NOTHING_SAID, outcome: 'double', symptom: 'doublePattern' } as const;
    const one = await logOne(shop, { ...double, cause: 'dullWheel' });
    const two = await logOne(shop, { ...double, cause: 'dullWheel' });
    await logOne(shop, { ...double, cause: 'secondPass' });
    await logOne(shop, { ...NOTHING_SAID, symptom: 'flaking', cause: 'dullWheel' });
    expect(await causeCounts(shop.view, 'doublePattern')).toEqual({ dullWheel: 2, secondPass: 1 });
    await shop.change(async (change) => {
      good(await correctResult(change, { id: one.result.id }, { cause: 'wrongCount' }));
      good(await withdrawResult(change, { id: two.result.id }));
    });
    expect(await causeCounts(shop.view, 'doublePattern')).toEqual({ wrongCount: 1, secondPass: 1 });
  });
};
