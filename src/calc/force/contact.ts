import { type Mm, type MPa, mm, mpa, within } from '../units.ts';

/** Poisson's ratio of the work. From memory: metals lie between 0.28 and 0.35. */
const WORK_POISSON = 0.29;
/** Modulus and Poisson's ratio of a hardened wheel. From memory. */
const WHEEL_MODULUS: MPa = mpa(220_000);
const WHEEL_POISSON = 0.28;

/**
 * Radius of the roller that would press a flat as a wheel presses a bar.
 *
 *     Req = Dw Dp/(2 (Dw + Dp))
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Dw (wheelDiameter) | diameter of the wheel | mm | > 0 |
 * | Dp (workDiameter) | diameter of the blank | mm | > 0 |
 * | → Req | equivalent radius | mm | |
 *
 * Assumes the contact is short against both radii.
 *
 * @source force-model (curvatures of two rollers add)
 * @example equivalentRadius(mm(20), mm(25)) // 5.55556 mm
 */
export function equivalentRadius(wheelDiameter: Mm, workDiameter: Mm): Mm {
  within('wheelDiameter', wheelDiameter, Number.MIN_VALUE, 1e6, 'mm');
  within('workDiameter', workDiameter, Number.MIN_VALUE, 1e6, 'mm');
  return mm((wheelDiameter * workDiameter) / (2 * (wheelDiameter + workDiameter)));
}

/**
 * Length of the arc on which a wheel bears while it goes in deeper.
 *
 *     L = √(2 Req dz)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Req (radius) | equivalent radius | mm | > 0 |
 * | dz (infeed) | infeed of the turn | mm | ≥ 0 |
 * | → L | contact arc | mm | |
 *
 * Assumes the wheel bears only on the side where it goes in.
 *
 * @source force-model (chord of a shallow cut into a round)
 * @example contactArc(equivalentRadius(mm(20), mm(25)), mm(0.02)) // 0.471405 mm
 */
export function contactArc(radius: Mm, infeed: Mm): Mm {
  within('radius', radius, Number.MIN_VALUE, 1e6, 'mm');
  within('infeed', infeed, 0, 1e6, 'mm');
  return mm(Math.sqrt(2 * radius * infeed));
}

/**
 * Modulus of a contact between the work and a hardened wheel.
 *
 *     1/E* = (1 − 0.29²)/E + (1 − 0.28²)/220000
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | E (modulus) | modulus of the work | MPa | > 0 |
 * | → E* | contact modulus | MPa | |
 *
 * Assumes a steel wheel, and 0.29 for every work material.
 *
 * @source hertz (both bodies give)
 * @example contactModulus(mpa(205000)) // 115515 MPa
 */
export function contactModulus(modulus: MPa): MPa {
  within('modulus', modulus, Number.MIN_VALUE, 1e6, 'MPa');
  const work = (1 - WORK_POISSON ** 2) / modulus;
  return mpa(1 / (work + (1 - WHEEL_POISSON ** 2) / WHEEL_MODULUS));
}

/**
 * Half width of a line contact that bears with a known mean pressure.
 *
 *     b_e = 8 p̄ Req/(π E*)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | p̄ (pressure) | mean pressure | MPa | ≥ 0 |
 * | Req (radius) | equivalent radius | mm | > 0 |
 * | E* (stiffness) | contact modulus | MPa | > 0 |
 * | → b_e | half width of the contact | mm | |
 *
 * Assumes smooth rollers that spring and do not flow.
 *
 * @source hertz (b² = 4 F' Req/(π E*) with F' = 2 b p̄)
 * @example hertzHalfWidth(mpa(541.683), equivalentRadius(mm(20), mm(25)), contactModulus(mpa(205000))) // 0.0663399 mm
 */
export function hertzHalfWidth(pressure: MPa, radius: Mm, stiffness: MPa): Mm {
  within('pressure', pressure, 0, 1e6, 'MPa');
  within('stiffness', stiffness, Number.MIN_VALUE, 1e6, 'MPa');
  return mm((8 * pressure * radius) / (Math.PI * stiffness));
}
