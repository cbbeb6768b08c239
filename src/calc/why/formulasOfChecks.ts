import type { Formula } from './formula.ts';

/** How each check ends. */
export const CHECK_FORMULAS = {
  trackingCheck: {
    formula: ['|δ| ≤ 0.10 fine, ≤ 0.20 watch, else stop; under 12 teeth stop'],
    sources: ['window-thresholds', 'common-practice'],
  },
  countDoubt: {
    formula: ['Δ = u N, u = 2.5 % label, 0.5 % counted, 0.1/N proven, 0 DP on its own blanks'],
    sources: ['wheel-truth'],
  },
  wheelCheck: {
    formula: ['Δ ≤ 0.25 of a tooth fine, else watch'],
    sources: ['wheel-truth', 'asme-b94.6-reported'],
  },
  runoutCheck: {
    formula: ['e = reading/2 against z1: ≤ z1/2 fine, ≤ z1 watch, else stop'],
    sources: ['judgement'],
  },
  fillCheck: {
    formula: [
      "0.70 ≤ x ≤ 0.92 and not above the material's own: fine; to 0.97 or below 0.70: watch; above: stop",
    ],
    sources: ['fill-limits'],
  },
  formedFeedCheck: {
    formula: ['inside the window fine, else watch'],
    sources: ['feed-window'],
  },
  edgeCheck: {
    formula: [
      'bevelled: either; square: plunge to form, travel to cut; convex: travel; one crossed wheel: plunge',
    ],
    sources: ['edge-rule', 'one-piece-crossed', 'judgement'],
  },
  formRatingByNumbers: {
    formula: ['elongation ≥ 12 % and HB ≤ 250 yes; 5–12 % or 250–300 marginal; else no'],
    sources: ['form-or-cut'],
  },
  materialCheck: {
    formula: ['forming: yes fine, marginal watch, no stop; cutting: fine'],
    sources: ['form-or-cut'],
  },
  speedCheck: {
    formula: ['v ≤ limit fine, ≤ 1.5 limit watch, else stop'],
    sources: ['speed-limit', 'judgement'],
  },
  finishCheck: {
    formula: ['low ≤ Do ≤ high with its whole spread: fine;  Do alone: watch;  else stop'],
    sources: ['growth-prior', 'judgement'],
  },
  pinHeatCheck: {
    formula: [
      'index ≤ 1 fine;  index/2 > 2 stop, watch where the wheel warms by less than 60 K;  else watch',
    ],
    sources: ['pin-index'],
  },
  pinPressureCheck: {
    formula: ['P ≤ 100 MPa fine, else watch'],
    sources: ['pin-index'],
  },
  stressState: {
    formula: ['σ ≤ Re/1.5 fine;  σ/2 > Re stop;  else watch'],
    sources: ['give-limits'],
  },
  giveState: {
    formula: ['give ≤ 10 % of the depth fine;  give/2 > 30 % stop;  else watch'],
    sources: ['give-limits'],
  },
  bendingCheck: {
    formula: ['the worse of stress against yield and depth difference against infeed'],
    sources: ['give-limits'],
  },
  ringCheck: {
    formula: ['the worse of stress against yield and closing against tooth height; fine on a plug'],
    sources: ['give-limits', 'ring'],
  },
  stickoutCheck: {
    formula: ['one-sided, out > 3 D and nothing holds the end: watch, else fine'],
    sources: ['give-limits'],
  },
  widthCheck: {
    formula: ['w ≤ D fine, else watch'],
    sources: ['asme-b94.6'],
  },
  capacityCheck: {
    formula: [
      'at the expected force within its limits fine; past them even at half of it stop; else watch',
    ],
    sources: ['force-model', 'judgement'],
  },
  pressFit: {
    formula: ['i = (D_crest − D_bore)/2;  0 < i ≤ 0.6 H fine, ≤ H watch, else stop'],
    sources: ['press-fit'],
  },
} as const satisfies Record<string, Formula>;
