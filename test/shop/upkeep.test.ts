/** What is put away by itself: answers that nobody will ask for again, and nothing else. */
import { expect, test } from 'vitest';
import { once } from '../../src/shop/index.ts';
import { REPEATS_MS } from '../../src/shop/interactions.ts';
import { startUpkeep } from '../../src/upkeep.ts';
import { newRecords, newShop, person, START } from '../support/records.ts';

test('old answers go at the start and as time goes on; younger ones and cards stay', async () => {
  const { store } = await newRecords('sqlite');
  const shop = await newShop(store);
  const DAY = 24 * 3_600_000;
  for (const [id, at] of [
    ['old', START],
    ['younger', START + DAY],
    ['new', START + 2 * DAY],
  ] as const)
    await shop.changeBy(
      person('Ada'),
      (change) => once(change, id, () => Promise.resolve({ said: id })),
      at,
    );
  const kept = async (): Promise<readonly string[]> =>
    (await store.read.selectFrom('interaction').select('id').orderBy('id').execute()).map(
      ({ id }) => id,
    );
  let now = START + REPEATS_MS + 1;
  const faults: unknown[] = [];
  const upkeep = startUpkeep(store, {
    now: () => now,
    onFault: (error) => faults.push(error),
    everyMs: 10,
  });
  await expect.poll(kept).toEqual(['new', 'younger']);
  now += DAY;
  await expect.poll(kept).toEqual(['new']);
  await upkeep.stop();
  now += 10 * DAY;
  await new Promise((done) => setTimeout(done, 50));
  expect(await kept()).toEqual(['new']);
  expect(faults).toEqual([]);
});
