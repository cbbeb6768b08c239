import type { StandardRevisionTable, StandardTable } from '../../store/index.ts';
import { keyOf } from '../names.ts';
import { type Done, done, refused } from '../result.ts';
import type { ShopView } from '../view.ts';
import type { Basis } from './basis.ts';
import type { Scope } from './job.ts';

/** The life of a revision: each state comes after one before it. */
const STANDARD_STATES = ['draft', 'proposed', 'approved', 'superseded', 'retired'] as const;
export type StandardState = (typeof STANDARD_STATES)[number];

/** Who did something, and when. */
export type Signed = { readonly by: string; readonly at: number };

/** What a part number meant from one day to another. Its content never changes. */
export type Revision = {
  readonly id: string;
  readonly number: number;
  readonly state: StandardState;
  /** The id of the card it was made from. */
  readonly card: string;
  readonly scope: Scope;
  /** What it rested on when it was approved. */
  readonly basis: Basis | null;
  /** Why it is not like the one before. */
  readonly why: string | null;
  readonly made: Signed;
  readonly proposed: Signed | null;
  readonly approved: Signed | null;
  readonly reviewAt: number | null;
  readonly ended: (Signed & { readonly why: string | null }) | null;
};

export type Standard = {
  readonly id: string;
  /** The part number as the shop writes it. */
  readonly part: string;
  readonly version: number;
  readonly changed: Signed;
  /** The newest first. */
  readonly revisions: readonly Revision[];
};

/** The revision that holds, where one does. */
export const approvedOf = ({ revisions }: Standard): Revision | undefined =>
  revisions.find(({ state }) => state === 'approved');

/** The one that is still to be decided on. */
export const openOf = ({ revisions }: Standard): Revision | undefined =>
  revisions.find(({ state }) => state === 'draft' || state === 'proposed');

/** What was last done to a revision. */
export const lastOf = ({ made, proposed, approved, ended }: Revision): Signed =>
  ended ?? approved ?? proposed ?? made;

const signed = (at: number | null, by: string | null): Signed | null =>
  at === null || by === null ? null : { at, by };

export const revisionOf = (row: StandardRevisionTable): Revision => {
  const ended = signed(row.ended_at, row.ended_by);
  return {
    id: row.id,
    number: row.number,
    state: STANDARD_STATES.find((state) => state === row.state) ?? 'retired',
    card: row.card,
    // What was kept is what was handed in: a scope and a basis of this program or an older one.
    scope: JSON.parse(row.scope) as Scope,
    basis: row.basis === null ? null : (JSON.parse(row.basis) as Basis),
    why: row.why,
    made: { at: row.made_at, by: row.made_by },
    proposed: signed(row.proposed_at, row.proposed_by),
    approved: signed(row.approved_at, row.approved_by),
    reviewAt: row.review_at,
    ended: ended === null ? null : { ...ended, why: row.ended_why },
  };
};

const standardOf = (row: StandardTable, revisions: readonly Revision[]): Standard => ({
  id: row.id,
  part: row.part,
  version: row.version,
  changed: { at: row.changed_at, by: row.changed_by },
  revisions,
});

const rowsOf = (view: ShopView) =>
  view.db.selectFrom('standard').selectAll().where('shop', '=', view.id);

const revisionsOf = async (view: ShopView, ids: readonly string[]) => {
  if (ids.length === 0) return [];
  return await view.db
    .selectFrom('standard_revision')
    .selectAll()
    .where('shop', '=', view.id)
    .where('standard', 'in', [...ids])
    .orderBy('number', 'desc')
    .execute();
};

/** The standard of a part number or an id, with all its revisions; undefined where there is none. */
export const readStandard = async (view: ShopView, said: string): Promise<Standard | undefined> => {
  const key = keyOf(view.words, said);
  const row =
    (await rowsOf(view).where('part_key', '=', key).executeTakeFirst()) ??
    (await rowsOf(view).where('id', '=', said).executeTakeFirst());
  // Its own row first: who changes it in between is found out by the version.
  return row === undefined
    ? undefined
    : standardOf(row, (await revisionsOf(view, [row.id])).map(revisionOf));
};

/** Part numbers that are looked through for the one that was meant. Judgement. */
const MOST_PARTS = 1000;

/** Part numbers, the ones last changed first. */
export const partsOf = async (view: ShopView): Promise<readonly string[]> => {
  const rows = await view.db
    .selectFrom('standard')
    .select('part')
    .where('shop', '=', view.id)
    .orderBy('changed_at', 'desc')
    .orderBy('id', 'desc')
    .limit(MOST_PARTS)
    .execute();
  return rows.map(({ part }) => part);
};

/** The standard of a part number; otherwise the part numbers that may have been meant. */
export const findStandard = async (view: ShopView, said: string): Promise<Done<Standard>> => {
  const standard = await readStandard(view, said);
  if (standard !== undefined) return done(standard);
  const nearest = view.words.nearestOf(keyOf(view.words, said), await partsOf(view));
  return refused({ code: 'notFound', what: 'standard', nearest });
};

export type StandardsWanted = {
  readonly limit: number;
  /** Only those with a revision in this state. */
  readonly state?: StandardState;
};

/** The standards last changed first, each with all its revisions. */
export const listStandards = async (
  view: ShopView,
  { limit, state }: StandardsWanted,
): Promise<readonly Standard[]> => {
  let query = rowsOf(view);
  if (state !== undefined) {
    const having = view.db
      .selectFrom('standard_revision')
      .select('standard')
      .where('shop', '=', view.id)
      .where('state', '=', state);
    query = query.where('id', 'in', having);
  }
  const rows = await query
    .orderBy('changed_at', 'desc')
    .orderBy('id', 'desc')
    .limit(limit)
    .execute();
  const revisions = await revisionsOf(
    view,
    rows.map(({ id }) => id),
  );
  return rows.map((row) =>
    standardOf(row, revisions.filter(({ standard }) => standard === row.id).map(revisionOf)),
  );
};
