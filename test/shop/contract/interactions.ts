/** An interaction acts once, however often it comes. */
import { describe, expect, it } from 'vitest';
import {
  addTo,
  forgetAnswers,
  listOf,
  once,
  queueEffects,
  WHEELS,
} from '../../../src/shop/index.ts';
import { REPEATS_MS } from '../../../src/shop/interactions.ts';
import type { Engine, Store } from '../../../src/store/index.ts';
import { good, newRecords, newShop, START, type TestShop } from '../../support/records.ts';
import { STRAIGHT } from './samples.ts';

const effectKeys = async (store: Store): Promise<string[]> =>
  (await store.read.selectFrom('effect').select('key').execute()).map(({ key }) => key);

/** Adds a wheel and has it announced, and says which run it was that did so. */
const act = (shop: TestShop, interaction: string, run: number) =>
  shop.change((change) =>
    once(change, interaction, async () => {
      const { name } = good(await addTo(change, WHEELS, { ...STRAIGHT, name: `W ${interaction}` }));
      await queueEffects(change, [{ key: `${interaction}:post`, effect: { post: name } }]);
      return { run, name };
    }),
  );

export const interactions = (engine: Engine): void => {
  describe('interactions', () => {
    it('give the answer of the first again, and act no second time', async () => {
      const { store } = await newRecords(engine);
      const shop = await newShop(store);
      const first = await act(shop, 'i1', 1);
      const second = await act(shop, 'i1', 2);
      expect(first).toEqual({ first: true, answer: { run: 1, name: 'W i1' } });
      expect(second).toEqual({ first: false, answer: { run: 1, name: 'W i1' } });
      expect(await listOf(shop.view, WHEELS)).toHaveLength(1);
      expect(await effectKeys(store)).toEqual(['i1:post']);
    });

    it('act once when they come many times at the same moment', async () => {
      const { store } = await newRecords(engine);
      const shop = await newShop(store);
      const all = await Promise.all(Array.from({ length: 10 }, (_, run) => act(shop, 'i1', run)));
      expect(all.filter(({ first }) => first)).toHaveLength(1);
      expect(new Set(all.map(({ answer }) => answer.run)).size).toBe(1);
      expect(await listOf(shop.view, WHEELS)).toHaveLength(1);
    });

    it('can come again when the first time failed', async () => {
      const { store } = await newRecords(engine);
      const shop = await newShop(store);
      await expect(
        shop.change((change) =>
          once(change, 'i1', async () => {
            good(await addTo(change, WHEELS, STRAIGHT));
            throw new Error('half way');
          }),
        ),
      ).rejects.toThrow('half way');
      expect(await listOf(shop.view, WHEELS)).toEqual([]);
      expect(await act(shop, 'i1', 2)).toMatchObject({ first: true });
    });

    it('of one shop say nothing to another that names the same id', async () => {
      const { store } = await newRecords(engine);
      const [mine, other] = [await newShop(store, 'Mine'), await newShop(store, 'Other')];
      await act(mine, 'i1', 1);
      expect(await act(other, 'i1', 2)).toMatchObject({ first: true, answer: { run: 2 } });
    });

    it('are forgotten after half a year, what they did is not', async () => {
      const { store } = await newRecords(engine);
      const shop = await newShop(store);
      await act(shop, 'i1', 1);
      await forgetAnswers(store, START + REPEATS_MS);
      expect(await act(shop, 'i1', 2)).toMatchObject({ first: false });
      await forgetAnswers(store, START + REPEATS_MS + 1);
      expect(await store.read.selectFrom('interaction').selectAll().execute()).toEqual([]);
      expect(await listOf(shop.view, WHEELS)).toHaveLength(1);
    });
  });
};
