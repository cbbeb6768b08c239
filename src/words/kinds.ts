import { MM_PER_INCH, type UnitName } from '../calc/units.ts';
import type { Refusal, Suggestion } from '../refusal.ts';
import { plainText } from './characters.ts';
import {
  type Cursor,
  ofMeasure,
  type Quantity,
  quantityAt,
  type ShopUnits,
  spanOf,
  tokenAt,
} from './cursor.ts';
import { partOf, readAs } from './edit.ts';
import { nearestOf } from './nearest.ts';
import { type Reader, type Reading, refused, took } from './reading.ts';
import type { Measure } from './unit.ts';

export type Range = readonly [low: number, high: number];

export const outOfRange = (
  what: string,
  value: number,
  [min, max]: Range,
  unit: UnitName,
): Refusal => ({ code: 'outOfRange', what, value, min, max, unit });

const signed = (quantity: Quantity): number =>
  quantity.sign === '-' ? -quantity.value : quantity.value;
const isIn = (value: number, [low, high]: Range): boolean => value >= low && value <= high;

export const inRange = (
  what: string,
  value: number,
  used: number,
  limits: Range,
  unit: UnitName,
): Reading<number> =>
  isIn(value, limits) ? took(value, used) : refused(outOfRange(what, value, limits, unit));

/** What a person most likely means by a bare number, by the shop's units. */
export type BareRange = { readonly in: Range; readonly mm: Range };

const factorOf = (units: ShopUnits): number => (units === 'in' ? MM_PER_INCH : 1);

/** A bare number that fits neither the shop's habits nor common sense is a question, not a guess. */
const bareQuestion = (
  cursor: Cursor,
  what: string,
  quantity: Quantity,
  limits: Range,
): Reading<number> => {
  const typed = partOf(cursor.text, quantity.number);
  const readings: Suggestion[] = (['mm', 'in'] as const)
    .filter((unit) => isIn(quantity.value * factorOf(unit), limits))
    .map((unit) => readAs(cursor.text, quantity.number, `${typed} ${unit}`));
  const value = signed(quantity) * factorOf(cursor.units);
  return readings.length === 0 || quantity.sign === '-'
    ? refused(outOfRange(what, value, limits, 'mm'))
    : refused({ code: 'unclear', what, readings });
};

/** A length in mm. A bare number is in the shop's unit where it is a likely size in it. */
export const lengthOf =
  (what: string, limits: Range, bare: BareRange): Reader<number> =>
  (cursor) => {
    const found = quantityAt(cursor);
    const quantity = found === null ? null : ofMeasure(found, 'length');
    if (quantity === null) return null;
    const { unit, used } = quantity;
    if (unit !== null) return inRange(what, signed(quantity) * unit.factor, used, limits, 'mm');
    if (quantity.sign === '-' || !isIn(quantity.value, bare[cursor.units]))
      return bareQuestion(cursor, what, quantity, limits);
    return inRange(what, signed(quantity) * factorOf(cursor.units), used, limits, 'mm');
  };

/** A small length (a run-out, a coating) in mm; a bare number is in the shop's unit. */
export const smallLengthOf = (what: string, limits: Range): Reader<number> =>
  lengthOf(what, limits, { in: [0, Number.MAX_VALUE], mm: [0, Number.MAX_VALUE] });

/**
 * A length of the tooling, whose inch and metric sizes do not overlap: a bare number can only be
 * one of the two.
 */
export const hardwareOf =
  (what: string, limits: Range, sizes: BareRange): Reader<number> =>
  (cursor) => {
    const found = quantityAt(cursor);
    const quantity = found === null ? null : ofMeasure(found, 'length');
    if (quantity === null) return null;
    const { unit, used } = quantity;
    const value = signed(quantity);
    if (unit !== null) return inRange(what, value * unit.factor, used, limits, 'mm');
    const fits = (['in', 'mm'] as const).filter((units) => isIn(value, sizes[units]));
    const only = fits.length === 1 ? fits[0] : undefined;
    if (only !== undefined) return inRange(what, value * factorOf(only), used, limits, 'mm');
    return bareQuestion(cursor, what, quantity, limits);
  };

/** A plain number with an optional unit of one measure. */
export const numberOfKind =
  (
    what: string,
    limits: Range,
    measure: Measure | null,
    unit: UnitName,
    bareFactor = 1,
  ): Reader<number> =>
  (cursor) => {
    const found = quantityAt(cursor);
    const quantity = found === null ? null : ofMeasure(found, measure);
    if (quantity === null) return null;
    const factor = quantity.unit?.factor ?? bareFactor;
    return inRange(what, signed(quantity) * factor, quantity.used, limits, unit);
  };

/** A whole number. */
export const countOf =
  (what: string, limits: Range, measure: Measure | null = null): Reader<number> =>
  (cursor, names) => {
    const reading = numberOfKind(what, limits, measure, '1')(cursor, names);
    if (reading === null || 'refusal' in reading || Number.isInteger(reading.value)) return reading;
    return refused({
      code: 'unclear',
      what,
      readings: [Math.floor(reading.value), Math.ceil(reading.value)].map((whole) =>
        readAs(cursor.text, spanOf(cursor, reading.used), String(whole)),
      ),
    });
  };

/** A share: `85%`, `85`, `0.85`. Over 1.5 it can only be meant in hundredths. */
export const shareOf =
  (what: string, limits: Range): Reader<number> =>
  (cursor) => {
    const found = quantityAt(cursor);
    const quantity = found === null ? null : ofMeasure(found, 'share');
    if (quantity === null) return null;
    const value = signed(quantity);
    const share = quantity.unit !== null || value > 1.5 ? value / 100 : value;
    return inRange(what, share, quantity.used, limits, '1');
  };

/** An angle in radians; a bare number is degrees. */
export const angleOf = (what: string, limits: Range): Reader<number> =>
  numberOfKind(what, limits, 'angle', 'rad', Math.PI / 180);

/** A rate whose bare number is in the shop's unit: ft/min or m/min, in/rev or mm/rev. */
export const rateOf =
  (what: string, limits: Range, measure: 'speed' | 'feed', inchFactor: number): Reader<number> =>
  (cursor, names) => {
    const bare = cursor.units === 'in' ? inchFactor : 1;
    const unit = measure === 'speed' ? 'm/min' : 'mm/rev';
    const quantity = quantityAt(cursor);
    // `feed 0.3mm` is meant as a feed: a length a turn.
    if (measure === 'feed' && quantity?.unit?.measure === 'length')
      return inRange(what, signed(quantity) * quantity.unit.factor, quantity.used, limits, unit);
    return numberOfKind(what, limits, measure, unit, bare)(cursor, names);
  };

/** One of the names the shop has given. */
export const nameOf =
  (
    what: string,
    known: (names: Parameters<Reader<string>>[1]) => readonly string[],
  ): Reader<string> =>
  (cursor, names) => {
    const list = known(names);
    const found = list
      .map((name) => ({ name, words: plainText(name).split(/\s+/u) }))
      .filter(({ words }) => words.every((word, i) => tokenAt(cursor, i)?.text === word))
      .sort((a, b) => b.words.length - a.words.length)[0];
    if (found !== undefined) return took(found.name, found.words.length);
    const token = tokenAt(cursor);
    if (token === undefined) return null;
    return refused({ code: 'notFound', what, nearest: nearestOf(token.text, list) });
  };
