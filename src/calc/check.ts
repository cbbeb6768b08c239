import type { UnitName } from './units.ts';

/** A number with its unit; null where it does not apply to this set-up. */
export type Figure = { readonly value: number; readonly unit: UnitName };
export type Figures = Readonly<Record<string, Figure | null>>;

/**
 * A number with its unit, as cards and checks carry them.
 *
 *     value, unit
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | value | the number, unrounded | - | |
 * | unit | what it is counted in | - | one that this project names |
 * | → figure | both together | - | |
 *
 * Assumes the value is already in that unit.
 *
 * @source judgement (no number goes without its unit)
 * @example figure(25.4, 'mm').unit // "mm"
 */
export function figure(value: number, unit: UnitName): Figure {
  return { value, unit };
}

/** How a check ends. Words first: never by colour alone. */
export type State = 'fine' | 'watch' | 'stop';

/** Every reason a check can give; the phrase book has a sentence for each. */
export type CheckReasons = {
  tracking: 'whole' | 'inWindow' | 'nearEdge' | 'offWhole' | 'fewTeeth';
  wheel: 'ownBlank' | 'proven' | 'label' | 'counted';
  runout: 'within' | 'close' | 'over';
  fill: 'within' | 'shallow' | 'deep' | 'overMaterial' | 'overFull';
  feed: 'within' | 'asked' | 'noWindow' | 'cut';
  edge:
    | 'bevelledPlunge'
    | 'bevelledTravel'
    | 'squarePlunge'
    | 'squareTravel'
    | 'convexTravel'
    | 'convexPlunge'
    | 'onePieceTravel'
    | 'squareCut'
    | 'notSquareCut';
  material: 'forms' | 'marginal' | 'doesNotForm' | 'cuts';
  speed: 'within' | 'overLimit' | 'farOverLimit';
  finish: 'inside' | 'spread' | 'over' | 'under';
  // Of what the wheels press on and what gives way.
  pinHeat: 'cool' | 'warm' | 'hotButShort' | 'hot';
  pinPressure: 'within' | 'high';
  bending: 'holds' | 'opposed' | 'pushedAway' | 'staysBent';
  ring: 'holds' | 'thickWall' | 'plugged' | 'outOfRound' | 'crushed';
  stickout: 'short' | 'supported' | 'opposed' | 'long';
  width: 'within' | 'wide';
  capacity: 'within' | 'overTorque' | 'overPower';
  fit: 'grips' | 'tight' | 'over' | 'loose';
  // Of a trial turn and of a finished part.
  seam: 'whole' | 'centres' | 'closes';
  count: 'asExpected' | 'wheelDiffers' | 'notThisWheel' | 'doubled';
  filled: 'asPlanned' | 'short' | 'over';
  growth: 'asExpected' | 'less' | 'more';
  taper: 'even' | 'bends' | 'outOfLine' | 'uneven';
};
export type CheckName = keyof CheckReasons;

export type CheckOf<N extends CheckName> = {
  readonly name: N;
  readonly state: State;
  readonly reason: CheckReasons[N];
  readonly figures: Figures;
};
export type Check = { [N in CheckName]: CheckOf<N> }[CheckName];

/**
 * How a number ends against two limits.
 *
 *     value ≤ fineTo fine, ≤ watchTo watch, else stop
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | value | what is looked at, in any unit | - | |
 * | fineTo | largest value that is fine, in the same unit | - | |
 * | watchTo | largest value that is only watched | - | ≥ fineTo |
 * | → state | fine, watch or stop | - | |
 *
 * Assumes the limits themselves are inside, and that a value which is no number stops.
 *
 * @source judgement (three states, and a number on a limit is inside it)
 * @example verdict(0.1, 0.1, 0.2) // "fine"
 * @example verdict(0.21, 0.1, 0.2) // "stop"
 */
export function verdict(value: number, fineTo: number, watchTo: number): State {
  if (value <= fineTo) return 'fine';
  return value <= watchTo ? 'watch' : 'stop';
}

const WORST: readonly State[] = ['fine', 'watch', 'stop'];

/**
 * The worse of two verdicts on one thing.
 *
 *     fine < watch < stop
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | a | how one part of a check ends | - | |
 * | b | how another part of it ends | - | |
 * | → state | how the check ends | - | |
 *
 * Assumes what stops for one reason stops.
 *
 * @source judgement (the worst reason speaks)
 * @example worseOf('fine', 'watch') // "watch"
 */
export function worseOf(a: State, b: State): State {
  return WORST.indexOf(a) >= WORST.indexOf(b) ? a : b;
}
