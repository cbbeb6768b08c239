import { type CheckOf, figure, type State } from './check.ts';
import type { Window } from './tracking.ts';
import { type Mm, mm, within } from './units.ts';

/**
 * Limits to knurl to so that the part is right after plating.
 *
 *     D_knurl = D_print − 2 s
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | limits | smallest and largest diameter on the print | mm | |
 * | s (thickness) | thickness of the plating | mm | 0 to 1 |
 * | → low, high | smallest and largest diameter before plating | mm | |
 *
 * Assumes the plating lies as thick on the crests as anywhere.
 *
 * @source plating (both sides of a diameter)
 * @example finishedSizeMinusPlate({ low: mm(19.987), high: mm(20) }, mm(0.008)).high // 19.984 mm
 */
export function finishedSizeMinusPlate(limits: Window, thickness: Mm): Window {
  const off = 2 * within('plate', thickness, 0, 1, 'mm');
  within('finish', limits.low, off, 1e6, 'mm');
  return { low: mm(limits.low - off), high: mm(limits.high - off) };
}

/** Share of the tooth height that may bite into the bore. Judgement. */
export const FIT_BITES_TO = 0.6;
/** Beyond the tooth itself the groove roots bind too. Judgement. */
export const FIT_BITES_NOT_OVER = 1;

const fitState = (share: number): readonly [State, CheckOf<'fit'>['reason']] => {
  if (share <= 0) return ['stop', 'loose'];
  if (share <= FIT_BITES_TO + 1e-9) return ['fine', 'grips'];
  return share <= FIT_BITES_NOT_OVER + 1e-9 ? ['watch', 'tight'] : ['stop', 'over'];
};

/**
 * How a knurled part presses into a bore: interference on each side against the tooth height.
 *
 *     i = (D_crest − D_bore)/2;  0 < i ≤ 0.6 H fine, ≤ H watch, else stop
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | D_bore (bore) | diameter of the bore pressed into | mm | > 0 |
 * | D_crest (crest) | diameter over the crests | mm | > 0 |
 * | H (toothHeight) | tooth height | mm | > 0 |
 * | → check | fit, with the interference's share of the tooth and the largest crest that is fine | - | |
 * | → i | interference on a side | mm | |
 *
 * Assumes the softer of the two parts gives way round the teeth.
 *
 * @source press-fit (0.6 of the tooth height)
 * @example pressFit({ bore: mm(10), crest: mm(10.2), toothHeight: mm(0.3) }).figures.interference.value // 0.1 mm
 * @example pressFit({ bore: mm(10), crest: mm(10.5), toothHeight: mm(0.3) }).state // "watch"
 */
export function pressFit(of: {
  readonly bore: Mm;
  readonly crest: Mm;
  readonly toothHeight: Mm;
}): CheckOf<'fit'> {
  within('fit', of.bore, Number.MIN_VALUE, 1e6, 'mm');
  within('crestDiameter', of.crest, Number.MIN_VALUE, 1e6, 'mm');
  within('toothHeight', of.toothHeight, Number.MIN_VALUE, 1000, 'mm');
  const interference = (of.crest - of.bore) / 2;
  const share = interference / of.toothHeight;
  const [state, reason] = fitState(share);
  return {
    name: 'fit',
    state,
    reason,
    figures: {
      interference: figure(interference, 'mm'),
      interferenceShare: figure(share, '1'),
      bore: figure(of.bore, 'mm'),
      largestCrest: figure(of.bore + 2 * FIT_BITES_TO * of.toothHeight, 'mm'),
    },
  };
}
