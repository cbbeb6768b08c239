import { FORMING_CAP } from '../speed.ts';
import {
  type Kelvin,
  kelvin,
  type Mm,
  type MPa,
  mm,
  mpa,
  type Newton,
  newton,
  type RevPerMin,
  revPerMin,
  type Seconds,
  type Watt,
  watt,
  within,
} from '../units.ts';

/** Rubbing of an oiled wheel on its pin. Judgement. */
export const PIN_FRICTION = 0.12;
/** Density of a wheel, kg/mm³. From memory: steel. */
const WHEEL_DENSITY = 7.85e-6;
/** Heat a wheel takes up, J/(kg K). From memory: steel. */
const WHEEL_HEAT_CAPACITY = 470;

/**
 * Rotation of the wheel on its pin.
 *
 *     n_w = n D/Dw
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | n (rotation) | spindle speed | rev/min | ≥ 0 |
 * | D (workDiameter) | diameter of the blank | mm | > 0 |
 * | Dw (wheelDiameter) | diameter of the wheel | mm | > 0 |
 * | → n_w | rotation of the wheel | rev/min | |
 *
 * Assumes the wheel rolls without slip.
 *
 * @source pin-heat (rolling)
 * @example wheelRotation(revPerMin(388.083), mm(25), mm(20)) // 485.104 rev/min
 */
export function wheelRotation(rotation: RevPerMin, workDiameter: Mm, wheelDiameter: Mm): RevPerMin {
  within('rotation', rotation, 0, 1e6, 'rev/min');
  within('workDiameter', workDiameter, Number.MIN_VALUE, 1e6, 'mm');
  within('wheelDiameter', wheelDiameter, Number.MIN_VALUE, 1e6, 'mm');
  return revPerMin((rotation * workDiameter) / wheelDiameter);
}

/**
 * Speed at which the wheel's bore slides on the pin.
 *
 *     v = π d n_w/60000
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | d (pinDiameter) | diameter of the pin | mm | > 0 |
 * | n_w (rotation) | rotation of the wheel | rev/min | ≥ 0 |
 * | → v | sliding speed | m/s | |
 *
 * Assumes the pin stands still.
 *
 * @source pin-heat (circumference of the pin)
 * @example pinSliding(mm(6), revPerMin(485.104)) // 0.1524 m/s
 */
export function pinSliding(pinDiameter: Mm, rotation: RevPerMin): number {
  within('pinDiameter', pinDiameter, Number.MIN_VALUE, 1e6, 'mm');
  within('rotation', rotation, 0, 1e6, 'rev/min');
  return (Math.PI * pinDiameter * rotation) / 60_000;
}

/**
 * Pressure of the wheel on its pin.
 *
 *     P = F/(d w)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | F (force) | force of the wheel | N | ≥ 0 |
 * | d (pinDiameter) | diameter of the pin | mm | > 0 |
 * | w (face) | face of the wheel | mm | > 0 |
 * | → P | pressure on the pin's projected area | MPa | |
 *
 * Assumes the bore bears on its whole length.
 *
 * @source pin-heat (projected area)
 * @example pinBearing(newton(4000), mm(6), mm(8)) // 83.3333 MPa
 */
export function pinBearing(force: Newton, pinDiameter: Mm, face: Mm): MPa {
  within('force', force, 0, 1e9, 'N');
  within('pinDiameter', pinDiameter, Number.MIN_VALUE, 1e6, 'mm');
  within('face', face, Number.MIN_VALUE, 1e6, 'mm');
  return mpa(force / (pinDiameter * face));
}

/**
 * Heat that rubbing makes on the pin.
 *
 *     Q = μ F v,  μ = 0.12
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | F (force) | force of the wheel | N | ≥ 0 |
 * | v (sliding) | sliding speed | m/s | ≥ 0 |
 * | → Q | heat | W | |
 *
 * Assumes oil on the pin.
 *
 * @source pin-heat (friction)
 * @source judgement (0.12)
 * @example pinHeat(newton(4000), 0.1524) // 73.152 W
 */
export function pinHeat(force: Newton, sliding: number): Watt {
  within('force', force, 0, 1e9, 'N');
  within('sliding', sliding, 0, 1e6, 'm/s');
  return watt(PIN_FRICTION * force * sliding);
}

/** The plunge that is called 1: 4000 N at 100 ft/min, a 20 × 8 wheel on a 6 mm pin. Judgement. */
const ORDINARY = { force: newton(4000), wheel: mm(20), face: mm(8), pin: mm(6) } as const;

/**
 * Heat on a square millimetre of pin in the plunge that is called 1.
 *
 *     μ P v at 4000 N, 100 ft/min, wheel 20 × 8, pin 6
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | → limit | heat over projected area | W/mm² | |
 *
 * Assumes the trade's limit of 100 ft/min is meant for an ordinary plunge in steel.
 *
 * @source pin-index (what is called 1)
 * @source speed-limit (100 ft/min)
 * @example ordinaryPinHeat() // 1.524 W/mm²
 */
export function ordinaryPinHeat(): number {
  const { force, wheel, face, pin } = ORDINARY;
  // The rims of wheel and work run alike; the pin's is slower by the ratio of its diameter.
  const sliding = ((FORMING_CAP / 60) * pin) / wheel;
  return pinHeat(force, sliding) / (pin * face);
}

/** Thickest pin a wheel can turn on, as a share of its diameter. Judgement: it needs a rim. */
const THICKEST_PIN = 0.9;

/**
 * How much warmer the whole wheel gets in a cut when no heat leaves it.
 *
 *     ΔT = Q t/(m c),  m = ρ π (Dw² − d²) w/4,  ρ = 7.85e-6 kg/mm³,  c = 470 J/(kg K)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Q (heat) | heat on the pin | W | ≥ 0 |
 * | t (time) | time of the cut | s | ≥ 0 |
 * | Dw (wheelDiameter) | diameter of the wheel | mm | > 0 |
 * | d (pinDiameter) | diameter of the pin | mm | 0 to 0.9 Dw |
 * | w (face) | face of the wheel | mm | > 0 |
 * | → ΔT | warm-up | K | |
 *
 * Assumes a steel wheel that was cold, and all the heat in it.
 *
 * @source pin-heat (heat over heat capacity)
 * @example wheelWarmUp({ heat: watt(73.152), time: seconds(10), wheelDiameter: mm(20), pinDiameter: mm(6), face: mm(8) }) // 86.6917 K
 */
export function wheelWarmUp(of: {
  readonly heat: Watt;
  readonly time: Seconds;
  readonly wheelDiameter: Mm;
  readonly pinDiameter: Mm;
  readonly face: Mm;
}): Kelvin {
  within('heat', of.heat, 0, 1e9, 'W');
  within('time', of.time, 0, 1e9, 's');
  within('wheelDiameter', of.wheelDiameter, Number.MIN_VALUE, 1e6, 'mm');
  within('pinDiameter', of.pinDiameter, 0, THICKEST_PIN * of.wheelDiameter, 'mm');
  within('face', of.face, Number.MIN_VALUE, 1e6, 'mm');
  const area = (Math.PI * (of.wheelDiameter ** 2 - of.pinDiameter ** 2)) / 4;
  const mass = WHEEL_DENSITY * area * of.face;
  return kelvin((of.heat * of.time) / (mass * WHEEL_HEAT_CAPACITY));
}
