import PQueue from 'p-queue';
import type { Store } from '../store/index.ts';
import {
  type Carried,
  type Claimed,
  claimEffects,
  effectDelivered,
  effectGivenUp,
  effectPostponed,
  type NoteOf,
} from './claims.ts';

/** What became of an attempt. */
export type Attempt =
  | { readonly delivered: true; readonly outcome?: unknown }
  | {
      readonly delivered: false;
      /** What the platform said, without anything secret. */
      readonly fault: string;
      /** It will never be taken: no such channel, no permission. */
      readonly final: boolean;
      /** The platform asked for this pause. */
      readonly againAfterMs?: number;
    };

/** Makes an effect happen. The signal says that the time for it is over. */
export type Deliver = (effect: Claimed, signal: AbortSignal) => Promise<Attempt>;

export type OutboxOptions = {
  readonly worker: string;
  readonly deliver: Deliver;
  /** Whose effects it takes on; everybody's, where not said. */
  readonly carried?: readonly Carried[];
  readonly now: () => number;
  readonly noteOf?: NoteOf;
  /** For the log: the records or the delivery could not be reached. */
  readonly onFault?: (error: unknown) => void;
  readonly leaseMs?: number;
  readonly pollMs?: number;
  /** How many are delivered at a time. */
  readonly concurrency?: number;
};

export type Outbox = {
  /** Delivers whatever is due, until nothing is. Gives back how many attempts were made. */
  readonly deliverDue: () => Promise<number>;
  /** Goes on delivering until stopped. */
  readonly start: () => void;
  /** Something was just queued: look now. */
  readonly nudge: () => void;
  /** Takes on nothing more and waits for what is on its way. */
  readonly stop: () => Promise<void>;
};

/** Judgement: twice what the slowest call of a platform's client takes with its own retries. */
const LEASE_MS = 60_000;
/** The time to deliver ends before the lease does, so that two never deliver at once. */
const SHARE_OF_LEASE = 0.8;
const POLL_MS = 1_000;
const CONCURRENCY = 4;

/** Pauses double from a second to a quarter of an hour; after a day it is given up. Judgement. */
const FIRST_PAUSE_MS = 1_000;
const LONGEST_PAUSE_MS = 15 * 60_000;
const GIVE_UP_MS = 24 * 3_600_000;
/** Pauses differ by up to this share, so that what failed together is not tried together. */
const SPREAD = 0.2;
const LONGEST_FAULT = 300;

/** The pause after an attempt. */
export const pauseAfter = (attempt: number, chance = Math.random()): number => {
  const pause = Math.min(FIRST_PAUSE_MS * 2 ** (attempt - 1), LONGEST_PAUSE_MS);
  return Math.round(pause * (1 + SPREAD * chance));
};

export const openOutbox = (store: Store, options: OutboxOptions): Outbox => {
  const { onFault = () => undefined, pollMs = POLL_MS, concurrency = CONCURRENCY } = options;
  const queue = new PQueue({ concurrency });
  let running = false;
  let timer: NodeJS.Timeout | undefined;
  let round: Promise<unknown> = Promise.resolve();

  const takeOn = async (): Promise<number> => {
    const { worker, carried, now, leaseMs = LEASE_MS } = options;
    const most = concurrency - queue.pending - queue.size;
    if (most <= 0) return 0;
    const claimed = await claimEffects(store, { worker, carried, at: now(), leaseMs, most });
    for (const effect of claimed) {
      queue.add(() => attempt(store, options, effect)).catch(onFault);
    }
    return claimed.length;
  };

  const deliverDue = async (): Promise<number> => {
    for (let count = 0; ; ) {
      const taken = await takeOn();
      count += taken;
      await queue.onIdle();
      if (taken === 0) return count;
    }
  };

  const look = (): void => {
    clearTimeout(timer);
    round = round
      .then(takeOn)
      .catch((error: unknown) => {
        onFault(error);
        return 0;
      })
      .then((taken) => {
        clearTimeout(timer);
        if (running) timer = setTimeout(look, taken > 0 ? 0 : pollMs);
      });
  };

  return {
    deliverDue,
    start: () => {
      running = true;
      // A free place is filled at once, not at the next look.
      queue.on('next', () => {
        if (running) look();
      });
      look();
    },
    nudge: () => {
      if (running) look();
    },
    stop: async () => {
      running = false;
      queue.removeAllListeners('next');
      clearTimeout(timer);
      await round;
      clearTimeout(timer);
      await queue.onIdle();
    },
  };
};

/** One attempt, and what becomes of the effect because of it. */
const attempt = async (store: Store, options: OutboxOptions, effect: Claimed): Promise<void> => {
  const { leaseMs = LEASE_MS, now, noteOf = () => null } = options;
  const result = await timely(options.deliver, effect, leaseMs * SHARE_OF_LEASE);
  const at = now();
  if (result.delivered) {
    await effectDelivered(store, effect, result.outcome, at);
    return;
  }
  const fault = result.fault.slice(0, LONGEST_FAULT);
  if (result.final || at - effect.firstAt >= GIVE_UP_MS) {
    await effectGivenUp(store, effect, fault, at, noteOf);
  } else {
    const pause = result.againAfterMs ?? pauseAfter(effect.attempt);
    await effectPostponed(store, effect, fault, at + pause);
  }
};

const timely = async (deliver: Deliver, effect: Claimed, ms: number): Promise<Attempt> => {
  const over = new AbortController();
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<Attempt>((resolve) => {
    timer = setTimeout(() => {
      over.abort();
      resolve({ delivered: false, fault: 'no answer in time', final: false });
    }, ms);
  });
  try {
    return await Promise.race([deliver(effect, over.signal).catch(asFault), late]);
  } finally {
    clearTimeout(timer);
  }
};

const asFault = (error: unknown): Attempt => ({
  delivered: false,
  fault: error instanceof Error ? error.message : String(error),
  final: false,
});
