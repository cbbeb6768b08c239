import type { Effect, Ring } from '../../../src/desk/index.ts';
import {
  type Answered,
  answerKey,
  isUnderWay,
  type PutUp,
  personById,
  postKey,
  type Question,
  reminderKey,
  reopenKey,
  type ShopView,
  settingsOf,
  shownKey,
  type Tellable,
  threadKey,
  toTell,
} from '../../../src/shop/index.ts';
import { type Attached, answerCard, questionCard, reminderCard, reopenedCard } from './cards.ts';

/** Signs of a question that name its thread. Judgement: with its code they fit on one line. */
const IN_TITLE = 70;

const titleOf = ({ code, text }: Question): string => {
  const line = Array.from(text.replaceAll('\n', ' '));
  return `${code}: ${line.length <= IN_TITLE ? line.join('') : `${line.slice(0, IN_TITLE - 1).join('')}…`}`;
};

const ringOf = ({ people, groups }: Tellable): Ring => ({
  people: people.map(({ outside }) => outside),
  groups: groups.map(({ outside }) => outside),
});

/** Puts a question up, with the card it is about, opens its thread, and tells who can answer. */
export const askedEffects = async (
  view: ShopView,
  question: Question,
  attached: Attached | null,
  told: Tellable,
): Promise<readonly Effect[]> => {
  const { code, place } = question;
  const card = await questionCard(view, question, attached);
  return [
    { effect: 'post', key: postKey(code), place, ring: ringOf(told), card },
    { effect: 'thread', key: threadKey(code), of: postKey(code), title: titleOf(question) },
  ];
};

/** In the question's thread; where none could be opened, beside the question. */
const beside = async (
  view: ShopView,
  { code, place }: Question,
): Promise<{ readonly of: string } | { readonly place: string }> => {
  const of = threadKey(code);
  return (await isUnderWay(view, of)) ? { of } : { place };
};

/**
 * The posted question as it stands now. Each change of it waits for the one before, so that the
 * last to be made is the last to be seen.
 */
const shown = async (
  view: ShopView,
  question: Question,
  attached: Attached | null,
): Promise<readonly Effect[]> => {
  const { code, version } = question;
  const of = shownKey(code, version - 1);
  if (!(await isUnderWay(view, of))) return [];
  const card = await questionCard(view, question, attached);
  return [{ effect: 'edit', key: shownKey(code, version), of, card }];
};

/** Tells whoever asked, once, in the thread; the posted question says that there is an answer. */
export const answeredEffects = async (
  view: ShopView,
  { question, answer }: Answered,
  attached: Attached | null,
): Promise<readonly Effect[]> => {
  const asker = await personById(view, question.askedBy);
  const isTold = asker !== null && question.askedBy !== answer.givenBy;
  const people = isTold ? [asker.outside] : [];
  return [
    {
      effect: 'post',
      key: answerKey(question.code, answer.number),
      ...(await beside(view, question)),
      ring: { people, groups: [] },
      card: await answerCard(view, question, answer),
    },
    ...(await shown(view, question, attached)),
  ];
};

/** The posted question says by what it was solved. */
export const solvedEffects = (
  view: ShopView,
  { question }: Answered,
  attached: Attached | null,
): Promise<readonly Effect[]> => shown(view, question, attached);

/** Tells those who can answer that it waits again, and why. */
export const reopenedEffects = async (
  view: ShopView,
  question: Question,
  why: string,
  by: string,
  attached: Attached | null,
): Promise<readonly Effect[]> => [
  {
    effect: 'post',
    key: reopenKey(question.code, question.round),
    ...(await beside(view, question)),
    ring: ringOf(await toTell(view, 'engineer', by)),
    card: await reopenedCard(view, question, why, by),
  },
  ...(await shown(view, question, attached)),
];

/** A question that waits comes up again where it was put up; the last time for the supervisor. */
export const reminderEffects = async (
  view: ShopView,
  { question, number, isLast }: PutUp,
): Promise<readonly Effect[]> => {
  const told = await toTell(view, isLast ? 'supervisor' : 'engineer', question.askedBy);
  const { code, place, round } = question;
  const card = await reminderCard(view, question, await settingsOf(view), { number, isLast });
  return [
    { effect: 'post', key: reminderKey(code, round, number), place, ring: ringOf(told), card },
  ];
};
