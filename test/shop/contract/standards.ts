/** Standards: every step of their lives, every step that is refused, and what they cover. */
import { describe, expect, it } from 'vitest';
import { degrees, mm } from '../../../src/calc/index.ts';
import { en, showIn } from '../../../src/phrases/index.ts';
import type { Refusal } from '../../../src/refusal.ts';
import {
  addRule,
  addTo,
  approvedOf,
  approveStandard,
  changeIn,
  changeSetting,
  changesSince,
  covering,
  findStandard,
  historyOf,
  isUnderWay,
  type Job,
  keepCard,
  keysOf,
  listStandards,
  MACHINES,
  oldestPins,
  proposeStandard,
  queueEffects,
  removeFrom,
  retireStandard,
  type Saving,
  type ShopChange,
  type StandardState,
  saveStandard,
  WHEELS,
} from '../../../src/shop/index.ts';
import type { Engine } from '../../../src/store/index.ts';
import { good, newRecords, newShop, person, refusalOf, START } from '../../support/records.ts';
import { bringTo, draftOf, inches, jobLike } from '../../support/standards.ts';
import { SETUP_CARD, STRAIGHT, TURRET } from './samples.ts';

const PART = 'TH-2041-B';
const BEN = person('Ben');

type Result = Awaited<ReturnType<typeof proposeStandard>>;
type Step = (change: ShopChange, revision: number) => Promise<Result>;

const saving =
  (how: Saving, why: string | null = 'it runs cleaner'): Step =>
  async (change) =>
    await saveStandard(change, { ...(await draftOf(change, PART)), why }, how);

/** What can be asked of a standard; each names the revision that the person has in front of them. */
const STEPS = {
  save: saving('save'),
  propose: (change, revision) => proposeStandard(change, { part: PART, revision }),
  'propose a card': saving('propose'),
  approve: (change, revision) =>
    approveStandard(change, { part: PART, revision, reviewMonths: null }),
  revise: saving('revise'),
  'revise without a reason': saving('revise', null),
  retire: (change, revision) =>
    retireStandard(change, { part: PART, revision, why: 'no longer made' }),
  'retire without a reason': (change, revision) =>
    retireStandard(change, { part: PART, revision, why: null }),
} satisfies Record<string, Step>;
type StepName = keyof typeof STEPS;

/** Where the newest revision is afterwards, or why not. */
type Outcome = StandardState | Refusal['code'];

/**
 * By somebody else than who brought it there: what is another's draft or proposal is never written
 * over unasked.
 */
const LIVES: Readonly<Record<StandardState | 'none', Readonly<Record<StepName, Outcome>>>> = {
  none: {
    save: 'draft',
    propose: 'notFound',
    'propose a card': 'proposed',
    approve: 'notFound',
    revise: 'notFound',
    'revise without a reason': 'notFound',
    retire: 'notFound',
    'retire without a reason': 'missing',
  },
  draft: {
    save: 'stale',
    propose: 'proposed',
    'propose a card': 'stale',
    approve: 'notNow',
    revise: 'notNow',
    'revise without a reason': 'notNow',
    retire: 'retired',
    'retire without a reason': 'missing',
  },
  proposed: {
    save: 'stale',
    propose: 'notNow',
    'propose a card': 'stale',
    approve: 'approved',
    revise: 'notNow',
    'revise without a reason': 'notNow',
    retire: 'retired',
    'retire without a reason': 'missing',
  },
  approved: {
    save: 'notNow',
    propose: 'notNow',
    'propose a card': 'proposed',
    approve: 'notNow',
    revise: 'draft',
    'revise without a reason': 'missing',
    retire: 'retired',
    'retire without a reason': 'missing',
  },
  superseded: {
    save: 'notNow',
    propose: 'notNow',
    'propose a card': 'proposed',
    approve: 'notNow',
    revise: 'draft',
    'revise without a reason': 'missing',
    retire: 'notNow',
    'retire without a reason': 'missing',
  },
  retired: {
    save: 'notNow',
    propose: 'notNow',
    'propose a card': 'proposed',
    approve: 'notNow',
    revise: 'draft',
    'revise without a reason': 'missing',
    retire: 'notNow',
    'retire without a reason': 'missing',
  },
};

