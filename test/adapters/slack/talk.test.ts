/** What people do in Slack and what they get, through the real client. */
import { afterAll, expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { buttonsOf } from '../../platforms/slack/people.ts';
import type { View } from '../../platforms/slack/platform.ts';
import { openBot, readable, until } from './bot.ts';

const bot = await openBot();
afterAll(async () => {
  expect(bot.platform.faults).toEqual([]);
  expect(bot.faults).toEqual([]);
  await bot.stop();
});

const LINE = '1.000 1018 straight 21tpi';
/** Worked by hand in test/reference/jobs.ts: 65 teeth of 1/21 in want 0.9852 in. */
const HEADLINE = 'Turn to 0.9852 in: 65 teeth';

const next = async (act: () => Promise<unknown>) => {
  const before = bot.platform.posted.length;
  const acked = await act();
  await until(() => bot.platform.posted.length > before, 'a reply');
  const message = bot.platform.posted.at(-1);
  if (message === undefined) throw new Error('no reply');
  return { acked, message };
};
const nextView = async (act: () => Promise<unknown>): Promise<View> => {
  const before = bot.platform.views.length;
  await act();
  await until(() => bot.platform.views.length > before, 'a form');
  const view = bot.platform.views.at(-1);
  if (view === undefined) throw new Error('no form');
  return view;
};

test('a line after the slash is acknowledged empty and answered in the channel, first line first', async () => {
  const { acked, message } = await next(() => bot.people.slash(LINE));
  expect(acked).toMatchObject({ payload: {} });
  expect(message).toMatchObject({ by: 'post', channel: 'C0FLOORSHOP', only: null, thread: null });
  expect(message.body.text).toContain(HEADLINE);
});

test('the same line with “only me” is seen by nobody else', async () => {
  const { message } = await next(() => bot.people.slash(`${LINE} only me`));
  expect(message).toMatchObject({ only: 'U0OPERATOR', channel: 'C0FLOORSHOP' });
  expect(message.body.text).toContain(HEADLINE);
});

test('what phones make of quotes, dashes and spaces is read as meant', async () => {
  const { message } = await next(() => bot.people.slash('1–1/4″ 1018 Straight 21 TPI'));
  expect(message.only).toBeNull();
  expect(message.body.text).toContain('Turn to 1.2');
});

test('a refusal is private, keeps the words and offers to change them', async () => {
  const { message } = await next(() => bot.people.slash('1.000 1018 stright 21tpi'));
  expect(message.only).toBe('U0OPERATOR');
  expect(readable(message.body)).toContain('stright');
  const form = await nextView(() => bot.people.press(message, en.chat.correct));
  expect(JSON.stringify(form.view)).toContain('1.000 1018 stright 21tpi');
  const { message: answered } = await next(() =>
    bot.people.submit(form, { words: `/knurl ${LINE}` }),
  );
  expect(answered.body.text).toContain(HEADLINE);
});

test('words that would ring or link are shown as text', async () => {
  for (const words of [
    '&lt;!channel&gt; *bold* _so_',
    '<!channel> hello',
    '<https://x.example|21tpi>',
    '@here `code` ~no~',
  ]) {
    const { message } = await next(() => bot.people.slash(words));
    expect(message.only).toBe('U0OPERATOR');
  }
});

test('a line of six thousand characters is refused in one message', async () => {
  const before = bot.platform.posted.length;
  const { message } = await next(() => bot.people.slash('9'.repeat(6000)));
  expect(message.only).toBe('U0OPERATOR');
  expect(bot.platform.posted.length).toBe(before + 1);
});

test('every button of a card is answered, in the place of the card', async () => {
  const { message: card } = await next(() => bot.people.slash(LINE));
  const buttons = buttonsOf(card.body);
  expect(buttons.length).toBeGreaterThan(2);
  for (const [index, { text }] of buttons.entries()) {
    const pressed = (): Promise<unknown> => bot.people.press(card, index);
    // What is seen has to be said first: that one brings a form.
    const answered = async (): Promise<unknown> =>
      text?.text === 'Trouble'
        ? await bot.people.submit(await nextView(pressed), { symptom: 'double' })
        : await pressed();
    const { message } = await next(answered);
    expect(message.channel).toBe(card.channel);
    if (text?.text === 'Trouble') expect(readable(message.body)).toContain('Most likely');
  }
});

test('a button in a private reply stays private', async () => {
  const { message: card } = await next(() => bot.people.slash(`${LINE} only me`));
  const { message } = await next(() => bot.people.press(card, 0));
  expect(message.only).toBe('U0OPERATOR');
});

test('a button whose answer is gone says so', async () => {
  const { message: card } = await next(() => bot.people.slash(LINE));
  const old = JSON.parse(
    JSON.stringify(card).replaceAll('T0SHOP.trigger', 'T0SHOP.trigge'),
  ) as typeof card;
  const { message } = await next(() => bot.people.press(old, 0));
  expect(readable(message.body)).toMatch(/no longer kept|There is no/u);
  expect(message.only).toBe('U0OPERATOR');
});

test('no words bring the form, and the form the card, where it was asked for', async () => {
  const form = await nextView(() => bot.people.slash(''));
  const { message } = await next(() =>
    bot.people.submit(form, {
      diameter: '1.000',
      pattern: 'straight',
      pitch: '21tpi',
      material: '1018',
    }),
  );
  expect(message).toMatchObject({ by: 'post', channel: 'C0FLOORSHOP', only: null });
  expect(message.body.text).toContain(HEADLINE);
});

test('a form sent for one person alone stays with them', async () => {
  const form = await nextView(() => bot.people.slash(''));
  const filled = { words: LINE, 'only-me': 'yes' };
  const { message } = await next(() => bot.people.submit(form, filled));
  expect(message.only).toBe('U0OPERATOR');
});

test('impossible values are told at their fields and what was typed stays', async () => {
  const form = await nextView(() => bot.people.slash(''));
  const before = bot.platform.posted.length;
  const tooLarge = { diameter: '900', pattern: 'straight', pitch: '21tpi', material: '1018' };
  for (const [filled, field] of [
    [tooLarge, 'diameter'],
    [{ ...tooLarge, diameter: '1.000', pitch: 'blorp' }, 'pitch'],
    [{ pattern: 'straight', pitch: '21tpi' }, 'diameter'],
    [{ ...tooLarge, diameter: '1.000', words: 'wobbly' }, 'words'],
  ] as const) {
    const acked = await bot.people.submit(form, filled);
    const payload = acked?.payload as { response_action: string; errors: Record<string, string> };
    expect(payload.response_action).toBe('errors');
    expect(Object.keys(payload.errors)).toEqual([field]);
    expect(payload.errors[field]).toMatch(/\w{3}/u);
  }
  expect(bot.platform.posted.length).toBe(before);
});

test('suggestions come while typing, and what was typed is among them', async () => {
  const form = await nextView(() => bot.people.slash(''));
  const acked = await bot.people.suggest(form, 'material', '303');
  const { options } = acked?.payload as { options: { value: string }[] };
  expect(options[0]?.value).toContain('303');
  const odd = await bot.people.suggest(form, 'material', 'unobtainium');
  expect(JSON.stringify(odd?.payload)).toContain('unobtainium');
});

test('a mention answers where it stands: in the channel, and in the thread', async () => {
  const { message: above } = await next(() => bot.people.mention(LINE));
  expect(above).toMatchObject({ by: 'post', thread: null, only: null });
  const thread = '1790000000.000777';
  const { message } = await next(() => bot.people.mention(LINE, { thread }));
  expect(message).toMatchObject({ by: 'post', thread, only: null });
  const { message: pressed } = await next(() => bot.people.press(message, 0));
  expect(pressed.thread).toBe(thread);
  const { message: refused } = await next(() => bot.people.mention('1.000 blorp', { thread }));
  expect(refused).toMatchObject({ only: 'U0OPERATOR', thread });
});

test('a mention without words offers the form by a button', async () => {
  const { message } = await next(() => bot.people.mention('', { thread: '1790000000.000778' }));
  expect(message.only).toBe('U0OPERATOR');
  const form = await nextView(() => bot.people.press(message, en.slack.openForm));
  const { message: card } = await next(() => bot.people.submit(form, { words: LINE }));
  expect(card).toMatchObject({ thread: '1790000000.000778', only: null });
});

test('a message is read by its shortcut, links and all', async () => {
  const words = '<@U0BOT> 1.000 1018 straight <https://x.example|21tpi>';
  const { message } = await next(() => bot.people.messageShortcut('from-message', words));
  expect(message.body.text).toContain(HEADLINE);
  const { message: empty } = await next(() => bot.people.messageShortcut('from-message', ''));
  expect(readable(empty.body)).toContain(en.chat.nothingToRead);
});

test('the global shortcut opens the form and answers to the person alone', async () => {
  const form = await nextView(() => bot.people.globalShortcut('open-setup'));
  const { message } = await next(() => bot.people.submit(form, { words: LINE }));
  expect(message.channel).toBe('DU0OPERATORT0SHOP');
});

test('the home shows the forms and opens them', async () => {
  await bot.people.openHome();
  await until(() => bot.platform.homes.length > 0, 'a home');
  expect(readable(bot.platform.homes[0]?.view)).toContain('/knurl setup');
  const form = await nextView(() => bot.people.pressHome('knurl setup'));
  const { message } = await next(() => bot.people.submit(form, { words: LINE }));
  expect(message.channel).toBe('DU0OPERATORT0SHOP');
  const other = await nextView(() => bot.people.choose(null, 'knurl trouble'));
  expect(other.view.callback_id).toContain('trouble');
});

/** What needs a shop's records is refused here, and refusals are private. */
const OF_RECORDS: readonly string[] = [
  ...['ask', 'answer', 'solved', 'reopen', 'questions'],
  ...['card', 'result', 'standard', 'find'],
];
const needsRecords = ({ path }: (typeof FLEET)[number]): boolean =>
  path[0] === 'shop' || OF_RECORDS.includes(path[1] ?? '');
const EXAMPLES = FLEET.filter((command) => !needsRecords(command)).flatMap((command) =>
  command.examples.map((example) => [command, example] as const),
);
const rest = (path: readonly string[], example: string): string => {
  const words = example.replace(/^\/\w+ ?/u, '');
  const verb = path.slice(1).join(' ');
  return words.startsWith(verb) ? words.slice(verb.length).trim() : words;
};

test('every verb is answered alike by words, by form, by mention and in a thread', async () => {
  for (const [{ path, parameters }, example] of EXAMPLES) {
    const words = example.replace(/^\/\w+ ?/u, '');
    const { message: slashed } = await next(() =>
      bot.people.slash(words, {}, { command: `/${path[0]}` }),
    );
    const { message: mentioned } = await next(() => bot.people.mention(example));
    const { message: threaded } = await next(() =>
      bot.people.mention(example, { thread: '1790000000.000900' }),
    );
    expect(mentioned.body.text).toBe(slashed.body.text);
    expect(threaded.body.text).toBe(slashed.body.text);
    expect(threaded.thread).toBe('1790000000.000900');
    if (parameters.length === 0) continue;
    const verb = path.slice(1).join(' ');
    const form = await nextView(() => bot.people.slash(verb, {}, { command: `/${path[0]}` }));
    const { message: filled } = await next(() =>
      bot.people.submit(form, { words: rest(path, example) }),
    );
    expect(filled.body.text).toBe(slashed.body.text);
  }
}, 60_000);
