import { MM_PER_INCH } from '../calc/units.ts';
import { plainText } from './characters.ts';
import { type Cursor, moved, type Quantity, quantityAt, tokenAt } from './cursor.ts';
import { type BareRange, hardwareOf, outOfRange, type Range } from './kinds.ts';
import { MATERIAL_PHRASES } from './material.ts';
import { nearestOf } from './nearest.ts';
import { NUMBER, numberOf } from './numbers.ts';
import { type Names, type Reader, type Reading, refused, took } from './reading.ts';
import { unitOf } from './unit.ts';

/** Sizes wheels come in. The inch and metric ranges do not overlap, so a bare size is clear. */
const WHEEL_DIAMETER: Range = [5, 80];
const DIAMETER_SIZES: BareRange = { in: [0.2, 3], mm: [5, 80] };
const FACE: Range = [0.5, 60];
const BORE: Range = [0.5, 60];
const WHEEL_TEETH: Range = [8, 1000];
const PIN: Range = [1, 25];
const PIN_SIZES: BareRange = { in: [0.04, 0.99], mm: [1, 25] };
export const BEVEL: Range = [0, 5];
export const BEVEL_SIZES: BareRange = { in: [0, 0.19], mm: [0.2, 5] };

/** A wheel by size, by size and count, or by the shop's own name for it. */
export type WheelWords = {
  readonly name: string | null;
  readonly diameter: number | null;
  readonly face: number | null;
  readonly bore: number | null;
  readonly teeth: number | null;
};
const NO_WHEEL: WheelWords = { name: null, diameter: null, face: null, bore: null, teeth: null };

const SIZES = new RegExp(`^(${NUMBER})x(${NUMBER})(?:x(${NUMBER}))?([^\\d].*)?$`, 'u');

/** `20x8x6`, `20 x 8 x 6`, `3/4x3/8x1/4 in`: joined to one word and the tokens it takes. */
const joinedSizes = (cursor: Cursor): { readonly text: string; readonly used: number } => {
  let text = tokenAt(cursor)?.text ?? '';
  let used = 1;
  for (;;) {
    const next = tokenAt(cursor, used)?.text;
    if (next === undefined) break;
    const continues =
      next === 'x' || /^x[\d.]/u.test(next) || (text.endsWith('x') && /^[\d.]/u.test(next));
    if (!continues) break;
    text += next;
    used += 1;
  }
  return { text, used };
};

const inLimits = (what: string, value: number, range: Range) =>
  value >= range[0] && value <= range[1] ? null : refused(outOfRange(what, value, range, 'mm'));

const sizesAt = (cursor: Cursor): Reading<WheelWords> | null => {
  const joined = joinedSizes(cursor);
  const match = SIZES.exec(joined.text);
  if (match === null) return null;
  const [, first = '', second = '', third, tail] = match;
  const attached = tail === undefined ? null : unitOf(tail);
  if (tail !== undefined && attached?.measure !== 'length') return null;
  const following = attached === null ? unitOf(tokenAt(cursor, joined.used)?.text ?? '') : null;
  const unit = attached ?? (following?.measure === 'length' ? following : null);
  const outside = numberOf(first) ?? 0;
  const bare = outside <= DIAMETER_SIZES.in[1] ? MM_PER_INCH : 1;
  const factor = unit?.factor ?? bare;
  const [diameter, face] = [outside * factor, (numberOf(second) ?? 0) * factor];
  const bore = third === undefined ? null : (numberOf(third) ?? 0) * factor;
  const fault =
    inLimits('wheelDiameter', diameter, WHEEL_DIAMETER) ??
    inLimits('wheelFace', face, FACE) ??
    (bore === null ? null : inLimits('wheelBore', bore, [BORE[0], diameter]));
  if (fault !== null) return fault;
  const used = joined.used + (attached === null && unit !== null ? 1 : 0);
  return took({ ...NO_WHEEL, diameter, face, bore }, used);
};

