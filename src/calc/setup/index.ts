export type { Support, ToolLayout } from '../bending/index.ts';
export { LARGEST_DIAMETER } from './blank.ts';
export { type Crest, finishCheck } from './finish.ts';
export type { Motion, Running, WheelInUse } from './motion.ts';
export { type ResolvedPitch, resolvePitch } from './pitch.ts';
export { NARROWEST_FACE, REMEDY_KINDS, type Remedy, type RemedyKind } from './remedy.ts';
export {
  type CountedWheel,
  DEFAULT_INCLUDED,
  DEFAULT_WHEEL,
  type MachineLimits,
  type SetupRequest,
  type Steps,
  type WheelSize,
} from './request.ts';
export {
  type Alternative,
  checksWith,
  SETUP_FIGURES,
  type SetupFigureName,
  type SetupFigures,
  type SetupResult,
  setUp,
} from './setup.ts';
