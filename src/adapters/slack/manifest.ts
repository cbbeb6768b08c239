import type { Command } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { shortened } from '../common/fields.ts';
import { LIMITS } from './limits.ts';

/** Callbacks of the two shortcuts. */
export const FROM_MESSAGE = 'from-message';
export const OPEN_SETUP = 'open-setup';

/** What the bot may do; the README says why, one by one. */
const SCOPES = [
  'app_mentions:read',
  'channels:history',
  'chat:write',
  'chat:write.public',
  'commands',
  'files:write',
  'groups:history',
  'im:history',
  'im:write',
  'mpim:history',
  'pins:write',
  'usergroups:read',
  'users:read',
] as const;

const EVENTS = ['app_home_opened', 'app_mention'] as const;

const rootsOf = (fleet: readonly Command[]): readonly string[] => [
  ...new Set(fleet.map(({ path }) => path[0])),
];

const slashOf = (book: Book, fleet: readonly Command[], root: string, url: string | null) => {
  const example = fleet.find(({ path }) => path[0] === root)?.examples[0] ?? '';
  return {
    command: `/${root}`,
    description: shortened(book.verbs[root] ?? book.slack.slash(root), LIMITS.summary),
    usage_hint: example.replace(`/${root} `, ''),
    // So that a person or a user group in a line comes with its id.
    should_escape: true,
    ...(url === null ? {} : { url }),
  };
};

/**
 * The app as Slack takes it, from the records alone. An address is only needed where Slack calls
 * the bot; without one it is Socket Mode.
 */
export const manifestFor = (book: Book, fleet: readonly Command[], url: string | null = null) => ({
  display_information: {
    name: book.slack.appName,
    description: book.slack.appDescription,
  },
  features: {
    app_home: {
      home_tab_enabled: true,
      messages_tab_enabled: true,
      messages_tab_read_only_enabled: true,
    },
    bot_user: { display_name: book.slack.appName.toLowerCase(), always_online: true },
    shortcuts: [
      {
        name: shortened(book.chat.fromMessage, LIMITS.shortcutName),
        type: 'message',
        callback_id: FROM_MESSAGE,
        description: book.slack.fromMessageDescription,
      },
      {
        name: shortened(book.slack.setupShortcut, LIMITS.shortcutName),
        type: 'global',
        callback_id: OPEN_SETUP,
        description: book.slack.setupDescription,
      },
    ],
    slash_commands: rootsOf(fleet).map((root) => slashOf(book, fleet, root, url)),
  },
  oauth_config: { scopes: { bot: [...SCOPES] } },
  settings: {
    event_subscriptions: { bot_events: [...EVENTS], ...(url === null ? {} : { request_url: url }) },
    interactivity: {
      is_enabled: true,
      ...(url === null ? {} : { request_url: url, message_menu_options_url: url }),
    },
    org_deploy_enabled: false,
    socket_mode_enabled: url === null,
    token_rotation_enabled: false,
  },
});
