import { enterShop, type ForFind, type ShopView, viewShop } from '../../../src/shop/index.ts';
import { openStore, type Store, type StorePlace } from '../../../src/store/index.ts';
import { WORDS } from '../words.ts';
import { ASKED, EVERY_MS, told } from './index.ts';
import { loadEntries } from './load.ts';

const FROM = Date.UTC(2021, 0, 4, 6);

/** The id of what the question of this place in the list is asked for. */
export const wantedId = (at: number): string => `wanted-${String(at)}`;

/** So many entries, and among them, spread over all the years, what will be asked for. */
export const toldEntries = (count: number): readonly ForFind[] => {
  const entries: ForFind[] = [];
  for (const entry of told(FROM)) {
    if (entries.length === count) break;
    entries.push(entry);
  }
  const wanted = ASKED.map(([text], at): ForFind => {
    const after = Math.floor(((at + 0.5) / ASKED.length) * count);
    const id = wantedId(at);
    const moment = FROM + after * EVERY_MS + 1;
    return { kind: 'question', id, code: null, at: moment, approved: false, texts: [text] };
  });
  return [...entries, ...wanted];
};

/** A shop that was told so much. */
export const toldShop = async (
  place: StorePlace,
  count: number,
): Promise<{ readonly store: Store; readonly view: ShopView }> => {
  const store = await openStore(place);
  const outside = { platform: 'terminal', id: 'Brass Lane', name: 'Brass Lane' };
  const ada = { id: 'ada', name: 'Ada', groups: [], manages: null };
  const id = await store.transact(
    async (tx) => (await enterShop(tx, WORDS, outside, ada, FROM)).change.id,
  );
  await loadEntries(place, id, toldEntries(count));
  return { store, view: viewShop(store.read, id, WORDS) };
};
