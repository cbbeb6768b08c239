import type { Refusal, Suggestion } from '../refusal.ts';
import {
  type Cursor,
  longestAt,
  moved,
  phraseOf,
  type Quantity,
  quantityAt,
  type ShopUnits,
  spanOf,
  tokenAt,
} from './cursor.ts';
import { partOf, readAs, withMore, without } from './edit.ts';
import { outOfRange } from './kinds.ts';
import { nearestOf } from './nearest.ts';
import { NUMBER } from './numbers.ts';
import { type Names, NO_NAMES, type Parameter, type Reading } from './reading.ts';
import { type Span, tokensOf } from './tokens.ts';
import { UNIT_WORDS } from './unit.ts';

/** A line longer than this is a letter, not a request. Judgement. */
export const LONGEST_LINE = 1000;

/** Words people put between the ones that count. */
const FILLERS = new Set(
  'a an the of for with and please knurl knurling knurled set up setup make do i want need bar round rod stock piece part dia diameter at to in is it by on this'.split(
    ' ',
  ),
);

/** A parameter of any value: the reader hands values through without looking at them. */
export type AnyParameter = Parameter<unknown>;

export type ReadLine = {
  readonly values: ReadonlyMap<string, unknown>;
  readonly spans: ReadonlyMap<string, readonly Span[]>;
};
export type LineResult =
  | { readonly read: ReadLine }
  | { readonly refusal: Refusal; readonly choices: readonly Suggestion[] };

type PhraseMeaning =
  | { readonly kind: 'value'; readonly parameter: AnyParameter; readonly value: unknown }
  | { readonly kind: 'keyword'; readonly parameter: AnyParameter };

type Phrases = readonly (readonly [readonly string[], PhraseMeaning])[];

/** What a set of parameters lets a person say; made once, used for every line. */
export type Vocabulary = {
  readonly parameters: readonly AnyParameter[];
  readonly phrases: ReadonlyMap<string, Phrases>;
  readonly words: readonly string[];
};

export const vocabularyOf = (
  parameters: readonly AnyParameter[],
  extraWords: readonly string[] = [],
): Vocabulary => {
  const phrases = new Map<string, Phrases>();
  const words = new Set<string>([...UNIT_WORDS.keys(), ...extraWords]);
  const add = (phrase: string, meaning: PhraseMeaning): void => {
    const parts = phraseOf(phrase);
    const first = parts[0] ?? '';
    phrases.set(first, [...(phrases.get(first) ?? []), [parts, meaning]]);
    words.add(phrase);
  };
  for (const parameter of parameters) {
    for (const [phrase, value] of parameter.values ?? [])
      add(phrase, { kind: 'value', parameter, value });
    for (const phrase of parameter.keywords ?? []) add(phrase, { kind: 'keyword', parameter });
  }
  return { parameters, phrases, words: [...words].filter((word) => word.length > 1) };
};

type Found = { readonly parameter: AnyParameter; readonly value: unknown; readonly used: number };
type Step =
  | { readonly found: Found }
  | { readonly skip: number }
  | { readonly refusal: Refusal; readonly choices?: readonly Suggestion[] };

const stepOf = (parameter: AnyParameter, reading: Reading<unknown>, before = 0): Step =>
  'refusal' in reading
    ? { refusal: reading.refusal }
    : { found: { parameter, value: reading.value, used: reading.used + before } };

const isNumber = (cursor: Cursor): boolean => quantityAt(cursor) !== null;

/** `long` with nothing readable behind it. */
const keywordAlone = (cursor: Cursor, parameter: AnyParameter, used: number): Step => {
  if (parameter.loose === true) return { skip: used };
  const next = tokenAt(cursor, used);
  const choices = parameter.examples.map((example) =>
    readAs(cursor.text, spanOf(cursor, used), example),
  );
  if (next !== undefined && /\d/u.test(next.text)) return unreadable(moved(cursor, used), []);
  return {
    refusal: { code: 'missing', parameter: parameter.name, examples: parameter.examples },
    choices,
  };
};

