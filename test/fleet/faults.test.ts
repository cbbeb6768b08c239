/** Records that cannot be written or reached: the person's words come back, and nothing is half-done. */
import { randomUUID } from 'node:crypto';
import fs from 'node:fs';
import Database from 'better-sqlite3';
import { expect, it, onTestFinished } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import { type Answer, type Call, type Desk, openRecordsDesk } from '../../src/desk/index.ts';
import { openStore, type Store } from '../../src/store/index.ts';
import { cutProxy } from '../support/cutProxy.ts';
import { textOf } from '../support/desk.ts';
import { newPlace, onServer } from '../support/places.ts';
import { newRecords, START } from '../support/records.ts';
import { carded } from './strangers.ts';

const CRIB = 'name,form,pitch\nAsh,straight,21 tpi\nBeech,straight,25 tpi\n';

const callOf = (words: string, interactionId: string): Call => ({
  shop: 'Quillhaven',
  person: { id: 'oda', name: 'Oda' },
  place: { channel: 'floor', thread: null, isPrivate: false },
  interactionId,
  attached: words.includes('import') ? [{ name: 'crib.csv', text: CRIB }] : [],
  given: { words },
});

const deskOver = (store: Store): Desk =>
  openRecordsDesk(FLEET, store, { platform: 'terminal', program: 'test', now: () => START });

const asking =
  (desk: Desk) =>
  (words: string, id: string = randomUUID()): Promise<Answer> =>
    desk.answer(callOf(words, id));

/** What the examples of the verbs speak of. */
const SHOP = [
  '/shop people add Ben engineer',
  '/shop wheels add Old Faithful straight 21 tpi teeth 50 diameter 19 mm',
  '/shop machines add Big lathe speeds 60 90 140 rpm',
  '/shop materials add yellow bar as 1018 HB 150',
  '/shop rules add Guard down',
  '1.000 straight 21tpi 1018',
];

const repeatsWords = (answer: Answer, words: string): void => {
  expect(answer).toMatchObject({ refusal: { code: 'unavailable', what: 'records', words } });
  const said = textOf(answer, 2000);
  expect(said).toContain('Nothing was changed.');
  expect(said).toContain(words);
};

it('every verb, full at each of its statements in turn: the words come back and nothing is kept', async () => {
  const disk = { left: Number.POSITIVE_INFINITY };
  const { store, place } = await newRecords('sqlite', {
    watch: () => {
      disk.left -= 1;
      if (disk.left < 0) throw new Database.SqliteError('database or disk is full', 'SQLITE_FULL');
    },
  });
  const ask = asking(deskOver(store));
  for (const line of SHOP) await carded(ask, line);
  const file = place.engine === 'sqlite' ? place.file : '';
  const witness = new Database(file, { readonly: true });
  onTestFinished(() => void witness.close());
  /** Changes whenever anybody has kept anything. */
  const version = (): unknown => witness.pragma('data_version', { simple: true });
  let failures = 0;
  for (const { path, examples } of FLEET) {
    const words = examples[0] ?? `/${path.join(' ')}`;
    const id = randomUUID();
    for (let statements = 0; ; statements += 1) {
      const before = version();
      disk.left = statements;
      const answer = await ask(words, id);
      const wasEnough = disk.left >= 0;
      disk.left = Number.POSITIVE_INFINITY;
      // With room enough the same request is answered as if nothing had been.
      if (wasEnough) break;
      failures += 1;
      repeatsWords(answer, words);
      expect([words, statements, version()]).toEqual([words, statements, before]);
    }
  }
  expect(failures).toBeGreaterThan(FLEET.length * 5);
}, 240_000);

it('a file that is moved away in the middle of the day, and comes back', async () => {
  const { store, place } = await newRecords('sqlite');
  const ask = asking(deskOver(store));
  const file = place.engine === 'sqlite' ? place.file : '';
  for (const line of SHOP) await carded(ask, line);
  fs.renameSync(file, `${file}.elsewhere`);
  const line = '/shop wheels add Ash straight 21 tpi';
  repeatsWords(await ask(line), line);
  fs.renameSync(`${file}.elsewhere`, file);
  await carded(ask, line);
});

it('a server that may only be read', async () => {
  const place = await newPlace('postgres');
  onTestFinished(place.remove);
  const url = place.engine === 'postgres' ? place.url : '';
  const first = await openStore(place);
  for (const line of SHOP) await carded(asking(deskOver(first)), line);
  await first.close();
  const name = new URL(url).pathname.slice(1);
  await onServer((client) =>
    client.query(`alter database ${name} set default_transaction_read_only = on`),
  );
  const store = await openStore(place);
  onTestFinished(store.close);
  const line = '/shop wheels change Old Faithful worn';
  repeatsWords(await asking(deskOver(store))(line), line);
});

it('a server that has no room', async () => {
  const { store, place } = await newRecords('postgres', { fresh: true });
  const ask = asking(deskOver(store));
  for (const line of SHOP) await carded(ask, line);
  const url = place.engine === 'postgres' ? place.url : '';
  await onServer(async (client) => {
    await client.query(`create function no_room() returns trigger language plpgsql as $$
      begin raise exception 'could not extend file' using errcode = '53100'; end $$`);
    await client.query(
      'create trigger no_room before insert on history for each row execute function no_room()',
    );
  }, url);
  const line = '/shop wheels add Ash straight 21 tpi';
  repeatsWords(await ask(line), line);
  expect(textOf(await carded(ask, '/shop wheels'))).not.toContain('Ash');
});

it.each(['before', 'after'] as const)(
  'a server lost in the middle of a request, %s it has the change: asked again, it takes place once',
  async (when) => {
    const records = await newRecords('postgres');
    const { place } = records;
    const line = await cutProxy(place.engine === 'postgres' ? place.url : '');
    const store = await openStore({ engine: 'postgres', url: line.url }, { connections: 2 });
    onTestFinished(store.close);
    const ask = asking(deskOver(store));
    for (const each of SHOP) await carded(ask, each);
    line.cutAt('insert into "wheel"', when);
    const words = '/shop wheels add Ash straight 21 tpi';
    // The line is there again at once: the desk asks again by itself, and nobody notices.
    await carded(ask, words);
    expect(line.cuts()).toBe(1);
    expect(textOf(await carded(ask, '/shop wheels'))).toContain('2 wheels:');
  },
);

it('a server that is gone and stays gone', async () => {
  const records = await newRecords('postgres', { fresh: true });
  const { store, place } = records;
  const ask = asking(deskOver(store));
  for (const each of SHOP) await carded(ask, each);
  const name = new URL(place.engine === 'postgres' ? place.url : '').pathname.slice(1);
  await onServer(async (client) => {
    await client.query(`alter database ${name} allow_connections false`);
    await client.query(
      `select pg_terminate_backend(pid) from pg_stat_activity where datname = '${name}'`,
    );
  });
  const words = '/shop wheels add Ash straight 21 tpi';
  repeatsWords(await ask(words), words);
  await onServer((client) => client.query(`alter database ${name} allow_connections true`));
  await carded(ask, words);
});
