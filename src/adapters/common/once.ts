/**
 * Says of each interaction once that it is new. Where several processes share the work, whoever
 * builds the adapter hands in one that asks the records instead.
 */
export type Once = (interaction: string) => boolean | Promise<boolean>;

/** Platforms repeat within minutes; this many are remembered by one process. Judgement. */
const MOST = 20_000;

export const onceInProcess = (most = MOST): Once => {
  const seen = new Set<string>();
  return (interaction) => {
    if (seen.has(interaction)) return false;
    seen.add(interaction);
    const [oldest] = seen;
    if (seen.size > most && oldest !== undefined) seen.delete(oldest);
    return true;
  };
};
