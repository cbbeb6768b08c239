import { z } from 'zod';
import { type Command, cardReply, defineCommand, type Reply, said } from '../../src/desk/index.ts';
import {
  addRule,
  findIn,
  listOf,
  MACHINES,
  MATERIALS_OF_SHOP,
  RULES,
  type Rule,
  type ShopView,
} from '../../src/shop/index.ts';
import {
  freeMaterial,
  type MaterialWords,
  nameOf,
  textOf,
  tokenAt,
  vocabularyOf,
} from '../../src/words/index.ts';
import { changed } from './changes.ts';
import { ruleFacts } from './facts.ts';
import { type Listed, lookAt, removeCommand, thingCard } from './lists.ts';
import { newName, recordsOf } from './named.ts';
import { refused, visiting } from './visit.ts';

const onlyOn = said<string>({
  name: 'onlyOn',
  read: nameOf('machine', (names) => names.machines),
  keywords: ['only on'],
  suggests: 'machines',
  examples: ['only on Big lathe'],
});

const onlyFor = said<MaterialWords>({
  name: 'onlyFor',
  read: freeMaterial,
  keywords: ['only for'],
  suggests: 'materials',
  examples: ['only for 304'],
});

const scope = { onlyOn, onlyFor };
const records = recordsOf(scope);

/** The sentence itself: everything up to where it says what it is only for. */
const ruleText = said<string>({
  name: 'rule',
  read: textOf(() => vocabularyOf(records())),
  keywords: ['rule', 'text', 'to'],
  text: true,
  examples: ['"Coolant on before the wheel touches"'],
});

/** Rules go by their numbers. */
const number = said<string>({
  name: 'name',
  read: (cursor) => numberAt(cursor),
  keywords: ['number', 'name'],
  examples: ['2'],
});

const numberAt = (cursor: Parameters<typeof tokenAt>[0]) => {
  const text = tokenAt(cursor)?.text ?? '';
  return /^\d{1,6}$/u.test(text) ? { value: text, used: 1 } : null;
};

/** The names of everything a rule may be for, by their ids. */
const namesIn = async (shop: ShopView): Promise<ReadonlyMap<string, string>> => {
  const things = [...(await listOf(shop, MACHINES)), ...(await listOf(shop, MATERIALS_OF_SHOP))];
  return new Map(things.map(({ id, name }) => [id, name]));
};

export const ruleList: Listed<'rule', Rule> = {
  register: RULES,
  what: 'rule',
  verb: 'rules',
  name: '1',
  addLine: '/shop rules add Coolant on before the wheel touches',
  lead: numberAt,
  inShort: async ({ shop }) => {
    const names = await namesIn(shop);
    return (rule) => ruleFacts(rule, names);
  },
  facts: async ({ shop }, rule) => ruleFacts(rule, await namesIn(shop)),
};

type ScopeSaid = {
  readonly onlyOn?: string | undefined;
  readonly onlyFor?: MaterialWords | undefined;
};

/** Ids of what a rule is only for. */
const scopeOf = async (
  shop: ShopView,
  said: ScopeSaid,
): Promise<Omit<Rule, 'name' | 'text'> | Reply> => {
  const machine = said.onlyOn === undefined ? null : await findIn(shop, MACHINES, said.onlyOn);
  if (machine?.ok === false) return refused(machine.refusal);
  const { onlyFor } = said;
  if (onlyFor?.own === undefined) {
    return { machine: machine?.value.id ?? null, material: null, base: onlyFor?.usual ?? null };
  }
  const material = await findIn(shop, MATERIALS_OF_SHOP, onlyFor.own);
  return material.ok
    ? { machine: machine?.value.id ?? null, material: material.value.id, base: null }
    : refused(material.refusal);
};

/** A sentence that stands on every card from now on. */
const add = defineCommand({
  path: ['shop', 'rules', 'add'],
  examples: [ruleList.addLine, '/shop rules add Tailstock always only on Big lathe'],
  parameters: z.object({ rule: ruleText, ...scope }),
  lead: { name: 'rule', read: newName(records) },
  allowed: 'supervisor',
  run: (context, given) =>
    visiting(context, async (visit) => {
      if (given.rule === undefined) {
        return refused({ code: 'missing', parameter: 'rule', examples: [ruleList.addLine] });
      }
      const for_ = await scopeOf(visit.shop, given);
      if (!('base' in for_)) return for_;
      const result = await addRule(visit.shop, { ...for_, text: given.rule });
      return result.ok
        ? cardReply(await thingCard(context, visit, ruleList, result.value, 'added'))
        : refused(result.refusal);
    }),
});

/** Another sentence under the same number, or another place for it. */
const change = defineCommand({
  path: ['shop', 'rules', 'change'],
  examples: ['/shop rules change 1 to Coolant on, guard down'],
  parameters: z.object({ name: number, rule: ruleText, ...scope }),
  lead: { name: 'name', read: numberAt },
  allowed: 'supervisor',
  run: (context, given) =>
    visiting(context, async ({ shop }) => {
      const for_ = await scopeOf(shop, given);
      if (!('base' in for_)) return for_;
      const isScoped = given.onlyOn !== undefined || given.onlyFor !== undefined;
      return await changed(context, ruleList, given.name, {
        ...(given.rule === undefined ? {} : { text: given.rule }),
        ...(isScoped ? for_ : {}),
      });
    }),
});

export const rules: readonly Command[] = [
  ...lookAt(ruleList),
  add,
  change,
  removeCommand(ruleList, () => numberAt),
];
