/** Before a wheel touches the blank, at the seam of a trial turn, and on the finished part. */
export { type AfterCheck, checkAfter } from './after.ts';
export { type BlankCheck, checkBlank, type WheelOnWork } from './blank.ts';
export { chanceByLabel, SEAM_READING_SD, seamChance } from './chance.ts';
export { type Fade, type FlatsAlong, fadeAlong } from './fade.ts';
export {
  CHECK_FIGURES,
  type CheckAlternative,
  type CheckFigureName,
  type CheckFigures,
  type PartMove,
} from './figures.ts';
export type { MeasuredPart } from './judge.ts';
export type { NextPartMoveId, ThisPartMoveId } from './moves.ts';
export { provenPitch, proveWheel } from './proven.ts';
export { type CrestMaker, type Rescue, rescueSpoiled } from './rescue.ts';
export {
  type SeamCheck,
  type SeamKind,
  type SeamReading,
  type SeamWheel,
  seamTest,
} from './seam.ts';
export type { OffFigure } from './seen.ts';
