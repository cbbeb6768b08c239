import { listGroups, type RoleGroup } from './groups.ts';
import { listPeople, type ShopPerson } from './people.ts';
import { atLeast, ROLES, type Role } from './roles.ts';
import type { ShopView } from './view.ts';

/** Those who are told of something, by themselves or by the platform's group they are in. */
export type Tellable = {
  readonly people: readonly ShopPerson[];
  readonly groups: readonly RoleGroup[];
};

/**
 * Those of a role, but for whoever it comes from; where there is nobody, those of the next role
 * above. Only they are told: the others of the channel can read it.
 */
export const toTell = async (view: ShopView, role: Role, from: string): Promise<Tellable> => {
  const everybody = (await listPeople(view)).filter(({ id }) => id !== from);
  const groups = await listGroups(view);
  for (const one of ROLES.filter((each) => atLeast(each, role))) {
    const of = <T extends { readonly role: Role }>(list: readonly T[]): readonly T[] =>
      list.filter((each) => each.role === one);
    const told = { people: of(everybody), groups: of(groups) };
    if (told.people.length + told.groups.length > 0) return told;
  }
  return { people: [], groups: [] };
};
