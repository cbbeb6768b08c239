import type { Figure, LimitedBy, Mm, Process, RemedyKind, State, Window } from '../calc/index.ts';
import type { Nothing } from './nothing.ts';

/** A set-up that the plan found, as a card tells it. */
export type CandidateSaid = {
  readonly wheel: string;
  readonly toothCount: number;
  readonly blankDiameter: Mm;
  readonly fill: number;
  readonly process: Process;
  readonly chanceTracks: number;
  readonly chanceLands: number;
  readonly limitedBy: LimitedBy;
  readonly state: State;
};

export type PlanLines = {
  planBest: CandidateSaid;
  planNone: { readonly limits: Window };
  planFor: { readonly limits: Window; readonly wheels: number };
  planCribByStandard: Nothing;
  planCribOneWheel: Nothing;
  planOffMiddle: Nothing;
  planRemedy: {
    readonly kind: RemedyKind;
    readonly number: Figure | null;
    readonly candidate: CandidateSaid;
  };
  planWider: {
    readonly side: 'above' | 'below';
    readonly by: Mm;
    readonly limits: Window;
    readonly candidate: CandidateSaid;
  };
  planOtherPitch: { readonly pitch: Mm; readonly candidate: CandidateSaid };
  planCut: CandidateSaid;
};

/** What the buttons of a plan say. */
export type PlanLabels = {
  candidateWith: {
    readonly kind: RemedyKind;
    readonly number: Figure | null;
    readonly toothCount: number;
  };
  otherPitch: { readonly pitch: Mm; readonly toothCount: number };
  planWith: { readonly limits: Window };
  candidateCut: { readonly toothCount: number };
};

export type PlanRows = {
  candidate: CandidateSaid & { readonly place: number };
};