const PATHS = Object.entries(LIVES).flatMap(([from, steps]) =>
  Object.entries(steps).map(([step, outcome]) => [from, step, outcome] as const),
);

const sentenceOf = (refusal: unknown): string => en.refusal(refusal as Refusal, showIn('in'));

export const standards = (engine: Engine): void => {
  describe('a standard', () => {
    lives(engine);
    bars(engine);
    covers(engine);
    changes(engine);
    pins(engine);
  });
};

const lives = (engine: Engine): void => {
  it.each(PATHS)('from %s, %s: %s', async (from, step, outcome) => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const before = await shop.change(async (change) =>
      from === 'none' ? null : await bringTo(change, PART, from as StandardState),
    );
    const number = before?.revision.number ?? 1;
    const result = await shop.changeBy(BEN, (change) => STEPS[step as StepName](change, number));
    const kept = await findStandard(shop.view, PART);
    if (result.ok) {
      expect(result.value.revision.state).toBe(outcome);
      // Never two that hold, whatever way was taken.
      const held = result.value.standard.revisions.filter(({ state }) => state === 'approved');
      expect(held.length).toBeLessThanOrEqual(1);
      return;
    }
    expect(result.refusal.code).toBe(outcome);
    // Nothing is half done.
    expect(kept.ok ? kept.value : null).toEqual(before?.standard ?? null);
    const sentence = sentenceOf(result.refusal);
    expect(sentence).toMatch(/^\S.*(?:[.?…]|: \/knurl standard [a-z]+ TH-2041-B)$/u);
    expect(sentence).not.toMatch(/undefined|null|NaN|\[object/u);
    if (outcome === 'stale' || outcome === 'notNow') expect(sentence).toContain('Ada');
  });

  it('keeps who did what, when and why', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const { standard } = await shop.change((change) => bringTo(change, PART, 'draft'));
    const which = { part: PART, revision: 1 };
    await shop.changeBy(BEN, (change) => proposeStandard(change, which), START + 1);
    const approve = (change: ShopChange) => approveStandard(change, { ...which, reviewMonths: 6 });
    await shop.changeBy(person('Ada'), approve, START + 2);
    const why = 'the drawing changed';
    await shop.changeBy(BEN, (change) => retireStandard(change, { ...which, why }), START + 3);
    const steps = await historyOf(shop.view, 'standard', { id: standard.id });
    expect(steps.map(({ at, after }) => [at - START, after])).toEqual([
      [3, { part: PART, revision: 1, state: 'retired', why }],
      [2, { part: PART, revision: 1, state: 'approved', why: null }],
      [1, { part: PART, revision: 1, state: 'proposed', why: null }],
      [0, expect.objectContaining({ state: 'draft', why: 'it runs cleaner' })],
    ]);
    expect(new Set(steps.map(({ by }) => by)).size).toBe(2);
    const [revision] = good(await findStandard(shop.view, PART)).revisions;
    expect(revision?.reviewAt).toBe(Date.UTC(2025, 6, 6, 7, 0) + 2);
    expect(revision?.ended).toMatchObject({ at: START + 3, why });
  });

  it('writes over an own draft, and over another’s only where that was seen', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await shop.change((change) => bringTo(change, PART, 'draft'));
    const own = good(await shop.change((change) => STEPS.save(change, 0)));
    expect(own.revision.number).toBe(2);
    const over = (seen: number) =>
      shop.changeBy(BEN, async (change) =>
        saveStandard(change, { ...(await draftOf(change, PART)), over: seen }, 'save'),
      );
    const stale = refusalOf(await over(1));
    expect(stale).toMatchObject({ code: 'stale', what: PART, by: 'Ada' });
    expect(sentenceOf(stale)).toBe(
      'TH-2041-B was changed by Ada, 6 Jan 2025, 07:00 UTC. Nothing of yours was done. Look at it again, then repeat your change.',
    );
    const seen = good(await over(2));
    expect(seen.standard.revisions.map(({ number, state }) => [number, state])).toEqual([
      [3, 'draft'],
      [2, 'superseded'],
      [1, 'superseded'],
    ]);
  });

  it('is not revised from a revision that is no longer the last', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await shop.change((change) => bringTo(change, PART, 'approved'));
    await shop.change((change) => bringTo(change, PART, 'approved'));
    const late = await shop.changeBy(BEN, async (change) =>
      saveStandard(change, { ...(await draftOf(change, PART)), over: 1 }, 'revise'),
    );
    expect(refusalOf(late)).toMatchObject({ code: 'stale', by: 'Ada' });
  });

  it('has one approval and one clear refusal where two approve at once', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await shop.changeBy(person('Ben'), () => Promise.resolve());
    await shop.change((change) => bringTo(change, PART, 'proposed'));
    const both = await Promise.all(
      [person('Ada'), BEN].map((who) => shop.changeBy(who, (change) => STEPS.approve(change, 1))),
    );
    expect(both.map(({ ok }) => ok).sort()).toEqual([false, true]);
    const refused = both.find(({ ok }) => !ok);
    const holder = both[0]?.ok === true ? 'Ada' : 'Ben';
    expect(refused).toMatchObject({
      refusal: { code: 'notNow', state: 'approved', by: holder, revision: 1 },
    });
  });

  it('is not approved by whoever proposed it, where the shop wants two people', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await shop.changeBy(BEN, () => Promise.resolve());
    await shop.change((change) => changeSetting(change, 'fourEyes', true));
    await shop.change((change) => bringTo(change, PART, 'proposed'));
    const own = refusalOf(await shop.change((change) => STEPS.approve(change, 1)));
    expect(own).toEqual({ code: 'fourEyes', part: PART, revision: 1, people: [] });
    expect(sentenceOf(own)).toContain('nobody else here may');
    expect((await shop.changeBy(BEN, (change) => STEPS.approve(change, 1))).ok).toBe(true);
  });

  it('takes part numbers as shops write them, and says where one is too long', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const made = await shop.change((change) => bringTo(change, '  th-2041-b\u200b ', 'draft'));
    expect(made.standard.part).toBe('th-2041-b');
    expect(good(await findStandard(shop.view, 'TH-2041-B')).id).toBe(made.standard.id);
    expect(refusalOf(await findStandard(shop.view, 'TH-2041-C'))).toMatchObject({
      code: 'notFound',
      what: 'standard',
      nearest: ['th-2041-b'],
    });
    const long = await shop.change(async (change) =>
      saveStandard(change, await draftOf(change, 'X1'.repeat(250)), 'save'),
    );
    expect(sentenceOf(refusalOf(long))).toBe(
      'The part number has 500 characters; at most 60 are kept. Make it shorter.',
    );
    const none = await shop.change(async (change) =>
      saveStandard(change, await draftOf(change, ' \u200b '), 'save'),
    );
    expect(refusalOf(none)).toMatchObject({ code: 'missing', parameter: 'part' });
    expect(await listStandards(shop.view, { limit: 9 })).toHaveLength(1);
  });

  it('is made of no set-up that stops, and of nothing but a set-up', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const from = (more: Partial<typeof SETUP_CARD>) =>
      shop.change(async (change) => {
        const { id } = await keepCard(change, { ...SETUP_CARD, ...more });
        return await saveStandard(change, await draftOf(change, PART, id), 'propose');
      });
    const checks = [{ name: 'bending', state: 'stop' }];
    const stopped = refusalOf(await from({ card: { checks } }));
    expect(stopped).toMatchObject({ code: 'cardStopped', check: 'bending' });
    expect(sentenceOf(stopped)).toMatch(/stops at bending/u);
    expect(refusalOf(await from({ kind: 'plan' }))).toMatchObject({ what: 'setUpCard' });
  });

  it('is listed by its state, the last changed first', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const states: readonly StandardState[] = ['draft', 'proposed', 'approved', 'retired'];
    for (const [at, state] of states.entries())
      await shop.changeBy(
        person('Ada'),
        (change) => bringTo(change, `P-${state}`, state),
        START + at,
      );
    const partsIn = async (state?: StandardState) =>
      (await listStandards(shop.view, { limit: 9, ...(state === undefined ? {} : { state }) })).map(
        ({ part }) => part,
      );
    expect(await partsIn()).toEqual(['P-retired', 'P-approved', 'P-proposed', 'P-draft']);
    for (const state of states) expect(await partsIn(state)).toEqual([`P-${state}`]);
  });
};

