import { type Mm, mm, within } from '../units.ts';
import { bisect } from './bisect.ts';
import { formedFlat } from './flat.ts';
import type { Form } from './form.ts';
import { LONGEST, positive, SLACK, upTo } from './limits.ts';

/** A formed knurl on round work. */
export type FormedRound = {
  /** Radius at the bottom of the grooves. */
  readonly rootRadius: Mm;
  /** From touch to the groove root, on the radius. */
  readonly infeed: Mm;
  readonly crestDiameter: Mm;
  /** Crest diameter less blank diameter. */
  readonly growth: Mm;
};

const varianceFactor = (form: Form, x: number): number => {
  switch (form) {
    case 'grooves':
      return x / 3 - x ** 2 / 4;
    case 'raised':
      return (2 * x) / 3 - (7 * x ** 2) / 6 + (2 * x ** 3) / 3 - x ** 4 / 9;
    case 'sunk':
      return x ** 2 / 6 - x ** 4 / 9;
  }
};

/**
 * Mean square of the knurled surface about its own mean height, which is all that round work adds.
 *
 *     s² = 2 ∫₀ᴴ u·share du − z²
 *     grooves H²(x/3 − x²/4);  raised H²(2x/3 − 7x²/6 + 2x³/3 − x⁴/9);  sunk H²(x²/6 − x⁴/9);  x = H/Hf
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | H | tooth height | mm | 0 to Hf |
 * | Hf | sharp height | mm | > 0 |
 * | → s² | variance of the surface's height | mm² | |
 *
 * Assumes a sharp wheel and that the shares of round work are those of flat work.
 *
 * @source round-work (second moment of the solid share)
 * @example profileVariance('grooves', mm(0.3), mm(0.4)) // 0.00984375 mm²
 */
export function profileVariance(form: Form, H: Mm, Hf: Mm): number {
  positive('Hf', Hf);
  const height = upTo('H', H, Hf);
  return height ** 2 * varianceFactor(form, height / Hf);
}

type Profile = {
  readonly height: Mm;
  readonly infeed: Mm;
  readonly rise: Mm;
  readonly variance: number;
};

const profile = (form: Form, height: Mm, sharp: Mm): Profile => ({
  height: upTo('height', height, positive('sharpHeight', sharp)),
  infeed: formedFlat(form, height, sharp).infeed,
  rise: formedFlat(form, height, sharp).rise,
  variance: profileVariance(form, height, sharp),
});

/** Blank whose metal would all be in the teeth: nothing is left under the grooves of a smaller one. */
const smallestBlank = (of: Profile): number => 2 * Math.hypot(of.infeed, Math.sqrt(of.variance));

const roundFrom = (of: Profile, blankDiameter: Mm): FormedRound => {
  const blankRadius = blankDiameter / 2;
  const outer = Math.sqrt(blankRadius ** 2 - of.variance);
  // blankRadius − outer, without the difference of two nearly equal numbers.
  const extra = of.variance / (blankRadius + outer);
  const growth = 2 * (of.rise - extra);
  return {
    rootRadius: mm(outer - of.infeed),
    infeed: mm(of.infeed + extra),
    crestDiameter: mm(blankDiameter + growth),
    growth: mm(growth),
  };
};

/**
 * Infeed, crest diameter and growth of a formed knurl on round work, exact.
 *
 *     Rr = √(Db²/4 − s²) − z;  infeed = Db/2 − Rr;  Do = 2 (Rr + H);  growth = Do − Db
 *
 * The same as Rr = −I₀ + √(Db²/4 + I₀² − 2I₁) with I₀ = ∫₀ᴴ share du = z, I₁ = ∫₀ᴴ u·share du and
 * s² = 2I₁ − I₀².
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | Db (blankDiameter) | diameter of the blank | mm | ≥ 2√(z² + s²) |
 * | H (height) | tooth height | mm | 0 to Hf |
 * | Hf (sharpHeight) | sharp height | mm | > 0 |
 * | → Rr (rootRadius) | radius at the groove root | mm | |
 * | → infeed | infeed from touch | mm | |
 * | → Do (crestDiameter) | diameter over the crests | mm | |
 * | → growth | crest diameter less blank diameter | mm | |
 *
 * Assumes that volume is kept, that no metal flows along the work, and a sharp wheel.
 *
 * @source round-work (volume kept between root and crest of round work)
 * @source volume-constancy (the solid shares)
 * @example formedRound({ form: 'grooves', blankDiameter: mm(6), height: mm(0.4), sharpHeight: mm(0.4) }).crestDiameter // 6.39555 mm
 * @example formedRound({ form: 'sunk', blankDiameter: mm(6), height: mm(0.4), sharpHeight: mm(0.4) }).infeed // 0.268149 mm
 */
export function formedRound(of: {
  readonly form: Form;
  readonly blankDiameter: Mm;
  readonly height: Mm;
  readonly sharpHeight: Mm;
}): FormedRound {
  const tooth = profile(of.form, of.height, of.sharpHeight);
  positive('blankDiameter', of.blankDiameter);
  within('blankDiameter', of.blankDiameter, smallestBlank(tooth), LONGEST, 'mm');
  return roundFrom(tooth, of.blankDiameter);
}

