import { distance } from 'fastest-levenshtein';
import { plainText } from './characters.ts';

/** Most neighbours offered for one word. */
const MOST = 3;

/** Letters that may be wrong in a word of this length. Judgement: a slip or two, not another word. */
const allowance = (length: number): number => (length <= 2 ? 0 : length <= 5 ? 1 : 2);

const hasDigit = (word: string): boolean => /\d/u.test(word);

/**
 * The known words a misspelt one may have been meant for, nearest first. They are offered, never
 * taken; and digits are never guessed.
 */
export const nearestOf = (word: string, known: Iterable<string>): readonly string[] => {
  if (word.length > 40) return [];
  const sameDigits = word.replaceAll(/\D/gu, '');
  const scored: { word: string; off: number }[] = [];
  for (const candidate of new Set(known)) {
    const plain = plainText(candidate);
    if (hasDigit(word + plain) && plain.replaceAll(/\D/gu, '') !== sameDigits) continue;
    const off = distance(word, plain);
    if (off <= allowance(word.length)) scored.push({ word: candidate, off });
  }
  const best = Math.min(...scored.map((entry) => entry.off));
  return scored
    .filter((entry) => entry.off === best)
    .sort((a, b) => a.word.localeCompare(b.word))
    .slice(0, MOST)
    .map((entry) => entry.word);
};
