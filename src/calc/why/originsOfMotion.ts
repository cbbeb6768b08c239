import type { SetupFigureName } from '../setup/index.ts';
import type { Origins } from './origin.ts';

const WIDTH = {
  through: { b: 'contactWidth' },
  given: { face: 'wheelFace', bevel: 'bevel' },
} as const;

const FEED_ENDS: Origins = [
  {
    when: ['cut'],
    by: 'cutFeedCheck',
    parts: ['0.05 to 0.30 mm/rev fine, else watch'],
  },
  {
    by: 'feedWindow',
    inputs: { p: 'pitch' },
    through: WIDTH.through,
    given: { ...WIDTH.given, fewest: 'fewestTurns', most: 'mostTurns' },
  },
];

/** How the figures of speed, feed, turns and time come about. */
export const MOTION_ORIGINS = {
  surfaceSpeed: [
    { when: ['speedAsked'], told: 'person' },
    {
      when: ['rotationAsked'],
      by: 'surfaceSpeed',
      inputs: { n: 'spindleSpeed', D: 'blankDiameter' },
    },
    {
      when: ['speedStepped'],
      by: 'surfaceSpeed',
      inputs: { n: 'spindleSpeed', D: 'blankDiameter' },
    },
    {
      by: 'startingSpeed',
      through: { v_hi: 'speedLimit' },
      given: { v_lo: 'slowestOfBand' },
    },
  ],
  spindleSpeed: [
    { when: ['rotationAsked'], told: 'person' },
    { when: ['speedStepped'], told: 'machine' },
    { by: 'spindleSpeed', inputs: { v: 'surfaceSpeed', D: 'blankDiameter' } },
  ],
  feed: [
    { when: ['feedAsked'], told: 'person' },
    { when: ['feedStepped'], told: 'machine' },
    { when: ['cut'], by: 'cutFeedCheck', parts: ['0.15 mm/rev unless said'] },
    {
      ...WIDTH,
      when: ['turnsAsked'],
      by: 'turnsOnSpot',
      inputs: { N: 'turns' },
      given: { ...WIDTH.given, f: 'thisFigure' },
    },
    {
      by: 'feedWindow',
      inputs: { p: 'pitch' },
      through: WIDTH.through,
      given: { ...WIDTH.given, fewest: 'fewestTurns', most: 'mostTurns' },
    },
  ],
  feedLow: FEED_ENDS,
  feedHigh: FEED_ENDS,
  turns: [
    { when: ['turnsAsked'], told: 'person' },
    { ...WIDTH, when: ['traverse'], by: 'turnsOnSpot', inputs: { f: 'feed' } },
    { by: 'plungeTurns', given: { fewest: 'fewestTurns', most: 'mostTurns' } },
  ],
  passes: [
    {
      ...WIDTH,
      by: 'turnsOnSpot',
      inputs: { f: 'feed', N: 'turns' },
    },
  ],
  time: [
    {
      when: ['traverse'],
      by: 'traverseTime',
      inputs: { f: 'feed', n: 'spindleSpeed' },
      through: WIDTH.through,
      given: { ...WIDTH.given, length: 'knurlLength' },
      remark: 'timesParts',
    },
    { by: 'plungeTime', inputs: { N: 'turns', n: 'spindleSpeed' }, remark: 'timesParts' },
  ],
  infeedPerTurn: [{ by: 'infeedPerTurn', inputs: { z: 'infeed', z1: 'firstBite', N: 'turns' } }],
} as const satisfies Partial<Record<SetupFigureName, Origins>>;
