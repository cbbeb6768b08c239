/** The routes of the platform that a bot needs, each with what it does. */
import type { openInteractions } from './asked.ts';
import type { Bodies } from './bodies.ts';
import { type Outgoing, outgoingFaults } from './outgoing.ts';
import { directOf, messageOf, threadOf, userOf } from './payloads.ts';
import { Refused } from './refused.ts';
import type { Posted, Rooms } from './rooms.ts';
import type { Body } from './rules.ts';
import type { Sent } from './sent.ts';
import { APPLICATION, type Channel, type Someone, snowflake } from './world.ts';

export type Reply = { readonly status: number; readonly body?: unknown };

type Act = (parts: readonly string[], sent: Sent) => Reply;
export type Route = {
  readonly name: string;
  readonly method: string;
  readonly path: RegExp;
  /** Only with the bot's token. */
  readonly isSecret: boolean;
  readonly act: Act;
};

const NOTHING: Reply = { status: 204 };
const CALLBACKS: Readonly<Record<number, Outgoing>> = {
  4: 'reply',
  5: 'reply',
  8: 'suggestions',
  9: 'form',
};

export type RoutesOptions = {
  readonly rooms: Rooms;
  readonly interactions: ReturnType<typeof openInteractions>;
  readonly next: () => number;
  readonly gateway: () => string;
  readonly people: () => readonly Someone[];
  readonly faults: string[];
  readonly check: (kind: keyof Bodies, body: unknown) => void;
};

