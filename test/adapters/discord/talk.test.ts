/** What people do in Discord and what they get, through the real client. */
import { afterAll, expect, test } from 'vitest';
import { en } from '../../../src/phrases/index.ts';
import { buttonsOf } from '../../platforms/discord/people.ts';
import { FLOOR, OPERATOR, THREAD } from '../../platforms/discord/world.ts';
import { openBot } from './bot.ts';
import { readIn } from './seen.ts';

const bot = await openBot();
afterAll(async () => {
  expect(bot.platform.faults).toEqual([]);
  expect(bot.faults).toEqual([]);
  await bot.stop();
});

const { people, next, nextForm } = bot;
const SETUP = ['knurl', 'setup'];
const LINE = '1.000 1018 straight 21tpi';
/** Worked by hand in test/reference/jobs.ts: 65 teeth of 1/21 in want 0.9852 in. */
const HEADLINE = 'Turn to 0.9852 in: 65 teeth';
const asking = (words: string, more = {}) => next(() => people.slash(SETUP, { words, ...more }));

test('words are answered in the channel, in the acknowledgement itself', async () => {
  const { acked, message } = await asking(LINE);
  expect(acked?.type).toBe(4);
  expect(message).toMatchObject({ by: 'reply', channel: FLOOR, only: null, rings: [] });
  expect(readIn(message)).toContain(HEADLINE);
});

test('options and words say the same', async () => {
  const { message: worded } = await asking(LINE);
  const { message } = await next(() =>
    people.slash(SETUP, {
      diameter: '1.000',
      material: '1018',
      pattern: 'straight',
      pitch: '21 tpi',
    }),
  );
  expect(buttonsOf(message).map(({ label }) => label)).toEqual(
    buttonsOf(worded).map(({ label }) => label),
  );
  expect(readIn(message)).toContain(HEADLINE);
});

test('the same with “only me” is seen by nobody else, and so is what its buttons bring', async () => {
  const { message } = await asking(LINE, { 'only-me': true });
  expect(message.only).toBe(OPERATOR.id);
  const { message: pressed } = await next(() => people.press(message, 0));
  expect(pressed.only).toBe(OPERATOR.id);
});

test('a refusal is private, offers its choices, and keeps the words to be changed', async () => {
  const { message } = await asking('1.000 1018 stright 21tpi');
  expect(message.only).toBe(OPERATOR.id);
  expect(readIn(message)).toContain('stright');
  expect(buttonsOf(message).length).toBeGreaterThan(1);
  const form = await nextForm(() => people.press(message, en.chat.correct));
  expect(JSON.stringify(form.body)).toContain('1.000 1018 stright 21tpi');
  const { message: answered } = await next(() =>
    people.submit(form, { words: `/knurl setup ${LINE}` }),
  );
  expect(readIn(answered)).toContain(HEADLINE);
});

test('a mention is answered where it stands: in the channel, and in the thread', async () => {
  let asked = '';
  const { message } = await next(() => {
    asked = people.mention(LINE);
  });
  expect(message).toMatchObject({ by: 'post', channel: FLOOR, replyTo: asked, rings: [] });
  const { message: inThread } = await next(() =>
    people.mention(LINE, { ...OPERATOR, channel: THREAD }),
  );
  expect(inThread).toMatchObject({ by: 'post', channel: THREAD, only: null });
  expect(readIn(inThread)).toContain(HEADLINE);
  const { message: pressed } = await next(() => people.press(inThread, 0));
  expect(pressed.channel).toBe(THREAD);
});
