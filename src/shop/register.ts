import type { Refusal, Use } from '../refusal.ts';
import {
  type RegisterName,
  readRegister,
  type Tables,
  type Written,
  writeRegister,
} from '../store/index.ts';
import { type Remembered, remember } from './history.ts';
import { cleaned, keyOf, LONGEST_NAME, textFault } from './names.ts';
import type { Done } from './result.ts';
import { done, refused } from './result.ts';
import type { ShopChange, ShopView } from './view.ts';

/** One kind of thing a shop keeps a list of: how it lies in the table and what it must keep to. */
export type Register<N extends RegisterName, T extends { readonly name: string }> = {
  readonly subject: N;
  readonly toRow: (content: T) => Omit<Written<N>, 'name' | 'name_key'>;
  readonly fromRow: (row: Tables[N]) => T;
  /** What is wrong with it, the name apart. */
  readonly fault: (content: T) => Refusal | null;
  /** Where it is in use, at most this many. */
  readonly uses: (view: ShopView, id: string, most: number) => Promise<readonly Use[]>;
};

/** A thing of a list with what the list knows of it. */
export type Kept<T> = T & {
  readonly id: string;
  /** Counts changes; name it when you change what you have seen. */
  readonly version: number;
  readonly changedAt: number;
  readonly changedBy: string;
};

/** Uses that are named before a removal. Judgement: enough to know what it is about. */
const USES_SHOWN = 5;

const kept = <N extends RegisterName, T extends { readonly name: string }>(
  register: Register<N, T>,
  row: Tables[N],
): Kept<T> => ({
  ...register.fromRow(row),
  id: row.id,
  version: row.version,
  changedAt: row.changed_at,
  changedBy: row.changed_by,
});

/** The whole list, by name. */
export const listOf = async <N extends RegisterName, T extends { readonly name: string }>(
  view: ShopView,
  register: Register<N, T>,
): Promise<readonly Kept<T>[]> =>
  (await readRegister(view.db, register.subject, view.id).list()).map((row) => kept(register, row));

/** The one of this name, or of this id; otherwise the names that may have been meant. */
export const findIn = async <N extends RegisterName, T extends { readonly name: string }>(
  view: ShopView,
  register: Register<N, T>,
  said: string,
): Promise<Done<Kept<T>>> => {
  const rows = readRegister(view.db, register.subject, view.id);
  const key = keyOf(view.words, said);
  const row = (await rows.byName(key)) ?? (await rows.byId(said));
  if (row !== undefined) return done(kept(register, row));
  const nearest = view.words.nearestOf(key, await rows.names());
  return refused({ code: 'notFound', what: register.subject, nearest });
};

/** Puts a new one on the list. */
export const addTo = async <N extends RegisterName, T extends { readonly name: string }>(
  change: ShopChange,
  register: Register<N, T>,
  given: T,
): Promise<Done<Kept<T>>> => {
  const content = { ...given, name: cleaned(given.name) };
  const fault = faultOf(register, content);
  if (fault !== null) return refused(fault);
  const id = change.db.newId(change.at);
  const added = await addRows(change, register, [{ id, content }]);
  if (!added.has(id)) {
    return refused({ code: 'taken', what: register.subject, name: content.name });
  }
  return await findIn(change, register, id);
};

/** Writes many at once. What is not among the ids given back has a name that is taken. */
export const addRows = async <N extends RegisterName, T extends { readonly name: string }>(
  change: ShopChange,
  register: Register<N, T>,
  items: readonly { readonly id: string; readonly content: T }[],
): Promise<ReadonlySet<string>> => {
  const rows = items.map(({ id, content }) => ({ ...written(change, register, content), id }));
  const added = await writeRegister(change.db, register.subject, change.id).add(rows, change);
  const lines = items
    .filter(({ id }) => added.has(id))
    .map(
      ({ id, content }): Remembered => ({
        subjectId: id,
        verb: 'added',
        before: null,
        after: content,
      }),
    );
  await remember(change, register.subject, lines);
  return added;
};

