import type { Guild } from 'discord.js';
import type { Call, Directory, Named, Options } from '../../desk/index.ts';
import { within } from '../common/within.ts';

/** A person, a role or a channel as Discord writes it in a text. */
const MENTION = /<(?<kind>@!?|@&|#)(?<id>\d{17,20})>/gu;
const SNOWFLAKE = /^\d{17,20}$/u;

/** A name takes no longer than this to be found; without one its id stands in its place. Judgement. */
const PATIENCE_MS = 600;

const textsIn = ({ given }: Call): readonly string[] => {
  if ('words' in given) return [given.words];
  const options = 'path' in given ? given.options : (given.pressed.added ?? {});
  return Object.values(options).filter((each) => typeof each === 'string');
};

const found = (text: string, kind: RegExp): readonly string[] =>
  [...text.matchAll(MENTION)].flatMap(({ groups }) =>
    groups?.['id'] !== undefined && kind.test(groups['kind'] ?? '') ? [groups['id']] : [],
  );

/** Asked one by one: the list of all members is a privileged thing to have. */
const personNamed = async (guild: Guild | null, id: string): Promise<Named> => {
  const known = guild?.members.cache.get(id)?.displayName;
  if (known !== undefined || guild === null) return { id, name: known ?? id };
  const asked = guild.members.fetch({ user: id, cache: true }).then(
    ({ displayName }) => displayName,
    () => id,
  );
  return { id, name: await within(asked, PATIENCE_MS, id) };
};

const sameName = (a: string, b: string): boolean => a.toLowerCase() === b.toLowerCase();
const withoutAt = (called: string): string => called.trim().replace(/^@/u, '');

/** Whom this server knows: roles by any name, people by those that were mentioned. */
const directoryOf = (guild: Guild | null, people: readonly Named[]): Directory => {
  const groups = (): readonly Named[] =>
    [...(guild?.roles.cache.values() ?? [])]
      .filter(({ id }) => id !== guild?.id)
      .map(({ id, name }) => ({ id, name }));
  const among = (known: readonly Named[], called: string): Named | null => {
    const plain = withoutAt(called);
    const id = /^<@[!&]?(\d+)>$/u.exec(called.trim())?.[1] ?? plain;
    return (
      known.find((each) => each.id === id) ??
      known.find(({ name }) => sameName(withoutAt(name), plain)) ??
      null
    );
  };
  return {
    person: (called) => {
      const plain = withoutAt(called);
      return among(people, called) ?? (SNOWFLAKE.test(plain) ? { id: plain, name: plain } : null);
    },
    group: (called) => among(groups(), called),
    groups,
  };
};

/** A name of several words is quoted where other words stand beside it. */
const asWord = (name: string): string =>
  /\s/u.test(name) ? `"${name.replaceAll('"', "'")}"` : name;

const spelled = (
  text: string,
  nameOf: (kind: string, id: string) => string,
  written: (name: string) => string,
): string =>
  text.replaceAll(MENTION, (_all, kind: string, id: string) =>
    kind === '#' ? id : written(nameOf(kind, id)),
  );

/** What was typed with every mention as a name, and who is meant by those names. */
export const withMentions = async (call: Call, guild: Guild | null): Promise<Call> => {
  const ids = new Set(textsIn(call).flatMap((text) => found(text, /^@!?$/u)));
  const people = await Promise.all([...ids].map((id) => personNamed(guild, id)));
  const nameOf = (kind: string, id: string): string =>
    (kind === '@&'
      ? guild?.roles.cache.get(id)?.name
      : people.find((each) => each.id === id)?.name) ?? id;
  const line = (text: string): string => spelled(text, nameOf, asWord);
  const field = (text: string): string => spelled(text, nameOf, (name) => name);
  const filled = (options: Options): Options =>
    Object.fromEntries(
      Object.entries(options).map(([name, value]) => [
        name,
        typeof value !== 'string' ? value : name === 'words' ? line(value) : field(value),
      ]),
    );
  const { given } = call;
  const directory = directoryOf(guild, people);
  if ('words' in given) return { ...call, directory, given: { words: line(given.words) } };
  if ('path' in given)
    return { ...call, directory, given: { ...given, options: filled(given.options) } };
  const { added } = given.pressed;
  if (added === undefined) return { ...call, directory };
  return { ...call, directory, given: { pressed: { ...given.pressed, added: filled(added) } } };
};
