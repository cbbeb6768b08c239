import { ENGINEER, OPERATORS, SUPERVISOR } from './said.ts';
import { DAYS } from './season.ts';

/** What the shop decides and asks during its season, beside its batches. */
export type Decision = {
  /** Hours since the season began. */
  readonly at: number;
  readonly by: string;
  /** `{card QH-114}` is the code of the last card of that part, `{shallow}` that of a question. */
  readonly line: string;
  /** The name under which the question that is put up is spoken of afterwards. */
  readonly names?: string;
};

const [KIT, DOV, SANNA] = OPERATORS;
const LAST_DAY = DAYS - 1;

const on = (day: number, hour: number, by: string, line: string, names?: string): Decision => ({
  at: day * 24 + hour,
  by,
  line,
  ...(names === undefined ? {} : { names }),
});

/** A standard in each state it can be in. */
const STANDARDS: readonly Decision[] = [
  // Approved, and revised since: the first revision is superseded.
  on(8, 1, KIT, '/knurl standard propose QH-114 card {card QH-114}'),
  on(8, 2, SUPERVISOR, '/knurl standard approve QH-114'),
  on(
    27,
    3,
    SUPERVISOR,
    '/knurl standard revise QH-114 card {card QH-114} because our own growth is known now',
  ),
  on(27, 4, SUPERVISOR, '/knurl standard propose QH-114'),
  on(28, 1, SUPERVISOR, '/knurl standard approve QH-114 review in 6 months'),
  // Approved.
  on(13, 4, SUPERVISOR, '/knurl standard save QH-120 card {card QH-120}'),
  on(13, 5, SUPERVISOR, '/knurl standard propose QH-120'),
  on(14, 1, SUPERVISOR, '/knurl standard approve QH-120'),
  // Retired.
  on(15, 2, DOV, '/knurl standard propose QH-301 card {card QH-301}'),
  on(15, 6, SUPERVISOR, '/knurl standard approve QH-301'),
  on(34, 5, SUPERVISOR, '/knurl standard retire QH-301 because the new bars want another set-up'),
  // Proposed: it waits for a decision.
  on(LAST_DAY, 2, SANNA, '/knurl standard propose QH-207 card {card QH-207}'),
  // A draft.
  on(LAST_DAY, 3, ENGINEER, '/knurl standard save QH-233 card {card QH-233}'),
];

/** A question in each state. */
const QUESTIONS: readonly Decision[] = [
  on(
    9,
    3,
    SANNA,
    '/knurl ask {card QH-318} it comes out shallow, how much deeper may I go',
    'shallow',
  ),
  on(
    9,
    5,
    ENGINEER,
    '/knurl answer {shallow} the wheel is worn: a thou deeper helps for today, order a new one',
  ),
  on(10, 1, SANNA, '/knurl solved {shallow} a thou deeper was right'),
  on(22, 2, KIT, '/knurl ask {card QH-301} the pin bends at the free end', 'bends'),
  on(22, 4, ENGINEER, '/knurl answer {bends} bring it out 15 mm instead of 25'),
  on(23, 1, KIT, '/knurl solved {bends}'),
  on(29, 6, KIT, '/knurl reopen {bends} with the new bars it bends again'),
  on(LAST_DAY, 1, DOV, '/knurl ask {card QH-233} may I run the plug a gear faster', 'gear'),
  on(LAST_DAY, 4, ENGINEER, '/knurl answer {gear} no: the pin is at its limit with this pressure'),
  on(
    LAST_DAY,
    6,
    KIT,
    '/knurl ask {card QH-114} the seam shows on one bar in ten, count or bar',
    'seam',
  ),
];

/** All of it, in its order. */
export const DECISIONS: readonly Decision[] = [...STANDARDS, ...QUESTIONS].toSorted(
  (a, b) => a.at - b.at,
);

/** The line with the codes in it that were given by then. */
export const spokenLine = (line: string, codes: ReadonlyMap<string, string>): string =>
  line.replaceAll(/\{(?<name>[^}]+)\}/gu, (_, name: string) => {
    const code = codes.get(name);
    if (code === undefined) throw new Error(`nothing of the demo is called ${name} yet`);
    return code;
  });
