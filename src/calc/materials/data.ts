import { ALUMINIUM_ALLOYS } from './aluminium.ts';
import { COPPER_ALLOYS } from './copperAlloys.ts';
import type { Material } from './material.ts';
import { OTHER_METALS } from './otherMetals.ts';
import { PLASTICS } from './plastics.ts';
import { STAINLESS_STEELS } from './stainless.ts';
import { STEELS } from './steels.ts';

/** Bars as shops buy them. A bare grade means the condition it is usually sold in. */
export const MATERIALS: readonly Material[] = [
  ...STEELS,
  ...STAINLESS_STEELS,
  ...ALUMINIUM_ALLOYS,
  ...COPPER_ALLOYS,
  ...OTHER_METALS,
  ...PLASTICS,
];
