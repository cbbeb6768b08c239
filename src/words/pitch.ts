import type { Pitch, PitchSystem } from '../calc/pitch.ts';
import { COARSEST_PITCH, FINEST_PITCH, standardDp } from '../calc/pitch.ts';
import { MM_PER_INCH, type UnitName } from '../calc/units.ts';
import {
  type Cursor,
  isAfterComma,
  moved,
  phraseAt,
  phraseOf,
  plainOf,
  spanOf,
  textAt,
} from './cursor.ts';
import { partOf } from './edit.ts';
import { numberOf } from './numbers.ts';
import { quantityAt, quantityOf, signed } from './quantity.ts';
import { ask, isIn, outOfRange, type Range } from './range.ts';
import { type Reader, type Reading, refused, took } from './reading.ts';
import type { Quantity } from './unit.ts';
import { unitOf } from './unit.ts';

// A hair of slack, so that 25.4/0.2 is not refused for its last binary digit.
const SLACK = 1e-9;
const METRIC: Range = [FINEST_PITCH, COARSEST_PITCH];
/** The same range of pitch, in each system's own number. */
const LIMITS: Readonly<Record<PitchSystem, Range>> = {
  metric: METRIC,
  tpi: [MM_PER_INCH / COARSEST_PITCH - SLACK, MM_PER_INCH / FINEST_PITCH + SLACK],
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
  return isIn(value, LIMITS[system])
    ? took({ system, value }, used)
    : refused(outOfRange(NAMES[system], value, LIMITS[system], unit));
};

/** `21 tpi`, `96dp`, `0.3 module`: the unit says which system. */
const byUnit = (quantity: Quantity): Reading<Pitch> | null => {
  const measure = quantity.unit?.measure;
  return measure === 'tpi' || measure === 'dp' || measure === 'module'
    ? pitch(measure, signed(quantity), quantity.used)
    : null;
};

const LETTER = /^([pmt])(\d*[.,]?\d+)$/u;

/**
 * A letter that touches its number. P is a diametral pitch only with the standard's own numbers,
 * and a pitch in mm where it can be one: P20 is a steel. A t needs its decimals: T6 is a temper.
 */
const lettered = (letter: string, number: string, used: number): Reading<Pitch> | null => {
  const value = numberOf(number);
  if (value === null) return null;
  if (letter === 'm') return pitch('module', value, used);
  if (letter === 'p' && standardDp(value) !== null) return pitch('dp', value, used);
  const decimals = letter === 'p' || /[.,]/u.test(number);
  return decimals && isIn(value, METRIC) ? pitch('metric', value, used) : null;
};

/** `p96`, `p0.8`, `t0.8` and `m0.3`, or the letter and the number apart. */
const byLetter = (cursor: Cursor): Reading<Pitch> | null => {
  const word = textAt(cursor);
  const touching = LETTER.exec(word);
  if (touching !== null) return lettered(touching[1] ?? '', touching[2] ?? '', 1);
  if (!/^[pmt]$/u.test(word) || isAfterComma(cursor, 1)) return null;
  const quantity = quantityAt(moved(cursor, 1));
  if (quantity?.unit !== null || quantity.sign !== '' || quantity.mixed) return null;
  return lettered(word, partOf(plainOf(cursor), quantity.number), quantity.used + 1);
};

const SYSTEM_WORDS: readonly (readonly [readonly string[], PitchSystem])[] = [
  ...(['tpi', 'teeth per inch', 't.p.i'] as const).map((word) => [phraseOf(word), 'tpi'] as const),
  ...(['dp', 'diametral pitch', 'd.p'] as const).map((word) => [phraseOf(word), 'dp'] as const),
  ...(['module', 'mod'] as const).map((word) => [phraseOf(word), 'module'] as const),
];

/** `tpi 21`, `dp 96`, `module 0.3`. */
const bySystemWord = (cursor: Cursor): Reading<Pitch> | null => {
  for (const [phrase, system] of SYSTEM_WORDS) {
    const words = phraseAt(cursor, phrase);
    if (words === 0 || isAfterComma(cursor, words)) continue;
    const quantity = quantityOf(moved(cursor, words), system === 'metric' ? 'length' : system);
    if (quantity === null || quantity.sign === '±') return null;
    return pitch(system, signed(quantity), quantity.used + words);
  }
  return null;
};

/** How many of the steps shops call coarse, medium and fine. Common practice; offered, never taken. */
const GRADES: ReadonlyMap<string, readonly string[]> = new Map([
  ['coarse', ['14tpi', '1.6 pitch']],
  ['medium', ['21tpi', '1.0 pitch']],
  ['fine', ['33tpi', '0.6 pitch']],
]);

