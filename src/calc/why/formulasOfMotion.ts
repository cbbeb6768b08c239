import type { Formula } from './formula.ts';

/** Speed, feed, turns and time. */
export const MOTION_FORMULAS = {
  speedLimit: {
    formula: ['forming: min(top of the band, 100 ft/min × 1 or 1.5); cutting: top of the band'],
    sources: ['speed-limit', 'judgement', 'speed-band'],
  },
  startingSpeed: {
    formula: ['v = v_lo + (v_hi − v_lo)/4, v_hi capped when forming'],
    sources: ['speed-band', 'speed-limit'],
  },
  spindleSpeed: {
    formula: ['n = 1000 v/(π D)'],
    sources: ['whole-tooth'],
  },
  surfaceSpeed: {
    formula: ['v = π D n/1000'],
    sources: ['whole-tooth'],
  },
  contactWidth: {
    formula: ['b = face − 2 × bevel'],
    sources: ['din-403'],
  },
  feedWindow: {
    formula: [
      'f ∈ [b/most, b/fewest] ∩ [0.13, 0.76], f ≤ 0.76 min(1, 1/p); the middle of what is left',
    ],
    sources: ['feed-window', 'feed-cap'],
  },
  cutFeedCheck: {
    formula: ['0.15 mm/rev unless said;  0.05 to 0.30 mm/rev fine, else watch'],
    sources: ['judgement'],
  },
  turnsOnSpot: {
    formula: ['N = b/f'],
    sources: ['feed-window'],
  },
  plungeTurns: {
    formula: ['N = ⌈(fewest + most)/2⌉'],
    sources: ['feed-window'],
  },
  infeedPerTurn: {
    formula: ['dz = (z − z1)/(N − 4)'],
    sources: ['feed-window'],
  },
  plungeTime: {
    formula: ['t = 60 N/n'],
    sources: ['feed-window'],
  },
  traverseTime: {
    formula: ['t = 60 (length + b)/(f n)'],
    sources: ['feed-window'],
  },
} as const satisfies Record<string, Formula>;