/** A job that differs in one thing from the standard's own, and whether it is still covered. */
const JOBS: readonly (readonly [what: string, said: Partial<Job>, covered: boolean])[] = [
  ['the very job', {}, true],
  ['a bar a hundredth thicker', { stock: inches(1.009) }, true],
  ['a bar thinner than a hundredth', { stock: inches(0.989) }, false],
  ['25 mm for 1 in', { stock: mm(25) }, false],
  ['a material nobody named', { base: null }, false],
  ['another material', { base: 'ss304' }, false],
  ['the shop’s own bars of that material', { material: 'm1' }, true],
  ['another pattern', { pattern: { kind: 'diamond', points: 'raised' } }, false],
  ['1.2 mm for 21 TPI', { pitch: { named: mm(1.2), basis: 'normal', transverse: mm(1.2) } }, false],
  [
    'the same pitch as another system says it',
    { pitch: { named: mm(1.21), basis: 'rim', transverse: mm(1.21) } },
    true,
  ],
  ['a count of its own', { teeth: 64 }, false],
  ['the count it has', { teeth: 65 }, true],
  ['the bar left as it is', { asIs: true }, false],
  ['cut instead of formed', { process: 'cut' }, false],
  ['another tooth angle', { included: degrees(70) }, false],
  ['limits it comes out in', { finish: { low: inches(0.995), high: inches(1.005) } }, true],
  [
    'limits it does not come out in',
    { finish: { low: inches(0.985), high: inches(0.995) } },
    false,
  ],
  ['a bore', { bore: mm(10) }, false],
  ['a wheel that travels', { travel: 'traverse' }, false],
  ['any wheel and machine', { wheel: 'w1', machine: 'm1' }, true],
];

