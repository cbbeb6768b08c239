import { type Cursor, moved, plainOf, spanOf, tokenAt } from './cursor.ts';
import { isReadable } from './reader.ts';
import { type Names, NO_NAMES, type Reader, type Reading, took } from './reading.ts';
import type { Vocabulary } from './vocabulary.ts';

/**
 * Words that are nobody's but the person's own: a name, a place, a rule. In quotation marks they
 * are taken as they stand; without, they go on until something stands there that can be read.
 */

/** A text as the reader takes it back whole; a quotation mark inside is doubled. */
export const quoted = (text: string): string => `"${text.replaceAll('"', '""')}"`;

/** How many words begin before a place in the line. */
const wordsBefore = (cursor: Cursor, end: number): number => {
  let count = 0;
  for (let at = cursor.at; (cursor.tokens[at]?.start ?? end) < end; at += 1) count += 1;
  return count;
};

/** `"Old Faithful"`, `"5"" wheel"`; null where no quotation mark opens or none closes. */
export const quotedAt = (
  cursor: Cursor,
): { readonly value: string; readonly used: number } | null => {
  const first = tokenAt(cursor);
  if (first === undefined) return null;
  const line = plainOf(cursor);
  // A quotation mark that touches its word is no part of it.
  const mark = line[first.start - 1] === '"' ? first.start - 1 : first.start;
  if (line[mark] !== '"') return null;
  let value = '';
  for (let at = mark + 1; at < line.length; at += 1) {
    if (line[at] !== '"') value += cursor.text[at] ?? '';
    else if (line[at + 1] === '"') {
      value += '"';
      at += 1;
    } else {
      const used = wordsBefore(cursor, at + 1);
      return value.trim() === '' ? null : { value: value.trim(), used };
    }
  }
  return null;
};

/** As typed, from the first word to the last of so many. */
const typedAt = (cursor: Cursor, used: number): string => {
  const { start, end } = spanOf(cursor, used);
  return cursor.text.slice(start, end);
};

/** How many words stand here that mean nothing to this vocabulary. */
const unknownWords = (cursor: Cursor, vocabulary: Vocabulary, names: Names): number => {
  let used = 0;
  for (;;) {
    const here = moved(cursor, used);
    if (tokenAt(here) === undefined || isReadable(here, vocabulary, names)) return used;
    used += 1;
  }
};

/** The words before anything that can be read: the name in `Old Faithful straight 21 tpi`. */
export const leadingText = (
  cursor: Cursor,
  vocabulary: Vocabulary,
  names: Names = NO_NAMES,
): Reading<string> | null => {
  const whole = quotedAt(cursor);
  if (whole !== null) return took(whole.value, whole.used);
  const used = unknownWords(cursor, vocabulary, names);
  return used === 0 ? null : took(typedAt(cursor, used), used);
};

/** The words after a keyword, at least one of them, up to what can be read again. */
export const textOf =
  (vocabulary: () => Vocabulary): Reader<string> =>
  (cursor, names) => {
    const whole = quotedAt(cursor);
    if (whole !== null) return took(whole.value, whole.used);
    if (tokenAt(cursor) === undefined) return null;
    const used = 1 + unknownWords(moved(cursor, 1), vocabulary(), names);
    return took(typedAt(cursor, used), used);
  };

/**
 * All that is left of the line, word for word; in quotation marks round the whole of it, what they
 * hold. What parts it from the word before is no part of it.
 */
export const restOfLine = (
  cursor: Cursor,
): { readonly value: string; readonly used: number } | null => {
  const left = cursor.tokens.length - cursor.at;
  if (left <= 0) return null;
  const whole = quotedAt(cursor);
  if (whole?.used === left && plainOf(cursor).trimEnd().endsWith('"')) return whole;
  const before = cursor.tokens[cursor.at - 1]?.end ?? 0;
  const value = cursor.text
    .slice(before)
    .replace(/^[\s:,;]+/u, '')
    .trimEnd();
  return { value, used: left };
};

/** One word as it was typed, or what stands in quotation marks. */
export const oneWord: Reader<string> = (cursor) => {
  const whole = quotedAt(cursor);
  if (whole !== null) return took(whole.value, whole.used);
  return tokenAt(cursor) === undefined ? null : took(typedAt(cursor, 1), 1);
};

/** All words up to one that announces something else, whatever they are; or what is quoted. */
export const upToKeyword =
  (vocabulary: () => Vocabulary): Reader<string> =>
  (cursor) => {
    const whole = quotedAt(cursor);
    if (whole !== null) return took(whole.value, whole.used);
    const { phrases } = vocabulary();
    let used = 0;
    for (;;) {
      const word = tokenAt(cursor, used)?.text;
      if (word === undefined || phrases.has(word)) break;
      used += 1;
    }
    return used === 0 ? null : took(typedAt(cursor, used), used);
  };
