import { type Mm, mm, type Rad, within } from '../units.ts';
import { halfAngle, positive } from './limits.ts';

/**
 * Height at which the flanks of a tooth would meet in an edge.
 *
 *     Hf = p / (2 tan a)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | p | pitch square to the tooth | mm | > 0 |
 * | 2a (included) | included tooth angle | rad | 0.01745 to 3.124 |
 * | → Hf | sharp height | mm | |
 *
 * Assumes straight flanks of equal slope.
 *
 * @source tooth-geometry (isosceles triangle over the pitch)
 * @example sharpHeight(mm(0.8), degrees(90)) // 0.4 mm
 * @example sharpHeight(mm(1), degrees(70)) // 0.714074 mm
 */
export function sharpHeight(p: Mm, included: Rad): Mm {
  positive('p', p);
  return mm(p / (2 * Math.tan(halfAngle(included))));
}

/**
 * Height of a tooth that is filled to a share of its sharp height.
 *
 *     H = x Hf
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | x (fill) | tooth height over sharp height | - | 0 to 1 |
 * | Hf (sharp) | sharp height | mm | > 0 |
 * | → H | tooth height | mm | |
 *
 * Assumes the fill is meant of the height, not of the volume.
 *
 * @source tooth-geometry (similar triangles)
 * @example heightOfFill(0.9, mm(0.4)) // 0.36 mm
 */
export function heightOfFill(fill: number, sharp: Mm): Mm {
  within('fill', fill, 0, 1 + 1e-9);
  return mm(fill * positive('sharpHeight', sharp));
}

/**
 * Flat left on a crest that is not filled to an edge.
 *
 *     w = p (1 − x)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | p | pitch square to the tooth | mm | > 0 |
 * | x (fill) | tooth height over sharp height | - | 0 to 1 |
 * | → w | flat on the crest, square to the tooth | mm | |
 *
 * Assumes a wheel with sharp tips.
 *
 * @source tooth-geometry (similar triangles)
 * @example crestFlat(mm(0.8), 0.75) // 0.2 mm
 */
export function crestFlat(p: Mm, fill: number): Mm {
  positive('p', p);
  return mm(p * (1 - within('fill', fill, 0, 1)));
}

/**
 * Height of a sharp tooth on a round wheel, lower than the same tooth on a flat rack.
 *
 *     h = p / (2 (tan a + π/Nw))
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | p | pitch along the wheel's outside | mm | > 0 |
 * | 2a (included) | included tooth angle | rad | 0.01745 to 3.124 |
 * | Nw (wheelTeeth) | teeth on the wheel | - | 3 to 10000 |
 * | → h | greatest tooth height the wheel can press | mm | |
 *
 * Assumes sharp tips on the outside diameter and sharp roots.
 *
 * @source tooth-geometry (a flank's two half widths fill the pitch at depth h, which is p − 2πh/Nw)
 * @example roundWheelToothHeight(mm(1), degrees(90), 63) // 0.476251 mm
 */
export function roundWheelToothHeight(p: Mm, included: Rad, wheelTeeth: number): Mm {
  positive('p', p);
  within('wheelTeeth', wheelTeeth, 3, 10000);
  return mm(p / (2 * (Math.tan(halfAngle(included)) + Math.PI / wheelTeeth)));
}
