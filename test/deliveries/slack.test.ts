/** What a change leaves to be done is done on the platform: the real client, records on both engines. */
import { spawn } from 'node:child_process';
import path from 'node:path';
import { afterEach, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { FLEET } from '../../commands/index.ts';
import { type Card, line } from '../../src/card/index.ts';
import { type Deliverer, openDeliveries } from '../../src/deliveries.ts';
import { cardReply, defineCommand, type Effect, openRecordsDesk } from '../../src/desk/index.ts';
import type { Outbox } from '../../src/shop/index.ts';
import type { Store } from '../../src/store/index.ts';
import { type Bot, openBot, readable, until } from '../adapters/slack/bot.ts';
import { APP_TOKEN, openPlatform, TEAMS } from '../platforms/slack/platform.ts';
import { ENGINES } from '../support/places.ts';
import { newRecords } from '../support/records.ts';

const CARD: Card = {
  verb: 'standard',
  headline: line('roleNamed', { name: 'Mara', role: 'supervisor' }),
  parts: [],
  choices: [],
  pictures: [],
  figures: {},
  checks: [],
  cautions: [],
  alternatives: [],
  units: 'in',
};
const SAYS = 'Mara is supervisor now.';
const OWNER = { id: 'U0OWNER' };
const SHOP = { command: '/shop' };
const STANDARDS = 'C0OPENSHOP/';

/** A post that is pinned, a thread under it with an answer in it, and somebody who is told. */
const ALL_KINDS: readonly Effect[] = [
  { effect: 'post', key: 'k1', place: STANDARDS, card: CARD },
  { effect: 'pin', key: 'k2', of: 'k1' },
  { effect: 'thread', key: 'k3', of: 'k1', title: 'Which wheel?' },
  { effect: 'post', key: 'k4', of: 'k3', card: CARD },
  { effect: 'notify', key: 'k5', people: ['U0ENGINEER'], card: CARD },
];

/** `/shop herald`: an answer, and whatever is to happen besides. */
const heralding = (effects: readonly Effect[]) =>
  defineCommand({
    path: ['shop', 'herald'],
    examples: ['/shop herald'],
    parameters: z.object({}),
    allowed: 'operator',
    run: () => cardReply({ ...CARD, headline: line('settings', {}) }, effects),
  });

const open: { bot: Bot; box: Outbox }[] = [];
afterEach(async () => {
  for (const { bot, box } of open.splice(0)) {
    await box.stop();
    expect(bot.platform.faults).toEqual([]);
    await bot.stop();
  }
});

/** The bot with records, as it runs: what is queued goes out by the deliveries. */
const running = async (store: Store, effects: readonly Effect[]) => {
  let nudge = (): void => undefined;
  const desk = openRecordsDesk([...FLEET, heralding(effects)], store, {
    platform: 'slack',
    program: 'test',
    now: Date.now,
    onAnswered: () => nudge(),
  });
  const bot = await openBot({ breakDesk: () => desk });
  const { teams: shops, deliver } = bot.bot;
  const box = openDeliveries(store, [{ platform: 'slack', shops, deliver }], {
    now: Date.now,
    onFault: (error) => {
      throw error;
    },
  });
  nudge = box.nudge;
  open.push({ bot, box });
  return { bot, box };
};

const statesOf = async (store: Store): Promise<Readonly<Record<string, string>>> => {
  const rows = await store.read.selectFrom('effect').select(['key', 'state']).execute();
  return Object.fromEntries(rows.map(({ key, state }) => [key, state]));
};

describe.each(ENGINES)('on %s', (engine) => {
  it('everything a command leaves is done after its answer, without anybody asking', async () => {
    const { store } = await newRecords(engine);
    const { bot, box } = await running(store, ALL_KINDS);
    box.start();
    await bot.people.slash('herald', {}, SHOP);
    await until(() => bot.platform.posted.length === 5, 'the answer, three posts, one told');
    const [answer, ...rest] = bot.platform.posted;
    expect(answer).toMatchObject({ channel: 'C0FLOORSHOP', only: null });
    const post = rest.find(({ channel, thread }) => channel === 'C0OPENSHOP' && thread === null);
    expect(readable(post?.body)).toContain(SAYS);
    const inThread = rest.filter(({ thread }) => thread === post?.ts);
    expect(inThread.map(({ body }) => readable(body))).toEqual([
      expect.stringContaining('Which wheel?'),
      expect.stringContaining(SAYS),
    ]);
    expect(rest.map(({ channel }) => channel)).toContain('DU0ENGINEERT0SHOP');
    await until(() => bot.platform.pins.length === 1, 'the pin');
    expect(bot.platform.pins).toEqual([post?.ts]);
    await box.stop();
    expect(new Set(Object.values(await statesOf(store)))).toEqual(new Set(['delivered']));
  });

  it('what cannot be posted is said in the channel for that, once, with what it was', async () => {
    const { store } = await newRecords(engine);
    const nowhere: Effect = { effect: 'post', key: 'k1', place: 'C0CLOSEDSHOP/', card: CARD };
    const pin: Effect = { effect: 'pin', key: 'k2', of: 'k1' };
    const { bot, box } = await running(store, [nowhere, pin]);
    const there = { ...OWNER, channel: 'C0OPENSHOP' };
    await bot.people.slash('settings change notices here', there, SHOP);
    await until(() => bot.platform.posted.length === 1, 'the setting');
    await bot.people.slash('herald', {}, SHOP);
    await until(() => bot.platform.posted.length === 2, 'the answer');
    await box.deliverDue();
    const said = bot.platform.posted.slice(2);
    expect(said.map(({ channel }) => channel)).toEqual(['C0OPENSHOP']);
    expect(readable(said[0]?.body)).toContain('A message could not be posted');
    expect(readable(said[0]?.body)).toContain(SAYS);
    expect(await box.deliverDue()).toBe(0);
    expect(await statesOf(store)).toEqual({ k1: 'givenUp', k2: 'givenUp', 'note:k1': 'delivered' });
  });

  it('a note that cannot be posted leaves no further note', async () => {
    const { store } = await newRecords(engine);
    const nowhere: Effect = { effect: 'post', key: 'k1', place: 'C0CLOSEDSHOP/', card: CARD };
    const { bot, box } = await running(store, [nowhere]);
    await bot.people.slash('settings change notices C0CLOSEDSHOP', OWNER, SHOP);
    await bot.people.slash('herald', OWNER, SHOP);
    await until(() => bot.platform.posted.length === 2, 'the answers');
    await box.deliverDue();
    expect(await statesOf(store)).toEqual({ k1: 'givenUp', 'note:k1': 'givenUp' });
    // Nothing is lost for that: whoever asks next is told.
    await bot.people.slash('settings', OWNER, SHOP);
    await until(() => bot.platform.posted.length === 3, 'the next answer');
    expect(readable(bot.platform.posted[2]?.body)).toContain('could not be delivered');
  });

  it('what belongs to a shop that is not reached from here waits for who reaches it', async () => {
    const { store } = await newRecords(engine);
    const others = [
      { platform: 'slack', id: 'T0ELSEWHERE' },
      { platform: 'discord', id: '100000000000000001' },
    ];
    for (const { platform, id } of others) await leftBy(store, platform, id);
    const { box, bot } = await running(store, []);
    expect(await box.deliverDue()).toBe(0);
    expect(bot.platform.posted).toEqual([]);
    const rows = await store.read.selectFrom('effect').select(['attempts', 'state']).execute();
    expect(rows).toEqual(others.map(() => ({ attempts: 0, state: 'waiting' })));
    const got: string[] = [];
    const deliverer = (platform: string, shops: readonly string[] | null): Deliverer => ({
      platform,
      shops,
      deliver: (effect, { shop }) => {
        got.push(`${platform} ${shop} ${effect.key}`);
        return Promise.resolve({ delivered: true, outcome: null });
      },
    });
    const both = [deliverer('discord', null), deliverer('slack', ['T0ELSEWHERE'])];
    const there = openDeliveries(store, both, { now: Date.now, onFault: console.error });
    expect(await there.deliverDue()).toBe(2);
    expect(got.sort()).toEqual(['discord 100000000000000001 k1', 'slack T0ELSEWHERE k1']);
  });
});

/** One post, queued by a shop of whatever platform. */
const leftBy = async (store: Store, platform: string, shop: string): Promise<void> => {
  const fleet = [heralding(ALL_KINDS.slice(0, 1))];
  const desk = openRecordsDesk(fleet, store, { platform, program: 'test', now: Date.now });
  await desk.answer({
    shop,
    person: { id: 'mara', name: 'Mara' },
    place: { channel: 'floor', thread: null, isPrivate: false },
    interactionId: 'i1',
    given: { words: '/shop herald' },
  });
};

it('the program delivers what was left before it was started, and ends well when told to', async () => {
  const { store, place } = await newRecords('sqlite');
  if (place.engine !== 'sqlite') throw new Error('not a file');
  await leftBy(store, 'slack', 'T0SHOP');
  const platform = await openPlatform();
  const child = spawn(process.execPath, ['--import', 'tsx', 'src/main.ts'], {
    env: {
      ...process.env,
      DATABASE_URL: '',
      WHOLETOOTH_DATA: path.dirname(place.file),
      SLACK_BOT_TOKEN: TEAMS.map(({ botToken }) => botToken).join(','),
      SLACK_APP_TOKEN: APP_TOKEN,
      SLACK_API_URL: platform.api,
    },
    stdio: 'ignore',
  });
  const ended = new Promise((done) => child.on('exit', done));
  await until(() => platform.posted.length === 1, 'the post', 20_000);
  expect(readable(platform.posted[0]?.body)).toContain(SAYS);
  child.kill('SIGTERM');
  expect(await ended).toBe(0);
  expect(Object.values(await statesOf(store))).toEqual(['delivered']);
  expect(platform.faults).toEqual([]);
  await platform.stop();
}, 40_000);
