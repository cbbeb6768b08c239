import { bendingCheck, stickoutCheck } from '../bending/index.ts';
import type { Check } from '../check.ts';
import { capacityCheck, forceBand, widthCheck } from '../force/index.ts';
import { pinHeatCheck, pinPressureCheck } from '../pin/index.ts';
import { ringCheck } from '../ring/index.ts';
import type { Load, Pressing } from './load.ts';

const workChecks = (p: Pressing, load: Load): readonly (Check | null)[] => {
  const { request } = p;
  const yieldStrength = request.material.yield.value;
  const { stickout, support } = request;
  return [
    stickout === null
      ? null
      : bendingCheck({ bent: load.bent, yieldStrength, infeed: p.tooth.infeed }),
    load.tube === null
      ? null
      : ringCheck({ ...load.tube, yieldStrength, toothHeight: p.tooth.height }),
    stickout === null
      ? null
      : stickoutCheck({
          stickout,
          diameter: p.diameter,
          support,
          layout: request.layout ?? 'oneSided',
        }),
    load.knurlWidth === null ? null : widthCheck(load.knurlWidth, p.diameter),
  ];
};

const machineCheck = (p: Pressing, load: Load): Check | null => {
  const { machine } = p.request;
  if (machine === null || (machine.torque === null && machine.power === null)) return null;
  return capacityCheck({
    torque: load.torque,
    power: load.power,
    torqueLimit: machine.torque,
    powerLimit: machine.power,
  });
};

/** Checks of pin, work and machine; one that lacks what it needs is absent. */
export const loadChecks = (p: Pressing, load: Load): readonly (Check | null)[] => [
  load.pin.index === null ? null : pinHeatCheck({ index: load.pin.index, warmUp: load.pin.warmUp }),
  pinPressureCheck(load.pin.pressure),
  ...workChecks(p, load),
  machineCheck(p, load),
];

export const loadFigures = (load: Load) => {
  const band = forceBand(load.radialForce);
  return {
    radialForce: band.expected,
    radialForceLow: band.low,
    radialForceHigh: band.high,
    torque: load.torque,
    power: load.power,
    deflection: load.bent?.deflection ?? null,
    bendingStress: load.bent?.stress ?? null,
    ringStress: load.tube?.ring?.stress ?? null,
    ringClosing: load.tube?.ring?.closing ?? null,
    pinHeatIndex: load.pin.index,
    pinPressure: load.pin.pressure,
    wheelSpeed: load.pin.rotation,
    wheelWarmUp: load.pin.warmUp,
  };
};
