import { type Cursor, isAfterComma, moved, plainOf, textAt, tokenAt } from './cursor.ts';
import { partOf } from './edit.ts';
import { type BareRange, factorOf } from './length.ts';
import { type Limits, limitsAt, type Said } from './limitShapes.ts';
import { quantityAt } from './quantity.ts';
import { ask, isIn, outOfRange, placeOf, type Range } from './range.ts';
import { type Reader, type Reading, refused, took } from './reading.ts';
import { unitOf } from './unit.ts';

type Wanted = { readonly what: string; readonly range: Range; readonly bare: BareRange };

/** The two sizes the other way round, each with its unit. */
const reversed = (cursor: Cursor, what: string, { groups, span, unit }: Said): Reading<Limits> => {
  const usual = unit === '' ? cursor.units : '';
  const typed = (name: string): string =>
    `${groups[name] ?? ''} ${groups[`${name}Unit`] ?? usual}`.trim();
  const sorted = `${typed('to')} to ${typed('nominal')}`;
  return ask(cursor, what, 'limitsReversed', span, [sorted]);
};

const isWithin = ({ low, high }: Limits, [least, most]: Range, factor = 1): boolean =>
  Math.min(low, high) >= least * factor && Math.max(low, high) <= most * factor;

const outside = (
  cursor: Cursor,
  { what, range }: Wanted,
  { limits, span }: Said,
): Reading<Limits> => {
  const value = isIn(limits.low, range) ? limits.high : limits.low;
  return refused({ ...outOfRange(what, value, range, 'mm'), ...placeOf(cursor, span) });
};

/** Sizes without a unit that are no likely ones in the shop's: asked. */
const unlikely = (cursor: Cursor, wanted: Wanted, said: Said): Reading<Limits> => {
  const own = factorOf(cursor.units);
  const typed = partOf(cursor.text, said.span);
  const { low, high } = said.limits;
  const readings = (['mm', 'in'] as const)
    .filter((unit) => {
      const other = { low: (low / own) * factorOf(unit), high: (high / own) * factorOf(unit) };
      return isWithin({ ...other, nominalOnly: false }, wanted.range);
    })
    .map((unit) => `${typed} ${unit}`);
  return readings.length === 0
    ? outside(cursor, wanted, said)
    : ask(cursor, wanted.what, 'noUnit', said.span, readings);
};

/** `1.000 ±5`: a tolerance that size can only be in the smaller unit, and is asked. */
const smallTolerance = (cursor: Cursor, { what }: Wanted, said: Said): Reading<Limits> | null => {
  const { groups, span } = said;
  const hasUnit = (groups['toleranceUnit'] ?? groups['otherUnit']) !== undefined;
  if (groups['tolerance'] === undefined || hasUnit) return null;
  const inInches = said.unit === '' ? cursor.units === 'in' : unitOf(said.unit)?.factor !== 1;
  const typed = partOf(cursor.text, span);
  return ask(cursor, what, 'noUnit', span, [`${typed} ${inInches ? 'thou' : 'um'}`]);
};

/** `.995 1.005`: limits without a sign between them, or a size and the bar? */
const twoSizes = (cursor: Cursor, { what }: Wanted, said: Said): Reading<Limits> | null => {
  const next = moved(cursor, said.used);
  const second = isAfterComma(next) ? null : quantityAt(next);
  if (!said.limits.nominalOnly || second === null || second.mixed || second.sign !== '')
    return null;
  if (second.unit !== null && second.unit.measure !== 'length') return null;
  const value = second.value * (second.unit?.factor ?? factorOf(cursor.units));
  const { low } = said.limits;
  if (!(Math.max(low, value) <= Math.min(low, value) * WIDEST)) return null;
  const span = {
    start: said.span.start,
    end: tokenAt(next, second.used - 1)?.end ?? said.span.end,
  };
  const [first, other] = [said.span, { start: said.span.end, end: span.end }].map((part) =>
    partOf(cursor.text, part).trim(),
  );
  return ask(cursor, what, 'sizeByWhat', span, [
    `${first ?? ''} to ${other ?? ''}`,
    `${first ?? ''}, ${other ?? ''}`,
  ]);
};

