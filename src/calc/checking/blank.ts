import type { Check } from '../check.ts';
import { standardDp } from '../pitch.ts';
import {
  LARGEST_DIAMETER,
  type ResolvedPitch,
  resolvePitch,
  type SetupRequest,
} from '../setup/index.ts';
import {
  FEWEST_TEETH,
  largestWholeCount,
  toothCount,
  toothError,
  wholeToothDiameter,
} from '../teeth.ts';
import { trackingCheck, trackingWindow, wheelCheck } from '../tracking.ts';
import { type Mm, mm, within } from '../units.ts';
import { chanceByLabel } from './chance.ts';
import { type CheckAlternative, type CheckFigures, checkFigures } from './figures.ts';

/** What has to be known of the wheel and the pattern to say whether a blank tracks. */
export type WheelOnWork = Pick<
  SetupRequest,
  'pattern' | 'pitch' | 'alongRim' | 'counted' | 'proven' | 'helix' | 'tilt' | 'knurlClass'
>;

export type BlankCheck = {
  readonly figures: CheckFigures;
  readonly checks: readonly Check[];
  /** The next whole counts below. */
  readonly alternatives: readonly CheckAlternative[];
  readonly pitch: ResolvedPitch;
};

const ALTERNATIVES = 3;
/** Less than this off a bar is no cut. */
const NO_CUT: Mm = mm(1e-6);

/** A bar that takes at least the fewest teeth of this pitch. */
export const knurlable = (diameter: Mm, transverse: Mm): Mm =>
  within(
    'diameter',
    diameter,
    wholeToothDiameter(FEWEST_TEETH, transverse),
    LARGEST_DIAMETER,
    'mm',
  );

const dpOf = (wheel: WheelOnWork) =>
  wheel.pitch?.system === 'dp' ? standardDp(wheel.pitch.value) : null;

const smallerOnes = (diameter: Mm, transverse: Mm): readonly CheckAlternative[] => {
  const most = largestWholeCount(mm(diameter - NO_CUT), transverse);
  const counts = Array.from({ length: ALTERNATIVES }, (_, i) => most - i);
  return counts
    .filter((count) => count >= FEWEST_TEETH)
    .map((count) => ({ toothCount: count, blankDiameter: wholeToothDiameter(count, transverse) }));
};

/** Tracking and wheel as the set-up judges them, on this diameter. */
const checksOf = (wheel: WheelOnWork, diameter: Mm, pitch: ResolvedPitch) => {
  const tracking = trackingCheck({
    diameter,
    transversePitch: pitch.transverse,
    dp: dpOf(wheel),
    knurlClass: wheel.knurlClass,
  });
  const truth = wheelCheck({
    blankDiameter: diameter,
    teeth: Math.round(toothCount(diameter, pitch.transverse)),
    pitch: wheel.pitch,
    knowledge: pitch.knowledge,
    setOver: pitch.setOver,
  });
  return { tracking, truth, doubt: truth.figures['countDoubt']?.value ?? 0 };
};

/** What a blank says of itself before a wheel touches it, as figures. */
export const blankFigures = (wheel: WheelOnWork, diameter: Mm, pitch: ResolvedPitch) => {
  const { transverse } = pitch;
  const teeth = Math.round(toothCount(diameter, transverse));
  const window = trackingWindow({
    teeth,
    transversePitch: transverse,
    dp: dpOf(wheel),
    knurlClass: wheel.knurlClass,
  });
  const error = toothError(diameter, transverse);
  const { doubt } = checksOf(wheel, diameter, pitch);
  return {
    toothCount: teeth,
    toothError: error,
    diameterError: diameter - wholeToothDiameter(teeth, transverse),
    blankWindowLow: window.low,
    blankWindowHigh: window.high,
    pitch: pitch.normal,
    transversePitch: transverse,
    countDoubt: doubt,
    chanceTracks: chanceByLabel(error, doubt),
  };
};

/**
 * Whether a blank as it is will track, and the next smaller diameter that does.
 *
 *     N = π D/p_t;  δ = N − round(N);  D − round(N) p_t/π;  next: ⌊N⌋ p_t/π
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | wheel | pitch, pattern and class, as in a request for a set-up | - | |
 * | D (diameter) | diameter of the blank | mm | 3 teeth to 500 |
 * | → toothCount, toothError | nearest whole count and the signed share of a tooth beside it | - | |
 * | → diameterError | diameter less the whole-tooth diameter nearest to it | mm | |
 * | → nextDiameter, nextTakeOff | next smaller diameter that tracks, and what comes off | mm | |
 * | → chanceTracks | chance that it tracks, with what is known of the wheel | - | 0 to 1 |
 *
 * Assumes a turned bar cannot be made larger.
 *
 * @source whole-tooth (counts round the bar)
 * @source window-thresholds (0.10 and 0.20 of a tooth)
 * @source wheel-truth (how far the count may be out)
 * @example checkBlank({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, knurlClass: null }, inch(0.995)).figures.toothError.value // -0.356422
 * @example checkBlank({ pattern: { kind: 'straight' }, pitch: { system: 'tpi', value: 21 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null, knurlClass: null }, inch(0.995)).figures.nextDiameter.value // 25.0252 mm
 */
export function checkBlank(wheel: WheelOnWork, diameter: Mm): BlankCheck {
  const pitch = resolvePitch(wheel);
  knurlable(diameter, pitch.transverse);
  const { tracking, truth } = checksOf(wheel, diameter, pitch);
  const alternatives = smallerOnes(diameter, pitch.transverse);
  const next = alternatives[0] ?? null;
  return {
    figures: checkFigures({
      ...blankFigures(wheel, diameter, pitch),
      nextDiameter: next?.blankDiameter ?? null,
      nextToothCount: next?.toothCount ?? null,
      nextTakeOff: next === null ? null : diameter - next.blankDiameter,
    }),
    checks: [tracking, truth],
    alternatives,
    pitch,
  };
}
