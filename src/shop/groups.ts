import { remember } from './history.ts';
import { cleaned, keyOf } from './names.ts';
import { type Done, done, refused } from './result.ts';
import { type Role, roleOf } from './roles.ts';
import type { ShopChange, ShopView } from './view.ts';

/** A role or user group of the platform whose members have a role in the shop. */
export type RoleGroup = {
  readonly id: string;
  readonly outside: string;
  readonly name: string;
  readonly role: Role;
};

const rowsOf = (view: ShopView) =>
  view.db
    .selectFrom('person_group')
    .selectAll()
    .where('shop', '=', view.id)
    .where('removed_at', 'is', null);

export const listGroups = async (view: ShopView): Promise<readonly RoleGroup[]> =>
  (await rowsOf(view).orderBy('name_key').execute()).map((row) => ({
    id: row.id,
    outside: row.outside,
    name: row.name,
    role: roleOf(row.role),
  }));

/** The roles that these groups of the platform give. */
export const rolesOfGroups = async (
  view: ShopView,
  outside: readonly string[],
): Promise<readonly Role[]> => {
  if (outside.length === 0) return [];
  const rows = await rowsOf(view)
    .where('outside', 'in', [...outside])
    .execute();
  return rows.map(({ role }) => roleOf(role));
};

/** Gives the members of a group a role, or another one than before. */
export const nameGroupRole = async (
  change: ShopChange,
  group: { readonly outside: string; readonly name: string },
  role: Role,
): Promise<Done<RoleGroup>> => {
  const name = cleaned(group.name);
  const before = (await listGroups(change)).find(({ outside }) => outside === group.outside);
  const fresh = {
    shop: change.id,
    id: change.db.newId(change.at),
    outside: group.outside,
    name,
    name_key: keyOf(change.words, name),
    role,
    version: 1,
    made_at: change.at,
    removed_at: null,
  };
  const { id } = await change.db
    .insertInto('person_group')
    .values(fresh)
    .onConflict((oc) =>
      oc
        .columns(['shop', 'outside'])
        .doUpdateSet({ name, name_key: fresh.name_key, role, removed_at: null }),
    )
    .returning('id')
    .executeTakeFirstOrThrow();
  const verb = before === undefined ? 'added' : 'changed';
  const after = { outside: group.outside, name, role };
  await remember(change, 'group', [{ subjectId: id, verb, before: before ?? null, after }]);
  return done({ id, ...after });
};

export const removeGroup = async (
  change: ShopChange,
  outside: string,
): Promise<Done<RoleGroup>> => {
  const before = (await listGroups(change)).find((group) => group.outside === outside);
  if (before === undefined) return refused({ code: 'notFound', what: 'group', nearest: [] });
  await change.db
    .updateTable('person_group')
    .set({ removed_at: change.at })
    .where('shop', '=', change.id)
    .where('id', '=', before.id)
    .execute();
  await remember(change, 'group', [{ subjectId: before.id, verb: 'removed', before, after: null }]);
  return done(before);
};
