import { z } from 'zod';

/** What is wrong with one variable; the phrase book has the sentence. */
export type ConfigFault = { readonly variable: string; readonly fault: 'missing' | 'malformed' };

export type DiscordConfig = {
  readonly token: string;
  readonly application: string;
  readonly testGuild: string | null;
  readonly api: string | undefined;
};

export type SlackConfig = {
  /** One for each workspace. */
  readonly botTokens: readonly string[];
  readonly by:
    | { readonly appToken: string }
    | { readonly signingSecret: string; readonly port: number };
  readonly api: string | undefined;
};

/** Only what is asked for: a platform none of whose variables are set is not started. */
export type Config = {
  readonly discord: DiscordConfig | null;
  readonly slack: SlackConfig | null;
};

type Environment = Readonly<Record<string, string | undefined>>;

const snowflake = z.string().regex(/^\d{17,20}$/u);
const address = z.url({ protocol: /^https?$/u });

const discordShape = z.object({
  DISCORD_TOKEN: z.string().regex(/^\S{20,}$/u),
  DISCORD_APPLICATION_ID: snowflake,
  DISCORD_TEST_GUILD: snowflake.optional(),
  DISCORD_API_URL: address.optional(),
});

const slackCommon = {
  SLACK_BOT_TOKEN: z.string().regex(/^xoxb-[\w-]+(?:\s*,\s*xoxb-[\w-]+)*$/u),
  SLACK_API_URL: address.optional(),
};
const socketShape = z.object({
  ...slackCommon,
  SLACK_APP_TOKEN: z.string().regex(/^xapp-[\w-]+$/u),
});
const httpShape = z.object({
  ...slackCommon,
  SLACK_SIGNING_SECRET: z.string().regex(/^\S{16,}$/u),
  PORT: z.string().regex(/^\d+$/u).transform(Number).pipe(z.number().min(1).max(65_535)),
});

/** A variable that is set to nothing is not set. */
const filled = (environment: Environment): Environment =>
  Object.fromEntries(
    Object.entries(environment).filter(([, value]) => value !== undefined && value.trim() !== ''),
  );

const asksFor = (environment: Environment, names: readonly string[]): boolean =>
  names.some((name) => environment[name] !== undefined);

const faultsOf = (error: z.ZodError, environment: Environment): readonly ConfigFault[] =>
  error.issues.map(({ path }) => {
    const variable = String(path[0]);
    return { variable, fault: environment[variable] === undefined ? 'missing' : 'malformed' };
  });

type Read<T> = { readonly value: T | null; readonly faults: readonly ConfigFault[] };

const discordOf = (environment: Environment): Read<DiscordConfig> => {
  if (!asksFor(environment, ['DISCORD_TOKEN', 'DISCORD_APPLICATION_ID']))
    return { value: null, faults: [] };
  const read = discordShape.safeParse(environment);
  if (!read.success) return { value: null, faults: faultsOf(read.error, environment) };
  const { data } = read;
  return {
    value: {
      token: data.DISCORD_TOKEN,
      application: data.DISCORD_APPLICATION_ID,
      testGuild: data.DISCORD_TEST_GUILD ?? null,
      api: data.DISCORD_API_URL,
    },
    faults: [],
  };
};

const tokensIn = (text: string): readonly string[] => text.split(',').map((each) => each.trim());

const slackOf = (environment: Environment): Read<SlackConfig> => {
  const names = ['SLACK_BOT_TOKEN', 'SLACK_APP_TOKEN', 'SLACK_SIGNING_SECRET'];
  if (!asksFor(environment, names)) return { value: null, faults: [] };
  // A socket needs no address of its own: that is the way unless only the other is asked for.
  const isHttp =
    environment['SLACK_APP_TOKEN'] === undefined &&
    environment['SLACK_SIGNING_SECRET'] !== undefined;
  if (isHttp) {
    const read = httpShape.safeParse(environment);
    if (!read.success) return { value: null, faults: faultsOf(read.error, environment) };
    const {
      SLACK_BOT_TOKEN,
      SLACK_SIGNING_SECRET: signingSecret,
      PORT: port,
      SLACK_API_URL,
    } = read.data;
    const value = {
      botTokens: tokensIn(SLACK_BOT_TOKEN),
      by: { signingSecret, port },
      api: SLACK_API_URL,
    };
    return { value, faults: [] };
  }
  const read = socketShape.safeParse(environment);
  if (!read.success) return { value: null, faults: faultsOf(read.error, environment) };
  const { SLACK_BOT_TOKEN, SLACK_APP_TOKEN: appToken, SLACK_API_URL } = read.data;
  return {
    value: { botTokens: tokensIn(SLACK_BOT_TOKEN), by: { appToken }, api: SLACK_API_URL },
    faults: [],
  };
};

/** What the environment says of the chat platforms, or everything that is wrong with it. */
export const configOf = (
  environment: Environment,
): { readonly config: Config } | { readonly faults: readonly ConfigFault[] } => {
  const set = filled(environment);
  const discord = discordOf(set);
  const slack = slackOf(set);
  const faults = [...discord.faults, ...slack.faults];
  return faults.length > 0
    ? { faults }
    : { config: { discord: discord.value, slack: slack.value } };
};
