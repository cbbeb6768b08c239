/** What the platform does wrong, and what the person gets all the same. */
import { afterEach, describe, expect, test } from 'vitest';
import { TokenRefused } from '../../../src/adapters/slack/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { buttonsOf } from '../../platforms/slack/people.ts';
import { APP_TOKEN, TEAMS } from '../../platforms/slack/platform.ts';
import { type Bot, openBot, readable, until, type Wanted } from './bot.ts';

const LINE = '1.000 1018 straight 21tpi';
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

const answersOf = ({ platform }: Bot) =>
  platform.posted.filter(({ body }) => (body.text ?? '').includes(HEADLINE));
const saying = ({ platform }: Bot, words: string) =>
  platform.posted.filter(({ body }) => readable(body).includes(words));

describe('a post that meets a fault', () => {
  test('500 after it was done: it is looked for and stands once', async () => {
    const bot = await opened();
    bot.platform.meet('chat.postMessage', { status: 500, done: true });
    await bot.people.slash(LINE);
    await until(() => answersOf(bot).length > 0, 'the answer');
    await settle();
    expect(answersOf(bot)).toHaveLength(1);
    expect(bot.platform.calls.map(({ method }) => method)).toContain('conversations.history');
  });

  test('500 before it was done, twice: it comes once, in its thread', async () => {
    const bot = await opened();
    const fault = { status: 500, done: false } as const;
    bot.platform.meet('chat.postMessage', fault, fault);
    await bot.people.mention(LINE, { thread: '1790000000.000001' });
    await until(() => answersOf(bot).length > 0, 'the answer');
    await settle();
    expect(answersOf(bot)).toHaveLength(1);
    expect(bot.platform.calls.map(({ method }) => method)).toContain('conversations.replies');
  });

  test('500 for good: one short sentence to whoever asked, and a counted fault', async () => {
    const bot = await opened();
    const fault = { status: 500, done: false } as const;
    bot.platform.meet('chat.postMessage', fault, fault, fault);
    await bot.people.slash(LINE);
    await until(() => saying(bot, en.chat.fault).length > 0, 'the sentence');
    await settle();
    expect(bot.platform.posted).toHaveLength(1);
    expect(bot.platform.posted[0]?.only).toBe('U0OPERATOR');
    expect(bot.faults.map(({ what }) => what)).toEqual(['send']);
  });

  test('429: the queue waits as long as asked, then everything goes out once', async () => {
    const bot = await opened();
    bot.platform.meet('chat.postMessage', { status: 429, after: 1 });
    const since = Date.now();
    await bot.people.slash(LINE);
    await settle(200);
    await bot.people.slash(`${LINE} `, { id: 'U0SECOND' });
    await until(() => answersOf(bot).length === 2, 'both answers');
    expect(Date.now() - since).toBeGreaterThanOrEqual(950);
    const [, ...later] = bot.platform.calls.filter(({ method }) => method === 'chat.postMessage');
    expect(later.every(({ at }) => at - since >= 950)).toBe(true);
    await settle();
    expect(answersOf(bot)).toHaveLength(2);
  });

  test('a channel the bot is not in: by the response address, still in the channel', async () => {
    const bot = await opened();
    await bot.people.slash(LINE, { channel: 'C0CLOSEDSHOP' });
    await until(() => answersOf(bot).length > 0, 'the answer');
    expect(answersOf(bot)[0]).toMatchObject({
      by: 'response',
      only: null,
      channel: 'C0CLOSEDSHOP',
    });
    expect(bot.faults).toEqual([]);
  });

  test('each call failing in turn: exactly one message, the answer or one clear sentence', async () => {
    for (const only of ['', ' only me'])
      for (const method of [
        'chat.postMessage',
        'response_url',
        'chat.postEphemeral',
        'users.info',
        'usergroups.list',
      ]) {
        const bot = await opened();
        const fault = { status: 500, done: false } as const;
        bot.platform.meet(method, fault, fault, fault);
        await bot.people.slash(LINE + only);
        await until(() => bot.platform.posted.length > 0, `a message in spite of ${method}`);
        await settle(150);
        expect(bot.platform.posted, method).toHaveLength(1);
        if (only !== '') expect(bot.platform.posted[0]?.only).toBe('U0OPERATOR');
      }
  });
});

