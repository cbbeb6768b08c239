import { MM_PER_INCH } from '../calc/units.ts';
import type { Refusal } from '../refusal.ts';
import { type Cursor, isAfterComma, moved, textAt } from './cursor.ts';
import { type BareRange, hardwareOf } from './length.ts';
import { knownName, nameOf } from './names.ts';
import { NUMBER, numberOf } from './numbers.ts';
import { quantityAt } from './quantity.ts';
import { isIn, outOfRange, type Range } from './range.ts';
import { either, type Names, type Reader, type Reading, refused, took } from './reading.ts';
import { type Unit, unitOf } from './unit.ts';

/** Sizes wheels come in. The inch and metric ranges do not overlap, so a bare size is clear. */
const WHEEL_DIAMETER: Range = [5, 80];
const DIAMETER_SIZES: BareRange = { in: [0.2, 3], mm: [5, 80] };
const FACE: Range = [0.5, 60];
const LEAST_BORE = 0.5;
const WHEEL_TEETH: Range = [8, 1000];

/** A wheel by size, by size and count, or by the shop's own name for it. */
export type WheelWords = {
  readonly name: string | null;
  readonly diameter: number | null;
  readonly face: number | null;
  readonly bore: number | null;
  readonly teeth: number | null;
};
const NO_WHEEL: WheelWords = { name: null, diameter: null, face: null, bore: null, teeth: null };

const lengthUnit = (word: string): Unit | null => {
  const unit = unitOf(word);
  return unit?.measure === 'length' && unit.either === undefined ? unit : null;
};

/** One of the sizes between the x: its number, and its unit where it has one. */
type Size = { readonly value: number; readonly unit: Unit | null; readonly used: number };

const SIZE = new RegExp(`^(${NUMBER})(.*)$`, 'u');

const sizeAt = (cursor: Cursor): Size | null => {
  const [, number = '', rest = ''] = SIZE.exec(textAt(cursor)) ?? [];
  const value = numberOf(number);
  if (value === null) return null;
  if (rest !== '') {
    const unit = lengthUnit(rest);
    return unit === null ? null : { value, unit, used: 1 };
  }
  const apart = isAfterComma(cursor, 1) ? null : lengthUnit(textAt(cursor, 1));
  return { value, unit: apart, used: apart === null ? 1 : 2 };
};

export type Sizes = { readonly sizes: readonly Size[]; readonly used: number };

/** `20x8x6`, `20 x 8`, `3/4x3/8x1/4 in`: two or three sizes with an x between them. */
export const timesAt = (cursor: Cursor): Sizes | null => {
  const sizes: Size[] = [];
  let used = 0;
  while (sizes.length < 3) {
    const size = sizeAt(moved(cursor, used));
    if (size === null) break;
    sizes.push(size);
    used += size.used;
    if (textAt(cursor, used) !== 'x' || sizeAt(moved(cursor, used + 1)) === null) break;
    used += 1;
  }
  return sizes.length < 2 ? null : { sizes, used };
};

const firstFault = (
  sizes: readonly [what: string, value: number | undefined, range: Range][],
): Refusal | null => {
  for (const [what, value, range] of sizes)
    if (value !== undefined && !isIn(value, range)) return outOfRange(what, value, range, 'mm');
  return null;
};

const sizesAt = (cursor: Cursor): Reading<WheelWords> | null => {
  const times = timesAt(cursor);
  if (times === null) return null;
  const stated = times.sizes.map((size) => size.unit).find((unit) => unit !== null);
  const outside = times.sizes[0]?.value ?? 0;
  const usual = stated?.factor ?? (outside <= DIAMETER_SIZES.in[1] ? MM_PER_INCH : 1);
  const [diameter = 0, face = 0, bore] = times.sizes.map(
    ({ value, unit }) => value * (unit?.factor ?? usual),
  );
  const fault = firstFault([
    ['wheelDiameter', diameter, WHEEL_DIAMETER],
    ['wheelFace', face, FACE],
    ['wheelBore', bore, [LEAST_BORE, diameter]],
  ]);
  if (fault !== null) return refused(fault);
  return took({ ...NO_WHEEL, diameter, face, bore: bore ?? null }, times.used);
};

/** Small words that may stand between a wheel's size and its count. */
const LINKS = new Set(['with', 'and', 'dia', 'diameter', 'ø']);

const teethAt = (cursor: Cursor): Reading<number> | null => {
  const linked = LINKS.has(textAt(cursor)) ? 1 : 0;
  const quantity = quantityAt(moved(cursor, linked));
  if (quantity?.unit?.measure !== 'teeth') return null;
  const { value, sign } = quantity;
  return Number.isInteger(value) && sign !== '-' && isIn(value, WHEEL_TEETH)
    ? took(value, quantity.used + linked)
    : refused(outOfRange('wheelTeeth', value, WHEEL_TEETH, '1'));
};

const diameterAt: Reader<number> = hardwareOf('wheelDiameter', WHEEL_DIAMETER, DIAMETER_SIZES);

