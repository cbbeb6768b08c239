import { LARGEST_DIAMETER } from '../../src/calc/index.ts';
import { said } from '../../src/desk/index.ts';
import {
  type Cursor,
  countOf,
  lengthOf,
  moved,
  numberOfKind,
  quantityAt,
  type Reader,
  smallLengthOf,
  tokenAt,
  took,
} from '../../src/words/index.ts';

const DIAMETERS = [1, LARGEST_DIAMETER] as const;
const USUAL_DIAMETERS = { in: [0.06, 8], mm: [2, 200] } as const;
/** Most teeth that anyone counts round a part. */
const COUNTS = [3, 9999] as const;
const readDiameter = lengthOf('diameter', DIAMETERS, USUAL_DIAMETERS);
const readCount = countOf('count', COUNTS, 'teeth');

/** Odd gap between the last mark and the first, as a share of a pitch. */
export const seam = said<number>({
  name: 'seam',
  read: numberOfKind('seam', [0, 1], null, '1'),
  keywords: ['seam', 'gap'],
  examples: ['seam 0.3'],
});

export const count = said<number>({
  name: 'count',
  read: readCount,
  keywords: ['count', 'counted'],
  postfix: true,
  examples: ['count 66'],
});

export const scrap = said<true>({
  name: 'scrap',
  read: () => null,
  values: [
    ['scrap', true],
    ['on scrap', true],
  ],
  closed: true,
  examples: ['scrap'],
});

export const crest = said<number>({
  name: 'crest',
  read: lengthOf('crestDiameter', DIAMETERS, USUAL_DIAMETERS),
  keywords: ['crest', 'crests', 'over crests', 'crest diameter', 'measures', 'measure'],
  postfix: true,
  examples: ['crest 1.0040'],
});

export const height = said<number>({
  name: 'height',
  read: smallLengthOf('toothHeight', [0, 5]),
  keywords: ['height', 'tooth height'],
  examples: ['height 0.021'],
});

export const flat = said<number>({
  name: 'flat',
  read: smallLengthOf('flat', [0, 3.2]),
  keywords: ['flat', 'crest flat'],
  examples: ['flat 0.005'],
});

/** Flats at two places along the knurl, the one near the chuck first. */
export type FlatsWords = { readonly near: number; readonly far: number; readonly distance: number };

const LINKS = new Set(['and', 'to', 'over', 'apart', 'at', 'on', 'in']);

/** Past the words that may stand between two numbers. */
const linked = (cursor: Cursor): { readonly cursor: Cursor; readonly used: number } => {
  const word = tokenAt(cursor)?.text ?? '';
  return LINKS.has(word) ? { cursor: moved(cursor, 1), used: 1 } : { cursor, used: 0 };
};

const readFlat = smallLengthOf('flat', [0, 3.2]);
const readDistance = lengthOf('length', [0.2, 2000], { in: [0.02, 12], mm: [0.8, 300] });

const readFlats: Reader<FlatsWords> = (cursor, names) => {
  const near = readFlat(cursor, names);
  if (near === null || 'refusal' in near) return near;
  const second = linked(moved(cursor, near.used));
  const far = readFlat(second.cursor, names);
  if (far === null || 'refusal' in far) return far;
  const third = linked(moved(second.cursor, far.used));
  const distance = readDistance(third.cursor, names);
  if (distance === null || 'refusal' in distance) return distance;
  const used = near.used + second.used + far.used + third.used + distance.used;
  return took({ near: near.value, far: far.value, distance: distance.value }, used);
};

export const flats = said<FlatsWords>({
  name: 'flats',
  read: readFlats,
  keywords: ['flats'],
  examples: ['flats 0.004 and 0.008 over 1.0'],
});

/** A diameter and the count that tracked on it: the wheel's own pitch. */
export type ProvenWords = { readonly teeth: number; readonly diameter: number };

const countFirst: Reader<ProvenWords> = (cursor, names) => {
  const teeth = readCount(cursor, names);
  if (teeth === null || 'refusal' in teeth) return teeth;
  const rest = linked(moved(cursor, teeth.used));
  const diameter = readDiameter(rest.cursor, names);
  if (diameter === null || 'refusal' in diameter) return diameter;
  const used = teeth.used + rest.used + diameter.used;
  return took({ teeth: teeth.value, diameter: diameter.value }, used);
};

const diameterFirst: Reader<ProvenWords> = (cursor, names) => {
  const diameter = readDiameter(cursor, names);
  if (diameter === null || 'refusal' in diameter) return diameter;
  const rest = linked(moved(cursor, diameter.used));
  const teeth = readCount(rest.cursor, names);
  if (teeth === null || 'refusal' in teeth) return teeth;
  const used = diameter.used + rest.used + teeth.used;
  return took({ teeth: teeth.value, diameter: diameter.value }, used);
};

/** `proven 65 at 0.9852` or `proven 0.9852 65`: whichever number is whole and alone is the count. */
const readProven: Reader<ProvenWords> = (cursor, names) => {
  const first = quantityAt(cursor);
  if (first === null) return null;
  const isCount =
    first.unit?.measure === 'teeth' ||
    (first.unit === null && Number.isInteger(first.value) && first.value >= COUNTS[0]);
  return isCount ? countFirst(cursor, names) : diameterFirst(cursor, names);
};

export const proven = said<ProvenWords>({
  name: 'proven',
  read: readProven,
  keywords: ['proven', 'proved'],
  examples: ['proven 65 at 0.9852'],
});
