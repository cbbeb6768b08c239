import { type PersonTable, type Tx } from '../store/index.ts';
import { rolesOfGroups } from './groups.ts';
import { remember } from './history.ts';
import { cleaned, keyOf } from './names.ts';
import { personOf, type ShopPerson } from './people.ts';
import { highest, type Role } from './roles.ts';
import type { ShopChange, ShopView, ShopWords } from './view.ts';

/** A shop as its platform knows it. */
export type ShopOutside = {
  /** discord, slack, terminal … */
  readonly platform: string;
  readonly id: string;
  readonly name: string;
};

/** A person as their platform knows them. */
export type PersonOutside = {
  readonly id: string;
  readonly name: string;
  /** The platform's own roles or user groups they are in. */
  readonly groups: readonly string[];
  /**
   * Manages the server, or installed the app. Null where the platform knows no such thing: then
   * the first person of a new shop is its owner.
   */
  readonly manages: boolean | null;
};

export type Entered = {
  /** The shop, opened for changes by this person. */
  readonly change: ShopChange;
  readonly person: ShopPerson;
  /** What the person may, everything taken together. */
  readonly role: Role;
  /** The shop was not known before. */
  readonly isNew: boolean;
};

/** Finds the shop and the person, and makes them where they come for the first time. */
export const enterShop = async (
  tx: Tx,
  words: ShopWords,
  shop: ShopOutside,
  person: PersonOutside,
  at: number,
): Promise<Entered> => {
  const known = await shopOf(tx, shop);
  const made = known === null ? await makeShop(tx, shop, at) : null;
  // Two may come first at once: the one whose row was kept made the shop.
  const id = known ?? made ?? (await shopOf(tx, shop));
  if (id === null) throw new Error('a shop that was just made is not there');
  const view: ShopView = { id, db: tx, words };
  const first = made !== null && person.manages === null;
  const row = await meet(tx, view, person, at, first ? 'owner' : 'operator');
  const change: ShopChange = { ...view, db: tx, by: row.id, at };
  if (first) await rememberFirst(change, row);
  const met = personOf(row);
  return { change, person: met, role: await roleIn(change, met, person), isNew: made !== null };
};

/** The shop's id of ours, or null where it is not known. */
export const shopOf = async (
  db: ShopView['db'],
  { platform, id }: Pick<ShopOutside, 'platform' | 'id'>,
): Promise<string | null> => {
  const row = await db
    .selectFrom('shop')
    .select('id')
    .where('platform', '=', platform)
    .where('outside', '=', id)
    .executeTakeFirst();
  return row?.id ?? null;
};

const makeShop = async (tx: Tx, shop: ShopOutside, at: number): Promise<string | null> => {
  const { platform, id: outside } = shop;
  const row = await tx
    .insertInto('shop')
    .values({ id: tx.newId(at), platform, outside, name: cleaned(shop.name), made_at: at })
    .onConflict((oc) => oc.columns(['platform', 'outside']).doNothing())
    .returning('id')
    .executeTakeFirst();
  return row?.id ?? null;
};

/** The person's row, made or brought up to the name they go by today. */
const meet = async (
  tx: Tx,
  view: ShopView,
  person: PersonOutside,
  at: number,
  role: Role,
): Promise<PersonTable> => {
  const name = cleaned(person.name) || person.id;
  const name_key = keyOf(view.words, name);
  const known = await personRow(tx, view, person.id);
  if (known?.name === name && known.removed_at === null) return known;
  return await tx
    .insertInto('person')
    .values({
      shop: view.id,
      id: tx.newId(at),
      outside: person.id,
      name,
      name_key,
      role,
      version: 1,
      met_at: at,
      removed_at: null,
    })
    .onConflict((oc) =>
      oc.columns(['shop', 'outside']).doUpdateSet({ name, name_key, removed_at: null }),
    )
    .returningAll()
    .executeTakeFirstOrThrow();
};

const personRow = (tx: Tx, view: ShopView, outside: string): Promise<PersonTable | undefined> =>
  tx
    .selectFrom('person')
    .selectAll()
    .where('shop', '=', view.id)
    .where('outside', '=', outside)
    .executeTakeFirst();

const rememberFirst = (change: ShopChange, row: PersonTable): Promise<void> => {
  const { name, outside, role } = row;
  const after = { name, outside, role };
  return remember(change, 'person', [{ subjectId: row.id, verb: 'added', before: null, after }]);
};

/** Their own role, their groups', and the manager's for as long as nobody was named owner. */
const roleIn = async (
  view: ShopView,
  person: ShopPerson,
  { groups, manages }: PersonOutside,
): Promise<Role> => {
  const role = highest([person.role, ...(await rolesOfGroups(view, groups))]);
  if (manages !== true || role === 'owner') return role;
  const named = await view.db
    .selectFrom('person')
    .select('id')
    .where('shop', '=', view.id)
    .where('role', '=', 'owner')
    .where('removed_at', 'is', null)
    .limit(1)
    .executeTakeFirst();
  return named === undefined ? 'owner' : role;
};