const covers = (engine: Engine): void => {
  it('covers what it was made for, and nothing that was said otherwise', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await shop.change((change) => bringTo(change, PART, 'approved'));
    const found = [];
    for (const [what, said] of JOBS)
      found.push([what, (await covering(shop.view, jobLike(said))).length === 1]);
    expect(found).toEqual(JOBS.map(([what, , covered]) => [what, covered]));
  });

  it.each(['draft', 'proposed', 'retired'] as const)('covers nothing while %s', async (state) => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await shop.change((change) => bringTo(change, PART, state));
    expect(await covering(shop.view, jobLike())).toEqual([]);
  });

  it('of several that cover, the closest is first, and of equals the one approved last', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const wheel = await shop.change(async (change) => good(await addTo(change, WHEELS, STRAIGHT)));
    const made = async (part: string, at: number, own: string | null) =>
      shop.changeBy(
        person('Ada'),
        async (change) => {
          const { id } = await keepCard(change, { ...SETUP_CARD, wheel: own });
          await bringTo(change, part, 'approved', id);
        },
        START + at,
      );
    await made('OWN', 1, wheel.id);
    await made('OLDER', 2, null);
    await made('NEWER', 3, null);
    const partsFor = async (said: Partial<Job>) =>
      (await covering(shop.view, jobLike(said))).map(({ standard }) => standard.part);
    expect(await partsFor({ wheel: wheel.id })).toEqual(['OWN', 'NEWER', 'OLDER']);
    // A line that names no wheel may mean any; one that names another means another.
    expect(await partsFor({})).toEqual(['NEWER', 'OLDER', 'OWN']);
    expect(await partsFor({ wheel: 'another' })).toEqual(['NEWER', 'OLDER']);
  });
};

