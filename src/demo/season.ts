import { drawn, normalFrom } from './chance.ts';
import { JOBS, type Job, type Outcome } from './jobs.ts';
import { OPERATORS } from './said.ts';

const MM_PER_INCH = 25.4;
/** Days of the season, the shifts' hours, and how much is told of it. Judgement: a busy small shop. */
export const DAYS = 42;
const SHIFT_HOURS = 8.5;
const RESULTS = 200;
const MOST_OF_A_BATCH = 4;
const DAYS_OF_A_WEEK = 7;
const WORKING_DAYS = 5;

/** What is told of one part of a batch, and how many were run by then. */
export type Told = {
  readonly outcome: Outcome;
  /** Of the normal spread: how far the crest and the flat are from what is usual. */
  readonly chances: readonly [number, number];
  readonly parts: number;
};

/** A batch of one job: its card is asked for, and some of its parts are told. */
export type Batch = {
  readonly job: Job;
  readonly by: string;
  /** Hours since the season began. */
  readonly at: number;
  readonly results: readonly Told[];
};

const workingDays = (): readonly number[] =>
  Array.from({ length: DAYS }, (_, day) => day).filter(
    (day) => (DAYS - 1 - day) % DAYS_OF_A_WEEK < WORKING_DAYS,
  );

/** The season's batches in their order, the same every time for the same chance. */
export const season = (random: () => number): readonly Batch[] => {
  const counts: number[] = [];
  for (let left = RESULTS; left > 0; left -= counts.at(-1) ?? left)
    counts.push(Math.min(left, 1 + Math.floor(random() * MOST_OF_A_BATCH)));
  const days = workingDays();
  return counts.map((count, index) => {
    const place = (index / counts.length) * days.length;
    const day = days[Math.floor(place)] ?? 0;
    const job = drawn(random, JOBS);
    return {
      job,
      by: OPERATORS[Math.floor(random() * OPERATORS.length)] ?? '',
      at: day * 24 + (place % 1) * SHIFT_HOURS,
      results: Array.from({ length: count }, () => ({
        outcome: drawn(random, job.outcomes),
        chances: [normalFrom(random), normalFrom(random)] as const,
        parts: 1 + Math.floor(random() * 40),
      })),
    };
  });
};

/** Figures of a card as the demo needs them. */
export type Expected = (
  figure: 'toothCount' | 'crestDiameter' | 'crestDiameterHigh' | 'crestFlat',
) => number;

/** Of the spread a card gives, what one part differs from the next; the same of the flat. Judgement. */
const PART_TO_PART = 0.45;
const FLAT_TO_FLAT = 0.12;

const inches = (millimetres: number): string => `${(millimetres / MM_PER_INCH).toFixed(4)} in`;

/** What is typed for a part that was made by a card. */
export const resultLine = (
  code: string,
  { outcome, chances, parts }: Told,
  expected: Expected,
): string => {
  const { words, teeth, crest } = outcome;
  const [first, second] = chances;
  const middle = expected('crestDiameter');
  const spread = expected('crestDiameterHigh') - middle;
  const measured =
    crest === null
      ? []
      : [
          `crest ${inches(middle + (crest + PART_TO_PART * first) * spread)}`,
          `flat ${inches(expected('crestFlat') * (1 + FLAT_TO_FLAT * second))}`,
        ];
  const counted = teeth === null ? [] : [`${String(expected('toothCount') + teeth)} teeth`];
  const said = [`card ${code}`, ...counted, ...measured, `${String(parts)} parts`, words];
  return `/knurl result ${said.join(' ')}`;
};
