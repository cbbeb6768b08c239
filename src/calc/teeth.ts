import { type Mm, mm, type Rad, rad, within } from './units.ts';

/** Fewer whole teeth than this round a bar make no knurl at all. */
export const FEWEST_TEETH = 3;
/** Fewer than this do not roll: the card stops and names the smallest diameter. Common practice. */
export const FEWEST_SENSIBLE_TEETH = 12;
/** Rounding noise under which a count is whole. */
const WHOLE = 1e-9;

/**
 * Teeth that fit round the work, as a real number.
 *
 *     N = π D / p_t
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | p_t (transversePitch) | pitch round the rim | mm | > 0 |
 * | → N | teeth round the work | - | |
 *
 * Assumes the wheel rolls on the blank without slip at first touch.
 *
 * @source whole-tooth (pitch circle of the blank)
 * @source asme-b94.6 (N = P·D, through p_t = π/P)
 * @example toothCount(mm(25.4), mm(1)) // 79.7965
 */
export function toothCount(diameter: Mm, transversePitch: Mm): number {
  within('diameter', diameter, Number.MIN_VALUE, 1e6, 'mm');
  within('transversePitch', transversePitch, Number.MIN_VALUE, 1e6, 'mm');
  return (Math.PI * diameter) / transversePitch;
}

/**
 * Diameter at which a whole number of teeth fits round the work.
 *
 *     D = N · p_t / π
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | N (teeth) | teeth round the work | - | > 0 |
 * | p_t (transversePitch) | pitch round the rim | mm | > 0 |
 * | → D | diameter of the blank | mm | |
 *
 * Assumes the wheel rolls on the blank without slip at first touch.
 *
 * @source whole-tooth (toothCount, rearranged)
 * @example wholeToothDiameter(65, inch(1 / 21)) // 25.0252 mm
 */
export function wholeToothDiameter(teeth: number, transversePitch: Mm): Mm {
  within('teeth', teeth, 0, 1e7);
  within('transversePitch', transversePitch, Number.MIN_VALUE, 1e6, 'mm');
  return mm((teeth * transversePitch) / Math.PI);
}

/**
 * Largest whole count on a bar that can only be turned smaller.
 *
 *     N = ⌊π D / p_t⌋
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (diameter) | diameter of the bar | mm | > 0 |
 * | p_t (transversePitch) | pitch round the rim | mm | > 0 |
 * | → N | largest whole count at or under the bar | - | |
 *
 * Assumes a count within 1e-9 of whole is whole.
 *
 * @source whole-tooth (a turned bar cannot be made larger)
 * @example largestWholeCount(mm(25.4), mm(1)) // 79
 */
export function largestWholeCount(diameter: Mm, transversePitch: Mm): number {
  return Math.floor(toothCount(diameter, transversePitch) + WHOLE);
}

/**
 * How far a blank is from a whole number of teeth.
 *
 *     δ = N − round(N)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | p_t (transversePitch) | pitch round the rim | mm | > 0 |
 * | → δ | signed share of a tooth, under is negative | - | -0.5 to 0.5 |
 *
 * Assumes the wheel rolls on the blank without slip at first touch.
 *
 * @source whole-tooth (the seam left after one turn)
 * @example toothError(mm(25.4), mm(1)) // -0.203547
 */
export function toothError(diameter: Mm, transversePitch: Mm): number {
  const teeth = toothCount(diameter, transversePitch);
  return teeth - Math.round(teeth);
}

/**
 * Swivel at which a straight wheel set over gives a whole count on a diameter that is fixed.
 *
 *     cos ψ = N p / (π D)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | N (teeth) | teeth wanted | - | ≥ 3 |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | p (normalPitch) | pitch of the straight wheel | mm | > 0 |
 * | → ψ | swivel | rad | 0 to 1.57 |
 *
 * Assumes N p ≤ π D.
 *
 * @source asme-b94.6 (160 DP straight wheel on 1.000 in, 138 teeth: about 30½°)
 * @example swivelForCount(138, inch(1), inch(Math.PI / 160)) // 0.530607 rad
 */
export function swivelForCount(teeth: number, diameter: Mm, normalPitch: Mm): Rad {
  const cos = teeth / toothCount(diameter, normalPitch);
  return rad(Math.acos(within('teeth', cos, 0, 1)));
}
