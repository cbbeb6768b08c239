/** What a file does when it cannot do what is asked: read-only, full, moved away, held, damaged. */
import fs from 'node:fs';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import Database from 'better-sqlite3';
import { Kysely } from 'kysely';
import { expect, it, onTestFinished } from 'vitest';
import {
  migrate,
  openStore,
  StoreUnavailable,
  storePlace,
  type Tables,
} from '../../src/store/index.ts';
import { sqliteDialect } from '../../src/store/sqliteDriver.ts';
import { fromSqlite } from '../../src/store/sqliteFaults.ts';
import { newFolder } from '../support/places.ts';
import { newRecords, type Records, START } from '../support/records.ts';

type Rows = Pick<Kysely<Tables>, 'selectFrom' | 'insertInto'>;

const addShop = (rows: Rows, id: string, name = id) =>
  rows
    .insertInto('shop')
    .values({ id, platform: 'terminal', outside: id, name, made_at: START })
    .execute();

const shops = async (rows: Pick<Rows, 'selectFrom'>): Promise<number> =>
  (await rows.selectFrom('shop').select('id').execute()).length;

/** What the work says is wrong, in our own words, or that nothing is. */
const reasonOf = (work: Promise<unknown>): Promise<unknown> =>
  work.then(
    () => 'nothing',
    (error: unknown) => (error instanceof StoreUnavailable ? error.reason : error),
  );

const fileOf = ({ place }: Records): string => {
  if (place.engine !== 'sqlite') throw new Error('a file was wanted');
  return place.file;
};

/** The query builder on a connection that was made difficult beforehand. */
const difficult = async (
  make: (file: string) => Database.Database,
): Promise<{ readonly db: Database.Database; readonly rows: Kysely<Tables> }> => {
  const file = path.join(newFolder(), 'wholetooth.db');
  await migrate({ engine: 'sqlite', file });
  const db = make(file);
  onTestFinished(() => {
    db.close();
  });
  const dialect = sqliteDialect(
    { db, begin: 'begin immediate', waitMs: 50, stillThere: () => undefined },
    { translate: fromSqlite },
  );
  return { db, rows: new Kysely<Tables>({ dialect }) };
};

const change = (rows: Kysely<Tables>, id: string, name = id) =>
  rows.transaction().execute((tx) => addShop(tx, id, name));

it('says that it is full, keeps nothing of the change, and goes on when there is room', async () => {
  // SQLite's own limit on the pages of a file stands in for the end of the disk: the same code.
  const { db, rows } = await difficult((file) => new Database(file));
  const pages = db.pragma('page_count', { simple: true }) as number;
  db.pragma(`max_page_count = ${pages + 3}`);
  await change(rows, 's1');
  expect(await reasonOf(change(rows, 's2', 'x'.repeat(100_000)))).toBe('full');
  expect(await shops(rows)).toBe(1);
  db.pragma(`max_page_count = ${pages + 1000}`);
  await change(rows, 's2', 'x'.repeat(100_000));
  expect(await shops(rows)).toBe(2);
});

it('says that it is read-only, and still reads', async () => {
  const { rows } = await difficult((file) => new Database(file, { readonly: true }));
  expect(await reasonOf(change(rows, 's1'))).toBe('readOnly');
  expect(await shops(rows)).toBe(0);
});

it('never writes through the connection that reads', async () => {
  const { store } = await newRecords('sqlite');
  const sneaky = store.read as unknown as Rows;
  expect(await reasonOf(addShop(sneaky, 's1'))).toBe('readOnly');
  expect(await shops(store.read)).toBe(0);
});

