/** The app as Slack takes it comes from the records alone. */
import { expect, test } from 'vitest';
import { FLEET } from '../../../commands/index.ts';
import { FROM_MESSAGE, manifestFor, OPEN_SETUP } from '../../../src/adapters/slack/manifest.ts';
import { en } from '../../../src/phrases/index.ts';
import { openBot, until } from './bot.ts';

const manifest = manifestFor(en, FLEET);

test('every root of the records is a slash command, and nothing else is', () => {
  const roots = [...new Set(FLEET.map(({ path }) => `/${path[0]}`))];
  expect(manifest.features.slash_commands.map(({ command }) => command)).toEqual(roots);
});

test('the words it shows fit and the examples are ones that run', () => {
  // Limits: docs.slack.dev, reference/app-manifest.
  expect(manifest.display_information.name.length).toBeLessThanOrEqual(35);
  expect(manifest.display_information.description.length).toBeLessThanOrEqual(140);
  expect(manifest.features.bot_user.display_name.length).toBeLessThanOrEqual(80);
  expect(manifest.features.shortcuts.length).toBeLessThanOrEqual(10);
  for (const { name, description, callback_id } of manifest.features.shortcuts) {
    expect(name.length).toBeLessThanOrEqual(24);
    expect(description.length).toBeLessThanOrEqual(150);
    expect([FROM_MESSAGE, OPEN_SETUP]).toContain(callback_id);
  }
  for (const { command, description, usage_hint } of manifest.features.slash_commands) {
    expect(command.length).toBeLessThanOrEqual(32);
    expect(description.length).toBeLessThanOrEqual(2000);
    expect(usage_hint.length).toBeLessThanOrEqual(1000);
  }
});

test('an address is there where Slack calls the bot, and nowhere else', () => {
  const url = 'https://bot.example/slack/events';
  expect(JSON.stringify(manifest)).not.toContain('http');
  expect(manifest.settings.socket_mode_enabled).toBe(true);
  const http = manifestFor(en, FLEET, url);
  expect(http.settings.socket_mode_enabled).toBe(false);
  expect(http.settings.event_subscriptions).toMatchObject({ request_url: url });
  expect(http.settings.interactivity).toMatchObject({ request_url: url });
  expect(http.features.slash_commands.every((each) => each.url === url)).toBe(true);
});

/** What each method needs (docs.slack.dev, reference/methods, each method's page; reported). */
const NEEDED: Readonly<Record<string, readonly string[]>> = {
  'auth.test': [],
  'apps.connections.open': [],
  'views.open': [],
  'views.publish': [],
  'chat.postMessage': ['chat:write', 'chat:write.public'],
  'chat.postEphemeral': ['chat:write'],
  'chat.update': ['chat:write'],
  'conversations.open': ['im:write'],
  'conversations.history': ['channels:history', 'groups:history', 'im:history', 'mpim:history'],
  'conversations.replies': ['channels:history', 'groups:history', 'im:history', 'mpim:history'],
  'files.getUploadURLExternal': ['files:write'],
  'files.completeUploadExternal': ['files:write'],
  'pins.add': ['pins:write'],
  'pins.remove': ['pins:write'],
  'usergroups.list': ['usergroups:read'],
  'users.info': ['users:read'],
};

test('no scope is asked for that no call or event needs, and none is missing', async () => {
  const bot = await openBot();
  await bot.people.slash('1.000 1018 straight 21tpi');
  await until(() => bot.platform.posted.length > 0, 'an answer');
  const called = new Set(bot.platform.calls.map(({ method }) => method));
  await bot.stop();
  for (const method of called) expect(Object.keys(NEEDED)).toContain(method);
  const wanted = new Set([...Object.values(NEEDED).flat(), 'commands', 'app_mentions:read']);
  expect([...manifest.oauth_config.scopes.bot].sort()).toEqual([...wanted].sort());
});
