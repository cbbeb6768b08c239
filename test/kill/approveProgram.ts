/**
 * Approves the proposed standards it is told of, one by one, at the moment it is told, and says
 * what it was answered. Two of these are told of the same ones at the same time.
 */
import { approveStandard, enterShop, keysOf, queueEffects } from '../../src/shop/index.ts';
import { openStore, type StorePlace } from '../../src/store/index.ts';
import { WORDS } from '../support/words.ts';

const { place, name } = JSON.parse(process.argv[2] ?? '') as { place: StorePlace; name: string };
const store = await openStore(place, { connections: 2 });

const approve = (part: string) =>
  store.transact(async (tx) => {
    const shop = { platform: 'terminal', id: 'twice', name: 'Twice' };
    const who = { id: name, name, groups: [], manages: null };
    const { change } = await enterShop(tx, WORDS, shop, who, Date.now());
    const result = await approveStandard(change, { part, revision: 1, reviewMonths: null });
    if (!result.ok) return { refusal: result.refusal };
    const { post } = keysOf(result.value.standard.id, 1);
    await queueEffects(change, [{ key: post, effect: { post: part } }]);
    return { refusal: null };
  });

process.on('message', (part: string) => {
  void approve(part).then(
    (answer) => process.send?.(answer),
    (error: unknown) => process.send?.({ fault: String(error) }),
  );
});
process.on('disconnect', () => {
  void store.close();
});
process.send?.('ready');
