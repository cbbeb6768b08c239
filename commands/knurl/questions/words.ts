import { said } from '../../../src/desk/index.ts';
import {
  type Cursor,
  moved,
  plainText,
  quotedAt,
  restOfLine,
  tokenAt,
  tokensOf,
} from '../../../src/words/index.ts';
import { plainCodeAt } from '../codeWords.ts';

/** What was said to one of the verbs about questions; the text is the person's own, word for word. */
export type QuestionWords = {
  /** A code that stands first: of a card, or of a question. */
  readonly code: string | null;
  /** Expressly about no card. */
  readonly noCard: boolean;
  /** Which answer is meant. */
  readonly number: number | null;
  /** What was said besides. */
  readonly text: string;
  /** The same with the code in front of it, should that be none. */
  readonly whole: string;
};

/** Keywords a form puts before its fields; a person may say them too. */
export type QuestionKeywords = {
  readonly code: readonly string[];
  readonly number: readonly string[];
  readonly text: readonly string[];
};

const NO_CARD = [
  ['no', 'card'],
  ['without', 'card'],
  ['without', 'a', 'card'],
] as const;

const textAt = (cursor: Cursor, ahead = 0): string => tokenAt(cursor, ahead)?.text ?? '';

const noCardAt = (cursor: Cursor): number =>
  NO_CARD.find((phrase) => phrase.every((word, ahead) => textAt(cursor, ahead) === word))?.length ??
  0;

/** Past a keyword, where what it announces follows. */
const past = (
  cursor: Cursor,
  keywords: readonly string[],
  follows: (next: Cursor) => boolean,
): Cursor => {
  const next = moved(cursor, 1);
  return keywords.includes(textAt(cursor)) && follows(next) ? next : cursor;
};

/** Whether what is left of the line stands in quotation marks, as a form writes it. */
const isQuoted = (cursor: Cursor): boolean => {
  const before = cursor.tokens[cursor.at - 1]?.end ?? 0;
  return plainText(cursor.text.slice(before)).trimStart().startsWith('"');
};

const numberAt = (cursor: Cursor): number | null => {
  const word = textAt(cursor);
  return /^\d{1,4}$/u.test(word) ? Number(word) : null;
};

const restOf = (cursor: Cursor): string => restOfLine(cursor)?.value ?? '';

type Options = Pick<QuestionWords, 'code' | 'noCard' | 'number'>;

/** What a form writes behind the words, up to the end of the line; null where it is something else. */
const optionsBehind = (start: Cursor, keywords: QuestionKeywords): Options | null => {
  let cursor = start;
  let options: Options = { code: null, noCard: false, number: null };
  while (cursor.at < cursor.tokens.length) {
    const before = cursor.at;
    const without = noCardAt(cursor);
    cursor = moved(cursor, without);
    options = { ...options, noCard: options.noCard || without > 0 };
    const announced = past(cursor, keywords.code, (next) => plainCodeAt(next) !== null);
    const code = announced === cursor ? null : plainCodeAt(announced);
    if (code !== null) cursor = moved(announced, code.used);
    const counted = past(cursor, keywords.number, (next) => numberAt(next) !== null);
    const number = counted === cursor ? null : numberAt(counted);
    if (number !== null) cursor = moved(counted, 1);
    options = {
      ...options,
      code: code?.value ?? options.code,
      number: number ?? options.number,
    };
    if (cursor.at === before) return null;
  }
  return options;
};

/** Codes first, then the words up to the end of the line: as a person types it. */
const readTyped = (start: Cursor, keywords: QuestionKeywords): QuestionWords => {
  const without = noCardAt(start);
  let cursor = past(moved(start, without), keywords.code, (next) => plainCodeAt(next) !== null);
  const whole = restOf(past(cursor, keywords.text, isQuoted));
  const code = plainCodeAt(cursor);
  if (code !== null) cursor = moved(cursor, code.used);
  const counted = past(cursor, keywords.number, (next) => numberAt(next) !== null);
  const number = counted === cursor ? null : numberAt(counted);
  if (number !== null) cursor = moved(counted, 1);
  const text = restOf(past(cursor, keywords.text, isQuoted));
  return { code: code?.value ?? null, noCard: without > 0, number, text, whole };
};

/**
 * The words in quotation marks and then nothing but options: as a form writes a line. A code that
 * was put before the words themselves is one all the same.
 */
const readForm = (start: Cursor, keywords: QuestionKeywords): QuestionWords | null => {
  const words = quotedAt(start);
  const options = words === null ? null : optionsBehind(moved(start, words.used), keywords);
  if (words === null || options === null) return null;
  const { value: text } = words;
  const inner = readTyped({ text, tokens: tokensOf(text), at: 0, units: start.units }, keywords);
  if (options.code !== null) return { ...options, text, whole: text };
  return {
    ...inner,
    number: options.number ?? inner.number,
    noCard: options.noCard || inner.noCard,
  };
};

/** Reads everything that follows the verb. */
export const readQuestionWords =
  (keywords: QuestionKeywords) =>
  (start: Cursor): { readonly value: QuestionWords; readonly used: number } | null => {
    const used = start.tokens.length - start.at;
    if (used <= 0) return null;
    return { value: readForm(start, keywords) ?? readTyped(start, keywords), used };
  };

const CODE = 'K7M2X';

/** The code of a card, as an option of a form. */
export const cardCode = said<string>({
  name: 'code',
  read: plainCodeAt,
  keywords: ['card', 'code'],
  suggests: 'cards',
  examples: [CODE],
});

/** The code of a question, as an option of a form. */
export const questionCode = said<string>({
  name: 'asked',
  read: plainCodeAt,
  keywords: ['question', 'code'],
  examples: [CODE],
});

export const noCard = said<true>({
  name: 'noCard',
  read: () => null,
  closed: true,
  values: NO_CARD.map((phrase) => [phrase.join(' '), true] as const),
  examples: ['no card'],
});

/** Which of several answers, as an option of a form. */
export const answerNumber = said<number>({
  name: 'accepted',
  read: (cursor) => {
    const number = numberAt(cursor);
    return number === null ? null : { value: number, used: 1 };
  },
  keywords: ['answer', 'number'],
  examples: ['2'],
});

/** The words themselves; the field that reads the whole line. */
export const wordsField = (name: string, keywords: QuestionKeywords, examples: readonly string[]) =>
  said<QuestionWords>({
    name,
    read: (cursor) => readQuestionWords(keywords)(cursor),
    keywords: keywords.text,
    text: true,
    examples,
  });
