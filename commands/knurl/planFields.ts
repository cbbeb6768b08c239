import { z } from 'zod';
import { said } from '../../src/desk/index.ts';
import { shareOf } from '../../src/words/index.ts';
import { fit, plate } from './finishParameters.ts';
import * as words from './parameters.ts';

/** How far off the pitch asked for a wheel may be. */
const tolerance = said<number>({
  name: 'tolerance',
  read: shareOf('tolerance', [0, 0.5]),
  keywords: ['within', 'tolerance', 'pitch within'],
  examples: ['within 3%'],
});

export const planFields = z.object({
  finish: words.finish,
  pattern: words.pattern,
  pitch: words.pitch,
  material: words.material,
  callout: words.callout,
  diameter: words.diameter,
  points: words.points,
  hand: words.hand,
  rim: words.rim,
  tolerance,
  length: words.length,
  stickout: words.stickout,
  support: words.support,
  layout: words.layout,
  process: words.process,
  class: words.knurlClass,
  helix: words.helix,
  angle: words.angle,
  wheel: words.wheel,
  machine: words.machine,
  bevel: words.bevel,
  edge: words.edge,
  oneWheel: words.onePiece,
  pin: words.pin,
  bore: words.bore,
  plug: words.plug,
  hardness: words.hardness,
  speed: words.speed,
  rotation: words.rotation,
  feed: words.feed,
  turns: words.turns,
  batch: words.batch,
  runout: words.runout,
  plate,
  fit,
  units: words.shown,
});
export type PlanWords = z.infer<typeof planFields>;

export type CribKind = 'byStandard' | 'ofShop' | 'oneWheel';
