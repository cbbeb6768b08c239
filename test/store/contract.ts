/** What the records promise, whichever engine keeps them. */
import fc from 'fast-check';
import { describe, expect, it, onTestFinished } from 'vitest';
import {
  type Engine,
  MADE_TABLES,
  migrate,
  openStore,
  type Store,
  StoreUnavailable,
  TABLES,
  type Tables,
} from '../../src/store/index.ts';
import { newPlace } from '../support/places.ts';
import { newRecords, START } from '../support/records.ts';

const SHOP: Tables['shop'] = {
  id: 's1',
  platform: 'terminal',
  outside: 'one',
  name: 'One',
  made_at: START,
};

const addShop = (store: Store, id = 's1') =>
  store.transact((tx) =>
    tx
      .insertInto('shop')
      .values({ ...SHOP, id, outside: id })
      .execute(),
  );

const shopIds = async (store: Store): Promise<string[]> =>
  (await store.read.selectFrom('shop').select('id').orderBy('id').execute()).map(({ id }) => id);

export const storeContract = (engine: Engine): void => {
  describe(`the records in ${engine}`, () => {
    values(engine);
    changes(engine);
    form(engine);
  });
};

const values = (engine: Engine): void => {
  it('gives back every number and text as it was given', async () => {
    const { store } = await newRecords(engine);
    await addShop(store);
    let count = 0;
    // Zero has no sign in the records: one engine drops it.
    const real = fc.double({ noNaN: true, noDefaultInfinity: true }).map((value) => value + 0);
    const whole = fc.maxSafeInteger();
    const text = fc.string({ unit: 'grapheme' }).map((said) => said.replaceAll('\0', ''));
    const property = fc.asyncProperty(real, whole, text, async (face, parts, place) => {
      count += 1;
      const row = {
        ...wheelRow(`w${count}`),
        face: face === 0 ? 0 : face,
        parts_run: parts,
        place,
      };
      await store.transact((tx) => tx.insertInto('wheel').values(row).execute());
      const back = await store.read
        .selectFrom('wheel')
        .selectAll()
        .where('id', '=', row.id)
        .executeTakeFirstOrThrow();
      expect(back).toEqual(row);
    });
    await fc.assert(property, { numRuns: 60 });
  });

  it('counts in numbers, not in words', async () => {
    const { store } = await newRecords(engine);
    await addShop(store);
    const row = await store.read
      .selectFrom('shop')
      .select((eb) => [eb.fn.countAll().as('count'), eb.fn.sum('made_at').as('sum')])
      .executeTakeFirstOrThrow();
    expect(row).toEqual({ count: 1, sum: START });
  });

  it('sorts names byte by byte, whatever language the server speaks', async () => {
    const { store } = await newRecords(engine);
    await addShop(store);
    const names = ['Zug', 'zug', 'ärger', 'apfel', 'a b', 'ab', 'a-b', 'A', '10', '9', 'ﬁ', '🔧'];
    await store.transact((tx) =>
      tx
        .insertInto('wheel')
        .values(names.map((name, at) => ({ ...wheelRow(`w${at}`), name, name_key: name })))
        .execute(),
    );
    const sorted = await store.read
      .selectFrom('wheel')
      .select('name')
      .orderBy('name_key')
      .execute();
    const byBytes = [...names].sort((a, b) => Buffer.compare(Buffer.from(a), Buffer.from(b)));
    expect(sorted.map(({ name }) => name)).toEqual(byBytes);
  });

  it('keeps a whole number whole: half a tooth is refused by the column itself', async () => {
    const { store } = await newRecords(engine);
    await addShop(store);
    const half = { ...wheelRow('w1'), teeth: 62.5 };
    await expect(
      store.transact((tx) => tx.insertInto('wheel').values(half).execute()),
    ).rejects.toThrow();
  });
};