const bars = (engine: Engine): void => {
  it('takes the bars that were said, from its own blank up', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const { revision } = await shop.change(async (change) => {
      const draft = await draftOf(change, PART);
      const said = { low: inches(0.9), high: inches(1.1) };
      return good(await saveStandard(change, { ...draft, bars: said }, 'save'));
    });
    const { bars: kept, blank } = revision.scope;
    // evidence: 65 teeth of 21 TPI, 65/(21 π) = 0.98524 in
    expect(blank / 25.4).toBeCloseTo(0.98524, 5);
    expect(kept).toEqual({ low: blank, high: inches(1.1) });
    const thin = await shop.change(async (change) => {
      const draft = await draftOf(change, 'THIN');
      const said = { low: inches(0.8), high: inches(0.9) };
      return await saveStandard(change, { ...draft, bars: said }, 'save');
    });
    expect(refusalOf(thin)).toMatchObject({ code: 'outOfRange', what: 'bars' });
  });
};

const changes = (engine: Engine): void => {
  it('says what it rests on has changed, been removed or come since it was approved', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const things = await shop.change(async (change) => {
      const wheel = good(await addTo(change, WHEELS, STRAIGHT));
      const machine = good(await addTo(change, MACHINES, TURRET));
      const scope = { machine: machine.id, material: null, base: null };
      const rule = good(await addRule(change, { ...scope, text: 'Slowly' }));
      const draft = { ...SETUP_CARD, wheel: wheel.id, machine: machine.id };
      const { id } = await keepCard(change, draft);
      await bringTo(change, PART, 'approved', id);
      return { wheel: wheel.id, machine: machine.id, rule: rule.id };
    });
    const since = async () => {
      const revision = approvedOf(good(await findStandard(shop.view, PART)));
      return revision === undefined
        ? null
        : await changesSince(shop.view, revision.scope, revision.basis);
    };
    expect(await since()).toEqual([]);
    // Parts that were run, and another drawer, say nothing about how a part comes out.
    await shop.change((change) =>
      changeIn(change, WHEELS, things.wheel, { partsRun: 9999, place: 'drawer 1' }),
    );
    expect(await since()).toEqual([]);
    await shop.change((change) => changeIn(change, WHEELS, things.wheel, { teeth: 62 }));
    await shop.change((change) =>
      removeFrom(change, MACHINES, things.machine, { evenInUse: true }),
    );
    await shop.change((change) =>
      addRule(change, { text: 'Guard down', machine: null, material: null, base: null }),
    );
    expect(await since()).toEqual([
      { what: 'wheel', name: STRAIGHT.name, how: 'changed', facts: ['teeth'] },
      { what: 'machine', name: TURRET.name, how: 'removed', facts: [] },
      { what: 'rule', name: '2', how: 'added', facts: [] },
    ]);
    // Approved again as it is now, it rests on what there is now.
    await shop.change(async (change) => bringTo(change, PART, 'approved'));
    expect(await since()).toEqual([]);
  });
};

const pins = (engine: Engine): void => {
  it('names the pins that have stood longest, and none that never stood', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const pinned = async (part: string, at: number, state: string) => {
      await shop.changeBy(
        person('Ada'),
        async (change) => {
          const { standard } = await bringTo(change, part, 'approved');
          await queueEffects(change, [{ key: keysOf(standard.id, 1).pin, effect: { pin: part } }]);
        },
        START + at,
      );
      // As the outbox writes it down.
      await store.transact(async (tx) => {
        await tx.updateTable('effect').set({ state }).where('state', '=', 'waiting').execute();
      });
    };
    await pinned('B', 2, 'delivered');
    await pinned('A', 1, 'delivered');
    await pinned('GIVEN-UP', 0, 'givenUp');
    await pinned('C', 3, 'delivered');
    const oldest = await oldestPins(shop.view, 2);
    expect(oldest.map(({ part, at }) => [part, at - START])).toEqual([
      ['A', 1],
      ['B', 2],
    ]);
    const { id } = good(await findStandard(shop.view, 'GIVEN-UP'));
    expect(await isUnderWay(shop.view, keysOf(id, 1).pin)).toBe(false);
  });
};
