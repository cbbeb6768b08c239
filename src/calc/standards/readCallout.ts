import type { Pattern } from '../pattern.ts';
import type { Pitch } from '../pitch.ts';
import { degrees, type Rad } from '../units.ts';
import type { Callout } from './callout.ts';
import { DIN_82, DIN_FORMS, DIN_INCLUDED, type DinForm } from './din82.ts';
import { JIS_MODULES } from './jis.ts';
import { type Piece, piecesOf } from './pieces.ts';

export type UnknownForm = {
  readonly problem: 'unknownForm';
  /** The letters that are no form, or the standard that stands without one. */
  readonly word: string;
  /** Where they stand in the text. */
  readonly start: number;
  readonly end: number;
  readonly nearest: readonly DinForm[];
};

export type ReadCallout = {
  readonly callout: Callout;
  /** Characters the callout takes, from the start of the text. */
  readonly length: number;
};

type Of<K extends Piece['is']> = Extract<Piece, { readonly is: K }>;

const all = <K extends Piece['is']>(pieces: readonly Piece[], is: K): readonly Of<K>[] =>
  pieces.filter((piece): piece is Of<K> => piece.is === is);
const first = <K extends Piece['is']>(pieces: readonly Piece[], is: K): Of<K> | null =>
  all(pieces, is)[0] ?? null;

/** What may stand in a callout, and how often. */
const holds = (pieces: readonly Piece[], most: Partial<Record<Piece['is'], number>>): boolean =>
  pieces.every(({ is }) => is === 'filler' || all(pieces, is).length <= (most[is] ?? 0));

const FINEST = 0.2;
const COARSEST = 3.2;

const metric = (value: number): Pitch | null =>
  value >= FINEST && value <= COARSEST ? { system: 'metric', value } : null;

/** `08`, `0.8`, `0,8`, `1`: a pitch as the standard's designation writes it. A third decimal is a diameter in inches. */
const metricPitch = ({ text, unit }: Of<'number'>): Pitch | null => {
  if (unit === '°') return null;
  if (unit === '' && /^(?:0\d|1[0-9])$/u.test(text)) return metric(Number(text) / 10);
  if (unit === '' && !/^(?:[12]|\d?[.,]\d{1,2})$/u.test(text)) return null;
  return metric(Number(text.replace(',', '.')));
};

/** Profile angles that need no degree sign after a dash. */
const PROFILES: readonly number[] = [70, 80, 90, 105];

const profileOf = (piece: Of<'number'>): Rad | null => {
  const value = Number(piece.text.replace(',', '.'));
  const dashed = piece.gap.includes('-') && piece.unit === '' && PROFILES.includes(value);
  const signed = piece.unit === '°' && value >= 60 && value <= 120;
  return dashed || signed ? degrees(value) : null;
};

const NOTHING = {
  form: null,
  pattern: null,
  pitch: null,
  included: null,
  knurlClass: null,
} as const;

const numberFollows = (
  pieces: readonly Piece[],
  number: Piece | undefined,
  ...after: Piece['is'][]
) => {
  const before = number === undefined ? undefined : pieces[pieces.indexOf(number) - 1];
  return before !== undefined && after.includes(before.is);
};

const readDin = (pieces: readonly Piece[]): Callout | null => {
  const form = first(pieces, 'form')?.form;
  const standard = first(pieces, 'standard');
  if (form === undefined || (standard !== null && standard.standard !== 'din82')) return null;
  if (!holds(pieces, { standard: 1, form: 1, number: 2 })) return null;
  const numbers = [...all(pieces, 'number')];
  const last = numbers.at(-1);
  const included = last === undefined ? null : profileOf(last);
  if (included !== null) numbers.pop();
  const [number, extra] = numbers;
  const pitch = number === undefined ? null : metricPitch(number);
  if (extra !== undefined || (number !== undefined && pitch === null)) return null;
  if (number !== undefined && !numberFollows(pieces, number, 'form', 'standard')) return null;
  const { pattern } = DIN_82[form];
  const profile = included ?? DIN_INCLUDED;
  return { ...NOTHING, standard: 'din82', form, pattern, pitch, included: profile };
};

const patternOf = (pieces: readonly Piece[]): Pattern | null =>
  first(pieces, 'pattern')?.pattern ?? null;

const readDp = (pieces: readonly Piece[]): Callout | null => {
  const pitch = first(pieces, 'pitch');
  const standard = first(pieces, 'standard');
  if (pitch === null ? standard === null : pitch.system !== 'dp') return null;
  if (standard !== null && standard.standard !== 'asme') return null;
  if (!holds(pieces, { standard: 1, pitch: 1, pattern: 1, class: 1 })) return null;
  return {
    ...NOTHING,
    standard: 'asme',
    pattern: patternOf(pieces),
    pitch: pitch === null ? null : { system: 'dp', value: pitch.value },
    knurlClass: first(pieces, 'class')?.knurlClass ?? null,
  };
};

