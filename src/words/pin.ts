import { type Cursor, isAfterComma, moved, textAt } from './cursor.ts';
import { type BareRange, hardwareOf } from './length.ts';
import { quantityAt } from './quantity.ts';
import type { Range } from './range.ts';
import { either, type Reader, took } from './reading.ts';

const PIN: Range = [1, 25];
/** Bare sizes. A pin of 1 mm carries no knurling wheel, so a bare 1.0 is none. */
const PIN_SIZES: BareRange = { in: [0.04, 0.99], mm: [2, 25] };

/** The pin the wheel turns on. */
export type PinWords = {
  readonly diameter: number | null;
  readonly material: 'hardened' | 'carbide' | null;
};

const MATERIALS: ReadonlyMap<string, 'hardened' | 'carbide'> = new Map([
  ['carbide', 'carbide'],
  ['hardened', 'hardened'],
  ['hard', 'hardened'],
  ['steel', 'hardened'],
]);
const materialAt = (cursor: Cursor, ahead: number): 'hardened' | 'carbide' | null =>
  MATERIALS.get(textAt(cursor, ahead)) ?? null;

const diameterAt: Reader<number> = hardwareOf('pinDiameter', PIN, PIN_SIZES);

/** What may follow the word `pin`: `6mm carbide`, `carbide`, `1/4`. */
export const readPin: Reader<PinWords> = (cursor, names) => {
  const before = materialAt(cursor, 0);
  const skipped = before === null ? 0 : 1;
  const diameter = isAfterComma(cursor, skipped) ? null : diameterAt(moved(cursor, skipped), names);
  // A number after `pin carbide` that is no pin size is the bar, not the pin.
  if (diameter === null || 'refusal' in diameter)
    return before !== null ? took({ diameter: null, material: before }, 1) : diameter;
  const used = skipped + diameter.used;
  const after = before ?? (isAfterComma(cursor, used) ? null : materialAt(cursor, used));
  const more = before === null && after !== null ? 1 : 0;
  return took({ diameter: diameter.value, material: after }, used + more);
};

const IS_PIN = /^pins?$/u;

/** `6mm pin`, `6 mm carbide pin`: the word comes after. */
export const pinFirst: Reader<PinWords> = (cursor, names) => {
  const length = quantityAt(cursor)?.used ?? 0;
  if (length === 0 || isAfterComma(cursor, length)) return null;
  const material = materialAt(cursor, length);
  const used = length + (material === null ? 0 : 1);
  if (!IS_PIN.test(textAt(cursor, used))) return null;
  const diameter = diameterAt(cursor, names);
  if (diameter === null || 'refusal' in diameter || diameter.used !== length) return null;
  // In `1.0 pin 6mm` the word belongs to what follows.
  const next = moved(cursor, used + 1);
  const after = material !== null || isAfterComma(next) ? null : diameterAt(next, names);
  if (after !== null && 'value' in after) return null;
  return took({ diameter: diameter.value, material }, used + 1);
};

export const onePin = (a: PinWords, b: PinWords): PinWords | null => {
  const diameter = either(a.diameter, b.diameter);
  const material = either(a.material, b.material);
  return diameter === null || material === null
    ? null
    : { diameter: diameter.value, material: material.value };
};
