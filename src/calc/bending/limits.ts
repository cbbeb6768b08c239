import { STICKOUT_DIAMETERS } from '../caution.ts';
import { type CheckOf, figure, type State, verdict, worseOf } from '../check.ts';
import { FORCE_FACTOR } from '../force/index.ts';
import type { Mm, MPa } from '../units.ts';
import type { BentWork, Support } from './work.ts';

/** Wheels on one side push the bar away; opposed ones pinch it. */
export type ToolLayout = 'oneSided' | 'opposed';

/** Yield over the stress that is fine at the expected force. Judgement. */
export const YIELD_MARGIN = 1.5;
/** Share of a depth that may give way at the expected force. Judgement. */
export const GIVE_FINE = 0.1;
/** Share of a depth that must not give way even at the low force. Judgement. */
const GIVE_STOP = 0.3;

/**
 * Verdict on a stress that follows from a force known to a factor of 2.
 *
 *     σ ≤ Re/1.5 fine;  σ/2 > Re stop;  else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | σ (stress) | stress at the expected force | MPa | ≥ 0 |
 * | Re (yieldStrength) | yield strength | MPa | > 0 |
 * | → state | fine, watch or stop | - | |
 *
 * Assumes stress goes with the force.
 *
 * @source give-limits (yield/1.5 at the expected force, yield at the low one)
 * @example stressState(mpa(200), mpa(370)) // "fine"
 * @example stressState(mpa(741), mpa(370)) // "stop"
 */
export function stressState(stress: MPa, yieldStrength: MPa): State {
  return verdict(stress, yieldStrength / YIELD_MARGIN, FORCE_FACTOR * yieldStrength);
}

/**
 * Verdict on how far the work gives way, the force being known to a factor of 2.
 *
 *     give ≤ 10 % of the depth fine;  give/2 > 30 % stop;  else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | give | how far the work gives way at the expected force | mm | ≥ 0 |
 * | depth | infeed, or tooth height of a ring | mm | > 0 |
 * | → state | fine, watch or stop | - | |
 *
 * Assumes the give goes with the force.
 *
 * @source give-limits (10 % at the expected force, 30 % at the low one)
 * @example giveState(mm(0.02), mm(0.3)) // "fine"
 * @example giveState(mm(0.19), mm(0.3)) // "stop"
 */
export function giveState(give: Mm, depth: Mm): State {
  return verdict(give, GIVE_FINE * depth, FORCE_FACTOR * GIVE_STOP * depth);
}

/**
 * Whether the bar stands the push of the wheels, straight enough and without staying bent.
 *
 *     the worse of stress against yield and depth difference against infeed
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | bent | deflection, depth difference and stress at the expected force, or null where wheels are opposed | - | |
 * | Re (yieldStrength) | yield strength | MPa | > 0 |
 * | z (infeed) | whole infeed | mm | > 0 |
 * | → check | bending, with its figures and limits | - | |
 *
 * Assumes opposed wheels push the bar nowhere.
 *
 * @source give-limits (stress and depth difference)
 * @example bendingCheck({ bent: { deflection: mm(0.02), depthDifference: mm(0.01), stress: mpa(200) }, yieldStrength: mpa(370), infeed: mm(0.3) }).state // "fine"
 */
export function bendingCheck(of: {
  readonly bent: BentWork | null;
  readonly yieldStrength: MPa;
  readonly infeed: Mm;
}): CheckOf<'bending'> {
  if (of.bent === null) return { name: 'bending', state: 'fine', reason: 'opposed', figures: {} };
  const byStress = stressState(of.bent.stress, of.yieldStrength);
  const byDepth = giveState(of.bent.depthDifference, of.infeed);
  const state = worseOf(byStress, byDepth);
  const bends = state === byStress;
  return {
    name: 'bending',
    state,
    reason: state === 'fine' ? 'holds' : bends ? 'staysBent' : 'pushedAway',
    figures: {
      bendingStress: figure(of.bent.stress, 'MPa'),
      stressFineTo: figure(of.yieldStrength / YIELD_MARGIN, 'MPa'),
      yieldStrength: figure(of.yieldStrength, 'MPa'),
      deflection: figure(of.bent.deflection, 'mm'),
      depthDifference: figure(of.bent.depthDifference, 'mm'),
      differenceFineTo: figure(GIVE_FINE * of.infeed, 'mm'),
    },
  };
}

/**
 * Whether the bar sticks out too far to be left without support.
 *
 *     one-sided, out > 3 D and nothing holds the end: watch, else fine
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | out (stickout) | from the chuck to the end of the bar | mm | > 0 |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | support | chuck, tailstock or centres | - | |
 * | layout | one-sided or opposed wheels | - | |
 * | → check | stickout, in mm and in diameters | - | |
 *
 * Assumes a tailstock or centres are the support that is wanted.
 *
 * @source give-limits (overhang of 3 diameters)
 * @example stickoutCheck({ stickout: mm(80), diameter: mm(25), support: 'chuck', layout: 'oneSided' }).state // "watch"
 */
export function stickoutCheck(of: {
  readonly stickout: Mm;
  readonly diameter: Mm;
  readonly support: Support;
  readonly layout: ToolLayout;
}): CheckOf<'stickout'> {
  const figures = {
    stickout: figure(of.stickout, 'mm'),
    diameters: figure(of.stickout / of.diameter, '1'),
    diametersFineTo: figure(STICKOUT_DIAMETERS, '1'),
  };
  const say = (state: State, reason: CheckOf<'stickout'>['reason']) =>
    ({ name: 'stickout', state, reason, figures }) as const;
  if (of.stickout <= STICKOUT_DIAMETERS * of.diameter + 1e-9) return say('fine', 'short');
  if (of.layout === 'opposed') return say('fine', 'opposed');
  return of.support === 'chuck' ? say('watch', 'long') : say('fine', 'supported');
}
