import type { Refusal } from '../refusal.ts';
import type { Cursor } from './cursor.ts';
import type { Measure } from './unit.ts';

/** What stands at a place: a value and how many tokens it takes, or why it cannot be taken. */
export type Reading<T> =
  | { readonly value: T; readonly used: number }
  | { readonly refusal: Refusal };

export const took = <T>(value: T, used: number): Reading<T> => ({ value, used });
export const refused = (refusal: Refusal): { readonly refusal: Refusal } => ({ refusal });

/** What two halves of one thing say together; null where both say it and differ. */
export const either = <T>(a: T | null, b: T | null): { readonly value: T | null } | null =>
  a !== null && b !== null && a !== b ? null : { value: a ?? b };

/** Names the shop has given, which the reader cannot know by itself. */
export type Names = {
  readonly wheels: readonly string[];
  readonly machines: readonly string[];
  /** Its own names for rows of the table of materials. */
  readonly materials?: readonly { readonly name: string; readonly base: string }[];
  /** Part numbers that it keeps a standard for. */
  readonly standards?: readonly string[];
};
export const NO_NAMES: Names = { wheels: [], machines: [] };

/** Kinds of names that can be offered while somebody types. */
export type Suggested =
  | 'materials'
  /** Only those that a shop has named itself. */
  | 'ownMaterials'
  | 'wheels'
  | 'machines'
  | 'cards'
  | 'standards'
  | 'people';

/** Reads a value at a place; null where nothing of its kind stands there. */
export type Reader<T> = (cursor: Cursor, names: Names) => Reading<T> | null;

/**
 * One thing a person can say, and all the ways of saying it. From these records come the reader of
 * plain words, the options and forms of the platforms, and the help text.
 */
export type Parameter<T> = {
  readonly name: string;
  /** Reads the value after a keyword, or as the whole of an option. */
  readonly read: Reader<T>;
  /** Words that announce the value: `long 1.5`. */
  readonly keywords?: readonly string[];
  /** The keyword may also follow: `1.5 long`. */
  readonly postfix?: boolean;
  /** A keyword without a value of its own is only a filler: the `bar` of `1 in bar`. */
  readonly loose?: boolean;
  /** Words that are the value by themselves: `as-is`. */
  readonly values?: readonly (readonly [phrase: string, value: T])[];
  /** Reads the value where no keyword announces it. */
  readonly free?: Reader<T>;
  /** Reads forms that give it away without a keyword in front: `20mm wheel`, `1.0 ±0.005`. */
  readonly unannounced?: Reader<T>;
  /** Quantities that can only be this: 200 rpm. */
  readonly measures?: readonly Measure[];
  /** Takes a number that says nothing about itself. */
  readonly bare?: boolean;
  /** What a number that says nothing about itself may also have been meant for: `21 tpi`. */
  readonly mayBe?: (number: string) => readonly string[];
  /** Puts together what was said in two places; null where the two disagree. */
  readonly merge?: (a: T, b: T) => T | null;
  /** Words of the person's own; a form's field is quoted, so that it is taken as it stands. */
  readonly text?: boolean;
  /** Nothing but `values` says it: a platform may list them all. */
  readonly closed?: boolean;
  /** Where names to offer while somebody types come from. */
  readonly suggests?: Suggested;
  /** Things to type, shown where it is missing and in the help. */
  readonly examples: readonly string[];
  /** The same for a shop that measures in mm, where those would not do. */
  readonly metricExamples?: readonly string[];
};
