/** Knurls and wheels as the standards list, limit and call them. */
export * from './ansi.ts';
export { type Callout, type Standard, writeCallout } from './callout.ts';
export { type Converted, convertPitch } from './convert.ts';
export { dinCrib, dpCrib } from './crib.ts';
export * from './din82.ts';
export {
  DIN_403,
  type DinPitch,
  type DinWheelSize,
  dinWheelCode,
  dinWheelTeeth,
} from './din403.ts';
export { GOST_PITCHES, type GostKind } from './gost.ts';
export { JIS_MODULES, type JisKind, jisBlank } from './jis.ts';
export { type ReadCallout, readCallout, type UnknownForm } from './readCallout.ts';
