/** Shops: nothing of one is ever seen from another, not even that it is there. */
import { describe, expect, it } from 'vitest';
import {
  addRule,
  addTo,
  answerQuestion,
  answersTo,
  approveStandard,
  askQuestion,
  causeCounts,
  changeIn,
  changeSetting,
  confirmResult,
  correctResult,
  covering,
  dropFromFind,
  effectOf,
  exportJson,
  findCard,
  findEntries,
  findIn,
  findPerson,
  findQuestion,
  findResult,
  findStandard,
  givenUp,
  givenUpSeen,
  growthIn,
  growthTallies,
  historyOf,
  importSheet,
  isUnderWay,
  latestCards,
  latestResults,
  listGroups,
  listOf,
  listPeople,
  listStandards,
  logResult,
  MACHINES,
  MATERIALS_OF_SHOP,
  nameGroupRole,
  nameRole,
  nearestWords,
  oldestPins,
  once,
  partsOf,
  personById,
  proposeStandard,
  questionInThread,
  questionsOnCard,
  queueEffects,
  RULES,
  removeFrom,
  removeGroup,
  removePerson,
  reopenQuestion,
  resultById,
  retireStandard,
  rolesOfGroups,
  rulesOnCard,
  type ShopChange,
  settingsOf,
  solveQuestion,
  toTell,
  unsolvedQuestions,
  WHEEL_SHEET,
  WHEELS,
  whoMay,
  withdrawResult,
} from '../../../src/shop/index.ts';
import { putUpAgain } from '../../../src/shop/questions/waiting.ts';
import { type Engine, MADE_TABLES, TABLES } from '../../../src/store/index.ts';
import {
  good,
  newRecords,
  newShop,
  person,
  refusalOf,
  type TestShop,
} from '../../support/records.ts';
import { grown, keptFor } from '../../support/results.ts';
import { requestOf } from '../../support/setupRequest.ts';
import { bringTo, jobLike } from '../../support/standards.ts';
import { CARD, STRAIGHT, TURRET } from './samples.ts';

/** Everything of a shop that has an id or a name. */
type Things = Readonly<Record<Thing, string>>;
type Thing =
  | 'wheel'
  | 'wheelName'
  | 'machine'
  | 'machineName'
  | 'material'
  | 'rule'
  | 'ruleName'
  | 'person'
  | 'personName'
  | 'personOutside'
  | 'group'
  | 'card'
  | 'code'
  | 'result'
  | 'question'
  | 'questionCode'
  | 'effect'
  | 'standard'
  | 'part';

const ALL = { machine: null, material: null, base: null };
const BAR = { base: 'steel-medC-CD', hardness: 210, elongation: null, note: null };

const furnish = async (shop: TestShop, mark: string): Promise<Things> => {
  const kim = person(`Kim ${mark}`, { id: `kim-${mark}` });
  const met = await shop.changeBy(kim, (_, entered) => Promise.resolve(entered.person));
  return await shop.change(async (change) => {
    const wheel = good(await addTo(change, WHEELS, { ...STRAIGHT, name: `wheel ${mark}` }));
    const machine = good(await addTo(change, MACHINES, { ...TURRET, name: `lathe ${mark}` }));
    const bar = { ...BAR, name: `bar ${mark}` };
    const material = good(await addTo(change, MATERIALS_OF_SHOP, bar));
    const rule = good(await addRule(change, { ...ALL, text: `rule ${mark}` }));
    const group = { outside: `group-${mark}`, name: `Group ${mark}` };
    good(await nameGroupRole(change, group, 'supervisor'));
    const part = await keptFor(change, requestOf(), wheel.id, machine.id);
    good(await logResult(change, part, grown(0.95)));
    const odd = { ...grown(1.6), symptom: 'oversize', cause: 'dullWheel' } as const;
    const { result } = good(await logResult(change, part, odd));
    const { standard } = await bringTo(change, `part ${mark}`, 'approved', part.id);
    await queueEffects(change, [{ key: `post ${mark}`, effect: { post: mark } }]);
    const asking = { text: `why ${mark}`, card: part.id, place: `questions ${mark}/` };
    const question = good(await askQuestion(change, asking));
    good(await answerQuestion(change, question.id, `so ${mark}`));
    return {
      wheel: wheel.id,
      wheelName: wheel.name,
      machine: machine.id,
      machineName: machine.name,
      material: material.id,
      rule: rule.id,
      ruleName: rule.name,
      person: met.id,
      personName: met.name,
      personOutside: met.outside,
      group: group.outside,
      card: part.id,
      code: part.code,
      result: result.id,
      question: question.id,
      questionCode: question.code,
      effect: `post ${mark}`,
      standard: standard.id,
      part: standard.part,
    };
  });
};

