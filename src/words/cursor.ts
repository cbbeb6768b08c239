import { isFractionUnderOne, isWhole, NUMBER, numberOf } from './numbers.ts';
import type { Span, Token } from './tokens.ts';
import { type Unit, unitOf } from './unit.ts';

export type ShopUnits = 'in' | 'mm';

/** A place in the line being read. Reading never moves it: every reader says where it stopped. */
export type Cursor = {
  readonly text: string;
  readonly tokens: readonly Token[];
  readonly at: number;
  readonly units: ShopUnits;
};

export const tokenAt = (cursor: Cursor, ahead = 0): Token | undefined =>
  cursor.tokens[cursor.at + ahead];
export const moved = (cursor: Cursor, by: number): Cursor => ({ ...cursor, at: cursor.at + by });

/** From the first to the last of a number of tokens. */
export const spanOf = (cursor: Cursor, used: number): Span => {
  const first = tokenAt(cursor);
  const last = tokenAt(cursor, Math.max(0, used - 1));
  const end = cursor.text.length;
  return { start: first?.start ?? end, end: last?.end ?? end };
};

/** A number as typed, with its unit where it has one. */
export type Quantity = {
  readonly value: number;
  readonly sign: '' | '+' | '-' | '±';
  readonly unit: Unit | null;
  readonly used: number;
  /** The unit is a word of its own: `1.0 in`. */
  readonly unitApart: boolean;
  /** A number stands behind that word, so that it may belong to it: `feed 0.012 turns 18`. */
  readonly numberFollows: boolean;
  /** Place of the number without its unit: where a unit would be added. */
  readonly number: Span;
};

const SIGNED = new RegExp(`^(\\+/-|\\+-|[+\\-±])?(${NUMBER})(.*)$`, 'u');

const signOf = (text: string | undefined): Quantity['sign'] => {
  if (text === undefined) return '';
  return text === '+' || text === '-' ? text : '±';
};

type Head = { readonly sign: Quantity['sign']; readonly value: number; readonly rest: string };

const headOf = (text: string): Head | null => {
  const match = SIGNED.exec(text);
  if (match === null) return null;
  const value = numberOf(match[2] ?? '');
  return value === null ? null : { sign: signOf(match[1]), value, rest: match[3] ?? '' };
};

const withUnit = (cursor: Cursor, head: Head, used: number, start: number): Quantity | null => {
  const last = cursor.tokens[cursor.at + used - 1];
  if (last === undefined) return null;
  const number = { start, end: last.end - head.rest.length };
  const base = { value: head.value, sign: head.sign, number };
  if (head.rest !== '') {
    const unit = unitOf(head.rest);
    return unit === null ? null : { ...base, unit, used, unitApart: false, numberFollows: false };
  }
  const next = tokenAt(cursor, used);
  const unit = next === undefined ? null : unitOf(next.text);
  if (unit === null) return { ...base, unit, used, unitApart: false, numberFollows: false };
  const behind = tokenAt(cursor, used + 1);
  const numberFollows = behind !== undefined && headOf(behind.text) !== null;
  return { ...base, unit, used: used + 1, unitApart: true, numberFollows };
};

/** The quantity that starts here: `1.0`, `1.0in`, `1.0 in`, `1 1/4"`, `-0.010`. */
export const quantityAt = (cursor: Cursor): Quantity | null => {
  const first = tokenAt(cursor);
  if (first === undefined) return null;
  const second = tokenAt(cursor, 1);
  if (isWhole(first.text) && second !== undefined) {
    const tail = headOf(second.text);
    const share = second.text.slice(0, second.text.length - (tail?.rest.length ?? 0));
    if (tail !== null && isFractionUnderOne(share))
      return withUnit(cursor, { ...tail, value: Number(first.text) + tail.value }, 2, first.start);
  }
  const head = headOf(first.text);
  return head === null ? null : withUnit(cursor, head, 1, first.start);
};

/**
 * The quantity as one of a measure: its own unit or none. The `in` of `turns 18 in brass` is a
 * word, not a unit, where an inch makes no sense, and the `turns` of `feed 0.012 turns 18` belongs
 * to the number behind it; any other unit means something else was meant.
 */
export const ofMeasure = (quantity: Quantity, measure: Unit['measure'] | null): Quantity | null => {
  const { unit } = quantity;
  if (unit === null || unit.measure === measure) return quantity;
  const isWord = quantity.unitApart && (unit.measure === 'length' || quantity.numberFollows);
  return isWord ? withoutUnit(quantity) : null;
};

/** The number alone, its unit word left for what follows. */
export const withoutUnit = (quantity: Quantity): Quantity => ({
  ...quantity,
  unit: null,
  used: quantity.used - (quantity.unitApart ? 1 : 0),
  unitApart: false,
  numberFollows: false,
});

/** How many tokens a phrase takes here, 0 where it does not stand here. */
export const phraseAt = (cursor: Cursor, phrase: readonly string[]): number =>
  phrase.every((word, index) => tokenAt(cursor, index)?.text === word) ? phrase.length : 0;

/** The longest of many phrases that stands here. */
export const longestAt = <T>(
  cursor: Cursor,
  phrases: readonly (readonly [phrase: readonly string[], value: T])[],
): { readonly value: T; readonly used: number } | null => {
  let best: { value: T; used: number } | null = null;
  for (const [phrase, value] of phrases) {
    const used = phraseAt(cursor, phrase);
    if (used > (best?.used ?? 0)) best = { value, used };
  }
  return best;
};

export const phraseOf = (text: string): readonly string[] => text.split(' ');
