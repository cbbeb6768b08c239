import type { IncomingMessage, ServerResponse } from 'node:http';
import { setTimeout as pause } from 'node:timers/promises';
import {
  App,
  type Authorize,
  HTTPReceiver,
  type HTTPReceiverOptions,
  type Logger,
  LogLevel,
  SocketModeReceiver,
  webApi,
} from '@slack/bolt';
import type { Log } from '../common/log.ts';
import { faultText, isRefused } from './faults.ts';

/** One of the tokens is none; the name says which. */
export class TokenRefused extends Error {
  readonly variable: string;
  constructor(variable: string) {
    super(variable);
    this.variable = variable;
  }
}

/** A workspace that this bot is in. */
export type Installation = {
  readonly team: string;
  readonly botToken: string;
  readonly botId: string;
  readonly botUserId: string;
};

/** A call that takes longer is tried again or given up. Judgement. */
const CALL_PATIENCE_MS = 10_000;
/** Slack's own bodies are far smaller. Judgement. */
const BODY_LIMIT = 1024 * 1024;
/** As old, or as far ahead, as a signed request may be (authentication, verifying requests). */
const AGE_LIMIT_S = 300;

/** Built anew for each client: the library changes what it is given. */
export const clientOptions = (
  api: string | undefined,
  logger?: Logger,
): webApi.WebClientOptions => ({
  ...(api === undefined ? {} : { slackApiUrl: api }),
  ...(logger === undefined ? {} : { logger }),
  // The sender knows what may be sent a second time; the client does not.
  retryConfig: { retries: 0 },
  timeout: CALL_PATIENCE_MS,
});

/** What a library says, without tokens and addresses. */
const scrubbed = (said: readonly unknown[]): string =>
  said
    .map((each) => (each instanceof Error ? each.name : String(each)))
    .join(' ')
    .replaceAll(/\bxox[a-z]-[\w-]+|\bxapp-[\w-]+|\b(?:https?|wss?):\/\/\S+/gu, '…')
    .slice(0, 300);

/** The library's own log: only what is out of order, and nothing secret. */
export const loggerFor = (log: Log): Logger => ({
  debug: () => undefined,
  info: () => undefined,
  warn: (...said) => log.note('slack library', { said: scrubbed(said) }),
  error: (...said) => log.note('slack library', { said: scrubbed(said), isError: true }),
  setLevel: () => undefined,
  getLevel: () => LogLevel.WARN,
  setName: () => undefined,
});

const refusedAs = async <T>(variable: string, call: Promise<T>): Promise<T> => {
  try {
    return await call;
  } catch (error) {
    if (isRefused(error, 'tokenWrong')) throw new TokenRefused(variable);
    throw error;
  }
};

/** Tries a bot token before anything else can fail over it. */
export const installationOf = async (
  botToken: string,
  api: string | undefined,
  logger: Logger,
): Promise<Installation> => {
  const client = new webApi.WebClient(botToken, clientOptions(api, logger));
  const found = await refusedAs('SLACK_BOT_TOKEN', client.auth.test());
  return {
    team: found.team_id ?? '',
    botToken,
    botId: found.bot_id ?? '',
    botUserId: found.user_id ?? '',
  };
};

/** A request of a workspace that this bot is not in is nobody's. */
const authorizeBy =
  (installations: readonly Installation[]): Authorize<boolean> =>
  async ({ teamId }) => {
    const found = installations.find(({ team }) => team === teamId);
    if (found === undefined) throw new Error('no such workspace');
    const { team, botToken, botId, botUserId } = found;
    return await Promise.resolve({ teamId: team, botToken, botId, botUserId });
  };

const appWith = (
  receiver: HTTPReceiver | SocketModeReceiver,
  installations: readonly Installation[],
  api: string | undefined,
  logger: Logger,
): App =>
  new App({
    receiver,
    authorize: authorizeBy(installations),
    clientOptions: clientOptions(api, logger),
    logger,
  });

