import {
  type AutocompleteInteraction,
  type ChatInputCommandInteraction,
  type Client,
  type Message as DiscordMessage,
  type Interaction,
  type MessageContextMenuCommandInteraction,
} from 'discord.js';
import type { Log } from '../common/log.ts';
import type { Once } from '../common/once.ts';
import { sentence } from '../common/spoken.ts';
import { within } from '../common/within.ts';
import { type Controls, pressed, submitted } from './controls.ts';
import { faultText } from './faults.ts';
import { isTable, withFiles } from './files.ts';
import { LIMITS } from './limits.ts';
import { withMentions } from './mentions.ts';
import {
  callOf,
  filesOf,
  focusedIn,
  handleOf,
  isForBot,
  messageCall,
  typedIn,
  wordsOf,
} from './receive.ts';

export type Listening = Controls & {
  readonly client: Client<true>;
  readonly log: Log;
  readonly once: Once;
  /** How long suggestions may take: they come while somebody types. */
  readonly suggestMs: number;
};

/** Turns what Discord sends into calls, and hands what the desk answers to whoever sends it. */
export const openListeners = (listening: Listening) => {
  const { client, desk, book, flow, sender, log, once, suggestMs } = listening;

  const asked = async (interaction: ChatInputCommandInteraction): Promise<void> => {
    const since = performance.now();
    const { path, options: filled, isPrivate } = typedIn(interaction, desk.fleet);
    const call = callOf(interaction, { path, options: filled }, isPrivate);
    await flow.answer(handleOf(interaction), call, {
      since,
      prepare: async (plain) =>
        await withFiles(book, await withMentions(plain, interaction.guild), filesOf(interaction)),
    });
  };

  const fromMessage = async (interaction: MessageContextMenuCommandInteraction): Promise<void> => {
    const since = performance.now();
    const words = wordsOf(interaction.targetMessage.content, client.user.id);
    const call = callOf(interaction, { words }, false);
    const handle = handleOf(interaction);
    await (words === ''
      ? flow.say(handle, call, sentence(book.chat.nothingToRead))
      : flow.answer(handle, call, {
          since,
          prepare: (plain) => withMentions(plain, interaction.guild),
        }));
  };

  const suggest = async (interaction: AutocompleteInteraction): Promise<void> => {
    const { path, options: filled } = typedIn(interaction, desk.fleet);
    const command = desk.fleet.find((each) => each.path.join(' ') === path.join(' '));
    const call = callOf(interaction, { path, options: filled }, true);
    const found = desk.suggest(call, focusedIn(interaction, command)).catch((error: unknown) => {
      log.fault('suggest', { fault: faultText(error), error });
      return [];
    });
    const choices = (await within(found, suggestMs, []))
      .filter(({ words }) => words !== '' && words.length <= LIMITS.choiceValue)
      .slice(0, LIMITS.choices)
      .map(({ label, words }) => ({ name: label.slice(0, LIMITS.choiceName), value: words }));
    await sender.suggest(handleOf(interaction), choices);
  };

  const acted = async (event: Exclude<Interaction, AutocompleteInteraction>): Promise<void> => {
    try {
      if (event.isChatInputCommand()) await asked(event);
      else if (event.isMessageContextMenuCommand()) await fromMessage(event);
      else if (event.isButton()) await pressed(listening, event);
      else if (event.isModalSubmit()) await submitted(listening, event);
    } catch (error) {
      // What fails here was not said to anybody yet.
      log.fault('interaction', { interaction: event.id, fault: faultText(error), error });
      if (!event.isRepliable()) return;
      const call = callOf(event, { words: '' }, true);
      await flow.say(handleOf(event), call, sentence(book.chat.fault));
    }
  };

  return {
    interaction: async (event: Interaction): Promise<void> => {
      if (event.isAutocomplete()) {
        await suggest(event);
        return;
      }
      if (await once(event.id)) await acted(event);
      else log.note('repeated', { interaction: event.id });
    },

    message: async (event: DiscordMessage): Promise<void> => {
      if (!isForBot(event, client.user.id)) return;
      if (!(await once(event.id))) {
        log.note('repeated', { interaction: event.id });
        return;
      }
      await flow.answerMessage(
        messageCall(event, client.user.id),
        event.id,
        async (plain) =>
          await withFiles(
            book,
            await withMentions(plain, event.guild),
            [...event.attachments.values()].filter(isTable),
          ),
      );
    },
  };
};
