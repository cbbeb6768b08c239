/**
 * What a person gets instead of a card. A refusal is a value: the phrase book turns it into a
 * sentence that says what was wrong, why, and what to type instead.
 */
export type Suggestion = {
  /** What a button would say. */
  readonly label: string;
  /** The line the button would send. */
  readonly words: string;
};

/** Where in what was typed the fault lies, so that the reply can point at it and quote it. */
export type Place = {
  readonly word?: string;
  readonly start?: number;
  readonly end?: number;
};

export type Unreadable = {
  readonly code: 'unreadable';
  readonly word: string;
  /** Where the word stands in what was typed, so that the reply can point at it. */
  readonly start: number;
  readonly end: number;
  readonly nearest: readonly string[];
};

export type Missing = Place & {
  readonly code: 'missing';
  readonly parameter: string;
  readonly examples: readonly string[];
};

export type OutOfRangeRefusal = Place & {
  readonly code: 'outOfRange';
  readonly what: string;
  readonly value: number;
  readonly min: number;
  readonly max: number;
  readonly unit: string;
};

export type Unclear = Place & {
  readonly code: 'unclear';
  readonly what: string;
  readonly readings: readonly Suggestion[];
  /** Why it has to be asked. */
  readonly because?: Contradiction | Doubt;
};

/** What makes words that a person typed mean more than one thing. */
export type Doubt =
  | 'saidTwice'
  | 'noUnit'
  | 'unitOrWord'
  | 'unitOfTwo'
  | 'commaOrThousands'
  | 'commaOrTwo'
  | 'keywordBetween'
  | 'sizeByWhat'
  | 'limitsOfWhat'
  | 'whichAngle'
  | 'wholeNumber'
  | 'oneOfRange'
  | 'gradeOnly'
  | 'familyOnly'
  | 'calloutAgainst';

/** Things people say together that exclude each other. */
export type Contradiction =
  | 'handNeedsDiagonal'
  | 'pointsNeedCrossing'
  | 'helixNeedsHelical'
  | 'tiltAndHelix'
  | 'tiltNotSquare'
  | 'classNeedsDp'
  | 'classStraightOnly'
  | 'squareEdgeHasNoBevel'
  | 'speedTwice'
  | 'feedTwice'
  | 'countAndAsIs'
  | 'limitsReversed';

export type NotAllowed = {
  readonly code: 'notAllowed';
  readonly role: string;
  readonly people: readonly string[];
  /** Who may do it too, because they asked. */
  readonly asker?: string;
};

export type NotFound = Place & {
  readonly code: 'notFound';
  readonly what: string;
  readonly nearest: readonly string[];
};

export type Stale = {
  readonly code: 'stale';
  readonly what: string;
  readonly by: string;
  readonly when: string;
  /** The time zone in which the shop reads its clock. */
  readonly zone?: string;
};

export type Unavailable = {
  readonly code: 'unavailable';
  readonly what: string;
  /** The person's own words, repeated so that they can be sent again. */
  readonly words: string;
};

/** The name belongs to another of the same list. */
export type Taken = {
  readonly code: 'taken';
  readonly what: string;
  readonly name: string;
};

/** Somewhere a thing is in use. */
export type Use = { readonly what: 'rule' | 'card'; readonly name: string };

/** Removing it would leave these without it. */
export type InUse = {
  readonly code: 'inUse';
  readonly what: string;
  readonly name: string;
  readonly where: readonly Use[];
  /** There are further ones. */
  readonly more: boolean;
};

/** Somebody must be left who can name owners. */
export type LastOwner = { readonly code: 'lastOwner'; readonly name: string };

/** Where a question stands it does not take that. */
export type QuestionStands = {
  readonly code: 'questionStands';
  /** The question's own code. */
  readonly question: string;
  readonly state: 'open' | 'answered' | 'solved' | 'reopened';
  readonly move: 'answer' | 'solve' | 'reopen';
  /** What was said with it, so that it can be sent again. */
  readonly words: string;
};

/** A standard is not where in its life it would have to be for what was asked. */
export type NotNow = {
  readonly code: 'notNow';
  readonly asked: 'save' | 'propose' | 'approve' | 'revise' | 'retire' | 'use';
  readonly part: string;
  readonly revision: number;
  /** Where it is, who brought it there, and when. */
  readonly state: 'draft' | 'proposed' | 'approved' | 'superseded' | 'retired';
  readonly by: string;
  readonly at: number;
  readonly zone: string;
};

/** Whoever proposed it may not approve it here; these may. */
export type FourEyes = {
  readonly code: 'fourEyes';
  readonly part: string;
  readonly revision: number;
  readonly people: readonly string[];
};

/** A set-up that ends in a stop is nobody's standard. */
export type CardStopped = {
  readonly code: 'cardStopped';
  readonly card: string;
  readonly check: string;
};

export type Refusal =
  | Unreadable
  | Missing
  | OutOfRangeRefusal
  | Unclear
  | NotAllowed
  | NotFound
  | Stale
  | Unavailable
  | Taken
  | InUse
  | LastOwner
  | NotNow
  | FourEyes
  | CardStopped
  | QuestionStands;
