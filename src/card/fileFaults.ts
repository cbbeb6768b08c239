/** What is wrong with a cell of a file that was read in. */
export type CellFault = {
  readonly column: string;
  /** What stands there. */
  readonly cell: string;
} & (
  | { readonly why: 'missing'; readonly examples: readonly string[] }
  | { readonly why: 'unreadable'; readonly examples: readonly string[] }
  /** It is a quantity, but of another kind: a weight where a length belongs. */
  | { readonly why: 'wrongUnit'; readonly wanted: readonly string[] }
  | { readonly why: 'notOneOf'; readonly choices: readonly string[] }
  /** It can be read in two ways. */
  | { readonly why: 'unclear'; readonly readings: readonly string[] }
  | {
      readonly why: 'outOfRange';
      readonly value: number;
      readonly min: number;
      readonly max: number;
      readonly unit: string;
    }
  /** The name stands in an earlier line of the same file. */
  | { readonly why: 'twice'; readonly line: number }
  /** The shop has one of this name with other values, and it was not said to replace them. */
  | { readonly why: 'differs'; readonly columns: readonly string[] }
);

/** Why nothing of a file was read. */
export type FileFault =
  | { readonly why: 'empty' }
  | { readonly why: 'tooLong'; readonly most: number }
  | { readonly why: 'tooManyRows'; readonly most: number }
  /** Its quotes do not close, or it is no table. */
  | { readonly why: 'notATable'; readonly line: number }
  | {
      readonly why: 'columns';
      readonly missing: readonly string[];
      readonly found: readonly string[];
    }
  /** Two columns say the same thing. */
  | { readonly why: 'columnTwice'; readonly column: string };
