import { type CautionId, cautionsFor } from '../caution.ts';
import type { Check, CheckName, Figure, State } from '../check.ts';
import { figure } from '../check.ts';
import { edgeCheck } from '../edge.ts';
import { infeedPerTurn } from '../feed.ts';
import { fillCheck } from '../fill.ts';
import { pressFit } from '../fits.ts';
import { formRating, materialCheck } from '../formOrCut.ts';
import { crestFlat, formedRound } from '../growth/index.ts';
import { formOf, isOnePiece, type WheelKind, wheelFor } from '../pattern.ts';
import { standardDp } from '../pitch.ts';
import type { Process } from '../speed.ts';
import {
  FEWEST_TEETH,
  largestWholeCount,
  toothCount,
  toothError,
  wholeToothDiameter,
} from '../teeth.ts';
import {
  firstBite,
  firstCutBite,
  runoutCheck,
  TRACKS_WITHIN,
  trackingCheck,
  trackingWindow,
  type Window,
  wheelCheck,
} from '../tracking.ts';
import { type Mm, mm, type UnitName } from '../units.ts';
import { type ChosenBlank, chooseBlank } from './blank.ts';
import { finishCheck } from './finish.ts';
import { type Load, loadOf, type Pressing } from './load.ts';
import { loadChecks, loadFigures } from './loadChecks.ts';
import {
  type Motion,
  motion,
  type Running,
  running,
  type WheelInUse,
  wheelInUse,
} from './motion.ts';
import { type ResolvedPitch, resolvePitch } from './pitch.ts';
import { type Remedy, remediesFor, withRemedies } from './remedy.ts';
import type { SetupRequest } from './request.ts';
import { startingFill, type ToothPlan, toothPlan } from './tooth.ts';

/** The figures every set-up card has, each with its unit; one that does not apply is null. */
export const SETUP_FIGURES = {
  stockToothCount: '1',
  stockToothError: '1',
  toothCount: '1',
  blankDiameter: 'mm',
  blankWindowLow: 'mm',
  blankWindowHigh: 'mm',
  pitch: 'mm',
  transversePitch: 'mm',
  sharpHeight: 'mm',
  toothHeight: 'mm',
  fill: '1',
  infeed: 'mm',
  fullInfeed: 'mm',
  growth: 'mm',
  growthFactor: '1',
  crestDiameter: 'mm',
  crestDiameterLow: 'mm',
  crestDiameterHigh: 'mm',
  crestFlat: 'mm',
  firstBite: 'mm',
  infeedPerTurn: 'mm',
  surfaceSpeed: 'm/min',
  spindleSpeed: 'rev/min',
  feed: 'mm/rev',
  feedLow: 'mm/rev',
  feedHigh: 'mm/rev',
  turns: '1',
  passes: '1',
  time: 's',
  radialForce: 'N',
  radialForceLow: 'N',
  radialForceHigh: 'N',
  torque: 'N·mm',
  power: 'W',
  deflection: 'mm',
  bendingStress: 'MPa',
  ringStress: 'MPa',
  ringClosing: 'mm',
  pinHeatIndex: '1',
  pinPressure: 'MPa',
  wheelSpeed: 'rev/min',
  wheelWarmUp: 'K',
} as const satisfies Record<string, UnitName>;
export type SetupFigureName = keyof typeof SETUP_FIGURES;
export type SetupFigures = Readonly<Record<SetupFigureName, Figure | null>>;

export type Alternative = { readonly toothCount: number; readonly blankDiameter: Mm };

export type SetupResult = {
  readonly figures: SetupFigures;
  readonly checks: readonly Check[];
  readonly cautions: readonly CautionId[];
  /** The next three whole counts below. */
  readonly alternatives: readonly Alternative[];
  /** The next whole count above that the bar or the print still allows. */
  readonly larger: Alternative | null;
  readonly pitch: ResolvedPitch;
  readonly process: Process;
  /** The material does not form, so the knurl is cut without having been asked for. */
  readonly switchedToCut: boolean;
  readonly blank: ChosenBlank;
  readonly window: Window;
  readonly wheel: WheelKind;
  readonly wheelInUse: WheelInUse;
  readonly motion: Motion;
  readonly running: Running | null;
  readonly load: Load;
  /** Changes that would lift a stop, each tried. */
  readonly remedies: readonly Remedy[];
  /** The bar as it is, where it tracks without being turned. */
  readonly asIs: { readonly toothCount: number; readonly toothError: number } | null;
  /** Largest whole count under the bar, or nearest to the print, read the other way. */
  readonly otherWayTeeth: number | null;
};

