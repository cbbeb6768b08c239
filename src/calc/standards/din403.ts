import { type Mm, mm, OutOfRange } from '../units.ts';
import { DIN_PITCHES, type DinWheelForm } from './din82.ts';

export type DinPitch = (typeof DIN_PITCHES)[number];

/** Teeth of the wheels whose grooves run with the axis, and of those at 30° to it. */
type Counts = Readonly<Record<DinPitch, readonly [axial: number, helical: number]>>;

export type DinWheelSize = {
  readonly diameter: Mm;
  readonly widths: readonly Mm[];
  readonly bore: Mm;
  readonly counts: Counts;
};

/** Sizes and teeth as the standard prints them. Read. */
export const DIN_403: readonly [DinWheelSize, DinWheelSize] = [
  {
    diameter: mm(15),
    widths: [mm(4), mm(5), mm(6)],
    bore: mm(4),
    counts: {
      0.5: [94, 82],
      0.6: [78, 68],
      0.8: [59, 51],
      1: [48, 41],
      1.2: [39, 34],
      1.6: [29, 25],
    },
  },
  {
    diameter: mm(20),
    widths: [mm(6), mm(8), mm(10)],
    bore: mm(6),
    counts: {
      0.5: [126, 109],
      0.6: [105, 91],
      0.8: [79, 68],
      1: [63, 54],
      1.2: [52, 45],
      1.6: [39, 34],
    },
  },
];

const isAxial = (form: DinWheelForm): boolean => form === 'AA' || form === 'KE' || form === 'KV';

const dinPitch = (value: number): DinPitch => {
  const found = DIN_PITCHES.find((t) => Math.abs(t - value) < 1e-9);
  if (found === undefined) throw new OutOfRange('pitch', value, 0.5, 1.6, 'mm');
  return found;
};

/**
 * Teeth the standard prints for a wheel.
 *
 *     table by diameter, pitch and form; first column AA KE KV, second BL BR GE GV
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | AA, BL, BR, GE, GV, KE or KV | - | |
 * | D (diameter) | outside diameter | mm | 15 or 20 |
 * | t (pitch) | pitch square to the tooth | mm | 0.5 to 1.6 |
 * | → teeth | teeth on the wheel | - | |
 *
 * Assumes the wheel is made to the standard.
 *
 * @source din-403 (tooth counts)
 * @example dinWheelTeeth('AA', mm(20), mm(0.8)) // 79
 * @example dinWheelTeeth('BL', mm(15), mm(1)) // 41
 */
export function dinWheelTeeth(form: DinWheelForm, diameter: Mm, pitch: Mm): number {
  const size = DIN_403.find((row) => row.diameter === diameter);
  if (size === undefined) throw new OutOfRange('wheelDiameter', diameter, 15, 20, 'mm');
  return size.counts[dinPitch(pitch)][isAxial(form) ? 0 : 1];
}

const twoDigits = (value: number): string => String(Math.round(value)).padStart(2, '0');

/**
 * Size, edges and pitch of a wheel as the standard's designation writes them after its form.
 *
 *     ⟨diameter⟩⟨width⟩ F ⟨pitch⟩, as in Rändelrad BL 2006 F 08 DIN 403
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (diameter) | outside diameter | mm | 15 or 20 |
 * | w (width) | width | mm | |
 * | t (pitch) | pitch square to the tooth | mm | 0.5 to 1.6 |
 * | → code | the middle of the designation | - | |
 *
 * Assumes both edges are chamfered, which F stands for.
 *
 * @source din-403 (designation)
 * @example dinWheelCode({ diameter: mm(20), width: mm(6), pitch: mm(0.8) }) // "2006 F 08"
 */
export function dinWheelCode(of: {
  readonly diameter: Mm;
  readonly width: Mm;
  readonly pitch: Mm;
}): string {
  return `${twoDigits(of.diameter)}${twoDigits(of.width)} F ${twoDigits(10 * dinPitch(of.pitch))}`;
}
