/** What comes too late, or not at all the first time: never wider than it was asked for. */
import { afterAll, beforeEach, expect, test } from 'vitest';
import { type Card, line } from '../../../src/card/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { buttonsOf } from '../../platforms/discord/people.ts';
import type { Posted } from '../../platforms/discord/rooms.ts';
import { ENGINEER, FLOOR, OPERATOR, SHOP, STRANGER } from '../../platforms/discord/world.ts';
import { until } from '../../support/until.ts';
import { openBot } from './bot.ts';
import { readIn } from './seen.ts';

const bot = await openBot();
const { people, platform, next } = bot;
afterAll(async () => {
  expect(platform.faults).toEqual([]);
  await bot.stop();
});
beforeEach(() => {
  bot.faults.length = 0;
});

const SETUP = ['knurl', 'setup'];
const LINE = '1.000 1018 straight 21tpi';
/** Worked by hand in test/reference/jobs.ts: 65 teeth of 1/21 in want 0.9852 in. */
const HEADLINE = 'Turn to 0.9852 in: 65 teeth';
const TOO_LATE = { status: 404, code: 10_062 } as const;
const BROKEN = { status: 500, done: false } as const;

const asking = async (more = {}): Promise<Posted> =>
  (await next(() => people.slash(SETUP, { words: LINE, ...more }))).message;

test('an open answer that comes too late stands in the channel and calls whoever asked', async () => {
  platform.meet('callback', TOO_LATE);
  const message = await asking();
  expect(message).toMatchObject({ by: 'post', channel: FLOOR, only: null });
  expect(message.rings).toEqual([`@${OPERATOR.id}`]);
  expect(readIn(message)).toContain(HEADLINE);
  expect(readIn(message)).toContain(en.chat.lateAnswer);
});

test('a private one is only said to be ready, and shown to nobody but whoever asked', async () => {
  platform.meet('callback', TOO_LATE);
  const message = await asking({ 'only-me': true });
  expect(message).toMatchObject({ by: 'post', only: null, rings: [`@${OPERATOR.id}`] });
  expect(readIn(message)).toContain(en.discord.answerReady);
  expect(readIn(message)).not.toContain('Turn to');
  const { message: other } = await next(() => people.press(message, en.discord.showMe, ENGINEER));
  expect(other.only).toBe(ENGINEER.id);
  expect(readIn(other)).toContain(en.discord.notYours);
  const { message: own } = await next(() => people.press(message, en.discord.showMe));
  expect(own.only).toBe(OPERATOR.id);
  expect(readIn(own)).toContain(HEADLINE);
  // Its buttons are those of the answer, and what they bring stays private.
  const { message: pressed } = await next(() => people.press(own, 0));
  expect(pressed.only).toBe(OPERATOR.id);
});

test('an answer that cannot be sent is kept, and said to be', async () => {
  platform.meet('callback', BROKEN, BROKEN, BROKEN);
  const message = await asking();
  expect(message.only).toBe(OPERATOR.id);
  expect(readIn(message)).toContain(en.discord.unsent);
  expect(bot.faults.map(({ what }) => what)).toEqual(['send']);
  const { message: shown } = await next(() => people.press(message, en.discord.showMe));
  expect(readIn(shown)).toContain(HEADLINE);
});

test('a form that comes too late is said to be, and opens the next time', async () => {
  const { message } = await next(() => people.slash(SETUP, { words: '1.000 1018 stright 21tpi' }));
  platform.meet('callback', TOO_LATE);
  const { message: late } = await next(() => people.press(message, en.chat.correct));
  expect(readIn(late)).toContain(en.discord.formLate);
  expect(late.rings).toEqual([`@${OPERATOR.id}`]);
  const form = await bot.nextForm(() => people.press(message, en.chat.correct));
  expect(JSON.stringify(form.body)).toContain('stright');
});

test('a picture that cannot be sent leaves the card, and a word that nothing else is missing', async () => {
  platform.meet('editOriginal', BROKEN, BROKEN, BROKEN);
  const { id } = await asking();
  const card = (): string =>
    platform.posted
      .filter((each) => each.id === id)
      .map(readIn)
      .join('');
  await until(() => card().includes(en.terminal.noPicture), 'the word about the picture');
  expect(card()).toContain(HEADLINE);
  expect(bot.faults.map(({ what }) => what)).toEqual(['picture']);
});

test('a button in a direct message acts in the shop that wrote it, for its members', async () => {
  const [first] = buttonsOf(await asking());
  // The answer that the button belongs to is the one that was just given.
  const key = first?.custom_id?.split(':').at(-1) ?? '';
  const card: Card = {
    verb: 'notice',
    headline: line('helpIntro', {}),
    parts: [],
    choices: [{ label: { label: 'today', values: {} }, words: '/shop settings' }] as never,
    pictures: [],
    figures: {},
    checks: [],
    cautions: [],
    alternatives: [],
    units: 'in',
  };
  platform.meetPerson(OPERATOR);
  const effect = { effect: 'notify', key, people: [OPERATOR.id], card } as const;
  await bot.bot.deliver(effect, { shop: SHOP, earlier: null, firstTried: null });
  const note = platform.posted.at(-1);
  if (note === undefined) throw new Error('no note');
  expect(note.guild).toBeNull();
  expect(buttonsOf(note)[0]?.custom_id).toContain(`@${SHOP}`);
  const { message } = await next(() => people.press(note, 0));
  expect(message.channel).toBe(note.channel);
  expect(readIn(message)).toMatch(/1\.0000 in|Turn to/u);
  platform.meetPerson(STRANGER);
  const { message: refused } = await next(() => people.press(note, 0, STRANGER));
  expect(readIn(refused)).toContain(en.chat.gone);
});
