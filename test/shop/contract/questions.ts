/** Questions: asked, answered, solved, reopened; what is said is kept, whoever is first. */
import { describe, expect, it } from 'vitest';
import {
  answerQuestion,
  answersTo,
  askQuestion,
  effectOf,
  findEntries,
  findQuestion,
  historyOf,
  keepCard,
  nameRole,
  openOutbox,
  type Question,
  type QuestionState,
  questionInThread,
  questionsOnCard,
  queueEffects,
  type Role,
  reopenQuestion,
  solveQuestion,
  threadKey,
  toTell,
  unsolvedQuestions,
} from '../../../src/shop/index.ts';
import type { Engine, Store } from '../../../src/store/index.ts';
import {
  good,
  newRecords,
  newShop,
  person,
  refusalOf,
  START,
  type TestShop,
} from '../../support/records.ts';
import { CARD } from './samples.ts';

const BEN = person('Ben');
const OLA = person('Ola');
const WHY = 'why does it double *here*, <@everyone>?\nsecond line';

type Move = 'answer' | 'solve' | 'solve with words' | 'reopen';
type Result = { ok: true; value: unknown } | { ok: false; refusal: unknown };

const ask = async (shop: TestShop, text = WHY): Promise<Question> =>
  good(
    await shop.changeBy(BEN, (change) =>
      askQuestion(change, { text, card: null, place: 'questions/' }),
    ),
  );

const act = (shop: TestShop, id: string, move: Move): Promise<Result> =>
  shop.change<Result>((change) => {
    const role: Role = 'engineer';
    if (move === 'answer') return answerQuestion(change, id, 'turn slower');
    if (move === 'reopen') return reopenQuestion(change, id, { role, words: 'it doubles again' });
    const words = move === 'solve' ? null : 'the wheel was worn';
    return solveQuestion(change, id, { role, accepted: null, words });
  });

/** Moves that bring a new question there. */
const WAYS: { readonly [S in QuestionState]: readonly Move[] } = {
  open: [],
  answered: ['answer'],
  solved: ['answer', 'solve'],
  reopened: ['answer', 'solve', 'reopen'],
};

const at = async (shop: TestShop, state: QuestionState): Promise<Question> => {
  const { id } = await ask(shop);
  for (const move of WAYS[state]) good(await act(shop, id, move));
  const question = good(await findQuestion(shop.view, id));
  expect(question.state).toBe(state);
  return question;
};

export const questions = (engine: Engine): void => {
  describe('questions', () => {
    life(engine);
    said(engine);
    people(engine);
    together(engine);
    places(engine);
  });
};

const life = (engine: Engine): void => {
  it.each<[QuestionState, Move, QuestionState | null]>([
    ['open', 'answer', 'answered'],
    ['open', 'solve', null],
    ['open', 'solve with words', 'solved'],
    ['open', 'reopen', null],
    ['answered', 'answer', 'answered'],
    ['answered', 'solve', 'solved'],
    ['answered', 'solve with words', 'solved'],
    ['answered', 'reopen', 'reopened'],
    ['solved', 'answer', null],
    ['solved', 'solve', null],
    ['solved', 'solve with words', null],
    ['solved', 'reopen', 'reopened'],
    ['reopened', 'answer', 'answered'],
    ['reopened', 'solve', 'solved'],
    ['reopened', 'solve with words', 'solved'],
    ['reopened', 'reopen', null],
  ])('%s, then %s: %s', async (state, move, wanted) => {
    const shop = await newShop((await newRecords(engine)).store);
    const before = await at(shop, state);
    const answers = await answersTo(shop.view, before.id);
    const result = await act(shop, before.id, move);
    const after = good(await findQuestion(shop.view, before.id));
    if (wanted === null) {
      const refusal = refusalOf(result);
      expect(refusal).toMatchObject({ code: 'questionStands', question: before.code, state });
      expect(after).toEqual(before);
      expect(await answersTo(shop.view, before.id)).toEqual(answers);
      return;
    }
    expect(after).toMatchObject({ state: wanted, version: before.version + 1 });
    expect(after.remindAt === null).toBe(wanted !== 'reopened');
    expect(after.solvedAt === null).toBe(wanted !== 'solved');
    const [last] = await historyOf(shop.view, 'question', { id: before.id });
    expect(last).toMatchObject({ before: { state }, after: { state: wanted } });
  });

  it('repeats the words that a solved one does not take', async () => {
    const shop = await newShop((await newRecords(engine)).store);
    const { id } = await at(shop, 'solved');
    const words = 'a long answer, worked on for an hour';
    const refused = await shop.change((change) => answerQuestion(change, id, words));
    expect(refusalOf(refused)).toMatchObject({ move: 'answer', words });
  });

  it('are solved by the answer that is named, and ask which where several could be meant', async () => {
    const shop = await newShop((await newRecords(engine)).store);
    const { id } = await ask(shop);
    for (const text of ['slower', 'deeper', 'another wheel'])
      good(await shop.change((change) => answerQuestion(change, id, text)));
    const solve = (accepted: number | null) =>
      shop.changeBy(BEN, (change) =>
        solveQuestion(change, id, { role: 'operator', accepted, words: null }),
      );
    expect(refusalOf(await solve(null))).toMatchObject({
      code: 'unclear',
      readings: [{ words: '1' }, { words: '2' }, { words: '3' }],
    });
    expect(refusalOf(await solve(4))).toEqual({
      code: 'notFound',
      what: 'answer',
      nearest: ['1', '2', '3'],
    });
    const { question, answer } = good(await solve(2));
    expect([question.accepted, answer.text]).toEqual([2, 'deeper']);
  });
};

