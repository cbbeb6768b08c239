import type { Origins, Worked } from './origin.ts';
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

/** What rests on the growth to expect: the shop's own, or what is taken before it has results. */
const byGrowth = (worked: Worked): Origins => [
  { ...worked, when: ['growthLearned'], through: { ḡ: 'growthBelief' } },
  { ...worked, through: { ḡ: 'growthBeforeResults' } },
];

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
  fill: byGrowth({
    by: 'plan',
    parts: ['x from ḡ·growth(x) = D_middle − D_b, 0.70 ≤ x ≤ 0.97'],
    inputs: { D_b: 'blankDiameter' },
    given: { D_middle: 'limits', growth: 'staticGrowth' },
  }),
  crestDiameter: [
    { when: ['cut'], by: 'cutKnurl', parts: ['Do = Db'], inputs: { Db: 'blankDiameter' } },
    ...byGrowth({
      ...FORMED_CREST,
      inputs: { D: 'blankDiameter' },
      also: ['fill'],
      given: { growth: 'staticGrowth', H: 'heightOfFill' },
    }),
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
    ...byGrowth({
      by: 'chanceOfLanding',
      also: ['blankDiameter'],
      given: {
        G_low: 'growthWanted',
        G_high: 'growthWanted',
        G_full: 'growthAtFull',
        G_shallow: 'growthAtShallow',
      },
    }),
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
