import {
  type Attachment,
  type AutocompleteInteraction,
  type BaseInteraction,
  type ChatInputCommandInteraction,
  type CommandInteractionOption,
  type Message as DiscordMessage,
  PermissionFlagsBits,
  type RepliableInteraction,
} from 'discord.js';
import type { Call, Command, Options, Person } from '../../desk/index.ts';
import type { Handle } from './send.ts';

/** The option that takes a whole line, and the one that hides the reply. */
export const WORDS_OPTION = 'words';
export const ONLY_ME_OPTION = 'only-me';
/** The option that takes a file. */
export const FILE_OPTION = 'file';

/** A parameter's name in the form that Discord takes for an option. */
export const optionName = (name: string): string =>
  name.replaceAll(/[A-Z]/gu, (letter) => `-${letter.toLowerCase()}`);

export const handleOf = (interaction: RepliableInteraction | AutocompleteInteraction): Handle => ({
  application: interaction.applicationId,
  id: interaction.id,
  token: interaction.token,
  channel: interaction.channelId ?? '',
  person: interaction.user.id,
});

type Placed = Pick<BaseInteraction, 'channel' | 'channelId'>;

/** A thread is named beside the channel it hangs in. */
const placeOf = ({ channel, channelId }: Placed, isPrivate: boolean): Call['place'] => {
  const isThread = channel?.isThread() === true;
  return {
    channel: (isThread ? channel.parentId : null) ?? channelId ?? '',
    thread: isThread ? channelId : null,
    isPrivate,
  };
};

const nameOf = (interaction: BaseInteraction): string => {
  const { member, user } = interaction;
  if (member === null) return user.displayName;
  return 'displayName' in member ? member.displayName : (member.nick ?? user.displayName);
};

/** Roles of the server, and whether it is theirs to manage; in a direct message there is neither. */
const standingOf = ({
  member,
  memberPermissions,
  guild,
  guildId,
  user,
}: BaseInteraction): Pick<Person, 'groups' | 'manages'> => {
  if (member === null) return {};
  const roles = Array.isArray(member.roles) ? member.roles : [...member.roles.cache.keys()];
  return {
    // Everybody has the role that has the server's own id.
    groups: roles.filter((id) => id !== guildId),
    manages:
      guild?.ownerId === user.id ||
      memberPermissions?.has(PermissionFlagsBits.ManageGuild) === true,
  };
};

/** What every call says of who asked and where. */
export const callOf = (
  interaction: BaseInteraction,
  given: Call['given'],
  isPrivate: boolean,
): Call => ({
  shop: interaction.guildId ?? '',
  person: { id: interaction.user.id, name: nameOf(interaction), ...standingOf(interaction) },
  place: placeOf(interaction, isPrivate),
  interactionId: interaction.id,
  given,
});

type Leaf = {
  readonly path: readonly string[];
  readonly data: readonly CommandInteractionOption[];
};

/** The options below the last sub-command, and the way there. */
const leafOf = (name: string, data: readonly CommandInteractionOption[]): Leaf => {
  const [first] = data;
  if (data.length !== 1 || first?.options === undefined) return { path: [name], data };
  const below = leafOf(first.name, first.options);
  return { path: [name, ...below.path], data: below.data };
};

type Typed = {
  readonly path: readonly string[];
  readonly options: Options;
  readonly isPrivate: boolean;
};

/** What was filled in, under the names of the command's own parameters. */
export const typedIn = (
  interaction: ChatInputCommandInteraction | AutocompleteInteraction,
  fleet: readonly Command[],
): Typed => {
  const { path, data } = leafOf(interaction.commandName, interaction.options.data);
  const command = fleet.find((each) => each.path.join(' ') === path.join(' '));
  const names = new Map(
    (command?.parameters ?? []).map(({ name }) => [optionName(name), name] as const),
  );
  const filled = data.flatMap(({ name, value }) =>
    value === undefined || name === ONLY_ME_OPTION || name === FILE_OPTION
      ? []
      : [[names.get(name) ?? name, value] as const],
  );
  return {
    path,
    options: Object.fromEntries(filled),
    isPrivate: data.some(({ name, value }) => name === ONLY_ME_OPTION && value === true),
  };
};

/** The files that came with a command. */
export const filesOf = ({ options }: ChatInputCommandInteraction): readonly Attachment[] => {
  const { data } = leafOf('', options.data);
  return data.flatMap(({ attachment }) => (attachment ? [attachment] : []));
};

/** The parameter that is being typed. */
export const focusedIn = (
  interaction: AutocompleteInteraction,
  command: Command | undefined,
): { readonly parameter: string; readonly typed: string } => {
  const { name, value } = interaction.options.getFocused(true);
  const parameter = command?.parameters.find((each) => optionName(each.name) === name);
  return { parameter: parameter?.name ?? name, typed: value };
};

/** The words of a message without the bot's own name in them. */
export const wordsOf = (content: string, bot: string): string =>
  content
    .replaceAll(new RegExp(`<@!?${bot}>`, 'gu'), ' ')
    .replaceAll(/\s+/gu, ' ')
    .trim();

/** Meant for the bot: it is named in the text, not only answered or called with everybody. */
export const isForBot = (message: DiscordMessage, bot: string): boolean =>
  !message.author.bot && new RegExp(`<@!?${bot}>`, 'u').test(message.content);

/** A call from a message that names the bot; such a reply is never private. */
export const messageCall = (message: DiscordMessage, bot: string): Call => ({
  shop: message.guildId ?? '',
  person: {
    id: message.author.id,
    name: message.member?.displayName ?? message.author.displayName,
    ...(message.member === null
      ? {}
      : {
          groups: [...message.member.roles.cache.keys()].filter((id) => id !== message.guildId),
          manages: message.member.permissions.has(PermissionFlagsBits.ManageGuild),
        }),
  },
  place: placeOf(message, false),
  interactionId: message.id,
  given: { words: wordsOf(message.content, bot) },
});
