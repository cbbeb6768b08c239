/** Who may what, by what Slack knows of people: administrators, user groups, those who are mentioned. */
import { expect, test } from 'vitest';
import { until } from '../../support/until.ts';
import { openShops as opened } from './shops.ts';

const RULE = 'rules add Lamp on at the back lathe';
const LINE = '1.000 1018 straight 21tpi';

test('a user group named in a line gives its members their role, and nobody else', async () => {
  const bot = await opened();
  expect(await bot.shop(RULE, 'U0ENGINEER')).toContain('needs the role supervisor');
  const named = await bot.shop('people group <!subteam^S0ENG|@engineers> supervisor', 'U0OWNER');
  expect(named).toContain('Night Engineers');
  expect(await bot.shop(RULE, 'U0ENGINEER')).toContain('Lamp on at the back lathe');
  expect(await bot.shop('rules add Another', 'U0OPERATOR')).toContain('Night Engineers');
  expect(await bot.shop('people group "night engineers" none', 'U0OWNER')).toContain('Night');
  expect(await bot.shop('rules add A third', 'U0ENGINEER')).toContain('needs the role supervisor');
});

test('a group that the workspace has not is refused with those it has', async () => {
  const bot = await opened();
  const refused = await bot.shop('people group Leads supervisor', 'U0OWNER');
  expect(refused).toContain('Leads');
  expect(await bot.shop('people list', 'U0OWNER')).not.toContain('Leads');
});

test('a person mentioned in a line is meant by their id, by slash command and by mention', async () => {
  const bot = await opened();
  await bot.shop('people add <@U0NEWHAND|sam> supervisor', 'U0OWNER');
  expect(await bot.shop('people list', 'U0OWNER')).toContain('sam');
  expect(await bot.shop(RULE, 'U0NEWHAND')).toContain('Lamp on at the back lathe');
  const added = await bot.answerTo(() =>
    bot.people.mention('/shop people add <@U0SECOND> engineer', { id: 'U0OWNER' }),
  );
  expect(added).toContain('Name of U0SECOND');
});

test('a name without a mention is nobody who could ever come, and is not kept', async () => {
  const bot = await opened();
  const refused = await bot.shop('people add Newhand engineer', 'U0OWNER');
  expect(refused).toContain('I cannot tell who “Newhand” is here. Type @ and pick them');
  expect(await bot.shop('people list', 'U0OWNER')).not.toContain('Newhand');
});

test('an administrator is known as the owner where the workspace has no user groups', async () => {
  const bot = await opened();
  bot.platform.meet('usergroups.list', { error: 'missing_scope' }, { error: 'missing_scope' });
  const added = await bot.shop('people add <@U0NEWHAND|sam> engineer', 'U0OWNER');
  expect(added).toContain('sam');
  expect(added).toContain('engineer');
});

test('Slack is asked once for its groups, and a pause it asks for holds no answer back', async () => {
  const bot = await opened();
  bot.platform.meet('users.info', { status: 429, after: 20 });
  const since = Date.now();
  await bot.answerTo(() => bot.people.slash(LINE, { id: 'U0FIRST' }));
  expect(Date.now() - since).toBeLessThan(5_000);
  for (let one = 0; one < 20; one += 1) await bot.people.slash(LINE, { id: `U0P${String(one)}` });
  await until(() => bot.platform.posted.length === 21, 'twenty-one answers');
  const asked = bot.platform.calls.filter(({ method }) => method === 'usergroups.list');
  expect(asked).toHaveLength(1);
});