/**
 * Blank that comes out at a crest diameter when the tooth has a given height, exact.
 *
 *     Db = 2 √((Do/2 − r)² + s²)
 *
 * The same as Db = 2 √((Do/2 − H)² + 2 ((Do/2 − H) I₀ + I₁)), with r = H − I₀ and s² = 2I₁ − I₀².
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | Do (crestDiameter) | diameter over the crests | mm | ≥ 2H, > 0 |
 * | H (height) | tooth height | mm | 0 to Hf |
 * | Hf (sharpHeight) | sharp height | mm | > 0 |
 * | → Db | diameter of the blank | mm | |
 *
 * Assumes that volume is kept, that no metal flows along the work, and a sharp wheel.
 *
 * @source round-work (formedRound, solved for the blank)
 * @example blankForCrest({ form: 'grooves', crestDiameter: mm(6.39555), height: mm(0.4), sharpHeight: mm(0.4) }) // 6.0000 mm
 */
export function blankForCrest(of: {
  readonly form: Form;
  readonly crestDiameter: Mm;
  readonly height: Mm;
  readonly sharpHeight: Mm;
}): Mm {
  const tooth = profile(of.form, of.height, of.sharpHeight);
  positive('crestDiameter', of.crestDiameter);
  within('crestDiameter', of.crestDiameter, 2 * tooth.height, LONGEST, 'mm');
  return mm(2 * Math.hypot(of.crestDiameter / 2 - tooth.rise, Math.sqrt(tooth.variance)));
}

/** Height at which a figure of the round knurl reaches a value; null beyond full form. */
const heightWhere = (
  of: { readonly form: Form; readonly blankDiameter: Mm; readonly sharpHeight: Mm },
  figure: 'growth' | 'infeed',
  value: number,
): Mm | null => {
  const at = (height: number): number =>
    roundFrom(profile(of.form, mm(height), of.sharpHeight), of.blankDiameter)[figure];
  const full = at(of.sharpHeight);
  // A diameter is only known to its own last digits, so the noise is measured on the diameter.
  if (value > full + SLACK * of.blankDiameter) return null;
  return value >= full ? of.sharpHeight : mm(bisect(at, value, of.sharpHeight));
};

const takesFullForm = (form: Form, blankDiameter: Mm, sharp: Mm): void => {
  positive('blankDiameter', blankDiameter);
  const least = smallestBlank(profile(form, positive('sharpHeight', sharp), sharp));
  within('blankDiameter', blankDiameter, least, LONGEST, 'mm');
};

/**
 * Tooth height that a crest diameter on a known blank speaks for, as if volume alone ruled.
 *
 *     H where Do(H) of formedRound is the crest diameter, by halving to 1e-12 of H
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | Db (blankDiameter) | diameter of the blank | mm | large enough to take full form |
 * | Do (crestDiameter) | diameter over the crests | mm | ≥ Db |
 * | Hf (sharpHeight) | sharp height | mm | > 0 |
 * | → H | tooth height, null when the crest is beyond full form | mm | 0 to Hf |
 *
 * Assumes that volume is kept and static growth: a measured growth is divided by its factor first.
 *
 * @source round-work (formedRound, solved for H)
 * @example heightFromCrest({ form: 'grooves', blankDiameter: mm(6), crestDiameter: mm(6.2), sharpHeight: mm(0.4) }) // 0.284952 mm
 * @example heightFromCrest({ form: 'grooves', blankDiameter: mm(6), crestDiameter: mm(6.4), sharpHeight: mm(0.4) }) // null
 */
export function heightFromCrest(of: {
  readonly form: Form;
  readonly blankDiameter: Mm;
  readonly crestDiameter: Mm;
  readonly sharpHeight: Mm;
}): Mm | null {
  takesFullForm(of.form, of.blankDiameter, of.sharpHeight);
  const least = of.blankDiameter * (1 - SLACK);
  if (of.crestDiameter >= least && of.crestDiameter < of.blankDiameter) return mm(0);
  within('crestDiameter', of.crestDiameter, of.blankDiameter, LONGEST, 'mm');
  return heightWhere(of, 'growth', of.crestDiameter - of.blankDiameter);
}

/**
 * Tooth height that an infeed from touch gives on round work.
 *
 *     H where the infeed of formedRound is the infeed, by halving to 1e-12 of H
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | Db (blankDiameter) | diameter of the blank | mm | large enough to take full form |
 * | infeed | infeed from touch, on the radius | mm | ≥ 0 |
 * | Hf (sharpHeight) | sharp height | mm | > 0 |
 * | → H | tooth height, null when the infeed is beyond full form | mm | 0 to Hf |
 *
 * Assumes that volume is kept, that no metal flows along the work, and a sharp wheel.
 *
 * @source round-work (formedRound, solved for H)
 * @example heightFromRoundInfeed({ form: 'grooves', blankDiameter: mm(6), infeed: mm(0.202223), sharpHeight: mm(0.4) }) // 0.40 mm
 * @example heightFromRoundInfeed({ form: 'grooves', blankDiameter: mm(6), infeed: mm(0.21), sharpHeight: mm(0.4) }) // null
 */
export function heightFromRoundInfeed(of: {
  readonly form: Form;
  readonly blankDiameter: Mm;
  readonly infeed: Mm;
  readonly sharpHeight: Mm;
}): Mm | null {
  takesFullForm(of.form, of.blankDiameter, of.sharpHeight);
  within('infeed', of.infeed, 0, LONGEST, 'mm');
  return heightWhere(of, 'infeed', of.infeed);
}
