import { distance } from 'fastest-levenshtein';
import { plainText } from './characters.ts';

/** Most neighbours offered for one word. */
const MOST = 3;

/** Letters that may be wrong in a word of this length. Judgement: a slip or two, not another word. */
const allowance = (length: number): number => (length <= 2 ? 0 : length <= 5 ? 1 : 2);

/** Longer than any name; nothing is near it. */
const LONGEST = 40;

/** Two neighbouring letters change places: one slip of the thumb, not two. */
const isSwapped = (a: string, b: string): boolean => {
  if (a.length !== b.length) return false;
  let at = 0;
  while (at < a.length && a[at] === b[at]) at += 1;
  const swapped = a.slice(0, at) + (a[at + 1] ?? '') + (a[at] ?? '') + a.slice(at + 2);
  return swapped === b;
};

const off = (word: string, candidate: string): number =>
  isSwapped(word, candidate) ? 1 : distance(word, candidate);

const digitsOf = (word: string): string => (/\d/u.test(word) ? word.replaceAll(/\D/gu, '') : '');

/**
 * The known words a misspelt one may have been meant for, nearest first. They are offered, never
 * taken; and digits are never guessed.
 */
export const nearestOf = (word: string, known: Iterable<string>): readonly string[] => {
  if (word.length > LONGEST) return [];
  const most = allowance(word.length);
  const digits = digitsOf(word);
  const scored = new Map<string, number>();
  for (const candidate of known) {
    if (Math.abs(candidate.length - word.length) > most || scored.has(candidate)) continue;
    const plain = plainText(candidate);
    if (digitsOf(plain) !== digits) continue;
    const slips = off(word, plain);
    if (slips <= most) scored.set(candidate, slips);
  }
  const best = Math.min(...scored.values());
  return [...scored]
    .filter(([, slips]) => slips === best)
    .map(([candidate]) => candidate)
    .sort((a, b) => a.localeCompare(b))
    .slice(0, MOST);
};
