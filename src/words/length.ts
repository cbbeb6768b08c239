import { MM_PER_INCH } from '../calc/units.ts';
import type { Doubt } from '../refusal.ts';
import { type Cursor, cursorOf, moved, type ShopUnits, spanOf, textAt } from './cursor.ts';
import { partOf } from './edit.ts';
import { freeMaterial } from './material.ts';
import { quantityOf, signed } from './quantity.ts';
import { ask, inRange, isIn, outOfRange, type Range } from './range.ts';
import { NO_NAMES, type Reader, type Reading, refused, took } from './reading.ts';
import type { Span } from './tokens.ts';
import type { Quantity } from './unit.ts';
import { unitOf } from './unit.ts';

/** What a person most likely means by a bare number, by the shop's units. */
export type BareRange = { readonly in: Range; readonly mm: Range };

export const factorOf = (units: ShopUnits): number => (units === 'in' ? MM_PER_INCH : 1);

/** A length to be read: what it is called, what it may be, and what a bare number is likely to be. */
type Wanted = {
  readonly what: string;
  readonly limits: Range;
  /** Units that a bare number is offered in. */
  readonly offered: readonly string[];
};

type Candidate = { readonly words: string; readonly value: number };

/** The readings that make sense, as a question; where none does, it is out of range. */
const settled = (
  cursor: Cursor,
  { what, limits }: Wanted,
  because: Doubt,
  span: Span,
  candidates: readonly Candidate[],
): Reading<number> => {
  const fit = candidates.filter(({ value }) => isIn(value, limits)).map(({ words }) => words);
  return fit.length === 0
    ? refused(outOfRange(what, candidates[0]?.value ?? 0, limits, 'mm'))
    : ask(cursor, what, because, span, fit);
};

const inUnit = (typed: string, value: number, unit: string): Candidate => ({
  words: `${typed} ${unit}`,
  value: value * (unitOf(unit)?.factor ?? 1),
});

/** Three figures without a point: `750` is how three quarters of an inch are said aloud. */
const IN_THOU = /^\d{3}$/u;

/** A bare number that fits neither the shop's habits nor common sense is a question, not a guess. */
const bareQuestion = (cursor: Cursor, wanted: Wanted, quantity: Quantity): Reading<number> => {
  const { what, limits, offered } = wanted;
  const typed = partOf(cursor.text, quantity.number);
  const units = offered.filter((unit) => unit !== 'thou' || IN_THOU.test(typed));
  const candidates = units.map((unit) => inUnit(typed, quantity.value, unit));
  if (quantity.sign !== '-' && candidates.some(({ value }) => isIn(value, limits)))
    return settled(cursor, wanted, 'noUnit', quantity.number, candidates);
  return refused(outOfRange(what, signed(quantity) * factorOf(cursor.units), limits, 'mm'));
};

/** What something can be in: `20 in brass`, `3 in the chuck`. */
const HOLDERS = new Set([
  'the',
  'a',
  'an',
  'chuck',
  'collet',
  'centers',
  'centres',
  'lathe',
  'vice',
]);

/** In a metric shop the `in` of `20 in brass` may be a word. */
const maybeWord = (cursor: Cursor, quantity: Quantity): boolean => {
  if (cursor.units === 'in' || !quantity.unitApart) return false;
  if (textAt(cursor, quantity.used - 1) !== 'in') return false;
  const next = moved(cursor, quantity.used);
  return HOLDERS.has(textAt(next)) || freeMaterial(next, NO_NAMES) !== null;
};

const unitOrWord = (cursor: Cursor, wanted: Wanted, quantity: Quantity): Reading<number> => {
  const typed = partOf(cursor.text, quantity.number);
  const value = signed(quantity);
  const span = spanOf(cursor, quantity.used);
  return settled(cursor, wanted, 'unitOrWord', span, [
    inUnit(typed, value, 'mm'),
    inUnit(typed, value, 'inch'),
  ]);
};

/** With a unit: what it says, unless the unit or the number says two things. */
const stated = (cursor: Cursor, wanted: Wanted, quantity: Quantity): Reading<number> => {
  const { unit, used } = quantity;
  if (unit === null) return refused(outOfRange(wanted.what, 0, wanted.limits, 'mm'));
  const value = signed(quantity);
  const typed = partOf(cursor.text, quantity.number);
  const span = spanOf(cursor, used);
  if (unit.either !== undefined) {
    const candidates = unit.either.map((each) => inUnit(typed, value, each));
    return settled(cursor, wanted, 'unitOfTwo', span, candidates);
  }
  return orThousands(cursor, wanted, quantity, unit.factor, value * unit.factor);
};

