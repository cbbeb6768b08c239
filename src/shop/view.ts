import type { Reader, Tx } from '../store/index.ts';

/**
 * How names are compared and misspelt ones guessed at: the same way as everything else that
 * people type, so it is handed in by whoever reads their words.
 */
export type ShopWords = {
  /** The same text without capitals and typographic characters. */
  readonly plainText: (text: string) => string;
  /** The known words that a misspelt one may have been meant for. */
  readonly nearestOf: (word: string, known: Iterable<string>) => readonly string[];
  /** The value of a plain number, or null. */
  readonly numberOf: (text: string) => number | null;
  /** What a unit measures and its size in the program's own, or null. */
  readonly unitOf: (word: string) => { readonly measure: string; readonly factor: number } | null;
  /** What people call a row of the table of materials. */
  readonly materialNames: (id: string) => readonly string[];
};

/** One shop, to be read. Everything that is asked through it is asked of this shop alone. */
export type ShopView = {
  readonly id: string;
  readonly db: Reader;
  readonly words: ShopWords;
};

/** One shop, inside one change, with who makes it and when. */
export type ShopChange = ShopView & {
  readonly db: Tx;
  readonly by: string;
  readonly at: number;
};

export const viewShop = (db: Reader, id: string, words: ShopWords): ShopView => ({ id, db, words });
