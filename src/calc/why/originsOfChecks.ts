import type { CheckName } from '../check.ts';
import type { Origins } from './origin.ts';

/** How every check comes to fine, watch or stop. */
export const CHECK_ORIGINS: Readonly<Record<CheckName, Origins>> = {
  tracking: [
    {
      when: ['blank'],
      by: 'trackingCheck',
      inputs: { δ: 'toothError', p_t: 'transversePitch' },
      through: { N: 'toothCount' },
      given: { D: 'blankSaid' },
    },
    {
      by: 'trackingCheck',
      inputs: { δ: 'toothError', D: 'blankDiameter', p_t: 'transversePitch' },
      through: { N: 'toothCount' },
    },
  ],
  wheel: [
    {
      by: 'wheelCheck',
      inputs: { Δ: 'countDoubt', N: 'toothCount' },
      through: { u: 'countDoubt' },
    },
  ],
  runout: [{ by: 'runoutCheck', inputs: { e: 'eccentricity', z1: 'firstBite' } }],
  fill: [{ by: 'fillCheck', inputs: { x: 'fill' }, given: { own: 'ownFill' } }],
  feed: [
    {
      when: ['cut'],
      by: 'cutFeedCheck',
      parts: ['0.05 to 0.30 mm/rev fine, else watch'],
      also: ['feed'],
    },
    {
      by: 'formedFeedCheck',
      inputs: { f: 'feed', p: 'pitch' },
      also: ['feedLow', 'feedHigh'],
      through: { window: 'feedWindow', b: 'contactWidth' },
      given: { face: 'wheelFace', bevel: 'bevel', fewest: 'fewestTurns', most: 'mostTurns' },
    },
  ],
  edge: [{ by: 'edgeCheck' }],
  material: [
    {
      by: 'materialCheck',
      inputs: { elongation: 'elongation', HB: 'hardness' },
      through: { forming: 'formRatingByNumbers' },
    },
  ],
  speed: [
    {
      by: 'speedCheck',
      inputs: { v: 'surfaceSpeed', limit: 'speedLimit' },
      through: { limit: 'speedLimit' },
    },
  ],
  finish: [
    { by: 'finishCheck', inputs: { Do: 'crestDiameter', low: 'finishLow', high: 'finishHigh' } },
  ],
  pinHeat: [
    {
      by: 'pinHeatCheck',
      inputs: { index: 'pinHeatIndex' },
      also: ['wheelWarmUp'],
    },
  ],
  pinPressure: [{ by: 'pinPressureCheck', inputs: { P: 'pinPressure' } }],
  bending: [
    {
      by: 'bendingCheck',
      inputs: {
        σ: 'bendingStress',
        Re: 'yieldStrength',
        give: 'depthDifference',
        depth: 'infeed',
      },
      through: { stress: 'stressState', difference: 'giveState' },
    },
  ],
  ring: [
    {
      by: 'ringCheck',
      inputs: { σ: 'ringStress', Re: 'yieldStrength', give: 'ringClosing', depth: 'toothHeight' },
      through: { stress: 'stressState', closing: 'giveState' },
    },
  ],
  stickout: [{ by: 'stickoutCheck', inputs: { out: 'stickout', D: 'blankDiameter' } }],
  width: [{ by: 'widthCheck', inputs: { w: 'knurlWidth', D: 'blankDiameter' } }],
  capacity: [
    {
      by: 'capacityCheck',
      also: ['torque', 'torqueLimit', 'power', 'powerLimit'],
    },
  ],
  fit: [
    {
      by: 'pressFit',
      inputs: { i: 'interference', D_crest: 'crestDiameter', H: 'toothHeight' },
      given: { D_bore: 'boreOfFit' },
    },
  ],
  seam: [
    {
      by: 'seamTest',
      parts: ['chance that it tracks ≥ 90 % fine, else watch'],
      inputs: { chance: 'chanceTracks', h: 'seamTeethOff' },
      through: { chance: 'seamChance' },
      given: { m: 'gapLeft' },
    },
  ],
  count: [
    {
      by: 'partChecks',
      parts: [
        'count: N as worked out fine;  within Δ + 0.5 of π D/p_t watch;  else, or within 6 % of twice N, stop',
      ],
      inputs: { N: 'countExpected', D: 'blankDiameter', p_t: 'transversePitch' },
      through: { Δ: 'countDoubt' },
    },
  ],
  filled: [
    {
      by: 'partChecks',
      parts: ['fill, growth: up to 2.5 standard deviations off fine, else watch'],
      also: ['fillMeasured', 'fillExpected'],
    },
  ],
  growth: [
    {
      by: 'partChecks',
      parts: ['fill, growth: up to 2.5 standard deviations off fine, else watch'],
      also: ['growthFactor', 'growthFactorExpected'],
    },
  ],
  taper: [
    {
      by: 'fadeAlong',
      inputs: { 'z₁': 'infeedNear', 'z₂': 'infeedFar', p: 'pitch' },
      given: { w: 'flatAtPlace', l: 'distance' },
    },
  ],
};
