import { DEFAULT_FILL } from '../fill.ts';
import { formedRound, roundWheelToothHeight, sharpHeight } from '../growth/index.ts';
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

/** The fill to start with: what was asked, else 90 % or the material's own, never over the wheel's. */
export const startingFill = (
  plan: ToothPlan,
  asked: number | null,
  materialFill: number | null,
): number =>
  Math.min(asked ?? Math.min(DEFAULT_FILL, materialFill ?? DEFAULT_FILL), plan.wheelFill);

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

/** Infeed and crest on a real blank: exact on round work when formed, the tooth itself when cut. */
export const makeTooth = (plan: ToothPlan, blank: Mm, fill: number): MadeTooth => {
  const height = mm(fill * plan.sharpHeight);
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
};
