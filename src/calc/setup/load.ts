import { type BentWork, bentWork } from '../bending/index.ts';
import { CUTTING_STIFFNESS, cutKnurl, cutTorque } from '../cut.ts';
import { CUT_FEED, FEWEST_TURNS, infeedPerTurn } from '../feed.ts';
import {
  drivePower,
  equivalentRadius,
  plungeForce,
  pressOf,
  rollingPressure,
  traverseForce,
  type WheelForce,
  wheelTorque,
} from '../force/index.ts';
import { formOf, wheelFor } from '../pattern.ts';
import {
  pinBearing,
  pinHeat,
  pinHeatIndex,
  pinSliding,
  wheelRotation,
  wheelWarmUp,
} from '../pin/index.ts';
import { type PinchedRing, pinchedRing, ringWidth } from '../ring/index.ts';
import type { Process } from '../speed.ts';
import {
  type Kelvin,
  type Mm,
  type MPa,
  mm,
  type Newton,
  type NewtonMm,
  newton,
  newtonMm,
  OutOfRange,
  type RevPerMin,
  seconds,
  type Watt,
} from '../units.ts';
import { LARGEST_DIAMETER } from './blank.ts';
import type { Motion, Running, WheelInUse } from './motion.ts';
import type { SetupRequest } from './request.ts';
import type { MadeTooth } from './tooth.ts';

/** Longest stickout that is answered: bars come in 6 m. Judgement. */
const LONGEST_STICKOUT: Mm = mm(6000);
/** A length printed in inches comes back short by less than this. */
const PRINTED = 0.002;

/** What the force of a set-up depends on. */
export type Pressing = {
  readonly request: SetupRequest;
  readonly process: Process;
  readonly normal: Mm;
  readonly setOver: boolean;
  readonly diameter: Mm;
  readonly tooth: MadeTooth;
  readonly bite: Mm;
  readonly wheel: WheelInUse;
  readonly running: Running | null;
  readonly motion: Motion;
};

export type PinLoad = {
  readonly pressure: MPa;
  readonly rotation: RevPerMin | null;
  readonly index: number | null;
  /** In the cut of one part; null where speed or length is not known. */
  readonly warmUp: Kelvin | null;
};

/** The wall of a tube under the groove root, and how it gives; no ring where a plug carries it. */
export type WallLoad = {
  readonly wall: Mm;
  readonly meanRadius: Mm;
  readonly ring: PinchedRing | null;
};

/** What the wheels do to work, pin and machine, at the expected force. */
export type Load = {
  /** Wheels that press from the side that presses hardest. */
  readonly wheelsOneSide: number;
  readonly wheels: number;
  /** Of one wheel, square to the work. */
  readonly radialForce: Newton;
  /** Of all the wheels of one side. */
  readonly sideForce: Newton;
  readonly torque: NewtonMm;
  readonly power: Watt | null;
  readonly pin: PinLoad;
  /** Null where nothing is known of the stickout, or wheels are opposed. */
  readonly bent: BentWork | null;
  readonly tube: WallLoad | null;
  /** Width of the knurl along the work; null where a cut's length is not known. */
  readonly knurlWidth: Mm | null;
};

const isPair = (p: Pressing): boolean => {
  const kind = wheelFor(p.request.pattern, p.request.onePiece, p.setOver);
  return kind === 'helicalPair' || kind === 'straightPairSetOver';
};

const isOpposed = (request: SetupRequest): boolean => request.layout === 'opposed';

/** Opposed tools carry one wheel a side; a one-sided pair presses with both. */
const wheelsOf = (p: Pressing): { readonly one: number; readonly all: number } => {
  if (isOpposed(p.request)) return { one: 1, all: 2 };
  return isPair(p) ? { one: 2, all: 2 } : { one: 1, all: 1 };
};

/** A plunge without a length is as wide as the wheel rolls; a cut without one is unknown. */
const knurlWidthOf = (p: Pressing): Mm | null =>
  p.request.length ?? (p.motion.travel === 'plunge' ? p.wheel.width : null);

/** Width that bears at one time: all of a plunge, the contact width, or a cutting edge's feed. */
const bearingWidth = (p: Pressing): Mm => {
  if (p.process === 'cut') return mm(p.motion.feed ?? CUT_FEED.usual);
  return p.motion.travel === 'plunge' ? (p.request.length ?? p.wheel.width) : p.wheel.width;
};

const refuseSenseless = (p: Pressing): void => {
  const { bore, stickout, stockLength } = p.request;
  if (bore !== null) {
    // The diameter that was said is named before the one it is turned to.
    const { stock } = p.request;
    const outside = stock !== null && bore >= stock ? stock : p.diameter;
    if (!(bore >= 0 && bore < outside)) throw new OutOfRange('bore', bore, 0, outside, 'mm');
    const wall = wallOf(p, bore);
    if (wall < p.tooth.height)
      throw new OutOfRange('wall', wall, p.tooth.height, LARGEST_DIAMETER / 2, 'mm');
  }
  if (stickout === null) return;
  const least = knurlWidthOf(p) ?? 0;
  const most = Math.min(stockLength ?? LONGEST_STICKOUT, LONGEST_STICKOUT);
  if (!(stickout >= least - PRINTED && stickout <= most + PRINTED))
    throw new OutOfRange('stickout', stickout, least, most, 'mm');
};

