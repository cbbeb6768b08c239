import {
  type CribWheel,
  DEFAULT_INCLUDED,
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
} from '../../src/desk/index.ts';
import { planCard } from './planCard.ts';
import { type CribKind, type PlanWords, planFields } from './planFields.ts';
import { cribOfShop } from './shopCrib.ts';
import { type ShopBuilt, shopRequestOf } from './shopRequest.ts';
import { reworded } from './words.ts';

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

type Crib = { readonly crib: readonly CribWheel[]; readonly kind: CribKind };

/** The wheel that was named, the shop's own, or those of the standards where it entered none. */
const cribOf = async (context: Context, given: PlanWords, request: SetupRequest): Promise<Crib> =>
  given.wheel === undefined
    ? await cribOfShop(context, [request.pattern])
    : { crib: [namedWheel(request)], kind: 'oneWheel' };

const missingFinish = (context: Context): Reply => {
  const examples = context.units === 'in' ? ['finish 0.995-1.005'] : ['finish 19.8-20.0'];
  return refuse(
    { code: 'missing', parameter: 'finish', examples },
    examples.map((example) => ({
      label: example,
      words: reworded(context, ['finish'], example),
    })),
  );
};

type Asked = Exclude<ShopBuilt, { readonly refusal: unknown }>;

const planned = async (
  context: Context,
  given: PlanWords,
  { request, machine, growth, about }: Asked,
): Promise<Reply> => {
  const { finish } = request;
  if (finish === null || request.aimOnly === true) return missingFinish(context);
  const { crib, kind } = await cribOf(context, given, request);
  const wanted: PlanRequest = {
    job: request,
    limits: finish,
    pitchTolerance: given.tolerance ?? PITCH_TOLERANCE,
    included: request.included === DEFAULT_INCLUDED ? null : request.included,
    crib,
    turningSpread: machine?.turningSpread ?? TURNING_SPREAD,
  };
  return cardReply(
    planCard({
      context,
      given,
      request,
      limits: finish,
      kind,
      crib,
      growth,
      plan: planFrom(wanted),
    }),
    [],
    about,
  );
};

/** From the print's limits to every set-up that comes out, the likeliest first. */
export const plan = defineCommand({
  path: ['knurl', 'plan'],
  examples: [
    '/knurl plan finish 0.995-1.005 straight 96dp 303 long 0.5',
    '/knurl plan finish 19.8-20.1mm RGE 0.8 1018 long 15mm',
  ],
  parameters: planFields,
  foremost: ['finish', 'pattern', 'pitch', 'material', 'length', 'stickout', 'wheel', 'machine'],
  allowed: 'operator',
  run: async (context, given) => {
    if (given.finish === undefined) return missingFinish(context);
    const built = await shopRequestOf(context, given, false);
    return 'refusal' in built
      ? refuse(built.refusal, built.choices)
      : await planned(context, given, built);
  },
});
