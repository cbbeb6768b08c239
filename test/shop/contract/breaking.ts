/**
 * Every change is broken at every step: its first call to the records fails, then its second, and
 * so on until none failed. Each time everything is as it was, to the row; then, whole, it is done.
 */
import { describe, expect, it } from 'vitest';
import {
  addRule,
  addTo,
  approveStandard,
  changeIn,
  changeSetting,
  confirmResult,
  correctResult,
  importSheet,
  keepCard,
  keysOf,
  logResult,
  MACHINES,
  nameGroupRole,
  nameRole,
  once,
  proposeStandard,
  queueEffects,
  removeFrom,
  removePerson,
  retireStandard,
  type ShopChange,
  saveStandard,
  WHEEL_SHEET,
  WHEELS,
  withdrawResult,
} from '../../../src/shop/index.ts';
import {
  type Engine,
  MADE_TABLES,
  type Store,
  StoreUnavailable,
  TABLES,
} from '../../../src/store/index.ts';
import { good, newRecords, newShop, person, type TestShop } from '../../support/records.ts';
import { grown, keptFor } from '../../support/results.ts';
import { requestOf } from '../../support/setupRequest.ts';
import { bringTo, draftOf } from '../../support/standards.ts';
import { CARD, LEFT, STRAIGHT, TURRET } from './samples.ts';

type Prepared = {
  readonly wheel: string;
  readonly ben: string;
  /** A result that is learned from, and one that waits. */
  readonly learned: string;
  readonly doubted: string;
  /** A card of a set-up. */
  readonly setup: string;
};
type Work = (change: ShopChange, prepared: Prepared) => Promise<unknown>;

const FILE = `name,form,pitch,parts run
Old Faithful,straight,21 tpi,7
New one,straight,25 tpi,
Not good,straight,,
Another,left helical,0.8 mm,3
`;

/** Each does several things, so that there is something to leave half done. */
const WORKS: Readonly<Record<string, Work>> = {
  add: async (change) => {
    good(await addTo(change, WHEELS, LEFT));
    good(await addTo(change, MACHINES, TURRET));
    good(await addRule(change, { text: 'Slowly', machine: null, material: null, base: null }));
  },
  change: async (change, { wheel }) => good(await changeIn(change, WHEELS, wheel, { partsRun: 1 })),
  remove: async (change, { wheel }) => {
    expect((await removeFrom(change, WHEELS, wheel)).ok).toBe(false);
    good(await removeFrom(change, WHEELS, wheel, { evenInUse: true }));
  },
  import: (change) =>
    importSheet(change, WHEELS, WHEEL_SHEET, FILE, { units: 'mm', replace: true }),
  card: (change, { wheel }) =>
    once(change, 'i1', async () => {
      const { code } = await keepCard(change, { ...CARD, wheel });
      await queueEffects(change, [
        { key: 'i1:post', effect: { post: code } },
        { key: 'i1:pin', effect: { pin: code }, after: 'i1:post' },
      ]);
      return { code };
    }),
  settings: async (change) => {
    good(await changeSetting(change, 'units', 'mm'));
    good(await changeSetting(change, 'questionHours', 8));
  },
  logging: async (change, { wheel }) => {
    const card = await keptFor(change, requestOf(), wheel);
    const said = { ...grown(0.9), partsRun: 40, cause: 'dullWheel', note: 'burr' } as const;
    good(await logResult(change, card, said));
  },
  correcting: async (change, { learned }) =>
    good(await correctResult(change, { id: learned }, { ...grown(0.88), partsRun: 3 })),
  withdrawing: async (change, { learned }) => good(await withdrawResult(change, { id: learned })),
  confirming: async (change, { doubted }) => good(await confirmResult(change, { id: doubted })),
  people: async (change, { ben }) => {
    good(await nameGroupRole(change, { outside: 'g', name: 'Leads' }, 'supervisor'));
    good(await nameRole(change, ben, 'owner'));
    good(await removePerson(change, change.by));
  },
};

