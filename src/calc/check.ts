import type { UnitName } from './units.ts';

/** A number with its unit; null where it does not apply to this set-up. */
export type Figure = { readonly value: number; readonly unit: UnitName };
export type Figures = Readonly<Record<string, Figure | null>>;

export const figure = (value: number, unit: UnitName): Figure => ({ value, unit });

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

/** The three-way verdict of a number against two limits, the limits themselves being inside. */
export const verdict = (value: number, fineTo: number, watchTo: number): State =>
  value <= fineTo ? 'fine' : value <= watchTo ? 'watch' : 'stop';
