import { literally } from '../store/index.ts';
import type { ShopChange, ShopView } from './view.ts';

/** What queueing needs of a change: whose and when. */
export type Queueing = Pick<ShopChange, 'id' | 'db' | 'at'>;

/** What must happen besides the reply, as it is queued; the effect itself is opaque here. */
export type QueuedEffect = {
  /** Tells a second copy from a new effect. */
  readonly key: string;
  readonly effect: unknown;
  /** The key of the effect that must have taken place before: the post that is to be pinned. */
  readonly after?: string;
  /** Not before this moment. */
  readonly notBefore?: number;
};

/**
 * Writes effects down in the same change as what caused them, so that both are kept or neither.
 *
 * @returns the keys that were new
 */
export const queueEffects = async (
  change: Queueing,
  effects: readonly QueuedEffect[],
): Promise<readonly string[]> => {
  const queued: string[] = [];
  for (const effect of effects) {
    const { state, fault } = await startingState(change, effect.after);
    const row = await change.db
      .insertInto('effect')
      .values({
        shop: change.id,
        id: change.db.newId(change.at),
        key: effect.key,
        effect: JSON.stringify(effect.effect),
        state,
        after: effect.after ?? null,
        made_at: change.at,
        due_at: Math.max(change.at, effect.notBefore ?? 0),
        attempts: 0,
        first_at: null,
        worker: null,
        delivered_at: null,
        given_up_at: state === 'givenUp' ? change.at : null,
        seen_at: null,
        last_fault: fault,
        outcome: null,
        place: null,
      })
      .onConflict((oc) => oc.columns(['shop', 'key']).doNothing())
      .returning('key')
      .executeTakeFirst();
    if (row !== undefined) queued.push(row.key);
  }
  return queued;
};

type Starting = {
  readonly state: 'waiting' | 'held' | 'givenUp';
  readonly fault: string | null;
};

/**
 * Held until the one before it has taken place, and given up with it. That one's row is written to,
 * unchanged, so that it cannot be delivered unseen at the same moment, which would leave this one
 * held for ever.
 */
const startingState = async (change: Queueing, after: string | undefined): Promise<Starting> => {
  if (after === undefined) return { state: 'waiting', fault: null };
  const before = await change.db
    .updateTable('effect')
    .set((eb) => ({ attempts: eb.ref('attempts') }))
    .where('shop', '=', change.id)
    .where('key', '=', after)
    .returning(['state', 'last_fault'])
    .executeTakeFirst();
  if (before === undefined) throw new Error(`an effect waits for ${after}, which was never queued`);
  if (before.state === 'givenUp') return { state: 'givenUp', fault: before.last_fault };
  return { state: before.state === 'delivered' ? 'waiting' : 'held', fault: null };
};

/** Whether an effect was queued, and may still take place or has. */
export const isUnderWay = async (view: ShopView, key: string): Promise<boolean> => {
  const row = await view.db
    .selectFrom('effect')
    .select('state')
    .where('shop', '=', view.id)
    .where('key', '=', key)
    .executeTakeFirst();
  return row !== undefined && row.state !== 'givenUp';
};

/** An effect as it was queued, whatever has become of it. */
export const effectOf = async (view: ShopView, key: string): Promise<unknown> => {
  const row = await view.db
    .selectFrom('effect')
    .select('effect')
    .where('shop', '=', view.id)
    .where('key', '=', key)
    .executeTakeFirst();
  return row === undefined ? null : (JSON.parse(row.effect) as unknown);
};

/** An effect that could not be delivered and will not be tried again. */
export type GivenUp = {
  readonly id: string;
  readonly key: string;
  readonly effect: unknown;
  readonly attempts: number;
  readonly givenUpAt: number;
  /** What the platform said last. */
  readonly fault: string;
};

/** What was given up and nobody was shown yet: to be said at the next occasion. */
export const givenUp = async (view: ShopView, limit = 10): Promise<readonly GivenUp[]> => {
  const rows = await view.db
    .selectFrom('effect')
    .selectAll()
    .where('shop', '=', view.id)
    .where('state', '=', literally('givenUp'))
    .where('seen_at', 'is', null)
    .orderBy('id')
    .limit(limit)
    .execute();
  return rows.map((row) => ({
    id: row.id,
    key: row.key,
    effect: JSON.parse(row.effect) as unknown,
    attempts: row.attempts,
    givenUpAt: row.given_up_at ?? row.due_at,
    fault: row.last_fault ?? '',
  }));
};

/** These were shown to somebody. */
export const givenUpSeen = async (change: ShopChange, ids: readonly string[]): Promise<void> => {
  if (ids.length === 0) return;
  await change.db
    .updateTable('effect')
    .set({ seen_at: change.at })
    .where('shop', '=', change.id)
    .where('state', '=', literally('givenUp'))
    .where('id', 'in', [...ids])
    .execute();
};
