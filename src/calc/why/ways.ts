import type { AfterCheck, BlankCheck, SeamCheck } from '../checking/index.ts';
import { CUT_FEED } from '../feed.ts';
import { DEFAULT_FILL } from '../fill.ts';
import { isPolymer } from '../materials/index.ts';
import type { SetupRequest, SetupResult } from '../setup/index.ts';
import type { WheelKnowledge } from '../tracking.ts';

/** In what way a figure came about, where a card can come about in several. */
export type Way =
  /** The bar as it is, a count that was asked for, or the nearest to the print's limits. */
  | 'asIs'
  | 'teethAsked'
  | 'forPrint'
  /** A fill that was asked for, or moved to bring the crest inside the limits. */
  | 'fillAsked'
  | 'fillForPrint'
  | 'classCalled'
  /** What is known of the wheel besides its label. */
  | 'counted'
  | 'proven'
  | 'cut'
  | 'plastic'
  | 'traverse'
  /** Asked for and taken as it was said. */
  | 'speedAsked'
  | 'rotationAsked'
  | 'feedAsked'
  | 'turnsAsked'
  /** Set to what the machine has at or under what was wanted. */
  | 'speedStepped'
  | 'feedStepped'
  | 'growthLearned'
  | 'tailstock'
  | 'centres'
  /** Which check it was: of a blank, of a seam or of a finished part. */
  | 'blank'
  | 'seam'
  | 'part';

type Holds = Readonly<Partial<Record<Way, boolean>>>;

const those = (holds: Holds): readonly Way[] =>
  Object.entries(holds)
    .filter(([, is]) => is)
    .map(([way]) => way as Way);

const same = (a: number | null, b: number | null): boolean =>
  a !== null && b !== null && Math.abs(a - b) <= 1e-9 * Math.max(1, Math.abs(a));

const wheelWays = (
  request: Pick<SetupRequest, 'knurlClass'>,
  knowledge: WheelKnowledge,
): Holds => ({
  classCalled: request.knurlClass !== null,
  counted: knowledge === 'counted',
  proven: knowledge === 'proven',
});

const blankWays = (request: SetupRequest, result: SetupResult): Holds => {
  const asIs = request.asIs && request.stock !== null;
  const teethAsked = !asIs && request.wantedTeeth !== null;
  return {
    asIs,
    teethAsked,
    forPrint: !asIs && !teethAsked && request.finish !== null,
    fillAsked: same(request.fill, result.blank.tooth.fill),
    fillForPrint: result.blank.fillMoved,
  };
};

const speedWays = (request: SetupRequest, { running }: SetupResult): Holds => {
  if (running === null) return {};
  const speedStepped = !same(running.rotation, running.wanted);
  return {
    speedStepped,
    speedAsked: !speedStepped && request.speed !== null,
    rotationAsked: !speedStepped && request.rotation !== null,
  };
};

/** The feed before the machine's gears had their say. */
const wantedFeed = (request: SetupRequest, result: SetupResult): number => {
  const { window } = result.motion;
  if (request.feed !== null) return request.feed;
  if (window === null) return CUT_FEED.usual;
  return request.turns === null ? window.feed : result.wheelInUse.width / request.turns;
};

const motionWays = (request: SetupRequest, result: SetupResult): Holds => {
  const { motion } = result;
  const traverse = motion.travel === 'traverse';
  const feedStepped = traverse && !same(motion.feed, wantedFeed(request, result));
  return {
    traverse,
    feedStepped,
    feedAsked: traverse && same(request.feed, motion.feed),
    turnsAsked: same(request.turns, motion.turns),
  };
};

/**
 * The ways in which the figures of a set-up came about.
 *
 *     { way : it holds of what was said and of what was worked out }
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | request | what was said | - | |
 * | result | the set-up that was worked out from it | - | |
 * | → ways | those that hold | - | |
 *
 * Assumes a figure that comes out as it was asked for was taken from the person.
 *
 * @source judgement (which cases are told apart)
 * @example waysOfSetUp({ asIs: false, stock: inch(1), wantedTeeth: null, finish: null, fill: null, knurlClass: null, speed: null, rotation: null, feed: null, turns: 18, support: 'chuck', material: materialById('steel-lowC-CD'), growth: growthBeforeResults() }, { process: 'form', pitch: { knowledge: 'label' }, blank: { tooth: { fill: 0.9 }, fillMoved: false }, motion: { travel: 'plunge', feed: null, window: null, turns: 18 }, running: null }) // ["turnsAsked"]
 */
export function waysOfSetUp(request: SetupRequest, result: SetupResult): readonly Way[] {
  return those({
    ...blankWays(request, result),
    ...wheelWays(request, result.pitch.knowledge),
    cut: result.process === 'cut',
    plastic: isPolymer(request.material),
    ...motionWays(request, result),
    ...speedWays(request, result),
    growthLearned: request.growth.results > 0,
    tailstock: request.support === 'tailstock',
    centres: request.support === 'centres',
  });
}

const partWays = (request: SetupRequest, { figures }: AfterCheck): Holds => {
  const fill = figures.fillExpected?.value ?? null;
  const usual = Math.min(DEFAULT_FILL, request.material.maxFill.value ?? DEFAULT_FILL);
  return {
    cut: figures.growthExpected === null,
    fillAsked: same(request.fill, fill),
    fillForPrint: request.finish !== null && request.fill === null && !same(usual, fill),
    growthLearned: request.growth.results > 0,
  };
};

/**
 * The ways in which the figures of a check came about.
 *
 *     { way : it holds of what was said and of what was worked out }
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | request | what was said | - | |
 * | result | the check of a blank, of a seam or of a finished part | - | |
 * | → ways | those that hold | - | |
 *
 * Assumes a figure that comes out as it was asked for was taken from the person.
 *
 * @source judgement (which cases are told apart)
 * @example waysOfCheck({ knurlClass: null }, { kind: 'closes', pitch: { knowledge: 'counted' } }) // ["counted", "seam"]
 */
export function waysOfCheck(
  request: SetupRequest,
  result: BlankCheck | SeamCheck | AfterCheck,
): readonly Way[] {
  const isPart = 'right' in result;
  const isSeam = 'kind' in result;
  return those({
    ...wheelWays(request, result.pitch.knowledge),
    ...(isPart ? partWays(request, result) : {}),
    blank: !isPart && !isSeam,
    seam: isSeam,
    part: isPart,
  });
}