describe('a response address', () => {
  test('used up or answering 500: the private reply goes another private way', async () => {
    const bot = await opened();
    await bot.people.slash(`${LINE} only me`, {}, { responses: 0 });
    await until(() => answersOf(bot).length === 1, 'the answer');
    expect(answersOf(bot)[0]).toMatchObject({ by: 'ephemeral', only: 'U0OPERATOR' });
    const fault = { status: 500, done: false } as const;
    bot.platform.meet('response_url', fault, fault, fault);
    await bot.people.slash(`${LINE} only me`);
    await until(() => answersOf(bot).length === 2, 'the answer');
    expect(answersOf(bot)[1]).toMatchObject({ by: 'ephemeral', only: 'U0OPERATOR' });
  });

  test('used up where the bot may not write: the reply goes to the person alone', async () => {
    const bot = await opened();
    await bot.people.slash(`${LINE} only me`, { channel: 'C0CLOSEDSHOP' }, { responses: 0 });
    await until(() => answersOf(bot).length === 1, 'the answer');
    expect(answersOf(bot)[0]).toMatchObject({ by: 'post', channel: 'DU0OPERATORT0SHOP' });
  });
});

describe('time', () => {
  test('an expired trigger: a button takes the place of the form', async () => {
    const bot = await opened();
    await bot.people.slash('', {}, { triggerLasts: -1 });
    const [said] = await bot.posted(1);
    if (said === undefined) throw new Error('silence');
    expect(said.only).toBe('U0OPERATOR');
    expect(buttonsOf(said.body)).toHaveLength(1);
    await bot.people.press(said, en.slack.openForm);
    await until(() => bot.platform.views.length > 0, 'the form');
    expect(bot.platform.views[0]?.view.callback_id).toContain('setup');
  });

  test('a form opened by a button that came late is offered again too', async () => {
    const bot = await opened();
    await bot.people.slash('1.000 1018 stright 21tpi');
    const [refused] = await bot.posted(1);
    if (refused === undefined) throw new Error('silence');
    await bot.people.press(refused, en.chat.correct, {}, { triggerLasts: -1 });
    const again = (await bot.posted(2))[1];
    if (again === undefined) throw new Error('silence');
    await bot.people.press(again, en.slack.openForm);
    await until(() => bot.platform.views.length > 0, 'the form');
    expect(JSON.stringify(bot.platform.views[0]?.view)).toContain('stright');
  });

  test('a slow desk: acknowledged at once, answered when it is there', async () => {
    const bot = await opened({
      formPatienceMs: 100,
      breakDesk: (desk) => ({
        ...desk,
        answer: async (call) => {
          await settle(600);
          return await desk.answer(call);
        },
      }),
    });
    const acked = await bot.people.slash(LINE);
    expect(acked?.ms).toBeLessThan(400);
    await until(() => answersOf(bot).length === 1, 'the answer');
    await bot.people.slash('');
    await until(() => bot.platform.views.length > 0, 'the form');
    const [form] = bot.platform.views;
    if (form === undefined) throw new Error('no form');
    const sent = await bot.people.submit(form, { words: LINE });
    expect(sent?.ms).toBeLessThan(500);
    await until(() => answersOf(bot).length === 2, 'the answer to the form');
  });

  test('a hundred at once: all are acknowledged long before the last is answered', async () => {
    const bot = await opened({
      breakDesk: (desk) => ({
        ...desk,
        answer: async (call) => {
          // Work that lets nothing else have its turn.
          const end = performance.now() + 20;
          while (performance.now() < end);
          return await desk.answer(call);
        },
      }),
    });
    // Known from now on: nothing has to be looked up in between.
    await bot.people.slash(LINE);
    await until(() => answersOf(bot).length === 1, 'the first answer');
    const since = performance.now();
    const acks = await Promise.all(Array.from({ length: 100 }, () => bot.people.slash(LINE)));
    await until(() => answersOf(bot).length === 101, 'all answers', 30_000);
    const worst = Math.max(...acks.map((ack) => ack?.ms ?? Number.POSITIVE_INFINITY));
    expect(worst).toBeLessThan((performance.now() - since) / 3);
  });

  test('a desk that throws: still acknowledged, one sentence, a counted fault', async () => {
    const bot = await opened({
      breakDesk: (desk) => ({ ...desk, answer: () => Promise.reject(new Error('broken')) }),
    });
    expect(await bot.people.slash(LINE)).not.toBeNull();
    await bot.posted(1);
    expect(await bot.people.mention(LINE)).not.toBeNull();
    await bot.posted(2);
    await bot.people.slash('');
    await until(() => bot.platform.views.length > 0, 'the form');
    const [form] = bot.platform.views;
    if (form === undefined) throw new Error('no form');
    expect(await bot.people.submit(form, { words: LINE })).not.toBeNull();
    await bot.posted(3);
    await settle();
    expect(saying(bot, en.chat.fault)).toHaveLength(3);
    expect(bot.platform.posted.every(({ only }) => only === 'U0OPERATOR')).toBe(true);
    expect(bot.faults).toHaveLength(3);
  });
});

