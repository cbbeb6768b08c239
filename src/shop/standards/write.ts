import type { Refusal } from '../../refusal.ts';
import type { StandardRevisionTable } from '../../store/index.ts';
import { findCard } from '../cards.ts';
import { cardTexts } from '../cardTexts.ts';
import { putForFind } from '../find/index.ts';
import { remember } from '../history.ts';
import type { Done } from '../result.ts';
import { done, refused } from '../result.ts';
import type { ShopChange } from '../view.ts';
import { overtaken } from './judge.ts';
import { approvedOf, openOf, type Revision, readStandard, type Standard } from './standard.ts';

/** A standard after something was done to one of its revisions. */
export type StandardWith = { readonly standard: Standard; readonly revision: Revision };

/** What is to be done to a standard, or why not; found out from what was read of it. */
export type Judge<T> = (standard: Standard) => Promise<Done<T>>;

/**
 * Puts this change in front of every other of the same standard, as it was read. False when
 * another came first.
 */
const claim = async (change: ShopChange, { id, version }: Standard): Promise<boolean> => {
  const { numUpdatedRows } = await change.db
    .updateTable('standard')
    .set({ version: version + 1, changed_at: change.at, changed_by: change.by })
    .where('shop', '=', change.id)
    .where('id', '=', id)
    .where('version', '=', version)
    .executeTakeFirstOrThrow();
  return numUpdatedRows === 1n;
};

/**
 * Judges what was read, takes the standard, and writes. Where somebody else took it in between it
 * is judged once more, so that whoever comes second hears what the first one did.
 */
export const changing = async <T>(
  change: ShopChange,
  standard: Standard,
  judge: Judge<T>,
  write: (wanted: T) => Promise<void>,
): Promise<Done<{ readonly standard: Standard; readonly wanted: T }>> => {
  const wanted = await judge(standard);
  if (!wanted.ok) return wanted;
  if (!(await claim(change, standard))) return refused(await overtook(change, standard, judge));
  await write(wanted.value);
  const after = await readStandard(change, standard.id);
  if (after === undefined) throw new Error('a standard that was changed is gone');
  await findable(change, after);
  return done({ standard: after, wanted: wanted.value });
};

/** It is found by its part number, by why it is as it is, and by what its card is found by. */
const findable = async (change: ShopChange, standard: Standard): Promise<void> => {
  const { id, part, revisions } = standard;
  const approved = approvedOf(standard);
  const shown = approved ?? openOf(standard) ?? revisions[0];
  const card = shown === undefined ? undefined : await findCard(change, shown.card);
  await putForFind(change, {
    kind: 'standard',
    id,
    code: part,
    at: change.at,
    approved: approved !== undefined,
    texts: [
      part,
      ...revisions.flatMap(({ why }) => why ?? []),
      ...(card?.ok === true ? await cardTexts(change, card.value) : []),
    ],
  });
};

const overtook = async <T>(
  change: ShopChange,
  before: Standard,
  judge: Judge<T>,
): Promise<Refusal> => {
  const now = (await readStandard(change, before.id)) ?? before;
  const again = await judge(now);
  return again.ok ? await overtaken(change, now, now.changed) : again.refusal;
};

/** Brings a revision to another place in its life. */
export const moveRevision = async (
  change: ShopChange,
  { id, part }: Standard,
  revision: Revision,
  to: Partial<StandardRevisionTable> & { readonly state: Revision['state'] },
): Promise<void> => {
  await change.db
    .updateTable('standard_revision')
    .set(to)
    .where('shop', '=', change.id)
    .where('id', '=', revision.id)
    .execute();
  await remember(change, 'standard', [
    {
      subjectId: id,
      verb: 'changed',
      before: { part, revision: revision.number, state: revision.state },
      after: { part, revision: revision.number, state: to.state, why: to.ended_why ?? null },
    },
  ]);
};
