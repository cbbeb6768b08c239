import { mPerMin } from '../../calc/units.ts';
import type {
  Doubt,
  InUse,
  NotFound,
  OutOfRangeRefusal,
  QuestionStands,
  Refusal,
  Suggestion,
  Unclear,
} from '../../refusal.ts';
import type { Book } from '../book.ts';
import type { Rounding, Show } from '../show.ts';
import { thing } from './names.ts';
import { cardStopped, fourEyes, notNow, stale } from './standardRefusals.ts';

/** Words of a refusal are shown, never obeyed; a very long one is shortened. */
const quoted = (word: string): string => `“${word.length > 30 ? `${word.slice(0, 29)}…` : word}”`;

const list = (items: readonly string[]): string =>
  items.length <= 1
    ? (items[0] ?? '')
    : `${items.slice(0, -1).join(', ')} or ${items.at(-1) ?? ''}`;

/** A limit so large that it only says that there is one. */
const isOpen = (value: number): boolean => Math.abs(value) > 1e5;

/** A number of at most four figures, rounded so that a limit typed back is inside it. */
const figures = (value: number, rounding: Rounding, show: Show): string => {
  if (rounding === 'nearest' || Number.isInteger(value)) return show.number(value);
  const scale = 10 ** (3 - Math.floor(Math.log10(Math.abs(value))));
  const steps = value * scale;
  return String((rounding === 'up' ? Math.ceil(steps) : Math.floor(steps)) / scale);
};

const amount = (
  value: number,
  unit: string,
  show: Show,
  rounding: Rounding = 'nearest',
): string => {
  if (isOpen(value)) return 'far too much';
  switch (unit) {
    case 'mm':
      return show.length(value, rounding);
    case 'rad':
      return show.angle(value);
    case 'm/min':
      return show.speed(mPerMin(value));
    case 'mm/rev':
      return show.feed(value);
    case 'rev/min':
      return show.rotation(value);
    default:
      return figures(value, rounding, show);
  }
};

type Because = (refusal: OutOfRangeRefusal, print: (value: number) => string) => string;

/** Where both values come from the person, the sentence names both. */
const BECAUSE: Readonly<Record<string, Because>> = {
  bore: ({ value, max }, print) =>
    `The bore, ${print(value)}, is not smaller than the diameter, ${print(max)}. Type a smaller bore, or the right diameter.`,
  wall: ({ value, min }, print) =>
    value <= 0
      ? `The bore reaches ${print(-value)} into the teeth; the wall under them has to be ${print(min)} at least, as thick as the tooth is high. Take a smaller bore, or a finer pitch.`
      : `The wall left under the teeth, ${print(value)}, is thinner than the tooth is high, ${print(min)}. Take a finer pitch, less fill or a smaller bore.`,
  stickout: ({ value, min, max }, print) =>
    value < min
      ? `The stickout, ${print(value)}, is shorter than the knurl, ${print(min)}. Type a longer stickout or a shorter knurl.`
      : `The stickout, ${print(value)}, is longer than the bar can be, ${print(max)}. Type a shorter one.`,
  quietHours: () =>
    'Quiet hours take a part of the day and leave at least 4 hours of it. Type them like this: quiet 22:00-06:00.',
  crestDiameter: ({ value, min, max }, print) =>
    value < min
      ? `The crest, ${print(value)}, is smaller than the blank it grew from, ${print(min)}. Measure over several crests and type it again.`
      : `The crest, ${print(value)}, is larger than this tooth can raise it, ${print(max)}. Measure it again, or check the blank.`,
};

