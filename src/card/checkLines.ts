import type { Mm, NextPartMoveId, OffFigure, PartMove, ThisPartMoveId } from '../calc/index.ts';
import type { Nothing } from './nothing.ts';

/** What the check says before, at the seam of a trial turn, and after. */
export type CheckLines = {
  blankTracks: {
    readonly diameter: Mm;
    readonly toothCount: number;
    readonly toothError: number;
    readonly chance: number | null;
  };
  blankDoesNot: {
    readonly diameter: Mm;
    readonly toothError: number;
    readonly nextDiameter: Mm;
    readonly nextToothCount: number;
    readonly takeOff: Mm;
  };
  blankIsOff: {
    readonly diameter: Mm;
    readonly toothCount: number;
    readonly toothError: number;
  };
  blankFewTeeth: { readonly diameter: Mm; readonly smallest: Mm };
  blankTooSmall: { readonly diameter: Mm; readonly toothError: number };
  chanceTracks: { readonly chance: number };
  seamWhole: { readonly diameter: Mm };
  seamTurnTo: { readonly diameter: Mm; readonly takeOff: Mm };
  seamChance: { readonly chance: number; readonly byLabel: number };
  seamMarksStay: Nothing;
  seamCountFar: { readonly count: number; readonly expected: number };
  seamProven: {
    readonly effectivePitch: Mm;
    readonly count: number;
    readonly diameter: Mm;
  };
  seamStep: { readonly step: 1 | 2 | 3 | 4; readonly bite: Mm };
  partRight: { readonly blank: Mm; readonly toothCount: number };
  /** The first thing to do to this part, and what is off. */
  partOff: {
    readonly off: readonly OffFigure[];
    readonly move: PartMove<ThisPartMoveId>;
    /** What the planned fill leaves on the crests. */
    readonly flat: Mm;
  };
  thisPart: { readonly move: PartMove<ThisPartMoveId> };
  /** The flat on the crests that the planned fill leaves: what to stop by where the dial is no judge. */
  nextPart: { readonly move: PartMove<NextPartMoveId>; readonly flat: Mm };
  /** The wheel differs from its label: the blank already is whole, or is turned for the other count. */
  nextCount: {
    readonly blank: Mm;
    readonly counted: number;
    readonly diameter: Mm;
    readonly expected: number;
  };
  rescue: {
    readonly cleaned: Mm;
    readonly diameter: Mm;
    readonly toothCount: number;
    readonly meetsPrint: boolean | null;
  };
  noRescue: { readonly cleaned: Mm };
};

export type CheckRows = {
  countSeen: { readonly counted: number; readonly expected: number };
  crestSeen: { readonly crest: Mm; readonly low: Mm; readonly high: Mm };
  growthSeen: { readonly growth: Mm; readonly factor: number };
  fillSeen: {
    readonly measured: number | null;
    readonly fromCrest: number | null;
  };
};

/** What the buttons of a check say. */
export type CheckLabels = {
  setUpAt: { readonly diameter: Mm };
  withoutCount: Nothing;
};
