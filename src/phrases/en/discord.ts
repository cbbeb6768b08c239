import type { DiscordPhrases } from '../discord.ts';

/** As much of a pin as tells which it is. */
const PIN_SHOWN = 60;

const firstLine = (text: string): string => {
  const [line = ''] = text
    .replaceAll(/^#+\s*|\\/gu, '')
    .trim()
    .split('\n');
  return line.length <= PIN_SHOWN ? line : `${line.slice(0, PIN_SHOWN - 1)}…`;
};

export const discord: DiscordPhrases = {
  answerReady:
    'The answer is ready. It was asked for in private: press the button to see it alone.',
  showMe: 'Show it to me',
  notYours: 'That answer is for whoever asked. Ask for your own.',
  unsent: 'The answer was made but could not be shown. Press the button to see it.',
  formLate: 'Discord gave the form no time to open. Press that button again.',
  moreWords: 'More, in your own words',
  file: 'The file, as a table with commas between (CSV)',
  fileTooLarge: (name, megabytes) =>
    `${name} is larger than ${String(megabytes)} MB, more than can go this way.`,
  filesHere: 'The files, for you alone.',
  filesClosed:
    'The files go to you alone, and you take no direct messages from this server. Ask by the slash command instead.',
  faults: {
    notThere: 'the channel is not there, or the bot may not see it',
    noPermission: "the bot's role may not do that in this channel",
    messageGone: 'the message is no longer there',
    pinsFull: (most, oldest) => {
      const named = oldest.map(({ at, text }) =>
        [at.slice(0, 10), firstLine(text)].filter((part) => part !== '').join(' '),
      );
      const oldestPins = named.length === 0 ? '' : ` (the oldest: ${named.join('; ')})`;
      return `the channel has ${String(most)} pins, as many as it holds; take one off${oldestPins}`;
    },
    closed: (name) => `${name} takes no direct messages from this server`,
    notMember: (id) => `${id} is no longer in this server`,
    and: '; ',
  },
};
