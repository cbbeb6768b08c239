export { OutOfRange } from '../calc/units.ts';
export { freeCallout } from './callout.ts';
export { plainText } from './characters.ts';
export {
  type Cursor,
  moved,
  type ShopUnits,
  spanOf,
  tokenAt,
} from './cursor.ts';
export { partOf, readAs, replaced, withMore } from './edit.ts';
export { type HardnessWords, readHardness } from './hardness.ts';
export * from './kinds.ts';
export { type BareRange, hardwareOf, lengthOf, smallLengthOf } from './length.ts';
export type { Limits } from './limitShapes.ts';
export { limitsOf, unannouncedLimits } from './limits.ts';
export {
  freeMaterial,
  MATERIAL_OFFERS,
  MATERIAL_PHRASES,
  type MaterialWords,
  materialNames,
  narrowed,
} from './material.ts';
export { knownName, nameOf } from './names.ts';
export { nearestOf } from './nearest.ts';
export { numberOf } from './numbers.ts';
export { onePin, type PinWords, pinFirst, readPin } from './pin.ts';
export { freePitch, pitchesOf, readPitch, samePitch } from './pitch.ts';
export { quantityAt } from './quantity.ts';
export type { Range } from './range.ts';
export { type LineResult, type ReadLine, readLine } from './reader.ts';
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
export { leadingText, oneWord, quoted, quotedAt, restOfLine, textOf, upToKeyword } from './text.ts';
export { type Span, type Token, tokensOf } from './tokens.ts';
export type { Quantity } from './unit.ts';
export { unitOf } from './unit.ts';
export { type AnyParameter, type Vocabulary, vocabularyOf } from './vocabulary.ts';
export { oneWheel, readWheel, timesAt, type WheelWords, wheelFirst } from './wheel.ts';
