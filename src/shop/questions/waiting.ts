import type { Store } from '../../store/index.ts';
import type { Queueing } from '../effects.ts';
import { afterQuiet } from '../quiet.ts';
import { type Settings, settingsOf } from '../settings.ts';
import type { ShopView, ShopWords } from '../view.ts';
import { type Question, questionOf } from './question.ts';

const HOUR_MS = 3_600_000;

/**
 * How often a question comes up again: after the shop's time, after twice the time, then it goes
 * to the supervisor. Judgement: who has not answered by then is not told a fourth time.
 */
export const REMINDERS = 3;

/**
 * When a question that was put up now is put up again. The hours are those of the clock, day and
 * night: a bar waits in the lathe whether or not the engineer is awake, and four hours should mean
 * the same to whoever set them and whoever reads them. They count from the time it was last put
 * up, so that two reminders that both fell into one night do not come up together in the morning:
 * what falls into the quiet hours comes up right after them, and the next one follows from there.
 */
export const dueAfter = ({ questionHours, quietHours, timeZone }: Settings, at: number): number =>
  afterQuiet(at + questionHours * HOUR_MS, quietHours, timeZone);

/** A question that comes up again, and for the how manieth time. */
export type PutUp = {
  readonly question: Question;
  readonly number: number;
  /** Those who can answer were told often enough: now it is for those above them. */
  readonly isLast: boolean;
};

export type DueQuestion = { readonly shop: string; readonly id: string };

/** Whatever is to come up again by now, in every shop. */
export const dueQuestions = (
  { read }: Store,
  at: number,
  most: number,
): Promise<readonly DueQuestion[]> =>
  read
    .selectFrom('question')
    .select(['shop', 'id'])
    .where('remind_at', 'is not', null)
    .where('remind_at', '<=', at)
    .orderBy('remind_at')
    .orderBy('id')
    .limit(most)
    .execute();

/**
 * Notes that a question is put up again now, and when next. Null where it is not to be: another
 * process was first, it was answered in the meantime, or the shop has quiet hours.
 */
export const putUpAgain = async (
  change: Queueing & { readonly words: ShopWords },
  id: string,
): Promise<PutUp | null> => {
  const { db, at, id: shop } = change;
  const rows = () => db.updateTable('question').where('shop', '=', shop).where('id', '=', id);
  // Written to, unchanged: of several processes one goes on, the others see what it has done.
  const row = await rows()
    .set((eb) => ({ version: eb.ref('version') }))
    .where('remind_at', '<=', at)
    .returningAll()
    .executeTakeFirst();
  if (row === undefined) return null;
  const view: ShopView = { id: shop, db, words: change.words };
  const settings = await settingsOf(view);
  // The quiet hours may have been set, or come, since this time was worked out.
  const loud = afterQuiet(at, settings.quietHours, settings.timeZone);
  if (loud > at) {
    await rows().set({ remind_at: loud }).execute();
    return null;
  }
  const number = row.reminders + 1;
  const isLast = number >= REMINDERS;
  const remindAt = isLast ? null : dueAfter(settings, at);
  await rows().set({ reminders: number, remind_at: remindAt }).execute();
  const question = { ...questionOf(row), reminders: number, remindAt };
  return { question, number, isLast };
};