const byGrade = (cursor: Cursor): Reading<Pitch> | null => {
  const readings = GRADES.get(textAt(cursor));
  return readings === undefined
    ? null
    : ask(cursor, 'pitch', 'gradeOnly', spanOf(cursor, 1), readings);
};

/** What `21 pitch` or `.030 pitch` may have been meant for: a bare pitch is in mm. */
const otherPitch = (
  cursor: Cursor,
  quantity: Quantity,
  used: number,
  word: string,
): Reading<Pitch> => {
  const { value } = quantity;
  const typed = partOf(cursor.text, quantity.number);
  const readings = [
    ...(isIn(value, LIMITS.tpi) && standardDp(value) === null ? [`${typed} tpi`] : []),
    ...(isIn(value, LIMITS.dp) ? [`${typed} dp`] : []),
    ...(isIn(value * MM_PER_INCH, METRIC) ? [`${typed} in${word}`] : []),
  ];
  return readings.length === 0 || quantity.sign === '-'
    ? pitch('metric', signed(quantity), used)
    : ask(cursor, 'pitch', 'noUnit', spanOf(cursor, used), readings);
};

/** A pitch said as a length: `1.0 pitch` is in mm in every shop. */
const asLength = (cursor: Cursor, quantity: Quantity, after: string): Reading<Pitch> => {
  const used = quantity.used + (after === '' ? 0 : 1);
  const { unit } = quantity;
  if (unit?.either !== undefined) {
    const typed = partOf(cursor.text, quantity.number);
    const fit = unit.either.filter((each) =>
      isIn(quantity.value * (unitOf(each)?.factor ?? 1), METRIC),
    );
    return ask(
      cursor,
      'pitch',
      'unitOfTwo',
      spanOf(cursor, used),
      fit.map((each) => `${typed} ${each}${after}`),
    );
  }
  const value = signed(quantity) * (unit?.factor ?? 1);
  return unit === null && !isIn(value, METRIC)
    ? otherPitch(cursor, quantity, used, after)
    : pitch('metric', value, used);
};

/** `0.3m` is written for a module as well as for metres. */
const metresOrModule = (cursor: Cursor, quantity: Quantity): Reading<Pitch> | null => {
  if (quantity.unit !== unitOf('m') || !isIn(quantity.value, LIMITS.module)) return null;
  const typed = partOf(cursor.text, quantity.number);
  return ask(cursor, 'pitch', 'unitOfTwo', spanOf(cursor, quantity.used), [`m${typed}`]);
};

/** `1.0 pitch`, where the word does not belong to what follows, as in `1.0 pitch 21tpi`. */
const beforeTheWord = (cursor: Cursor, quantity: Quantity): Reading<Pitch> | null => {
  const lengthOrBare = quantity.unit === null || quantity.unit.measure === 'length';
  if (!lengthOrBare || quantity.sign === '±' || textAt(cursor, quantity.used) !== 'pitch')
    return null;
  if (isAfterComma(cursor, quantity.used)) return null;
  const after = quantityAt(moved(cursor, quantity.used + 1));
  if (after !== null && byUnit(after) !== null && !isAfterComma(cursor, quantity.used + 1))
    return null;
  return asLength(cursor, quantity, ' pitch');
};

/** A pitch that says by itself that it is one. */
export const freePitch: Reader<Pitch> = (cursor) => {
  const spelt = byLetter(cursor) ?? bySystemWord(cursor) ?? byGrade(cursor);
  if (spelt !== null) return spelt;
  const quantity = quantityAt(cursor);
  if (quantity === null) return null;
  return byUnit(quantity) ?? metresOrModule(cursor, quantity) ?? beforeTheWord(cursor, quantity);
};

/** What may follow the word `pitch`. */
export const readPitch: Reader<Pitch> = (cursor, names) => {
  const free = freePitch(cursor, names);
  if (free !== null) return free;
  const quantity = quantityOf(cursor, 'length');
  return quantity === null || quantity.sign === '±' ? null : asLength(cursor, quantity, '');
};

export const samePitch = (a: Pitch, b: Pitch): Pitch | null =>
  a.system === b.system && Math.abs(a.value - b.value) < SLACK ? a : null;

/** Teeth per inch as wheels are sold. Judgement: what a lone number may have been meant for. */
const LIKELY_TPI: Range = [8, 80];

/** Pitches that a number without a unit may have been meant for. */
export const pitchesOf = (number: string): readonly string[] => {
  const value = numberOf(number) ?? 0;
  if (standardDp(value) !== null) return ['dp'];
  if (Number.isInteger(value) && isIn(value, LIKELY_TPI)) return ['tpi'];
  return isIn(value, METRIC) ? ['pitch'] : [];
};
