/** How a part of a job came out: what is said besides the counted teeth and the crest. */
export type Outcome = {
  /** That often, among all of the job. */
  readonly share: number;
  readonly words: string;
  /** Teeth counted beyond those of the card; null where nobody counts a spoilt part. */
  readonly teeth: number | null;
  /** The crest against what the card expects, in shares of the card's own spread; null: not measured. */
  readonly crest: number | null;
};

/** A job that comes round again: the number of its part, and what is typed for it. All invented. */
export type Job = {
  readonly part: string;
  readonly line: string;
  /** Comes round that often, among all jobs. */
  readonly share: number;
  readonly outcomes: readonly Outcome[];
};

const good = (share: number, crest: number): Outcome => ({
  share,
  words: 'good',
  teeth: 0,
  crest,
});
const spoilt = (share: number, words: string, teeth: number | null = null): Outcome => ({
  share,
  words,
  teeth,
  crest: null,
});

export const JOBS: readonly Job[] = [
  {
    part: 'QH-114',
    line: '1.000 yellow bar straight wheel Fern on Bench lathe out 1.5',
    share: 26,
    outcomes: [
      good(88, 0.2),
      spoilt(7, 'double cause light first bite', 1),
      spoilt(3, 'double cause blank oversize', 1),
      spoilt(2, 'flaking cause too many turns'),
    ],
  },
  {
    part: 'QH-120',
    line: '5/8 brass straight wheel Linden on Bench lathe out 0.75',
    share: 20,
    outcomes: [
      good(92, -0.1),
      spoilt(4, 'shallow cause not deep enough', 0),
      spoilt(4, 'other note burr at the chuck end'),
    ],
  },
  {
    part: 'QH-207',
    line: '3/4 green bar diamond 21tpi long 2 out 2.5 on Long bed tailstock',
    share: 16,
    outcomes: [
      good(84, 0.1),
      spoilt(9, 'double cause wheels out of step', 1),
      spoilt(7, 'shallow cause loose centre', 0),
    ],
  },
  {
    part: 'QH-233',
    line: '1.250 pump shaft straight wheel Juniper on Long bed out 1.25',
    share: 12,
    outcomes: [
      good(80, -0.4),
      spoilt(12, 'flaking cause over-filled'),
      spoilt(5, 'seized cause dry wheel'),
      spoilt(3, 'double cause light first bite', -1),
    ],
  },
  {
    part: 'QH-301',
    line: '12mm 1045 straight wheel Clover on Bar turner out 25 mm',
    share: 14,
    outcomes: [
      good(86, 0),
      spoilt(9, 'bent cause too far out'),
      spoilt(5, 'double cause runout', 1),
    ],
  },
  {
    part: 'QH-318',
    line: '1.500 6061 straight 96dp wheel Thistle on Bench lathe out 1.5',
    share: 12,
    outcomes: [
      good(74, -0.3),
      spoilt(18, 'shallow cause dull wheel', 0),
      spoilt(8, 'double cause dull wheel', 1),
    ],
  },
];
