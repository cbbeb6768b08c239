import { type EffectTable, literally, type Reader, type Store, type Tx } from '../store/index.ts';
import { type QueuedEffect, queueEffects } from './effects.ts';
import type { ShopView } from './view.ts';

/** Shops that a process can reach. What is queued for others is left to the processes of theirs. */
export type Carried = {
  readonly platform: string;
  /** The shops' own ids there; null: every shop of the platform. */
  readonly shops: readonly string[] | null;
};

/** An effect that this process has taken on, for as long as its lease lasts. */
export type Claimed = {
  readonly shop: string;
  /** Where the shop talks, and its own id there. */
  readonly platform: string;
  readonly outside: string;
  readonly id: string;
  readonly key: string;
  readonly effect: unknown;
  /** 1 the first time. From 2 on it may have taken place already: look before doing it again. */
  readonly attempt: number;
  readonly worker: string;
  /** When it was first tried. */
  readonly firstAt: number;
  /** What the platform gave back for the effect this one waited for. */
  readonly earlier: unknown;
};

export type ClaimOptions = {
  readonly worker: string;
  readonly at: number;
  readonly leaseMs: number;
  readonly most: number;
  /** Everybody's, where not said. */
  readonly carried?: readonly Carried[] | undefined;
};

/**
 * Takes on what is due. Its next moment is set to the end of the lease: if this process ends
 * before it has said what became of it, another takes it on then.
 */
export const claimEffects = async (
  store: Store,
  options: ClaimOptions,
): Promise<readonly Claimed[]> => {
  // A look costs nothing; a change takes its place in the line of those who write.
  const due = await dueRows(store.read, options).select('effect.id').limit(1).executeTakeFirst();
  if (due === undefined) return [];
  return await store.transact((tx) => takeOn(tx, store.engine, options));
};

/** The engine goes through what is due and looks up whose it is, never the other way round. */
const dueRows = (db: Pick<Reader, 'selectFrom'>, { at, carried }: ClaimOptions) =>
  db
    .selectFrom('effect')
    .crossJoin('shop')
    .whereRef('shop.id', '=', 'effect.shop')
    .where('effect.state', '=', literally('waiting'))
    .where('effect.due_at', '<=', at)
    .$if(carried !== undefined, (query) =>
      query.where((eb) =>
        eb.or(
          (carried ?? []).map(({ platform, shops }) => {
            const there = eb('shop.platform', '=', platform);
            return shops === null ? there : eb.and([there, eb('shop.outside', 'in', [...shops])]);
          }),
        ),
      ),
    )
    .orderBy('effect.due_at')
    .orderBy('effect.id');

const takeOn = async (
  tx: Tx,
  engine: Store['engine'],
  options: ClaimOptions,
): Promise<readonly Claimed[]> => {
  const { worker, at, leaseMs, most } = options;
  const wanted = dueRows(tx, options)
    .selectAll('effect')
    .select(['shop.platform', 'shop.outside'])
    .limit(most);
  // On a server another process may be taking on the same ones: what it holds is passed over.
  const locked = engine === 'postgres' ? wanted.forUpdate('effect').skipLocked() : wanted;
  const rows = await locked.execute();
  const claimed: Claimed[] = [];
  for (const row of rows) {
    const attempt = row.attempts + 1;
    const firstAt = row.first_at ?? at;
    await rowOf(tx, row)
      .set({ attempts: attempt, first_at: firstAt, due_at: at + leaseMs, worker })
      .execute();
    claimed.push({
      shop: row.shop,
      platform: row.platform,
      outside: row.outside,
      id: row.id,
      key: row.key,
      effect: JSON.parse(row.effect),
      attempt,
      worker,
      firstAt,
      earlier: row.after === null ? null : await outcomeOf(tx, row.shop, row.after),
    });
  }
  return claimed;
};

const rowOf = (tx: Tx, { shop, id }: Pick<EffectTable, 'shop' | 'id'>) =>
  tx.updateTable('effect').where('shop', '=', shop).where('id', '=', id);

const outcomeOf = async (tx: Tx, shop: string, key: string): Promise<unknown> => {
  const row = await tx
    .selectFrom('effect')
    .select('outcome')
    .where('shop', '=', shop)
    .where('key', '=', key)
    .executeTakeFirst();
  const outcome = row?.outcome ?? null;
  return outcome === null ? null : JSON.parse(outcome);
};

/** Where it took place, where that is known. */
const placeIn = (outcome: unknown): string | null =>
  typeof outcome === 'object' &&
  outcome !== null &&
  'place' in outcome &&
  typeof outcome.place === 'string'
    ? outcome.place
    : null;

/** It has taken place. What waited for it may go now. */
export const effectDelivered = async (
  store: Store,
  claimed: Claimed,
  outcome: unknown,
  at: number,
): Promise<void> => {
  await store.transact(async (tx) => {
    await rowOf(tx, claimed)
      .where('state', '=', literally('waiting'))
      .set({
        state: 'delivered',
        delivered_at: at,
        worker: null,
        outcome: outcome === undefined ? null : JSON.stringify(outcome),
        place: placeIn(outcome),
      })
      .execute();
    await tx
      .updateTable('effect')
      .set({ state: 'waiting' })
      .where('shop', '=', claimed.shop)
      .where('after', '=', claimed.key)
      .where('state', '=', literally('held'))
      .execute();
  });
};

/** Not this time. Only who still has it says when it is tried again. */
export const effectPostponed = async (
  store: Store,
  claimed: Claimed,
  fault: string,
  dueAt: number,
): Promise<void> => {
  await store.transact(async (tx) => {
    await rowOf(tx, claimed)
      .where('state', '=', literally('waiting'))
      .where('worker', '=', claimed.worker)
      .where('attempts', '=', claimed.attempt)
      .set({ due_at: dueAt, worker: null, last_fault: fault })
      .execute();
  });
};

/** What is to happen because an effect was given up: the visible note. */
export type NoteOf = (
  givenUp: Claimed,
  fault: string,
  of: Pick<ShopView, 'id' | 'db'>,
) => Promise<QueuedEffect | null> | QueuedEffect | null;

/** Not at all. What waited for it is given up with it, and a note takes its place. */
export const effectGivenUp = async (
  store: Store,
  claimed: Claimed,
  fault: string,
  at: number,
  noteOf: NoteOf,
): Promise<void> => {
  await store.transact(async (tx) => {
    const given = { state: 'givenUp', given_up_at: at, worker: null, last_fault: fault };
    const { numUpdatedRows } = await rowOf(tx, claimed)
      .where('state', '=', literally('waiting'))
      .set(given)
      .executeTakeFirstOrThrow();
    // Another process, after this one's lease, has delivered it or given it up already.
    if (numUpdatedRows === 0n) return;
    let keys: readonly string[] = [claimed.key];
    while (keys.length > 0) {
      const held = await tx
        .updateTable('effect')
        .set(given)
        .where('shop', '=', claimed.shop)
        .where('after', 'in', [...keys])
        .where('state', '=', literally('held'))
        .returning('key')
        .execute();
      keys = held.map(({ key }) => key);
    }
    const of = { id: claimed.shop, db: tx };
    const note = await noteOf(claimed, fault, of);
    if (note !== null) await queueEffects({ ...of, at }, [note]);
  });
};
