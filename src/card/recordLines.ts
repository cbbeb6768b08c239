import type { Pattern } from '../calc/index.ts';
import type { Nothing } from './nothing.ts';
import type { ResultLines } from './resultLines.ts';

/** What the record of a shop is about, part by part. */
export type RecordPart = 'growth' | 'wheels' | 'materials' | 'standards';

export type RecordLines = {
  record: { readonly results: number; readonly good: number };
  recordNone: { readonly line: string };
  recordPart: { readonly about: RecordPart; readonly more: number };
  recordDoubted: { readonly results: readonly string[]; readonly more: number };
  /** What the growth is a share of, and what stands in brackets. */
  recordGrowthHow: Nothing;
  recordFiles: { readonly files: readonly string[] };
};

export type RecordRows = {
  recordGrowth: {
    readonly pattern: Pattern;
    readonly group: string;
    readonly mean: number;
    readonly low: number;
    readonly high: number;
    readonly results: number;
  };
  recordOutcomes: {
    readonly about: 'wheels' | 'materials';
    readonly name: string | null;
    readonly count: number;
    readonly good: number;
    readonly others: readonly {
      readonly outcome: ResultLines['resultShown']['outcome'];
      readonly count: number;
    }[];
  };
  recordStandard: {
    readonly part: string;
    readonly results: number;
    readonly partsRun: number;
  };
};
