import { M_PER_FOOT, MM_PER_INCH } from '../calc/units.ts';

/** What a unit measures, and its size in the program's own unit of that kind. */
export type Measure =
  | 'length'
  | 'speed'
  | 'rotation'
  | 'feed'
  | 'angle'
  | 'share'
  | 'tpi'
  | 'dp'
  | 'module'
  | 'hb'
  | 'hrc'
  | 'teeth'
  | 'turns'
  | 'pieces';
export type Unit = { readonly measure: Measure; readonly factor: number };

const INCH: Unit = { measure: 'length', factor: MM_PER_INCH };
const THOU: Unit = { measure: 'length', factor: MM_PER_INCH / 1000 };
const MILLIMETRE: Unit = { measure: 'length', factor: 1 };
const MICRON: Unit = { measure: 'length', factor: 0.001 };
const FEET_PER_MINUTE: Unit = { measure: 'speed', factor: M_PER_FOOT };
const METRES_PER_MINUTE: Unit = { measure: 'speed', factor: 1 };
const ROTATION: Unit = { measure: 'rotation', factor: 1 };
const INCH_PER_REV: Unit = { measure: 'feed', factor: MM_PER_INCH };
const DEGREE: Unit = { measure: 'angle', factor: Math.PI / 180 };
const one = (measure: Measure): Unit => ({ measure, factor: 1 });

/** Every spelling of a unit that a shop types. */
export const UNIT_WORDS: ReadonlyMap<string, Unit> = new Map([
  ...['in', 'inch', 'inches', '"', "''", 'ins'].map((word) => [word, INCH] as const),
  ...['thou', 'thous'].map((word) => [word, THOU] as const),
  ...['mm', 'millimeter', 'millimeters', 'millimetre', 'millimetres'].map(
    (word) => [word, MILLIMETRE] as const,
  ),
  ['cm', { measure: 'length', factor: 10 }],
  ...['um', 'micron', 'microns'].map((word) => [word, MICRON] as const),
  ...['sfm', 'sfpm', 'fpm', 'ft/min', 'feet/min'].map((word) => [word, FEET_PER_MINUTE] as const),
  ...['m/min', 'mpm'].map((word) => [word, METRES_PER_MINUTE] as const),
  ...['rpm', 'rev/min', 'revs/min', 'r/min'].map((word) => [word, ROTATION] as const),
  ...['in/rev', 'ipr', '"/rev', 'inch/rev'].map((word) => [word, INCH_PER_REV] as const),
  ['thou/rev', { measure: 'feed', factor: MM_PER_INCH / 1000 }],
  ['mm/rev', { measure: 'feed', factor: 1 }],
  ...['deg', 'degs', 'degree', 'degrees', '°'].map((word) => [word, DEGREE] as const),
  ...['%', 'percent'].map((word) => [word, { measure: 'share', factor: 0.01 }] as const),
  ['tpi', one('tpi')],
  ['dp', one('dp')],
  ...['mod', 'module'].map((word) => [word, one('module')] as const),
  ...['hb', 'bhn', 'brinell'].map((word) => [word, one('hb')] as const),
  ...['hrc', 'rc'].map((word) => [word, one('hrc')] as const),
  ...['teeth', 'tooth'].map((word) => [word, one('teeth')] as const),
  ...['turns', 'turn', 'revs'].map((word) => [word, one('turns')] as const),
  ...['pcs', 'pieces', 'parts', 'off'].map((word) => [word, one('pieces')] as const),
]);

export const unitOf = (word: string): Unit | null => UNIT_WORDS.get(word) ?? null;
