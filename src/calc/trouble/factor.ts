import type { CheckName, State } from '../check.ts';
import { normalShare } from '../normal.ts';
import { within } from '../units.ts';
import type { TroubleNumber } from './facts.ts';

/** How a number speaks for a cause. */
export type NumberSays = {
  readonly number: TroubleNumber;
  /** Where it is as likely as not that the number has passed what the work stands. */
  readonly limit: number;
  /** How sure the limit is: on a number of its own kind, or as a ratio. */
  readonly spread: number;
  readonly scale: 'linear' | 'ratio';
  readonly side: 'over' | 'under';
  /** Share of troubled jobs in which it is past the limit: what the prior already counts. */
  readonly usual: number;
  /** The check whose verdict says the same thing, and is silent where the number speaks. */
  readonly insteadOf: CheckName | null;
};

/** How a check speaks for a cause where its number is not to be had. */
export type CheckSays = { readonly check: CheckName } & Readonly<Record<State, number>>;

/** No number rules a cause out for good: it may be wrong, or two things may have gone wrong. */
export const LEAST_FACTOR = 0.04;
/** A log of nothing has no end; numbers under this are taken for it. */
const NEXT_TO_NOTHING = 1e-9;

/** A force is known to a factor of 2: four parts in five lie inside that. Derived from force-model. */
export const FORCE_SPREAD = Math.LN2 / 1.2815515655446004;

/**
 * How much likelier a number makes a cause.
 *
 *     P = Φ(±(v − limit)/spread), or Φ(±ln(v/limit)/spread) by ratio;  factor = max(P/usual, 0.04)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | v (value) | the number | - | |
 * | says | its limit, how sure that is, its side and how often it is past it | - | |
 * | → factor | what the cause's weight is multiplied by | - | 0.04 to 1/usual |
 *
 * Assumes what the work stands is spread normally about the limit.
 *
 * @source trouble-numbers (limits and spreads)
 * @source normal-spread (share past the limit)
 * @example numberFactor(1, { number: 'speedOver', limit: 1, spread: 0.2, scale: 'ratio', side: 'over', usual: 0.25, insteadOf: null }) // 2.0
 * @example numberFactor(0.2, { number: 'speedOver', limit: 1, spread: 0.2, scale: 'ratio', side: 'over', usual: 0.25, insteadOf: null }) // 0.04
 */
export function numberFactor(value: number, says: NumberSays): number {
  within(says.number, value, -1e12, 1e12);
  const { limit, spread } = says;
  const past =
    says.scale === 'ratio'
      ? Math.log(Math.max(value, NEXT_TO_NOTHING) / limit) / spread
      : (value - limit) / spread;
  const chance = normalShare(says.side === 'over' ? past : -past);
  return Math.max(LEAST_FACTOR, chance / says.usual);
}
