import type { Mark } from '../sources.ts';

/**
 * From the surest to the least sure. What was read can be looked up again, and so can what was
 * reported, at one remove. A derivation can be followed step by step, but is no better than what
 * it sets out from. Common practice is tried every day, though nobody wrote down its limits. What
 * is from memory may have a wrong digit that nothing would show. A judgement has been tried by
 * nobody else.
 */
export const MARK_ORDER: readonly Mark[] = [
  'read',
  'reported',
  'derived',
  'common practice',
  'from memory',
  'judgement',
];

/**
 * How sure a figure is whose parts are sure to different degrees.
 *
 *     read > reported > derived > common practice > from memory > judgement: the last of those met
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | marks | marks of its sources | - | one or more |
 * | → mark | the weakest of them | - | |
 *
 * Assumes a figure is no surer than the weakest thing it rests on.
 *
 * @source judgement (the order)
 * @example weakestMark(['read', 'common practice', 'derived']) // "common practice"
 */
export function weakestMark(marks: readonly Mark[]): Mark {
  const last = Math.max(...marks.map((mark) => MARK_ORDER.indexOf(mark)));
  const weakest = MARK_ORDER[last];
  if (weakest === undefined) throw new RangeError('a figure without a mark');
  return weakest;
}
