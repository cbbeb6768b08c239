import type { Steps } from '../../src/calc/index.ts';
import {
  type Cursor,
  moved,
  type Quantity,
  quantityAt,
  type Reader,
  type Reading,
  refused,
  tokenAt,
  took,
} from '../../src/words/index.ts';

export type StepRange = readonly [min: number, max: number, unit: string];

/** `40-2500` is one word to the eye and three to the reader. */
const RANGE_WORD = /^(?<from>\d[\d.]*)-(?<to>\d[\d.]*)(?<unit>\D*)$/u;
const TO = new Set(['to', '-', '..', '...', '…']);

const splitRange = (cursor: Cursor): Cursor => {
  const token = tokenAt(cursor);
  const parts = RANGE_WORD.exec(token?.text ?? '')?.groups;
  if (token === undefined || parts === undefined) return cursor;
  const from = parts['from'] ?? '';
  const cut = token.start + from.length;
  const tokens = [
    { text: from, start: token.start, end: cut },
    { text: 'to', start: cut, end: cut + 1 },
    { text: (parts['to'] ?? '') + (parts['unit'] ?? ''), start: cut + 1, end: token.end },
  ];
  const before = cursor.tokens.slice(0, cursor.at);
  return { ...cursor, tokens: [...before, ...tokens, ...cursor.tokens.slice(cursor.at + 1)] };
};

type Found = {
  readonly quantities: readonly Quantity[];
  readonly isRange: boolean;
  readonly used: number;
};

const quantitiesAt = (cursor: Cursor, measure: string): Found => {
  const quantities: Quantity[] = [];
  let used = 0;
  let isRange = false;
  for (;;) {
    const quantity = quantityAt(moved(cursor, used));
    const isOurs = quantity?.unit === null || quantity?.unit?.measure === measure;
    if (quantity === null || quantity.sign === '-' || !isOurs) break;
    quantities.push(quantity);
    used += quantity.used;
    // A unit ends the list: what follows is something else.
    if (isRange || quantity.unit !== null) break;
    if (quantities.length === 1 && TO.has(tokenAt(cursor, used)?.text ?? '')) {
      isRange = true;
      used += 1;
    }
  }
  return { quantities, isRange, used };
};

/**
 * What a gearbox can be set to: `60 90 140 rpm`, or `40 to 2500` for anything between. The unit
 * stands once, at the end, and speaks for all; without one they are in the shop's.
 */
export const stepsOf =
  (
    what: string,
    measure: string,
    [min, max, unit]: StepRange,
    usual: Readonly<Record<'in' | 'mm', number>>,
  ): Reader<Steps<number>> =>
  (typed): Reading<Steps<number>> | null => {
    const cursor = splitRange(typed);
    const extra = cursor.tokens.length - typed.tokens.length;
    const { quantities, isRange, used } = quantitiesAt(cursor, measure);
    if (quantities.length === 0 || (isRange && quantities.length < 2)) return null;
    const factor = quantities.at(-1)?.unit?.factor ?? usual[cursor.units];
    const values = quantities.map(({ value }) => value * factor);
    const outside = values.find((value) => !(value >= min && value <= max));
    if (outside !== undefined) {
      return refused({ code: 'outOfRange', what, value: outside, min, max, unit });
    }
    const [slowest = 0, fastest = 0] = values;
    return took(isRange ? { slowest, fastest } : { list: values }, used - extra);
  };

/** Units of power, which nobody types in a set-up. Source: mechanical horsepower, 550 ft·lbf/s. */
const POWER: Readonly<Record<string, number>> = { w: 1, kw: 1000, hp: 745.6998715822702 };

/** `5.5 kW`, `7.5hp`, in watts. */
export const readPower: Reader<number> = (cursor) => {
  const attached = /^(?<number>\d[\d.,]*)(?<unit>kw|hp|w)$/u.exec(
    tokenAt(cursor)?.text ?? '',
  )?.groups;
  const number = Number((attached?.['number'] ?? tokenAt(cursor)?.text ?? '').replace(',', '.'));
  const factor = POWER[attached?.['unit'] ?? tokenAt(cursor, 1)?.text ?? ''];
  if (!Number.isFinite(number) || factor === undefined) return null;
  const value = number * factor;
  const [min, max] = [20, 200_000];
  return value >= min && value <= max
    ? took(value, attached === undefined ? 2 : 1)
    : refused({ code: 'outOfRange', what: 'power', value, min, max, unit: 'W' });
};
