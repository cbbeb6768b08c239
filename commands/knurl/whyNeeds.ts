import type { CheckName, Subject } from '../../src/calc/index.ts';
import type { AskedFigure } from './whyWords.ts';

/** What has to be said before a card has a figure. */
const FIGURES_NEED: Readonly<Partial<Record<AskedFigure, string>>> = {
  stockToothCount: 'diameter',
  stockToothError: 'diameter',
  deflection: 'stickout',
  bendingStress: 'stickout',
  ringStress: 'bore',
  ringClosing: 'bore',
  feed: 'length',
  feedLow: 'length',
  feedHigh: 'length',
  passes: 'length',
  time: 'length',
  wheelWarmUp: 'length',
  seamTakeOff: 'seam',
  seamDiameter: 'seam',
  seamTeethOff: 'seam',
  seamLabelChance: 'seam',
  marksTakeOff: 'seam',
  marksDiameter: 'seam',
  effectivePitch: 'count',
  countedTeeth: 'count',
  countExpected: 'count',
  growthMeasured: 'crest',
  growthExpected: 'crest',
  growthFactorExpected: 'crest',
  fillFromCrest: 'crest',
  crestMeasured: 'crest',
  fillMeasured: 'height',
  fillExpected: 'height',
  fillNear: 'flats',
  fillFar: 'flats',
  infeedNear: 'flats',
  infeedFar: 'flats',
  taper: 'flats',
  swivelAngle: 'flats',
  chanceOfCause: 'symptom',
};

const CHECKS_NEED: Readonly<Partial<Record<CheckName, string>>> = {
  bending: 'stickout',
  stickout: 'stickout',
  ring: 'bore',
  feed: 'length',
  runout: 'runout',
  finish: 'finish',
  fit: 'fit',
  seam: 'seam',
  count: 'count',
  growth: 'crest',
  filled: 'height',
  taper: 'flats',
};

/** The parameter that would bring this figure or check onto the card; null where none would. */
export const whatBrings = (subject: Subject): string | null =>
  ('check' in subject ? CHECKS_NEED[subject.check] : FIGURES_NEED[subject.figure as AskedFigure]) ??
  null;
