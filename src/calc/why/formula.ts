import type { SourceId } from '../sources.ts';

/** A formula as the card of the function that works it out prints it, and where it comes from. */
export type Formula = {
  readonly formula: readonly string[];
  readonly sources: readonly SourceId[];
};
