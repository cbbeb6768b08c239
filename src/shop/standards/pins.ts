import { literally } from '../../store/index.ts';
import type { ShopView } from '../view.ts';
import { keysOf } from './keys.ts';

export type Pinned = { readonly part: string; readonly revision: number; readonly at: number };

/** Pins that are named where there may be no room for one more. Judgement: enough to choose from. */
const PINS_NAMED = 3;
/** Approved standards looked through for their pins. Judgement: more than a channel can pin. */
const MOST_LOOKED = 300;

/** The standards of this shop whose pins have stood longest; the platform's pins are a mirror. */
export const oldestPins = async (
  view: Pick<ShopView, 'id' | 'db'>,
  most = PINS_NAMED,
): Promise<readonly Pinned[]> => {
  const rows = await view.db
    .selectFrom('standard_revision')
    .innerJoin('standard', (join) =>
      join
        .onRef('standard.shop', '=', 'standard_revision.shop')
        .onRef('standard.id', '=', 'standard_revision.standard'),
    )
    .select(['standard.id', 'standard.part', 'standard_revision.number'])
    .select('standard_revision.approved_at')
    .where('standard_revision.shop', '=', view.id)
    .where('standard_revision.state', '=', literally('approved'))
    .orderBy('standard_revision.approved_at')
    .limit(MOST_LOOKED)
    .execute();
  const keys = rows.map(({ id, number }) => keysOf(id, number).pin);
  const pinned = await deliveredOf(view, keys);
  return rows
    .filter((_, at) => pinned.has(keys[at] ?? ''))
    .slice(0, most)
    .map(({ part, number, approved_at: at }) => ({ part, revision: number, at: at ?? 0 }));
};

const deliveredOf = async (
  view: Pick<ShopView, 'id' | 'db'>,
  keys: readonly string[],
): Promise<ReadonlySet<string>> => {
  if (keys.length === 0) return new Set();
  const rows = await view.db
    .selectFrom('effect')
    .select('key')
    .where('shop', '=', view.id)
    .where('key', 'in', [...keys])
    .where('state', '=', literally('delivered'))
    .execute();
  return new Set(rows.map(({ key }) => key));
};
