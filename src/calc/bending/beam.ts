import { type Mm, type MPa, mm, type Newton, type NewtonMm, newtonMm, within } from '../units.ts';

/** What a wheel does to a bar where it presses. */
export type Bend = {
  /** How far the bar gives way under the wheel. */
  readonly deflection: Mm;
  /** Largest bending moment anywhere in the bar. */
  readonly moment: NewtonMm;
};

/** A bar and the force on it. */
export type Beam = {
  readonly force: Newton;
  /** From the chuck (between centres: from the live centre) to the force. */
  readonly reach: Mm;
  readonly modulus: MPa;
  readonly secondMoment: number;
};

const sound = (of: Beam): number => {
  within('force', of.force, 0, 1e9, 'N');
  within('reach', of.reach, 0, 1e6, 'mm');
  within('modulus', of.modulus, Number.MIN_VALUE, 1e6, 'MPa');
  within('secondMoment', of.secondMoment, Number.MIN_VALUE, 1e15, 'mm⁴');
  return of.modulus * of.secondMoment;
};

/**
 * Bending of a bar held in the chuck alone.
 *
 *     δ = F a³/(3 E I);  M = F a
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | F (force) | force square to the bar | N | ≥ 0 |
 * | a (reach) | from the chuck to the force | mm | ≥ 0 |
 * | E (modulus) | modulus of the work | MPa | > 0 |
 * | I (secondMoment) | second moment of area | mm⁴ | > 0 |
 * | → δ (deflection) | how far the bar gives way under the force | mm | |
 * | → M (moment) | bending moment at the chuck | N·mm | |
 *
 * Assumes jaws that do not give.
 *
 * @source beam (held at one end)
 * @example bentInChuck({ force: newton(2000), reach: mm(40), modulus: mpa(205000), secondMoment: secondMoment(mm(12), null) }).deflection // 0.204475 mm
 */
export function bentInChuck(of: Beam): Bend {
  const stiffness = sound(of);
  return {
    deflection: mm((of.force * of.reach ** 3) / (3 * stiffness)),
    moment: newtonMm(of.force * of.reach),
  };
}

/**
 * Bending of a bar held in the chuck and by a tailstock.
 *
 *     δ = F a³ b² (3a + 4b)/(12 E I L³);  b = L − a
 *     M = max(F a b (L + b)/(2L²), F a² b (3L − a)/(2L³))
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | F (force) | force square to the bar | N | ≥ 0 |
 * | a (reach) | from the chuck to the force | mm | 0 to L |
 * | L (span) | from the chuck to the tailstock | mm | > 0 |
 * | E (modulus) | modulus of the work | MPa | > 0 |
 * | I (secondMoment) | second moment of area | mm⁴ | > 0 |
 * | → δ (deflection) | how far the bar gives way under the force | mm | |
 * | → M (moment) | larger of the moments at the chuck and under the force | N·mm | |
 *
 * Assumes jaws and a centre that do not give.
 *
 * @source beam (held at one end, propped at the other)
 * @example bentByTailstock({ force: newton(2000), reach: mm(40), span: mm(80), modulus: mpa(205000), secondMoment: secondMoment(mm(12), null) }).deflection // 0.0447289 mm
 */
export function bentByTailstock(of: Beam & { readonly span: Mm }): Bend {
  const { force: F, reach: a, span: L } = of;
  const stiffness = sound(of);
  const b = L - within('reach', a, 0, within('span', L, Number.MIN_VALUE, 1e6, 'mm'), 'mm');
  const atChuck = (F * a * b * (L + b)) / (2 * L ** 2);
  const underForce = (F * a ** 2 * b * (3 * L - a)) / (2 * L ** 3);
  return {
    deflection: mm((F * a ** 3 * b ** 2 * (3 * a + 4 * b)) / (12 * stiffness * L ** 3)),
    moment: newtonMm(Math.max(atChuck, underForce)),
  };
}

/**
 * Bending of a bar between centres.
 *
 *     δ = F a² b²/(3 E I L);  M = F a b/L;  b = L − a
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | F (force) | force square to the bar | N | ≥ 0 |
 * | a (reach) | from the live centre to the force | mm | 0 to L |
 * | L (span) | from centre to centre | mm | > 0 |
 * | E (modulus) | modulus of the work | MPa | > 0 |
 * | I (secondMoment) | second moment of area | mm⁴ | > 0 |
 * | → δ (deflection) | how far the bar gives way under the force | mm | |
 * | → M (moment) | bending moment under the force | N·mm | |
 *
 * Assumes centres that do not give and hold no moment.
 *
 * @source beam (between centres)
 * @example bentBetweenCentres({ force: newton(2000), reach: mm(40), span: mm(80), modulus: mpa(205000), secondMoment: secondMoment(mm(12), null) }).deflection // 0.102237 mm
 */
export function bentBetweenCentres(of: Beam & { readonly span: Mm }): Bend {
  const { force: F, reach: a, span: L } = of;
  const stiffness = sound(of);
  const b = L - within('reach', a, 0, within('span', L, Number.MIN_VALUE, 1e6, 'mm'), 'mm');
  return {
    deflection: mm((F * a ** 2 * b ** 2) / (3 * stiffness * L)),
    moment: newtonMm((F * a * b) / L),
  };
}
