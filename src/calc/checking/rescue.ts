import { FULL_ENOUGH, SHALLOW_BELOW } from '../fill.ts';
import { type Form, formedRound } from '../growth/index.ts';
import type { GrowthBelief } from '../shopGrowth.ts';
import { FEWEST_SENSIBLE_TEETH, largestWholeCount, wholeToothDiameter } from '../teeth.ts';
import type { Window } from '../tracking.ts';
import { type Mm, mm, within } from '../units.ts';

/** How many whole counts down a print is looked for. */
const STEPS_DOWN = 40;

export type Rescue = {
  /** Diameter at which the spoiled teeth are turned away. */
  readonly cleaned: Mm;
  readonly blank: { readonly teeth: number; readonly diameter: Mm; readonly fill: number } | null;
  /** Null where no print limits the finished diameter. */
  readonly meetsPrint: boolean | null;
};

export type CrestMaker = {
  readonly form: Form;
  readonly sharpHeight: Mm;
  readonly growth: GrowthBelief;
};

const crestAt = (maker: CrestMaker, blank: Mm, fill: number): Mm =>
  mm(
    blank +
      maker.growth.mean *
        formedRound({
          form: maker.form,
          blankDiameter: blank,
          height: mm(fill * maker.sharpHeight),
          sharpHeight: maker.sharpHeight,
        }).growth,
  );

/** Fill nearest the wanted one whose crest lies inside the limits; null where there is none. */
const fillInside = (
  maker: CrestMaker,
  blank: Mm,
  limits: Window,
  fills: { readonly wanted: number; readonly deepest: number },
): number | null => {
  const crest = (fill: number) => crestAt(maker, blank, fill);
  const lowest = Math.min(SHALLOW_BELOW, fills.deepest);
  if (crest(lowest) > limits.high || crest(fills.deepest) < limits.low) return null;
  const wanted = crest(fills.wanted);
  if (wanted >= limits.low && wanted <= limits.high) return fills.wanted;
  const target = wanted > limits.high ? limits.high : limits.low;
  let [shallow, deep] = [lowest, fills.deepest];
  // The crest rises with the fill, so the one fill that meets the limit is closed in on.
  while (deep - shallow > 1e-9) {
    const middle = (shallow + deep) / 2;
    if (crest(middle) < target) shallow = middle;
    else deep = middle;
  }
  return (shallow + deep) / 2;
};

/**
 * The next smaller blank that a spoiled part can still be turned to.
 *
 *     cleaned = crest − 2 H;  N = ⌊π cleaned/p_t⌋ and on down until the crest meets the print
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | crest | diameter over the crests of the spoiled part | mm | > 2 H |
 * | H (toothHeight) | height of its teeth | mm | ≥ 0 |
 * | p_t (transversePitch) | pitch round the rim | mm | > 0 |
 * | maker | form, sharp height and growth of the pattern | - | |
 * | fill | fill wanted | - | 0 to 1 |
 * | deepest | deepest fill allowed | - | 0 to 1 |
 * | limits | limits of the finished diameter, or null | - | |
 * | → cleaned | diameter at which the teeth are gone | mm | |
 * | → blank | count, diameter and fill, or null when there is none | - | |
 * | → meetsPrint | whether the crest lies inside the limits; null without a print | - | |
 *
 * Assumes the growth that is expected of the next part.
 *
 * @source check-after (cleaned-up diameter)
 * @source whole-tooth (next smaller whole count)
 * @example rescueSpoiled({ crest: mm(20.4), toothHeight: mm(0.36), transversePitch: mm(0.8), maker: { form: 'grooves', sharpHeight: mm(0.4), growth: growthBeforeResults() }, fill: 0.9, deepest: 0.92, limits: null }).blank.diameter // 19.608 mm
 */
export function rescueSpoiled(of: {
  readonly crest: Mm;
  readonly toothHeight: Mm;
  readonly transversePitch: Mm;
  readonly maker: CrestMaker;
  readonly fill: number;
  readonly deepest: number;
  readonly limits: Window | null;
}): Rescue {
  within('toothHeight', of.toothHeight, 0, of.crest / 2, 'mm');
  const cleaned = mm(of.crest - 2 * of.toothHeight);
  const most = largestWholeCount(cleaned, of.transversePitch);
  const blankOf = (teeth: number, fill: number) => ({
    teeth,
    diameter: wholeToothDiameter(teeth, of.transversePitch),
    fill,
  });
  if (most < FEWEST_SENSIBLE_TEETH)
    return { cleaned, blank: null, meetsPrint: of.limits === null ? null : false };
  if (of.limits === null) return { cleaned, blank: blankOf(most, of.fill), meetsPrint: null };
  const fills = { wanted: of.fill, deepest: Math.min(of.deepest, FULL_ENOUGH) };
  const last = Math.max(FEWEST_SENSIBLE_TEETH, most - STEPS_DOWN);
  for (let teeth = most; teeth >= last; teeth -= 1) {
    const blank = wholeToothDiameter(teeth, of.transversePitch);
    const fill = fillInside(of.maker, blank, of.limits, fills);
    if (fill !== null) return { cleaned, blank: blankOf(teeth, fill), meetsPrint: true };
  }
  return { cleaned, blank: blankOf(most, of.fill), meetsPrint: false };
}