/** Everything that can be asked or changed, with an id or name that may be somebody else's. */
const ASKED: Readonly<Record<string, (change: ShopChange, id: string) => Promise<unknown>>> = {
  findWheel: (change, id) => findIn(change, WHEELS, id),
  findMachine: (change, id) => findIn(change, MACHINES, id),
  findMaterial: (change, id) => findIn(change, MATERIALS_OF_SHOP, id),
  findRule: (change, id) => findIn(change, RULES, id),
  changeWheel: (change, id) => changeIn(change, WHEELS, id, { partsRun: 5 }),
  changeMachine: (change, id) => changeIn(change, MACHINES, id, { dial: 'radius' }),
  changeMaterial: (change, id) => changeIn(change, MATERIALS_OF_SHOP, id, { hardness: 300 }),
  changeRule: (change, id) => changeIn(change, RULES, id, { text: 'mine now' }),
  removeWheel: (change, id) => removeFrom(change, WHEELS, id, { evenInUse: true }),
  removeMachine: (change, id) => removeFrom(change, MACHINES, id),
  removeMaterial: (change, id) => removeFrom(change, MATERIALS_OF_SHOP, id),
  removeRule: (change, id) => removeFrom(change, RULES, id),
  ruleForMachine: (change, id) => addRule(change, { ...ALL, text: 'x', machine: id }),
  ruleForMaterial: (change, id) => addRule(change, { ...ALL, text: 'x', material: id }),
  rulesOnCard: (change, id) => rulesOnCard(change, { machine: id, material: id, base: null }),
  findPerson: (change, id) => findPerson(change, id),
  personById: (change, id) => personById(change, id),
  nameRole: (change, id) => nameRole(change, id, 'engineer'),
  removePerson: (change, id) => removePerson(change, id),
  removeGroup: (change, id) => removeGroup(change, id),
  rolesOfGroups: (change, id) => rolesOfGroups(change, [id]),
  findCard: (change, id) => findCard(change, id),
  cardsBefore: (change, id) => latestCards(change, { limit: 50, before: id }),
  cardsOf: (change, id) => latestCards(change, { limit: 50, madeBy: id }),
  historyOfWheel: (change, id) => historyOf(change, 'wheel', { id }),
  historyOfPerson: (change, id) => historyOf(change, 'person', { id }),
  resultOfCard: (change, id) => findResult(change, { card: id }),
  resultById: (change, id) => resultById(change, id),
  resultsOf: (change, id) => latestResults(change, { limit: 50, madeBy: id }),
  resultsOfCard: (change, id) => latestResults(change, { limit: 50, card: id }),
  resultsOnWheel: (change, id) => latestResults(change, { limit: 50, wheel: id }),
  correctResult: (change, id) => correctResult(change, { id }, { teeth: 65 }),
  withdrawResult: (change, id) => withdrawResult(change, { id }),
  confirmResult: (change, id) => confirmResult(change, { id }),
  historyOfResult: (change, id) => historyOf(change, 'result', { id }),
  growthIn: (change, id) => growthIn(change, id),
  givenUpSeen: (change, id) => givenUpSeen(change, [id]),
  findStandard: (change, id) => findStandard(change, id),
  proposeStandard: (change, id) => proposeStandard(change, { part: id, revision: null }),
  approveStandard: (change, id) =>
    approveStandard(change, { part: id, revision: null, reviewMonths: null }),
  retireStandard: (change, id) =>
    retireStandard(change, { part: id, revision: null, why: 'mine now' }),
  historyOfStandard: (change, id) => historyOf(change, 'standard', { id }),
  covering: (change, id) => covering(change, jobLike({ wheel: id, machine: id, material: id })),
  isUnderWay: (change, id) => isUnderWay(change, id),
  findQuestion: (change, id) => findQuestion(change, id),
  questionInThread: (change, id) => questionInThread(change, id),
  questionsOnCard: (change, id) => questionsOnCard(change, id, 5),
  answersTo: (change, id) => answersTo(change, id),
  askedBy: (change, id) => unsolvedQuestions(change, { limit: 5, askedBy: id }),
  answerQuestion: (change, id) => answerQuestion(change, id, 'mine'),
  solveQuestion: (change, id) =>
    solveQuestion(change, id, { role: 'engineer', accepted: null, words: 'mine' }),
  reopenQuestion: (change, id) => reopenQuestion(change, id, { role: 'engineer', words: 'mine' }),
  putUpAgain: (change, id) => putUpAgain({ ...change, at: change.at + 99 * 3_600_000 }, id),
  toTell: (change, id) => toTell(change, 'engineer', id),
  effectOf: (change, id) => effectOf(change, id),
  once: (change, id) => once(change, id, () => Promise.resolve('mine')),
  dropFromFind: (change, id) => dropFromFind(change, 'card', id),
};

