import { type CardTable } from '../store/index.ts';
import { cardTexts } from './cardTexts.ts';
import { CODE_LENGTHS, misheard, newCode, readCode } from './codes.ts';
import { putForFind } from './find/index.ts';
import { type Done, done, refused } from './result.ts';
import type { ShopChange, ShopView } from './view.ts';

/** A card as it is kept. Request, figures and card are what was handed in, as JSON values. */
export type CardDraft = {
  /** The verb it answers: setup, plan … */
  readonly kind: string;
  /** Where it was asked for: an adapter's own address. */
  readonly place: string;
  /** The person's own words. */
  readonly words: string;
  readonly request: unknown;
  readonly figures: unknown;
  readonly card: unknown;
  /** The program's version that worked it out. */
  readonly program: string;
  /** Ids of what the shop's lists gave to it. */
  readonly wheel: string | null;
  readonly machine: string | null;
  readonly material: string | null;
};

export type KeptCard = CardDraft & {
  readonly id: string;
  readonly code: string;
  readonly madeAt: number;
  /** The id of the person it was made for. */
  readonly madeBy: string;
};

/** Keeps a card, gives it its code, and lets it be found by its words. */
export const keepCard = async (
  change: ShopChange,
  draft: CardDraft,
): Promise<{ readonly id: string; readonly code: string }> => {
  const row = rowOf(change, draft);
  for (const length of CODE_LENGTHS) {
    const code = newCode(length);
    const kept = await change.db
      .insertInto('card')
      .values({ ...row, code })
      .onConflict((oc) => oc.columns(['shop', 'code']).doNothing())
      .returning('id')
      .executeTakeFirst();
    if (kept === undefined) continue;
    const texts = await cardTexts(change, draft);
    const { id, made_at: at } = row;
    await putForFind(change, { kind: 'card', id, code, at, approved: false, texts });
    return { id, code };
  }
  throw new Error('no free code was found for a card');
};

const rowOf = (change: ShopChange, draft: CardDraft): Omit<CardTable, 'code'> => ({
  shop: change.id,
  id: change.db.newId(change.at),
  kind: draft.kind,
  made_at: change.at,
  made_by: change.by,
  place: draft.place,
  words: draft.words.replaceAll('\0', ''),
  request: JSON.stringify(draft.request),
  figures: JSON.stringify(draft.figures),
  card: JSON.stringify(draft.card),
  program: draft.program,
  wheel: draft.wheel,
  machine: draft.machine,
  material: draft.material,
});

const cardOf = (row: CardTable): KeptCard => ({
  id: row.id,
  code: row.code,
  kind: row.kind,
  madeAt: row.made_at,
  madeBy: row.made_by,
  place: row.place,
  words: row.words,
  request: JSON.parse(row.request),
  figures: JSON.parse(row.figures),
  card: JSON.parse(row.card),
  program: row.program,
  wheel: row.wheel,
  machine: row.machine,
  material: row.material,
});

const rowsOf = (view: ShopView) =>
  view.db.selectFrom('card').selectAll().where('shop', '=', view.id);

/** The card of a code as somebody typed or heard it, or of an id; or codes that were meant. */
export const findCard = async (view: ShopView, typed: string): Promise<Done<KeptCard>> => {
  const code = readCode(typed);
  const byCode =
    code === null ? undefined : await rowsOf(view).where('code', '=', code).executeTakeFirst();
  const row = byCode ?? (await rowsOf(view).where('id', '=', typed).executeTakeFirst());
  if (row !== undefined) return done(cardOf(row));
  return refused({
    code: 'notFound',
    what: 'card',
    nearest: code === null ? [] : await codesNear(view, code),
  });
};

/** The card of an id that the records themselves name. */
export const cardById = async (view: ShopView, id: string): Promise<KeptCard | null> => {
  const row = await rowsOf(view).where('id', '=', id).executeTakeFirst();
  return row === undefined ? null : cardOf(row);
};

const codesNear = async (view: ShopView, code: string): Promise<readonly string[]> => {
  const near = misheard(code);
  if (near.length === 0) return [];
  const rows = await view.db
    .selectFrom('card')
    .select('code')
    .where('shop', '=', view.id)
    .where('code', 'in', [...near])
    .orderBy('id', 'desc')
    .limit(3)
    .execute();
  return rows.map((row) => row.code);
};

export type CardsWanted = {
  readonly limit: number;
  /** Only one person's. */
  readonly madeBy?: string;
  /** Only those asked for in one place. */
  readonly place?: string;
  /** Only older ones than the card of this id. */
  readonly before?: string;
};

/** The newest cards first. */
export const latestCards = async (
  view: ShopView,
  { limit, madeBy, place, before }: CardsWanted,
): Promise<readonly KeptCard[]> => {
  let query = rowsOf(view).orderBy('id', 'desc').limit(limit);
  if (madeBy !== undefined) query = query.where('made_by', '=', madeBy);
  if (place !== undefined) query = query.where('place', '=', place);
  if (before !== undefined) query = query.where('id', '<', before);
  return (await query.execute()).map(cardOf);
};

/** Codes with the lines they answered, the newest first: enough to choose one by. */
export const latestCodes = async (
  view: ShopView,
  limit: number,
): Promise<readonly Pick<KeptCard, 'code' | 'words'>[]> =>
  await view.db
    .selectFrom('card')
    .select(['code', 'words'])
    .where('shop', '=', view.id)
    .orderBy('id', 'desc')
    .limit(limit)
    .execute();
