import { type Cursor, moved, phraseAt, spanOf, textAt, tokenAt } from './cursor.ts';
import { nearestOf } from './nearest.ts';
import { placeOf } from './range.ts';
import { type Names, type Reader, type Reading, refused, took } from './reading.ts';
import { tokensOf } from './tokens.ts';

const wordsOf = (name: string): readonly string[] => tokensOf(name).map((token) => token.text);

const ARTICLES = new Set(['the', 'a', 'an', 'our', 'my']);
const articlesAt = (cursor: Cursor): number => (ARTICLES.has(textAt(cursor)) ? 1 : 0);

/** How many words a name takes here, 0 where it does not stand here. */
const lengthAt = (cursor: Cursor, name: string): number => {
  const words = wordsOf(name);
  const here = phraseAt(cursor, words);
  if (here > 0) return here;
  const skipped = articlesAt(cursor);
  const behind = skipped === 0 ? 0 : phraseAt(moved(cursor, skipped), words);
  if (behind > 0) return skipped + behind;
  // A wheel may be called `wheel 3`: then the keyword was the first word of its name.
  return Math.max(0, phraseAt(moved(cursor, -1), words) - 1);
};

/** The name that stands here, the longest where one begins another; the article may be said. */
const standing = (cursor: Cursor, known: readonly string[]): Reading<string> | null => {
  let best: { readonly name: string; readonly used: number } | null = null;
  for (const name of known) {
    const used = lengthAt(cursor, name);
    if (used > (best?.used ?? 0)) best = { name, used };
  }
  return best === null ? null : took(best.name, best.used);
};

/** Most names that are offered for one. */
const MOST = 3;

/** Names a slip away from what was typed, with the words they take. */
const slips = (
  cursor: Cursor,
  known: readonly string[],
): readonly [name: string, words: number][] =>
  known.flatMap((name) => {
    const words = wordsOf(name);
    const typed = words.map((_, ahead) => textAt(cursor, ahead)).join(' ');
    return nearestOf(typed, [words.join(' ')]).length > 0 ? [[name, words.length]] : [];
  });

/** Names that hold the word that was typed: `colchester` of several of that make. */
const holding = (cursor: Cursor, known: readonly string[]): readonly string[] => {
  const first = textAt(cursor);
  return known.filter((name) => first !== '' && wordsOf(name).includes(first));
};

/** No such name: what comes nearest, and the words it would take the place of. */
const notFound = (cursor: Cursor, what: string, known: readonly string[]): Reading<never> => {
  const near = slips(cursor, known);
  const longest = Math.max(1, ...near.map(([, words]) => words));
  const nearest = near.length > 0 ? near.map(([name]) => name) : holding(cursor, known);
  const place = placeOf(cursor, spanOf(cursor, longest));
  return refused({ code: 'notFound', what, nearest: nearest.slice(0, MOST), ...place });
};

/** One of the names the shop has given, where it stands here. */
export const knownName =
  (known: (names: Names) => readonly string[]): Reader<string> =>
  (cursor, names) =>
    standing(cursor, known(names));

/** One of the names the shop has given; any other is not found. */
export const nameOf =
  (what: string, known: (names: Names) => readonly string[]): Reader<string> =>
  (cursor, names) => {
    const found = standing(cursor, known(names));
    if (found !== null) return found;
    const next = moved(cursor, articlesAt(cursor));
    return tokenAt(next) === undefined ? null : notFound(next, what, known(names));
  };
