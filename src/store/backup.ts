import fs from 'node:fs';
import Database from 'better-sqlite3';
import { BackupFault } from './backupFaults.ts';
import { draftOf, putInPlace } from './durable.ts';
import { KNOWN_FORM, stepsDone } from './form.ts';
import { writeLines } from './lines.ts';
import type { StorePlace } from './place.ts';
import { openPostgres } from './postgres.ts';
import { openSqlite, ours } from './sqlite.ts';
import type { Reader } from './view.ts';

/** More pages than any file has: everything in one step, which no writer can make begin again. */
const ALL_PAGES = 0x7fffffff;

/**
 * Copies the records as they are at one moment, while the program goes on working. A file is
 * copied as a file; a server's records, or where the name ends in .jsonl, are written as lines.
 */
export const backup = async (place: StorePlace, file: string): Promise<void> => {
  if (fs.existsSync(file)) throw new BackupFault('exists', file);
  const draft = draftOf(file);
  try {
    if (place.engine === 'postgres') await linesOfServer(place.url, draft);
    else if (file.endsWith('.jsonl')) await linesOfFile(place.file, draft);
    else await copyOfFile(place.file, draft);
    putInPlace(draft, file);
  } finally {
    fs.rmSync(draft, { force: true });
  }
};

const linesOfServer = async (url: string, draft: string): Promise<void> => {
  const { db, close } = openPostgres(url, { unhurried: true, connections: 1 });
  try {
    const form = (await stepsDone(db)).at(-1) ?? KNOWN_FORM;
    await db
      .transaction()
      .setIsolationLevel('repeatable read')
      .setAccessMode('read only')
      .execute((view: Reader) => writeLines(view, form, draft));
  } finally {
    await close();
  }
};

const linesOfFile = async (file: string, draft: string): Promise<void> => {
  if (!fs.existsSync(file)) throw new BackupFault('absent', file);
  const { write, view, close } = await openSqlite(file);
  try {
    const form = (await stepsDone(write)).at(-1) ?? KNOWN_FORM;
    const moment = await view();
    await writeLines(moment.db, form, draft).finally(moment.close);
  } finally {
    await close();
  }
};

/** A copy is looked through before it is called one, and stands alone, without a log beside it. */
export const copyOfFile = async (file: string, draft: string): Promise<void> => {
  if (!fs.existsSync(file)) throw new BackupFault('absent', file);
  const source = ours(() => new Database(file, { fileMustExist: true, timeout: 5_000 }));
  try {
    source.pragma('query_only = on');
    await source.backup(draft, { progress: () => ALL_PAGES });
  } catch (error) {
    throw isNotADatabase(error) ? new BackupFault('notABackup', file, error) : error;
  } finally {
    source.close();
  }
  lookThrough(draft, file);
};

const lookThrough = (draft: string, file: string): void => {
  const copy = new Database(draft);
  try {
    copy.pragma('journal_mode = delete');
    const found = copy.pragma('integrity_check', { simple: true });
    if (found !== 'ok') throw new BackupFault('damaged', file);
  } catch (error) {
    // Some damage is found out by the looking itself.
    throw isCorrupt(error) ? new BackupFault('damaged', file, error) : error;
  } finally {
    copy.close();
  }
  fs.chmodSync(draft, 0o600);
};

const isCorrupt = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && String(error.code).startsWith('SQLITE_CORRUPT');

const isNotADatabase = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && error.code === 'SQLITE_NOTADB';
