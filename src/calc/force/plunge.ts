import { TRACKS_WITHIN } from '../tracking.ts';
import { type Mm, type MPa, mm, type Newton, newton, within } from '../units.ts';
import { contactArc } from './contact.ts';
import { type Press, wedgeShare } from './wedge.ts';

/** Fill that the first bite makes: the window of whole teeth, either side. */
const FIRST_FILL = 2 * TRACKS_WITHIN;

/** Force of one wheel square to the work, and the arc it bears on. */
export type WheelForce = { readonly force: Newton; readonly arc: Mm };

/**
 * Force of a wheel on the arc and width it bears on.
 *
 *     F = q φ w L
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | q (pressure) | pressure under a tooth | MPa | > 0 |
 * | φ (share) | wedge share | - | 0 to 1 |
 * | w (width) | width of the knurl under the wheel | mm | > 0 |
 * | L (arc) | contact arc | mm | ≥ 0 |
 * | → F | force square to the work | N | |
 *
 * Assumes an even pressure; an estimate, to be multiplied or divided by 2.
 *
 * @source force-model (pressure on the wedge share of the contact)
 * @example pressedForce({ pressure: metalPressure(126, 0.1), share: 0.8, width: mm(8), arc: mm(0.4714045) }) // 4085.63 N
 */
export function pressedForce(of: {
  readonly pressure: MPa;
  readonly share: number;
  readonly width: Mm;
  readonly arc: Mm;
}): Newton {
  within('pressure', of.pressure, Number.MIN_VALUE, 1e6, 'MPa');
  within('share', of.share, 0, 1);
  within('width', of.width, Number.MIN_VALUE, 1e6, 'mm');
  within('arc', of.arc, 0, 1e6, 'mm');
  return newton(of.pressure * of.share * of.width * of.arc);
}

/**
 * Force of one wheel that plunges: the first turn or the deepest of the others.
 *
 *     F = max(q φ(0.2) w √(2 Req z1), q φ(x) w √(2 Req dz))
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | press | what the wheel presses | - | |
 * | q (pressure) | pressure under a tooth | MPa | > 0 |
 * | x (fill) | tooth height over sharp height | - | 0 to 1 |
 * | w (width) | width of the knurl under the wheel | mm | > 0 |
 * | Req (radius) | equivalent radius | mm | > 0 |
 * | z (infeed) | whole infeed | mm | > 0 |
 * | z1 (bite) | infeed of the first turn, at most the whole | mm | > 0 |
 * | dz (perTurn) | infeed of the other turns | mm | ≥ 0 |
 * | → F (force) | force square to the work | N | |
 * | → L (arc) | contact arc of the turn that presses hardest | mm | |
 *
 * Assumes an even feed; an estimate, to be multiplied or divided by 2.
 *
 * @source force-model (pressure on the wedge share of the contact)
 * @source first-bite (the first turn makes a fill of 0.2)
 * @example plungeForce({ press: 'grooves', pressure: metalPressure(126, 0.1), fill: 0.8, width: mm(8), radius: equivalentRadius(mm(20), mm(25)), infeed: mm(0.24), bite: mm(0.09), perTurn: mm(0.02) }).force // 4085.63 N
 */
export function plungeForce(of: {
  readonly press: Press;
  readonly pressure: MPa;
  readonly fill: number;
  readonly width: Mm;
  readonly radius: Mm;
  readonly infeed: Mm;
  readonly bite: Mm;
  readonly perTurn: Mm;
}): WheelForce {
  const turn = (fill: number, depth: number): WheelForce => {
    const arc = contactArc(of.radius, mm(depth));
    const share = wedgeShare(of.press, fill);
    return { arc, force: pressedForce({ pressure: of.pressure, share, width: of.width, arc }) };
  };
  const first = turn(Math.min(FIRST_FILL, of.fill), Math.min(of.bite, of.infeed));
  const other = turn(of.fill, of.perTurn);
  return other.force >= first.force ? other : first;
}
