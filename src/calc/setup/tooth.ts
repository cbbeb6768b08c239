import { DEFAULT_FILL } from '../fill.ts';
import { formedRound, heightOfFill, roundWheelToothHeight, sharpHeight } from '../growth/index.ts';
import { formOf, type Pattern } from '../pattern.ts';
import type { GrowthBelief } from '../shopGrowth.ts';
import { growthInterval } from '../shopGrowth.ts';
import type { Process } from '../speed.ts';
import { type Mm, mm, OutOfRange } from '../units.ts';
import type { SetupRequest } from './request.ts';

/** The tooth to be made, as far as it does not depend on the blank. */
export type ToothPlan = {
  readonly pattern: Pattern;
  readonly process: Process;
  readonly sharpHeight: Mm;
  /** Highest tooth the wheel itself has, as a share of the sharp height. */
  readonly wheelFill: number;
  readonly growth: GrowthBelief;
};

export const toothPlan = (request: SetupRequest, normal: Mm, process: Process): ToothPlan => {
  const sharp = sharpHeight(normal, request.included);
  const { counted } = request;
  const cap =
    counted === null ? sharp : roundWheelToothHeight(normal, request.included, counted.teeth);
  return {
    pattern: request.pattern,
    process,
    sharpHeight: sharp,
    wheelFill: Math.min(1, cap / sharp),
    growth: request.growth,
  };
};

/**
 * The fill to start with, as a share of the sharp height.
 *
 *     x = what was asked, else min(0.90, the material's own);  never over the wheel's own tooth
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | plan | the tooth to be made, with the highest tooth of the wheel | - | |
 * | asked | fill asked for, or null | - | 0 to 1 |
 * | own (materialFill) | deepest fill advised for the material, or null | - | 0 to 1 |
 * | → x | fill | - | |
 *
 * Assumes a counted wheel has sharp teeth on its outside diameter.
 *
 * @source fill-default (90 %)
 * @source materials-practice (the material's own)
 * @source tooth-geometry (the tooth of a round wheel)
 * @example startingFill({ pattern: { kind: 'straight' }, process: 'form', sharpHeight: mm(0.6), wheelFill: 1, growth: growthBeforeResults() }, null, 0.85) // 0.85
 */
export function startingFill(
  plan: ToothPlan,
  asked: number | null,
  materialFill: number | null,
): number {
  return Math.min(asked ?? Math.min(DEFAULT_FILL, materialFill ?? DEFAULT_FILL), plan.wheelFill);
}

/** What a tooth of a given fill does to a given blank. */
export type MadeTooth = {
  readonly height: Mm;
  readonly fill: number;
  readonly infeed: Mm;
  /** Static growth, before the shop's own share of it. */
  readonly growth: Mm;
  readonly crest: Mm;
  readonly crestLow: Mm;
  readonly crestHigh: Mm;
};

/**
 * Height, infeed and crest of a tooth on a real blank: exact on round work when formed, the tooth itself when cut.
 *
 *     formed: Do = D + ḡ growth(H), its 80 % spread D + (ḡ ± 1.2816 sd) growth(H);  cut: Do = D
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | plan | pattern, process, sharp height Hf and expected growth ḡ, sd of the tooth | - | |
 * | D (blank) | diameter of the blank | mm | > 2H |
 * | x (fill) | tooth height over sharp height | - | 0 to 1 |
 * | → H | tooth height | mm | |
 * | → crest, crestLow, crestHigh | diameter over the crests and its 80 % spread | mm | |
 *
 * Assumes the shop's own share of the static growth, or what is expected before it has results.
 *
 * @source round-work (static growth)
 * @source growth-prior (how much of it shows)
 * @example makeTooth({ pattern: { kind: 'straight' }, process: 'form', sharpHeight: mm(0.4), wheelFill: 1, growth: growthBeforeResults() }, mm(6), 1).crest // 6.37578 mm
 */
export function makeTooth(plan: ToothPlan, blank: Mm, fill: number): MadeTooth {
  const height = heightOfFill(fill, plan.sharpHeight);
  // A tooth taller than the bar's radius has nothing left to stand on.
  if (height >= blank / 2) throw new OutOfRange('diameter', blank, 2 * height, 500, 'mm');
  if (plan.process === 'cut') {
    const still = { growth: mm(0), crest: blank, crestLow: blank, crestHigh: blank };
    return { height, fill, infeed: height, ...still };
  }
  const formed = formedRound({
    form: formOf(plan.pattern),
    blankDiameter: blank,
    height,
    sharpHeight: plan.sharpHeight,
  });
  const { low, high } = growthInterval(plan.growth);
  const crest = (share: number) => mm(blank + share * formed.growth);
  return {
    height,
    fill,
    infeed: formed.infeed,
    growth: formed.growth,
    crest: crest(plan.growth.mean),
    crestLow: crest(low),
    crestHigh: crest(high),
  };
}
