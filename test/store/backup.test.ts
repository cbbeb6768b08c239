/** Backups made while others write, read back into either engine, and refused when not whole. */
import fs from 'node:fs';
import path from 'node:path';
import { describe, expect, it, onTestFinished } from 'vitest';
import {
  BackupFault,
  backup,
  type Engine,
  enterTerms,
  MADE_TABLES,
  openStore,
  RecordsTooNew,
  restore,
  type Store,
  type StorePlace,
  TABLES,
} from '../../src/store/index.ts';
import { ENGINES, newFolder, newPlace } from '../support/places.ts';
import { newRecords, START } from '../support/records.ts';
import { wheelRow } from './contract.ts';

const fill = async (store: Store, wheels: number): Promise<void> => {
  await store.transact(async (tx) => {
    const shop = { id: 's1', platform: 'terminal', outside: 'one', name: 'Ümit’s\n"shop"' };
    await tx
      .insertInto('shop')
      .values({ ...shop, made_at: START })
      .execute();
    for (let at = 0; at < wheels; at += 1) {
      const row = { ...wheelRow(`w${at}`), face: at / 7, place: at % 3 === 0 ? null : 'drawer' };
      await tx.insertInto('wheel').values(row).execute();
    }
    const terms = ['#card', 'brass', 'knob'];
    const entry = {
      shop: 's1',
      id: 'card:1',
      kind: 'card',
      subject_id: '1',
      code: null,
      at: START,
    };
    await tx
      .insertInto('find_entry')
      .values({ ...entry, approved: 0, place: 7, terms: terms.join(' ') })
      .execute();
    await enterTerms(tx, [{ shop: 's1', place: 7, terms }]);
  });
};

/** Every row of every table. */
const everything = async (store: Store): Promise<Record<string, unknown>> => {
  const tables: Record<string, unknown> = {};
  for (const { name, key } of TABLES) {
    tables[name] = await store.read
      .selectFrom(name)
      .selectAll()
      .orderBy(key as never)
      .execute();
  }
  // What is made from others comes back with them.
  for (const name of MADE_TABLES) {
    const rows = await store.read.selectFrom(name).selectAll().execute();
    tables[name] = rows.map((row) => JSON.stringify(Object.entries(row).sort())).sort();
  }
  return tables;
};

const opened = async (place: StorePlace): Promise<Store> => {
  const store = await openStore(place);
  onTestFinished(store.close);
  return store;
};

const freshPlace = async (engine: Engine): Promise<StorePlace> => {
  const place = await newPlace(engine);
  onTestFinished(place.remove);
  return place;
};

const faultOf = (work: Promise<unknown>): Promise<unknown> =>
  work.then(
    () => 'nothing',
    (error: unknown) => (error instanceof BackupFault ? error.code : error),
  );

/** Which kinds of backup go where: a file's copy goes into a file only. */
const WAYS: readonly (readonly [from: Engine, name: string, to: Engine])[] = [
  ['sqlite', 'records.db', 'sqlite'],
  ['sqlite', 'records.jsonl', 'sqlite'],
  ['sqlite', 'records.jsonl', 'postgres'],
  ['postgres', 'records.jsonl', 'sqlite'],
  ['postgres', 'records.jsonl', 'postgres'],
];

describe.each(WAYS)('a backup from %s as %s', (from, name, to) => {
  it(`comes back into ${to} row by row`, async () => {
    const { store, place } = await newRecords(from);
    await fill(store, 600);
    const file = path.join(newFolder(), name);
    await backup(place, file);
    const target = await freshPlace(to);
    await restore(target, file);
    expect(await everything(await opened(target))).toEqual(await everything(store));
  });
});

