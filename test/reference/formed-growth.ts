/**
 * Worked examples for the formulas of formed knurls, computed independently of src/calc, six
 * significant digits. Lengths in mm, angles in degrees; null: beyond full form.
 */
import type { Form } from '../../src/calc/growth/index.ts';

/** A1: a pattern filled to an edge. */
export const FULL_FORM = [
  {
    p: 1.0,
    included: 70,
    Hf: 0.714074,
    growth: { grooves: 0.714074, raised: 0.952099, sunk: 0.476049 },
    infeed: { grooves: 0.357037, raised: 0.238025, sunk: 0.476049 },
  },
  {
    p: 1.0,
    included: 90,
    Hf: 0.5,
    growth: { grooves: 0.5, raised: 0.666667, sunk: 0.333333 },
    infeed: { grooves: 0.25, raised: 0.166667, sunk: 0.333333 },
  },
] as const;

type PartlyFilled = {
  readonly form: Form;
  readonly infeed: number;
  readonly rise: number;
  readonly growth: number;
  readonly dialSlope: number;
  readonly variance: number;
};

/** A2: pitch 0.8, 90°, tooth height 0.3 of a sharp height of 0.4. */
export const PARTIAL: readonly PartlyFilled[] = [
  {
    form: 'grooves',
    infeed: 0.1875,
    rise: 0.1125,
    growth: 0.225,
    dialSlope: 6.0,
    variance: 0.00984375,
  },
  {
    form: 'raised',
    infeed: 0.13125,
    rise: 0.16875,
    growth: 0.3375,
    dialSlope: 30.0,
    variance: 0.00808594,
  },
  {
    form: 'sunk',
    infeed: 0.24375,
    rise: 0.05625,
    growth: 0.1125,
    dialSlope: 2.57143,
    variance: 0.00527344,
  },
];

/** A3: pitch 0.8, 90°, blank 19.7, crest 19.9, the work taken as flat. */
export const FROM_CREST_FLAT = [
  { form: 'grooves', height: 0.282843, infeed: 0.182843, fill: 0.707107 },
  { form: 'raised', height: 0.221481, infeed: 0.121481, fill: 0.553702 },
] as const;

/** A4: pitch 0.8, 90°, blank 6.0, full form at 0.4; "numeric" by integration on the cylinder. */
export const ROUND = [
  {
    form: 'grooves',
    infeedFlat: 0.2,
    crestFlat: 6.4,
    infeed: 0.202223,
    crest: 6.39555,
    crestNumeric: 6.39555,
    crestFromVariance: 6.39556,
    blankBack: 6.0,
  },
  {
    form: 'sunk',
    infeedFlat: 0.266667,
    crestFlat: 6.26667,
    infeed: 0.268149,
    crest: 6.2637,
    crestNumeric: 6.2637,
    crestFromVariance: 6.2637,
    blankBack: 6.0,
  },
] as const;

/** A5: pitch 0.8, 90°, tip flat 0.08 (a tenth of the pitch), height 0.36. */
export const TIP_FLAT = { tipFlat: 0.1, height: 0.36, infeed: 0.162, rise: 0.198 } as const;

/** A6: pitch 0.8, 90°, tip radius 0.1, height 0.3, straight. */
export const TIP_RADIUS = {
  tipRadius: 0.1,
  height: 0.3,
  recess: 0.0414214,
  lostArea: 0.00214602,
  infeed: 0.156972,
  rise: 0.143028,
  growth: 0.286056,
} as const;

/** A7: pitch 0.8, 90°, both radii 0.05. */
export const ROUNDED_LIMIT = { radius: 0.05, greatestHeight: 0.358579 } as const;

/** A8: pitch 0.8, 90°, infeed 0.15. */
export const OVER_FILLED = [
  { form: 'raised', fullFormInfeed: 0.133333, height: null },
  { form: 'sunk', fullFormInfeed: 0.266667, height: 0.158258 },
] as const;

/** A10: pitch 1.0, 90°, wheel of 63 teeth. */
export const ROUND_WHEEL = { p: 1.0, included: 90, teeth: 63, height: 0.476251 } as const;