const byPhrase = (
  cursor: Cursor,
  vocabulary: Vocabulary,
  names: Names,
): (Step & { readonly used: number }) | null => {
  const token = tokenAt(cursor);
  const phrases = token === undefined ? undefined : vocabulary.phrases.get(token.text);
  if (phrases === undefined) return null;
  const longest = longestAt(cursor, phrases);
  if (longest === null) return null;
  const { value: meaning, used } = longest;
  if (meaning.kind === 'value')
    return { found: { parameter: meaning.parameter, value: meaning.value, used }, used };
  // One word may announce two parameters (`square` edges, `square` patterns): the first that reads.
  for (const [phrase, other] of phrases) {
    if (other.kind !== 'keyword' || phrase.length !== used) continue;
    const reading = other.parameter.read(moved(cursor, used), names);
    if (reading !== null) return { ...stepOf(other.parameter, reading, used), used };
  }
  return { ...keywordAlone(cursor, meaning.parameter, used), used };
};

const byItself = (
  cursor: Cursor,
  vocabulary: Vocabulary,
  names: Names,
): (Step & { readonly used: number }) | null => {
  let best: (Step & { readonly used: number }) | null = null;
  for (const parameter of vocabulary.parameters) {
    const reading = parameter.free?.(cursor, names) ?? null;
    if (reading === null) continue;
    const used = 'refusal' in reading ? 1 : reading.used;
    if (used > (best?.used ?? 0)) best = { ...stepOf(parameter, reading), used };
  }
  return best;
};

/** `1.5 long`, where no number follows that the word could announce instead. */
const postfix = (
  cursor: Cursor,
  quantity: Quantity,
  vocabulary: Vocabulary,
  names: Names,
): Step | null => {
  const after = moved(cursor, quantity.used);
  const token = tokenAt(after);
  const phrases = token === undefined ? undefined : vocabulary.phrases.get(token.text);
  if (phrases === undefined) return null;
  const keyword = longestAt(after, phrases);
  if (keyword?.value.kind !== 'keyword' || keyword.value.parameter.postfix !== true) return null;
  if (isNumber(moved(after, keyword.used))) return null;
  const reading = keyword.value.parameter.read(cursor, names);
  return reading === null ? null : stepOf(keyword.value.parameter, reading, keyword.used);
};

/** 30° may be a helix, a swivel or a tooth angle: whichever it can be is offered. */
const unclearAngle = (
  cursor: Cursor,
  quantity: Quantity,
  vocabulary: Vocabulary,
  names: Names,
): Step => {
  const span = spanOf(cursor, quantity.used);
  const typed = partOf(cursor.text, span);
  const readings = vocabulary.parameters
    .filter((parameter) => ['helix', 'tilt', 'angle'].includes(parameter.name))
    .filter((parameter) => {
      const reading = parameter.read(cursor, names);
      return reading !== null && 'value' in reading;
    })
    .map((parameter) => readAs(cursor.text, span, `${parameter.keywords?.[0] ?? ''} ${typed}`));
  return readings.length === 0
    ? unreadable(cursor, [])
    : { refusal: { code: 'unclear', what: 'angle', readings } };
};

/** The number alone, where the word behind it announces another. */
const bareBefore = (cursor: Cursor, vocabulary: Vocabulary, names: Names): Step | null => {
  const parameter = vocabulary.parameters.find((each) => each.bare === true);
  const alone = { ...cursor, tokens: cursor.tokens.slice(0, cursor.at + 1) };
  const reading = parameter?.read(alone, names) ?? null;
  return parameter === undefined || reading === null || 'refusal' in reading
    ? null
    : stepOf(parameter, reading);
};

const byQuantity = (cursor: Cursor, vocabulary: Vocabulary, names: Names): Step | null => {
  const quantity = quantityAt(cursor);
  if (quantity === null) return null;
  const late = postfix(cursor, quantity, vocabulary, names);
  if (late !== null) return late;
  const measure = quantity.unit?.measure;
  const claims = (parameter: AnyParameter): boolean =>
    measure === undefined
      ? parameter.bare === true
      : (parameter.measures ?? []).some((own) => own === measure);
  const parameter = vocabulary.parameters.find(claims);
  const reading = parameter?.read(cursor, names) ?? null;
  // `1.0 turns 18`: one turn makes no sense, so the word belongs to the number behind it.
  if (quantity.numberFollows && reading !== null && 'refusal' in reading)
    return bareBefore(cursor, vocabulary, names) ?? { refusal: reading.refusal };
  if (parameter !== undefined && reading !== null) return stepOf(parameter, reading);
  return measure === 'angle' ? unclearAngle(cursor, quantity, vocabulary, names) : null;
};

