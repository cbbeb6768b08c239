import type { Edge } from './edge.ts';
import type { Pattern } from './pattern.ts';
import { type Pitch, type WorkPitch } from './pitch.ts';
import { type ResolvedPitch, resolvePitch, type WheelSize } from './setup/index.ts';
import { type Mm, type Rad, within } from './units.ts';

/** A wheel, or a pair of them, that lies in the crib. */
export type CribWheel = {
  readonly name: string;
  /** What it leaves on the work. */
  readonly pattern: Pattern;
  /** A crossed pattern from one wheel instead of a pair. */
  readonly onePiece: boolean;
  /** Its label; null where only a count or a proven pitch is known. */
  readonly pitch: Pitch | null;
  /** The label's pitch is meant along the rim. */
  readonly alongRim: boolean;
  /** Teeth, where they were counted or the standard it is made to prints them. */
  readonly teeth: number | null;
  /** Pitch round the rim that a diameter and its count have proven. */
  readonly proven: Mm | null;
  /** Null: what the pattern implies. */
  readonly helix: Rad | null;
  readonly included: Rad;
  readonly size: WheelSize;
  /** Null: what its bevel implies. */
  readonly edge: Edge | null;
};

/**
 * Pitch a wheel of the crib puts on the work, the best knowledge of it first.
 *
 *     proven p_t; else π D_w/N_w along the rim; else the label
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | name | as the shop calls it | - | |
 * | pattern | what it leaves on the work | - | |
 * | onePiece | a crossed pattern from one wheel | - | |
 * | pitch | its label, or null | - | |
 * | alongRim | the label is meant along the rim | - | |
 * | N_w (teeth) | teeth counted, or null | - | |
 * | p_t (proven) | pitch a diameter and its count have proven, or null | mm | |
 * | ψ (helix) | helix, or null for the usual one | rad | 0 to 1.2 |
 * | 2a (included) | included tooth angle | rad | |
 * | D_w (size) | diameter, face, bore and bevel | mm | |
 * | edge | bevelled, square or convex, or null | - | |
 * | → normal, transverse | pitch square to the tooth and round the rim | mm | 0.2 to 3.2 |
 * | → knowledge | label, counted or proven | - | |
 *
 * Assumes a counted wheel rolls on its outside diameter.
 *
 * @source wheel-truth (a counted wheel is believed over its label)
 * @example cribPitch({ name: 'A', pattern: { kind: 'straight' }, onePiece: false, pitch: { system: 'metric', value: 0.8 }, alongRim: false, teeth: 79, proven: null, helix: null, included: degrees(90), size: DEFAULT_WHEEL, edge: null }).normal // 0.79534 mm
 */
export function cribPitch(wheel: CribWheel): ResolvedPitch {
  const { teeth, size } = wheel;
  const counted = teeth === null ? null : { diameter: size.diameter, teeth };
  return resolvePitch({ ...wheel, counted, tilt: null });
}

export type WheelWithin = {
  readonly wheel: CribWheel;
  readonly pitch: WorkPitch;
  /** How much coarser the wheel is than what was asked for, as a share of it. */
  readonly error: number;
};

/** Rounding noise that does not put a wheel outside a tolerance. */
const HAIR = 1e-9;

/**
 * Wheels of the crib whose pitch comes within a tolerance of the one asked for, the nearest first.
 *
 *     |p_wheel/p − 1| ≤ tolerance
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | p (normal) | pitch asked for, square to the tooth | mm | > 0 |
 * | tolerance | share it may be off | - | 0 to 10 |
 * | crib | the wheels | - | |
 * | → wheels | each with its pitch and its signed error | - | |
 *
 * Assumes pitches are compared square to the tooth, where they set the tooth height.
 *
 * @source pitch-conversion (share of the pitch asked for)
 * @example wheelsWithin({ normal: mm(0.8), tolerance: 0.01, crib: dinCrib() }).length // 48
 */
export function wheelsWithin(of: {
  readonly normal: Mm;
  readonly tolerance: number;
  readonly crib: readonly CribWheel[];
}): readonly WheelWithin[] {
  within('pitch', of.normal, Number.MIN_VALUE, 1000, 'mm');
  within('tolerance', of.tolerance, 0, 10);
  return of.crib
    .map((wheel) => {
      const pitch = cribPitch(wheel);
      return { wheel, pitch, error: pitch.normal / of.normal - 1 };
    })
    .filter(({ error }) => Math.abs(error) <= of.tolerance + HAIR)
    .sort((a, b) => Math.abs(a.error) - Math.abs(b.error));
}
