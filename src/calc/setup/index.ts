export { LARGEST_DIAMETER } from './blank.ts';
export type { Motion, Running, WheelInUse } from './motion.ts';
export { type ResolvedPitch, resolvePitch } from './pitch.ts';
export {
  type CountedWheel,
  DEFAULT_BEVEL,
  DEFAULT_INCLUDED,
  DEFAULT_WHEEL,
  type MachineLimits,
  type SetupRequest,
  type Steps,
  type Support,
  type ToolLayout,
  type WheelSize,
} from './request.ts';
export {
  type Alternative,
  SETUP_FIGURES,
  type SetupFigureName,
  type SetupFigures,
  type SetupResult,
  setUp,
} from './setup.ts';
