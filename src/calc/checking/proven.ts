import { figure } from '../check.ts';
import { resolvePitch } from '../setup/index.ts';
import { FEWEST_TEETH, toothCount } from '../teeth.ts';
import { type Mm, mm, OutOfRange, within } from '../units.ts';
import { type BlankCheck, checkBlank, type WheelOnWork } from './blank.ts';

/** More teeth than this nobody counts round a bar. Judgement. */
const MOST_COUNTED = 9999;
/** A count this many times too small or too large belongs to no wheel of this pitch. Judgement. */
const FAR_OFF = 3;

/** Counts that a person may have found where a label speaks for so many teeth. */
const countLimits = (expected: number): { readonly fewest: number; readonly most: number } => ({
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

/** A count that a person may have found: whole, and not a multiple away from the label's. */
export const wholeCount = (count: number, expected: number): number => {
  const { fewest, most } = countLimits(expected);
  within('counted', count, fewest, most);
  if (!Number.isInteger(count)) throw new OutOfRange('counted', count, fewest, most, '1');
  return count;
};

/**
 * A wheel proven by a diameter on which it tracked and the teeth counted there.
 *
 *     p_eff = π D/N, which replaces the label from here on
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | wheel | pitch, pattern and class, as in a request for a set-up | - | |
 * | D (diameter) | blank on which the pattern met itself | mm | 3 teeth to 500 |
 * | N (count) | teeth counted round it | - | a third to three times what the label says |
 * | → effectivePitch | pitch round the rim | mm | |
 * | → nextDiameter | next smaller diameter that tracks, now with the pitch that is proven | mm | |
 *
 * Assumes the pattern met itself, as on a scrap roll that was looked at.
 *
 * @source wheel-truth (a proven pair is good to 0.1 tooth in all)
 * @source whole-tooth (next whole count)
 * @example proveWheel({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, knurlClass: null }, inch(0.995), 65).figures.effectivePitch.value // 1.2215 mm
 */
export function proveWheel(wheel: WheelOnWork, diameter: Mm, count: number): BlankCheck {
  const label = toothCount(diameter, resolvePitch(wheel).transverse);
  const pitch = provenPitch(diameter, wholeCount(count, label));
  const check = checkBlank({ ...wheel, proven: pitch }, diameter);
  return { ...check, figures: { ...check.figures, effectivePitch: figure(pitch, 'mm') } };
}