const changes = (engine: Engine): void => {
  it('keeps a change whole or not at all', async () => {
    const { store } = await newRecords(engine);
    await expect(
      store.transact(async (tx) => {
        await tx.insertInto('shop').values(SHOP).execute();
        throw new Error('half way');
      }),
    ).rejects.toThrow('half way');
    expect(await shopIds(store)).toEqual([]);
    await addShop(store);
    expect(await shopIds(store)).toEqual(['s1']);
  });

  it('shows nobody a change before it is whole', async () => {
    const { store } = await newRecords(engine);
    await store.transact(async (tx) => {
      await tx.insertInto('shop').values(SHOP).execute();
      expect(await shopIds(store)).toEqual([]);
      const inside = await tx.selectFrom('shop').select('id').execute();
      expect(inside).toEqual([{ id: 's1' }]);
    });
    expect(await shopIds(store)).toEqual(['s1']);
  });

  it('loses none of many changes made at once', async () => {
    const { store } = await newRecords(engine);
    await addShop(store);
    await store.transact((tx) => tx.insertInto('wheel').values(wheelRow('w1')).execute());
    const more = () =>
      store.transact((tx) =>
        tx
          .updateTable('wheel')
          .set((eb) => ({ parts_run: eb('parts_run', '+', 1) }))
          .where('id', '=', 'w1')
          .execute(),
      );
    await Promise.all(Array.from({ length: 50 }, more));
    const { parts_run } = await store.read
      .selectFrom('wheel')
      .select('parts_run')
      .executeTakeFirstOrThrow();
    expect(parts_run).toBe(50);
  });

  it('makes a change again that met another one', async () => {
    const { store } = await newRecords(engine);
    await addShop(store, 's1');
    let runs = 0;
    // The first run does as if it had not seen the other; the second looks.
    const id = await store.transact(async (tx) => {
      runs += 1;
      const wanted = runs === 1 ? 's1' : 's2';
      await tx
        .insertInto('shop')
        .values({ ...SHOP, id: wanted, outside: wanted })
        .execute();
      return wanted;
    });
    expect([id, runs]).toEqual(['s2', 2]);
    expect(await shopIds(store)).toEqual(['s1', 's2']);
  });

  it('refuses a change inside a change instead of waiting for ever', async () => {
    const { store } = await newRecords(engine);
    await expect(store.transact(() => addShop(store))).rejects.toThrow(/inside a change/u);
    await addShop(store);
    expect(await shopIds(store)).toEqual(['s1']);
  });

  it('keeps a view still while others change what is there', async () => {
    const { store } = await newRecords(engine);
    await addShop(store, 's1');
    const seen = await store.snapshot(async (view) => {
      const before = await view.selectFrom('shop').select('id').execute();
      await addShop(store, 's2');
      const after = await view.selectFrom('shop').select('id').execute();
      return [before.length, after.length];
    });
    expect(seen).toEqual([1, 1]);
    expect(await shopIds(store)).toEqual(['s1', 's2']);
  });

  it('never lets a row refer to what another shop has', async () => {
    const { store } = await newRecords(engine);
    await addShop(store, 's1');
    await addShop(store, 's2');
    await store.transact((tx) => tx.insertInto('machine').values(machineRow('m1', 's1')).execute());
    const rule = { ...listed('r1', 's2'), text: 'x', machine: 'm1', material: null, base: null };
    await expect(
      store.transact((tx) => tx.insertInto('rule').values(rule).execute()),
    ).rejects.toThrow();
  });

  it('says that it is gone once it was closed', async () => {
    const place = await newPlace(engine);
    onTestFinished(place.remove);
    const store = await openStore(place);
    await store.close();
    await expect(addShop(store)).rejects.toThrow();
  });
};