/** The wheel's size first, then its count where one follows at once. */
const sizeThenTeeth = (cursor: Cursor, size: WheelWords, used: number): Reading<WheelWords> => {
  const teeth = isAfterComma(cursor, used) ? null : teethAt(moved(cursor, used));
  if (teeth === null) return took(size, used);
  if ('refusal' in teeth) return teeth;
  return took({ ...size, teeth: teeth.value }, used + teeth.used);
};

/** The count first, then the size. */
const teethThenSize = (cursor: Cursor, teeth: number, used: number): Reading<WheelWords> => {
  const next = moved(cursor, used);
  const quantity = isAfterComma(next) ? null : quantityAt(next);
  // A bare number after the count may as well be the bar.
  const diameter = quantity?.unit?.measure === 'length' ? diameterAt(next, NOBODY) : null;
  return diameter !== null && 'value' in diameter
    ? took({ ...NO_WHEEL, teeth, diameter: diameter.value }, used + diameter.used)
    : took({ ...NO_WHEEL, teeth }, used);
};
const NOBODY = { wheels: [], machines: [] } as const;

/** A wheel by its sizes or its count, where that stands here. */
const measuredAt: Reader<WheelWords> = (cursor, names) => {
  const linked = LINKS.has(textAt(cursor)) ? 1 : 0;
  const start = moved(cursor, linked);
  const sizes = sizesAt(start);
  if (sizes !== null)
    return 'refusal' in sizes ? sizes : sizeThenTeeth(cursor, sizes.value, sizes.used + linked);
  const teeth = teethAt(start);
  if (teeth !== null)
    return 'refusal' in teeth ? teeth : teethThenSize(cursor, teeth.value, teeth.used + linked);
  const diameter = diameterAt(start, names);
  if (diameter === null || 'refusal' in diameter) return diameter;
  const size = { ...NO_WHEEL, diameter: diameter.value };
  return sizeThenTeeth(cursor, size, diameter.used + linked);
};

const named = knownName((names) => names.wheels);
const unknown = nameOf('wheel', (names) => names.wheels);

/** What may follow the word `wheel`. */
export const readWheel: Reader<WheelWords> = (cursor, names) => {
  const known = named(cursor, names);
  if (known !== null && 'value' in known)
    return took({ ...NO_WHEEL, name: known.value }, known.used);
  const measured = measuredAt(cursor, names);
  if (measured !== null) return measured;
  const other = unknown(cursor, names);
  return other !== null && 'refusal' in other ? other : null;
};

const WHEEL = /^wheels?$/u;

type Described = { readonly wheel: WheelWords; readonly used: number };

/** A size alone, `20x8x6` or `3/4`, where one stands here. */
const sizeAlone = (cursor: Cursor, names: Names): Described | null => {
  const sizes = sizesAt(cursor);
  if (sizes !== null) return 'value' in sizes ? { wheel: sizes.value, used: sizes.used } : null;
  const diameter = diameterAt(cursor, names);
  return diameter !== null && 'value' in diameter
    ? { wheel: { ...NO_WHEEL, diameter: diameter.value }, used: diameter.used }
    : null;
};

/** What stands before the word wheel: its name, its size, its count, or its count and its size. */
const describedAt = (cursor: Cursor, names: Names): Described | null => {
  const known = named(cursor, names);
  if (known !== null && 'value' in known)
    return { wheel: { ...NO_WHEEL, name: known.value }, used: known.used };
  const teeth = teethAt(cursor);
  if (teeth === null || 'refusal' in teeth) return sizeAlone(cursor, names);
  const counted = { ...NO_WHEEL, teeth: teeth.value };
  const size = sizeAlone(moved(cursor, teeth.used), names);
  if (size === null || !WHEEL.test(textAt(cursor, teeth.used + size.used)))
    return { wheel: counted, used: teeth.used };
  return { wheel: { ...size.wheel, teeth: teeth.value }, used: teeth.used + size.used };
};

/** `20x8x6 wheel`, `20mm wheel 63 teeth`, `63 tooth wheel`, `the blue wheel`: the word comes after. */
export const wheelFirst: Reader<WheelWords> = (cursor, names) => {
  const described = describedAt(cursor, names);
  if (described === null) return null;
  const { wheel, used } = described;
  if (!WHEEL.test(textAt(cursor, used)) || isAfterComma(cursor, used)) return null;
  const next = moved(cursor, used + 1);
  if (wheel.teeth !== null || isAfterComma(next)) return took(wheel, used + 1);
  // In `1.0 wheel 20x8x6` the word belongs to what follows.
  if (wheel.name === null && sizeAlone(next, names) !== null) return null;
  return sizeThenTeeth(cursor, wheel, used + 1);
};

/** A wheel said in two places, as far as they agree. */
export const oneWheel = (a: WheelWords, b: WheelWords): WheelWords | null => {
  const name = either(a.name, b.name);
  const diameter = either(a.diameter, b.diameter);
  const face = either(a.face, b.face);
  const bore = either(a.bore, b.bore);
  const teeth = either(a.teeth, b.teeth);
  if (!name || !diameter || !face || !bore || !teeth) return null;
  return {
    name: name.value,
    diameter: diameter.value,
    face: face.value,
    bore: bore.value,
    teeth: teeth.value,
  };
};