const readTpi = (pieces: readonly Piece[]): Callout | null => {
  const pitch = first(pieces, 'pitch');
  if (pitch?.system !== 'tpi' || !holds(pieces, { pitch: 1, pattern: 1 })) return null;
  return {
    ...NOTHING,
    standard: 'tpi',
    pattern: patternOf(pieces),
    pitch: { system: 'tpi', value: pitch.value },
  };
};

/** A bare `m 0.3` is a module only where the standard has it: metres are written alike. */
const isListedModule = (value: number): boolean =>
  JIS_MODULES.some((module) => Math.abs(module - value) < 1e-9);

const readJis = (pieces: readonly Piece[]): Callout | null => {
  const pitch = first(pieces, 'pitch');
  const standard = first(pieces, 'standard');
  if (standard !== null && standard.standard !== 'jis') return null;
  if (pitch !== null && pitch.system !== 'module') return null;
  if (standard === null && (pitch === null || !isListedModule(pitch.value))) return null;
  if (!holds(pieces, { standard: 1, pitch: 1, pattern: 1 })) return null;
  return {
    ...NOTHING,
    standard: 'jis',
    pattern: patternOf(pieces),
    pitch: pitch === null ? null : { system: 'module', value: pitch.value },
  };
};

const readGost = (pieces: readonly Piece[]): Callout | null => {
  if (first(pieces, 'standard')?.standard !== 'gost') return null;
  if (!holds(pieces, { standard: 1, pattern: 1, number: 1 })) return null;
  const number = first(pieces, 'number');
  const pitch = number === null ? null : metricPitch(number);
  if (number !== null && (pitch === null || pieces[0] === number)) return null;
  return { ...NOTHING, standard: 'gost', pattern: patternOf(pieces), pitch };
};

const READERS = [readDin, readDp, readTpi, readJis, readGost] as const;

const interpret = (pieces: readonly Piece[]): Callout | null => {
  for (const read of READERS) {
    const callout = read(pieces);
    if (callout !== null) return callout;
  }
  return null;
};

/** Letters that differ, place by place. */
const lettersOff = (word: string, form: DinForm): number =>
  Array.from(form).filter((letter, place) => word[place] !== letter).length +
  Math.max(0, word.length - form.length);

const nearestForms = (word: string): readonly DinForm[] => {
  const least = Math.min(...DIN_FORMS.map((form) => lettersOff(word, form)));
  return DIN_FORMS.filter((form) => lettersOff(word, form) === least);
};

const formsOfPattern = (pattern: Pattern): readonly DinForm[] =>
  DIN_FORMS.filter((form) => DIN_82[form].pattern.kind === pattern.kind);

/** Form-like letters that are no other word: raw, rad and ram are words, Ra is a roughness. */
const LOOKS_LIKE_A_FORM = /^(?:R[BGK][A-Z]?|RA[^ADGMNPSTWY])$/u;

const unknownForm = (pieces: readonly Piece[]): UnknownForm | null => {
  // A number before the callout is the bar: the callout itself is read from its own first word on.
  if (pieces[0]?.is === 'number') return null;
  const din = pieces.find((piece) => piece.is === 'standard' && piece.standard === 'din82');
  const letters = first(pieces, 'letters');
  const at = letters === null ? -1 : pieces.indexOf(letters);
  const next = pieces[at + 1];
  const pitched = next?.is === 'number' && metricPitch(next) !== null;
  if (
    letters !== null &&
    (din !== undefined || (pitched && LOOKS_LIKE_A_FORM.test(letters.letters)))
  ) {
    const { start, end, letters: word } = letters;
    return { problem: 'unknownForm', word, start, end, nearest: nearestForms(word) };
  }
  if (din === undefined || letters !== null) return null;
  const pattern = patternOf(pieces);
  const nearest = pattern === null ? DIN_FORMS : formsOfPattern(pattern);
  return { problem: 'unknownForm', word: 'DIN 82', start: din.start, end: din.end, nearest };
};

/**
 * Reads a callout at the beginning of a text, in any spelling of the standards.
 *
 *     Rändel RGE 08 DIN 82;  RGE 08 - 105;  DIN 82-RAA 0,8;  96 DP STRAIGHT CLASS II;  P96;
 *     JIS B 0951 DIAMOND m 0.3;  21 TPI;  GOST 21474-75 STRAIGHT 0.8
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | text | what was typed, from the first character of the callout on | - | |
 * | → callout, length | what it says, and how many characters say it | - | |
 * | → problem, nearest | letters that are no form, with the forms that come nearest | - | |
 *
 * Assumes the longest stretch that makes one callout; null where none stands at the beginning.
 *
 * @source din-82 (designation)
 * @source din-82-spellings (other spellings)
 * @source callout-spellings (the words of the others)
 * @example readCallout('rge 08 din 82 20mm').length // 13
 * @example readCallout('rgx 0.8').nearest // ["RGE","RGV"]
 */
export function readCallout(text: string): ReadCallout | UnknownForm | null {
  const pieces = piecesOf(text);
  for (let count = pieces.length; count > 0; count -= 1) {
    const part = pieces.slice(0, count);
    const callout = interpret(part);
    if (callout !== null) return { callout, length: part.at(-1)?.end ?? 0 };
  }
  return unknownForm(pieces);
}
