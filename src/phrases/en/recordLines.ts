import type { RecordLines, RecordPart, RecordRows } from '../../card/recordLines.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { patternName } from './names.ts';

const HEADINGS: { readonly [P in RecordPart]: string } = {
  growth: 'Growth by pattern and material',
  wheels: 'How parts came out, by wheel',
  materials: 'How parts came out, by material',
  standards: 'Standards by what was logged on their cards',
};

const NOT_NAMED = { wheels: 'no wheel named', materials: 'not known' } as const;

/** From so many on a share is said in per cent. Judgement: of fewer it says more than is known. */
const ENOUGH = 20;

const counted = (count: number, one: string, many: string): string =>
  `${String(count)} ${count === 1 ? one : many}`;
const results = (count: number): string => counted(count, 'result', 'results');
const list = (items: readonly string[]): string => items.join(', ');

const goodOf = (good: number, count: number): string => {
  const share = count < ENOUGH ? '' : `, ${((100 * good) / count).toFixed(0)} %`;
  return `${String(good)} of ${String(count)} good${share}`;
};

export const recordLines: {
  readonly [K in keyof RecordLines]: (values: RecordLines[K], show: Show) => string;
} = {
  record: ({ results: count, good }) => `${results(count)} of this shop: ${goodOf(good, count)}.`,
  recordNone: ({ line }) => `No results yet. Log one: ${line}`,
  recordPart: ({ about, more }) =>
    `${HEADINGS[about]}${more === 0 ? '' : `, and ${String(more)} more in the files`}:`,
  recordDoubted: ({ results: names, more }) =>
    `Not learned from until an engineer confirms them: ${list(names)}${more === 0 ? '' : ` and ${String(more)} more`}.`,
  recordGrowthHow: () =>
    'Growth as a share of the static growth; in brackets where four of five of the next parts lie.',
  recordFiles: ({ files }) => `As tables: ${list(files)}.`,
};

export const recordRows: {
  readonly [K in keyof RecordRows]: (values: RecordRows[K], show: Show) => LabelledText;
} = {
  recordGrowth: ({ pattern, group, mean, low, high, results: count }) => {
    const percent = (share: number): string => (100 * share).toFixed(0);
    // What tells the rows apart is long; the numbers are short, and stand in front.
    return {
      label: `${percent(mean)} % (${percent(low)} to ${percent(high)})`,
      text: `${patternName(pattern)} in ${group}, ${results(count)}`,
    };
  },
  recordOutcomes: ({ about, name, count, good, others }) => ({
    label: goodOf(good, count),
    text: [
      name ?? NOT_NAMED[about],
      ...others.map((other) => `${other.outcome} ${String(other.count)}`),
    ].join('; '),
  }),
  recordStandard: ({ part, results: count, partsRun }) => ({
    label: part,
    text: `${results(count)}, ${counted(partsRun, 'part', 'parts')} run`,
  }),
};
