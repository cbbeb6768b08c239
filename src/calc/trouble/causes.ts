import type { CheckName } from '../check.ts';
import type { UnitName } from '../units.ts';
import { type CheckSays, FORCE_SPREAD, type NumberSays } from './factor.ts';
import type { MoveNumber, Need, TroubleNumber } from './facts.ts';
import type { CauseId } from './symptoms.ts';

/** What to do about a cause: a number of the set-up, or one that is the same everywhere. */
type Move =
  | { readonly id: TroubleMoveId; readonly of: MoveNumber }
  | { readonly id: TroubleMoveId; readonly number: number; readonly unit: UnitName };

export type TroubleMoveId =
  | 'turnToWhole'
  | 'seamTest'
  | 'biteAtLeast'
  | 'trueUpTo'
  | 'stopAtFlat'
  | 'feedTo'
  | 'runSlower'
  | 'oilEvery'
  | 'changePinAtPlay'
  | 'thickerPin'
  | 'changeWheelAtFlat'
  | 'findMarkEvery'
  | 'shortenTo'
  | 'swivel'
  | 'levelWithin'
  | 'countWheels'
  | 'oneBitesFirst'
  | 'feedAt'
  | 'turnsAtMost'
  | 'turnsAtLeast'
  | 'bevel'
  | 'cutInstead'
  | 'expectGrowth'
  | 'turnBlankTo'
  | 'turnStraightWithin'
  | 'plugBore'
  | 'roundInJawsWithin'
  | 'brushEvery'
  | 'toolPlayUnder'
  | 'gripLength'
  | 'centrePlayUnder'
  | 'dwell'
  | 'onePass'
  | 'chamfer'
  | 'narrowTo';

export type Cause = {
  readonly needs: Need | null;
  readonly numbers: readonly NumberSays[];
  readonly checks: readonly CheckSays[];
  readonly move: Move;
};

/** Play of a wheel on its pin that wants a new pin. Judgement. */
const PIN_PLAY = 0.05;
/** Play of tool or centre that shows in the work. Judgement. */
const TOOL_PLAY = 0.02;
/** How level a pair of wheels has to stand. Judgement. */
const LEVEL = 0.2;
/** Parts a wheel makes before it is dull, and before its pin is worn. Judgement. */
const WHEEL_LIFE = 3000;
const PIN_LIFE = 2500;
/** Spread of those lives, as a ratio. Judgement. */
const LIFE_SPREAD = 0.7;

const past = (
  number: TroubleNumber,
  limit: number,
  spread: number,
  usual: number,
  insteadOf: CheckName | null = null,
): NumberSays => ({ number, limit, spread, scale: 'ratio', side: 'over', usual, insteadOf });

/** A number that stands against its limit by difference, not by ratio. */
const above = (
  number: TroubleNumber,
  limit: number,
  spread: number,
  usual: number,
  insteadOf: CheckName | null = null,
): NumberSays => ({ number, limit, spread, scale: 'linear', side: 'over', usual, insteadOf });

const below = (
  number: TroubleNumber,
  limit: number,
  spread: number,
  usual: number,
): NumberSays => ({
  number,
  limit,
  spread,
  scale: 'ratio',
  side: 'under',
  usual,
  insteadOf: null,
});

const check = (name: CheckName, fine: number, watch: number, stop: number): CheckSays => ({
  check: name,
  fine,
  watch,
  stop,
});

const wordsOnly = (needs: Need | null, move: Move): Cause => ({
  needs,
  numbers: [],
  checks: [],
  move,
});

/**
 * Causes, what has to be there for them, which numbers and checks speak for them, and the next
 * move. Every limit, spread and share is a judgement (trouble-numbers).
 */
