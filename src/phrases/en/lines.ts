import type { Check, CheckName, CheckOf } from '../../calc/index.ts';
import type { Book } from '../book.ts';
import type { Show } from '../show.ts';
import { checkLines } from './checkLines.ts';
import { checks } from './checks.ts';
import { convertLines } from './convertLines.ts';
import { findLines } from './findLines.ts';
import { patternName, pitchName, wheelName } from './names.ts';
import { planLines } from './planLines.ts';
import { questionLines } from './questionLines.ts';
import { recordLines } from './recordLines.ts';
import { remedyLabel } from './remedies.ts';
import { resultLines } from './resultLines.ts';
import { shopLines } from './shopLines.ts';
import { standardLines } from './standardLines.ts';
import { todayLines } from './todayLines.ts';
import { troubleLines } from './troubleLines.ts';
import { whyLines } from './whyLines.ts';

const teeth = (count: number): string => `${String(count)} ${count === 1 ? 'tooth' : 'teeth'}`;
const inSentence = (label: string): string => label.charAt(0).toLowerCase() + label.slice(1);
const under = (error: number): string => (error < 0 ? 'under' : 'over');

/** The sentence of whatever check this is. */
const sayCheck = <N extends CheckName>(check: CheckOf<N>, show: Show): string =>
  checks[check.name].say(check, show);

const stopText = (check: Check, show: Show): string =>
  `${checks[check.name].label}: ${sayCheck(check, show)}`;

export const lines: Book['lines'] = {
  ...checkLines,
  ...convertLines,
  ...findLines,
  ...planLines,
  ...questionLines,
  ...recordLines,
  ...resultLines,
  ...shopLines,
  ...standardLines,
  ...todayLines,
  ...troubleLines,
  ...whyLines,
  turnTo: ({ blankDiameter, toothCount }, show) =>
    `Turn to ${show.length(blankDiameter)}: ${teeth(toothCount)}   [${show.other(blankDiameter)}]`,
  leaveAt: ({ blankDiameter, toothCount }, show) =>
    `Leave it at ${show.length(blankDiameter)}: ${teeth(toothCount)}   [${show.other(blankDiameter)}]`,
  stopped: ({ check }, show) => `Do not run this. ${stopText(check, show)}`,
  passesWith: ({ remedies }, show) =>
    `Would lift it: ${remedies.map(({ kind, number }) => inSentence(remedyLabel(kind, number, show))).join('; or ')}.`,
  wouldTurnTo: ({ blankDiameter, toothCount }, show) =>
    `Worked out for ${show.length(blankDiameter)}, ${teeth(toothCount)}   [${show.other(blankDiameter)}]`,
  windowTracks: ({ low, high }, show) => `${show.span(low, high)} tracks.`,
  leaveItOption: ({ stock, toothCount, toothError }, show) =>
    `Or leave it at ${show.length(stock)}: ${teeth(toothCount)}, ${show.teeth(toothError)} of a tooth ${under(toothError)}. (as-is)`,
  asItIs: ({ stock, toothError }, show) =>
    `The bar as it is, ${show.length(stock)}: ${show.teeth(toothError)} of a tooth ${under(toothError)}.`,
  finishMet: ({ limits, fillMoved, fill }, show) =>
    fillMoved
      ? `For a finished ${show.span(limits.low, limits.high)}: fill moved to ${show.percent(fill)}.`
      : `For a finished ${show.span(limits.low, limits.high)}.`,
  finishAimed: ({ size }, show) =>
    `Aimed at ${show.both(size)} over the crests; no limits were said, so none were checked.`,
  plateTaken: ({ thickness, crest }, show) =>
    `Plating of ${show.both(thickness)} to come: ${show.both(crest)} over the crests then.`,
  pitchTaken: ({ took, toothCount, otherCount }) => {
    const here = took === 'normal' ? 'square to the teeth' : 'along the rim';
    const there = took === 'normal' ? 'along the rim' : 'square to the teeth';
    const other = otherCount === null ? '' : ` Meant ${there}: ${String(otherCount)}.`;
    return `Pitch taken ${here}: ${teeth(toothCount)}.${other}`;
  },
  helixTaken: ({ helix }, show) => `Helix ${show.angle(helix)} taken.`,
  wheelNeeded: ({ wheel, pattern }) => `Takes ${wheelName[wheel]} (${patternName(pattern)}).`,
  calloutBar: ({ stock }, show) =>
    `${show.length(stock)} taken as the bar; a drawing's size is the finished one: say finish and its limits.`,
  materialTaken: ({ name, condition }) => `No material named: ${name}, ${condition}, taken.`,
  processSwitched: ({ name }) => `${name} does not form: worked out as a cut knurl.`,
  labelOverruled: ({ label, counted, normal }, show) =>
    `Wheel as counted, ${teeth(counted.teeth)} on ${show.length(counted.diameter)}, goes before its label ${pitchName(label)}: pitch ${show.both(normal)}.`,
  wheelTaken: ({ wheel, edge }) => {
    const size = [wheel.diameter, wheel.face, wheel.bore]
      .map((part) => String(Number(part.toFixed(2))))
      .join(' x ');
    return `Wheel ${size} mm, ${edge === 'square' ? 'square edges' : edge === 'convex' ? 'convex edges' : 'bevelled'}, taken; yours?`;
  },
  classWindow: ({ knurlClass }) => `The window is the blank tolerance of class ${knurlClass}.`,
  feedNeedsLength: () =>
    'The feed goes with a wheel that travels: add the length, such as long 1.5.',
  startHalfOn: ({ chamfer, clearance }, show) =>
    `Start with half the wheel on the work. Lead chamfer ${show.length(chamfer)} or more; leave ${show.length(clearance)} to a shoulder.`,
  helpIntro: () => 'Say the bar, the pattern and the pitch; add the material. Words in any order.',
  helpVerb: ({ verb, line: example }) => `${verb}: ${example}`,
  helpExample: ({ line: example }) => example,
};
