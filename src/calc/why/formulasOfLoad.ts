import type { Formula } from './formula.ts';

/** What the wheels press on, and what gives way. */
export const LOAD_FORMULAS = {
  metalPressure: {
    formula: ['q = 9.80665 HB 2.5ⁿ'],
    sources: ['hardness-as-yield', 'work-hardening'],
  },
  plasticPressure: {
    formula: ['q = 3 Re'],
    sources: ['plastic-pressure'],
  },
  wedgeShare: {
    formula: ['grooves x;  one of a pair x − x²/2;  crossed, raised 2x − x²;  crossed, sunk x²'],
    sources: ['force-model'],
  },
  meanWedgeShare: {
    formula: [
      'φ̄ = (1/z) ∫₀ᶻ φ dz,  dz = share dH',
      'grooves (x/2 − x²/3)/(1 − x/2);  crossed, sunk (x²/3 − x⁴/5)/(1 − x²/3)',
      'crossed, raised (x − 5x²/3 + x³ − x⁴/5)/(1 − x + x²/3), one of a pair half of it',
    ],
    sources: ['force-model', 'volume-constancy'],
  },
  equivalentRadius: {
    formula: ['Req = Dw Dp/(2 (Dw + Dp))'],
    sources: ['force-model'],
  },
  contactArc: {
    formula: ['L = √(2 Req dz)'],
    sources: ['force-model'],
  },
  contactModulus: {
    formula: ['1/E* = (1 − 0.29²)/E + (1 − 0.28²)/220000'],
    sources: ['hertz'],
  },
  hertzHalfWidth: {
    formula: ['b_e = 8 p̄ Req/(π E*)'],
    sources: ['hertz'],
  },
  trailingForce: {
    formula: ['p̄ = 0.5 q φ(x);  F = 2 p̄ b_e (b − c),  b_e = 8 p̄ Req/(π E*)'],
    sources: ['hertz', 'force-model', 'judgement'],
  },
  plungeForce: {
    formula: ['F = max(q φ(0.2) w √(2 Req z1), q φ(x) w √(2 Req dz))'],
    sources: ['force-model', 'first-bite'],
  },
  traverseForce: {
    formula: ['F = q φ̄ √(2 Req z f c) + 2 p̄ b_e (b − c),  c = max(f, bevel)'],
    sources: ['force-model', 'hertz'],
  },
  forceBand: {
    formula: ['F/2, F, 2F'],
    sources: ['force-model'],
  },
  wheelTorque: {
    formula: ['T = F (L/2)(1 + Dp/Dw)'],
    sources: ['force-model'],
  },
  cutTorque: {
    formula: ['T = Ft D/2'],
    sources: ['cut-force'],
  },
  drivePower: {
    formula: ['P = T 2π n/60000'],
    sources: ['force-model'],
  },
  secondMoment: {
    formula: ['I = π (D⁴ − d⁴)/64'],
    sources: ['beam'],
  },
  sectionModulus: {
    formula: ['W = 2 I/D'],
    sources: ['beam'],
  },
  bentInChuck: {
    formula: ['δ = F a³/(3 E I);  M = F a'],
    sources: ['beam'],
  },
  bentByTailstock: {
    formula: [
      'δ = F a³ b² (3a + 4b)/(12 E I L³);  b = L − a',
      'M = max(F a b (L + b)/(2L²), F a² b (3L − a)/(2L³))',
    ],
    sources: ['beam'],
  },
  bentBetweenCentres: {
    formula: ['δ = F a² b²/(3 E I L);  M = F a b/L;  b = L − a'],
    sources: ['beam'],
  },
  bentWork: {
    formula: [
      'plunge: a = out − w/2, difference F a² w/(2 E I) in the chuck, 0 where both ends are held',
      'traverse: a from out − w to out, difference the largest less the smallest deflection',
      'stress M/W',
    ],
    sources: ['beam', 'judgement'],
  },
  ringWidth: {
    formula: ['b = w + 3 √(R t)'],
    sources: ['ring-width'],
  },
  pinchedRing: {
    formula: [
      'closing (π/4 − 2/π) F R³/(E I);  spreading (2/π − 1/2) F R³/(E I);  I = b t³/12',
      'M under the force F R/π, a quarter turn away (1/2 − 1/π) F R',
      'σ = 6 M/(b t²), a quarter turn away + F/(2 b t)',
    ],
    sources: ['ring'],
  },
  wheelRotation: {
    formula: ['n_w = n D/Dw'],
    sources: ['pin-heat'],
  },
  pinSliding: {
    formula: ['v = π d n_w/60000'],
    sources: ['pin-heat'],
  },
  pinBearing: {
    formula: ['P = F/(d w)'],
    sources: ['pin-heat'],
  },
  pinHeat: {
    formula: ['Q = μ F v,  μ = 0.12'],
    sources: ['pin-heat', 'judgement'],
  },
  ordinaryPinHeat: {
    formula: ['μ P v at 4000 N, 100 ft/min, wheel 20 × 8, pin 6'],
    sources: ['pin-index', 'speed-limit'],
  },
  pinHeatIndex: {
    formula: ['μ P v/1.524;  carbide divides by 1.5'],
    sources: ['pin-index'],
  },
  wheelWarmUp: {
    formula: ['ΔT = Q t/(m c),  m = ρ π (Dw² − d²) w/4,  ρ = 7.85e-6 kg/mm³,  c = 470 J/(kg K)'],
    sources: ['pin-heat'],
  },
} as const satisfies Record<string, Formula>;
