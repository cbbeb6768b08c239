import { randomInt } from 'node:crypto';

/**
 * The signs of a card's code: said over a running machine and written on a tag with a marker.
 * Left out is whatever is easily taken for another: by the eye 0 O Q D, 1 I L, 2 against Z, 5
 * against S, 8 against B, U against V; by the ear B D E G V Z beside P and T, N beside M, S
 * beside F, 5 beside 9; and the vowels, so that no code is a word. Judgement.
 */
export const CODE_SIGNS = '2346789CFHJKMPRTWXY';

/** What a reader may make of a sign that is not used: only where it can be nothing else. */
const MEANT: Readonly<Record<string, string>> = { Z: '2', B: '8', N: 'M' };

/** Signs of a first code. Judgement: two million of them a shop, before codes grow longer. */
const SHORTEST = 5;
const LONGEST = 12;

/** A number and what may be its unit: `263FT`. */
const LIKE_A_SIZE = /^\d+[A-Z]+$/u;

/** A code with letters and digits, so that it is never read as a number, a word or a size. */
export const newCode = (length = SHORTEST): string => {
  for (;;) {
    const code = Array.from({ length }, () => CODE_SIGNS[randomInt(CODE_SIGNS.length)]).join('');
    if (/\d/u.test(code) && /[A-Z]/u.test(code) && !LIKE_A_SIZE.test(code)) return code;
  }
};

/** Lengths to try one after the other when a code is taken. */
export const CODE_LENGTHS: readonly number[] = [5, 5, 5, 6, 6, 7, 8, 10, LONGEST];

/** What was typed as a code, or null where it cannot be one. Spaces and hyphens do not count. */
export const readCode = (typed: string): string | null => {
  const signs = Array.from(
    typed.toUpperCase().replaceAll(/[\s\-–—_.#]/gu, ''),
    (sign) => MEANT[sign] ?? sign,
  ).join('');
  const fits = signs.length >= SHORTEST && signs.length <= LONGEST;
  return fits && Array.from(signs).every((sign) => CODE_SIGNS.includes(sign)) ? signs : null;
};

/** Codes that differ in one letter: a digit is heard right or not at all. */
export const misheard = (code: string): readonly string[] =>
  Array.from(code).flatMap((sign, at) =>
    /\d/u.test(sign)
      ? []
      : Array.from(CODE_SIGNS)
          .filter((other) => other !== sign && !/\d/u.test(other))
          .map((other) => code.slice(0, at) + other + code.slice(at + 1)),
  );
