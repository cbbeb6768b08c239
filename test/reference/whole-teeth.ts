/**
 * Worked examples for whole teeth round the work, windows and first bites, computed independently
 * of src/calc, six significant digits. Lengths in mm, angles in degrees.
 */

/** B1 to B3: a bar and a pitch, what fits, how far it is from whole, and the blanks next to it. */
export const WHOLE_TEETH = [
  {
    name: 'B1, straight',
    diameter: 25.4,
    wheel: { kind: 'label', pitch: 1.0, helix: 0 },
    transverse: 1.0,
    count: 79.7965,
    nearest: 80,
    error: -0.203547,
    exact: 25.4648,
    step: 0.31831,
    down: 25.1465,
    up: 25.4648,
    /** Gap between the first tooth and the last after one turn. */
    gap: -0.203547,
    /** Share of the circumference that the wheel would have to slip. */
    slip: 0.00255082,
  },
  {
    name: 'B2, helical 30°',
    diameter: 25.4,
    wheel: { kind: 'label', pitch: 1.0, helix: 30 },
    transverse: 1.1547,
    count: 69.1058,
    nearest: 69,
    error: 0.105756,
    exact: 25.3611,
    step: 0.367553,
    down: 25.3611,
    up: 25.7287,
    gap: 0.122116,
    slip: -0.00153035,
  },
  {
    name: 'B3, wheel of 19.05 mm with 60 teeth',
    diameter: 16.0,
    wheel: { kind: 'counted', diameter: 19.05, teeth: 60 },
    transverse: 0.997456,
    count: 50.3937,
    nearest: 50,
    error: 0.393701,
    exact: 15.875,
    step: 0.3175,
    down: 15.875,
    up: 16.1925,
    gap: 0.392699,
    slip: -0.0078125,
  },
] as const;

/** B4: a 160 DP straight wheel set over 30° on 1.000 in, lengths in inches. */
export const SET_OVER = {
  dp: 160,
  diameterIn: 1.0,
  tilt: 30,
  count: 138.564,
  whole: 138,
  tiltForWhole: 30.4015,
  diameterForWholeIn: 0.995929,
} as const;

/** B5: Class I blank tolerance as a share of one tooth's step of diameter. */
export const CLASS_I_SHARE = { 64: 0.096, 96: 0.096, 128: 0.0896, 160: 0.08 } as const;

/** B6: pitch 1.0; share of a tooth a first turn still catches, and the bite that catches a tenth. */
export const FIRST_BITE = {
  caught: [
    { included: 90, bite: 0.05, share: 0.0527864 },
    { included: 90, bite: 0.09, share: 0.1 },
    { included: 90, bite: 0.15, share: 0.183772 },
  ],
  biteForATenth: [
    { included: 90, bite: 0.09 },
    { included: 70, bite: 0.128533 },
  ],
} as const;

/**
 * DIN 403 (January 1973), teeth by outside diameter and pitch: wheels AA, KE, KV first, then BL, BR,
 * GE, GV. Read.
 */
export const DIN_403_TEETH = [
  { diameter: 15, pitch: 0.5, axial: 94, helical: 82 },
  { diameter: 15, pitch: 0.6, axial: 78, helical: 68 },
  { diameter: 15, pitch: 0.8, axial: 59, helical: 51 },
  { diameter: 15, pitch: 1.0, axial: 48, helical: 41 },
  { diameter: 15, pitch: 1.2, axial: 39, helical: 34 },
  { diameter: 15, pitch: 1.6, axial: 29, helical: 25 },
  { diameter: 20, pitch: 0.5, axial: 126, helical: 109 },
  { diameter: 20, pitch: 0.6, axial: 105, helical: 91 },
  { diameter: 20, pitch: 0.8, axial: 79, helical: 68 },
  { diameter: 20, pitch: 1.0, axial: 63, helical: 54 },
  { diameter: 20, pitch: 1.2, axial: 52, helical: 45 },
  { diameter: 20, pitch: 1.6, axial: 39, helical: 34 },
] as const;

/** Printed counts of that table that are not the nearest whole number, and what that is. Derived. */
export const NOT_NEAREST = [
  { diameter: 15, pitch: 0.6, wheels: 'axial', printed: 78, nearest: 79 },
  { diameter: 15, pitch: 1.0, wheels: 'axial', printed: 48, nearest: 47 },
  { diameter: 15, pitch: 1.6, wheels: 'helical', printed: 25, nearest: 26 },
] as const;
