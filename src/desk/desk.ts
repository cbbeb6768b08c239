import { OutOfRange } from '../calc/index.ts';
import type { Card } from '../card/index.ts';
import type { Refusal, Suggestion } from '../refusal.ts';
import {
  type LineResult,
  MATERIAL_PHRASES,
  type Names,
  NO_NAMES,
  readLine,
  type ShopUnits,
  type Vocabulary,
  vocabularyOf,
} from '../words/index.ts';
import type { Call } from './call.ts';
import type { Command, Context, Reply } from './command.ts';
import type { Effect } from './effect.ts';
import { lineOf, route } from './route.ts';

/** What goes back to the adapter. */
export type Answer =
  | { readonly kind: 'card'; readonly card: Card; readonly effects: readonly Effect[] }
  | {
      readonly kind: 'refusal';
      readonly refusal: Refusal;
      readonly choices: readonly Suggestion[];
      readonly units: ShopUnits;
      /** What was typed, so that it can be corrected and sent again. */
      readonly text: string;
    };

export type Desk = { readonly answer: (call: Call) => Promise<Answer> };

/** What the desk needs to know of a shop before it reads a line. */
export type ShopFacts = { readonly units: ShopUnits; readonly names: Names };
export type FactsOf = (call: Call) => Promise<ShopFacts> | ShopFacts;

/** A line that a button sends always says which command it is for. */
const sendable = <T extends { readonly words: string }>(choices: readonly T[]): readonly T[] =>
  choices.map((choice) => ({
    ...choice,
    words: choice.words.startsWith('/') ? choice.words : `/knurl ${choice.words}`,
  }));

/** Numbers that make no sense are the person's to correct, wherever they are found out. */
const asRefusal = (error: unknown): Refusal => {
  if (!(error instanceof OutOfRange)) throw error;
  const { what, value, min, max, unit } = error;
  return { code: 'outOfRange', what, value, min, max, unit };
};

type Asked = { readonly text: string; readonly command: Command; readonly read: LineResult };

export const openDesk = (fleet: readonly Command[], facts: FactsOf): Desk => {
  const vocabularies = new Map<Command, Vocabulary>(
    fleet.map((command) => [command, vocabularyOf(command.parameters, MATERIAL_PHRASES)]),
  );

  const asked = (
    call: Call,
    shop: ShopFacts,
  ): Asked | { readonly text: string; readonly refusal: Refusal } => {
    const { given } = call;
    const named =
      'path' in given ? fleet.find((c) => c.path.join(' ') === given.path.join(' ')) : undefined;
    const text =
      'words' in given ? given.words : named === undefined ? '' : lineOf(named, given.options);
    const way = route(text, fleet);
    if ('refusal' in way) return { text, refusal: way.refusal };
    const vocabulary = vocabularies.get(way.command) ?? vocabularyOf([]);
    const read = readLine(text, vocabulary, shop.units, shop.names, way.skip);
    return { text, command: way.command, read };
  };

  const run = async (command: Command, context: Context): Promise<Reply> => {
    try {
      return await command.run(context, Object.fromEntries(context.read.values));
    } catch (error) {
      return { refusal: asRefusal(error), choices: [] };
    }
  };

  const answer = async (call: Call): Promise<Answer> => {
    const shop = await facts(call);
    const request = asked(call, shop);
    const refused = (refusal: Refusal, choices: readonly Suggestion[]): Answer => ({
      kind: 'refusal',
      refusal:
        refusal.code === 'unclear' ? { ...refusal, readings: sendable(refusal.readings) } : refusal,
      choices: sendable(choices),
      units: shop.units,
      text: request.text,
    });
    if (!('command' in request)) return refused(request.refusal, []);
    if ('refusal' in request.read) return refused(request.read.refusal, request.read.choices);
    const { text, command } = request;
    const context: Context = { text, read: request.read.read, units: shop.units, fleet };
    const reply = await run(command, context);
    if ('refusal' in reply) return refused(reply.refusal, reply.choices);
    const card = { ...reply.card, choices: sendable(reply.card.choices) };
    return { kind: 'card', card, effects: reply.effects };
  };

  return { answer };
};

/** A shop that has said nothing about itself. */
export const plainShop =
  (units: ShopUnits): FactsOf =>
  () => ({ units, names: NO_NAMES });
