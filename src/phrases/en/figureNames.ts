import type { Figure, FigureName } from '../../calc/index.ts';
import type { Show } from '../show.ts';

/** How a number without a unit is read. */
type Read = 'count' | 'share' | 'teeth' | 'number';

type Named = { readonly name: string; readonly read?: Read };

/** What every figure of a card is called in a sentence. */
const FIGURES: Readonly<Record<FigureName, Named>> = {
  stockToothCount: { name: 'teeth on the bar as it is', read: 'count' },
  stockToothError: { name: 'tooth error of the bar as it is', read: 'teeth' },
  toothCount: { name: 'tooth count', read: 'count' },
  blankDiameter: { name: 'blank diameter' },
  blankWindowLow: { name: 'smallest blank that tracks' },
  blankWindowHigh: { name: 'largest blank that tracks' },
  pitch: { name: 'pitch square to the teeth' },
  transversePitch: { name: 'pitch round the rim' },
  sharpHeight: { name: 'sharp height' },
  toothHeight: { name: 'tooth height' },
  fill: { name: 'fill', read: 'share' },
  infeed: { name: 'infeed past touch' },
  fullInfeed: { name: 'infeed at full form' },
  growth: { name: 'static growth' },
  growthFactor: { name: 'growth factor', read: 'share' },
  crestDiameter: { name: 'crest diameter' },
  crestDiameterLow: { name: 'smallest crest to expect' },
  crestDiameterHigh: { name: 'largest crest to expect' },
  crestFlat: { name: 'flat on the crests' },
  firstBite: { name: 'first turn' },
  infeedPerTurn: { name: 'infeed of each turn' },
  surfaceSpeed: { name: 'surface speed' },
  spindleSpeed: { name: 'spindle speed' },
  feed: { name: 'feed' },
  feedLow: { name: 'slowest feed' },
  feedHigh: { name: 'fastest feed' },
  turns: { name: 'turns', read: 'count' },
  passes: { name: 'passes', read: 'count' },
  time: { name: 'time' },
  radialForce: { name: 'radial force' },
  radialForceLow: { name: 'lowest radial force to expect' },
  radialForceHigh: { name: 'highest radial force to expect' },
  torque: { name: 'torque' },
  power: { name: 'power' },
  deflection: { name: 'deflection' },
  bendingStress: { name: 'bending stress' },
  ringStress: { name: 'stress in the wall' },
  ringClosing: { name: 'closing of the wall' },
  pinHeatIndex: { name: 'pin heat', read: 'number' },
  pinPressure: { name: 'pin load' },
  wheelSpeed: { name: 'wheel speed' },
  wheelWarmUp: { name: 'warm-up of the wheel' },
  toothError: { name: 'tooth error', read: 'teeth' },
  diameterError: { name: 'distance to the whole-tooth diameter' },
  nextDiameter: { name: 'next diameter down that tracks' },
  nextToothCount: { name: 'teeth on the next diameter down', read: 'count' },
  nextTakeOff: { name: 'what comes off to the next diameter' },
  countDoubt: { name: 'doubt about the count', read: 'teeth' },
  chanceTracks: { name: 'chance that it tracks', read: 'share' },
  chanceLands: { name: 'chance that it lands', read: 'share' },
  chanceOfCause: { name: 'chance of the likeliest cause', read: 'share' },
  effectivePitch: { name: "wheel's own pitch" },
  seamTakeOff: { name: 'what comes off at the seam' },
  seamDiameter: { name: 'diameter that closes the seam' },
  seamTeethOff: { name: 'teeth that come off', read: 'teeth' },
  seamLabelChance: { name: 'chance by the label alone', read: 'share' },
  marksTakeOff: { name: 'what comes off until the marks are gone' },
  marksDiameter: { name: 'diameter without the marks' },
  countedTeeth: { name: 'teeth counted', read: 'count' },
  countExpected: { name: 'teeth worked out', read: 'count' },
  growthMeasured: { name: 'growth measured' },
  growthExpected: { name: 'growth to expect' },
  growthFactorExpected: { name: 'growth factor to expect', read: 'share' },
  fillMeasured: { name: 'fill measured', read: 'share' },
  fillExpected: { name: 'fill planned', read: 'share' },
  fillFromCrest: { name: 'fill by the crest', read: 'share' },
  crestMeasured: { name: 'crest measured' },
  cleanedDiameter: { name: 'diameter it cleans up at' },
  rescueDiameter: { name: 'smaller blank that still goes' },
  rescueToothCount: { name: 'teeth on the smaller blank', read: 'count' },
  rescueFill: { name: 'fill on the smaller blank', read: 'share' },
  fillNear: { name: 'fill near the chuck', read: 'share' },
  fillFar: { name: 'fill far from the chuck', read: 'share' },
  infeedNear: { name: 'infeed near the chuck' },
  infeedFar: { name: 'infeed far from the chuck' },
  taper: { name: 'taper of the infeed' },
  swivelAngle: { name: 'angle to swivel' },
  depthDifference: { name: 'difference of depth along the knurl' },
  diameters: { name: 'stickout in diameters', read: 'number' },
  eccentricity: { name: 'eccentricity' },
  elongation: { name: 'elongation of the material' },
  finishHigh: { name: 'upper limit of the print' },
  finishLow: { name: 'lower limit of the print' },
  gap: { name: 'gap at the seam', read: 'teeth' },
  hardness: { name: 'hardness of the material' },
  interference: { name: 'interference on a side' },
  knurlWidth: { name: 'width of the knurl' },
  powerLimit: { name: 'power of the machine' },
  speedLimit: { name: 'speed not to pass' },
  stickout: { name: 'stickout' },
  torqueLimit: { name: 'torque of the machine' },
  wall: { name: 'wall under the teeth' },
  yieldStrength: { name: 'yield strength of the material' },
};

export const figureName = (name: FigureName): string => FIGURES[name].name;

const withoutUnit = (name: FigureName, value: number, show: Show): string => {
  switch (FIGURES[name].read ?? 'number') {
    case 'count':
      return show.count(value);
    case 'share':
      return show.percent(value);
    case 'teeth':
      return `${value < 0 ? '−' : ''}${show.teeth(value)} of a tooth`;
    case 'number':
      return show.number(value);
  }
};

/** A figure with its unit, the shop's own first. */
export const figureText = (name: FigureName, { value, unit }: Figure, show: Show): string => {
  switch (unit) {
    case '1':
      return withoutUnit(name, value, show);
    case 'mm':
      return show.both(value);
    case 'rad':
      return show.angle(value);
    case 'm/min':
      return `${show.speed(value)} [${show.otherSpeed(value)}]`;
    case 'mm/rev':
      return `${show.feed(value)} [${show.otherFeed(value)}]`;
    case 'rev/min':
      return show.rotation(value);
    case 's':
      return show.time(value);
    default:
      return `${show.number(value)} ${unit}`;
  }
};
