import { GIVE_FINE, giveState, stressState, YIELD_MARGIN } from '../bending/index.ts';
import { type CheckOf, figure, worseOf } from '../check.ts';
import type { Mm, MPa } from '../units.ts';
import { type PinchedRing, THIN_RING_BELOW } from './thinRing.ts';

/**
 * Whether a tube stands the pinch of the wheels, round enough and without being crushed.
 *
 *     the worse of stress against yield and closing against tooth height; fine on a plug
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | ring | closing and stresses at the expected force, or null where a plug carries the wall | - | |
 * | t (wall) | wall under the groove root | mm | > 0 |
 * | R (meanRadius) | mean radius of that wall | mm | > 0 |
 * | Re (yieldStrength) | yield strength | MPa | > 0 |
 * | H (toothHeight) | tooth height | mm | > 0 |
 * | → check | ring, with its figures and limits; thinBelow where t/R lies outside the formula | - | |
 *
 * Assumes a thin ring; of a thick one the figures are too rough to trust, and the check says so.
 *
 * @source give-limits (stress and closing)
 * @source ring (t/R under 0.2)
 * @example ringCheck({ ring: null, wall: mm(2), meanRadius: mm(11), yieldStrength: mpa(370), toothHeight: mm(0.5) }).reason // "plugged"
 */
export function ringCheck(of: {
  readonly ring: PinchedRing | null;
  readonly wall: Mm;
  readonly meanRadius: Mm;
  readonly yieldStrength: MPa;
  readonly toothHeight: Mm;
}): CheckOf<'ring'> {
  const ratio = of.wall / of.meanRadius;
  const wall = { wall: figure(of.wall, 'mm'), wallOverRadius: figure(ratio, '1') };
  if (of.ring === null) return { name: 'ring', state: 'fine', reason: 'plugged', figures: wall };
  const outside = ratio >= THIN_RING_BELOW;
  const byStress = stressState(of.ring.stress, of.yieldStrength);
  const byClosing = giveState(of.ring.closing, of.toothHeight);
  const state = worseOf(byStress, byClosing);
  const crushed = state === byStress;
  const fine = outside ? 'thickWall' : 'holds';
  return {
    name: 'ring',
    state,
    reason: state === 'fine' ? fine : crushed ? 'crushed' : 'outOfRound',
    figures: {
      ...wall,
      thinBelow: outside ? figure(THIN_RING_BELOW, '1') : null,
      ringStress: figure(of.ring.stress, 'MPa'),
      stressFineTo: figure(of.yieldStrength / YIELD_MARGIN, 'MPa'),
      yieldStrength: figure(of.yieldStrength, 'MPa'),
      ringClosing: figure(of.ring.closing, 'mm'),
      closingFineTo: figure(GIVE_FINE * of.toothHeight, 'mm'),
    },
  };
}
