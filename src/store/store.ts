import type { Transaction } from 'kysely';
import { bringUp } from './form.ts';
import type { Watch } from './guard.ts';
import { idMaker, type NewId } from './ids.ts';
import type { Engine } from './migrations/columns.ts';
import type { StorePlace } from './place.ts';
import { openPostgres } from './postgres.ts';
import { openSqlite } from './sqlite.ts';
import type { Tables } from './tables.ts';
import { changeRunner, type TransactOptions } from './transact.ts';
import { openView, type Reader, type View } from './view.ts';

/** What can be asked and changed while a change is open. */
export type Tx = Reader &
  Pick<Transaction<Tables>, 'insertInto' | 'updateTable' | 'deleteFrom'> & {
    /** An id for a new row, of the moment it is made. */
    readonly newId: NewId;
  };

export type Store = {
  readonly engine: Engine;
  /** For what changes nothing. Sees every change that was acknowledged. */
  readonly read: Reader;
  /**
   * One change, whole or not at all. The work may be run more than once (it met another change),
   * so it touches nothing but the records, and it waits for nothing else: others wait for it.
   */
  readonly transact: <T>(work: (tx: Tx) => Promise<T>, options?: TransactOptions) => Promise<T>;
  /** A view of one moment, however long the reading takes and whatever is changed meanwhile. */
  readonly snapshot: <T>(work: (view: Reader) => Promise<T>) => Promise<T>;
  /** The same, kept open by whoever asks for it, until it is closed. */
  readonly view: () => Promise<View>;
  readonly close: () => Promise<void>;
};

export type StoreOptions = {
  /** Sees every statement before it runs; what it throws is that statement's fault. */
  readonly watch?: Watch;
  /** How long to wait for another program that holds the records. */
  readonly waitMs?: number;
  /** How many connections to a server at most. */
  readonly connections?: number;
};

/** Opens the records and brings them to this program's form. */
export const openStore = async (place: StorePlace, options: StoreOptions = {}): Promise<Store> => {
  await migrate(place);
  return place.engine === 'sqlite'
    ? await sqliteStore(place.file, options)
    : postgresStore(place.url, options);
};

/**
 * Brings the records to this program's form.
 *
 * @returns the steps that were made
 */
export const migrate = async (place: StorePlace): Promise<readonly string[]> => {
  if (place.engine === 'sqlite') {
    const { write, close } = await openSqlite(place.file);
    return await bringUp(write, 'sqlite').finally(close);
  }
  const { db, close } = openPostgres(place.url, { unhurried: true, connections: 1 });
  return await bringUp(db, 'postgres').finally(close);
};

const sqliteStore = async (file: string, options: StoreOptions): Promise<Store> => {
  const { write, read, view, close } = await openSqlite(file, options);
  const run = changeRunner();
  const newId = idMaker();
  return {
    engine: 'sqlite',
    read,
    transact: (work, how) =>
      run(() => write.transaction().execute((trx) => work(changing(trx, newId))), how),
    view,
    snapshot: (work) => within(view, work),
    close,
  };
};

const postgresStore = (url: string, options: StoreOptions): Store => {
  const { db, close } = openPostgres(url, options);
  const run = changeRunner();
  const newId = idMaker();
  const view = (): Promise<View> =>
    openView(db, undefined, (begin) =>
      begin.setIsolationLevel('repeatable read').setAccessMode('read only'),
    );
  return {
    engine: 'postgres',
    read: db,
    transact: (work, how) =>
      run(() => db.transaction().execute((trx) => work(changing(trx, newId))), how),
    view,
    snapshot: (work) => within(view, work),
    close,
  };
};

/** No more of the query builder than a change may use. */
const changing = (trx: Transaction<Tables>, newId: NewId): Tx => ({
  selectFrom: trx.selectFrom.bind(trx),
  with: trx.with.bind(trx),
  insertInto: trx.insertInto.bind(trx),
  updateTable: trx.updateTable.bind(trx),
  deleteFrom: trx.deleteFrom.bind(trx),
  newId,
});

const within = async <T>(
  open: () => Promise<View>,
  work: (db: Reader) => Promise<T>,
): Promise<T> => {
  const view = await open();
  try {
    return await work(view.db);
  } finally {
    await view.close();
  }
};
