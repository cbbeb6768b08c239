/**
 * Acts on the interactions it is told of, one by one, at the moment it is told, and says what
 * answer it got. Two of these get the same interactions at the same time.
 */
import { addTo, enterShop, once, queueEffects, WHEELS } from '../../src/shop/index.ts';
import { openStore, type StorePlace } from '../../src/store/index.ts';
import { STRAIGHT } from '../shop/contract/samples.ts';
import { WORDS } from '../support/words.ts';

const { place, name } = JSON.parse(process.argv[2] ?? '') as { place: StorePlace; name: string };
const store = await openStore(place, { connections: 2 });

const act = (interaction: string) =>
  store.transact(async (tx) => {
    const shop = { platform: 'terminal', id: 'twice', name: 'Twice' };
    const who = { id: 'kim', name: 'Kim', groups: [], manages: null };
    const { change } = await enterShop(tx, WORDS, shop, who, Date.now());
    return await once(change, interaction, async () => {
      const wheel = { ...STRAIGHT, name: `wheel ${interaction}` };
      const { ok } = await addTo(change, WHEELS, wheel);
      await queueEffects(change, [
        { key: `${interaction} ${name}`, effect: { post: interaction } },
      ]);
      return { by: name, ok };
    });
  });

process.on('message', (interaction: string) => {
  void act(interaction).then(
    (acted) => process.send?.({ interaction, ...acted }),
    (error: unknown) => process.send?.({ interaction, fault: String(error) }),
  );
});
process.on('disconnect', () => {
  void store.close();
});
process.send?.('ready');
