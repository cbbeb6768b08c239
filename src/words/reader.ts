import type { Refusal, Suggestion } from '../refusal.ts';
import { type Cursor, cursorOf, moved, type ShopUnits, spanOf } from './cursor.ts';
import { type Ear, type Found, isUnreadable, type Step } from './ear.ts';
import { partOf, readAs, withMore, without } from './edit.ts';
import { numberOf } from './numbers.ts';
import { outOfRange, placeOf } from './range.ts';
import { type Names, NO_NAMES } from './reading.ts';
import { earFor } from './step.ts';
import type { Span } from './tokens.ts';
import type { AnyParameter, Vocabulary } from './vocabulary.ts';

/** A line longer than this is a letter, not a request. Judgement. */
export const LONGEST_LINE = 1000;

export type ReadLine = {
  readonly values: ReadonlyMap<string, unknown>;
  readonly spans: ReadonlyMap<string, readonly Span[]>;
};
/** Whether something stands here that is more than a word nobody knows. */
export const isReadable = (
  cursor: Cursor,
  vocabulary: Vocabulary,
  names: Names = NO_NAMES,
): boolean => {
  const next = earFor(vocabulary, names).step(cursor);
  return 'found' in next || ('refusal' in next && !isUnreadable(next));
};

type Refused = { readonly refusal: Refusal; readonly choices: readonly Suggestion[] };
export type LineResult = { readonly read: ReadLine } | Refused;

type Fault = Extract<Step, { readonly refusal: Refusal }>;

type Progress = { readonly values: Map<string, unknown>; readonly spans: Map<string, Span[]> };

/** What the second of two bare sizes may have been meant for instead: the 1mm of `25 straight 1mm`. */
const otherwise = (cursor: Cursor, second: Span, ear: Ear): readonly Suggestion[] => {
  const typed = partOf(cursor.text, second);
  const isBare = numberOf(typed) !== null;
  return ear.vocabulary.parameters
    .flatMap((parameter) => parameter.mayBe?.(typed.replace(/ ?mm$/iu, '')) ?? [])
    .filter((unit) => isBare || unit === 'pitch')
    .map((unit) => readAs(cursor.text, second, `${typed} ${unit}`));
};

/** The same thing said twice and differently: which one is asked. */
const twice = (
  cursor: Cursor,
  { name, bare }: AnyParameter,
  first: Span,
  second: Span,
  ear: Ear,
): Refusal => ({
  code: 'unclear',
  what: name,
  because: 'saidTwice',
  readings: [
    { label: partOf(cursor.text, first), words: without(cursor.text, second) },
    { label: partOf(cursor.text, second), words: without(cursor.text, first) },
    ...(bare === true ? otherwise(cursor, second, ear) : []),
  ],
  ...placeOf(cursor, second),
});

/** Sizes that differ only by the last digit of a conversion are one size: 7/8 and 22.225 mm. */
const SAME = 1e-9;

const same = (a: unknown, b: unknown): boolean =>
  typeof a === 'number' && typeof b === 'number'
    ? Math.abs(a - b) <= SAME * Math.max(1, Math.abs(a))
    : JSON.stringify(a) === JSON.stringify(b);

/** Puts a value in its place, or says why it cannot stand beside what was said before. */
const put = (progress: Progress, cursor: Cursor, found: Found, ear: Ear): Refusal | null => {
  const { name, merge } = found.parameter;
  const span = spanOf(cursor, found.used);
  const earlier = progress.spans.get(name) ?? [];
  const [first] = earlier;
  if (first !== undefined) {
    const before = progress.values.get(name);
    const together = merge?.(before, found.value) ?? (same(before, found.value) ? before : null);
    if (together === null) return twice(cursor, found.parameter, first, span, ear);
    progress.values.set(name, together);
  } else progress.values.set(name, found.value);
  progress.spans.set(name, [...earlier, span]);
  return null;
};

/** Longer than this nobody types, but a platform lets through. Judgement. */
const LONG_LINE = 60;

