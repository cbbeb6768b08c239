/** Who is who in a server, what is offered while somebody types, and files that come and go. */
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { setTimeout as pause } from 'node:timers/promises';
import { afterAll, expect, test } from 'vitest';
import { en } from '../../../src/phrases/index.ts';
import { ENGINEER, OPERATOR, OWNER, STRANGER, SUPERVISORS } from '../../platforms/discord/world.ts';
import { until } from '../../support/until.ts';
import { openBot } from './bot.ts';
import { readIn } from './seen.ts';

const bot = await openBot();
const { people, next, platform } = bot;
for (const someone of [OPERATOR, OWNER, ENGINEER]) platform.meetPerson(someone);

const SHEET = 'name,form,pitch,teeth,diameter\nKL-7,straight,21 tpi,63,19.05 mm\n';
const files = http.createServer((_, response) => response.end(SHEET));
await new Promise<void>((done) => files.listen(0, '127.0.0.1', done));
const address = `http://127.0.0.1:${String((files.address() as AddressInfo).port)}/wheels.csv`;

afterAll(async () => {
  expect(platform.faults).toEqual([]);
  await bot.stop();
  files.close();
});

const asks = async (path: string, values = {}, someone = OPERATOR): Promise<string> => {
  const { message } = await next(() => people.slash(path.split(' '), values, someone));
  return readIn(message);
};
const offered = async (path: string, focused: string, typed: string, someone = OPERATOR) =>
  (await people.suggest(path.split(' '), { [focused]: typed }, focused, someone)).map(
    ({ value }) => value,
  );

test('who manages the server owns its shop, and gives a role of the server a role in the shop', async () => {
  expect(await asks('shop people group', { name: 'Engineers', role: 'engineer' })).toMatch(
    /owner/u,
  );
  const said = await asks('shop people group', { name: 'engineers', role: 'supervisor' }, OWNER);
  expect(said).toContain('Engineers');
  // Only a supervisor may: the role of the server has made one of the engineer.
  const wheel = { name: 'KL-1', words: 'straight 21 tpi 63 teeth diameter 19.05 mm' };
  expect(await asks('shop wheels add', wheel)).toMatch(/supervisor/u);
  expect(await asks('shop wheels add', wheel, ENGINEER)).toContain('KL-1');
});

test('a role by its mention is the role of that name; one the server has not is not taken', async () => {
  const name = `<@&${SUPERVISORS}>`;
  expect(await asks('shop people group', { name, role: 'supervisor' }, OWNER)).toContain(
    'Supervisors',
  );
  expect(
    await asks('shop people group', { name: 'Supervisers', role: 'engineer' }, OWNER),
  ).toContain('Supervisors');
  expect(await asks('shop people group', { name: '@Supervisors', none: true }, OWNER)).toContain(
    'Supervisors',
  );
});

test('a person by their mention goes by their name, and rings nobody', async () => {
  const { message } = await next(() =>
    people.mention(`/shop people add <@${ENGINEER.id}> engineer`, OWNER),
  );
  expect(message.rings).toEqual([]);
  // They have spoken before: it is said whom, not which number.
  expect(readIn(message)).toContain(ENGINEER.name);
  expect(readIn(message)).not.toContain(ENGINEER.id);
  const shown = await asks('shop people show', { name: `<@${ENGINEER.id}>` });
  expect(shown).toContain(ENGINEER.name);
});

test('three letters bring the right one first', async () => {
  expect((await offered('knurl setup', 'material', '101'))[0]).toBe('1018');
  expect((await offered('knurl setup', 'material', 'bra'))[0]).toMatch(/^brass/u);
  expect((await offered('knurl setup', 'wheel', 'kl-'))[0]).toBe('KL-1');
  expect((await offered('shop wheels show', 'name', 'kl'))[0]).toBe('KL-1');
  expect(await offered('shop wheels show', 'name', '')).toEqual(['KL-1']);
  await asks('shop machines add', { name: 'Long bed', words: 'speeds 60 90 140 rpm' }, ENGINEER);
  expect((await offered('knurl setup', 'machine', 'lon'))[0]).toBe('Long bed');
  expect((await offered('shop people show', 'name', 'kim'))[0]).toBe('Kim');
});

test('cards are offered by their codes and by what was asked', async () => {
  const said = await asks('knurl setup', { words: '0.750 303 diamond 25tpi' });
  const all = await people.suggest(['knurl', 'card'], { code: '' }, 'code');
  expect(all.length).toBeGreaterThan(0);
  const [newest] = all;
  expect(newest?.name).toContain('0.750');
  const code = newest?.value ?? '';
  expect(said).toContain(code);
  expect((await offered('knurl card', 'code', code.slice(0, 3).toLowerCase()))[0]).toBe(code);
  expect((await offered('knurl card', 'code', 'diamond'))[0]).toBe(code);
  expect(await asks('knurl card', { code })).toContain('0.750');
});

test('nothing of one shop is offered in another', async () => {
  await asks('knurl setup', { words: '1.000 1018 straight 21tpi' }, STRANGER);
  expect(await offered('knurl setup', 'wheel', 'kl-', STRANGER)).toEqual([]);
  const cards = await people.suggest(['knurl', 'card'], { code: '' }, 'code', STRANGER);
  expect(cards.map(({ name }) => name).join(' ')).not.toContain('0.750');
});

const handedOver = (): readonly string[] =>
  platform.posted
    .flatMap((each) => each.files.map(({ name }) => name))
    .filter((name) => /csv|json/u.test(name));

/** Files are made while they are handed over: they are all there when no more come. */
const allHandedOver = async (): Promise<void> => {
  for (let count = -1; count !== handedOver().length; ) {
    count = handedOver().length;
    await pause(400);
  }
};

const imported = (size = SHEET.length) => {
  const id = '1600000000000000001';
  const file = { id, filename: 'wheels.csv', size, url: address, proxy_url: address };
  const path = ['shop', 'wheels', 'import'];
  return next(() => people.slash(path, { file: id }, ENGINEER, { files: { [id]: file } }));
};

test('a list comes as a file with the command', async () => {
  const { message } = await imported();
  expect(readIn(message)).toContain('1');
  expect((await offered('knurl setup', 'wheel', 'kl-7'))[0]).toBe('KL-7');
});

test('a file too large to be a list is not read', async () => {
  const { message } = await imported(9 * 1024 * 1024);
  expect(readIn(message)).toContain(en.discord.fileTooLarge('wheels.csv', 4));
  expect(message.only).toBe(ENGINEER.id);
});

test('what a shop has kept goes as files to its owner alone', async () => {
  const before = platform.posted.length;
  await people.slash(['shop', 'export'], {}, OWNER);
  await until(() => platform.posted.some(({ files: all }) => all.length > 0), 'the files');
  await until(() => handedOver().includes('wheel.csv'), 'the list of wheels');
  await allHandedOver();
  const sent = platform.posted.slice(before).filter((each) => each.files.length > 0);
  for (const { only } of sent) expect(only).toBe(OWNER.id);
  // In a channel, without a slash command, there is nothing to see but the card.
  await next(() => people.mention('/shop export', OWNER));
  const direct = () =>
    platform.posted.filter(({ guild, files: all }) => guild === null && all.length > 0);
  await until(() => direct().length === sent.length, 'the files, by direct message');
  await allHandedOver();
  expect(direct()).toHaveLength(sent.length);
});

test('nobody but the owner gets a file', async () => {
  const before = handedOver().length;
  await asks('shop export', {}, ENGINEER);
  await allHandedOver();
  expect(handedOver()).toHaveLength(before);
});
