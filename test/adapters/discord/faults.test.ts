/** What the platform does wrong, and what the person gets all the same. */
import { afterEach, describe, expect, test } from 'vitest';
import { TokenRefused } from '../../../src/adapters/discord/index.ts';
import type { Desk } from '../../../src/desk/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { buttonsOf } from '../../platforms/discord/people.ts';
import type { Misfortune } from '../../platforms/discord/platform.ts';
import { FLOOR, OPERATOR, OTHER, OWNER, SHOP, STRANGER } from '../../platforms/discord/world.ts';
import { until } from '../../support/until.ts';
import { type Bot, openBot, type Wanted } from './bot.ts';
import { readIn } from './seen.ts';

const SETUP = ['knurl', 'setup'];
const LINE = '1.000 1018 straight 21tpi';
const REFUSED = '1.000 1018 stright 21tpi';
const HEADLINE = 'Turn to 0.9852 in: 65 teeth';

const open: Bot[] = [];
const opened = async (wanted: Wanted = {}): Promise<Bot> => {
  const bot = await openBot(wanted);
  open.push(bot);
  return bot;
};
/** Long enough for a second message, were there one. */
const settle = (ms = 300): Promise<void> => new Promise((done) => setTimeout(done, ms));

afterEach(async () => {
  for (const bot of open.splice(0)) {
    expect(bot.platform.faults).toEqual([]);
    await bot.stop();
  }
});

const asking = ({ people }: Bot, words = LINE, more = {}, delivery = {}) =>
  people.slash(SETUP, { words, ...more }, OPERATOR, delivery);
const saying = ({ platform }: Bot, words: string) =>
  platform.posted.filter((message) => readIn(message).includes(words));
const answersOf = (bot: Bot) => saying(bot, HEADLINE);
const answered = (bot: Bot, count = 1): Promise<void> =>
  until(() => answersOf(bot).length >= count, 'the answer');

/** Each answer takes so long. */
const slow =
  (ms: number) =>
  (desk: Desk): Desk => ({
    ...desk,
    answer: async (call) => {
      await settle(ms);
      return await desk.answer(call);
    },
  });
const hasty = { deferAfterMs: 50, breakDesk: slow(200) } as const;

const failed = { status: 500, done: false } as const;
const lost = { status: 500, done: true } as const;
const broken = { status: 0, done: false } as const;
const cut = { status: 0, done: true } as const;

describe('a call that fails twice and then goes well', () => {
  const ways: readonly (readonly [string, readonly Misfortune[]])[] = [
    ['500 before it was done', [failed, failed]],
    ['500 after it was done', [lost, lost]],
    ['the line breaks before', [broken, broken]],
    ['the line breaks after', [cut, cut]],
  ];

  test.each(ways)('%s: the reply stands once', async (_way, misfortunes) => {
    const bot = await opened();
    bot.platform.meet('callback', ...misfortunes);
    await asking(bot);
    await answered(bot);
    await settle();
    expect(bot.platform.posted).toHaveLength(1);
    expect(bot.faults).toEqual([]);
  });

  test.each(ways)('%s: the answer to a mention stands once', async (_way, misfortunes) => {
    const bot = await opened();
    bot.platform.meet('post', ...misfortunes);
    bot.people.mention(LINE);
    await answered(bot);
    await settle(600);
    expect(bot.platform.posted).toHaveLength(1);
    expect(bot.faults).toEqual([]);
  });

  test.each(ways)('%s: a deferred reply stands once', async (_way, misfortunes) => {
    const bot = await opened(hasty);
    bot.platform.meet('editOriginal', ...misfortunes);
    expect(await asking(bot)).toMatchObject({ type: 5 });
    await answered(bot);
    await settle();
    expect(bot.platform.posted).toHaveLength(1);
    expect(bot.faults).toEqual([]);
  });
});

