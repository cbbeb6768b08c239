/** Where every send goes: never into another workspace, never to more people than were meant. */
import { afterAll, expect, test } from 'vitest';
import type { Drawn } from '../../../src/adapters/common/pieces.ts';
import { line } from '../../../src/card/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { TEAMS } from '../../platforms/slack/platform.ts';
import { openBot, readable, until } from './bot.ts';

const PICTURE: Drawn = { name: 'tooth.png', bytes: new Uint8Array(2000), alt: 'a tooth to scale' };
const bot = await openBot({
  draw: (answer) =>
    Promise.resolve(answer.kind === 'card' ? answer.card.pictures.map(() => PICTURE) : []),
});
afterAll(async () => {
  expect(bot.platform.faults).toEqual([]);
  await bot.stop();
});

const LINE = '1.000 1018 straight 21tpi';
/** Pictures of the card to that line: tooth, diameters, set-up. */
const EACH = 3;
const PEOPLE = TEAMS.flatMap(({ id: team }) =>
  ['FLOOR', 'OPEN', 'CLOSED'].map((channel) => ({
    team,
    id: `U0${team.slice(2)}${channel}`,
    name: `name-of-${team}`,
    channel: `C0${channel}${team.slice(2)}`,
  })),
);

test('a picture goes where its card is, with words; in private it stays out', async () => {
  await bot.people.slash(LINE);
  await until(() => bot.platform.pictures.length === EACH, 'the pictures');
  const [picture] = bot.platform.pictures;
  expect(picture).toMatchObject({ channel: 'C0FLOORSHOP', thread: null, alt: PICTURE.alt });
  expect(picture?.bytes).toBeGreaterThanOrEqual(PICTURE.bytes.length);
  const before = bot.platform.posted.length;
  await bot.people.slash(`${LINE} only me`);
  await until(() => bot.platform.posted.length > before, 'the private answer');
  await bot.people.mention(LINE, { thread: '1790000000.000500' });
  await until(() => bot.platform.pictures.length === 2 * EACH, 'the pictures in the thread');
  expect(bot.platform.pictures[EACH]?.thread).toBe('1790000000.000500');
  await new Promise((done) => setTimeout(done, 150));
  expect(bot.platform.pictures).toHaveLength(2 * EACH);
});

test('a picture that cannot be sent is counted, and the card says that nothing else is missing', async () => {
  const before = bot.platform.posted.length;
  const pictures = bot.platform.pictures.length;
  const card = () => readable(bot.platform.posted[before]?.body ?? '');
  bot.platform.meet('files.getUploadURLExternal', { error: 'missing_scope' });
  await bot.people.slash(LINE);
  await until(() => card().includes(en.terminal.noPicture), 'the sentence on the card');
  expect(card()).toContain('Turn to 0.9852 in: 65 teeth');
  expect(bot.platform.posted.length).toBe(before + 1);
  expect(bot.platform.pictures.length).toBe(pictures + EACH - 1);
  expect(bot.faults.map(({ what }) => what)).toEqual(['picture']);
  bot.faults.length = 0;
});

test('every send of two workspaces stays in its own, and private ones with their person', async () => {
  bot.platform.posted.length = 0;
  bot.platform.pictures.length = 0;
  for (const person of PEOPLE) {
    await bot.people.slash(`${LINE} long ${String(1 + PEOPLE.indexOf(person))}`, person);
    await bot.people.slash(`${LINE} only me`, person);
    await bot.people.slash('1.000 blorp', person);
    await bot.people.mention('blorp', person);
  }
  await until(() => bot.platform.posted.length >= PEOPLE.length * 4, 'all answers');
  for (const posted of bot.platform.posted) {
    const tail = posted.team.slice(2);
    expect(posted.channel.endsWith(tail)).toBe(true);
    // Nothing of the one workspace is named in the other.
    const others = TEAMS.filter(({ id }) => id !== posted.team);
    for (const other of others) {
      expect(JSON.stringify(posted)).not.toContain(`name-of-${other.id}`);
      expect(JSON.stringify(posted)).not.toContain(other.bot);
    }
    for (const { botToken } of TEAMS) expect(JSON.stringify(posted)).not.toContain(botToken);
    if (posted.only !== null) expect(posted.only).toContain(tail);
    // A refusal, and what was asked for in private, is in no channel.
    if (posted.only === null && !posted.channel.startsWith('D'))
      expect(posted.body.text).toContain('Turn to');
  }
  const publicCards = bot.platform.posted.filter(
    ({ only, channel }) => only === null && !channel.startsWith('D'),
  );
  expect(publicCards).toHaveLength(PEOPLE.length);
  for (const { channel } of bot.platform.pictures)
    expect(publicCards.map((each) => each.channel)).toContain(channel);
});

