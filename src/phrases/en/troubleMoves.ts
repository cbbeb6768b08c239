import type { NextMove, TroubleMoveId } from '../../calc/index.ts';
import type { Show } from '../show.ts';

type Say = (value: number, show: Show) => string;

/** One next move for each cause, as a number where the set-up gives one. */
const MOVES: { readonly [M in TroubleMoveId]: { readonly with: Say; readonly without: string } } = {
  turnToWhole: {
    with: (v, show) => `turn to ${show.both(v)}, a whole count`,
    without: 'turn the blank to a whole count',
  },
  seamTest: {
    with: (v, show) => `seam test: press in ${show.length(v, 'up')}, once round by hand`,
    without: 'seam test: one trial turn by hand',
  },
  biteAtLeast: {
    with: (v, show) => `first turn ${show.both(v, 'up')} or more`,
    without: 'bite harder on the first turn',
  },
  trueUpTo: {
    with: (v, show) => `true the bar to an indicator reading of ${show.length(v, 'down')} or less`,
    without: 'true the bar up',
  },
  stopAtFlat: {
    with: (v, show) => `stop while the crests keep a flat of ${show.length(v, 'up')}`,
    without: 'stop while the crests keep a flat',
  },
  feedTo: {
    with: (v, show) => `feed in to ${show.both(v)} past touch`,
    without: 'feed in further',
  },
  runSlower: { with: (v, show) => `run at ${show.speed(v)} or slower`, without: 'run slower' },
  oilEvery: {
    with: () => 'oil pin and wheel before every part, from the outgoing side',
    without: 'oil pin and wheel',
  },
  changePinAtPlay: {
    with: (v, show) => `change the pin when the wheel plays ${show.length(v)} on it`,
    without: 'change the pin',
  },
  thickerPin: {
    with: (v, show) => `take a pin of ${show.length(v, 'up')} or more, or a carbide one`,
    without: 'take a thicker pin',
  },
  changeWheelAtFlat: {
    with: (v, show) => `change the wheel when its tips show a flat of ${show.length(v)}`,
    without: 'change the wheel',
  },
  findMarkEvery: {
    with: (v, show) => `look for a mark every ${show.length(v)}, once round the wheel`,
    without: 'look for a mark once round the wheel',
  },
  shortenTo: {
    with: (v, show) => `stick out ${show.length(v, 'down')} or less, or bring up the tailstock`,
    without: 'bring up the tailstock',
  },
  swivel: {
    with: (v, show) => `swivel the tool by ${show.angle(v)}`,
    without: 'square the tool to the work',
  },
  levelWithin: {
    with: (v, show) => `set both wheels level within ${show.length(v)}`,
    without: 'set both wheels level',
  },
  countWheels: {
    with: (v, show) => `count both wheels: about ${show.count(v)} teeth each, and the same`,
    without: 'count the teeth of both wheels',
  },
  oneBitesFirst: {
    with: (v, show) => `let one wheel bite ${show.length(v, 'up')} first, then close the other`,
    without: 'let one wheel bite first',
  },
  feedAt: { with: (v, show) => `feed at ${show.feed(v)}`, without: 'feed slower' },
  turnsAtMost: {
    with: (v, show) => `no more than ${show.count(v)} turns on one spot`,
    without: 'fewer turns on one spot',
  },
  turnsAtLeast: {
    with: (v, show) => `take ${show.count(v)} turns`,
    without: 'take more turns',
  },
  bevel: {
    with: (v, show) => `take a wheel bevelled ${show.length(v)} a side`,
    without: 'take a bevelled wheel',
  },
  cutInstead: {
    with: (v, show) => `cut it instead, at ${show.feed(v)}`,
    without: 'cut it instead',
  },
  expectGrowth: {
    with: (v, show) => `log the result; expect ${show.percent(v)} of the static growth`,
    without: 'measure and log the result',
  },
  turnBlankTo: {
    with: (v, show) => `turn the blank to ${show.both(v)}`,
    without: 'measure the blank',
  },
  turnStraightWithin: {
    with: (v, show) => `turn the blank straight within ${show.length(v, 'down')}`,
    without: 'turn the blank straight',
  },
  plugBore: {
    with: (v, show) => `plug the bore of ${show.length(v)}`,
    without: 'plug the bore',
  },
  roundInJawsWithin: {
    with: (v, show) => `grip so that it stays round within ${show.length(v, 'down')}`,
    without: 'grip it with soft jaws',
  },
  brushEvery: {
    with: () => 'brush the wheel before every part, spindle stopped',
    without: 'brush the wheel, spindle stopped',
  },
  toolPlayUnder: {
    with: (v, show) => `tighten the tool until it plays less than ${show.length(v)}`,
    without: 'tighten the tool',
  },
  gripLength: {
    with: (v, show) => `grip at least ${show.length(v, 'up')} in the chuck`,
    without: 'grip more of the bar',
  },
  centrePlayUnder: {
    with: (v, show) => `take up the centre until it plays less than ${show.length(v)}`,
    without: 'take up the centre',
  },
  dwell: {
    with: (v, show) => `end with ${show.count(v)} turns without infeed`,
    without: 'end with a few turns without infeed',
  },
  onePass: { with: () => 'knurl in one pass', without: 'knurl in one pass' },
  chamfer: {
    with: (v, show) => `turn a lead chamfer of ${show.length(v, 'up')} or more`,
    without: 'turn a lead chamfer',
  },
  narrowTo: {
    with: (v, show) => `take a wheel no wider than ${show.length(v, 'down')}`,
    without: 'take a narrower wheel',
  },
};

export const moveText = ({ id, number }: NextMove, show: Show): string =>
  number === null ? MOVES[id].without : MOVES[id].with(number, show);
