import { within } from './units.ts';

/** Further out than this the share is closer to 0 or 1 than a number can tell. */
const FARTHEST = 40;
/** From here on the tail is worked out from its far end, where the series would cancel. */
const TAIL = 4;
const TAIL_STEPS = 60;

/** Height of the normal curve. */
const curve = (z: number): number => Math.exp(-(z ** 2) / 2) / Math.sqrt(2 * Math.PI);

/** φ(z) (z + z³/3 + z⁵/15 + …): the share between the middle and z. */
const fromMiddle = (z: number): number => {
  let term = z;
  let sum = z;
  for (let k = 3; Math.abs(term) > 1e-17 * Math.abs(sum); k += 2) {
    term *= z ** 2 / k;
    sum += term;
  }
  return curve(z) * sum;
};

/** φ(z)/(z + 1/(z + 2/(z + …))): the share beyond z. */
const beyond = (z: number): number => {
  let fraction = z;
  for (let k = TAIL_STEPS; k >= 1; k -= 1) fraction = z + k / fraction;
  return curve(z) / fraction;
};

/**
 * Share of a normal spread that lies below a point.
 *
 *     Φ(z) = ½ + φ(z) (z + z³/3 + z⁵/(3·5) + …),  φ(z) = e^(−z²/2)/√(2π)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | z | distance from the middle in standard deviations | - | |
 * | → Φ | share below | - | 0 to 1 |
 *
 * Assumes nothing beyond 40 standard deviations; past 4 the tail's continued fraction is used.
 *
 * @source normal-spread (series and continued fraction)
 * @example normalShare(1.2815515655446004) // 0.900000000
 * @example normalShare(-1.959963984540054) // 0.025000000
 */
export function normalShare(z: number): number {
  const at = Math.max(-FARTHEST, Math.min(FARTHEST, within('z', z, -1e300, 1e300)));
  if (at > TAIL) return 1 - beyond(at);
  return at < -TAIL ? beyond(-at) : 0.5 + fromMiddle(at);
}

/**
 * Share of a normal spread below a point, added up from far below.
 *
 *     G(z) = ∫₋∞ᶻ Φ dt = z Φ(z) + φ(z)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | z | distance from the middle in standard deviations | - | |
 * | → G | the share added up | - | ≥ 0 |
 *
 * Assumes what normalShare assumes.
 *
 * @source normal-spread (integral by parts)
 * @example normalShareSum(0) // 0.39894228
 */
export function normalShareSum(z: number): number {
  const at = within('z', z, -1e300, 1e300);
  if (at < -TAIL) return Math.max(0, curve(at) + at * normalShare(at));
  return at * normalShare(at) + curve(at);
}
