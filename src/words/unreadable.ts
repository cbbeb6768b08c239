import type { Suggestion } from '../refusal.ts';
import { type Cursor, spanOf, textAt } from './cursor.ts';
import { readAs, without } from './edit.ts';
import { nearestOf } from './nearest.ts';
import { NUMBER } from './numbers.ts';
import { placeOf } from './range.ts';
import { UNIT_WORDS } from './unit.ts';

const NUMBER_THEN_WORD = new RegExp(`^(${NUMBER})-?([^\\d.,/].*)$`, 'u');
const WORD_THEN_NUMBER = new RegExp(`^(\\p{L}[^\\d.,/]*?)[-.]?(${NUMBER})(\\D*)$`, 'u');

/**
 * Words that mean something of their own: hardness scales that are not read, whose numbers another
 * scale would make wrong, and limits. What is spelt like them is not what they mean.
 */
const OWN_MEANING = /^(?:hr[abdefg]\d*|hv\d*|vickers|shore|max|min|not?|over|under)$/u;

const UNITS = [...UNIT_WORDS.keys()].filter((unit) => unit.length > 1 && !unit.includes(' '));

/** Numbers said in words: offered in figures, and two equal helices as the helix they are. */
const IN_FIGURES: ReadonlyMap<string, string> = new Map([
  ['one', '1'],
  ['two', '2'],
  ['three', '3'],
  ['four', '4'],
  ['half', '1/2'],
  ['quarter', '1/4'],
  ['30/30', 'helix 30'],
  ['45/45', 'helix 45'],
]);

/** A number is certain; what is grown onto it may be two words, or a slip in its unit. */
const withNumber = (word: string, known: ReadonlySet<string>): readonly string[] => {
  const [, number = '', tail = ''] = NUMBER_THEN_WORD.exec(word) ?? [];
  if (number !== '') {
    if (known.has(tail)) return [`${number} ${tail}`];
    // A letter more makes room for a slip in units of three letters.
    const units = nearestOf(
      `${tail} `,
      UNITS.map((unit) => `${unit} `),
    );
    return tail.length < 2 ? [] : units.map((unit) => `${number} ${unit.trim()}`);
  }
  const [, head = '', rest = '', end = ''] = WORD_THEN_NUMBER.exec(word) ?? [];
  return known.has(head) ? [`${head} ${rest}${end}`] : [];
};

/** What a word that cannot be read may have been meant for. */
const nearestTo = (word: string, known: readonly string[]): readonly string[] => {
  const figures = IN_FIGURES.get(word);
  if (figures !== undefined) return [figures];
  if (OWN_MEANING.test(word)) return [];
  const split = /\d/u.test(word) ? withNumber(word, new Set(known)) : [];
  if (split.length > 0 || /^\d/u.test(word)) return split;
  return nearestOf(
    word,
    known.filter((each) => each.length > 2 || UNIT_WORDS.has(each)),
  );
};

/** A sign or a picture without letters or digits may be left out; a word never is. */
const leftOut = (cursor: Cursor): readonly Suggestion[] => {
  if (/[\p{L}\p{N}]/u.test(textAt(cursor))) return [];
  const line = without(cursor.text, spanOf(cursor, 1));
  const says = /[\p{L}\p{N}]/u.test(line.replace(/^\/\S+/u, ''));
  return says ? [{ label: line, words: line }] : [];
};

/** A word that is not known, with those it may have been meant for. */
export const unreadable = (cursor: Cursor, known: readonly string[]) => {
  const span = spanOf(cursor, 1);
  const nearest = nearestTo(textAt(cursor), known);
  return {
    refusal: { code: 'unreadable' as const, nearest, ...placeOf(cursor, span) },
    choices:
      nearest.length > 0 ? nearest.map((by) => readAs(cursor.text, span, by)) : leftOut(cursor),
  };
};
