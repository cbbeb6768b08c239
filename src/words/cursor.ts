import { plainText } from './characters.ts';
import { type Span, type Token, tokensOf } from './tokens.ts';
import type { Quantity } from './unit.ts';

export type ShopUnits = 'in' | 'mm';

type Memory = {
  /** The same line in plain characters, place for place. */
  readonly plain: string;
  readonly tokens: readonly Token[];
  /** The words as they were typed, and after which of them a comma is only supposed. */
  readonly typed: readonly Token[];
  readonly supposed: readonly number[];
  /** Quantities already read, by token: many readers ask for the same one. */
  readonly quantities: (Quantity | null | undefined)[];
};

/** A place in the line being read. Reading never moves it: every reader says where it stopped. */
export type Cursor = {
  readonly text: string;
  readonly tokens: readonly Token[];
  readonly at: number;
  readonly units: ShopUnits;
  /** What was found out about this very line, so that it is not found out again. */
  readonly memory?: Memory;
};

/** The beginning of a line. */
export const cursorOf = (text: string, units: ShopUnits, at = 0): Cursor => {
  const plain = plainText(text);
  const tokens = tokensOf(text, plain);
  return {
    text,
    tokens,
    at,
    units,
    memory: { plain, tokens, typed: tokens, supposed: [], quantities: [] },
  };
};

/** The line in plain characters, place for place. */
export const plainOf = (cursor: Cursor): string => cursor.memory?.plain ?? plainText(cursor.text);

/** Quantities already read of these words; a reader may have put others in their place. */
export const quantitiesOf = ({ memory, tokens }: Cursor): (Quantity | null | undefined)[] =>
  memory?.tokens === tokens ? memory.quantities : [];

export const tokenAt = (cursor: Cursor, ahead = 0): Token | undefined =>
  cursor.tokens[cursor.at + ahead];
export const textAt = (cursor: Cursor, ahead = 0): string => tokenAt(cursor, ahead)?.text ?? '';
export const moved = (cursor: Cursor, by: number): Cursor => {
  const { text, tokens, at, units, memory } = cursor;
  return memory === undefined
    ? { ...cursor, at: at + by }
    : { text, tokens, at: at + by, units, memory };
};

/** Whether a comma or the like stands right before this place. */
export const isAfterComma = (cursor: Cursor, ahead = 0): boolean =>
  tokenAt(cursor, ahead - 1)?.closed === true;

/** The same place read as if a comma followed the word there. */
export const withComma = (cursor: Cursor, ahead: number): Cursor => {
  const tokens = cursor.tokens.map((token, index) =>
    index === cursor.at + ahead ? { ...token, closed: true } : token,
  );
  const { typed = cursor.tokens, supposed = [] } = cursor.memory ?? {};
  const memory = {
    plain: plainOf(cursor),
    tokens,
    typed,
    supposed: [...supposed, cursor.at + ahead],
    quantities: [],
  };
  return { ...cursor, tokens, memory };
};

/** From the first to the last of a number of tokens. */
export const spanOf = (cursor: Cursor, used: number): Span => {
  const first = tokenAt(cursor);
  const last = tokenAt(cursor, Math.max(0, used - 1));
  const end = cursor.text.length;
  return { start: first?.start ?? end, end: last?.end ?? end };
};

/** How many tokens a phrase takes here, 0 where it does not stand here. */
export const phraseAt = (cursor: Cursor, phrase: readonly string[]): number => {
  for (let i = 0; i < phrase.length; i += 1) if (textAt(cursor, i) !== phrase[i]) return 0;
  return phrase.length;
};

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
