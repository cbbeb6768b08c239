import { z } from 'zod';
import { setUp } from '../../src/calc/index.ts';
import { cardReply, defineCommand, refuse } from '../../src/desk/index.ts';
import { proven } from './checkParameters.ts';
import { fit, plate } from './finishParameters.ts';
import * as words from './parameters.ts';
import { requestOf } from './request.ts';
import { setupCard } from './setupCard.ts';

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
  hardness: words.hardness,
  runout: words.runout,
  plate,
  fit,
  proven,
  units: words.shown,
});
export type SetupWords = z.infer<typeof setupParameters>;

/** What an operator asks for at the machine. */
export const setup = defineCommand({
  path: ['knurl', 'setup'],
  examples: [
    '/knurl 1.000 straight 21tpi 1018',
    '/knurl 19mm diamond 1.0 pitch 304 long 30mm',
    '/knurl 7/8 diagonal left 96dp brass',
  ],
  parameters: setupParameters,
  allowed: 'operator',
  run: (context, said) => {
    const built = requestOf(context, said);
    if ('refusal' in built) return refuse(built.refusal, built.choices);
    const result = setUp(built.request);
    return cardReply(setupCard({ ...built, context, said, result }));
  },
});
