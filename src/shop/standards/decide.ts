import type { Refusal } from '../../refusal.ts';
import { cleaned, LONGEST_TEXT, textFault } from '../names.ts';
import { whoMay } from '../people.ts';
import { type Done, done, refused } from '../result.ts';
import { settingsOf } from '../settings.ts';
import type { ShopChange } from '../view.ts';
import { basisOf } from './basis.ts';
import { nameOf, noRevision, notNow, numbered } from './judge.ts';
import { approvedOf, findStandard, openOf, type Revision, type Standard } from './standard.ts';
import { changing, moveRevision, type StandardWith } from './write.ts';

/** Which revision: the one of this number, or, where none was said, the one it can only be. */
export type Which = { readonly part: string; readonly revision: number | null };

type Asked = 'propose' | 'approve' | 'retire';

/** The one that is meant, and whether it is where it has to be. */
const meant = async (
  change: ShopChange,
  asked: Asked,
  standard: Standard,
  number: number | null,
  fits: (revision: Revision) => boolean,
): Promise<Done<Revision>> => {
  const candidates = [openOf(standard), approvedOf(standard), standard.revisions[0]].filter(
    (each) => each !== undefined,
  );
  const found =
    number === null ? (candidates.find(fits) ?? candidates[0]) : numbered(standard, number);
  if (found === undefined) return refused(noRevision(standard, number ?? 1));
  return fits(found) ? done(found) : refused(await notNow(change, asked, standard, found));
};

/** Puts a draft up for a decision. */
export const proposeStandard = async (
  change: ShopChange,
  { part, revision }: Which,
): Promise<Done<StandardWith>> => {
  const found = await findStandard(change, part);
  if (!found.ok) return found;
  const result = await changing(
    change,
    found.value,
    (read) => meant(change, 'propose', read, revision, ({ state }) => state === 'draft'),
    (draft) => {
      const signed = { proposed_at: change.at, proposed_by: change.by };
      return moveRevision(change, found.value, draft, { state: 'proposed', ...signed });
    },
  );
  return result.ok ? withRevision(result.value.standard, result.value.wanted) : result;
};

const withRevision = (standard: Standard, { number }: Revision): Done<StandardWith> => {
  const revision = numbered(standard, number);
  if (revision === undefined) throw new Error('a revision that was changed is gone');
  return done({ standard, revision });
};

/** The same day so many months on; the last of a month that has no such day. */
export const monthsAfter = (at: number, months: number): number => {
  const then = new Date(at);
  const day = then.getUTCDate();
  then.setUTCDate(1);
  then.setUTCMonth(then.getUTCMonth() + months);
  const last = new Date(Date.UTC(then.getUTCFullYear(), then.getUTCMonth() + 1, 0)).getUTCDate();
  then.setUTCDate(Math.min(day, last));
  return then.getTime();
};

export type Approved = StandardWith & {
  /** The revision that held until now. */
  readonly before: Revision | null;
};

/** Makes a proposed revision the one that holds; the one before no longer does. */
export const approveStandard = async (
  change: ShopChange,
  { part, revision, reviewMonths }: Which & { readonly reviewMonths: number | null },
): Promise<Done<Approved>> => {
  const found = await findStandard(change, part);
  if (!found.ok) return found;
  const settings = await settingsOf(change);
  const before = approvedOf(found.value) ?? null;
  const result = await changing(
    change,
    found.value,
    async (read) => {
      const judged = await meant(change, 'approve', read, revision, isProposed);
      if (!judged.ok || !settings.fourEyes) return judged;
      const fault = await ownProposal(change, read, judged.value);
      return fault === null ? judged : refused(fault);
    },
    async (proposed) => {
      const ended = { ended_at: change.at, ended_by: change.by, ended_why: null };
      if (before !== null)
        await moveRevision(change, found.value, before, { state: 'superseded', ...ended });
      await moveRevision(change, found.value, proposed, {
        state: 'approved',
        approved_at: change.at,
        approved_by: change.by,
        review_at: monthsAfter(change.at, reviewMonths ?? settings.reviewMonths),
        basis: JSON.stringify(await basisOf(change, proposed.scope)),
      });
    },
  );
  if (!result.ok) return result;
  const after = withRevision(result.value.standard, result.value.wanted);
  return after.ok ? done({ ...after.value, before }) : after;
};

const isProposed = ({ state }: Revision): boolean => state === 'proposed';

/** Two pairs of eyes: whoever else may approve is named. */
const ownProposal = async (
  change: ShopChange,
  { part }: Standard,
  { number, proposed }: Revision,
): Promise<Refusal | null> => {
  if (proposed?.by !== change.by) return null;
  const self = await nameOf(change, change.by);
  const people = (await whoMay(change, 'supervisor')).filter((name) => name !== self);
  return { code: 'fourEyes', part, revision: number, people };
};

export type Retired = StandardWith & { readonly wasApproved: boolean };

/** Takes a revision out of use: the one that holds, or one that was never decided on. */
export const retireStandard = async (
  change: ShopChange,
  { part, revision, why: said }: Which & { readonly why: string | null },
): Promise<Done<Retired>> => {
  const why = cleaned(said ?? '');
  const fault = textFault('why', why, LONGEST_TEXT, ['because the part is no longer made']);
  if (fault !== null) return refused(fault);
  const found = await findStandard(change, part);
  if (!found.ok) return found;
  const result = await changing(
    change,
    found.value,
    (read) => toRetire(change, read, revision),
    (retired) => {
      const ended = { ended_at: change.at, ended_by: change.by, ended_why: why };
      return moveRevision(change, found.value, retired, { state: 'retired', ...ended });
    },
  );
  if (!result.ok) return result;
  const { standard, wanted } = result.value;
  const after = withRevision(standard, wanted);
  return after.ok ? done({ ...after.value, wasApproved: wanted.state === 'approved' }) : after;
};

/** Where none is named it is the one that holds, before one that is still to be decided on. */
const toRetire = (
  change: ShopChange,
  standard: Standard,
  number: number | null,
): Promise<Done<Revision>> => {
  const isAlive = ({ ended }: Revision): boolean => ended === null;
  const holds = approvedOf(standard)?.number ?? null;
  return meant(change, 'retire', standard, number ?? holds, isAlive);
};
