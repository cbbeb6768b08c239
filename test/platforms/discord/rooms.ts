/** Channels and what stands in them: messages, pins, threads, direct channels. */

import { textsIn } from './payloads.ts';
import { Refused } from './refused.ts';
import { type Body, namedIn } from './rules.ts';
import { CHANNELS, type Channel, GUILDS, snowflake } from './world.ts';

export type File = { readonly name: string; readonly bytes: number; readonly alt: string };

export type Posted = {
  readonly by: 'reply' | 'followUp' | 'post';
  readonly id: string;
  readonly guild: string | null;
  readonly channel: string;
  /** Only this person sees it. */
  readonly only: string | null;
  readonly body: Body;
  readonly files: readonly File[];
  /** Who was rung by it: `@person`, `&role`, everyone. */
  readonly rings: readonly string[];
  readonly replyTo: string | null;
  readonly edits: number;
};

type Allowed = {
  readonly parse?: readonly string[];
  users?: readonly string[];
  roles?: readonly string[];
};

/** Who a message calls, as far as it may. */
const rungBy = (body: Body): readonly string[] => {
  const {
    parse,
    users = [],
    roles = [],
  } = (body['allowed_mentions'] ?? {
    parse: ['users', 'roles', 'everyone'],
  }) as Allowed;
  const may = (kind: string): boolean => parse?.includes(kind) === true;
  return [...new Set(textsIn(body).flatMap(namedIn))].filter((named) => {
    if (named.startsWith('@')) return may('users') || users.includes(named.slice(1));
    if (named.startsWith('&')) return may('roles') || roles.includes(named.slice(1));
    return may('everyone');
  });
};

const MOST_PINS = 250;

export const openRooms = (next: () => number) => {
  const channels = new Map<string, Channel>(CHANNELS.map((each) => [each.id, each]));
  const guilds = new Set(GUILDS.map(({ id }) => id));
  const posted: Posted[] = [];
  const nonces = new Map<string, string>();
  const pins = new Map<string, string[]>();
  /** People who take no direct messages. */
  const shut = new Set<string>();

  const channelOf = (id: string): Channel => {
    const channel = channels.get(id);
    if (channel === undefined) throw new Refused(404, 10_003, 'Unknown Channel');
    if (channel.guild !== '' && !guilds.has(channel.guild))
      throw new Refused(403, 50_001, 'Missing Access');
    return channel;
  };
  /** A channel in which the bot may write by itself. */
  const writable = (id: string): Channel => {
    const channel = channelOf(id);
    if (shut.has(id)) throw new Refused(403, 50_007, 'Cannot send messages to this user');
    if (!channel.open) throw new Refused(403, 50_013, 'Missing Permissions');
    return channel;
  };

  const messageAt = (channel: string, id: string): number => {
    const at = posted.findIndex((each) => each.id === id && each.channel === channel);
    if (at < 0) throw new Refused(404, 10_008, 'Unknown Message');
    return at;
  };

  const store = (
    entry: Omit<Posted, 'id' | 'guild' | 'rings' | 'edits'> & { readonly id?: string },
  ): Posted => {
    const guild = channels.get(entry.channel)?.guild ?? '';
    const message: Posted = {
      ...entry,
      id: entry.id ?? snowflake(next()),
      guild: guild === '' ? null : guild,
      // What only one person sees rings nobody.
      rings: entry.only === null ? rungBy(entry.body) : [],
      edits: 0,
    };
    posted.push(message);
    return message;
  };

  const edit = (at: number, body: Body, files: readonly File[]): Posted => {
    const before = posted[at];
    if (before === undefined) throw new Refused(404, 10_008, 'Unknown Message');
    const said = body['attachments'];
    const kept = said === undefined ? before.files : [];
    const after = {
      ...before,
      // An edit changes what it names and leaves the rest; whoever sees it stays the same.
      body: {
        ...before.body,
        ...body,
        flags: Number(body['flags'] ?? 0) | (Number(before.body['flags'] ?? 0) & 64),
      },
      files: [...kept, ...files],
      edits: before.edits + 1,
    };
    posted[at] = after;
    return after;
  };

  const post = (id: string, body: Body, files: readonly File[]): Posted => {
    const channel = writable(id);
    const key = body['enforce_nonce'] === true ? `${id} ${String(body['nonce'])}` : null;
    const before = posted.find((each) => key !== null && each.id === nonces.get(key));
    if (before !== undefined) return before;
    const reference = body['message_reference'] as { readonly message_id: string } | undefined;
    const replyTo = reference?.message_id ?? null;
    const message = store({ by: 'post', channel: channel.id, only: null, body, files, replyTo });
    if (key !== null) nonces.set(key, message.id);
    return message;
  };

  const pin = (channel: string, id: string): void => {
    writable(channel);
    messageAt(channel, id);
    const there = pins.get(channel) ?? [];
    if (there.includes(id)) return;
    if (there.length >= MOST_PINS)
      throw new Refused(400, 30_003, 'Maximum number of pins reached for this channel (250)');
    pins.set(channel, [id, ...there]);
  };

  const openThread = (parent: string, id: string, name: string): Channel => {
    const channel = writable(parent);
    if (channel.parent !== null)
      throw new Refused(400, 50_024, 'Cannot execute action on this channel type');
    messageAt(parent, id);
    if (channels.has(id))
      throw new Refused(400, 160_004, 'A thread has already been created for this message');
    const thread = { id, name, guild: channel.guild, parent, open: true };
    channels.set(id, thread);
    return thread;
  };

  return {
    posted,
    channelOf,
    store,
    edit,
    post,
    pin,
    openThread,
    messageAt,
    unpin: (channel: string, id: string): void => {
      writable(channel);
      pins.set(
        channel,
        (pins.get(channel) ?? []).filter((each) => each !== id),
      );
    },
    pinsOf: (channel: string): readonly string[] => pins.get(channel) ?? [],
    /** Pins that people put there before. */
    fillPins: (channel: string, count: number): void => {
      const old = Array.from({ length: count }, (_, i) => `15${String(i).padStart(17, '0')}`);
      pins.set(channel, [...(pins.get(channel) ?? []), ...old]);
    },
    direct: (person: string): Channel => {
      const id = `19${person.slice(2)}`;
      const channel = { id, name: '', guild: '', parent: null, open: true };
      channels.set(id, channel);
      return channel;
    },
    shutDirect: (person: string): void => void shut.add(`19${person.slice(2)}`),
    /** The few minutes are over in which the same nonce is the same message. */
    forgetNonces: (): void => nonces.clear(),
    leave: (guild: string): void => void guilds.delete(guild),
    /** A server of one channel. */
    join: (guild: string, channel: string): void => {
      guilds.add(guild);
      channels.set(channel, { id: channel, name: 'floor', guild, parent: null, open: true });
    },
    add: (channel: Channel): void => void channels.set(channel.id, channel),
    get channels(): readonly Channel[] {
      return [...channels.values()];
    },
  };
};
export type Rooms = ReturnType<typeof openRooms>;
