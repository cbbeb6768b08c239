import { createHash } from 'node:crypto';
import { MessageFlags, type REST, type RequestData, Routes } from 'discord.js';
import { z } from 'zod';
import { shortened } from '../common/fields.ts';
import { isPassing, isRefused, trying } from './faults.ts';
import { LIMITS } from './limits.ts';
import type { Message } from './render.ts';

export type Sent = { readonly channel: string; readonly message: string };

export const request = ({ body, files }: Message, more: object = {}): RequestData => ({
  body: { ...body, ...more },
  files: [...files],
});

/** An edit keeps the audience the message was made for. */
export const editRequest = (message: Message): RequestData =>
  request(message, { flags: message.body.flags & ~MessageFlags.Ephemeral });

/** A post is looked for from so long before it was first tried: clocks differ. Judgement. */
const LOOK_BACK_MS = 60_000;
/** So many pages are looked through, of the most messages that a page has. Judgement. */
const LOOK_PAGES = 5;
const PAGE = 100;
/** The moment that Discord's ids count from (reference, snowflakes). */
const EPOCH = 1_420_070_400_000;
const TIME_SHIFT = 22n;

const idAt = (moment: number): string => String(BigInt(Math.max(0, moment - EPOCH)) << TIME_SHIFT);

const digestOf = (key: string): Buffer => createHash('sha256').update(key).digest();

/** The nonce of a key: whatever it is made of, as long as Discord takes. */
const nonceOf = (key: string): string => digestOf(key).toString('base64url').slice(0, LIMITS.nonce);

/** The number of a key: a component carries it, and comes back with it whenever it is read. */
const markOf = (key: string): number => (digestOf(key).readUInt32BE(0) >>> 1) + 1;

/** The message with its mark on its first component, seen by nobody. */
const marked = (message: Message, key: string): Message => {
  const [first, ...rest] = message.body.components;
  if (first === undefined) return message;
  const components = [{ ...first, id: markOf(key) }, ...rest];
  return { ...message, body: { ...message.body, components } };
};

const sentShape = z.object({ id: z.string(), channel_id: z.string() });
const sentOf = (response: unknown): Sent => {
  const { id, channel_id } = sentShape.parse(response);
  return { channel: channel_id, message: id };
};

const keptShape = z.array(
  z.object({
    id: z.string(),
    channel_id: z.string(),
    nonce: z.union([z.string(), z.number()]).nullish(),
    components: z.array(z.looseObject({ id: z.number().optional() })).optional(),
  }),
);

const pinsShape = z.object({
  items: z.array(
    z.object({
      pinned_at: z.string(),
      message: z.object({
        content: z.string().optional(),
        components: z.array(z.looseObject({ content: z.string().optional() })).optional(),
      }),
    }),
  ),
  has_more: z.boolean(),
});
const PINS_PAGE = 50;

export type Pinned = { readonly at: string; readonly text: string };
export type Member = { readonly name: string; readonly roles: readonly string[] };

const memberShape = z.object({
  nick: z.string().nullish(),
  roles: z.array(z.string()),
  user: z.object({ username: z.string(), global_name: z.string().nullish() }),
});
const channelShape = z.object({ guild_id: z.string().nullish() });

export type Channels = ReturnType<typeof openChannels>;

