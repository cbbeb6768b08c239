import { type CheckOf, type Figures, figure } from './check.ts';
import {
  type Mm,
  type MmPerRev,
  mm,
  mmPerRev,
  type RevPerMin,
  type Seconds,
  seconds,
  within,
} from './units.ts';

export type HardeningClass = 'low' | 'medium' | 'high';

/** Turns that a spot under the wheel should see, fewest and most. Common practice. */
export const TURNS_ON_A_SPOT: Record<HardeningClass, readonly [fewest: number, most: number]> = {
  low: [10, 20],
  medium: [8, 15],
  high: [5, 10],
};

/** 0.005 in/rev, rounded as the metric trade gives it. Common practice. */
export const SLOWEST_FEED: MmPerRev = mmPerRev(0.13);
/** 0.030 in/rev, rounded as the metric trade gives it. Common practice. */
export const FASTEST_FEED: MmPerRev = mmPerRev(0.76);
/** Pitch from which a coarser one wants less feed. Judgement. */
export const FEED_CAP_PITCH: Mm = mm(1);

/** Feeds a knurl is cut with, and the one taken when nothing is said. Judgement. */
export const CUT_FEED = {
  least: mmPerRev(0.05),
  usual: mmPerRev(0.15),
  most: mmPerRev(0.3),
} as const;

/** Turns without infeed at the end of a plunge. Judgement. */
export const DWELL_TURNS = 3;
/** A plunge needs its first bite, its dwell and at least one turn between. */
export const FEWEST_TURNS = DWELL_TURNS + 2;

/**
 * Width of wheel that rolls on the work.
 *
 *     b = face − 2 × bevel
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | face | width of the wheel | mm | > 0 |
 * | bevel | bevel of one edge | mm | 0 to face/2 |
 * | → b | contact width | mm | |
 *
 * Assumes both edges are bevelled alike.
 *
 * @source din-403 (F: both edges chamfered)
 * @example contactWidth(mm(8), mm(1)) // 6 mm
 */
export function contactWidth(face: Mm, bevel: Mm): Mm {
  within('face', face, Number.MIN_VALUE, 1000, 'mm');
  within('bevel', bevel, 0, face / 2, 'mm');
  return mm(face - 2 * bevel);
}

/** What keeps the feed from being faster or slower. */
export type FeedRule = 'turns' | 'envelope' | 'coarsePitch';

export type FeedWindow = {
  readonly low: MmPerRev;
  readonly high: MmPerRev;
  /** False where the rules leave nothing between them. */
  readonly open: boolean;
  readonly feed: MmPerRev;
  /** The rule that sets the upper end. */
  readonly boundBy: FeedRule;
  /** Contact width at which the window would open, where it is closed. */
  readonly openingWidth: Mm | null;
};

/** Widest contact for which the fewest-turns end still lies under the cap, or narrowest for the other end. */
const widthThatOpens = (fewest: number, most: number, top: number, b: Mm): Mm | null => {
  const widest = top * most;
  if (b > widest) return mm(widest);
  const narrowest = SLOWEST_FEED * fewest;
  return b < narrowest ? mm(narrowest) : null;
};

/**
 * Feeds that give every spot its turns, in the trade's range and not too fast for the pitch.
 *
 *     f ∈ [b/most, b/fewest] ∩ [0.13, 0.76], f ≤ 0.76 min(1, 1/p); the middle of what is left
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | b (width) | contact width | mm | > 0 |
 * | p (pitch) | normal pitch | mm | > 0 |
 * | hardening | low, medium or high | - | |
 * | → low, high | ends of the window (low > high: closed) | mm/rev | |
 * | → feed | middle, or the upper end where closed, never under 0.13 | mm/rev | |
 *
 * Assumes one pass.
 *
 * @source feed-window (0.005 to 0.030 in/rev, 10 to 20 turns on a spot)
 * @source feed-cap (coarser pitch, less feed)
 * @example feedWindow(mm(8), mm(1), 'low').low // 0.4 mm/rev
 * @example feedWindow(mm(8), mm(1), 'high').open // false
 */
export function feedWindow(width: Mm, pitch: Mm, hardening: HardeningClass): FeedWindow {
  within('width', width, Number.MIN_VALUE, 1000, 'mm');
  within('pitch', pitch, Number.MIN_VALUE, 1000, 'mm');
  const [fewest, most] = TURNS_ON_A_SPOT[hardening];
  const cap = FASTEST_FEED * Math.min(1, FEED_CAP_PITCH / pitch);
  const high = Math.min(width / fewest, cap);
  const low = Math.max(width / most, SLOWEST_FEED);
  const open = low <= high;
  const boundBy: FeedRule =
    width / fewest <= cap ? 'turns' : cap < FASTEST_FEED ? 'coarsePitch' : 'envelope';
  return {
    low: mmPerRev(low),
    high: mmPerRev(high),
    open,
    feed: mmPerRev(open ? (low + high) / 2 : Math.max(SLOWEST_FEED, high)),
    boundBy,
    openingWidth: open ? null : widthThatOpens(fewest, most, cap, width),
  };
}

/**
 * Turns that each spot gets from a wheel that travels along.
 *
 *     N = b/f
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | b (width) | contact width | mm | > 0 |
 * | f (feed) | feed | mm/rev | > 0 |
 * | → N | turns | - | |
 *
 * Assumes one pass.
 *
 * @source feed-window (turns on a spot)
 * @example turnsOnSpot(mm(6), mmPerRev(0.4)) // 15
 */
