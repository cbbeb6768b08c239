import type { Pattern } from '../pattern.ts';
import { STANDARD_DP, type StandardDp } from '../pitch.ts';
import type { Mark, SourceId } from '../sources.ts';
import type { KnurlClass, Window } from '../tracking.ts';
import { inch, type Mm, mm, within } from '../units.ts';

/** The grade to use first, and the one to avoid. Reported. */
export const PREFERRED_DP: StandardDp = 96;
export const AVOIDED_DP: StandardDp = 64;

type ClassRow = {
  /** How far over and under the nominal crest diameter, in inches, by pitch. */
  readonly limits: Readonly<Record<StandardDp, readonly [above: number, below: number]>>;
  readonly mark: Mark;
  readonly source: SourceId;
};

/** Limits of the knurled diameter, in inches. Class I read, II and III from memory. */
const CLASSES: Readonly<Record<KnurlClass, ClassRow>> = {
  I: {
    limits: {
      64: [0.005, 0.012],
      96: [0.004, 0.01],
      128: [0.003, 0.008],
      160: [0.002, 0.006],
    },
    mark: 'read',
    source: 'asme-b94.6',
  },
  II: {
    limits: { 64: [0, 0.01], 96: [0, 0.009], 128: [0, 0.008], 160: [0, 0.006] },
    mark: 'from memory',
    source: 'asme-b94.6-memory',
  },
  III: {
    limits: { 64: [0, 0.006], 96: [0, 0.005], 128: [0, 0.004], 160: [0, 0.003] },
    mark: 'from memory',
    source: 'asme-b94.6-memory',
  },
};

/**
 * How sure the limits of a class are, and where they come from.
 *
 *     I read in the handbook; II, III from memory
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | class (knurlClass) | I, II or III | - | |
 * | → mark, source | how sure, and the entry of the register | - | |
 *
 * Assumes nothing beyond the register.
 *
 * @source asme-b94.6 (class I)
 * @source asme-b94.6-memory (classes II and III)
 * @example classEvidence('II').mark // "from memory"
 */
export function classEvidence(knurlClass: KnurlClass): {
  readonly mark: Mark;
  readonly source: SourceId;
} {
  const { mark, source } = CLASSES[knurlClass];
  return { mark, source };
}

/**
 * Finished limits that a class allows about a nominal crest diameter.
 *
 *     D + above … D − below; 96 DP: I +0.004/−0.010, II +0/−0.009, III +0/−0.005 in
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | dp | diametral pitch | - | 64, 96, 128 or 160 |
 * | class (knurlClass) | I, II or III | - | |
 * | D (nominal) | nominal diameter over the crests | mm | > 0.3 |
 * | → low, high | smallest and largest finished diameter | mm | |
 *
 * Assumes the print's diameter is that of the finished knurl.
 *
 * @source asme-b94.6 (class I)
 * @source asme-b94.6-memory (classes II and III)
 * @example finishLimits({ dp: 96, knurlClass: 'II', nominal: inch(1) }).low // 25.1714 mm
 * @example finishLimits({ dp: 64, knurlClass: 'I', nominal: inch(1) }).high // 25.527 mm
 */
export function finishLimits(of: {
  readonly dp: StandardDp;
  readonly knurlClass: KnurlClass;
  readonly nominal: Mm;
}): Window {
  const [above, below] = CLASSES[of.knurlClass].limits[of.dp];
  within('nominal', of.nominal, inch(below), 1e6, 'mm');
  return { low: mm(of.nominal - inch(below)), high: mm(of.nominal + inch(above)) };
}

/**
 * Whether a class may be called out for a pattern.
 *
 *     I: straight, diagonal, raised diamond; II, III: straight only
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | class (knurlClass) | I, II or III | - | |
 * | pattern | pattern on the work | - | |
 * | → suits | true where the standard has it | - | |
 *
 * Assumes the callout is meant by the standard.
 *
 * @source asme-b94.6 (what the classes are for)
 * @example classSuits('II', { kind: 'diamond', points: 'raised' }) // false
 * @example classSuits('I', { kind: 'diamond', points: 'raised' }) // true
 */
export function classSuits(knurlClass: KnurlClass, pattern: Pattern): boolean {
  if (pattern.kind === 'straight') return true;
  if (knurlClass !== 'I') return false;
  return pattern.kind === 'diagonal' || (pattern.kind === 'diamond' && pattern.points === 'raised');
}

export type DpWheelSize = {
  /** As the trade writes it, in inches. */
  readonly name: string;
  readonly diameter: Mm;
  readonly face: Mm;
  readonly bore: Mm;
};

/** Wheel sizes: outside diameter × face × bore. From memory. */
export const DP_WHEEL_SIZES: readonly DpWheelSize[] = [
  { name: '1/2 x 3/16 x 3/16', diameter: inch(1 / 2), face: inch(3 / 16), bore: inch(3 / 16) },
  { name: '5/8 x 1/4 x 1/4', diameter: inch(5 / 8), face: inch(1 / 4), bore: inch(1 / 4) },
  { name: '3/4 x 3/8 x 1/4', diameter: inch(3 / 4), face: inch(3 / 8), bore: inch(1 / 4) },
  { name: '7/8 x 3/8 x 1/4', diameter: inch(7 / 8), face: inch(3 / 8), bore: inch(1 / 4) },
];

/**
 * Teeth on a diametral-pitch wheel of the listed sizes.
 *
 *     N_w = P · D_w
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | P (dp) | diametral pitch | - | 64, 96, 128 or 160 |
 * | D_w (diameter) | nominal outside diameter of the wheel | mm | > 0 |
 * | → N_w | teeth | - | |
 *
 * Assumes the nominal outside diameter.
 *
 * @source asme-b94.6-memory (teeth = P × nominal diameter)
 * @example dpWheelTeeth(96, inch(3 / 4)) // 72
 */
export function dpWheelTeeth(dp: StandardDp, diameter: Mm): number {
  within('diameter', diameter, inch(1 / dp), 1000, 'mm');
  return Math.round((dp * diameter) / inch(1));
}

/** Every pitch of the standard, the preferred one first. */
export const DP_BY_PREFERENCE: readonly StandardDp[] = [
  PREFERRED_DP,
  ...STANDARD_DP.filter((dp) => dp !== PREFERRED_DP && dp !== AVOIDED_DP),
  AVOIDED_DP,
];
