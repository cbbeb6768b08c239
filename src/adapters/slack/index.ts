import { webApi } from '@slack/bolt';
import type { Desk, Effect } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import type { Delivering, Delivery } from '../common/delivery.ts';
import type { Log } from '../common/log.ts';
import { type Once, onceInProcess } from '../common/once.ts';
import { inTurns } from '../common/turns.ts';
import {
  type Connecting,
  type Connection,
  clientOptions,
  connectHttp,
  connectSocket,
  installationOf,
  type Listen,
  loggerFor,
} from './connect.ts';
import { deliverEffect } from './effects.ts';
import { faultText } from './faults.ts';
import { openFlow } from './flow.ts';
import { listen } from './listen.ts';
import { openPeople } from './people.ts';
import type { Draw } from './pictures.ts';
import { interactionOf } from './receive.ts';
import { openSender } from './send.ts';

export { TokenRefused } from './connect.ts';
export { manifestFor } from './manifest.ts';

export type SlackOptions = {
  /** One for each workspace that the bot is in. */
  readonly botTokens: readonly string[];
  readonly by: { readonly appToken: string } | Listen;
  /** Of a proxy or a local counterpart; the socket's address comes from it. */
  readonly api?: string | undefined;
  readonly desk: Desk;
  readonly book: Book;
  readonly log: Log;
  readonly draw?: Draw;
  /** Of the records, where several processes share the work. */
  readonly once?: Once;
  readonly formPatienceMs?: number;
};

export type Slack = {
  /** The workspaces it is in. */
  readonly teams: readonly string[];
  /** Makes an effect happen that was queued with a change. */
  readonly deliver: (effect: Effect, delivering: Delivering) => Promise<Delivery>;
  readonly stop: () => Promise<void>;
};

/** Judgement: of the three seconds there are, half for the answer and half for the way. */
const FORM_PATIENCE_MS = 1_500;

/** Every interaction goes on only once, however often it comes. */
const onlyOnce = ({ app }: Connection, once: Once, log: Log): void => {
  /** Where it cannot be told, it goes on: the desk does nothing twice either. */
  const isNew = async (name: string): Promise<boolean> => {
    try {
      return await once(name);
    } catch (error) {
      log.fault('once', { fault: faultText(error) });
      return true;
    }
  };
  app.use(async ({ body, context, next, ...rest }) => {
    const id = interactionOf(body);
    if (id === null || (await isNew(`${context.teamId ?? ''} ${id}`))) {
      await next();
      return;
    }
    log.note('repeated', { interaction: id });
    if ('ack' in rest && typeof rest.ack === 'function') await rest.ack();
  });
};

/** Connects, and answers until stopped. */
export const openSlack = async (options: SlackOptions): Promise<Slack> => {
  const { by, api, book, log, once = onceInProcess() } = options;
  const desk = inTurns(options.desk);
  const logger = loggerFor(log);
  const installations = await Promise.all(
    options.botTokens.map((token) => installationOf(token, api, logger)),
  );
  const connecting: Connecting = { installations, api, log, logger };
  const connection =
    'appToken' in by ? connectSocket(connecting, by.appToken) : connectHttp(connecting, by);
  const busy = new Set<Promise<void>>();
  /** Nothing that happens to one event may end the program. */
  const keep = (what: string, work: Promise<void>): void => {
    const watched = work
      .catch((error: unknown) => log.fault(what, { fault: faultText(error), error }))
      .finally(() => busy.delete(watched));
    busy.add(watched);
  };
  const draw = options.draw ?? null;
  const formPatienceMs = options.formPatienceMs ?? FORM_PATIENCE_MS;
  // Looked up by clients of their own: a pause that Slack asks of them holds no answer back.
  const lookers = new Map(
    installations.map(({ team, botToken }) => {
      const patient = { ...clientOptions(api, logger), rejectRateLimitedCalls: true };
      return [team, openSender(new webApi.WebClient(botToken, patient))] as const;
    }),
  );
  const people = openPeople((shop) => lookers.get(shop) ?? null, log);
  const flow = openFlow({ desk, book, log, draw, people });
  onlyOnce(connection, once, log);
  listen(connection.app, { desk, book, log, flow, keep, formPatienceMs });
  connection.app.error((error) => {
    log.fault('event', { fault: faultText(error), error });
    return Promise.resolve();
  });
  await connection.start();
  return {
    teams: installations.map(({ team }) => team),
    deliver: async (effect, delivering) => {
      const found = installations.find(({ team }) => team === delivering.shop);
      if (found === undefined) return { delivered: false, fault: 'no such workspace', final: true };
      const client = new webApi.WebClient(found.botToken, clientOptions(api, logger));
      return await deliverEffect(openSender(client), book, effect, delivering);
    },
    stop: async () => {
      await Promise.allSettled(busy);
      await connection.stop();
    },
  };
};
