import {
  CAUSE_IDS,
  type CauseId,
  type Mm,
  mm,
  SYMPTOMS,
  type SymptomId,
} from '../../calc/index.ts';
import type { Refusal } from '../../refusal.ts';
import type { ResultTable } from '../../store/index.ts';
import { outside, type Range, wholeFault } from '../limits.ts';
import { cleaned, LONGEST_TEXT, textFault } from '../names.ts';

/** How it went, in the shop's words. */
export const OUTCOMES = [
  'good',
  'double',
  'shallow',
  'flaking',
  'bent',
  'seized',
  'other',
] as const;
export type Outcome = (typeof OUTCOMES)[number];

/** What a person says of a part that was made by a card. Null: not said. */
export type ResultContent = {
  readonly outcome: Outcome;
  /** What was seen, where it went wrong: the symptom that a cause is counted under. */
  readonly symptom: SymptomId | null;
  readonly teeth: number | null;
  /** Diameter before knurling, where it was not the card's. */
  readonly blank: Mm | null;
  readonly crest: Mm | null;
  readonly toothHeight: Mm | null;
  /** Flat left on the crests: another way to say the height. */
  readonly flat: Mm | null;
  readonly partsRun: number;
  /** What turned out to be behind it. */
  readonly cause: CauseId | null;
  readonly note: string | null;
};

/** More parts than anybody runs between two results. Judgement. */
const PARTS: Range = [0, 1_000_000, 'parts'];

/** What is wrong with it by itself, whatever card it is for. */
export const contentFault = ({ partsRun, note }: ResultContent): Refusal | null =>
  outside('partsRun', partsRun, PARTS) ??
  wholeFault('partsRun', partsRun, PARTS) ??
  (note === null ? null : textFault('note', cleaned(note), LONGEST_TEXT));

/** The symptom that an outcome stands for where nothing closer was said. */
export const symptomOf = (outcome: Outcome): SymptomId | null => {
  switch (outcome) {
    case 'double':
      return 'doublePattern';
    case 'shallow':
      return 'shallowAllRound';
    case 'flaking':
      return 'flaking';
    case 'bent':
      return 'bentPart';
    case 'seized':
      return 'pinSeized';
    case 'good':
    case 'other':
      return null;
  }
};

/** The columns that a person fills. */
export const contentRow = (content: ResultContent) => ({
  outcome: content.outcome,
  symptom: content.symptom,
  teeth: content.teeth,
  blank: content.blank,
  crest: content.crest,
  tooth_height: content.toothHeight,
  flat: content.flat,
  parts_run: content.partsRun,
  cause: content.cause,
  note: content.note === null ? null : cleaned(content.note),
});

const length = (value: number | null): Mm | null => (value === null ? null : mm(value));

const oneOf = <T extends string>(known: readonly T[], kept: string | null): T | null =>
  known.find((word) => word === kept) ?? null;

export const contentOf = (row: ResultTable): ResultContent => ({
  outcome: oneOf(OUTCOMES, row.outcome) ?? 'other',
  symptom: oneOf(SYMPTOMS, row.symptom),
  teeth: row.teeth,
  blank: length(row.blank),
  crest: length(row.crest),
  toothHeight: length(row.tooth_height),
  flat: length(row.flat),
  partsRun: row.parts_run,
  cause: oneOf(CAUSE_IDS, row.cause),
  note: row.note,
});
