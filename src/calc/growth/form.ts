import { type Mm, mm, within } from '../units.ts';
import { LONGEST, positive } from './limits.ts';

/** How the grooves meet. Grooves: straight and diagonal; raised, sunk: points of diamond, square. */
export type Form = 'grooves' | 'raised' | 'sunk';

const shareAt = (form: Form, g: number): number => {
  switch (form) {
    case 'grooves':
      return 1 - g;
    case 'raised':
      return (1 - g) ** 2;
    case 'sunk':
      return 1 - g ** 2;
  }
};

/**
 * Void per area of a form, from one groove family's ∫g du and ∫g² du: the void share is g, 2g − g²
 * or g², so its integral needs no more than these two.
 */
export const voidOf = (form: Form, first: number, second: number): number => {
  switch (form) {
    case 'grooves':
      return first;
    case 'raised':
      return 2 * first - second;
    case 'sunk':
      return second;
  }
};

/**
 * Share of the surface that is solid at a height above the groove root.
 *
 *     g = min(1, β + u/Hf);  grooves 1 − g;  raised (1 − g)²;  sunk 1 − g²
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | u | height above the groove root | mm | ≥ 0 |
 * | Hf | sharp height | mm | > 0 |
 * | β (tipFlat) | flat on the wheel's tip as a share of the pitch, 0 unless said | - | 0 to 1 |
 * | → share | solid share | - | 0 to 1 |
 *
 * Assumes two groove families of one depth that cross at any angle, or one family.
 *
 * @source volume-constancy (solid shares: two crossing families press independently of each other)
 * @example solidShare('raised', mm(0.3), mm(0.4)) // 0.0625
 * @example solidShare('grooves', mm(0), mm(0.4), 0.1) // 0.9
 */
export function solidShare(form: Form, u: Mm, Hf: Mm, tipFlat = 0): number {
  within('u', u, 0, LONGEST, 'mm');
  positive('Hf', Hf);
  within('tipFlat', tipFlat, 0, 1);
  return shareAt(form, Math.min(1, tipFlat + u / Hf));
}

/**
 * Infeed at which the pattern is full and its crests are edges.
 *
 *     grooves Hf/2;  raised Hf/3;  sunk 2Hf/3
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | Hf | sharp height | mm | > 0 |
 * | → z | infeed from touch | mm | |
 *
 * Assumes a sharp wheel on work so large that it counts as flat, and that volume is kept.
 *
 * @source volume-constancy (infeed of formedFlat at H = Hf)
 * @example fullFormInfeed('raised', mm(0.4)) // 0.133333 mm
 */
export function fullFormInfeed(form: Form, Hf: Mm): Mm {
  positive('Hf', Hf);
  return mm(Hf * (1 - voidOf(form, 1 / 2, 1 / 3)));
}

/**
 * How much the crest diameter grows for a small turn of the dial, per unit of infeed.
 *
 *     dD/dz = 2 (1/share(H) − 1)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | x (fill) | tooth height over sharp height | - | 0 to 1 |
 * | → slope | growth of the crest diameter over infeed; endless at a fill of 1 | - | ≥ 0 |
 *
 * Assumes a sharp wheel on work so large that it counts as flat, and that volume is kept.
 *
 * @source volume-constancy (dz = share dH, dD = 2 (dH − dz))
 * @example dialSlope('grooves', 0.75) // 6
 * @example dialSlope('raised', 0.75) // 30
 */
export function dialSlope(form: Form, fill: number): number {
  return 2 * (1 / shareAt(form, within('fill', fill, 0, 1)) - 1);
}
