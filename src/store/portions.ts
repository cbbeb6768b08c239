import { type Kysely, sql } from 'kysely';
import type { TableFacts } from './tables.ts';
import type { Reader } from './view.ts';

export type Row = Readonly<Record<string, string | number | null>>;

/** Judgement: a portion of cards, the largest rows there are, stays within a few megabytes. */
const PORTION = 250;

/**
 * The rows of a table in the order of their keys, a portion at a time, so that a million of them
 * are never in memory together; of one shop or of all.
 */
export async function* portionsOf(
  db: Reader,
  { name, shop, key }: TableFacts,
  ofShop?: string,
): AsyncGenerator<readonly Row[]> {
  // Only the columns of the key are named, and every table has its own.
  const all = db as unknown as Kysely<{ t: Record<string, string | number | null> }>;
  let rows = all.selectFrom(name as 't').selectAll();
  if (ofShop !== undefined) rows = rows.where(shop, '=', ofShop);
  const sorted = rows.orderBy(shop).orderBy(key).limit(PORTION);
  let last: Row | undefined;
  for (;;) {
    const after: Row | undefined = last;
    const query =
      after === undefined
        ? sorted
        : sorted.where(
            sql<boolean>`(${sql.ref(shop)}, ${sql.ref(key)}) > (${after[shop]}, ${after[key]})`,
          );
    const portion: readonly Row[] = await query.execute();
    if (portion.length > 0) yield portion;
    if (portion.length < PORTION) return;
    last = portion.at(-1);
  }
}
