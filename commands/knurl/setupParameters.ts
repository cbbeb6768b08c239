import { z } from 'zod';
import { proven } from './checkParameters.ts';
import { fit, plate } from './finishParameters.ts';
import * as words from './parameters.ts';
import { partOfSetup } from './standardFields.ts';

/** Everything that can be said of a set-up. */
export const setupParameters = z.object({
  diameter: words.diameter,
  pattern: words.pattern,
  pitch: words.pitch,
  material: words.material,
  callout: words.callout,
  points: words.points,
  hand: words.hand,
  rim: words.rim,
  finish: words.finish,
  asIs: words.asIs,
  teeth: words.teeth,
  length: words.length,
  stickout: words.stickout,
  stockLength: words.stockLength,
  process: words.process,
  class: words.knurlClass,
  helix: words.helix,
  tilt: words.tilt,
  angle: words.angle,
  fill: words.fill,
  speed: words.speed,
  rotation: words.rotation,
  feed: words.feed,
  turns: words.turns,
  batch: words.batch,
  wheel: words.wheel,
  bevel: words.bevel,
  edge: words.edge,
  oneWheel: words.onePiece,
  layout: words.layout,
  pin: words.pin,
  support: words.support,
  bore: words.bore,
  plug: words.plug,
  machine: words.machine,
  hardness: words.hardness,
  runout: words.runout,
  plate,
  fit,
  proven,
  part: partOfSetup,
  units: words.shown,
});
export type SetupWords = z.infer<typeof setupParameters>;
