/**
 * Puts entries in by the hundred thousand: the same rows as one at a time, of the same terms, but
 * past the query builder and in the order of their keys, which takes seconds and not minutes.
 */
import Database from 'better-sqlite3';
import pg from 'pg';
import { entryTerms, placeOf } from '../../../src/shop/find/put.ts';
import type { ForFind } from '../../../src/shop/index.ts';
import { type StorePlace, spellingsOf } from '../../../src/store/index.ts';

type Cell = string | number | null;
type Columns = Readonly<Record<string, 'text' | 'bigint'>>;
type Sheet = { readonly table: string; readonly columns: Columns; readonly rows: Iterable<Cell[]> };

const ENTRY: Columns = {
  shop: 'text',
  id: 'text',
  kind: 'text',
  subject_id: 'text',
  code: 'text',
  at: 'bigint',
  approved: 'bigint',
  place: 'bigint',
  terms: 'text',
};

export const loadEntries = async (
  place: StorePlace,
  shop: string,
  entries: readonly ForFind[],
): Promise<void> => {
  const sheets = sheetsOf(shop, entries);
  if (place.engine === 'sqlite') intoFile(place.file, sheets);
  else await intoServer(place.url, sheets);
};

const sheetsOf = (shop: string, entries: readonly ForFind[]): readonly Sheet[] => {
  const places = new Map<string, number[]>();
  const rows = entries.map((entry) => {
    const { kind, id, code, at, approved } = entry;
    const place = placeOf(approved, at, 0);
    const terms = entryTerms(entry);
    for (const term of terms) {
      const of = places.get(term);
      if (of === undefined) places.set(term, [place]);
      else of.push(place);
    }
    return [shop, `${kind}:${id}`, kind, id, code, at, approved ? 1 : 0, place, terms.join(' ')];
  });
  const terms = [...places.keys()].sort();
  return [
    { table: 'find_entry', columns: ENTRY, rows },
    {
      table: 'find_term',
      columns: { shop: 'text', term: 'text', place: 'bigint' },
      rows: termRows(shop, terms, places),
    },
    {
      table: 'find_spelling',
      columns: { shop: 'text', spelling: 'text', term: 'text' },
      rows: terms.flatMap((term) => spellingsOf(term).map((spelling) => [shop, spelling, term])),
    },
  ];
};

function* termRows(
  shop: string,
  terms: readonly string[],
  places: ReadonlyMap<string, readonly number[]>,
): Generator<Cell[]> {
  for (const term of terms) for (const place of places.get(term) ?? []) yield [shop, term, place];
}

const intoFile = (file: string, sheets: readonly Sheet[]): void => {
  const db = new Database(file);
  try {
    db.pragma('synchronous = off');
    db.transaction(() => {
      for (const { table, columns, rows } of sheets) {
        const names = Object.keys(columns);
        const marks = names.map(() => '?').join(', ');
        const insert = db.prepare(`insert into ${table} (${names.join(', ')}) values (${marks})`);
        for (const row of rows) insert.run(row);
      }
    })();
  } finally {
    db.close();
  }
};

/** Rows a statement. */
const AT_ONCE = 20_000;

const intoServer = async (url: string, sheets: readonly Sheet[]): Promise<void> => {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await client.query('begin');
    for (const sheet of sheets) await sheetInto(client, sheet);
    await client.query('commit');
    // What a server of a real shop does by itself, sooner or later.
    await client.query('vacuum analyze find_entry, find_term, find_spelling');
  } finally {
    await client.end();
  }
};

const sheetInto = async (client: pg.Client, { table, columns, rows }: Sheet): Promise<void> => {
  const names = Object.keys(columns);
  const lists = Object.values(columns).map((type, at) => `$${String(at + 1)}::${type}[]`);
  const insert = `insert into ${table} (${names.join(', ')}) select * from unnest(${lists.join(', ')})`;
  let held: Cell[][] = names.map(() => []);
  const flush = async (): Promise<void> => {
    await client.query(insert, held);
    held = names.map(() => []);
  };
  for (const row of rows) {
    for (const [at, cell] of row.entries()) held[at]?.push(cell);
    if ((held[0]?.length ?? 0) >= AT_ONCE) await flush();
  }
  await flush();
};
