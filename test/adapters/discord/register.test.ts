/** What is registered: a difference first, and only that is changed. */
import { afterAll, expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { register } from '../../../src/adapters/discord/index.ts';
import type { Command } from '../../../src/desk/index.ts';
import { en } from '../../../src/phrases/index.ts';
import { openPlatform } from '../../platforms/discord/platform.ts';
import { bodyCheck } from '../../platforms/discord/schemas.ts';
import { APPLICATION, SHOP, TOKEN } from '../../platforms/discord/world.ts';

const platform = await openPlatform(bodyCheck());
afterAll(async () => {
  expect(platform.faults).toEqual([]);
  await platform.stop();
});

type Wanted = {
  readonly guild?: string | null;
  readonly dryRun?: boolean;
  readonly token?: string;
};
const registered = async (
  fleet: readonly Command[],
  { guild = null, dryRun = false, token = TOKEN }: Wanted = {},
) => {
  const lines: string[] = [];
  const before = platform.calls.length;
  const result = await register({
    token,
    application: APPLICATION,
    guild,
    api: platform.api,
    dryRun,
    book: en,
    fleet,
    print: (line) => void lines.push(line),
  });
  return { result, lines, routes: platform.calls.slice(before).map(({ route }) => route) };
};

test('shown only, nothing is changed', async () => {
  const { lines, routes } = await registered(FLEET, { dryRun: true });
  expect(lines).toContain('+ knurl');
  expect(lines.at(-1)).toBe(en.chat.registration.dry);
  expect(routes).toEqual(['commands']);
  expect(platform.routes.registered()).toEqual([]);
});

test('registered once, a second time finds nothing to do', async () => {
  await registered(FLEET);
  expect(platform.routes.registered()).toHaveLength(3);
  const { lines, routes } = await registered(FLEET);
  expect(lines).toEqual([
    '= knurl',
    '= shop',
    `= ${en.chat.fromMessage}`,
    en.chat.registration.done(0),
  ]);
  expect(routes).toEqual(['commands']);
});

test('of a fleet that has changed only what differs is sent, and it is said what that is', async () => {
  const less = FLEET.filter(({ path }) => path.join(' ') !== 'knurl convert').map((command) =>
    command.path.join(' ') === 'knurl card'
      ? { ...command, parameters: [], foremost: [] }
      : command,
  );
  const { lines, routes } = await registered(less);
  expect(lines).toContain('~ knurl');
  expect(lines).toContain('    - knurl convert');
  expect(lines).toContain('    - knurl card code');
  expect(lines).toContain('= shop');
  expect(routes).toEqual(['commands', 'register']);
  const { lines: none } = await registered(less.filter(({ path }) => path[0] !== 'shop'));
  expect(none).toContain('- shop');
  await registered(FLEET);
});

test('one server has a list of its own', async () => {
  const all = platform.routes.registered();
  const { lines } = await registered(FLEET, { guild: SHOP });
  expect(lines).toContain('+ knurl');
  expect(platform.routes.registered(SHOP)).toHaveLength(3);
  expect(platform.routes.registered()).toEqual(all);
});

test('what is wrong is named by its variable, and no token is told', async () => {
  const { result } = await registered(FLEET, { token: 'stolen.token-of-nobody.0000' });
  expect(result).toMatchObject({ wrong: 'DISCORD_TOKEN' });
  expect(JSON.stringify(result)).not.toContain('stolen');
  platform.meet('commands', { status: 404, code: 10_002 });
  expect((await registered(FLEET)).result).toMatchObject({ wrong: 'DISCORD_APPLICATION_ID' });
  platform.meet('commands', { status: 403, code: 50_001 });
  expect((await registered(FLEET, { guild: SHOP })).result).toMatchObject({
    wrong: 'DISCORD_TEST_GUILD',
  });
});