/** Everything that is said in channels without being asked in one: each once, by its key. */
export const openChannels = (rest: REST) => {
  /** The post with this key, where it stands already. */
  const find = async (channel: string, key: string, since: number): Promise<Sent | null> => {
    const mark = markOf(key);
    const nonce = nonceOf(key);
    let after = idAt(since - LOOK_BACK_MS);
    for (let page = 0; page < LOOK_PAGES; page += 1) {
      const query = new URLSearchParams({ limit: String(PAGE), after });
      const read = await rest.get(Routes.channelMessages(channel), { query });
      const messages = keptShape.parse(read);
      const found = messages.find(
        (each) => each.nonce === nonce || each.components?.[0]?.id === mark,
      );
      if (found !== undefined) return { channel: found.channel_id, message: found.id };
      if (messages.length < PAGE) return null;
      after = messages.map(({ id }) => id).reduce((a, b) => (BigInt(a) > BigInt(b) ? a : b));
    }
    return null;
  };

  const standing = async (channel: string, key: string, since: number): Promise<Sent | null> => {
    try {
      return await find(channel, key, since);
    } catch (error) {
      // Where the bot may write but not read, a second copy is better than none.
      if (isPassing(error)) throw error;
      return null;
    }
  };

  /**
   * Posts once. The nonce makes a second copy within minutes the first one; after longer it is
   * looked for. `firstTried` is when it was first tried, where that was before.
   */
  const post = async (
    channel: string,
    message: Message,
    key: string,
    { replyTo, firstTried = null }: { replyTo?: string; firstTried?: number | null } = {},
  ): Promise<Sent> => {
    // One channel's keys are no other's: a nonce is the bot's, in whatever channel it writes.
    const own = `${channel} ${key}`;
    return await trying(async () => {
      const stands = firstTried === null ? null : await standing(channel, own, firstTried);
      if (stands !== null) return stands;
      return sentOf(
        await rest.post(
          Routes.channelMessages(channel),
          request(marked(message, own), {
            nonce: nonceOf(own),
            enforce_nonce: true,
            ...(replyTo === undefined
              ? {}
              : { message_reference: { message_id: replyTo, fail_if_not_exists: false } }),
          }),
        ),
      );
    });
  };

  return {
    post,

    edit: async ({ channel, message: id }: Sent, message: Message): Promise<Sent> =>
      sentOf(
        await trying(() => rest.patch(Routes.channelMessage(channel, id), editRequest(message))),
      ),

    pin: async ({ channel, message }: Sent): Promise<void> => {
      await trying(() => rest.put(Routes.channelMessagesPin(channel, message)));
    },

    /** A message that is gone is pinned no longer. */
    unpin: async ({ channel, message }: Sent): Promise<void> => {
      try {
        await trying(() => rest.delete(Routes.channelMessagesPin(channel, message)));
      } catch (error) {
        if (!isRefused(error, 'unknownMessage')) throw error;
      }
    },

    /** The pins of a channel that have been there longest, the oldest first. */
    oldestPins: async (channel: string, most: number): Promise<readonly Pinned[]> => {
      const pins: Pinned[] = [];
      for (let before: string | undefined; pins.length < LIMITS.pins; ) {
        const query = new URLSearchParams({ limit: String(PINS_PAGE) });
        if (before !== undefined) query.set('before', before);
        const page = pinsShape.parse(
          await trying(() => rest.get(Routes.channelMessagesPins(channel), { query })),
        );
        pins.push(
          ...page.items.map(({ pinned_at: at, message: { content, components = [] } }) => ({
            at,
            text: components.find((each) => each.content !== undefined)?.content ?? content ?? '',
          })),
        );
        before = page.items.at(-1)?.pinned_at;
        if (!page.has_more || before === undefined) break;
      }
      return pins.slice(-most).reverse();
    },

    /** The thread of a message has the message's own id, so a second one is refused. */
    thread: async ({ channel, message }: Sent, name: string): Promise<string> => {
      try {
        await trying(() =>
          rest.post(Routes.threads(channel, message), {
            body: { name: shortened(name, LIMITS.threadName) },
          }),
        );
      } catch (error) {
        if (!isRefused(error, 'threadExists')) throw error;
      }
      return message;
    },

    /** The channel in which a person is written to alone. */
    directChannel: async (person: string): Promise<string> => {
      const opened = await trying(() =>
        rest.post(Routes.userChannels(), { body: { recipient_id: person } }),
      );
      return z.object({ id: z.string() }).parse(opened).id;
    },

    /** A member of a server, or null for who is none. */
    member: async (guild: string, person: string): Promise<Member | null> => {
      try {
        const found = memberShape.parse(
          await trying(() => rest.get(Routes.guildMember(guild, person))),
        );
        const { username, global_name } = found.user;
        return { name: found.nick ?? global_name ?? username, roles: found.roles };
      } catch (error) {
        if (isRefused(error, 'unknownMember', 'unknownPerson')) return null;
        throw error;
      }
    },

    /** The server a channel belongs to; null for a channel of two people. */
    guildOf: async (channel: string): Promise<string | null> =>
      channelShape.parse(await trying(() => rest.get(Routes.channel(channel)))).guild_id ?? null,
  };
};
