import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  ordinaryPinHeat,
  pinBearing,
  pinHeat,
  pinHeatCheck,
  pinHeatIndex,
  pinPressureCheck,
  pinSliding,
  wheelRotation,
  wheelWarmUp,
} from '../../src/calc/pin/index.ts';
import { spindleSpeed } from '../../src/calc/speed.ts';
import {
  kelvin,
  mm,
  mPerMin,
  mpa,
  newton,
  OutOfRange,
  revPerMin,
  seconds,
  watt,
} from '../../src/calc/units.ts';
import { PIN_REFERENCE as D1 } from '../reference/force.ts';
import { sixDigits } from '../support/digits.ts';
import { near } from '../support/near.ts';

describe('the pin', () => {
  const work = spindleSpeed(mPerMin(D1.surfaceSpeed), mm(D1.workDiameter));
  const wheel = wheelRotation(work, mm(D1.workDiameter), mm(D1.wheelDiameter));
  const sliding = pinSliding(mm(D1.pinDiameter), wheel);
  const pressure = pinBearing(newton(D1.force), mm(D1.pinDiameter), mm(D1.face));
  const heat = pinHeat(newton(D1.force), sliding);

  // evidence: worked example D1
  it('turns, slides, bears and warms as in the worked example', () => {
    expect(sixDigits(work)).toBe(D1.workRotation);
    expect(sixDigits(wheel)).toBe(D1.wheelRotation);
    expect(sixDigits(sliding)).toBe(D1.sliding);
    expect(sixDigits(pressure)).toBe(D1.pressure);
    expect(sixDigits(heat)).toBe(D1.heat);
    expect(sixDigits(ordinaryPinHeat())).toBe(D1.ordinary);
    expect(sixDigits(pinHeatIndex(pressure, sliding, 'hardened'))).toBe(D1.index);
    const warmUp = wheelWarmUp({
      heat,
      time: seconds(10),
      wheelDiameter: mm(D1.wheelDiameter),
      pinDiameter: mm(D1.pinDiameter),
      face: mm(D1.face),
    });
    expect(sixDigits(warmUp)).toBe(D1.warmUp);
  });

  it('of carbide counts for two thirds', () => {
    near(pinHeatIndex(pressure, sliding, 'carbide'), 2 / 3, 1e-9);
  });

  it('is as hot as force and speed, and no hotter on work of another diameter', () => {
    const index = (force: number, speed: number, diameter: number) => {
      const n = spindleSpeed(mPerMin(speed), mm(diameter));
      const v = pinSliding(mm(6), wheelRotation(n, mm(diameter), mm(20)));
      return pinHeatIndex(pinBearing(newton(force), mm(6), mm(8)), v, 'hardened');
    };
    const some = fc.double({ min: 1, max: 100, noNaN: true });
    fc.assert(
      fc.property(some, some, (speed, diameter) => {
        near(index(4000, speed, diameter), speed / 30.48, 1e-9);
        near(index(8000, speed, diameter), (2 * speed) / 30.48, 1e-9);
      }),
    );
  });
});

describe('the checks of the pin', () => {
  it('stop only where half the force is still twice too hot, and not in a short cut', () => {
    const at = (index: number, warmUp: number | null) =>
      pinHeatCheck({ index, warmUp: warmUp === null ? null : kelvin(warmUp) });
    expect(at(1, 100)).toMatchObject({ state: 'fine', reason: 'cool' });
    expect(at(1.1, 100)).toMatchObject({ state: 'watch', reason: 'warm' });
    expect(at(4, 100)).toMatchObject({ state: 'watch', reason: 'warm' });
    expect(at(4.1, 59)).toMatchObject({ state: 'watch', reason: 'hotButShort' });
    expect(at(4.1, 60)).toMatchObject({ state: 'stop', reason: 'hot' });
    expect(at(4.1, null)).toMatchObject({ state: 'stop', reason: 'hot' });
  });

  it('watch a pressure above 100 MPa', () => {
    expect(pinPressureCheck(mpa(100))).toMatchObject({ state: 'fine', reason: 'within' });
    expect(pinPressureCheck(mpa(101))).toMatchObject({ state: 'watch', reason: 'high' });
    expect(pinPressureCheck(mpa(1000)).state).toBe('watch');
  });
});

describe('senseless arguments', () => {
  it.each<[string, () => unknown]>([
    ['no wheel', () => wheelRotation(revPerMin(100), mm(25), mm(0))],
    ['no pin', () => pinSliding(mm(0), revPerMin(100))],
    ['no face', () => pinBearing(newton(100), mm(6), mm(0))],
    ['a negative force', () => pinHeat(newton(-1), 0.1)],
    ['a pressure that is no number', () => pinHeatIndex(mpa(Number.NaN), 0.1, 'hardened')],
    [
      'a pin larger than the wheel',
      () =>
        wheelWarmUp({
          heat: watt(1),
          time: seconds(1),
          wheelDiameter: mm(20),
          pinDiameter: mm(21),
          face: mm(8),
        }),
    ],
  ])('refuse %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });
});
