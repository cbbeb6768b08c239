import { DiscordAPIError, REST, Routes } from 'discord.js';
import { z } from 'zod';
import type { Command } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { commandsFor, type Registered } from './commands.ts';
import { faultText, isRefused } from './faults.ts';

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

/** Slash commands, and those on people and messages. */
const OURS = 3;

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

/** What is said of one option, apart from the options below it. */
const fieldsOf = (value: Named): readonly (readonly [string, unknown])[] =>
  Object.entries(value)
    .filter(([key, each]) => SAID.has(key) && key !== 'options' && key !== 'name' && says(each))
    .map(([key, each]) => [key, essence(each)]);

const namedShape = z.looseObject({ name: z.string(), options: z.array(z.unknown()).nullish() });
type Named = { readonly name: string; readonly options?: unknown };
const below = ({ options }: { readonly options?: unknown }): readonly Named[] =>
  z.array(namedShape).catch([]).parse(options);

/** What differs below a command: what is new, what is gone, and what is said otherwise. */
export type Detail = {
  readonly path: string;
  readonly is: 'added' | 'removed' | 'changed';
  /** What is said otherwise, by Discord's own names. */
  readonly fields: readonly string[];
};

const detailsOf = (path: string, wanted: Named, there: Named): readonly Detail[] => {
  const before = new Map(fieldsOf(there));
  const after = new Map(fieldsOf(wanted));
  const fields = [...new Set([...before.keys(), ...after.keys()])].filter(
    (key) => JSON.stringify(before.get(key)) !== JSON.stringify(after.get(key)),
  );
  const [old, fresh] = [below(there), below(wanted)];
  const kept = fresh.filter(({ name }) => old.some((each) => each.name === name));
  const order = (options: readonly Named[]): string =>
    options
      .flatMap(({ name }) => (kept.some((each) => each.name === name) ? [name] : []))
      .join(' ');
  if (order(old) !== order(fresh)) fields.push('order');
  const inside = (name: string): string => `${path} ${name}`;
  return [
    ...(fields.length === 0 ? [] : [{ path, is: 'changed', fields } as const]),
    ...fresh.flatMap((option): readonly Detail[] => {
      const known = old.find(({ name }) => name === option.name);
      return known === undefined
        ? [{ path: inside(option.name), is: 'added', fields: [] }]
        : detailsOf(inside(option.name), option, known);
    }),
    ...old
      .filter(({ name }) => !fresh.some((each) => each.name === name))
      .map(({ name }) => ({ path: inside(name), is: 'removed', fields: [] }) as const),
  ];
};

const keyOf = ({ type, name }: { type: number; name: string }): string => `${String(type)} ${name}`;

export type Difference = {
  readonly added: readonly Registered[];
  readonly changed: readonly Registered[];
  readonly removed: readonly Kept[];
  readonly same: readonly Registered[];
  /** What it is that differs in those that are changed. */
  readonly details: readonly Detail[];
};

export const difference = (wanted: readonly Registered[], there: readonly Kept[]): Difference => {
  const known = new Map(there.map((command) => [keyOf(command), command]));
  const isSame = (command: Registered): boolean =>
    JSON.stringify(essence(command)) === JSON.stringify(essence(known.get(keyOf(command))));
  const names = new Set(wanted.map(keyOf));
  const old = wanted.filter((command) => known.has(keyOf(command)));
  const changed = old.filter((command) => !isSame(command));
  return {
    added: wanted.filter((command) => !known.has(keyOf(command))),
    changed,
    // What opens an application's own window is none of ours.
    removed: there.filter((command) => command.type <= OURS && !names.has(keyOf(command))),
    same: old.filter(isSame),
    details: changed.flatMap((command) => {
      const before = known.get(keyOf(command));
      return before === undefined ? [] : detailsOf(command.name, command, before);
    }),
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

/** Why nothing, or not everything, was registered: what is wrong with which variable, or a fault. */
export type NotRegistered = {
  readonly wrong: 'DISCORD_TOKEN' | 'DISCORD_APPLICATION_ID' | 'DISCORD_TEST_GUILD' | null;
  readonly fault: string;
};

const wrongOf = (error: unknown, guild: string | null): NotRegistered['wrong'] => {
  if (error instanceof DiscordAPIError && error.status === 401) return 'DISCORD_TOKEN';
  if (isRefused(error, 'notThisApplication')) return 'DISCORD_APPLICATION_ID';
  return guild !== null && isRefused(error, 'missingAccess', 'unknownGuild')
    ? 'DISCORD_TEST_GUILD'
    : null;
};

const printed = (found: Difference, { book, print }: RegisterOptions): void => {
  const { registration } = book.chat;
  const inside = (command: string): void => {
    for (const { path, is, fields } of found.details)
      if (path === command || path.startsWith(`${command} `))
        print(registration.detail[is](path, fields));
  };
  for (const { name } of found.added) print(registration.added(name));
  for (const { name } of found.changed) {
    print(registration.changed(name));
    inside(name);
  }
  for (const { name } of found.removed) print(registration.removed(name));
  for (const { name } of found.same) print(registration.same(name));
};

/** Makes Discord list what the records say, and touches only what differs. */
export const register = async (options: RegisterOptions): Promise<Difference | NotRegistered> => {
  const { token, application, guild, api, dryRun, book, fleet, print } = options;
  const rest = new REST(api === undefined ? {} : { api }).setToken(token);
  const list =
    guild === null
      ? Routes.applicationCommands(application)
      : Routes.applicationGuildCommands(application, guild);
  const { registration } = book.chat;
  try {
    const there = z.array(kept).parse(await rest.get(list));
    const found = difference(commandsFor(book, fleet), there);
    printed(found, options);
    if (dryRun) {
      print(registration.dry);
      return found;
    }
    // Sent under a name that is there already, a command takes the other's place.
    for (const command of [...found.added, ...found.changed])
      await rest.post(list, { body: command });
    for (const { id } of found.removed) await rest.delete(`${list}/${id}`);
    const { length: removed } = found.removed;
    print(registration.done(found.added.length + found.changed.length + removed));
    return found;
  } catch (error) {
    return { wrong: wrongOf(error, guild), fault: faultText(error) };
  }
};