describe('a listener that throws', () => {
  test('a form that nobody can read any more: acknowledged, the person told, counted', async () => {
    const bot = await opened();
    await bot.people.slash('');
    await until(() => bot.platform.views.length > 0, 'the form');
    const [form] = bot.platform.views;
    if (form === undefined) throw new Error('no form');
    const old = { ...form, view: { ...form.view, private_metadata: 'of an earlier program' } };
    expect(await bot.people.submit(old, { words: LINE })).not.toBeNull();
    const [said] = await bot.posted(1);
    expect(readable(said?.body ?? '')).toContain(en.chat.fault);
    expect(said?.channel).toBe('DU0OPERATORT0SHOP');
    expect(bot.faults.map(({ what }) => what)).toEqual(['interaction']);
  });

  test('records that cannot say what was there before: acknowledged, and answered', async () => {
    const bot = await opened({ once: () => Promise.reject(new Error('no records')) });
    expect(await bot.people.slash(LINE)).not.toBeNull();
    await until(() => answersOf(bot).length === 1, 'the answer');
    expect(bot.faults.map(({ what }) => what)).toEqual(['once']);
  });
});

describe('the socket', () => {
  test('the same envelope twice acts once', async () => {
    const bot = await opened();
    const payload = bot.people.slashBody('/knurl', LINE, {}, {});
    for (let copy = 0; copy < 3; copy += 1)
      expect(await bot.platform.deliver({ type: 'slash_commands', payload })).not.toBeNull();
    const mention = bot.people.mentionBody(LINE, {});
    for (let copy = 0; copy < 2; copy += 1)
      await bot.platform.deliver({ type: 'events_api', payload: mention }, undefined, copy);
    await until(() => answersOf(bot).length >= 2, 'the answers');
    await settle();
    expect(answersOf(bot)).toHaveLength(2);
  });

  test('a refresh or a drop: it comes back at once, and what was asked is answered', async () => {
    const bot = await opened();
    for (const [turn, breakIt] of [bot.platform.refresh, bot.platform.drop].entries()) {
      const before = bot.platform.opened;
      breakIt();
      await until(() => bot.platform.opened > before, 'the connection after the break', 2_000);
      await bot.people.slash(LINE);
      await until(() => answersOf(bot).length === turn + 1, 'the answer after the break');
    }
  });

  test('what came just before a drop is answered after it', async () => {
    const bot = await opened({
      breakDesk: (desk) => ({
        ...desk,
        answer: async (call) => {
          await settle(300);
          return await desk.answer(call);
        },
      }),
    });
    await bot.people.slash(LINE);
    bot.platform.drop();
    await until(() => answersOf(bot).length === 1, 'the answer');
  });

  test('a mention during the gap is delivered again and answered once', async () => {
    const bot = await opened();
    const before = bot.platform.opened;
    bot.platform.drop();
    const payload = bot.people.mentionBody(LINE, {});
    expect(await bot.platform.deliver({ type: 'events_api', payload })).toBeNull();
    await until(() => bot.platform.opened > before, 'the connection after the gap');
    await bot.platform.deliver({ type: 'events_api', payload }, undefined, 1);
    await until(() => answersOf(bot).length === 1, 'the answer');
  });

  test('the platform cannot be reached for a while: tried until it can', async () => {
    const bot = await opened();
    const fault = { status: 500, done: false } as const;
    bot.platform.meet('apps.connections.open', fault, fault);
    const before = bot.platform.opened;
    bot.platform.drop();
    await until(() => bot.platform.opened > before, 'the connection after the break');
    await bot.people.slash(LINE);
    await until(() => answersOf(bot).length === 1, 'the answer');
  });
});

