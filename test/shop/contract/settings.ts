/** Settings and rules: what the shop has decided for itself. */
import { describe, expect, it } from 'vitest';
import { mm } from '../../../src/calc/index.ts';
import {
  addRule,
  addTo,
  changeSetting,
  historyOf,
  listOf,
  MACHINES,
  RULES,
  removeFrom,
  rulesOnCard,
  type Settings,
  settingsOf,
} from '../../../src/shop/index.ts';
import type { Engine } from '../../../src/store/index.ts';
import { good, newRecords, newShop, refusalOf } from '../../support/records.ts';
import { ENGINE_LATHE, TURRET } from './samples.ts';

const ALL = { machine: null, material: null, base: null };

export const settings = (engine: Engine): void => {
  describe('settings', () => {
    it('are the usual ones until something is set, and what was set is remembered', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const usual = await settingsOf(shop.view);
      expect(usual).toMatchObject({ units: 'in', language: 'en', timeZone: 'UTC' });
      await shop.change(async (change) => {
        good(await changeSetting(change, 'units', 'mm'));
        good(await changeSetting(change, 'timeZone', 'Europe/Berlin'));
        good(await changeSetting(change, 'standardsChannel', 'C123'));
      });
      const wanted: Settings = {
        ...usual,
        units: 'mm',
        timeZone: 'Europe/Berlin',
        standardsChannel: 'C123',
      };
      expect(await settingsOf(shop.view)).toEqual(wanted);
      await shop.change(async (change) => good(await changeSetting(change, 'units', 'in')));
      expect((await settingsOf(shop.view)).units).toBe('in');
      expect(await historyOf(shop.view, 'setting', { id: 'units' })).toMatchObject([
        { before: 'mm', after: 'in' },
        { before: 'in', after: 'mm' },
      ]);
    });

    it('are not set to what makes no sense', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const zone = await shop.change((c) => changeSetting(c, 'timeZone', 'Europe/Berlim'));
      expect(refusalOf(zone)).toEqual({
        code: 'notFound',
        what: 'timeZone',
        nearest: ['Europe/Berlin'],
      });
      const hours = await shop.change((c) => changeSetting(c, 'questionHours', 0));
      expect(refusalOf(hours)).toMatchObject({ code: 'outOfRange', what: 'questionHours' });
      expect(await historyOf(shop.view, 'setting')).toEqual([]);
    });
  });

  describe('rules', () => {
    it('stand on the cards they are for, in the order of their numbers', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const machine = await shop.change(async (change) => {
        const { id } = good(await addTo(change, MACHINES, ENGINE_LATHE));
        good(await addRule(change, { ...ALL, text: 'Coolant on first' }));
        good(await addRule(change, { ...ALL, text: 'Tailstock always', machine: id }));
        good(await addRule(change, { ...ALL, text: 'Carbide pin', base: 'ss304' }));
        return id;
      });
      expect(await rulesOnCard(shop.view, ALL)).toEqual(['Coolant on first']);
      expect(await rulesOnCard(shop.view, { machine, material: null, base: 'ss304' })).toEqual([
        'Coolant on first',
        'Tailstock always',
        'Carbide pin',
      ]);
      expect((await listOf(shop.view, RULES)).map(({ name }) => name)).toEqual(['1', '2', '3']);
    });

    it('are numbered without a gap being filled, however many are added at once', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const add = (text: string) => shop.change((change) => addRule(change, { ...ALL, text }));
      const added = await Promise.all(['a', 'b', 'c', 'd'].map(add));
      expect(added.map((rule) => good(rule).name).sort()).toEqual(['1', '2', '3', '4']);
      const last = added.map(good).find(({ name }) => name === '4');
      await shop.change(async (change) => good(await removeFrom(change, RULES, last?.id ?? '')));
      expect(good(await add('e')).name).toBe('5');
    });

    it('are not made for what the shop does not have', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const wrong = { ...ALL, text: 'Never', machine: 'no such' };
      const result = await shop.change((change) => addRule(change, wrong));
      expect(refusalOf(result)).toEqual({ code: 'notFound', what: 'machine', nearest: [] });
      const long = { ...ALL, text: 'x'.repeat(501) };
      const tooLong = await shop.change((change) => addRule(change, long));
      expect(refusalOf(tooLong)).toMatchObject({ what: 'rule', value: 501, max: 500 });
    });

    it('are named before the machine they are for is removed', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const id = await shop.change(async (change) => {
        const machine = good(await addTo(change, MACHINES, TURRET));
        good(await addRule(change, { ...ALL, text: 'Slowly', machine: machine.id }));
        return machine.id;
      });
      const refused = await shop.change((change) => removeFrom(change, MACHINES, id));
      expect(refusalOf(refused)).toMatchObject({
        code: 'inUse',
        where: [{ what: 'rule', name: '1' }],
      });
      expect((await listOf(shop.view, MACHINES))[0]?.largestDiameter ?? mm(0)).toBe(0);
    });
  });
};
