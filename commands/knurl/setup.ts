import { setUp } from '../../src/calc/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  refuse,
  type Visit,
} from '../../src/desk/index.ts';
import { type Covering } from '../../src/shop/index.ts';
import { withMore } from '../../src/words/index.ts';
import { setupCard } from './setupCard.ts';
import { type SetupWords, setupParameters } from './setupParameters.ts';
import { type ShopBuilt, shopRequestOf } from './shopRequest.ts';
import { cardOf } from './standardCards.ts';
import { firstFor, jobAsked, proposeChoice, withStandard } from './standardFirst.ts';
import { pickedFor } from './standardPicked.ts';

type Built = Extract<ShopBuilt, { readonly about: unknown }>;

/** A part number alone: the standard's own words, and whatever else was said. */
const fromStandard = async (
  context: Context,
  visit: Visit,
  { revision }: Covering,
): Promise<Reply> => {
  const { words } = await cardOf(visit.shop, revision);
  const all = withMore(words, context.text.replace(/^\s*\/knurl(?:\s+setup)?\b/iu, ''));
  const reply = await context.again(all);
  if ('refusal' in reply || reply.about === undefined) return reply;
  // Whoever asks for this card again has to get it without the standard, too.
  return { ...reply, about: { ...reply.about, words: reply.about.words ?? all } };
};

const answered = async (
  context: Context,
  said: SetupWords,
  built: Built,
  picked: Covering | null,
): Promise<Reply> => {
  const result = setUp(built.request);
  const card = setupCard({ ...built, context, said, result });
  const { visit } = context;
  if (visit === null) return cardReply(card, [], built.about);
  const first = await firstFor(visit, jobAsked(said, built, result), picked);
  const whole = first === null ? card : await withStandard(visit, card, first);
  const choices = [...whole.choices, proposeChoice(first)];
  return cardReply({ ...whole, choices }, [], built.about);
};

/** What an operator asks for at the machine. */
export const setup = defineCommand({
  path: ['knurl', 'setup'],
  examples: [
    '/knurl 1.000 straight 21tpi 1018',
    '/knurl 19mm diamond 1.0 pitch 304 long 30mm',
    '/knurl 7/8 diagonal left 96dp brass',
  ],
  parameters: setupParameters,
  foremost: [
    'diameter',
    'pattern',
    'pitch',
    'material',
    'length',
    'stickout',
    'wheel',
    'machine',
    'finish',
    'teeth',
    'asIs',
    'bore',
  ],
  allowed: 'operator',
  run: async (context, said) => {
    const picked = await pickedFor(context, said.part);
    if (picked !== null && 'refusal' in picked) return picked;
    const built = await shopRequestOf(context, said);
    if (!('refusal' in built)) return await answered(context, said, built, picked);
    const { visit } = context;
    return visit !== null && picked !== null && built.refusal.code === 'missing'
      ? await fromStandard(context, visit, picked)
      : refuse(built.refusal, built.choices);
  },
});