const ALTERNATIVES = 3;

const processOf = (request: SetupRequest): { process: Process; switched: boolean } => {
  if (request.process !== null) return { process: request.process, switched: false };
  const forms = formRating(request.material, request.hardness) !== 'no';
  return { process: forms ? 'form' : 'cut', switched: !forms };
};

/** Infeed at which the pattern is full: the wheel is up to its root in the work. */
const fullInfeed = (plan: ToothPlan, blank: Mm): Mm | null => {
  if (plan.process === 'cut') return plan.sharpHeight;
  if (plan.sharpHeight >= blank / 2) return null;
  return formedRound({
    form: formOf(plan.pattern),
    blankDiameter: blank,
    height: plan.sharpHeight,
    sharpHeight: plan.sharpHeight,
  }).infeed;
};

const biteOf = (plan: ToothPlan): Mm =>
  plan.process === 'cut'
    ? firstCutBite(plan.sharpHeight, TRACKS_WITHIN)
    : firstBite(plan.sharpHeight, TRACKS_WITHIN);

const smallerBlanks = (teeth: number, transverse: Mm, below: Mm): readonly Alternative[] => {
  const list: Alternative[] = [];
  for (let n = teeth; n >= FEWEST_TEETH && list.length < ALTERNATIVES; n -= 1) {
    const blankDiameter = wholeToothDiameter(n, transverse);
    if (blankDiameter < below - 1e-9) list.push({ toothCount: n, blankDiameter });
  }
  return list;
};

const largerBlank = (request: SetupRequest, teeth: number, transverse: Mm): Alternative | null => {
  const blankDiameter = wholeToothDiameter(teeth + 1, transverse);
  const ceiling = request.stock ?? (request.finish === null ? null : request.finish.high);
  return ceiling !== null && blankDiameter <= ceiling
    ? { toothCount: teeth + 1, blankDiameter }
    : null;
};

const asIsOffer = (request: SetupRequest, transverse: Mm, chosen: ChosenBlank) => {
  const { stock } = request;
  if (stock === null || request.asIs || Math.abs(stock - chosen.diameter) < 1e-6) return null;
  const delta = toothError(stock, transverse);
  if (Math.abs(delta) > TRACKS_WITHIN) return null;
  return { toothCount: Math.round(toothCount(stock, transverse)), toothError: delta };
};

type Worked = {
  readonly request: SetupRequest;
  readonly process: Process;
  readonly pitch: ResolvedPitch;
  readonly plan: ToothPlan;
  readonly blank: ChosenBlank;
  readonly window: Window;
  readonly bite: Mm;
  readonly wheel: WheelInUse;
  readonly running: Running | null;
  readonly motion: Motion;
  readonly pressing: Pressing;
  readonly load: Load;
};

const runningOf = (request: SetupRequest, process: Process, diameter: Mm): Running | null => {
  const { material } = request;
  const band = process === 'cut' ? material.cutSpeed.value : material.formSpeed.value;
  const stopped = process === 'form' && formRating(material, request.hardness) === 'no';
  if (band === null || stopped) return null;
  const { pin, speed, rotation, machine } = request;
  return running({ band, process, pin, diameter, speed, rotation, machine });
};

const windowOf = (request: SetupRequest, teeth: number, transverse: Mm): Window => {
  const dp = request.pitch?.system === 'dp' ? standardDp(request.pitch.value) : null;
  return trackingWindow({ teeth, transversePitch: transverse, dp, knurlClass: request.knurlClass });
};

