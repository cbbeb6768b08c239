/**
 * Worked examples for force, bending, pinching and pin heat, computed independently of src/calc,
 * six significant digits. Lengths in mm, forces in N, stresses in MPa, speeds as named.
 */

/** C2: one turn of a plunge, straight, in metal of 126 HB and n = 0.1. */
export const PLUNGE_TURN = {
  hardness: 126,
  strainHardening: 0.1,
  width: 8,
  wheelDiameter: 20,
  workDiameter: 25,
  perTurn: 0.02,
  sharpHeight: 0.5,
  height: 0.4,
  radius: 5.55556,
  share: 0.8,
  arc: 0.471405,
  pressure: 1354.21,
  force: 4085.63,
  torque: 2166.73,
} as const;

/** C4: leading part of a traverse, the same metal and wheel. */
export const TRAVERSE_LEADING = {
  infeed: 0.24,
  feed: 0.25,
  lead: 1.0,
  fill: 0.8,
  meanShare: 0.311111,
  area: 0.254021,
  force: 343.997,
} as const;

/** C4b: the part of the wheel that follows. */
export const TRAVERSE_TRAILING = {
  width: 8,
  lead: 1.0,
  share: 0.8,
  modulus: 205000,
  meanPressure: 541.683,
  halfWidth: 0.0663399,
  force: 503.093,
} as const;

/** C6, C7, C9: a bar of 12 mm, 2000 N at 40 mm; span 80 mm where there is one. */
export const BENT_BAR = {
  force: 2000,
  reach: 40,
  span: 80,
  diameter: 12,
  modulus: 205000,
  secondMoment: 1017.88,
  chuck: { deflection: 0.204475, stress: 471.57 },
  tailstock: { deflection: 0.0447289, moment: 30000.0 },
  centres: { deflection: 0.102237 },
} as const;

/** C10: a ring of 30 mm outside, wall 2, width 8, pinched by 1500 N. */
export const PINCHED = {
  force: 1500,
  meanRadius: 14,
  wall: 2,
  width: 8,
  modulus: 205000,
  momentUnder: 6684.51,
  momentAside: 3815.49,
  closing: 0.560096,
  spreading: 0.514323,
  stressUnder: 1253.35,
  stressAside: 762.28,
} as const;

/** D1: the plunge whose pin heat is called 1. */
export const PIN_REFERENCE = {
  force: 4000,
  /** m/min */
  surfaceSpeed: 30.48,
  workDiameter: 25,
  wheelDiameter: 20,
  pinDiameter: 6,
  face: 8,
  /** rev/min */
  workRotation: 388.083,
  wheelRotation: 485.104,
  /** m/s */
  sliding: 0.1524,
  pressure: 83.3333,
  /** W */
  heat: 73.152,
  /** W/mm² */
  ordinary: 1.524,
  index: 1.0,
  /** K, in 10 s */
  warmUp: 86.6917,
} as const;