/** Words that are looked for: what fits is everybody's own, so they are asked in an empty shop. */
const LOOKED_FOR: typeof ASKED = {
  find: (change, words) => findEntries(change, words, { limit: 9 }),
  findMisspelt: (change, words) => findEntries(change, words.slice(0, -1), { limit: 9 }),
  findCards: (change, words) => findEntries(change, words, { limit: 9, kind: 'card' }),
  nearestWords: (change, words) => nearestWords(change, words.slice(0, -2)),
};

/** Everything that is asked without naming anything. */
const OVERVIEWS: Readonly<Record<string, (change: ShopChange) => Promise<unknown>>> = {
  wheels: (change) => listOf(change, WHEELS),
  machines: (change) => listOf(change, MACHINES),
  materials: (change) => listOf(change, MATERIALS_OF_SHOP),
  rules: (change) => listOf(change, RULES),
  people: (change) => listPeople(change),
  groups: (change) => listGroups(change),
  whoMay: (change) => whoMay(change, 'operator'),
  cards: (change) => latestCards(change, { limit: 50 }),
  results: (change) => latestResults(change, { limit: 50 }),
  doubted: (change) => latestResults(change, { limit: 50, doubted: true, since: 1 }),
  growth: (change) => growthIn(change, 'straight × steel'),
  tallies: (change) => growthTallies(change),
  causes: (change) => causeCounts(change, 'oversize'),
  standards: (change) => listStandards(change, { limit: 50 }),
  approvedStandards: (change) => listStandards(change, { limit: 50, state: 'approved' }),
  parts: (change) => partsOf(change),
  covering: (change) => covering(change, jobLike()),
  oldestPins: (change) => oldestPins(change, 5),
  settings: (change) => settingsOf(change),
  questions: (change) => unsolvedQuestions(change, { limit: 50 }),
  givenUp: (change) => givenUp(change),
  history: (change) => historyOf(change, 'wheel'),
  newest: (change) => findEntries(change, '', { limit: 9, kind: 'card' }),
  export: async (change) => {
    const pieces: string[] = [];
    for await (const piece of exportJson(change)) pieces.push(piece);
    return pieces;
  },
};

/** What a stranger is told of something that nobody has at all. */
const NOBODYS = 'nobody has this';

/** The words that a question itself brought along are no hint. */
const without = (answer: unknown, id: string): string =>
  JSON.stringify(answer ?? null).replaceAll(JSON.stringify(id).slice(1, -1), NOBODYS);

