import type { Check, State } from '../check.ts';
import { checksWith, type SetupRequest } from '../setup/index.ts';
import { OutOfRange } from '../units.ts';
import { type Prospect, processOf, productOf } from './prospects.ts';
import { type Candidate, PLAN_LENGTH, type PlanRequest } from './request.ts';

/** The set-up a prospect stands for. The limits are left out: landing is by measuring, and has its chance. */
const setupOf = (prospect: Prospect, request: PlanRequest): SetupRequest => {
  const { wheel } = prospect.fitting;
  const counted =
    wheel.teeth === null ? null : { diameter: wheel.size.diameter, teeth: wheel.teeth };
  return {
    ...request.job,
    pattern: wheel.pattern,
    pitch: wheel.pitch,
    alongRim: wheel.alongRim,
    counted,
    proven: wheel.proven,
    helix: wheel.helix,
    tilt: null,
    included: wheel.included,
    stock: null,
    finish: null,
    asIs: false,
    wantedTeeth: prospect.toothCount,
    fill: prospect.fill,
    process: processOf(request),
    wheel: wheel.size,
    edge: wheel.edge,
    onePiece: wheel.onePiece,
  };
};

const RANK: readonly State[] = ['fine', 'watch', 'stop'];

const worstOf = (checks: readonly Check[]): State =>
  RANK[Math.max(0, ...checks.map(({ state }) => RANK.indexOf(state)))] ?? 'fine';

export const passes = (candidate: Candidate): boolean => candidate.state !== 'stop';

/** Works out force, pin, feed and the rest of one prospect. */
const judgeProspect = (prospect: Prospect, request: PlanRequest): Candidate => {
  const setup = setupOf(prospect, request);
  const checks = checksWith(setup, {});
  const stopped = checks.find(({ state }) => state === 'stop');
  const { fitting, weakest, ...rest } = prospect;
  return {
    ...rest,
    wheel: fitting.wheel,
    process: processOf(request),
    pitchError: fitting.pitchError,
    product: productOf(prospect),
    limitedBy: stopped?.name ?? weakest,
    state: worstOf(checks),
    checks,
    request: setup,
  };
};

/** Null where the tooth does not fit the work at all: a wall thinner than it. */
const tryProspect = (prospect: Prospect, request: PlanRequest): Candidate | OutOfRange => {
  try {
    return judgeProspect(prospect, request);
  } catch (error) {
    if (error instanceof OutOfRange) return error;
    throw error;
  }
};

/** The first of the prospects, in the order they come, that nothing stops. */
export const firstPassing = (
  prospects: readonly Prospect[],
  request: PlanRequest,
): Candidate | null => {
  for (const prospect of prospects) {
    const candidate = tryProspect(prospect, request);
    if (!(candidate instanceof OutOfRange) && passes(candidate)) return candidate;
  }
  return null;
};

const watches = (candidate: Candidate): number =>
  candidate.checks.filter(({ state }) => state === 'watch').length;

/** Chances that differ by less are one: then the set-up with less to watch goes first. */
const SAME_CHANCE = 5e-4;

const steps = ({ product }: Candidate): number => Math.round(product / SAME_CHANCE);

const better = (a: Candidate, b: Candidate): number =>
  steps(b) - steps(a) ||
  watches(a) - watches(b) ||
  Math.abs(a.pitchError ?? 0) - Math.abs(b.pitchError ?? 0);

/**
 * The likeliest prospects that pass, then the likeliest that do not. Judging goes down the list
 * and ends once enough pass, so that a full crib costs no more than it has to.
 */
export const judged = (
  prospects: readonly Prospect[],
  request: PlanRequest,
): readonly Candidate[] => {
  const passing: Candidate[] = [];
  const stopped: Candidate[] = [];
  let senseless: OutOfRange | null = null;
  for (const prospect of prospects) {
    const weakest = passing.at(-1)?.product ?? 0;
    if (passing.length >= PLAN_LENGTH && productOf(prospect) < weakest - SAME_CHANCE) break;
    const candidate = tryProspect(prospect, request);
    if (candidate instanceof OutOfRange) senseless ??= candidate;
    else (passes(candidate) ? passing : stopped).push(candidate);
  }
  // What no wheel can do is wrong with the job itself: a stickout shorter than the knurl.
  if (senseless !== null && passing.length + stopped.length === 0) throw senseless;
  const firstOf = (list: Candidate[]) => list.sort(better).slice(0, PLAN_LENGTH);
  return [...firstOf(passing), ...firstOf(stopped)];
};
