import pRetry from 'p-retry';
import { StoreUnavailable } from './faults.ts';

/**
 * How long somebody else may hold the file before the person is told that it is in use.
 * Judgement: longer than any import of ours holds it, short enough for a person to wait.
 */
export const WAIT_MS = 10_000;

/** Between two attempts. Judgement: an ordinary change holds the lock for a few milliseconds. */
const FIRST_PAUSE_MS = 2;
const LONGEST_PAUSE_MS = 40;

/**
 * Tries again while the file is locked by another process, without holding up this one: between
 * two attempts everything else that waits gets its turn.
 */
export const patiently = async <T>(attempt: () => T, waitMs = WAIT_MS): Promise<T> => {
  try {
    return attempt();
  } catch (error) {
    if (!isBusy(error)) throw error;
  }
  return await pRetry(attempt, {
    retries: Number.POSITIVE_INFINITY,
    maxRetryTime: waitMs,
    minTimeout: FIRST_PAUSE_MS,
    maxTimeout: LONGEST_PAUSE_MS,
    factor: 1.5,
    randomize: true,
    shouldRetry: ({ error }) => isBusy(error),
  });
};

const isBusy = (error: unknown): boolean =>
  error instanceof StoreUnavailable && error.reason === 'busy';