export function turnsOnSpot(width: Mm, feed: MmPerRev): number {
  within('feed', feed, Number.MIN_VALUE, 1000, 'mm/rev');
  return width / feed;
}

/**
 * Turns of a plunge: the middle of the class's range.
 *
 *     N = ⌈(fewest + most)/2⌉
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | hardening | low, medium or high | - | |
 * | → N | turns: 15, 12, 8 | - | |
 *
 * Assumes the last three turns feed nothing.
 *
 * @source feed-window (turns on a spot)
 * @example plungeTurns('medium') // 12
 */
export function plungeTurns(hardening: HardeningClass): number {
  const [fewest, most] = TURNS_ON_A_SPOT[hardening];
  return Math.ceil((fewest + most) / 2);
}

/**
 * Infeed of each turn between the first bite and the dwell.
 *
 *     dz = (z − z1)/(N − 4)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | z (infeed) | whole infeed past touch | mm | > 0 |
 * | z1 (bite) | infeed of the first turn | mm | > 0 |
 * | N (turns) | turns of the plunge | - | ≥ 5 |
 * | → dz | infeed a turn | mm | |
 *
 * Assumes an even feed; nothing is left where the first bite is already the whole infeed.
 *
 * @source feed-window (turns on a spot)
 * @example infeedPerTurn(mm(0.3), mm(0.1), 15) // 0.0181818 mm
 */
export function infeedPerTurn(infeed: Mm, bite: Mm, turns: number): Mm {
  within('turns', turns, FEWEST_TURNS, 1e6);
  return mm(Math.max(0, infeed - bite) / (turns - DWELL_TURNS - 1));
}

/**
 * Time of a traverse.
 *
 *     t = 60 (length + b)/(f n)
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | length | length of the knurl | mm | > 0 |
 * | b (width) | contact width, run off the end | mm | ≥ 0 |
 * | f (feed) | feed | mm/rev | > 0 |
 * | n (rotation) | spindle speed | rev/min | > 0 |
 * | → t | time of one part | s | |
 *
 * Assumes one pass and nothing for handling.
 *
 * @source feed-window (path over feed)
 * @example traverseTime({ length: mm(30), width: mm(0), feed: mmPerRev(0.4), rotation: revPerMin(397.887) }) // 11.3097 s
 */
export function traverseTime(of: {
  readonly length: Mm;
  readonly width: Mm;
  readonly feed: MmPerRev;
  readonly rotation: RevPerMin;
}): Seconds {
  within('feed', of.feed, Number.MIN_VALUE, 1000, 'mm/rev');
  within('rotation', of.rotation, Number.MIN_VALUE, 1e6, 'rev/min');
  return seconds((60 * (of.length + of.width)) / (of.feed * of.rotation));
}

/**
 * Time of a plunge.
 *
 *     t = 60 N/n
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | N (turns) | turns | - | > 0 |
 * | n (rotation) | spindle speed | rev/min | > 0 |
 * | → t | time of one part | s | |
 *
 * Assumes nothing for handling.
 *
 * @source feed-window (turns over spindle speed)
 * @example plungeTime(15, revPerMin(300)) // 3 s
 */
export function plungeTime(turns: number, rotation: RevPerMin): Seconds {
  within('turns', turns, Number.MIN_VALUE, 1e9);
  within('rotation', rotation, Number.MIN_VALUE, 1e6, 'rev/min');
  return seconds((60 * turns) / rotation);
}

const feedFigures = (
  feed: MmPerRev,
  low: number,
  high: number,
  openingWidth: Mm | null,
): Figures => ({
  feed: figure(feed, 'mm/rev'),
  feedLow: figure(low, 'mm/rev'),
  feedHigh: figure(high, 'mm/rev'),
  openingWidth: openingWidth === null ? null : figure(openingWidth, 'mm'),
});

/**
 * Whether the feed of a formed traverse gives each spot its turns.
 *
 *     inside the window fine, else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | f (feed) | feed | mm/rev | > 0 |
 * | window | feeds that are right | - | |
 * | → check | feed, with its ends and the contact width that would open it | - | |
 *
 * Assumes one pass.
 *
 * @source feed-window (turns on a spot)
 * @example formedFeedCheck(mmPerRev(0.76), feedWindow(mm(8), mm(1), 'high')).state // "watch"
 */
export function formedFeedCheck(feed: MmPerRev, window: FeedWindow): CheckOf<'feed'> {
  const inside = window.open && feed >= window.low - 1e-9 && feed <= window.high + 1e-9;
  return {
    name: 'feed',
    state: inside ? 'fine' : 'watch',
    reason: inside ? 'within' : window.open ? 'asked' : 'noWindow',
    figures: feedFigures(feed, window.low, window.high, window.openingWidth),
  };
}

/**
 * Whether the feed of a cut knurl lies in its range.
 *
 *     0.15 mm/rev unless said;  0.05 to 0.30 mm/rev fine, else watch
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | f (feed) | feed | mm/rev | > 0 |
 * | → check | feed, with its range | - | |
 *
 * Assumes square-edged wheels that travel.
 *
 * @source judgement (0.05 to 0.30 mm/rev, 0.15 unless said)
 * @example cutFeedCheck(mmPerRev(0.15)).state // "fine"
 */
export function cutFeedCheck(feed: MmPerRev): CheckOf<'feed'> {
  const { least, most } = CUT_FEED;
  const inside = feed >= least && feed <= most;
  return {
    name: 'feed',
    state: inside ? 'fine' : 'watch',
    reason: inside ? 'cut' : 'asked',
    figures: feedFigures(feed, least, most, null),
  };
}
