import { MM_PER_INCH } from '../calc/units.ts';
import { type Cursor, plainOf, tokenAt } from './cursor.ts';
import { factorOf } from './length.ts';
import { NUMBER, numberOf } from './numbers.ts';
import type { Span } from './tokens.ts';
import { UNIT_WORDS, unitOf } from './unit.ts';

/** The print's limits, or a nominal size whose tolerance was not said. */
export type Limits = {
  readonly low: number;
  readonly high: number;
  /** Only one size was said. */
  readonly nominalOnly: boolean;
};

/** Units of a size or of a tolerance; those that mean two things are not taken here. */
const UNITS = [...UNIT_WORDS]
  .filter(
    ([word, unit]) => unit.measure === 'length' && unit.either === undefined && word.length > 1,
  )
  .map(([word]) => word)
  .sort((a, b) => b.length - a.length)
  .join('|');
/**
 * A size: its number and its unit, each in a group of this name. The number is looked at first and
 * then taken whole, so that 7/8 is never a 7 with something behind it.
 */
const size = (name: string): string =>
  String.raw`(?=(?<${name}>\d{1,2}\s(?:\d+/\d+|[½¼¾⅛⅜⅝⅞])|${NUMBER}))\k<${name}>(?:\s?(?<${name}Unit>(?:${UNITS})(?!\p{L})|"))?`;
const BOTH = String.raw`\s*(?:±|\+\s?/\s?-|\+-|-/\+)\s*`;
const SIGN = String.raw`[+-]`;
const TO = String.raw`\s*(?:-|to|and|\.{2,}|…|/)\s*`;

const shape = (source: string): RegExp => new RegExp(source, 'uy');
/** `25 ±0.1`, `1.000 +/-.005` */
const PLUS_MINUS = shape(`${size('nominal')}${BOTH}${size('tolerance')}`);
/** `1.000 +0 -0.010`, `1.000 +.000/-.010`, `1.000 (+0, -.010)` */
const TWO_SIGNS = shape(
  String.raw`${size('nominal')}\s*\(?\s*(?<sign>${SIGN})\s*${size('tolerance')}\s*[/,]?\s*(?<otherSign>${SIGN})\s*${size('other')}`,
);
/** `1.000 -.010`, `1.000 +.005` */
const ONE_SIGN = shape(String.raw`${size('nominal')}\s*(?<sign>${SIGN})\s*${size('tolerance')}`);
/** `0.995-1.005`, `0.995 to 1.005 in` */
const RANGE = shape(`${size('nominal')}${TO}${size('to')}`);
const NOMINAL = shape(size('nominal'));

export type Groups = Readonly<Record<string, string | undefined>>;
type Found = {
  readonly groups: Groups;
  readonly span: Span;
  readonly used: number;
};

/** A shape that begins here and ends where a word ends. */
const match = (cursor: Cursor, wanted: RegExp): Found | null => {
  const start = tokenAt(cursor)?.start;
  if (start === undefined) return null;
  wanted.lastIndex = start;
  const found = wanted.exec(plainOf(cursor));
  if (found === null) return null;
  const end = start + found[0].length;
  let used = 0;
  while ((tokenAt(cursor, used)?.start ?? end) < end) used += 1;
  if ((tokenAt(cursor, used - 1)?.end ?? 0) !== end) return null;
  return { groups: found.groups ?? {}, span: { start, end }, used };
};

const valueOf = (text: string | undefined): number | null =>
  text === undefined ? null : numberOf(text.replace(/\s(?=\d+\/)/u, '-').replaceAll(/\s/gu, ''));

/** A full-size unit speaks for everything that has none; a thou or a micron for tolerances only. */
const SMALL: ReadonlySet<number> = new Set([MM_PER_INCH / 1000, 0.001]);

type Scale = {
  readonly size: number;
  readonly tolerance: number;
  /** The unit that speaks for the size, as typed; empty where none does. */
  readonly unit: string;
};

const scaleOf = (cursor: Cursor, groups: Groups): Scale => {
  const all = ['nominal', 'to', 'tolerance', 'other'].map((name) => groups[`${name}Unit`] ?? '');
  const factor = (unit: string): number | null => unitOf(unit)?.factor ?? null;
  const isSmall = (unit: string): boolean => SMALL.has(factor(unit) ?? 0);
  const [nominal = '', to = ''] = all;
  const unit = [nominal, to, all.find((each) => each !== '' && !isSmall(each))].find(Boolean) ?? '';
  const size = factor(unit) ?? factorOf(cursor.units);
  return { size, tolerance: factor(all.find(isSmall) ?? '') ?? size, unit };
};

/** Each of the sizes, its own unit going before what speaks for it. */
const inMm = (groups: Groups, name: string, factor: number): number | null => {
  const value = valueOf(groups[name]);
  return value === null ? null : value * (unitOf(groups[`${name}Unit`] ?? '')?.factor ?? factor);
};

/** A lone minus makes limits of two sizes alike, and a tolerance of a small one: `1.000-.010`. */
const ALIKE = 0.5;

type Offsets = readonly number[];

const between = (low: number, high: number, nominalOnly = false): Limits => ({
  low,
  high,
  nominalOnly,
});

const spread = (nominal: number, offsets: Offsets): Limits =>
  between(nominal + Math.min(...offsets), nominal + Math.max(...offsets));

const signedBy = (sign: string | undefined, amount: number): number =>
  sign === '-' ? -amount : amount;

/** What one of the shapes says, or null where it does not say limits. */
const say = (cursor: Cursor, { groups }: Found): Limits | null => {
  const scale = scaleOf(cursor, groups);
  const nominal = inMm(groups, 'nominal', scale.size);
  const to = inMm(groups, 'to', scale.size);
  const tolerance = inMm(groups, 'tolerance', scale.tolerance);
  const other = inMm(groups, 'other', scale.tolerance);
  if (nominal === null) return null;
  if (to !== null) return to < nominal * ALIKE ? null : between(nominal, to);
  if (tolerance === null) return between(nominal, nominal, true);
  if (other !== null)
    return spread(nominal, [
      signedBy(groups['sign'], tolerance),
      signedBy(groups['otherSign'], other),
    ]);
  if (groups['sign'] === undefined) return spread(nominal, [-tolerance, tolerance]);
  return tolerance > nominal * ALIKE
    ? null
    : spread(nominal, [0, signedBy(groups['sign'], tolerance)]);
};

const SHAPES = [PLUS_MINUS, TWO_SIGNS, RANGE, ONE_SIGN, NOMINAL] as const;

export type Said = Found & {
  readonly limits: Limits;
  /** The unit that speaks for the size, as typed; empty where none does. */
  readonly unit: string;
};

/** The first shape that stands here and says limits. */
export const limitsAt = (cursor: Cursor): Said | null => {
  for (const wanted of SHAPES) {
    const found = match(cursor, wanted);
    const limits = found === null ? null : say(cursor, found);
    if (found !== null && limits !== null)
      return { ...found, limits, unit: scaleOf(cursor, found.groups).unit };
  }
  return null;
};
