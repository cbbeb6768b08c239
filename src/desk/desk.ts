import type { Card } from '../card/index.ts';
import type { Refusal, Suggestion } from '../refusal.ts';
import { whoMay } from '../shop/index.ts';
import {
  type Cursor,
  type LineResult,
  MATERIAL_PHRASES,
  type Names,
  NO_NAMES,
  OutOfRange,
  type ReadLine,
  readLine,
  type ShopUnits,
  type Suggested,
  spanOf,
  tokensOf,
  type Vocabulary,
  vocabularyOf,
} from '../words/index.ts';
import { type Answer, choicesIn } from './answer.ts';
import type { Call } from './call.ts';
import type { Command, Context, Reply } from './command.ts';
import { type KeptAnswers, keptInProcess } from './kept.ts';
import type { PinnedStandard } from './pinned.ts';
import { atLeast } from './role.ts';
import { lineOf, type Route, route, wordsOf } from './route.ts';
import { suggestionsFor } from './suggest.ts';
import type { Visit } from './visit.ts';

export type Desk = {
  readonly answer: (call: Call) => Promise<Answer>;
  /** The answer an earlier interaction got, for whatever stands behind its buttons. */
  readonly recall: (call: Pick<Call, 'shop'>, of: string) => Promise<Answer | null>;
  /** What may be meant by the letters typed so far for a parameter, the likeliest first. */
  readonly suggest: (
    call: Call,
    asked: { readonly parameter: string; readonly typed: string },
  ) => Promise<readonly Suggestion[]>;
  /** The content of a file that an answer names, for who may have it; null for who may not. */
  readonly download: (call: Call, file: string) => Promise<AsyncIterable<string> | null>;
  /** The standards that hold in a shop, for a page that shows them before anything is asked. */
  readonly pinned: (call: Pick<Call, 'shop'>) => Promise<readonly PinnedStandard[]>;
  readonly fleet: readonly Command[];
};

/** What the desk needs to know of a shop, and of who asks, before it reads a line. */
export type ShopFacts = {
  readonly units: ShopUnits;
  readonly names: Names;
  /** The last card this person got in this place, where one is remembered. */
  readonly last: Card | null;
  /** The shop's records, where there are any. */
  readonly visit?: Visit;
  /** What the records offer while somebody types, beside names. */
  readonly offers?: (kind: Suggested) => Promise<readonly Suggestion[]>;
  /** What is kept of a reply, and what it is given besides, before it is answered. */
  readonly settle?: (reply: Reply, context: Context) => Promise<Reply>;
};
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

/** Reads a line: first what has to stand first, then the rest in any order. */
const readFor = (
  text: string,
  { command, skip }: Extract<Route, { readonly command: Command }>,
  vocabulary: Vocabulary,
  { units, names }: ShopFacts,
): LineResult => {
  const cursor: Cursor = { text, tokens: tokensOf(text), at: skip, units };
  const first = command.lead?.read(cursor, names) ?? null;
  if (command.lead === undefined || first === null)
    return readLine(text, vocabulary, units, names, skip);
  if ('refusal' in first) return first;
  const { name } = command.lead;
  const isAll = skip + first.used >= cursor.tokens.length;
  // What takes the whole line, as a question does, may be a letter.
  const rest = isAll
    ? { read: { values: new Map(), spans: new Map() } }
    : readLine(text, vocabulary, units, names, skip + first.used);
  if ('refusal' in rest) return rest;
  const { values, spans } = rest.read;
  return {
    read: {
      values: new Map([...values, [name, first.value]]),
      spans: new Map([...spans, [name, [spanOf(cursor, first.used)]]]),
    },
  };
};

/** Who has to be asked instead, where the person may not ask for this themselves. */
const notAllowed = async (
  visit: Visit | undefined,
  { allowed }: Command,
): Promise<Refusal | null> => {
  if (visit === undefined || atLeast(visit.role, allowed)) return null;
  return { code: 'notAllowed', role: allowed, people: await whoMay(visit.shop, allowed) };
};

