/** Where an adapter says what went wrong; whoever builds it decides where that is written. */
export type Log = {
  /** Something failed that nobody may have seen: counted and written down. */
  readonly fault: (what: string, details: Readonly<Record<string, unknown>>) => void;
  readonly note: (what: string, details: Readonly<Record<string, unknown>>) => void;
};
