import { type Choice, label } from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';

/** To the engineers with the numbers of this card, where cards are kept. */
export const askChoices = ({ visit }: Context): readonly Choice[] =>
  visit === null
    ? []
    : [
        {
          label: label('askEngineer', {}),
          words: '/knurl ask',
          ask: ['question'],
          ofCard: true,
        },
      ];

/** What is seen on the part, held against this very set-up: only the symptom is still to be said. */
export const troubleChoice = ({ text }: Context): Choice => ({
  label: label('troubleSeen', {}),
  words: `/knurl trouble ${bareLine(text)}`.trimEnd(),
  ask: ['symptom'],
});

/** A line without what says which verb it is for. */
export const bareLine = (text: string): string =>
  text.replace(/^\s*\/?knurl\b\s*/iu, '').replace(/^(?:setup|trouble)\b\s*/iu, '');
