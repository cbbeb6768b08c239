import { setTimeout as pause } from 'node:timers/promises';
import type { webApi } from '@slack/bolt';
import type { HomeView, ModalView } from '@slack/types';
import { z } from 'zod';
import { shortened } from '../common/fields.ts';
import type { Drawn } from '../common/pieces.ts';
import { isPassing, isRefused, mayBeDone, ResponseRefused } from './faults.ts';
import { LIMITS } from './limits.ts';
import type { Message } from './render.ts';

export type Where = { readonly channel: string; readonly thread: string | null };
/** A user group as Slack names it, and its members. */
export type UserGroup = {
  readonly id: string;
  readonly name: string;
  readonly handle: string;
  readonly users: readonly string[];
};
export type Sent = { readonly channel: string; readonly message: string };

/** Judgement: three tries within what a person waits; the outbox has its own, longer patience. */
const TRIES = 3;
const FIRST_PAUSE_MS = 150;
const RESPONSE_PATIENCE_MS = 10_000;
/** A post is looked for among so many messages, from so long before it was first tried. */
const LOOK_BACK = 50;
const LOOK_BACK_S = 60;

/** Under this name the key of a post is kept with it, seen by nobody. */
const EVENT = 'wholetooth_post';

/** Tries again what may go well the next time. The client itself tries nothing twice. */
export const trying = async <T>(call: (before: unknown) => Promise<T>): Promise<T> => {
  let before: unknown = null;
  for (let attempt = 1; ; attempt += 1) {
    try {
      return await call(before);
    } catch (error) {
      if (attempt >= TRIES || !isPassing(error)) throw error;
      before = error;
      await pause(FIRST_PAUSE_MS * 2 ** (attempt - 1));
    }
  }
};

const keyed = z.object({
  ts: z.string(),
  metadata: z.object({
    event_type: z.literal(EVENT),
    event_payload: z.object({ key: z.string() }),
  }),
});

/** Where a message goes as Slack names it. */
const placed = ({ channel, thread }: Where) => ({
  channel,
  ...(thread === null ? {} : { thread_ts: thread }),
});

const quiet = { unfurl_links: false, unfurl_media: false } as const;

export type Sender = ReturnType<typeof openSender>;

