import { GIVE_FINE } from '../bending/index.ts';
import { STICKOUT_DIAMETERS } from '../caution.ts';
import type { Check, CheckName, State } from '../check.ts';
import { type AfterCheck, chanceByLabel, checkBlank } from '../checking/index.ts';
import { TURNS_ON_A_SPOT } from '../feed.ts';
import { DEFAULT_FILL, FULL_ENOUGH, SHALLOW_BELOW } from '../fill.ts';
import { type FormRating, formRating } from '../formOrCut.ts';
import { crestFlat } from '../growth/index.ts';
import { formOf } from '../pattern.ts';
import { PIN_PRESSURE_FINE } from '../pin/index.ts';
import type { SetupFigureName, SetupRequest, SetupResult } from '../setup/index.ts';
import { toothError, wholeToothDiameter } from '../teeth.ts';
import { TRACKS_WITHIN } from '../tracking.ts';
import type { Mm } from '../units.ts';
import type { MoveNumber, Need, TroubleFacts, TroubleNumber } from './facts.ts';

/** What a person has found out beside the card; null where nobody looked. */
export type TroubleSeen = {
  /** Parts this wheel has made, as the shop's record has them. */
  readonly partsOnWheel: number | null;
  /** Infeed of the first turn as it was taken. */
  readonly firstBite: Mm | null;
  readonly blank: Mm | null;
  /** Difference of the blank's diameter from end to end. */
  readonly blankTaper: Mm | null;
  /** The finished part, measured. */
  readonly after: AfterCheck | null;
};

/** Nothing but the card. */
export const NOTHING_SEEN: TroubleSeen = {
  partsOnWheel: null,
  firstBite: null,
  blank: null,
  blankTaper: null,
  after: null,
};

/** Radial force of a wheel in an ordinary plunge, N. Judgement, as for the pin. */
const ORDINARY_FORCE = 4000;
/** Share of the infeed that may give way before it is seen: between watch and stop. Judgement. */
const GIVE_SEEN = 2 * GIVE_FINE;
/** Hardness and elongation past which forming ends, between marginal and no. */
const HARDNESS_END = 275;
const ELONGATION_END = 8.5;
/** What a rating says where hardness and elongation do not. Judgement. */
const RATED: Record<FormRating, number> = { yes: 0, marginal: 1, no: 1.3 };
/** Flat on a wheel's tips, as a share of the pitch, that makes it dull. Judgement. */
const DULL_FLAT = 0.05;
/** Slower by this where the index alone asks for nothing. Judgement. */
const SLOWER = 0.75;
const STICKOUT_SHORTER = 0.8;

type Known = {
  readonly request: SetupRequest;
  readonly result: SetupResult;
  readonly seen: TroubleSeen;
};

const valueOf = ({ result }: Known, name: SetupFigureName): number | null =>
  result.figures[name]?.value ?? null;

/** A figure of one of the set-up's checks, by the check's name and its own. */
const inCheck = ({ result }: Known, check: CheckName, name: string): number | null =>
  result.checks.find((each) => each.name === check)?.figures[name]?.value ?? null;

const afterValue = ({ seen }: Known, name: keyof AfterCheck['figures']): number | null =>
  seen.after?.figures[name]?.value ?? null;

const ratio = (value: number | null, to: number | null): number | null =>
  value === null || to === null || to === 0 ? null : value / to;

const larger = (a: number | null, b: number | null): number | null =>
  a === null || b === null ? (a ?? b) : Math.max(a, b);

const blankOf = ({ result, seen }: Known): Mm => seen.blank ?? result.blank.diameter;

const countNumbers = (known: Known) => {
  const { result, seen } = known;
  const { transverse } = result.pitch;
  const doubt = inCheck(known, 'wheel', 'countDoubt');
  const window = wholeToothDiameter(TRACKS_WITHIN, transverse);
  return {
    toothError: Math.abs(toothError(blankOf(known), transverse)),
    labelMiss: doubt === null ? null : 1 - chanceByLabel(0, doubt),
    biteShare: ratio(seen.firstBite, valueOf(known, 'firstBite')),
    eccentricityOverBite: ratio(
      inCheck(known, 'runout', 'eccentricity'),
      inCheck(known, 'runout', 'firstBite'),
    ),
    blankOff: seen.blank === null ? null : Math.abs(seen.blank - result.blank.diameter) / window,
    blankTaper:
      seen.blankTaper === null ? null : ratio(seen.blankTaper / 2, valueOf(known, 'infeed')),
  };
};

const deepestFill = ({ request, result }: Known): number =>
  Math.min(FULL_ENOUGH, result.process === 'form' ? (request.material.maxFill.value ?? 1) : 1);

