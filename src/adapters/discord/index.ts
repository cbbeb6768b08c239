import { Client, Events, GatewayIntentBits, Options } from 'discord.js';
import type { Desk, Effect } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import type { Delivering, Delivery } from '../common/delivery.ts';
import type { Log } from '../common/log.ts';
import { type Once, onceInProcess } from '../common/once.ts';
import { inTurns } from '../common/turns.ts';
import { login, watch } from './connect.ts';
import { deliverEffect } from './effects.ts';
import { faultText } from './faults.ts';
import { openFlow } from './flow.ts';
import { openListeners } from './listen.ts';
import type { Draw } from './pictures.ts';
import { openSender } from './send.ts';

export { TokenRefused } from './connect.ts';
export { type NotRegistered, register } from './register.ts';

export type DiscordOptions = {
  readonly token: string;
  /** Of a proxy or a local counterpart; the gateway's address comes from it. */
  readonly api?: string | undefined;
  readonly desk: Desk;
  readonly book: Book;
  readonly log: Log;
  readonly draw?: Draw;
  readonly deferAfterMs?: number;
  /** Of the records, where several processes share the work. */
  readonly once?: Once;
  /** The connection is gone for good. */
  readonly onEnded?: (error: Error) => void;
};

export type Discord = {
  /** How many servers it is in. */
  readonly shops: number;
  /** Makes an effect happen that was queued with a change. */
  readonly deliver: (effect: Effect, delivering: Delivering) => Promise<Delivery>;
  readonly stop: () => Promise<void>;
};

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

/** The server of a channel that the client has heard of. */
const guildIn = (client: Client, channel: string): string | null => {
  const known = client.channels.cache.get(channel);
  return known !== undefined && 'guildId' in known ? known.guildId : null;
};

/** Connects, and answers until stopped. */
export const openDiscord = async (options: DiscordOptions): Promise<Discord> => {
  const { token, log, book, once = onceInProcess(), onEnded = () => undefined } = options;
  const desk = inTurns(options.desk);
  const { draw = null, deferAfterMs = DEFER_AFTER_MS } = options;
  const client = clientOf(options);
  const sender = openSender(client.rest);
  const flow = openFlow({ desk, book, sender, log, draw, deferAfterMs });
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
  client.once(Events.ClientReady, (connected) => {
    const controls = { desk, book, flow, sender };
    const listening = { ...controls, client: connected, log, once, suggestMs: deferAfterMs };
    const listeners = openListeners(listening);
    connected.on(Events.InteractionCreate, (event) =>
      kept('interaction', listeners.interaction(event)),
    );
    connected.on(Events.MessageCreate, (event) => kept('message', listeners.message(event)));
  });
  let isReady = false;
  const ended = new Promise<never>((_, failed) => {
    watch(client, log, (error) => {
      failed(error);
      if (isReady) onEnded(error);
    });
  });
  // Whoever waits for it hears of it; once everything is there nobody does.
  ended.catch(() => undefined);
  const connected = await login(client, token, ended);
  isReady = true;
  return {
    get shops() {
      return connected.guilds.cache.size;
    },
    deliver: (effect, delivering) => {
      const guildOf = (channel: string): string | null => guildIn(connected, channel);
      return deliverEffect({ sender, book, guildOf }, effect, delivering);
    },
    stop: async () => {
      await Promise.allSettled(busy);
      await client.destroy();
    },
  };
};
