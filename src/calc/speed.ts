import { type CheckOf, figure, verdict } from './check.ts';
import {
  feetPerMinute,
  type Mm,
  type MPerMin,
  mPerMin,
  type RevPerMin,
  revPerMin,
  within,
} from './units.ts';

export type Process = 'form' | 'cut';
export type PinMaterial = 'hardened' | 'carbide';

/** Forming with hardened pins stays at or under this. Common practice. */
export const FORMING_CAP: MPerMin = feetPerMinute(100);
/** What carbide pins allow more. Judgement. */
export const CARBIDE_FACTOR = 1.5;
/** How far up the band the card starts. Judgement. */
export const BAND_SHARE = 0.25;
/** Above this many times the limit the check stops. Judgement. */
export const SPEED_STOP_FACTOR = 1.5;

export type Band = readonly [low: MPerMin, high: MPerMin];

const cap = (pin: PinMaterial): MPerMin =>
  mPerMin(pin === 'carbide' ? FORMING_CAP * CARBIDE_FACTOR : FORMING_CAP);

/**
 * Surface speed not to pass with this material, process and pin.
 *
 *     forming: min(top of the band, 100 ft/min × 1 or 1.5); cutting: top of the band
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | band | slowest and fastest speed for the material and process | - | |
 * | process | form or cut | - | |
 * | pin | hardened or carbide | - | |
 * | → v | limit | m/min | |
 *
 * Assumes a pin in good order and oil on it.
 *
 * @source speed-limit (100 ft/min with hardened pins)
 * @source judgement (1.5 times that with carbide)
 * @source speed-band (bands by material)
 * @example speedLimit([mPerMin(20), mPerMin(40)], 'form', 'hardened') // 30.48 m/min
 */
export function speedLimit(band: Band, process: Process, pin: PinMaterial): MPerMin {
  if (process === 'cut') return band[1];
  const limit = cap(pin);
  return limit < band[0] ? limit : mPerMin(Math.min(band[1], limit));
}

/**
 * Surface speed to start with: a quarter of the way up the band.
 *
 *     v = v_lo + (v_hi − v_lo)/4, v_hi capped when forming
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | band | slowest and fastest speed for the material and process | - | |
 * | process | form or cut | - | |
 * | pin | hardened or carbide | - | |
 * | → v | surface speed | m/min | |
 *
 * Assumes nothing is known that speaks for more.
 *
 * @source speed-band (judgement inside a general envelope)
 * @source speed-limit (cap)
 * @example startingSpeed([mPerMin(20), mPerMin(40)], 'form', 'hardened') // 22.62 m/min
 */
export function startingSpeed(band: Band, process: Process, pin: PinMaterial): MPerMin {
  const high = speedLimit(band, process, pin);
  if (high < band[0]) return high;
  return mPerMin(band[0] + BAND_SHARE * (high - band[0]));
}

/**
 * Spindle speed for a surface speed.
 *
 *     n = 1000 v/(π D)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | v (speed) | surface speed | m/min | ≥ 0 |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | → n | spindle speed | rev/min | |
 *
 * Assumes the speed is meant at the blank's surface.
 *
 * @source whole-tooth (circumference of the blank)
 * @example spindleSpeed(mPerMin(25), mm(20)) // 397.887 rev/min
 */
export function spindleSpeed(speed: MPerMin, diameter: Mm): RevPerMin {
  within('speed', speed, 0, 1e6, 'm/min');
  within('diameter', diameter, Number.MIN_VALUE, 1e6, 'mm');
  return revPerMin((1000 * speed) / (Math.PI * diameter));
}

/**
 * Surface speed of a spindle speed.
 *
 *     v = π D n/1000
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | n (rotation) | spindle speed | rev/min | ≥ 0 |
 * | D (diameter) | diameter of the blank | mm | > 0 |
 * | → v | surface speed | m/min | |
 *
 * Assumes the speed is meant at the blank's surface.
 *
 * @source whole-tooth (circumference of the blank)
 * @example surfaceSpeed(revPerMin(397.887), mm(20)) // 25.0000 m/min
 */
export function surfaceSpeed(rotation: RevPerMin, diameter: Mm): MPerMin {
  within('rotation', rotation, 0, 1e6, 'rev/min');
  within('diameter', diameter, Number.MIN_VALUE, 1e6, 'mm');
  return mPerMin((Math.PI * diameter * rotation) / 1000);
}

/**
 * Whether the work runs slowly enough.
 *
 *     v ≤ limit fine, ≤ 1.5 limit watch, else stop
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | v (speed) | surface speed, or null where forming is stopped | m/min | ≥ 0 |
 * | limit | speed not to pass | m/min | > 0 |
 * | → check | speed, with surfaceSpeed and speedLimit | - | |
 *
 * Assumes slower than the band does no harm.
 *
 * @source speed-limit (100 ft/min with hardened pins)
 * @source judgement (1.5 times the limit stops)
 * @example speedCheck(mPerMin(40), mPerMin(30.48)).state // "watch"
 */
export function speedCheck(speed: MPerMin, limit: MPerMin): CheckOf<'speed'> {
  const state = verdict(speed - 1e-9, limit, SPEED_STOP_FACTOR * limit);
  return {
    name: 'speed',
    state,
    reason: state === 'fine' ? 'within' : state === 'watch' ? 'overLimit' : 'farOverLimit',
    figures: { surfaceSpeed: figure(speed, 'm/min'), speedLimit: figure(limit, 'm/min') },
  };
}
