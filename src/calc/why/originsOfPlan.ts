import type { Origins } from './origin.ts';
import { FORMED_CREST } from './originsShared.ts';

/** Names of the figures of a plan: those of its best set-up. */
export const PLAN_FIGURES = [
  'toothCount',
  'blankDiameter',
  'fill',
  'crestDiameter',
  'chanceTracks',
  'chanceLands',
] as const;
export type PlanFigureName = (typeof PLAN_FIGURES)[number];

/** How every figure of a plan comes about. */
export const PLAN_ORIGINS: Readonly<Record<PlanFigureName, Origins>> = {
  toothCount: [
    {
      by: 'plan',
      parts: ['rank by P_tracks · P_lands'],
      inputs: { P_tracks: 'chanceTracks', P_lands: 'chanceLands' },
    },
  ],
  blankDiameter: [
    {
      by: 'plan',
      parts: ['D_b = N p_t/π'],
      inputs: { N: 'toothCount' },
      given: { p_t: 'pitchOfWheel' },
    },
  ],
  fill: [
    {
      by: 'plan',
      parts: ['x from ḡ·growth(x) = D_middle − D_b, 0.70 ≤ x ≤ 0.97'],
      inputs: { D_b: 'blankDiameter' },
      given: { D_middle: 'limits', ḡ: 'growthMean', growth: 'staticGrowth' },
    },
  ],
  crestDiameter: [
    { when: ['cut'], by: 'cutKnurl', parts: ['Do = Db'], inputs: { Db: 'blankDiameter' } },
    {
      ...FORMED_CREST,
      inputs: { D: 'blankDiameter' },
      also: ['fill'],
      given: { ḡ: 'growthMean', growth: 'staticGrowth', H: 'heightOfFill', sd: 'growthSpread' },
    },
  ],
  chanceTracks: [
    {
      by: 'chanceOfTracking',
      inputs: { N: 'toothCount' },
      through: { u: 'countDoubt' },
      given: { σ_D: 'turningSpread', p_t: 'pitchOfWheel' },
    },
  ],
  chanceLands: [
    {
      when: ['cut'],
      by: 'chanceOfTurning',
      inputs: { 'D₀': 'blankDiameter' },
      given: { low: 'limits', high: 'limits', σ_D: 'turningSpread' },
    },
    {
      by: 'chanceOfLanding',
      also: ['blankDiameter'],
      given: {
        G_low: 'growthWanted',
        G_high: 'growthWanted',
        G_full: 'growthAtFull',
        G_shallow: 'growthAtShallow',
        ḡ: 'growthMean',
        sd: 'growthSpread',
      },
    },
  ],
};

/** Names of the figures of a trouble: the likeliest cause's. */
export const TROUBLE_FIGURES = ['chanceOfCause'] as const;
export type TroubleFigureName = (typeof TROUBLE_FIGURES)[number];

/** How the chance of a cause comes about. */
export const TROUBLE_ORIGINS: Readonly<Record<TroubleFigureName, Origins>> = {
  chanceOfCause: [
    {
      by: 'rankCauses',
      through: { prior: 'learnedPrior', factors: 'numberFactor' },
      given: { p: 'firstGuess', n: 'resultsOfShop', v: 'numberOfSetup', limit: 'limitOfNumber' },
    },
  ],
};
