export { mulberry32, normalFrom } from '../../src/demo/chance.ts';

/** An even number between two ends. */
export const between = (random: () => number, low: number, high: number): number =>
  low + (high - low) * random();

/** One of a list, all alike. */
export const oneOf = <T>(random: () => number, list: readonly T[]): T => {
  const drawn = list[Math.floor(random() * list.length)];
  if (drawn === undefined) throw new Error('nothing to draw from');
  return drawn;
};