/** Every call to Slack, each made so that a second one does no second thing. */
export const openSender = (client: webApi.WebClient) => {
  /** The post with this key, where it stands already. */
  const find = async (
    { channel, thread }: Where,
    key: string,
    since: number,
  ): Promise<string | null> => {
    const asked = {
      channel,
      limit: LOOK_BACK,
      oldest: String(Math.floor(since / 1000) - LOOK_BACK_S),
      include_all_metadata: true,
    };
    const { messages = [] } = await (thread === null
      ? client.conversations.history(asked)
      : client.conversations.replies({ ...asked, ts: thread })
    ).catch((error: unknown) => {
      // Where the bot may write but not read, a second copy is better than none.
      if (isPassing(error)) throw error;
      return { messages: [] };
    });
    const found = messages
      .map((each) => keyed.safeParse(each))
      .find((each) => each.success && each.data.metadata.event_payload.key === key);
    return found?.data?.ts ?? null;
  };

  /**
   * Posts once: after a fault that leaves it open whether it stands, it is looked for first.
   * `since` is when it was first tried, where that was before.
   */
  const post = async (
    where: Where,
    message: Message,
    key: string,
    firstTried: number | null = null,
  ): Promise<Sent> => {
    const since = firstTried ?? Date.now();
    return await trying(async (before) => {
      if (firstTried !== null || (before !== null && mayBeDone(before))) {
        const stands = await find(where, key, since);
        if (stands !== null) return { channel: where.channel, message: stands };
      }
      const sent = await client.chat.postMessage({
        ...placed(where),
        ...message,
        ...quiet,
        metadata: { event_type: EVENT, event_payload: { key } },
      });
      return { channel: sent.channel ?? where.channel, message: sent.ts ?? '' };
    });
  };

  return {
    post,

    /** Only this person sees it; it has no key and after a fault it may stand twice. */
    whisper: (where: Where, person: string, message: Message) =>
      trying(() => client.chat.postEphemeral({ ...placed(where), user: person, ...message })),

    /** To the person alone, where there is no channel to say it in. */
    direct: async (
      person: string,
      message: Message,
      key: string,
      firstTried: number | null = null,
    ): Promise<Sent> => {
      const { channel } = await trying(() => client.conversations.open({ users: person }));
      const where = { channel: channel?.id ?? person, thread: null };
      return await post(where, message, key, firstTried);
    },

    /** By the address that came with the interaction. */
    respond: (
      url: string,
      message: Message,
      { isPrivate, thread }: { isPrivate: boolean; thread: string | null },
    ) =>
      trying(async () => {
        const response = await fetch(url, {
          method: 'POST',
          headers: { 'Content-Type': 'application/json' },
          body: JSON.stringify({
            ...message,
            ...(thread === null ? {} : { thread_ts: thread }),
            ...quiet,
            response_type: isPrivate ? 'ephemeral' : 'in_channel',
            replace_original: false,
          }),
          redirect: 'error',
          signal: AbortSignal.timeout(RESPONSE_PATIENCE_MS),
        });
        await response.arrayBuffer();
        if (!response.ok) throw new ResponseRefused(response.status);
      }),

    open: (trigger: string, view: ModalView) => client.views.open({ trigger_id: trigger, view }),
    home: (person: string, view: HomeView) =>
      trying(() => client.views.publish({ user_id: person, view })),

    edit: ({ channel, message: ts }: Sent, message: Message) =>
      trying(() => client.chat.update({ channel, ts, ...message })),

    pin: async ({ channel, message: timestamp }: Sent): Promise<void> => {
      try {
        await trying(() => client.pins.add({ channel, timestamp }));
      } catch (error) {
        if (!isRefused(error, 'pinned')) throw error;
      }
    },
    unpin: async ({ channel, message: timestamp }: Sent): Promise<void> => {
      try {
        await trying(() => client.pins.remove({ channel, timestamp }));
      } catch (error) {
        if (!isRefused(error, 'notPinned')) throw error;
      }
    },

    /** Only into the place where the card stands, never wider. */
    picture: ({ channel, thread }: Where, { name, bytes, alt }: Drawn) =>
      client.files.uploadV2({
        ...(thread === null ? { channel_id: channel } : { channel_id: channel, thread_ts: thread }),
        file: Buffer.from(bytes),
        filename: name,
        title: shortened(alt, LIMITS.inputText),
        alt_text: shortened(alt, LIMITS.altText),
      }),

    /** To the person alone. */
    file: async (person: string, name: string, bytes: Buffer) => {
      const { channel } = await trying(() => client.conversations.open({ users: person }));
      await client.files.uploadV2({
        channel_id: channel?.id ?? person,
        file: bytes,
        filename: name,
        title: name,
      });
    },

    /** What they are called, and whether they administer this very workspace; guests of another do not. */
    user: async (
      person: string,
      shop: string,
    ): Promise<{ readonly name: string | null; readonly manages: boolean }> => {
      const { user } = await trying(() => client.users.info({ user: person }));
      const names = [user?.profile?.display_name, user?.real_name, user?.name];
      return {
        name: names.find((name) => name !== undefined && name !== '') ?? null,
        manages: user?.team_id === shop && (user.is_admin === true || user.is_owner === true),
      };
    },

    /** The user groups of the workspace, where it has any, and who is in each. */
    groups: async (): Promise<readonly UserGroup[]> => {
      const { usergroups = [] } = await trying(() =>
        client.usergroups.list({ include_users: true }),
      );
      return usergroups.flatMap(({ id, name = '', handle = '', users = [] }) =>
        id === undefined ? [] : [{ id, name, handle, users }],
      );
    },
  };
};
