/** A small Slack on 127.0.0.1: Web API, Socket Mode, signed HTTP. It can misbehave on request. */
import { createHmac } from 'node:crypto';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { type WebSocket, WebSocketServer } from 'ws';
import { type Body, ruleFaults } from './rules.ts';
import { type BodyCheck, bodyCheck } from './schemas.ts';

export type Posted = {
  readonly by: 'post' | 'ephemeral' | 'response';
  readonly team: string;
  readonly channel: string;
  readonly thread: string | null;
  /** Only this person sees it. */
  readonly only: string | null;
  readonly ts: string;
  readonly body: Body;
  readonly metadata: unknown;
};
export type View = {
  readonly id: string;
  readonly team: string;
  readonly person: string;
  readonly view: Body & {
    readonly callback_id: string;
    readonly private_metadata: string;
    readonly [key: string]: unknown;
  };
};
export type Picture = {
  readonly channel: string;
  readonly thread: string | null;
  readonly alt: string;
  readonly bytes: number;
  readonly name: string;
};
export type CallSeen = { readonly method: string; readonly token: string; readonly at: number };

/** What the next call of a method meets. */
export type Misfortune =
  /** Whether it was done all the same. */
  | { readonly status: 500; readonly done: boolean }
  | { readonly status: 429; readonly after: number }
  | { readonly error: string };

export type Team = {
  readonly id: string;
  readonly botToken: string;
  readonly bot: string;
};
export const TEAMS: readonly Team[] = [
  { id: 'T0SHOP', botToken: 'xoxb-1-shop', bot: 'U0BOT' },
  { id: 'T0OTHER', botToken: 'xoxb-2-other', bot: 'U0BOTTWO' },
];
export const APP_TOKEN = 'xapp-1-app';
export const SIGNING_SECRET = 'signed-by-the-counterpart';

type Envelope = { readonly type: string; readonly payload: unknown };
type Acked = { readonly payload: unknown; readonly ms: number };
type Fields = Record<string, string>;

const json = (text: string | undefined): unknown =>
  text === undefined ? undefined : JSON.parse(text);

const readBody = async (request: http.IncomingMessage): Promise<Buffer> => {
  const chunks: Buffer[] = [];
  for await (const chunk of request) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks);
};

export type Channel = {
  readonly id: string;
  readonly team: string;
  /** The bot is in it, or may write there all the same. */
  readonly open: boolean;
};

export type Platform = Awaited<ReturnType<typeof openPlatform>>;

