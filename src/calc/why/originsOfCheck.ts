import type { CheckFigureName } from '../checking/index.ts';
import type { Origins, Worked } from './origin.ts';
import {
  FILL,
  FORMED_CREST,
  GROWTH_FACTOR,
  PITCH,
  TRANSVERSE_PITCH,
  WINDOW,
} from './originsShared.ts';

const COUNT: Origins = [
  {
    when: ['part'],
    by: 'toothCount',
    inputs: { D: 'blankDiameter', p_t: 'transversePitch' },
    remark: 'nearestWhole',
  },
  {
    by: 'toothCount',
    inputs: { p_t: 'transversePitch' },
    given: { D: 'blankSaid' },
    remark: 'nearestWhole',
  },
];

const BLANK_ORIGINS = {
  toothCount: COUNT,
  toothError: [
    {
      when: ['part'],
      by: 'toothError',
      inputs: { D: 'blankDiameter', p_t: 'transversePitch', 'round(N)': 'toothCount' },
      through: { N: 'toothCount' },
    },
    {
      by: 'toothError',
      inputs: { p_t: 'transversePitch', 'round(N)': 'toothCount' },
      through: { N: 'toothCount' },
      given: { D: 'blankSaid' },
    },
  ],
  diameterError: [
    {
      by: 'checkBlank',
      parts: ['D − round(N) p_t/π'],
      inputs: { 'round(N)': 'toothCount', p_t: 'transversePitch' },
      given: { D: 'blankSaid' },
    },
  ],
  blankWindowLow: WINDOW,
  blankWindowHigh: WINDOW,
  pitch: PITCH,
  transversePitch: TRANSVERSE_PITCH,
  countDoubt: [{ by: 'countDoubt', inputs: { N: 'toothCount' } }],
  chanceTracks: [
    {
      when: ['seam'],
      by: 'seamChance',
      inputs: { h: 'seamTeethOff' },
      given: { m: 'gapLeft' },
    },
    { by: 'chanceByLabel', inputs: { δ: 'toothError', Δ: 'countDoubt' } },
  ],
} as const satisfies Partial<Record<CheckFigureName, Origins>>;

const TAKE_OFF =
  'whole from s = 0.95: nothing;  s ≤ 0.10: s p_t/π;  else (s + k) p_t/π ≥ 2 z1, scrap: k = 0';

const SEAM = {
  by: 'seamTest',
  parts: [TAKE_OFF],
  inputs: { p_t: 'transversePitch', z1: 'firstBite' },
  given: { s: 'gapRead', k: 'wholeTeeth' },
} as const satisfies Worked;

const SEAM_LEFT = { ...SEAM, remark: 'blankLessThat' } as const satisfies Worked;

const MARKS_COUNTED = 'marks counted: p_eff = π D/(n − 1 + s)';

const NEXT = {
  by: 'checkBlank',
  parts: ['next: ⌊N⌋ p_t/π'],
  inputs: { p_t: 'transversePitch', N: 'nextToothCount' },
} as const satisfies Worked;

const SEAM_ORIGINS = {
  nextDiameter: [{ when: ['seam'], ...SEAM_LEFT }, NEXT],
  nextTakeOff: [
    { when: ['seam'], ...SEAM },
    { ...NEXT, remark: 'comesOff' },
  ],
  nextToothCount: [
    {
      when: ['seam'],
      by: 'seamTest',
      parts: [MARKS_COUNTED],
      given: { n: 'marksCounted', s: 'gapRead', D: 'blankSaid' },
    },
    {
      by: 'largestWholeCount',
      inputs: { p_t: 'transversePitch' },
      given: { D: 'blankSaid' },
    },
  ],
  effectivePitch: [
    {
      when: ['seam'],
      by: 'seamTest',
      parts: [MARKS_COUNTED],
      given: { D: 'blankSaid', n: 'marksCounted', s: 'gapRead' },
    },
    { by: 'provenPitch', inputs: { D: 'blankDiameter', N: 'countedTeeth' } },
  ],
  seamTakeOff: [SEAM],
  seamDiameter: [SEAM_LEFT],
  seamTeethOff: [SEAM],
  seamLabelChance: [
    { by: 'chanceByLabel', inputs: { Δ: 'countDoubt' }, given: { δ: 'wholeByLabel' } },
  ],
  marksTakeOff: [SEAM],
  marksDiameter: [SEAM_LEFT],
  firstBite: [
    {
      when: ['cut'],
      by: 'firstCutBite',
      inputs: { p: 'pitch' },
      through: { Hf: 'sharpHeight' },
      given: { a: 'halfAngle', δ: 'caughtShare' },
    },
    {
      by: 'firstBite',
      inputs: { p: 'pitch' },
      through: { Hf: 'sharpHeight' },
      given: { a: 'halfAngle', δ: 'caughtShare' },
    },
  ],
} as const satisfies Partial<Record<CheckFigureName, Origins>>;

const CREST: Origins = [
  { when: ['cut'], by: 'cutKnurl', parts: ['Do = Db'], inputs: { Db: 'blankDiameter' } },
  {
    ...FORMED_CREST,
    inputs: { D: 'blankDiameter', ḡ: 'growthFactorExpected' },
    given: { growth: 'staticGrowth', sd: 'growthSpread', H: 'heightMeasured' },
  },
];