/** The line that a call stands for. */
const lineFor = (call: Call, fleet: readonly Command[], pressed: Answer | null): string | null => {
  const { given } = call;
  if ('words' in given) return given.words;
  if ('path' in given) {
    const named = fleet.find((c) => c.path.join(' ') === given.path.join(' '));
    return named === undefined ? '' : lineOf(named, given.options);
  }
  const line = choicesIn(pressed)[given.pressed.choice]?.words;
  if (line === undefined) return null;
  const { added } = given.pressed;
  const way = route(line, fleet);
  return added === undefined || !('command' in way)
    ? line
    : [line, ...wordsOf(way.command, added, tokensOf(line).length > way.skip)].join(' ');
};

export const openDesk = (
  fleet: readonly Command[],
  facts: FactsOf,
  kept: KeptAnswers = keptInProcess(),
): Desk => {
  const vocabularies = new Map<Command, Vocabulary>(
    fleet.map((command) => [command, vocabularyOf(command.parameters, MATERIAL_PHRASES)]),
  );

  const read = (
    text: string,
    way: Extract<Route, { readonly command: Command }>,
    shop: ShopFacts,
  ): LineResult => {
    const vocabulary = vocabularies.get(way.command) ?? vocabularyOf([]);
    return readFor(text, way, vocabulary, shop);
  };

  const asked = async (
    call: Call,
    shop: ShopFacts,
    pressed: Answer | null,
  ): Promise<Asked | { readonly text: string; readonly refusal: Refusal }> => {
    const text = lineFor(call, fleet, pressed);
    // The answer behind the button is gone: nothing is guessed in its place.
    if (text === null)
      return { text: '', refusal: { code: 'notFound', what: 'card', nearest: [] } };
    const way = route(text, fleet);
    if ('refusal' in way) return { text, refusal: way.refusal };
    const refusal = await notAllowed(shop.visit, way.command);
    if (refusal !== null) return { text, refusal };
    return { text, command: way.command, read: read(text, way, shop) };
  };

  const run = async (command: Command, context: Context): Promise<Reply> => {
    try {
      return await command.run(context, Object.fromEntries(context.read.values));
    } catch (error) {
      return { refusal: asRefusal(error), choices: [] };
    }
  };

  const contextFor = (call: Call, shop: ShopFacts, text: string, given: ReadLine): Context => ({
    text,
    read: given,
    units: shop.units,
    fleet,
    last: shop.last,
    visit: shop.visit ?? null,
    place: call.place,
    attached: call.attached ?? [],
    again: async (line) => {
      const way = route(line, fleet);
      if ('refusal' in way) return { refusal: way.refusal, choices: [] };
      const refusal = await notAllowed(shop.visit, way.command);
      if (refusal !== null) return { refusal, choices: [] };
      const result = read(line, way, shop);
      if ('refusal' in result) return result;
      return await run(way.command, contextFor(call, shop, line, result.read));
    },
  });

  const recall: Desk['recall'] = async (call, of) => await kept.recall(call, of);

  const suggest: Desk['suggest'] = async (call, { parameter: name, typed }) => {
    const { given } = call;
    if (!('path' in given)) return [];
    const command = fleet.find((c) => c.path.join(' ') === given.path.join(' '));
    const parameter = command?.parameters.find((each) => each.name === name);
    if (parameter === undefined) return [];
    const { names, offers } = await facts(call);
    const { suggests } = parameter;
    const more = suggests === undefined ? [] : await offers?.(suggests);
    return suggestionsFor(parameter, typed, names, more);
  };

  const answerTo = async (call: Call): Promise<Answer> => {
    const shop = await facts(call);
    const pressed = 'pressed' in call.given ? await recall(call, call.given.pressed.of) : null;
    const request = await asked(call, shop, pressed);
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
    const context = contextFor(call, shop, text, request.read.read);
    const ran = await run(command, context);
    const reply = (await shop.settle?.(ran, context)) ?? ran;
    if ('refusal' in reply) return refused(reply.refusal, reply.choices);
    const card = { ...reply.card, choices: sendable(reply.card.choices) };
    const { effects, files } = reply;
    return { kind: 'card', card, effects, ...(files === undefined ? {} : { files }) };
  };

  const answer = async (call: Call): Promise<Answer> => {
    const given = await answerTo(call);
    await kept.keep(call, given);
    return given;
  };

  return {
    answer,
    recall,
    suggest,
    download: () => Promise.resolve(null),
    pinned: () => Promise.resolve([]),
    fleet,
  };
};

/** A shop that has said nothing about itself. */
export const plainShop =
  (units: ShopUnits): FactsOf =>
  () => ({ units, names: NO_NAMES, last: null });
