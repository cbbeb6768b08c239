import { mPerMin } from '../../calc/units.ts';
import type { OutOfRangeRefusal, Refusal, Suggestion } from '../../refusal.ts';
import type { Book } from '../book.ts';
import type { Show } from '../show.ts';
import { thing } from './names.ts';

/** Words of a refusal are shown, never obeyed; a very long one is shortened. */
const quoted = (word: string): string => `“${word.length > 30 ? `${word.slice(0, 29)}…` : word}”`;

const list = (items: readonly string[]): string =>
  items.length <= 1
    ? (items[0] ?? '')
    : `${items.slice(0, -1).join(', ')} or ${items.at(-1) ?? ''}`;

/** A limit so large that it only says that there is one. */
const isOpen = (value: number): boolean => Math.abs(value) > 1e5;

const amount = (value: number, unit: string, show: Show): string => {
  if (isOpen(value)) return 'far too much';
  switch (unit) {
    case 'mm':
      return show.length(value);
    case 'rad':
      return show.angle(value);
    case 'm/min':
      return show.speed(mPerMin(value));
    case 'mm/rev':
      return show.feed(value);
    case 'rev/min':
      return show.rotation(value);
    default:
      return show.number(value);
  }
};

type Because = (refusal: OutOfRangeRefusal, print: (value: number) => string) => string;

/** Where both values come from the person, the sentence names both. */
const BECAUSE: Readonly<Record<string, Because>> = {
  bore: ({ value, max }, print) =>
    `The bore, ${print(value)}, does not fit into the blank, ${print(max)}. Type a smaller bore, or the right diameter.`,
  wall: ({ value, min }, print) =>
    `The wall left under the teeth, ${print(value)}, is thinner than the tooth is high, ${print(min)}. Take a finer pitch, less fill or a smaller bore.`,
  stickout: ({ value, min, max }, print) =>
    value < min
      ? `The stickout, ${print(value)}, is shorter than the knurl, ${print(min)}. Type a longer stickout or a shorter knurl.`
      : `The stickout, ${print(value)}, is longer than the bar can be, ${print(max)}. Type a shorter one.`,
  crestDiameter: ({ value, min, max }, print) =>
    value < min
      ? `The crest, ${print(value)}, is smaller than the blank it grew from, ${print(min)}. Measure over several crests and type it again.`
      : `The crest, ${print(value)}, is larger than this tooth can raise it, ${print(max)}. Measure it again, or check the blank.`,
};

const outOfRange = (refusal: OutOfRangeRefusal, show: Show): string => {
  const { what, value, min, max, unit } = refusal;
  if (what === 'textLength')
    return `That is ${String(value)} characters; a request fits in ${String(max)}. Say the bar, the pattern and the pitch, such as 1.000 straight 21tpi.`;
  if (Number.isNaN(value)) return `The ${thing(what)} is missing.`;
  if (what === 'fill')
    return `The ${thing(what)} of ${show.percent(value)} is outside ${show.percent(min)} to ${show.percent(max)}. Type one between them, such as fill 85%.`;
  const because = BECAUSE[what];
  if (because !== undefined) return because(refusal, (each) => amount(each, unit, show));
  const limits = isOpen(max)
    ? `at least ${amount(min, unit, show)}`
    : `${amount(min, unit, show)} to ${amount(max, unit, show)}`;
  const problem = value < min ? 'too small' : 'too large';
  return `The ${thing(what)}, ${amount(value, unit, show)}, is ${problem}: it has to be ${limits}. Type one that is.`;
};

/** Why two things that were said exclude each other. */
export const contradictions: Book['contradictions'] = {
  handNeedsDiagonal: 'Left and right belong to a diagonal knurl.',
  pointsNeedCrossing: 'Raised and sunk belong to crossed patterns, diamond or square.',
  helixNeedsHelical: 'A straight or square knurl has no helix.',
  tiltAndHelix: 'A helical wheel has its helix, a straight one is set over; not both.',
  tiltNotSquare: 'A square pattern comes from one crossed wheel, which is not set over.',
  classNeedsDp: 'A class is defined for 64, 96, 128 and 160 DP.',
  classStraightOnly:
    'Classes II and III are for straight knurls only; class I for straight, diagonal and raised diamond.',
  squareEdgeHasNoBevel: 'A square edge has no bevel.',
  speedTwice: 'Surface speed and spindle speed fix each other.',
  feedTwice: 'Feed and turns fix each other.',
  countAndAsIs: 'As-is keeps the bar; a tooth count turns it.',
  limitsReversed: 'The limits are the wrong way round.',
};

const asked = (readings: readonly Suggestion[]): string => {
  const labels = readings.map((reading) => reading.label);
  return labels.length === 1 ? `Did you mean ${list(labels)}?` : `Which one: ${list(labels)}?`;
};

export const refusal = (fault: Refusal, show: Show): string => {
  switch (fault.code) {
    case 'unreadable':
      return fault.nearest.length > 0
        ? `${quoted(fault.word)} is not a word I know. Did you mean ${list(fault.nearest)}?`
        : `${quoted(fault.word)} is not a word I know. Leave it out, or type help for what I read.`;
    case 'missing':
      return `The ${thing(fault.parameter)} is missing. Add one, such as ${list(fault.examples)}.`;
    case 'outOfRange':
      return outOfRange(fault, show);
    case 'unclear':
      if (fault.because !== undefined)
        return `${contradictions[fault.because]} ${asked(fault.readings)}`;
      return fault.readings.length > 0
        ? `The ${thing(fault.what)} could mean more than one thing: ${list(fault.readings.map((reading) => reading.label))}. Which one?`
        : `The ${thing(fault.what)} is unclear. Say it another way.`;
    case 'notAllowed':
      return fault.people.length > 0
        ? `That needs the role ${fault.role}. Ask ${list(fault.people)}.`
        : `That needs the role ${fault.role}, which nobody has yet.`;
    case 'notFound':
      return fault.nearest.length > 0
        ? `There is no such ${thing(fault.what)} here. Did you mean ${list(fault.nearest)}?`
        : `There is no such ${thing(fault.what)} here. Check the name, or leave it out.`;
    case 'stale':
      return `The ${thing(fault.what)} was changed by ${fault.by} at ${fault.when}. Look at it again, then repeat your change.`;
    case 'unavailable':
      return `The ${thing(fault.what)} cannot be reached just now. Nothing was changed. Send this again in a minute: ${fault.words}`;
  }
};
