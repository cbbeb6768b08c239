import { materialById } from '../calc/index.ts';
import type { Refusal } from '../refusal.ts';
import { cleaned, LONGEST_TEXT, textFault } from './names.ts';
import { addTo, type Kept, listOf, type Register } from './register.ts';
import { type Done, refused } from './result.ts';
import type { ShopChange, ShopView } from './view.ts';

/** A sentence of the shop's own that stands on its cards: on all, or where it belongs. */
export type Rule = {
  /** A number, given when it is added and never given again. */
  readonly name: string;
  readonly text: string;
  /** Only on cards for this machine: its id. */
  readonly machine: string | null;
  /** Only for this material of the shop's own: its id. */
  readonly material: string | null;
  /** Only for this row of the table of materials. */
  readonly base: string | null;
};

const fault = (rule: Rule): Refusal | null => {
  if (rule.base !== null && materialById(rule.base) === undefined) {
    return { code: 'notFound', what: 'material', nearest: [] };
  }
  return textFault('rule', cleaned(rule.text), LONGEST_TEXT, [
    'Coolant on before the wheel touches',
  ]);
};

export const RULES: Register<'rule', Rule> = {
  subject: 'rule',
  fault,
  uses: () => Promise.resolve([]),
  toRow: ({ text, machine, material, base }) => ({ text: cleaned(text), machine, material, base }),
  fromRow: ({ name, text, machine, material, base }) => ({ name, text, machine, material, base }),
};

/** Two people may add a rule at once and both see the same last number. Judgement. */
const TRIES = 5;

/** Adds a rule under the next number. */
export const addRule = async (
  change: ShopChange,
  rule: Omit<Rule, 'name'>,
): Promise<Done<Kept<Rule>>> => {
  const fault = await scopeFault(change, rule);
  if (fault !== null) return refused(fault);
  let added = await addTo(change, RULES, { ...rule, name: await nextNumber(change) });
  for (let tries = 1; isTaken(added) && tries < TRIES; tries += 1) {
    added = await addTo(change, RULES, { ...rule, name: await nextNumber(change) });
  }
  return added;
};

const isTaken = (result: Done<unknown>): boolean => !result.ok && result.refusal.code === 'taken';

const nextNumber = async (change: ShopChange): Promise<string> => {
  const rows = await change.db
    .selectFrom('rule')
    .select('name')
    .where('shop', '=', change.id)
    .execute();
  const last = rows.reduce((most, { name }) => Math.max(most, Number(name) || 0), 0);
  return String(last + 1);
};

/** A rule for something that is not on this shop's lists would never be seen. */
const scopeFault = async (
  change: ShopChange,
  rule: Omit<Rule, 'name'>,
): Promise<Refusal | null> => {
  for (const what of ['machine', 'material'] as const) {
    const id = rule[what];
    if (id === null) continue;
    const row = await change.db
      .selectFrom(what)
      .select('id')
      .where('shop', '=', change.id)
      .where('id', '=', id)
      .where('removed_at', 'is', null)
      .executeTakeFirst();
    if (row === undefined) return { code: 'notFound', what, nearest: [] };
  }
  return null;
};

/** What a card is about, as far as rules care. */
export type RuleScope = {
  readonly machine: string | null;
  readonly material: string | null;
  readonly base: string | null;
};

/** The rules that hold for it, in the order of their numbers. */
export const rulesHolding = async (
  view: ShopView,
  scope: RuleScope,
): Promise<readonly Kept<Rule>[]> => {
  const holds = (rule: Rule): boolean =>
    (rule.machine === null || rule.machine === scope.machine) &&
    (rule.material === null || rule.material === scope.material) &&
    (rule.base === null || rule.base === scope.base);
  return (await listOf(view, RULES)).filter(holds).sort((a, b) => Number(a.name) - Number(b.name));
};

/** The sentences that belong on a card, in the order of their numbers. */
export const rulesOnCard = async (view: ShopView, scope: RuleScope): Promise<readonly string[]> =>
  (await rulesHolding(view, scope)).map(({ text }) => text);
