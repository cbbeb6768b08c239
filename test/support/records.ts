/** Stores and shops to test with: real engines, invented shops. */
import { onTestFinished } from 'vitest';
import {
  type Entered,
  enterShop,
  type PersonOutside,
  type ShopChange,
  type ShopView,
  viewShop,
} from '../../src/shop/index.ts';
import { type Engine, openStore, type Store, type StoreOptions } from '../../src/store/index.ts';
import { emptyPlace, newPlace, type TestPlace } from './places.ts';
import { WORDS } from './words.ts';

export { WORDS } from './words.ts';

/** A Monday morning. */
export const START = Date.UTC(2025, 0, 6, 7, 0);

export type Records = { readonly store: Store; readonly place: TestPlace };

/** Empty records of their own, gone when the test is over. */
export const newRecords = async (
  engine: Engine,
  options: StoreOptions & { readonly fresh?: boolean } = {},
): Promise<Records> => {
  const place = await (options.fresh === true ? newPlace(engine) : emptyPlace(engine));
  const store = await openStore(place, { connections: 4, ...options });
  onTestFinished(async () => {
    await store.close();
    await place.remove();
  });
  return { store, place };
};

export const person = (name: string, more: Partial<PersonOutside> = {}): PersonOutside => ({
  id: name.toLowerCase(),
  name,
  groups: [],
  manages: null,
  ...more,
});

/** A shop that one person has just come into; the first is its owner. */
export type TestShop = {
  readonly id: string;
  readonly outside: string;
  readonly view: ShopView;
  /** One change by the first person, or by whoever is named. */
  readonly change: <T>(work: (change: ShopChange, entered: Entered) => Promise<T>) => Promise<T>;
  readonly changeBy: <T>(
    who: PersonOutside,
    work: (change: ShopChange, entered: Entered) => Promise<T>,
    at?: number,
  ) => Promise<T>;
};

export const newShop = async (store: Store, name = 'Brass Lane Works'): Promise<TestShop> => {
  const outside = { platform: 'terminal', id: name, name };
  const changeBy: TestShop['changeBy'] = (who, work, at = START) =>
    store.transact(async (tx) => {
      const entered = await enterShop(tx, WORDS, outside, who, at);
      return await work(entered.change, entered);
    });
  const first = person('Ada');
  const id = await changeBy(first, (change) => Promise.resolve(change.id));
  return {
    id,
    outside: name,
    view: viewShop(store.read, id, WORDS),
    changeBy,
    change: (work) => changeBy(first, work),
  };
};

/** The value of a result that has to be good. */
export const good = <T>(result: { ok: true; value: T } | { ok: false; refusal: unknown }): T => {
  if (!result.ok) throw new Error(`refused: ${JSON.stringify(result.refusal)}`);
  return result.value;
};

/** The refusal of a result that has to be refused. */
export const refusalOf = (result: { ok: true } | { ok: false; refusal: unknown }): unknown => {
  if (result.ok) throw new Error('was not refused');
  return result.refusal;
};
