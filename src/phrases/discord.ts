/** What only Discord has a way for, and a way of refusing. */
export type DiscordPhrases = {
  /** A private answer that could not be shown where it was asked for. */
  readonly answerReady: string;
  readonly showMe: string;
  readonly notYours: string;
  /** The answer was made, but no way was open to send it. */
  readonly unsent: string;
  readonly formLate: string;
  readonly moreWords: string;
  /** The option that takes a file. */
  readonly file: string;
  readonly fileTooLarge: (name: string, megabytes: number) => string;
  readonly filesHere: string;
  /** A file goes to one person alone, and there was no way to them. */
  readonly filesClosed: string;
  /** Why something could not be delivered: the end of a sentence. */
  readonly faults: {
    readonly notThere: string;
    readonly noPermission: string;
    readonly messageGone: string;
    readonly pinsFull: (
      most: number,
      oldest: readonly { readonly at: string; readonly text: string }[],
    ) => string;
    readonly closed: (name: string) => string;
    readonly notMember: (id: string) => string;
    readonly and: string;
  };
};
