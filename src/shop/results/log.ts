import type { FamilyGrowth } from '../../calc/index.ts';
import type { ResultTable } from '../../store/index.ts';
import type { KeptCard } from '../cards.ts';
import { remember } from '../history.ts';
import { type Done, done, refused } from '../result.ts';
import type { ShopChange, ShopView } from '../view.ts';
import { type Compared, compared } from './compare.ts';
import { contentFault, contentRow, type ResultContent } from './content.ts';
import { letFind } from './found.ts';
import { growthIn, learn, type Resifted, resift } from './growth.ts';
import { type KeptResult, keptResult } from './kept.ts';
import { wear } from './wear.ts';

/** What became of a result, and of what the shop knows through it. */
export type Logged = {
  readonly result: KeptResult;
  readonly compared: Compared;
  /** What is expected of the next part of its family; null where it says nothing of growth. */
  readonly growth: FamilyGrowth | null;
  /** Parts its wheel has run now; null where no wheel of the shop was used. */
  readonly partsOnWheel: number | null;
  /** Other results that are learned from now or wait now because of it. */
  readonly others: Resifted;
};

export const NO_OTHERS: Resifted = { learned: [], doubted: [] };

/** Results of a shop stand in a row: two that come at once are put one after the other. */
export const inTurn = async (change: ShopChange): Promise<void> => {
  await change.db
    .updateTable('shop')
    .set((eb) => ({ name: eb.ref('name') }))
    .where('id', '=', change.id)
    .execute();
};

const nextNumber = async (view: ShopView): Promise<number> => {
  const last = await view.db
    .selectFrom('result')
    .select('number')
    .where('shop', '=', view.id)
    .orderBy('number', 'desc')
    .limit(1)
    .executeTakeFirst();
  return (last?.number ?? 0) + 1;
};

/** Whether none stands behind it; another program's clock may be ahead of this one's. */
const isLast = async (view: ShopView, id: string): Promise<boolean> => {
  const later = await view.db
    .selectFrom('result')
    .select('id')
    .where('shop', '=', view.id)
    .where('id', '>', id)
    .limit(1)
    .executeTakeFirst();
  return later === undefined;
};

const rowFor = async (
  change: ShopChange,
  card: KeptCard,
  content: ResultContent,
  { base, growth }: Compared,
): Promise<ResultTable> => ({
  shop: change.id,
  id: change.db.newId(change.at),
  number: await nextNumber(change),
  card: card.id,
  wheel: card.wheel,
  base,
  version: 1,
  made_at: change.at,
  made_by: change.by,
  changed_at: change.at,
  changed_by: change.by,
  withdrawn_at: null,
  withdrawn_by: null,
  ...contentRow(content),
  family: typeof growth === 'string' ? null : growth.family,
  share: typeof growth === 'string' ? null : growth.share,
  learned: 0,
  confirmed_at: null,
  confirmed_by: null,
});

/** What history keeps of a result. */
export const saidOf = (row: ResultTable) => {
  const { outcome, symptom, teeth, blank, crest, tooth_height, flat, parts_run, cause, note } = row;
  const content = { outcome, symptom, teeth, blank, crest, tooth_height, flat, parts_run };
  const { share, confirmed_by } = row;
  return { ...content, cause, note, share, confirmed_by };
};

/** Keeps how a part of a card came out, and learns from it. */
export const logResult = async (
  change: ShopChange,
  card: KeptCard,
  content: ResultContent,
): Promise<Done<Logged>> => {
  const fault = contentFault(content);
  if (fault !== null) return refused(fault);
  const seen = compared(card, content);
  if (!seen.ok) return seen;
  await inTurn(change);
  const row = await rowFor(change, card, content, seen.value);
  const isNewest = await isLast(change, row.id);
  const { growth } = seen.value;
  const speaks = typeof growth !== 'string';
  const judged = speaks && isNewest ? await learn(change, row.id, growth) : null;
  const kept = { ...row, learned: judged?.learned === true ? 1 : 0 };
  await change.db.insertInto('result').values(kept).execute();
  const others = speaks && !isNewest ? await resift(change) : NO_OTHERS;
  const partsOnWheel = await wear(change, row.wheel, row.parts_run);
  await letFind(change, row, card);
  await remember(change, 'result', [
    { subjectId: row.id, verb: 'added', before: null, after: saidOf(row) },
  ]);
  return done(await loggedOf(change, row.id, seen.value, partsOnWheel, others));
};

/** A result as it stands after a change, with everything the change did. */
export const loggedOf = async (
  view: ShopView,
  id: string,
  seen: Compared,
  partsOnWheel: number | null,
  others: Resifted,
): Promise<Logged> => {
  const row = await view.db
    .selectFrom('result')
    .selectAll()
    .where('shop', '=', view.id)
    .where('id', '=', id)
    .executeTakeFirstOrThrow();
  const not = (ids: readonly string[]) => ids.filter((each) => each !== id);
  return {
    result: keptResult(row),
    compared: seen,
    growth: row.family === null ? null : await growthIn(view, row.family),
    partsOnWheel,
    others: { learned: not(others.learned), doubted: not(others.doubted) },
  };
};
