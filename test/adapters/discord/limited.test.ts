/** The platform asks to wait, on every route there is: everything happens all the same, once. */
import { expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { line } from '../../../src/card/index.ts';
import type { Effect, MessageAddress } from '../../../src/desk/index.ts';
import { CLOSED, ENGINEER, OPERATOR, SHOP, STANDARDS } from '../../platforms/discord/world.ts';
import { type Bot, newScene, openBot, registerIn } from './bot.ts';
import { readIn, withoutCodes } from './seen.ts';

const SETUP = ['knurl', 'setup'];
const LINE = '1.000 1018 straight 21tpi';
const REFUSED = '1.000 1018 stright 21tpi';

const card = {
  verb: 'help',
  headline: line('helpIntro', {}),
  parts: [],
  choices: [],
  pictures: [],
  figures: {},
  checks: [],
  cautions: [],
  alternatives: [],
  units: 'in',
} as const;

/** What a shop's records bring about: on every route that only they use. */
const effects = async ({ bot, platform }: Bot): Promise<void> => {
  const deliver = async (effect: Effect, earlier: unknown = null, firstTried = 0) => {
    const first = firstTried === 0 ? null : firstTried;
    const done = await bot.deliver(effect, { shop: SHOP, earlier, firstTried: first });
    if (!done.delivered) throw new Error(done.fault);
    return done.outcome;
  };
  const post = { effect: 'post', key: 'k1', place: `${STANDARDS}/`, card } as const;
  const posted = await deliver(post);
  expect(await deliver(post, null, Date.now())).toEqual(posted);
  await deliver({ effect: 'pin', key: 'k2', of: 'k1' }, posted);
  const message = posted as MessageAddress;
  await deliver({ effect: 'unpin', key: 'k3', message });
  await deliver({ effect: 'thread', key: 'k4', of: 'k1', title: 'Which wheel?' }, posted);
  await deliver({ effect: 'edit', key: 'k5', message, card });
  await deliver({ effect: 'notify', key: 'k6', people: [ENGINEER.id], card });
  // A channel that the client has not heard of is asked for.
  const second = (await deliver({ ...post, key: 'k7' })) as MessageAddress;
  const made = platform.rooms.openThread(STANDARDS, second.message, 'Made since');
  await deliver({ ...post, key: 'k8', place: `${made.id}/` });
  platform.rooms.fillPins(STANDARDS, 250);
  const full = { effect: 'pin', key: 'k9', of: 'k1' } as const;
  const refused = await bot.deliver(full, { shop: SHOP, earlier: posted, firstTried: null });
  expect(refused).toMatchObject({ delivered: false, final: true });
};

const WAIT = { status: 429, after: 0.05 } as const;

/** Everything that a bot does, from its registration on; what stands in the end, and what was called. */
const lived = async (isLimited: boolean) => {
  const scene = await newScene();
  const { platform } = scene;
  if (isLimited) for (const { name } of platform.routes.list) platform.meet(name, WAIT);
  await registerIn(platform);
  await registerIn(
    platform,
    FLEET.filter(({ path }) => path[0] !== 'shop'),
  );
  await registerIn(platform);
  let patience = 0;
  const bot = await openBot({
    scene,
    deferAfterMs: 60,
    breakDesk: (desk) => ({
      ...desk,
      answer: async (call) => {
        await new Promise((done) => setTimeout(done, patience));
        return await desk.answer(call);
      },
    }),
  });
  await bot.next(() => bot.people.slash(SETUP, { words: LINE }));
  await bot.quiet();
  await bot.next(() =>
    bot.people.suggest(SETUP, { material: '303' }, 'material').then(() => bot.people.mention(LINE)),
  );
  await bot.quiet();
  patience = 150;
  await bot.next(() => bot.people.slash(SETUP, { words: LINE }, { ...OPERATOR, channel: CLOSED }));
  await bot.next(() => bot.people.slash(SETUP, { words: REFUSED }));
  patience = 0;
  await bot.quiet();
  const talked = platform.posted.map((message) => [message.only, withoutCodes(readIn(message))]);
  platform.posted.length = 0;
  await effects(bot);
  const done = platform.posted.map((message) => [message.channel, readIn(message)]);
  const called = new Set(platform.calls.map(({ route }) => route));
  const unmet = new Set(
    platform.routes.list.map(({ name }) => name).filter((name) => !called.has(name)),
  );
  expect(platform.faults).toEqual([]);
  expect(bot.faults).toEqual([]);
  await bot.stop();
  return { talked, done: done.map(([, text]) => text), unmet };
};

test('each route is waited for as long as it asks, and nothing is said twice or left out', async () => {
  const plain = await lived(false);
  expect(plain.unmet).toEqual(new Set());
  const limited = await lived(true);
  expect(limited).toEqual(plain);
}, 60_000);
