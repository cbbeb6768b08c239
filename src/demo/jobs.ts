/** A job that comes round again: what is typed for it, and what its part is called. All invented. */
export type Job = {
  readonly part: string;
  readonly line: string;
  /** Asked for that often, of a hundred. */
  readonly share: number;
};

export const JOBS: readonly Job[] = [
  {
    part: 'QH-114 adjuster knob',
    line: '1.000 yellow bar straight wheel Fern on Bench lathe out 1.5',
    share: 26,
  },
  {
    part: 'QH-120 thumb nut',
    line: '5/8 brass straight wheel Linden on Bench lathe out 0.75',
    share: 20,
  },
  {
    part: 'QH-207 gauge handle',
    line: '3/4 green bar diamond 21tpi long 2 out 2.5 on Long bed tailstock',
    share: 16,
  },
  {
    part: 'QH-233 drain plug',
    line: '1.250 pump shaft straight wheel Juniper on Long bed out 1.25',
    share: 12,
  },
  {
    part: 'QH-301 press pin',
    line: '12mm 1045 straight wheel Clover on Bar turner out 25 mm',
    share: 14,
  },
  {
    part: 'QH-318 dial ring',
    line: '1.500 6061 straight 96dp wheel Thistle on Bench lathe out 1.5',
    share: 12,
  },
];
