import { EXPLAINED, type ExplainedVerb, type Subject } from '../../src/calc/index.ts';
import { type Lead, said } from '../../src/desk/index.ts';
import type { Refusal, Suggestion } from '../../src/refusal.ts';
import {
  type Cursor,
  moved,
  nearestOf,
  readAs,
  replaced,
  type Span,
  spanOf,
  tokenAt,
} from '../../src/words/index.ts';
import { FIGURE_EXAMPLES, namesSaid, subjectsOf } from './whyWords.ts';

/** What is asked about: everything its name can mean, where it stands, and on whose card. */
export type AskedAbout = {
  readonly subjects: readonly Subject[];
  /** The name alone, for lines that ask about another. */
  readonly span: Span;
  readonly verb: ExplainedVerb | null;
};

/** Words before the name that say nothing. */
const BEFORE = new Set(['the', 'is', 'are', 'a', 'my', 'this', 'that', 'so', 'was']);
/** Words between the name and the line that follows it. */
const BETWEEN = new Set(['of', 'for', 'on', 'in', 'at']);
const ROOTS = new Set(['knurl', '/knurl']);
/** Most words that a name has. */
const LONGEST = 5;

const withoutWords = (cursor: Cursor, words: ReadonlySet<string>): Cursor => {
  let at = cursor;
  while (words.has(tokenAt(at)?.text ?? '')) at = moved(at, 1);
  return at;
};

/** The next words as one name; hyphens part words as spaces do. */
const phraseAt = (cursor: Cursor, words: number): string | null => {
  const tokens = Array.from({ length: words }, (_, i) => tokenAt(cursor, i)?.text);
  return tokens.includes(undefined) ? null : tokens.join(' ').replaceAll(/[-_]/gu, ' ');
};

const LENGTHS = Array.from({ length: LONGEST }, (_, i) => LONGEST - i);

type Name = { readonly subjects: readonly Subject[]; readonly words: number };

const nameAt = (cursor: Cursor, onlyChecks: boolean): Name | null => {
  for (const words of LENGTHS) {
    const phrase = phraseAt(cursor, words);
    const subjects = phrase === null ? [] : subjectsOf(phrase, onlyChecks);
    if (subjects.length > 0) return { subjects, words };
  }
  return null;
};

type Refused = { readonly refusal: Refusal; readonly choices: readonly Suggestion[] };

/** Nothing stands there that could be a name: what could, put in its place. */
const missing = (cursor: Cursor): Refused => {
  const { start } = spanOf(cursor, 1);
  return {
    refusal: { code: 'missing', parameter: 'figure', examples: FIGURE_EXAMPLES },
    choices: FIGURE_EXAMPLES.map((name) => ({
      label: name,
      words: replaced(cursor.text, { start, end: start }, ` ${name} `),
    })),
  };
};

/** A name that nothing has, with those it may have been meant for. */
const unknown = (cursor: Cursor, onlyChecks: boolean): Refused => {
  const names = namesSaid(onlyChecks);
  const near = LENGTHS.map((words) => {
    const phrase = phraseAt(cursor, words);
    return { words, nearest: phrase === null ? [] : nearestOf(phrase, names) };
  }).find(({ nearest }) => nearest.length > 0);
  const { words, nearest } = near ?? { words: 1, nearest: [] };
  const { start, end } = spanOf(cursor, words);
  const offered = nearest.length > 0 ? nearest : FIGURE_EXAMPLES;
  return {
    refusal: {
      code: 'notFound',
      what: 'figure',
      word: cursor.text.slice(start, end),
      start,
      end,
      nearest,
    },
    choices: offered.map((name) => readAs(cursor.text, { start, end }, name)),
  };
};

/** Whose card the line that follows asks for, where it says so. */
const verbAt = (cursor: Cursor): { readonly verb: ExplainedVerb | null; readonly at: Cursor } => {
  const start = withoutWords(cursor, BETWEEN);
  const after = withoutWords(start, ROOTS);
  const verb = EXPLAINED.find((each) => each === tokenAt(after)?.text) ?? null;
  if (verb !== null) return { verb, at: moved(after, 1) };
  return { verb: null, at: after.at > start.at ? after : cursor };
};

/** The name of a figure or a check, right behind `why`; `check` before it means the check. */
const readFigure = (cursor: Cursor): ReturnType<Lead> => {
  const start = withoutWords(cursor, BEFORE);
  const onlyChecks = tokenAt(start)?.text === 'check';
  const from = onlyChecks ? withoutWords(moved(start, 1), new Set([...BEFORE, ...BETWEEN])) : start;
  const first = tokenAt(from)?.text ?? '';
  if (first === '' || /^[\d./]/u.test(first)) return missing(onlyChecks ? start : from);
  const name = nameAt(from, onlyChecks);
  if (name === null) return unknown(from, onlyChecks);
  const end = moved(from, name.words);
  const { verb, at } = verbAt(end);
  const span = spanOf(start, end.at - start.at);
  const value: AskedAbout = { subjects: name.subjects, span, verb };
  return { value, used: at.at - cursor.at };
};

export const lead: Lead = readFigure;

export const figure = said<AskedAbout>({
  name: 'figure',
  read: (cursor) => readFigure(cursor) as { value: AskedAbout; used: number } | Refused | null,
  examples: FIGURE_EXAMPLES,
});
