import type { Check, Figure, FigureName, Mm } from '../calc/index.ts';
import type { Nothing } from './nothing.ts';
import type { Amount, Fact, Moment } from './shopLines.ts';

/** Where a revision of a standard is in its life. */
export type StandardStateSaid = 'draft' | 'proposed' | 'approved' | 'superseded' | 'retired';

/** A revision by its number. */
export type RevisionSaid = { readonly part: string; readonly revision: number };

/** What a standard rests on is not what it was when it was approved. */
export type ChangedSince = {
  readonly what: 'wheel' | 'machine' | 'material' | 'rule';
  readonly name: string;
  readonly how: 'changed' | 'removed' | 'added';
  readonly facts: readonly string[];
};

export type StandardLines = {
  standardIs: RevisionSaid & { readonly state: StandardStateSaid };
  standardDone: RevisionSaid & { readonly did: 'saved' | 'proposed' | 'approved' | 'retired' };
  standardTurnTo: RevisionSaid & {
    readonly blankDiameter: Mm;
    readonly toothCount: number;
    readonly left: boolean;
  };
  /** What was done to it, by whom, and when. */
  standardSigned: Moment & {
    readonly did: StandardStateSaid;
    readonly by: string;
    readonly why: string | null;
  };
  standardWhy: { readonly why: string };
  standardFromCard: { readonly code: string };
  standardCovers: { readonly facts: readonly Fact[] };
  standardPicked: { readonly outside: readonly string[] };
  standardAlso: { readonly parts: readonly string[] };
  standardChanged: ChangedSince;
  standardReviewDue: Moment;
  standardReviewAt: Moment;
  standardSame: Nothing;
  standardDiffers: { readonly count: number };
  standardButStops: RevisionSaid & { readonly check: Check };
  standardBefore: { readonly revision: number; readonly pinned: boolean };
  standardPosted: { readonly where: 'channel' | 'here' | 'nowhere'; readonly line: string };
  standardsListed: { readonly count: number; readonly state: StandardStateSaid | null };
  standardsMore: Nothing;
  standardsNone: { readonly line: string };
  standardHistory: { readonly part: string; readonly revisions: number };
  standardCompared: {
    readonly part: string;
    readonly from: number;
    readonly to: number;
    readonly count: number;
  };
  standardOnlyOne: RevisionSaid;
  /** Who is to look which pin could go: the ones that have stood longest. */
  oldestPins: { readonly pins: readonly (RevisionSaid & Moment)[] };
};

export type StandardRows = {
  standardItem: RevisionSaid & {
    readonly state: StandardStateSaid;
    readonly facts: readonly Fact[];
    readonly blankDiameter: Mm;
    readonly toothCount: number;
    /** It asks to be looked at again. */
    readonly due: boolean;
    /** Another one is still to be decided on. */
    readonly open: { readonly revision: number; readonly state: StandardStateSaid } | null;
  };
  standardStep: Moment & {
    readonly revision: number;
    readonly state: StandardStateSaid;
    readonly by: string;
    readonly why: string | null;
    readonly card: string | null;
  };
  figureBeside: {
    readonly name: FigureName;
    readonly standard: Figure | null;
    readonly now: Figure | null;
  };
  figureRevised: {
    readonly name: FigureName;
    readonly before: Figure | null;
    readonly after: Figure | null;
  };
  factRevised: { readonly name: string; readonly before: Amount; readonly after: Amount };
};

/** What the buttons of a standard say. */
export type StandardLabels = {
  proposeStandard: Nothing;
  proposeRevision: { readonly part: string };
  proposeDraft: Nothing;
  approveStandard: RevisionSaid;
  retireStandard: RevisionSaid;
  showStandard: { readonly part: string };
  compareStandard: Nothing;
  standardHistory: Nothing;
};
