import {
  type Cursor,
  isAfterComma,
  longestAt,
  moved,
  phraseAt,
  spanOf,
  textAt,
  tokenAt,
} from './cursor.ts';
import { type Ear, isFound, type Step, stepOf } from './ear.ts';
import { readAs } from './edit.ts';
import { quantityAt } from './quantity.ts';
import { placeOf } from './range.ts';
import type { Quantity } from './unit.ts';
import { unreadable } from './unreadable.ts';
import { type AnyParameter, examplesOf, type Phrases } from './vocabulary.ts';

/** A step, and how many words it rests on: the longer of two readings is taken. */
export type Weighed = { readonly step: Step; readonly words: number };

/** `long` with nothing readable behind it. */
export const keywordAlone = (cursor: Cursor, parameter: AnyParameter, used: number): Step => {
  if (parameter.loose === true) return { skip: used };
  const examples = examplesOf(parameter, cursor.units);
  // A number of another kind, such as the angle of `long 30deg`, is part of what is not clear.
  const next = moved(cursor, used);
  const number = quantityAt(next);
  if (number === null && /\d/u.test(textAt(next))) return unreadable(next, []);
  const other = number !== null && !isAfterComma(next) && number.unit !== null ? number.used : 0;
  const span = spanOf(cursor, used + other);
  return {
    refusal: { code: 'missing', parameter: parameter.name, examples, ...placeOf(cursor, span) },
    choices: examples.map((example) => readAs(cursor.text, span, example)),
  };
};

/**
 * Whether a loose keyword only stands before something else: `bar 304`, `on a 1.0 bar`. A bare
 * number belongs to the keyword, unless the keyword wants a name.
 */
const isFillerOnly = (cursor: Cursor, refused: Step, ear: Ear): boolean => {
  let next = cursor;
  while (tokenAt(next) !== undefined) {
    const step = ear.step(next);
    if (isFound(step)) return step.found.parameter.bare !== true || isNotFound(refused);
    if ('refusal' in step) return false;
    next = moved(next, step.skip);
  }
  return true;
};

const isNotFound = (step: Step): boolean => 'refusal' in step && step.refusal.code === 'notFound';

/** One word may announce two parameters (`square` edges, `square` patterns): the first that reads. */
const announcedBy = (cursor: Cursor, phrases: Phrases, used: number, ear: Ear): Step | null => {
  const after = moved(cursor, used);
  for (const [phrase, { kind, parameter }] of phrases) {
    if (kind !== 'keyword' || phrase.length !== used || phraseAt(cursor, phrase) === 0) continue;
    const reading = parameter.read(after, ear.names);
    const step = reading === null ? null : stepOf(cursor, parameter, reading, used);
    if (step === null) continue;
    if (parameter.loose === true && 'refusal' in step && isFillerOnly(after, step, ear))
      return { skip: used };
    return step;
  }
  return null;
};

/** A phrase that is a value by itself, or a keyword and what it announces. */
export const byPhrase = (cursor: Cursor, ear: Ear): Weighed | null => {
  const phrases = ear.vocabulary.phrases.get(textAt(cursor));
  if (phrases === undefined) return null;
  const longest = longestAt(cursor, phrases);
  if (longest === null) return null;
  const { value: meaning, used } = longest;
  if (meaning.kind === 'value') {
    const { parameter, value } = meaning;
    return { step: { found: { parameter, value, used } }, words: used };
  }
  const step = announcedBy(cursor, phrases, used, ear);
  return { step: step ?? keywordAlone(cursor, meaning.parameter, used), words: used };
};

/** The keyword that may stand behind a number: the `long` of `1.5 long`. */
const keywordBehind = (
  cursor: Cursor,
  quantity: Quantity,
  ear: Ear,
): { readonly parameter: AnyParameter; readonly used: number } | null => {
  const after = moved(cursor, quantity.used);
  if (isAfterComma(after)) return null;
  const phrases = ear.vocabulary.phrases.get(textAt(after));
  const longest = phrases === undefined ? null : longestAt(after, phrases);
  if (longest?.value.kind !== 'keyword' || longest.value.parameter.postfix !== true) return null;
  return { parameter: longest.value.parameter, used: longest.used };
};

/**
 * Whether the keyword behind a number belongs to it: `1.5 long`, and not `1.0 long 1.5`. In a row
 * such as `1.5 long 3 out` the last one decides.
 */
const belongs = (cursor: Cursor, quantity: Quantity, ear: Ear): boolean => {
  const keyword = keywordBehind(cursor, quantity, ear);
  if (keyword === null) return false;
  const next = moved(cursor, quantity.used + keyword.used);
  if (isAfterComma(next)) return true;
  const announced = keyword.parameter.read(next, ear.names);
  const following = quantityAt(next);
  if (announced === null || 'refusal' in announced || following === null) return true;
  return belongs(next, following, ear);
};

/** `1.5 long`, where the keyword does not announce what follows it. */
export const postfixed = (cursor: Cursor, quantity: Quantity, ear: Ear): Step | null => {
  const keyword = keywordBehind(cursor, quantity, ear);
  if (keyword === null || !belongs(cursor, quantity, ear)) return null;
  const { parameter, used } = keyword;
  const reading = parameter.read(cursor, ear.names);
  if (reading === null) return null;
  return 'value' in reading
    ? { found: { parameter, value: reading.value, used: reading.used + used } }
    : stepOf(cursor, parameter, reading);
};
