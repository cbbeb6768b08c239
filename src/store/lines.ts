import { createReadStream, createWriteStream } from 'node:fs';
import { createInterface } from 'node:readline';
import { pipeline } from 'node:stream/promises';
import { BackupFault } from './backupFaults.ts';
import { portionsOf, type Row } from './portions.ts';
import { TABLES } from './tables.ts';
import type { Reader } from './view.ts';

/**
 * A backup as lines of JSON: what it is, then the rows table by table, then how many there were.
 * Both engines write it and both read it, so it also carries records from one to the other.
 */
export type Head = { readonly wholetooth: 'records'; readonly form: string };
export type Portion = { readonly table: string; readonly rows: readonly Row[] };
type End = { readonly end: Readonly<Record<string, number>> };

export const writeLines = async (view: Reader, form: string, file: string): Promise<void> => {
  await pipeline(linesOf(view, form), createWriteStream(file, { flags: 'wx', mode: 0o600 }));
};

async function* linesOf(view: Reader, form: string): AsyncGenerator<string> {
  const head: Head = { wholetooth: 'records', form };
  yield `${JSON.stringify(head)}\n`;
  const counts: Record<string, number> = {};
  for (const table of TABLES) {
    let count = 0;
    for await (const rows of portionsOf(view, table)) {
      count += rows.length;
      const portion: Portion = { table: table.name, rows };
      yield `${JSON.stringify(portion)}\n`;
    }
    counts[table.name] = count;
  }
  const end: End = { end: counts };
  yield `${JSON.stringify(end)}\n`;
}

/** The first line, if it is one of ours. */
export const readHead = async (file: string): Promise<Head> => {
  for await (const line of rawLines(file)) {
    const head = parsed(line, file);
    if (isHead(head)) return head;
    break;
  }
  throw new BackupFault('notABackup', file);
};

/** The rows of a backup, portion by portion. A file that does not come to its end is refused. */
export async function* readPortions(file: string): AsyncGenerator<Portion> {
  const counts: Record<string, number> = {};
  let first = true;
  for await (const line of rawLines(file)) {
    const content = parsed(line, file);
    if (first) {
      first = false;
      if (!isHead(content)) throw new BackupFault('notABackup', file);
    } else if (isPortion(content)) {
      counts[content.table] = (counts[content.table] ?? 0) + content.rows.length;
      yield content;
    } else if (isEnd(content) && agrees(content.end, counts)) {
      return;
    } else {
      throw new BackupFault('damaged', file);
    }
  }
  throw new BackupFault('damaged', file);
}

const rawLines = (file: string): AsyncIterable<string> =>
  createInterface({ input: createReadStream(file, 'utf8'), crlfDelay: Number.POSITIVE_INFINITY });

const parsed = (line: string, file: string): unknown => {
  try {
    return JSON.parse(line);
  } catch (error) {
    throw new BackupFault('damaged', file, error);
  }
};

const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);

const isHead = (value: unknown): value is Head =>
  isObject(value) && value['wholetooth'] === 'records' && typeof value['form'] === 'string';

const isCell = (value: unknown): boolean =>
  value === null || typeof value === 'string' || typeof value === 'number';

const isPortion = (value: unknown): value is Portion =>
  isObject(value) &&
  TABLES.some(({ name }) => name === value['table']) &&
  Array.isArray(value['rows']) &&
  value['rows'].every((row: unknown) => isObject(row) && Object.values(row).every(isCell));

const isEnd = (value: unknown): value is End =>
  isObject(value) &&
  isObject(value['end']) &&
  Object.values(value['end']).every((count) => typeof count === 'number');

const agrees = (said: Readonly<Record<string, number>>, read: Record<string, number>): boolean =>
  Object.entries(said).every(([table, count]) => count === (read[table] ?? 0)) &&
  Object.keys(read).every((table) => table in said);
