import { z } from 'zod';
import {
  type CribWheel,
  DEFAULT_INCLUDED,
  dinCrib,
  dpCrib,
  PITCH_TOLERANCE,
  type PlanRequest,
  plan as planFrom,
  type SetupRequest,
  TURNING_SPREAD,
} from '../../src/calc/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  refuse,
  said,
} from '../../src/desk/index.ts';
import { shareOf } from '../../src/words/index.ts';
import { fit, plate } from './finishParameters.ts';
import * as words from './parameters.ts';
import { planCard } from './planCard.ts';
import { requestOf } from './request.ts';

/** How far off the pitch asked for a wheel may be. */
const tolerance = said<number>({
  name: 'tolerance',
  read: shareOf('tolerance', [0, 0.5]),
  keywords: ['within', 'tolerance', 'pitch within'],
  examples: ['within 3%'],
});

const parameters = z.object({
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
export type PlanWords = z.infer<typeof parameters>;

export type CribKind = 'byStandard' | 'oneWheel';

/** The wheel that was named, as the only one in the crib. */
const namedWheel = (request: SetupRequest): CribWheel => ({
  name: `${String(request.wheel.diameter)} mm`,
  pattern: request.pattern,
  onePiece: request.onePiece,
  pitch: request.pitch,
  alongRim: request.alongRim,
  teeth: request.counted?.teeth ?? null,
  proven: request.proven,
  helix: request.helix,
  included: request.included,
  size: request.wheel,
  edge: request.edge,
});

const cribFor = (
  given: PlanWords,
  request: SetupRequest,
): { crib: readonly CribWheel[]; kind: CribKind } =>
  given.wheel === undefined
    ? { crib: [...dinCrib(), ...dpCrib()], kind: 'byStandard' }
    : { crib: [namedWheel(request)], kind: 'oneWheel' };

const missingFinish = ({ units }: Context): Reply =>
  refuse({
    code: 'missing',
    parameter: 'finish',
    examples: units === 'in' ? ['finish 0.995-1.005'] : ['finish 19.8-20.0'],
  });

const planned = (context: Context, given: PlanWords, request: SetupRequest): Reply => {
  const { finish } = request;
  if (finish === null || request.aimOnly === true) return missingFinish(context);
  const { crib, kind } = cribFor(given, request);
  const wanted: PlanRequest = {
    job: request,
    limits: finish,
    pitchTolerance: given.tolerance ?? PITCH_TOLERANCE,
    included: request.included === DEFAULT_INCLUDED ? null : request.included,
    crib,
    turningSpread: TURNING_SPREAD,
  };
  return cardReply(
    planCard({ context, given, request, limits: finish, kind, plan: planFrom(wanted) }),
  );
};

/** From the print's limits to every set-up that comes out, the likeliest first. */
export const plan = defineCommand({
  path: ['knurl', 'plan'],
  examples: [
    '/knurl plan finish 0.995-1.005 straight 96dp 303 long 0.5',
    '/knurl plan finish 19.8-20.1mm RGE 0.8 1018 long 15mm',
  ],
  parameters,
  allowed: 'operator',
  run: (context, given) => {
    if (given.finish === undefined) return missingFinish(context);
    const built = requestOf(context, given, false);
    return 'refusal' in built
      ? refuse(built.refusal, built.choices)
      : planned(context, given, built.request);
  },
});
