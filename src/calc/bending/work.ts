import type { Travel } from '../edge.ts';
import { type Mm, type MPa, mm, mpa, type Newton } from '../units.ts';
import { type Bend, bentBetweenCentres, bentByTailstock, bentInChuck } from './beam.ts';
import { secondMoment, sectionModulus } from './section.ts';

/** How the bar is held. */
export type Support = 'chuck' | 'tailstock' | 'centres';

/** From the force to the tailstock's centre where nothing else is known. Judgement. */
export const REACH_TO_CENTRE: Mm = mm(25);

/** Where deflection or moment is largest along a span, as shares of it; all follow from dδ/da = 0. */
const LARGEST_AT: Record<Support, readonly number[]> = {
  chuck: [],
  tailstock: [1 - 1 / Math.sqrt(3), 2 - Math.SQRT2, (3 - Math.sqrt(3)) / 2],
  centres: [1 / 2],
};

export type BentWork = {
  /** Largest deflection under the wheel. */
  readonly deflection: Mm;
  /** Largest less smallest infeed along the knurl, because the bar gives way. */
  readonly depthDifference: Mm;
  readonly stress: MPa;
};

type Held = {
  readonly support: Support;
  readonly force: Newton;
  readonly modulus: MPa;
  readonly diameter: Mm;
  readonly bore: Mm | null;
};

/** Bending with the wheel at one place; `far` is the farthest place it comes to. */
const bendAt = (of: Held, reach: number, far: number): Bend => {
  const { force, modulus } = of;
  const place = mm(reach);
  const inertia = secondMoment(of.diameter, of.bore);
  const span = mm(far + REACH_TO_CENTRE);
  switch (of.support) {
    case 'chuck':
      return bentInChuck({ force, reach: place, modulus, secondMoment: inertia });
    case 'tailstock':
      return bentByTailstock({ force, reach: place, span, modulus, secondMoment: inertia });
    case 'centres':
      return bentBetweenCentres({ force, reach: place, span, modulus, secondMoment: inertia });
  }
};

/** Bar held at one end: a plunging wheel stands on a slope. Held at both it stands level. */
const tiltUnderWheel = (of: Held, reach: number, width: Mm): number =>
  of.support === 'chuck'
    ? (of.force * reach ** 2 * width) / (2 * of.modulus * secondMoment(of.diameter, of.bore))
    : 0;

/**
 * How a bar bends under the wheels of one side, and how uneven that makes the knurl.
 *
 *     plunge: a = out − w/2, difference F a² w/(2 E I) in the chuck, 0 where both ends are held
 *     traverse: a from out − w to out, difference the largest less the smallest deflection
 *     stress M/W
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | support | chuck, tailstock or centres | - | |
 * | travel | plunge or traverse | - | |
 * | F (force) | force of all the wheels on one side | N | ≥ 0 |
 * | out (stickout) | from the chuck to the end of the knurl | mm | ≥ w |
 * | w (width) | width of the knurl along the work | mm | > 0 |
 * | E (modulus) | modulus of the work | MPa | > 0 |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | d (bore) | bore, or null for a solid bar | mm | 0 to D |
 * | → δ (deflection) | largest deflection under the wheel | mm | |
 * | → difference (depthDifference) | unevenness of the infeed along the knurl | mm | |
 * | → σ (stress) | largest bending stress | MPa | |
 *
 * Assumes the knurl ends where the bar does, and a tailstock 25 mm past the farthest place of the wheel.
 *
 * @source beam (held at one end, propped, between centres)
 * @source judgement (25 mm to the tailstock)
 * @example bentWork({ support: 'chuck', travel: 'plunge', force: newton(2000), stickout: mm(43), width: mm(6), modulus: mpa(205000), diameter: mm(12), bore: null }).stress // 471.57 MPa
 * @example bentWork({ support: 'chuck', travel: 'plunge', force: newton(2000), stickout: mm(43), width: mm(6), modulus: mpa(205000), diameter: mm(12), bore: null }).depthDifference // 0.0460 mm
 */
export function bentWork(of: {
  readonly support: Support;
  readonly travel: Travel;
  readonly force: Newton;
  readonly stickout: Mm;
  readonly width: Mm;
  readonly modulus: MPa;
  readonly diameter: Mm;
  readonly bore: Mm | null;
}): BentWork {
  const [from, far] =
    of.travel === 'plunge'
      ? [of.stickout - of.width / 2, of.stickout - of.width / 2]
      : [of.stickout - of.width, of.stickout];
  const span = far + REACH_TO_CENTRE;
  const between = LARGEST_AT[of.support].map((share) => share * span);
  const places = [from, far, ...between.filter((place) => place > from && place < far)];
  const bends = places.map((place) => bendAt(of, place, far));
  const deflections = bends.map((bend) => bend.deflection);
  const largest = Math.max(...deflections);
  const moment = Math.max(...bends.map((bend) => bend.moment));
  return {
    deflection: mm(largest),
    depthDifference: mm(
      of.travel === 'plunge'
        ? tiltUnderWheel(of, far, of.width)
        : largest - Math.min(...deflections),
    ),
    stress: mpa(moment / sectionModulus(of.diameter, of.bore)),
  };
}
