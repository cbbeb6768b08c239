import type { Refusal } from '../../refusal.ts';
import { literally, type ResultTable } from '../../store/index.ts';
import { type Done, done, refused } from '../result.ts';
import type { ShopView } from '../view.ts';
import { contentOf, type ResultContent } from './content.ts';

/** How far the cards go by a result. */
export type Standing =
  /** It says nothing of the growth. */
  | 'silent'
  | 'learned'
  /** Kept, and not learned from until someone confirms it. */
  | 'doubted'
  | 'withdrawn';

/** A result as it is kept. */
export type KeptResult = ResultContent & {
  readonly id: string;
  /** What people call it by: R12. */
  readonly number: number;
  /** The id of its card. */
  readonly card: string;
  readonly wheel: string | null;
  /** The row of the table of materials it was made for. */
  readonly base: string | null;
  /** Counts changes; name it when you change what you have seen. */
  readonly version: number;
  readonly madeAt: number;
  readonly madeBy: string;
  readonly changedAt: number;
  readonly changedBy: string;
  /** Pattern and material whose growth it speaks of, and what it says of it. */
  readonly family: string | null;
  readonly share: number | null;
  readonly standing: Standing;
  readonly confirmedBy: string | null;
};

const standingOf = (row: ResultTable): Standing => {
  if (row.withdrawn_at !== null) return 'withdrawn';
  if (row.family === null) return 'silent';
  return row.learned === 1 ? 'learned' : 'doubted';
};

export const keptResult = (row: ResultTable): KeptResult => ({
  ...contentOf(row),
  id: row.id,
  number: row.number,
  card: row.card,
  wheel: row.wheel,
  base: row.base,
  version: row.version,
  madeAt: row.made_at,
  madeBy: row.made_by,
  changedAt: row.changed_at,
  changedBy: row.changed_by,
  family: row.family,
  share: row.share,
  standing: standingOf(row),
  confirmedBy: row.confirmed_by,
});

/** What people call a result by. */
export const resultName = (number: number): string => `R${String(number)}`;

export const resultRows = (view: ShopView) =>
  view.db.selectFrom('result').selectAll().where('shop', '=', view.id);

/** Which result is meant: by its number, or the last one that stands of a card. */
export type ResultWanted = { readonly number: number } | { readonly card: string };

const notFound: Refusal = { code: 'notFound', what: 'result', nearest: [] };

export const findResult = async (
  view: ShopView,
  wanted: ResultWanted,
): Promise<Done<KeptResult>> => {
  const row =
    'number' in wanted
      ? await resultRows(view).where('number', '=', wanted.number).executeTakeFirst()
      : await resultRows(view)
          .where('card', '=', wanted.card)
          .where('withdrawn_at', 'is', null)
          .orderBy('id', 'desc')
          .limit(1)
          .executeTakeFirst();
  return row === undefined ? refused(notFound) : done(keptResult(row));
};

/** The result of an id that the records themselves name. */
export const resultById = async (view: ShopView, id: string): Promise<KeptResult | null> => {
  const row = await resultRows(view).where('id', '=', id).executeTakeFirst();
  return row === undefined ? null : keptResult(row);
};

export type ResultsWanted = {
  readonly limit: number;
  /** Only one person's. */
  readonly madeBy?: string;
  /** Only those of a card, or of a wheel. */
  readonly card?: string;
  readonly wheel?: string;
  /** Only those that were logged at or after this moment. */
  readonly since?: number;
  /** Only those that wait to be confirmed. */
  readonly doubted?: true;
};

/** Results that stand, the newest first. */
export const latestResults = async (
  view: ShopView,
  { limit, madeBy, card, wheel, since, doubted }: ResultsWanted,
): Promise<readonly KeptResult[]> => {
  let query = resultRows(view).where('withdrawn_at', 'is', null).orderBy('id', 'desc').limit(limit);
  if (madeBy !== undefined) query = query.where('made_by', '=', madeBy);
  if (card !== undefined) query = query.where('card', '=', card);
  if (wheel !== undefined) query = query.where('wheel', '=', wheel);
  if (since !== undefined) query = query.where('made_at', '>=', since);
  if (doubted === true)
    query = query.where('family', 'is not', null).where('learned', '=', literally(0));
  return (await query.execute()).map(keptResult);
};
