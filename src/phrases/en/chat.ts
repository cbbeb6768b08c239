import type { ChatPhrases, ConfigPhrases } from '../chat.ts';

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

export const chat: ChatPhrases = {
  words: 'In your own words, such as 1.000 straight 21tpi 1018',
  onlyMe: 'Only you see the answer',
  option: (name, examples) =>
    examples.length === 0 ? capital(name) : `${capital(name)}: ${examples.join(', ')}`,
  fromMessage: 'Set up from this message',
  cautions: 'Cautions in full',
  allCautions: 'Cautions in full',
  correct: 'Change and send again',
  correctTitle: 'Change and send again',
  correctField: 'Request',
  formTitle: 'One thing more',
  fault: 'Something went wrong here, not in what you typed. Nothing was changed; send it again.',
  tooLate: 'The platform passed your request on too late to answer it privately. Send it again.',
  lateAnswer: 'The platform passed this on late; here is the answer.',
  gone: 'What this button was for is no longer kept. Send the request again.',
  nothingToRead: 'That message has no words to read. Say the bar, the pattern and the pitch.',
  connected: (platform, shops) =>
    `${platform} is connected: ${String(shops)} ${shops === 1 ? 'shop' : 'shops'}.`,
  tokenWrong: (variable) =>
    `${variable} is not a token that the platform takes. Copy it again from the application's page and start again.`,
  cannotStart: (platform, fault) => `${platform} could not be started: ${fault}.`,
  connectionEnded: (platform) =>
    `${platform} has ended the connection for good. Start again; if it ends again, look at the application's page.`,
  registration: {
    added: (name) => `+ ${name}`,
    changed: (name) => `~ ${name}`,
    removed: (name) => `- ${name}`,
    same: (name) => `= ${name}`,
    detail: {
      added: (path) => `    + ${path}`,
      removed: (path) => `    - ${path}`,
      changed: (path, fields) => `    ~ ${path}: ${fields.join(', ')}`,
    },
    notMember:
      'The bot is not in the server that DISCORD_TEST_GUILD names. Invite it there, or name another.',
    failed: (fault) => `The commands could not be registered: ${fault}.`,
    dry: 'Only shown; nothing was changed.',
    done: (changes) =>
      changes === 0
        ? 'Everything is registered as it should be.'
        : `${String(changes)} changed on the platform.`,
  },
};

const WHAT: Readonly<Record<string, string>> = {
  DISCORD_TOKEN: "the bot's token: application's page, Bot, Reset Token",
  DISCORD_APPLICATION_ID: "the application's id, 17 to 20 digits: application's page, General",
  DISCORD_TEST_GUILD: 'the id of one server, 17 to 20 digits, or nothing',
  SLACK_BOT_TOKEN:
    'begins with xoxb-: app page, OAuth & Permissions (several workspaces: several, with commas)',
  SLACK_APP_TOKEN: 'begins with xapp-: app page, Basic Information, App-Level Tokens',
  SLACK_SIGNING_SECRET: 'app page, Basic Information, App Credentials',
  SLACK_API_URL: 'an address such as http://127.0.0.1:8080/api/, or nothing',
  PORT: 'the number of the port that Slack can reach, 1 to 65535',
  DISCORD_API_URL: 'an address such as http://127.0.0.1:8080/api, or nothing',
};

export const config: ConfigPhrases = {
  missing: (variable) => `${variable} is missing: ${WHAT[variable] ?? 'give it a value'}.`,
  malformed: (variable) =>
    `${variable} is not what it has to be: ${WHAT[variable] ?? 'give it another value'}.`,
};
