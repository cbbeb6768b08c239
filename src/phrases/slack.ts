import type { Mm } from '../calc/index.ts';
import type { Show } from './show.ts';

/** What only Slack has a place for: the app's own page, its forms, its home. */
export type SlackPhrases = {
  readonly appName: string;
  readonly appDescription: string;
  readonly slash: (root: string) => string;
  readonly fromMessageDescription: string;
  readonly setupShortcut: string;
  readonly setupDescription: string;
  /** Typed at either end of a line, it hides the reply. */
  readonly onlyMeWords: string;
  readonly audience: string;
  readonly moreWords: string;
  readonly send: string;
  readonly cancel: string;
  readonly choose: string;
  readonly home: string;
  /** Slack gave the form no time to open. */
  readonly formLate: string;
  /** Where a form cannot open by itself. */
  readonly formNeeded: string;
  readonly openForm: string;
  /** Files have no private place in a channel. */
  readonly filesHere: string;
  readonly filesLeft: (names: readonly string[]) => string;
  /** Over the shop's own standards. */
  readonly standards: string;
  readonly standard: (
    of: {
      readonly part: string;
      readonly revision: number;
      readonly blankDiameter: Mm;
      readonly toothCount: number;
    },
    show: Show,
  ) => string;
  readonly showStandard: string;
};
