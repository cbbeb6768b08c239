import { type CheckOf, figure } from '../check.ts';
import type { Window } from '../tracking.ts';
import { inside } from './blank.ts';
import type { MadeTooth } from './tooth.ts';

/** Whether the expected crest, and its 80 % spread, lie inside the print's limits. */
export const finishCheck = (tooth: MadeTooth, limits: Window): CheckOf<'finish'> => {
  const over = Math.max(0, tooth.crest - limits.high);
  const under = Math.max(0, limits.low - tooth.crest);
  const figures = {
    crestDiameter: figure(tooth.crest, 'mm'),
    finishLow: figure(limits.low, 'mm'),
    finishHigh: figure(limits.high, 'mm'),
    outsideBy: figure(Math.max(over, under), 'mm'),
  };
  const say = (state: CheckOf<'finish'>['state'], reason: CheckOf<'finish'>['reason']) =>
    ({ name: 'finish', state, reason, figures }) as const;
  if (!inside(tooth.crest, limits)) return say('stop', over > 0 ? 'over' : 'under');
  const spreads = !inside(tooth.crestLow, limits) || !inside(tooth.crestHigh, limits);
  return spreads ? say('watch', 'spread') : say('fine', 'inside');
};
