import type { Suggestion } from '../refusal.ts';
import type { Span } from './tokens.ts';

const tidy = (line: string): string => line.replaceAll(/\s+/gu, ' ').trim();

/** The line with one part replaced by something else. */
export const replaced = (text: string, span: Span, by: string): string =>
  tidy(`${text.slice(0, span.start)}${by}${text.slice(span.end)}`);

/** The line without one part. */
export const without = (text: string, span: Span): string => replaced(text, span, ' ');

/** The line with more words at its end. */
export const withMore = (text: string, words: string): string => tidy(`${text} ${words}`);

export const partOf = (text: string, span: Span): string => text.slice(span.start, span.end);

/** One way of reading a part of the line. */
export const readAs = (text: string, span: Span, by: string): Suggestion => ({
  label: by,
  words: replaced(text, span, by),
});
