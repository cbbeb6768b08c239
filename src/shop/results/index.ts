/** How parts came out: kept, corrected, withdrawn, and what the shop learns from them. */
export { causeCounts } from './causes.ts';
export { confirmResult, correctResult, lookAtResult, withdrawResult } from './change.ts';
export type { Compared, GrowthSaid, NoGrowth } from './compare.ts';
export { OUTCOMES, type Outcome, type ResultContent, symptomOf } from './content.ts';
export { growthIn, growthTallies, type Resifted } from './growth.ts';
export {
  findResult,
  type KeptResult,
  latestResults,
  type ResultsWanted,
  type ResultWanted,
  resultById,
  resultName,
  type Standing,
} from './kept.ts';
export { type Logged, logResult } from './log.ts';
