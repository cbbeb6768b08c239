import {
  CAUSE_IDS,
  type CauseId,
  LARGEST_DIAMETER,
  SYMPTOMS,
  type SymptomId,
} from '../../src/calc/index.ts';
import { type Lead, said } from '../../src/desk/index.ts';
import { type Outcome, readCode, symptomOf } from '../../src/shop/index.ts';
import {
  type Cursor,
  countOf,
  lengthOf,
  nameOf,
  partOf,
  quantityAt,
  type Reader,
  spanOf,
  textOf,
  tokenAt,
  took,
  vocabularyOf,
} from '../../src/words/index.ts';
import { CAUSE_WORDS } from './causeWords.ts';
import { readCodeAt } from './codeWords.ts';
import { SPOKEN } from './troubleParameters.ts';

/** How it went, and what was seen where it went wrong. */
export type OutcomeWords = { readonly outcome: Outcome; readonly symptom: SymptomId | null };

const OUTCOME_OF: { readonly [S in SymptomId]?: Outcome } = {
  doublePattern: 'double',
  shallowAllRound: 'shallow',
  shallowOneSide: 'shallow',
  flaking: 'flaking',
  bentPart: 'bent',
  pinSeized: 'seized',
};

const wentAs = (outcome: Outcome, symptom = symptomOf(outcome)): OutcomeWords => ({
  outcome,
  symptom,
});

/** The shop's own words for it first, then everything that trouble knows a name for. */
const OUTCOME_WORDS: readonly (readonly [phrase: string, value: OutcomeWords])[] = [
  ...['good', 'ok', 'okay', 'fine', 'right', 'perfect', 'came out good', 'all good'].map(
    (phrase) => [phrase, wentAs('good')] as const,
  ),
  ...(['double', 'shallow', 'flaking', 'bent', 'seized'] as const).map(
    (outcome) => [outcome, wentAs(outcome)] as const,
  ),
  ...['other', 'something else'].map((phrase) => [phrase, wentAs('other')] as const),
  ...SYMPTOMS.flatMap((symptom) =>
    SPOKEN[symptom].map(
      (phrase) => [phrase, wentAs(OUTCOME_OF[symptom] ?? 'other', symptom)] as const,
    ),
  ),
];

export const outcome = said<OutcomeWords>({
  name: 'outcome',
  read: () => null,
  values: OUTCOME_WORDS,
  closed: true,
  examples: ['good', 'double', 'shallow', 'flaking'],
});

/** Most teeth that anyone counts round a part. */
const COUNTS = [3, 9999] as const;

export const count = said<number>({
  name: 'count',
  read: countOf('count', COUNTS, 'teeth'),
  keywords: ['count', 'counted', 'teeth'],
  postfix: true,
  measures: ['teeth'],
  examples: ['65 teeth'],
});

export const blank = said<number>({
  name: 'blank',
  read: lengthOf('blank', [1, LARGEST_DIAMETER], { in: [0.06, 8], mm: [2, 200] }),
  keywords: ['blank', 'turned to', 'turned', 'blank was'],
  examples: ['blank 0.9850'],
});

export const parts = said<number>({
  name: 'parts',
  read: countOf('partsRun', [0, 1_000_000], 'pieces'),
  keywords: ['parts', 'ran', 'run', 'made', 'batch'],
  postfix: true,
  measures: ['pieces'],
  examples: ['50 parts'],
});

const CAUSE_OF = new Map(
  CAUSE_IDS.flatMap((cause) => CAUSE_WORDS[cause].map((phrase) => [phrase, cause] as const)),
);

const readCauseName = nameOf('cause', () => [...CAUSE_OF.keys()]);

const readCause: Reader<CauseId> = (cursor, names) => {
  const reading = readCauseName(cursor, names);
  if (reading === null || 'refusal' in reading) return reading;
  const cause = CAUSE_OF.get(reading.value);
  return cause === undefined ? null : took(cause, reading.used);
};