const fillNumbers = (known: Known) => {
  const planned = known.result.blank.tooth.fill;
  const measured = afterValue(known, 'fillMeasured');
  const short = planned < SHALLOW_BELOW ? SHALLOW_BELOW - planned : null;
  return {
    fillOver: (measured ?? planned) - deepestFill(known),
    fillShort: measured === null ? short : planned - measured,
    // Without a fill the crest cannot tell growth from fill.
    growthOff: measured === null || known.seen.after === null ? null : known.seen.after.growthOffBy,
  };
};

const brittlenessOf = ({ request, result }: Known): number | null => {
  if (result.process === 'cut') return null;
  const { material, hardness } = request;
  const hard = (hardness ?? material.hardness.value ?? 0) / HARDNESS_END;
  const short = ELONGATION_END / Math.max(0.1, material.elongation.value);
  return Math.max(hard, short, RATED[formRating(material, hardness)]);
};

const turnNumbers = (known: Known) => {
  const { request, result } = known;
  const turns = result.process === 'cut' ? null : result.motion.turns;
  const [fewest, most] = TURNS_ON_A_SPOT[request.material.hardeningClass ?? 'low'];
  const byFeed = ratio(result.motion.feed, result.motion.window?.high ?? null);
  return {
    turnsUnder: larger(turns === null ? null : fewest / turns, byFeed),
    turnsOver: turns === null ? null : turns / most,
  };
};

const giveNumbers = (known: Known) => {
  const bent = inCheck(known, 'bending', 'depthDifference');
  const taper = afterValue(known, 'taper');
  return {
    bends: larger(
      ratio(bent, GIVE_SEEN * known.result.blank.tooth.infeed),
      ratio(inCheck(known, 'bending', 'bendingStress'), inCheck(known, 'bending', 'yieldStrength')),
    ),
    overhang: ratio(known.request.stickout, STICKOUT_DIAMETERS * known.result.blank.diameter),
    fadeOverGive: taper === null ? null : ratio(Math.abs(taper), bent),
    closes: larger(
      ratio(inCheck(known, 'ring', 'ringClosing'), GIVE_SEEN * known.result.blank.tooth.height),
      ratio(inCheck(known, 'ring', 'ringStress'), inCheck(known, 'ring', 'yieldStrength')),
    ),
  };
};

const numbersOf = (known: Known): Record<TroubleNumber, number | null> => ({
  ...countNumbers(known),
  ...fillNumbers(known),
  ...turnNumbers(known),
  ...giveNumbers(known),
  brittleness: brittlenessOf(known),
  pinHeatIndex: valueOf(known, 'pinHeatIndex'),
  pinPressureShare: ratio(valueOf(known, 'pinPressure'), PIN_PRESSURE_FINE),
  speedOver: ratio(inCheck(known, 'speed', 'surfaceSpeed'), inCheck(known, 'speed', 'speedLimit')),
  widthOver: ratio(known.result.load.knurlWidth, known.result.blank.diameter),
  forceShare: ratio(valueOf(known, 'radialForce'), ORDINARY_FORCE),
  partsOnWheel: known.seen.partsOnWheel,
});

const pinDiameterOf = (known: Known): number | null => {
  const pin = known.request.pinDiameter ?? known.request.wheel.bore;
  const share = ratio(valueOf(known, 'pinPressure'), PIN_PRESSURE_FINE);
  return share === null ? null : pin * Math.max(1, share);
};

const speedForPin = (known: Known): number | null => {
  const speed = valueOf(known, 'surfaceSpeed');
  const index = valueOf(known, 'pinHeatIndex');
  return speed === null ? null : speed * Math.min(SLOWER, index === null ? 1 : 1 / index);
};

/** Shorter until no more than is let pass gives way: both kinds of bending grow with the length. */
const stickoutAtMost = (known: Known, bends: number | null): number | null => {
  const { stickout } = known.request;
  const tried = inCheck(known, 'bending', 'largestStickout');
  if (stickout === null || tried !== null) return tried;
  const shorter = stickout * Math.min(STICKOUT_SHORTER, Math.cbrt(1 / Math.max(1, bends ?? 1)));
  return Math.max(known.result.load.knurlWidth ?? 0, shorter);
};

/** The force of a plunge goes with the root of the infeed a turn: half the force, four times the turns. */
const turnsForForce = (known: Known): number | null => {
  const turns = valueOf(known, 'turns');
  const share = ratio(valueOf(known, 'radialForce'), ORDINARY_FORCE);
  if (turns === null || share === null) return null;
  const [, most] = TURNS_ON_A_SPOT[known.request.material.hardeningClass ?? 'low'];
  return Math.max(Math.ceil(turns), Math.min(most, Math.ceil(turns * Math.max(1, share) ** 2)));
};

