import type { CauseId, Evidence, NextMove, SymptomId } from '../calc/index.ts';
import type { Nothing } from './nothing.ts';

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
  troubleByNumbers: Nothing;
  troubleByWords: Nothing;
  /** Nothing of the set-up was said: it is that of the last card. */
  troubleOfCard: { readonly code: string };
};

/** What the buttons of a trouble say. */
export type TroubleLabels = { setUpCard: Nothing; checkCard: Nothing; troubleSeen: Nothing };

export type TroubleRows = {
  cause: CauseSaid & { readonly place: number };
};
