import {
  type Cursor,
  isAfterComma,
  moved,
  phraseAt,
  quantitiesOf,
  spanOf,
  textAt,
  tokenAt,
} from './cursor.ts';
import { isFractionUnderOne, isWhole, NUMBER, numberOf, thousandsOf } from './numbers.ts';
import type { Token } from './tokens.ts';
import {
  type Measure,
  ONLY_TOUCHING,
  type Quantity,
  UNIT_PHRASES,
  type Unit,
  unitOf,
} from './unit.ts';

const SIGNED = new RegExp(String.raw`^(\+/-|\+-|[+\-±])?(${NUMBER})(.*)$`, 'u');
const STARTS_A_NUMBER = /^[+\-±/]*[\d.,½⅓⅔¼¾⅕⅛⅜⅝⅞]/u;

const signOf = (text: string | undefined): Quantity['sign'] => {
  if (text === undefined) return '';
  return text === '+' || text === '-' ? text : '±';
};

export const signed = (quantity: Quantity): number =>
  quantity.sign === '-' ? -quantity.value : quantity.value;

type Head = Pick<Quantity, 'sign' | 'value' | 'thousands'> & { readonly rest: string };

const headOf = (text: string): Head | null => {
  if (!STARTS_A_NUMBER.test(text)) return null;
  const match = SIGNED.exec(text);
  const number = match?.[2] ?? '';
  const value = numberOf(number);
  if (match === null || value === null) return null;
  const rest = match[3] ?? '';
  return { sign: signOf(match[1]), value, thousands: thousandsOf(number), rest };
};

type Apart = { readonly unit: Unit; readonly used: number };

/** The unit that stands as words of its own behind the number. */
const unitApart = (cursor: Cursor, at: number): Apart | null => {
  const first = textAt(cursor, at);
  for (const [phrase, unit] of UNIT_PHRASES.get(first) ?? [])
    if (phraseAt(moved(cursor, at), phrase) > 0) return { unit, used: phrase.length };
  const unit = first === ONLY_TOUCHING ? null : unitOf(first);
  return unit === null ? null : { unit, used: 1 };
};

/** `21teeth per inch`: the unit begins in the number's own word. */
const goesOn = (cursor: Cursor, rest: string, at: number): Apart | null => {
  for (const [phrase, unit] of UNIT_PHRASES.get(rest) ?? []) {
    const tail = phrase.slice(1);
    if (phraseAt(moved(cursor, at), tail) > 0) return { unit, used: tail.length };
  }
  return null;
};

/** A unit that touches its number, perhaps by a dash: `21tpi`, `30-degree`. */
const unitTouching = (rest: string): Unit | null =>
  unitOf(rest) ?? (/^-\p{L}{2}/u.test(rest) ? unitOf(rest.slice(1)) : null);

/** The unit of a number, in its own word or behind it; null where letters there are none. */
const unitOfHead = (
  cursor: Cursor,
  rest: string,
  words: number,
  closed: boolean,
): Apart | { readonly unit: null; readonly used: 0 } | null => {
  if (rest === '') return (closed ? null : unitApart(cursor, words)) ?? { unit: null, used: 0 };
  const touching = unitTouching(rest);
  if (touching === null) return null;
  return (closed ? null : goesOn(cursor, rest, words)) ?? { unit: touching, used: 0 };
};

const withUnit = (cursor: Cursor, head: Head, words: number, first: Token): Quantity | null => {
  const last = words === 1 ? first : tokenAt(cursor, words - 1);
  if (last === undefined) return null;
  const found = unitOfHead(cursor, head.rest, words, last.closed === true);
  if (found === null) return null;
  return {
    value: head.value,
    sign: head.sign,
    unit: found.unit,
    used: words + found.used,
    unitApart: head.rest === '' && found.unit !== null,
    mixed: words > 1,
    thousands: head.thousands,
    number: { start: first.start, end: last.end - head.rest.length },
  };
};

const mixedAt = (cursor: Cursor, first: Token): Quantity | null => {
  const second = tokenAt(cursor, 1);
  if (second === undefined || first.closed || !isWhole(first.text)) return null;
  const tail = headOf(second.text);
  if (tail === null) return null;
  const share = second.text.slice(0, second.text.length - tail.rest.length);
  if (!isFractionUnderOne(share)) return null;
  return withUnit(cursor, { ...tail, value: Number(first.text) + tail.value }, 2, first);
};

const singleAt = (cursor: Cursor, first: Token): Quantity | null => {
  const head = headOf(first.text);
  return head === null ? null : withUnit(cursor, head, 1, first);
};

/** The quantity that starts here: `1.0`, `1.0in`, `1.0 in`, `1 1/4"`, `-0.010`. */
export const quantityAt = (cursor: Cursor): Quantity | null => {
  const quantities = quantitiesOf(cursor);
  const known = quantities[cursor.at];
  if (known !== undefined) return known;
  const first = tokenAt(cursor);
  if (first === undefined) return null;
  const found = mixedAt(cursor, first) ?? singleAt(cursor, first);
  quantities[cursor.at] = found;
  return found;
};

/** The same number without its unit, where the unit is a word of its own. */
const withoutUnit = (cursor: Cursor, quantity: Quantity): Quantity => {
  const used = quantity.mixed ? 2 : 1;
  return { ...quantity, unit: null, used, unitApart: false, number: spanOf(cursor, used) };
};

/** The unit's word may announce what follows instead: the `rpm` of `long 1.5 rpm 200`. */
const announces = (cursor: Cursor, { used }: Quantity): boolean =>
  !isAfterComma(cursor, used) && quantityAt(moved(cursor, used)) !== null;

/**
 * The quantity as one of a measure: its own unit or none. The `in` of `turns 18 in brass` is a
 * word, not a unit, where an inch makes no sense; any other unit means something else was meant.
 * Only lengths are said in mixed numbers: `tpi 21 3/4` is a pitch and a bar.
 */
export const quantityOf = (cursor: Cursor, measure: Measure | null): Quantity | null => {
  const found = quantityAt(cursor);
  const first = tokenAt(cursor);
  if (found === null || first === undefined) return null;
  const quantity = found.mixed && measure !== 'length' ? singleAt(cursor, first) : found;
  if (quantity === null || quantity.unit === null || quantity.unit.measure === measure)
    return quantity;
  if (!quantity.unitApart) return null;
  const isWord = textAt(cursor, quantity.used - 1) === 'in';
  return isWord || announces(cursor, quantity) ? withoutUnit(cursor, quantity) : null;
};
