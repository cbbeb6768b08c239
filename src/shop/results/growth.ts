import {
  type FamilyGrowth,
  type FamilyTally,
  type GrowthResult,
  growthFromTallies,
  isDoubted,
  siftResults,
  tallyGrowth,
} from '../../calc/index.ts';
import { literally } from '../../store/index.ts';
import type { ShopChange, ShopView } from '../view.ts';
import type { GrowthSaid } from './compare.ts';

/**
 * What the results that are learned from add up to, family by family, in the order in which they
 * were first seen: then sums come out to the last digit as if all results were read again.
 */
export const growthTallies = async (view: ShopView): Promise<readonly FamilyTally[]> =>
  await view.db
    .selectFrom('growth')
    .select(['family', 'count', 'sum'])
    .where('shop', '=', view.id)
    .orderBy('first')
    .execute();

const doubtedRows = (view: ShopView) =>
  view.db
    .selectFrom('result')
    .where('shop', '=', view.id)
    .where('family', 'is not', null)
    .where('withdrawn_at', 'is', null)
    .where('learned', '=', literally(0));

/** The share of static growth to expect of the next part of a family in this shop. */
export const growthIn = async (view: ShopView, family: string): Promise<FamilyGrowth> => {
  const { count } = await doubtedRows(view)
    .select((eb) => eb.fn.countAll<number>().as('count'))
    .executeTakeFirstOrThrow();
  return growthFromTallies(await growthTallies(view), family, count);
};

/** Whether the next result is learned from, and what was expected of it. */
export type Judged = { readonly learned: boolean; readonly expected: FamilyGrowth };

/** The newest result, held against all before it and added to what is learned. */
export const learn = async (
  change: ShopChange,
  id: string,
  { family, share }: GrowthSaid,
): Promise<Judged> => {
  const expected = await growthIn(change, family);
  if (isDoubted(share, expected)) return { learned: false, expected };
  await change.db
    .insertInto('growth')
    .values({ shop: change.id, family, count: 1, sum: share, first: id })
    .onConflict((oc) =>
      oc.columns(['shop', 'family']).doUpdateSet((eb) => ({
        count: eb('growth.count', '+', 1),
        sum: eb('growth.sum', '+', share),
      })),
    )
    .execute();
  return { learned: true, expected };
};

type Kept = GrowthResult & { readonly id: string; readonly learned: boolean };

/** All that speaks of growth and stands, the oldest first. */
const growthResults = async (view: ShopView): Promise<readonly Kept[]> => {
  const rows = await view.db
    .selectFrom('result')
    .select(['id', 'family', 'share', 'learned', 'confirmed_at'])
    .where('shop', '=', view.id)
    .where('family', 'is not', null)
    .where('withdrawn_at', 'is', null)
    .orderBy('id')
    .execute();
  return rows.map((row) => ({
    id: row.id,
    family: row.family ?? '',
    share: row.share ?? 0,
    learned: row.learned === 1,
    confirmed: row.confirmed_at !== null,
  }));
};

/** Results whose standing changed because of a change to another one. */
export type Resifted = {
  /** Ids of those that are learned from now, and of those that wait now. */
  readonly learned: readonly string[];
  readonly doubted: readonly string[];
};

/**
 * Sifts all results again after one of them was changed: each is held against what was known
 * before it, so a change may be felt by every later one. What was forgotten leaves no trace.
 */
export const resift = async (change: ShopChange): Promise<Resifted> => {
  const results = await growthResults(change);
  const sifted = siftResults(results);
  const isLearned = new Set<GrowthResult>(sifted.learned);
  const turned = results.filter((result) => result.learned !== isLearned.has(result));
  const learned = turned.filter((result) => isLearned.has(result)).map(({ id }) => id);
  const doubted = turned.filter((result) => !isLearned.has(result)).map(({ id }) => id);
  await mark(change, learned, 1);
  await mark(change, doubted, 0);
  await putTallies(change, results, tallyGrowth(results), isLearned);
  return { learned, doubted };
};

/** Ids in one statement. Judgement: far below the number of values either engine takes. */
const PORTION = 250;

const mark = async (change: ShopChange, ids: readonly string[], learned: 0 | 1): Promise<void> => {
  for (let start = 0; start < ids.length; start += PORTION) {
    await change.db
      .updateTable('result')
      .set({ learned })
      .where('shop', '=', change.id)
      .where('id', 'in', ids.slice(start, start + PORTION))
      .execute();
  }
};

const putTallies = async (
  change: ShopChange,
  results: readonly Kept[],
  tallies: readonly FamilyTally[],
  isLearned: ReadonlySet<GrowthResult>,
): Promise<void> => {
  await change.db.deleteFrom('growth').where('shop', '=', change.id).execute();
  if (tallies.length === 0) return;
  const firstOf = (family: string): string =>
    results.find((result) => result.family === family && isLearned.has(result))?.id ?? '';
  const rows = tallies.map((tally) => ({
    shop: change.id,
    ...tally,
    first: firstOf(tally.family),
  }));
  await change.db.insertInto('growth').values(rows).execute();
};