const MEASURED_SHARE = {
  by: 'measuredGrowthShare',
  inputs: { D_crest: 'crestMeasured', D_blank: 'blankDiameter' },
  given: { growth: 'staticGrowth', H: 'heightMeasured' },
} as const satisfies Worked;

const PART_ORIGINS = {
  blankDiameter: [{ told: 'person' }],
  countedTeeth: [{ told: 'person' }],
  crestMeasured: [{ told: 'person' }],
  countExpected: [
    {
      by: 'toothCount',
      inputs: { D: 'blankDiameter', p_t: 'transversePitch' },
      remark: 'nearestWhole',
    },
  ],
  growthMeasured: [{ ...MEASURED_SHARE, remark: 'onlyDifference' }],
  growthExpected: [
    {
      ...FORMED_CREST,
      inputs: { Do: 'crestDiameter', D: 'blankDiameter', ḡ: 'growthFactorExpected' },
      given: { growth: 'staticGrowth', sd: 'growthSpread', H: 'heightMeasured' },
    },
  ],
  growthFactor: [MEASURED_SHARE],
  growthFactorExpected: GROWTH_FACTOR,
  fillMeasured: [
    {
      by: 'checkAfter',
      parts: ['x = H/Hf = 1 − w/p'],
      inputs: { p: 'pitch' },
      through: { Hf: 'sharpHeight' },
      given: { H: 'heightMeasured', w: 'flatMeasured', a: 'halfAngle' },
    },
  ],
  fillExpected: FILL,
  fillFromCrest: [
    {
      by: 'checkAfter',
      parts: ['Do = D + ḡ growth(x_crest)'],
      inputs: { Do: 'crestMeasured', D: 'blankDiameter', ḡ: 'growthFactorExpected' },
      through: { x_crest: 'heightFromCrest' },
      given: { growth: 'staticGrowth' },
    },
  ],
  crestDiameter: CREST,
  crestDiameterLow: CREST,
  crestDiameterHigh: CREST,
} as const satisfies Partial<Record<CheckFigureName, Origins>>;

const NEXT_COUNT = 'N = ⌊π cleaned/p_t⌋ and on down until the crest meets the print';

const RESCUE = {
  by: 'rescueSpoiled',
  parts: [NEXT_COUNT],
  inputs: { cleaned: 'cleanedDiameter', p_t: 'transversePitch' },
} as const satisfies Worked;

const RESCUE_ORIGINS = {
  cleanedDiameter: [
    {
      by: 'rescueSpoiled',
      parts: ['cleaned = crest − 2 H'],
      inputs: { crest: 'crestMeasured' },
      given: { H: 'cleanedHeight' },
    },
  ],
  rescueDiameter: [
    {
      by: 'wholeToothDiameter',
      inputs: { N: 'rescueToothCount', p_t: 'transversePitch', cleaned: 'cleanedDiameter' },
      through: { N: ['rescueSpoiled', NEXT_COUNT] },
    },
  ],
  rescueToothCount: [RESCUE],
  rescueFill: [RESCUE],
} as const satisfies Partial<Record<CheckFigureName, Origins>>;

const FILL_ALONG = {
  by: 'fadeAlong',
  parts: ['x = 1 − w/p'],
  inputs: { p: 'pitch' },
  given: { w: 'flatAtPlace' },
} as const satisfies Worked;

const FADE_ORIGINS = {
  fillNear: [FILL_ALONG],
  fillFar: [FILL_ALONG],
  infeedNear: [
    {
      by: 'fadeAlong',
      parts: ['x = 1 − w/p;  z = z(x)'],
      inputs: { x: 'fillNear', p: 'pitch' },
      given: { w: 'flatAtPlace', z: 'infeedOfFill' },
    },
  ],
  infeedFar: [
    {
      by: 'fadeAlong',
      parts: ['x = 1 − w/p;  z = z(x)'],
      inputs: { x: 'fillFar', p: 'pitch' },
      given: { w: 'flatAtPlace', z: 'infeedOfFill' },
    },
  ],
  taper: [
    {
      by: 'fadeAlong',
      parts: ['z = z(x);  tan α = (z₁ − z₂)/l, near end 1, far end 2'],
      inputs: { 'z₁': 'infeedNear', 'z₂': 'infeedFar' },
      given: { l: 'distance', z: 'infeedOfFill' },
    },
  ],
  swivelAngle: [
    {
      by: 'fadeAlong',
      parts: ['tan α = (z₁ − z₂)/l, near end 1, far end 2'],
      inputs: { 'z₁': 'infeedNear', 'z₂': 'infeedFar' },
      given: { l: 'distance' },
    },
  ],
} as const satisfies Partial<Record<CheckFigureName, Origins>>;

/** How every figure of a check comes about. */
export const CHECK_FIGURE_ORIGINS: Readonly<Record<CheckFigureName, Origins>> = {
  ...BLANK_ORIGINS,
  ...SEAM_ORIGINS,
  ...PART_ORIGINS,
  ...RESCUE_ORIGINS,
  ...FADE_ORIGINS,
};
