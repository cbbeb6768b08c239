/** Even numbers from 0 up to 1, the same row for the same seed (mulberry32). */
export const mulberry32 = (seed: number): (() => number) => {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
};

/** A number from the normal spread about 0 with deviation 1, out of two even ones (Box and Muller). */
export const normalFrom = (random: () => number): number =>
  Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());

/** One of a list, each as often as its share says. */
export const drawn = <T extends { readonly share: number }>(
  random: () => number,
  list: readonly T[],
): T => {
  let left = random() * list.reduce((sum, { share }) => sum + share, 0);
  for (const one of list) {
    left -= one.share;
    if (left < 0) return one;
  }
  throw new Error('nothing to draw from');
};
