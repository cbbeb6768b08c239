import {
  type Context,
  placeName,
  type Reply,
  refuse,
  type Visit,
} from '../../../src/desk/index.ts';
import type { Refusal, Suggestion } from '../../../src/refusal.ts';
import {
  findCard,
  findQuestion,
  type Question,
  questionInThread,
  type ShopView,
} from '../../../src/shop/index.ts';
import { quoted } from '../../../src/words/index.ts';
import { type Attached, attachedFrom } from './cards.ts';
import type { QuestionWords } from './words.ts';

/** A part of a question that tells it from others. Judgement: what a button shows. */
const ON_BUTTON = 40;

const inShort = ({ code, text }: Question): string => {
  const signs = Array.from(text.replaceAll('\n', ' '));
  return `${code} ${signs.length <= ON_BUTTON ? signs.join('') : `${signs.slice(0, ON_BUTTON - 1).join('')}…`}`;
};

/** The line that says the same of this question, its words kept whatever they are. */
export type LineFor = (code: string) => string;

/** A line about a question whose words are kept as they are. */
export const lineOf =
  (verb: string, keyword: string, text: string): LineFor =>
  (code) =>
    [`/knurl ${verb} ${code}`, ...(text === '' ? [] : [keyword, quoted(text)])].join(' ');

export type Meant = {
  readonly question: Question;
  /** What was said besides, once it is known what was a code. */
  readonly text: string;
};

/** Which question is meant: the one of the code, or the one in whose thread this is said. */
export const meant = async (
  { place }: Context,
  { shop }: Visit,
  said: QuestionWords | undefined,
  lineFor: (text: string) => LineFor,
  others: () => Promise<readonly Question[]>,
): Promise<Meant | { readonly reply: Reply }> => {
  const text = said?.text ?? '';
  const code = said?.code ?? null;
  const byCode = code === null ? null : await findQuestion(shop, code);
  if (byCode?.ok === true) return { question: byCode.value, text };
  const here = place.thread === null ? null : await questionInThread(shop, placeName(place));
  // In a thread it is clear which one is meant: what only looked like a code was said to it.
  if (here !== null) return { question: here, text: said?.whole ?? '' };
  if (byCode !== null && code !== null) {
    return { reply: notFound(byCode.refusal, code, lineFor(text)) };
  }
  const readings = (await others()).map(
    (question): Suggestion => ({ label: inShort(question), words: lineFor(text)(question.code) }),
  );
  return { reply: unnamed(readings) };
};

const notFound = (refusal: Refusal, word: string, lineFor: LineFor): Reply => {
  if (refusal.code !== 'notFound') return refuse(refusal);
  const choices = refusal.nearest.map((each) => ({ label: each, words: lineFor(each) }));
  return refuse({ ...refusal, word: word.toUpperCase() }, choices);
};

const unnamed = (readings: readonly Suggestion[]): Reply =>
  readings.length === 0
    ? refuse({ code: 'missing', parameter: 'asked', examples: ['K7M2X'] })
    : refuse({ code: 'unclear', what: 'asked', readings }, readings);

/** The card a question is about. */
export const cardOf = async (shop: ShopView, question: Question): Promise<Attached | null> => {
  if (question.card === null) return null;
  const found = await findCard(shop, question.card);
  return found.ok ? attachedFrom(found.value) : null;
};