const workOut = (request: SetupRequest): Worked => {
  const pitch = resolvePitch(request);
  const { process } = processOf(request);
  const plan = toothPlan(request, pitch.normal, process);
  const materialFill = process === 'form' ? request.material.maxFill.value : null;
  const { stock, finish, asIs, wantedTeeth } = request;
  const blank = chooseBlank(plan, {
    stock,
    finish,
    asIs,
    wantedTeeth,
    transverse: pitch.transverse,
    fill: startingFill(plan, request.fill, materialFill),
    deepestFill: request.fill === null && request.aimOnly !== true ? (materialFill ?? 1) : null,
  });
  const wheel = wheelInUse(request, process);
  const run = runningOf(request, process, blank.diameter);
  const moves = motion(
    {
      request,
      width: wheel.width,
      normal: pitch.normal,
      hardening: request.material.hardeningClass ?? 'low',
      rotation: run?.rotation ?? null,
    },
    process,
  );
  const { diameter, tooth } = blank;
  const { normal, setOver } = pitch;
  const bite = biteOf(plan);
  // Written out, not spread: remedies and plans work this out thousands of times.
  const pressing: Pressing = {
    request,
    process,
    normal,
    setOver,
    diameter,
    tooth,
    bite,
    wheel,
    running: run,
    motion: moves,
  };
  return {
    request,
    process,
    pitch,
    plan,
    blank,
    window: windowOf(request, blank.teeth, pitch.transverse),
    bite,
    wheel,
    running: run,
    motion: moves,
    pressing,
    load: loadOf(pressing),
  };
};

/** The plated crest in the bore it is pressed into. */
const fitCheck = ({ request, blank }: Worked): Check | null =>
  request.fitBore === undefined || request.fitBore === null
    ? null
    : pressFit({
        bore: request.fitBore,
        crest: mm(blank.tooth.crest + 2 * (request.plate ?? 0)),
        toothHeight: blank.tooth.height,
      });

const checksOf = (w: Worked): readonly Check[] => {
  const { request, blank, pitch } = w;
  const dp = request.pitch?.system === 'dp' ? standardDp(request.pitch.value) : null;
  const materialFill = w.process === 'form' ? request.material.maxFill.value : null;
  const checks: (Check | null)[] = [
    trackingCheck({
      diameter: blank.diameter,
      transversePitch: pitch.transverse,
      dp,
      knurlClass: request.knurlClass,
    }),
    wheelCheck({
      blankDiameter: blank.diameter,
      teeth: blank.teeth,
      pitch: request.pitch,
      knowledge: pitch.knowledge,
      setOver: pitch.setOver,
    }),
    request.runout === null ? null : runoutCheck(request.runout, w.bite),
    request.finish === null || request.aimOnly === true
      ? null
      : finishCheck(blank.tooth, request.finish),
    fitCheck(w),
    fillCheck(blank.tooth.fill, materialFill),
    w.motion.check,
    edgeCheck({
      edge: w.wheel.edge,
      travel: w.motion.travel,
      process: w.process,
      onePiece: isOnePiece(request.pattern, request.onePiece),
    }),
    materialCheck(request.material, request.hardness, w.process),
    w.running?.check ?? null,
    ...loadChecks(w.pressing, w.load),
  ];
  return checks.filter((check) => check !== null);
};

const stockFigures = (w: Worked) => {
  const { stock } = w.request;
  const { transverse } = w.pitch;
  return {
    stockToothCount: stock === null ? null : Math.round(toothCount(stock, transverse)),
    stockToothError: stock === null ? null : toothError(stock, transverse),
  };
};

const toothFigures = (w: Worked) => {
  const { tooth, diameter, teeth } = w.blank;
  return {
    toothCount: teeth,
    blankDiameter: diameter,
    blankWindowLow: w.window.low,
    blankWindowHigh: w.window.high,
    pitch: w.pitch.normal,
    transversePitch: w.pitch.transverse,
    sharpHeight: w.plan.sharpHeight,
    toothHeight: tooth.height,
    fill: tooth.fill,
    infeed: tooth.infeed,
    fullInfeed: fullInfeed(w.plan, diameter),
    growth: tooth.growth,
    growthFactor: w.process === 'cut' ? null : w.plan.growth.mean,
    crestDiameter: tooth.crest,
    crestDiameterLow: tooth.crestLow,
    crestDiameterHigh: tooth.crestHigh,
    crestFlat: crestFlat(w.pitch.normal, tooth.fill),
    firstBite: w.bite,
  };
};

const motionFigures = (w: Worked) => {
  const { motion: m } = w;
  const each =
    m.travel === 'plunge' && m.turns !== null
      ? infeedPerTurn(w.blank.tooth.infeed, w.bite, m.turns)
      : null;
  return {
    infeedPerTurn: each,
    surfaceSpeed: w.running?.surfaceSpeed ?? null,
    spindleSpeed: w.running?.rotation ?? null,
    feed: m.feed,
    feedLow: m.feedLow,
    feedHigh: m.feedHigh,
    turns: m.turns,
    passes: m.passes,
    time: m.time,
  };
};

