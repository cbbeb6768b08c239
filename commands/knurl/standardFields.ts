import { LARGEST_DIAMETER } from '../../src/calc/index.ts';
import { type Lead, said } from '../../src/desk/index.ts';
import type { StandardState } from '../../src/shop/index.ts';
import {
  type Cursor,
  countOf,
  knownName,
  type Limits,
  limitsOf,
  moved,
  oneWord,
  quantityAt,
  type Reader,
  restOfLine,
  tokenAt,
  took,
  upToKeyword,
  vocabularyOf,
} from '../../src/words/index.ts';
import { recordsOf } from '../shop/named.ts';
import { readCodeAt } from './codeWords.ts';

export const PART_EXAMPLE = 'TH-2041-B';

/** A part number of which there is a standard, however many words it has; else one word. */
const readPart: Reader<string> = (cursor, names) => {
  const known = knownName(({ standards = [] }) => standards)(cursor, names);
  return known !== null && 'value' in known ? known : oneWord(cursor, names);
};

export const part = said<string>({
  name: 'part',
  read: readPart,
  keywords: ['part', 'part number', 'part no', 'p/n', 'pn'],
  text: true,
  suggests: 'standards',
  examples: [`part ${PART_EXAMPLE}`],
});

/** A word with letters and digits that is no quantity: a part number, and no `part 1.000` or `21tpi`. */
const LOOKS_LIKE_ONE = /^(?=.*\p{L})(?=.*\d)[\p{L}\d]/u;

/** Among the words of a set-up `part` is mostly said of the work itself. */
const readPartOfSetup: Reader<string> = (cursor, names) => {
  const reading = readPart(cursor, names);
  const isKnown = reading !== null && knownName(({ standards = [] }) => standards)(cursor, names);
  if (isKnown !== null && isKnown !== false) return reading;
  const text = tokenAt(cursor)?.text ?? '';
  const isQuoted = reading !== null && 'value' in reading && reading.value.length !== text.length;
  if (isQuoted) return reading;
  return LOOKS_LIKE_ONE.test(text) && quantityAt(cursor) === null ? reading : null;
};

export const partOfSetup = said<string>({
  name: 'part',
  read: readPartOfSetup,
  keywords: ['part', 'part number', 'part no', 'p/n', 'pn'],
  loose: true,
  text: true,
  suggests: 'standards',
  examples: [`part ${PART_EXAMPLE}`],
});

export const fromCard = said<string>({
  name: 'card',
  read: readCodeAt,
  keywords: ['card', 'code', 'from card'],
  suggests: 'cards',
  examples: ['card K7M2X'],
});

/** Revisions of one part. Judgement: more than anybody makes. */
const MOST_REVISIONS = 9999;

export const revision = said<number>({
  name: 'revision',
  read: countOf('revision', [1, MOST_REVISIONS]),
  keywords: ['rev', 'revision'],
  examples: ['rev 2'],
});

const NUMBER = /^\d{1,4}$/u;
const TWO_NUMBERS = /^(\d{1,4})[-/](\d{1,4})$/u;
const BETWEEN = new Set(['and', 'with', 'to', 'against']);

const numberAt = (cursor: Cursor): number | null => {
  const text = tokenAt(cursor)?.text ?? '';
  return NUMBER.test(text) ? Number(text) : null;
};

/** `1 and 2`, `1 2`, `1-2`, `1`. */
const readRevisions: Reader<readonly number[]> = (cursor) => {
  const pair = TWO_NUMBERS.exec(tokenAt(cursor)?.text ?? '');
  if (pair !== null) return took([Number(pair[1]), Number(pair[2])], 1);
  const first = numberAt(cursor);
  if (first === null) return null;
  const skipped = BETWEEN.has(tokenAt(cursor, 1)?.text ?? '') ? 2 : 1;
  const second = numberAt(moved(cursor, skipped));
  return second === null ? took([first], 1) : took([first, second], skipped + 1);
};

export const revisions = said<readonly number[]>({
  name: 'revisions',
  read: readRevisions,
  keywords: ['rev', 'revs', 'revision', 'revisions', 'with', 'and'],
  merge: (a, b) => [...new Set([...a, ...b])],
  examples: ['rev 1 and 2'],
});

/** Everything behind the word is the reason: whatever it holds is no request. */
export const why = said<string>({
  name: 'why',
  read: restOfLine,
  keywords: ['because', 'why', 'reason'],
  text: true,
  examples: ['because the new wheel leaves a cleaner crest'],
});

const DIAMETERS = [1, LARGEST_DIAMETER] as const;

export const bars = said<Limits>({
  name: 'bars',
  read: limitsOf('bars', DIAMETERS, { in: [0.06, 8], mm: [2, 200] }),
  keywords: ['bars', 'for bars', 'bar range'],
  examples: ['bars 0.990-1.010'],
  metricExamples: ['bars 24.8-25.2'],
});

const MONTHS = new Set(['month', 'months', 'mo']);
const YEARS = new Set(['year', 'years', 'yr', 'yrs']);
const MOST_MONTHS = 120;

/** `6 months`, `2 years`, `6`. */
const readMonths: Reader<number> = (cursor, names) => {
  const word = tokenAt(cursor, 1)?.text ?? '';
  const inYears = YEARS.has(word);
  const most = inYears ? MOST_MONTHS / 12 : MOST_MONTHS;
  const reading = countOf('reviewMonths', [1, most])(cursor, names);
  if (reading === null || 'refusal' in reading) return reading;
  const used = reading.used + (inYears || MONTHS.has(word) ? 1 : 0);
  return took(reading.value * (inYears ? 12 : 1), used);
};

export const reviewMonths = said<number>({
  name: 'reviewMonths',
  read: readMonths,
  keywords: ['review', 'review in', 'review after'],
  examples: ['review in 6 months'],
});

export const state = said<StandardState>({
  name: 'state',
  read: () => null,
  closed: true,
  values: [
    ['drafts', 'draft'],
    ['draft', 'draft'],
    ['proposed', 'proposed'],
    ['waiting', 'proposed'],
    ['approved', 'approved'],
    ['superseded', 'superseded'],
    ['retired', 'retired'],
  ],
  examples: ['proposed', 'approved'],
});

/** What may stand behind a part number; the number itself ends where one of these begins. */
const behind = recordsOf({ part, fromCard, revisions, revision, why, bars, reviewMonths, state });

const behindIt = upToKeyword(() => vocabularyOf(behind()));

/** The part number right behind the verb: one that is known, or the whole of what stands there. */
export const leadPart: Lead = (cursor, names) => {
  const known = knownName(({ standards = [] }) => standards)(cursor, names);
  const typed = behindIt(cursor, names);
  const found = [known, typed].flatMap((each) => (each !== null && 'value' in each ? [each] : []));
  return found.sort((a, b) => b.used - a.used)[0] ?? null;
};
