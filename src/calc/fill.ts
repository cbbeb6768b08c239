import { type CheckOf, figure } from './check.ts';
import { within } from './units.ts';

/** Tooth height aimed at, as a share of the sharp height. Common practice. */
export const DEFAULT_FILL = 0.9;
/** Below this a pattern is shallow. Judgement. */
export const SHALLOW_BELOW = 0.7;
/** Fine up to this. Judgement. */
export const FULL_ENOUGH = 0.92;
/** Above this the wheel packs: stop. Judgement. */
export const OVER_FULL = 0.97;

/**
 * Whether the tooth is full enough and not too full.
 *
 *     0.70 ≤ x ≤ 0.92 and not above the material's own: fine; to 0.97 or below 0.70: watch; above: stop
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | x (fill) | tooth height over sharp height | - | 0 to 1 |
 * | own (materialFill) | deepest fill advised for the material, or null | - | 0 to 1 |
 * | → check | fill, with its limits | - | |
 *
 * Assumes a wheel with sharp teeth.
 *
 * @source fill-limits (0.70, 0.92, 0.97)
 * @example fillCheck(0.9, null).state // "fine"
 * @example fillCheck(0.9, 0.85).state // "watch"
 */
export function fillCheck(fill: number, materialFill: number | null): CheckOf<'fill'> {
  within('fill', fill, 0, 1 + 1e-9);
  const figures = {
    fill: figure(fill, '1'),
    fillLow: figure(SHALLOW_BELOW, '1'),
    fillHigh: figure(Math.min(FULL_ENOUGH, materialFill ?? FULL_ENOUGH), '1'),
  };
  // A hair of slack keeps 0.7 × Hf / Hf from failing its own limit.
  const over = (limit: number) => fill > limit + 1e-9;
  if (over(OVER_FULL)) return { name: 'fill', state: 'stop', reason: 'overFull', figures };
  if (materialFill !== null && over(materialFill))
    return { name: 'fill', state: 'watch', reason: 'overMaterial', figures };
  if (over(FULL_ENOUGH)) return { name: 'fill', state: 'watch', reason: 'deep', figures };
  if (fill < SHALLOW_BELOW - 1e-9)
    return { name: 'fill', state: 'watch', reason: 'shallow', figures };
  return { name: 'fill', state: 'fine', reason: 'within', figures };
}
