import fs from 'node:fs';
import path from 'node:path';
import Database from 'better-sqlite3';
import { Kysely } from 'kysely';
import { StoreUnavailable } from './faults.ts';
import type { Guards, Watch } from './guard.ts';
import { patiently, WAIT_MS } from './patience.ts';
import { type SqliteUse, sqliteDialect } from './sqliteDriver.ts';
import { fromSqlite } from './sqliteFaults.ts';
import type { Tables } from './tables.ts';
import { openView, type View } from './view.ts';

/**
 * How long the driver itself may stand still for a lock, and with it the whole process, which
 * has three seconds to acknowledge a request. Longer waits are made outside it (patience.ts).
 */
const BLOCKING_WAIT_MS = 10;

export type SqliteOptions = {
  readonly watch?: Watch | undefined;
  readonly waitMs?: number | undefined;
};

export type SqliteStore = {
  readonly write: Kysely<Tables>;
  readonly read: Kysely<Tables>;
  /** A view of one moment: what is written meanwhile does not show in it. */
  readonly view: () => Promise<View>;
  readonly close: () => Promise<void>;
};

/** Opens the file, makes it where it is not there yet. */
export const openSqlite = async (
  file: string,
  options: SqliteOptions = {},
): Promise<SqliteStore> => {
  const guards: Guards = { translate: fromSqlite, watch: options.watch };
  const writer = await openFile(file);
  const reader = openReader(file);
  const stillThere = sameFile(file);
  const waitMs = options.waitMs ?? WAIT_MS;
  const use = (db: Database.Database, begin: SqliteUse['begin']): Kysely<Tables> =>
    new Kysely({ dialect: sqliteDialect({ db, begin, waitMs, stillThere }, guards) });
  const write = use(writer, 'begin immediate');
  const read = use(reader, 'begin');
  return {
    write,
    read,
    view: async () => {
      const own = openReader(file);
      try {
        return await openView(use(own, 'begin'), () => own.close());
      } catch (error) {
        own.close();
        throw error;
      }
    },
    close: async () => {
      // Waits for what is under way. Then the files, which the query builder leaves open; the
      // writer last, since it folds the log back into the file.
      await Promise.all([read.destroy(), write.destroy()]);
      reader.close();
      writer.close();
    },
  };
};

/** Runs what talks to the driver and lets only our own faults out. */
export const ours = <T>(run: () => T): T => {
  try {
    return run();
  } catch (error) {
    throw fromSqlite(error);
  }
};

const openFile = async (file: string): Promise<Database.Database> => {
  makeFolder(path.dirname(file));
  const db = ours(() => new Database(file, { timeout: BLOCKING_WAIT_MS }));
  try {
    // Only the owner of the process reads what a shop keeps.
    fs.chmodSync(file, 0o600);
    // At the very start two processes may both want to give a new file its form: one waits.
    const mode = await patiently(() =>
      ours(() => db.pragma('journal_mode = wal', { simple: true })),
    );
    if (mode !== 'wal') throw noLog(file, String(mode));
    ours(() => db.pragma('synchronous = full'));
    ours(() => db.pragma('foreign_keys = on'));
    return db;
  } catch (error) {
    db.close();
    throw error;
  }
};

const noLog = (file: string, mode: string): StoreUnavailable =>
  new StoreUnavailable(
    'gone',
    new Error(`${file} lies where no write-ahead log can be kept (it stays ${mode}).`),
  );

const openReader = (file: string): Database.Database =>
  ours(() => {
    const db = new Database(file, { timeout: BLOCKING_WAIT_MS, fileMustExist: true });
    db.pragma('query_only = on');
    return db;
  });

const makeFolder = (folder: string): void => {
  try {
    fs.mkdirSync(folder, { recursive: true, mode: 0o700 });
  } catch (error) {
    throw new StoreUnavailable('gone', error);
  }
};

/**
 * SQLite goes on writing into a file that was moved away or deleted, and what it then
 * acknowledges is lost. So the name is looked at before every use: it must still lead to the file.
 */
const sameFile = (file: string): (() => void) => {
  const opened = fs.statSync(file, { bigint: true });
  return () => {
    const now = fs.statSync(file, { bigint: true, throwIfNoEntry: false });
    if (now?.ino === opened.ino && now.dev === opened.dev) return;
    throw new StoreUnavailable('gone', new Error(`${file} was moved away or replaced.`));
  };
};
