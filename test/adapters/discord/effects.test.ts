/** What a change brings about besides the reply: each once, in its own shop, ringing nobody else. */
import { afterAll, beforeEach, expect, test } from 'vitest';
import type { Delivering } from '../../../src/adapters/common/delivery.ts';
import type { Card } from '../../../src/card/index.ts';
import { line } from '../../../src/card/index.ts';
import type { Effect, MessageAddress } from '../../../src/desk/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { buttonsOf } from '../../platforms/discord/people.ts';
import {
  APPLICATION,
  ENGINEER,
  ENGINEERS,
  FLOOR,
  OPERATOR,
  OTHER_FLOOR,
  OWNER,
  SHOP,
  STANDARDS,
  STRANGER,
  THREAD,
} from '../../platforms/discord/world.ts';
import { openBot } from './bot.ts';
import { readIn } from './seen.ts';

const bot = await openBot();
const { platform } = bot;
afterAll(async () => {
  expect(platform.faults).toEqual([]);
  await bot.stop();
});
beforeEach(() => {
  platform.posted.length = 0;
});

const card: Card = {
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
};
const FIRST: Delivering = { shop: SHOP, earlier: null, firstTried: null };
const deliver = (effect: Effect, more: Partial<Delivering> = {}) =>
  bot.bot.deliver(effect, { ...FIRST, ...more });
const delivered = async (effect: Effect, more: Partial<Delivering> = {}): Promise<unknown> => {
  const done = await deliver(effect, more);
  if (!done.delivered) throw new Error(done.fault);
  return done.outcome;
};
const post = (key: string, place = `${STANDARDS}/`): Effect => ({
  effect: 'post',
  key,
  place,
  card,
});
const refusedFor = async (effect: Effect, more: Partial<Delivering> = {}): Promise<string> => {
  const done = await deliver(effect, more);
  if (done.delivered) throw new Error('it was delivered');
  expect(done.final).toBe(true);
  return done.fault;
};

test('a post stands once, however often it is tried, even hours later', async () => {
  const first = await delivered(post('once'));
  const [message] = platform.posted;
  expect(first).toEqual({ place: `${STANDARDS}/`, message: message?.id });
  expect(message).toMatchObject({ channel: STANDARDS, only: null, rings: [] });
  // Within minutes the nonce tells; after longer the bot looks for the mark of the post.
  platform.rooms.forgetNonces();
  const hoursAgo = Date.now() - 5 * 3_600_000;
  expect(await delivered(post('once'), { firstTried: hoursAgo })).toEqual(first);
  expect(platform.posted).toHaveLength(1);
  // Another key is another message, with the same words.
  await delivered(post('twice'), { firstTried: hoursAgo });
  expect(platform.posted).toHaveLength(2);
});

test.each([
  ['500 after it was done', { status: 500, done: true } as const],
  ['500 before it was done', { status: 500, done: false } as const],
  ['a line that breaks after it was done', { status: 0, done: true } as const],
])('%s: one message', async (name, fault) => {
  platform.meet('post', fault);
  await delivered(post(name));
  expect(platform.posted).toHaveLength(1);
});

test('500 for good is tried again later; a place that is not there never', async () => {
  const fault = { status: 500, done: false } as const;
  platform.meet('post', fault, fault, fault);
  expect(await deliver(post('later'))).toMatchObject({ delivered: false, final: false });
  expect(await refusedFor(post('gone', '1499999999999999999/'))).toBe(en.discord.faults.notThere);
  platform.meet('post', { status: 403, code: 50_013 });
  expect(await refusedFor(post('shut'))).toBe(en.discord.faults.noPermission);
});

test('nothing goes into the server of another shop', async () => {
  expect(await refusedFor(post('astray', `${OTHER_FLOOR}/`))).toBe(en.discord.faults.notThere);
  const there = { place: `${OTHER_FLOOR}/`, message: '1500000000000000001' };
  for (const effect of [
    { effect: 'edit', key: 'astray-edit', message: there, card },
    { effect: 'unpin', key: 'astray-unpin', message: there },
  ] as const)
    expect(await refusedFor(effect)).toBe(en.discord.faults.notThere);
  expect(platform.posted).toEqual([]);
});

test('a ring calls the people and roles it names, and nobody that the words name', async () => {
  const ring = { people: [ENGINEER.id], groups: [ENGINEERS] };
  await delivered({ effect: 'post', key: 'ring', place: `${FLOOR}/`, ring, card });
  expect(platform.posted[0]?.rings).toEqual([`@${ENGINEER.id}`, `&${ENGINEERS}`]);
  const loud = {
    ...card,
    parts: [{ part: 'own', texts: [`@everyone <@${OPERATOR.id}> <@&${ENGINEERS}> @here`] }],
  } as const;
  await delivered({ effect: 'post', key: 'words', place: `${FLOOR}/`, card: loud });
  expect(platform.posted[1]?.rings).toEqual([]);
  expect(platform.posted[1]?.body['allowed_mentions']).toEqual({ parse: [] });
});

test('a pin and its end are one thing each, and what is gone is pinned no longer', async () => {
  const earlier = await delivered(post('pinned'));
  const pin = { effect: 'pin', key: 'pin', of: 'pinned' } as const;
  for (let turn = 0; turn < 2; turn += 1)
    expect(await delivered(pin, { earlier })).toEqual(earlier);
  expect(platform.rooms.pinsOf(STANDARDS)).toHaveLength(1);
  const message = earlier as MessageAddress;
  for (let turn = 0; turn < 2; turn += 1)
    await delivered({ effect: 'unpin', key: 'unpin', message });
  expect(platform.rooms.pinsOf(STANDARDS)).toEqual([]);
  platform.meet('unpin', { status: 404, code: 10_008 });
  await delivered({ effect: 'unpin', key: 'unpin-gone', message });
});

