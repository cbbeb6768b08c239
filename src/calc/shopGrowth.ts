import { type Form, formedRound } from './growth/index.ts';
import type { MaterialGroup } from './materials/index.ts';
import type { Pattern } from './pattern.ts';
import { type Mm, within } from './units.ts';

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
/** Further than this from what was expected, in standard deviations, a result waits for a word. Judgement. */
export const DOUBTED_BEYOND = 3;
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
 * | ḡ (mean) | expected share | - | |
 * | sd | its standard deviation | - | ≥ 0 |
 * | results | results behind it | - | ≥ 0 |
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

/** What a finished part said about the growth. */
export type GrowthResult = {
  /** Pattern and material, from growthFamily. */
  readonly family: string;
  /** Measured growth over static growth. */
  readonly share: number;
  /** Someone has looked at it and stands by it, however odd it is. */
  readonly confirmed: boolean;
};

/**
 * Name of the family whose growth is learned together.
 *
 *     pattern × material group
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pattern | pattern on the work | - | |
 * | group | family of materials | - | |
 * | → family | name of both | - | |
 *
 * Assumes hand and pitch make no difference to the share.
 *
 * @source growth-prior (families are pattern × material)
 * @example growthFamily({ kind: 'diamond', points: 'raised' }, 'steel') // "diamond raised × steel"
 */
export function growthFamily(pattern: Pattern, group: MaterialGroup): string {
  const points = 'points' in pattern ? ` ${pattern.points}` : '';
  return `${pattern.kind}${points} × ${group}`;
}

/**
 * Share of the static growth that a finished part shows.
 *
 *     g = (D_crest − D_blank) / growth(H)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | D_blank (blankDiameter) | diameter before knurling | mm | > 0 |
 * | D_crest (crestDiameter) | diameter over the crests | mm | ≥ D_blank |
 * | H (height) | tooth height, measured | mm | > 0 |
 * | Hf (sharpHeight) | sharp height | mm | > 0 |
 * | → g | measured over static growth | - | |
 *
 * Assumes a sharp wheel; the growth is that of the tooth that was measured, not of the one planned.
 *
 * @source round-work (static growth)
 * @example measuredGrowthShare({ form: 'grooves', blankDiameter: mm(6), crestDiameter: mm(6.37577), height: mm(0.4), sharpHeight: mm(0.4) }) // 0.950
 */
export function measuredGrowthShare(of: {
  readonly form: Form;
  readonly blankDiameter: Mm;
  readonly crestDiameter: Mm;
  readonly height: Mm;
  readonly sharpHeight: Mm;
}): number {
  within('toothHeight', of.height, Number.MIN_VALUE, of.sharpHeight, 'mm');
  const { growth } = formedRound(of);
  within('crestDiameter', of.crestDiameter, of.blankDiameter, 1e6, 'mm');
  return (of.crestDiameter - of.blankDiameter) / growth;
}

/** The results of one family that are learned from, added up. */
export type FamilyTally = {
  readonly family: string;
  readonly count: number;
  /** Of the measured shares. */
  readonly sum: number;
};

type Tally = { readonly count: number; readonly sum: number };
type Tallies = ReadonlyMap<string, Tally>;

const NONE: Tally = { count: 0, sum: 0 };

// Precisions: one over the variance of shops, families and parts.
const SHOP = SHOP_SD ** -2;
const FAMILY = FAMILY_SD ** -2;
const PART = PART_SD ** -2;

/** How far a family's own parts are believed against the shop's mean: 0 to 1. */
const pull = ({ count }: Tally): number => (PART * count) / (FAMILY + PART * count);

/**
 * The linear system of (μ, φ₁ … φ_F) is an arrow: every φ is tied to μ alone. So the families are
 * eliminated one by one, which leaves a single equation for μ; each family then follows from it.
 */
const predictive = (tallies: Tallies, family: string): { mean: number; sd: number } => {
  let precision = SHOP;
  let moment = SHOP * PRIOR_MEAN;
  for (const tally of tallies.values()) {
    const weight = FAMILY * pull(tally);
    precision += weight;
    moment += (weight * tally.sum) / tally.count;
  }
  const shop = moment / precision;
  const own = tallies.get(family) ?? NONE;
  const k = pull(own);
  const mean = own.count === 0 ? shop : (1 - k) * shop + (k * own.sum) / own.count;
  const variance = (1 - k) ** 2 / precision + 1 / (FAMILY + PART * own.count);
  return { mean, sd: Math.sqrt(variance + PART_SD ** 2) };
};

export type LearnedGrowth = {
  readonly learned: readonly GrowthResult[];
  /** Kept, but not learned from until someone confirms them. */
  readonly doubted: readonly GrowthResult[];
};

/** Whether a share is so far from what was expected that it waits for a word. */
const isOdd = (share: number, { mean, sd }: { readonly mean: number; readonly sd: number }) =>
  Math.abs(within('growthShare', share, -10, 10) - mean) > DOUBTED_BEYOND * sd;

const sift = (results: readonly GrowthResult[]): LearnedGrowth & { readonly tallies: Tallies } => {
  const tallies = new Map<string, Tally>();
  const learned: GrowthResult[] = [];
  const doubted: GrowthResult[] = [];
  for (const result of results) {
    const { family, share, confirmed } = result;
    if (isOdd(share, predictive(tallies, family)) && !confirmed) {
      doubted.push(result);
      continue;
    }
    const { count, sum } = tallies.get(family) ?? NONE;
    tallies.set(family, { count: count + 1, sum: sum + share });
    learned.push(result);
  }
  return { learned, doubted, tallies };
};

