import { type Cursor, isAfterComma, moved, spanOf, textAt } from './cursor.ts';
import { numberOf } from './numbers.ts';
import { quantityAt, quantityOf } from './quantity.ts';
import { ask, isIn, outOfRange, type Range } from './range.ts';
import { type Reader, type Reading, refused, took } from './reading.ts';

/** A hardness as it was measured. */
export type HardnessWords = { readonly scale: 'HB' | 'HRC'; readonly value: number };

type Scale = HardnessWords['scale'];
const HARDNESS: Readonly<Record<Scale, Range>> = { HB: [20, 750], HRC: [5, 68] };
const SCALES: ReadonlyMap<string, Scale> = new Map([
  ['hb', 'HB'],
  ['hbw', 'HB'],
  ['bhn', 'HB'],
  ['brinell', 'HB'],
  ['hrc', 'HRC'],
  ['rc', 'HRC'],
]);

const hardness = (scale: Scale, value: number, used: number): Reading<HardnessWords> =>
  isIn(value, HARDNESS[scale])
    ? took({ scale, value }, used)
    : refused(outOfRange('hardness', value, HARDNESS[scale], scale));

const RANGE = /^(?<low>\d{1,3})-(?<high>\d{1,3})(?<scale>[a-z]*)$/u;

/** `28-32 HRC` as mills sell it: one value is worked with, so which one is asked. */
const rangeAt = (
  cursor: Cursor,
  scale: Scale | null,
  used: number,
): Reading<HardnessWords> | null => {
  const groups = RANGE.exec(textAt(cursor, scale === null ? 0 : used))?.groups;
  if (groups === undefined) return null;
  const { low = '', high = '', scale: touching = '' } = groups;
  const apart = touching === '' && scale === null ? SCALES.get(textAt(cursor, 1)) : undefined;
  const own = scale ?? SCALES.get(touching) ?? apart;
  if (own === undefined) return null;
  const length = used + 1 + (apart === undefined ? 0 : 1);
  const readings = [low, high].map((value) => `${value} ${own}`);
  return ask(cursor, 'hardness', 'oneOfRange', spanOf(cursor, length), readings);
};

/** `HB 210`, `hb210`. */
const scaleFirst = (cursor: Cursor): Reading<HardnessWords> | null => {
  const touching = /^([a-z]+)([\d.,]+)$/u.exec(textAt(cursor));
  const value = touching === null ? null : numberOf(touching[2] ?? '');
  const scale = SCALES.get(touching?.[1] ?? '');
  if (value !== null && scale !== undefined) return hardness(scale, value, 1);
  const named = SCALES.get(textAt(cursor));
  if (named === undefined || isAfterComma(cursor, 1)) return null;
  const range = rangeAt(cursor, named, 1);
  if (range !== null) return range;
  const after = quantityOf(moved(cursor, 1), named === 'HB' ? 'hb' : 'hrc');
  return after === null || after.sign !== '' ? null : hardness(named, after.value, after.used + 1);
};

/** `HB 210`, `hb210`, `28 HRC`. */
export const readHardness: Reader<HardnessWords> = (cursor) => {
  const first = scaleFirst(cursor) ?? rangeAt(cursor, null, 0);
  if (first !== null) return first;
  const quantity = quantityAt(cursor);
  const measure = quantity?.unit?.measure;
  if (quantity === null || (measure !== 'hb' && measure !== 'hrc')) return null;
  return hardness(measure === 'hb' ? 'HB' : 'HRC', quantity.value, quantity.used);
};
