import { firstIdAt } from '../store/index.ts';
import { type KeptResult, keptResult } from './results/kept.ts';
import type { ShopView } from './view.ts';

/** Something of which a card shows a few, and how many there are. */
export type Some<T> = { readonly count: number; readonly first: readonly T[] };

const some = <T>(all: readonly T[], limit: number): Some<T> => ({
  count: all.length,
  first: all.slice(0, limit),
});

/** What was last set up on a machine, or by somebody who named none. */
export type SetUp = {
  readonly code: string;
  readonly words: string;
  readonly at: number;
  readonly by: string;
  readonly machine: string | null;
};

/** Cards that are what somebody does at a machine. */
const AT_A_MACHINE = ['setup', 'check'];
/** Most cards that are looked through. Judgement: more than a shop makes in two days. */
const MOST_CARDS = 400;

/** The newest card of every machine since a moment, the newest first; no machine, of the person. */
export const setUpSince = async (
  view: ShopView,
  since: number,
  limit: number,
): Promise<Some<SetUp>> => {
  const rows = await view.db
    .selectFrom('card')
    .select(['code', 'words', 'made_at', 'made_by', 'machine'])
    .where('shop', '=', view.id)
    .where('id', '>=', firstIdAt(since))
    .where('kind', 'in', AT_A_MACHINE)
    .orderBy('id', 'desc')
    .limit(MOST_CARDS)
    .execute();
  const newest = new Map<string, SetUp>();
  for (const { code, words, made_at: at, made_by: by, machine } of rows) {
    const where = machine ?? by;
    if (!newest.has(where)) newest.set(where, { code, words, at, by, machine });
  }
  return some([...newest.values()], limit);
};

const wrongRows = (view: ShopView, since: number) =>
  view.db
    .selectFrom('result')
    .where('shop', '=', view.id)
    .where('id', '>=', firstIdAt(since))
    .where('withdrawn_at', 'is', null)
    .where('outcome', '<>', 'good');

/** What did not come out good since a moment, the newest first. */
export const wrongSince = async (
  view: ShopView,
  since: number,
  limit: number,
): Promise<Some<KeptResult>> => {
  const { count } = await wrongRows(view, since)
    .select((eb) => eb.fn.countAll<number>().as('count'))
    .executeTakeFirstOrThrow();
  const rows = await wrongRows(view, since)
    .selectAll()
    .orderBy('id', 'desc')
    .limit(limit)
    .execute();
  return { count, first: rows.map(keptResult) };
};

/** Most standards that are counted. Judgement: beyond that it is a number nobody works off. */
const MOST_STANDARDS = 100;

const idsOf = (rows: readonly { readonly standard: string }[], limit: number): Some<string> =>
  some([...new Set(rows.map(({ standard }) => standard))], limit);

/** Ids of the standards that somebody has to decide on, the one that waits longest first. */
export const standardsToDecide = async (view: ShopView, limit: number): Promise<Some<string>> => {
  const rows = await view.db
    .selectFrom('standard_revision')
    .select('standard')
    .where('shop', '=', view.id)
    .where('state', '=', 'proposed')
    .orderBy('proposed_at')
    .orderBy('id')
    .limit(MOST_STANDARDS)
    .execute();
  return idsOf(rows, limit);
};

/** Ids of the standards that were to be looked at again by now, the longest overdue first. */
export const standardsToReview = async (
  view: ShopView,
  by: number,
  limit: number,
): Promise<Some<string>> => {
  const rows = await view.db
    .selectFrom('standard_revision')
    .select('standard')
    .where('shop', '=', view.id)
    .where('state', '=', 'approved')
    .where('review_at', '<=', by)
    .orderBy('review_at')
    .orderBy('id')
    .limit(MOST_STANDARDS)
    .execute();
  return idsOf(rows, limit);
};
