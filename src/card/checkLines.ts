import type { Mm, NextPartMoveId, OffFigure, PartMove, ThisPartMoveId } from '../calc/index.ts';

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
  blankTooSmall: { readonly diameter: Mm; readonly toothError: number };
  chanceTracks: { readonly chance: number };
  seamWhole: { readonly diameter: Mm };
  seamTurnTo: { readonly diameter: Mm; readonly takeOff: Mm };
  seamChance: { readonly chance: number; readonly byLabel: number };
  seamMarksStay: Record<never, never>;
  seamProven: { readonly effectivePitch: Mm; readonly count: number; readonly diameter: Mm };
  seamStep: { readonly step: 1 | 2 | 3 | 4; readonly bite: Mm | null };
  partRight: { readonly blank: Mm; readonly toothCount: number };
  partOff: { readonly off: readonly OffFigure[] };
  thisPart: { readonly move: PartMove<ThisPartMoveId> };
  nextPart: { readonly move: PartMove<NextPartMoveId> };
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
  fillSeen: { readonly measured: number | null; readonly fromCrest: number | null };
};