/** A long line is heard from its end first, so that looking ahead never has far to go. */
const fromTheEnd = (start: Cursor, ear: Ear): void => {
  if (start.tokens.length <= LONG_LINE) return;
  for (let at = start.tokens.length - 1; at >= start.at; at -= 1) ear.step({ ...start, at });
};

/** Reads word by word until the end, or until something has to be asked. */
const listen = (start: Cursor, ear: Ear): { readonly read: ReadLine } | Fault => {
  fromTheEnd(start, ear);
  const progress: Progress = { values: new Map(), spans: new Map() };
  let cursor = start;
  while (cursor.at < cursor.tokens.length) {
    const next = ear.step(cursor);
    if ('refusal' in next) return next;
    if ('skip' in next) cursor = moved(cursor, next.skip);
    else {
      if (next.found.used < 1) throw new Error(`${next.found.parameter.name} read no word`);
      const refusal = put(progress, cursor, next.found, ear);
      if (refusal !== null) return { refusal };
      cursor = moved(cursor, next.found.used);
    }
  }
  return { read: progress };
};

/** What a button could send instead. */
const choicesOf = (
  text: string,
  { refusal, choices }: { readonly refusal: Refusal; readonly choices?: readonly Suggestion[] },
): readonly Suggestion[] => {
  if (choices !== undefined) return choices;
  switch (refusal.code) {
    case 'unclear':
      return refusal.readings;
    case 'missing':
      return refusal.examples.map((example) => ({
        label: example,
        words: withMore(text, example),
      }));
    case 'unreadable':
    case 'notFound': {
      const { start, end, nearest } = refusal;
      if (start === undefined || end === undefined) return [];
      return nearest.map((by) => readAs(text, { start, end }, by));
    }
    default:
      return [];
  }
};

/** What is asked because it was said twice, if that is why. */
const saidTwice = (refusal: Refusal): string | null =>
  refusal.code === 'unclear' && refusal.because === 'saidTwice' ? refusal.what : null;

/** Whether a line gets past the words that were not clear in another. */
const isBetter = (words: string, fault: Refusal, start: Cursor, ear: Ear): boolean => {
  const left = start.text.length - (('end' in fault ? fault.end : undefined) ?? 0);
  const outcome = listen(cursorOf(words, start.units, start.at), ear);
  if ('read' in outcome) return true;
  const { refusal } = outcome;
  // Of three sizes, one may go at a time; but nothing new may be said twice.
  const again = saidTwice(refusal);
  if (again !== null && again !== saidTwice(fault)) return false;
  return 'start' in refusal && words.length - refusal.start <= left;
};

/** Only what would itself be read is offered: a button that leads back here helps nobody. */
const offered = (start: Cursor, ear: Ear, fault: Fault): Refused => {
  const { text } = start;
  const { refusal } = fault;
  const all = choicesOf(text, fault);
  const isOffered = all.map(({ words }) => isBetter(words, refusal, start, ear));
  const kept = <T>(list: readonly T[]): readonly T[] => list.filter((_, i) => isOffered[i] ?? true);
  const choices = kept(all);
  if (refusal.code === 'unclear' && refusal.readings === all)
    return { refusal: { ...refusal, readings: choices }, choices };
  if ((refusal.code === 'unreadable' || refusal.code === 'notFound') && refusal.nearest.length > 0)
    return { refusal: { ...refusal, nearest: kept(refusal.nearest) }, choices };
  return { refusal, choices };
};

/** Reads a line, words in any order. Digits are never guessed and no word is silently dropped. */
export const readLine = (
  text: string,
  vocabulary: Vocabulary,
  units: ShopUnits,
  names: Names = NO_NAMES,
  skip = 0,
): LineResult => {
  if (text.length > LONGEST_LINE)
    return { refusal: outOfRange('textLength', text.length, [0, LONGEST_LINE], '1'), choices: [] };
  const ear = earFor(vocabulary, names);
  // The first words may be the command's own name.
  const start = cursorOf(text, units, skip);
  const outcome = listen(start, ear);
  return 'read' in outcome ? outcome : offered(start, ear, outcome);
};
