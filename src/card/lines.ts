import type {
  Check,
  CountedWheel,
  Edge,
  Figure,
  KnurlClass,
  Mm,
  MmPerRev,
  MPerMin,
  Pattern,
  Pitch,
  PitchBasis,
  Rad,
  RemedyKind,
  RevPerMin,
  Seconds,
  WheelKind,
  WheelSize,
  Window,
} from '../calc/index.ts';
import type { CheckLabels, CheckLines, CheckRows } from './checkLines.ts';
import type { ConvertLabels, ConvertLines, ConvertRows } from './convertLines.ts';
import type { FindLabels, FindLines, FindRows } from './findLines.ts';
import type { Nothing } from './nothing.ts';
import type { PlanLabels, PlanLines, PlanRows } from './planLines.ts';
import type { QuestionLabels, QuestionLines, QuestionRows } from './questionLines.ts';
import type { RecordLines, RecordRows } from './recordLines.ts';
import type { ResultLabels, ResultLines, ResultRows } from './resultLines.ts';
import type { ShopLabels, ShopLines, ShopRows } from './shopLines.ts';
import type { StandardLabels, StandardLines, StandardRows } from './standardLines.ts';
import type { TodayLabels, TodayLines, TodayRows } from './todayLines.ts';
import type { TroubleLabels, TroubleLines, TroubleRows } from './troubleLines.ts';
import type { WhyLabels, WhyLines, WhyRows } from './whyLines.ts';

/**
 * Every sentence a card can say, and the numbers it says it with. The phrase book of a language
 * has one entry for each; a new line here is a compile error there until it has words.
 */
export type Lines = CheckLines &
  ConvertLines &
  FindLines &
  PlanLines &
  QuestionLines &
  RecordLines &
  ResultLines &
  ShopLines &
  StandardLines &
  TodayLines &
  TroubleLines &
  WhyLines & {
    turnTo: { readonly blankDiameter: Mm; readonly toothCount: number };
    leaveAt: { readonly blankDiameter: Mm; readonly toothCount: number };
    stopped: { readonly check: Check };
    /** The smallest changes that lift a stop. */
    passesWith: {
      readonly remedies: readonly { readonly kind: RemedyKind; readonly number: Figure | null }[];
    };
    wouldTurnTo: { readonly blankDiameter: Mm; readonly toothCount: number };
    windowTracks: Window;
    leaveItOption: {
      readonly stock: Mm;
      readonly toothCount: number;
      readonly toothError: number;
    };
    asItIs: { readonly stock: Mm; readonly toothError: number };
    finishMet: { readonly limits: Window; readonly fillMoved: boolean; readonly fill: number };
    finishAimed: { readonly size: Mm };
    plateTaken: { readonly thickness: Mm; readonly crest: Mm };
    pitchTaken: {
      readonly took: PitchBasis;
      readonly toothCount: number;
      readonly otherCount: number | null;
    };
    calloutBar: { readonly stock: Mm };
    helixTaken: { readonly helix: Rad };
    wheelNeeded: { readonly wheel: WheelKind; readonly pattern: Pattern };
    materialTaken: { readonly name: string; readonly condition: string };
    processSwitched: { readonly name: string };
    labelOverruled: { readonly label: Pitch; readonly counted: CountedWheel; readonly normal: Mm };
    wheelTaken: { readonly wheel: WheelSize; readonly edge: Edge };
    classWindow: { readonly knurlClass: KnurlClass };
    feedNeedsLength: Nothing;
    startHalfOn: { readonly chamfer: Mm; readonly clearance: Mm };
    helpIntro: Nothing;
    helpVerb: { readonly verb: string; readonly line: string };
    helpExample: { readonly line: string };
  };
export type LineId = keyof Lines;
export type Line = { [K in LineId]: { readonly line: K; readonly values: Lines[K] } }[LineId];

/** Label and value rows: the numbers of the card in reading order. */
export type Rows = CheckRows &
  ConvertRows &
  FindRows &
  PlanRows &
  QuestionRows &
  RecordRows &
  ResultRows &
  ShopRows &
  StandardRows &
  TodayRows &
  TroubleRows &
  WhyRows & {
    material: { readonly name: string; readonly condition: string };
    feedIn: { readonly infeed: Mm; readonly cut: boolean };
    firstTurn: { readonly firstBite: Mm };
    stopWhen: {
      readonly crestFlat: Mm;
      readonly crest: Mm;
      readonly low: Mm;
      readonly high: Mm;
      readonly cut: boolean;
    };
    toothHeight: { readonly height: Mm; readonly fill: number; readonly sharpHeight: Mm };
    run: { readonly spindleSpeed: RevPerMin; readonly surfaceSpeed: MPerMin };
    plunge: {
      readonly turns: number;
      readonly dwell: number;
      readonly time: Seconds | null;
      readonly batch: number;
    };
    traverse: {
      readonly feed: MmPerRev;
      readonly low: MmPerRev;
      readonly high: MmPerRev;
      readonly turns: number | null;
      readonly time: Seconds | null;
      readonly batch: number;
    };
  };
export type RowId = keyof Rows;
export type Row = { [K in RowId]: { readonly row: K; readonly values: Rows[K] } }[RowId];

/** What a button says. */
export type Labels = CheckLabels &
  ConvertLabels &
  FindLabels &
  PlanLabels &
  QuestionLabels &
  ResultLabels &
  ShopLabels &
  StandardLabels &
  TodayLabels &
  TroubleLabels &
  WhyLabels & {
    asIs: { readonly stock: Mm };
    finishedSize: { readonly size: Mm };
    otherBasis: { readonly took: PitchBasis };
    material: { readonly name: string; readonly condition: string };
    smaller: { readonly toothCount: number; readonly blankDiameter: Mm };
    larger: { readonly toothCount: number; readonly blankDiameter: Mm };
    remedy: { readonly kind: RemedyKind; readonly number: Figure | null };
    candidate: { readonly place: number; readonly wheel: string; readonly toothCount: number };
    ownSpeed: Nothing;
    cutInstead: Nothing;
    bevelled: Nothing;
    ownFill: Nothing;
    otherUnits: { readonly units: 'in' | 'mm' };
    words: { readonly words: string };
  };
export type LabelId = keyof Labels;
export type Label = { [K in LabelId]: { readonly label: K; readonly values: Labels[K] } }[LabelId];

export const line = <K extends LineId>(id: K, values: Lines[K]): Line =>
  ({ line: id, values }) as Line;
export const row = <K extends RowId>(id: K, values: Rows[K]): Row => ({ row: id, values }) as Row;
export const label = <K extends LabelId>(id: K, values: Labels[K]): Label =>
  ({ label: id, values }) as Label;
