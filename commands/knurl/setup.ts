import { setUp } from '../../src/calc/index.ts';
import { cardReply, defineCommand, refuse } from '../../src/desk/index.ts';
import { setupCard } from './setupCard.ts';
import { setupParameters } from './setupParameters.ts';
import { shopRequestOf } from './shopRequest.ts';

/** What an operator asks for at the machine. */
export const setup = defineCommand({
  path: ['knurl', 'setup'],
  examples: [
    '/knurl 1.000 straight 21tpi 1018',
    '/knurl 19mm diamond 1.0 pitch 304 long 30mm',
    '/knurl 7/8 diagonal left 96dp brass',
  ],
  parameters: setupParameters,
  allowed: 'operator',
  run: async (context, said) => {
    const built = await shopRequestOf(context, said);
    if ('refusal' in built) return refuse(built.refusal, built.choices);
    const result = setUp(built.request);
    return cardReply(setupCard({ ...built, context, said, result }), [], built.about);
  },
});
