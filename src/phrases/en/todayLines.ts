import type { TodayLabels, TodayLines, TodayPart, TodayRows } from '../../card/todayLines.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { momentText } from './shopNames.ts';

type Words = {
  readonly heading: (count: number) => string;
  readonly short: (count: number) => string;
  readonly none: string;
  readonly all: string;
};

const many = (count: number, one: string, more: string): string =>
  `${String(count)} ${count === 1 ? one : more}`;

const PARTS: { readonly [P in TodayPart]: Words } = {
  setUp: {
    heading: () => 'Set up since yesterday',
    short: (count) => `${String(count)} set up`,
    none: 'nothing set up',
    all: 'All cards',
  },
  wrong: {
    heading: () => 'Went wrong since yesterday',
    short: (count) => `${String(count)} went wrong`,
    none: 'nothing went wrong',
    all: 'All results',
  },
  questions: {
    heading: (count) => (count === 1 ? 'Open question' : 'Open questions'),
    short: (count) => many(count, 'question open', 'questions open'),
    none: 'no question open',
    all: 'All questions',
  },
  decide: {
    heading: (count) => (count === 1 ? 'Standard to decide on' : 'Standards to decide on'),
    short: (count) => many(count, 'standard to decide on', 'standards to decide on'),
    none: 'no standard to decide on',
    all: 'All proposed',
  },
  review: {
    heading: (count) => (count === 1 ? 'Standard to look at again' : 'Standards to look at again'),
    short: (count) => many(count, 'standard to look at again', 'standards to look at again'),
    none: 'no standard to look at again',
    all: 'All standards',
  },
};

const ORDER = ['setUp', 'wrong', 'questions', 'decide', 'review'] as const;
const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

export const todayLines: {
  readonly [K in keyof TodayLines]: (values: TodayLines[K], show: Show) => string;
} = {
  today: ({ counts, ...moment }) => {
    const there = ORDER.filter((part) => counts[part] > 0);
    const said =
      there.length === 0
        ? 'nothing new since yesterday'
        : there.map((part) => PARTS[part].short(counts[part])).join(', ');
    return `${momentText(moment)}: ${said}.`;
  },
  todayPart: ({ about, count, more }) =>
    `${PARTS[about].heading(count)}${more === 0 ? '' : `, and ${String(more)} more`}:`,
  todayNone: ({ about }) => `${capital(about.map((part) => PARTS[part].none).join(', '))}.`,
};

export const todayRows: {
  readonly [K in keyof TodayRows]: (values: TodayRows[K], show: Show) => LabelledText;
} = {
  setUpHere: ({ where, code, said, by, moment }) => ({
    label: where,
    text: `${said}. ${code}, ${by === null ? '' : `${by}, `}${momentText(moment)}`,
  }),
};

export const todayLabels: {
  readonly [K in keyof TodayLabels]: (values: TodayLabels[K], show: Show) => string;
} = {
  todayAll: ({ about }) => PARTS[about].all,
};
