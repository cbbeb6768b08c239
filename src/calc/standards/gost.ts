/** Kinds of knurl the standard knows. */
export type GostKind = 'straight' | 'diamond';

/** Pitches of GOST 21474-75 in mm, by kind. Read. */
export const GOST_PITCHES: Readonly<Record<GostKind, readonly number[]>> = {
  straight: [0.5, 0.6, 0.8, 1.0, 1.2, 1.6],
  diamond: [0.5, 0.6, 0.8, 1.0, 1.2, 1.6, 2.0],
};