const said = (engine: Engine): void => {
  it('are kept word for word, and found by the code that was read aloud', async () => {
    const shop = await newShop((await newRecords(engine)).store);
    const asked = await ask(shop);
    expect(asked).toMatchObject({ text: WHY, askedAt: START, state: 'open', place: 'questions/' });
    expect(good(await findQuestion(shop.view, ` ${asked.code.toLowerCase()}`))).toEqual(asked);
    const unknown = await findQuestion(shop.view, 'what');
    expect(refusalOf(unknown)).toEqual({ code: 'notFound', what: 'asked', nearest: [] });
  });

  it('of nothing, or longer than a message holds, are refused and leave nothing', async () => {
    const shop = await newShop((await newRecords(engine)).store);
    const tried = (text: string) =>
      shop.change((change) => askQuestion(change, { text, card: null, place: 'c/' }));
    expect(refusalOf(await tried(' \n\u200b '))).toMatchObject({ code: 'missing' });
    expect(refusalOf(await tried('x'.repeat(2001)))).toMatchObject({ value: 2001, max: 2000 });
    expect(good(await tried('x'.repeat(2000))).text).toHaveLength(2000);
    expect(await unsolvedQuestions(shop.view, { limit: 9 })).toHaveLength(1);
  });

  it('stay with their card, and are found by their words, their answers and their card', async () => {
    const shop = await newShop((await newRecords(engine)).store);
    const card = await shop.change((change) => keepCard(change, CARD));
    const asking = { text: 'it chatters', card: card.id, place: 'c/' };
    const { id } = good(await shop.change((change) => askQuestion(change, asking)));
    good(await shop.change((change) => answerQuestion(change, id, 'support the tailstock')));
    const [about] = await questionsOnCard(shop.view, card.id, 5);
    expect(about?.id).toBe(id);
    const found = async (words: string) =>
      (await findEntries(shop.view, words, { limit: 9, kind: 'question' })).map((each) => each.id);
    for (const words of ['chatters', 'tailstok', card.code, '1018'])
      expect([words, await found(words)]).toEqual([words, [id]]);
    expect((await findEntries(shop.view, 'chatters', { limit: 1 }))[0]?.approved).toBe(false);
    good(await act(shop, id, 'solve'));
    expect((await findEntries(shop.view, 'chatters', { limit: 1 }))[0]?.approved).toBe(true);
  });
};

