/** What a server does when it cannot do what is asked: down, lost in the middle, read-only, slow. */
import { expect, it, onTestFinished } from 'vitest';
import {
  openStore,
  type Reader,
  type Store,
  StoreUnavailable,
  type Tx,
} from '../../src/store/index.ts';
import { cutProxy } from '../support/cutProxy.ts';
import { newPlace, onServer } from '../support/places.ts';
import { newRecords, type Records, START } from '../support/records.ts';

/** The statement alone: the word also stands in the settings of a new connection. */
const COMMIT = 'commit\0';

const addShop = (tx: Tx, id: string) =>
  tx
    .insertInto('shop')
    .values({ id, platform: 'terminal', outside: id, name: id, made_at: START })
    .execute();

const shops = async (rows: Reader): Promise<number> =>
  (await rows.selectFrom('shop').select('id').execute()).length;

const reasonOf = (work: Promise<unknown>): Promise<unknown> =>
  work.then(
    () => 'nothing',
    (error: unknown) => (error instanceof StoreUnavailable ? error.reason : error),
  );

const urlOf = ({ place }: Records): string => {
  if (place.engine !== 'postgres') throw new Error('a server was wanted');
  return place.url;
};

/** The same records once more, over a line that can be cut. */
const throughLine = async (records: Records) => {
  const line = await cutProxy(urlOf(records));
  const store = await openStore({ engine: 'postgres', url: line.url }, { connections: 2 });
  onTestFinished(store.close);
  return { line, store };
};

it('says that a server that is not there is gone', async () => {
  const nobody = 'postgres://nobody@127.0.0.1:1/nothing';
  expect(await reasonOf(openStore({ engine: 'postgres', url: nobody }))).toBe('gone');
});

it('says that a database that is not there is gone', async () => {
  const url = new URL(urlOf(await newRecords('postgres')));
  url.pathname = '/no_such_records';
  expect(await reasonOf(openStore({ engine: 'postgres', url: url.toString() }))).toBe('gone');
});

it.each(['begin', 'insert into "shop"', 'update "shop"'])(
  'keeps nothing of a change that is cut off at its %s, and goes on afterwards',
  async (words) => {
    const records = await newRecords('postgres');
    const { line, store } = await throughLine(records);
    line.cutAt(words, 'before');
    expect(await reasonOf(twoSteps(store))).toBe('gone');
    expect(line.cuts()).toBe(1);
    expect(await shops(records.store.read)).toBe(0);
    await twoSteps(store);
    expect(await shops(records.store.read)).toBe(1);
  },
);

const twoSteps = (store: Store, id = 's1', repeatable = false) =>
  store.transact(
    async (tx) => {
      const there = await tx.selectFrom('shop').select('id').where('id', '=', id).execute();
      if (there.length > 0) return 'was there';
      await addShop(tx, id);
      await tx.updateTable('shop').set({ name: 'second step' }).where('id', '=', id).execute();
      return 'made';
    },
    { repeatable },
  );

it('says that it is gone when the acknowledgement is lost, whether or not it was kept', async () => {
  const records = await newRecords('postgres');
  const { line, store } = await throughLine(records);
  line.cutAt(COMMIT, 'before');
  expect(await reasonOf(twoSteps(store, 's1'))).toBe('gone');
  expect(await shops(records.store.read)).toBe(0);
  line.cutAt(COMMIT, 'after');
  expect(await reasonOf(twoSteps(store, 's2'))).toBe('gone');
  expect(await shops(records.store.read)).toBe(1);
});

it('asks again when it may, and finds what it had kept', async () => {
  const records = await newRecords('postgres');
  const { line, store } = await throughLine(records);
  line.cutAt(COMMIT, 'before');
  expect(await twoSteps(store, 's1', true)).toBe('made');
  line.cutAt(COMMIT, 'after');
  expect(await twoSteps(store, 's2', true)).toBe('was there');
  expect(line.cuts()).toBe(2);
  expect(await shops(records.store.read)).toBe(2);
});

it('outlives every connection being ended by the server, also one that is in use', async () => {
  const records = await newRecords('postgres');
  const { store } = records;
  await store.transact((tx) => addShop(tx, 's1'));
  const cut = store.transact(async (tx) => {
    await addShop(tx, 's2');
    await endConnections(records);
    await addShop(tx, 's3');
  });
  expect(await reasonOf(cut)).toBe('gone');
  await store.transact((tx) => addShop(tx, 's4'));
  expect(await shops(store.read)).toBe(2);
});

const endConnections = (records: Records) =>
  onServer(
    (client) =>
      client.query(
        `select pg_terminate_backend(pid) from pg_stat_activity
         where datname = current_database() and pid <> pg_backend_pid()`,
      ),
    urlOf(records),
  );

it('says that it is read-only, and still reads', async () => {
  const place = await newPlace('postgres');
  onTestFinished(place.remove);
  await (await openStore(place)).close();
  const url = place.engine === 'postgres' ? place.url : '';
  const name = new URL(url).pathname.slice(1);
  await onServer((client) =>
    client.query(`alter database ${name} set default_transaction_read_only = on`),
  );
  const store = await openStore(place);
  onTestFinished(store.close);
  expect(await reasonOf(store.transact((tx) => addShop(tx, 's1')))).toBe('readOnly');
  expect(await shops(store.read)).toBe(0);
});

it('says that it is full when the server has no room', async () => {
  // The code that PostgreSQL gives for a full disk (53100), raised by the server itself.
  const records = await newRecords('postgres', { fresh: true });
  await onServer(async (client) => {
    await client.query(`create function no_room() returns trigger language plpgsql as $$
      begin raise exception 'could not extend file' using errcode = '53100'; end $$`);
    await client.query(
      'create trigger no_room before insert on shop for each row execute function no_room()',
    );
  }, urlOf(records));
  expect(await reasonOf(records.store.transact((tx) => addShop(tx, 's1')))).toBe('full');
});

it('lets two changes that block each other both come through', async () => {
  const { store } = await newRecords('postgres');
  await store.transact(async (tx) => {
    await addShop(tx, 's1');
    await addShop(tx, 's2');
  });
  const rename = (first: string, second: string, name: string) =>
    store.transact(async (tx) => {
      for (const id of [first, second]) {
        await tx.updateTable('shop').set({ name }).where('id', '=', id).execute();
        await new Promise((resolve) => setTimeout(resolve, 50));
      }
    });
  await Promise.all([rename('s1', 's2', 'one way'), rename('s2', 's1', 'the other')]);
  const rows = await store.read.selectFrom('shop').select('name').execute();
  expect(new Set(rows.map(({ name }) => name)).size).toBe(1);
});

it('does not acknowledge before it has written, even where the server is set to', async () => {
  const records = await newRecords('postgres', { fresh: true });
  const name = new URL(urlOf(records)).pathname.slice(1);
  await onServer((client) => client.query(`alter database ${name} set synchronous_commit = off`));
  const store = await openStore(records.place);
  onTestFinished(store.close);
  const setting = await store.read
    .selectFrom('pg_settings' as never)
    .select('setting' as never)
    .where('name' as never, '=', 'synchronous_commit' as never)
    .execute();
  expect(setting).toEqual([{ setting: 'on' }]);
});
