import { type CheckOf } from '../check.ts';
import type { Edge, Travel } from '../edge.ts';
import {
  CUT_FEED,
  contactWidth,
  cutFeedCheck,
  type FeedWindow,
  feedWindow,
  formedFeedCheck,
  type HardeningClass,
  plungeTime,
  plungeTurns,
  traverseTime,
  turnsOnSpot,
} from '../feed.ts';
import {
  type Band,
  type PinMaterial,
  type Process,
  speedCheck,
  speedLimit,
  spindleSpeed,
  startingSpeed,
  surfaceSpeed,
} from '../speed.ts';
import {
  type Mm,
  type MmPerRev,
  type MPerMin,
  mm,
  mmPerRev,
  type RevPerMin,
  type Seconds,
  seconds,
} from '../units.ts';
import { DEFAULT_BEVEL, type MachineLimits, type SetupRequest, type Steps } from './request.ts';

export type WheelInUse = {
  readonly edge: Edge;
  readonly bevel: Mm;
  readonly width: Mm;
};

/** Edge and contact width: a square edge has no bevel, and a cut wants square edges unless said. */
export const wheelInUse = (request: SetupRequest, process: Process): WheelInUse => {
  const said = request.wheel.bevel;
  const implied: Edge = process === 'cut' && (said === null || said === 0) ? 'square' : 'bevelled';
  const edge = request.edge ?? (said === 0 ? 'square' : implied);
  const bevel = said ?? (edge === 'square' ? mm(0) : DEFAULT_BEVEL);
  return { edge, bevel, width: contactWidth(request.wheel.face, bevel) };
};

export const travelOf = (length: Mm | null, width: Mm, process: Process): Travel =>
  process === 'cut' || (length !== null && length > width + 1e-9) ? 'traverse' : 'plunge';

/** The step at or under a wish; the slowest where all are faster. */
const atOrUnder = <T extends number>(steps: Steps<T> | null, wanted: T): T => {
  if (steps === null) return wanted;
  if (!('list' in steps))
    return wanted < steps.slowest ? steps.slowest : wanted > steps.fastest ? steps.fastest : wanted;
  const sorted = [...steps.list].sort((a, b) => a - b);
  // A hair of slack: a gear of exactly the wanted speed is at it.
  return sorted.filter((step) => step <= wanted * (1 + 1e-9)).at(-1) ?? sorted[0] ?? wanted;
};

export type Running = {
  readonly surfaceSpeed: MPerMin;
  readonly rotation: RevPerMin;
  readonly check: CheckOf<'speed'>;
  /** What was wanted before the machine's gears had their say. */
  readonly wanted: RevPerMin;
};

export const running = (of: {
  readonly band: Band;
  readonly process: Process;
  readonly pin: PinMaterial;
  readonly diameter: Mm;
  readonly speed: MPerMin | null;
  readonly rotation: RevPerMin | null;
  readonly machine: MachineLimits | null;
}): Running => {
  const wanted =
    of.rotation ??
    spindleSpeed(of.speed ?? startingSpeed(of.band, of.process, of.pin), of.diameter);
  const rotation = atOrUnder(of.machine?.speeds ?? null, wanted);
  const speed = surfaceSpeed(rotation, of.diameter);
  return {
    surfaceSpeed: speed,
    rotation,
    wanted,
    check: speedCheck(speed, speedLimit(of.band, of.process, of.pin)),
  };
};

export type Motion = {
  readonly travel: Travel;
  readonly feed: MmPerRev | null;
  readonly feedLow: MmPerRev | null;
  readonly feedHigh: MmPerRev | null;
  readonly window: FeedWindow | null;
  readonly turns: number | null;
  readonly passes: number | null;
  /** Time of the whole batch; null where speed or length is not known. */
  readonly time: Seconds | null;
  readonly check: CheckOf<'feed'> | null;
};

type MotionOf = {
  readonly request: SetupRequest;
  readonly width: Mm;
  readonly normal: Mm;
  readonly hardening: HardeningClass;
  readonly rotation: RevPerMin | null;
};

const geared = (feed: MmPerRev, of: MotionOf): MmPerRev =>
  atOrUnder(of.request.machine?.feeds ?? null, feed);

const traverseFor = (feed: MmPerRev, of: MotionOf): Seconds | null =>
  of.request.length === null || of.rotation === null
    ? null
    : seconds(
        of.request.batch *
          traverseTime({ length: of.request.length, width: of.width, feed, rotation: of.rotation }),
      );

const plunge = (of: MotionOf): Motion => {
  const turns = of.request.turns ?? plungeTurns(of.hardening);
  const time =
    of.rotation === null ? null : seconds(of.request.batch * plungeTime(turns, of.rotation));
  const still = { feed: null, feedLow: null, feedHigh: null, window: null, passes: null };
  return { travel: 'plunge', ...still, turns, time, check: null };
};

const formedTraverse = (of: MotionOf): Motion => {
  const { request, width } = of;
  const window = feedWindow(width, of.normal, of.hardening);
  const byTurns = request.turns === null ? null : mmPerRev(width / request.turns);
  const feed = geared(request.feed ?? byTurns ?? window.feed, of);
  return {
    travel: 'traverse',
    feed,
    feedLow: window.low,
    feedHigh: window.high,
    window,
    turns: turnsOnSpot(width, feed),
    passes: 1,
    time: traverseFor(feed, of),
    check: formedFeedCheck(feed, window),
  };
};

const cutTraverse = (of: MotionOf): Motion => {
  const feed = geared(of.request.feed ?? CUT_FEED.usual, of);
  return {
    travel: 'traverse',
    feed,
    feedLow: CUT_FEED.least,
    feedHigh: CUT_FEED.most,
    window: null,
    // Only the leading edge cuts, so turns on one spot mean nothing here.
    turns: null,
    passes: 1,
    time: traverseFor(feed, of),
    check: cutFeedCheck(feed),
  };
};

export const motion = (of: MotionOf, process: Process): Motion => {
  if (process === 'cut') return cutTraverse(of);
  return travelOf(of.request.length, of.width, process) === 'plunge'
    ? plunge(of)
    : formedTraverse(of);
};
