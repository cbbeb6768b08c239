import { within } from '../units.ts';
import { PRIORS } from './priors.ts';
import { CAUSE_IDS, type CauseId, type SymptomId } from './symptoms.ts';

/** How many logged results the first guess counts for. Judgement. */
const PRIOR_RESULTS = 12;
/** More results than anybody logs. */
const MOST_RESULTS = 1e6;

/** How often each cause turned out to be behind a symptom in this shop. */
export type CauseCounts = Readonly<Partial<Record<CauseId, number>>>;

export type CauseShare = { readonly cause: CauseId; readonly chance: number };

/**
 * How likely each cause is for a symptom in this shop, before a number has spoken.
 *
 *     P = (12 p + n) / (12 + Σ n),  p the first guess, n the results of this shop
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | symptom | what is seen | - | |
 * | counts | n of each cause | - | ≥ 0 |
 * | → chance | P of each cause that was guessed or logged, in the order of the causes | - | 0 to 1 |
 *
 * Assumes the first guess is worth twelve results.
 *
 * @source trouble-priors (first guess, and what it is worth)
 * @example learnedPrior('bentPart', { barGivesWay: 0 })[0].chance // 0.54
 * @example learnedPrior('bentPart', { pressesTooHard: 12 }).find(({ cause }) => cause === 'pressesTooHard').chance // 0.58
 */
export function learnedPrior(symptom: SymptomId, counts: CauseCounts): readonly CauseShare[] {
  const guess = PRIORS[symptom];
  const total = Object.values(guess).reduce((sum, weight) => sum + weight, 0);
  const logged = (cause: CauseId): number => within(cause, counts[cause] ?? 0, 0, MOST_RESULTS);
  const results = CAUSE_IDS.reduce((sum, cause) => sum + logged(cause), 0);
  return CAUSE_IDS.map((cause) => ({
    cause,
    chance:
      ((PRIOR_RESULTS * (guess[cause] ?? 0)) / total + logged(cause)) / (PRIOR_RESULTS + results),
  })).filter(({ chance }) => chance > 0);
}
