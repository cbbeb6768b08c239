/** What is wrong with the store itself, as far as the person waiting for an answer is concerned. */
export type UnavailableReason =
  /** Somebody else holds it, and held it for as long as we waited. */
  | 'busy'
  /** It can be read but not written. */
  | 'readOnly'
  /** No room is left for another row. */
  | 'full'
  /** It cannot be reached, was moved away, or is damaged. */
  | 'gone';

const SENTENCES: Record<UnavailableReason, string> = {
  busy: 'The records are in use by another program and did not become free in time.',
  readOnly: 'The records can be read but not written: nothing was changed.',
  full: 'There is no room left for the records: nothing was changed.',
  gone: 'The records cannot be reached.',
};

/** The store cannot do what was asked, and nothing of it was kept. The cause is for the log only. */
export class StoreUnavailable extends Error {
  readonly reason: UnavailableReason;

  constructor(reason: UnavailableReason, cause?: unknown) {
    super(SENTENCES[reason], { cause });
    this.name = 'StoreUnavailable';
    this.reason = reason;
  }
}

/** Two changes got in each other's way. The one that is told so can simply be made again. */
export class Collision extends Error {
  constructor(cause: unknown) {
    super('Two changes met.', { cause });
    this.name = 'Collision';
  }
}

/** The records were written by a newer program, whose meaning this one cannot know. */
export class RecordsTooNew extends Error {
  readonly found: string;
  readonly known: string;

  constructor(found: string, known: string) {
    super(
      `The records were written by a newer Wholetooth (their form is ${found}, this program knows ${known}). Start the newer program, or restore a backup that was made with this one.`,
    );
    this.name = 'RecordsTooNew';
    this.found = found;
    this.known = known;
  }
}

/** What a driver throws, as far as it can be told apart: a code, or nothing. */
export const codeOf = (error: unknown): string => {
  if (!(error instanceof Error) || !('code' in error)) return '';
  return typeof error.code === 'string' ? error.code : '';
};
