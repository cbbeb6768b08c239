import { type Client, Events } from 'discord.js';
import type { Log } from '../common/log.ts';
import { faultText } from './faults.ts';

/** The token is none, or is one no longer. */
export class TokenRefused extends Error {}

/** The gateway's word for a token that is none (topics/opcodes-and-status-codes, close codes). */
const AUTHENTICATION_FAILED = 4004;

/** The connection is gone for good: nothing brings it back but another start. */
export class ConnectionEnded extends Error {
  readonly code: number;
  constructor(code: number) {
    super(String(code));
    this.code = code;
  }
}

const endedBy = (code: number): Error =>
  code === AUTHENTICATION_FAILED ? new TokenRefused(String(code)) : new ConnectionEnded(code);

/** What goes wrong with the connection is written down; what ends it is told to whoever started it. */
export const watch = (client: Client, log: Log, onEnded: (error: Error) => void): void => {
  client.on(Events.Error, (error) => log.fault('client', { fault: faultText(error) }));
  client.on(Events.ShardError, (error) => log.note('gateway', { fault: faultText(error) }));
  client.on(Events.ShardReconnecting, (shard) => log.note('reconnecting', { shard }));
  client.on(Events.ShardResume, (shard, replayed) => log.note('resumed', { shard, replayed }));
  client.on(Events.ShardDisconnect, ({ code }, shard) => {
    log.fault('disconnected', { shard, code });
    onEnded(endedBy(code));
  });
  client.on(Events.GuildDelete, ({ id, available }) => {
    if (available) log.note('left', { shop: id });
  });
};

const ready = (client: Client): Promise<Client<true>> =>
  new Promise((done) => {
    client.once(Events.ClientReady, done);
  });

const isTokenFault = (error: unknown): boolean =>
  error instanceof Error &&
  (('code' in error && error.code === 'TokenInvalid') ||
    ('status' in error && error.status === 401));

/** Logs in and waits until everything is there; ends where the gateway refuses it after all. */
export const login = async (
  client: Client,
  token: string,
  ended: Promise<never>,
): Promise<Client<true>> => {
  const isReady = ready(client);
  try {
    await Promise.race([client.login(token), ended]);
    return await Promise.race([isReady, ended]);
  } catch (error) {
    await client.destroy();
    if (isTokenFault(error)) throw new TokenRefused('401');
    throw error;
  }
};
