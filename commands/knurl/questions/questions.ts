import { z } from 'zod';
import { type Card, label, line, type Part, row } from '../../../src/card/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  parameterOf,
  placeName,
  type Visit,
} from '../../../src/desk/index.ts';
import {
  findCard,
  findQuestion,
  isWaiting,
  type Question,
  questionInThread,
  type ShopView,
  settingsOf,
  unsolvedQuestions,
} from '../../../src/shop/index.ts';
import { NO_NAMES } from '../../../src/words/index.ts';
import { refused, shopCard, visiting } from '../../shop/visit.ts';
import { answerRows, nameOf, questionCard } from './cards.ts';
import { cardOf } from './found.ts';
import { questionCode } from './words.ts';

/** Questions shown at once. Judgement: what a phone scrolls through without losing its place. */
const SHOWN = 12;
/** Most that are counted. Judgement: a shop with more has other worries. */
const COUNTED = 200;
/** Of these the first have a button. */
const WITH_BUTTON = 5;

/** Questions as rows of a list. */
export const questionRows = async (view: ShopView, questions: readonly Question[]) => {
  const { timeZone: zone } = await settingsOf(view);
  const rows = [];
  for (const { code, text, state, askedBy, askedAt: at, card } of questions) {
    const found = card === null ? null : await findCard(view, card);
    const about = found?.ok === true ? found.value.code : null;
    const by = await nameOf(view, askedBy);
    rows.push(row('questionItem', { code, text, by, asked: { at, zone }, state, card: about }));
  }
  return rows;
};

const listCard = async (context: Context, { shop }: Visit): Promise<Card> => {
  const all = await unsolvedQuestions(shop, { limit: COUNTED });
  // Those that wait for an answer come before those that wait to be tried.
  const questions = [...all.filter(isWaiting), ...all.filter((each) => !isWaiting(each))];
  if (questions.length === 0) {
    return shopCard(context, { verb: 'questions', headline: line('questionsNone', {}) });
  }
  const waiting = questions.filter(isWaiting).length;
  const shown = questions.slice(0, SHOWN);
  const more = questions.length - shown.length;
  return shopCard(context, {
    verb: 'questions',
    headline: line('questionsUnsolved', { waiting, answered: questions.length - waiting }),
    rows: await questionRows(shop, shown),
    after: more > 0 ? [line('questionsMore', { more })] : [],
    choices: shown.slice(0, WITH_BUTTON).map(({ code }) => ({
      label: label('questionShown', { code }),
      words: `/knurl questions ${code}`,
    })),
    lists: { questions },
  });
};

/** One question with its card and all that was answered. */
const oneCard = async ({ shop }: Visit, question: Question): Promise<Card> => {
  const card = await questionCard(shop, question, await cardOf(shop, question));
  const rows = await answerRows(shop, question);
  const answers: readonly Part[] = rows.length === 0 ? [] : [{ part: 'rows', rows }];
  // Under the question and where it stands, before the numbers it is about.
  const at = 1 + card.parts.findIndex(({ part }) => part === 'lines');
  const parts = [...card.parts.slice(0, at), ...answers, ...card.parts.slice(at)];
  return { ...card, parts, lists: { questions: [question] } };
};

/** What is open, or one question by its code; in a question's thread that one. */
export const questions = defineCommand({
  path: ['knurl', 'questions'],
  examples: ['/knurl questions', '/knurl questions K7M2X'],
  parameters: z.object({ asked: questionCode }),
  lead: {
    name: 'asked',
    read: (cursor) => {
      const reading = parameterOf(questionCode).read(cursor, NO_NAMES);
      return reading !== null && 'value' in reading ? reading : null;
    },
  },
  allowed: 'operator',
  run: (context, { asked }) =>
    visiting(context, async (visit) => {
      const { shop } = visit;
      if (asked !== undefined) {
        const found = await findQuestion(shop, asked);
        if (found.ok) return cardReply(await oneCard(visit, found.value));
        const { refusal } = found;
        return refused(refusal.code === 'notFound' ? { ...refusal, word: asked } : refusal);
      }
      const { place } = context;
      const here = place.thread === null ? null : await questionInThread(shop, placeName(place));
      return cardReply(here === null ? await listCard(context, visit) : await oneCard(visit, here));
    }),
});
