import type { Converted, Mm, Pitch, Rad } from '../calc/index.ts';
import type { Nothing } from './nothing.ts';

/** A wheel whose pitch comes near the one asked for. */
export type NearSaid = { readonly wheel: string; readonly pitch: Mm; readonly error: number };

export type ConvertLines = {
  pitchIs: { readonly pitch: Pitch; readonly systems: readonly Converted[] };
  /** What is along the rim and what square to the teeth, where the two differ. */
  alongRim: { readonly helix: Rad };
  straightTaken: Nothing;
  wheelsWithin: { readonly tolerance: number; readonly wheels: number };
  noWheelWithin: NearSaid & { readonly tolerance: number };
};

export type ConvertRows = {
  inSystem: Converted;
  nearWheel: NearSaid & { readonly place: number };
};

/** What the buttons of a conversion say. */
export type ConvertLabels = { within: { readonly tolerance: number } };
