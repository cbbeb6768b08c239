/** What one interaction did, as it was acknowledged and as it was kept. */
export type Did = {
  readonly interaction: string;
  /** Ids of wheels that were added, and of those that were removed. */
  readonly wheels: readonly string[];
  readonly removed: readonly string[];
  /** Codes. */
  readonly cards: readonly string[];
  /** Ids of results that were logged, and of those that were withdrawn. */
  readonly results: readonly string[];
  readonly withdrawn: readonly string[];
  /** Ids of revisions of a standard that were approved. */
  readonly approved: readonly string[];
  /** Ids of questions that were asked, of answers that were given, of questions that were solved. */
  readonly asked: readonly string[];
  readonly answered: readonly string[];
  readonly solved: readonly string[];
  /** Keys. */
  readonly effects: readonly string[];
};

/** The wheel on which every interaction counts itself. */
export const TALLY = 'tally';

/** The wheel that every result is of. */
export const WORN = 'worn';
