import type { FamilyGrowth, SetupRequest } from '../../src/calc/index.ts';
import type { About, Context } from '../../src/desk/index.ts';
import type { Refusal, Suggestion } from '../../src/refusal.ts';
import {
  findIn,
  leaves,
  limitsOf,
  MACHINES,
  MATERIALS_OF_SHOP,
  type Machine,
  type ShopMaterial,
  sizeOf,
  WHEELS,
  type Wheel,
} from '../../src/shop/index.ts';
import { requestOf } from './request.ts';
import type { SetupWords } from './setupParameters.ts';
import { grownAs, growthFor } from './shopGrowth.ts';

type Refused = { readonly refusal: Refusal; readonly choices: readonly Suggestion[] };
type Given<T> = { readonly id: string; readonly value: T } | null;

export type ShopBuilt =
  | {
      readonly request: SetupRequest;
      readonly materialAssumed: boolean;
      readonly machine: Machine | null;
      readonly wheel: Wheel | null;
      /** What the shop has seen of the growth of such a part. */
      readonly growth: FamilyGrowth | null;
      readonly about: About;
    }
  | Refused;

const noRecords = (what: string): Refused => ({
  refusal: { code: 'notFound', what, nearest: [] },
  choices: [],
});

const machineOf = async (
  { visit }: Context,
  name: string | undefined,
): Promise<Given<Machine> | Refused> => {
  if (name === undefined) return null;
  if (visit === null) return noRecords('machine');
  const found = await findIn(visit.shop, MACHINES, name);
  return found.ok
    ? { id: found.value.id, value: found.value }
    : { refusal: found.refusal, choices: [] };
};

const materialOf = async (
  { visit }: Context,
  said: SetupWords,
): Promise<Given<ShopMaterial> | Refused> => {
  const name = said.material?.own;
  if (name === undefined) return null;
  if (visit === null) return noRecords('material');
  const found = await findIn(visit.shop, MATERIALS_OF_SHOP, name);
  return found.ok
    ? { id: found.value.id, value: found.value }
    : { refusal: found.refusal, choices: [] };
};

const wheelOf = async ({ visit }: Context, said: SetupWords): Promise<Given<Wheel> | Refused> => {
  const name = said.wheel?.name ?? null;
  if (name === null) return null;
  if (visit === null) return noRecords('wheel');
  const found = await findIn(visit.shop, WHEELS, name);
  return found.ok
    ? { id: found.value.id, value: found.value }
    : { refusal: found.refusal, choices: [] };
};

/** What a wheel alone leaves on the work; nothing where its form leaves a choice. */
const patternLeft = (said: SetupWords, wheel: Wheel): Pick<SetupWords, 'pattern' | 'hand'> => {
  const isSaid =
    said.pattern !== undefined ||
    said.hand !== undefined ||
    (said.callout?.pattern ?? null) !== null;
  const [only, ...others] = leaves(wheel.form);
  if (isSaid || only === undefined || others.length > 0) return {};
  return 'hand' in only && only.hand !== null
    ? { pattern: only.kind, hand: only.hand }
    : { pattern: only.kind };
};

/** What the shop knows of its wheel, where the line did not say it itself. */
const withWheel = (said: SetupWords, wheel: Wheel): SetupWords => {
  const { diameter, face, bore } = sizeOf(wheel);
  const counted = wheel.diameter === null ? null : wheel.teeth;
  const pin = { diameter: wheel.pinDiameter, material: wheel.pinMaterial };
  const known = pin.diameter === null && pin.material === null ? undefined : pin;
  return {
    ...said,
    ...patternLeft(said, wheel),
    wheel: { name: wheel.name, diameter, face, bore, teeth: counted },
    pitch: said.pitch ?? wheel.pitch ?? undefined,
    rim: said.rim ?? (wheel.alongRim ? true : undefined),
    bevel: said.bevel ?? wheel.bevel ?? undefined,
    edge: said.edge ?? wheel.edge ?? undefined,
    angle: said.angle ?? wheel.included ?? undefined,
    pin: said.pin ?? known,
    // A proven pair stands for the pitch: one count on the diameter that it gives.
    proven:
      said.proven ??
      (wheel.proven === null
        ? undefined
        : { teeth: 100, diameter: (100 * wheel.proven) / Math.PI }),
  };
};

const lowered = (request: SetupRequest, machine: Machine | null): SetupRequest =>
  machine === null ? request : { ...request, machine: limitsOf(machine) };

/** What a line asks for, with what the shop's own lists know of its wheel and its machine. */
export const shopRequestOf = async (
  context: Context,
  said: SetupWords,
  pitchNeeded = true,
): Promise<ShopBuilt> => {
  const [wheel, machine] = [await wheelOf(context, said), await machineOf(context, said.machine)];
  if (wheel !== null && 'refusal' in wheel) return wheel;
  if (machine !== null && 'refusal' in machine) return machine;
  const material = await materialOf(context, said);
  if (material !== null && 'refusal' in material) return material;
  const known = wheel === null ? said : withWheel(said, wheel.value);
  const built = requestOf(context, known, pitchNeeded);
  if ('refusal' in built) return built;
  const growth = await growthFor(context, built.request);
  const request = grownAs(lowered(built.request, machine?.value ?? null), growth);
  return {
    request,
    materialAssumed: built.materialAssumed,
    machine: machine?.value ?? null,
    wheel: wheel?.value ?? null,
    growth,
    about: {
      request,
      wheel: wheel?.id ?? null,
      machine: machine?.id ?? null,
      material: material?.id ?? null,
      base: request.material.id,
    },
  };
};
