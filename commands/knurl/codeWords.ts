import { readCode } from '../../src/shop/index.ts';
import { type Cursor, type Reader, type Token, tokenAt } from '../../src/words/index.ts';

/** What was typed without a gap, though a reader of numbers took it apart: `9X2T4`. */
const wordAt = (cursor: Cursor, ahead: number): readonly Token[] => {
  const tokens: Token[] = [];
  for (;;) {
    const next = tokenAt(cursor, ahead + tokens.length);
    const last = tokens.at(-1);
    if (next === undefined || (last !== undefined && next.start !== last.end)) return tokens;
    tokens.push(next);
  }
};

const textOf = (tokens: readonly Token[]): string => tokens.map(({ text }) => text).join('');

/**
 * A code that stands here without a gap, where nothing says that one follows: letters and digits,
 * so that no plain word or number is taken for one.
 */
export const plainCodeAt = (
  cursor: Cursor,
): { readonly value: string; readonly used: number } | null => {
  const tokens = wordAt(cursor, 0);
  const word = textOf(tokens);
  const looksIt = /^[a-z\d]+(?:-[a-z\d]+)?$/u.test(word) && /\d/u.test(word) && /[a-z]/u.test(word);
  const code = looksIt ? readCode(word) : null;
  return code === null ? null : { value: code, used: tokens.length };
};

/** A code as it is written or said: `k7m2x`, `K7-M2X`, `k7 m2x`. */
export const readCodeAt: Reader<string> = (cursor) => {
  const first = wordAt(cursor, 0);
  if (first.length === 0) return null;
  const second = wordAt(cursor, first.length);
  const alone = readCode(textOf(first));
  const both = readCode(textOf([...first, ...second]));
  if (alone === null && both !== null) return { value: both, used: first.length + second.length };
  // What cannot be a code is looked for all the same, and then said not to be there.
  return { value: alone ?? textOf(first), used: first.length };
};
