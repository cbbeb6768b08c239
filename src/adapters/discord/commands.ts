import {
  type APIApplicationCommandOption,
  type APIApplicationCommandSubcommandOption,
  ApplicationCommandOptionType,
  ApplicationCommandType,
  ApplicationIntegrationType,
  InteractionContextType,
} from 'discord.js';
import type { Command } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import {
  byWeight,
  isSwitch,
  isWhole,
  type Parameter,
  phrasesOf,
  shortened,
} from '../common/fields.ts';
import { parameterName, verbSummary } from '../common/spoken.ts';
import { LIMITS } from './limits.ts';
import { FILE_OPTION, ONLY_ME_OPTION, optionName, WORDS_OPTION } from './receive.ts';

type Choice = { readonly name: string; readonly value: string };

/** A command as Discord keeps it, as far as it is ours to say. */
export type Registered = {
  readonly type: number;
  readonly name: string;
  readonly description?: string;
  readonly options?: readonly APIApplicationCommandOption[];
  readonly contexts: readonly number[];
  readonly integration_types: readonly number[];
};

const grouped = <T>(items: readonly T[], keyOf: (item: T) => string): Map<string, T[]> => {
  const groups = new Map<string, T[]>();
  for (const item of items) {
    const key = keyOf(item);
    groups.set(key, [...(groups.get(key) ?? []), item]);
  }
  return groups;
};

const choicesOf = (parameter: Parameter): readonly Choice[] | null => {
  const phrases = phrasesOf(parameter);
  if (phrases === null || phrases.length > LIMITS.choices) return null;
  return phrases.map((phrase) => ({ name: phrase, value: phrase }));
};

/** How much is said of each option, and how many there are: what all verbs together have room for. */
type Size = { readonly examples: number; readonly options: number };

const optionOf = (
  book: Book,
  parameter: Parameter,
  { examples }: Size,
): APIApplicationCommandOption => {
  const name = optionName(parameter.name);
  const called = parameterName(book, parameter.name);
  const plain = shortened(book.chat.option(called, []), LIMITS.description);
  if (isSwitch(parameter))
    return { type: ApplicationCommandOptionType.Boolean, name, description: plain };
  const choices = choicesOf(parameter);
  if (choices !== null)
    return {
      type: ApplicationCommandOptionType.String,
      name,
      description: plain,
      choices: [...choices],
    };
  const description = shortened(
    book.chat.option(called, parameter.examples.slice(0, examples)),
    LIMITS.description,
  );
  if (isWhole(parameter))
    return { type: ApplicationCommandOptionType.Integer, name, description, min_value: 0 };
  const suggests = parameter.suggests !== undefined || parameter.closed === true;
  return {
    type: ApplicationCommandOptionType.String,
    name,
    description,
    ...(suggests ? { autocomplete: true } : {}),
  };
};

/** A verb that works something out can be said in words alone; to the others they only add. */
const isWorkedOut = ({ parameters }: Command): boolean =>
  parameters.some(({ name }) => name === 'diameter');

const ownOptions = (book: Book, command: Command): readonly APIApplicationCommandOption[] => [
  {
    type: ApplicationCommandOptionType.String,
    name: WORDS_OPTION,
    description: isWorkedOut(command) ? book.chat.words : book.discord.moreWords,
  },
  {
    type: ApplicationCommandOptionType.Boolean,
    name: ONLY_ME_OPTION,
    description: book.chat.onlyMe,
  },
];

/** Asked for first: nothing can be done without it. */
const fileOptions = (book: Book, command: Command): readonly APIApplicationCommandOption[] =>
  command.takesFile === true
    ? [
        {
          type: ApplicationCommandOptionType.Attachment,
          name: FILE_OPTION,
          description: book.discord.file,
          required: true,
        },
      ]
    : [];

/**
 * A verb as a sub-command. The parameters of a record stand in the order of their weight: what does
 * not fit among the options is said in the words.
 */
const subcommandOf = (
  book: Book,
  command: Command,
  size: Size,
): APIApplicationCommandSubcommandOption => {
  const own = ownOptions(book, command);
  const file = fileOptions(book, command);
  const ordered = byWeight(command);
  const room = Math.min(size.options, LIMITS.options - own.length - file.length);
  return {
    type: ApplicationCommandOptionType.Subcommand,
    name: command.path.at(-1) ?? '',
    description: shortened(verbSummary(book, command), LIMITS.description),
    options: [
      ...file,
      ...ordered.slice(0, room).map((each) => optionOf(book, each, size)),
      ...own,
    ] as NonNullable<APIApplicationCommandSubcommandOption['options']>,
  };
};

/** Verbs of two words stand in a group named by the first. */
const optionsOf = (
  book: Book,
  commands: readonly Command[],
  size: Size,
): readonly APIApplicationCommandOption[] => {
  const groups = grouped(commands, ({ path }) => (path.length > 2 ? (path[1] ?? '') : ''));
  return [...groups].flatMap(([group, members]): readonly APIApplicationCommandOption[] => {
    const below = members.map((command) => subcommandOf(book, command, size));
    if (group === '') return below;
    return [
      {
        type: ApplicationCommandOptionType.SubcommandGroup,
        name: group,
        description: shortened(group, LIMITS.description),
        options: below,
      },
    ];
  });
};

/** Characters that Discord counts: names, descriptions and values of a command and all below it. */
export const commandText = (command: unknown): number => {
  if (Array.isArray(command))
    return command.reduce<number>((sum, each) => sum + commandText(each), 0);
  if (typeof command !== 'object' || command === null) return 0;
  return Object.entries(command).reduce(
    (sum, [key, value]: [string, unknown]) =>
      sum +
      (['name', 'description', 'value'].includes(key) ? String(value).length : commandText(value)),
    0,
  );
};

/** Examples shown of an option, where there is room. Judgement: two say what kind of thing it is. */
const EXAMPLES = 2;

const rootOf = (book: Book, root: string, commands: readonly Command[]): Registered => {
  const made = (size: Size): Registered => ({
    type: ApplicationCommandType.ChatInput,
    name: root,
    description: shortened(book.verbs[root] ?? root, LIMITS.description),
    options: optionsOf(book, commands, size),
    contexts: [InteractionContextType.Guild],
    integration_types: [ApplicationIntegrationType.GuildInstall],
  });
  // All verbs together have a limit too: examples go first, then the options of least weight.
  let size: Size = { examples: EXAMPLES, options: LIMITS.options };
  while (size.options > 0 && commandText(made(size)) > LIMITS.commandText)
    size =
      size.examples > 0
        ? { ...size, examples: size.examples - 1 }
        : { ...size, options: size.options - 1 };
  return made(size);
};

/** Everything a person can ask for, as Discord lists it: made from the records alone. */
export const commandsFor = (book: Book, fleet: readonly Command[]): readonly Registered[] => {
  const roots = grouped(fleet, ({ path }) => path[0]);
  return [
    ...[...roots].map(([root, commands]) => rootOf(book, root, commands)),
    {
      type: ApplicationCommandType.Message,
      name: shortened(book.chat.fromMessage, LIMITS.name),
      contexts: [InteractionContextType.Guild],
      integration_types: [ApplicationIntegrationType.GuildInstall],
    },
  ];
};
