/** Where every send goes: never into another server, never to more people than were meant. */
import { afterAll, expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { buttonsOf } from '../../platforms/discord/people.ts';
import { CLOSED, OPERATOR, OTHER, SHOP, STRANGER, THREAD } from '../../platforms/discord/world.ts';
import { openBot } from './bot.ts';
import { readIn } from './seen.ts';

const bot = await openBot();
afterAll(async () => {
  expect(bot.platform.faults).toEqual([]);
  expect(bot.faults).toEqual([]);
  await bot.stop();
});
const { people, platform, next, quiet } = bot;
const SETUP = ['knurl', 'setup'];
const LINE = '1.000 1018 straight 21tpi';
const REFUSED = '1.000 1018 blorp 21tpi';

const PEOPLE = [
  { ...OPERATOR, id: '1300000000000000031', name: 'name-of-shop' },
  { ...OPERATOR, id: '1300000000000000032', name: 'name-of-shop', channel: CLOSED },
  { ...OPERATOR, id: '1300000000000000033', name: 'name-of-shop', channel: THREAD },
  { ...STRANGER, id: '1300000000000000034', name: 'name-of-other' },
];

test('every send of two servers stays in its own channel, and private ones with their person', async () => {
  for (const person of PEOPLE) {
    const before = platform.posted.length;
    await next(() => people.slash(SETUP, { words: LINE }, person));
    await next(() => people.slash(SETUP, { words: LINE, 'only-me': true }, person));
    await next(() => people.slash(SETUP, { words: REFUSED }, person));
    await next(() => people.onMessage(LINE, person));
    if (person.channel !== CLOSED) await next(() => people.mention(LINE, person));
    await quiet();
    const sent = platform.posted.slice(before);
    const [open, hidden, refused, ...others] = sent;
    expect(open?.only).toBeNull();
    expect(hidden?.only).toBe(person.id);
    expect(refused?.only).toBe(person.id);
    for (const { only } of others) expect(only).toBeNull();
    for (const message of sent) {
      expect(message).toMatchObject({ channel: person.channel, guild: person.guild, rings: [] });
      // Nothing of the one server is named in the other.
      const other = person.guild === SHOP ? 'name-of-other' : 'name-of-shop';
      expect(JSON.stringify(message)).not.toContain(other);
    }
  }
});

test('no send of any verb, asked for in private, is seen by anybody else', async () => {
  const owner = platform.addGuild('A quiet place');
  const before = platform.posted.length;
  for (const { path, examples } of FLEET)
    for (const words of examples)
      await next(() => people.slash(path, { words, 'only-me': true }, owner));
  await bot.still();
  for (const { only, body } of platform.posted.slice(before))
    expect(only, readIn({ body })).toBe(owner.id);
}, 60_000);

test('a button of one server pressed in another finds nothing there', async () => {
  const { message: card } = await next(() => people.slash(SETUP, { words: LINE }, OPERATOR));
  await quiet();
  const moved = { ...card, channel: STRANGER.channel, guild: OTHER };
  for (const index of buttonsOf(card).keys()) {
    const { message } = await next(() => people.press(moved, index, STRANGER));
    expect(message).toMatchObject({ guild: OTHER, only: STRANGER.id });
    expect(readIn(message)).not.toContain('0.9852');
  }
});

test('what one shop keeps is in no answer of another', async () => {
  const ours = platform.addGuild('Ours');
  const theirs = platform.addGuild('Theirs');
  await next(() =>
    people.slash(['shop', 'wheels', 'add'], { name: 'Secret wheel', form: 'straight' }, ours),
  );
  const { message: code } = await next(() => people.slash(SETUP, { words: LINE }, ours));
  const card = /\bCard (\w{5,12})\b/u.exec(readIn(code))?.[1] ?? '';
  for (const [path, options] of [
    [['shop', 'wheels', 'list'], {}],
    [['shop', 'wheels', 'show'], { name: 'Secrets' }],
    [['knurl', 'card'], { code: card }],
    [['knurl', 'plan'], { words: 'finish 0.995-1.005 straight 96dp 303 wheel Secrets' }],
  ] as const) {
    const { message } = await next(() => people.slash(path, options, theirs));
    expect(readIn(message)).not.toMatch(/Secret wheel|0\.9852/u);
  }
});

test('the bot’s own messages and those of other bots are not answered', async () => {
  const before = platform.posted.length;
  people.mentionByBot(LINE, OPERATOR);
  await new Promise((done) => setTimeout(done, 150));
  expect(platform.posted).toHaveLength(before);
});