/** Changes what is said and leaves the rest. With a version: only if that is still the last one. */
export const changeIn = async <N extends RegisterName, T extends { readonly name: string }>(
  change: ShopChange,
  register: Register<N, T>,
  id: string,
  patch: Partial<T>,
  version?: number,
): Promise<Done<Kept<T>>> => {
  const before = await readRegister(change.db, register.subject, change.id).byId(id);
  if (before === undefined) return await findIn(change, register, id);
  if (version !== undefined && version !== before.version) return stale(change, before);
  const old = register.fromRow(before);
  const merged = { ...old, ...patch };
  const content = { ...merged, name: cleaned(merged.name) };
  const fault = faultOf(register, content) ?? (await nameFault(change, register, id, content.name));
  if (fault !== null) return refused(fault);
  const rows = writeRegister(change.db, register.subject, change.id);
  if (!(await rows.change(id, before.version, written(change, register, content), change))) {
    return stale(change, before);
  }
  await remember(change, register.subject, [
    { subjectId: id, verb: 'changed', before: old, after: content },
  ]);
  return await findIn(change, register, id);
};

/** Takes one off the list. What uses it is named first, and only then, if said, it goes. */
export const removeFrom = async <N extends RegisterName, T extends { readonly name: string }>(
  change: ShopChange,
  register: Register<N, T>,
  id: string,
  how: { readonly evenInUse?: boolean; readonly version?: number } = {},
): Promise<Done<Kept<T>>> => {
  const row = await readRegister(change.db, register.subject, change.id).byId(id);
  if (row === undefined) return await findIn(change, register, id);
  if (how.version !== undefined && how.version !== row.version) return stale(change, row);
  const uses = how.evenInUse === true ? [] : await register.uses(change, id, USES_SHOWN + 1);
  if (uses.length > 0) {
    const where = uses.slice(0, USES_SHOWN);
    const more = uses.length > USES_SHOWN;
    return refused({ code: 'inUse', what: register.subject, name: row.name, where, more });
  }
  const rows = writeRegister(change.db, register.subject, change.id);
  if (!(await rows.remove(id, row.version, change))) return stale(change, row);
  await remember(change, register.subject, [
    { subjectId: id, verb: 'removed', before: register.fromRow(row), after: null },
  ]);
  return done(kept(register, row));
};

/** What is wrong with one, its name included. */
export const faultOf = <N extends RegisterName, T extends { readonly name: string }>(
  register: Register<N, T>,
  content: T,
): Refusal | null => textFault('name', content.name, LONGEST_NAME) ?? register.fault(content);

const written = <N extends RegisterName, T extends { readonly name: string }>(
  view: ShopView,
  register: Register<N, T>,
  content: T,
): Written<N> =>
  ({
    ...register.toRow(content),
    name: content.name,
    name_key: keyOf(view.words, content.name),
  }) as Written<N>;

const nameFault = async <N extends RegisterName, T extends { readonly name: string }>(
  change: ShopChange,
  register: Register<N, T>,
  id: string,
  name: string,
): Promise<Refusal | null> => {
  const rows = readRegister(change.db, register.subject, change.id);
  const holder = await rows.byName(keyOf(change.words, name));
  return holder === undefined || holder.id === id
    ? null
    : { code: 'taken', what: register.subject, name };
};

const stale = async (
  view: ShopView,
  row: { readonly name: string; readonly changed_by: string; readonly changed_at: number },
): Promise<Done<never>> => {
  const person = await view.db
    .selectFrom('person')
    .select('name')
    .where('shop', '=', view.id)
    .where('id', '=', row.changed_by)
    .executeTakeFirst();
  return refused({
    code: 'stale',
    what: row.name,
    by: person?.name ?? '',
    when: new Date(row.changed_at).toISOString(),
  });
};
