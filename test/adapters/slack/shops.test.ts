/** Two shops in one program: what the one has told is nowhere in the other, and the home is their own. */
import { expect, test } from 'vitest';
import { en } from '../../../src/phrases/index.ts';
import { buttonsOf } from '../../platforms/slack/people.ts';
import { until } from '../../support/until.ts';
import { readable } from './bot.ts';
import { openShops } from './shops.ts';

const LINE = '1.000 1018 straight 21tpi';
/** Invented names that nothing else of the program contains. */
const [MACHINE, RULE, WHEEL, PART] = ['Quartzbeam', 'Nettlefold', 'Hobnail', 'ZQ-4411'];
const TOLD = [MACHINE, RULE, WHEEL, PART] as const;
const OTHER = { team: 'T0OTHER', channel: 'C0FLOOROTHER' } as const;

type Shops = Awaited<ReturnType<typeof openShops>>;

/** The first shop tells all it has to tell; the code of its card. */
const tells = async ({ shop, knurl, platform }: Shops): Promise<string> => {
  await shop(`machines add ${MACHINE} 100 200 400 rpm`, 'U0OWNER');
  await shop(`rules add ${RULE} before every start`, 'U0OWNER');
  await shop(`wheels add ${WHEEL} straight 21 tpi`, 'U0OWNER');
  const card = await knurl(LINE, 'U0OWNER');
  await knurl(`standard save ${PART}`, 'U0OWNER');
  await knurl(`standard propose ${PART}`, 'U0OWNER');
  await knurl(`standard approve ${PART}`, 'U0OWNER');
  const said = readable(platform.posted);
  for (const told of TOLD) expect(said).toContain(told);
  return /\bCard ([2346789CFHJKMPRTWXY]{5,12})\b/u.exec(card)?.[1] ?? 'no code';
};

test('nothing that one shop has told is in any send to the other, whatever is asked there', async () => {
  const bot = await openShops();
  const code = await tells(bot);
  expect(code).not.toBe('no code');
  const own = bot.platform.posted.length;
  const asked = [
    ['/shop', 'machines list'],
    ['/shop', 'wheels list'],
    ['/shop', 'rules list'],
    ['/shop', 'people list'],
    ['/shop', 'machines show Quartz'],
    ['/knurl', `${LINE} wheel Hobnai`],
    ['/knurl', `${LINE} on Quartz`],
    ['/knurl', `card ${code}`],
    ['/knurl', 'standard list'],
    ['/knurl', 'standard show ZQ-4412'],
    ['/knurl', 'find before every start'],
    ['/knurl', 'find 1018'],
    ['/knurl', LINE],
  ] as const;
  for (const [command, words] of asked)
    for (const quiet of ['', ' only me'])
      await bot.messageTo(() =>
        bot.people.slash(`${words}${quiet}`, { ...OTHER, id: 'U0STRANGER' }, { command }),
      );
  await bot.people.openHome({ team: 'T0OTHER', id: 'U0STRANGER' });
  await until(() => bot.platform.homes.length === 1, 'a home');
  for (const message of bot.platform.posted.slice(own)) {
    expect(message.team).toBe('T0OTHER');
    expect(message.channel.endsWith('OTHER')).toBe(true);
    const said = readable(message);
    for (const told of [...TOLD, 'U0OWNER', 'Name of U0OWNER']) expect(said).not.toContain(told);
  }
  for (const told of TOLD) expect(JSON.stringify(bot.platform.homes)).not.toContain(told);
});

test("the home shows the shop's standards, each by a button, to whoever presses it alone", async () => {
  const bot = await openShops();
  const homeOf = async (id: string) => {
    const before = bot.platform.homes.length;
    await bot.people.openHome({ id });
    await until(() => bot.platform.homes.length > before, 'a home');
    return bot.platform.homes.at(-1)?.view ?? { blocks: [] };
  };
  expect(readable(await homeOf('U0OWNER'))).not.toContain(en.slack.standards);
  await tells(bot);
  const home = await homeOf('U0OPERATOR');
  expect(readable(home)).toContain(en.slack.standards);
  expect(readable(home)).toContain(`${PART} rev 1: turn to 0.9852 in [25.025 mm], 65 teeth`);
  const buttons = (home.blocks ?? []).flatMap((block) => {
    const { accessory } = block as { readonly accessory?: { readonly value: string } };
    return accessory === undefined ? [] : [accessory.value];
  });
  expect(buttons).toHaveLength(1);
  const shown = await bot.messageTo(() => bot.people.pressHome(buttons[0] ?? '', {}, 'say:0'));
  expect(shown.channel).toBe('DU0OPERATORT0SHOP');
  expect(readable(shown.body)).toContain(`${PART} rev 1`);
});

test('a verb that needs nothing more is answered; one that does opens its form, or offers it', async () => {
  const bot = await openShops();
  expect(await bot.knurl('standard list', 'U0OWNER')).toContain('standard');
  expect(bot.platform.views).toEqual([]);
  await bot.people.slash('standard show');
  await until(() => bot.platform.views.length === 1, 'a form');
  expect(bot.platform.views[0]?.view.callback_id).toContain('standard show');
  const offered = await bot.messageTo(() => bot.people.mention('/knurl standard show'));
  expect(buttonsOf(offered.body).map(({ text }) => text?.text)).toEqual([en.slack.openForm]);
});

test('the files of an export go to the owner alone, and what cannot be sent is said', async () => {
  const bot = await openShops();
  await tells(bot);
  await bot.shop('export', 'U0OPERATOR');
  await bot.people.slash('export', { id: 'U0OWNER' }, { command: '/shop' });
  await until(() => bot.platform.pictures.some(({ name }) => name.endsWith('.json')), 'a file');
  await until(() => bot.platform.pictures.length > 3, 'the tables');
  for (const { channel, bytes } of bot.platform.pictures) {
    expect(channel).toBe('DU0OWNERT0SHOP');
    expect(bytes).toBeGreaterThan(0);
  }
  bot.platform.meet('files.getUploadURLExternal', { error: 'missing_scope' });
  const left = (): boolean => readable(bot.platform.posted).includes('Not sent: ');
  await bot.people.slash('export', { id: 'U0OWNER' }, { command: '/shop' });
  await until(left, 'what was not sent');
  const said = bot.platform.posted.filter(({ body }) => readable(body).includes('Not sent: '));
  expect(said.map(({ only }) => only)).toEqual(['U0OWNER']);
});

test('what cannot be told apart is asked with the readings as buttons, and a press answers', async () => {
  const bot = await openShops();
  const asked = await bot.messageTo(() => bot.people.slash('19 1018 straight 21tpi'));
  expect(asked.only).toBe('U0OPERATOR');
  const labels = buttonsOf(asked.body).map(({ text }) => text?.text ?? '');
  const at = labels.findIndex((label) => label.includes('19 mm'));
  expect(at).toBeGreaterThanOrEqual(0);
  const card = await bot.messageTo(() => bot.people.press(asked, at));
  expect(readable(card.body)).toContain('Turn to 0.7');
});

test('names in the quotes, dashes and spaces of a phone are read as meant', async () => {
  const bot = await openShops();
  const added = await bot.shop('wheels add “Back drawer” straight 21 tpi', 'U0OWNER');
  expect(added).toContain('Back drawer');
  const card = await bot.knurl('1–1/4 1018 straight 21tpi wheel ‘back drawer’', 'U0OWNER');
  expect(card).toContain('Turn to 1.2');
  // The wheel is the one that was meant, not one taken for want of a better.
  expect(card).not.toContain('taken; yours?');
});
