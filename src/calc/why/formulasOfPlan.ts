import type { Formula } from './formula.ts';

/** A plan, and the causes of a trouble. */
export const PLAN_FORMULAS = {
  plan: {
    formula: [
      'D_b = N p_t/π;  x from ḡ·growth(x) = D_middle − D_b, 0.70 ≤ x ≤ 0.97;  rank by P_tracks · P_lands',
    ],
    sources: ['plan-chances', 'fill-limits', 'turning-spread'],
  },
  chanceOfTracking: {
    formula: ['P(|δ| ≤ 0.10),  δ ~ N(0, (π σ_D/p_t)² + (u N)²/3)'],
    sources: ['plan-chances', 'window-thresholds', 'turning-spread'],
  },
  chanceOfLanding: {
    formula: ['P(G_low/G_full ≤ g ≤ G_high/G_shallow),  g ~ N(ḡ, sd²)'],
    sources: ['plan-chances'],
  },
  chanceOfTurning: {
    formula: ['P(low ≤ D ≤ high),  D ~ N(D₀, σ_D²)'],
    sources: ['plan-chances', 'turning-spread'],
  },
  rankCauses: {
    formula: ['weight = prior × Π factors;  chance = weight / Σ weights'],
    sources: ['trouble-priors', 'trouble-numbers'],
  },
  numberFactor: {
    formula: [
      'P = Φ(±(v − limit)/spread), or Φ(±ln(v/limit)/spread) by ratio;  factor = max(P/usual, 0.04)',
    ],
    sources: ['trouble-numbers', 'normal-spread'],
  },
  learnedPrior: {
    formula: ['P = (12 p + n) / (12 + Σ n),  p the first guess, n the results of this shop'],
    sources: ['trouble-priors'],
  },
} as const satisfies Record<string, Formula>;
