import type { PersonTable } from '../store/index.ts';
import { remember } from './history.ts';
import { cleaned, keyOf, LONGEST_NAME, textFault } from './names.ts';
import { type Done, done, refused } from './result.ts';
import { atLeast, ROLES, type Role, roleOf } from './roles.ts';
import type { ShopChange, ShopView } from './view.ts';

export type ShopPerson = {
  readonly id: string;
  /** As the platform knows them. */
  readonly outside: string;
  readonly name: string;
  /** What they may in their own name; a group they are in may give them more. */
  readonly role: Role;
  readonly version: number;
  readonly metAt: number;
};

export const personOf = (row: PersonTable): ShopPerson => ({
  id: row.id,
  outside: row.outside,
  name: row.name,
  role: roleOf(row.role),
  version: row.version,
  metAt: row.met_at,
});

const rowsOf = (view: ShopView) =>
  view.db
    .selectFrom('person')
    .selectAll()
    .where('shop', '=', view.id)
    .where('removed_at', 'is', null);

/** Everybody the shop has met, by name. */
export const listPeople = async (view: ShopView): Promise<readonly ShopPerson[]> =>
  (await rowsOf(view).orderBy('name_key').orderBy('id').execute()).map(personOf);

/** The person of this id, of ours or the platform's. */
export const personById = async (view: ShopView, id: string): Promise<ShopPerson | null> => {
  const row = await rowsOf(view)
    .where((eb) => eb.or([eb('id', '=', id), eb('outside', '=', id)]))
    .executeTakeFirst();
  return row === undefined ? null : personOf(row);
};

/** The one of this name or id; two of one name are a question, not a guess. */
export const findPerson = async (view: ShopView, said: string): Promise<Done<ShopPerson>> => {
  const byId = await personById(view, said);
  if (byId !== null) return done(byId);
  const key = keyOf(view.words, said);
  const [row, second] = await rowsOf(view).where('name_key', '=', key).limit(2).execute();
  if (row === undefined) {
    const people = await listPeople(view);
    const nearest = view.words.nearestOf(
      key,
      people.map(({ name }) => name),
    );
    return refused({ code: 'notFound', what: 'person', nearest });
  }
  if (second === undefined) return done(personOf(row));
  const readings = [row, second].map(({ name, outside }) => ({
    label: `${name} (${outside})`,
    words: outside,
  }));
  return refused({ code: 'unclear', what: said, readings });
};

/** Those who may do what a role may, by name: whom a refusal names. */
export const whoMay = async (view: ShopView, role: Role): Promise<readonly string[]> => {
  const enough = ROLES.filter((one) => atLeast(one, role));
  const people = await rowsOf(view).where('role', 'in', enough).orderBy('name_key').execute();
  const groups = await view.db
    .selectFrom('person_group')
    .select('name')
    .where('shop', '=', view.id)
    .where('removed_at', 'is', null)
    .where('role', 'in', enough)
    .orderBy('name_key')
    .execute();
  return [...people.map(({ name }) => name), ...groups.map(({ name }) => name)];
};

/** Gives a person a role. The last owner keeps theirs until somebody else has it. */
export const nameRole = async (
  change: ShopChange,
  person: string,
  role: Role,
): Promise<Done<ShopPerson>> => {
  const before = await personById(change, person);
  if (before === null) return refused({ code: 'notFound', what: 'person', nearest: [] });
  if (role !== 'owner' && (await isLastOwner(change, before))) {
    return refused({ code: 'lastOwner', name: before.name });
  }
  await change.db
    .updateTable('person')
    .set({ role, version: before.version + 1 })
    .where('shop', '=', change.id)
    .where('id', '=', before.id)
    .execute();
  const after = { ...before, role, version: before.version + 1 };
  await remember(change, 'person', [
    { subjectId: before.id, verb: 'changed', before: said(before), after: said(after) },
  ]);
  return done(after);
};

/** Takes a person off the list. Their cards stay; if they speak again they are met anew. */
export const removePerson = async (
  change: ShopChange,
  person: string,
): Promise<Done<ShopPerson>> => {
  const before = await personById(change, person);
  if (before === null) return refused({ code: 'notFound', what: 'person', nearest: [] });
  if (await isLastOwner(change, before)) return refused({ code: 'lastOwner', name: before.name });
  await change.db
    .updateTable('person')
    .set({ removed_at: change.at, role: 'operator', version: before.version + 1 })
    .where('shop', '=', change.id)
    .where('id', '=', before.id)
    .execute();
  await remember(change, 'person', [
    { subjectId: before.id, verb: 'removed', before: said(before), after: null },
  ]);
  return done(before);
};

/** Puts somebody on the list who has not come in yet, by the id they will come with. */
export const meetPerson = async (
  change: ShopChange,
  who: { readonly outside: string; readonly name: string },
  role: Role,
): Promise<Done<ShopPerson>> => {
  const name = cleaned(who.name);
  const fault = textFault('name', name, LONGEST_NAME);
  if (fault !== null) return refused(fault);
  const fresh = {
    shop: change.id,
    id: change.db.newId(change.at),
    outside: who.outside,
    name,
    name_key: keyOf(change.words, name),
    role,
    version: 1,
    met_at: change.at,
    removed_at: null,
  };
  const row = await change.db
    .insertInto('person')
    .values(fresh)
    .onConflict((oc) => oc.columns(['shop', 'outside']).doNothing())
    .returningAll()
    .executeTakeFirst();
  if (row === undefined) return refused({ code: 'taken', what: 'person', name });
  const person = personOf(row);
  await remember(change, 'person', [
    { subjectId: person.id, verb: 'added', before: null, after: said(person) },
  ]);
  return done(person);
};

const said = ({ name, outside, role }: ShopPerson) => ({ name, outside, role });

const isLastOwner = async (change: ShopChange, person: ShopPerson): Promise<boolean> => {
  if (person.role !== 'owner') return false;
  // Writing the shop's own row first puts two such changes in a line: two owners who remove each
  // other at the same moment would otherwise each see the other still there.
  await change.db
    .updateTable('shop')
    .set((eb) => ({ name: eb.ref('name') }))
    .where('id', '=', change.id)
    .execute();
  const owners = await rowsOf(change).where('role', '=', 'owner').execute();
  return owners.every(({ id }) => id === person.id);
};