const figuresOf = (w: Worked): SetupFigures => {
  const values: Record<SetupFigureName, number | null> = {
    ...stockFigures(w),
    ...toothFigures(w),
    ...motionFigures(w),
    ...loadFigures(w.load),
  };
  const named = Object.entries(SETUP_FIGURES).map(([name, unit]) => {
    const value = values[name as SetupFigureName];
    return [name, value === null ? null : figure(value, unit)] as const;
  });
  return Object.fromEntries(named) as Record<SetupFigureName, Figure | null>;
};

const otherWayTeeth = (w: Worked): number | null => {
  const { otherWay } = w.pitch;
  if (otherWay === null) return null;
  const { stock } = w.request;
  if (stock === null || w.request.asIs || w.request.finish !== null)
    return Math.round(toothCount(w.blank.diameter, otherWay.transverse));
  return largestWholeCount(stock, otherWay.transverse);
};

const stateOf = (checks: readonly Check[], name: CheckName): State | null =>
  checks.find((check) => check.name === name)?.state ?? null;

const cautionsOf = (w: Worked, checks: readonly Check[]): readonly CautionId[] => {
  const { request } = w;
  return cautionsFor({
    blankDiameter: w.blank.diameter,
    stickout: request.stickout,
    supported: request.support !== 'chuck',
    stockLength: request.stockLength,
    bore: request.bore,
    fill: w.blank.tooth.fill,
    materialFill: request.material.maxFill.value,
    materialGroup: request.material.group,
    rotation: w.running?.rotation ?? null,
    machineTopSpeed: request.machine?.topSpeed ?? null,
    seamTest: false,
    warmUp: w.load.pin.warmUp,
    bending: stateOf(checks, 'bending'),
    ring: stateOf(checks, 'ring'),
    pinHeat: stateOf(checks, 'pinHeat'),
  });
};

const remediesOf = (w: Worked, checks: readonly Check[]): readonly Remedy[] =>
  remediesFor(
    {
      request: w.request,
      checks,
      travel: w.motion.travel,
      knurlWidth: w.load.knurlWidth,
      turns: w.motion.turns,
      surfaceSpeed: w.running?.surfaceSpeed ?? null,
      speedLimit: w.running?.check.figures['speedLimit']?.value ?? null,
    },
    (request) => checksOf(workOut(request)),
  );

/**
 * Only the checks of a set-up, for those who try many.
 *
 *     checks of setUp({ …request, …change }), without remedies
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | request | what was said, as for setUp | - | |
 * | change | what is tried instead of it | - | |
 * | → checks | each fine, watch or stop, with its numbers | - | |
 *
 * Assumes what setUp assumes.
 *
 * @source whole-tooth (blank)
 * @source force-model (what the wheels press on)
 * @example checksWith({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, included: DEFAULT_INCLUDED, stock: inch(1), finish: null, asIs: false, wantedTeeth: null, knurlClass: null, fill: null, material: materialById('steel-lowC-CD'), hardness: null, process: null, wheel: DEFAULT_WHEEL, edge: null, pin: 'hardened', pinDiameter: null, onePiece: false, length: null, stickout: null, support: 'chuck', layout: null, stockLength: null, bore: null, plug: false, feed: null, speed: null, rotation: null, turns: null, batch: 1, runout: null, machine: null, growth: growthBeforeResults() }, { fill: 0.99 }).filter((check) => check.state === 'stop').map((check) => check.name) // ["fill"]
 */
export function checksWith(request: SetupRequest, change: Partial<SetupRequest>): readonly Check[] {
  return checksOf(workOut({ ...request, ...change }));
}

