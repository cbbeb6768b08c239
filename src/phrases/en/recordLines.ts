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

const NOT_NAMED = { wheels: 'No wheel named', materials: 'Not known' } as const;

/** From so many on a share is said in per cent. Judgement: of fewer it says more than is known. */
const ENOUGH = 20;

const counted = (count: number, one: string, many: string): string =>
  `${String(count)} ${count === 1 ? one : many}`;
const results = (count: number): string => counted(count, 'result', 'results');
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
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
    return {
      label: `${capital(patternName(pattern))}, ${group}`,
      text: `${percent(mean)} % (${percent(low)} to ${percent(high)}), ${results(count)}`,
    };
  },
  recordOutcomes: ({ about, name, count, good, others }) => ({
    label: name ?? NOT_NAMED[about],
    text: [
      goodOf(good, count),
      ...others.map((other) => `${other.outcome} ${String(other.count)}`),
    ].join('; '),
  }),
  recordStandard: ({ part, results: count, partsRun }) => ({
    label: part,
    text: `${results(count)}, ${counted(partsRun, 'part', 'parts')} run`,
  }),
};
