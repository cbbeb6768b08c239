import { type CheckOf, figure } from '../check.ts';
import { FORCE_FACTOR } from '../force/index.ts';
import { type Form, formedRound, sharpHeight, solidShare } from '../growth/index.ts';
import { type Mm, mm, type Rad, rad, within } from '../units.ts';

/** How well a flat on a crest is read, standard deviation. Judgement. */
export const FLAT_READING: Mm = mm(0.02);
/** A difference under so many standard deviations of the reading is none. Judgement. */
const NO_DIFFERENCE = 2;

/** Flats on the crests at two places along the knurl: towards the chuck and away from it. */
export type FlatsAlong = { readonly near: Mm; readonly far: Mm; readonly distance: Mm };

export type Fade = {
  readonly fillNear: number;
  readonly fillFar: number;
  readonly infeedNear: Mm;
  readonly infeedFar: Mm;
  /** Infeed far from the chuck less infeed near it; negative where the pattern fades outwards. */
  readonly taper: Mm;
  /** Positive: swing the far end of the wheel towards the work. */
  readonly swivelAngle: Rad;
  readonly check: CheckOf<'taper'>;
};

type Tooth = {
  readonly form: Form;
  readonly blank: Mm;
  readonly p: Mm;
  readonly sharp: Mm;
};

const infeedAt = (tooth: Tooth, fill: number): Mm =>
  formedRound({
    form: tooth.form,
    blankDiameter: tooth.blank,
    height: mm(fill * tooth.sharp),
    sharpHeight: tooth.sharp,
  }).infeed;

/** What the reading of two flats alone makes of the infeed between them. */
const readingSpread = (tooth: Tooth, fill: number): number => {
  const share = solidShare(tooth.form, mm(fill * tooth.sharp), tooth.sharp);
  return (Math.SQRT2 * FLAT_READING * share * tooth.sharp) / tooth.p;
};

const reasonOf = (
  taper: number,
  spread: number,
  deflection: Mm | null,
): CheckOf<'taper'>['reason'] => {
  if (Math.abs(taper) <= NO_DIFFERENCE * spread) return 'even';
  if (deflection === null) return 'uneven';
  // A bar gives way most where it is held least: there the pattern is shallow.
  const least = deflection / FORCE_FACTOR - NO_DIFFERENCE * spread;
  const most = deflection * FORCE_FACTOR + NO_DIFFERENCE * spread;
  return -taper >= least && -taper <= most ? 'bends' : 'outOfLine';
};

/**
 * What flats of different width along a knurl say of the infeed, and the angle to swivel.
 *
 *     x = 1 − w/p;  z = z(x);  tan α = (z₁ − z₂)/l, near end 1, far end 2
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | blank | diameter of the blank | mm | > 0 |
 * | p | pitch square to the tooth | mm | > 0 |
 * | 2a (included) | included tooth angle | rad | 0.01745 to 3.124 |
 * | flats | flat near the chuck, flat far from it, distance between | mm | 0 to p |
 * | deflection | how unevenly the bar gives way along the knurl by the estimate of force, or null | mm | ≥ 0 |
 * | → taper | infeed at the far end less at the near end | mm | |
 * | → α (swivelAngle) | angle to swing the far end of the wheel in by | rad | |
 * | → check | taper: even, the bar bends, or the tool is out of line | - | |
 *
 * Assumes a wheel with sharp tips and a bar that gives way most at its far end.
 *
 * @source fade-along (infeed from flats, angle from infeed)
 * @source tooth-geometry (flat against fill)
 * @source round-work (infeed of a fill)
 * @source check-limits (flats read to 0.02 mm)
 * @example fadeAlong({ form: 'grooves', blank: mm(20), p: mm(0.8), included: degrees(90), flats: { near: mm(0.08), far: mm(0.4), distance: mm(20) }, deflection: null }).taper // -0.0484 mm
 */
export function fadeAlong(of: {
  readonly form: Form;
  readonly blank: Mm;
  readonly p: Mm;
  readonly included: Rad;
  readonly flats: FlatsAlong;
  readonly deflection: Mm | null;
}): Fade {
  const { flats } = of;
  const tooth: Tooth = { ...of, sharp: sharpHeight(of.p, of.included) };
  const fillOf = (what: string, flat: Mm) => 1 - within(what, flat, 0, of.p, 'mm') / of.p;
  const fillNear = fillOf('flatNear', flats.near);
  const fillFar = fillOf('flatFar', flats.far);
  within('distance', flats.distance, 1e-3, 1e4, 'mm');
  const infeedNear = infeedAt(tooth, fillNear);
  const infeedFar = infeedAt(tooth, fillFar);
  const taper = mm(infeedFar - infeedNear);
  const reason = reasonOf(taper, readingSpread(tooth, (fillNear + fillFar) / 2), of.deflection);
  return {
    fillNear,
    fillFar,
    infeedNear,
    infeedFar,
    taper,
    swivelAngle: rad(Math.atan((infeedNear - infeedFar) / flats.distance)),
    check: {
      name: 'taper',
      state: reason === 'even' ? 'fine' : 'watch',
      reason,
      figures: {
        taper: figure(taper, 'mm'),
        deflection: of.deflection === null ? null : figure(of.deflection, 'mm'),
      },
    },
  };
}
