import type { Moment } from './shopLines.ts';

/** What the card of the day tells of, part by part. */
export type TodayPart = 'setUp' | 'wrong' | 'questions' | 'decide' | 'review';

export type TodayLines = {
  /** How much there is of each, in one line. */
  today: Moment & { readonly counts: Readonly<Record<TodayPart, number>> };
  todayPart: { readonly about: TodayPart; readonly count: number; readonly more: number };
  /** Parts of which there is nothing. */
  todayNone: { readonly about: readonly TodayPart[] };
};

export type TodayRows = {
  setUpHere: {
    /** The machine, or who it was where no machine was named. */
    readonly where: string;
    readonly code: string;
    readonly said: string;
    /** Who, where a machine was named. */
    readonly by: string | null;
    readonly moment: Moment;
  };
};

export type TodayLabels = { todayAll: { readonly about: TodayPart } };
