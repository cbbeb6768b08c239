export * from './card.ts';
export type { CellFault, FileFault } from './fileFaults.ts';
export type { FoundKind, FoundThing } from './findLines.ts';
export * from './lines.ts';
export type { CandidateSaid } from './planLines.ts';
export type {
  QuestionInShort,
  QuestionLabels,
  QuestionLines,
  QuestionRows,
} from './questionLines.ts';
export type { RecordPart } from './recordLines.ts';
export type {
  Amount,
  Fact,
  Moment,
  ShopLabels,
  ShopLines,
  ShopRows,
  ShopThing,
} from './shopLines.ts';
export type { ChangedSince, RevisionSaid, StandardStateSaid } from './standardLines.ts';
export type { TodayPart } from './todayLines.ts';
export type { Sure, WhyLabels, WhyLines, WhyRows } from './whyLines.ts';
