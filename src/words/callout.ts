import { type Callout, readCallout } from '../calc/standards/index.ts';
import { plainText } from './characters.ts';
import { tokenAt } from './cursor.ts';
import { type Reader, refused, took } from './reading.ts';

/** `96 DP straight` is read word by word; these are the callouts that only a standard spells. */
const SPELT_BY_STANDARD = new Set(['din82', 'gost']);
const NAMES_STANDARD = /^(?:asme|ansi|jis)/u;

/** A drawing's callout: `RGE 0.8`, `DIN 82-RAA 0,8`, `JIS B 0951 straight m 0.3`. */
export const freeCallout: Reader<Callout> = (cursor) => {
  const token = tokenAt(cursor);
  if (token === undefined) return null;
  const found = readCallout(plainText(cursor.text).slice(token.start));
  if (found === null) return null;
  if ('problem' in found) {
    const [start, end] = [token.start + found.start, token.start + found.end];
    const word = cursor.text.slice(start, end);
    return refused({ code: 'unreadable', word, start, end, nearest: found.nearest });
  }
  const { callout, length } = found;
  if (!SPELT_BY_STANDARD.has(callout.standard) && !NAMES_STANDARD.test(token.text)) return null;
  const end = token.start + length;
  const used = cursor.tokens.slice(cursor.at).filter((each) => each.start < end).length;
  return took(callout, used);
};
