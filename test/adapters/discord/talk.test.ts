/** What people do in Discord and what they get, through the real client. */
import { afterAll, describe, expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { textsIn } from '../../platforms/discord/payloads.ts';
import { buttonsOf } from '../../platforms/discord/people.ts';
import { namedIn } from '../../platforms/discord/rules.ts';
import { FLOOR, OPERATOR, OWNER, THREAD } from '../../platforms/discord/world.ts';
import { until } from '../../support/until.ts';
import { openBot } from './bot.ts';
import { readIn } from './seen.ts';

const bot = await openBot();
afterAll(async () => {
  expect(bot.platform.faults).toEqual([]);
  expect(bot.faults).toEqual([]);
  await bot.stop();
});

const { people, platform, next, nextForm, quiet } = bot;
const SETUP = ['knurl', 'setup'];
const LINE = '1.000 1018 straight 21tpi';
/** Worked by hand in test/reference/jobs.ts: 65 teeth of 1/21 in want 0.9852 in. */
const HEADLINE = 'Turn to 0.9852 in: 65 teeth';
const asking = (words: string, more = {}) => next(() => people.slash(SETUP, { words, ...more }));

describe('options and words', () => {
  test('words are answered in the channel, in the acknowledgement itself', async () => {
    const { acked, message } = await asking(LINE);
    expect(acked?.type).toBe(4);
    expect(message).toMatchObject({ by: 'reply', channel: FLOOR, only: null, rings: [] });
    expect(readIn(message)).toContain(HEADLINE);
    await quiet();
    expect(platform.posted[0]?.files.map(({ alt }) => alt)).toHaveLength(3);
  });

  test('options and words say the same, alone or together', async () => {
    const without = { material: '1018', pattern: 'straight', pitch: '21 tpi' };
    const { message } = await next(() => people.slash(SETUP, { diameter: '1.000', ...without }));
    expect(readIn(message)).toContain(HEADLINE);
    const { message: both } = await next(() => people.slash(SETUP, { ...without, words: '1.000' }));
    expect(readIn(both)).toContain(HEADLINE);
  });

  test('a whole line in the words is that line', async () => {
    const { message } = await asking('/knurl check 0.995 straight 21tpi');
    expect(readIn(message)).toContain('0.9852');
    expect(message.only).toBeNull();
  });

  test('what phones make of quotes, dashes and capitals is read as meant', async () => {
    const { message } = await asking('1–1/4″ 1018 Straight 21 TPI');
    expect(message.only).toBeNull();
    expect(readIn(message)).toContain('Turn to 1.2');
  });

  test('no option at all is told what to say', async () => {
    const { message } = await next(() => people.slash(SETUP));
    expect(message.only).toBe(OPERATOR.id);
    expect(readIn(message)).toMatch(/such as|Type/u);
  });
});

describe('private', () => {
  test('“only me” is seen by nobody else, and so is all that its buttons bring', async () => {
    const { message } = await asking(LINE, { 'only-me': true });
    expect(message.only).toBe(OPERATOR.id);
    const before = platform.posted.length;
    for (const { label = '' } of buttonsOf(message)) await people.press(message, label);
    await quiet();
    expect(platform.posted.length).toBeGreaterThan(before);
    for (const { only } of platform.posted.slice(before)) expect(only).toBe(OPERATOR.id);
  });

  test('a refusal is private, offers its choices, and keeps the words to be changed', async () => {
    const { message } = await asking('1.000 1018 stright 21tpi');
    expect(message.only).toBe(OPERATOR.id);
    expect(readIn(message)).toContain('stright');
    const labels = buttonsOf(message).map(({ label }) => label);
    expect(labels).toContain(en.chat.correct);
    expect(labels.length).toBeGreaterThan(1);
    const form = await nextForm(() => people.press(message, en.chat.correct));
    expect(JSON.stringify(form.body)).toContain('1.000 1018 stright 21tpi');
    const { message: answered } = await next(() =>
      people.submit(form, { words: `/knurl setup ${LINE}` }),
    );
    expect(readIn(answered)).toContain(HEADLINE);
    // The reading that was offered does it too, in one press.
    const { message: chosen } = await next(() => people.press(message, 0));
    expect(readIn(chosen)).toContain(HEADLINE);
  });

  test('a form sent with nothing in it says so', async () => {
    const { message } = await asking('1.000 1018 stright 21tpi');
    const form = await nextForm(() => people.press(message, en.chat.correct));
    const { message: said } = await next(() => people.submit(form, { words: '  ' }));
    expect(said.only).toBe(OPERATOR.id);
    expect(readIn(said)).toContain(en.chat.nothingToRead);
  });
});

describe('bad input', () => {
  test.each([
    ['a word that is none', '1.000 1018 blorp 21tpi'],
    ['a diameter no lathe turns', '900 straight 21tpi 1018'],
    ['two diameters', '1.000 straight 21tpi 1018 diameter 2.000'],
    ['a size of which the unit is not clear', '19 diamond 21tpi'],
    ['no pitch', '1.000 straight 1018'],
    ['a material that is none', '1.000 straight 21tpi unobtainium'],
    ['a question', 'what do I do?'],
    ['nothing but signs', '?!?'],
    ['another bot’s command', '/remind me'],
    ['a number that is none', 'NaN straight 21tpi'],
  ])('%s: one private reply that can be corrected', async (_what, words) => {
    const before = platform.posted.length;
    const { message } = await asking(words);
    expect(message.only).toBe(OPERATOR.id);
    expect(platform.posted.length).toBe(before + 1);
    const form = await nextForm(() => people.press(message, en.chat.correct));
    expect(JSON.stringify(form.body)).toContain(words.replaceAll('"', '\\"'));
  });

  test('six thousand characters: refused in messages that fit, and the words are not lost', async () => {
    for (const words of ['9'.repeat(6000), `${LINE} ${'blorp '.repeat(990)}`.slice(0, 6000)]) {
      const before = platform.posted.length;
      await asking(words);
      await quiet();
      for (const { only } of platform.posted.slice(before)) expect(only).toBe(OPERATOR.id);
    }
    const { message } = await next(() =>
      people.slash(SETUP, { diameter: '1'.repeat(6000), pitch: '21tpi' }),
    );
    expect(message.only).toBe(OPERATOR.id);
  });

  test('markup, calls and invitations in a person’s words are text, and ring nobody', async () => {
    const nasty = [
      '@everyone look',
      '@here',
      '<@1300000000000000001> <@&1200000000000000011>',
      '**bold** __under__ ~~gone~~ ||hidden||',
      '```js\nalert(1)\n```',
      '`code`',
      '# head',
      '> said',
      '[here](https://x.example/free)',
      'https://discord.gg/abcdef discord.com/invite/abcdef',
      '<t:1790000000:R> </knurl setup:1> <:tooth:1>',
      '\\*not\\*',
    ];
    for (const words of nasty) {
      const { message } = await asking(words);
      expect(message.rings).toEqual([]);
      expect(textsIn(message.body).flatMap(namedIn)).toEqual([]);
      const { message: kept } = await next(() =>
        people.slash(['shop', 'rules', 'add'], { rule: words }, OWNER),
      );
      expect(kept.rings).toEqual([]);
      const texts = textsIn(kept.body);
      expect(texts.flatMap(namedIn)).toEqual([]);
      // What was typed is read as it was typed, mark for mark; who was named, by name.
      const read = texts.join('\n').replaceAll(/\\([^\p{L}\p{N}\s])/gu, '$1');
      const typed = words.replace(/^<@.*>$/u, 'Ada Engineers');
      expect(read.replaceAll(/\s+/gu, ' ')).toContain(typed.replaceAll(/\s+/gu, ' '));
    }
  });
});

describe('a mention', () => {
  test('is answered where it stands: in the channel, and in the thread', async () => {
    let asked = '';
    const { message } = await next(() => {
      asked = people.mention(LINE);
    });
    expect(message).toMatchObject({ by: 'post', channel: FLOOR, replyTo: asked, rings: [] });
    await quiet();
    const inThread = { ...OPERATOR, channel: THREAD };
    const { message: threaded } = await next(() => people.mention(LINE, inThread));
    expect(threaded).toMatchObject({ by: 'post', channel: THREAD, only: null });
    expect(readIn(threaded)).toContain(HEADLINE);
    await quiet();
    const { message: pressed } = await next(() => people.press(threaded, 'Show mm first'));
    expect(pressed.channel).toBe(THREAD);
    const { message: refused } = await next(() => people.mention('1.000 blorp', inThread));
    expect(refused.channel).toBe(THREAD);
    expect(refused.rings).toEqual([]);
  });

  test('a reply or a message that only calls everybody is none of the bot’s', async () => {
    const before = platform.posted.length;
    people.chat();
    await new Promise((done) => setTimeout(done, 100));
    expect(platform.posted.length).toBe(before);
  });

  test('every verb can be asked for by a mention, in a thread too', async () => {
    const owner = platform.addGuild('A shop of threads');
    const thread = platform.addThread(owner.channel);
    for (const { path, examples } of FLEET) {
      const [line = `/${path.join(' ')}`] = examples;
      for (const channel of [owner.channel, thread]) {
        const before = platform.posted.length;
        people.mention(line, { ...owner, channel });
        // What the shop has kept comes by direct message, once it is made.
        const answers = () => platform.posted.slice(before).filter(({ guild }) => guild !== null);
        await until(() => answers().length > 0, line);
        expect(answers()[0], line).toMatchObject({ by: 'post', channel, only: null });
      }
    }
    await bot.still();
  }, 60_000);
});

describe('a message of somebody else', () => {
  test('is read as a set-up by its command', async () => {
    const { message } = await next(() => people.onMessage(`<@${OPERATOR.id}> ${LINE}`));
    expect(readIn(message)).toMatch(/Turn to|not a word/u);
    const { message: plain } = await next(() => people.onMessage(LINE));
    expect(readIn(plain)).toContain(HEADLINE);
    const { message: empty } = await next(() => people.onMessage(''));
    expect(empty.only).toBe(OPERATOR.id);
    expect(readIn(empty)).toContain(en.chat.nothingToRead);
  });
});

describe('suggestions while typing', () => {
  const suggested = async (
    path: readonly string[],
    option: string,
    typed: string,
  ): Promise<readonly string[]> =>
    (await people.suggest(path, { [option]: typed }, option)).map(({ value }) => value);

  test('after three letters the right one comes first', async () => {
    for (const [typed, wanted] of [
      ['303', '303'],
      ['304', '304'],
      ['101', '1018'],
      ['bra', 'brass'],
      ['606', '6061'],
      ['12l', '12L14'],
    ] as const)
      expect((await suggested(SETUP, 'material', typed))[0]?.toLowerCase()).toBe(
        wanted.toLowerCase(),
      );
  });

  test('the shop’s own come too, and no other shop’s', async () => {
    const other = platform.addGuild('Next door');
    for (const [who, name] of [
      [OWNER, 'Old Faithful'],
      [other, 'Foreign lathe'],
    ] as const)
      await next(() => people.slash(['shop', 'machines', 'add'], { name, speeds: '60 90' }, who));
    const RULE = ['shop', 'rules', 'add'];
    expect((await suggested(RULE, 'only-on', 'old'))[0]).toBe('Old Faithful');
    expect(await suggested(RULE, 'only-on', 'for')).not.toContain('Foreign lathe');
  });

  test('none where nothing fits, and never more or longer than Discord takes', async () => {
    expect(await suggested(SETUP, 'material', 'zzzzzz')).toEqual([]);
    for (const typed of ['', 's', 'st', 'a'.repeat(6000), '@everyone', '💥'])
      expect((await suggested(SETUP, 'material', typed)).length).toBeLessThanOrEqual(25);
  });

  test('every option that suggests answers in time', async () => {
    for (const { path } of FLEET)
      for (const { name, autocomplete } of people.optionsOf(path))
        if (autocomplete === true) await suggested(path, name, 'st');
  });
});

test('the foremost options of every verb have their place, whatever is left out', () => {
  for (const { path, foremost } of FLEET) {
    const names = people.optionsOf(path).map(({ name }) => name);
    for (const name of foremost.slice(0, 5))
      expect(names, path.join(' ')).toContain(
        name.replaceAll(/[A-Z]/gu, (letter) => `-${letter.toLowerCase()}`),
      );
    expect(names).toContain('words');
    expect(names).toContain('only-me');
  }
});
