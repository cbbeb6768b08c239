import { MM_PER_INCH } from '../calc/units.ts';
import {
  type Cursor,
  moved,
  ofMeasure,
  type Quantity,
  quantityAt,
  spanOf,
  tokenAt,
} from './cursor.ts';
import { replaced } from './edit.ts';
import { type BareRange, outOfRange, type Range } from './kinds.ts';
import { type Reader, type Reading, refused, took } from './reading.ts';

/** The print's limits, or a nominal size whose tolerance was not said. */
export type Limits = {
  readonly low: number;
  readonly high: number;
  /** Only one size was said. */
  readonly nominalOnly: boolean;
};

const NUMBER_PAIR = /^(?<a>[\d.,/½¼¾⅛⅜⅝⅞]*?[\d½¼¾⅛⅜⅝⅞])(?<to>-|\.{2,}|…|\/)(?<b>[\d.,].*)$/u;

/** `0.995-1.005` is one word to the eye and three to the reader. */
const split = (cursor: Cursor): Cursor => {
  const token = tokenAt(cursor);
  // A mixed number such as 1-1/4 stays whole.
  if (token === undefined || /^\d+-\d+\/\d+\D*$/u.test(token.text)) return cursor;
  const groups = NUMBER_PAIR.exec(token.text)?.groups;
  if (groups === undefined) return cursor;
  const { a = '', to = '', b = '' } = groups;
  if (to === '/' && !/[.,]/u.test(a + b)) return cursor;
  const at = token.start + a.length;
  const parts = [
    { text: a, start: token.start, end: at },
    { text: 'to', start: at, end: at + to.length },
    { text: b, start: at + to.length, end: token.end },
  ];
  const tokens = [
    ...cursor.tokens.slice(0, cursor.at),
    ...parts,
    ...cursor.tokens.slice(cursor.at + 1),
  ];
  return { ...cursor, tokens };
};

const SEPARATORS = new Set(['-', 'to', '..', '...', '…', '/']);

type Size = { readonly value: number; readonly used: number };

const sizeIn = (quantity: Quantity, bareFactor: number): number => {
  const factor = quantity.unit?.measure === 'length' ? quantity.unit.factor : bareFactor;
  return quantity.value * factor;
};

/** `+0`, `-0.010`, `+.000/-.010`, `±0.005` after the nominal size. */
const toleranceAt = (cursor: Cursor): readonly Quantity[] => {
  const slashed = tokenAt(cursor);
  const inTwo = /^([+-][\d.,]+)\/([+-][\d.,]+\D*)$/u.exec(slashed?.text ?? '');
  if (slashed !== undefined && inTwo !== null) {
    const parts = [inTwo[1] ?? '', inTwo[2] ?? ''].map((text) => ({ ...slashed, text }));
    const each = parts.map((part) => quantityAt({ ...cursor, tokens: [part], at: 0 }));
    const both = each.filter((quantity) => quantity !== null);
    return both.length === 2 ? both.map((q, i) => ({ ...q, used: i })) : [];
  }
  const first = quantityAt(cursor);
  if (first === null || first.sign === '') return [];
  if (first.sign === '±') return [first];
  const gap = tokenAt(cursor, first.used)?.text === '/' ? 1 : 0;
  const second = quantityAt(moved(cursor, first.used + gap));
  if (second === null || second.sign === '' || second.sign === '±') return [first];
  return [first, { ...second, used: second.used + gap }];
};

const within = (
  cursor: Cursor,
  what: string,
  limits: Limits,
  used: number,
  range: Range,
): Reading<Limits> => {
  for (const value of [limits.low, limits.high])
    if (!(value >= range[0] && value <= range[1]))
      return refused(outOfRange(what, value, range, 'mm'));
  if (limits.low <= limits.high) return took(limits, used);
  const span = spanOf(cursor, used);
  const scale = cursor.units === 'in' ? MM_PER_INCH : 1;
  const print = (value: number): string =>
    `${String(Number((value / scale).toFixed(5)))} ${cursor.units}`;
  const sorted = `${print(limits.high)} to ${print(limits.low)}`;
  return refused({
    code: 'unclear',
    what,
    because: 'limitsReversed',
    readings: [{ label: sorted, words: replaced(cursor.text, span, sorted) }],
  });
};

const toleranced = (size: Size, parts: readonly Quantity[], bare: number): Limits => {
  const offsets = parts.flatMap((part) => {
    const amount = sizeIn(part, bare);
    if (part.sign === '±') return [-amount, amount];
    return [part.sign === '-' ? -amount : amount];
  });
  const all = parts.length === 1 && parts[0]?.sign !== '±' ? [0, ...offsets] : offsets;
  return {
    low: size.value + Math.min(...all),
    high: size.value + Math.max(...all),
    nominalOnly: false,
  };
};

/** `0.995-1.005`, `0.995 to 1.005 in`, `1.000 +0 -0.010`, `25 ±0.1`, or one nominal size. */
export const limitsOf =
  (what: string, range: Range, bare: BareRange): Reader<Limits> =>
  (whole) => {
    const cursor = split(whole);
    const extra = cursor.tokens.length - whole.tokens.length;
    const first = quantityAt(cursor);
    if (first === null) return null;
    const lengthUnit = first.unit === null || first.unit.measure === 'length';
    if (!lengthUnit) return null;
    const firstUsed = first.used;
    const separator = SEPARATORS.has(tokenAt(cursor, firstUsed)?.text ?? '');
    const second = separator ? quantityAt(moved(cursor, firstUsed + 1)) : null;
    // One word that looked like two sizes but is not: `0.745-0.755bored`.
    if (extra > 0 && second === null) return null;
    const shop = cursor.units === 'in' ? MM_PER_INCH : 1;
    // `25.3-25.5mm`: the unit at the end speaks for both.
    const stated = [first, second].map((q) => q?.unit).find((unit) => unit?.measure === 'length');
    const factor = stated?.factor ?? shop;
    const plain = stated === undefined;
    const likely = bare[cursor.units];
    if (plain && !(first.value >= likely[0] && first.value <= likely[1]))
      return refused(
        outOfRange(what, first.value * factor, [likely[0] * factor, likely[1] * factor], 'mm'),
      );
    const size = { value: sizeIn(first, factor), used: firstUsed };
    if (second !== null) {
      const other = ofMeasure(second, 'length');
      if (other === null) return null;
      const used = firstUsed + 1 + other.used - extra;
      const limits = { low: size.value, high: sizeIn(other, factor), nominalOnly: false };
      return within(whole, what, limits, used, range);
    }
    const parts = toleranceAt(moved(cursor, firstUsed));
    const used = firstUsed - extra + parts.reduce((sum, part) => sum + part.used, 0);
    if (parts.length > 0) return within(whole, what, toleranced(size, parts, factor), used, range);
    return within(
      whole,
      what,
      { low: size.value, high: size.value, nominalOnly: true },
      used,
      range,
    );
  };