export type Connection = {
  readonly app: App;
  readonly start: () => Promise<void>;
  readonly stop: () => Promise<void>;
};

export type Connecting = {
  readonly installations: readonly Installation[];
  readonly api: string | undefined;
  readonly log: Log;
  readonly logger: Logger;
};

/** Pauses before the next try to connect: at once, then longer. Judgement. */
const FIRST_PAUSE_MS = 250;
const LONGEST_PAUSE_MS = 30_000;

/**
 * By a socket that the bot opens. The library would wait five seconds before it opens another,
 * and end the program where that fails; here the next one is opened at once, and again until it is.
 */
export const connectSocket = (
  { installations, api, log, logger }: Connecting,
  appToken: string,
): Connection => {
  const receiver = new SocketModeReceiver({
    appToken,
    logger,
    autoReconnectEnabled: false,
    installerOptions: { clientOptions: clientOptions(api, logger) },
  });
  const app = appWith(receiver, installations, api, logger);
  let isWanted = false;
  let isConnecting = false;

  const connect = async (): Promise<void> => {
    if (isConnecting) return;
    isConnecting = true;
    for (let attempt = 0; isWanted; attempt += 1) {
      try {
        await receiver.client.start();
        log.note('connected', {});
        break;
      } catch (error) {
        log.fault('connect', { fault: faultText(error) });
        await pause(Math.min(FIRST_PAUSE_MS * 2 ** attempt, LONGEST_PAUSE_MS));
      }
    }
    isConnecting = false;
  };

  receiver.client.on('disconnected', () => {
    if (!isWanted || isConnecting) return;
    log.note('disconnected', {});
    connect().catch((error: unknown) => log.fault('connect', { fault: faultText(error) }));
  });

  return {
    app,
    start: async () => {
      const client = new webApi.WebClient(appToken, clientOptions(api, logger));
      await refusedAs('SLACK_APP_TOKEN', client.apps.connections.open({}));
      isWanted = true;
      await connect();
    },
    stop: async () => {
      isWanted = false;
      await receiver.client.disconnect();
    },
  };
};

/** Signed long ago, or ahead of time: the library looks only one way. */
const isTimely = ({ headers }: IncomingMessage): boolean => {
  const at = Number(headers['x-slack-request-timestamp']);
  return Math.abs(Date.now() / 1000 - at) <= AGE_LIMIT_S;
};

/** Said to be larger than anything Slack sends: not read at all. */
const isTooLarge = ({ headers }: IncomingMessage): boolean =>
  Number(headers['content-length'] ?? 0) > BODY_LIMIT;

class GuardedReceiver extends HTTPReceiver {
  constructor(options: HTTPReceiverOptions) {
    super(options);
    const listener = this.requestListener;
    this.requestListener = (request: IncomingMessage, response: ServerResponse) => {
      const status = isTooLarge(request) ? 413 : isTimely(request) ? null : 401;
      if (status === null) {
        listener(request, response);
        return;
      }
      response.writeHead(status, { connection: 'close' });
      response.end(() => request.destroy());
    };
  }
}

export type Listen = {
  readonly signingSecret: string;
  readonly port: number;
  /** Every address of the machine where none is named. */
  readonly host?: string | undefined;
};

/** By requests that Slack makes, each signed. */
export const connectHttp = (
  { installations, api, logger }: Connecting,
  { signingSecret, port, host }: Listen,
): Connection => {
  const receiver = new GuardedReceiver({
    signingSecret,
    bodyLimit: BODY_LIMIT,
    logger,
    installerOptions: { clientOptions: clientOptions(api, logger) },
  });
  return {
    app: appWith(receiver, installations, api, logger),
    start: async () => {
      await receiver.start({ port, ...(host === undefined ? {} : { host }) });
    },
    stop: () => receiver.stop(),
  };
};
