import type { NotNow, Refusal } from '../../refusal.ts';
import { settingsOf } from '../settings.ts';
import type { ShopView } from '../view.ts';
import { lastOf, type Revision, type Standard } from './standard.ts';

/** The name of somebody of this shop, as it is today. */
export const nameOf = async (view: ShopView, id: string): Promise<string> => {
  const row = await view.db
    .selectFrom('person')
    .select('name')
    .where('shop', '=', view.id)
    .where('id', '=', id)
    .executeTakeFirst();
  return row?.name ?? '';
};

/** Why something cannot be done to a revision where it is: who brought it there, and when. */
export const notNow = async (
  view: ShopView,
  asked: NotNow['asked'],
  { part }: Standard,
  revision: Revision,
): Promise<NotNow> => {
  const { by, at } = lastOf(revision);
  const { timeZone: zone } = await settingsOf(view);
  const { number, state } = revision;
  const who = await nameOf(view, by);
  return { code: 'notNow', asked, part, revision: number, state, by: who, at, zone };
};

/** Somebody else was there first. */
export const overtaken = async (
  view: ShopView,
  { part }: Standard,
  { by, at }: { readonly by: string; readonly at: number },
): Promise<Refusal> => {
  const { timeZone: zone } = await settingsOf(view);
  const when = new Date(at).toISOString();
  return { code: 'stale', what: part, by: await nameOf(view, by), when, zone };
};

/** The revision of this number. */
export const numbered = ({ revisions }: Standard, number: number): Revision | undefined =>
  revisions.find((revision) => revision.number === number);

/** There is no such revision; the ones there are. */
export const noRevision = ({ part, revisions }: Standard, number: number): Refusal => ({
  code: 'notFound',
  what: 'revision',
  word: `${part} rev ${String(number)}`,
  nearest: revisions.slice(0, 3).map((revision) => `rev ${String(revision.number)}`),
});
