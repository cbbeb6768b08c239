import type { Formula } from './formula.ts';

/** A blank, a seam and a finished part. */
export const PART_FORMULAS = {
  checkBlank: {
    formula: ['N = π D/p_t;  δ = N − round(N);  D − round(N) p_t/π;  next: ⌊N⌋ p_t/π'],
    sources: ['whole-tooth', 'window-thresholds', 'wheel-truth'],
  },
  chanceByLabel: {
    formula: ['share of [δ − Δ, δ + Δ] that lies within 0.10 of a whole number'],
    sources: ['wheel-truth', 'window-thresholds'],
  },
  seamTest: {
    formula: [
      'whole from s = 0.95: nothing;  s ≤ 0.10: s p_t/π;  else (s + k) p_t/π ≥ 2 z1, scrap: k = 0',
      'marks counted: p_eff = π D/(n − 1 + s)',
      'chance that it tracks ≥ 90 % fine, else watch',
    ],
    sources: ['seam-test', 'seam-reading', 'first-bite', 'judgement'],
  },
  seamChance: {
    formula: [
      'P(|m + e + w| ≤ 0.10),  e ~ N(0, 0.05²),  w even in ±h',
      'P(m + e + w ≤ a) = σ/(2h) (G((a − m + h)/σ) − G((a − m − h)/σ)),  G(z) = z Φ(z) + φ(z)',
    ],
    sources: ['seam-reading', 'normal-spread'],
  },
  checkAfter: {
    formula: [
      'N expected = round(π D/p_t);  x = H/Hf = 1 − w/p;  g = (Do − D)/growth(x);  Do = D + ḡ growth(x_crest)',
      'off: more than 2.5 standard deviations of what is expected and how well it is measured',
    ],
    sources: ['check-after', 'check-limits', 'round-work', 'growth-prior'],
  },
  measuredGrowthShare: {
    formula: ['g = (D_crest − D_blank) / growth(H)'],
    sources: ['round-work'],
  },
  partChecks: {
    formula: [
      'count: N as worked out fine;  within Δ + 0.5 of π D/p_t watch;  else, or within 6 % of twice N, stop',
      'fill, growth: up to 2.5 standard deviations off fine, else watch',
    ],
    sources: ['wheel-truth', 'check-limits', 'growth-prior', 'judgement'],
  },
  rescueSpoiled: {
    formula: [
      'cleaned = crest − 2 H;  N = ⌊π cleaned/p_t⌋ and on down until the crest meets the print',
    ],
    sources: ['check-after', 'whole-tooth'],
  },
  fadeAlong: {
    formula: ['x = 1 − w/p;  z = z(x);  tan α = (z₁ − z₂)/l, near end 1, far end 2'],
    sources: ['fade-along', 'tooth-geometry', 'round-work', 'check-limits'],
  },
} as const satisfies Record<string, Formula>;
