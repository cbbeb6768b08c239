import { randomBytes } from 'node:crypto';

/** Digits and letters in the order of their bytes, so that ids sort as their moments do. */
const DIGITS = '0123456789abcdefghjkmnpqrstvwxyz';
const MOMENT_DIGITS = 9;
const PLACE_DIGITS = 3;
const RANDOM_DIGITS = 12;

const inDigits = (value: number, count: number): string => {
  let text = '';
  for (let rest = value; text.length < count; rest = Math.floor(rest / 32)) {
    text = (DIGITS[rest % 32] ?? '') + text;
  }
  return text;
};

/**
 * A new id: its moment first, so that the newest stand together at the end of every index, then
 * its place among those made at once, then enough chance that no two are ever alike and none can
 * be guessed from another.
 */
export const newId = (at: number, place = 0): string => {
  const chance = Array.from(randomBytes(RANDOM_DIGITS), (byte) => DIGITS[byte % 32] ?? '');
  return inDigits(at, MOMENT_DIGITS) + inDigits(place, PLACE_DIGITS) + chance.join('');
};
