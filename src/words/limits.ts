import { MM_PER_INCH } from '../calc/units.ts';
import type { Refusal } from '../refusal.ts';
import { type Cursor, plainOf, tokenAt } from './cursor.ts';
import { partOf, readAs } from './edit.ts';
import { type BareRange, factorOf } from './length.ts';
import { NUMBER, numberOf } from './numbers.ts';
import { ask, isIn, outOfRange, placeOf, type Range } from './range.ts';
import { type Reader, type Reading, refused, took } from './reading.ts';
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
const TO = String.raw`\s*(?:-|to|\.{2,}|…|/)\s*`;

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

type Groups = Readonly<Record<string, string | undefined>>;
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
const SMALL = new Set([MM_PER_INCH / 1000, 0.001]);

type Scale = { readonly size: number; readonly tolerance: number; readonly bare: boolean };

const scaleOf = (cursor: Cursor, groups: Groups): Scale => {
  const factor = (name: string): number | null =>
    unitOf(groups[`${name}Unit`] ?? '')?.factor ?? null;
  const all = ['nominal', 'to', 'tolerance', 'other'].map(factor).filter((each) => each !== null);
  const small = all.find((each) => SMALL.has(each)) ?? null;
  const full = factor('nominal') ?? factor('to') ?? all.find((each) => !SMALL.has(each)) ?? null;
  const own = full ?? factorOf(cursor.units);
  return { size: own, tolerance: small ?? own, bare: full === null };
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

type Said = Found & { readonly limits: Limits; readonly bare: boolean };

/** The first shape that stands here and says limits. */
const limitsAt = (cursor: Cursor): Said | null => {
  for (const wanted of SHAPES) {
    const found = match(cursor, wanted);
    const limits = found === null ? null : say(cursor, found);
    if (found !== null && limits !== null)
      return { ...found, limits, bare: scaleOf(cursor, found.groups).bare };
  }
  return null;
};

const reversed = (cursor: Cursor, what: string, { groups, span, bare }: Said): Refusal => {
  const usual = bare ? cursor.units : '';
  const typed = (name: string): string =>
    `${groups[name] ?? ''} ${groups[`${name}Unit`] ?? usual}`.trim();
  const sorted = `${typed('to')} to ${typed('nominal')}`;
  return {
    code: 'unclear',
    what,
    because: 'limitsReversed',
    readings: [readAs(cursor.text, span, sorted)],
    ...placeOf(cursor, span),
  };
};

/** Sizes without a unit that are no likely ones in the shop's: asked. */
const unlikely = (
  cursor: Cursor,
  what: string,
  { limits, span }: Said,
  range: Range,
): Reading<Limits> => {
  const own = factorOf(cursor.units);
  const fit = (['mm', 'in'] as const).filter((unit) =>
    [limits.low, limits.high].every((value) => isIn((value / own) * factorOf(unit), range)),
  );
  if (fit.length === 0) return refused(outOfRange(what, limits.low, range, 'mm'));
  const typed = partOf(cursor.text, span);
  return ask(
    cursor,
    what,
    'noUnit',
    span,
    fit.map((unit) => `${typed} ${unit}`),
  );
};

/** `0.995-1.005`, `0.995 to 1.005 in`, `1.000 +0 -0.010`, `25 ±0.1`, or one nominal size. */
export const limitsOf =
  (what: string, range: Range, bare: BareRange): Reader<Limits> =>
  (cursor) => {
    const said = limitsAt(cursor);
    if (said === null) return null;
    const { low, high } = said.limits;
    const [least, most] = bare[cursor.units].map((each) => each * factorOf(cursor.units));
    if (said.bare && !(Math.min(low, high) >= (least ?? 0) && Math.max(low, high) <= (most ?? 0)))
      return unlikely(cursor, what, said, range);
    const outside = [low, high].find((value) => !isIn(value, range));
    if (outside !== undefined) return refused(outOfRange(what, outside, range, 'mm'));
    return low > high ? refused(reversed(cursor, what, said)) : took(said.limits, said.used);
  };

/** Two sizes that differ by more than this are hardly limits of one part. */
const WIDEST = 1.25;
/** Most numbers of a line have nothing of the kind near them. */
const MAY_FOLLOW = /^.{1,12}?(?:[±+…]|-[\s(.\d]|\.\.|to|\/[\s.\d+-])/u;
const LOOKS_LIKE_SIZES = /[.,½¼¾⅛⅜⅝⅞±]|\d\/\d|mm|in|"/u;

/**
 * Limits that nothing announces: of the finished part, or of the bar? The size alone is offered
 * as well.
 */
export const unannouncedLimits =
  (what: string, keyword: string): Reader<Limits> =>
  (cursor) => {
    const start = tokenAt(cursor)?.start ?? plainOf(cursor).length;
    if (!MAY_FOLLOW.test(plainOf(cursor).slice(start))) return null;
    const said = limitsAt(cursor);
    if (said === null || said.limits.nominalOnly) return null;
    const { limits, span, groups } = said;
    const typed = partOf(cursor.text, span);
    if (limits.high > limits.low * WIDEST || limits.low > limits.high * WIDEST) return null;
    if (!LOOKS_LIKE_SIZES.test(typed)) return null;
    const nominal = groups['to'] === undefined ? [nominalOf(cursor, groups, span)] : [];
    return ask(cursor, what, 'limitsOfWhat', span, [`${keyword} ${typed}`, ...nominal]);
  };

const nominalOf = (cursor: Cursor, groups: Groups, { start }: Span): string => {
  const unit = groups['nominalUnit'] ?? groups['toleranceUnit'] ?? '';
  const number = partOf(cursor.text, { start, end: start + (groups['nominal'] ?? '').length });
  return `${number} ${unit}`.trim();
};