test('a button of one workspace pressed by somebody of another stays in their own', async () => {
  bot.platform.posted.length = 0;
  await bot.people.slash(`${LINE} only me`);
  await until(() => bot.platform.posted.length === 1, 'the card');
  const [card] = bot.platform.posted;
  if (card === undefined) throw new Error('no card');
  const stranger = { team: 'T0OTHER', id: 'U0STRANGER', channel: 'C0FLOOROTHER' };
  await bot.people.press({ ...card, channel: 'C0FLOOROTHER', team: 'T0OTHER' }, 0, stranger);
  await until(() => bot.platform.posted.length === 2, 'an answer');
  expect(bot.platform.posted[1]).toMatchObject({ team: 'T0OTHER', only: 'U0STRANGER' });
});

test('a workspace the bot is not in gets nothing', async () => {
  bot.platform.posted.length = 0;
  await bot.people.mention(LINE, { team: 'T0NOBODY', channel: 'C0FLOORNOBODY' });
  await new Promise((done) => setTimeout(done, 200));
  expect(bot.platform.posted).toEqual([]);
  bot.faults.length = 0;
});

test('effects: post once, pin, thread under it, edit, take the pin off, tell one person', async () => {
  bot.platform.posted.length = 0;
  const { bot: slack } = bot;
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
  const first = { shop: 'T0SHOP', earlier: null, firstTried: null };
  const post = { effect: 'post', key: 'k1', place: 'C0FLOORSHOP/', card } as const;
  const posted = await slack.deliver(post, first);
  if (!posted.delivered) throw new Error(posted.fault);
  const again = await slack.deliver(post, { ...first, firstTried: Date.now() - 1000 });
  expect(again).toEqual(posted);
  expect(bot.platform.posted).toHaveLength(1);
  const after = { ...first, earlier: posted.outcome };
  for (let turn = 0; turn < 2; turn += 1)
    expect(await slack.deliver({ effect: 'pin', key: 'k2', of: 'k1' }, after)).toMatchObject({
      delivered: true,
    });
  expect(bot.platform.pins).toHaveLength(1);
  const thread = { effect: 'thread', key: 'k3', of: 'k1', title: 'Which wheel?' } as const;
  const opened = await slack.deliver(thread, after);
  if (!opened.delivered) throw new Error(opened.fault);
  expect(bot.platform.posted[1]?.thread).toBe(bot.platform.posted[0]?.ts);
  const ring = { people: ['U0ENGINEER'], groups: ['S0ENGINEERS'] };
  bot.platform.allowRinging('@U0ENGINEER', '!subteam^S0ENGINEERS');
  const inThread = { effect: 'post', key: 'k3-1', of: 'k3', ring, card } as const;
  await slack.deliver(inThread, { ...first, earlier: opened.outcome });
  expect(bot.platform.posted[2]?.thread).toBe(bot.platform.posted[0]?.ts);
  expect(JSON.stringify(bot.platform.posted[2])).toContain('<@U0ENGINEER> <!subteam^S0ENGINEERS>');
  const message = posted.outcome as { place: string; message: string };
  await slack.deliver({ effect: 'edit', key: 'k4', message, card }, first);
  for (let turn = 0; turn < 2; turn += 1)
    expect(await slack.deliver({ effect: 'unpin', key: 'k5', message }, first)).toMatchObject({
      delivered: true,
    });
  expect(bot.platform.pins).toEqual([]);
  await slack.deliver({ effect: 'notify', key: 'k6', people: ['U0ENGINEER'], card }, first);
  expect(bot.platform.posted.at(-1)?.channel).toBe('DU0ENGINEERT0SHOP');
  const nowhere = { effect: 'post', key: 'k7', place: 'C0GONE/', card } as const;
  expect(await slack.deliver(nowhere, first)).toMatchObject({ delivered: false, final: true });
  bot.platform.meet('pins.add', { error: 'too_many_pins' });
  expect(await slack.deliver({ effect: 'pin', key: 'k8', of: 'k1' }, after)).toMatchObject({
    final: true,
  });
});
