import type { SymptomId } from '../../calc/index.ts';
import type { ResultLabels, ResultLines, ResultRows } from '../../card/resultLines.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { patternName } from './names.ts';
import { momentText } from './shopNames.ts';
import { causeNames, symptomNames } from './troubleNames.ts';

type HowItWent = Pick<ResultLines['resultShown'], 'outcome' | 'symptom'>;

/** Symptoms that the outcome's own word says already. */
const SAID_BY_OUTCOME: readonly SymptomId[] = [
  'doublePattern',
  'shallowAllRound',
  'flaking',
  'bentPart',
  'pinSeized',
];

/** `double`, `tapered`, or just how it went. */
export const howItWent = ({ outcome, symptom }: HowItWent): string => {
  if (symptom === null || SAID_BY_OUTCOME.includes(symptom)) return outcome;
  return symptomNames[symptom];
};

const counted = (count: number): string => `${String(count)} ${count === 1 ? 'result' : 'results'}`;
const list = (items: readonly string[]): string => items.join(', ');

const TEACHES_NOT: { readonly [W in ResultLines['resultTeachesNot']['why']]: string } = {
  noCrest: 'Nothing to learn of the growth: no crest was measured.',
  noHeight:
    'Nothing to learn of the growth yet: the crest alone cannot tell growth from depth. Add the tooth height, or the flat on the crests.',
  cut: 'A cut knurl does not grow: nothing to learn.',
  spoiled: 'A part without sound teeth says nothing of the growth: nothing to learn of it.',
  tooLittle: 'The tooth is too shallow to tell its growth: nothing to learn.',
  oldCard: 'The card is of an older program: the result is kept, and not held against it.',
};

export const resultLines: {
  readonly [K in keyof ResultLines]: (values: ResultLines[K], show: Show) => string;
} = {
  growthStands: ({ results, ofFamily, doubted, pattern, group }) => {
    const waits = doubted === 1 ? 'waits' : 'wait';
    const more = results === 0 ? counted(doubted) : `${String(doubted)} more`;
    const waiting = doubted === 0 ? '' : ` ${more} ${waits} to be confirmed.`;
    return results === 0
      ? `Growth as usual: no results of this shop behind it yet.${waiting}`
      : `Growth by ${counted(results)} of this shop, ${String(ofFamily)} of a ${patternName(pattern)} in ${group}.${waiting}`;
  },
  resultDone: ({ did, result, code, ...went }) =>
    `${result} ${did}: ${howItWent(went)}, card ${code}.`,
  resultWithdrawn: ({ result, code, ...went }) =>
    `${result} withdrawn: ${howItWent(went)}, card ${code}. It stays in the records, and nothing goes by it any more.`,
  resultShown: ({ result, code, ...went }) => `${result}: ${howItWent(went)}, card ${code}`,
  resultsListed: ({ count, waiting }) =>
    waiting
      ? `${counted(count)} ${count === 1 ? 'waits' : 'wait'} to be confirmed:`
      : `The last ${counted(count)}:`,
  resultsNone: ({ waiting, line }) =>
    waiting ? 'No result waits to be confirmed.' : `No results yet. Log one: ${line}`,
  resultNoDoubt: ({ result, learned }) =>
    learned
      ? `${result} does not wait: the cards learn from it already.`
      : `${result} does not wait: it says nothing of the growth.`,
  resultLogged: ({ by, ...moment }) => `Logged by ${by}, ${momentText(moment)}.`,
  resultChanged: ({ by, verb, ...moment }) =>
    `${verb === 'removed' ? 'Withdrawn' : 'Changed'} by ${by}, ${momentText(moment)}.`,
  resultTeachesNot: ({ why }) => TEACHES_NOT[why],
  resultWaits: ({ result, share, low, high }, show) =>
    `Kept, and not learned from yet: it grew ${show.percent(share)} of the static growth, and ${show.percent(low)} to ${show.percent(high)} was to be expected. An engineer who has looked at it confirms it: /knurl result confirm ${result}`,
  resultExpects: ({ mean, ofFamily, pattern, group }, show) => {
    const family = `a ${patternName(pattern)} in ${group}`;
    const such = ofFamily === 1 ? 'such result' : 'such results';
    const behind =
      ofFamily === 0 ? 'with no such result behind it' : `by ${String(ofFamily)} ${such}`;
    return `The next card of ${family} expects ${show.percent(mean)} of the static growth, ${behind}.`;
  },
  resultOthers: ({ learned, doubted }) =>
    [
      ...(learned.length === 0 ? [] : [`Learned from now as well: ${list(learned)}.`]),
      ...(doubted.length === 0 ? [] : [`To be confirmed now: ${list(doubted)}.`]),
    ].join(' '),
  resultCauseCounts: ({ cause, symptom }) =>
    `Counted from now on where the trouble is ${symptomNames[symptom]}: ${causeNames[cause]}.`,
  troubleCounts: ({ results }) =>
    `${results === 1 ? '1 cause' : `${String(results)} causes`} that this shop has found ${results === 1 ? 'is' : 'are'} counted in.`,
};

export const resultRows: {
  readonly [K in keyof ResultRows]: (values: ResultRows[K], show: Show) => LabelledText;
} = {
  resultGrowth: ({ share, expected }, show) => ({
    label: 'Growth',
    text:
      expected === null
        ? `${show.percent(share)} of the static growth`
        : `${show.percent(share)} of the static growth, ${show.percent(expected)} expected`,
  }),
  resultWheel: ({ wheel, parts, run }) => ({
    label: 'Wheel',
    text: `${wheel}: ${String(run)} ${run === 1 ? 'part' : 'parts'} run${parts === 0 ? '' : ` (${String(Math.abs(parts))} ${parts < 0 ? 'fewer' : 'more'})`}`,
  }),
  resultCause: ({ cause }) => ({ label: 'Cause', text: causeNames[cause] }),
  resultNote: ({ note }) => ({ label: 'Note', text: note }),
  resultListed: ({ result, code, teeth, crest, share, waits, by, moment, ...went }, show) => ({
    label: result,
    text: [
      howItWent(went),
      `card ${code}`,
      ...(teeth === null ? [] : [`${String(teeth)} teeth`]),
      ...(crest === null ? [] : [`crest ${show.length(crest)}`]),
      ...(share === null ? [] : [`growth ${show.percent(share)}`]),
      ...(waits ? ['waits to be confirmed'] : []),
      `${by}, ${momentText(moment)}`,
    ].join(', '),
  }),
};

export const resultLabels: {
  readonly [K in keyof ResultLabels]: (values: ResultLabels[K], show: Show) => string;
} = {
  logResult: () => 'Log the result',
  correctResult: () => 'Correct it',
  withdrawResult: ({ result }) => `Withdraw ${result}`,
  confirmResult: ({ result }) => `Confirm ${result}`,
  causeFound: () => 'Cause found',
  heightMeasured: () => 'Add the tooth height',
  whatIsBehind: ({ symptom }) => `Trouble: ${symptomNames[symptom]}`,
  cardOf: ({ code }) => `Card ${code}`,
  resultsWaiting: () => 'What waits to be confirmed',
};
