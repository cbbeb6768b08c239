import type { CheckOf } from './check.ts';
import type { Process } from './speed.ts';

export type Edge = 'bevelled' | 'square' | 'convex';
export type Travel = 'plunge' | 'traverse';

/**
 * Whether the wheel's edges suit the way it goes.
 *
 *     bevelled: either; square: plunge to form, travel to cut; convex: travel; one crossed wheel: plunge
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | edge | bevelled, square or convex | - | |
 * | travel | plunge or traverse | - | |
 * | process | form or cut | - | |
 * | onePiece | one crossed wheel: square patterns, or a diamond from one wheel | - | |
 * | → check | edge | - | |
 *
 * Assumes a cut knurl is made by square-edged wheels that travel.
 *
 * @source edge-rule (bevelled edges may travel, square ones plunge, convex ones are for axial forming)
 * @source one-piece-crossed (a crossed wheel plunges only)
 * @source judgement (other edges than square in a cut: watch)
 * @example edgeCheck({ edge: 'square', travel: 'traverse', process: 'form', onePiece: false }).state // "stop"
 */
export function edgeCheck(of: {
  readonly edge: Edge;
  readonly travel: Travel;
  readonly process: Process;
  readonly onePiece: boolean;
}): CheckOf<'edge'> {
  const say = (state: CheckOf<'edge'>['state'], reason: CheckOf<'edge'>['reason']) =>
    ({ name: 'edge', state, reason, figures: {} }) as const;
  const travels = of.travel === 'traverse';
  if (of.onePiece && travels) return say('stop', 'onePieceTravel');
  if (of.process === 'cut')
    return of.edge === 'square' ? say('fine', 'squareCut') : say('watch', 'notSquareCut');
  switch (of.edge) {
    case 'bevelled':
      return say('fine', travels ? 'bevelledTravel' : 'bevelledPlunge');
    case 'square':
      return travels ? say('stop', 'squareTravel') : say('fine', 'squarePlunge');
    case 'convex':
      return travels ? say('fine', 'convexTravel') : say('watch', 'convexPlunge');
  }
}