export const isolation = (engine: Engine): void => {
  describe('one shop among others', () => {
    it.each(Object.entries(ASKED))(
      '%s says of another shop’s things what it says of things that nobody has',
      async (_, ask) => {
        const { store } = await newRecords(engine);
        const mine = await newShop(store, 'Mine');
        const other = await newShop(store, 'Other');
        await furnish(mine, 'one');
        const theirs = await furnish(other, 'two');
        const asked = (id: string) => tried(mine, (change) => ask(change, id));
        const nothing = without(await asked(NOBODYS), NOBODYS);
        const before = await rowsOf(other);
        for (const id of Object.values(theirs).filter((value) => value !== theirs.ruleName)) {
          expect([id, without(await asked(id), id)]).toEqual([id, nothing]);
        }
        expect(await rowsOf(other)).toBe(before);
      },
    );

    it.each(Object.entries(LOOKED_FOR))(
      '%s finds nothing of another shop, and no word it uses',
      async (_, look) => {
        const { store } = await newRecords(engine);
        const mine = await newShop(store, 'Mine');
        const theirs = await furnish(await newShop(store, 'Other'), 'two');
        for (const words of [CARD.words, ...Object.values(theirs)]) {
          expect([words, await mine.change((change) => look(change, words))]).toEqual([words, []]);
        }
      },
    );

    it('never shows a row of another in any overview, and fills none of its lists', async () => {
      const { store } = await newRecords(engine);
      const mine = await newShop(store, 'Mine');
      const other = await newShop(store, 'Other');
      const blank: Record<string, string> = {};
      for (const [name, look] of Object.entries(OVERVIEWS)) {
        blank[name] = JSON.stringify(await mine.change(look));
      }
      await furnish(other, 'two');
      for (const [name, look] of Object.entries(OVERVIEWS)) {
        expect([name, JSON.stringify(await mine.change(look))]).toEqual([name, blank[name]]);
      }
    });

    it('finds no result by a number that only another has', async () => {
      const { store } = await newRecords(engine);
      const [mine, other] = [await newShop(store, 'Mine'), await newShop(store, 'Other')];
      await furnish(other, 'two');
      const asked = (number: number) => findResult(mine.view, { number });
      expect(refusalOf(await asked(2))).toEqual(refusalOf(await asked(9)));
    });

    it('lets two shops have the same names, the same codes of groups, the same keys', async () => {
      const { store } = await newRecords(engine);
      const shops = [await newShop(store, 'Mine'), await newShop(store, 'Other')];
      for (const shop of shops) await furnish(shop, 'same');
      for (const shop of shops) {
        expect(await listOf(shop.view, WHEELS)).toHaveLength(1);
        expect(await latestCards(shop.view, { limit: 9 })).toHaveLength(1);
      }
    });

    it('names its shop in every statement that it sends', async () => {
      const said = new Set<string>();
      const { store } = await newRecords(engine, { watch: (statement) => said.add(statement) });
      const shop = await newShop(store, 'Mine');
      const things = await furnish(shop, 'one');
      for (const ask of [...Object.values(ASKED), ...Object.values(LOOKED_FOR)]) {
        for (const id of [things.wheel, things.machine, things.person, things.code, NOBODYS]) {
          await tried(shop, (change) => ask(change, id));
        }
      }
      for (const look of Object.values(OVERVIEWS)) await shop.change(look);
      await shop.change((change) => changeSetting(change, 'units', 'mm'));
      const file = 'name,form,pitch\nA,straight,21 tpi\n';
      await shop.change((change) =>
        importSheet(change, WHEELS, WHEEL_SHEET, file, { units: 'mm', replace: true }),
      );
      const ofShops = [...said].filter((statement) => tableIn(statement) !== undefined);
      const unnamed = ofShops.filter((statement) => !namesShop(statement));
      expect(unnamed).toEqual([]);
      // As many kinds of statement as there are things to ask.
      expect(ofShops.length).toBeGreaterThan(40);
    });
  });
};

const tried = async (
  shop: TestShop,
  ask: (change: ShopChange) => Promise<unknown>,
): Promise<unknown> => {
  const stop = new Error('taken back');
  let answer: unknown;
  // Taken back each time, so that every question meets the same shop.
  await shop
    .change(async (change) => {
      answer = await ask(change);
      throw stop;
    })
    .catch((error: unknown) => {
      if (error !== stop) throw error;
    });
  return answer;
};

const rowsOf = async (shop: TestShop): Promise<string> => {
  const pieces: string[] = [];
  for await (const piece of exportJson(shop.view)) pieces.push(piece);
  return pieces.join('');
};

const OF_SHOPS: readonly string[] = [
  ...TABLES.filter(({ shop }) => shop === 'shop').map(({ name }) => name),
  ...MADE_TABLES,
];

const tableIn = (statement: string): string | undefined => {
  const name = /(?:from|into|update) "(?<name>\w+)"/u.exec(statement)?.groups?.['name'];
  return OF_SHOPS.find((table) => table === name);
};

const namesShop = (statement: string): boolean =>
  statement.startsWith('insert into')
    ? /insert into "\w+" \([^)]*"shop"/u.test(statement)
    : /where .*"shop" = /u.test(statement);
