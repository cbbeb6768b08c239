import { type Choice, label } from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';

/** What a form asks for. Five fields are what every platform's form holds. */
export const ASKED = ['outcome', 'count', 'crest', 'height', 'parts'] as const;

/** How it went, of the card this stands on; nothing where nothing is kept. */
export const logChoices = ({ visit }: Context): readonly Choice[] =>
  visit === null
    ? []
    : [
        {
          label: label('logResult', {}),
          words: '/knurl result log card',
          ask: ASKED,
          ofCard: true,
        },
      ];