/** Only behind its own word: in a note the same words mean nothing. */
export const cause = said<CauseId>({
  name: 'cause',
  read: readCause,
  keywords: ['cause', 'caused by', 'because of', 'because'],
  values: [...CAUSE_OF].map(([phrase, value]) => [`cause ${phrase}`, value] as const),
  closed: true,
  examples: ['cause dull wheel', 'cause light bite'],
});

const NO_WORDS = vocabularyOf([]);
const readWords = textOf(() => NO_WORDS);

/** Everything up to the end of the line as it was typed, or what stands in quotation marks. */
const readNote: Reader<string> = (cursor, names) => {
  const start = tokenAt(cursor)?.start ?? 0;
  const reading = readWords(cursor, names);
  const isQuoted = /["“”„]/u.test(cursor.text.slice(Math.max(0, start - 1), start + 1));
  if (reading === null || 'refusal' in reading || isQuoted) return reading;
  return took(cursor.text.slice(start).trim(), cursor.tokens.length - cursor.at);
};

/** Words of the person's own, about anything that no number says. */
export const note = said<string>({
  name: 'note',
  read: readNote,
  keywords: ['note', 'notes', 'remark'],
  text: true,
  examples: ['note burr at the chuck end'],
});

/** The version of a result that a button was made for. */
export const version = said<number>({
  name: 'version',
  read: countOf('version', [1, 1_000_000]),
  keywords: ['seen'],
  examples: ['seen 1'],
});

/** A code that stands by itself: never a number with its unit, nor two words run together. */
const bareCode = (cursor: Cursor): { readonly value: string; readonly used: number } | null => {
  if ((quantityAt(cursor)?.unit ?? null) !== null) return null;
  const reading = readCodeAt(cursor, { wheels: [], machines: [] });
  if (reading === null || 'refusal' in reading) return null;
  const typed = partOf(cursor.text, spanOf(cursor, reading.used));
  const isCode = readCode(reading.value) === reading.value && !/[\s.]/u.test(typed);
  return isCode && /\d/u.test(reading.value) && /[A-Z]/u.test(reading.value) ? reading : null;
};

export const code = said<string>({
  name: 'code',
  read: readCodeAt,
  free: bareCode,
  keywords: ['card', 'code', 'for card', 'of card'],
  suggests: 'cards',
  examples: ['K7M2X'],
});

/** A result by its number, or by the code of its card. */
export type ResultSaid = { readonly number: number } | { readonly code: string };

const NUMBER = /^#?(?<r>r)?-?(?<digits>\d{1,7})$/u;

/** `R12`; where nothing else can be meant, `12` too. */
const resultAt = (cursor: Cursor, isAlone: boolean) => {
  const found = NUMBER.exec(tokenAt(cursor)?.text ?? '')?.groups;
  if (found === undefined || (found['r'] === undefined && !isAlone)) return null;
  return took<ResultSaid>({ number: Number(found['digits']) }, 1);
};

const bareResult: Reader<ResultSaid> = (cursor) => {
  const numbered = resultAt(cursor, false);
  if (numbered !== null) return numbered;
  const coded = bareCode(cursor);
  return coded === null ? null : took<ResultSaid>({ code: coded.value }, coded.used);
};

const announcedResult: Reader<ResultSaid> = (cursor, names) => {
  const numbered = resultAt(cursor, true);
  if (numbered !== null) return numbered;
  const coded = readCodeAt(cursor, names);
  if (coded === null || 'refusal' in coded) return coded;
  return took<ResultSaid>({ code: coded.value }, coded.used);
};

export const result = said<ResultSaid>({
  name: 'result',
  read: announcedResult,
  free: bareResult,
  keywords: ['result', 'no', 'number', 'card', 'code'],
  examples: ['R12'],
});

/** Right behind the verb a number alone is the result's: `/knurl result confirm 12`. */
export const resultFirst: Lead = (cursor) => {
  const reading = resultAt(cursor, true);
  return reading === null || 'refusal' in reading ? null : reading;
};

export const waiting = said<true>({
  name: 'waiting',
  read: () => null,
  closed: true,
  values: ['waiting', 'to confirm', 'doubted', 'unconfirmed'].map((phrase) => [phrase, true]),
  examples: ['waiting'],
});
