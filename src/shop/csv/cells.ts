import type { Pitch, PitchSystem, Steps } from '../../calc/index.ts';
import type { CellFault } from '../../card/index.ts';
import type { ShopWords } from '../view.ts';

type Fault = {
  [K in CellFault['why']]: Omit<Extract<CellFault, { why: K }>, 'column' | 'cell'>;
}[CellFault['why']];
export type Cell<T> = { readonly value: T } | { readonly fault: Fault };

/** What a cell is read against: how people write numbers and units, and what bare ones are in. */
export type CellContext = {
  readonly words: ShopWords;
  readonly units: 'in' | 'mm';
  /** The unit the column's heading names, or null. */
  readonly headed: string | null;
};

export type ReadCell<T> = (text: string, context: CellContext) => Cell<T>;

const took = <T>(value: T): Cell<T> => ({ value });
const wrong = (fault: Fault): { readonly fault: Fault } => ({ fault });

/** A number with a point, as programs write it. A formula is no number, whatever it would give. */
const PLAIN_NUMBER = /^[-+]?\d+(?:\.\d+)?(?:e[-+]?\d+)?$/u;
const NUMBER_AND_UNIT =
  /^(?<number>[-+]?\d+(?:\.\d+)?e[-+]?\d+|[-+]?[\d.,/½¼¾⅓⅔⅕⅛⅜⅝⅞-]*[\d.½¼¾⅓⅔⅕⅛⅜⅝⅞])\s*(?<unit>[^\d\s].*)?$/u;

export type Measured = { readonly measure: string; readonly factor: number };

/** Units of power, which nobody types in a request. Source: mechanical horsepower, 550 ft·lbf/s. */
const POWER_UNITS: Readonly<Record<string, Measured>> = {
  w: { measure: 'power', factor: 1 },
  kw: { measure: 'power', factor: 1000 },
  hp: { measure: 'power', factor: 745.6998715822702 },
};

const unitNamed = (word: string, { words }: CellContext): Measured | null => {
  const plain = words.plainText(word.trim());
  return POWER_UNITS[plain] ?? words.unitOf(plain);
};

type Spoken = { readonly value: number; readonly unit: string | null };

const spoken = (text: string, { words }: CellContext): Spoken | null => {
  const parts = NUMBER_AND_UNIT.exec(words.plainText(text.trim()))?.groups;
  const number = parts?.['number'] ?? '';
  const value = PLAIN_NUMBER.test(number) ? Number(number) : words.numberOf(number);
  return value === null ? null : { value, unit: parts?.['unit']?.trim() ?? null };
};

/** What a bare number is in, where neither the cell nor its heading says. */
type Usual = (units: 'in' | 'mm') => string;

/** A number with a unit of one kind, in the program's own unit of that kind. */
export const quantity =
  <T extends number>(
    measure: string,
    branded: (value: number) => T,
    usual: Usual,
    examples: readonly string[],
  ): ReadCell<T> =>
  (text, context) => {
    const said = spoken(text, context);
    if (said === null) return wrong({ why: 'unreadable', examples });
    const unit = unitNamed(said.unit ?? context.headed ?? usual(context.units), context);
    if (unit?.measure !== measure) return wrong({ why: 'wrongUnit', wanted: examples });
    return took(branded(said.value * unit.factor));
  };

/** A whole number, written with digits alone: 1,000 could be one or a thousand. */
export const count =
  (examples: readonly string[]): ReadCell<number> =>
  (text) =>
    /^\d{1,9}$/u.test(text.trim()) ? took(Number(text)) : wrong({ why: 'unreadable', examples });

export const plain: ReadCell<string> = (text) => took(text);

/** One of a few words; capitals, spaces and hyphens do not count. */
export const choice = <T>(choices: Readonly<Record<string, T>>): ReadCell<T> => {
  const folded = (text: string): string => text.toLowerCase().replaceAll(/[\s_-]/gu, '');
  const known = new Map(Object.entries(choices).map(([word, value]) => [folded(word), value]));
  return (text) => {
    const value = known.get(folded(text));
    return value === undefined
      ? wrong({ why: 'notOneOf', choices: [...new Set(Object.keys(choices))] })
      : took(value);
  };
};

/** `60 90 140`, `60, 90, 140 rpm`; null where a single comma may be a point or a gap. */
const listed = (body: string): readonly string[] | null => {
  const apart = body.split(/[;|\s]+|,\s+/u).map((word) => word.replace(/,$/u, ''));
  if (apart.length > 1) return apart.filter((word) => word !== '');
  const commas = body.split(',');
  return commas.length === 2 ? null : commas;
};

const RANGE = /^(?<from>[\d.,]+)\s*(?:-|to|\.\.\.?|…)\s*(?<to>[\d.,]+)$/u;
const BODY_AND_UNIT = /^(?<body>.*\d)\s*(?<unit>[a-z"'][a-z"'/]*)?$/u;

/** What a gearbox can be set to: `60 90 140`, or `40 to 2000` for anything between. */
export const steps =
  <T extends number>(
    measure: string,
    branded: (value: number) => T,
    usual: Usual,
    examples: readonly string[],
  ): ReadCell<Steps<T>> =>
  (text, context) => {
    const parts = BODY_AND_UNIT.exec(context.words.plainText(text.trim()))?.groups;
    const body = parts?.['body']?.trim() ?? '';
    const range = RANGE.exec(body)?.groups;
    const words = range === undefined ? listed(body) : [range['from'] ?? '', range['to'] ?? ''];
    if (words === null) return wrong({ why: 'unclear', readings: commaReadings(body) });
    const one = quantity(measure, branded, usual, examples);
    const headed = parts?.['unit'] ?? context.headed;
    const values: T[] = [];
    for (const word of words) {
      const read = one(word, { ...context, headed });
      if ('fault' in read) return read;
      values.push(read.value);
    }
    const [slowest, fastest] = values;
    if (range === undefined || slowest === undefined || fastest === undefined) {
      return took({ list: values });
    }
    return took({ slowest, fastest });
  };

const commaReadings = (body: string): readonly string[] => [
  body.replace(',', '.'),
  body.replace(',', ' '),
];

/** A label: a number with its system. A bare number could be any of four. */
export const pitch =
  (examples: readonly string[]): ReadCell<Pitch> =>
  (text, context) => {
    const module = /^m\s*(?<number>[\d.,]+)$/u.exec(context.words.plainText(text.trim()));
    const said = spoken(
      module === null ? text : `${module.groups?.['number'] ?? ''} module`,
      context,
    );
    if (said === null) return wrong({ why: 'unreadable', examples });
    const word = said.unit ?? context.headed;
    if (word === null) {
      const readings = ['tpi', 'dp', 'mm', 'module'].map((unit) => `${said.value} ${unit}`);
      return wrong({ why: 'unclear', readings });
    }
    const unit = unitNamed(word, context);
    const system = unit === null ? undefined : SYSTEMS[unit.measure];
    if (unit === null || system === undefined) return wrong({ why: 'wrongUnit', wanted: examples });
    return took({ system, value: said.value * unit.factor });
  };

/** A length as a label is the pitch itself. */
const SYSTEMS: Readonly<Record<string, PitchSystem>> = {
  tpi: 'tpi',
  dp: 'dp',
  module: 'module',
  length: 'metric',
};
