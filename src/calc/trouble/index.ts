/** From what is seen on the part to what is to be done, by what the set-up's numbers say. */
export { CAUSES, type Cause, type TroubleMoveId } from './causes.ts';
export { type CheckSays, LEAST_FACTOR, type NumberSays, numberFactor } from './factor.ts';
export {
  MOVE_NUMBERS,
  type MoveNumber,
  type Need,
  NO_FACTS,
  type TroubleFacts,
  type TroubleNumber,
} from './facts.ts';
export { type CauseCounts, type CauseShare, learnedPrior } from './learned.ts';
export { PRIORS } from './priors.ts';
export { type Evidence, type NextMove, type RankedCause, rankCauses } from './rank.ts';
export { NOTHING_SEEN, type TroubleSeen, troubleFacts } from './setupFacts.ts';
export { CAUSE_IDS, type CauseId, SYMPTOMS, type SymptomId } from './symptoms.ts';
