import type { CauseId, Mm, Pattern, SymptomId } from '../calc/index.ts';
import type { Nothing } from './nothing.ts';
import type { Moment } from './shopLines.ts';

/** How a part came out, in the shop's words, and what was seen where that says more. */
type HowItWent = {
  readonly outcome: 'good' | 'double' | 'shallow' | 'flaking' | 'bent' | 'seized' | 'other';
  readonly symptom: SymptomId | null;
};

/** What a result is called by, and the code of its card. */
type Named = { readonly result: string; readonly code: string };

export type ResultLines = {
  /** How many results stand behind the growth that a card expects. */
  growthStands: {
    readonly results: number;
    /** Of this pattern and material. */
    readonly ofFamily: number;
    readonly doubted: number;
    readonly pattern: Pattern;
    readonly group: string;
  };
  resultDone: Named & HowItWent & { readonly did: 'logged' | 'corrected' | 'confirmed' };
  resultWithdrawn: Named & HowItWent;
  resultShown: Named & HowItWent;
  resultsListed: { readonly count: number; readonly waiting: boolean };
  resultsNone: { readonly waiting: boolean; readonly line: string };
  /** It does not wait: confirming it would change nothing. */
  resultNoDoubt: { readonly result: string; readonly learned: boolean };
  resultLogged: Moment & { readonly by: string };
  resultChanged: Moment & { readonly by: string; readonly verb: 'changed' | 'removed' };
  /** Why nothing is learned from it. */
  resultTeachesNot: {
    readonly why: 'noCrest' | 'noHeight' | 'cut' | 'spoiled' | 'tooLittle' | 'oldCard';
  };
  resultWaits: {
    readonly result: string;
    readonly share: number;
    readonly low: number;
    readonly high: number;
  };
  /** What the next card of this pattern and material expects. */
  resultExpects: {
    readonly mean: number;
    readonly ofFamily: number;
    readonly pattern: Pattern;
    readonly group: string;
  };
  /** Others that are learned from, or wait, because of this one. */
  resultOthers: { readonly learned: readonly string[]; readonly doubted: readonly string[] };
  resultCauseCounts: { readonly cause: CauseId; readonly symptom: SymptomId };
  /** Logged causes that the ranking has counted in. */
  troubleCounts: { readonly results: number };
};

export type ResultRows = {
  resultGrowth: { readonly share: number; readonly expected: number | null };
  resultWheel: { readonly wheel: string; readonly parts: number; readonly run: number };
  resultCause: { readonly cause: CauseId };
  resultNote: { readonly note: string };
  resultListed: HowItWent &
    Named & {
      readonly teeth: number | null;
      readonly crest: Mm | null;
      readonly share: number | null;
      readonly waits: boolean;
      readonly by: string;
      readonly moment: Moment;
    };
};

/** What the buttons of a result say. */
export type ResultLabels = {
  logResult: Nothing;
  correctResult: Nothing;
  withdrawResult: { readonly result: string };
  confirmResult: { readonly result: string };
  causeFound: Nothing;
  heightMeasured: Nothing;
  whatIsBehind: { readonly symptom: SymptomId };
  cardOf: { readonly code: string };
  resultsWaiting: Nothing;
};