test('where the pins are full it is said, with the oldest, and none is taken off', async () => {
  const oldest = (await delivered(post('oldest'))) as MessageAddress;
  await delivered({ effect: 'pin', key: 'oldest-pin', of: 'oldest' }, { earlier: oldest });
  platform.rooms.fillPins(STANDARDS, 249);
  const earlier = await delivered(post('one-more'));
  const pin = { effect: 'pin', key: 'one-more-pin', of: 'one-more' } as const;
  const fault = await refusedFor(pin, { earlier });
  expect(fault).toContain('250 pins');
  expect(fault).toContain(en.lines.helpIntro({}, {} as never).slice(0, 20));
  expect(platform.rooms.pinsOf(STANDARDS)).toHaveLength(250);
});

test('a thread opens once under its post, and what follows stands in it', async () => {
  const earlier = (await delivered(post('question', `${FLOOR}/`))) as MessageAddress;
  const thread = {
    effect: 'thread',
    key: 'thread',
    of: 'question',
    title: 'Which wheel?',
  } as const;
  const opened = await delivered(thread, { earlier });
  expect(opened).toEqual({ place: `${FLOOR}/${earlier.message}`, message: earlier.message });
  expect(await delivered(thread, { earlier })).toEqual(opened);
  expect(platform.rooms.channelOf(earlier.message).name).toBe('Which wheel?');
  const follows = { effect: 'post', key: 'answer', of: 'thread', card } as const;
  expect(await delivered(follows, { earlier: opened })).toMatchObject({
    place: `${FLOOR}/${earlier.message}`,
  });
  expect(platform.posted.at(-1)?.channel).toBe(earlier.message);
  // What the thread left is the message it hangs on, in the channel above.
  await delivered({ effect: 'edit', key: 'above', of: 'thread', card }, { earlier: opened });
  expect(platform.posted[0]?.edits).toBe(1);
});

test('a title longer than a thread name is said in full in the thread', async () => {
  const title = `Which wheel for ${'the long blank '.repeat(10)}of job seven?`;
  const earlier = (await delivered(post('long', `${FLOOR}/`))) as MessageAddress;
  await delivered({ effect: 'thread', key: 'long-thread', of: 'long', title }, { earlier });
  const said = platform.posted.at(-1);
  expect(said?.channel).toBe(earlier.message);
  expect(said === undefined ? '' : readIn(said)).toContain(title);
});

test('in a thread, or where none may be opened, what belongs together stays there', async () => {
  const inThread = (await delivered(post('inside', `${FLOOR}/${THREAD}`))) as MessageAddress;
  const effect = { effect: 'thread', key: 'inside-thread', of: 'inside', title: 'Why?' } as const;
  expect(await delivered(effect, { earlier: inThread })).toMatchObject({
    place: `${FLOOR}/${THREAD}`,
  });
  expect(platform.posted.at(-1)).toMatchObject({ channel: THREAD });
  const above = (await delivered(post('no-threads', `${FLOOR}/`))) as MessageAddress;
  platform.meet('thread', { status: 403, code: 50_013 });
  const there = await delivered({ ...effect, key: 'none', of: 'no-threads' }, { earlier: above });
  expect(there).toMatchObject({ place: `${FLOOR}/` });
});

test('a note goes to each alone, once; one who cannot be reached keeps nobody from it', async () => {
  const key = 'note';
  const note = { effect: 'notify', key, people: [ENGINEER.id, OWNER.id], card } as const;
  for (const someone of [ENGINEER, OWNER]) platform.meetPerson(someone);
  await delivered(note);
  platform.rooms.forgetNonces();
  await delivered(note, { firstTried: Date.now() - 60_000 });
  expect(platform.posted).toHaveLength(2);
  expect(new Set(platform.posted.map(({ guild }) => guild))).toEqual(new Set([null]));
  platform.posted.length = 0;
  platform.rooms.shutDirect(ENGINEER.id);
  const closed = { ...note, key: 'closed' };
  expect(await refusedFor(closed)).toBe(en.discord.faults.closed(ENGINEER.name));
  expect(platform.posted).toHaveLength(1);
});

test('whoever is no member of the server hears nothing of its shop', async () => {
  platform.meetPerson(STRANGER);
  const note = { effect: 'notify', key: 'stranger', people: [STRANGER.id], card } as const;
  expect(await refusedFor(note)).toBe(en.discord.faults.notMember(STRANGER.id));
  expect(platform.posted).toEqual([]);
});

test('an edit changes what stands, and what does not fit any more follows it', async () => {
  const message = (await delivered(post('edited'))) as MessageAddress;
  const texts = Array.from(
    { length: 90 },
    (_, i) => `Line ${String(i)} ${'of the record '.repeat(5)}`,
  );
  const long = { ...card, parts: [{ part: 'own', texts }] } as const;
  await delivered({ effect: 'edit', key: 'edit', message, card: long });
  expect(platform.posted[0]?.edits).toBe(1);
  const all = platform.posted.map(readIn).join('\n');
  for (const text of texts) expect(all).toContain(text.trim());
  expect(platform.posted.length).toBeGreaterThan(1);
});

test('a button of a note carries its shop, and works for its members only', async () => {
  const choices = [{ label: { label: 'words', values: { words: 'Help' } }, words: 'help' }];
  const asking = { ...card, choices } as unknown as Card;
  await delivered({ effect: 'notify', key: 'button', people: [OWNER.id], card: asking });
  const [button] = buttonsOf(platform.posted[0] ?? { body: {} });
  expect(button?.custom_id).toBe(`p@${SHOP}:0:button`);
  expect(button?.custom_id).not.toContain(APPLICATION);
});
