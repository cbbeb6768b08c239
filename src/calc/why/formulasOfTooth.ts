import type { Formula } from './formula.ts';

/** Pitch, count, blank, tooth and growth. */
export const TOOTH_FORMULAS = {
  labelledPitch: {
    formula: ['t = t;  t = 25.4 / TPI;  t = 25.4 π / DP;  t = π m'],
    sources: ['asme-b94.6', 'jis-b-0951', 'tpi-practice'],
  },
  basisOf: {
    formula: ['metric, TPI, module: square to the tooth; DP: along the rim'],
    sources: ['din-403', 'asme-b94.6', 'tpi-practice', 'jis-b-0951'],
  },
  workPitch: {
    formula: ['p_t = p / cos ψ'],
    sources: ['asme-b94.6', 'tpi-practice'],
  },
  countedWheelPitch: {
    formula: ['p_w = π D_w / N_w'],
    sources: ['din-403'],
  },
  provenPitch: {
    formula: ['p_eff = π D / N'],
    sources: ['wheel-truth'],
  },
  toothCount: {
    formula: ['N = π D / p_t'],
    sources: ['whole-tooth', 'asme-b94.6'],
  },
  toothError: {
    formula: ['δ = N − round(N)'],
    sources: ['whole-tooth'],
  },
  largestWholeCount: {
    formula: ['N = ⌊π D / p_t⌋'],
    sources: ['whole-tooth'],
  },
  wholeToothDiameter: {
    formula: ['D = N · p_t / π'],
    sources: ['whole-tooth'],
  },
  chooseBlank: {
    formula: [
      'as it is: N = round(π D/p_t);  under a bar: N = ⌊π D/p_t⌋',
      'for a print: N whose crest comes nearest the middle of the limits, N ≤ ⌊π D/p_t⌋',
      'crest outside them: x from 0.70 to 0.92 at which it comes nearest their middle',
    ],
    sources: ['whole-tooth', 'round-work', 'growth-prior', 'fill-limits'],
  },
  trackingWindow: {
    formula: ['D ± 0.10 p_t/π, or the tolerance of the class that was called out'],
    sources: ['window-thresholds', 'asme-b94.6'],
  },
  classBlankTolerance: {
    formula: ['I and II: ±t; III: +0 / −t'],
    sources: ['asme-b94.6', 'asme-b94.6-memory'],
  },
  sharpHeight: {
    formula: ['Hf = p / (2 tan a)'],
    sources: ['tooth-geometry'],
  },
  heightOfFill: {
    formula: ['H = x Hf'],
    sources: ['tooth-geometry'],
  },
  startingFill: {
    formula: [
      "x = what was asked, else min(0.90, the material's own);  never over the wheel's own tooth",
    ],
    sources: ['fill-default', 'materials-practice', 'tooth-geometry'],
  },
  makeTooth: {
    formula: [
      'formed: Do = D + ḡ growth(H), its 80 % spread D + (ḡ ± 1.2816 sd) growth(H);  cut: Do = D',
    ],
    sources: ['round-work', 'growth-prior'],
  },
  solidShare: {
    formula: ['g = min(1, β + u/Hf);  grooves 1 − g;  raised (1 − g)²;  sunk 1 − g²'],
    sources: ['volume-constancy'],
  },
  formedFlat: {
    formula: [
      'z = ∫₀ᴴ share du;  r = H − z;  growth = 2r',
      'r = G₁ grooves;  2G₁ − G₂ raised;  G₂ sunk',
      'G₁ = H (β + x/2);  G₂ = H (β² + βx + x²/3);  x = H/Hf',
    ],
    sources: ['volume-constancy', 'din-82-blank'],
  },
  profileVariance: {
    formula: [
      's² = 2 ∫₀ᴴ u·share du − z²',
      'grooves H²(x/3 − x²/4);  raised H²(2x/3 − 7x²/6 + 2x³/3 − x⁴/9);  sunk H²(x²/6 − x⁴/9);  x = H/Hf',
    ],
    sources: ['round-work'],
  },
  formedRound: {
    formula: ['Rr = √(Db²/4 − s²) − z;  infeed = Db/2 − Rr;  Do = 2 (Rr + H);  growth = Do − Db'],
    sources: ['round-work', 'volume-constancy'],
  },
  heightFromCrest: {
    formula: ['H where Do(H) of formedRound is the crest diameter, by halving to 1e-12 of H'],
    sources: ['round-work'],
  },
  crestFlat: {
    formula: ['w = p (1 − x)'],
    sources: ['tooth-geometry'],
  },
  cutKnurl: {
    formula: ['Do = Db;  infeed = H;  A = f·r(H);  Ft = kc·A;  Fr = 0.5 Ft'],
    sources: ['volume-constancy', 'cut-force', 'cut-practice'],
  },
  growthBeforeResults: {
    formula: ['ḡ = 0.95, sd = √(0.08² + 0.04² + 0.05²)'],
    sources: ['growth-prior'],
  },
  growthBelief: {
    formula: [
      'g_fj = μ + φ_f + ε;  μ ~ N(0.95, 0.08²), φ_f ~ N(0, 0.04²), ε ~ N(0, 0.05²)',
      'k_f = n_f/0.05² / (1/0.04² + n_f/0.05²);  1/V = 1/0.08² + Σ k_f/0.04²',
      'μ̂ = V (0.95/0.08² + Σ k_f ḡ_f/0.04²);  mean = (1 − k_f) μ̂ + k_f ḡ_f',
      'sd² = (1 − k_f)² V + 1/(1/0.04² + n_f/0.05²) + 0.05²',
    ],
    sources: ['growth-learned', 'growth-prior'],
  },
  firstBite: {
    formula: ['H1 = 2 δ Hf,  z1 = H1 − H1²/(2 Hf)  →  0.18 Hf at δ = 0.10'],
    sources: ['first-bite'],
  },
  firstCutBite: {
    formula: ['z1 = H1 = 2 δ Hf'],
    sources: ['first-bite'],
  },
} as const satisfies Record<string, Formula>;