/**
 * The whole set-up from what an operator knows: blank, tooth, motion, checks and cautions.
 *
 *     N whole → D = N p_t/π → H = x Hf → infeed and crest on round work → v, n, f, turns, t
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pattern | pattern on the work | - | |
 * | pitch | label of the wheel, or null | - | |
 * | alongRim | the label is meant along the rim | - | |
 * | counted | wheel counted and measured, or null | - | |
 * | proven | pitch round the rim that a pair has proven, or null | mm | > 0 |
 * | helix | helix of the teeth, or null | rad | |
 * | tilt | swivel of straight wheels, or null | rad | |
 * | 2a (included) | included tooth angle | rad | 0.01745 to 3.124 |
 * | stock | diameter of the bar, or null | mm | > 0 |
 * | finish | limits of the print over the crests, or null | - | |
 * | aimOnly | the finish is one size to aim at, without limits | - | |
 * | fitBore | bore the knurl is pressed into, or null | mm | > 0 |
 * | plate | thickness of the plating to come, or null | mm | ≥ 0 |
 * | asIs | the bar is left as it is | - | |
 * | wantedTeeth | count asked for, or null | - | ≥ 3 |
 * | knurlClass | class called out, or null | - | |
 * | fill | tooth height over sharp height asked for, or null | - | 0 to 1 |
 * | material | row of the materials table | - | |
 * | HB (hardness) | hardness measured on the bar, or null | HB | > 0 |
 * | process | form or cut, or null | - | |
 * | wheel | size of the wheel | - | |
 * | edge | edge of the wheel, or null | - | |
 * | pin | hardened or carbide | - | |
 * | pinDiameter | diameter of the pin, or null for the wheel's bore | mm | > 0 |
 * | onePiece | one crossed wheel instead of a pair | - | |
 * | length | length of the knurl, or null | mm | > 0 |
 * | stickout | from the chuck to the end of the knurl, or null | mm | ≥ length |
 * | support | chuck, tailstock or centres | - | |
 * | layout | one-sided or opposed, or null | - | |
 * | stockLength | length of the bar, or null | mm | ≥ stickout |
 * | bore | bore of the work, or null | mm | leaves a wall of a tooth |
 * | plug | a plug carries the wall | - | |
 * | feed | feed asked for, or null | mm/rev | > 0 |
 * | speed | surface speed asked for, or null | m/min | > 0 |
 * | rotation | spindle speed asked for, or null | rev/min | > 0 |
 * | turns | turns asked for, or null | - | ≥ 5 |
 * | batch | parts | - | ≥ 1 |
 * | runout | reading of the indicator, or null | mm | ≥ 0 |
 * | machine | what the machine can do, or null | - | |
 * | growth | what is known of the shop's growth | - | |
 * | → figures | every figure of the card, null where it does not apply | - | |
 * | → figures.blankDiameter | what to turn to | mm | |
 * | → checks | each fine, watch or stop, with its numbers | - | |
 * | → remedies | changes that lift a stop, each worked out again | - | |
 *
 * Assumes the defaults named in this folder where nothing was said.
 *
 * @source whole-tooth (blank)
 * @source round-work (infeed and crest)
 * @source feed-window (feed and turns)
 * @source speed-band (speed)
 * @source force-model (force, torque)
 * @source give-limits (bending, ring)
 * @source pin-index (pin)
 * @example setUp({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, included: DEFAULT_INCLUDED, stock: inch(1), finish: null, asIs: false, wantedTeeth: null, knurlClass: null, fill: null, material: materialById('steel-lowC-CD'), hardness: null, process: null, wheel: DEFAULT_WHEEL, edge: null, pin: 'hardened', pinDiameter: null, onePiece: false, length: null, stickout: null, support: 'chuck', layout: null, stockLength: null, bore: null, plug: false, feed: null, speed: null, rotation: null, turns: null, batch: 1, runout: null, machine: null, growth: growthBeforeResults() }).figures.blankDiameter.value // 25.0252 mm
 */
export function setUp(request: SetupRequest): SetupResult {
  const w = workOut(request);
  const { teeth, diameter } = w.blank;
  const { transverse } = w.pitch;
  const checks = checksOf(w);
  const remedies = remediesOf(w, checks);
  return {
    figures: figuresOf(w),
    checks: withRemedies(checks, remedies),
    cautions: cautionsOf(w, checks),
    alternatives: smallerBlanks(teeth, transverse, diameter),
    larger: largerBlank(request, teeth, transverse),
    pitch: w.pitch,
    process: w.process,
    switchedToCut: processOf(request).switched,
    blank: w.blank,
    window: w.window,
    wheel: wheelFor(request.pattern, request.onePiece, w.pitch.setOver),
    wheelInUse: w.wheel,
    motion: w.motion,
    running: w.running,
    load: w.load,
    remedies,
    asIs: asIsOffer(request, transverse, w.blank),
    otherWayTeeth: otherWayTeeth(w),
  };
}
