import type { SetupFigureName } from '../setup/index.ts';
import type { Origins } from './origin.ts';
import { LOAD_ORIGINS } from './originsOfLoad.ts';
import { MOTION_ORIGINS } from './originsOfMotion.ts';
import {
  FILL,
  FORMED,
  FORMED_CREST,
  GROWTH_FACTOR,
  PITCH,
  TRANSVERSE_PITCH,
  WINDOW,
} from './originsShared.ts';

const CREST: Origins = [
  {
    when: ['cut'],
    by: 'cutKnurl',
    parts: ['Do = Db'],
    inputs: { Db: 'blankDiameter' },
  },
  {
    ...FORMED_CREST,
    inputs: { D: 'blankDiameter', growth: 'growth', ḡ: 'growthFactor', H: 'toothHeight' },
    given: { sd: 'growthSpread' },
  },
];

const BLANK_ORIGINS = {
  stockToothCount: [
    {
      by: 'toothCount',
      inputs: { p_t: 'transversePitch' },
      given: { D: 'bar' },
      remark: 'nearestWhole',
    },
  ],
  stockToothError: [
    {
      by: 'toothError',
      inputs: { p_t: 'transversePitch', 'round(N)': 'stockToothCount' },
      through: { N: 'toothCount' },
      given: { D: 'bar' },
    },
  ],
  toothCount: [
    {
      when: ['asIs'],
      by: 'toothCount',
      inputs: { D: 'blankDiameter', p_t: 'transversePitch' },
      remark: 'nearestWhole',
    },
    { when: ['teethAsked'], told: 'person' },
    {
      when: ['forPrint'],
      by: 'chooseBlank',
      parts: ['for a print: N whose crest comes nearest the middle of the limits, N ≤ ⌊π D/p_t⌋'],
      inputs: { p_t: 'transversePitch', crest: 'crestDiameter' },
      given: { D: 'barIfAny', limits: 'limits' },
    },
    {
      by: 'largestWholeCount',
      inputs: { p_t: 'transversePitch' },
      given: { D: 'bar' },
    },
  ],
  blankDiameter: [
    { when: ['asIs'], told: 'person' },
    { by: 'wholeToothDiameter', inputs: { N: 'toothCount', p_t: 'transversePitch' } },
  ],
  blankWindowLow: WINDOW,
  blankWindowHigh: WINDOW,
  pitch: PITCH,
  transversePitch: TRANSVERSE_PITCH,
} as const satisfies Partial<Record<SetupFigureName, Origins>>;

const TOOTH_ORIGINS = {
  sharpHeight: [{ by: 'sharpHeight', inputs: { p: 'pitch' }, given: { a: 'halfAngle' } }],
  toothHeight: [{ by: 'heightOfFill', inputs: { x: 'fill', Hf: 'sharpHeight' } }],
  fill: FILL,
  infeed: [
    { when: ['cut'], by: 'cutKnurl', parts: ['infeed = H'], inputs: { H: 'toothHeight' } },
    {
      ...FORMED,
      by: 'formedRound',
      parts: ['Rr = √(Db²/4 − s²) − z;  infeed = Db/2 − Rr'],
      inputs: { Db: 'blankDiameter', H: 'toothHeight', Hf: 'sharpHeight' },
    },
  ],
  fullInfeed: [
    {
      when: ['cut'],
      by: 'cutKnurl',
      parts: ['infeed = H'],
      inputs: { H: 'sharpHeight' },
      remark: 'atFullForm',
    },
    {
      ...FORMED,
      by: 'formedRound',
      parts: ['Rr = √(Db²/4 − s²) − z;  infeed = Db/2 − Rr'],
      inputs: { Db: 'blankDiameter', Hf: 'sharpHeight', H: 'sharpHeight' },
      remark: 'atFullForm',
    },
  ],
  growth: [
    {
      when: ['cut'],
      by: 'cutKnurl',
      parts: ['Do = Db'],
      inputs: { Do: 'crestDiameter', Db: 'blankDiameter' },
    },
    {
      ...FORMED,
      by: 'formedRound',
      parts: ['Rr = √(Db²/4 − s²) − z', 'Do = 2 (Rr + H);  growth = Do − Db'],
      inputs: { Db: 'blankDiameter', H: 'toothHeight', Hf: 'sharpHeight' },
    },
  ],
  growthFactor: GROWTH_FACTOR,
  crestDiameter: CREST,
  crestDiameterLow: CREST,
  crestDiameterHigh: CREST,
  crestFlat: [{ by: 'crestFlat', inputs: { p: 'pitch', x: 'fill' } }],
  firstBite: [
    {
      when: ['cut'],
      by: 'firstCutBite',
      inputs: { Hf: 'sharpHeight' },
      given: { δ: 'caughtShare' },
    },
    { by: 'firstBite', inputs: { Hf: 'sharpHeight' }, given: { δ: 'caughtShare' } },
  ],
} as const satisfies Partial<Record<SetupFigureName, Origins>>;

/** How every figure of a set-up comes about. */
export const SETUP_ORIGINS: Readonly<Record<SetupFigureName, Origins>> = {
  ...BLANK_ORIGINS,
  ...TOOTH_ORIGINS,
  ...MOTION_ORIGINS,
  ...LOAD_ORIGINS,
};