export const openRoutes = (options: RoutesOptions) => {
  const { rooms, interactions, next, gateway, people, faults, check } = options;
  const commands = new Map<string, Map<string, Bodies['command']>>();

  /** Refuses what Discord would, and keeps count of it. */
  const hold = (kind: Outgoing, { body, files }: Sent): void => {
    const wrong = outgoingFaults(
      kind,
      body,
      files.map(({ name }) => name),
    );
    faults.push(...wrong);
    if (wrong.length > 0) throw new Refused(400, 50_035, `Invalid Form Body: ${wrong[0] ?? ''}`);
  };

  const sent = <K extends keyof Bodies>(kind: K, body: Bodies[K], status = 200): Reply => {
    check(kind, body);
    return { status, body };
  };
  const message = (posted: Posted): Reply => sent('posted', messageOf(posted));

  const listFor = (place: string): Map<string, Bodies['command']> => {
    const list = commands.get(place) ?? new Map<string, Bodies['command']>();
    commands.set(place, list);
    return list;
  };
  const keep = (place: string, body: Body): Bodies['command'] => {
    const list = listFor(place);
    const old = [...list.values()].find(
      (each) => each.type === body['type'] && each.name === body['name'],
    );
    const command = {
      description: '',
      default_member_permissions: null,
      ...body,
      id: old?.id ?? snowflake(next()),
      application_id: APPLICATION,
      version: snowflake(next()),
    } as unknown as Bodies['command'];
    list.set(command.id, command);
    return command;
  };

  const route = (name: string, method: string, path: string, act: Act, isSecret = true): Route => ({
    name,
    method,
    path: new RegExp(`^${path.replaceAll(/:\w+/gu, '([^/]+)')}$`, 'u'),
    isSecret,
    act,
  });
  const channelOf = (channel: Channel): Reply =>
    channel.guild === '' ? sent('direct', directOf(channel)) : sent('thread', threadOf(channel));

  const list = [
    route('gateway', 'GET', '/gateway/bot', () =>
      sent('gateway', {
        url: gateway(),
        shards: 1,
        session_start_limit: { total: 1000, remaining: 999, reset_after: 0, max_concurrency: 1 },
      }),
    ),
    ...['/applications/:app/commands', '/applications/:app/guilds/:guild/commands'].flatMap(
      (path) => [
        route('commands', 'GET', path, ([, guild = '']) => ({
          status: 200,
          body: [...listFor(guild).values()],
        })),
        route('register', 'POST', path, ([, guild = ''], call) => {
          hold('command', call);
          return sent('command', keep(guild, call.body), 201);
        }),
        route('unregister', 'DELETE', `${path}/:id`, (parts) => {
          const guild = parts.length > 2 ? (parts[1] ?? '') : '';
          if (!listFor(guild).delete(parts.at(-1) ?? ''))
            throw new Refused(404, 10_063, 'Unknown application command');
          return NOTHING;
        }),
      ],
    ),
    route(
      'callback',
      'POST',
      '/interactions/:id/:token/callback',
      ([id = '', token = ''], call) => {
        const kind = CALLBACKS[Number(call.body['type'])];
        if (kind === undefined) faults.push(`a callback of type ${String(call.body['type'])}`);
        else hold(kind, call);
        interactions.acknowledge(id, token, call.body, call.files);
        return NOTHING;
      },
      false,
    ),
    route(
      'editOriginal',
      'PATCH',
      '/webhooks/:app/:token/messages/(?:@|%40)original',
      ([, token = ''], call) => {
        hold('editOriginal', call);
        return message(interactions.editOriginal(token, call.body, call.files));
      },
      false,
    ),
    route(
      'deleteOriginal',
      'DELETE',
      '/webhooks/:app/:token/messages/(?:@|%40)original',
      ([, token = '']) => {
        interactions.deleteOriginal(token);
        return NOTHING;
      },
      false,
    ),
    route(
      'followUp',
      'POST',
      '/webhooks/:app/:token',
      ([, token = ''], call) => {
        hold('followUp', call);
        return message(interactions.followUp(token, call.body, call.files));
      },
      false,
    ),
    route('channel', 'GET', '/channels/:id', ([id = '']) => channelOf(rooms.channelOf(id))),
    route('messages', 'GET', '/channels/:id/messages', ([id = ''], { query }) => {
      rooms.channelOf(id);
      const after = BigInt(query.get('after') ?? '0');
      const found = rooms.posted
        .filter((each) => each.channel === id && each.only === null && BigInt(each.id) > after)
        .slice(-Number(query.get('limit') ?? '50'))
        .reverse();
      return { status: 200, body: found.map((each) => messageOf(each)) };
    }),
    route('post', 'POST', '/channels/:id/messages', ([id = ''], call) => {
      hold('post', call);
      return message(rooms.post(id, call.body, call.files));
    }),
    route('edit', 'PATCH', '/channels/:id/messages/:message', ([id = '', at = ''], call) => {
      hold('edit', call);
      return message(rooms.edit(rooms.messageAt(id, at), call.body, call.files));
    }),
    route('pins', 'GET', '/channels/:id/messages/pins', ([id = '']) => ({
      status: 200,
      body: {
        items: rooms.pinsOf(id).flatMap((pinned) => {
          const found = rooms.posted.find((each) => each.id === pinned);
          return found === undefined
            ? []
            : [{ pinned_at: new Date().toISOString(), message: messageOf(found) }];
        }),
        has_more: false,
      },
    })),
    route('pin', 'PUT', '/channels/:id/messages/pins/:message', ([id = '', at = '']) => {
      rooms.pin(id, at);
      return NOTHING;
    }),
    route('unpin', 'DELETE', '/channels/:id/messages/pins/:message', ([id = '', at = '']) => {
      rooms.unpin(id, at);
      return NOTHING;
    }),
    route(
      'thread',
      'POST',
      '/channels/:id/messages/:message/threads',
      ([id = '', at = ''], call) => {
        hold('thread', call);
        return channelOf(rooms.openThread(id, at, String(call.body['name'])));
      },
    ),
    route('direct', 'POST', '/users/@me/channels', (_, { body }) =>
      channelOf(rooms.direct(String(body['recipient_id']))),
    ),
    route('member', 'GET', '/guilds/:guild/members/:person', ([guild = '', id = '']) => {
      const found = people().find((each) => each.guild === guild && each.id === id);
      if (found === undefined) throw new Refused(404, 10_007, 'Unknown Member');
      return {
        status: 200,
        body: { user: userOf(found), roles: found.roles, nick: null, deaf: false, mute: false },
      };
    }),
  ];

  return {
    list,
    /** The command of this name, as it is registered. */
    commandOf: (type: Bodies['command']['type'], name: string): Bodies['command'] | undefined =>
      [...commands.values()]
        .flatMap((each) => [...each.values()])
        .find((each) => each.type === type && each.name === name),
    registered: (guild = ''): readonly Bodies['command'][] => [...listFor(guild).values()],
  };
};
