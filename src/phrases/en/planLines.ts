import type { CandidateSaid, PlanLabels, PlanLines, PlanRows } from '../../card/planLines.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { checkNames } from './checkNames.ts';
import { remedyLabel } from './remedies.ts';

/** A chance in whole per cent; never a certainty it is not. */
const chance = (share: number): string => {
  const percent = Math.round(share * 100);
  return `${String(Math.min(99, Math.max(1, percent)))} %`;
};

const limitedBy = (said: CandidateSaid): string =>
  said.limitedBy === 'turning' ? 'the turning' : checkNames[said.limitedBy].toLowerCase();

const made = (said: CandidateSaid): string => (said.process === 'cut' ? ', cut' : '');

const setUp = (said: CandidateSaid, show: Show): string =>
  `${show.length(said.blankDiameter)}, ${String(said.toothCount)} teeth, wheel ${said.wheel}${made(said)}`;

const odds = (said: CandidateSaid): string =>
  `tracks ${chance(said.chanceTracks)}, lands ${chance(said.chanceLands)}`;

type PlanPhrases = {
  readonly [K in keyof PlanLines]: (values: PlanLines[K], show: Show) => string;
};

export const planLines: PlanPhrases = {
  planBest: (said, show) => `Turn to ${setUp(said, show)}: ${odds(said)}`,
  planNone: ({ limits }, show) =>
    `Nothing in the crib passes for ${show.span(limits.low, limits.high)} ${show.units} as it was asked.`,
  planFor: ({ limits, wheels }, show) =>
    `For a finished ${show.span(limits.low, limits.high)} ${show.units}; ${String(wheels)} ${wheels === 1 ? 'wheel suits' : 'wheels suit'}.`,
  planCribByStandard: () =>
    'No wheels are entered yet: the crib is the DIN 403 table and the DP wheels.',
  planCribOneWheel: () => 'Planned for the wheel that was named.',
  planOffMiddle: () =>
    'No count meets the middle of the limits; this one lies inside them, off it.',
  planRemedy: ({ kind, number, candidate }, show) =>
    `${remedyLabel(kind, number, show)}, then it passes: ${setUp(candidate, show)}; ${odds(candidate)}.`,
  planWider: ({ side, by, limits, candidate }, show) =>
    `Limits ${show.length(by, 'up')} wider ${side}, ${show.span(limits.low, limits.high)}: ${setUp(candidate, show)}; ${odds(candidate)}.`,
  planOtherPitch: ({ pitch, candidate }, show) =>
    `Another pitch, ${show.both(pitch)}: ${setUp(candidate, show)}; ${odds(candidate)}.`,
  planCut: (said, show) => `Cut instead: ${setUp(said, show)}; ${odds(said)}.`,
};

export const planLabels: {
  readonly [K in keyof PlanLabels]: (values: PlanLabels[K], show: Show) => string;
} = {
  candidateWith: ({ kind, number, toothCount }, show) =>
    `${remedyLabel(kind, number, show)}: ${String(toothCount)} teeth`,
  otherPitch: ({ pitch, toothCount }, show) =>
    `Pitch ${show.length(pitch)}: ${String(toothCount)} teeth`,
  planWith: ({ limits }, show) => `Limits ${show.span(limits.low, limits.high)}`,
  candidateCut: ({ toothCount }) => `Cut it: ${String(toothCount)} teeth`,
};

export const planRows: {
  readonly [K in keyof PlanRows]: (values: PlanRows[K], show: Show) => LabelledText;
} = {
  candidate: (said, show) => ({
    label: `${String(said.place)}. ${said.state === 'stop' ? 'stop' : said.state}`,
    text: `${show.both(said.blankDiameter)}, ${String(said.toothCount)} teeth, fill ${show.percent(said.fill)}${made(said)}; wheel ${said.wheel}; ${odds(said)}; limited by ${limitedBy(said)}`,
  }),
};
