import type { UnitName } from '../calc/units.ts';
import { type Cursor, spanOf } from './cursor.ts';
import { partOf } from './edit.ts';
import { quantityAt, quantityOf, signed } from './quantity.ts';
import { ask, inRange, isIn, type Range } from './range.ts';
import { type Reader, type Reading, took } from './reading.ts';
import type { Measure, Quantity } from './unit.ts';

/**
 * `1,200 rpm` and `1.200 rpm` may be 1.2 or 1200: nobody turns at 1.2, but digits are not guessed.
 * Null where the number can only be what it says.
 */
const asThousands = (
  cursor: Cursor,
  what: string,
  quantity: Quantity,
  factor: number,
  limits: Range,
): Reading<number> | null => {
  const { thousands, used } = quantity;
  if (thousands === null || !isIn(thousands * factor, limits)) return null;
  if (!isIn(signed(quantity) * factor, limits)) return took(thousands * factor, used);
  const decimal = partOf(cursor.text, quantity.number).replace(',', '.');
  const readings = [String(thousands), String(Number(decimal))];
  return ask(cursor, what, 'commaOrThousands', quantity.number, readings);
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
    const quantity = quantityOf(cursor, measure);
    if (quantity === null || quantity.sign === '±') return null;
    const factor = quantity.unit?.factor ?? bareFactor;
    return (
      asThousands(cursor, what, quantity, factor, limits) ??
      inRange(what, signed(quantity) * factor, quantity.used, limits, unit)
    );
  };

/** A whole number. */
export const countOf =
  (what: string, limits: Range, measure: Measure | null = null): Reader<number> =>
  (cursor, names) => {
    const reading = numberOfKind(what, limits, measure, '1')(cursor, names);
    if (reading === null || 'refusal' in reading || Number.isInteger(reading.value)) return reading;
    const wholes = [Math.floor(reading.value), Math.ceil(reading.value)];
    const fit = wholes.filter((whole) => isIn(whole, limits)).map(String);
    return ask(cursor, what, 'wholeNumber', spanOf(cursor, reading.used), fit);
  };

/** A share: `85%`, `85`, `0.85`. Over 1.5 it can only be meant in hundredths. */
export const shareOf =
  (what: string, limits: Range): Reader<number> =>
  (cursor) => {
    const quantity = quantityOf(cursor, 'share');
    if (quantity === null || quantity.sign === '±') return null;
    const value = signed(quantity);
    const share = quantity.unit !== null || value > 1.5 ? value / 100 : value;
    return inRange(what, share, quantity.used, limits, '1');
  };

/** An angle in radians; a bare number is degrees. */
export const angleOf = (what: string, limits: Range): Reader<number> =>
  numberOfKind(what, limits, 'angle', 'rad', Math.PI / 180);

const RATES = {
  speed: { unit: 'm/min', inch: 'sfm', metric: 'm/min' },
  feed: { unit: 'mm/rev', inch: 'in/rev', metric: 'mm/rev' },
} as const;

/** A bare rate that makes no sense in the shop's unit, but does in the other: asked. */
const inOtherUnit = (
  cursor: Cursor,
  what: string,
  quantity: Quantity,
  other: { readonly factor: number; readonly unit: string },
  limits: Range,
): Reading<number> | null => {
  if (quantity.unit !== null || !isIn(signed(quantity) * other.factor, limits)) return null;
  const typed = partOf(cursor.text, quantity.number);
  return ask(cursor, what, 'noUnit', quantity.number, [`${typed} ${other.unit}`]);
};

/** A rate whose bare number is in the shop's unit: ft/min or m/min, in/rev or mm/rev. */
export const rateOf =
  (what: string, limits: Range, measure: 'speed' | 'feed', inchFactor: number): Reader<number> =>
  (cursor) => {
    const { unit, inch, metric } = RATES[measure];
    // `feed 0.3mm` is meant as a feed: a length a turn.
    const asLength = measure === 'feed' && quantityAt(cursor)?.unit?.measure === 'length';
    const quantity = quantityOf(cursor, asLength ? 'length' : measure);
    if (quantity === null || quantity.sign === '±' || quantity.unit?.either !== undefined)
      return null;
    const inches = cursor.units === 'in';
    const value = signed(quantity) * (quantity.unit?.factor ?? (inches ? inchFactor : 1));
    if (isIn(value, limits)) return took(value, quantity.used);
    const other = inches ? { factor: 1, unit: metric } : { factor: inchFactor, unit: inch };
    return (
      inOtherUnit(cursor, what, quantity, other, limits) ??
      inRange(what, value, quantity.used, limits, unit)
    );
  };