describe.each(ENGINES)('a backup of %s', (engine) => {
  it('is of one moment, however much is written meanwhile', async () => {
    const { store, place } = await newRecords(engine);
    await fill(store, 300);
    const folder = newFolder();
    const until = new AbortController();
    const writer = (async () => {
      // Each change adds one wheel and counts it on another: a torn backup would show a difference.
      for (let at = 300; !until.signal.aborted; at += 1) {
        await store.transact(async (tx) => {
          await tx
            .insertInto('wheel')
            .values(wheelRow(`w${at}`))
            .execute();
          await tx
            .updateTable('wheel')
            .set((eb) => ({ parts_run: eb('parts_run', '+', 1) }))
            .where('id', '=', 'w0')
            .execute();
        });
        await new Promise((resolve) => setImmediate(resolve));
      }
    })();
    for (let round = 0; round < 3; round += 1) {
      await backup(place, path.join(folder, `${round}.jsonl`));
      if (engine === 'sqlite') await backup(place, path.join(folder, `${round}.db`));
    }
    until.abort();
    await writer;
    for (const name of fs.readdirSync(folder)) {
      const target = await freshPlace(name.endsWith('.db') ? 'sqlite' : engine);
      await restore(target, path.join(folder, name));
      const copy = await opened(target);
      const wheels = await copy.read.selectFrom('wheel').select(['id', 'parts_run']).execute();
      const counted = wheels.find(({ id }) => id === 'w0')?.parts_run;
      expect(wheels.length - 300).toBe(counted);
    }
  });

  it('is never written over another file, and leaves nothing half-made', async () => {
    const { store, place } = await newRecords(engine);
    await fill(store, 1);
    const folder = newFolder();
    const file = path.join(folder, 'old.jsonl');
    fs.writeFileSync(file, 'precious');
    expect(await faultOf(backup(place, file))).toBe('exists');
    expect(fs.readFileSync(file, 'utf8')).toBe('precious');
    expect(fs.readdirSync(folder)).toEqual(['old.jsonl']);
  });

  it('is refused when it is cut short at any line, and nothing is restored of it', async () => {
    const { store, place } = await newRecords(engine);
    await fill(store, 3);
    const file = path.join(newFolder(), 'records.jsonl');
    await backup(place, file);
    const lines = fs.readFileSync(file, 'utf8').trimEnd().split('\n');
    const target = await freshPlace(engine);
    for (let count = 0; count < lines.length; count += 1) {
      fs.writeFileSync(file, lines.slice(0, count).join('\n'));
      const wanted = count === 0 ? 'notABackup' : 'damaged';
      expect(await faultOf(restore(target, file))).toBe(wanted);
    }
    expect((await everything(await opened(target)))['shop']).toEqual([]);
  });

  it('is refused when a row is missing or it comes from a newer program', async () => {
    const { store, place } = await newRecords(engine);
    await fill(store, 3);
    const file = path.join(newFolder(), 'records.jsonl');
    await backup(place, file);
    const whole = fs.readFileSync(file, 'utf8');
    const target = await freshPlace(engine);
    fs.writeFileSync(file, whole.replace('"wheel":3', '"wheel":4'));
    expect(await faultOf(restore(target, file))).toBe('damaged');
    fs.writeFileSync(file, whole.replace(/"form":"[^"]+"/u, '"form":"9999-later"'));
    expect(await faultOf(restore(target, file))).toBeInstanceOf(RecordsTooNew);
    fs.writeFileSync(file, 'a shopping list');
    expect(await faultOf(restore(target, file))).toBe('damaged');
    expect(await faultOf(restore(target, `${file}.not-there`))).toBe('absent');
  });

  it('of an older form is read as it was written, then brought up', async () => {
    const file = path.join(newFolder(), 'old.jsonl');
    const shop = { id: 's1', platform: 'terminal', outside: 'one', name: 'One', made_at: START };
    const lines = [
      { wholetooth: 'records', form: '0001-shop-and-people' },
      { table: 'shop', rows: [shop] },
      { end: { shop: 1 } },
    ];
    fs.writeFileSync(file, lines.map((line) => JSON.stringify(line)).join('\n'));
    const target = await freshPlace(engine);
    await (await openStore(target)).close();
    await restore(target, file);
    const store = await opened(target);
    expect(await store.read.selectFrom('shop').selectAll().execute()).toEqual([shop]);
    expect(await store.read.selectFrom('card').selectAll().execute()).toEqual([]);
  });
});

describe('a restoration over records that are there', () => {
  it('sets a file aside, and both can be looked at', async () => {
    const before = await newRecords('sqlite');
    await fill(before.store, 5);
    const other = await newRecords('sqlite');
    await fill(other.store, 2);
    const file = path.join(newFolder(), 'records.db');
    await backup(other.place, file);
    await before.store.close();
    const { setAside } = await restore(before.place, file);
    const now = await opened(before.place);
    expect(((await everything(now))['wheel'] as unknown[]).length).toBe(2);
    const aside = await opened({ engine: 'sqlite', file: setAside ?? '' });
    expect(((await everything(aside))['wheel'] as unknown[]).length).toBe(5);
  });

  it('is refused while the program runs, and the program goes on', async () => {
    const running = await newRecords('sqlite');
    await fill(running.store, 5);
    const file = path.join(newFolder(), 'records.db');
    await backup(running.place, file);
    expect(await faultOf(restore(running.place, file))).toBe('inUse');
    await running.store.transact((tx) => tx.insertInto('wheel').values(wheelRow('new')).execute());
    expect(((await everything(running.store))['wheel'] as unknown[]).length).toBe(6);
  });

  it('takes damaged records out of the way', async () => {
    const source = await newRecords('sqlite');
    await fill(source.store, 2);
    const folder = newFolder();
    const file = path.join(folder, 'records.db');
    await backup(source.place, file);
    const damaged = path.join(folder, 'wholetooth.db');
    fs.writeFileSync(damaged, 'a shopping list');
    const { setAside } = await restore({ engine: 'sqlite', file: damaged }, file);
    expect(fs.readFileSync(setAside ?? '', 'utf8')).toBe('a shopping list');
    const store = await opened({ engine: 'sqlite', file: damaged });
    expect(((await everything(store))['wheel'] as unknown[]).length).toBe(2);
  });

  it('is refused by a server that holds shops, and by one that is given a file’s copy', async () => {
    const { store, place } = await newRecords('postgres');
    await fill(store, 2);
    const folder = newFolder();
    await backup(place, path.join(folder, 'records.jsonl'));
    expect(await faultOf(restore(place, path.join(folder, 'records.jsonl')))).toBe('notEmpty');
    const file = await newRecords('sqlite');
    await backup(file.place, path.join(folder, 'records.db'));
    expect(await faultOf(restore(place, path.join(folder, 'records.db')))).toBe('wrongEngine');
  });

  it('refuses a database that is not ours, and one with a page destroyed', async () => {
    const { store, place } = await newRecords('sqlite');
    await fill(store, 400);
    const file = path.join(newFolder(), 'records.db');
    await backup(place, file);
    const target = await freshPlace('sqlite');
    const content = fs.readFileSync(file);
    content.fill(0x5a, Math.floor(content.length / 2), Math.floor(content.length / 2) + 4096);
    fs.writeFileSync(file, content);
    expect(await faultOf(restore(target, file))).toBe('damaged');
    const { default: Database } = await import('better-sqlite3');
    const foreign = path.join(newFolder(), 'foreign.db');
    new Database(foreign).exec('create table recipes (name text)').close();
    expect(await faultOf(restore(target, foreign))).toBe('notABackup');
  });
});
