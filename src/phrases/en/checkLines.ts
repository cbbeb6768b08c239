import type { CheckLines, CheckRows } from '../../card/checkLines.ts';
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

const nextPart = (move: CheckLines['nextPart']['move'], show: Show): string => {
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
      return `Next part: feed in ${show.both(amount(move))} more.`;
    case 'feedLess':
      return `Next part: feed in ${show.both(amount(move))} less.`;
    case 'logGrowth':
      return `Next part: it grows to ${show.percent(amount(move))} of the static growth; log the result so that the cards learn it.`;
    case 'swivel':
      return `Next part: swivel the tool by ${show.angle(amount(move))}.`;
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
  blankTooSmall: ({ diameter, toothError }, show) =>
    `${show.length(diameter)} is ${show.teeth(toothError)} of a tooth off, and no smaller whole count is left`,
  chanceTracks: ({ chance }, show) =>
    `By the label alone it tracks ${show.percent(chance)} of the time; a seam test settles it.`,
  seamWhole: ({ diameter }, show) => `Leave it at ${show.length(diameter)}: the seam is whole`,
  seamTurnTo: ({ diameter, takeOff }, show) =>
    `Turn ${show.length(takeOff)} off: to ${show.length(diameter)}   [${show.other(diameter)}]`,
  seamChance: ({ chance, byLabel }, show) =>
    `Tracks ${show.percent(chance)} of the time; by the label alone ${show.percent(byLabel)}.`,
  seamMarksStay: () => 'The marks stay: they lie in the pattern that follows, or on scrap.',
  seamProven: ({ effectivePitch, count, diameter }, show) =>
    `Wheel proven: pitch ${show.both(effectivePitch)} round the rim. Say it again as: proven ${String(count)} at ${show.length(diameter)}.`,
  seamStep: ({ step, bite }, show) =>
    SEAM_STEPS[step](bite === null ? 'lightly' : show.length(bite, 'up')),
  partRight: ({ blank, toothCount }, show) =>
    `Right: ${String(toothCount)} teeth on ${show.length(blank)}`,
  partOff: ({ off }) => `Off: ${off.map((figure) => OFF[figure]).join(' and ')}`,
  thisPart: ({ move }, show) => thisPart(move, show),
  nextPart: ({ move }, show) => nextPart(move, show),
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
    label: 'Count',
    text: `${String(counted)} counted, ${String(expected)} worked out`,
  }),
  crestSeen: ({ crest, low, high }, show) => ({
    label: 'Crest',
    text: `${show.both(crest)} measured, ${show.span(low, high)} expected`,
  }),
  growthSeen: ({ growth, factor }, show) => ({
    label: 'Growth',
    text: `${show.both(growth)}, ${show.percent(factor)} of the static growth`,
  }),
  fillSeen: ({ measured, fromCrest }, show) => ({
    label: 'Fill',
    text: [
      measured === null ? null : `${show.percent(measured)} by the tooth`,
      fromCrest === null ? null : `${show.percent(fromCrest)} by the crest`,
    ]
      .filter((part) => part !== null)
      .join(', '),
  }),
};
