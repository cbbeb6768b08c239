import type { ResultTable } from '../../store/index.ts';
import { cardById } from '../cards.ts';
import { dropFromFind } from '../find/index.ts';
import { remember, type Verb } from '../history.ts';
import { personById } from '../people.ts';
import { type Done, done, refused } from '../result.ts';
import type { ShopChange, ShopView } from '../view.ts';
import { compared } from './compare.ts';
import { contentFault, contentOf, contentRow, type ResultContent } from './content.ts';
import { letFind } from './found.ts';
import { resift } from './growth.ts';
import { type KeptResult, resultName, resultRows } from './kept.ts';
import { inTurn, type Logged, loggedOf, NO_OTHERS, saidOf } from './log.ts';
import { partsRun, wear } from './wear.ts';

/** Which result, and the version of it that was seen: another is not written over. */
type Seen = { readonly id: string; readonly version?: number };

const stale = async (change: ShopChange, row: ResultTable): Promise<Done<never>> =>
  refused({
    code: 'stale',
    what: resultName(row.number),
    by: (await personById(change, row.withdrawn_by ?? row.changed_by))?.name ?? '',
    when: new Date(row.withdrawn_at ?? row.changed_at).toISOString(),
  });

/** The result as it stands, if it is still the one that was seen and nobody has withdrawn it. */
const standing = async (change: ShopChange, { id, version }: Seen): Promise<Done<ResultTable>> => {
  await inTurn(change);
  const row = await resultRows(change).where('id', '=', id).executeTakeFirst();
  if (row === undefined) return refused({ code: 'notFound', what: 'result', nearest: [] });
  const isSeen = version === undefined || version === row.version;
  return isSeen && row.withdrawn_at === null ? done(row) : await stale(change, row);
};

type Columns = Partial<Omit<ResultTable, 'shop' | 'id' | 'number'>>;

/** Writes the change, counts it, and remembers it. */
const rewritten = async (
  change: ShopChange,
  before: ResultTable,
  columns: Columns,
  verb: Verb = 'changed',
): Promise<ResultTable> => {
  const signed = {
    ...columns,
    version: before.version + 1,
    changed_at: change.at,
    changed_by: change.by,
  };
  const after = await change.db
    .updateTable('result')
    .set(signed)
    .where('shop', '=', change.id)
    .where('id', '=', before.id)
    .where('version', '=', before.version)
    .returningAll()
    .executeTakeFirstOrThrow();
  await remember(change, 'result', [
    {
      subjectId: before.id,
      verb,
      before: saidOf(before),
      after: verb === 'removed' ? null : saidOf(after),
    },
  ]);
  return after;
};

/** Says otherwise what was logged; the rest stays. What was learned from it is learned anew. */
export const correctResult = async (
  change: ShopChange,
  seen: Seen,
  patch: Partial<ResultContent>,
): Promise<Done<Logged>> => {
  const found = await standing(change, seen);
  if (!found.ok) return found;
  const before = found.value;
  const content: ResultContent = { ...contentOf(before), ...patch };
  const fault = contentFault(content);
  if (fault !== null) return refused(fault);
  const card = await cardById(change, before.card);
  if (card === null) return refused({ code: 'notFound', what: 'card', nearest: [] });
  const beside = compared(card, content);
  if (!beside.ok) return beside;
  const { growth } = beside.value;
  const said = typeof growth === 'string' ? { family: null, share: null } : growth;
  // What was confirmed were other numbers.
  const isSame = said.family === before.family && said.share === before.share;
  const confirmed = isSame ? {} : { confirmed_at: null, confirmed_by: null, learned: 0 };
  const after = await rewritten(change, before, { ...contentRow(content), ...said, ...confirmed });
  await letFind(change, after, card);
  const others = isSame ? NO_OTHERS : await resift(change);
  const parts = await wear(change, before.wheel, content.partsRun - before.parts_run);
  return done(await loggedOf(change, before.id, beside.value, parts, others));
};

/** Takes a result back: it stays in the records, and nothing goes by it any more. */
export const withdrawResult = async (change: ShopChange, seen: Seen): Promise<Done<Logged>> => {
  const found = await standing(change, seen);
  if (!found.ok) return found;
  const before = found.value;
  const columns = { withdrawn_at: change.at, withdrawn_by: change.by, learned: 0 };
  await rewritten(change, before, columns, 'removed');
  await dropFromFind(change, 'result', before.id);
  const others = await resift(change);
  const parts = await wear(change, before.wheel, -before.parts_run);
  return done(await again(change, before, parts, others));
};

/** Someone has looked at it and stands by it: from now on it is learned from, however odd it is. */
export const confirmResult = async (change: ShopChange, seen: Seen): Promise<Done<Logged>> => {
  const found = await standing(change, seen);
  if (!found.ok) return found;
  const before = found.value;
  await rewritten(change, before, { confirmed_at: change.at, confirmed_by: change.by });
  const others = await resift(change);
  return done(await again(change, before, await partsRun(change, before.wheel), others));
};

/** A result with all that is known through it, nothing being changed. */
export const lookAtResult = async (view: ShopView, result: KeptResult): Promise<Logged> => {
  const row = await resultRows(view).where('id', '=', result.id).executeTakeFirstOrThrow();
  return await again(view, row, await partsRun(view, row.wheel), NO_OTHERS);
};

/** The result held against its card once more, as it stands now. */
const again = async (
  view: ShopView,
  row: ResultTable,
  parts: number | null,
  others: Logged['others'],
): Promise<Logged> => {
  const card = await cardById(view, row.card);
  const beside = card === null ? null : compared(card, contentOf(row));
  const nothing = { base: null, after: null, growth: 'oldCard' } as const;
  const seen = beside?.ok === true ? beside.value : nothing;
  return await loggedOf(view, row.id, seen, parts, others);
};