it('does not acknowledge what it would write into a file that was moved away', async () => {
  const records = await newRecords('sqlite');
  const { store } = records;
  const file = fileOf(records);
  await store.transact((tx) => addShop(tx, 's1'));
  fs.renameSync(file, `${file}.elsewhere`);
  expect(await reasonOf(store.transact((tx) => addShop(tx, 's2')))).toBe('gone');
  expect(await reasonOf(shops(store.read))).toBe('gone');
  fs.writeFileSync(file, '');
  expect(await reasonOf(store.transact((tx) => addShop(tx, 's2')))).toBe('gone');
  fs.renameSync(`${file}.elsewhere`, file);
  await store.transact((tx) => addShop(tx, 's3'));
  expect(await shops(store.read)).toBe(2);
});

it('says that a damaged file is gone', async () => {
  const file = path.join(newFolder(), 'wholetooth.db');
  fs.writeFileSync(file, 'this is a shopping list, not a database, and long enough to be read');
  expect(await reasonOf(openStore({ engine: 'sqlite', file }))).toBe('gone');
});

it('says that a folder that cannot be made is gone', async () => {
  const notAFolder = path.join(newFolder(), 'file');
  fs.writeFileSync(notAFolder, '');
  const file = path.join(notAFolder, 'wholetooth.db');
  expect(await reasonOf(openStore({ engine: 'sqlite', file }))).toBe('gone');
});

it('keeps the file from other users of the machine', async () => {
  const records = await newRecords('sqlite');
  expect(fs.statSync(fileOf(records)).mode & 0o077).toBe(0);
});

it('waits for a file that another program holds, and holds up nothing else meanwhile', async () => {
  const records = await newRecords('sqlite');
  const other = holder(fileOf(records));
  other.exec('begin immediate');
  const waiting = records.store.transact((tx) => addShop(tx, 's1'));
  const longest = await longestGap(400);
  other.exec('commit');
  await waiting;
  expect(await shops(records.store.read)).toBe(1);
  // A platform wants its acknowledgement within three seconds; a blocking wait would show here as
  // one gap as long as the lock. Other work on the machine may cost some of it.
  expect(longest).toBeLessThan(200);
});

/** The longest that a timer had to wait, of those that ran for so long. */
const longestGap = async (ms: number): Promise<number> => {
  let longest = 0;
  for (const end = performance.now() + ms; performance.now() < end; ) {
    const since = performance.now();
    await pause(5);
    longest = Math.max(longest, performance.now() - since);
  }
  return longest;
};

it('says that it is busy when the other program does not come to an end', async () => {
  const records = await newRecords('sqlite', { waitMs: 150 });
  const other = holder(fileOf(records));
  other.exec('begin immediate');
  expect(await reasonOf(records.store.transact((tx) => addShop(tx, 's1')))).toBe('busy');
  expect(await shops(records.store.read)).toBe(0);
  other.exec('rollback');
  await records.store.transact((tx) => addShop(tx, 's1'));
});

const holder = (file: string): Database.Database => {
  const other = new Database(file);
  onTestFinished(() => {
    other.close();
  });
  return other;
};

it('serves those who read while a long change is being written', async () => {
  const { store } = await newRecords('sqlite');
  await store.transact((tx) => addShop(tx, 's1'));
  let seen = -1;
  await store.transact(async (tx) => {
    await addShop(tx, 's2');
    seen = await shops(store.read);
  });
  expect(seen).toBe(1);
});

it('finds its place by two settings, and says which of them is wrong', () => {
  expect(storePlace({})).toEqual({
    engine: 'sqlite',
    file: path.resolve('.data', 'wholetooth.db'),
  });
  expect(storePlace({ WHOLETOOTH_DATA: '/records', DATABASE_URL: ' ' })).toEqual({
    engine: 'sqlite',
    file: path.resolve('/records', 'wholetooth.db'),
  });
  const url = 'postgres://shop@localhost/records';
  expect(storePlace({ WHOLETOOTH_DATA: '/records', DATABASE_URL: url })).toEqual({
    engine: 'postgres',
    url,
  });
  expect(() => storePlace({ DATABASE_URL: 'mysql://x' })).toThrow(/DATABASE_URL.*postgres:/u);
});
