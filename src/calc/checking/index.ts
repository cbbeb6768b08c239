/** Before a wheel touches the blank, at the seam of a trial turn, and on the finished part. */
export {
  type AfterCheck,
  checkAfter,
} from './after.ts';
export { type BlankCheck, checkBlank, type WheelOnWork } from './blank.ts';
export { chanceByLabel, SEAM_READING_SD, seamChance } from './chance.ts';
export { type Fade, FLAT_READING, type FlatsAlong, fadeAlong } from './fade.ts';
export {
  CHECK_FIGURES,
  type CheckAlternative,
  type CheckFigureName,
  type CheckFigures,
  type PartMove,
} from './figures.ts';
export { CREST_READING, HEIGHT_READING, type MeasuredPart, STOPS_WITHIN } from './judge.ts';
export type { NextPartMoveId, ThisPartMoveId } from './moves.ts';
export { OFF_FROM } from './partChecks.ts';
export { MOST_COUNTED, provenPitch } from './proven.ts';
export { type CrestMaker, type Rescue, rescueSpoiled } from './rescue.ts';
export {
  LABEL_OFF,
  SEAM_CENTRED_TO,
  SEAM_WHOLE_FROM,
  type SeamCheck,
  type SeamKind,
  type SeamReading,
  type SeamWheel,
  seamTest,
} from './seam.ts';
export type { OffFigure } from './seen.ts';
