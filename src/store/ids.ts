import { randomBytes } from 'node:crypto';

/** Digits and letters in the order of their bytes, so that ids sort as their moments do. */
const DIGITS = '0123456789abcdefghjkmnpqrstvwxyz';
const MOMENT_DIGITS = 9;
const PLACE_DIGITS = 4;
const RANDOM_DIGITS = 11;
const PLACES = DIGITS.length ** PLACE_DIGITS;

const inDigits = (value: number, count: number): string => {
  let text = '';
  for (let rest = value; text.length < count; rest = Math.floor(rest / DIGITS.length)) {
    text = (DIGITS[rest % DIGITS.length] ?? '') + text;
  }
  return text;
};

/** No id of this moment or a later one sorts before this; every earlier one does. */
export const firstIdAt = (at: number): string => inDigits(Math.max(0, at), MOMENT_DIGITS);

export type NewId = (at: number) => string;

/**
 * Makes ids: the moment first, so that the newest stand together at the end of every index, then
 * their place among those that this process makes, so that what was made in one moment keeps its
 * order, then enough chance that no two are ever alike and none can be guessed from another.
 */
export const idMaker = (): NewId => {
  let place = 0;
  return (at) => {
    place = (place + 1) % PLACES;
    const chance = Array.from(
      randomBytes(RANDOM_DIGITS),
      (byte) => DIGITS[byte % DIGITS.length] ?? '',
    );
    return inDigits(at, MOMENT_DIGITS) + inDigits(place, PLACE_DIGITS) + chance.join('');
  };
};
