import { usualHelix } from '../pattern.ts';
import {
  basisOf,
  COARSEST_PITCH,
  countedWheelPitch,
  FINEST_PITCH,
  labelledPitch,
  type PitchBasis,
  type WorkPitch,
  workPitch,
} from '../pitch.ts';
import type { WheelKnowledge } from '../tracking.ts';
import { mm, OutOfRange, type Rad, rad } from '../units.ts';
import type { SetupRequest } from './request.ts';

/** The pitch a set-up is worked out with, and what else the label could have meant. */
export type ResolvedPitch = WorkPitch & {
  readonly helix: Rad;
  readonly setOver: boolean;
  readonly knowledge: WheelKnowledge;
  /** How a helical label was taken where it could mean either; null where it could not. */
  readonly took: PitchBasis | null;
  readonly otherWay: WorkPitch | null;
};

type Source = Pick<
  SetupRequest,
  'pitch' | 'counted' | 'proven' | 'alongRim' | 'pattern' | 'helix' | 'tilt'
>;

const helixOf = (of: Source): { helix: Rad; setOver: boolean } =>
  of.tilt !== null
    ? { helix: of.tilt, setOver: true }
    : { helix: of.helix ?? usualHelix(of.pattern), setOver: false };

const inRange = (pitch: WorkPitch): WorkPitch => {
  // A hair of slack: 25.4 π/DP at a limit must not fail by rounding.
  const { normal } = pitch;
  if (!(normal >= FINEST_PITCH - 1e-9 && normal <= COARSEST_PITCH + 1e-9))
    throw new OutOfRange('pitch', normal, FINEST_PITCH, COARSEST_PITCH, 'mm');
  return pitch;
};

/**
 * Pitch of the wheel in hand, the best knowledge of it first: proven pair, counted wheel, label.
 *
 *     proven p_t; else π D_w/N_w along the rim; else the label in its system's direction
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | pattern | pattern on the work | - | |
 * | pitch | label of the wheel, or null | - | |
 * | alongRim | the label is meant along the rim | - | |
 * | counted | wheel counted and measured, or null | - | |
 * | proven | pitch round the rim that a pair has proven, or null | mm | > 0 |
 * | helix | helix of the teeth, or null | rad | |
 * | tilt | swivel of straight wheels, or null | rad | |
 * | → normal, transverse | pitch square to the tooth and round the rim | mm | 0.2 to 3.2 |
 * | → took, otherWay | how an unclear helical label was taken, and the other reading | - | |
 *
 * Assumes a counted wheel rolls on its outside diameter.
 *
 * @source wheel-truth (a counted wheel is believed over its label)
 * @source tpi-practice (helical TPI counted square to the teeth)
 * @example resolvePitch({ pattern: { kind: 'diamond', points: 'raised' }, pitch: { system: 'metric', value: 1 }, alongRim: false, counted: null, proven: null, helix: null, tilt: null }).transverse // 1.1547 mm
 */
export function resolvePitch(of: Source): ResolvedPitch {
  const { helix, setOver } = helixOf(of);
  const none = { took: null, otherWay: null } as const;
  if (of.proven !== null) {
    const pitch = { normal: mm(of.proven * Math.cos(helix)), transverse: of.proven };
    return { ...inRange(pitch), helix, setOver, knowledge: 'proven', ...none };
  }
  if (of.counted !== null) {
    const pitch = countedWheelPitch(of.counted.diameter, of.counted.teeth);
    const work = inRange(workPitch({ pitch, basis: 'rim', helix, setOver }));
    return { ...work, helix, setOver, knowledge: 'counted', ...none };
  }
  if (of.pitch === null)
    throw new OutOfRange('pitch', Number.NaN, FINEST_PITCH, COARSEST_PITCH, 'mm');
  const pitch = labelledPitch(of.pitch);
  const basis = of.alongRim ? 'rim' : basisOf(of.pitch.system);
  const { normal, transverse } = inRange(workPitch({ pitch, basis, helix, setOver }));
  // Only TPI and plain metric labels are printed both ways on helical wheels.
  const bothWays = of.pitch.system === 'tpi' || of.pitch.system === 'metric';
  const unclear = bothWays && !setOver && helix !== rad(0);
  const other = basis === 'rim' ? 'normal' : 'rim';
  return {
    normal,
    transverse,
    helix,
    setOver,
    knowledge: 'label',
    took: unclear ? basis : null,
    otherWay: unclear ? workPitch({ pitch, basis: other, helix, setOver }) : null,
  };
}
