import { type CheckOf, figure } from '../check.ts';
import type { Window } from '../tracking.ts';
import { inside } from './blank.ts';
import type { MadeTooth } from './tooth.ts';

/** A diameter over the crests with the ends of its spread; one that was measured has none. */
export type Crest = Pick<MadeTooth, 'crest' | 'crestLow' | 'crestHigh'>;

/**
 * Whether the crest, and its 80 % spread, lie inside the print's limits.
 *
 *     low ≤ Do ≤ high with its whole spread: fine;  Do alone: watch;  else stop
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | Do (crest) | crest diameter and the ends of its spread | mm | |
 * | limits | smallest and largest finished diameter of the print | mm | |
 * | → check | finish, with the limits and how far outside them | - | |
 *
 * Assumes a crest that was measured has no spread.
 *
 * @source growth-prior (the spread)
 * @source judgement (watch where only the spread reaches outside)
 * @example finishCheck({ crest: mm(25.4), crestLow: mm(25.3), crestHigh: mm(25.5) }, { low: mm(25.35), high: mm(25.6) }).state // "watch"
 */
export function finishCheck(crest: Crest, limits: Window): CheckOf<'finish'> {
  const over = Math.max(0, crest.crest - limits.high);
  const under = Math.max(0, limits.low - crest.crest);
  const figures = {
    crestDiameter: figure(crest.crest, 'mm'),
    finishLow: figure(limits.low, 'mm'),
    finishHigh: figure(limits.high, 'mm'),
    outsideBy: figure(Math.max(over, under), 'mm'),
  };
  const say = (state: CheckOf<'finish'>['state'], reason: CheckOf<'finish'>['reason']) =>
    ({ name: 'finish', state, reason, figures }) as const;
  if (!inside(crest.crest, limits)) return say('stop', over > 0 ? 'over' : 'under');
  const spreads = !inside(crest.crestLow, limits) || !inside(crest.crestHigh, limits);
  return spreads ? say('watch', 'spread') : say('fine', 'inside');
}
