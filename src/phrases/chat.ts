/** What a chat platform shows round the cards: options, forms, and what it says when it cannot. */
export type ChatPhrases = {
  /** The option that takes a whole line. */
  readonly words: string;
  /** The option that hides the reply from everybody else. */
  readonly onlyMe: string;
  readonly option: (name: string, examples: readonly string[]) => string;
  /** What can be done with somebody's message. */
  readonly fromMessage: string;
  readonly cautions: string;
  readonly allCautions: string;
  readonly correct: string;
  readonly correctTitle: string;
  readonly correctField: string;
  readonly formTitle: string;
  readonly fault: string;
  /** The platform gave no time to answer; a private answer is not shown in the open. */
  readonly tooLate: string;
  /** In front of an answer that could not be given where it was asked for. */
  readonly lateAnswer: string;
  /** Whom a late answer is for; the adapter writes the person's name in the platform's way. */
  readonly gone: string;
  readonly nothingToRead: string;
  readonly connected: (platform: string, shops: number) => string;
  readonly tokenWrong: (variable: string) => string;
  readonly cannotStart: (platform: string, fault: string) => string;
  readonly connectionEnded: (platform: string) => string;
  readonly registration: RegistrationPhrases;
};

/** What `register` prints. */
export type RegistrationPhrases = {
  readonly added: (name: string) => string;
  readonly changed: (name: string) => string;
  readonly removed: (name: string) => string;
  readonly same: (name: string) => string;
  /** What differs below a command that is changed; the names of its fields are the platform's. */
  readonly detail: Readonly<
    Record<'added' | 'removed' | 'changed', (path: string, fields: readonly string[]) => string>
  >;
  readonly notMember: string;
  readonly failed: (fault: string) => string;
  readonly dry: string;
  readonly done: (changes: number) => string;
};

/** A sentence for each thing that can be wrong with what the environment says. */
export type ConfigPhrases = {
  readonly missing: (variable: string) => string;
  readonly malformed: (variable: string) => string;
};
