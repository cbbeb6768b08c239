import { type Form, formedFlat, sharpHeight } from './growth/index.ts';
import type { MaterialGroup, Valued } from './materials/index.ts';
import {
  type Mm,
  type MmPerRev,
  type MPa,
  mm,
  mpa,
  type Newton,
  type NewtonMm,
  newton,
  newtonMm,
  type Rad,
  within,
} from './units.ts';

/**
 * Cutting force over chip area, k_c, by kind of metal. Judgement: a knurl's chips are far thinner
 * than those the tables of turning cover, so the figures stand above theirs.
 */
export const CUTTING_STIFFNESS: Valued<Readonly<Record<MaterialGroup, MPa>>> = {
  value: {
    steel: mpa(3500),
    stainless: mpa(2800),
    nickel: mpa(3500),
    titanium: mpa(2200),
    copper: mpa(1500),
    bronze: mpa(1500),
    iron: mpa(1500),
    aluminium: mpa(1200),
    brass: mpa(1200),
    zinc: mpa(1200),
    magnesium: mpa(1200),
    plastic: mpa(300),
  },
  mark: 'judgement',
  source: 'cut-force',
};

/** Radial force of a wheel that cuts, as a share of its tangential force. Judgement. */
export const CUT_RADIAL_SHARE = 0.5;

/** A cut knurl: the metal of the grooves leaves as chip, so nothing rises. */
export type Cut = {
  readonly crestDiameter: Mm;
  readonly infeed: Mm;
  /** Cross-section of the chip in mm². */
  readonly chipArea: number;
  readonly tangentialForce: Newton;
  readonly radialForce: Newton;
};

/**
 * Crest, infeed, chip and forces of a knurl that is cut instead of formed.
 *
 *     Do = Db;  infeed = H;  A = f·r(H);  Ft = kc·A;  Fr = 0.5 Ft
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | form | how the grooves meet | - | |
 * | Db (blankDiameter) | diameter of the blank | mm | > 2H |
 * | p | pitch square to the tooth | mm | > 0 |
 * | 2a (included) | included tooth angle | rad | 0.01745 to 3.124 |
 * | H (height) | tooth height | mm | 0 to the sharp height |
 * | f (feed) | feed along the work | mm/rev | > 0 |
 * | kc (cuttingStiffness) | cutting force over chip area | MPa | > 0 |
 * | → Do (crestDiameter) | diameter over the crests | mm | |
 * | → infeed | infeed from touch, on the radius | mm | |
 * | → A (chipArea) | area of chip cut in a turn, r(H) being the void per area of the form | mm² | |
 * | → Ft (tangentialForce) | cutting force round the work | N | |
 * | → Fr (radialForce) | force of a wheel square to the work | N | |
 *
 * Assumes sharp, square-edged wheels that travel, and work so large that it counts as flat.
 *
 * @source volume-constancy (void per area of the form, here chip instead of rise)
 * @source cut-force (kc for small chips; radial force half the tangential force)
 * @source cut-practice (the diameter does not grow)
 * @example cutKnurl({ form: 'grooves', blankDiameter: mm(20), p: mm(0.8), included: degrees(90), height: mm(0.3), feed: mmPerRev(0.15), cuttingStiffness: mpa(3500) }).tangentialForce // 59.06 N
 */
export function cutKnurl(of: {
  readonly form: Form;
  readonly blankDiameter: Mm;
  readonly p: Mm;
  readonly included: Rad;
  readonly height: Mm;
  readonly feed: MmPerRev;
  readonly cuttingStiffness: MPa;
}): Cut {
  const { rise } = formedFlat(of.form, of.height, sharpHeight(of.p, of.included));
  within('blankDiameter', of.blankDiameter, Math.max(2 * of.height, Number.MIN_VALUE), 1e6, 'mm');
  within('feed', of.feed, Number.MIN_VALUE, 1e3, 'mm/rev');
  within('cuttingStiffness', of.cuttingStiffness, Number.MIN_VALUE, 1e6, 'MPa');
  const chipArea = of.feed * rise;
  const tangential = of.cuttingStiffness * chipArea;
  return {
    crestDiameter: of.blankDiameter,
    infeed: mm(of.height),
    chipArea,
    tangentialForce: newton(tangential),
    radialForce: newton(CUT_RADIAL_SHARE * tangential),
  };
}

/**
 * Torque on the work from a cut knurl's chip.
 *
 *     T = Ft D/2
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Ft (tangentialForce) | cutting force round the work | N | ≥ 0 |
 * | D (blankDiameter) | diameter of the blank | mm | > 0 |
 * | → T | torque on the work | N·mm | |
 *
 * Assumes the chip is cut from the whole pattern, however many wheels share it.
 *
 * @source cut-force (tangential force)
 * @example cutTorque(newton(59), mm(20)) // 590 N·mm
 */
export function cutTorque(tangentialForce: Newton, blankDiameter: Mm): NewtonMm {
  within('force', tangentialForce, 0, 1e9, 'N');
  return newtonMm((tangentialForce * blankDiameter) / 2);
}
