import {
  type Mm,
  type Newton,
  type NewtonMm,
  newton,
  newtonMm,
  type RevPerMin,
  type Watt,
  watt,
  within,
} from '../units.ts';

/** No published force was found to hold the model against: it is known to this factor. Judgement. */
export const FORCE_FACTOR = 2;

/**
 * The band in which a force lies that is known to a factor of 2.
 *
 *     F/2, F, 2F
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | F (force) | expected force | N | ≥ 0 |
 * | → low, expected, high | band of the force | N | |
 *
 * Assumes the force is as likely to be twice as half of what is expected.
 *
 * @source force-model (known to a factor of 2)
 * @example forceBand(newton(3000)).high // 6000 N
 */
export function forceBand(force: Newton): {
  readonly low: Newton;
  readonly expected: Newton;
  readonly high: Newton;
} {
  within('force', force, 0, 1e9, 'N');
  return {
    low: newton(force / FORCE_FACTOR),
    expected: force,
    high: newton(force * FORCE_FACTOR),
  };
}

/**
 * Torque on the work from one wheel that rolls in it.
 *
 *     T = F (L/2)(1 + Dp/Dw)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | F (force) | force square to the work | N | ≥ 0 |
 * | L (arc) | contact arc | mm | ≥ 0 |
 * | Dw (wheelDiameter) | diameter of the wheel | mm | > 0 |
 * | Dp (workDiameter) | diameter of the blank | mm | > 0 |
 * | → T | torque on the work | N·mm | |
 *
 * Assumes the wheel idles, so the force passes through its axis, and bears in the middle of the arc.
 *
 * @source force-model (lever of the force about the work's axis)
 * @example wheelTorque({ force: newton(4085.63), arc: mm(0.471405), wheelDiameter: mm(20), workDiameter: mm(25) }) // 2166.73 N·mm
 */
export function wheelTorque(of: {
  readonly force: Newton;
  readonly arc: Mm;
  readonly wheelDiameter: Mm;
  readonly workDiameter: Mm;
}): NewtonMm {
  within('force', of.force, 0, 1e9, 'N');
  within('wheelDiameter', of.wheelDiameter, Number.MIN_VALUE, 1e6, 'mm');
  return newtonMm(of.force * (of.arc / 2) * (1 + of.workDiameter / of.wheelDiameter));
}

/**
 * Power that a torque takes at a spindle speed.
 *
 *     P = T 2π n/60000
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | T (torque) | torque on the work | N·mm | ≥ 0 |
 * | n (rotation) | spindle speed | rev/min | ≥ 0 |
 * | → P | power at the work | W | |
 *
 * Assumes nothing is lost in the drive.
 *
 * @source force-model (torque times angular speed)
 * @example drivePower(newtonMm(2166.73), revPerMin(300)) // 68.07 W
 */
export function drivePower(torque: NewtonMm, rotation: RevPerMin): Watt {
  within('torque', torque, 0, 1e12, 'N·mm');
  within('rotation', rotation, 0, 1e6, 'rev/min');
  return watt((torque * 2 * Math.PI * rotation) / 60_000);
}
