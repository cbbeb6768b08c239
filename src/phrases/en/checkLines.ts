import type { CheckLabels, CheckLines, CheckRows } from '../../card/checkLines.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';

const side = (error: number): string => (error < 0 ? 'under' : 'over');
const amount = (move: { readonly number: number | null }): number => move.number ?? 0;

type CheckPhrases = {
  readonly [K in keyof CheckLines]: (values: CheckLines[K], show: Show) => string;
};

const OFF: Readonly<Record<CheckLines['partOff']['off'][number], string>> = {
  count: 'the count',
  fill: 'the fill',
  growth: 'the growth',
  fillOrGrowth: 'fill or growth',
  taper: 'the depth along the length',
};

const SEAM_STEPS: Readonly<Record<CheckLines['seamStep']['step'], (bite: string) => string>> = {
  1: () => '1. Drive out, power off, one wheel only.',
  2: (bite) => `2. Press the wheel in ${bite}, turn the work once round by hand, back out.`,
  3: () => '3. Look where the last mark meets the first: how much of a pitch is the odd gap?',
  4: () => '4. Send it: seam 0.3, with the count if you counted, scrap if the marks may stay.',
};

/** A chance in whole per cent; never a certainty it is not. */
const odds = (share: number): string =>
  `${String(Math.min(99, Math.max(1, Math.round(share * 100))))} %`;

/** What to do to this part, short enough to stand in front. */
const inShort = ({ move, flat }: Pick<CheckLines['partOff'], 'move' | 'flat'>, show: Show) => {
  switch (move.id) {
    case 'keep':
      return 'Keep it';
    case 'feedFurther':
      return `Feed in further, until the crests keep a flat of ${show.length(flat)}`;
    case 'measureFlat':
      return 'Measure the flat on the crests';
    case 'countAgain':
      return 'Count again';
    case 'turnDown':
      return `Turn it down to ${show.length(amount(move))} and knurl again`;
    case 'scrap':
      return 'Scrap it';
  }
};

const thisPart = (move: CheckLines['thisPart']['move'], show: Show): string => {
  switch (move.id) {
    case 'keep':
      return 'This part: keep it.';
    case 'feedFurther':
      return `This part: feed in ${show.both(amount(move))} further.`;
    case 'measureFlat':
      return `This part: measure the flat on the crests; ${show.length(amount(move))} means the fill is right and the growth differs.`;
    case 'countAgain':
      return `This part: count again; ${show.count(amount(move))} was worked out.`;
    case 'turnDown':
      return `This part: turn down to ${show.both(amount(move))} and knurl again.`;
    case 'scrap':
      return 'This part: no smaller blank still meets the print.';
  }
};

const nextPart = ({ move, flat }: CheckLines['nextPart'], show: Show): string => {
  switch (move.id) {
    case 'same':
      return 'Next part: the same again.';
    case 'useEffectivePitch':
      return `Next part: this wheel's pitch is ${show.both(amount(move))} round the rim.`;
    case 'turnBlank':
      return `Next part: turn the blank to ${show.both(amount(move))}.`;
    case 'biteAtLeast':
      return `Next part: first turn ${show.length(amount(move), 'up')} or more.`;
    case 'feedMore':
      return `Next part: feed in ${show.both(amount(move))} more, until the crests keep a flat of ${show.length(flat)}.`;
    case 'feedLess':
      return `Next part: stop while the crests keep a flat of ${show.length(flat)}, ${show.both(amount(move))} less infeed.`;
    case 'stopAtCrest':
      return `Next part: stop when it measures ${show.both(amount(move))} over the crests, and look at the flat there.`;
    case 'logGrowth':
      return `Next part: it grows ${show.percent(amount(move))} of the static growth; log the result so that the cards learn it.`;
    case 'swivel':
      return `Next part: swivel the tool by ${show.angle(Math.abs(amount(move)))}, the shallow end deeper.`;
    case 'support':
      return `Next part: support the bar; it gives by ${show.length(amount(move))}.`;
  }
};

