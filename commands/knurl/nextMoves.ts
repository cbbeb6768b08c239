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
