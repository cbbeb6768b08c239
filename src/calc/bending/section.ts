import { type Mm, within } from '../units.ts';

/**
 * Stiffness of a round section against bending, solid or hollow.
 *
 *     I = π (D⁴ − d⁴)/64
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (diameter) | outside diameter | mm | > 0 |
 * | d (bore) | bore, or null for a solid bar | mm | 0 to D |
 * | → I | second moment of area | mm⁴ | |
 *
 * Assumes the bore runs through and stands in the middle.
 *
 * @source beam (round sections)
 * @example secondMoment(mm(12), null) // 1017.88 mm⁴
 */
export function secondMoment(diameter: Mm, bore: Mm | null): number {
  within('diameter', diameter, Number.MIN_VALUE, 1e6, 'mm');
  const inside = bore === null ? 0 : within('bore', bore, 0, diameter, 'mm');
  return (Math.PI * (diameter ** 4 - inside ** 4)) / 64;
}

/**
 * Strength of a round section against bending, solid or hollow.
 *
 *     W = 2 I/D
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (diameter) | outside diameter | mm | > 0 |
 * | d (bore) | bore, or null for a solid bar | mm | 0 to D |
 * | → W | section modulus | mm³ | |
 *
 * Assumes the bore runs through and stands in the middle.
 *
 * @source beam (round sections)
 * @example sectionModulus(mm(12), null) // 169.646 mm³
 */
export function sectionModulus(diameter: Mm, bore: Mm | null): number {
  return (2 * secondMoment(diameter, bore)) / diameter;
}
