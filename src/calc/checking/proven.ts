import { FEWEST_TEETH } from '../teeth.ts';
import { type Mm, mm, within } from '../units.ts';

/** More teeth than this nobody counts round a bar. Judgement. */
export const MOST_COUNTED = 9999;
/** A count this many times too small or too large belongs to no wheel of this pitch. Judgement. */
const FAR_OFF = 3;

/** Counts that a person may have found where a label speaks for so many teeth. */
export const countLimits = (
  expected: number,
): { readonly fewest: number; readonly most: number } => ({
  fewest: Math.max(FEWEST_TEETH, Math.floor(expected / FAR_OFF)),
  most: Math.min(MOST_COUNTED, Math.ceil(expected * FAR_OFF)),
});

/**
 * Pitch that a diameter and the count which tracked on it have proven.
 *
 *     p_eff = π D / N
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (diameter) | blank on which the pattern met itself | mm | > 0 |
 * | N (count) | teeth counted round it | - | 3 to 9999 |
 * | → p_eff | pitch round the rim, which replaces the label's | mm | |
 *
 * Assumes the pattern met itself, so the count is whole to about 0.1 of a tooth.
 *
 * @source wheel-truth (a proven pair is good to 0.1 tooth in all)
 * @example provenPitch(mm(20), 63) // 0.997331 mm
 */
export function provenPitch(diameter: Mm, count: number): Mm {
  within('diameter', diameter, Number.MIN_VALUE, 1e6, 'mm');
  within('counted', count, FEWEST_TEETH, MOST_COUNTED);
  return mm((Math.PI * diameter) / count);
}
