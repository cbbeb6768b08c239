/** Share of the static growth that shows on the part, as a shop has seen it so far. */
export type GrowthBelief = {
  /** Expected share for the next part of this pattern and material. */
  readonly mean: number;
  /** Standard deviation of that share from part to part and from what is not known yet. */
  readonly sd: number;
  /** Results that stand behind it. */
  readonly results: number;
};

/** Before any result: mean of the shop's share. Judgement. */
export const PRIOR_MEAN = 0.95;
/** Spread of shops. Judgement. */
export const SHOP_SD = 0.08;
/** Spread of pattern × material families within a shop. Judgement. */
export const FAMILY_SD = 0.04;
/** Spread of parts within a family. Judgement. */
export const PART_SD = 0.05;
/** Half width of the middle 80 % of a normal distribution, in standard deviations. */
export const EIGHTY_PERCENT = 1.2815515655446004;

/**
 * The share of static growth to expect before a shop has logged anything.
 *
 *     ḡ = 0.95, sd = √(0.08² + 0.04² + 0.05²)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | → mean, sd | expected share and its standard deviation | - | |
 *
 * Assumes shop, family and part vary independently and normally.
 *
 * @source growth-prior (the numbers are judgements)
 * @example growthBeforeResults().sd // 0.1025
 */
export function growthBeforeResults(): GrowthBelief {
  return { mean: PRIOR_MEAN, sd: Math.hypot(SHOP_SD, FAMILY_SD, PART_SD), results: 0 };
}

/**
 * The middle 80 % of the share of static growth.
 *
 *     ḡ ± 1.2816 sd
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | belief | expected share and its standard deviation | - | |
 * | → low, high | ends of the 80 % interval | - | |
 *
 * Assumes a normal spread.
 *
 * @source growth-prior (predictive of the next part)
 * @example growthInterval(growthBeforeResults()).low // 0.819
 * @example growthInterval(growthBeforeResults()).high // 1.081
 */
export function growthInterval(belief: GrowthBelief): {
  readonly low: number;
  readonly high: number;
} {
  const half = EIGHTY_PERCENT * belief.sd;
  return { low: belief.mean - half, high: belief.mean + half };
}
