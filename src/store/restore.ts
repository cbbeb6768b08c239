import fs from 'node:fs';
import path from 'node:path';
import Database from 'better-sqlite3';
import type { Kysely } from 'kysely';
import { copyOfFile } from './backup.ts';
import { BackupFault } from './backupFaults.ts';
import { draftOf, putInPlace } from './durable.ts';
import { RecordsTooNew, StoreUnavailable } from './faults.ts';
import { enterAllTerms } from './findIndex.ts';
import { bringUp, FORM_TABLES, KNOWN_FORM, stepsDone } from './form.ts';
import { readHead, readPortions } from './lines.ts';
import type { Engine } from './migrations/columns.ts';
import { stepNames } from './migrations/index.ts';
import type { StorePlace } from './place.ts';
import { openPostgres } from './postgres.ts';
import { openSqlite, ours } from './sqlite.ts';
import { MADE_TABLES, TABLES, type Tables } from './tables.ts';

export type Restored = {
  /** Where the records went that were there before, or null where there were none. */
  readonly setAside: string | null;
};

/**
 * Puts a backup in the place of the records. What was there before is kept beside it; a server's
 * database must be empty. If anything is wrong with the backup nothing is changed.
 */
export const restore = async (place: StorePlace, file: string): Promise<Restored> => {
  if (!fs.existsSync(file)) throw new BackupFault('absent', file);
  const copied = isSqliteFile(file);
  if (place.engine === 'postgres') {
    if (copied) throw new BackupFault('wrongEngine', file);
    await intoServer(place.url, file);
    return { setAside: null };
  }
  return await intoFile(place.file, file, copied);
};

/** How every SQLite file begins. Source: SQLite documentation, "Database File Format". */
const SQLITE_BEGINNING = 'SQLite format 3\0';

const isSqliteFile = (file: string): boolean => {
  const handle = fs.openSync(file, 'r');
  try {
    const start = Buffer.alloc(SQLITE_BEGINNING.length);
    fs.readSync(handle, start, 0, start.length, 0);
    return start.toString('latin1') === SQLITE_BEGINNING;
  } finally {
    fs.closeSync(handle);
  }
};

const intoServer = async (url: string, file: string): Promise<void> => {
  const { db, close } = openPostgres(url, { unhurried: true, connections: 1 });
  await linesInto(db, 'postgres', file).finally(close);
};

const intoFile = async (target: string, file: string, copied: boolean): Promise<Restored> => {
  fs.mkdirSync(path.dirname(target), { recursive: true, mode: 0o700 });
  const draft = draftOf(target);
  try {
    if (copied) await copyOfFile(file, draft);
    await bringDraftUp(draft, file, copied);
    const setAside = putAside(target);
    putInPlace(draft, target);
    return { setAside };
  } finally {
    for (const end of ['', '-wal', '-shm']) fs.rmSync(draft + end, { force: true });
  }
};

const bringDraftUp = async (draft: string, file: string, copied: boolean): Promise<void> => {
  const { write, close } = await openSqlite(draft);
  try {
    if (copied) {
      if ((await stepsDone(write)).length === 0) throw new BackupFault('notABackup', file);
      await bringUp(write, 'sqlite');
    } else {
      await linesInto(write, 'sqlite', file);
    }
  } finally {
    await close();
  }
};

/** Steps are named so that they sort. */
const FIRST_WITH_FIND = '0007';

/** Reads lines into a database that holds no shop yet, in one change. */
const linesInto = async (db: Kysely<Tables>, engine: Engine, file: string): Promise<void> => {
  const { form } = await readHead(file);
  if (!stepNames.includes(form)) throw new RecordsTooNew(form, KNOWN_FORM);
  await makeReady(db, engine, form, file);
  await db.transaction().execute(async (tx) => {
    for await (const { table, rows } of readPortions(file)) {
      // The table's name was looked up in TABLES; its columns are what this form wrote itself.
      const into = tx as unknown as Kysely<{ t: Record<string, string | number | null> }>;
      await into
        .insertInto(table as 't')
        .values([...rows])
        .execute();
    }
    if (form >= FIRST_WITH_FIND) await enterAllTerms(tx);
  });
  await bringUp(db, engine);
};

/** An empty database of a newer form is emptied of its tables too: rows go in as they came out. */
const makeReady = async (
  db: Kysely<Tables>,
  engine: Engine,
  form: string,
  file: string,
): Promise<void> => {
  const done = await stepsDone(db);
  const unknown = done.findLast((name) => !stepNames.includes(name));
  if (unknown !== undefined) throw new RecordsTooNew(unknown, KNOWN_FORM);
  if (done.length > 0) {
    const shop = await db.selectFrom('shop').select('id').limit(1).executeTakeFirst();
    if (shop !== undefined) throw new BackupFault('notEmpty', file);
  }
  if (done.at(-1) !== form && done.includes(form)) {
    const records = [...MADE_TABLES, ...TABLES.map(({ name }) => name).reverse()];
    const names: readonly string[] = [...records, ...FORM_TABLES];
    for (const name of names) await db.schema.dropTable(name).ifExists().execute();
  }
  await bringUp(db, engine, form);
};

/** Takes the records out of the way. Fails, and changes nothing, while somebody uses them. */
const putAside = (target: string): string | null => {
  if (!fs.existsSync(target)) return null;
  foldLog(target);
  const moment = new Date().toISOString().replaceAll(/[:.]/g, '-');
  const aside = `${target}.before-${moment}`;
  for (const end of ['-wal', '-shm', '']) {
    if (fs.existsSync(target + end)) fs.renameSync(target + end, aside + end);
  }
  return aside;
};

/** Leaving the log is possible only for somebody who is alone with the file. */
const foldLog = (target: string): void => {
  try {
    ours(() => {
      const db = new Database(target, { fileMustExist: true, timeout: 2_000 });
      try {
        db.pragma('journal_mode = delete');
      } finally {
        db.close();
      }
    });
  } catch (error) {
    if (!(error instanceof StoreUnavailable)) throw error;
    if (error.reason === 'busy') throw new BackupFault('inUse', target, error);
    // Damaged records are what a backup is restored for: they are set aside as they are.
  }
};
