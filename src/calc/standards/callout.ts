import type { Pattern } from '../pattern.ts';
import type { Pitch } from '../pitch.ts';
import type { KnurlClass } from '../tracking.ts';
import type { Rad } from '../units.ts';
import type { DinForm } from './din82.ts';

/** The standards, or the plain habit of naming teeth per inch, that a callout can follow. */
export type Standard = 'din82' | 'asme' | 'jis' | 'gost' | 'tpi';

/** What a callout on a drawing says. Null: it does not say. */
export type Callout = {
  readonly standard: Standard;
  /** Form letters of DIN 82. */
  readonly form: DinForm | null;
  readonly pattern: Pattern | null;
  readonly pitch: Pitch | null;
  /** Profile angle; DIN 82 means 90° where its designation names none. */
  readonly included: Rad | null;
  readonly knurlClass: KnurlClass | null;
};

const degreesOf = (angle: Rad): number => Math.round((angle * 180) / Math.PI);

/** At most four decimals, none that is nothing. */
const printed = (value: number): string => String(Number(value.toFixed(4)));
/** Metric pitches keep a decimal, so that 2,0 is never taken for a diameter. */
const decimalComma = (value: number): string =>
  (Number.isInteger(value) ? value.toFixed(1) : printed(value)).replace('.', ',');

/** `08` for 0.8; a pitch of more than one decimal is written out. */
const dinPitchText = (t: number): string => {
  const tenths = Math.round(10 * t);
  return Math.abs(tenths / 10 - t) < 1e-9 && tenths < 20
    ? String(tenths).padStart(2, '0')
    : decimalComma(t);
};

const points = (kept: 'raised' | 'sunk'): string => (kept === 'raised' ? 'RAISED' : 'SUNK');

const patternText = (pattern: Pattern): string => {
  switch (pattern.kind) {
    case 'straight':
      return 'STRAIGHT';
    case 'diagonal':
      return pattern.hand === null ? 'DIAGONAL' : `DIAGONAL ${pattern.hand.toUpperCase()}`;
    case 'diamond':
      return `${points(pattern.points)} DIAMOND`;
    case 'square':
      return `${points(pattern.points)} SQUARE`;
  }
};

const pitchText = (pitch: Pitch): string => {
  switch (pitch.system) {
    case 'metric':
      return decimalComma(pitch.value);
    case 'dp':
      return `${printed(pitch.value)} DP`;
    case 'tpi':
      return `${printed(pitch.value)} TPI`;
    case 'module':
      return `m ${printed(pitch.value)}`;
  }
};

const dinText = (callout: Callout): readonly (string | null)[] => [
  'Rändel',
  callout.form,
  callout.pitch === null ? null : dinPitchText(callout.pitch.value),
  callout.included === null || degreesOf(callout.included) === 90
    ? null
    : `- ${degreesOf(callout.included)}`,
  'DIN 82',
];

const wordsOf = (callout: Callout): readonly (string | null)[] => {
  const pattern = callout.pattern === null ? null : patternText(callout.pattern);
  const pitch = callout.pitch === null ? null : pitchText(callout.pitch);
  switch (callout.standard) {
    case 'din82':
      return dinText(callout);
    case 'asme':
      return [
        pitch ?? 'ASME B94.6',
        pattern,
        callout.knurlClass === null ? null : `CLASS ${callout.knurlClass}`,
      ];
    case 'jis':
      return ['JIS B 0951', pattern, pitch];
    case 'gost':
      return ['GOST 21474-75', pattern, pitch];
    case 'tpi':
      return [pitch, pattern];
  }
};

/**
 * A callout as its standard writes it on a drawing.
 *
 *     Rändel RGE 08 DIN 82;  96 DP STRAIGHT CLASS II;  JIS B 0951 STRAIGHT m 0.3;  21 TPI STRAIGHT
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | standard | din82, asme, jis, gost or tpi | - | |
 * | form | letters of DIN 82, or null | - | |
 * | pattern | pattern on the work, or null | - | |
 * | pitch | system and number, or null | - | |
 * | α (included) | profile angle, or null | rad | |
 * | class (knurlClass) | I, II, III or null | - | |
 * | → text | the callout | - | |
 *
 * Assumes a pattern the standard has; order and abbreviations of the ANSI, JIS and GOST texts are a habit.
 *
 * @source din-82 (designation)
 * @source callout-spellings (order of the words in the others)
 * @example writeCallout({ standard: 'din82', form: 'RGE', pattern: { kind: 'diamond', points: 'raised' }, pitch: { system: 'metric', value: 0.8 }, included: degrees(90), knurlClass: null }) // "Rändel RGE 08 DIN 82"
 */
export function writeCallout(callout: Callout): string {
  return wordsOf(callout)
    .filter((word) => word !== null)
    .join(' ');
}
