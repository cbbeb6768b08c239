import { type Mm, mm, within } from '../units.ts';
import { type Form, fullFormInfeed, voidOf } from './form.ts';
import { LONGEST, positive, SLACK, upTo } from './limits.ts';

/** Where the old surface comes to lie in the new tooth. */
export type Formed = {
  /** From touch to the groove root, on the radius. */
  readonly infeed: Mm;
  /** From the old surface up to the crest, on the radius. */
  readonly rise: Mm;
  /** What the rise does to the diameter. */
  readonly growth: Mm;
};

/** The old surface lies at the mean height of the new one, so the void per area is the rise. */
export const raisedBy = (height: number, rise: number): Formed => ({
  infeed: mm(height - rise),
  rise: mm(rise),
  growth: mm(2 * rise),
});

/**
 * Infeed, rise and growth of a formed knurl on work so large that it counts as flat.
 *
 *     z = ∫₀ᴴ share du;  r = H − z;  growth = 2r
 *     r = G₁ grooves;  2G₁ − G₂ raised;  G₂ sunk
 *     G₁ = H (β + x/2);  G₂ = H (β² + βx + x²/3);  x = H/Hf
 *
 * With β = 0: r = H²/(2Hf), H²/Hf − H³/(3Hf²), H³/(3Hf²).
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | H | tooth height | mm | 0 to Hf (1 − β) |
 * | Hf | sharp height | mm | > 0 |
 * | β (tipFlat) | flat on the wheel's tip as a share of the pitch, 0 unless said | - | 0 to 1 |
 * | → z (infeed) | infeed from touch | mm | |
 * | → r (rise) | crest above the old surface | mm | |
 * | → growth | growth of the diameter | mm | |
 *
 * Assumes that volume is kept and that the groove is the wheel's tooth, not swept wider by rolling.
 *
 * @source volume-constancy (the old surface lies at the mean height of the new one)
 * @source din-82-blank (d1 − 0.5 t, 0.67 t, 0.33 t are this growth at full form and 90°)
 * @example formedFlat('grooves', mm(0.3), mm(0.4)).growth // 0.225 mm
 * @example formedFlat('grooves', mm(0.36), mm(0.4), 0.1).infeed // 0.162 mm
 */
export function formedFlat(form: Form, H: Mm, Hf: Mm, tipFlat = 0): Formed {
  positive('Hf', Hf);
  within('tipFlat', tipFlat, 0, 1);
  const height = upTo('H', H, mm(Hf * (1 - tipFlat)));
  const x = height / Hf;
  const first = height * (tipFlat + x / 2);
  const second = height * (tipFlat ** 2 + tipFlat * x + x ** 2 / 3);
  return raisedBy(height, voidOf(form, first, second));
}

/** Part of a limit that is used up, 1 at most; null when it is more than the limit gives. */
const partOf = (value: number, most: number): number | null =>
  value > most * (1 + SLACK) ? null : Math.min(1, value / most);

// The inverses are written so that nothing cancels for a shallow knurl; each is the formula of the
// card, rearranged.

const fillFromRise = (form: Form, y: number): number => {
  switch (form) {
    case 'grooves':
      return Math.sqrt(2 * y);
    case 'raised': {
      // acos(1 − 1.5y)/3, and 1 + 2 cos(2π/3 − third) opened up.
      const third = (2 / 3) * Math.asin(Math.sqrt(0.75 * y));
      return 2 * Math.sin(third / 2) ** 2 + Math.sqrt(3) * Math.sin(third);
    }
    case 'sunk':
      return Math.cbrt(3 * y);
  }
};

const fillFromInfeed = (form: Form, w: number): number => {
  switch (form) {
    case 'grooves':
      return (2 * w) / (1 + Math.sqrt(Math.max(0, 1 - 2 * w)));
    case 'raised':
      return -Math.expm1(Math.log1p(Math.max(-1, -3 * w)) / 3);
    case 'sunk':
      return 2 * Math.sin(Math.asin(Math.min(1, 1.5 * w)) / 3);
  }
};

/**
 * Tooth height that a rise of the crest speaks for.
 *
 *     y = r/Hf;  grooves x = √(2y);  raised x = 1 + 2 cos(2π/3 − acos(1 − 1.5y)/3);  sunk x = ∛(3y);  H = x Hf
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | r | crest above the old surface, half the growth | mm | ≥ 0 |
 * | Hf | sharp height | mm | > 0 |
 * | → H | tooth height, null when the rise is more than full form gives | mm | 0 to Hf |
 *
 * Assumes a sharp wheel on work so large that it counts as flat, and that volume is kept.
 *
 * @source volume-constancy (rise of formedFlat, solved for H)
 * @example heightFromRise('grooves', mm(0.1), mm(0.4)) // 0.282843 mm
 * @example heightFromRise('raised', mm(0.3), mm(0.4)) // null
 */
export function heightFromRise(form: Form, r: Mm, Hf: Mm): Mm | null {
  within('r', r, 0, LONGEST, 'mm');
  const most = Hf - fullFormInfeed(form, Hf);
  const part = partOf(r, most);
  return part === null ? null : mm(Hf * Math.min(1, fillFromRise(form, (part * most) / Hf)));
}

/**
 * Tooth height that an infeed from touch gives.
 *
 *     w = z/Hf;  grooves x = 1 − √(1 − 2w);  raised x = 1 − ∛(1 − 3w);  sunk x = 2 sin(asin(1.5w)/3);  H = x Hf
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | z | infeed from touch | mm | ≥ 0 |
 * | Hf | sharp height | mm | > 0 |
 * | → H | tooth height, null when the infeed is more than full form takes | mm | 0 to Hf |
 *
 * Assumes a sharp wheel on work so large that it counts as flat, and that volume is kept.
 *
 * @source volume-constancy (infeed of formedFlat, solved for H)
 * @example heightFromInfeed('sunk', mm(0.15), mm(0.4)) // 0.158258 mm
 * @example heightFromInfeed('raised', mm(0.15), mm(0.4)) // null
 */
export function heightFromInfeed(form: Form, z: Mm, Hf: Mm): Mm | null {
  within('z', z, 0, LONGEST, 'mm');
  const most = fullFormInfeed(form, Hf);
  const part = partOf(z, most);
  return part === null ? null : mm(Hf * Math.min(1, fillFromInfeed(form, (part * most) / Hf)));
}