export const CAUSES: Readonly<Record<CauseId, Cause>> = {
  wrongCount: {
    needs: null,
    numbers: [above('toothError', 0.12, 0.03, 0.25, 'tracking')],
    checks: [check('tracking', 0.2, 1.5, 4)],
    move: { id: 'turnToWhole', of: 'nextDiameter' },
  },
  wheelOffLabel: {
    needs: null,
    numbers: [above('labelMiss', 0.4, 0.2, 0.5, 'wheel')],
    checks: [check('wheel', 0.1, 1.8, 1.8)],
    move: { id: 'seamTest', of: 'firstBite' },
  },
  lightFirstBite: {
    needs: 'formed',
    numbers: [below('biteShare', 0.8, 0.25, 0.3)],
    checks: [],
    move: { id: 'biteAtLeast', of: 'firstBite' },
  },
  runOut: {
    needs: null,
    numbers: [past('eccentricityOverBite', 0.8, 0.3, 0.2, 'runout')],
    checks: [check('runout', 0.15, 2, 5)],
    move: { id: 'trueUpTo', of: 'readingAtMost' },
  },
  overFilled: {
    needs: null,
    numbers: [above('fillOver', 0.03, 0.015, 0.15, 'fill')],
    checks: [check('fill', 0.3, 1.5, 5)],
    move: { id: 'stopAtFlat', of: 'flatToStopAt' },
  },
  underFilled: {
    needs: null,
    numbers: [above('fillShort', 0.08, 0.03, 0.3)],
    checks: [check('filled', 0.2, 3, 3)],
    move: { id: 'feedTo', of: 'infeed' },
  },
  hotPin: {
    needs: null,
    numbers: [past('pinHeatIndex', 1.4, FORCE_SPREAD, 0.2, 'pinHeat')],
    checks: [check('pinHeat', 0.3, 1.6, 4)],
    move: { id: 'runSlower', of: 'speedForPin' },
  },
  dryWheel: wordsOnly(null, { id: 'oilEvery', number: 1, unit: '1' }),
  wornPin: {
    needs: null,
    numbers: [past('partsOnWheel', PIN_LIFE, LIFE_SPREAD, 0.3)],
    checks: [],
    move: { id: 'changePinAtPlay', number: PIN_PLAY, unit: 'mm' },
  },
  thinPin: {
    needs: null,
    numbers: [past('pinPressureShare', 1.5, FORCE_SPREAD, 0.25, 'pinPressure')],
    checks: [check('pinPressure', 0.4, 2, 2)],
    move: { id: 'thickerPin', of: 'pinDiameter' },
  },
  dullWheel: {
    needs: null,
    numbers: [past('partsOnWheel', WHEEL_LIFE, LIFE_SPREAD, 0.3)],
    checks: [],
    move: { id: 'changeWheelAtFlat', of: 'tipFlat' },
  },
  chippedWheel: wordsOnly(null, { id: 'findMarkEvery', of: 'wheelCircumference' }),
  barGivesWay: {
    needs: null,
    numbers: [
      past('bends', 1, FORCE_SPREAD, 0.2, 'bending'),
      past('overhang', 0.8, 0.5, 0.5, 'stickout'),
      below('fadeOverGive', 2, 0.5, 0.5),
    ],
    checks: [check('bending', 0.25, 2, 4), check('stickout', 0.8, 1.5, 1.5)],
    move: { id: 'shortenTo', of: 'stickoutAtMost' },
  },
  toolOutOfLine: {
    needs: null,
    numbers: [past('fadeOverGive', 2, 0.5, 0.5)],
    checks: [],
    move: { id: 'swivel', of: 'swivelAngle' },
  },
  wheelsUnequal: wordsOnly('pair', { id: 'levelWithin', number: LEVEL, unit: 'mm' }),
  unlikeWheels: wordsOnly('pair', { id: 'countWheels', of: 'wheelTeeth' }),
  opposedOutOfStep: wordsOnly('opposed', { id: 'oneBitesFirst', of: 'firstBite' }),
  feedTooFast: {
    needs: 'traverse',
    numbers: [past('turnsUnder', 1.25, 0.2, 0.2, 'feed')],
    checks: [check('feed', 0.4, 2, 2)],
    move: { id: 'feedAt', of: 'feed' },
  },
  tooManyTurns: {
    needs: 'formed',
    numbers: [past('turnsOver', 1.25, 0.2, 0.2)],
    checks: [],
    move: { id: 'turnsAtMost', of: 'turnsAtMost' },
  },
  squareEdges: {
    needs: 'traverse',
    numbers: [],
    checks: [check('edge', 0.15, 1.5, 6)],
    move: { id: 'bevel', number: 1, unit: 'mm' },
  },
  materialTears: {
    needs: 'formed',
    numbers: [past('brittleness', 1.05, 0.12, 0.2, 'material')],
    checks: [check('material', 0.3, 2, 5)],
    move: { id: 'cutInstead', number: 0.15, unit: 'mm/rev' },
  },
  growthUnlike: {
    needs: 'formed',
    numbers: [above('growthOff', 2.5, 0.6, 0.3, 'growth')],
    checks: [check('growth', 0.2, 3, 3)],
    move: { id: 'expectGrowth', of: 'growthFactor' },
  },
  blankOffSize: {
    needs: null,
    numbers: [past('blankOff', 0.8, 0.35, 0.3)],
    checks: [],
    move: { id: 'turnBlankTo', of: 'blankDiameter' },
  },
  taperedBlank: {
    needs: null,
    numbers: [past('blankTaper', 0.15, 0.4, 0.3)],
    checks: [],
    move: { id: 'turnStraightWithin', of: 'taperAtMost' },
  },
  thinWall: {
    needs: 'tube',
    numbers: [past('closes', 1, FORCE_SPREAD, 0.4, 'ring')],
    checks: [check('ring', 0.2, 1.5, 2.5)],
    move: { id: 'plugBore', of: 'bore' },
  },
  jawsTooTight: wordsOnly('tube', { id: 'roundInJawsWithin', of: 'roundWithin' }),
  chipsInMesh: wordsOnly(null, { id: 'brushEvery', number: 1, unit: '1' }),
  tooFast: {
    needs: null,
    numbers: [past('speedOver', 1.2, 0.15, 0.15, 'speed')],
    checks: [check('speed', 0.3, 2, 5)],
    move: { id: 'runSlower', of: 'speedLimit' },
  },
  looseTool: wordsOnly(null, { id: 'toolPlayUnder', number: TOOL_PLAY, unit: 'mm' }),
  poorGrip: wordsOnly(null, { id: 'gripLength', of: 'gripLength' }),
  looseCentre: wordsOnly('supported', { id: 'centrePlayUnder', number: TOOL_PLAY, unit: 'mm' }),
  noDwell: wordsOnly('plunge', { id: 'dwell', number: 3, unit: '1' }),
  secondPass: wordsOnly(null, { id: 'onePass', number: 1, unit: '1' }),
  noLeadChamfer: wordsOnly('traverse', { id: 'chamfer', of: 'chamfer' }),
  wideKnurl: {
    needs: 'plunge',
    // A knurl too wide for its bar does its harm by bending it.
    numbers: [
      past('widthOver', 1, 0.25, 0.15, 'width'),
      past('bends', 1, FORCE_SPREAD, 0.2, 'bending'),
    ],
    checks: [check('width', 0.3, 3, 3)],
    move: { id: 'narrowTo', of: 'faceAtMost' },
  },
  pressesTooHard: {
    needs: null,
    numbers: [
      past('forceShare', 1.6, FORCE_SPREAD, 0.25),
      past('turnsUnder', 1.25, 0.2, 0.3, 'feed'),
    ],
    checks: [check('capacity', 0.8, 2, 4)],
    move: { id: 'turnsAtLeast', of: 'turnsForForce' },
  },
};