const teethAt = (cursor: Cursor): Reading<number> | null => {
  const quantity = quantityAt(cursor);
  if (quantity?.unit?.measure !== 'teeth') return null;
  const ok = Number.isInteger(quantity.value) && quantity.sign !== '-';
  return ok && quantity.value >= WHEEL_TEETH[0] && quantity.value <= WHEEL_TEETH[1]
    ? took(quantity.value, quantity.used)
    : refused(outOfRange('wheelTeeth', quantity.value, WHEEL_TEETH, '1'));
};

const diameterAt: Reader<number> = hardwareOf('wheelDiameter', WHEEL_DIAMETER, DIAMETER_SIZES);

/** The wheel's size first, then its count where one follows at once. */
const sizeThenTeeth = (cursor: Cursor, size: WheelWords, used: number): Reading<WheelWords> => {
  const teeth = teethAt(moved(cursor, used));
  if (teeth === null) return took(size, used);
  if ('refusal' in teeth) return teeth;
  return took({ ...size, teeth: teeth.value }, used + teeth.used);
};

const nameAt = (cursor: Cursor, names: Names): Reading<WheelWords> | null => {
  const found = names.wheels
    .map((name) => ({ name, words: plainText(name).split(/\s+/u) }))
    .filter(({ words }) => words.every((word, i) => tokenAt(cursor, i)?.text === word))
    .sort((a, b) => b.words.length - a.words.length)[0];
  return found === undefined ? null : took({ ...NO_WHEEL, name: found.name }, found.words.length);
};

/** What may follow the word `wheel`. */
export const readWheel: Reader<WheelWords> = (cursor, names) => {
  const named = nameAt(cursor, names);
  if (named !== null) return named;
  const sizes = sizesAt(cursor);
  if (sizes !== null)
    return 'refusal' in sizes ? sizes : sizeThenTeeth(cursor, sizes.value, sizes.used);
  const teeth = teethAt(cursor);
  if (teeth !== null)
    return 'refusal' in teeth ? teeth : took({ ...NO_WHEEL, teeth: teeth.value }, teeth.used);
  const diameter = diameterAt(cursor, names);
  if (diameter !== null) {
    if ('refusal' in diameter) return diameter;
    return sizeThenTeeth(cursor, { ...NO_WHEEL, diameter: diameter.value }, diameter.used);
  }
  const token = tokenAt(cursor);
  return token === undefined
    ? null
    : refused({ code: 'notFound', what: 'wheel', nearest: nearestOf(token.text, names.wheels) });
};

const either = <T>(a: T | null, b: T | null): { readonly value: T | null } | null =>
  a !== null && b !== null && a !== b ? null : { value: a ?? b };

/** A wheel said in two places, as far as they agree. */
export const oneWheel = (a: WheelWords, b: WheelWords): WheelWords | null => {
  const parts = [
    either(a.diameter, b.diameter),
    either(a.face, b.face),
    either(a.bore, b.bore),
    either(a.teeth, b.teeth),
  ].filter((part) => part !== null);
  const name = either(a.name, b.name);
  const [diameter, face, bore, teeth] = parts;
  if (name === null || !diameter || !face || !bore || !teeth) return null;
  return {
    name: name.value,
    diameter: diameter.value,
    face: face.value,
    bore: bore.value,
    teeth: teeth.value,
  };
};

/** The pin the wheel turns on. */
export type PinWords = {
  readonly diameter: number | null;
  readonly material: 'hardened' | 'carbide' | null;
};

/** A map, not an object: `constructor` is a word people may type. */
const PIN_MATERIALS: ReadonlyMap<string, 'hardened' | 'carbide'> = new Map<
  string,
  'hardened' | 'carbide'
>([
  ['carbide', 'carbide'],
  ['hardened', 'hardened'],
  ['hard', 'hardened'],
  ['steel', 'hardened'],
]);
const pinDiameter: Reader<number> = hardwareOf('pinDiameter', PIN, PIN_SIZES);

