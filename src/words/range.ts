import type { UnitName } from '../calc/units.ts';
import type { Contradiction, Doubt, OutOfRangeRefusal } from '../refusal.ts';
import type { Cursor } from './cursor.ts';
import { partOf, readAs } from './edit.ts';
import { type Reading, refused, took } from './reading.ts';
import type { Span } from './tokens.ts';

export type Range = readonly [low: number, high: number];

export const isIn = (value: number, [low, high]: Range): boolean => value >= low && value <= high;

export const outOfRange = (
  what: string,
  value: number,
  [min, max]: Range,
  unit: UnitName,
): OutOfRangeRefusal => ({ code: 'outOfRange', what, value, min, max, unit });

export const inRange = (
  what: string,
  value: number,
  used: number,
  limits: Range,
  unit: UnitName,
): Reading<number> =>
  isIn(value, limits) ? took(value, used) : refused(outOfRange(what, value, limits, unit));

/** Where something stands in the line, and the words themselves. */
export const placeOf = (cursor: Cursor, span: Span) => ({
  word: partOf(cursor.text, span),
  start: span.start,
  end: span.end,
});

/** Which of several readings was meant, as lines to send. */
export const ask = (
  cursor: Cursor,
  what: string,
  because: Contradiction | Doubt,
  span: Span,
  readings: readonly string[],
): Reading<never> =>
  refused({
    code: 'unclear',
    what,
    because,
    readings: readings.map((words) => readAs(cursor.text, span, words)),
    ...placeOf(cursor, span),
  });
