import { CODE_LENGTHS, newCode } from '../codes.ts';
import { remember } from '../history.ts';
import { LONGEST_WORDS, textFault, wordForWord } from '../names.ts';
import { personById, whoMay } from '../people.ts';
import { type Done, done, refused } from '../result.ts';
import { atLeast, type Role } from '../roles.ts';
import { settingsOf } from '../settings.ts';
import type { ShopChange } from '../view.ts';
import { type Move, moved } from './life.ts';
import { answersTo } from './look.ts';
import { type GivenAnswer, type Question, questionOf } from './question.ts';
import { dueAfter } from './waiting.ts';
import { putQuestionForFind } from './words.ts';

/** Who may settle a question that somebody else asked. */
const SETTLES: Role = 'engineer';

export type Asking = {
  readonly text: string;
  /** The id of the card it is about. */
  readonly card: string | null;
  /** Where it is put up. */
  readonly place: string;
};

/** Puts a question down and gives it its code. */
export const askQuestion = async (change: ShopChange, asking: Asking): Promise<Done<Question>> => {
  const text = wordForWord(asking.text);
  const fault = textFault('question', text, LONGEST_WORDS);
  if (fault !== null) return refused(fault);
  const { at, by } = change;
  const row = await withCode(change, {
    shop: change.id,
    id: change.db.newId(at),
    text,
    card: asking.card,
    state: 'open',
    version: 1,
    asked_at: at,
    asked_by: by,
    place: asking.place,
    waits_since: at,
    round: 0,
    reminders: 0,
    remind_at: dueAfter(await settingsOf(change), at),
    accepted: null,
    solved_at: null,
    solved_by: null,
  });
  const { id, state, card } = row;
  const after = { state, text, card };
  await remember(change, 'question', [{ subjectId: id, verb: 'added', before: null, after }]);
  const question = questionOf(row);
  await putQuestionForFind(change, question);
  return done(question);
};

type Row = Parameters<typeof questionOf>[0];

/** A code that no other question has, and no card: what is read aloud must mean one thing. */
const withCode = async (change: ShopChange, fresh: Omit<Row, 'code'>): Promise<Row> => {
  for (const length of CODE_LENGTHS) {
    const code = newCode(length);
    const card = await change.db
      .selectFrom('card')
      .select('id')
      .where('shop', '=', change.id)
      .where('code', '=', code)
      .executeTakeFirst();
    if (card !== undefined) continue;
    const row = await change.db
      .insertInto('question')
      .values({ ...fresh, code })
      .onConflict((oc) => oc.columns(['shop', 'code']).doNothing())
      .returningAll()
      .executeTakeFirst();
    if (row !== undefined) return row;
  }
  throw new Error('no free code was found for a question');
};

/**
 * The question as it stands, held until this change is through: its row is written to, unchanged,
 * so that two who act on it at once come one after the other, and the second sees what the first
 * has done instead of writing over it.
 */
const held = async (change: ShopChange, id: string): Promise<Done<Question>> => {
  const row = await change.db
    .updateTable('question')
    .set((eb) => ({ version: eb.ref('version') }))
    .where('shop', '=', change.id)
    .where('id', '=', id)
    .returningAll()
    .executeTakeFirst();
  return row === undefined
    ? refused({ code: 'notFound', what: 'asked', nearest: [] })
    : done(questionOf(row));
};

type Written = Partial<
  Pick<
    Row,
    'waits_since' | 'round' | 'reminders' | 'remind_at' | 'accepted' | 'solved_at' | 'solved_by'
  >
>;

/** Takes a question to where a move leads, and remembers from where. */
const taken = async (
  change: ShopChange,
  before: Question,
  state: Question['state'],
  written: Written,
  said: Readonly<Record<string, unknown>>,
): Promise<Question> => {
  const row = await change.db
    .updateTable('question')
    .set({ ...written, state, version: before.version + 1 })
    .where('shop', '=', change.id)
    .where('id', '=', before.id)
    .where('version', '=', before.version)
    .returningAll()
    .executeTakeFirstOrThrow();
  await remember(change, 'question', [
    {
      subjectId: before.id,
      verb: 'changed',
      before: { state: before.state },
      after: { state, ...said },
    },
  ]);
  const question = questionOf(row);
  await putQuestionForFind(change, question);
  return question;
};

const withAnswer = async (
  change: ShopChange,
  question: Question,
  text: string,
): Promise<GivenAnswer> => {
  const { at: givenAt, by: givenBy } = change;
  const number = (await answersTo(change, question.id)).length + 1;
  const id = change.db.newId(givenAt);
  await change.db
    .insertInto('answer')
    .values({
      shop: change.id,
      id,
      question: question.id,
      number,
      text,
      given_at: givenAt,
      given_by: givenBy,
    })
    .execute();
  return { id, number, text, givenAt, givenBy };
};

