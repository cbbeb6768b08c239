import type { State } from './check.ts';
import { FULL_ENOUGH } from './fill.ts';
import { type Kelvin, type Mm, mm, type RevPerMin, revPerMin } from './units.ts';

/** On every card that sets up a cut. */
export const STANDING_CAUTIONS = [
  'guardInPlace',
  'noLooseClothing',
  'eyeProtection',
  'keyOut',
  'stopToMeasure',
  'oilFromOutgoingSide',
] as const;

/** Chosen by the set-up, the one that matters most first. Order: judgement. */
export const CHOSEN_CAUTIONS = [
  'fireChips',
  'handTurn',
  'tubePinch',
  'supportBar',
  'barBehindSpindle',
  'chuckSpeed',
  'hotPin',
  'flaking',
  'forceUncertain',
] as const;

export type StandingCaution = (typeof STANDING_CAUTIONS)[number];
export type ChosenCaution = (typeof CHOSEN_CAUTIONS)[number];
export type CautionId = StandingCaution | ChosenCaution;

/** A bar that sticks out further than this many diameters wants support. Common practice. */
export const STICKOUT_DIAMETERS = 3;
/** Stock longer than the stickout by this much reaches out of the spindle. Reported. */
export const BEHIND_SPINDLE: Mm = mm(300);
/** Spindle speed above which the chuck's own limit is worth a look. Judgement. */
export const CHUCK_SPEED: RevPerMin = revPerMin(1500);
/** Wheel warm-up that is called hot. Judgement. */
export const HOT_WARM_UP = 60 as Kelvin;

export type CautionFacts = {
  readonly blankDiameter: Mm;
  readonly stickout: Mm | null;
  readonly supported: boolean;
  readonly stockLength: Mm | null;
  readonly bore: Mm | null;
  readonly fill: number | null;
  readonly materialFill: number | null;
  readonly materialGroup: string | null;
  readonly rotation: RevPerMin | null;
  readonly machineTopSpeed: RevPerMin | null;
  readonly seamTest: boolean;
  readonly warmUp: Kelvin | null;
  readonly bending: State | null;
  readonly ring: State | null;
  readonly pinHeat: State | null;
};

const notFine = (state: State | null): boolean => state !== null && state !== 'fine';

const applies: Record<ChosenCaution, (facts: CautionFacts) => boolean> = {
  fireChips: (f) => f.materialGroup === 'titanium' || f.materialGroup === 'magnesium',
  handTurn: (f) => f.seamTest,
  tubePinch: (f) => f.bore !== null,
  supportBar: (f) =>
    notFine(f.bending) ||
    (f.stickout !== null && !f.supported && f.stickout > STICKOUT_DIAMETERS * f.blankDiameter),
  barBehindSpindle: (f) =>
    f.stockLength !== null && f.stockLength > (f.stickout ?? 0) + BEHIND_SPINDLE,
  chuckSpeed: (f) =>
    f.rotation !== null &&
    (f.rotation > CHUCK_SPEED || (f.machineTopSpeed !== null && f.rotation > f.machineTopSpeed)),
  hotPin: (f) => notFine(f.pinHeat) || (f.warmUp !== null && f.warmUp > HOT_WARM_UP),
  flaking: (f) => f.materialFill !== null || (f.fill !== null && f.fill > FULL_ENOUGH + 1e-9),
  forceUncertain: (f) => notFine(f.bending) || notFine(f.ring) || notFine(f.pinHeat),
};

/**
 * The cautions that fit a set-up: the standing ones, then those its numbers call for.
 *
 *     standing ∪ { id : its condition holds }
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D (blankDiameter) | diameter of the blank | mm | > 0 |
 * | out (stickout) | from the chuck to the end of the knurl, or null | mm | > 0 |
 * | supported | tailstock or centres | - | |
 * | stockLength | length of the bar, or null | mm | > 0 |
 * | bore | bore of the work, or null | mm | > 0 |
 * | x (fill) | tooth height over sharp height, or null | - | 0 to 1 |
 * | materialFill | deepest fill advised for the material, or null | - | 0 to 1 |
 * | materialGroup | family of the material, or null | - | |
 * | n (rotation) | spindle speed, or null | rev/min | > 0 |
 * | machineTopSpeed | fastest the machine or its chuck may run, or null | rev/min | > 0 |
 * | seamTest | the work is turned by hand for a seam test | - | |
 * | ΔT (warmUp) | how much warmer the wheel gets, or null | K | ≥ 0 |
 * | bending | how the check on bending ends, or null | - | |
 * | ring | how the check on the wall ends, or null | - | |
 * | pinHeat | how the check on the pin ends, or null | - | |
 * | → ids | cautions, standing ones first, then the one that matters most | - | |
 *
 * Assumes what was not said is not the case; the standing ones hold regardless.
 *
 * @source navy-lathe (sleeves, rings, eye protection, stopped before measuring)
 * @source cfr-1910.212 (guards)
 * @source nip-practice (oil from the outgoing side)
 * @source common-practice (support, flaking)
 * @source judgement (chuck speed, hot pin)
 * @example cautionsFor({ blankDiameter: mm(25), stickout: null, supported: false, stockLength: null, bore: mm(10), fill: 0.9, materialFill: null, materialGroup: 'steel', rotation: null, machineTopSpeed: null, seamTest: false, warmUp: null, bending: null, ring: null, pinHeat: null }).length // 7
 */
export function cautionsFor(facts: CautionFacts): readonly CautionId[] {
  return [...STANDING_CAUTIONS, ...CHOSEN_CAUTIONS.filter((id) => applies[id](facts))];
}
