import type { FormulaWords } from './formulaWords.ts';

/** Speed, feed, turns and time. */
export const motionFormulas = {
  speedLimit: {
    says: 'Surface speed not to pass with this material, process and pin.',
    assumes: 'Assumes a pin in good order and oil on it.',
  },
  startingSpeed: {
    says: 'Surface speed to start with: a quarter of the way up the band.',
    assumes: 'Assumes nothing is known that speaks for more.',
  },
  spindleSpeed: {
    says: 'Spindle speed for a surface speed.',
    assumes: "Assumes the speed is meant at the blank's surface.",
  },
  surfaceSpeed: {
    says: 'Surface speed of a spindle speed.',
    assumes: "Assumes the speed is meant at the blank's surface.",
  },
  contactWidth: {
    says: 'Width of wheel that rolls on the work.',
    assumes: 'Assumes both edges are bevelled alike.',
  },
  feedWindow: {
    says: "Feeds that give every spot its turns, in the trade's range and not too fast for the pitch.",
    assumes: 'Assumes one pass.',
  },
  cutFeedCheck: {
    says: 'Whether the feed of a cut knurl lies in its range.',
    assumes: 'Assumes square-edged wheels that travel.',
  },
  turnsOnSpot: {
    says: 'Turns that each spot gets from a wheel that travels along.',
    assumes: 'Assumes one pass.',
  },
  plungeTurns: {
    says: "Turns of a plunge: the middle of the class's range.",
    assumes: 'Assumes the last three turns feed nothing.',
  },
  infeedPerTurn: {
    says: 'Infeed of each turn between the first bite and the dwell.',
    assumes:
      'Assumes an even feed; nothing is left where the first bite is already the whole infeed.',
  },
  plungeTime: {
    says: 'Time of a plunge.',
    assumes: 'Assumes nothing for handling.',
  },
  traverseTime: {
    says: 'Time of a traverse.',
    assumes: 'Assumes one pass and nothing for handling.',
  },
} as const satisfies Record<string, FormulaWords>;
