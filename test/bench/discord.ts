/**
 * Two hundred people ask at once in Discord, beside a bare bot of the same library that says a
 * fixed message of the same size. Each bot is a process of its own; ratios in one run.
 */
import { fork } from 'node:child_process';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { FLEET } from '../../commands/index.ts';
import { register } from '../../src/adapters/discord/index.ts';
import { en } from '../../src/phrases/index.ts';
import { openPeople } from '../platforms/discord/people.ts';
import { openPlatform, type Platform } from '../platforms/discord/platform.ts';
import { APPLICATION, OPERATOR, TOKEN } from '../platforms/discord/world.ts';
import { until } from '../support/until.ts';
import type { Told } from './discordProgram.ts';

const PEOPLE = 200;
/** What Discord waits for an acknowledgement, and what the job asks of the event loop. */
export const MOST_ACK_MS = 3_000;
export const MOST_BLOCKED_MS = 50;
const PATIENCE_MS = 120_000;

export type Burst = {
  readonly ackMedianMs: number;
  readonly ackWorstMs: number;
  /** Until the last of them had an answer. */
  readonly answeredMs: number;
  /** The longest time in which the bot did nothing else. */
  readonly blockedMs: number;
};

const PROGRAM = fileURLToPath(new URL('discordProgram.ts', import.meta.url));

/** A bot in its own process, and what it says. */
const started = async (told: Told) => {
  const child = fork(PROGRAM, [JSON.stringify(told)], { execArgv: ['--import', 'tsx'] });
  const heard: unknown[] = [];
  child.on('message', (said) => heard.push(said));
  const says = async (): Promise<unknown> => {
    await until(() => heard.length > 0, 'a word of the bot', PATIENCE_MS);
    return heard.shift();
  };
  await says();
  return {
    asked: async (what: 'begin' | 'end'): Promise<unknown> => {
      child.send(what);
      return await says();
    },
    stop: async (): Promise<void> => {
      const ended = new Promise((done) => child.on('exit', done));
      child.kill();
      await ended;
    },
  };
};

/** Everybody asks before anybody is answered, each for another bar. */
const burst = async (platform: Platform, round: number): Promise<Omit<Burst, 'blockedMs'>> => {
  const people = openPeople(platform);
  const before = platform.posted.length;
  const since = performance.now();
  const acks = await Promise.all(
    Array.from({ length: PEOPLE }, (_, i) => {
      const id = `13000000000${String(round)}1${String(i).padStart(5, '0')}`;
      const words = `${(0.8 + i / 1000).toFixed(3)} 1018 straight 21tpi`;
      return people.slash(['knurl', 'setup'], { words }, { ...OPERATOR, id });
    }),
  );
  await until(() => platform.posted.length >= before + PEOPLE, 'all answers', PATIENCE_MS);
  const answeredMs = performance.now() - since;
  const waits = acks.map((ack) => ack?.ms ?? Number.POSITIVE_INFINITY).sort((a, b) => a - b);
  return {
    ackMedianMs: waits[PEOPLE / 2] ?? Number.NaN,
    ackWorstMs: waits.at(-1) ?? Number.NaN,
    answeredMs,
  };
};

/** The second burst counts: the engine has warmed up. */
const crowd = async (platform: Platform, bot: Told['bot']): Promise<Burst> => {
  const program = await started({ api: platform.api, bot });
  try {
    await burst(platform, 1);
    await program.asked('begin');
    const times = await burst(platform, 2);
    const { blockedMs } = (await program.asked('end')) as { readonly blockedMs: number };
    return { ...times, blockedMs };
  } finally {
    await program.stop();
  }
};

export const benchDiscord = async () => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'wholetooth-bench-'));
  const platform = await openPlatform(() => null);
  const common = { token: TOKEN, application: APPLICATION, guild: null, api: platform.api };
  await register({ ...common, dryRun: false, book: en, fleet: FLEET, print: () => undefined });
  try {
    const cards = await crowd(platform, { file: path.join(folder, 'records.sqlite') });
    const bare = await crowd(platform, {
      says: platform.posted.find(({ by }) => by === 'reply')?.body,
    });
    return { bare, cards };
  } finally {
    await platform.stop();
    fs.rmSync(folder, { recursive: true, force: true });
  }
};

const ms = (value: number): string => `${value.toFixed(0)} ms`;
const times = (value: number, of: number): string => `${(value / of).toFixed(1)} times`;

/** A line for each: what it took, and how many times what the bare bot takes. */
export const discordLines = (found: Awaited<ReturnType<typeof benchDiscord>>): readonly string[] =>
  (
    [
      ['a bare bot that says a fixed message of this size', found.bare],
      ['cards, with records', found.cards],
    ] as const
  ).map(
    ([name, { ackMedianMs, ackWorstMs, answeredMs, blockedMs }]) =>
      `${name.padEnd(52)} acknowledged in ${ms(ackMedianMs)}, at the worst ${ms(ackWorstMs)} (${times(ackWorstMs, found.bare.ackWorstMs)}); all answered in ${ms(answeredMs)} (${times(answeredMs, found.bare.answeredMs)}); nothing else for ${ms(blockedMs)} at the longest`,
  );

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const found = await benchDiscord();
  process.stdout.write(`${discordLines(found).join('\n')}\n`);
  const { ackWorstMs, blockedMs } = found.cards;
  process.exitCode = ackWorstMs > MOST_ACK_MS || blockedMs > MOST_BLOCKED_MS ? 1 : 0;
}