const listed = (tallies: Tallies): readonly FamilyTally[] =>
  [...tallies].map(([family, { count, sum }]) => ({ family, count, sum }));

/**
 * Which results are learned from and which wait until someone confirms them.
 *
 *     |g − ḡ| > 3 sd of the part that was expected: doubted, unless confirmed
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | results | the shop's results, the oldest first | - | |
 * | → learned, doubted | the two heaps, in the same order | - | |
 *
 * Assumes each result is held against what the shop knew before it.
 *
 * @source growth-learned (three standard deviations of the predictive)
 * @example siftResults([{ family: 'straight × steel', share: 1.9, confirmed: false }]).doubted.length // 1
 * @example siftResults([{ family: 'straight × steel', share: 1.9, confirmed: true }]).doubted.length // 0
 */
export function siftResults(results: readonly GrowthResult[]): LearnedGrowth {
  const { learned, doubted } = sift(results);
  return { learned, doubted };
}

export type FamilyGrowth = GrowthBelief & {
  /** How many of the results are of this very pattern and material. */
  readonly ofFamily: number;
  readonly doubted: number;
};

/**
 * The share of static growth to expect of the next part of a family, from all the shop's results.
 *
 *     g_fj = μ + φ_f + ε;  μ ~ N(0.95, 0.08²), φ_f ~ N(0, 0.04²), ε ~ N(0, 0.05²)
 *     k_f = n_f/0.05² / (1/0.04² + n_f/0.05²);  1/V = 1/0.08² + Σ k_f/0.04²
 *     μ̂ = V (0.95/0.08² + Σ k_f ḡ_f/0.04²);  mean = (1 − k_f) μ̂ + k_f ḡ_f
 *     sd² = (1 − k_f)² V + 1/(1/0.04² + n_f/0.05²) + 0.05²
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | results | the shop's results, the oldest first | - | |
 * | f (family) | pattern and material of the next part | - | |
 * | → mean, sd | expected share and its standard deviation | - | |
 * | → results, ofFamily, doubted | results learned from, those of this family, those that wait | - | |
 *
 * Assumes shop, family and part vary independently and normally, with the spreads named in this file.
 *
 * @source growth-learned (jointly normal, one linear solve)
 * @source growth-prior (the five numbers are judgements)
 * @example growthBelief([], 'straight × steel').mean // 0.95
 * @example growthBelief([{ family: 'straight × steel', share: 0.85, confirmed: false }], 'straight × steel').mean // 0.8738
 */
export function growthBelief(results: readonly GrowthResult[], family: string): FamilyGrowth {
  const { doubted, tallies } = sift(results);
  return growthFromTallies(listed(tallies), family, doubted.length);
}

/**
 * What the results that are learned from add up to, family by family.
 *
 *     n_f, Σ g_fj  over the results that are learned from
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | results | the shop's results, the oldest first | - | |
 * | → family, count, sum | each family that was seen, in the order of its first result | - | |
 *
 * Assumes each result is held against what the shop knew before it.
 *
 * @source growth-learned (all that the linear solve needs of the results)
 * @example tallyGrowth([{ family: 'straight × steel', share: 0.9, confirmed: false }, { family: 'straight × steel', share: 0.94, confirmed: false }])[0].sum // 1.84
 */
export function tallyGrowth(results: readonly GrowthResult[]): readonly FamilyTally[] {
  return listed(sift(results).tallies);
}

/**
 * The share to expect of the next part of a family, from what the results add up to.
 *
 *     growthBelief, with n_f and Σ g_fj in place of the results
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | tallies | count and sum of each family, in the order of its first result | - | |
 * | f (family) | pattern and material of the next part | - | |
 * | doubted | results that wait to be confirmed | - | ≥ 0 |
 * | → mean, sd | expected share and its standard deviation | - | |
 * | → results, ofFamily, doubted | results learned from, those of this family, those that wait | - | |
 *
 * Assumes the tallies are those of tallyGrowth.
 *
 * @source growth-learned (jointly normal, one linear solve)
 * @source growth-prior (the five numbers are judgements)
 * @example growthFromTallies([{ family: 'straight × steel', count: 1, sum: 0.85 }], 'straight × steel', 0).mean // 0.8738
 */
export function growthFromTallies(
  tallies: readonly FamilyTally[],
  family: string,
  doubted: number,
): FamilyGrowth {
  const byFamily = new Map(tallies.map((tally) => [tally.family, tally]));
  return {
    ...predictive(byFamily, family),
    results: tallies.reduce((sum, { count }) => sum + count, 0),
    ofFamily: byFamily.get(family)?.count ?? 0,
    doubted,
  };
}

/**
 * Whether a part is so far from what was expected that it waits until someone confirms it.
 *
 *     |g − ḡ| > 3 sd
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | g (share) | measured over static growth | - | -10 to 10 |
 * | belief | ḡ and sd of the part that was expected | - | |
 * | → doubted | it waits | - | |
 *
 * Assumes the expectation is that of before the part.
 *
 * @source growth-learned (three standard deviations of the predictive)
 * @example isDoubted(1.3, growthBeforeResults()) // true
 * @example isDoubted(1.2, growthBeforeResults()) // false
 */
export function isDoubted(share: number, belief: GrowthBelief): boolean {
  return isOdd(share, belief);
}
