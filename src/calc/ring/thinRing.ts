import {
  type Mm,
  type MPa,
  mm,
  mpa,
  type Newton,
  type NewtonMm,
  newtonMm,
  within,
} from '../units.ts';

/** A ring counts as thin while its wall is under this share of its mean radius. From handbooks. */
export const THIN_RING_BELOW = 0.2;

/** Closing of a pinched ring along the force, over F R³/(E I). */
const CLOSING = Math.PI / 4 - 2 / Math.PI;
/** Spreading square to the force, over the same. */
const SPREADING = 2 / Math.PI - 1 / 2;
/** Bending moment under the force, over F R. */
const UNDER = 1 / Math.PI;
/** Bending moment a quarter turn away, over F R. */
const ASIDE = 1 / 2 - 1 / Math.PI;

export type PinchedRing = {
  /** How much the diameter closes under the wheels. */
  readonly closing: Mm;
  /** How much it grows square to that. */
  readonly spreading: Mm;
  readonly momentUnder: NewtonMm;
  readonly momentAside: NewtonMm;
  readonly stressUnder: MPa;
  readonly stressAside: MPa;
  /** The larger of the two. */
  readonly stress: MPa;
};

/**
 * Width of tube that shares the load of a wheel.
 *
 *     b = w + 3 √(R t)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | w (width) | width the wheel presses on | mm | ≥ 0 |
 * | R (meanRadius) | mean radius of the wall | mm | > 0 |
 * | t (wall) | thickness of the wall | mm | > 0 |
 * | → b | width of the ring | mm | |
 *
 * Assumes the tube goes on at both sides of the wheel.
 *
 * @source ring-width (3 √(R t))
 * @example ringWidth(mm(6), mm(11), mm(2)) // 20.07 mm
 */
export function ringWidth(width: Mm, meanRadius: Mm, wall: Mm): Mm {
  within('width', width, 0, 1e6, 'mm');
  within('meanRadius', meanRadius, Number.MIN_VALUE, 1e6, 'mm');
  within('wall', wall, Number.MIN_VALUE, 1e6, 'mm');
  return mm(width + 3 * Math.sqrt(meanRadius * wall));
}

/**
 * A thin ring pinched between two forces that face each other.
 *
 *     closing (π/4 − 2/π) F R³/(E I);  spreading (2/π − 1/2) F R³/(E I);  I = b t³/12
 *     M under the force F R/π, a quarter turn away (1/2 − 1/π) F R
 *     σ = 6 M/(b t²), a quarter turn away + F/(2 b t)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | F (force) | force of one side | N | ≥ 0 |
 * | R (meanRadius) | mean radius of the wall | mm | > 0 |
 * | t (wall) | thickness of the wall | mm | > 0; valid t/R < 0.2 |
 * | b (width) | width of the ring | mm | > 0 |
 * | E (modulus) | modulus of the work | MPa | > 0 |
 * | → closing, spreading | change of the diameter along and square to the force | mm | |
 * | → momentUnder, momentAside | bending moments | N·mm | |
 * | → stressUnder, stressAside, stress | stresses, and the larger of them | MPa | |
 *
 * Assumes a ring so thin that only its bending counts; a thicker one closes by other ways as well.
 *
 * @source ring (π/4 − 2/π, 1/π and 1/2 − 1/π, derived again)
 * @example pinchedRing({ force: newton(1500), meanRadius: mm(14), wall: mm(2), width: mm(8), modulus: mpa(205000) }).closing // 0.560096 mm
 * @example pinchedRing({ force: newton(1500), meanRadius: mm(14), wall: mm(2), width: mm(8), modulus: mpa(205000) }).stress // 1253.35 MPa
 */
export function pinchedRing(of: {
  readonly force: Newton;
  readonly meanRadius: Mm;
  readonly wall: Mm;
  readonly width: Mm;
  readonly modulus: MPa;
}): PinchedRing {
  const { force: F, meanRadius: R, wall: t, width: b } = of;
  within('force', F, 0, 1e9, 'N');
  within('meanRadius', R, Number.MIN_VALUE, 1e6, 'mm');
  within('wall', t, Number.MIN_VALUE, 2 * R, 'mm');
  within('width', b, Number.MIN_VALUE, 1e6, 'mm');
  within('modulus', of.modulus, Number.MIN_VALUE, 1e6, 'MPa');
  const give = (12 * F * R ** 3) / (of.modulus * b * t ** 3);
  const section = (b * t ** 2) / 6;
  const stressUnder = (UNDER * F * R) / section;
  const stressAside = (ASIDE * F * R) / section + F / (2 * b * t);
  return {
    closing: mm(CLOSING * give),
    spreading: mm(SPREADING * give),
    momentUnder: newtonMm(UNDER * F * R),
    momentAside: newtonMm(ASIDE * F * R),
    stressUnder: mpa(stressUnder),
    stressAside: mpa(stressAside),
    stress: mpa(Math.max(stressUnder, stressAside)),
  };
}
