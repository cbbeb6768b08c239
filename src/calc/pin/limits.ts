import { HOT_WARM_UP } from '../caution.ts';
import { type CheckOf, figure, verdict } from '../check.ts';
import { FORCE_FACTOR } from '../force/index.ts';
import { CARBIDE_FACTOR, type PinMaterial } from '../speed.ts';
import { type Kelvin, type MPa, within } from '../units.ts';
import { ordinaryPinHeat, PIN_FRICTION } from './pin.ts';

/** Index up to which a pin stands it. Judgement: what is called an ordinary plunge. */
const PIN_INDEX_FINE = 1;
/** Index that a pin does not stand even at the low force. Judgement. */
const PIN_INDEX_STOP = 2;
/** Pressure on the pin from which it is watched. Judgement. */
export const PIN_PRESSURE_FINE = 100 as MPa;

/**
 * Heat on a pin against that of an ordinary plunge at the trade's limit.
 *
 *     μ P v/1.524;  carbide divides by 1.5
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | P (pressure) | pressure on the pin | MPa | ≥ 0 |
 * | v (sliding) | sliding speed | m/s | ≥ 0 |
 * | pin | hardened or carbide | - | |
 * | → index | 1 for the ordinary plunge | - | |
 *
 * Assumes oil on the pin; no absolute limit is to be had, so this is a comparison.
 *
 * @source pin-index (ordinary plunge is 1, carbide divides by 1.5)
 * @example pinHeatIndex(mpa(83.3333), 0.1524, 'hardened') // 1.000
 */
export function pinHeatIndex(pressure: MPa, sliding: number, pin: PinMaterial): number {
  within('pressure', pressure, 0, 1e6, 'MPa');
  within('sliding', sliding, 0, 1e6, 'm/s');
  const index = (PIN_FRICTION * pressure * sliding) / ordinaryPinHeat();
  return pin === 'carbide' ? index / CARBIDE_FACTOR : index;
}

/**
 * Whether the pin stands the heat of the cut.
 *
 *     index ≤ 1 fine;  index/2 > 2 stop, watch where the wheel warms by less than 60 K;  else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | index | heat against an ordinary plunge, at the expected force | - | ≥ 0 |
 * | ΔT (warmUp) | warm-up of the wheel in the whole cut, or null where the time is not known | K | ≥ 0 |
 * | → check | pinHeat, with index and warm-up | - | |
 *
 * Assumes a cold wheel: it stands for seconds what it would not stand for long.
 *
 * @source pin-index (1, 2 and 60 K)
 * @example pinHeatCheck({ index: 0.6, warmUp: kelvin(15) }).state // "fine"
 * @example pinHeatCheck({ index: 5, warmUp: kelvin(15) }).reason // "hotButShort"
 * @example pinHeatCheck({ index: 5, warmUp: kelvin(90) }).state // "stop"
 */
export function pinHeatCheck(of: {
  readonly index: number;
  readonly warmUp: Kelvin | null;
}): CheckOf<'pinHeat'> {
  const figures = {
    pinHeatIndex: figure(of.index, '1'),
    indexFineTo: figure(PIN_INDEX_FINE, '1'),
    wheelWarmUp: of.warmUp === null ? null : figure(of.warmUp, 'K'),
  };
  const say = (state: CheckOf<'pinHeat'>['state'], reason: CheckOf<'pinHeat'>['reason']) =>
    ({ name: 'pinHeat', state, reason, figures }) as const;
  switch (verdict(of.index, PIN_INDEX_FINE + 1e-9, FORCE_FACTOR * PIN_INDEX_STOP)) {
    case 'fine':
      return say('fine', 'cool');
    case 'watch':
      return say('watch', 'warm');
    case 'stop':
      return of.warmUp !== null && of.warmUp < HOT_WARM_UP
        ? say('watch', 'hotButShort')
        : say('stop', 'hot');
  }
}

/**
 * Whether the pin stands the pressure of the wheel.
 *
 *     P ≤ 100 MPa fine, else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | P (pressure) | pressure on the pin | MPa | ≥ 0 |
 * | → check | pinPressure | - | |
 *
 * Assumes a hardened pin and a hardened bore.
 *
 * @source pin-index (100 MPa is watched)
 * @example pinPressureCheck(mpa(67)).state // "fine"
 */
export function pinPressureCheck(pressure: MPa): CheckOf<'pinPressure'> {
  const state = verdict(pressure, PIN_PRESSURE_FINE, Number.POSITIVE_INFINITY);
  return {
    name: 'pinPressure',
    state,
    reason: state === 'fine' ? 'within' : 'high',
    figures: {
      pinPressure: figure(pressure, 'MPa'),
      pressureFineTo: figure(PIN_PRESSURE_FINE, 'MPa'),
    },
  };
}
