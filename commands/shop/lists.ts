import { z } from 'zod';
import { type Card, type Fact, line, row, type ShopThing } from '../../src/card/index.ts';
import {
  type Command,
  type Context,
  cardReply,
  defineCommand,
  type Lead,
  parameterOf,
  type Reply,
  said,
  type Visit,
} from '../../src/desk/index.ts';
import type { Refusal } from '../../src/refusal.ts';
import {
  findIn,
  type Kept,
  listOf,
  personById,
  type Register,
  removeFrom,
} from '../../src/shop/index.ts';
import type { Suggested } from '../../src/words/index.ts';
import { nameField, type Others } from './named.ts';
import { refused, shopCard, visiting } from './visit.ts';

/** Most of a list that one card shows. Judgement: what is still read; the export has all. */
const MOST_SHOWN = 40;

/** What the commands of one list have to know of what is on it. */
export type Listed<
  N extends 'wheel' | 'machine' | 'material' | 'rule',
  T extends { readonly name: string },
> = {
  readonly register: Register<N, T>;
  readonly what: ShopThing & N;
  /** The word of its commands: `/shop wheels`. */
  readonly verb: string;
  /** Examples of a name that is on the list, and of a line that puts one on it. */
  readonly name: string;
  readonly addLine: string;
  readonly lead: Lead;
  /** Where its names come from while somebody types one. */
  readonly suggests?: Suggested;
  readonly inShort: (visit: Visit, items: readonly T[]) => Promise<(item: T) => readonly Fact[]>;
  readonly facts: (visit: Visit, item: T) => Promise<readonly Fact[]>;
};

const NO_OTHERS: Others = () => [];

/** `/shop wheels` and `/shop wheels show <name>`: everybody may look. */
export const lookAt = <
  N extends 'wheel' | 'machine' | 'material' | 'rule',
  T extends { readonly name: string },
>(
  of: Listed<N, T>,
): readonly Command[] => [listCommand(of), showCommand(of)];

const listCommand = <
  N extends 'wheel' | 'machine' | 'material' | 'rule',
  T extends { readonly name: string },
>(
  of: Listed<N, T>,
): Command =>
  defineCommand({
    path: ['shop', of.verb, 'list'],
    examples: [`/shop ${of.verb}`],
    parameters: z.object({}),
    allowed: 'operator',
    run: (context) =>
      visiting(context, async (visit) => {
        const items = await listOf(visit.shop, of.register);
        return cardReply(listCard(context, of, items, await of.inShort(visit, items)));
      }),
  });

const listCard = <
  N extends 'wheel' | 'machine' | 'material' | 'rule',
  T extends { readonly name: string },
>(
  context: Context,
  of: Listed<N, T>,
  items: readonly Kept<T>[],
  inShort: (item: T) => readonly Fact[],
): Card => {
  const { what, verb } = of;
  if (items.length === 0) {
    return shopCard(context, { verb, headline: line('listedNone', { what, line: of.addLine }) });
  }
  const more = items.length - MOST_SHOWN;
  return shopCard(context, {
    verb,
    headline: line('listed', { what, count: items.length }),
    rows: items
      .slice(0, MOST_SHOWN)
      .map((item) => row('listItem', { name: item.name, facts: inShort(item) })),
    after: more > 0 ? [line('listedMore', { more })] : [],
    lists: { [verb]: items },
  });
};

const showCommand = <
  N extends 'wheel' | 'machine' | 'material' | 'rule',
  T extends { readonly name: string },
>(
  of: Listed<N, T>,
): Command =>
  defineCommand({
    path: ['shop', of.verb, 'show'],
    examples: [`/shop ${of.verb} show ${of.name}`],
    parameters: z.object({ name: nameField(NO_OTHERS, [of.name], of.suggests) }),
    lead: { name: 'name', read: of.lead },
    allowed: 'operator',
    run: (context, { name }) =>
      visiting(context, async (visit) => {
        if (name === undefined) return refused(nameless(of.name));
        const found = await findIn(visit.shop, of.register, name);
        return found.ok
          ? cardReply(await thingCard(context, visit, of, found.value, 'shown'))
          : refused(withWord(found.refusal, name));
      }),
  });

/** A thing with all that is known of it: shown, or after something was done to it. */
export const thingCard = async <
  N extends 'wheel' | 'machine' | 'material' | 'rule',
  T extends { readonly name: string },
>(
  context: Context,
  visit: Visit,
  of: Listed<N, T>,
  item: Kept<T>,
  did: 'shown' | 'added' | 'changed',
): Promise<Card> => {
  const { what, verb } = of;
  const { name, changedAt: at } = item;
  const by = (await personById(visit.shop, item.changedBy))?.name ?? '';
  const zone = visit.settings.timeZone;
  return shopCard(context, {
    verb,
    headline: did === 'shown' ? line('shown', { what, name }) : line('done', { did, what, name }),
    rows: (await of.facts(visit, item)).map((fact) => row('fact', fact)),
    after: did === 'shown' ? [line('lastChanged', { by, at, zone })] : [],
    lists: { [verb]: [item] },
  });
};

const evenInUse = said<true>({
  name: 'evenInUse',
  read: () => null,
  closed: true,
  values: [
    ['even in use', true],
    ['even if in use', true],
    ['all the same', true],
    ['anyway', true],
  ],
  examples: ['even in use'],
});

/** `/shop wheels remove <name>`. */
export const removeCommand = <
  N extends 'wheel' | 'machine' | 'material' | 'rule',
  T extends { readonly name: string },
>(
  of: Listed<N, T>,
  lead: (others: Others) => Lead,
): Command => {
  const others: Others = () => [parameterOf(evenInUse)];
  return defineCommand({
    path: ['shop', of.verb, 'remove'],
    examples: [`/shop ${of.verb} remove ${of.name}`],
    parameters: z.object({ name: nameField(others, [of.name], of.suggests), evenInUse }),
    lead: { name: 'name', read: lead(others) },
    allowed: 'supervisor',
    run: (context, given) =>
      visiting(context, async ({ shop }) => {
        const { name } = given;
        if (name === undefined) return refused(nameless(of.name));
        const found = await findIn(shop, of.register, name);
        if (!found.ok) return refused(withWord(found.refusal, name));
        const how = { evenInUse: given.evenInUse === true };
        const removed = await removeFrom(shop, of.register, found.value.id, how);
        return removed.ok
          ? cardReply(removedCard(context, of, removed.value.name))
          : stillThere(context, removed.refusal);
      }),
  });
};

const removedCard = <
  N extends 'wheel' | 'machine' | 'material' | 'rule',
  T extends { readonly name: string },
>(
  context: Context,
  { what, verb }: Listed<N, T>,
  name: string,
): Card => shopCard(context, { verb, headline: line('done', { did: 'removed', what, name }) });

/** What is in use can be removed all the same, by one more word. */
const stillThere = ({ text }: Context, refusal: Refusal): Reply => {
  if (refusal.code !== 'inUse') return refused(refusal);
  const words = `${text} even in use`;
  return { refusal, choices: [{ label: 'even in use', words }] };
};

export const nameless = (example: string): Refusal => ({
  code: 'missing',
  parameter: 'name',
  examples: [example],
});

/** What was not found is repeated, so that the slip in it can be seen. */
export const withWord = (refusal: Refusal, word: string): Refusal =>
  refusal.code === 'notFound' ? { ...refusal, word } : refusal;
