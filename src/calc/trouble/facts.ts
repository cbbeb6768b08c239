import type { CheckName, State } from '../check.ts';
import type { UnitName } from '../units.ts';

/**
 * Numbers a cause can be read from. Most are shares of their own limit, so that one form of
 * likelihood fits them all.
 */
export const TROUBLE_NUMBERS = {
  /** Distance from a whole count. */
  toothError: '1',
  /** Chance that a whole count by the label does not track. */
  labelMiss: '1',
  /** First bite taken over the first bite needed. */
  biteShare: '1',
  /** Eccentricity over the first bite. */
  eccentricityOverBite: '1',
  /** Fill above what is fine for the material. */
  fillOver: '1',
  /** Fill short of what was planned, or of a sound tooth. */
  fillShort: '1',
  pinHeatIndex: '1',
  /** Pressure on the pin over the one that is watched. */
  pinPressureShare: '1',
  /** Surface speed over its limit. */
  speedOver: '1',
  /** Bending stress and uneven infeed over what is let pass, the larger. */
  bends: '1',
  /** Stickout over the three diameters from which a bar wants support. */
  overhang: '1',
  /** Uneven infeed as measured over the one that bending accounts for. */
  fadeOverGive: '1',
  /** Closing and stress of a tube over what is let pass, the larger. */
  closes: '1',
  /** Fewest turns a spot should see over those it sees. */
  turnsUnder: '1',
  /** Turns a spot sees over the most it should. */
  turnsOver: '1',
  /** How far past the end of what forms: hardness, elongation, rating of the material. */
  brittleness: '1',
  /** Growth factor off what was expected, in standard deviations. */
  growthOff: '1',
  /** Blank as measured off the one told, over its window. */
  blankOff: '1',
  /** Difference of the blank's radius from end to end over the infeed. */
  blankTaper: '1',
  /** Knurl width over the blank's diameter. */
  widthOver: '1',
  /** Radial force over that of an ordinary plunge. */
  forceShare: '1',
  partsOnWheel: '1',
} as const satisfies Record<string, UnitName>;
export type TroubleNumber = keyof typeof TROUBLE_NUMBERS;

/** What has to be there for a cause to be possible at all. */
export type Need = 'pair' | 'opposed' | 'tube' | 'supported' | 'traverse' | 'plunge' | 'formed';

/**
 * How much likelier a cause is once what it needs is there: the priors count all jobs, with and
 * without. Judgement: one over the share of troubled jobs that have it.
 */
export const NEED_THERE: Readonly<Record<Need, number>> = {
  pair: 1.3,
  opposed: 4,
  tube: 3,
  supported: 2,
  traverse: 1.5,
  plunge: 1.5,
  formed: 1,
};

/** Numbers that a next move can name, each worked out from the set-up in hand. */
export const MOVE_NUMBERS = {
  nextDiameter: 'mm',
  firstBite: 'mm',
  readingAtMost: 'mm',
  flatToStopAt: 'mm',
  infeed: 'mm',
  speedForPin: 'm/min',
  speedLimit: 'm/min',
  stickoutAtMost: 'mm',
  swivelAngle: 'rad',
  feed: 'mm/rev',
  turnsAtMost: '1',
  turnsForForce: '1',
  growthFactor: '1',
  blankDiameter: 'mm',
  taperAtMost: 'mm',
  bore: 'mm',
  roundWithin: 'mm',
  wheelCircumference: 'mm',
  wheelTeeth: '1',
  tipFlat: 'mm',
  chamfer: 'mm',
  faceAtMost: 'mm',
  pinDiameter: 'mm',
  gripLength: 'mm',
} as const satisfies Record<string, UnitName>;
export type MoveNumber = keyof typeof MOVE_NUMBERS;

/** Everything that is known; what is not known is left out. */
export type TroubleFacts = {
  readonly numbers: Readonly<Partial<Record<TroubleNumber, number>>>;
  readonly states: Readonly<Partial<Record<CheckName, State>>>;
  readonly has: Readonly<Partial<Record<Need, boolean>>>;
  readonly moves: Readonly<Partial<Record<MoveNumber, number>>>;
};

/** Words alone. */
export const NO_FACTS: TroubleFacts = { numbers: {}, states: {}, has: {}, moves: {} };
