import type { Card } from '../card/index.ts';
import type { Refusal, Suggestion } from '../refusal.ts';
import type { ShopUnits } from '../words/index.ts';
import type { Effect } from './effect.ts';

/** What goes back to the adapter. */
export type Answer =
  | {
      readonly kind: 'card';
      readonly card: Card;
      readonly effects: readonly Effect[];
      /** Names of files that go with it; the desk gives their content. */
      readonly files?: readonly string[];
    }
  | {
      readonly kind: 'refusal';
      readonly refusal: Refusal;
      readonly choices: readonly Suggestion[];
      readonly units: ShopUnits;
      /** What was typed, so that it can be corrected and sent again. */
      readonly text: string;
    };

/** What an answer offers to send next. */
export const choicesIn = (answer: Answer | null): readonly { readonly words: string }[] => {
  if (answer === null) return [];
  return answer.kind === 'card' ? answer.card.choices : answer.choices;
};
