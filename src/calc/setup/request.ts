import type { Support, ToolLayout } from '../bending/index.ts';
import type { Edge } from '../edge.ts';
import type { Material } from '../materials/index.ts';
import type { Pattern } from '../pattern.ts';
import type { Pitch } from '../pitch.ts';
import type { GrowthBelief } from '../shopGrowth.ts';
import type { PinMaterial, Process } from '../speed.ts';
import type { KnurlClass, Window } from '../tracking.ts';
import {
  degrees,
  type Mm,
  type MmPerRev,
  type MPerMin,
  mm,
  type NewtonMm,
  type Rad,
  type RevPerMin,
  type Watt,
} from '../units.ts';

/** A wheel whose teeth were counted and whose diameter was measured. */
export type CountedWheel = { readonly diameter: Mm; readonly teeth: number };

export type WheelSize = {
  readonly diameter: Mm;
  readonly face: Mm;
  readonly bore: Mm;
  /** Null: what its edge implies. */
  readonly bevel: Mm | null;
};

/** The wheel taken where none is named. */
export const DEFAULT_WHEEL: WheelSize = { diameter: mm(20), face: mm(8), bore: mm(6), bevel: null };
export const DEFAULT_BEVEL: Mm = mm(1);
/** Included tooth angle where none is named, for DP wheels too. */
export const DEFAULT_INCLUDED: Rad = degrees(90);

/** What a gearbox or a drive can be set to: single steps, or anything between two ends. */
export type Steps<T> =
  | { readonly list: readonly T[] }
  | { readonly slowest: T; readonly fastest: T };

/** What the machine can do, where the shop has said so. */
export type MachineLimits = {
  /** Spindle speeds, or null where any can be had. */
  readonly speeds: Steps<RevPerMin> | null;
  /** Feeds of the gearbox, or null where any can be had. */
  readonly feeds: Steps<MmPerRev> | null;
  readonly topSpeed: RevPerMin | null;
  /** What it can turn against at the spindle, or null where not known. */
  readonly torque: NewtonMm | null;
  readonly power: Watt | null;
};

/** Everything a set-up is worked out from. Null: not said. */
export type SetupRequest = {
  readonly pattern: Pattern;
  readonly pitch: Pitch | null;
  /** The label's pitch is meant along the rim. */
  readonly alongRim: boolean;
  readonly counted: CountedWheel | null;
  /** Pitch round the rim that a diameter and its count have proven. */
  readonly proven: Mm | null;
  readonly helix: Rad | null;
  /** Straight wheels set over by this much. */
  readonly tilt: Rad | null;
  readonly included: Rad;
  readonly stock: Mm | null;
  readonly finish: Window | null;
  /** The finish is one size to aim at, without limits of its own. */
  readonly aimOnly?: boolean;
  /** Bore the knurl is pressed into. */
  readonly fitBore?: Mm | null;
  /** Thickness of the plating to come, which the finish has been made smaller for. */
  readonly plate?: Mm | null;
  readonly asIs: boolean;
  readonly wantedTeeth: number | null;
  readonly knurlClass: KnurlClass | null;
  readonly fill: number | null;
  readonly material: Material;
  readonly hardness: number | null;
  readonly process: Process | null;
  readonly wheel: WheelSize;
  readonly edge: Edge | null;
  readonly pin: PinMaterial;
  /** Null: the bore of the wheel. */
  readonly pinDiameter: Mm | null;
  /** One crossed wheel instead of a pair. */
  readonly onePiece: boolean;
  readonly length: Mm | null;
  readonly stickout: Mm | null;
  readonly support: Support;
  /** Null: what the pattern implies. */
  readonly layout: ToolLayout | null;
  readonly stockLength: Mm | null;
  readonly bore: Mm | null;
  /** A plug in the bore carries the wall. */
  readonly plug: boolean;
  readonly feed: MmPerRev | null;
  readonly speed: MPerMin | null;
  readonly rotation: RevPerMin | null;
  readonly turns: number | null;
  readonly batch: number;
  readonly runout: Mm | null;
  readonly machine: MachineLimits | null;
  readonly growth: GrowthBelief;
};
