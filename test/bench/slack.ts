/**
 * Two hundred people ask at once in Slack, beside a bare app of the same library that says a fixed
 * message of the same size. Ratios in one run; the platform gives three seconds to acknowledge.
 */
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { App, SocketModeReceiver } from '@slack/bolt';
import { FLEET } from '../../commands/index.ts';
import { openDraw } from '../../src/adapters/common/draw.ts';
import type { Log } from '../../src/adapters/common/log.ts';
import { openSlack, type SlackOptions } from '../../src/adapters/slack/index.ts';
import { openRecordsDesk } from '../../src/desk/index.ts';
import { openRenderer } from '../../src/drawing/index.ts';
import { en } from '../../src/phrases/index.ts';
import { openStore } from '../../src/store/index.ts';
import { openPeople } from '../platforms/slack/people.ts';
import { APP_TOKEN, openPlatform, type Platform, TEAMS } from '../platforms/slack/platform.ts';

const PEOPLE = 200;
const LINES = [
  '1.000 straight 21tpi 1018',
  '19mm diamond 1.0 pitch 304 long 30mm out 60mm',
  '7/8 diagonal left 96dp brass',
  '20mm RGE 0.8 6061 wheel 20x8x6 bevel 1 fill 85%',
  '1.250 straight 16tpi 303',
];
/** What Slack waits for an acknowledgement. */
export const MOST_ACK_MS = 3_000;

export type Burst = {
  readonly ackMedianMs: number;
  readonly ackWorstMs: number;
  /** Until the last of them had an answer. */
  readonly answeredMs: number;
};

const until = async (holds: () => boolean): Promise<void> => {
  const end = Date.now() + 120_000;
  while (!holds()) {
    if (Date.now() > end) throw new Error('not answered in two minutes');
    await new Promise((done) => setTimeout(done, 5));
  }
};

/** Everybody asks before anybody is answered. */
const burst = async (platform: Platform): Promise<Burst> => {
  const people = openPeople(platform);
  const before = platform.posted.length;
  const since = performance.now();
  const acks = await Promise.all(
    Array.from({ length: PEOPLE }, (_, i) =>
      people.slash(LINES[i % LINES.length] ?? '', { id: `U0P${String(i)}` }),
    ),
  );
  await until(() => platform.posted.length >= before + PEOPLE);
  const answeredMs = performance.now() - since;
  const waits = acks.map((ack) => ack?.ms ?? Number.POSITIVE_INFINITY).sort((a, b) => a - b);
  return {
    ackMedianMs: waits[PEOPLE / 2] ?? Number.NaN,
    ackWorstMs: waits.at(-1) ?? Number.NaN,
    answeredMs,
  };
};

/** The second burst counts: the engine has warmed up, and everybody is known. */
const warmBurst = async (platform: Platform): Promise<Burst> => {
  await burst(platform);
  return await burst(platform);
};

const SILENT: Log = { fault: () => undefined, note: () => undefined };

const ours = async (
  draw: SlackOptions['draw'] | null,
): Promise<{ readonly times: Burst; readonly text: string; readonly blocks: string }> => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'wholetooth-bench-'));
  const store = await openStore({ engine: 'sqlite', file: path.join(folder, 'records.sqlite') });
  const platform = await openPlatform(() => null);
  const bot = await openSlack({
    botTokens: TEAMS.map(({ botToken }) => botToken),
    by: { appToken: APP_TOKEN },
    api: platform.api,
    desk: openRecordsDesk(FLEET, store, { platform: 'slack', program: 'bench', now: Date.now }),
    book: en,
    log: SILENT,
    ...(draw === null || draw === undefined ? {} : { draw }),
  });
  try {
    const times = await warmBurst(platform);
    const body = platform.posted.at(-1)?.body;
    return { times, text: body?.text ?? '', blocks: JSON.stringify(body?.blocks ?? []) };
  } finally {
    await bot.stop();
    await platform.stop();
    await store.close();
    fs.rmSync(folder, { recursive: true, force: true });
  }
};

/** As little as an app of this library can do: acknowledge, and say what it always says. */
const bare = async (text: string, blocks: string): Promise<Burst> => {
  const platform = await openPlatform(() => null);
  const clientOptions = { slackApiUrl: platform.api, retryConfig: { retries: 0 } };
  const receiver = new SocketModeReceiver({
    appToken: APP_TOKEN,
    installerOptions: { clientOptions: { ...clientOptions } },
  });
  const [team] = TEAMS;
  const app = new App({ token: team?.botToken ?? '', receiver, clientOptions });
  app.command(/.*/u, async ({ ack, body, client }) => {
    await ack();
    await client.chat.postMessage({
      channel: body.channel_id,
      text,
      blocks: JSON.parse(blocks) as [],
    });
  });
  await receiver.client.start();
  try {
    return await warmBurst(platform);
  } finally {
    await receiver.client.disconnect();
    await platform.stop();
  }
};

export const benchSlack = async () => {
  const cards = await ours(null);
  const drawing = openDraw(en, openRenderer(), () => undefined);
  return {
    bare: await bare(cards.text, cards.blocks),
    cards: cards.times,
    pictured: (await ours(drawing)).times,
  };
};

const ms = (value: number): string => `${value.toFixed(0)} ms`;
const times = (value: number, of: number): string => `${(value / of).toFixed(1)} times`;

/** A line for each: what it took, and how many times what the bare app takes. */
export const slackLines = (found: Awaited<ReturnType<typeof benchSlack>>): readonly string[] =>
  (
    [
      ['a bare app that says a fixed message of this size', found.bare],
      ['cards, with records', found.cards],
      ['cards, with records and pictures that follow', found.pictured],
    ] as const
  ).map(
    ([name, { ackMedianMs, ackWorstMs, answeredMs }]) =>
      `${name.padEnd(52)} acknowledged in ${ms(ackMedianMs)}, at the worst ${ms(ackWorstMs)} (${times(ackWorstMs, found.bare.ackWorstMs)}); all answered in ${ms(answeredMs)} (${times(answeredMs, found.bare.answeredMs)})`,
  );

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const found = await benchSlack();
  process.stdout.write(`${slackLines(found).join('\n')}\n`);
  const worst = Math.max(found.cards.ackWorstMs, found.pictured.ackWorstMs);
  process.exitCode = worst > MOST_ACK_MS ? 1 : 0;
}
