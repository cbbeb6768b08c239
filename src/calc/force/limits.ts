import { type CheckOf, figure, type State, verdict, worseOf } from '../check.ts';
import type { Mm, NewtonMm, Watt } from '../units.ts';
import { FORCE_FACTOR } from './torque.ts';

/** Within the machine at the expected force fine; past it even at the low force stop. */
const against = (value: number | null, limit: number | null): State =>
  value === null || limit === null ? 'fine' : verdict(value, limit, FORCE_FACTOR * limit);

/**
 * Whether the machine can turn the work against the wheels.
 *
 *     at the expected force within its limits fine; past them even at half of it stop; else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | T (torque) | torque of all the wheels on the work | N·mm | ≥ 0 |
 * | P (power) | power at the work, or null where the speed is not known | W | ≥ 0 |
 * | T_m (torqueLimit) | torque of the machine, or null where not known | N·mm | > 0 |
 * | P_m (powerLimit) | power of the machine, or null where not known | W | > 0 |
 * | → check | capacity, with both figures and both limits | - | |
 *
 * Assumes the limits are those at the spindle.
 *
 * @source force-model (torque and power)
 * @source judgement (watch past the limit, stop past it at half the force)
 * @example capacityCheck({ torque: newtonMm(2200), power: watt(70), torqueLimit: null, powerLimit: watt(500) }).state // "fine"
 */
export function capacityCheck(of: {
  readonly torque: NewtonMm;
  readonly power: Watt | null;
  readonly torqueLimit: NewtonMm | null;
  readonly powerLimit: Watt | null;
}): CheckOf<'capacity'> {
  const byTorque = against(of.torque, of.torqueLimit);
  const state = worseOf(byTorque, against(of.power, of.powerLimit));
  return {
    name: 'capacity',
    state,
    reason: state === 'fine' ? 'within' : state === byTorque ? 'overTorque' : 'overPower',
    figures: {
      torque: figure(of.torque, 'N·mm'),
      torqueLimit: of.torqueLimit === null ? null : figure(of.torqueLimit, 'N·mm'),
      power: of.power === null ? null : figure(of.power, 'W'),
      powerLimit: of.powerLimit === null ? null : figure(of.powerLimit, 'W'),
    },
  };
}

/**
 * Whether the knurl is no wider than the work is thick.
 *
 *     w ≤ D fine, else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | w (width) | width of the knurl along the work | mm | > 0 |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | → check | width | - | |
 *
 * Assumes nothing of how the work is held.
 *
 * @source asme-b94.6 (a knurl no wider than the blank diameter)
 * @example widthCheck(mm(6), mm(25)).state // "fine"
 * @example widthCheck(mm(30), mm(25)).state // "watch"
 */
export function widthCheck(width: Mm, diameter: Mm): CheckOf<'width'> {
  const wide = width > diameter + 1e-9;
  return {
    name: 'width',
    state: wide ? 'watch' : 'fine',
    reason: wide ? 'wide' : 'within',
    figures: { knurlWidth: figure(width, 'mm'), blankDiameter: figure(diameter, 'mm') },
  };
}
