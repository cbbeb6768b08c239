import { type Callout, readCallout } from '../calc/standards/index.ts';
import { type Cursor, plainOf, tokenAt } from './cursor.ts';
import { placeOf } from './range.ts';
import { type Reader, refused, took } from './reading.ts';
import type { Token } from './tokens.ts';

/** `96 DP straight` is read word by word; these are the callouts that only a standard spells. */
const SPELT_BY_STANDARD = new Set(['din82', 'gost']);
const NAMES_STANDARD = /^(?:asme|ansi|b94|jis)/u;
/** Something of a standard is in the line; most lines have nothing of the kind. */
const MENTIONS = /din|jis|gost|гост|asme|ansi|b\s?94|(?<!\p{L})r[abgk]/u;

const mayBegin = (cursor: Cursor, token: Token): boolean =>
  /^\p{L}/u.test(token.text) && MENTIONS.test(plainOf(cursor));

/** A drawing's callout: `RGE 0.8`, `DIN 82-RAA 0,8`, `JIS B 0951 straight m 0.3`. */
export const freeCallout: Reader<Callout> = (cursor) => {
  const token = tokenAt(cursor);
  if (token === undefined || !mayBegin(cursor, token)) return null;
  const found = readCallout(plainOf(cursor).slice(token.start));
  if (found === null) return null;
  if ('problem' in found) {
    const span = { start: token.start + found.start, end: token.start + found.end };
    return refused({ code: 'unreadable', nearest: found.nearest, ...placeOf(cursor, span) });
  }
  const { callout, length } = found;
  if (!SPELT_BY_STANDARD.has(callout.standard) && !NAMES_STANDARD.test(token.text)) return null;
  const end = token.start + length;
  let used = 0;
  while ((tokenAt(cursor, used)?.start ?? end) < end) used += 1;
  return took(callout, used);
};
