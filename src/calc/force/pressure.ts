import { isPolymer, type Material } from '../materials/index.ts';
import { type MPa, mpa, within } from '../units.ts';

/** One Brinell is one kgf/mm²; exact by definition of the kilogram-force. */
const MPA_PER_BRINELL = 9.80665;
/** How many times further than under a Brinell ball the metal is strained. From memory. */
const STRAIN_RATIO = 2.5;
/** Pressure over yield on plastics, which have no Brinell hardness. Judgement. */
const PLASTIC_PRESSURE = 3;

/**
 * Pressure under a tooth that is rolled into metal.
 *
 *     q = 9.80665 HB 2.5ⁿ
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | HB (hardness) | Brinell hardness | HB | > 0 |
 * | n (strainHardening) | strain-hardening exponent | - | 0 to 1 |
 * | → q | pressure on the ground the teeth have won | MPa | |
 *
 * Assumes Brinell hardness is the pressure at which metal gives way under a blunt body.
 *
 * @source hardness-as-yield (9.80665 HB)
 * @source work-hardening (2.5ⁿ)
 * @example metalPressure(126, 0.1) // 1354.21 MPa
 */
export function metalPressure(hardness: number, strainHardening: number): MPa {
  within('hardness', hardness, Number.MIN_VALUE, 2000, 'HB');
  within('strainHardening', strainHardening, 0, 1);
  return mpa(MPA_PER_BRINELL * hardness * STRAIN_RATIO ** strainHardening);
}

/**
 * Pressure under a tooth that is rolled into a plastic.
 *
 *     q = 3 Re
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Re (yieldStrength) | yield strength | MPa | > 0 |
 * | → q | pressure on the ground the teeth have won | MPa | |
 *
 * Assumes the plastic does not spring back before the wheel has passed.
 *
 * @source plastic-pressure (three times yield)
 * @example plasticPressure(mpa(72)) // 216 MPa
 */
export function plasticPressure(yieldStrength: MPa): MPa {
  within('yieldStrength', yieldStrength, Number.MIN_VALUE, 1e5, 'MPa');
  return mpa(PLASTIC_PRESSURE * yieldStrength);
}

/**
 * Pressure under a tooth in this bar, its own hardness taken before the table's where it is known.
 *
 *     metals 9.80665 HB 2.5ⁿ;  plastics 3 Re
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | material | row of the materials table | - | |
 * | HB (hardness) | hardness measured on the bar, or null | HB | > 0 |
 * | → q | pressure on the ground the teeth have won | MPa | |
 *
 * Assumes a hardness that was measured leaves the exponent of the table; of plastics it says nothing.
 *
 * @source hardness-as-yield (metals)
 * @source work-hardening (metals)
 * @source plastic-pressure (plastics)
 * @example rollingPressure(materialById('steel-lowC-CD'), null) // 1354.21 MPa
 * @example rollingPressure(materialById('pom'), null) // 216 MPa
 */
export function rollingPressure(material: Material, hardness: number | null): MPa {
  const brinell = hardness ?? material.hardness.value;
  if (isPolymer(material) || brinell === null) return plasticPressure(material.yield.value);
  return metalPressure(brinell, material.strainHardening.value ?? 0);
}
