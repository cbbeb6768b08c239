import { z } from 'zod';
import { type Fact, line, row } from '../../src/card/index.ts';
import {
  type Command,
  type Context,
  cardReply,
  defineCommand,
  type Named,
  parameterOf,
  type Reply,
  ROLES,
  type Role,
  said,
  type Visit,
} from '../../src/desk/index.ts';
import type { Refusal } from '../../src/refusal.ts';
import {
  findPerson,
  listGroups,
  listPeople,
  meetPerson,
  nameGroupRole,
  nameRole,
  removeGroup,
  removePerson,
  type ShopPerson,
} from '../../src/shop/index.ts';
import { nearestOf, plainText } from '../../src/words/index.ts';
import { nameless, withWord } from './lists.ts';
import { nameField, newName, type Others } from './named.ts';
import { refused, shopCard, visiting } from './visit.ts';

const NAME = 'Ben';

const role = said<Role>({
  name: 'role',
  read: () => null,
  closed: true,
  values: ROLES.map((each) => [each, each] as const),
  examples: ['engineer', 'supervisor'],
});

const others: Others = () => [parameterOf(role)];
const name = nameField(others, [NAME]);
const listed = nameField(others, [NAME], 'people');
const lead = { name: 'name', read: newName(others) } as const;

const roleless = {
  code: 'missing',
  parameter: 'role',
  examples: ['engineer', 'supervisor'],
} as const;

const roleFact = (of: Role): Fact => ({ name: 'role', amount: { kind: 'word', value: of } });

/** Who works here, and who may what. */
const list = defineCommand({
  path: ['shop', 'people', 'list'],
  examples: ['/shop people'],
  parameters: z.object({}),
  allowed: 'operator',
  run: (context) =>
    visiting(context, async ({ shop }) => {
      const people = await listPeople(shop);
      const groups = await listGroups(shop);
      const items = [...people, ...groups];
      return cardReply(
        shopCard(context, {
          verb: 'people',
          headline: line('listed', { what: 'person', count: people.length }),
          rows: items.map((one) =>
            row('listItem', { name: one.name, facts: [roleFact(one.role)] }),
          ),
          lists: { people, groups },
        }),
      );
    }),
});

const found = async (
  { shop, outsideId }: Visit,
  called: string | undefined,
  then: (person: ShopPerson) => Promise<Reply>,
): Promise<Reply> => {
  if (called === undefined) return refused(nameless(NAME));
  const person = await findPerson(shop, outsideId(called));
  return person.ok ? await then(person.value) : refused(withWord(person.refusal, called));
};

/** One person, and since when. */
const show = defineCommand({
  path: ['shop', 'people', 'show'],
  examples: [`/shop people show ${NAME}`],
  parameters: z.object({ name: listed }),
  lead,
  allowed: 'operator',
  run: (context, given) =>
    visiting(context, (visit) =>
      found(visit, given.name, (person) =>
        Promise.resolve(cardReply(personCard(context, visit, person))),
      ),
    ),
});

const personCard = (context: Context, { settings }: Visit, person: ShopPerson) =>
  shopCard(context, {
    verb: 'people',
    headline: line('shown', { what: 'person', name: person.name }),
    rows: [
      row('fact', roleFact(person.role)),
      row('fact', { name: 'outside', amount: { kind: 'text', value: person.outside } }),
      row('fact', {
        name: 'metAt',
        amount: { kind: 'moment', value: { at: person.metAt, zone: settings.timeZone } },
      }),
    ],
    lists: { people: [person] },
  });

const named = (context: Context, called: string, is: Role): Reply =>
  cardReply(
    shopCard(context, {
      verb: 'people',
      headline: line('roleNamed', { name: called, role: is }),
    }),
  );

/**
 * Whoever will come by that name or id. Where the platform tells people apart by ids, a name that
 * it does not know would be kept for somebody who never comes.
 */
const personCalled = async (
  { shop, outsideId, directory }: Visit,
  called: string,
): Promise<PersonCalled> => {
  if (directory === null) return { outside: outsideId(called), name: called };
  const known = directory.person(called);
  if (known !== null) return { outside: known.id, name: known.name };
  const met = await findPerson(shop, called);
  if (met.ok) return met.value;
  const nearest = met.refusal.code === 'notFound' ? met.refusal.nearest : [];
  return { refusal: { code: 'notFound', what: 'stranger', word: called, nearest } };
};

