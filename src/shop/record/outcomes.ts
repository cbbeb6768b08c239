import { materialById } from '../../calc/index.ts';
import type { Reader } from '../../store/index.ts';
import { OUTCOMES, type Outcome } from '../results/content.ts';
import type { ShopView } from '../view.ts';

/** How parts came out: how many results said so. */
export type Outcomes = {
  /** The wheel or the material; null where none was named. */
  readonly name: string | null;
  readonly count: number;
  readonly good: number;
  /** What else was said, the most frequent first. */
  readonly others: readonly { readonly outcome: Outcome; readonly count: number }[];
};

type Counted = { readonly of: string | null; readonly outcome: string; readonly count: number };

const countsBy = async (view: ShopView, what: 'wheel' | 'base'): Promise<readonly Counted[]> =>
  await view.db
    .selectFrom('result')
    .select((eb) => [`${what} as of`, 'outcome', eb.fn.countAll<number>().as('count')])
    .where('shop', '=', view.id)
    .where('withdrawn_at', 'is', null)
    .groupBy([what, 'outcome'])
    .execute();

const isOutcome = (word: string): Outcome => OUTCOMES.find((known) => known === word) ?? 'other';

const outcomesOf = (
  rows: readonly Counted[],
  nameOf: (id: string) => string,
): readonly Outcomes[] => {
  const ids = [...new Set(rows.map(({ of }) => of))];
  return ids
    .map((id): Outcomes => {
      const own = rows.filter(({ of }) => of === id);
      const others = own
        .filter(({ outcome }) => outcome !== 'good')
        .map(({ outcome, count }) => ({ outcome: isOutcome(outcome), count }))
        .sort((a, b) => b.count - a.count || (a.outcome < b.outcome ? -1 : 1));
      const count = own.reduce((sum, each) => sum + each.count, 0);
      const good = own.find(({ outcome }) => outcome === 'good')?.count ?? 0;
      return { name: id === null ? null : nameOf(id), count, good, others };
    })
    .sort((a, b) => b.count - a.count || ((a.name ?? '') < (b.name ?? '') ? -1 : 1));
};

/** Names of wheels, of those that were removed too: what they did stays true. */
const wheelNames = async (db: Reader, shop: string): Promise<ReadonlyMap<string, string>> => {
  const rows = await db
    .selectFrom('wheel')
    .select(['id', 'name'])
    .where('shop', '=', shop)
    .execute();
  return new Map(rows.map(({ id, name }) => [id, name]));
};

/** How parts came out by the shop's wheel that made them. */
export const outcomesByWheel = async (view: ShopView): Promise<readonly Outcomes[]> => {
  const names = await wheelNames(view.db, view.id);
  return outcomesOf(await countsBy(view, 'wheel'), (id) => names.get(id) ?? id);
};

/** How parts came out by the row of the table of materials. */
export const outcomesByMaterial = async (view: ShopView): Promise<readonly Outcomes[]> =>
  outcomesOf(await countsBy(view, 'base'), (id) => {
    const material = materialById(id);
    return material === undefined ? id : `${material.name}, ${material.condition}`;
  });

/** A standard, and the results that were logged on the cards it was made from. */
export type StandardUse = {
  readonly part: string;
  readonly results: number;
  readonly partsRun: number;
};

/** The standards by what was made by them, the most used first. */
export const standardUses = async (view: ShopView): Promise<readonly StandardUse[]> => {
  const rows = await view.db
    .selectFrom('standard_revision')
    .innerJoin('standard', (join) =>
      join
        .onRef('standard.shop', '=', 'standard_revision.shop')
        .onRef('standard.id', '=', 'standard_revision.standard'),
    )
    .innerJoin('result', (join) =>
      join
        .onRef('result.shop', '=', 'standard_revision.shop')
        .onRef('result.card', '=', 'standard_revision.card'),
    )
    .select((eb) => [
      'standard.part as part',
      eb.fn.countAll<number>().as('results'),
      eb.fn.sum<number>('result.parts_run').as('partsRun'),
    ])
    .where('standard_revision.shop', '=', view.id)
    .where('result.withdrawn_at', 'is', null)
    .groupBy(['standard.id', 'standard.part'])
    .execute();
  return [...rows].sort((a, b) => b.results - a.results || (a.part < b.part ? -1 : 1));
};
