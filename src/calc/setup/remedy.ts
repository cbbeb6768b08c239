import { type Check, type CheckName, type Figure, figure } from '../check.ts';
import { contactWidth, TURNS_ON_A_SPOT } from '../feed.ts';
import { type Mm, mm, mmPerRev, mPerMin, OutOfRange } from '../units.ts';
import { DEFAULT_BEVEL, type SetupRequest } from './request.ts';

/** What can be changed about a set-up that something stops, the smallest change first. Judgement. */
export const REMEDY_KINDS = [
  'stickout',
  'tailstock',
  'moreTurns',
  'slower',
  'narrowerWheel',
  'plug',
  'opposed',
  'cut',
] as const;
export type RemedyKind = (typeof REMEDY_KINDS)[number];

/** A change that was tried and is no longer stopped. */
export type Remedy = {
  readonly kind: RemedyKind;
  /** The check that stopped. */
  readonly check: CheckName;
  /** Largest stickout, fewest turns, fastest speed, widest face that pass; null where a word does. */
  readonly number: Figure | null;
  /** What says it in a request. */
  readonly words: string;
  readonly change: Partial<SetupRequest>;
};

/** Narrowest wheel that is offered. Judgement: narrower ones are not made. */
export const NARROWEST_FACE: Mm = mm(3);
const FACE_STEP = 0.5;
/** Under this nothing is gained by running slower. Judgement. */
const SLOWEST_SPEED = 1;
/** A tenth of a millimetre or of a metre a minute: what a person would set. */
const STEP = 0.1;
/** Left below a limit, so that a length printed in inches still passes. */
const PRINTED = 0.005;
const HALVINGS = 24;

type Try = {
  readonly number: Figure | null;
  readonly words: string;
  readonly change: Partial<SetupRequest>;
};
type Passes = (change: Partial<SetupRequest>) => boolean;
/** What the remedies need to know of the set-up that was stopped. */
export type Stopped = {
  readonly request: SetupRequest;
  readonly checks: readonly Check[];
  readonly travel: 'plunge' | 'traverse';
  readonly knurlWidth: Mm | null;
  readonly turns: number | null;
  readonly surfaceSpeed: number | null;
  /** Surface speed that the check of the speed calls fine. */
  readonly speedLimit: number | null;
};

/** Largest value under `most` that passes, in whole steps; null where not even `least` does. */
const largest = (
  least: number,
  most: number,
  passes: (value: number) => boolean,
): number | null => {
  if (least >= most || !passes(least)) return null;
  let [good, bad] = [least, most];
  for (let i = 0; i < HALVINGS; i += 1) {
    const middle = (good + bad) / 2;
    if (passes(middle)) good = middle;
    else bad = middle;
  }
  const whole = Number((Math.floor((good - PRINTED) / STEP) * STEP).toFixed(1));
  const value = Math.max(least, whole);
  return passes(value) ? value : null;
};

const shorterStickout = (of: Stopped, passes: Passes): Try | null => {
  const { stickout } = of.request;
  if (stickout === null) return null;
  const at = (out: number) => ({ stickout: mm(out) });
  const out = largest(of.knurlWidth ?? 0, stickout, (value) => passes(at(value)));
  return out === null
    ? null
    : { number: figure(out, 'mm'), words: `out ${out} mm`, change: at(out) };
};

/** More turns in a plunge are a finer infeed, in a traverse a finer feed. */
const withTurns = (of: Stopped, turns: number): Try => {
  const { request, travel } = of;
  if (travel === 'plunge' || request.feed === null)
    // The number first: behind another number the word would be taken for its unit.
    return { number: figure(turns, '1'), words: `${turns} turns`, change: { turns } };
  const bevel = request.wheel.bevel ?? (request.edge === 'square' ? mm(0) : DEFAULT_BEVEL);
  // Rounded up and written out, so that what is read back is what was tried.
  const feed = Number((contactWidth(request.wheel.face, bevel) / turns + 5e-4).toFixed(3));
  const change = { feed: mmPerRev(feed), turns: null };
  return { number: figure(turns, '1'), words: `feed ${feed} mm/rev`, change };
};

const moreTurns = (of: Stopped, passes: Passes): Try | null => {
  if (of.turns === null) return null;
  const [, most] = TURNS_ON_A_SPOT[of.request.material.hardeningClass ?? 'low'];
  for (let turns = Math.floor(of.turns) + 1; turns <= most; turns += 1) {
    const next = withTurns(of, turns);
    if (passes(next.change)) return next;
  }
  return null;
};

