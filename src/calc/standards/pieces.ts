import type { Pattern } from '../pattern.ts';
import type { PitchSystem } from '../pitch.ts';
import type { KnurlClass } from '../tracking.ts';
import { DIN_FORMS, type DinForm } from './din82.ts';

/** What a piece of a callout says. */
export type Said =
  | { readonly is: 'standard'; readonly standard: 'din82' | 'asme' | 'jis' | 'gost' }
  | { readonly is: 'form'; readonly form: DinForm }
  /** Letters that stand where a form should, and are none. */
  | { readonly is: 'letters'; readonly letters: string }
  | { readonly is: 'pattern'; readonly pattern: Pattern }
  | { readonly is: 'class'; readonly knurlClass: KnurlClass }
  | {
      readonly is: 'pitch';
      readonly system: Exclude<PitchSystem, 'metric'>;
      readonly value: number;
    }
  | { readonly is: 'number'; readonly text: string; readonly unit: '' | 'mm' | '°' }
  /** Knurl, Rändel: belongs to a callout and says nothing more. */
  | { readonly is: 'filler' };

export type Piece = Said & {
  readonly start: number;
  readonly end: number;
  /** What stood between this and the piece before. */
  readonly gap: string;
};

type Groups = Readonly<Record<string, string | undefined>>;
type Rule = { readonly shape: RegExp; readonly say: (groups: Groups, text: string) => Said | null };

/** No letter or digit of any script may follow. */
const END = '(?![\\p{L}\\p{N}])';
const NUMBER = '\\d+(?:[.,]\\d+)?|[.,]\\d+';

/** Reads from one place only; capitals as small letters. */
const shape = (source: string): RegExp => new RegExp(source, 'iuy');

const numberOf = (text: string | undefined): number => Number((text ?? '').replace(',', '.'));

const standards: readonly Rule[] = [
  [`din\\s*-?\\s*82(?!\\d)(?:\\s*[-:]\\s*1973(?:-\\d\\d)?${END})?`, 'din82'] as const,
  [
    `(?:ansi\\s*/?\\s*asme|ansi|asme)(?:\\s*b\\s*94\\.6m?(?:\\s*-\\s*(?:19|20)\\d\\d)?)?${END}`,
    'asme',
  ] as const,
  [`b\\s*94\\.6m?(?:\\s*-\\s*(?:19|20)\\d\\d)?${END}`, 'asme'] as const,
  [`jis(?:\\s*b\\s*0951)?(?:\\s*[-:]\\s*(?:19|20)\\d\\d)?${END}`, 'jis'] as const,
  [`(?:gost|гост)(?:\\s*21474(?:\\s*-\\s*75)?)?${END}`, 'gost'] as const,
].map(([source, standard]) => ({
  shape: shape(source),
  say: () => ({ is: 'standard', standard }),
}));

const SUNK = /sunk|female|depressed|indented/iu;
const crossed = (kind: 'diamond' | 'square', text: string): Said => ({
  is: 'pattern',
  pattern: { kind, points: SUNK.test(text) ? 'sunk' : 'raised' },
});
const diagonal = (text: string): Said => {
  const hand = /left|lh/iu.test(text) ? 'left' : /right|rh/iu.test(text) ? 'right' : null;
  return { is: 'pattern', pattern: { kind: 'diagonal', hand } };
};
const STRAIGHT: Said = { is: 'pattern', pattern: { kind: 'straight' } };

const POINTS = '(?:raised|male|sunk|female|depressed|indented)';
const HAND = '(?:left|right|lh|rh)(?:[\\s-]*hand(?:ed)?)?';

const patterns: readonly Rule[] = [
  { shape: shape(`straight${END}`), say: () => STRAIGHT },
  { shape: shape(`(?:прям(?:ое|ая|ой)${END}|平目)`), say: () => STRAIGHT },
  {
    shape: shape(`(?:${HAND}\\s*diagonal|diagonal(?:\\s*${HAND})?)${END}`),
    say: (_, text) => diagonal(text),
  },
  {
    shape: shape(`(?:${POINTS}\\s*diamond|diamond(?:\\s*${POINTS})?)${END}`),
    say: (_, text) => crossed('diamond', text),
  },
  {
    shape: shape(`(?:сетчат(?:ое|ая|ой)${END}|アヤ目|綾目)`),
    say: (_, text) => crossed('diamond', text),
  },
  {
    // The square of `square edge` speaks of the wheel.
    shape: shape(`(?:${POINTS}\\s*square|square(?:\\s*${POINTS})?)${END}(?!\\s*-?\\s*edge)`),
    say: (_, text) => crossed('square', text),
  },
];

const CLASS_NAMES: Readonly<Record<string, KnurlClass>> = {
  i: 'I',
  ii: 'II',
  iii: 'III',
  '1': 'I',
  '2': 'II',
  '3': 'III',
};

const classes: readonly Rule[] = [
  {
    shape: shape(
      `cl(?:ass|\\.)?\\s*-?\\s*(?<name>iii|ii|i|[123])${END}(?![.,]\\d)(?:\\s*tolerance${END})?`,
    ),
    say: ({ name }) => {
      const knurlClass = CLASS_NAMES[(name ?? '').toLowerCase()];
      return knurlClass === undefined ? null : { is: 'class', knurlClass };
    },
  },
];

