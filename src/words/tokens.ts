import { plainText } from './characters.ts';

/** A word of what was typed, in plain characters, with its place in the original. */
export type Token = { readonly text: string; readonly start: number; readonly end: number };
export type Span = { readonly start: number; readonly end: number };

/** Marks that end or wrap a word and mean nothing by themselves. */
const LEADING = /^[([{<,;:!?&]+/u;
const TRAILING = /[)\]}>,;:!?&]+$/u;
/** A full stop ends a sentence: `1.0 in.`, `1.0.`; but `21.` is a number. */
const FULL_STOP = /^(?<word>.*[^\d.]|\d*[.,]\d+)\.+$/u;

const trimmed = (word: string, start: number): Token | null => {
  const lead = LEADING.exec(word)?.[0].length ?? 0;
  const inner = word.slice(lead).replace(TRAILING, '');
  const text = FULL_STOP.exec(inner)?.groups?.['word'] ?? inner;
  return text === '' ? null : { text, start: start + lead, end: start + lead + text.length };
};

/** A comma parts words unless it stands between two digits of one number. */
const partsAt = (word: string): readonly number[] => {
  const cuts: number[] = [];
  for (let i = 0; i < word.length; i += 1) {
    if (word[i] === ';') cuts.push(i);
    if (word[i] !== ',') continue;
    const before = word.slice(0, i);
    const decimal =
      (before === '' || /(^|[^\d.,])\d+$/u.test(before)) && /^\d/u.test(word.slice(i + 1));
    if (!decimal) cuts.push(i);
  }
  return cuts;
};

const pieces = (word: string, start: number): readonly Token[] => {
  const cuts = [-1, ...partsAt(word), word.length];
  return cuts.slice(1).flatMap((end, index) => {
    const from = (cuts[index] ?? -1) + 1;
    const token = trimmed(word.slice(from, end), start + from);
    return token === null ? [] : [token];
  });
};

/** The words of a line, in order. */
export const tokensOf = (text: string): readonly Token[] => {
  const plain = plainText(text);
  // A diameter sign stands on its own, whether or not the number touches it.
  return [...plain.matchAll(/ø|[^\sø]+/gu)].flatMap((match) => pieces(match[0], match.index));
};
