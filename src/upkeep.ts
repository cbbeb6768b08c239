import { forgetAnswers, type Store } from './shop/index.ts';

/** How often what nobody will ask for again is put away. Judgement. */
const EVERY_MS = 24 * 3_600_000;

type UpkeepOptions = {
  readonly now: () => number;
  /** For the log: the records could not be used; the next time it is tried again. */
  readonly onFault: (error: unknown) => void;
  readonly everyMs?: number;
};

/** Puts away the answers that nobody will ask for again, at the start and then once a day. */
export const startUpkeep = (
  store: Store,
  { now, onFault, everyMs = EVERY_MS }: UpkeepOptions,
): { readonly stop: () => Promise<void> } => {
  const tidy = (): Promise<void> => forgetAnswers(store, now()).catch(onFault);
  let round = tidy();
  const timer = setInterval(() => {
    round = round.then(tidy);
  }, everyMs);
  return {
    stop: async () => {
      clearInterval(timer);
      await round;
    },
  };
};
