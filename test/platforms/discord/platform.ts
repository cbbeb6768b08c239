/** A small Discord on 127.0.0.1: REST and gateway. It can misbehave on request. */
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { setTimeout as pause } from 'node:timers/promises';
import { openInteractions } from './asked.ts';
import type { Bodies } from './bodies.ts';
import { openGateway } from './gateway.ts';
import { guildOf, readyOf, threadOf } from './payloads.ts';
import { Refused } from './refused.ts';
import { openRooms } from './rooms.ts';
import { openRoutes, type Reply, type Route } from './routes.ts';
import { type BodyCheck, bodyCheck } from './schemas.ts';
import { sentIn } from './sent.ts';
import {
  ENGINEER,
  everybodyIn,
  GUILDS,
  type Guild,
  OPERATOR,
  OWNER,
  type Someone,
  STRANGER,
  snowflake,
  TOKEN,
} from './world.ts';

/** What the next call of a route meets. */
export type Misfortune =
  /** Whether it was done all the same. */
  | { readonly status: 500; readonly done: boolean }
  /** The line breaks before the answer. */
  | { readonly status: 0; readonly done: boolean }
  | { readonly status: 429; readonly after: number }
  | { readonly status: 400 | 403 | 404; readonly code: number }
  /** It takes so many milliseconds. */
  | { readonly status: 200; readonly slow: number };

export type CallSeen = { readonly route: string; readonly path: string; readonly at: number };

export type Platform = Awaited<ReturnType<typeof openPlatform>>;

