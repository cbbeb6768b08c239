import type { QueuedEffect } from '../shop/index.ts';
import type { Effect } from './effect.ts';

/** An effect as the outbox takes it. */
export const queued = (effect: Effect): QueuedEffect => ({
  key: effect.key,
  effect,
  // What is pinned, or gets a thread, has to be there first.
  ...('of' in effect ? { after: effect.of } : {}),
});
