import {
  type AutocompleteInteraction,
  type ChatInputCommandInteraction,
  Client,
  type Message as DiscordMessage,
  Events,
  GatewayIntentBits,
  type Interaction,
  type MessageContextMenuCommandInteraction,
  Options,
} from 'discord.js';
import type { Desk } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import type { Log } from '../common/log.ts';
import { sentence } from '../common/spoken.ts';
import { within } from '../common/within.ts';
import { pressed, submitted } from './controls.ts';
import { faultText } from './faults.ts';
import { type Draw, openFlow } from './flow.ts';
import { LIMITS } from './limits.ts';
import { callOf, focusedIn, handleOf, isForBot, messageCall, typedIn, wordsOf } from './receive.ts';
import { openSender } from './send.ts';

export { register } from './register.ts';

export type DiscordOptions = {
  readonly token: string;
  /** Of a proxy or a local counterpart; the gateway's address comes from it. */
  readonly api?: string | undefined;
  readonly desk: Desk;
  readonly book: Book;
  readonly log: Log;
  readonly draw?: Draw;
  readonly deferAfterMs?: number;
};

export type Discord = {
  /** How many servers it is in. */
  readonly shops: number;
  readonly stop: () => Promise<void>;
};

/** The token is none. */
export class TokenRefused extends Error {}

/** Judgement: of the three seconds there are, one for the answer and two for the way. */
const DEFER_AFTER_MS = 1_000;
/** A call that takes longer is tried again or given up. Judgement. */
const CALL_PATIENCE_MS = 10_000;

const clientOf = ({ api }: DiscordOptions): Client =>
  new Client({
    // Without the privileged intent: messages that name the bot are readable all the same.
    intents: [GatewayIntentBits.Guilds, GatewayIntentBits.GuildMessages],
    shardCount: 1,
    allowedMentions: { parse: [] },
    makeCache: Options.cacheWithLimits({
      ...Options.DefaultMakeCacheSettings,
      MessageManager: 0,
      ReactionManager: 0,
      PresenceManager: 0,
    }),
    rest: {
      ...(api === undefined ? {} : { api }),
      // The sender knows what may be sent a second time; the client does not.
      retries: 0,
      timeout: CALL_PATIENCE_MS,
    },
  });

/** Puts the adapter together: what Discord sends becomes calls, what the desk answers messages. */
const handlersOf = (client: Client<true>, options: DiscordOptions) => {
  const { desk, book, log, deferAfterMs = DEFER_AFTER_MS } = options;
  const sender = openSender(client.rest);
  const draw = options.draw ?? (() => Promise.resolve([]));
  const flow = openFlow({ desk, book, sender, log, draw, deferAfterMs });
  const controls = { desk, book, flow, sender };

  const asked = async (interaction: ChatInputCommandInteraction): Promise<void> => {
    const { path, options: filled, isPrivate } = typedIn(interaction, desk.fleet);
    const call = callOf(interaction, { path, options: filled }, isPrivate);
    await flow.answer(handleOf(interaction), call);
  };

  const fromMessage = async (interaction: MessageContextMenuCommandInteraction): Promise<void> => {
    const words = wordsOf(interaction.targetMessage.content, client.user.id);
    const call = callOf(interaction, { words }, false);
    const handle = handleOf(interaction);
    await (words === ''
      ? flow.say(handle, call, sentence(book.chat.nothingToRead))
      : flow.answer(handle, call));
  };

  const suggest = async (interaction: AutocompleteInteraction): Promise<void> => {
    const { path, options: filled } = typedIn(interaction, desk.fleet);
    const command = desk.fleet.find((each) => each.path.join(' ') === path.join(' '));
    const call = callOf(interaction, { path, options: filled }, true);
    const found = desk.suggest(call, focusedIn(interaction, command));
    const choices = (await within(found, deferAfterMs, []))
      .filter(({ words }) => words.length <= LIMITS.choiceValue)
      .slice(0, LIMITS.choices)
      .map(({ label, words }) => ({ name: label.slice(0, LIMITS.choiceName), value: words }));
    await sender.suggest(handleOf(interaction), choices);
  };

  const interaction = async (event: Interaction): Promise<void> => {
    if (event.isAutocomplete()) await suggest(event);
    else if (event.isChatInputCommand()) await asked(event);
    else if (event.isMessageContextMenuCommand()) await fromMessage(event);
    else if (event.isButton()) await pressed(controls, event);
    else if (event.isModalSubmit()) await submitted(controls, event);
  };

  const message = async (event: DiscordMessage): Promise<void> => {
    if (!isForBot(event, client.user.id)) return;
    await flow.answerMessage(messageCall(event, client.user.id), event.id);
  };

  return { interaction, message };
};

const ready = (client: Client): Promise<Client<true>> =>
  new Promise((done) => {
    client.once(Events.ClientReady, done);
  });

const login = async (client: Client, token: string): Promise<Client<true>> => {
  const isReady = ready(client);
  try {
    await client.login(token);
  } catch (error) {
    await client.destroy();
    const code = error instanceof Error && 'code' in error ? String(error.code) : '';
    const status = error instanceof Error && 'status' in error ? error.status : null;
    if (code === 'TokenInvalid' || status === 401) throw new TokenRefused(code);
    throw error;
  }
  return await isReady;
};

/** Connects, and answers until stopped. */
export const openDiscord = async (options: DiscordOptions): Promise<Discord> => {
  const { token, log } = options;
  const client = clientOf(options);
  const busy = new Set<Promise<void>>();
  /** Nothing that happens to one event may end the program. */
  const kept = (what: string, work: Promise<void>): void => {
    const watched = work
      .catch((error: unknown) => {
        log.fault(what, { fault: faultText(error), error });
      })
      .finally(() => busy.delete(watched));
    busy.add(watched);
  };
  client.on(Events.Error, (error) => log.fault('client', { fault: faultText(error) }));
  client.on(Events.ShardError, (error) => log.fault('gateway', { fault: faultText(error) }));
  client.on(Events.ShardReconnecting, (shard) => log.note('reconnecting', { shard }));
  client.on(Events.ShardResume, (shard, replayed) => log.note('resumed', { shard, replayed }));
  client.once(Events.ClientReady, (connected) => {
    const handlers = handlersOf(connected, options);
    connected.on(Events.InteractionCreate, (event) =>
      kept('interaction', handlers.interaction(event)),
    );
    connected.on(Events.MessageCreate, (event) => kept('message', handlers.message(event)));
  });
  const connected = await login(client, token);
  return {
    get shops() {
      return connected.guilds.cache.size;
    },
    stop: async () => {
      await Promise.allSettled(busy);
      await client.destroy();
    },
  };
};
