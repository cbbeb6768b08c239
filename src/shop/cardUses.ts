import type { Use } from '../refusal.ts';
import type { ShopView } from './view.ts';

/** The newest cards that were made with something of the shop's lists. */
export const cardsUsing = async (
  view: ShopView,
  what: 'wheel' | 'machine' | 'material',
  id: string,
  most: number,
): Promise<readonly Use[]> => {
  const cards = await view.db
    .selectFrom('card')
    .select('code')
    .where('shop', '=', view.id)
    .where(what, '=', id)
    .orderBy('id', 'desc')
    .limit(most)
    .execute();
  return cards.map(({ code }) => ({ what: 'card', name: code }));
};
