import type { Form } from '../growth/index.ts';
import { formOf, type Pattern } from '../pattern.ts';
import { degrees, type Mm, mm, OutOfRange, type Rad, within } from '../units.ts';

/** The seven forms of a knurl on work, as a drawing names them. */
export const DIN_FORMS = ['RAA', 'RBL', 'RBR', 'RGE', 'RGV', 'RKE', 'RKV'] as const;
export type DinForm = (typeof DIN_FORMS)[number];

/** The wheels the standard names for them. */
export type DinWheelForm = 'AA' | 'BL' | 'BR' | 'GE' | 'GV' | 'KE' | 'KV';

/** One wheel, or a pair, that makes a form, set over where it is said. */
export type DinTool = { readonly wheels: readonly DinWheelForm[]; readonly setOver: boolean };

export type DinFormRow = {
  readonly pattern: Pattern;
  /** The usual tool first. */
  readonly tools: readonly [DinTool, ...DinTool[]];
  /** k of d2 = d1 − k·t as printed, for 90° only. */
  readonly factor: number;
};

const tool = (...wheels: DinWheelForm[]): DinTool => ({ wheels, setOver: false });
const setOver = (...wheels: DinWheelForm[]): DinTool => ({ wheels, setOver: true });
const diagonal = (hand: 'left' | 'right'): Pattern => ({ kind: 'diagonal', hand });

/** Form, wheels that make it and blank factor. Forms read, factors reported. */
export const DIN_82: Readonly<Record<DinForm, DinFormRow>> = {
  RAA: {
    pattern: { kind: 'straight' },
    tools: [tool('AA'), setOver('BL'), setOver('BR')],
    factor: 0.5,
  },
  // The wheel is the mirror of the knurl: left-hand grooves come from a right-hand wheel.
  RBL: { pattern: diagonal('left'), tools: [tool('BR'), setOver('AA')], factor: 0.5 },
  RBR: { pattern: diagonal('right'), tools: [tool('BL'), setOver('AA')], factor: 0.5 },
  RGE: {
    pattern: { kind: 'diamond', points: 'raised' },
    tools: [tool('GV'), tool('BL', 'BR')],
    factor: 0.67,
  },
  RGV: { pattern: { kind: 'diamond', points: 'sunk' }, tools: [tool('GE')], factor: 0.33 },
  RKE: { pattern: { kind: 'square', points: 'raised' }, tools: [tool('KV')], factor: 0.67 },
  RKV: { pattern: { kind: 'square', points: 'sunk' }, tools: [tool('KE')], factor: 0.33 },
};

/** Pitches t of the standard in mm; 2.0 was dropped in 1973. */
export const DIN_PITCHES = [0.5, 0.6, 0.8, 1.0, 1.2, 1.6] as const;
/** Profile angle where the designation names none. */
export const DIN_INCLUDED: Rad = degrees(90);
/** The other profile the standard knows, where it is required. */
export const DIN_WIDE_INCLUDED: Rad = degrees(105);

const isRightAngle = (included: Rad): boolean => Math.abs(included - DIN_INCLUDED) < 1e-9;

/** What k is at 90° before it is rounded for print: growth over pitch of a full tooth. */
const EXACT_FACTOR: Readonly<Record<Form, number>> = { grooves: 1 / 2, raised: 2 / 3, sunk: 1 / 3 };

/**
 * Factor k of the blank formula: printed for 90°, from equal volume for any other profile.
 *
 *     90°: k = 0.5, 0.67, 0.33;  else k = {1/2, 2/3, 1/3} cot(α/2)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | RAA, RBL, RBR, RGE, RGV, RKE or RKV | - | |
 * | α (included) | profile angle | rad | 0.5 to 2.6 |
 * | → k | factor of the pitch | - | |
 *
 * Assumes a tooth filled to its edge, no rounding in the groove and any material.
 *
 * @source din-82-blank (0.5, 0.67, 0.33)
 * @source din-82-105 (equal volume; not in the standard)
 * @example blankFactor('RGE', degrees(90)) // 0.67
 * @example blankFactor('RGE', degrees(105)) // 0.512
 */
export function blankFactor(form: DinForm, included: Rad): number {
  within('included', included, 0.5, 2.6, 'rad');
  const { factor, pattern } = DIN_82[form];
  return isRightAngle(included) ? factor : EXACT_FACTOR[formOf(pattern)] / Math.tan(included / 2);
}

/**
 * Diameter before knurling by the standard's own formula.
 *
 *     d2 = d1 − k t
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | RAA, RBL, RBR, RGE, RGV, RKE or RKV | - | |
 * | d1 (finished) | diameter over the finished crests | mm | > 0 |
 * | t (pitch) | pitch square to the tooth | mm | > 0 |
 * | → d2 | diameter before knurling | mm | |
 *
 * Assumes a 90° profile filled to its edge; the standard gives the formula for no other.
 *
 * @source din-82-blank (d2 = d1 − k·t)
 * @example blankByStandard({ form: 'RGE', finished: mm(20), pitch: mm(0.8) }) // 19.464 mm
 */
export function blankByStandard(of: {
  readonly form: DinForm;
  readonly finished: Mm;
  readonly pitch: Mm;
}): Mm {
  within('pitch', of.pitch, Number.MIN_VALUE, 1000, 'mm');
  const off = blankFactor(of.form, DIN_INCLUDED) * of.pitch;
  if (!(of.finished > off)) throw new OutOfRange('finished', of.finished, off, 1e6, 'mm');
  return mm(of.finished - off);
}

const samePattern = (a: Pattern, b: Pattern): boolean =>
  a.kind === b.kind &&
  (a.kind !== 'diagonal' || b.kind !== 'diagonal' || a.hand === b.hand) &&
  (!('points' in a) || !('points' in b) || a.points === b.points);

/**
 * Form letters of a pattern.
 *
 *     straight RAA; diagonal RBL, RBR; diamond RGE, RGV; square RKE, RKV
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pattern | pattern on the work | - | |
 * | → form | the letters, null for a diagonal whose hand is not known | - | |
 *
 * Assumes raised points are E, sunk ones V.
 *
 * @source din-82 (forms)
 * @example dinFormOf({ kind: 'diamond', points: 'raised' }) // "RGE"
 */
export function dinFormOf(pattern: Pattern): DinForm | null {
  return DIN_FORMS.find((form) => samePattern(DIN_82[form].pattern, pattern)) ?? null;
}
