import type { Kysely, SelectQueryBuilder } from 'kysely';
import type { Tx } from './store.ts';
import type { RegisterColumns, RegisterName, Tables } from './tables.ts';
import type { Reader } from './view.ts';

/** The columns that say who keeps a row and since when; the rest is what the row is about. */
type Content<N extends RegisterName> = Omit<Tables[N], keyof RegisterColumns>;

/** What is written when a row is made or changed. */
export type Written<N extends RegisterName> = Content<N> & { name: string; name_key: string };

export type Signature = { readonly at: number; readonly by: string };

/** Rows in one statement. Judgement: far below the number of values either engine takes. */
const PORTION = 250;

/**
 * The rows of one shop in one of its lists. Every statement here names the shop, so that nothing
 * built on it can reach another's.
 */
export type RegisterReader<N extends RegisterName> = {
  readonly list: () => Promise<Tables[N][]>;
  readonly byId: (id: string) => Promise<Tables[N] | undefined>;
  readonly byName: (nameKey: string) => Promise<Tables[N] | undefined>;
  readonly names: () => Promise<string[]>;
};

export type RegisterWriter<N extends RegisterName> = RegisterReader<N> & {
  /** Adds what can be added; what is not among the ids given back has a name that is taken. */
  readonly add: (
    rows: readonly (Written<N> & { id: string })[],
    signature: Signature,
  ) => Promise<Set<string>>;
  /** False when another change came first. */
  readonly change: (
    id: string,
    version: number,
    content: Written<N>,
    signature: Signature,
  ) => Promise<boolean>;
  readonly remove: (id: string, version: number, signature: Signature) => Promise<boolean>;
};

/** All lists look the same from here: which one it is makes no difference to the query. */
type Any = { register: RegisterColumns };

const rowsOf = (
  db: Reader,
  table: RegisterName,
  shop: string,
): SelectQueryBuilder<Any, 'register', object> =>
  (db as unknown as Kysely<Any>)
    .selectFrom(table as 'register')
    .where('shop', '=', shop)
    .where('removed_at', 'is', null);

export const readRegister = <N extends RegisterName>(
  db: Reader,
  table: N,
  shop: string,
): RegisterReader<N> => {
  const rows = () => rowsOf(db, table, shop);
  return {
    list: async () =>
      (await rows().selectAll().orderBy('name_key').orderBy('id').execute()) as Tables[N][],
    byId: async (id) =>
      (await rows().selectAll().where('id', '=', id).executeTakeFirst()) as Tables[N] | undefined,
    byName: async (nameKey) =>
      (await rows().selectAll().where('name_key', '=', nameKey).executeTakeFirst()) as
        | Tables[N]
        | undefined,
    names: async () =>
      (await rows().select('name').orderBy('name_key').execute()).map(({ name }) => name),
  };
};

export const writeRegister = <N extends RegisterName>(
  tx: Tx,
  table: N,
  shop: string,
): RegisterWriter<N> => {
  const db = tx as unknown as Kysely<Any>;
  const name = table as 'register';
  const update = (id: string, version: number) =>
    db
      .updateTable(name)
      .where('shop', '=', shop)
      .where('id', '=', id)
      .where('version', '=', version)
      .where('removed_at', 'is', null);
  return {
    ...readRegister(tx, table, shop),
    add: async (rows, signature) => {
      const added = new Set<string>();
      for (let start = 0; start < rows.length; start += PORTION) {
        const portion = rows
          .slice(start, start + PORTION)
          .map((row) => ({ ...row, ...newRow(shop, signature) }));
        const kept = await db
          .insertInto(name)
          .values(portion)
          .onConflict((oc) =>
            oc.columns(['shop', 'name_key']).where('removed_at', 'is', null).doNothing(),
          )
          .returning('id')
          .execute();
        for (const { id } of kept) added.add(id);
        if (start + PORTION < rows.length) await othersTurn();
      }
      return added;
    },
    change: async (id, version, content, { at, by }) => {
      const changed = { ...content, version: version + 1, changed_at: at, changed_by: by };
      const { numUpdatedRows } = await update(id, version).set(changed).executeTakeFirstOrThrow();
      return numUpdatedRows === 1n;
    },
    remove: async (id, version, { at, by }) => {
      const removed = { version: version + 1, removed_at: at, removed_by: by };
      const { numUpdatedRows } = await update(id, version).set(removed).executeTakeFirstOrThrow();
      return numUpdatedRows === 1n;
    },
  };
};

const newRow = (shop: string, { at, by }: Signature) => ({
  shop,
  version: 1,
  made_at: at,
  made_by: by,
  changed_at: at,
  changed_by: by,
  removed_at: null,
  removed_by: null,
});

/** A long list must not keep a request waiting that only wants to be acknowledged. */
const othersTurn = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));
