/** The servers, channels, roles and people of the counterpart: invented, like everything in them. */

export const TOKEN = 'counterpart.token-of-the-bot.0000000000';
/** Of the application, and so of its own user. */
export const APPLICATION = '1000000000000000001';
export const BOT_NAME = 'Wholetooth';

export type Role = { readonly id: string; readonly name: string; readonly permissions: bigint };
export type Channel = {
  readonly id: string;
  readonly name: string;
  readonly guild: string;
  /** The channel a thread hangs in. */
  readonly parent: string | null;
  /** The bot may write there by itself. */
  readonly open: boolean;
};
export type Guild = {
  readonly id: string;
  readonly name: string;
  readonly owner: string;
  readonly roles: readonly Role[];
};

/** Bits of topics/permissions. */
export const PERMISSION = {
  manageGuild: 1n << 5n,
  viewChannel: 1n << 10n,
  sendMessages: 1n << 11n,
  embedLinks: 1n << 14n,
  attachFiles: 1n << 15n,
  readHistory: 1n << 16n,
  createThreads: 1n << 35n,
  sendInThreads: 1n << 38n,
  pinMessages: 1n << 51n,
} as const;

const everybody = PERMISSION.viewChannel | PERMISSION.sendMessages | PERMISSION.readHistory;
/** What the bot was let in with. */
export const BOT_PERMISSIONS = Object.values(PERMISSION).reduce((all, one) => all | one, 0n);

export const SHOP = '1100000000000000001';
export const OTHER = '1100000000000000002';
export const ENGINEERS = '1200000000000000011';
export const SUPERVISORS = '1200000000000000012';

export const everybodyIn = (guild: string, more: readonly Role[] = []): readonly Role[] => [
  // The role of everybody has the server's id.
  { id: guild, name: '@everyone', permissions: everybody },
  ...more,
];

export const GUILDS: readonly Guild[] = [
  {
    id: SHOP,
    name: 'Brass Lane Works',
    owner: '1300000000000000001',
    roles: everybodyIn(SHOP, [
      { id: ENGINEERS, name: 'Engineers', permissions: everybody },
      { id: SUPERVISORS, name: 'Supervisors', permissions: everybody },
    ]),
  },
  {
    id: OTHER,
    name: 'Quayside Turning',
    owner: '1300000000000000021',
    roles: everybodyIn(OTHER),
  },
];

export const FLOOR = '1400000000000000001';
export const CLOSED = '1400000000000000002';
export const STANDARDS = '1400000000000000003';
export const THREAD = '1400000000000000004';
export const OTHER_FLOOR = '1400000000000000021';

const inShop = { guild: SHOP, parent: null, open: true };
export const CHANNELS: readonly Channel[] = [
  { ...inShop, id: FLOOR, name: 'floor' },
  { ...inShop, id: CLOSED, name: 'closed', open: false },
  { ...inShop, id: STANDARDS, name: 'standards' },
  { ...inShop, id: THREAD, name: 'which-wheel', parent: FLOOR },
  { id: OTHER_FLOOR, name: 'floor', guild: OTHER, parent: null, open: true },
];

export type Someone = {
  readonly id: string;
  readonly name: string;
  readonly guild: string;
  readonly channel: string;
  readonly roles: readonly string[];
  /** May manage the server. */
  readonly manages: boolean;
};

export const OPERATOR: Someone = {
  id: '1300000000000000002',
  name: 'Robin',
  guild: SHOP,
  channel: FLOOR,
  roles: [],
  manages: false,
};
export const OWNER: Someone = {
  ...OPERATOR,
  id: '1300000000000000001',
  name: 'Ada',
  manages: true,
};
export const ENGINEER: Someone = {
  ...OPERATOR,
  id: '1300000000000000003',
  name: 'Kim',
  roles: [ENGINEERS],
};
export const STRANGER: Someone = {
  ...OPERATOR,
  id: '1300000000000000022',
  name: 'Quill',
  guild: OTHER,
  channel: OTHER_FLOOR,
};

const DISCORD_EPOCH_MS = 1_420_070_400_000;

/** An id as the platform makes them: the time, and a number of its own. */
export const snowflake = (count: number): string =>
  ((BigInt(Date.now() - DISCORD_EPOCH_MS) << 22n) | BigInt(count % 4_194_304)).toString();
