/** People: the first is the owner, everybody else what they were named. */
import { describe, expect, it } from 'vitest';
import {
  findPerson,
  historyOf,
  listPeople,
  nameGroupRole,
  nameRole,
  type Role,
  removeGroup,
  removePerson,
  whoMay,
} from '../../../src/shop/index.ts';
import type { Engine } from '../../../src/store/index.ts';
import {
  good,
  newRecords,
  newShop,
  person,
  refusalOf,
  type TestShop,
} from '../../support/records.ts';

const shopOn = async (engine: Engine): Promise<TestShop> =>
  newShop((await newRecords(engine)).store);

/** What somebody may when they come in. */
const roleOf = (shop: TestShop, who: ReturnType<typeof person>): Promise<Role> =>
  shop.changeBy(who, (_, { role }) => Promise.resolve(role));

const idOf = (shop: TestShop, name: string): Promise<string> =>
  shop.changeBy(person(name), (_, entered) => Promise.resolve(entered.person.id));

export const people = (engine: Engine): void => {
  describe('people', () => {
    it('make the first of a new shop its owner and the next ones operators', async () => {
      const shop = await shopOn(engine);
      expect(await roleOf(shop, person('Ada'))).toBe('owner');
      expect(await roleOf(shop, person('Ben'))).toBe('operator');
      expect(await historyOf(shop.view, 'person')).toMatchObject([
        { verb: 'added', after: { name: 'Ada', role: 'owner' } },
      ]);
    });

    it('make one shop and one owner when many come first at the same moment', async () => {
      const { store } = await newRecords(engine);
      const shops = await Promise.all(
        Array.from({ length: 6 }, async (_, at) => {
          const { enterShop } = await import('../../../src/shop/index.ts');
          const { START, WORDS } = await import('../../support/records.ts');
          return await store.transact((tx) =>
            enterShop(
              tx,
              WORDS,
              { platform: 'terminal', id: 'new', name: 'New' },
              person(`P${at}`),
              START,
            ),
          );
        }),
      );
      expect(new Set(shops.map(({ change }) => change.id)).size).toBe(1);
      expect(shops.filter(({ role }) => role === 'owner')).toHaveLength(1);
      expect(shops.filter(({ isNew }) => isNew)).toHaveLength(1);
    });

    it('take whoever manages the server for the owner until somebody was named', async () => {
      const { store } = await newRecords(engine);
      const shop = await newShop(store, 'Managed');
      // A shop whose platform knows who manages it: its first person is nobody special.
      const { enterShop } = await import('../../../src/shop/index.ts');
      const { START, WORDS } = await import('../../support/records.ts');
      const enter = (name: string, manages: boolean) =>
        store.transact((tx) =>
          enterShop(
            tx,
            WORDS,
            { platform: 'discord', id: '42', name: 'Managed' },
            person(name, { manages }),
            START,
          ),
        );
      expect((await enter('Olga', false)).role).toBe('operator');
      expect((await enter('Max', true)).role).toBe('owner');
      await store.transact(async (tx) => {
        const who = { platform: 'discord', id: '42', name: 'Managed' };
        const { change } = await enterShop(tx, WORDS, who, person('Max', { manages: true }), START);
        good(await nameRole(change, 'olga', 'owner'));
      });
      expect((await enter('Max', true)).role).toBe('operator');
      expect((await enter('Olga', false)).role).toBe('owner');
      expect(await roleOf(shop, person('Olga'))).toBe('operator');
    });

    it('may what they were named, and what the groups they are in may', async () => {
      const shop = await shopOn(engine);
      const ben = await idOf(shop, 'Ben');
      await shop.change(async (change) => {
        good(await nameRole(change, ben, 'engineer'));
        good(await nameGroupRole(change, { outside: 'g1', name: 'Leads' }, 'supervisor'));
      });
      expect(await roleOf(shop, person('Ben'))).toBe('engineer');
      expect(await roleOf(shop, person('Ben', { groups: ['g0', 'g1'] }))).toBe('supervisor');
      expect(await whoMay(shop.view, 'engineer')).toEqual(['Ada', 'Ben', 'Leads']);
      expect(await whoMay(shop.view, 'supervisor')).toEqual(['Ada', 'Leads']);
      await shop.change(async (change) => good(await removeGroup(change, 'g1')));
      expect(await roleOf(shop, person('Ben', { groups: ['g1'] }))).toBe('engineer');
    });

    it('never lose the last owner, not even when two owners remove each other', async () => {
      const shop = await shopOn(engine);
      const ada = await idOf(shop, 'Ada');
      for (const attempt of [
        shop.change((change) => nameRole(change, ada, 'operator')),
        shop.change((change) => removePerson(change, ada)),
      ]) {
        expect(refusalOf(await attempt)).toEqual({ code: 'lastOwner', name: 'Ada' });
      }
      const ben = await idOf(shop, 'Ben');
      await shop.change(async (change) => good(await nameRole(change, ben, 'owner')));
      const both = await Promise.all([
        shop.changeBy(person('Ada'), (change) => removePerson(change, ben)),
        shop.changeBy(person('Ben'), (change) => removePerson(change, ada)),
      ]);
      expect(both.filter(({ ok }) => ok)).toHaveLength(1);
      expect(await whoMay(shop.view, 'owner')).toHaveLength(1);
    });

    it('are found by name; two of one name are a question', async () => {
      const shop = await shopOn(engine);
      await idOf(shop, 'Benjamin');
      expect(good(await findPerson(shop.view, 'BENJAMIN')).name).toBe('Benjamin');
      expect(refusalOf(await findPerson(shop.view, 'benjamyn'))).toEqual({
        code: 'notFound',
        what: 'person',
        nearest: ['Benjamin'],
      });
      await shop.changeBy(person('Benjamin', { id: 'other' }), () => Promise.resolve());
      expect(refusalOf(await findPerson(shop.view, 'Benjamin'))).toMatchObject({
        code: 'unclear',
        readings: [{ words: 'benjamin' }, { words: 'other' }],
      });
      expect(good(await findPerson(shop.view, 'other')).outside).toBe('other');
    });

    it('go by the name they have today', async () => {
      const shop = await shopOn(engine);
      await idOf(shop, 'Ben');
      await shop.changeBy(person('Benny', { id: 'ben' }), () => Promise.resolve());
      expect((await listPeople(shop.view)).map(({ name }) => name)).toEqual(['Ada', 'Benny']);
    });

    it('lose their role when they are removed, and come back as operators', async () => {
      const shop = await shopOn(engine);
      const ben = await idOf(shop, 'Ben');
      await shop.change(async (change) => {
        good(await nameRole(change, ben, 'supervisor'));
        good(await removePerson(change, ben));
      });
      expect((await listPeople(shop.view)).map(({ name }) => name)).toEqual(['Ada']);
      expect(await roleOf(shop, person('Ben'))).toBe('operator');
      expect(await idOf(shop, 'Ben')).toBe(ben);
    });
  });
};
