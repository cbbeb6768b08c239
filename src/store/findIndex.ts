import type { Kysely } from 'kysely';
import { portionsOf } from './portions.ts';
import { spellingsOf } from './spellings.ts';
import type { TableFacts, Tables } from './tables.ts';

/** What of an entry the terms are kept with. */
export type Indexed = {
  readonly shop: string;
  readonly place: number;
  readonly terms: readonly string[];
};

type Writer = Pick<Kysely<Tables>, 'selectFrom' | 'insertInto' | 'deleteFrom'>;

/** Rows a statement. Judgement: far below what either engine takes of values, and quick to build. */
const ROWS = 1_500;

const inParts = async <T>(
  rows: readonly T[],
  work: (part: readonly T[]) => Promise<unknown>,
): Promise<void> => {
  for (let at = 0; at < rows.length; at += ROWS) await work(rows.slice(at, at + ROWS));
};

/**
 * Lets entries be found by their terms. Rows go in in the order of their keys, so that two who
 * enter the same new terms wait for each other and never in a ring.
 */
export const enterTerms = async (db: Writer, entries: readonly Indexed[]): Promise<void> => {
  const places = entries.flatMap(({ shop, place, terms }) =>
    [...terms].sort().map((term) => ({ shop, term, place })),
  );
  await inParts(places, (part) =>
    db
      .insertInto('find_term')
      .values([...part])
      .execute(),
  );
  for (const shop of new Set(entries.map((entry) => entry.shop))) {
    const of = entries.filter((entry) => entry.shop === shop);
    await enterSpellings(db, shop, [...new Set(of.flatMap(({ terms }) => terms))].sort());
  }
};

const enterSpellings = async (
  db: Writer,
  shop: string,
  terms: readonly string[],
): Promise<void> => {
  await inParts(terms, async (part) => {
    const known = await db
      .selectFrom('find_spelling')
      .select('term')
      .where('shop', '=', shop)
      .where('spelling', 'in', [...part])
      .whereRef('term', '=', 'spelling')
      .execute();
    const old = new Set(known.map(({ term }) => term));
    const fresh = part
      .filter((term) => !old.has(term))
      .flatMap((term) => spellingsOf(term).map((spelling) => ({ shop, spelling, term })));
    await inParts(fresh, (rows) =>
      db
        .insertInto('find_spelling')
        .values([...rows])
        .onConflict((oc) => oc.doNothing())
        .execute(),
    );
  });
};

/** Lets an entry be found no more. Spellings stay: they say that a word is written so, no more. */
export const leaveTerms = async (db: Writer, { shop, place, terms }: Indexed): Promise<void> => {
  await db
    .deleteFrom('find_term')
    .where('shop', '=', shop)
    .where('place', '=', place)
    .where('term', 'in', [...terms])
    .execute();
};

const ENTRIES: TableFacts = { name: 'find_entry', shop: 'shop', key: 'id', json: [] };

/** Makes the terms of all entries again: a backup carries the entries alone. */
export const enterAllTerms = async (db: Kysely<Tables>): Promise<void> => {
  for await (const rows of portionsOf(db, ENTRIES)) {
    const entries = rows.map(({ shop, place, terms }) => ({
      shop: String(shop),
      place: Number(place),
      terms: termsIn(String(terms)),
    }));
    await enterTerms(db, entries);
  }
};

/** The terms of an entry as they are kept. */
export const termsIn = (kept: string): readonly string[] => (kept === '' ? [] : kept.split(' '));