export type Answered = { readonly question: Question; readonly answer: GivenAnswer };

/** Puts an answer to a question. It takes several; none takes the place of another. */
export const answerQuestion = async (
  change: ShopChange,
  id: string,
  words: string,
): Promise<Done<Answered>> => {
  const text = wordForWord(words);
  const fault = textFault('answer', text, LONGEST_WORDS);
  if (fault !== null) return refused(fault);
  const found = await held(change, id);
  if (!found.ok) return found;
  const move = moved(found.value, 'answer', text);
  if ('refusal' in move) return refused(move.refusal);
  const answer = await withAnswer(change, found.value, text);
  const question = await taken(
    change,
    found.value,
    move.to,
    { remind_at: null },
    { answer: answer.number, text },
  );
  return done({ question, answer });
};

/** For whoever asked, and for those who answer. */
const settling = async (
  change: ShopChange,
  id: string,
  role: Role,
  move: Move,
  words: string,
): Promise<Done<{ readonly before: Question; readonly to: Question['state'] }>> => {
  const found = await held(change, id);
  if (!found.ok) return found;
  const { value: before } = found;
  if (before.askedBy !== change.by && !atLeast(role, SETTLES)) {
    const asker = (await personById(change, before.askedBy))?.name ?? '';
    const people = await whoMay(change, SETTLES);
    return refused({ code: 'notAllowed', role: SETTLES, people, asker });
  }
  const way = moved(before, move, words);
  return 'refusal' in way ? refused(way.refusal) : done({ before, to: way.to });
};

export type Solving = {
  /** What whoever settles it may. */
  readonly role: Role;
  /** The number of the answer that solved it; null for the only one. */
  readonly accepted: number | null;
  /** What solved it, where no answer did. */
  readonly words: string | null;
};

/** A question is solved by an answer: the one that is named, the only one, or one that is said now. */
export const solveQuestion = async (
  change: ShopChange,
  id: string,
  { role, accepted, words }: Solving,
): Promise<Done<Answered>> => {
  const text = words === null ? '' : wordForWord(words);
  const fault = text === '' ? null : textFault('answer', text, LONGEST_WORDS);
  if (fault !== null) return refused(fault);
  const settled = await settling(change, id, role, 'solve', text);
  if (!settled.ok) return settled;
  const { before, to } = settled.value;
  const answer =
    text === ''
      ? await givenBefore(change, before, accepted)
      : done(await withAnswer(change, before, text));
  if (!answer.ok) return answer;
  const { number } = answer.value;
  const { at, by } = change;
  const question = await taken(
    change,
    before,
    to,
    { remind_at: null, accepted: number, solved_at: at, solved_by: by },
    { accepted: number, ...(text === '' ? {} : { text }) },
  );
  return done({ question, answer: answer.value });
};

/** Which of the answers was meant: of several, one has to be named. */
const givenBefore = async (
  change: ShopChange,
  { id, code, state }: Question,
  accepted: number | null,
): Promise<Done<GivenAnswer>> => {
  const answers = await answersTo(change, id);
  const [only] = answers;
  if (only === undefined) {
    return refused({
      code: 'questionStands',
      question: code,
      state,
      move: 'solve',
      words: '',
    });
  }
  const numbers = answers.map(({ number }) => String(number));
  if (accepted !== null) {
    const named = answers.find(({ number }) => number === accepted);
    return named === undefined
      ? refused({ code: 'notFound', what: 'answer', nearest: numbers })
      : done(named);
  }
  if (answers.length === 1) return done(only);
  const readings = answers.map(({ number, text }) => ({
    label: `${String(number)}: ${text}`,
    words: String(number),
  }));
  return refused({ code: 'unclear', what: 'accepted', readings });
};

export type Reopening = { readonly role: Role; readonly words: string };

/** A question that was answered or solved waits again, from now on. */
export const reopenQuestion = async (
  change: ShopChange,
  id: string,
  { role, words }: Reopening,
): Promise<Done<Question>> => {
  const text = wordForWord(words);
  const fault = text === '' ? null : textFault('reason', text, LONGEST_WORDS);
  if (fault !== null) return refused(fault);
  const settled = await settling(change, id, role, 'reopen', text);
  if (!settled.ok) return settled;
  const { before, to } = settled.value;
  const { at } = change;
  const again = {
    waits_since: at,
    round: before.round + 1,
    reminders: 0,
    remind_at: dueAfter(await settingsOf(change), at),
    accepted: null,
    solved_at: null,
    solved_by: null,
  };
  return done(await taken(change, before, to, again, text === '' ? {} : { text }));
};