const people = (engine: Engine): void => {
  it('are settled by whoever asked and by engineers, and by nobody else', async () => {
    const shop = await newShop((await newRecords(engine)).store);
    const { id } = await at(shop, 'answered');
    const solving = { role: 'operator', accepted: 1, words: null } as const;
    const stranger = await shop.changeBy(OLA, (change) => solveQuestion(change, id, solving));
    expect(refusalOf(stranger)).toEqual({
      code: 'notAllowed',
      role: 'engineer',
      people: ['Ada'],
      asker: 'Ben',
    });
    const reopened = await shop.changeBy(OLA, (change) =>
      reopenQuestion(change, id, { role: 'operator', words: '' }),
    );
    expect(refusalOf(reopened)).toMatchObject({ code: 'notAllowed', asker: 'Ben' });
    good(await shop.changeBy(BEN, (change) => solveQuestion(change, id, solving)));
    good(
      await shop.changeBy(OLA, (change) =>
        reopenQuestion(change, id, { role: 'engineer', words: '' }),
      ),
    );
  });

  it('are told to engineers; where there are none, to those above; never to who asks', async () => {
    const shop = await newShop((await newRecords(engine)).store);
    const idOf = (who: ReturnType<typeof person>) =>
      shop.changeBy(who, (_, entered) => Promise.resolve(entered.person.id));
    const [ben, ola, una] = [await idOf(BEN), await idOf(OLA), await idOf(person('Una'))];
    const told = async () =>
      (await toTell(shop.view, 'engineer', ben)).people.map(({ name }) => name);
    const name = async (id: string, role: Role) =>
      good(await shop.change((change) => nameRole(change, id, role)));
    expect(await told()).toEqual(['Ada']);
    await name(ola, 'supervisor');
    expect(await told()).toEqual(['Ola']);
    await name(ben, 'engineer');
    expect(await told()).toEqual(['Ola']);
    await name(una, 'engineer');
    expect(await told()).toEqual(['Una']);
  });
};

const together = (engine: Engine): void => {
  it('take every answer that is given at the same moment', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const { id } = await ask(shop);
    const texts = Array.from({ length: 8 }, (_, index) => `answer ${String(index)}`);
    const all = await Promise.all(
      texts.map((text) => shop.change((change) => answerQuestion(change, id, text))),
    );
    expect(all.map((each) => good(each).answer.number).sort()).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
    const kept = await answersTo(shop.view, id);
    expect(kept.map(({ text }) => text).sort()).toEqual(texts);
  });

  it('are solved once, however many solve them at the same moment', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    for (let round = 0; round < 20; round += 1) {
      const { id, code } = await at(shop, 'answered');
      const both = await Promise.all(
        [BEN, person('Ada')].map((who, index) =>
          shop.changeBy(who, (change) =>
            solveQuestion(change, id, {
              role: 'engineer',
              accepted: null,
              words: index === 0 ? null : 'something else',
            }),
          ),
        ),
      );
      expect(both.filter(({ ok }) => ok)).toHaveLength(1);
      const refused = both.find(({ ok }) => !ok) ?? { ok: true as const };
      expect(refusalOf(refused)).toMatchObject({
        code: 'questionStands',
        question: code,
        state: 'solved',
      });
    }
  });
};

/** Delivers whatever is queued, as a platform that opens a thread under each post. */
const delivered = async (store: Store): Promise<void> => {
  const outbox = openOutbox(store, {
    worker: 'w',
    now: () => START,
    deliver: ({ key }) =>
      Promise.resolve({ delivered: true, outcome: { place: `questions/${key}`, message: key } }),
  });
  await outbox.deliverDue();
};

const places = (engine: Engine): void => {
  it('are found by the thread that was opened for them, and by no other place', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const other = await newShop(store, 'Other');
    const question = await ask(shop);
    const key = threadKey(question.code);
    const thread = `questions/${key}`;
    await shop.change((change) => queueEffects(change, [{ key, effect: { card: 1 } }]));
    expect(await questionInThread(shop.view, thread)).toBe(null);
    await delivered(store);
    expect((await questionInThread(shop.view, thread))?.id).toBe(question.id);
    expect(await questionInThread(shop.view, 'questions/')).toBe(null);
    expect(await questionInThread(other.view, thread)).toBe(null);
    expect(await effectOf(shop.view, key)).toEqual({ card: 1 });
    expect(await effectOf(other.view, key)).toBe(null);
  });
};