export const checkLines: CheckPhrases = {
  blankTracks: ({ diameter, toothCount, toothError }, show) =>
    Math.abs(toothError) < 0.005
      ? `Leave it at ${show.length(diameter)}: ${String(toothCount)} teeth`
      : `Leave it at ${show.length(diameter)}: ${String(toothCount)} teeth, ${show.teeth(toothError)} of a tooth ${side(toothError)}`,
  blankDoesNot: ({ nextDiameter, nextToothCount, takeOff }, show) =>
    `Turn to ${show.length(nextDiameter)}: ${String(nextToothCount)} teeth; ${show.length(takeOff)} comes off`,
  blankIsOff: ({ diameter, toothCount, toothError }, show) =>
    `${show.length(diameter)} as it is: ${show.teeth(toothError)} of a tooth ${side(toothError)} ${String(toothCount)}.`,
  blankFewTeeth: ({ diameter, smallest }, show) =>
    `${show.length(diameter)} holds too few teeth to roll: take a finer pitch, or ${show.length(smallest, 'up')} or more`,
  blankTooSmall: ({ diameter, toothError }, show) =>
    `${show.length(diameter)} is ${show.teeth(toothError)} of a tooth off, and no smaller whole count is left`,
  chanceTracks: ({ chance }) =>
    `By the label alone it tracks ${odds(chance)} of the time; a seam test settles it.`,
  seamWhole: ({ diameter }, show) => `Leave it at ${show.length(diameter)}: the seam is whole`,
  seamTurnTo: ({ diameter, takeOff }, show) =>
    `Turn ${show.length(takeOff)} off: to ${show.length(diameter)}   [${show.other(diameter)}]`,
  seamChance: ({ chance, byLabel }) =>
    `Tracks ${odds(chance)} of the time; by the label alone ${odds(byLabel)}.`,
  seamMarksStay: () => 'The marks stay: they lie in the pattern that follows, or on scrap.',
  seamCountFar: ({ count, expected }) =>
    `${String(count)} counted, about ${String(expected)} by the label: too far apart. Count again before you turn.`,
  seamProven: ({ effectivePitch, count, diameter }, show) =>
    `Wheel proven: pitch ${show.both(effectivePitch)} round the rim. Say it from now on: proven ${String(count)} at ${show.length(diameter)}.`,
  seamStep: ({ step, bite }, show) => SEAM_STEPS[step](show.length(bite, 'up')),
  partRight: ({ blank, toothCount }, show) =>
    `Right, keep it: ${String(toothCount)} teeth on ${show.length(blank)}`,
  partOff: ({ off, move, flat }, show) => {
    const what = off.length === 0 ? 'the size' : off.map((figure) => OFF[figure]).join(' and ');
    return `${inShort({ move, flat }, show)}: ${what} ${off.length > 1 ? 'are' : 'is'} off`;
  },
  thisPart: ({ move }, show) => thisPart(move, show),
  nextPart: (values, show) => nextPart(values, show),
  nextCount: ({ blank, counted, diameter, expected }, show) =>
    `Next part: ${show.length(blank)} holds ${String(counted)} teeth as it is; for ${String(expected)} turn to ${show.both(diameter)}.`,
  rescue: ({ cleaned, diameter, toothCount, meetsPrint }, show) => {
    const print =
      meetsPrint === null ? '' : meetsPrint ? ', meets the print' : ', does not meet the print';
    return `Cleans up at ${show.length(cleaned)}; ${show.length(diameter)} then takes ${String(toothCount)} teeth${print}.`;
  },
  noRescue: ({ cleaned }, show) =>
    `Cleans up at ${show.length(cleaned)}; no whole count below it meets the print.`,
};

export const checkRows: {
  readonly [K in keyof CheckRows]: (values: CheckRows[K], show: Show) => LabelledText;
} = {
  countSeen: ({ counted, expected }) => ({
    label: 'Counted',
    text: `${String(counted)} counted, ${String(expected)} worked out`,
  }),
  crestSeen: ({ crest, low, high }, show) => ({
    label: 'Crests',
    text: `${show.both(crest)} measured, ${show.span(low, high)} expected`,
  }),
  growthSeen: ({ growth, factor }, show) => ({
    label: 'Grew',
    text: `${show.both(growth)}, ${show.percent(factor)} of the static growth`,
  }),
  fillSeen: ({ measured, fromCrest }, show) => ({
    label: 'Filled',
    text: [
      measured === null ? null : `${show.percent(measured)} by the tooth`,
      fromCrest === null ? null : `${show.percent(fromCrest)} by the crest`,
    ]
      .filter((part) => part !== null)
      .join(', '),
  }),
};

export const checkLabels: {
  readonly [K in keyof CheckLabels]: (values: CheckLabels[K], show: Show) => string;
} = {
  setUpAt: ({ diameter }, show) => `Set-up card at ${show.length(diameter)}`,
  withoutCount: () => 'Without the count',
};
