import type { SlackPhrases } from '../slack.ts';

export const slack: SlackPhrases = {
  appName: 'Wholetooth',
  appDescription: 'Sets up knurling on a lathe: diameter, infeed, speed, feed, checks, cautions',
  slash: (root) =>
    root === 'shop'
      ? "The shop's own wheels, machines, rules and people"
      : 'Set up, check, plan and mend a knurl',
  fromMessageDescription: 'Reads the bar, the pattern and the pitch out of this message',
  setupShortcut: 'Set up a knurl',
  setupDescription: 'Opens the form for a set-up',
  onlyMeWords: 'only me',
  audience: 'Who sees it',
  moreWords: 'Anything more, in your own words',
  send: 'Send',
  cancel: 'Cancel',
  choose: 'Choose what to ask',
  home: 'Fill in a form here, or type /knurl with the bar, the pattern and the pitch in any channel. What is asked here is answered to you alone.',
  formLate: 'Slack gave the form no time to open. Press the button to open it now.',
  formNeeded: 'Press the button to fill it in, or say the bar, the pattern and the pitch.',
  openForm: 'Open the form',
  filesHere: 'The files go to you alone, in a direct message.',
  filesLeft: (names) =>
    `Not sent: ${names.join(', ')}. Ask again, or take a backup where the program runs.`,
  standards: 'Standards of this shop',
  standard: ({ part, revision, blankDiameter, toothCount }, show) =>
    `${part} rev ${String(revision)}: turn to ${show.both(blankDiameter)}, ${String(toothCount)} teeth`,
  showStandard: 'Show',
};
