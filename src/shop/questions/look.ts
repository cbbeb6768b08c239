import { misheard, readCode } from '../codes.ts';
import { type Done, done, refused } from '../result.ts';
import type { ShopView } from '../view.ts';
import { codeInKey, KEY_START } from './keys.ts';
import { answerOf, type GivenAnswer, type Question, questionOf } from './question.ts';

const rowsOf = (view: ShopView) =>
  view.db.selectFrom('question').selectAll().where('shop', '=', view.id);

/** Most codes that are offered for one that was misheard. */
const MOST_NEAR = 3;

/** The question of a code as somebody typed or heard it, or of an id; or codes that were meant. */
export const findQuestion = async (view: ShopView, typed: string): Promise<Done<Question>> => {
  const code = readCode(typed);
  const byCode =
    code === null ? undefined : await rowsOf(view).where('code', '=', code).executeTakeFirst();
  const row = byCode ?? (await rowsOf(view).where('id', '=', typed).executeTakeFirst());
  if (row !== undefined) return done(questionOf(row));
  const nearest = code === null ? [] : await codesNear(view, code);
  return refused({ code: 'notFound', what: 'asked', nearest });
};

const codesNear = async (view: ShopView, code: string): Promise<readonly string[]> => {
  const near = misheard(code);
  if (near.length === 0) return [];
  const rows = await view.db
    .selectFrom('question')
    .select('code')
    .where('shop', '=', view.id)
    .where('code', 'in', [...near])
    .orderBy('id', 'desc')
    .limit(MOST_NEAR)
    .execute();
  return rows.map((row) => row.code);
};

/** The question whose thread this place is: what was posted in it says so. */
export const questionInThread = async (view: ShopView, place: string): Promise<Question | null> => {
  const posted = await view.db
    .selectFrom('effect')
    .select('key')
    .where('shop', '=', view.id)
    .where('place', '=', place)
    .where('key', 'like', `${KEY_START}%`)
    .limit(1)
    .executeTakeFirst();
  const code = posted === undefined ? null : codeInKey(posted.key);
  if (code === null) return null;
  const found = await findQuestion(view, code);
  return found.ok ? found.value : null;
};

/** What was answered to a question, the first answer first. */
export const answersTo = async (
  view: ShopView,
  question: string,
): Promise<readonly GivenAnswer[]> => {
  const rows = await view.db
    .selectFrom('answer')
    .selectAll()
    .where('shop', '=', view.id)
    .where('question', '=', question)
    .orderBy('number')
    .execute();
  return rows.map(answerOf);
};

/** What is not solved yet, asked longest ago first; of one person, where that is wanted. */
export const unsolvedQuestions = async (
  view: ShopView,
  wanted: { readonly limit: number; readonly askedBy?: string },
): Promise<readonly Question[]> => {
  let query = rowsOf(view).where('solved_at', 'is', null);
  if (wanted.askedBy !== undefined) query = query.where('asked_by', '=', wanted.askedBy);
  return (await query.orderBy('id').limit(wanted.limit).execute()).map(questionOf);
};

/** What was asked about a card, the newest question first. */
export const questionsOnCard = async (
  view: ShopView,
  card: string,
  limit: number,
): Promise<readonly Question[]> => {
  const rows = await rowsOf(view)
    .where('card', '=', card)
    .orderBy('id', 'desc')
    .limit(limit)
    .execute();
  return rows.map(questionOf);
};