const form = (engine: Engine): void => {
  it('is brought to its form once, however many start at the same time', async () => {
    const place = await newPlace(engine);
    onTestFinished(place.remove);
    const stores = await Promise.all(Array.from({ length: 4 }, () => openStore(place)));
    await Promise.all(stores.map((store, at) => addShop(store, `s${at}`)));
    for (const store of stores) expect(await shopIds(store)).toEqual(['s0', 's1', 's2', 's3']);
    await Promise.all(stores.map((store) => store.close()));
    expect(await migrate(place)).toEqual([]);
  });

  it('is refused when a newer program has written it, and left alone', async () => {
    const { store, place } = await newRecords(engine, { fresh: true });
    await addShop(store);
    const newer = { name: '9999-from-the-future', timestamp: '2031-01-01T00:00:00.000Z' };
    await store.transact((tx) =>
      tx
        .insertInto('form_step' as never)
        .values(newer as never)
        .execute(),
    );
    await expect(openStore(place)).rejects.toThrow(
      /newer Wholetooth.*9999-from-the-future.*Start the newer program/su,
    );
    expect(await shopIds(store)).toEqual(['s1']);
  });

  it('has every table in the list that backups and exports go by', async () => {
    const { store } = await newRecords(engine);
    const listed: readonly string[] = [...TABLES.map(({ name }) => name), ...MADE_TABLES].sort();
    expect(await tablesOf(store, engine)).toEqual(listed);
    for (const { name, shop, key, json } of TABLES) {
      const columns = await columnsOf(store, engine, name);
      expect(columns).toEqual(expect.arrayContaining([shop, key, ...json]));
    }
  });

  it('is a fault of ours, never the driver’s, that a caller sees', async () => {
    const { store } = await newRecords(engine, {
      watch: (statement) => {
        if (statement.includes('insert into "shop"')) throw busy(engine);
      },
      waitMs: 50,
    });
    const fault: unknown = await addShop(store).catch((error: unknown) => error);
    expect(fault).toBeInstanceOf(StoreUnavailable);
    expect(fault).toMatchObject({ reason: 'busy' });
    expect((fault as Error).message).not.toMatch(/sqlite|postgres|lock/iu);
  });
};

/** What each driver says of a lock. */
const busy = (engine: Engine): Error =>
  Object.assign(new Error('database is locked'), {
    code: engine === 'sqlite' ? 'SQLITE_BUSY' : '55P03',
  });

const FORM_TABLES = ['form_step', 'form_lock'];

/** Asked of the engine itself. */
const tablesOf = async (store: Store, engine: Engine): Promise<string[]> => {
  const rows = (await (engine === 'sqlite'
    ? store.read
        .selectFrom('sqlite_master' as never)
        .select('name' as never)
        .where('type' as never, '=', 'table' as never)
        .where('name' as never, 'not like', 'sqlite_%' as never)
        .execute()
    : store.read
        .selectFrom('information_schema.tables' as never)
        .select('table_name as name' as never)
        .where('table_schema' as never, '=', 'public' as never)
        .execute())) as { name: string }[];
  return rows
    .map(({ name }) => name)
    .filter((name) => !FORM_TABLES.includes(name))
    .sort();
};

const columnsOf = async (store: Store, engine: Engine, table: string): Promise<string[]> => {
  const rows = (await (engine === 'sqlite'
    ? store.read
        .selectFrom(`pragma_table_info` as never)
        .select('name' as never)
        .where('arg' as never, '=', table as never)
        .execute()
    : store.read
        .selectFrom('information_schema.columns' as never)
        .select('column_name as name' as never)
        .where('table_name' as never, '=', table as never)
        .execute())) as { name: string }[];
  return rows.map(({ name }) => name);
};

export const listed = (id: string, shop = 's1') => ({
  shop,
  id,
  name: id,
  name_key: id,
  version: 1,
  made_at: START,
  made_by: 'p1',
  changed_at: START,
  changed_by: 'p1',
  removed_at: null,
  removed_by: null,
});

const machineRow = (id: string, shop: string): Tables['machine'] => ({
  ...listed(id, shop),
  speeds: null,
  feeds: null,
  dial: 'diameter',
  units: null,
  largest_diameter: null,
  turning_spread: null,
  top_speed: null,
  power: null,
});

export const wheelRow = (id: string, shop = 's1'): Tables['wheel'] => ({
  ...listed(id, shop),
  kind: 'straight',
  pitch_system: 'tpi',
  pitch_value: 21,
  along_rim: 0,
  proven: null,
  teeth: null,
  diameter: null,
  face: null,
  bore: null,
  bevel: null,
  included: null,
  helix: null,
  tooth_depth: null,
  edge: null,
  pin_diameter: null,
  pin_material: null,
  place: null,
  parts_run: 0,
  state: 'good',
});
