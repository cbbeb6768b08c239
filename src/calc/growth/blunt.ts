import { type Mm, mm, type Rad, within } from '../units.ts';
import { type Formed, raisedBy } from './flat.ts';
import { type Form, voidOf } from './form.ts';
import { halfAngle, LONGEST, positive, upTo } from './limits.ts';
import { sharpHeight } from './tooth.ts';

/**
 * How far a rounded tip lies below the edge its flanks would meet in.
 *
 *     e = ρ (1/sin a − 1)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | ρ (rho) | radius on the tip | mm | ≥ 0 |
 * | 2a (included) | included tooth angle | rad | 0.01745 to 3.124 |
 * | → e | recess of the tip | mm | |
 *
 * Assumes an arc that runs into both flanks without a corner.
 *
 * @source blunt-wheel (circle touching two lines)
 * @example tipRecess(mm(0.1), degrees(90)) // 0.0414214 mm
 */
export function tipRecess(rho: Mm, included: Rad): Mm {
  within('rho', rho, 0, LONGEST, 'mm');
  return mm(rho * (1 / Math.sin(halfAngle(included)) - 1));
}

/**
 * Cross-section that a rounded tip lacks against a sharp one.
 *
 *     A = ρ² (cot a − π/2 + a)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | ρ (rho) | radius on the tip | mm | ≥ 0 |
 * | 2a (included) | included tooth angle | rad | 0.01745 to 3.124 |
 * | → A | area between the arc and the edge | mm² | |
 *
 * Assumes an arc that runs into both flanks without a corner.
 *
 * @source blunt-wheel (kite of the two tangents less the arc's sector)
 * @example tipLostArea(mm(0.1), degrees(90)) // 0.00214602 mm²
 */
export function tipLostArea(rho: Mm, included: Rad): number {
  within('rho', rho, 0, LONGEST, 'mm');
  const a = halfAngle(included);
  return rho ** 2 * (1 / Math.tan(a) - Math.PI / 2 + a);
}

/** Radius whose arc alone spans the pitch: a larger one has no flank left to run into. */
const largestRadius = (p: Mm, included: Rad): Mm => mm(p / (2 * Math.cos(halfAngle(included))));

type Groove = {
  readonly p: Mm;
  readonly included: Rad;
  readonly height: number;
  readonly tipRadius: Mm;
};

/** ∫g du and ∫g² du while only the arc is in the work: the half width is √(2ρu − u²). */
const insideArc = ({ p, tipRadius, height }: Groove): readonly [number, number] => {
  const turn = 2 * Math.asin(Math.sqrt(height / (2 * tipRadius)));
  const segment = tipRadius ** 2 * (turn - Math.sin(2 * turn) / 2);
  return [segment / p, (4 / p ** 2) * (tipRadius * height ** 2 - height ** 3 / 3)];
};

/** The same once the flanks are in the work: from there on the half width is (u + e) tan a. */
const pastTangent = (groove: Groove, tangent: number): readonly [number, number] => {
  const { p, included, height, tipRadius } = groove;
  const slope = Math.tan(halfAngle(included));
  const recess = tipRecess(tipRadius, included);
  const arc = tipRadius * tangent ** 2 - tangent ** 3 / 3;
  const flanks = (slope ** 2 * ((height + recess) ** 3 - (tangent + recess) ** 3)) / 3;
  const area = (height + recess) ** 2 * slope - tipLostArea(tipRadius, included);
  return [area / p, (4 / p ** 2) * (arc + flanks)];
};

/**
 * Infeed, rise and growth under a wheel whose tips are rounded, on work that counts as flat.
 *
 *     t = ρ (1 − sin a);  grooves r = G₁;  raised r = 2G₁ − G₂;  sunk r = G₂;  z = H − r
 *     H ≥ t: G₁ = ((H + e)² tan a − A)/p
 *            G₂ = (4/p²) (ρt² − t³/3 + tan² a ((H + e)³ − (t + e)³)/3)
 *     H < t: G₁ = (ρ²/p)(θ − sin θ cos θ), cos θ = 1 − H/ρ;  G₂ = (4/p²) (ρH² − H³/3)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | p | pitch square to the tooth | mm | > 0 |
 * | 2a (included) | included tooth angle | rad | 0.01745 to 3.124 |
 * | H (height) | tooth height, from the rounded groove root | mm | 0 to Hf − e |
 * | ρ (tipRadius) | radius on the wheel's tips | mm | 0 to p/(2 cos a) |
 * | → z (infeed) | infeed from touch | mm | |
 * | → r (rise) | crest above the old surface | mm | |
 * | → growth | growth of the diameter | mm | |
 *
 * Assumes that volume is kept and that the groove is the wheel's tooth, not swept wider by rolling.
 *
 * @source volume-constancy (the old surface lies at the mean height of the new one)
 * @source blunt-wheel (groove of a rounded tip; G₁ = ∫g du and G₂ = ∫g² du over its height)
 * @example formedBlunt({ form: 'grooves', p: mm(0.8), included: degrees(90), height: mm(0.3), tipRadius: mm(0.1) }).growth // 0.286056 mm
 */
export function formedBlunt(of: {
  readonly form: Form;
  readonly p: Mm;
  readonly included: Rad;
  readonly height: Mm;
  readonly tipRadius: Mm;
}): Formed {
  const { form, p, included, tipRadius } = of;
  const most = greatestHeight({ p, included, tipRadius, rootRadius: mm(0) });
  const height = upTo('height', of.height, most);
  const tangent = tipRadius * (1 - Math.sin(halfAngle(included)));
  const groove: Groove = { p, included, height, tipRadius };
  const [first, second] = height < tangent ? insideArc(groove) : pastTangent(groove, tangent);
  return raisedBy(height, voidOf(form, first, second));
}

/**
 * Greatest tooth height a wheel with rounded tips and rounded roots can press.
 *
 *     H ≤ Hf − e(ρ) − e(ρr)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | p | pitch square to the tooth | mm | > 0 |
 * | 2a (included) | included tooth angle | rad | 0.01745 to 3.124 |
 * | ρ (tipRadius) | radius on the wheel's tips | mm | 0 to p/(2 cos a) |
 * | ρr (rootRadius) | radius in the wheel's roots | mm | 0 to p/(2 cos a) − ρ |
 * | → H | greatest tooth height | mm | |
 *
 * Assumes arcs that run into the flanks without a corner.
 *
 * @source blunt-wheel (tipRecess at both ends of the flank)
 * @example greatestHeight({ p: mm(0.8), included: degrees(90), tipRadius: mm(0.05), rootRadius: mm(0.05) }) // 0.358579 mm
 */
export function greatestHeight(of: {
  readonly p: Mm;
  readonly included: Rad;
  readonly tipRadius: Mm;
  readonly rootRadius: Mm;
}): Mm {
  const { p, included } = of;
  const sharp = sharpHeight(positive('p', p), included);
  const largest = largestRadius(p, included);
  const tip = upTo('tipRadius', of.tipRadius, largest);
  const root = upTo('rootRadius', of.rootRadius, mm(largest - tip));
  return mm(sharp - tipRecess(tip, included) - tipRecess(root, included));
}
