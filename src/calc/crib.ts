import type { Edge } from './edge.ts';
import { formOf, type Pattern } from './pattern.ts';
import { type Pitch, type WorkPitch } from './pitch.ts';
import { type ResolvedPitch, resolvePitch, type WheelSize } from './setup/index.ts';
import { type Mm, mm, type Rad, within } from './units.ts';

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
 * @example wheelsWithin({ normal: mm(0.8), tolerance: 0.01, crib: dinCrib() }).length // 42
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

/**
 * Whether a wheel leaves the pattern that is asked for.
 *
 *     same kind and same points; a diagonal of the same hand, where both hands are known
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | made | pattern the wheel leaves | - | |
 * | asked | pattern asked for | - | |
 * | → suits | true where they agree | - | |
 *
 * Assumes a hand that is not known may be either.
 *
 * @source din-82 (forms, hands, points)
 * @example suitsPattern({ kind: 'diagonal', hand: 'left' }, { kind: 'diagonal', hand: null }) // true
 * @example suitsPattern({ kind: 'diamond', points: 'sunk' }, { kind: 'diamond', points: 'raised' }) // false
 */
export function suitsPattern(made: Pattern, asked: Pattern): boolean {
  if (made.kind === 'diagonal' && asked.kind === 'diagonal')
    return made.hand === null || asked.hand === null || made.hand === asked.hand;
  return made.kind === asked.kind && formOf(made) === formOf(asked);
}

/** Wheels of both hands make a pair when nothing else about their teeth differs. */
const teethOf = (wheel: CribWheel): string =>
  JSON.stringify([
    wheel.pitch?.system,
    wheel.pitch?.value,
    wheel.alongRim,
    wheel.teeth,
    wheel.proven,
    wheel.helix,
    wheel.included,
    wheel.size.diameter,
  ]);

const pairOf = (left: CribWheel, right: CribWheel): CribWheel => ({
  ...left,
  name: `${left.name} + ${right.name}`,
  pattern: { kind: 'diamond', points: 'raised' },
  size: { ...left.size, face: mm(Math.min(left.size.face, right.size.face)) },
});

const handed = (wheel: CribWheel, hand: 'left' | 'right'): boolean =>
  wheel.pattern.kind === 'diagonal' && wheel.pattern.hand === hand;

/**
 * The crib with a diamond pair for every left-hand wheel that has a right-hand fellow.
 *
 *     left + right of one pitch, count, diameter and tooth angle → diamond, raised points
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | crib | the wheels | - | |
 * | → crib | the same wheels, then the pairs | - | |
 *
 * Assumes the narrower face of a pair is the one that counts; a wheel is offered with one fellow only.
 *
 * @source din-82 (crossed helices, points raised, from a pair of wheels)
 * @example withPairs(dinCrib()).length // 288
 */
export function withPairs(crib: readonly CribWheel[]): readonly CribWheel[] {
  const fellows = new Map<string, CribWheel[]>();
  for (const wheel of crib) {
    const key = teethOf(wheel);
    if (handed(wheel, 'right')) fellows.set(key, [...(fellows.get(key) ?? []), wheel]);
  }
  const pairs = crib.flatMap((wheel) => {
    const fellow = handed(wheel, 'left') ? fellows.get(teethOf(wheel))?.shift() : undefined;
    return fellow === undefined ? [] : [pairOf(wheel, fellow)];
  });
  return [...crib, ...pairs];
}
