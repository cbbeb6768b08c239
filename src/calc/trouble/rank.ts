import type { CheckName, State } from '../check.ts';
import type { UnitName } from '../units.ts';
import { CAUSES, type TroubleMoveId } from './causes.ts';
import { type CheckSays, LEAST_FACTOR, type NumberSays, numberFactor } from './factor.ts';
import {
  MOVE_NUMBERS,
  NEED_THERE,
  type Need,
  TROUBLE_NUMBERS,
  type TroubleFacts,
  type TroubleNumber,
} from './facts.ts';
import { type CauseCounts, learnedPrior } from './learned.ts';
import type { CauseId, SymptomId } from './symptoms.ts';

/** Why a cause stands where it does: what spoke, and by what factor. */
export type Evidence =
  | {
      readonly kind: 'number';
      readonly number: TroubleNumber;
      readonly value: number;
      readonly unit: UnitName;
      readonly limit: number;
      readonly factor: number;
    }
  | {
      readonly kind: 'check';
      readonly check: CheckName;
      readonly state: State;
      readonly factor: number;
    }
  | {
      readonly kind: 'need';
      readonly need: Need;
      readonly there: boolean;
      readonly factor: number;
    };

export type NextMove = {
  readonly id: TroubleMoveId;
  readonly number: number | null;
  readonly unit: UnitName;
};

export type RankedCause = {
  readonly cause: CauseId;
  /** Share of all the causes that can stand behind the symptom. */
  readonly chance: number;
  /** Its share before a number spoke, the shop's own results counted in. */
  readonly prior: number;
  /** What spoke for or against it, the loudest first. */
  readonly evidence: readonly Evidence[];
  readonly move: NextMove;
};

/** Evidence that moves nothing is not worth a line. Judgement. */
const WORTH_SAYING = 1.15;

const byNumber = (says: NumberSays, facts: TroubleFacts): Evidence | null => {
  const value = facts.numbers[says.number];
  if (value === undefined) return null;
  return {
    kind: 'number',
    number: says.number,
    value,
    unit: TROUBLE_NUMBERS[says.number],
    limit: says.limit,
    factor: numberFactor(value, says),
  };
};

const byCheck = (says: CheckSays, facts: TroubleFacts): Evidence | null => {
  const state = facts.states[says.check];
  return state === undefined
    ? null
    : { kind: 'check', check: says.check, state, factor: says[state] };
};

const byNeed = (need: Need, facts: TroubleFacts): Evidence | null => {
  const there = facts.has[need];
  if (there === undefined) return null;
  return { kind: 'need', need, there, factor: there ? NEED_THERE[need] : LEAST_FACTOR };
};

const evidenceFor = (cause: CauseId, facts: TroubleFacts): readonly Evidence[] => {
  const { needs, numbers, checks } = CAUSES[cause];
  const spoken = numbers.filter(({ number }) => facts.numbers[number] !== undefined);
  const silent = new Set(spoken.map(({ insteadOf }) => insteadOf));
  const all: (Evidence | null)[] = [
    needs === null ? null : byNeed(needs, facts),
    ...spoken.map((says) => byNumber(says, facts)),
    ...checks.filter((says) => !silent.has(says.check)).map((says) => byCheck(says, facts)),
  ];
  return all.filter((evidence) => evidence !== null);
};

const loudness = ({ factor }: Evidence): number => Math.abs(Math.log(factor));

const moveFor = (cause: CauseId, facts: TroubleFacts): NextMove => {
  const { move } = CAUSES[cause];
  if ('number' in move) return move;
  return { id: move.id, number: facts.moves[move.of] ?? null, unit: MOVE_NUMBERS[move.of] };
};

/**
 * Causes of a symptom, the likeliest first, each with what spoke for it and one next move.
 *
 *     weight = prior × Π factors;  chance = weight / Σ weights
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | symptom | what is seen | - | |
 * | facts | numbers and checks of the set-up; words alone have none | - | |
 * | counts | what turned out to be the cause in this shop, for this symptom | - | ≥ 0 |
 * | → chance | share of all the causes behind the symptom | - | 0 to 1 |
 * | → evidence | number or check, and the factor it brings | - | |
 * | → move | what to do, as a number of this set-up | - | |
 *
 * Assumes one cause at a time, and numbers that speak independently of each other.
 *
 * @source trouble-priors (how often a cause stands behind a symptom)
 * @source trouble-numbers (what a number makes of it)
 * @example rankCauses('doublePattern', NO_FACTS, {})[0].cause // "wrongCount"
 * @example rankCauses('doublePattern', { ...NO_FACTS, numbers: { toothError: 0.01, labelMiss: 0.8 } }, {})[0].cause // "wheelOffLabel"
 */
export function rankCauses(
  symptom: SymptomId,
  facts: TroubleFacts,
  counts: CauseCounts,
): readonly RankedCause[] {
  const weighed = learnedPrior(symptom, counts).map(({ cause, chance: prior }) => {
    const evidence = evidenceFor(cause, facts);
    return { cause, prior, evidence, weight: evidence.reduce((w, e) => w * e.factor, prior) };
  });
  const sum = weighed.reduce((total, { weight }) => total + weight, 0);
  return weighed
    .map(({ cause, prior, evidence, weight }) => ({
      cause,
      chance: weight / sum,
      prior,
      evidence: evidence
        .filter((e) => loudness(e) >= Math.log(WORTH_SAYING))
        .sort((a, b) => loudness(b) - loudness(a)),
      move: moveFor(cause, facts),
    }))
    .sort((a, b) => b.chance - a.chance);
}