const toothMoves = (known: Known) => {
  const { request, result } = known;
  const bite = valueOf(known, 'firstBite');
  return {
    nextDiameter: checkBlank(request, blankOf(known)).figures.nextDiameter?.value ?? null,
    firstBite: bite,
    // Half the reading against half the bite.
    readingAtMost: bite,
    flatToStopAt: crestFlat(result.pitch.normal, Math.min(DEFAULT_FILL, deepestFill(known))),
    infeed: result.blank.tooth.infeed,
    growthFactor:
      result.process === 'form' ? (afterValue(known, 'growthFactor') ?? request.growth.mean) : null,
    blankDiameter: result.blank.diameter,
    taperAtMost: 2 * GIVE_FINE * result.blank.tooth.infeed,
    roundWithin: GIVE_FINE * result.blank.tooth.height,
    chamfer: result.blank.tooth.height,
    tipFlat: DULL_FLAT * result.pitch.normal,
  };
};

const swivelOf = (known: Known): number => {
  const measured = afterValue(known, 'swivelAngle');
  const width = known.result.load.knurlWidth ?? known.result.wheelInUse.width;
  return measured ?? Math.atan((GIVE_FINE * known.result.blank.tooth.infeed) / width);
};

const movesOf = (known: Known, bends: number | null): Record<MoveNumber, number | null> => {
  const { request, result } = known;
  const [, most] = TURNS_ON_A_SPOT[request.material.hardeningClass ?? 'low'];
  return {
    ...toothMoves(known),
    speedForPin: speedForPin(known),
    speedLimit: inCheck(known, 'speed', 'speedLimit'),
    stickoutAtMost: stickoutAtMost(known, bends),
    swivelAngle: swivelOf(known),
    feed: result.motion.window?.feed ?? result.motion.feed,
    turnsAtMost: most,
    turnsForForce: turnsForForce(known),
    bore: request.bore,
    wheelCircumference: Math.PI * request.wheel.diameter,
    wheelTeeth: Math.round((Math.PI * request.wheel.diameter) / result.pitch.transverse),
    faceAtMost: Math.min(request.wheel.face, result.blank.diameter),
    pinDiameter: pinDiameterOf(known),
    gripLength: result.blank.diameter,
  };
};

const hasOf = ({ request, result }: Known): Record<Need, boolean> => ({
  pair: result.load.wheels > 1 && formOf(request.pattern) !== 'grooves',
  opposed: request.layout === 'opposed' && formOf(request.pattern) === 'grooves',
  tube: request.bore !== null && request.bore > 0,
  supported: request.support !== 'chuck',
  traverse: result.motion.travel === 'traverse',
  plunge: result.motion.travel === 'plunge',
  formed: result.process === 'form',
});

const statesOf = ({ result, seen }: Known): Partial<Record<CheckName, State>> => {
  // What a crest alone makes of growth may as well be the fill.
  const measured = seen.after?.figures.fillMeasured ?? null;
  const after = (seen.after?.checks ?? []).filter(
    ({ name }) => name !== 'growth' || measured !== null,
  );
  const all: readonly Check[] = [...result.checks, ...after];
  return Object.fromEntries(all.map(({ name, state }) => [name, state] as const));
};

const told = <K extends string>(all: Record<K, number | null>): Partial<Record<K, number>> =>
  Object.fromEntries(
    Object.entries<number | null>(all).filter(([, value]) => value !== null),
  ) as Partial<Record<K, number>>;

/**
 * What a set-up and a person's own measurements say about the causes of trouble.
 *
 *     each number over its own limit: δ, e/z1, x − x_deepest, index, P/100 MPa, v/v_limit, f/f_high …
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | request | what the set-up was worked out from | - | |
 * | result | the set-up | - | |
 * | seen | parts on the wheel, first bite, blank and part as measured; null: nobody looked | - | |
 * | → numbers, states | numbers that are known, and how the checks end | - | |
 * | → has | pair of wheels, opposed, tube, supported, traverse, plunge, formed | - | |
 * | → moves | numbers for the next moves | - | |
 *
 * Assumes the part was made as the set-up says, but for what was measured.
 *
 * @source trouble-numbers (which number speaks for which cause)
 * @source force-model (force, bending, ring, pin)
 * @example ((request) => troubleFacts(request, setUp(request), NOTHING_SEEN).numbers.speedOver)({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, included: DEFAULT_INCLUDED, stock: inch(1), finish: null, asIs: false, wantedTeeth: null, knurlClass: null, fill: null, material: materialById('steel-lowC-CD'), hardness: null, process: null, wheel: DEFAULT_WHEEL, edge: null, pin: 'hardened', pinDiameter: null, onePiece: false, length: null, stickout: null, support: 'chuck', layout: null, stockLength: null, bore: null, plug: false, feed: null, speed: feetPerMinute(120), rotation: null, turns: null, batch: 1, runout: null, machine: null, growth: growthBeforeResults() }) // 1.2
 */
export function troubleFacts(
  request: SetupRequest,
  result: SetupResult,
  seen: TroubleSeen,
): TroubleFacts {
  const known = { request, result, seen };
  const numbers = told(numbersOf(known));
  return {
    numbers,
    states: statesOf(known),
    has: hasOf(known),
    moves: told(movesOf(known, numbers.bends ?? null)),
  };
}