/** Small words between the keyword and the sizes. */
const LINKS = new Set(['is', 'of', 'from', 'between', 'at', 'to', 'ø', 'dia', 'diameter', 'size']);

const judged = (cursor: Cursor, wanted: Wanted, said: Said, used: number): Reading<Limits> => {
  const { limits } = said;
  const factor = factorOf(cursor.units);
  const two = twoSizes(cursor, wanted, said);
  if (two !== null) return two;
  if (!isWithin(limits, wanted.range)) {
    const small = smallTolerance(cursor, wanted, said);
    if (small !== null) return small;
  }
  if (said.unit === '' && !isWithin(limits, wanted.bare[cursor.units], factor))
    return unlikely(cursor, wanted, said);
  if (!isWithin(limits, wanted.range)) return outside(cursor, wanted, said);
  return limits.low > limits.high ? reversed(cursor, wanted.what, said) : took(limits, used);
};

/** `0.995-1.005`, `0.995 to 1.005 in`, `1.000 +0 -0.010`, `25 ±0.1`, or one nominal size. */
export const limitsOf =
  (what: string, range: Range, bare: BareRange): Reader<Limits> =>
  (cursor) => {
    let linked = 0;
    while (LINKS.has(textAt(cursor, linked))) linked += 1;
    const start = moved(cursor, linked);
    const said = limitsAt(start);
    return said === null ? null : judged(start, { what, range, bare }, said, said.used + linked);
  };

/** Two sizes that differ by more than this are hardly limits of one part. */
const WIDEST = 1.25;
/** Most numbers of a line have nothing of the kind near them. */
const MAY_FOLLOW = /^.{1,12}?(?:[±+…]|-[\s(.\d]|\.\.|to|and|\/[\s.\d+-])/u;
const LOOKS_LIKE_SIZES = /[.,½¼¾⅛⅜⅝⅞±]|\d\/\d|mm|in|"/u;
const DIAMETER = /^(?:ø|d|dia|diam|diameter)$/u;

/** Limits of one part that stand here, at least a tolerance or two sizes. */
const twoLimits = (cursor: Cursor): Said | null => {
  const start = tokenAt(cursor)?.start ?? plainOf(cursor).length;
  if (!MAY_FOLLOW.test(plainOf(cursor).slice(start))) return null;
  const said = limitsAt(cursor);
  if (said === null || said.limits.nominalOnly) return null;
  const { low, high } = said.limits;
  const isWide = Math.max(low, high) > Math.min(low, high) * WIDEST;
  return isWide || !LOOKS_LIKE_SIZES.test(partOf(plainOf(cursor), said.span)) ? null : said;
};

const nominalOf = (cursor: Cursor, { groups, span, unit }: Said): string => {
  const end = span.start + (groups['nominal'] ?? '').length;
  return `${partOf(cursor.text, { start: span.start, end })} ${unit}`.trim();
};

/**
 * Limits that nothing announces: of the finished part, or of the bar? The size alone is offered
 * as well. With the keyword behind them, as in `0.995-1.005 finished`, there is no question.
 */
export const unannouncedLimits =
  (keywords: readonly string[], read: Reader<Limits>): Reader<Limits> =>
  (cursor, names) => {
    const start = moved(cursor, DIAMETER.test(textAt(cursor)) ? 1 : 0);
    const said = twoLimits(start);
    if (said === null) return null;
    const used = said.used + start.at - cursor.at;
    const next = moved(cursor, used);
    if (keywords.includes(textAt(next)) && limitsAt(moved(next, 1)) === null) {
      const reading = read(start, names);
      return reading !== null && 'value' in reading ? took(reading.value, used + 1) : reading;
    }
    const typed = partOf(cursor.text, said.span);
    const nominal = said.groups['to'] === undefined ? [nominalOf(cursor, said)] : [];
    const [keyword = ''] = keywords;
    const span = { start: tokenAt(cursor)?.start ?? said.span.start, end: said.span.end };
    return ask(cursor, keyword, 'limitsOfWhat', span, [`${keyword} ${typed}`, ...nominal]);
  };
