/** What the platform says of its servers, people and messages. */
import type { Bodies } from './bodies.ts';
import { allOf, type Body, type Component } from './rules.ts';
import {
  APPLICATION,
  BOT_NAME,
  BOT_PERMISSIONS,
  type Channel,
  type Guild,
  PERMISSION,
  type Role,
  type Someone,
} from './world.ts';

/** Numbers of the platform's lists are plain numbers here; the schemas tell whether they are right. */
const asBody = <K extends keyof Bodies>(_kind: K, body: unknown): Bodies[K] => body as Bodies[K];

const JOINED = '2026-01-05T07:00:00.000000+00:00';
/** Kinds of channels. */
const TEXT_CHANNEL = 0;
const THREAD_CHANNEL = 11;
/** Kinds of messages. */
const SAID = 0;
const ANSWERED = 19;
const BY_COMMAND = 20;

export const userOf = ({ id, name }: Pick<Someone, 'id' | 'name'>) => ({
  id,
  username: name.toLowerCase(),
  discriminator: '0',
  global_name: name,
  avatar: null,
});
export const botUser = { ...userOf({ id: APPLICATION, name: BOT_NAME }), bot: true };

const roleOf = ({ id, name, permissions }: Role, position: number) => ({
  id,
  name,
  color: 0,
  colors: { primary_color: 0, secondary_color: null, tertiary_color: null },
  hoist: false,
  icon: null,
  unicode_emoji: null,
  position,
  permissions: String(permissions),
  managed: false,
  mentionable: false,
  flags: 0,
});

const memberCommon = (roles: readonly string[]) => ({
  roles: [...roles],
  joined_at: JOINED,
  deaf: false,
  mute: false,
  flags: 0,
});

const channelOf = ({ id, name, guild }: Channel, position: number) => ({
  id,
  type: TEXT_CHANNEL,
  guild_id: guild,
  name,
  position,
  permission_overwrites: [],
  nsfw: false,
  parent_id: null,
  topic: null,
  last_message_id: null,
  rate_limit_per_user: 0,
});

export const threadOf = ({ id, name, guild, parent }: Channel): Bodies['thread'] =>
  asBody('thread', {
    id,
    type: THREAD_CHANNEL,
    guild_id: guild,
    parent_id: parent,
    name,
    owner_id: APPLICATION,
    last_message_id: null,
    rate_limit_per_user: 0,
    message_count: 0,
    member_count: 1,
    total_message_sent: 0,
    thread_metadata: {
      archived: false,
      auto_archive_duration: 1440,
      archive_timestamp: JOINED,
      locked: false,
    },
  });

const DIRECT_CHANNEL = 1;
export const directOf = ({ id }: Channel): Bodies['direct'] =>
  asBody('direct', { id, type: DIRECT_CHANNEL, name: null });

export const guildOf = (
  { id, name, owner, roles }: Guild,
  channels: readonly Channel[],
): Bodies['guildCreate'] => {
  const own = channels.filter(({ guild }) => guild === id);
  return asBody('guildCreate', {
    id,
    name,
    owner_id: owner,
    roles: roles.map(roleOf),
    channels: own.filter(({ parent }) => parent === null).map(channelOf),
    threads: own.filter(({ parent }) => parent !== null).map(threadOf),
    members: [{ user: botUser, ...memberCommon([]) }],
    member_count: 4,
    joined_at: JOINED,
    large: false,
    unavailable: false,
    presences: [],
    voice_states: [],
    stage_instances: [],
    guild_scheduled_events: [],
    soundboard_sounds: [],
    emojis: [],
    stickers: [],
    features: [],
    icon: null,
    splash: null,
    discovery_splash: null,
    banner: null,
    description: null,
    afk_channel_id: null,
    afk_timeout: 300,
    application_id: null,
    default_message_notifications: 0,
    explicit_content_filter: 0,
    hub_type: null,
    incidents_data: null,
    mfa_level: 0,
    nsfw_level: 0,
    preferred_locale: 'en-US',
    premium_progress_bar_enabled: false,
    premium_tier: 0,
    public_updates_channel_id: null,
    rules_channel_id: null,
    safety_alerts_channel_id: null,
    system_channel_flags: 0,
    system_channel_id: null,
    vanity_url_code: null,
    verification_level: 0,
  });
};

