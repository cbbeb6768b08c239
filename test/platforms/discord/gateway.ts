/** The gateway: sessions that outlive their connection, and what was missed told again. */
import type http from 'node:http';
import { type WebSocket, WebSocketServer } from 'ws';
import { TOKEN } from './world.ts';

/** topics/opcodes-and-status-codes. */
const OP = {
  dispatch: 0,
  heartbeat: 1,
  identify: 2,
  resume: 6,
  reconnect: 7,
  invalidSession: 9,
  hello: 10,
  heartbeatTaken: 11,
} as const;
const AUTHENTICATION_FAILED = 4004;
/** As the platform's own: no test lasts as long. */
const HEARTBEAT_MS = 41_250;

type Event = { readonly s: number; readonly t: string; readonly d: unknown };
type Session = { readonly id: string; readonly events: Event[]; socket: WebSocket | null };
type Frame = { readonly op: number; readonly d: Readonly<Record<string, unknown>> | number | null };

export type Dispatch = { readonly t: string; readonly d: unknown };

export type Gateway = ReturnType<typeof openGateway>;

export const openGateway = (
  server: http.Server,
  /** What a new session is told first. */
  greeting: (session: string) => readonly Dispatch[],
) => {
  const sessions = new Map<string, Session>();
  const sockets = new Set<WebSocket>();
  const intents: number[] = [];
  let connections = 0;
  let resumed = 0;
  let refusals = 0;

  const send = (socket: WebSocket, op: number, d: unknown, more: object = {}): void =>
    socket.send(JSON.stringify({ op, d, s: null, t: null, ...more }));

  const tell = (session: Session, { t, d }: Dispatch): void => {
    const event = { s: session.events.length + 1, t, d };
    session.events.push(event);
    if (session.socket !== null) send(session.socket, OP.dispatch, d, event);
  };

  const identify = (socket: WebSocket, d: Readonly<Record<string, unknown>>): void => {
    if (d['token'] !== TOKEN) {
      socket.close(AUTHENTICATION_FAILED, 'Authentication failed.');
      return;
    }
    intents.push(Number(d['intents']));
    const session: Session = { id: `session-${String(intents.length)}`, events: [], socket };
    sessions.set(session.id, session);
    for (const event of greeting(session.id)) tell(session, event);
  };

  const resume = (socket: WebSocket, d: Readonly<Record<string, unknown>>): void => {
    const session = sessions.get(String(d['session_id']));
    if (session === undefined || d['token'] !== TOKEN) {
      send(socket, OP.invalidSession, false);
      return;
    }
    session.socket = socket;
    resumed += 1;
    for (const event of session.events.filter(({ s }) => s > Number(d['seq'])))
      send(socket, OP.dispatch, event.d, event);
    tell(session, { t: 'RESUMED', d: {} });
  };

  const hear = (socket: WebSocket, { op, d }: Frame): void => {
    if (op === OP.heartbeat) send(socket, OP.heartbeatTaken, null);
    else if (op === OP.identify && typeof d === 'object') identify(socket, d ?? {});
    else if (op === OP.resume && typeof d === 'object') resume(socket, d ?? {});
  };

  const left = (socket: WebSocket): void => {
    sockets.delete(socket);
    for (const session of sessions.values()) if (session.socket === socket) session.socket = null;
  };

  const ears = new WebSocketServer({ server });
  ears.on('connection', (socket) => {
    if (refusals > 0) {
      refusals -= 1;
      socket.terminate();
      return;
    }
    connections += 1;
    sockets.add(socket);
    socket.on('close', () => left(socket));
    socket.on('message', (data: Buffer) => hear(socket, JSON.parse(data.toString()) as Frame));
    send(socket, OP.hello, { heartbeat_interval: HEARTBEAT_MS });
  });

  const drop = (): void => {
    for (const socket of sockets) {
      left(socket);
      socket.terminate();
    }
  };

  return {
    /** What every session was connected for. */
    intents,
    dispatch: (event: Dispatch): void => {
      for (const session of sessions.values()) tell(session, event);
    },
    /** The connection breaks without a word; its session stays. */
    drop,
    /** The platform hangs up, and says why. */
    end: (code: number): void => {
      for (const socket of sockets) socket.close(code);
    },
    /** The connection is asked to come again. */
    refresh: (): void => {
      for (const socket of sockets) send(socket, OP.reconnect, null);
    },
    /** No session is known any more: whoever comes back has to begin anew. */
    forget: (): void => sessions.clear(),
    /** So many connections break at once. */
    refuse: (count: number): void => {
      refusals = count;
    },
    get connections(): number {
      return connections;
    },
    get resumed(): number {
      return resumed;
    },
    /** Somebody is listening. */
    get isHeard(): boolean {
      return [...sessions.values()].some(({ socket }) => socket !== null);
    },
    stop: (): void => {
      drop();
      ears.close();
    },
  };
};