// A counterpart is one room: its parts share one state and are not used apart.
export const openPlatform = async (check: BodyCheck = bodyCheck()) => {
  const posted: Posted[] = [];
  const views: View[] = [];
  const homes: View[] = [];
  const pictures: Picture[] = [];
  const pins: string[] = [];
  const calls: CallSeen[] = [];
  const faults: string[] = [];
  const misfortunes = new Map<string, Misfortune[]>();
  const channels = new Map<string, Channel>();
  const responses = new Map<
    string,
    { team: string; channel: string; person: string; left: number }
  >();
  const triggers = new Map<
    string,
    { until: number; used: boolean; person: string; team: string }
  >();
  const uploads = new Map<string, { alt: string; bytes: number; name: string }>();
  const acks = new Map<string, (payload: unknown) => void>();
  const sockets = new Set<WebSocket>();
  let count = 0;
  let opened = 0;
  let mode: { readonly url: string } | null = null;
  let mayRing: ReadonlySet<string> = new Set();
  const next = (): number => (count += 1);
  const stamp = (): string => `1790000000.${String(next()).padStart(6, '0')}`;

  for (const team of TEAMS)
    for (const name of ['C0FLOOR', 'C0OPEN', 'C0CLOSED'])
      channels.set(`${name}${team.id.slice(2)}`, {
        id: `${name}${team.id.slice(2)}`,
        team: team.id,
        open: name !== 'C0CLOSED',
      });

  const hold = (kind: 'message' | 'modal' | 'home', body: Body): string | null => {
    const { text, blocks } = body;
    const wrong = [
      check(kind, kind === 'message' ? { text, blocks } : body),
      ...ruleFaults(kind === 'message' ? 'message' : 'view', body, mayRing),
    ].filter((each) => each !== null);
    faults.push(...wrong);
    return wrong[0] ?? null;
  };

  const channelOf = (team: Team, id: string): Channel | undefined => {
    const found = channels.get(id);
    return found?.team === team.id ? found : undefined;
  };
  const store = (entry: Omit<Posted, 'ts'>): string => {
    const ts = stamp();
    posted.push({ ...entry, ts });
    return ts;
  };

  const post = (
    team: Team,
    fields: Fields,
    only: string | null,
  ): Fields | Record<string, unknown> => {
    const channel = channelOf(team, fields['channel'] ?? '');
    if (channel === undefined) return { ok: false, error: 'channel_not_found' };
    if (!channel.open) return { ok: false, error: 'not_in_channel' };
    const body = {
      text: fields['text'] ?? '',
      blocks: json(fields['blocks']) as readonly unknown[],
    };
    if (hold('message', body) !== null) return { ok: false, error: 'invalid_blocks' };
    if (only !== null && fields['metadata'] !== undefined)
      faults.push('metadata that nobody keeps');
    const ts = store({
      by: only === null ? 'post' : 'ephemeral',
      team: team.id,
      channel: channel.id,
      thread: fields['thread_ts'] ?? null,
      only,
      body,
      metadata: json(fields['metadata']) ?? null,
    });
    return only === null ? { ok: true, channel: channel.id, ts } : { ok: true, message_ts: ts };
  };

  const history = (team: Team, fields: Fields, thread: string | null): Record<string, unknown> => {
    const channel = channelOf(team, fields['channel'] ?? '');
    if (channel === undefined) return { ok: false, error: 'channel_not_found' };
    const messages = posted
      .filter((each) => each.channel === channel.id && each.only === null && each.thread === thread)
      .map(({ ts, body, metadata }) => ({
        type: 'message',
        ts,
        text: body.text,
        ...(fields['include_all_metadata'] === 'true' && metadata !== null ? { metadata } : {}),
      }));
    return { ok: true, messages: messages.reverse() };
  };

  const openView = (team: Team, fields: Fields): Record<string, unknown> => {
    const trigger = triggers.get(fields['trigger_id'] ?? '');
    if (trigger === undefined) return { ok: false, error: 'invalid_trigger_id' };
    if (Date.now() > trigger.until) return { ok: false, error: 'expired_trigger_id' };
    if (trigger.used) return { ok: false, error: 'exchanged_trigger_id' };
    trigger.used = true;
    const view = json(fields['view']) as View['view'];
    if (hold('modal', view) !== null) return { ok: false, error: 'invalid_arguments' };
    const id = `V${String(next())}`;
    views.push({ id, team: team.id, person: trigger.person, view });
    return { ok: true, view: { id } };
  };

  const methods: Record<string, (team: Team, fields: Fields) => Record<string, unknown>> = {
    'auth.test': (team) => ({
      ok: true,
      team_id: team.id,
      user_id: team.bot,
      bot_id: `B${team.bot}`,
    }),
    'chat.postMessage': (team, fields) => post(team, fields, null),
    'chat.postEphemeral': (team, fields) => post(team, fields, fields['user'] ?? ''),
    'chat.update': (team, fields) => {
      const at = posted.findIndex((each) => each.ts === fields['ts'] && each.team === team.id);
      const before = posted[at];
      if (before === undefined) return { ok: false, error: 'message_not_found' };
      const body = {
        text: fields['text'] ?? '',
        blocks: json(fields['blocks']) as readonly unknown[],
      };
      if (hold('message', body) !== null) return { ok: false, error: 'invalid_blocks' };
      posted[at] = { ...before, body };
      return { ok: true, channel: before.channel, ts: before.ts };
    },
    'conversations.history': (team, fields) => history(team, fields, null),
    'conversations.replies': (team, fields) => history(team, fields, fields['ts'] ?? null),
    'conversations.open': (team, fields) => {
      const id = `D${fields['users'] ?? ''}${team.id}`;
      channels.set(id, { id, team: team.id, open: true });
      return { ok: true, channel: { id } };
    },
    'views.open': openView,
    'views.publish': (team, fields) => {
      const view = json(fields['view']) as View['view'];
      if (hold('home', view) !== null) return { ok: false, error: 'invalid_arguments' };
      homes.push({
        id: `V${String(next())}`,
        team: team.id,
        person: fields['user_id'] ?? '',
        view,
      });
      return { ok: true };
    },
    'pins.add': (_team, fields) => {
      const ts = fields['timestamp'] ?? '';
      if (pins.includes(ts)) return { ok: false, error: 'already_pinned' };
      pins.push(ts);
      return { ok: true };
    },
    'pins.remove': (_team, fields) => {
      const at = pins.indexOf(fields['timestamp'] ?? '');
      if (at < 0) return { ok: false, error: 'no_pin' };
      pins.splice(at, 1);
      return { ok: true };
    },
    'users.info': (team, fields) => ({
      ok: true,
      user: {
        id: fields['user'],
        team_id: team.id,
        is_admin: fields['user'] === 'U0OWNER',
        profile: { display_name: `Name of ${fields['user'] ?? ''}` },
      },
    }),
    'usergroups.list': () => ({
      ok: true,
      usergroups: [
        { id: 'S0ENG', name: 'Night Engineers', handle: 'engineers', users: ['U0ENGINEER'] },
      ],
    }),
    'files.getUploadURLExternal': (_team, fields) => {
      const id = `F${String(next())}`;
      uploads.set(id, { alt: fields['alt_text'] ?? '', bytes: 0, name: fields['filename'] ?? '' });
      return { ok: true, upload_url: `${base}/upload/${id}`, file_id: id };
    },
    'files.completeUploadExternal': (team, fields) => {
      const channel = channelOf(team, fields['channel_id'] ?? '');
      if (channel === undefined) return { ok: false, error: 'channel_not_found' };
      for (const { id } of json(fields['files']) as readonly { id: string }[]) {
        const file = uploads.get(id) ?? { alt: '', bytes: 0, name: '' };
        if (file.alt === '' && file.name.endsWith('.png')) faults.push('a picture without words');
        pictures.push({ channel: channel.id, thread: fields['thread_ts'] ?? null, ...file });
      }
      return { ok: true, files: [] };
    },
  };

  const api = (method: string, token: string, fields: Fields): Record<string, unknown> => {
    if (method === 'apps.connections.open')
      return token === APP_TOKEN
        ? { ok: true, url: `${base.replace('http', 'ws')}/socket` }
        : { ok: false, error: 'invalid_auth' };
    const team = TEAMS.find(({ botToken }) => botToken === token);
    if (team === undefined) return { ok: false, error: 'invalid_auth' };
    const act = methods[method];
    if (act === undefined) {
      faults.push(`no such method: ${method}`);
      return { ok: false, error: 'unknown_method' };
    }
    return act(team, fields);
  };

  const answer = (
    response: http.ServerResponse,
    status: number,
    body: unknown,
    headers = {},
  ): void => {
    response.writeHead(status, { 'content-type': 'application/json', ...headers });
    response.end(JSON.stringify(body));
  };

  /** A method as it goes today. */
  const withFortune = (
    response: http.ServerResponse,
    method: string,
    act: () => Record<string, unknown>,
  ): void => {
    const misfortune = misfortunes.get(method)?.shift();
    if (misfortune === undefined) answer(response, 200, act());
    else if ('error' in misfortune) answer(response, 200, { ok: false, error: misfortune.error });
    else if (misfortune.status === 429)
      answer(
        response,
        429,
        { ok: false, error: 'ratelimited' },
        { 'retry-after': misfortune.after },
      );
    else {
      if (misfortune.done) act();
      answer(response, 500, {});
    }
  };

  const respond = (response: http.ServerResponse, id: string, text: string): void => {
    const address = responses.get(id);
    calls.push({ method: 'response_url', token: '', at: Date.now() });
    const misfortune = misfortunes.get('response_url')?.shift();
    if (misfortune !== undefined && 'status' in misfortune && misfortune.status === 500) {
      response.writeHead(500).end();
      return;
    }
    if (address === undefined || address.left <= 0) {
      response.writeHead(404).end('used_url');
      return;
    }
    address.left -= 1;
    const body = JSON.parse(text) as Body & { response_type: string; thread_ts?: string };
    if (hold('message', body) !== null) {
      response.writeHead(400).end('invalid_blocks');
      return;
    }
    store({
      by: 'response',
      team: address.team,
      channel: address.channel,
      thread: body.thread_ts ?? null,
      only: body.response_type === 'in_channel' ? null : address.person,
      body,
      metadata: null,
    });
    response.writeHead(200).end('ok');
  };

  const server = http.createServer((request, response) => {
    const serve = async (): Promise<void> => {
      const bytes = await readBody(request);
      const [, room = '', rest = ''] = (request.url ?? '').split('/');
      if (room === 'respond') {
        respond(response, rest, bytes.toString());
        return;
      }
      if (room === 'upload') {
        const file = uploads.get(rest);
        if (file !== undefined) uploads.set(rest, { ...file, bytes: bytes.length });
        response.writeHead(200).end('OK');
        return;
      }
      const fields = Object.fromEntries(new URLSearchParams(bytes.toString()));
      const token = (request.headers.authorization ?? '').replace('Bearer ', '');
      calls.push({ method: rest, token, at: Date.now() });
      withFortune(response, rest, () => api(rest, token, fields));
    };
    serve().catch((error: unknown) => {
      faults.push(String(error));
      response.writeHead(500).end();
    });
  });

  const gateway = new WebSocketServer({ server, path: '/socket' });
  gateway.on('connection', (socket) => {
    sockets.add(socket);
    socket.on('close', () => sockets.delete(socket));
    socket.on('message', (data: Buffer) => {
      const { envelope_id, payload } = JSON.parse(data.toString()) as {
        envelope_id: string;
        payload: unknown;
      };
      acks.get(envelope_id)?.(payload);
    });
    socket.send(JSON.stringify({ type: 'hello', num_connections: sockets.size }));
    opened += 1;
  });

  await new Promise<void>((done) => server.listen(0, '127.0.0.1', done));
  const base = `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`;

  const viaSocket = (envelope: Envelope, id: string, retry: number): Promise<Acked | null> => {
    const [socket] = [...sockets];
    if (socket === undefined) return Promise.resolve(null);
    const since = performance.now();
    return new Promise((done) => {
      const late = setTimeout(() => done(null), 3_000);
      acks.set(id, (payload) => {
        clearTimeout(late);
        done({ payload, ms: performance.now() - since });
      });
      socket.send(
        JSON.stringify({
          ...envelope,
          envelope_id: id,
          accepts_response_payload: envelope.type !== 'events_api',
          ...(retry === 0 ? {} : { retry_attempt: retry, retry_reason: 'timeout' }),
        }),
      );
    });
  };

  /** As Slack writes it: a form for commands and interactions, JSON for events. */
  const encoded = ({ type, payload }: Envelope): { text: string; kind: string } => {
    if (type === 'events_api') return { text: JSON.stringify(payload), kind: 'application/json' };
    const fields =
      type === 'slash_commands' ? (payload as Fields) : { payload: JSON.stringify(payload) };
    return {
      text: new URLSearchParams(fields).toString(),
      kind: 'application/x-www-form-urlencoded',
    };
  };

  const signed = async (
    url: string,
    envelope: Envelope,
    { at = Math.floor(Date.now() / 1000), retry = 0, secret = SIGNING_SECRET } = {},
  ): Promise<{ status: number; text: string; ms: number }> => {
    const { text, kind } = encoded(envelope);
    const signature = createHmac('sha256', secret)
      .update(`v0:${String(at)}:${text}`)
      .digest('hex');
    const since = performance.now();
    const response = await fetch(url, {
      method: 'POST',
      headers: {
        'content-type': kind,
        'x-slack-request-timestamp': String(at),
        'x-slack-signature': `v0=${signature}`,
        ...(retry === 0
          ? {}
          : { 'x-slack-retry-num': String(retry), 'x-slack-retry-reason': 'http_timeout' }),
      },
      body: text,
    });
    return { status: response.status, text: await response.text(), ms: performance.now() - since };
  };

  const deliver = async (
    envelope: Envelope,
    id = `E${String(next())}`,
    retry = 0,
  ): Promise<Acked | null> => {
    if (mode === null) return await viaSocket(envelope, id, retry);
    const { status, text, ms } = await signed(mode.url, envelope, { retry });
    if (status !== 200) return null;
    return {
      payload: text === '' ? undefined : text.startsWith('{') ? JSON.parse(text) : text,
      ms,
    };
  };

  return {
    api: `${base}/api/`,
    posted,
    views,
    homes,
    pictures,
    pins,
    calls,
    /** Everything that Slack would have refused, or that the counterpart should not have sent. */
    faults,
    check,
    deliver,
    signed,
    encoded,
    next,
    useHttp: (url: string): void => {
      mode = { url };
    },
    allowRinging: (...inside: readonly string[]): void => {
      mayRing = new Set(inside);
    },
    /** What the next calls of a method meet, in this order. */
    meet: (method: string, ...what: readonly Misfortune[]): void => {
      misfortunes.set(method, [...(misfortunes.get(method) ?? []), ...what]);
    },
    trigger: (team: string, person: string, lasts = 3_000): string => {
      const id = `${String(next())}.${team}.trigger`;
      triggers.set(id, { until: Date.now() + lasts, used: false, person, team });
      return id;
    },
    responseUrl: (team: string, channel: string, person: string, left = 5): string => {
      const id = `R${String(next())}`;
      responses.set(id, { team, channel, person, left });
      return `${base}/respond/${id}`;
    },
    /** The connection breaks without a word. */
    drop: (): void => {
      for (const socket of sockets) socket.terminate();
      sockets.clear();
    },
    /** The connection is asked to come again. */
    refresh: (): void => {
      for (const socket of sockets)
        socket.send(JSON.stringify({ type: 'disconnect', reason: 'refresh_requested' }));
    },
    /** Connections that were ever made. */
    get opened(): number {
      return opened;
    },
    stop: async (): Promise<void> => {
      for (const socket of sockets) socket.terminate();
      gateway.close();
      server.closeAllConnections();
      await new Promise((done) => server.close(done));
    },
  };
};
