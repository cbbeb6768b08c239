const digitsOf = (term: string): string => term.replaceAll(/\P{N}+/gu, '');

const commonStart = (a: readonly string[], b: readonly string[]): number => {
  let at = 0;
  while (at < a.length && a[at] === b[at]) at += 1;
  return at;
};

const same = (a: readonly string[], b: readonly string[]): boolean =>
  a.length === b.length && commonStart(a, b) === a.length;

/**
 * Whether two terms are one slip of the thumb apart: a letter too many, one missing, another one,
 * or two neighbours that changed places, wherever in the word. Digits are read right or not at all.
 */
export const isOneSlip = (a: string, b: string): boolean => {
  if (a === b || digitsOf(a) !== digitsOf(b)) return false;
  const [one, two] = [Array.from(a), Array.from(b)];
  if (one.length > two.length) return isOneSlip(b, a);
  const at = commonStart(one, two);
  const [restOfOne, restOfTwo] = [one.slice(at), two.slice(at)];
  if (one.length < two.length) return same(restOfOne, restOfTwo.slice(1));
  if (same(restOfOne.slice(1), restOfTwo.slice(1))) return true;
  return (
    restOfOne[0] === restOfTwo[1] &&
    restOfOne[1] === restOfTwo[0] &&
    same(restOfOne.slice(2), restOfTwo.slice(2))
  );
};