/** What is done to a standard, with what is to be posted and pinned because of it. */
const STANDARD_WORKS: Readonly<Record<string, Work>> = {
  save: async (change, { setup }) =>
    good(await saveStandard(change, await draftOf(change, 'NEW-1', setup), 'save')),
  propose: async (change) =>
    good(await proposeStandard(change, { part: 'DRAFT-1', revision: null })),
  approve: (change) =>
    once(change, 'i1', async () => {
      const which = { part: 'WAITS-1', revision: 2, reviewMonths: null };
      const { standard, before } = good(await approveStandard(change, which));
      const keys = keysOf(standard.id, 2);
      const older = keysOf(standard.id, before?.number ?? 0);
      await queueEffects(change, [
        { key: keys.post, effect: { post: 2 } },
        { key: keys.pin, effect: { pin: 2 }, after: keys.post },
        { key: older.unpin, effect: { unpin: 1 }, after: older.pin },
      ]);
      return { part: standard.part };
    }),
  revise: async (change, { setup }) => {
    const draft = await draftOf(change, 'HOLDS-1', setup);
    good(await saveStandard(change, { ...draft, why: 'a cleaner crest' }, 'revise'));
  },
  retire: async (change) => {
    const which = { part: 'HOLDS-1', revision: null, why: 'no longer made' };
    good(await retireStandard(change, which));
  },
};

export const breaking = (engine: Engine): void => {
  describe('broken at every step', () => {
    it.each(Object.entries({ ...WORKS, ...STANDARD_WORKS }))(
      '%s is done whole or not at all',
      async (_, work) => {
        const fuse = newFuse(engine);
        const { store } = await newRecords(engine, { watch: fuse.watch });
        const shop = await newShop(store);
        const prepared = await prepare(shop);
        const before = await everything(store);
        const calls = await breakAll(fuse, store, before, () =>
          shop.change((change) => work(change, prepared)),
        );
        expect(await everything(store)).not.toEqual(before);
        // A change that makes fewer calls than this would not have been broken anywhere.
        expect(calls).toBeGreaterThan(5);
      },
    );
  });
};

const prepare = async (shop: TestShop): Promise<Prepared> => {
  const ben = await shop.changeBy(person('Ben'), (_, entered) =>
    Promise.resolve(entered.person.id),
  );
  return await shop.change(async (change) => {
    const { id: wheel } = good(await addTo(change, WHEELS, STRAIGHT));
    await keepCard(change, { ...CARD, wheel });
    const card = await keptFor(change, requestOf(), wheel);
    const { result: learned } = good(await logResult(change, card, grown(0.95)));
    const { result: doubted } = good(await logResult(change, card, grown(1.6)));
    const setup = card.id;
    await bringTo(change, 'DRAFT-1', 'draft', setup);
    await bringTo(change, 'HOLDS-1', 'approved', setup);
    const { standard } = await bringTo(change, 'WAITS-1', 'approved', setup);
    const { post, pin } = keysOf(standard.id, 1);
    await queueEffects(change, [
      { key: post, effect: { post: 1 } },
      { key: pin, effect: { pin: 1 }, after: post },
    ]);
    await bringTo(change, 'WAITS-1', 'proposed', setup);
    return { wheel, ben, learned: learned.id, doubted: doubted.id, setup };
  });
};

export const breakAll = async (
  fuse: Fuse,
  store: Store,
  before: unknown,
  change: () => Promise<unknown>,
): Promise<number> => {
  for (let n = 1; ; n += 1) {
    fuse.blowAt(n);
    const fault = await change().then(
      () => null,
      (error: unknown) => error,
    );
    if (!fuse.hasBlown()) {
      expect(fault).toBe(null);
      return n - 1;
    }
    expect(fault).toBeInstanceOf(StoreUnavailable);
    expect(await everything(store)).toEqual(before);
  }
};

type Fuse = {
  readonly watch: (statement: string) => void;
  readonly blowAt: (call: number) => void;
  readonly hasBlown: () => boolean;
};

/** Lets so many calls through and fails the next, as each engine's driver would. */
export const newFuse = (engine: Engine): Fuse => {
  let left = Number.POSITIVE_INFINITY;
  const code = engine === 'sqlite' ? 'SQLITE_IOERR_WRITE' : 'ECONNRESET';
  return {
    watch: () => {
      left -= 1;
      if (left === 0) throw Object.assign(new Error('disk I/O error'), { code });
    },
    blowAt: (call) => {
      left = call;
    },
    hasBlown: () => {
      const blown = left <= 0;
      left = Number.POSITIVE_INFINITY;
      return blown;
    },
  };
};

const said = (row: unknown): string => JSON.stringify(row);

/** Every row of every table. */
export const everything = async (store: Store): Promise<unknown> => {
  const tables: Record<string, unknown> = {};
  for (const { name, key } of TABLES) {
    tables[name] = await store.read
      .selectFrom(name)
      .selectAll()
      .orderBy(key as never)
      .execute();
  }
  for (const name of MADE_TABLES) {
    tables[name] = (await store.read.selectFrom(name).selectAll().execute()).map(said).sort();
  }
  return tables;
};
