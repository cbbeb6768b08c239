import { MACHINES } from '../machines.ts';
import { MATERIALS_OF_SHOP } from '../materials.ts';
import { findIn, type Kept, type Register } from '../register.ts';
import { rulesHolding } from '../rules.ts';
import type { ShopView } from '../view.ts';
import { WHEELS } from '../wheels.ts';
import type { Scope } from './job.ts';

/** What is known of a thing, by the names of its facts. */
type Facts = Readonly<Record<string, unknown>>;

/** A thing of the shop's as it was at one moment. */
type Then = {
  readonly id: string;
  readonly name: string;
  readonly version: number;
  readonly facts: Facts;
};

/** What a standard rests on besides its own numbers, as it was when it was approved. */
export type Basis = {
  readonly wheel: Then | null;
  readonly machine: Then | null;
  readonly material: Then | null;
  readonly rules: readonly Then[];
};

type Thing = 'wheel' | 'machine' | 'material';

/** What a standard rests on is not what it was. */
export type BasisChange = {
  readonly what: Thing | 'rule';
  readonly name: string;
  readonly how: 'changed' | 'removed' | 'added';
  /** Which of its facts, where they are known. */
  readonly facts: readonly string[];
};

/** What says nothing about how a part comes out: a name, a drawer, and how often it was used. */
const BESIDE_THE_POINT = new Set([
  'id',
  'version',
  'changedAt',
  'changedBy',
  'name',
  'place',
  'partsRun',
  'note',
]);

const factsOf = (kept: Facts): Facts =>
  Object.fromEntries(Object.entries(kept).filter(([name]) => !BESIDE_THE_POINT.has(name)));

const asOfNow = <T extends { readonly name: string }>(kept: Kept<T>): Then => ({
  id: kept.id,
  name: kept.name,
  version: kept.version,
  facts: factsOf(kept),
});

const thingNow = async <N extends Thing, T extends { readonly name: string }>(
  view: ShopView,
  register: Register<N, T>,
  id: string | null,
): Promise<Then | null> => {
  if (id === null) return null;
  const found = await findIn(view, register, id);
  return found.ok ? asOfNow(found.value) : null;
};

/** What a standard rests on, as it is now. */
export const basisOf = async (view: ShopView, scope: Scope): Promise<Basis> => ({
  wheel: await thingNow(view, WHEELS, scope.wheel),
  machine: await thingNow(view, MACHINES, scope.machine),
  material: await thingNow(view, MATERIALS_OF_SHOP, scope.material),
  rules: (await rulesHolding(view, scope)).map(asOfNow),
});

const same = (a: unknown, b: unknown): boolean =>
  JSON.stringify(a ?? null) === JSON.stringify(b ?? null);

const changedFacts = (then: Facts, now: Facts): readonly string[] =>
  [...new Set([...Object.keys(then), ...Object.keys(now)])].filter(
    (name) => !same(then[name], now[name]),
  );

const thingChange = (
  what: BasisChange['what'],
  then: Then | null,
  now: Then | null,
): readonly BasisChange[] => {
  if (then === null) return [];
  const { name } = then;
  if (now === null) return [{ what, name, how: 'removed', facts: [] }];
  // A newer version may only have counted parts.
  const facts = then.version === now.version ? [] : changedFacts(then.facts, now.facts);
  return facts.length === 0 ? [] : [{ what, name, how: 'changed', facts }];
};

const ruleChanges = (then: Basis, now: Basis): readonly BasisChange[] => {
  const before = then.rules.flatMap((rule) =>
    thingChange('rule', rule, now.rules.find(({ id }) => id === rule.id) ?? null),
  );
  const added = now.rules
    .filter(({ id }) => then.rules.every((rule) => rule.id !== id))
    .map(({ name }): BasisChange => ({ what: 'rule', name, how: 'added', facts: [] }));
  return [...before, ...added];
};

/** What of it has changed since it was approved. */
export const changesSince = async (
  view: ShopView,
  scope: Scope,
  then: Basis | null,
): Promise<readonly BasisChange[]> => {
  if (then === null) return [];
  const now = await basisOf(view, scope);
  return [
    ...thingChange('wheel', then.wheel, now.wheel),
    ...thingChange('machine', then.machine, now.machine),
    ...thingChange('material', then.material, now.material),
    ...ruleChanges(then, now),
  ];
};