describe('a call that fails for good', () => {
  test('of a mention: the channel is told in one sentence, if it takes that', async () => {
    const bot = await opened();
    bot.platform.meet('post', failed, failed, failed);
    bot.people.mention(LINE);
    await until(() => bot.platform.posted.length > 0, 'the sentence');
    await settle();
    expect(bot.platform.posted).toHaveLength(1);
    expect(bot.faults.map(({ what }) => what)).toEqual(['send']);
  });

  test('each route in turn: exactly one message, the answer or one clear sentence', async () => {
    for (const [route, words] of [
      ['callback', LINE],
      ['editOriginal', LINE],
      ['deleteOriginal', REFUSED],
      ['followUp', REFUSED],
    ] as const) {
      const bot = await opened(route === 'callback' ? {} : hasty);
      bot.platform.meet(route, failed, failed, failed);
      await asking(bot, words);
      await until(() => bot.platform.posted.length > 0, `a message in spite of ${route}`);
      await settle(150);
      expect(bot.platform.posted, route).toHaveLength(1);
      // What nobody else may see is in no message that they can.
      const [only] = bot.platform.posted;
      if (only?.only === null && words === REFUSED) expect(readIn(only)).not.toContain('stright');
    }
  });

  test('a channel the bot may not write in: the reply goes there all the same', async () => {
    const bot = await opened();
    const closed = { ...OPERATOR, channel: '1400000000000000002' };
    await bot.people.slash(SETUP, { words: LINE }, closed);
    await answered(bot);
    expect(answersOf(bot)[0]).toMatchObject({ channel: closed.channel, only: null });
    bot.people.mention(LINE, closed);
    await until(() => bot.faults.length > 0, 'a counted fault');
    await settle();
    expect(bot.platform.posted).toHaveLength(1);
  });
});

describe('time', () => {
  test('a slow desk is acknowledged after a second, and answered when it is there', async () => {
    const bot = await opened({ breakDesk: slow(1500) });
    const acked = await asking(bot);
    expect(acked?.type).toBe(5);
    expect(acked?.ms).toBeLessThan(2000);
    await answered(bot);
    expect(answersOf(bot)[0]).toMatchObject({ by: 'reply', only: null });
  });

  test('a deferred refusal is private although the wait was not', async () => {
    const bot = await opened(hasty);
    await asking(bot, REFUSED);
    await until(() => saying(bot, 'stright').length > 0, 'the refusal');
    await settle(100);
    expect(bot.platform.posted).toHaveLength(1);
    expect(bot.platform.posted[0]?.only).toBe(OPERATOR.id);
  });

  test('too late to answer: the answer is posted and names the person', async () => {
    const bot = await opened();
    expect(await asking(bot, LINE, {}, { lasts: -1 })).toBeNull();
    await answered(bot);
    expect(answersOf(bot)[0]).toMatchObject({
      by: 'post',
      channel: FLOOR,
      rings: [`@${OPERATOR.id}`],
    });
    expect(readIn(answersOf(bot)[0] ?? { body: {} })).toContain(en.chat.lateAnswer);
  });

  test('too late for a private answer: nothing of it is posted, and a button shows it', async () => {
    const bot = await opened();
    for (const [words, more, kept] of [
      [LINE, { 'only-me': true }, HEADLINE],
      [REFUSED, {}, 'stright'],
    ] as const) {
      bot.platform.posted.length = 0;
      await asking(bot, words, more, { lasts: -1 });
      await until(() => bot.platform.posted.length > 0, 'a word');
      const [said] = bot.platform.posted;
      if (said === undefined) throw new Error('silence');
      expect(said).toMatchObject({ by: 'post', only: null, rings: [`@${OPERATOR.id}`] });
      expect(readIn(said)).not.toContain(kept);
      const { message } = await bot.next(() => bot.people.press(said, 0));
      expect(message.only).toBe(OPERATOR.id);
      expect(readIn(message)).toContain(kept);
      // Nobody else gets it from there.
      const other = { ...OPERATOR, id: '1300000000000000077', name: 'Lee' };
      const { message: refused } = await bot.next(() => bot.people.press(said, 0, other));
      expect(refused.only).toBe(other.id);
      expect(readIn(refused)).not.toContain(kept);
    }
  });

  test('an interaction that ends while the answer is made: posted to whoever asked', async () => {
    const bot = await opened(hasty);
    await asking(bot, LINE, {}, { tokenLasts: 150 });
    await answered(bot);
    expect(answersOf(bot)[0]).toMatchObject({ by: 'post', rings: [`@${OPERATOR.id}`] });
  });

  test('a desk that throws: one private sentence, a counted fault, and the next is answered', async () => {
    let isBroken = true;
    const bot = await opened({
      breakDesk: (desk) => ({
        ...desk,
        answer: (call) => (isBroken ? Promise.reject(new Error('broken')) : desk.answer(call)),
      }),
    });
    await asking(bot);
    expect(saying(bot, en.chat.fault)).toHaveLength(1);
    expect(bot.platform.posted[0]?.only).toBe(OPERATOR.id);
    expect(bot.faults.map(({ what }) => what)).toEqual(['answer']);
    isBroken = false;
    await asking(bot);
    await answered(bot);
  });
});

