import {
  type Mm,
  type MmPerRev,
  type MPa,
  mm,
  mpa,
  type Newton,
  newton,
  within,
} from '../units.ts';
import { contactArc, contactModulus, hertzHalfWidth } from './contact.ts';
import type { WheelForce } from './plunge.ts';
import { meanWedgeShare, type Press, wedgeShare } from './wedge.ts';

/** Pressure under the part of a wheel that only follows, over that of the leading part. Judgement. */
export const TRAILING_PRESSURE = 0.5;

/**
 * Force on the leading edge of a wheel that travels, where the knurl is made.
 *
 *     F = q φ̄ √(2 Req z f c)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | q (pressure) | pressure under a tooth | MPa | > 0 |
 * | φ̄ (meanShare) | mean wedge share over the infeed | - | 0 to 1 |
 * | Req (radius) | equivalent radius | mm | > 0 |
 * | z (infeed) | whole infeed | mm | ≥ 0 |
 * | f (feed) | feed | mm/rev | > 0 |
 * | c (lead) | length of the lead: the bevel, or the feed where that is longer | mm | > 0 |
 * | → F | force square to the work | N | |
 *
 * Assumes an estimate, to be multiplied or divided by 2.
 *
 * @source force-model (arc √(2 Req z f/c) over a lead of length c)
 * @example leadingForce({ pressure: metalPressure(126, 0.1), meanShare: meanWedgeShare('grooves', 0.8), radius: equivalentRadius(mm(20), mm(25)), infeed: mm(0.24), feed: mmPerRev(0.25), lead: mm(1) }) // 343.997 N
 */
export function leadingForce(of: {
  readonly pressure: MPa;
  readonly meanShare: number;
  readonly radius: Mm;
  readonly infeed: Mm;
  readonly feed: MmPerRev;
  readonly lead: Mm;
}): Newton {
  within('pressure', of.pressure, Number.MIN_VALUE, 1e6, 'MPa');
  within('meanShare', of.meanShare, 0, 1);
  within('feed', of.feed, Number.MIN_VALUE, 1e3, 'mm/rev');
  within('lead', of.lead, Number.MIN_VALUE, 1e3, 'mm');
  const arc = contactArc(of.radius, of.infeed);
  return newton(of.pressure * of.meanShare * arc * Math.sqrt(of.feed * of.lead));
}

/**
 * Force on the part of a wheel that follows its leading edge and only smooths.
 *
 *     p̄ = 0.5 q φ(x);  F = 2 p̄ b_e (b − c),  b_e = 8 p̄ Req/(π E*)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | q (pressure) | pressure under a tooth | MPa | > 0 |
 * | φ (share) | wedge share of the finished tooth | - | 0 to 1 |
 * | Req (radius) | equivalent radius | mm | > 0 |
 * | E (modulus) | modulus of the work | MPa | > 0 |
 * | b (width) | contact width | mm | > 0 |
 * | c (lead) | length of the lead; nothing follows where it is the whole width | mm | ≥ 0 |
 * | → F | force square to the work | N | |
 *
 * Assumes half the pressure of the leading part; an estimate, to be multiplied or divided by 2.
 *
 * @source hertz (half width of the contact)
 * @source force-model (load of the part that follows)
 * @source judgement (half the pressure)
 * @example trailingForce({ pressure: metalPressure(126, 0.1), share: 0.8, radius: equivalentRadius(mm(20), mm(25)), modulus: mpa(205000), width: mm(8), lead: mm(1) }) // 503.093 N
 */
export function trailingForce(of: {
  readonly pressure: MPa;
  readonly share: number;
  readonly radius: Mm;
  readonly modulus: MPa;
  readonly width: Mm;
  readonly lead: Mm;
}): Newton {
  within('share', of.share, 0, 1);
  within('width', of.width, Number.MIN_VALUE, 1e6, 'mm');
  const mean = mpa(TRAILING_PRESSURE * of.pressure * of.share);
  const half = hertzHalfWidth(mean, of.radius, contactModulus(of.modulus));
  return newton(2 * mean * half * Math.max(0, of.width - of.lead));
}

/**
 * Force of one wheel that travels along the work.
 *
 *     F = q φ̄ √(2 Req z f c) + 2 p̄ b_e (b − c),  c = max(f, bevel)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | press | what the wheel presses | - | |
 * | q (pressure) | pressure under a tooth | MPa | > 0 |
 * | x (fill) | tooth height over sharp height | - | 0 to 1 |
 * | b (width) | contact width | mm | > 0 |
 * | Req (radius) | equivalent radius | mm | > 0 |
 * | z (infeed) | whole infeed | mm | ≥ 0 |
 * | f (feed) | feed | mm/rev | > 0 |
 * | bevel | bevel of the leading edge | mm | ≥ 0 |
 * | E (modulus) | modulus of the work | MPa | > 0 |
 * | → F (force) | force square to the work | N | |
 * | → L (arc) | contact arc at the whole infeed | mm | |
 *
 * Assumes one pass; an estimate, to be multiplied or divided by 2.
 *
 * @source force-model (leading and following part)
 * @source hertz (following part)
 * @example traverseForce({ press: 'grooves', pressure: metalPressure(126, 0.1), fill: 0.8, width: mm(8), radius: equivalentRadius(mm(20), mm(25)), infeed: mm(0.24), feed: mmPerRev(0.25), bevel: mm(1), modulus: mpa(205000) }).force // 847.09 N
 */
export function traverseForce(of: {
  readonly press: Press;
  readonly pressure: MPa;
  readonly fill: number;
  readonly width: Mm;
  readonly radius: Mm;
  readonly infeed: Mm;
  readonly feed: MmPerRev;
  readonly bevel: Mm;
  readonly modulus: MPa;
}): WheelForce {
  const lead = mm(Math.max(of.feed, of.bevel));
  const leading = leadingForce({ ...of, lead, meanShare: meanWedgeShare(of.press, of.fill) });
  const trailing = trailingForce({ ...of, lead, share: wedgeShare(of.press, of.fill) });
  return { force: newton(leading + trailing), arc: contactArc(of.radius, of.infeed) };
}
