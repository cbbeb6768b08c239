/** Questions in a shop that is killed: asked, answered, solved, and put up again meanwhile. */
import { expect } from 'vitest';
import {
  answeredEffects,
  askedEffects,
  solvedEffects,
} from '../../commands/knurl/questions/effects.ts';
import type { Effect } from '../../src/desk/index.ts';
import { queued } from '../../src/desk/queued.ts';
import {
  answerQuestion,
  askQuestion,
  queueEffects,
  reminderKey,
  type ShopChange,
  solveQuestion,
  toTell,
  unsolvedQuestions,
} from '../../src/shop/index.ts';
import type { Store } from '../../src/store/index.ts';
import type { Did } from './did.ts';

/** The one that is open is answered, then solved, then another is asked, with all that is posted. */
export const questionOne = async (change: ShopChange, did: Did): Promise<Did> => {
  const [oldest] = await unsolvedQuestions(change, { limit: 1 });
  if (oldest === undefined) {
    const asking = { text: `why ${did.interaction}`, card: null, place: 'questions/' };
    const asked = await askQuestion(change, asking);
    if (!asked.ok) return did;
    const told = await toTell(change, 'engineer', '');
    const keys = await post(change, await askedEffects(change, asked.value, null, told));
    return { ...did, asked: [asked.value.id], effects: [...did.effects, ...keys] };
  }
  if (oldest.state !== 'answered') {
    const answered = await answerQuestion(change, oldest.id, `so ${did.interaction}`);
    if (!answered.ok) return did;
    const keys = await post(change, await answeredEffects(change, answered.value, null));
    const { id } = answered.value.answer;
    return { ...did, answered: [id], effects: [...did.effects, ...keys] };
  }
  const solving = { role: 'engineer', accepted: 1, words: null } as const;
  const solved = await solveQuestion(change, oldest.id, solving);
  if (!solved.ok) return did;
  const keys = await post(change, await solvedEffects(change, solved.value, null));
  return { ...did, solved: [oldest.id], effects: [...did.effects, ...keys] };
};

const post = (change: ShopChange, effects: readonly Effect[]): Promise<readonly string[]> =>
  queueEffects(change, effects.map(queued));

/** Every question is there or not, and with it its answers, where it stands and what is found. */
export const questionsAreWhole = async (store: Store, kept: readonly Did[]): Promise<void> => {
  const rows = await store.read.selectFrom('question').selectAll().execute();
  const answers = await store.read.selectFrom('answer').selectAll().execute();
  expect(answers.length).toBeGreaterThan(0);
  expect(rows.map(({ id }) => id).sort()).toEqual(kept.flatMap((did) => did.asked).sort());
  expect(answers.map(({ id }) => id).sort()).toEqual(kept.flatMap((did) => did.answered).sort());
  const solved = rows.filter(({ solved_at }) => solved_at !== null);
  expect(solved.map(({ id }) => id).sort()).toEqual(kept.flatMap((did) => did.solved).sort());
  for (const { id, state, version, accepted } of rows) {
    const count = answers.filter(({ question }) => question === id).length;
    const wanted = accepted !== null ? 'solved' : count > 0 ? 'answered' : 'open';
    const changes = count + (accepted === null ? 0 : 1);
    expect([id, state, version]).toEqual([id, wanted, 1 + changes]);
  }
  const found = await store.read
    .selectFrom('find_entry')
    .select('subject_id')
    .where('kind', '=', 'question')
    .execute();
  expect(found.map(({ subject_id }) => subject_id).sort()).toEqual(rows.map(({ id }) => id).sort());
};

/** What was to be posted because questions came up again. */
export const reminderKeys = async (store: Store): Promise<readonly string[]> => {
  const rows = await store.read
    .selectFrom('question')
    .select(['code', 'round', 'reminders'])
    .execute();
  return rows.flatMap(({ code, round, reminders }) =>
    Array.from({ length: reminders }, (_, at) => reminderKey(code, round, at + 1)),
  );
};
