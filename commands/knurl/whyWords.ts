import type { CheckName, CheckNumber, FigureName, Subject } from '../../src/calc/index.ts';

/** Figures that can be asked about. */
export type AskedFigure = Exclude<FigureName, CheckNumber>;

/** How people call the figures of a set-up; the first name is the one that buttons send. */
const SETUP_FIGURES_SAID = {
  stockToothCount: ['bar teeth', 'teeth on the bar', 'stock teeth'],
  stockToothError: ['bar error', 'bar tooth error', 'stock error'],
  toothCount: ['tooth count', 'teeth', 'count', 'number of teeth'],
  blankDiameter: ['blank', 'diameter', 'blank diameter', 'turn to', 'dia'],
  blankWindowLow: ['smallest blank', 'window', 'window low', 'blank window'],
  blankWindowHigh: ['largest blank', 'window high', 'window'],
  pitch: ['pitch', 'normal pitch', 'pitch square to the teeth'],
  transversePitch: ['rim pitch', 'pitch round the rim', 'transverse pitch', 'pitch on the rim'],
  sharpHeight: ['sharp height', 'full height', 'sharp tooth'],
  toothHeight: ['tooth height', 'height', 'tooth depth', 'depth', 'tooth'],
  fill: ['fill', 'filling'],
  infeed: ['infeed', 'feed in', 'in feed', 'past touch', 'plunge depth'],
  fullInfeed: ['full infeed', 'infeed at full form', 'full form'],
  growth: ['static growth', 'growth'],
  growthFactor: ['growth factor', 'factor'],
  crestDiameter: ['crest', 'crest diameter', 'crests', 'over crests', 'finished diameter'],
  crestDiameterLow: ['smallest crest', 'lowest crest', 'crest low', 'crest band'],
  crestDiameterHigh: ['largest crest', 'highest crest', 'crest high', 'crest band'],
  crestFlat: ['flat', 'crest flat', 'flats', 'flat on the crests', 'stop'],
  firstBite: ['first turn', 'first bite', 'bite'],
  infeedPerTurn: ['infeed per turn', 'infeed each turn', 'infeed a turn', 'each turn'],
  surfaceSpeed: ['surface speed', 'speed', 'sfm', 'cutting speed'],
  spindleSpeed: ['rpm', 'spindle speed', 'spindle', 'run', 'revs'],
  feed: ['feed', 'feed rate', 'feedrate', 'travel'],
  feedLow: ['slowest feed', 'lowest feed', 'feed low'],
  feedHigh: ['fastest feed', 'highest feed', 'feed high'],
  turns: ['turns', 'revolutions', 'plunge'],
  passes: ['passes', 'pass'],
  time: ['time', 'how long'],
  radialForce: ['force', 'radial force', 'load', 'push'],
  radialForceLow: ['lowest force', 'low force', 'force low'],
  radialForceHigh: ['highest force', 'high force', 'force high'],
  torque: ['torque'],
  power: ['power'],
  deflection: ['deflection', 'sag', 'bend'],
  bendingStress: ['bending stress', 'stress'],
  ringStress: ['wall stress', 'ring stress', 'stress'],
  ringClosing: ['wall closing', 'ring closing', 'closing', 'out of round'],
  pinHeatIndex: ['pin heat', 'pin heat index', 'heat'],
  pinPressure: ['pin load', 'pin pressure', 'pressure'],
  wheelSpeed: ['wheel speed', 'wheel rpm'],
  wheelWarmUp: ['warm up', 'wheel warm up', 'wheel heat', 'wheel temperature'],
} as const satisfies Partial<Record<AskedFigure, readonly string[]>>;

/** How people call the figures that only a check has. */
const CHECK_FIGURES_SAID = {
  toothError: ['tooth error', 'error', 'off'],
  diameterError: ['diameter error'],
  seamDiameter: ['seam diameter', 'diameter', 'turn to', 'blank'],
  seamTakeOff: ['seam take off', 'take off', 'comes off'],
  seamTeethOff: ['teeth off'],
  seamLabelChance: ['label chance', 'chance by the label'],
  marksTakeOff: ['marks take off', 'marks'],
  marksDiameter: ['marks diameter'],
  nextDiameter: ['next diameter', 'next blank', 'next', 'diameter', 'turn to', 'blank'],
  nextToothCount: ['next count', 'next tooth count', 'next teeth'],
  nextTakeOff: ['next take off', 'take off', 'comes off'],
  countDoubt: ['count doubt', 'doubt'],
  chanceTracks: ['chance it tracks', 'chance', 'chance tracks', 'odds'],
  effectivePitch: ['effective pitch', 'own pitch', 'wheel pitch'],
  countedTeeth: ['counted teeth', 'counted', 'teeth counted'],
  countExpected: ['expected count', 'count expected', 'teeth expected'],
  growthMeasured: ['measured growth', 'growth measured', 'growth'],
  growthExpected: ['expected growth', 'growth expected'],
  growthFactorExpected: ['expected growth factor', 'growth factor expected'],
  fillMeasured: ['measured fill', 'fill measured', 'fill'],
  fillExpected: ['planned fill', 'fill planned', 'expected fill', 'fill expected'],
  fillFromCrest: ['fill from crest', 'fill by the crest', 'fill'],
  crestMeasured: ['measured crest', 'crest measured'],
  cleanedDiameter: ['cleaned diameter', 'cleans up', 'clean up'],
  rescueDiameter: ['rescue diameter', 'rescue', 'smaller blank'],
  rescueToothCount: ['rescue count', 'rescue teeth'],
  rescueFill: ['rescue fill'],
  fillNear: ['fill near', 'near fill'],
  fillFar: ['fill far', 'far fill'],
  infeedNear: ['infeed near', 'near infeed'],
  infeedFar: ['infeed far', 'far infeed'],
  taper: ['taper'],
  swivelAngle: ['swivel', 'swivel angle', 'angle'],
} as const satisfies Partial<Record<AskedFigure, readonly string[]>>;

