import type { CauseId, Evidence, NextMove, SymptomId } from '../calc/index.ts';

/** A cause as a card tells it. */
export type CauseSaid = {
  readonly cause: CauseId;
  readonly chance: number;
  readonly evidence: readonly Evidence[];
  readonly move: NextMove;
};

export type TroubleLines = {
  troubleLikeliest: CauseSaid;
  troubleSeen: { readonly symptom: SymptomId };
  troubleByNumbers: Record<never, never>;
  troubleByWords: Record<never, never>;
};

export type TroubleRows = {
  cause: CauseSaid & { readonly place: number };
};
