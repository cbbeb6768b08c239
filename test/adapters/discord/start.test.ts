/** The programs as an operator starts them, and what they say of what is wrong. */
import { spawn } from 'node:child_process';
import path from 'node:path';
import { beforeAll, expect, onTestFinished, test } from 'vitest';
import { sentencesFor } from '../../../src/chats.ts';
import { configOf } from '../../../src/config.ts';
import { en } from '../../../src/phrases/index.ts';
import { openPlatform, type Platform } from '../../platforms/discord/platform.ts';
import { APPLICATION, SHOP, TOKEN } from '../../platforms/discord/world.ts';
import { newFolder } from '../../support/places.ts';
import { builtFolder } from '../../support/program.ts';
import { until } from '../../support/until.ts';

const built = { folder: '' };
beforeAll(async () => {
  const sources = ['main', 'discordRegister'].map(
    (name) => new URL(`../../../src/${name}.ts`, import.meta.url),
  );
  const { folder, remove } = await builtFolder(sources);
  built.folder = folder;
  return remove;
}, 60_000);

/** A platform for one test. */
const newPlatform = async (): Promise<Platform> => {
  const platform = await openPlatform();
  onTestFinished(() => platform.stop());
  return platform;
};

const started = (
  { api }: Platform,
  program: string,
  args: readonly string[] = [],
  settings: Record<string, string> = {},
) => {
  const env = {
    ...process.env,
    DATABASE_URL: '',
    WHOLETOOTH_DATA: newFolder(),
    DISCORD_APPLICATION_ID: APPLICATION,
    DISCORD_TOKEN: TOKEN,
    DISCORD_API_URL: api,
    ...settings,
  };
  const file = path.join(built.folder, `${program}.js`);
  const child = spawn(process.execPath, [file, ...args], { cwd: newFolder(), env });
  const said = { out: '', err: '' };
  child.stdout.on('data', (chunk: Buffer) => (said.out += chunk.toString()));
  child.stderr.on('data', (chunk: Buffer) => (said.err += chunk.toString()));
  const ended = new Promise<number | null>((done) => child.on('close', done));
  return { child, said, ended };
};

test('a wrong token is one sentence and an exit code, and stands nowhere', async () => {
  const platform = await newPlatform();
  const wrong = 'somebody-elses.token-that-is-none.0000000000';
  const { said, ended } = started(platform, 'main', [], { DISCORD_TOKEN: wrong });
  expect(await ended).toBe(1);
  expect(said.err.trim()).toBe(en.chat.tokenWrong('DISCORD_TOKEN'));
  expect(said.out + said.err).not.toContain('somebody');
});

test('with the right one it says where it is, until it is told to stop', async () => {
  const platform = await newPlatform();
  const { child, said, ended } = started(platform, 'main');
  await until(() => said.out.includes('\n'), 'a word of the bot', 20_000);
  expect(said.out.trim()).toBe(en.chat.connected('Discord', 2));
  child.kill('SIGTERM');
  expect(await ended).toBe(0);
  expect(said.err).not.toContain('fault');
});

test('a session that is refused for good ends the program with a sentence', async () => {
  const platform = await newPlatform();
  const { said, ended } = started(platform, 'main');
  await until(() => said.out.includes('\n'), 'a word of the bot', 20_000);
  platform.gateway.end(4004);
  expect(await ended).toBe(1);
  expect(said.err).toContain(en.chat.tokenWrong('DISCORD_TOKEN'));
});

test('registering shows what differs, changes only that, and only on demand', async () => {
  const platform = await newPlatform();
  const dry = started(platform, 'discordRegister', ['--dry-run']);
  expect(await dry.ended).toBe(0);
  expect(dry.said.out).toContain(en.chat.registration.dry);
  expect(platform.routes.registered()).toEqual([]);
  const first = started(platform, 'discordRegister');
  expect(await first.ended).toBe(0);
  const names = platform.routes.registered().map(({ name }) => name);
  expect(names).toEqual(['knurl', 'shop', 'Set up from this message']);
  const before = platform.calls.length;
  const again = started(platform, 'discordRegister');
  expect(await again.ended).toBe(0);
  expect(platform.calls.slice(before).map(({ route }) => route)).toEqual(['commands']);
  expect(platform.faults).toEqual([]);
}, 30_000);

test('for a test server it touches that server alone', async () => {
  const platform = await newPlatform();
  const { ended } = started(platform, 'discordRegister', [], { DISCORD_TEST_GUILD: SHOP });
  expect(await ended).toBe(0);
  expect(platform.routes.registered()).toEqual([]);
  expect(platform.routes.registered(SHOP)).toHaveLength(3);
});

test('registering with a wrong token is one sentence and an exit code', async () => {
  const platform = await newPlatform();
  const wrong = 'somebody-elses.token-that-is-none.0000000000';
  const { said, ended } = started(platform, 'discordRegister', [], { DISCORD_TOKEN: wrong });
  expect(await ended).toBe(1);
  expect(said.err).toContain('DISCORD_TOKEN');
  expect(said.err.trim().split('\n')).toHaveLength(1);
  expect(said.out + said.err).not.toContain('somebody');
});

test.each([
  [{ DISCORD_TOKEN: TOKEN }, 'DISCORD_APPLICATION_ID is missing'],
  [{ DISCORD_APPLICATION_ID: APPLICATION }, 'DISCORD_TOKEN is missing'],
  [{ DISCORD_TOKEN: 'short', DISCORD_APPLICATION_ID: APPLICATION }, 'DISCORD_TOKEN is not'],
  [{ DISCORD_TOKEN: TOKEN, DISCORD_APPLICATION_ID: 'mine' }, 'DISCORD_APPLICATION_ID is not'],
  [
    { DISCORD_TOKEN: TOKEN, DISCORD_APPLICATION_ID: APPLICATION, DISCORD_TEST_GUILD: 'shop' },
    'DISCORD_TEST_GUILD is not',
  ],
  [
    { DISCORD_TOKEN: TOKEN, DISCORD_APPLICATION_ID: APPLICATION, DISCORD_API_URL: 'ftp://x' },
    'DISCORD_API_URL is not',
  ],
] as const)('a sentence for each thing that is wrong: %j', (environment, sentence) => {
  const found = configOf(environment);
  const sentences = 'faults' in found ? sentencesFor(en, found.faults) : [];
  expect(sentences).toHaveLength(1);
  expect(sentences[0]).toContain(sentence);
  for (const value of Object.values(environment)) expect(sentences[0]).not.toContain(`${value} `);
});