export const FIGURES_SAID: Readonly<Record<AskedFigure, readonly [string, ...string[]]>> = {
  ...SETUP_FIGURES_SAID,
  ...CHECK_FIGURES_SAID,
  chanceLands: ['chance it lands', 'chance lands', 'lands'],
  chanceOfCause: ['chance of the cause', 'chance', 'cause', 'likeliest'],
};

/** How people call the checks. Where a figure has the same name, `check` before it means this one. */
export const CHECKS_SAID: Readonly<Record<CheckName, readonly [string, ...string[]]>> = {
  tracking: ['tracking', 'track', 'tracks'],
  wheel: ['wheel', 'label'],
  runout: ['runout', 'run out'],
  fill: ['fill'],
  feed: ['feed'],
  edge: ['edge', 'edges'],
  material: ['material', 'metal'],
  speed: ['speed'],
  finish: ['print', 'finish', 'limits'],
  pinHeat: ['pin heat'],
  pinPressure: ['pin load', 'pin pressure'],
  bending: ['bending', 'bend'],
  ring: ['wall', 'ring', 'tube'],
  stickout: ['stickout', 'stick out', 'overhang'],
  width: ['width'],
  capacity: ['machine', 'capacity'],
  fit: ['fit', 'press fit'],
  seam: ['seam'],
  count: ['count'],
  filled: ['filled', 'fill'],
  growth: ['growth'],
  taper: ['taper'],
};

/** Said where a figure is missing. */
export const FIGURE_EXAMPLES = ['infeed', 'crest', 'speed', 'tracking'] as const;

const entries = <K extends string>(said: Readonly<Record<K, readonly string[]>>) =>
  Object.entries(said) as [K, readonly string[]][];

type Rank = { readonly subject: Subject; readonly rank: number };
type Index = ReadonlyMap<string, readonly Subject[]>;

/** Every name with what it can mean: what it is the first name of before what it also means. */
const indexOf = (
  all: readonly { readonly subject: Subject; readonly said: readonly string[] }[],
) => {
  const found = new Map<string, Rank[]>();
  for (const { subject, said } of all)
    for (const [rank, phrase] of said.entries())
      found.set(phrase, [...(found.get(phrase) ?? []), { subject, rank: Math.min(rank, 1) }]);
  const sorted = [...found].map(([phrase, ranks]): [string, readonly Subject[]] => [
    phrase,
    ranks.toSorted((a, b) => a.rank - b.rank).map(({ subject }) => subject),
  ]);
  return new Map(sorted);
};

const figures = entries(FIGURES_SAID).map(([figure, said]) => ({
  subject: { figure },
  // The name that programs read is understood too.
  said: [...new Set([...said, figure.toLowerCase()])],
}));
const checks = entries(CHECKS_SAID).map(([check, said]) => ({
  subject: { check },
  said: [...new Set([...said, check.toLowerCase()])],
}));

const CHECK_INDEX: Index = indexOf(checks);
const FIGURE_INDEX: Index = indexOf(figures);

/** What a name means, figures before checks. */
export const subjectsOf = (phrase: string, onlyChecks: boolean): readonly Subject[] => [
  ...(onlyChecks ? [] : (FIGURE_INDEX.get(phrase) ?? [])),
  ...(CHECK_INDEX.get(phrase) ?? []),
];

/** Names to offer for one that is misspelt. */
export const namesSaid = (onlyChecks: boolean): readonly string[] => [
  ...(onlyChecks ? [] : FIGURE_INDEX.keys()),
  ...CHECK_INDEX.keys(),
];

/** The name that a button sends. */
export const saidOf = (subject: Subject): string =>
  'check' in subject
    ? `check ${CHECKS_SAID[subject.check][0]}`
    : FIGURES_SAID[subject.figure as AskedFigure][0];
