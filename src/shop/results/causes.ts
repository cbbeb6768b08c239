import { CAUSE_IDS, type CauseCounts, type SymptomId } from '../../calc/index.ts';
import type { ShopView } from '../view.ts';

/** What turned out to be behind a symptom in this shop, and how often. */
export const causeCounts = async (view: ShopView, symptom: SymptomId): Promise<CauseCounts> => {
  const rows = await view.db
    .selectFrom('result')
    .select((eb) => ['cause', eb.fn.countAll<number>().as('count')])
    .where('shop', '=', view.id)
    .where('symptom', '=', symptom)
    .where('cause', 'is not', null)
    .where('withdrawn_at', 'is', null)
    .groupBy('cause')
    .execute();
  const counts = new Map(rows.map(({ cause, count }) => [cause, count]));
  return Object.fromEntries(
    CAUSE_IDS.flatMap((cause) => {
      const count = counts.get(cause);
      return count === undefined ? [] : [[cause, count]];
    }),
  );
};