describe('by signed requests', () => {
  const envelope = (bot: Bot) => ({
    type: 'slash_commands',
    payload: bot.people.slashBody('/knurl', LINE, {}, {}),
  });
  const now = () => Math.floor(Date.now() / 1000);

  test('words, forms and events are answered as by the socket', async () => {
    const bot = await opened({ http: true });
    expect(await bot.people.slash(LINE)).toMatchObject({ payload: undefined });
    await until(() => answersOf(bot).length === 1, 'the answer');
    await bot.people.mention(LINE);
    await until(() => answersOf(bot).length === 2, 'the answer to the mention');
    await bot.people.slash('');
    await until(() => bot.platform.views.length > 0, 'the form');
    const [form] = bot.platform.views;
    if (form === undefined) throw new Error('no form');
    const refused = await bot.people.submit(form, {
      diameter: '900',
      pattern: 'straight',
      pitch: '21tpi',
    });
    expect(refused?.payload).toMatchObject({ response_action: 'errors' });
    await bot.people.submit(form, { words: LINE });
    await until(() => answersOf(bot).length === 3, 'the answer to the form');
  });

  test('the same request again, and again as a retry, acts once', async () => {
    const bot = await opened({ http: true });
    const asked = envelope(bot);
    const at = now();
    for (const retry of [0, 0, 1, 2])
      expect((await bot.platform.signed(bot.url, asked, { at, retry })).status).toBe(200);
    await until(() => answersOf(bot).length > 0, 'the answer');
    await settle();
    expect(answersOf(bot)).toHaveLength(1);
  });

  test('signed by somebody else, long ago, tomorrow or not at all: refused', async () => {
    const bot = await opened({ http: true });
    const asked = envelope(bot);
    for (const wrong of [
      { secret: 'guessed' },
      { at: now() - 301 },
      { at: now() + 86_400 },
      { at: Number.NaN },
    ])
      expect((await bot.platform.signed(bot.url, asked, wrong)).status).toBe(401);
    const bare = await fetch(bot.url, { method: 'POST', body: '{}' });
    expect(bare.status).toBe(401);
    await settle();
    expect(bot.platform.posted).toEqual([]);
  });

  test('a body of five megabytes is refused and the next request answered', async () => {
    const bot = await opened({ http: true });
    const huge = {
      type: 'slash_commands',
      payload: { ...envelope(bot).payload, text: '9'.repeat(5_000_000) },
    };
    const refused = await bot.platform.signed(bot.url, huge).catch(() => ({ status: 413 }));
    expect(refused.status).toBe(413);
    await bot.people.slash(LINE);
    await until(() => answersOf(bot).length === 1, 'the answer');
  });
});

describe('at start', () => {
  const [team] = TEAMS;
  test.each([
    ['SLACK_BOT_TOKEN', { botTokens: ['xoxb-wrong'] }],
    ['SLACK_APP_TOKEN', { by: { appToken: 'xapp-wrong' } }],
  ] as const)('a wrong %s is named, and no token is told', async (variable, wrong) => {
    const fault = await openBot({
      botTokens: [team?.botToken ?? ''],
      by: { appToken: APP_TOKEN },
      ...wrong,
    }).catch((error: unknown) => error);
    expect(fault).toBeInstanceOf(TokenRefused);
    expect((fault as TokenRefused).variable).toBe(variable);
    expect(JSON.stringify(fault) + String(fault)).not.toContain('wrong');
  });
});