const pitchOf =
  (system: Exclude<PitchSystem, 'metric'>): Rule['say'] =>
  ({ value }) => ({ is: 'pitch', system, value: numberOf(value) });

const DP = '(?:d\\.?p\\.?|diametral\\s*pitch)';
const TPI = '(?:t\\.?p\\.?i\\.?|teeth\\s*(?:per|/)\\s*in(?:ch)?)';

const pitches: readonly Rule[] = [
  { shape: shape(`(?<value>${NUMBER})\\s*-?\\s*${DP}${END}`), say: pitchOf('dp') },
  { shape: shape(`dp\\s*=?\\s*(?<value>${NUMBER})${END}`), say: pitchOf('dp') },
  // P alone is a mould steel, a thread, a page: only the standard's own numbers make it a pitch.
  { shape: shape(`p\\s*=?\\s*(?<value>64|96|128|160)${END}(?![.,]\\d)`), say: pitchOf('dp') },
  { shape: shape(`(?<value>${NUMBER})\\s*-?\\s*${TPI}${END}`), say: pitchOf('tpi') },
  { shape: shape(`tpi\\s*=?\\s*(?<value>${NUMBER})${END}`), say: pitchOf('tpi') },
  {
    shape: shape(`m(?:odule?)?\\s*=?\\s*(?<value>\\d?[.,]\\d+)${END}(?!\\s*(?:mm|in|m)${END})`),
    say: pitchOf('module'),
  },
  { shape: shape(`(?<value>\\d?[.,]\\d+)\\s*module?${END}`), say: pitchOf('module') },
];

const UNITS = 'in|inch|inches|thou|um|hb|hrc|rpm|sfm|turns|teeth|tpi|dp|m';
/** `0.8 long` is a length; in `0.8 long 15mm` the word belongs to the number behind it. */
const NAMES_BEFORE = `(?:long|deep|wide)(?!\\s*[\\d.,])`;
/** What makes a number something else than a pitch: its unit, or being part of a fraction. */
const ELSE = `(?!\\s*(?:${UNITS}|${NAMES_BEFORE})${END})(?![\\w/%"'x.])(?!\\s*["%])`;

const numbers: readonly Rule[] = [
  {
    shape: shape(
      `(?:[tp]\\s*=?\\s*)?(?<value>${NUMBER})\\s*(?:(?<mm>mm)${END}|(?<deg>°|deg(?:rees)?${END}))?${ELSE}`,
    ),
    say: ({ value = '', mm, deg }) => ({
      is: 'number',
      text: value,
      unit: mm === undefined ? (deg === undefined ? '' : '°') : 'mm',
    }),
  },
];

const RÄNDEL = 'r(?:ä|ä|ae|a)ndel(?:ung)?';
const fillers: readonly Rule[] = [
  {
    shape: shape(`(?:knurl(?:ing|ed|s)?|${RÄNDEL}|рифление|ローレット)${END}`),
    say: () => ({ is: 'filler' }),
  },
];

const forms: readonly Rule[] = [
  {
    // The pitch may touch the form: RGE08.
    shape: shape('(?<form>raa|rbl|rbr|rge|rgv|rke|rkv)(?!\\p{L})'),
    say: ({ form }) => {
      const known = DIN_FORMS.find((name) => name === form?.toUpperCase());
      return known === undefined ? null : { is: 'form', form: known };
    },
  },
];

const letters: Rule = {
  shape: shape('(?<letters>[a-z]{2,4})(?!\\p{L})'),
  say: ({ letters: said = '' }) => ({ is: 'letters', letters: said.toUpperCase() }),
};

const RULES: readonly Rule[] = [
  ...standards,
  ...forms,
  ...patterns,
  ...classes,
  ...pitches,
  ...fillers,
  ...numbers,
];

const readBy = (
  rules: readonly Rule[],
  text: string,
  at: number,
): { said: Said; end: number } | null => {
  for (const rule of rules) {
    rule.shape.lastIndex = at;
    const match = rule.shape.exec(text);
    const said = match === null ? null : rule.say(match.groups ?? {}, match[0]);
    if (match !== null && said !== null) return { said, end: at + match[0].length };
  }
  return null;
};

const GAP = shape('[\\s,;:()-]*');
const gapAt = (text: string, at: number): string => {
  GAP.lastIndex = at;
  return GAP.exec(text)?.[0] ?? '';
};

/** Letters count only where a form is due: at the very start, or after the standard or Rändel. */
const lettersAreDue = (before: Piece | undefined): boolean =>
  before === undefined ||
  before.is === 'filler' ||
  (before.is === 'standard' && before.standard === 'din82');

/** The pieces of a callout one after another, as far as the text goes on speaking its language. */
export const piecesOf = (text: string): readonly Piece[] => {
  const pieces: Piece[] = [];
  for (let at = 0; at < text.length; ) {
    const before = pieces.at(-1);
    const gap = before === undefined ? '' : gapAt(text, at);
    const start = at + gap.length;
    const rules = lettersAreDue(before) ? [...RULES, letters] : RULES;
    const read = readBy(rules, text, start);
    if (read === null) break;
    pieces.push({ ...read.said, start, end: read.end, gap });
    at = read.end;
  }
  return pieces;
};
