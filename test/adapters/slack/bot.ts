/** The bot as it runs, with the real client, against the local counterpart. */
import { FLEET } from '../../../commands/index.ts';
import type { Log } from '../../../src/adapters/common/log.ts';
import { openSlack, type SlackOptions } from '../../../src/adapters/slack/index.ts';
import { type Desk, openDesk, plainShop } from '../../../src/desk/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { openPeople } from '../../platforms/slack/people.ts';
import { APP_TOKEN, openPlatform, SIGNING_SECRET, TEAMS } from '../../platforms/slack/platform.ts';
import { bodyCheck } from '../../platforms/slack/schemas.ts';
import { until } from '../../support/until.ts';

export { until } from '../../support/until.ts';

const CHECK = bodyCheck();

export type Noted = {
  readonly what: string;
  readonly details: Readonly<Record<string, unknown>>;
};

const freePort = async (): Promise<number> => {
  const { createServer } = await import('node:net');
  return await new Promise((done) => {
    const server = createServer().listen(0, '127.0.0.1', () => {
      const address = server.address();
      const port = typeof address === 'object' && address !== null ? address.port : 0;
      server.close(() => done(port));
    });
  });
};

export type Wanted = Partial<SlackOptions> & {
  readonly http?: boolean;
  readonly breakDesk?: (desk: Desk) => Desk;
};

export const openBot = async ({
  http = false,
  breakDesk = (desk) => desk,
  ...more
}: Wanted = {}) => {
  const platform = await openPlatform(CHECK);
  const faults: Noted[] = [];
  const notes: Noted[] = [];
  const log: Log = {
    fault: (what, details) => void faults.push({ what, details }),
    note: (what, details) => void notes.push({ what, details }),
  };
  const port = await freePort();
  const bot = await openSlack({
    botTokens: TEAMS.map(({ botToken }) => botToken),
    by: http ? { signingSecret: SIGNING_SECRET, port, host: '127.0.0.1' } : { appToken: APP_TOKEN },
    api: platform.api,
    desk: breakDesk(openDesk(FLEET, plainShop('in'))),
    book: en,
    log,
    ...more,
  }).catch(async (error: unknown) => {
    await platform.stop();
    throw error;
  });
  const url = `http://127.0.0.1:${String(port)}/slack/events`;
  if (http) platform.useHttp(url);
  return {
    platform,
    bot,
    people: openPeople(platform),
    url,
    faults,
    notes,
    /** Waits for so many messages and gives back those that came after the first `before`. */
    posted: async (most: number) => {
      await until(() => platform.posted.length >= most, `${String(most)} messages`);
      return platform.posted;
    },
    stop: async (): Promise<void> => {
      await bot.stop();
      await platform.stop();
    },
  };
};
export type Bot = Awaited<ReturnType<typeof openBot>>;

/** Everything that a person reads in a message. */
export const readable = (body: unknown): string =>
  JSON.stringify(body)
    .replaceAll('\\n', ' ')
    .replaceAll(/<!date\^0+\^\{_\}\|(.)>/gu, '$1')
    .replaceAll('&lt;', '<')
    .replaceAll('&gt;', '>')
    .replaceAll('&amp;', '&');