const slower = (of: Stopped, passes: Passes): Try | null => {
  if (of.surfaceSpeed === null) return null;
  const at = (speed: number) => ({ speed: mPerMin(speed), rotation: null });
  // What stops a pin is no advice while the speed itself is too high.
  const most = Math.min(of.surfaceSpeed, of.speedLimit ?? of.surfaceSpeed);
  const speed = largest(SLOWEST_SPEED, most, (value) => passes(at(value)));
  return speed === null
    ? null
    : { number: figure(speed, 'm/min'), words: `speed ${speed} m/min`, change: at(speed) };
};

const narrowerWheel = (of: Stopped, passes: Passes): Try | null => {
  const { wheel } = of.request;
  const bevel = wheel.bevel === null ? '' : ` bevel ${wheel.bevel} mm`;
  const start = (Math.ceil(wheel.face / FACE_STEP) - 1) * FACE_STEP;
  for (let face = start; face >= NARROWEST_FACE; face -= FACE_STEP) {
    const change = { wheel: { ...wheel, face: mm(face) } };
    if (passes(change))
      return {
        number: figure(face, 'mm'),
        words: `wheel ${wheel.diameter}x${face}x${wheel.bore} mm${bevel}`,
        change,
      };
  }
  return null;
};

/** A change that a single word makes. */
const byWord =
  (words: string, change: Partial<SetupRequest>) =>
  (_: Stopped, passes: Passes): Try | null =>
    passes(change) ? { number: null, words, change } : null;

const TRIES: Record<RemedyKind, (of: Stopped, passes: Passes) => Try | null> = {
  stickout: shorterStickout,
  tailstock: byWord('tailstock', { support: 'tailstock' }),
  moreTurns,
  slower,
  narrowerWheel,
  plug: byWord('plug', { plug: true }),
  opposed: byWord('opposed', { layout: 'opposed' }),
  cut: byWord('cut', { process: 'cut' }),
};

const stops = (checks: readonly Check[]): ReadonlySet<CheckName> =>
  new Set(checks.filter((check) => check.state === 'stop').map((check) => check.name));

/** Checks of this part of the set-up that can stop, and what each of them may be cured by. */
const CURES: Partial<Record<CheckName, readonly RemedyKind[]>> = {
  bending: ['stickout', 'tailstock', 'moreTurns', 'narrowerWheel', 'opposed', 'cut'],
  ring: ['moreTurns', 'narrowerWheel', 'plug', 'opposed', 'cut'],
  pinHeat: ['moreTurns', 'slower', 'cut'],
  capacity: ['moreTurns', 'slower', 'narrowerWheel', 'cut'],
};

/**
 * Changes that lift each stop, found by working the set-up out again with them. A change that
 * lifts one stop and brings another is none.
 */
export const remediesFor = (
  of: Stopped,
  judge: (request: SetupRequest) => readonly Check[],
): readonly Remedy[] => {
  const before = stops(of.checks);
  return [...before].flatMap((check) => {
    const passes: Passes = (change) => {
      const after = stopsWith(change, of.request, judge);
      return after !== null && !after.has(check) && [...after].every((name) => before.has(name));
    };
    return (CURES[check] ?? []).flatMap((kind) => {
      const found = TRIES[kind](of, passes);
      return found === null ? [] : [{ kind, check, ...found }];
    });
  });
};

/** Null where the change makes no sense on this work. */
const stopsWith = (
  change: Partial<SetupRequest>,
  request: SetupRequest,
  judge: (request: SetupRequest) => readonly Check[],
): ReadonlySet<CheckName> | null => {
  try {
    return stops(judge({ ...request, ...change }));
  } catch (error) {
    if (error instanceof OutOfRange) return null;
    throw error;
  }
};

const FIGURE_OF: Partial<Record<RemedyKind, string>> = {
  stickout: 'largestStickout',
  moreTurns: 'moreTurns',
  slower: 'slowerSpeed',
  narrowerWheel: 'narrowerFace',
};

/** The checks, a stopped one with the numbers that would lift it. */
export const withRemedies = (
  checks: readonly Check[],
  remedies: readonly Remedy[],
): readonly Check[] =>
  checks.map((check) => {
    const own = remedies.filter((remedy) => remedy.check === check.name);
    const numbers = own.flatMap(({ kind, number }) => {
      const name = FIGURE_OF[kind];
      return name === undefined || number === null ? [] : [[name, number] as const];
    });
    return { ...check, figures: { ...check.figures, ...Object.fromEntries(numbers) } };
  });