/** What may follow the word `pin`: `6mm carbide`, `carbide`, `1/4`. */
export const readPin: Reader<PinWords> = (cursor, names) => {
  const before = PIN_MATERIALS.get(tokenAt(cursor)?.text ?? '') ?? null;
  const skipped = before === null ? 0 : 1;
  const diameter = pinDiameter(moved(cursor, skipped), names);
  // A number after `pin carbide` that is no pin size is the bar, not the pin.
  if (diameter === null || 'refusal' in diameter)
    return before !== null ? took({ diameter: null, material: before }, 1) : diameter;
  const used = skipped + diameter.used;
  const after = before ?? PIN_MATERIALS.get(tokenAt(cursor, used)?.text ?? '') ?? null;
  const more = before === null && after !== null ? 1 : 0;
  return took({ diameter: diameter.value, material: after }, used + more);
};

export const onePin = (a: PinWords, b: PinWords): PinWords | null => {
  const diameter = either(a.diameter, b.diameter);
  const material = either(a.material, b.material);
  return diameter === null || material === null
    ? null
    : { diameter: diameter.value, material: material.value };
};

/** A hardness as it was measured. */
export type HardnessWords = { readonly scale: 'HB' | 'HRC'; readonly value: number };
const HARDNESS: Readonly<Record<'HB' | 'HRC', Range>> = { HB: [20, 750], HRC: [5, 68] };

const hardness = (scale: 'HB' | 'HRC', value: number, used: number): Reading<HardnessWords> => {
  const [low, high] = HARDNESS[scale];
  return value >= low && value <= high
    ? took({ scale, value }, used)
    : refused(outOfRange('hardness', value, HARDNESS[scale], scale));
};

/** A map, not an object: `constructor` is a word people may type. */
const SCALE_WORDS: ReadonlyMap<string, 'HB' | 'HRC'> = new Map<string, 'HB' | 'HRC'>([
  ['hb', 'HB'],
  ['bhn', 'HB'],
  ['brinell', 'HB'],
  ['hrc', 'HRC'],
  ['rc', 'HRC'],
]);

/** In `4140 HB 210` the scale belongs to the number behind it: the first one is the material. */
const announcesNext = (cursor: Cursor, quantity: Quantity): boolean => {
  const next = quantityAt(moved(cursor, quantity.used));
  const before = tokenAt(cursor)?.text ?? '';
  const scale = quantity.unit?.measure === 'hrc' ? 'HRC' : 'HB';
  const [low, high] = HARDNESS[scale];
  const likely = next?.unit === null && next.value >= low && next.value <= high;
  return (
    quantity.unitApart && likely && (quantity.value > high || MATERIAL_PHRASES.includes(before))
  );
};

/** `HB 210`, `hb210`, `28 HRC`. */
export const readHardness: Reader<HardnessWords> = (cursor) => {
  const token = tokenAt(cursor);
  const attached = /^(hb|hrc|bhn|rc)([\d.,]+)$/u.exec(token?.text ?? '');
  const value = attached === null ? null : numberOf(attached[2] ?? '');
  const scale = SCALE_WORDS.get(attached?.[1] ?? '');
  if (value !== null && scale !== undefined) return hardness(scale, value, 1);
  const named = SCALE_WORDS.get(token?.text ?? '');
  if (named !== undefined) {
    const after = quantityAt(moved(cursor, 1));
    return after?.unit === null ? hardness(named, after.value, after.used + 1) : null;
  }
  const quantity = quantityAt(cursor);
  const measure = quantity?.unit?.measure;
  if (quantity === null || (measure !== 'hb' && measure !== 'hrc')) return null;
  if (announcesNext(cursor, quantity)) return null;
  return hardness(measure === 'hb' ? 'HB' : 'HRC', quantity.value, quantity.used);
};
