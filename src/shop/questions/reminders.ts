import type { Store } from '../../store/index.ts';
import { type QueuedEffect, queueEffects } from '../effects.ts';
import type { ShopView, ShopWords } from '../view.ts';
import { type DueQuestion, dueQuestions, type PutUp, putUpAgain } from './waiting.ts';

export type ReminderOptions = {
  readonly now: () => number;
  readonly words: ShopWords;
  /** What is to be delivered because a question comes up again. */
  readonly effectsOf: (view: ShopView, putUp: PutUp) => Promise<readonly QueuedEffect[]>;
  /** Something was queued for delivery. */
  readonly onQueued?: () => void;
  /** For the log: the records could not be used. */
  readonly onFault?: (error: unknown) => void;
  readonly pollMs?: number;
};

export type Reminders = {
  /** Puts up again whatever is due. Gives back how many questions were. */
  readonly remindDue: () => Promise<number>;
  /** Goes on until stopped. */
  readonly start: () => void;
  /** Looks now. */
  readonly nudge: () => void;
  /** Begins nothing more and waits for what it has begun. */
  readonly stop: () => Promise<void>;
};

/** Judgement: people read their clocks by the minute. */
const POLL_MS = 20_000;
const PORTION = 50;

/**
 * Puts waiting questions up again at their time. A reminder and the time of the next one are kept
 * in one change, and the reminder's name is made from the question and its number: however many
 * processes look and however often they end in the middle, each comes once.
 */
export const openReminders = (store: Store, options: ReminderOptions): Reminders => {
  const { now, words, effectsOf, pollMs = POLL_MS } = options;
  const { onQueued = () => undefined, onFault = () => undefined } = options;
  let running = false;
  let timer: NodeJS.Timeout | undefined;
  let round: Promise<unknown> = Promise.resolve();

  const remind = ({ shop, id }: DueQuestion): Promise<boolean> =>
    store.transact(async (db) => {
      const change = { id: shop, db, words, at: now() };
      const putUp = await putUpAgain(change, id);
      if (putUp === null) return false;
      await queueEffects(change, await effectsOf(change, putUp));
      return true;
    });

  const remindDue = async (): Promise<number> => {
    let count = 0;
    for (;;) {
      const due = await dueQuestions(store, now(), PORTION);
      let faults = 0;
      for (const question of due) {
        try {
          if (await remind(question)) count += 1;
        } catch (error) {
          // One that cannot be put up now does not keep the others waiting.
          faults += 1;
          onFault(error);
        }
      }
      if (count > 0) onQueued();
      if (due.length < PORTION || faults > 0) return count;
    }
  };

  const look = (): void => {
    clearTimeout(timer);
    round = round
      .then(async () => {
        if (running) await remindDue();
      })
      .catch(onFault)
      .then(() => {
        clearTimeout(timer);
        if (running) timer = setTimeout(look, pollMs);
      });
  };

  return {
    remindDue,
    start: () => {
      running = true;
      look();
    },
    nudge: () => {
      if (running) look();
    },
    stop: async () => {
      running = false;
      clearTimeout(timer);
      await round;
      clearTimeout(timer);
    },
  };
};
