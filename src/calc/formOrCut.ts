import { type CheckOf, figure } from './check.ts';
import type { Material } from './materials/index.ts';
import type { Process } from './speed.ts';
import { within } from './units.ts';

export type FormRating = 'yes' | 'marginal' | 'no';

const WORSE: readonly FormRating[] = ['yes', 'marginal', 'no'];
const worse = (a: FormRating, b: FormRating): FormRating =>
  WORSE.indexOf(a) >= WORSE.indexOf(b) ? a : b;

/**
 * How well a metal takes forming, by what it stretches and how hard it is.
 *
 *     elongation ≥ 12 % and HB ≤ 250 yes; 5–12 % or 250–300 marginal; else no
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | A (elongation) | elongation at fracture | % | ≥ 0 |
 * | HB (hardness) | Brinell hardness | HB | > 0 |
 * | → rating | yes, marginal or no | - | |
 *
 * Assumes a metal without a problem of its own (lead, porosity, galling).
 *
 * @source form-or-cut (12 %, 250 and 300 HB)
 * @example formRatingByNumbers(15, 126) // "yes"
 * @example formRatingByNumbers(10, 320) // "no"
 */
export function formRatingByNumbers(elongation: number, hardness: number): FormRating {
  within('elongation', elongation, 0, 1000, '%');
  within('hardness', hardness, 0, 2000, 'HB');
  if (elongation < 5 || hardness > 300) return 'no';
  return elongation >= 12 && hardness <= 250 ? 'yes' : 'marginal';
}

/**
 * How well this bar takes forming, its own hardness taken before the table's where it is known.
 *
 *     the rule by numbers, and never better than a problem the table names
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | material | row of the materials table | - | |
 * | HB (hardness) | hardness measured on the bar, or null | HB | > 0 |
 * | → rating | yes, marginal or no | - | |
 *
 * Assumes a hardness that was measured replaces the table's and leaves its elongation.
 *
 * @source form-or-cut (12 %, 250 and 300 HB)
 * @example formRating(MATERIALS[0], 320) // "no"
 */
export function formRating(material: Material, hardness: number | null): FormRating {
  const table = material.formKnurl;
  const listed = material.hardness.value;
  if (hardness === null || listed === null) return table;
  const byTable = formRatingByNumbers(material.elongation.value, listed);
  const byBar = formRatingByNumbers(material.elongation.value, hardness);
  return table === byTable ? byBar : worse(table, byBar);
}

/**
 * Whether the material suits the way it is to be knurled.
 *
 *     forming: yes fine, marginal watch, no stop; cutting: fine
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | material | row of the materials table | - | |
 * | HB (hardness) | hardness measured on the bar, or null | HB | > 0 |
 * | process | form or cut | - | |
 * | → check | material | - | |
 *
 * Assumes the rating of the table where nothing is measured.
 *
 * @source form-or-cut (rating by elongation and hardness)
 * @example materialCheck(MATERIALS[0], null, 'form').state // "fine"
 */
export function materialCheck(
  material: Material,
  hardness: number | null,
  process: Process,
): CheckOf<'material'> {
  const listed = hardness ?? material.hardness.value;
  const figures = {
    hardness: listed === null ? null : figure(listed, 'HB'),
    elongation: figure(material.elongation.value, '%'),
  };
  if (process === 'cut') return { name: 'material', state: 'fine', reason: 'cuts', figures };
  switch (formRating(material, hardness)) {
    case 'yes':
      return { name: 'material', state: 'fine', reason: 'forms', figures };
    case 'marginal':
      return { name: 'material', state: 'watch', reason: 'marginal', figures };
    case 'no':
      return { name: 'material', state: 'stop', reason: 'doesNotForm', figures };
  }
}
