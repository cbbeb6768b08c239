import {
  basisOf,
  labelledPitch,
  type Pitch,
  type PitchSystem,
  STANDARD_DP,
  workPitch,
} from '../pitch.ts';
import { MM_PER_INCH, type Mm, mm, type Rad } from '../units.ts';
import { DIN_PITCHES } from './din82.ts';
import { JIS_MODULES } from './jis.ts';

const normalOf = (pitch: Pitch, helix: Rad): Mm =>
  workPitch({
    pitch: labelledPitch(pitch),
    basis: basisOf(pitch.system),
    helix,
    setOver: false,
  }).normal;

const numberIn = (system: PitchSystem, normal: Mm, helix: Rad): number => {
  switch (system) {
    case 'metric':
      return normal;
    case 'tpi':
      return MM_PER_INCH / normal;
    case 'module':
      return normal / Math.PI;
    case 'dp':
      return (Math.PI * MM_PER_INCH * Math.cos(helix)) / normal;
  }
};

/** Pitches wheels are made in; teeth per inch come in any whole number. */
const listed = (system: PitchSystem, exact: number): readonly number[] => {
  switch (system) {
    case 'metric':
      return DIN_PITCHES;
    case 'dp':
      return STANDARD_DP;
    case 'module':
      return JIS_MODULES;
    case 'tpi':
      return [Math.max(1, Math.floor(exact)), Math.ceil(exact)];
  }
};

export type Converted = {
  /** The same pitch in the other system, whether or not a wheel has it. */
  readonly exact: Pitch;
  /** The pitch wheels are made in that comes nearest. */
  readonly nearest: Pitch;
  /** How much coarser the nearest is than what was asked for, as a share of it. */
  readonly error: number;
};

/**
 * The same pitch in another system, the nearest that wheels are made in, and how far that one is off.
 *
 *     p = t = 25.4/TPI = π m = 25.4 π cos ψ/DP;  error = p_nearest/p − 1
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pitch | system and number to start from | - | |
 * | to | metric, tpi, dp or module | - | |
 * | ψ (helix) | helix on the work, 0 for straight and square | rad | 0 to 1.2 |
 * | → exact, nearest | number in the other system | - | |
 * | → error | share by which the nearest is coarser | - | |
 *
 * Assumes DP along the rim and the others square to the tooth.
 *
 * @source asme-b94.6 (DP along the rim)
 * @source tpi-practice (TPI square to the tooth)
 * @source jis-b-0951 (t = π m)
 * @example convertPitch({ pitch: { system: 'metric', value: 0.8 }, to: 'dp', helix: degrees(0) }).exact.value // 99.7456
 * @example convertPitch({ pitch: { system: 'metric', value: 0.8 }, to: 'dp', helix: degrees(0) }).error // 0.0390
 */
export function convertPitch(of: {
  readonly pitch: Pitch;
  readonly to: PitchSystem;
  readonly helix: Rad;
}): Converted {
  const { to, helix } = of;
  const normal = normalOf(of.pitch, helix);
  const exact: Pitch = { system: to, value: numberIn(to, mm(normal), helix) };
  const shareOff = (value: number): number => normalOf({ system: to, value }, helix) / normal - 1;
  const [nearest] = [...listed(to, exact.value)].sort(
    (a, b) => Math.abs(shareOff(a)) - Math.abs(shareOff(b)),
  );
  const value = nearest ?? exact.value;
  return { exact, nearest: { system: to, value }, error: shareOff(value) };
}
