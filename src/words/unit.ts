import { M_PER_FOOT, MM_PER_INCH } from '../calc/units.ts';
import type { Span } from './tokens.ts';

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
export type Unit = {
  readonly measure: Measure;
  readonly factor: number;
  /** Words that one shop means one unit by and the next another: which one is asked. */
  readonly either?: readonly string[];
};

/** A number as typed, with its unit where it has one. */
export type Quantity = {
  readonly value: number;
  readonly sign: '' | '+' | '-' | '±';
  readonly unit: Unit | null;
  readonly used: number;
  /** The unit is a word of its own: `1.0 in`. */
  readonly unitApart: boolean;
  /** Two words make the number: `1 1/4`. */
  readonly mixed: boolean;
  /** What the number is if its comma or point parts thousands. */
  readonly thousands: number | null;
  /** Place of the number without its unit: where a unit would be added. */
  readonly number: Span;
};

const MM_PER_FOOT = 12 * MM_PER_INCH;
const INCH: Unit = { measure: 'length', factor: MM_PER_INCH };
const THOU: Unit = { measure: 'length', factor: MM_PER_INCH / 1000 };
const MILLIMETRE: Unit = { measure: 'length', factor: 1 };
const MICRON: Unit = { measure: 'length', factor: 0.001 };
const METRE: Unit = { measure: 'length', factor: 1000 };
const FOOT: Unit = { measure: 'length', factor: MM_PER_FOOT };
const FEET_PER_MINUTE: Unit = { measure: 'speed', factor: M_PER_FOOT };
const METRES_PER_MINUTE: Unit = { measure: 'speed', factor: 1 };
const ROTATION: Unit = { measure: 'rotation', factor: 1 };
const INCH_PER_REV: Unit = { measure: 'feed', factor: MM_PER_INCH };
const MM_PER_REV: Unit = { measure: 'feed', factor: 1 };
const DEGREE: Unit = { measure: 'angle', factor: Math.PI / 180 };
const PER_CENT: Unit = { measure: 'share', factor: 0.01 };
const one = (measure: Measure): Unit => ({ measure, factor: 1 });
const eitherOf = (...either: readonly string[]): Unit => ({
  measure: 'length',
  factor: Number.NaN,
  either,
});

/** Every spelling of a unit that a shop types; several words where it takes several. */
const SPELLINGS: readonly (readonly [spellings: string, unit: Unit])[] = [
  [`in|inch|inches|ins|"|''`, INCH],
  ['thou|thous|thousandth|thousandths', THOU],
  ['mm|millimeter|millimeters|millimetre|millimetres|㎜', MILLIMETRE],
  ['cm|centimeter|centimeters|centimetre|centimetres', { measure: 'length', factor: 10 }],
  ['um|micron|microns|micrometre|micrometer', MICRON],
  ['m|metre|metres|meter|meters', METRE],
  ['ft|feet|foot', FOOT],
  // A mil is a thou in one country and a millimetre in the next; one prime is feet, or half of two.
  ['mil|mils', eitherOf('mm', 'thou')],
  [`'`, eitherOf('in', 'ft')],
  ['sfm|sfpm|fpm|ft/min|feet/min|feet per minute|ft per min|ft per minute', FEET_PER_MINUTE],
  ['surface feet|surface feet per minute', FEET_PER_MINUTE],
  ['m/min|mpm|metres/min|meters/min|metres per minute|meters per minute', METRES_PER_MINUTE],
  ['rpm|rev/min|revs/min|r/min|rev per min|revs per min|revs per minute', ROTATION],
  ['revolutions per minute', ROTATION],
  ['in/rev|ipr|"/rev|inch/rev|inches/rev|in per rev|inch per rev', INCH_PER_REV],
  ['thou/rev|thou per rev', { measure: 'feed', factor: MM_PER_INCH / 1000 }],
  ['mm/rev|mm per rev|mm/r', MM_PER_REV],
  ['deg|degs|degree|degrees|°', DEGREE],
  ['%|percent|per cent|pct', PER_CENT],
  ['tpi|teeth per inch|teeth per in|teeth/inch|teeth/in|teeth an inch', one('tpi')],
  ['dp|diametral pitch', one('dp')],
  ['mod|module', one('module')],
  ['hb|hbw|bhn|brinell', one('hb')],
  ['hrc|rc|rockwell c', one('hrc')],
  ['teeth|tooth', one('teeth')],
  ['turns|turn|revs|rev|revolutions', one('turns')],
  ['pcs|pc|pieces|parts|off|ea', one('pieces')],
];

const EACH: readonly (readonly [string, Unit])[] = SPELLINGS.flatMap(([spellings, unit]) =>
  spellings.split('|').map((spelling) => [spelling, unit] as const),
);

export const UNIT_WORDS: ReadonlyMap<string, Unit> = new Map(EACH);

/** The spellings of several words, by their first one, the longest first. */
export const UNIT_PHRASES: ReadonlyMap<string, readonly (readonly [readonly string[], Unit])[]> =
  EACH.filter(([spelling]) => spelling.includes(' '))
    .map(([spelling, unit]) => [spelling.split(' '), unit] as const)
    .sort((a, b) => b[0].length - a[0].length)
    .reduce(
      (map, entry) => map.set(entry[0][0] ?? '', [...(map.get(entry[0][0] ?? '') ?? []), entry]),
      new Map<string, readonly (readonly [readonly string[], Unit])[]>(),
    );

/** A lone `m` announces a module; as metres it touches its number. */
export const ONLY_TOUCHING = 'm';

const DOTTED = /^[a-z](?:\.[a-z])+$/u;

/** The unit of one word: `mm`, `t.p.i`. */
export const unitOf = (word: string): Unit | null =>
  UNIT_WORDS.get(word) ??
  (DOTTED.test(word) ? (UNIT_WORDS.get(word.replaceAll('.', '')) ?? null) : null);
