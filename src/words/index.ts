export { OutOfRange } from '../calc/units.ts';
export { freeCallout } from './callout.ts';
export { plainText } from './characters.ts';
export {
  type Cursor,
  moved,
  type Quantity,
  quantityAt,
  type ShopUnits,
  spanOf,
  tokenAt,
} from './cursor.ts';
export { partOf, readAs, replaced, withMore } from './edit.ts';
export * from './kinds.ts';
export { type Limits, limitsOf } from './limits.ts';
export {
  freeMaterial,
  MATERIAL_OFFERS,
  MATERIAL_PHRASES,
  type MaterialWords,
  narrowed,
} from './material.ts';
export { nearestOf } from './nearest.ts';
export { numberOf } from './numbers.ts';
export { freePitch, readPitch, samePitch } from './pitch.ts';
export {
  type AnyParameter,
  type LineResult,
  type ReadLine,
  readLine,
  type Vocabulary,
  vocabularyOf,
} from './reader.ts';
export {
  type Names,
  NO_NAMES,
  type Parameter,
  type Reader,
  type Reading,
  refused,
  type Suggested,
  took,
} from './reading.ts';
export { leadingText, quoted, textOf } from './text.ts';
export { type Span, tokensOf } from './tokens.ts';
export {
  BEVEL,
  BEVEL_SIZES,
  type HardnessWords,
  onePin,
  oneWheel,
  type PinWords,
  readHardness,
  readPin,
  readWheel,
  type WheelWords,
} from './tooling.ts';
export { unitOf } from './unit.ts';