describe('the same event again', () => {
  test('three times over: one reply, one answer, one press, one form', async () => {
    const bot = await opened();
    await asking(bot, LINE, {}, { copies: 3 });
    await answered(bot);
    const [card] = answersOf(bot);
    if (card === undefined) throw new Error('no card');
    bot.people.mention(LINE, OPERATOR, 3);
    await answered(bot, 2);
    await bot.people.press(card, 0, OPERATOR, { copies: 3 });
    await settle();
    expect(bot.platform.posted).toHaveLength(3);
    const { message: refused } = await bot.next(() => asking(bot, REFUSED));
    const form = await bot.nextForm(() =>
      bot.people.press(refused, en.chat.correct, OPERATOR, { copies: 2 }),
    );
    await bot.people.submit(form, { words: LINE }, { copies: 3 });
    await settle();
    expect(bot.platform.posted).toHaveLength(5);
    expect(bot.platform.forms).toHaveLength(1);
    expect(bot.faults).toEqual([]);
  });

  test('to two processes at once: one reply, one answer, one change', async () => {
    const first = await opened();
    const second = await openBot({ scene: first.scene });
    await asking(first);
    first.people.mention(LINE);
    await answered(first, 2);
    await first.people.slash(['shop', 'rules', 'add'], { rule: 'Guard down' }, OWNER);
    await settle(600);
    expect(first.platform.posted).toHaveLength(3);
    const { message } = await first.next(() => first.people.slash(['shop', 'rules', 'list']));
    expect(readIn(message).match(/Guard down/gu)).toHaveLength(1);
    await second.end();
    expect([...first.faults, ...second.faults]).toEqual([]);
  });

  test('a form that is sent twice is answered twice, and changes nothing by halves', async () => {
    const bot = await opened();
    const { message: refused } = await bot.next(() => asking(bot, REFUSED));
    const form = await bot.nextForm(() => bot.people.press(refused, en.chat.correct));
    for (const count of [1, 2]) {
      expect(await bot.people.submit(form, { words: LINE })).not.toBeNull();
      await answered(bot, count);
    }
    expect(bot.faults).toEqual([]);
  });
});

describe('the connection', () => {
  const lostAndBack = async (bot: Bot, breakIt: () => void): Promise<void> => {
    const before = bot.platform.gateway.resumed;
    breakIt();
    await until(() => bot.platform.gateway.resumed > before, 'the connection again');
  };

  test('dropped or asked to come again: it resumes, and what is asked then is answered', async () => {
    const bot = await opened();
    const { gateway } = bot.platform;
    for (const [turn, breakIt] of [gateway.drop, gateway.refresh].entries()) {
      await lostAndBack(bot, breakIt);
      await asking(bot);
      await answered(bot, turn + 1);
    }
    expect(gateway.intents).toHaveLength(1);
  });

  test('what was asked while nobody listened is answered after the gap, once', async () => {
    const bot = await opened();
    bot.platform.gateway.drop();
    const acked = asking(bot);
    bot.people.mention(LINE);
    expect(await acked).toMatchObject({ type: 4 });
    await answered(bot, 2);
    await settle();
    expect(bot.platform.posted).toHaveLength(2);
  });

  test('told too late after the gap: the person is answered in the channel', async () => {
    const bot = await opened();
    bot.platform.gateway.drop();
    expect(await asking(bot, LINE, {}, { lasts: 100 })).toBeNull();
    await answered(bot);
    expect(answersOf(bot)[0]).toMatchObject({ by: 'post', rings: [`@${OPERATOR.id}`] });
  });

  test('dropped while the answer is made, and right after it: nothing is lost or said twice', async () => {
    const bot = await opened({ breakDesk: slow(200) });
    const acked = asking(bot);
    await settle(50);
    await lostAndBack(bot, bot.platform.gateway.drop);
    await acked;
    await answered(bot);
    await lostAndBack(bot, bot.platform.gateway.drop);
    await settle();
    expect(bot.platform.posted).toHaveLength(1);
  });

  test('a platform that breaks every connection for a while: tried until it does not', async () => {
    const bot = await opened();
    bot.platform.gateway.refuse(2);
    const before = bot.platform.gateway.connections;
    bot.platform.gateway.drop();
    await until(() => bot.platform.gateway.connections > before, 'a connection', 15_000);
    await until(() => bot.platform.gateway.isHeard, 'somebody listening', 15_000);
    await asking(bot);
    await answered(bot);
  }, 30_000);

  test('a session that is no longer known: begun anew, and what is asked then is answered', async () => {
    const bot = await opened();
    bot.platform.gateway.forget();
    bot.platform.gateway.drop();
    await until(() => bot.platform.gateway.isHeard, 'a new session', 15_000);
    expect(bot.platform.gateway.intents).toHaveLength(2);
    await asking(bot);
    await answered(bot);
    bot.people.mention(LINE);
    await answered(bot, 2);
  }, 30_000);

  test('no privileged intent is asked for', async () => {
    const bot = await opened();
    // topics/gateway: members, presences and message content need the platform's leave.
    const privileged = (1 << 1) | (1 << 8) | (1 << 15);
    expect(bot.platform.gateway.intents).toHaveLength(1);
    expect((bot.platform.gateway.intents[0] ?? privileged) & privileged).toBe(0);
    bot.people.chat();
    await settle(100);
    expect(bot.platform.posted).toEqual([]);
  });
});