/** `1,200 mm` may be 1.2 or 1200; where only one of them can be, it is that one. */
const orThousands = (
  cursor: Cursor,
  { what, limits }: Wanted,
  quantity: Quantity,
  factor: number,
  value: number,
): Reading<number> => {
  const typed = partOf(cursor.text, quantity.number);
  const { thousands } = quantity;
  const large = thousands === null || !typed.includes(',') ? null : thousands * factor;
  if (large === null || thousands === null || !isIn(large, limits))
    return inRange(what, value, quantity.used, limits, 'mm');
  if (!isIn(value, limits)) return took(large, quantity.used);
  return ask(cursor, what, 'commaOrThousands', quantity.number, [
    typed.replace(',', '.'),
    String(thousands),
  ]);
};

/** `25,304 …` may be one number, or a size and a material with no space behind the comma. */
const commaBetweenTwo = (
  cursor: Cursor,
  what: string,
  quantity: Quantity,
): Reading<never> | null => {
  const typed = partOf(cursor.text, quantity.number);
  const [before = '', after, more] = typed.split(',');
  if (after === undefined || more !== undefined || !/^\d+$/u.test(before)) return null;
  if (freeMaterial(cursorOf(after, cursor.units), NO_NAMES) === null) return null;
  return ask(cursor, what, 'commaOrTwo', quantity.number, [
    `${before}.${after}`,
    `${before}, ${after}`,
  ]);
};

/** A length in mm. A bare number is in the shop's unit where it is a likely size in it. */
export const lengthOf =
  (
    what: string,
    limits: Range,
    bare: BareRange,
    offered: readonly string[] = ['mm', 'in'],
  ): Reader<number> =>
  (cursor) => {
    const quantity = quantityOf(cursor, 'length');
    if (quantity === null || quantity.sign === '±') return null;
    const wanted = { what, limits, offered };
    const two = commaBetweenTwo(cursor, what, quantity);
    if (two !== null) return two;
    if (maybeWord(cursor, quantity)) return unitOrWord(cursor, wanted, quantity);
    if (quantity.unit !== null) return stated(cursor, wanted, quantity);
    const factor = factorOf(cursor.units);
    if (quantity.sign === '-' || !isIn(quantity.value, bare[cursor.units]))
      return bareQuestion(cursor, wanted, quantity);
    return orThousands(cursor, wanted, quantity, factor, quantity.value * factor);
  };

/** A small length (a run-out, a coating) in mm; a bare number is in the shop's unit. */
export const smallLengthOf = (
  what: string,
  limits: Range,
  bare: BareRange = { in: [0, Number.MAX_VALUE], mm: [0, Number.MAX_VALUE] },
  offered: readonly string[] = ['mm', 'in'],
): Reader<number> => lengthOf(what, limits, bare, offered);

/**
 * A length of the tooling, whose inch and metric sizes do not overlap: a bare number can only be
 * one of the two.
 */
export const hardwareOf =
  (what: string, limits: Range, sizes: BareRange): Reader<number> =>
  (cursor) => {
    const joined = quantityOf(cursor, 'length');
    if (joined === null) return null;
    const wanted = { what, limits, offered: ['mm', 'in'] };
    if (joined.unit !== null) return stated(cursor, wanted, joined);
    // Mixed numbers are inches: in `bevel 1 3/4` the bevel is 1 and the bar 3/4.
    const inInches = !joined.mixed || isIn(signed(joined), sizes.in);
    const quantity = inInches ? joined : quantityOf(cursor, null);
    if (quantity === null) return null;
    const value = signed(quantity);
    const fits = (['in', 'mm'] as const).filter(
      (units) => isIn(value, sizes[units]) && !(quantity.mixed && units === 'mm'),
    );
    const only = fits.length === 1 ? fits[0] : undefined;
    return only === undefined
      ? bareQuestion(cursor, wanted, quantity)
      : inRange(what, value * factorOf(only), quantity.used, limits, 'mm');
  };
