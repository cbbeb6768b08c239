import type { Pitch, PitchSystem } from '../calc/pitch.ts';
import { COARSEST_PITCH, FINEST_PITCH } from '../calc/pitch.ts';
import { MM_PER_INCH, type UnitName } from '../calc/units.ts';
import { type Cursor, moved, ofMeasure, type Quantity, quantityAt, tokenAt } from './cursor.ts';
import { outOfRange, type Range } from './kinds.ts';
import { numberOf } from './numbers.ts';
import { type Reader, type Reading, refused, took } from './reading.ts';

const METRIC: Range = [FINEST_PITCH, COARSEST_PITCH];
/** The same range of pitch, in each system's own number. */
const LIMITS: Readonly<Record<PitchSystem, Range>> = {
  metric: METRIC,
  tpi: [MM_PER_INCH / COARSEST_PITCH, MM_PER_INCH / FINEST_PITCH],
  dp: [(MM_PER_INCH * Math.PI) / COARSEST_PITCH / 1.5, (MM_PER_INCH * Math.PI) / FINEST_PITCH],
  module: [FINEST_PITCH / Math.PI, COARSEST_PITCH / Math.PI],
};
const NAMES: Readonly<Record<PitchSystem, string>> = {
  metric: 'pitch',
  tpi: 'tpi',
  dp: 'dp',
  module: 'module',
};

const pitch = (system: PitchSystem, value: number, used: number): Reading<Pitch> => {
  const unit: UnitName = system === 'metric' ? 'mm' : '1';
  const [low, high] = LIMITS[system];
  // A hair of slack, so that 25.4/0.2 is not refused for its last binary digit.
  return value >= low - 1e-9 && value <= high + 1e-9
    ? took({ system, value }, used)
    : refused(outOfRange(NAMES[system], value, LIMITS[system], unit));
};

const signedValue = (quantity: Quantity): number =>
  quantity.sign === '-' ? -quantity.value : quantity.value;

/** `21 tpi`, `96dp`, `0.3 module`: the unit says which system. */
const byUnit = (quantity: Quantity): Reading<Pitch> | null => {
  const measure = quantity.unit?.measure;
  return measure === 'tpi' || measure === 'dp' || measure === 'module'
    ? pitch(measure, signedValue(quantity), quantity.used)
    : null;
};

const byLength = (quantity: Quantity, used: number): Reading<Pitch> => {
  const length = quantity.unit?.measure === 'length' ? quantity.unit.factor : 1;
  return pitch('metric', signedValue(quantity) * length, used);
};

/** `teeth per inch` and its short forms after a number. */
const teethPerInch = (cursor: Cursor, quantity: Quantity): Reading<Pitch> | null => {
  const [first, second] = [tokenAt(cursor, quantity.used), tokenAt(cursor, quantity.used + 1)];
  const inch = second?.text === 'inch' || second?.text === 'in';
  if (quantity.unit?.measure !== 'teeth' || first?.text !== 'per' || !inch) return null;
  return pitch('tpi', signedValue(quantity), quantity.used + 2);
};

/** `p96` and `m0.3`, or `m 0.3`. */
const byLetter = (cursor: Cursor): Reading<Pitch> | null => {
  const token = tokenAt(cursor);
  const match = /^(p|m)([\d.,]+)$/u.exec(token?.text ?? '');
  const value = match === null ? null : numberOf(match[2] ?? '');
  if (value !== null) return pitch(match?.[1] === 'p' ? 'dp' : 'module', value, 1);
  if (token?.text !== 'm') return null;
  const quantity = quantityAt(moved(cursor, 1));
  return quantity?.unit === null ? pitch('module', quantity.value, quantity.used + 1) : null;
};

/** A map, not an object: `constructor` is a word people may type. */
const SYSTEM_WORDS: ReadonlyMap<string, PitchSystem> = new Map<string, PitchSystem>([
  ['tpi', 'tpi'],
  ['dp', 'dp'],
  ['module', 'module'],
  ['mod', 'module'],
]);

/** `tpi 21`, `dp 96`, `module 0.3`. */
const bySystemWord = (cursor: Cursor): Reading<Pitch> | null => {
  const system = SYSTEM_WORDS.get(tokenAt(cursor)?.text ?? '');
  const quantity = quantityAt(moved(cursor, 1));
  if (system === undefined || quantity?.unit !== null) return null;
  return pitch(system, signedValue(quantity), quantity.used + 1);
};

/** A pitch that says by itself that it is one. */
export const freePitch: Reader<Pitch> = (cursor) => {
  const spelt = byLetter(cursor) ?? bySystemWord(cursor);
  if (spelt !== null) return spelt;
  const quantity = quantityAt(cursor);
  if (quantity === null) return null;
  const own = byUnit(quantity) ?? teethPerInch(cursor, quantity);
  if (own !== null) return own;
  const lengthOrBare = quantity.unit === null || quantity.unit.measure === 'length';
  const next = tokenAt(cursor, quantity.used)?.text;
  // `1.0 pitch 21tpi` would be two pitches: the word then belongs to what follows.
  if (!lengthOrBare || next !== 'pitch') return null;
  const after = quantityAt(moved(cursor, quantity.used + 1));
  if (after !== null && byUnit(after) !== null) return null;
  return byLength(quantity, quantity.used + 1);
};

/** What may follow the word `pitch`, `module`, `tpi` or `dp`. */
export const readPitch: Reader<Pitch> = (cursor, names) => {
  const free = freePitch(cursor, names);
  if (free !== null) return free;
  const quantity = quantityAt(cursor);
  if (quantity === null) return null;
  const plain = ofMeasure(quantity, 'length');
  return plain === null ? null : byLength(plain, plain.used);
};

export const samePitch = (a: Pitch, b: Pitch): Pitch | null =>
  a.system === b.system && a.value === b.value ? a : null;