type PersonCalled =
  | { readonly outside: string; readonly name: string }
  | { readonly refusal: Refusal };

/** Somebody who has not spoken yet, by the name or id they will come with. */
const add = defineCommand({
  path: ['shop', 'people', 'add'],
  examples: [`/shop people add ${NAME} engineer`],
  parameters: z.object({ name, role }),
  lead,
  allowed: 'owner',
  run: (context, given) =>
    visiting(context, async (visit) => {
      if (given.name === undefined) return refused(nameless(NAME));
      const who = await personCalled(visit, given.name);
      if ('refusal' in who) return refused(who.refusal);
      const met = await meetPerson(visit.shop, who, given.role ?? 'operator');
      return met.ok ? named(context, met.value.name, met.value.role) : refused(met.refusal);
    }),
});

/** Gives a person another role. */
const change = defineCommand({
  path: ['shop', 'people', 'change'],
  examples: [`/shop people change ${NAME} supervisor`],
  parameters: z.object({ name: listed, role }),
  lead,
  allowed: 'owner',
  run: (context, given) =>
    visiting(context, (visit) =>
      found(visit, given.name, async (person) => {
        if (given.role === undefined) return refused(roleless);
        const result = await nameRole(visit.shop, person.id, given.role);
        return result.ok ? named(context, person.name, given.role) : refused(result.refusal);
      }),
    ),
});

/** Takes somebody off the list. */
const remove = defineCommand({
  path: ['shop', 'people', 'remove'],
  examples: [`/shop people remove ${NAME}`],
  parameters: z.object({ name: listed }),
  lead,
  allowed: 'owner',
  run: (context, given) =>
    visiting(context, (visit) =>
      found(visit, given.name, async (person) => {
        const result = await removePerson(visit.shop, person.id);
        if (!result.ok) return refused(result.refusal);
        const headline = line('done', { did: 'removed', what: 'person', name: person.name });
        return cardReply(shopCard(context, { verb: 'people', headline }));
      }),
    ),
});

const none = said<true>({
  name: 'none',
  read: () => null,
  closed: true,
  values: [['none', true]],
  examples: ['none'],
});
const groupOthers: Others = () => [parameterOf(role), parameterOf(none)];

/** The group as the platform knows it; a platform that says nothing takes any name. */
const groupCalled = ({ directory }: Visit, called: string): Named | null =>
  directory === null ? { id: called, name: called } : directory.group(called);

/** One that the platform has given up is still on the shop's own list. */
const ungrouped = async (context: Context, visit: Visit, called: string): Promise<Reply> => {
  const { shop } = visit;
  const listed = (await listGroups(shop)).find(
    ({ name: each }) => plainText(each) === plainText(called),
  );
  const outside = groupCalled(visit, called)?.id ?? listed?.outside ?? called;
  const removed = await removeGroup(shop, outside);
  if (!removed.ok) return refused(withWord(removed.refusal, called));
  const headline = line('done', { did: 'removed', what: 'group', name: removed.value.name });
  return cardReply(shopCard(context, { verb: 'people', headline }));
};

/** Gives the members of a platform's own group a role, or takes it from them. */
const group = defineCommand({
  path: ['shop', 'people', 'group'],
  examples: ['/shop people group Leads supervisor', '/shop people group Leads none'],
  parameters: z.object({ name: nameField(groupOthers, ['Leads']), role, none }),
  lead: { name: 'name', read: newName(groupOthers) },
  allowed: 'owner',
  run: (context, given) =>
    visiting(context, async (visit) => {
      const called = given.name;
      if (called === undefined) return refused(nameless('Leads'));
      if (given.none === true) return await ungrouped(context, visit, called);
      if (given.role === undefined) return refused(roleless);
      const found = groupCalled(visit, called);
      if (found === null) {
        const names = (visit.directory?.groups() ?? []).map((each) => each.name);
        const nearest = nearestOf(plainText(called), names);
        return refused(withWord({ code: 'notFound', what: 'group', nearest }, called));
      }
      const { id: outside, name: its } = found;
      const result = await nameGroupRole(visit.shop, { outside, name: its }, given.role);
      return result.ok ? named(context, its, given.role) : refused(result.refusal);
    }),
});

export const people: readonly Command[] = [list, show, add, change, remove, group];