type Forces = { readonly radial: Newton; readonly torque: NewtonMm };

const cutForces = (p: Pressing): Forces => {
  const { request } = p;
  const cut = cutKnurl({
    form: formOf(request.pattern),
    blankDiameter: p.diameter,
    p: p.normal,
    included: request.included,
    height: p.tooth.height,
    feed: p.motion.feed ?? CUT_FEED.usual,
    cuttingStiffness: CUTTING_STIFFNESS.value[request.material.group],
  });
  return { radial: cut.radialForce, torque: cutTorque(cut.tangentialForce, p.diameter) };
};

const formedForce = (p: Pressing): WheelForce => {
  const { request, motion, tooth } = p;
  const press = pressOf(formOf(request.pattern), isPair(p));
  const pressure = rollingPressure(request.material, request.hardness);
  const radius = equivalentRadius(request.wheel.diameter, p.diameter);
  const { fill, infeed } = tooth;
  const width = bearingWidth(p);
  if (motion.feed === null) {
    const perTurn = infeedPerTurn(infeed, p.bite, motion.turns ?? FEWEST_TURNS);
    return plungeForce({ press, pressure, fill, width, radius, infeed, bite: p.bite, perTurn });
  }
  const { bevel } = p.wheel;
  const modulus = request.material.modulus.value;
  const { feed } = motion;
  return traverseForce({ press, pressure, fill, width, radius, infeed, feed, bevel, modulus });
};

const formedForces = (p: Pressing): Forces => {
  const { force, arc } = formedForce(p);
  const torque = wheelTorque({
    force,
    arc,
    wheelDiameter: p.request.wheel.diameter,
    workDiameter: p.diameter,
  });
  return { radial: force, torque: newtonMm(wheelsOf(p).all * torque) };
};

const pinLoad = (p: Pressing, force: Newton): PinLoad => {
  const { request, running, motion } = p;
  const diameter = request.pinDiameter ?? request.wheel.bore;
  const { face } = request.wheel;
  const pressure = pinBearing(force, diameter, face);
  if (running === null) return { pressure, rotation: null, index: null, warmUp: null };
  const rotation = wheelRotation(running.rotation, p.diameter, request.wheel.diameter);
  const sliding = pinSliding(diameter, rotation);
  const warmUp =
    motion.time === null
      ? null
      : wheelWarmUp({
          heat: pinHeat(force, sliding),
          time: seconds(motion.time / request.batch),
          wheelDiameter: request.wheel.diameter,
          pinDiameter: diameter,
          face,
        });
  return { pressure, rotation, index: pinHeatIndex(pressure, sliding, request.pin), warmUp };
};

const bentBy = (p: Pressing, sideForce: Newton): BentWork | null => {
  const { request } = p;
  if (request.stickout === null || isOpposed(request)) return null;
  return bentWork({
    support: request.support,
    travel: p.motion.travel,
    force: sideForce,
    stickout: request.stickout,
    // A cut of unknown length is taken as one contact width long.
    width: knurlWidthOf(p) ?? mm(Math.min(p.wheel.width, request.stickout)),
    modulus: request.material.modulus.value,
    diameter: p.diameter,
    bore: request.bore,
  });
};

const wallOf = (p: Pressing, bore: Mm): Mm => mm(p.diameter / 2 - p.tooth.infeed - bore / 2);

const tubeUnder = (p: Pressing, sideForce: Newton): WallLoad | null => {
  const { bore, plug, material } = p.request;
  // A bore of nothing is a solid bar.
  if (bore === null || bore === 0) return null;
  const wall = wallOf(p, bore);
  const meanRadius = mm((bore + wall) / 2);
  if (plug) return { wall, meanRadius, ring: null };
  const width = ringWidth(bearingWidth(p), meanRadius, wall);
  const modulus = material.modulus.value;
  return {
    wall,
    meanRadius,
    ring: pinchedRing({ force: sideForce, meanRadius, wall, width, modulus }),
  };
};

export const loadOf = (p: Pressing): Load => {
  refuseSenseless(p);
  const { radial, torque } = p.process === 'cut' ? cutForces(p) : formedForces(p);
  const wheels = wheelsOf(p);
  const sideForce = newton(wheels.one * radial);
  return {
    wheelsOneSide: wheels.one,
    wheels: wheels.all,
    radialForce: radial,
    sideForce,
    torque,
    power: p.running === null ? null : drivePower(torque, p.running.rotation),
    pin: pinLoad(p, radial),
    bent: bentBy(p, sideForce),
    tube: tubeUnder(p, sideForce),
    knurlWidth: knurlWidthOf(p),
  };
};
