import { REST, Routes } from 'discord.js';
import { z } from 'zod';
import type { Command } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { commandsFor, type Registered } from './commands.ts';

/** What Discord says of a command that it has. */
const kept = z.looseObject({
  id: z.string(),
  type: z.number(),
  name: z.string(),
  description: z.string().nullish(),
  options: z.array(z.unknown()).nullish(),
  contexts: z.array(z.number()).nullish(),
  integration_types: z.array(z.number()).nullish(),
});
type Kept = z.infer<typeof kept>;

const SAID = new Set([
  'type',
  'name',
  'description',
  'options',
  'choices',
  'value',
  'required',
  'autocomplete',
  'min_value',
  'max_value',
  'contexts',
  'integration_types',
]);

/** Nothing, no, an empty list and an empty text are one to Discord. */
const says = (value: unknown): boolean =>
  value !== undefined &&
  value !== null &&
  value !== false &&
  value !== '' &&
  !(Array.isArray(value) && value.length === 0);

/** What two commands are compared by: only what is ours to say, in one order. */
const essence = (value: unknown): unknown => {
  if (Array.isArray(value)) return value.map(essence);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .filter(([key, each]) => SAID.has(key) && says(each))
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, each]) => [key, essence(each)]),
  );
};

const keyOf = ({ type, name }: { type: number; name: string }): string => `${String(type)} ${name}`;

export type Difference = {
  readonly added: readonly Registered[];
  readonly changed: readonly Registered[];
  readonly removed: readonly Kept[];
  readonly same: readonly Registered[];
};

export const difference = (wanted: readonly Registered[], there: readonly Kept[]): Difference => {
  const known = new Map(there.map((command) => [keyOf(command), command]));
  const isSame = (command: Registered): boolean =>
    JSON.stringify(essence(command)) === JSON.stringify(essence(known.get(keyOf(command))));
  const names = new Set(wanted.map(keyOf));
  const old = wanted.filter((command) => known.has(keyOf(command)));
  return {
    added: wanted.filter((command) => !known.has(keyOf(command))),
    changed: old.filter((command) => !isSame(command)),
    removed: there.filter((command) => !names.has(keyOf(command))),
    same: old.filter(isSame),
  };
};

export type RegisterOptions = {
  readonly token: string;
  readonly application: string;
  /** One server, where changes show at once; all of them otherwise. */
  readonly guild: string | null;
  readonly api?: string | undefined;
  readonly dryRun: boolean;
  readonly book: Book;
  readonly fleet: readonly Command[];
  readonly print: (line: string) => void;
};

/** Makes Discord list what the records say, and touches only what differs. */
export const register = async (options: RegisterOptions): Promise<Difference> => {
  const { token, application, guild, api, dryRun, book, fleet, print } = options;
  const rest = new REST(api === undefined ? {} : { api }).setToken(token);
  const list =
    guild === null
      ? Routes.applicationCommands(application)
      : Routes.applicationGuildCommands(application, guild);
  const there = z.array(kept).parse(await rest.get(list));
  const found = difference(commandsFor(book, fleet), there);
  const { registration } = book.chat;
  for (const { name } of found.added) print(registration.added(name));
  for (const { name } of found.changed) print(registration.changed(name));
  for (const { name } of found.removed) print(registration.removed(name));
  for (const { name } of found.same) print(registration.same(name));
  if (dryRun) {
    print(registration.dry);
    return found;
  }
  // Sent under a name that is there already, a command takes the other's place.
  for (const command of [...found.added, ...found.changed])
    await rest.post(list, { body: command });
  for (const { id } of found.removed) await rest.delete(`${list}/${id}`);
  print(registration.done(found.added.length + found.changed.length + found.removed.length));
  return found;
};
