import type { Refusal, Suggestion } from '../refusal.ts';
import { type Cursor, moved, spanOf } from './cursor.ts';
import { quantityAt } from './quantity.ts';
import { placeOf } from './range.ts';
import type { Names, Reading } from './reading.ts';
import type { AnyParameter, Vocabulary } from './vocabulary.ts';

export type Found = {
  readonly parameter: AnyParameter;
  readonly value: unknown;
  readonly used: number;
};

/** What stands at a place: a value, words that add nothing, or what is to be asked. */
export type Step =
  | { readonly found: Found }
  | { readonly skip: number }
  | { readonly refusal: Refusal; readonly choices?: readonly Suggestion[] };

/** What a line is listened to with. */
export type Ear = {
  readonly vocabulary: Vocabulary;
  readonly names: Names;
  /** What stands at another place, for looking ahead. */
  readonly step: (cursor: Cursor) => Step;
};

/** A refusal that does not say where it lies is about the words that were being read. */
const located = (cursor: Cursor, used: number, refusal: Refusal): Refusal => {
  if (refusal.code !== 'outOfRange' && refusal.code !== 'unclear') return refusal;
  return refusal.start === undefined
    ? { ...refusal, ...placeOf(cursor, spanOf(cursor, used)) }
    : refusal;
};

/** A parameter's reading as a step, with the words that announced it. */
export const stepOf = (
  cursor: Cursor,
  parameter: AnyParameter,
  reading: Reading<unknown>,
  before = 0,
): Step => {
  if ('value' in reading)
    return { found: { parameter, value: reading.value, used: reading.used + before } };
  const used = before + (quantityAt(moved(cursor, before))?.used ?? 1);
  return { refusal: located(cursor, used, reading.refusal) };
};

export const isFound = (step: Step): step is { readonly found: Found } => 'found' in step;
export const isUnreadable = (step: Step): boolean =>
  'refusal' in step && step.refusal.code === 'unreadable';