/** The number of `21tp` is certain; its unit may be offered. */
const nearestUnit = (word: string): readonly string[] => {
  const match = new RegExp(`^(${NUMBER})([^\\d.,/].*)$`, 'u').exec(word);
  const [, number = '', tail = ''] = match ?? [];
  const units = [...UNIT_WORDS.keys()].filter((unit) => unit.length > 1);
  return tail.length < 2
    ? []
    : nearestOf(
        `${tail} `,
        units.map((unit) => `${unit} `),
      ).map((unit) => `${number} ${unit.trim()}`);
};

function unreadable(cursor: Cursor, known: readonly string[]): Step {
  const token = tokenAt(cursor);
  const span = token ?? { start: cursor.text.length, end: cursor.text.length };
  const word = partOf(cursor.text, span);
  const plain = token?.text ?? '';
  const nearest = /^\d/u.test(plain) ? nearestUnit(plain) : nearestOf(plain, known);
  return {
    refusal: { code: 'unreadable', word, start: span.start, end: span.end, nearest },
    choices: nearest.map((by) => readAs(cursor.text, span, by)),
  };
}

const step = (cursor: Cursor, vocabulary: Vocabulary, names: Names): Step => {
  const phrase = byPhrase(cursor, vocabulary, names);
  const own = byItself(cursor, vocabulary, names);
  if (own !== null && own.used > (phrase?.used ?? 0)) return own;
  if (phrase !== null) return phrase;
  const quantity = byQuantity(cursor, vocabulary, names);
  if (quantity !== null) return quantity;
  if (FILLERS.has(tokenAt(cursor)?.text ?? '')) return { skip: 1 };
  return unreadable(cursor, vocabulary.words);
};

/** Whether something stands here that is more than a word nobody knows. */
export const isReadable = (
  cursor: Cursor,
  vocabulary: Vocabulary,
  names: Names = NO_NAMES,
): boolean => {
  const next = step(cursor, vocabulary, names);
  if ('found' in next) return true;
  return 'refusal' in next && next.refusal.code !== 'unreadable';
};

type Progress = { readonly values: Map<string, unknown>; readonly spans: Map<string, Span[]> };

/** The same thing said twice and differently: which one is asked. */
const twice = (cursor: Cursor, name: string, first: Span, second: Span): Refusal => ({
  code: 'unclear',
  what: name,
  readings: [
    { label: partOf(cursor.text, first), words: without(cursor.text, second) },
    { label: partOf(cursor.text, second), words: without(cursor.text, first) },
  ],
});

const same = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b);

/** Puts a value in its place, or says why it cannot stand beside what was said before. */
const put = (progress: Progress, cursor: Cursor, found: Found): Refusal | null => {
  const { name, merge } = found.parameter;
  const span = spanOf(cursor, found.used);
  const earlier = progress.spans.get(name) ?? [];
  const [first] = earlier;
  if (first !== undefined) {
    const before = progress.values.get(name);
    const together = merge?.(before, found.value) ?? (same(before, found.value) ? before : null);
    if (together === null) return twice(cursor, name, first, span);
    progress.values.set(name, together);
  } else progress.values.set(name, found.value);
  progress.spans.set(name, [...earlier, span]);
  return null;
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
  const progress: Progress = { values: new Map(), spans: new Map() };
  // The first words may be the command's own name.
  let cursor: Cursor = { text, tokens: tokensOf(text), at: skip, units };
  while (cursor.at < cursor.tokens.length) {
    const next = step(cursor, vocabulary, names);
    if ('refusal' in next) return { refusal: next.refusal, choices: choicesOf(text, next) };
    if ('skip' in next) cursor = moved(cursor, next.skip);
    else {
      if (next.found.used < 1) throw new Error(`${next.found.parameter.name} read no word`);
      const refusal = put(progress, cursor, next.found);
      if (refusal !== null) return { refusal, choices: choicesOf(text, { refusal }) };
      cursor = moved(cursor, next.found.used);
    }
  }
  return { read: progress };
};

/** What a button could send instead. */
export const choicesOf = (
  text: string,
  fault: { readonly refusal: Refusal; readonly choices?: readonly Suggestion[] },
): readonly Suggestion[] => {
  if (fault.choices !== undefined) return fault.choices;
  if (fault.refusal.code === 'unclear') return fault.refusal.readings;
  if (fault.refusal.code === 'unreadable') {
    const { nearest, start, end } = fault.refusal;
    return nearest.map((by) => readAs(text, { start, end }, by));
  }
  if (fault.refusal.code === 'missing')
    return fault.refusal.examples.map((example) => ({
      label: example,
      words: withMore(text, example),
    }));
  return [];
};
