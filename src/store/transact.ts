import { AsyncLocalStorage } from 'node:async_hooks';
import { setTimeout as pause } from 'node:timers/promises';
import { Collision, StoreUnavailable } from './faults.ts';

/** How often a change that met another is made again. Judgement: two meet rarely, six never did. */
const COLLISIONS = 6;
const COLLISION_PAUSE_MS = 15;
/** Pauses before a lost server is asked again. Judgement: together under the three seconds that
 * a request may take before the platform must hear of it. */
const LOST_PAUSES_MS: readonly number[] = [100, 400, 1_000];

export type TransactOptions = {
  /**
   * The work may be run again although its first run may have been kept: it looks for its own
   * traces (an interaction's answer) before it acts. Then a server that was lost at the moment of
   * acknowledging is asked again, instead of leaving the person in doubt.
   */
  readonly repeatable?: boolean;
};

type Run = <T>(once: () => Promise<T>, options?: TransactOptions) => Promise<T>;

/** Runs changes one whole time each, again where that is right, and never one inside another. */
export const changeRunner = (): Run => {
  const inside = new AsyncLocalStorage<true>();
  return async (once, options = {}) => {
    if (inside.getStore() === true) {
      throw new Error('A change inside a change: hand the open one on instead of opening another.');
    }
    return await inside.run(true, () => again(once, options.repeatable === true));
  };
};

const again = async <T>(once: () => Promise<T>, repeatable: boolean): Promise<T> => {
  let collisions = 0;
  let losses = 0;
  for (;;) {
    try {
      return await once();
    } catch (error) {
      if (error instanceof Collision && collisions < COLLISIONS) {
        collisions += 1;
        await pause(Math.random() * COLLISION_PAUSE_MS * collisions);
        continue;
      }
      const wait = repeatable && isLoss(error) ? LOST_PAUSES_MS[losses] : undefined;
      if (wait === undefined) throw error;
      losses += 1;
      await pause(wait);
    }
  }
};

const isLoss = (error: unknown): boolean =>
  error instanceof StoreUnavailable && error.reason === 'gone';
