import type { Missing, OutOfRangeRefusal } from '../refusal.ts';
import type { ShopWords } from './view.ts';

/** Longest name of a wheel, a machine … Judgement: what fits on a button of either platform. */
export const LONGEST_NAME = 60;
/** Longest rule or note. Judgement: a rule that is read before every job is short. */
export const LONGEST_TEXT = 500;
/** Longest question or answer. Judgement: what one message of either platform holds. */
export const LONGEST_WORDS = 2000;

/** Half of a character, which no database keeps. */
const HALVES = /\p{Surrogate}/gu;
const CONTROLS = /\p{Control}+/gu;
const CONTROLS_IN_A_LINE = /[^\P{Control}\n]+/gu;
/** Characters without a width, and those that turn the direction of what follows. */
const UNSEEN = /[\u200b\u2060\ufeff\u202a-\u202e\u2066-\u2069]/gu;

/** What a person typed as it is kept: without what cannot be seen, spaces made one. */
export const cleaned = (text: string): string =>
  text
    .replace(HALVES, '\ufffd')
    .replace(CONTROLS, ' ')
    .replace(UNSEEN, '')
    .normalize('NFC')
    .replace(/\s+/gu, ' ')
    .trim();

/** What a person wrote as it is kept: word for word and line for line, without what cannot be seen. */
export const wordForWord = (text: string): string =>
  text
    .replace(/\r\n?/gu, '\n')
    .replace(HALVES, '\ufffd')
    .replace(CONTROLS_IN_A_LINE, ' ')
    .replace(UNSEEN, '')
    .normalize('NFC')
    .trim();

/** The form in which two names are compared: capitals and typographic characters do not count. */
export const keyOf = (words: ShopWords, name: string): string =>
  words.plainText(cleaned(name)).replace(/\s+/gu, ' ').trim();

/** What is wrong with a text that has to be there and has to be short. */
export const textFault = (
  what: string,
  text: string,
  longest: number,
  examples: readonly string[] = [],
): Missing | OutOfRangeRefusal | null => {
  if (text === '') return { code: 'missing', parameter: what, examples };
  // Counted as people count: an emoji is one.
  const length = Array.from(text).length;
  if (length <= longest) return null;
  return { code: 'outOfRange', what, value: length, min: 1, max: longest, unit: 'characters' };
};
