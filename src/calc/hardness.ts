import { within } from './units.ts';

/**
 * Rockwell C against Brinell (10 mm ball, 3000 kgf) of non-austenitic steels. Reported: a steel
 * house prints the even numbers, another the rest, both after the ASTM tables.
 */
const BRINELL_BY_ROCKWELL_C: readonly (readonly [hrc: number, hb: number])[] = [
  [20, 226],
  [22, 237],
  [24, 247],
  [26, 258],
  [28, 271],
  [30, 286],
  [32, 301],
  [34, 319],
  [36, 336],
  [38, 353],
  [40, 371],
  [42, 390],
  [44, 409],
  [46, 432],
  [48, 455],
  [50, 481],
  [52, 512],
  [54, 543],
  [56, 577],
  [58, 615],
  [60, 654],
  [62, 688],
  [64, 722],
];

/** Ends of the table: below the scale means little, above the ball does. */
export const SOFTEST_ROCKWELL_C = 20;
export const HARDEST_ROCKWELL_C = 64;

/**
 * Brinell hardness of a steel whose Rockwell C hardness is known.
 *
 *     printed pairs (20, 226) … (40, 371) … (64, 722), straight lines between
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | HRC (hrc) | Rockwell C hardness | HRC | 20 to 64 |
 * | → HB | Brinell hardness | HB | |
 *
 * Assumes carbon, alloy or tool steel; on austenitic and other metals it is only a hint.
 *
 * @source hardness-conversion (the pairs)
 * @example brinellFromRockwellC(28) // 271 HB
 * @example brinellFromRockwellC(29) // 278.5 HB
 */
export function brinellFromRockwellC(hrc: number): number {
  within('hardness', hrc, SOFTEST_ROCKWELL_C, HARDEST_ROCKWELL_C, 'HRC');
  const above = BRINELL_BY_ROCKWELL_C.findIndex(([printed]) => printed >= hrc);
  const [high, highHb] = BRINELL_BY_ROCKWELL_C[above] ?? [hrc, 0];
  const [low, lowHb] = BRINELL_BY_ROCKWELL_C[above - 1] ?? [high, highHb];
  return high === low ? highHb : lowHb + ((hrc - low) / (high - low)) * (highHb - lowHb);
}
