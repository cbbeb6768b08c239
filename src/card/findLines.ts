import type { SymptomId } from '../calc/index.ts';
import type { Nothing } from './nothing.ts';
import type { ResultLines } from './resultLines.ts';
import type { Moment } from './shopLines.ts';

/** What can be found by words. */
export type FoundKind = 'standard' | 'card' | 'question' | 'result';

/** How a part came out, where the thing is a result. */
type WentAs = {
  readonly outcome: ResultLines['resultShown']['outcome'];
  readonly symptom: SymptomId | null;
};

/** A thing in a list: what it is called by, what is said in it, who, when, and how it stands. */
export type FoundThing = {
  readonly kind: FoundKind;
  readonly name: string;
  readonly went: WentAs | null;
  /** People's own words. */
  readonly said: string;
  /** One of the program's words: approved, open …; null where it has no state. */
  readonly state: string | null;
  readonly by: string;
  readonly moment: Moment;
};

export type FindLines = {
  found: { readonly count: number; readonly more: boolean; readonly kind: FoundKind | null };
  /** Nothing of the kind that was named, but of others. */
  foundOthers: { readonly kind: FoundKind };
  foundNothing: { readonly words: string; readonly kind: FoundKind | null };
  foundNearest: { readonly nearest: readonly string[] };
  foundHow: Nothing;
  foundMore: Nothing;
};

export type FindRows = { foundThing: FoundThing };

export type FindLabels = {
  openFound: { readonly kind: FoundKind; readonly name: string };
  /** The same question with one word as the shop writes it. */
  findInstead: { readonly word: string };
};
