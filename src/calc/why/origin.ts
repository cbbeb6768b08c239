import type { CheckFigureName } from '../checking/index.ts';
import type { SetupFigureName } from '../setup/index.ts';
import type { FormulaName } from './formulas.ts';
import type { Way } from './ways.ts';

/** Numbers that only a check carries and that its rule speaks of. */
export const CHECK_NUMBERS = [
  'depthDifference',
  'diameters',
  'eccentricity',
  'elongation',
  'finishHigh',
  'finishLow',
  'gap',
  'hardness',
  'interference',
  'knurlWidth',
  'powerLimit',
  'speedLimit',
  'stickout',
  'torqueLimit',
  'wall',
  'yieldStrength',
] as const;
export type CheckNumber = (typeof CHECK_NUMBERS)[number];

/** A number by the name it has on a card. */
export type FigureName =
  | SetupFigureName
  | CheckFigureName
  | CheckNumber
  | 'chanceLands'
  | 'chanceOfCause';

/** What goes into a figure and is no figure of the card: it was said, or taken with the set-up. */
export type Given =
  | 'bar'
  | 'barIfAny'
  | 'bevel'
  | 'blankSaid'
  | 'bore'
  | 'boreOfFit'
  | 'caughtShare'
  | 'chipStiffness'
  | 'cleanedHeight'
  | 'distance'
  | 'fewestTurns'
  | 'firstGuess'
  | 'flatAtPlace'
  | 'flatMeasured'
  | 'gapLeft'
  | 'gapRead'
  | 'growthAtFull'
  | 'growthAtShallow'
  | 'growthSpread'
  | 'growthWanted'
  | 'halfAngle'
  | 'hardening'
  | 'hardestTurn'
  | 'hardness'
  | 'heightInGroove'
  | 'heightMeasured'
  | 'heightOfFill'
  | 'helix'
  | 'infeedOfFill'
  | 'knurlLength'
  | 'label'
  | 'limitOfNumber'
  | 'limits'
  | 'marksCounted'
  | 'meanRadius'
  | 'modulus'
  | 'mostTurns'
  | 'numberOfSetup'
  | 'ownFill'
  | 'pinDiameter'
  | 'pinFriction'
  | 'pitchOfWheel'
  | 'pressedWidth'
  | 'provenCount'
  | 'provenDiameter'
  | 'reach'
  | 'resultsOfShop'
  | 'slowestOfBand'
  | 'span'
  | 'staticGrowth'
  | 'thisFigure'
  | 'tipFlat'
  | 'turningSpread'
  | 'voidOfForm'
  | 'wall'
  | 'wheelDiameter'
  | 'wheelFace'
  | 'wheelTeeth'
  | 'wholeByLabel'
  | 'wholeTeeth'
  | 'yieldOfMaterial';

/** What is done with the formula's result before it is the figure. */
export type Remark =
  | 'nearestWhole'
  | 'onlyDifference'
  | 'timesParts'
  | 'timeOfOnePart'
  | 'timesWheels'
  | 'sideForce'
  | 'atFullForm'
  | 'blankLessThat'
  | 'comesOff';

/** A formula on the way to the figure, or the part of it that is needed. */
export type Through = FormulaName | readonly [name: FormulaName, part: string];

/** A figure that is worked out. */
export type Worked = {
  /** The ways that all have to hold; none where it holds for the rest. */
  readonly when?: readonly Way[];
  /** The function that works it out. */
  readonly by: FormulaName;
  /** The parts of its formula that give this figure; the whole where none is named. */
  readonly parts?: readonly string[];
  /** Symbols of the formula that are figures of the card. */
  readonly inputs?: Readonly<Record<string, FigureName>>;
  /** Figures of the card that the formula speaks of in words. */
  readonly also?: readonly FigureName[];
  /** Symbols that are worked out on the way. */
  readonly through?: Readonly<Record<string, Through>>;
  readonly given?: Readonly<Record<string, Given>>;
  readonly remark?: Remark;
};

/** A figure that is taken as the person said it, or as the machine has it. */
export type Told = { readonly when?: readonly Way[]; readonly told: 'person' | 'machine' };

/** How a figure comes about: the first whose ways all hold. */
export type Origins = readonly (Worked | Told)[];
