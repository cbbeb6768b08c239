import { FULL_ENOUGH, SHALLOW_BELOW } from '../fill.ts';
import { heightFromCrest } from '../growth/index.ts';
import { formOf } from '../pattern.ts';
import { FEWEST_TEETH, largestWholeCount, toothCount, wholeToothDiameter } from '../teeth.ts';
import type { Window } from '../tracking.ts';
import { type Mm, mm, OutOfRange } from '../units.ts';
import { type MadeTooth, makeTooth, type ToothPlan } from './tooth.ts';

/** Largest bar that is answered. Judgement. */
export const LARGEST_DIAMETER: Mm = mm(500);

export type ChosenBlank = {
  readonly diameter: Mm;
  readonly teeth: number;
  readonly tooth: MadeTooth;
  /** The fill was moved to bring the crest inside the print's limits. */
  readonly fillMoved: boolean;
};

const tooSmall = (diameter: Mm, transverse: Mm): OutOfRange =>
  new OutOfRange(
    'diameter',
    diameter,
    wholeToothDiameter(FEWEST_TEETH, transverse),
    LARGEST_DIAMETER,
    'mm',
  );

const middle = (limits: Window): Mm => mm((limits.low + limits.high) / 2);
export const inside = (crest: Mm, limits: Window): boolean =>
  crest >= limits.low - 1e-9 && crest <= limits.high + 1e-9;

/** Count whose crest at this fill comes nearest the middle, no larger than the bar allows. */
const nearestCount = (
  plan: ToothPlan,
  transverse: Mm,
  fill: number,
  target: Mm,
  most: number,
): number => {
  const off = (teeth: number): number =>
    Math.abs(makeTooth(plan, wholeToothDiameter(teeth, transverse), fill).crest - target);
  const start = Math.round(toothCount(target, transverse));
  let best = Math.min(most, Math.max(FEWEST_TEETH, start));
  // The crest rises with the count, so walking down until it gets worse is enough.
  while (best > FEWEST_TEETH && off(best - 1) < off(best)) best -= 1;
  return best;
};

/** Fill that brings the expected crest to the target, as near as 0.70 to `deepest` allows. */
const fillTowards = (plan: ToothPlan, blank: Mm, target: Mm, deepest: number): number => {
  const growth = (target - blank) / plan.growth.mean;
  if (growth <= 0) return SHALLOW_BELOW;
  const height = heightFromCrest({
    form: formOf(plan.pattern),
    blankDiameter: blank,
    crestDiameter: mm(blank + growth),
    sharpHeight: plan.sharpHeight,
  });
  const fill = height === null ? deepest : height / plan.sharpHeight;
  return Math.min(deepest, Math.max(Math.min(SHALLOW_BELOW, deepest), fill));
};

export type BlankWish = {
  readonly transverse: Mm;
  readonly stock: Mm | null;
  readonly finish: Window | null;
  readonly asIs: boolean;
  readonly wantedTeeth: number | null;
  readonly fill: number;
  /** Null where the person fixed the fill. */
  readonly deepestFill: number | null;
};

const wholeCount = (plan: ToothPlan, wish: BlankWish): number => {
  const { stock, finish, transverse } = wish;
  const most = stock === null ? Number.POSITIVE_INFINITY : largestWholeCount(stock, transverse);
  if (stock !== null && most < FEWEST_TEETH) throw tooSmall(stock, transverse);
  if (wish.wantedTeeth !== null) {
    if (wish.wantedTeeth > most)
      throw new OutOfRange('teeth', wish.wantedTeeth, FEWEST_TEETH, most, '1');
    return wish.wantedTeeth;
  }
  if (finish === null) return most;
  if (middle(finish) < wholeToothDiameter(FEWEST_TEETH, transverse))
    throw tooSmall(middle(finish), transverse);
  return nearestCount(plan, transverse, wish.fill, middle(finish), most);
};

/**
 * The blank to turn: the bar as it is, the largest whole count under it, or what the print needs.
 *
 *     as it is: N = round(π D/p_t);  under a bar: N = ⌊π D/p_t⌋
 *     for a print: N whose crest comes nearest the middle of the limits, N ≤ ⌊π D/p_t⌋
 *     crest outside them: x from 0.70 to 0.92 at which it comes nearest their middle
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | plan | the tooth to be made | - | |
 * | wish | bar D (stock), pitch p_t (transverse), limits of the print, count and fill asked for | - | |
 * | → teeth | whole count N | - | ≥ 3 |
 * | → diameter | what to turn to | mm | |
 *
 * Assumes a turned bar cannot be made larger, and that a fill which was asked for stays.
 *
 * @source whole-tooth (counts round the bar)
 * @source round-work (crest of each count)
 * @source growth-prior (how much of the static growth shows)
 * @source fill-limits (0.70 and 0.92)
 * @example chooseBlank({ pattern: { kind: 'straight' }, process: 'form', sharpHeight: mm(0.4), wheelFill: 1, growth: growthBeforeResults() }, { transverse: mm(0.8), stock: null, finish: { low: mm(19.9), high: mm(20.1) }, asIs: false, wantedTeeth: null, fill: 0.9, deepestFill: 1 }).teeth // 77
 */
export function chooseBlank(plan: ToothPlan, wish: BlankWish): ChosenBlank {
  const { stock, finish, transverse } = wish;
  const asItIs = wish.asIs && stock !== null;
  if (asItIs && toothCount(stock, transverse) < FEWEST_TEETH - 0.5)
    throw tooSmall(stock, transverse);
  const teeth = asItIs ? Math.round(toothCount(stock, transverse)) : wholeCount(plan, wish);
  const diameter = asItIs ? stock : wholeToothDiameter(teeth, transverse);
  const tooth = makeTooth(plan, diameter, wish.fill);
  const stays = finish === null || inside(tooth.crest, finish) || plan.process === 'cut';
  if (stays || wish.deepestFill === null) return { diameter, teeth, tooth, fillMoved: false };
  const deepest = Math.min(wish.deepestFill, FULL_ENOUGH, plan.wheelFill);
  const fill = fillTowards(plan, diameter, middle(finish), deepest);
  return { diameter, teeth, tooth: makeTooth(plan, diameter, fill), fillMoved: true };
}
