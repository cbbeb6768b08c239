import type { Given, Mark, Remark } from '../../calc/index.ts';

/** What goes into a figure without being one: said, taken with the set-up, or of the material. */
export const givens: Readonly<Record<Given, string>> = {
  bar: 'the bar as it was given',
  barIfAny: 'the bar, where one was given',
  bevel: 'bevel of the wheel',
  blankSaid: 'the blank as it was given',
  bore: 'bore of the work, none in a solid bar',
  boreOfFit: 'bore it is pressed into',
  caughtShare: 'share of a tooth to be caught, 0.10',
  chipStiffness: 'cutting force over chip area of the material',
  cleanedHeight: 'tooth height as measured, else as the fill has it',
  distance: 'distance between the two places',
  fewestTurns: 'fewest turns this material wants on a spot',
  firstGuess: 'how often it is the cause before anything is known',
  flatAtPlace: 'flat on the crests at that place',
  flatMeasured: 'flat on the crests as measured',
  gapLeft: 'tooth error that is left on purpose',
  gapRead: 'gap at the seam as read',
  growthAtFull: 'static growth at the fullest fill allowed',
  growthAtShallow: 'static growth at the shallowest fill allowed',
  growthSpread: 'standard deviation of the growth factor',
  growthWanted: 'crest the print allows, less the blank',
  halfAngle: 'half the tooth angle',
  hardening: 'how fast the material hardens',
  hardestTurn: 'infeed of the turn that presses hardest',
  hardness: 'Brinell hardness of the material',
  heightInGroove: 'height above the groove root',
  heightMeasured: 'the tooth as measured, else as planned',
  heightOfFill: 'tooth height of that fill',
  helix: 'helix of the teeth on the work',
  infeedOfFill: 'infeed that a fill takes on this blank',
  knurlLength: 'length of the knurl',
  label: "number on the wheel's label",
  limitOfNumber: 'its own limit',
  limits: 'limits of the print',
  marksCounted: 'marks counted',
  meanRadius: 'mean radius of the wall',
  modulus: 'modulus of the material',
  mostTurns: 'most turns this material wants on a spot',
  numberOfSetup: 'a number of the set-up',
  ownFill: 'deepest fill advised for the material',
  pinDiameter: 'diameter of the pin',
  pinFriction: 'friction on an oiled pin, 0.12',
  pitchOfWheel: 'pitch of that wheel round the rim',
  pressedWidth: 'width under the wheel',
  provenCount: 'teeth of the proven pair',
  provenDiameter: 'diameter of the proven pair',
  reach: 'from the chuck to the wheel where it is worst',
  resultsOfShop: "this shop's own results",
  slowestOfBand: 'slowest speed of the band for this material',
  span: 'from the chuck to the far centre',
  staticGrowth: 'static growth of the tooth',
  thisFigure: 'this figure',
  tipFlat: "flat on the wheel's tips, none here",
  turningSpread: 'spread of turned diameters',
  voidOfForm: 'void per area of the pattern',
  wall: 'wall under the groove root',
  wheelDiameter: 'diameter of the wheel',
  wheelFace: 'face of the wheel',
  wheelTeeth: 'teeth counted on the wheel',
  yieldOfMaterial: 'yield strength of the material',
  wholeByLabel: 'nothing: a whole count by the label',
  wholeTeeth: 'whole teeth more, until the marks are gone',
};

/** What is done with the result of the formula before it stands on the card. */
export const remarks: Readonly<Record<Remark, string>> = {
  atFullForm: 'With the tooth at its sharp height.',
  blankLessThat: 'That comes off the blank.',
  comesOff: 'What comes off is the blank less that.',
  nearestWhole: 'The nearest whole number is taken.',
  onlyDifference: 'The growth itself is crest less blank.',
  sideForce: 'F is the force of all the wheels on one side.',
  timeOfOnePart: 't is the time of one part.',
  timesParts: 'Times the number of parts.',
  timesWheels: 'Times the number of wheels.',
};

/** How sure a thing is, beside it. */
export const sureness: Readonly<Record<Mark, string>> = {
  read: 'read',
  reported: 'reported',
  derived: 'worked out',
  'common practice': 'trade rule',
  'from memory': 'from memory',
  judgement: 'judgement',
};

/** How sure a whole figure is. */
export const surenessOfAll: Readonly<Record<Mark, string>> = {
  read: 'read in its source',
  reported: 'reported by another text',
  derived: 'worked out here',
  'common practice': 'a rule of the trade, no source',
  'from memory': 'from memory; check before you rely on it',
  judgement: 'a judgement made here',
};

/** A source with its title, and how sure it is. */
export const sourced: Readonly<Record<Mark, (title: string) => string>> = {
  read: (title) => `Read in ${title}.`,
  reported: (title) => `Reported, the text itself not seen: ${title}.`,
  derived: (title) => `Worked out here: ${title}.`,
  'common practice': (title) => `A rule of the trade, no source: ${title}.`,
  'from memory': (title) => `From memory, check before you rely on it: ${title}.`,
  judgement: (title) => `A judgement made here: ${title}.`,
};