// A counterpart is one room: its parts share one state and are not used apart.
export const openPlatform = async (check: BodyCheck = bodyCheck()) => {
  const faults: string[] = [];
  const calls: CallSeen[] = [];
  const misfortunes = new Map<string, Misfortune[]>();
  const known = new Map<string, Someone>(
    [OPERATOR, OWNER, ENGINEER, STRANGER].map((each) => [each.id, each]),
  );
  let guilds: readonly Guild[] = GUILDS;
  let count = 0;
  const next = (): number => (count += 1);

  const checked = (kind: keyof Bodies, body: unknown): void => {
    const wrong = check(kind, body);
    if (wrong !== null) faults.push(wrong);
  };

  const rooms = openRooms(next);
  const interactions = openInteractions(rooms, next);
  const routes = openRoutes({
    rooms,
    interactions,
    next,
    gateway: () => base.replace('http', 'ws'),
    people: () => [...known.values()],
    faults,
    check: checked,
  });

  const answer = (response: http.ServerResponse, { status, body }: Reply, headers = {}): void => {
    const type = body === undefined ? {} : { 'content-type': 'application/json' };
    response.writeHead(status, { ...type, ...headers });
    response.end(body === undefined ? undefined : JSON.stringify(body));
  };
  const tried = (act: () => Reply): Reply => {
    try {
      return act();
    } catch (error) {
      if (!(error instanceof Refused)) throw error;
      return { status: error.status, body: { code: error.code, message: error.message } };
    }
  };

  /** A route as it goes today. */
  const withFortune = async (
    response: http.ServerResponse,
    { name }: Route,
    act: () => Reply,
  ): Promise<void> => {
    const misfortune = misfortunes.get(name)?.shift();
    if (misfortune === undefined) {
      answer(response, tried(act));
      return;
    }
    switch (misfortune.status) {
      case 200:
        await pause(misfortune.slow);
        answer(response, tried(act));
        return;
      case 429: {
        const { after } = misfortune;
        const body = { message: 'You are being rate limited.', retry_after: after, global: false };
        answer(response, { status: 429, body }, { 'retry-after': String(after) });
        return;
      }
      case 500:
        if (misfortune.done) tried(act);
        answer(response, { status: 500, body: { code: 0, message: '500: Internal Server Error' } });
        return;
      case 0:
        if (misfortune.done) tried(act);
        response.socket?.destroy();
        return;
      default:
        answer(response, {
          status: misfortune.status,
          body: { code: misfortune.code, message: 'Refused' },
        });
    }
  };

  const serve = async (
    request: http.IncomingMessage,
    response: http.ServerResponse,
  ): Promise<void> => {
    const url = new URL(request.url ?? '/', 'http://127.0.0.1');
    const path = url.pathname.replace(/^\/api\/v10/u, '');
    const sent = await sentIn(request, url.searchParams);
    const route = routes.list.find(
      (each) => each.method === request.method && each.path.test(path),
    );
    calls.push({ route: route?.name ?? '', path, at: Date.now() });
    if (route === undefined) {
      faults.push(`no such route: ${request.method ?? ''} ${path}`);
      answer(response, { status: 404, body: { code: 0, message: '404: Not Found' } });
      return;
    }
    if (route.isSecret && request.headers.authorization !== `Bot ${TOKEN}`) {
      answer(response, { status: 401, body: { code: 0, message: '401: Unauthorized' } });
      return;
    }
    const parts = route.path.exec(path)?.slice(1) ?? [];
    await withFortune(response, route, () => route.act(parts, sent));
  };

  const server = http.createServer((request, response) => {
    serve(request, response).catch((error: unknown) => {
      faults.push(String(error));
      response.writeHead(500).end();
    });
  });

  const gateway = openGateway(server, (session) => {
    const ready = readyOf(guilds, session, base.replace('http', 'ws'));
    checked('ready', ready);
    const created = guilds.map((guild) => guildOf(guild, rooms.channels));
    for (const guild of created) checked('guildCreate', guild);
    return [{ t: 'READY', d: ready }, ...created.map((guild) => ({ t: 'GUILD_CREATE', d: guild }))];
  });

  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done));
  const base = `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`;

  return {
    api: `${base}/api`,
    /** Everything that Discord would have refused, or that the counterpart should not have sent. */
    faults,
    calls,
    posted: rooms.posted,
    forms: interactions.forms,
    rooms,
    interactions,
    gateway,
    routes,
    next,
    /** Somebody whom the platform knows from now on. */
    meetPerson: (someone: Someone): void => void known.set(someone.id, someone),
    /** Tells the bot of something, so many times over. */
    dispatch: <K extends keyof Bodies>(t: string, kind: K, d: Bodies[K], copies = 1) => {
      checked(kind, d);
      for (let copy = 0; copy < copies; copy += 1) gateway.dispatch({ t, d });
    },
    /** What the next calls of a route meet, in this order. */
    meet: (route: string, ...what: readonly Misfortune[]): void => {
      if (routes.list.every(({ name }) => name !== route)) throw new Error(`no route ${route}`);
      misfortunes.set(route, [...(misfortunes.get(route) ?? []), ...what]);
    },
    /** The bot is thrown out of a server. */
    removeGuild: (id: string): void => {
      guilds = guilds.filter((each) => each.id !== id);
      rooms.leave(id);
      gateway.dispatch({ t: 'GUILD_DELETE', d: { id } });
    },
    /** The bot is let into a server; whoever owns it stands in its one channel. */
    addGuild: (name: string): Someone => {
      const [id, channel] = [snowflake(next()), snowflake(next())];
      const guild: Guild = { id, name, owner: OWNER.id, roles: everybodyIn(id) };
      guilds = [...guilds, guild];
      rooms.join(id, channel);
      const created = guildOf(guild, rooms.channels);
      checked('guildCreate', created);
      gateway.dispatch({ t: 'GUILD_CREATE', d: created });
      return { ...OWNER, guild: id, channel };
    },
    /** A thread is opened in a channel. */
    addThread: (parent: string): string => {
      const id = snowflake(next());
      const { guild } = rooms.channelOf(parent);
      const thread = { id, name: 'which-wheel', guild, parent, open: true };
      rooms.add(thread);
      checked('thread', threadOf(thread));
      gateway.dispatch({ t: 'THREAD_CREATE', d: threadOf(thread) });
      return id;
    },
    newId: (): string => snowflake(next()),
    stop: async (): Promise<void> => {
      gateway.stop();
      server.closeAllConnections();
      await new Promise((done) => server.close(done));
    },
  };
};