export const readyOf = (
  guilds: readonly Guild[],
  session: string,
  gateway: string,
): Bodies['ready'] =>
  asBody('ready', {
    v: 10,
    user: botUser,
    guilds: guilds.map(({ id }) => ({ id, unavailable: true })),
    session_id: session,
    resume_gateway_url: gateway,
    shard: [0, 1],
    application: { id: APPLICATION, flags: 0, flags_new: '0' },
  });

const permissionsOf = ({ manages }: Someone): string =>
  String(
    PERMISSION.viewChannel | PERMISSION.sendMessages | (manages ? PERMISSION.manageGuild : 0n),
  );

/** What comes with everything that a person does, whatever it is. */
export const interactionCommon = (
  { id, token }: { readonly id: string; readonly token: string },
  someone: Someone,
  channel: Channel,
) => {
  // Between two people there is no server, and no member of one.
  const isDirect = channel.guild === '';
  const where = isDirect
    ? { user: userOf(someone), context: 1, authorizing_integration_owners: { '0': '0' } }
    : {
        guild_id: someone.guild,
        member: {
          user: userOf(someone),
          nick: null,
          permissions: permissionsOf(someone),
          ...memberCommon(someone.roles),
        },
        guild_locale: 'en-US',
        context: 0,
        authorizing_integration_owners: { '0': someone.guild },
      };
  const type = channel.parent === null ? TEXT_CHANNEL : THREAD_CHANNEL;
  return {
    id,
    application_id: APPLICATION,
    token,
    version: 1,
    channel_id: someone.channel,
    channel: { id: someone.channel, type: isDirect ? DIRECT_CHANNEL : type },
    app_permissions: String(BOT_PERMISSIONS),
    locale: 'en-US',
    entitlements: [],
    attachment_size_limit: 10_485_760,
    ...where,
  } as const;
};

/** A message that a person wrote. Without naming the bot its words do not come along. */
export const writtenBy = (
  id: string,
  someone: Someone,
  text: string,
  namesBot: boolean,
): Bodies['mention'] =>
  asBody('mention', {
    id,
    type: SAID,
    channel_id: someone.channel,
    guild_id: someone.guild,
    author: userOf(someone),
    member: memberCommon(someone.roles),
    content: text,
    timestamp: new Date().toISOString(),
    edited_timestamp: null,
    tts: false,
    mention_everyone: false,
    mentions: namesBot ? [{ ...botUser, member: memberCommon([]) }] : [],
    mention_roles: [],
    attachments: [],
    embeds: [],
    components: [],
    pinned: false,
  });

/** Components as they come back: each with a number of its own. */
const numbered = (components: readonly Component[]): readonly Component[] => {
  let count = 0;
  const one = (component: Component): Component => ({
    ...component,
    id: component.id ?? (count += 1),
    ...(component.components === undefined ? {} : { components: component.components.map(one) }),
  });
  return components.map(one);
};

export type Kept = {
  readonly id: string;
  readonly by: 'reply' | 'followUp' | 'post';
  readonly channel: string;
  readonly body: Body;
  readonly replyTo: string | null;
};

/** A message of the bot's, as the platform gives it back. */
export const messageOf = ({ id, by, channel, body, replyTo }: Kept): Bodies['posted'] =>
  asBody('posted', {
    id,
    type: by === 'post' ? (replyTo === null ? SAID : ANSWERED) : BY_COMMAND,
    channel_id: channel,
    author: botUser,
    content: body['content'] ?? '',
    timestamp: new Date().toISOString(),
    edited_timestamp: null,
    tts: false,
    mention_everyone: false,
    mentions: [],
    mention_roles: [],
    attachments: [],
    embeds: [],
    pinned: false,
    flags: Number(body['flags'] ?? 0),
    components: numbered((body['components'] ?? []) as readonly Component[]),
    ...(by === 'post' ? {} : { application_id: APPLICATION, webhook_id: APPLICATION }),
    ...(typeof body['nonce'] === 'string' ? { nonce: body['nonce'] } : {}),
  });

/** Every text of a message. */
export const textsIn = (body: Body): readonly string[] => [
  ...(typeof body['content'] === 'string' ? [body['content']] : []),
  ...allOf((body['components'] ?? []) as readonly Component[]).flatMap(({ content }) =>
    content === undefined ? [] : [content],
  ),
];
