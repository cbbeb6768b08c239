import type { Call, Directory, Named, Options } from '../../desk/index.ts';
import type { UserGroup } from './send.ts';

/** A person or a user group as Slack writes it in a text (formatting message text, mentions). */
const MENTION = /<(?<kind>@|!subteam\^)(?<id>[A-Z0-9]+)(?:\|(?<label>[^<>]*))?>/gu;
const PERSON = /^[UW][A-Z0-9]{2,}$/u;

/** Whom a text may name: everybody but the bot itself, which is only spoken to. */
export const namesSomebody =
  (bot: string | undefined) =>
  (target: string): boolean =>
    target.startsWith('!subteam^') || (target.startsWith('@') && target !== `@${bot ?? ''}`);

/** What is known of a workspace, whoever is asked for. */
export type Known = {
  readonly nameOf: (person: string) => Promise<string>;
  readonly groups: readonly UserGroup[];
};

const textsIn = ({ given }: Call): readonly string[] => {
  if ('words' in given) return [given.words];
  const options = 'path' in given ? given.options : (given.pressed.added ?? {});
  return Object.values(options).filter((each) => typeof each === 'string');
};

const mentioned = async (
  texts: readonly string[],
  { nameOf }: Known,
): Promise<readonly Named[]> => {
  const people = texts.flatMap((text) =>
    [...text.matchAll(MENTION)].flatMap(({ groups = {} }) =>
      groups['kind'] === '@' ? [{ id: groups['id'] ?? '', label: groups['label'] ?? '' }] : [],
    ),
  );
  return await Promise.all(
    people.map(async ({ id, label }) => ({ id, name: label === '' ? await nameOf(id) : label })),
  );
};

const withoutAt = (called: string): string => called.trim().replace(/^@/u, '');
const sameName = (a: string, b: string): boolean =>
  withoutAt(a).toLowerCase() === withoutAt(b).toLowerCase();

/** Whom this workspace knows: user groups by any name, people by those that were mentioned. */
const directoryOf = (people: readonly Named[], groups: readonly UserGroup[]): Directory => ({
  person: (called) => {
    const plain = withoutAt(called);
    const known =
      people.find(({ id }) => id === plain) ?? people.find(({ name }) => sameName(name, plain));
    return known ?? (PERSON.test(plain) ? { id: plain, name: plain } : null);
  },
  group: (called) => {
    const plain = withoutAt(called);
    const known =
      groups.find(({ id }) => id === plain) ??
      groups.find(({ name, handle }) => sameName(name, plain) || sameName(handle, plain));
    return known === undefined ? null : { id: known.id, name: known.name };
  },
  groups: () => groups.map(({ id, name }) => ({ id, name })),
});

/** A name of several words is quoted where other words stand beside it. */
const asWord = (name: string): string =>
  /\s/u.test(name) ? `"${name.replaceAll('"', "'")}"` : name;

/** What was typed with every mention as a name, and who is meant by those names. */
export const withMentions = async (call: Call, known: Known): Promise<Call> => {
  const people = await mentioned(textsIn(call), known);
  const nameOf = (kind: string, id: string): string =>
    (kind === '@' ? people : known.groups).find((each) => each.id === id)?.name ?? id;
  const spelled = (text: string, written: (name: string) => string): string =>
    text.replaceAll(MENTION, (_all, kind: string, id: string) => written(nameOf(kind, id)));
  const line = (text: string): string => spelled(text, asWord);
  const filled = (options: Options): Options =>
    Object.fromEntries(
      Object.entries(options).map(([name, value]) => [
        name,
        typeof value !== 'string'
          ? value
          : name === 'words'
            ? line(value)
            : spelled(value, (each) => each),
      ]),
    );
  const { given } = call;
  const directory = directoryOf(people, known.groups);
  if ('words' in given) return { ...call, directory, given: { words: line(given.words) } };
  if ('path' in given)
    return { ...call, directory, given: { ...given, options: filled(given.options) } };
  const { added } = given.pressed;
  if (added === undefined) return { ...call, directory };
  return { ...call, directory, given: { pressed: { ...given.pressed, added: filled(added) } } };
};
