import type { Suggestion } from '../refusal.ts';
import type { Span } from './tokens.ts';

const tidy = (line: string): string => line.replaceAll(/\s+/gu, ' ').trim();

/** Where these two meet they would run into one: 3 and 7/8 into 3 7/8. */
const ENDS_IN_A_WHOLE = /(?<![\d.,/])\d{1,2}\s*$/u;
const STARTS_AS_A_FRACTION = /^\s*(?:\d+\s?\/\s?\d|[½⅓⅔¼¾⅕⅛⅜⅝⅞])/u;

const STARTS_WITH_A_MARK = /^(?:[\s,;:!?)]|\.(?!\d))/u;

/** Two parts beside each other: numbers that would run into one are kept apart by a comma. */
const joined = (before: string, after: string): string => {
  if (ENDS_IN_A_WHOLE.test(before) && STARTS_AS_A_FRACTION.test(after))
    return `${before.trimEnd()}, ${after.trimStart()}`;
  return STARTS_WITH_A_MARK.test(after) ? before + after : `${before} ${after}`;
};

/** The line with one part replaced by something else. */
export const replaced = (text: string, span: Span, by: string): string => {
  const [before, after] = [text.slice(0, span.start), text.slice(span.end)];
  return tidy(by.trim() === '' ? joined(before, after) : joined(`${before} ${by}`, after));
};

/** The line without one part. */
export const without = (text: string, span: Span): string => replaced(text, span, '');

/** The line with more words at its end. */
export const withMore = (text: string, words: string): string => tidy(joined(text, words));

export const partOf = (text: string, span: Span): string => text.slice(span.start, span.end);

/** One way of reading a part of the line. */
export const readAs = (text: string, span: Span, by: string): Suggestion => ({
  label: by,
  words: replaced(text, span, by),
});
