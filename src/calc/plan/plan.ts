import { OutOfRange, within } from '../units.ts';
import { changesFor } from './changes.ts';
import { judged, passes } from './judged.ts';
import { fittingsOf, prospectsOf } from './prospects.ts';
import type { Plan, PlanRequest } from './request.ts';

const refuseSenseless = ({ limits, pitchTolerance, turningSpread }: PlanRequest): void => {
  if (!(limits.low > 0 && limits.low < limits.high))
    throw new OutOfRange('finish', limits.low, 0, limits.high, 'mm');
  within('tolerance', pitchTolerance, 0, 10);
  within('turningSpread', turningSpread, 0, 10, 'mm');
};

/**
 * From the print's limits to set-ups: every wheel and whole count that brings the crest to the
 * middle of the limits, ranked by the chance that it tracks and lands.
 *
 *     D_b = N p_t/π;  x from ḡ·growth(x) = D_middle − D_b, 0.70 ≤ x ≤ 0.97;  rank by P_tracks · P_lands
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | job | what was said of pattern, pitch, material, machine, support and growth | - | |
 * | limits | smallest and largest finished diameter | mm | low < high |
 * | tolerance (pitchTolerance) | share a wheel's pitch may be off the one asked for | - | 0 to 10 |
 * | 2a (included) | tooth angle the print asks for, or null | rad | |
 * | crib | the wheels | - | |
 * | σ_D (turningSpread) | standard deviation of the turned diameter | mm | ≥ 0 |
 * | → candidates | wheel, count, blank, fill, both chances, what limits it; stopped ones last | - | |
 * | → blankDiameter | blank of a candidate | mm | |
 * | → changes | where none passes, what would | - | |
 *
 * Assumes the operator brings the crest to the middle of the limits by measuring, and that the two
 * chances are independent.
 *
 * @source plan-chances (both chances)
 * @source fill-limits (0.70 and 0.97)
 * @source turning-spread (0.006 mm unless the machine has its own)
 * @example plan({ job: { pattern: { kind: 'straight' }, pitch: { system: 'metric', value: 0.8 }, alongRim: false, helix: null, stock: null, knurlClass: null, material: materialById('steel-lowC-CD'), hardness: null, process: null, pin: 'hardened', pinDiameter: null, length: mm(6), stickout: null, support: 'chuck', layout: null, stockLength: null, bore: null, plug: false, feed: null, speed: null, rotation: null, turns: null, batch: 1, runout: null, machine: null, growth: growthBeforeResults() }, limits: { low: mm(19.9), high: mm(20) }, pitchTolerance: PITCH_TOLERANCE, included: null, crib: dinCrib(), turningSpread: TURNING_SPREAD }).candidates[0].blankDiameter // 19.747 mm
 */
export function plan(request: PlanRequest): Plan {
  refuseSenseless(request);
  const fittings = fittingsOf(request);
  const candidates = judged(prospectsOf(fittings, request), request);
  const changes = candidates.some(passes) ? [] : changesFor(candidates, { request, fittings });
  return { candidates, fittingWheels: fittings.length, changes };
}