describe('a server that throws the bot out', () => {
  test('while an answer is made: counted, and everybody else is answered', async () => {
    const bot = await opened({ breakDesk: slow(200) });
    bot.people.mention(LINE);
    await settle(50);
    bot.platform.removeGuild(SHOP);
    await until(() => bot.faults.length > 0, 'a counted fault');
    await bot.people.slash(SETUP, { words: LINE }, STRANGER);
    await answered(bot);
    expect(bot.platform.posted.every(({ guild }) => guild === OTHER)).toBe(true);
    expect(bot.bot.shops).toBe(1);
  });
});

describe('buttons', () => {
  test('of before a restart are answered after it', async () => {
    const first = await openBot();
    await asking(first);
    const { message: hidden } = await first.next(() => asking(first, LINE, { 'only-me': true }));
    const { message: refused } = await first.next(() => asking(first, REFUSED));
    const [card] = answersOf(first);
    await first.end();
    const bot = await opened({ scene: first.scene });
    if (card === undefined) throw new Error('no card');
    for (const index of buttonsOf(card).keys())
      expect(await bot.people.press(card, index)).not.toBeNull();
    expect(saying(bot, en.chat.gone)).toEqual([]);
    const { message: quiet } = await bot.next(() => bot.people.press(hidden, 0));
    expect(quiet.only).toBe(OPERATOR.id);
    const form = await bot.nextForm(() => bot.people.press(refused, en.chat.correct));
    expect(JSON.stringify(form.body)).toContain('stright');
  });

  test('whose card is gone, or that are none of ours, say so in private', async () => {
    const bot = await opened();
    const { message: card } = await bot.next(() => asking(bot));
    const { message: refused } = await bot.next(() => asking(bot, REFUSED));
    const others = [
      (id: string) => id.replace(/\d{17,}$/u, '1577000000000000000'),
      () => 'x:1:2',
      () => 'open_menu',
    ];
    for (const message of [card, refused])
      for (const index of buttonsOf(message).keys())
        for (const change of others) {
          const text = JSON.stringify(message.body, (key, value: unknown) =>
            key === 'custom_id' ? change(String(value)) : value,
          );
          const old = { ...message, body: JSON.parse(text) as typeof message.body };
          const { message: said } = await bot.next(() => bot.people.press(old, index));
          expect(said.only).toBe(OPERATOR.id);
          expect(readIn(said)).toMatch(/no longer kept|no card/iu);
        }
    expect(bot.faults).toEqual([]);
  });
});

describe('at start', () => {
  test('a token that the platform does not take is named as such, and told to nobody', async () => {
    const fault = await openBot({ token: 'a-stolen-token-of-somebody' }).catch(
      (error: unknown) => error,
    );
    expect(fault).toBeInstanceOf(TokenRefused);
    expect(JSON.stringify(fault) + String(fault)).not.toContain('stolen');
  });

  test('a platform that is not there in time is said as such', async () => {
    const fault = await openBot({ api: 'http://127.0.0.1:9/api' }).catch((error: unknown) => error);
    expect(fault).toBeInstanceOf(Error);
    expect(fault).not.toBeInstanceOf(TokenRefused);
  });
});