const outOfRange = (refusal: OutOfRangeRefusal, show: Show): string => {
  const { what, value, min, max, unit } = refusal;
  if (what === 'textLength')
    return `That is ${String(value)} characters; a request fits in ${String(max)}. Say the bar, the pattern and the pitch, such as 1.000 straight 21tpi.`;
  if (what === 'wanted')
    return `That is ${String(value)} characters to look for. Say it in a few words; at most ${String(max)} characters.`;
  if (unit === 'characters')
    return `The ${thing(what)} has ${String(value)} characters; at most ${String(max)} are kept. Make it shorter.`;
  if (Number.isNaN(value)) return `The ${thing(what)} is missing.`;
  if (what === 'fill')
    return `The ${thing(what)} of ${show.percent(value)} is outside ${show.percent(min)} to ${show.percent(max)}. Type one between them, such as fill 85%.`;
  // What was read and stands alone is judged by itself, not against something else that was said.
  const because = refusal.start === undefined ? BECAUSE[what] : undefined;
  if (because !== undefined) return because(refusal, (each) => amount(each, unit, show));
  const low = amount(min, unit, show, 'up');
  const limits = isOpen(max)
    ? `of ${low} or more`
    : `from ${low} to ${amount(max, unit, show, 'down')}`;
  const problem = value < min ? 'too small' : 'too large';
  const typed = refusal.word === undefined ? '' : `${quoted(refusal.word)}: `;
  const subject = typed === '' ? 'The' : 'the';
  return `${typed}${subject} ${thing(what)}, ${amount(value, unit, show)}, is ${problem}. Type one ${limits}.`;
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

/** What makes it a question, before the question itself. */
const doubts: { readonly [D in Doubt]: (word: string, fault: Unclear) => string } = {
  saidTwice: (_, { what }) => `The ${thing(what)} was said twice, and differently.`,
  noUnit: (word, { what, readings }) =>
    readings.length > 1
      ? `${word} has no unit, and more than one makes sense.`
      : `${word} without a unit is no likely ${thing(what)} here.`,
  unitOrWord: (word) => `${word}: inches, or a number and the word in?`,
  unitOfTwo: (word) => `${word} means different things in different shops.`,
  commaOrThousands: (word) => `${word} can be a decimal or thousands.`,
  commaOrTwo: (word) => `${word} can be one number or two.`,
  keywordBetween: (word) => `${word} can be read from either end.`,
  sizeByWhat: (word) => `${word}: it does not say what the sizes are of.`,
  limitsOfWhat: (word) => `${word} has limits, but not what they are of.`,
  whichAngle: (word) => `${word} does not say which angle it is.`,
  wholeNumber: (word, { what }) => `${word}: the ${thing(what)} is a whole number.`,
  oneOfRange: (word) => `${word} is a range; the card is worked out for one value.`,
  gradeOnly: (word) => `${word} is not the same pitch in every shop.`,
  familyOnly: (_, { what }) => `More than one ${thing(what)} answers to that.`,
  calloutAgainst: (_, { what }) =>
    `The callout and the words beside it disagree about the ${thing(what)}.`,
};

const isDoubt = (because: NonNullable<Unclear['because']>): because is Doubt => because in doubts;

const whyUnclear = (fault: Unclear): string => {
  const { because, word } = fault;
  if (fault.what === 'asked') return 'It does not say which question.';
  if (because === undefined) return `The ${thing(fault.what)} is not clear.`;
  return isDoubt(because)
    ? doubts[because](word === undefined ? 'That' : quoted(word), fault)
    : contradictions[because];
};

const asked = (readings: readonly Suggestion[]): string => {
  const labels = readings.map((reading) => reading.label);
  if (labels.length === 0) return 'Say it another way.';
  return labels.length === 1 ? `Did you mean ${list(labels)}?` : `Which one: ${list(labels)}?`;
};

const notFound = ({ what, word, nearest }: NotFound): string => {
  const name = word === undefined ? '' : ` ${quoted(word)}`;
  if (what === 'asked')
    return nearest.length > 0
      ? `There is no question${name} here. Did you mean ${list(nearest)}?`
      : `There is no question${name} here. /knurl questions lists those that are open.`;
  if (what === 'stranger')
    return `I cannot tell who${name} is here. Type @ and pick them from what is offered, such as /shop people add @${nearest[0] ?? 'Mara'} engineer.`;
  if (nearest.length > 0)
    return `There is no ${thing(what)}${name} here. Did you mean ${list(nearest)}?`;
  if (what === 'material')
    return `There is no material${name} in the table, and it is no likely size. Name the nearest one there is, such as 4140, and its hardness, such as HB 210.`;
  if (what === 'wheel')
    return `There is no wheel${name} here. Give its size, such as wheel 20x8x6, or leave it out.`;
  return `There is no ${thing(what)}${name} here. Check the name, or leave it out.`;
};

export const refusal = (fault: Refusal, show: Show): string => {
  switch (fault.code) {
    case 'unreadable':
      return fault.nearest.length > 0
        ? `${quoted(fault.word)} is not a word I know. Did you mean ${list(fault.nearest)}?`
        : `${quoted(fault.word)} is not a word I know. Say it another way or leave it out; help shows what I read.`;
    case 'missing':
      if (fault.word !== undefined)
        return `${quoted(fault.word)} does not say the ${thing(fault.parameter)}. Type it like this: ${list(fault.examples)}.`;
      return `The ${thing(fault.parameter)} is missing. Add one, such as ${list(fault.examples)}.`;
    case 'outOfRange':
      return outOfRange(fault, show);
    case 'unclear':
      return `${whyUnclear(fault)} ${asked(fault.readings)}`;
    case 'notAllowed':
      if (fault.asker !== undefined) return notTheirs(fault.asker, fault.role, fault.people);
      return fault.people.length > 0
        ? `That needs the role ${fault.role}. Ask ${list(fault.people)}.`
        : `That needs the role ${fault.role}, which nobody has yet.`;
    case 'notFound':
      return notFound(fault);
    case 'stale':
      return stale(fault);
    case 'unavailable':
      return `The ${thing(fault.what)} cannot be reached just now. Nothing was changed. Send this again in a minute: ${fault.words}`;
    case 'taken':
      return `There is a ${thing(fault.what)} ${quoted(fault.name)} already. Choose another name, or change that one.`;
    case 'inUse':
      return inUse(fault);
    case 'lastOwner':
      return `${fault.name} is the only owner. Name another owner first.`;
    case 'questionStands':
      return questionStands(fault);
    case 'notNow':
      return notNow(fault);
    case 'fourEyes':
      return fourEyes(fault);
    case 'cardStopped':
      return cardStopped(fault);
  }
};

const notTheirs = (asker: string, role: string, people: readonly string[]): string =>
  `That is for ${asker}, who asked, or for the role ${role}${people.length === 0 ? '' : `: ${list(people)}`}.`;

const questionStands = ({ question, state, move, words }: QuestionStands): string => {
  const said = words === '' ? '' : ` Your words: ${words}`;
  if (move === 'reopen')
    return `Question ${question} was not answered yet: it is open as it is. Nothing was changed.${said}`;
  if (state === 'solved')
    return move === 'answer'
      ? `Question ${question} is solved and takes no more answers. Reopen it, then send yours again.${said}`
      : `Question ${question} is solved already. Reopen it first, if that is not what solved it.${said}`;
  return `Question ${question} has no answer yet. Say what solved it, such as /knurl solved ${question} the wheel was worn.`;
};

const USES = { rule: 'rule', card: 'card' } as const;

const inUse = ({ what, name, where, more }: InUse): string => {
  const uses = where.map((use) => `${USES[use.what]} ${use.name}`);
  const all = more ? `${uses.join(', ')} and others` : uses.join(', ');
  return `The ${thing(what)} ${quoted(name)} is used by ${all}. They keep what they say; add the words even in use to remove it all the same.`;
};
