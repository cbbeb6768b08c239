import { normalShare } from '../normal.ts';
import type { GrowthBelief } from '../shopGrowth.ts';
import { TRACKS_WITHIN, type Window } from '../tracking.ts';
import { type Mm, mm, within } from '../units.ts';

/** Spread of turned diameters, as a standard deviation, where the machine has none of its own. Judgement. */
export const TURNING_SPREAD: Mm = mm(0.006);

/** Share of a normal spread between two ends. */
const between = (low: number, high: number, mean: number, sd: number): number =>
  sd > 0
    ? normalShare((high - mean) / sd) - normalShare((low - mean) / sd)
    : mean >= low && mean <= high
      ? 1
      : 0;

/**
 * Tooth error to expect of a part turned to a whole count, as a standard deviation.
 *
 *     s² = (π σ_D/p_t)² + Δ²/3
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | σ_D (turningSpread) | standard deviation of the turned diameter | mm | ≥ 0 |
 * | p_t (transversePitch) | pitch round the rim | mm | > 0 |
 * | Δ (countDoubt) | half width of the doubt about the count, in teeth | - | ≥ 0 |
 * | → s | standard deviation in teeth | - | |
 *
 * Assumes diameter and wheel err independently; Δ²/3 is the variance of an even doubt.
 *
 * @source plan-chances (variances added)
 * @example toothErrorSpread({ turningSpread: mm(0.006), transversePitch: mm(0.8), countDoubt: 0.1 }) // 0.06236
 */
export function toothErrorSpread(of: {
  readonly turningSpread: Mm;
  readonly transversePitch: Mm;
  readonly countDoubt: number;
}): number {
  within('turningSpread', of.turningSpread, 0, 10, 'mm');
  within('transversePitch', of.transversePitch, Number.MIN_VALUE, 1e6, 'mm');
  within('countDoubt', of.countDoubt, 0, 1e6);
  const byTurning = (Math.PI * of.turningSpread) / of.transversePitch;
  return Math.hypot(byTurning, of.countDoubt / Math.sqrt(3));
}

/**
 * Chance that a part turned to a whole count tracks on that count.
 *
 *     P(|δ| ≤ 0.10),  δ ~ N(0, (π σ_D/p_t)² + (u N)²/3)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | σ_D (turningSpread) | standard deviation of the turned diameter | mm | ≥ 0 |
 * | p_t (transversePitch) | pitch round the rim | mm | > 0 |
 * | u N (countDoubt) | half width of the doubt about the count, in teeth | - | ≥ 0 |
 * | → chance | that the pattern meets itself on the planned count | - | 0 to 1 |
 *
 * Assumes a normal error; a pattern that happens to close on another count is not counted.
 *
 * @source plan-chances (normal spread of the tooth error)
 * @source window-thresholds (0.10 of a tooth)
 * @source turning-spread (0.006 mm unless the machine has its own)
 * @example chanceOfTracking({ turningSpread: mm(0.006), transversePitch: mm(0.8), countDoubt: 0.1 }) // 0.891
 */
export function chanceOfTracking(of: {
  readonly turningSpread: Mm;
  readonly transversePitch: Mm;
  readonly countDoubt: number;
}): number {
  return between(-TRACKS_WITHIN, TRACKS_WITHIN, 0, toothErrorSpread(of));
}

/**
 * Chance that the crest can be brought where it is wanted with a fill that is neither too shallow
 * nor too full.
 *
 *     P(G_low/G_full ≤ g ≤ G_high/G_shallow),  g ~ N(ḡ, sd²)
 *
 * One diameter wanted, the middle of the limits: G_low = G_high.
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | G_low, G_high (wanted) | smallest and largest crest wanted, less blank | mm | low ≤ high |
 * | G_shallow (shallow) | static growth at the shallowest fill allowed | mm | > 0 |
 * | G_full (full) | static growth at the fullest fill allowed | mm | ≥ shallow |
 * | belief | expected share of the static growth and its standard deviation | - | |
 * | → chance | that the fill needed stays between the two | - | 0 to 1 |
 *
 * Assumes the crest is brought there by measuring, so that only the fill gives way.
 *
 * @source plan-chances (predictive of the shop's growth)
 * @example chanceOfLanding({ wanted: { low: mm(0.3), high: mm(0.3) }, shallow: mm(0.2), full: mm(0.38), belief: growthBeforeResults() }) // 0.941
 */
export function chanceOfLanding(of: {
  readonly wanted: Window;
  readonly shallow: Mm;
  readonly full: Mm;
  readonly belief: GrowthBelief;
}): number {
  within('growth', of.shallow, Number.MIN_VALUE, of.full, 'mm');
  const { mean, sd } = of.belief;
  return between(of.wanted.low / of.full, of.wanted.high / of.shallow, mean, sd);
}

/**
 * Chance that a turned diameter lies inside limits, which is all a cut knurl's crest depends on.
 *
 *     P(low ≤ D ≤ high),  D ~ N(D₀, σ_D²)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D₀ (diameter) | diameter turned to | mm | > 0 |
 * | limits | smallest and largest diameter allowed | mm | |
 * | σ_D (turningSpread) | standard deviation of the turned diameter | mm | ≥ 0 |
 * | → chance | that it lies inside | - | 0 to 1 |
 *
 * Assumes a normal error about the diameter turned to.
 *
 * @source plan-chances (normal spread of the diameter)
 * @source turning-spread (0.006 mm unless the machine has its own)
 * @example chanceOfTurning({ diameter: mm(20), limits: { low: mm(19.99), high: mm(20.01) }, turningSpread: mm(0.006) }) // 0.904
 */
export function chanceOfTurning(of: {
  readonly diameter: Mm;
  readonly limits: Window;
  readonly turningSpread: Mm;
}): number {
  within('diameter', of.diameter, Number.MIN_VALUE, 1e6, 'mm');
  within('turningSpread', of.turningSpread, 0, 10, 'mm');
  return between(of.limits.low, of.limits.high, of.diameter, of.turningSpread);
}
