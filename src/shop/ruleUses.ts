import type { Use } from '../refusal.ts';
import type { ShopView } from './view.ts';

/** The rules that hold for one machine or one material of the shop. */
export const rulesFor = async (
  view: ShopView,
  what: 'machine' | 'material',
  id: string,
  most: number,
): Promise<readonly Use[]> => {
  const rules = await view.db
    .selectFrom('rule')
    .select('name')
    .where('shop', '=', view.id)
    .where(what, '=', id)
    .where('removed_at', 'is', null)
    .orderBy('name_key')
    .limit(most)
    .execute();
  return rules.map(({ name }) => ({ what: 'rule', name }));
};
