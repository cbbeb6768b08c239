/** Shortest term with a letter to miss. Judgement: of `tpi` and `tip` each is near enough the other. */
const SHORTEST = 3;

const DIGIT = /\p{N}/u;

/**
 * A term as it is and with each of its letters left out. Two terms that are one slip apart (a
 * letter too many, one missing, another one, two that changed places) have one of these in common,
 * so that the slip is found by looking up, and not by comparing with every term there is. A digit
 * is never left out: 21 is not 12, nor 2.
 */
export const spellingsOf = (term: string): readonly string[] => {
  const signs = Array.from(term);
  const letters = signs.filter((sign) => !DIGIT.test(sign)).length;
  if (signs.length < SHORTEST || letters < 2) return [term];
  const shorter = signs.flatMap((sign, at) =>
    DIGIT.test(sign) ? [] : [signs.slice(0, at).join('') + signs.slice(at + 1).join('')],
  );
  return [...new Set([term, ...shorter])];
};
