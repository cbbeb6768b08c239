import type { HardeningClass } from '../feed.ts';
import type { Mark, SourceId } from '../sources.ts';
import type { MPa, MPerMin } from '../units.ts';

/** A value that brings its evidence along. */
export interface Valued<T> {
  readonly value: T;
  readonly mark: Mark;
  readonly source: SourceId;
}

/** Families that cut alike and whose growth is learned together. */
export type MaterialGroup =
  | 'steel'
  | 'stainless'
  | 'nickel'
  | 'titanium'
  | 'copper'
  | 'brass'
  | 'bronze'
  | 'aluminium'
  | 'zinc'
  | 'magnesium'
  | 'iron'
  | 'plastic';

/** Whether a process suits the material. */
export type Suits = 'yes' | 'marginal' | 'no';

/** Slowest and fastest surface speed of a process. */
export type SpeedBand = readonly [slowest: MPerMin, fastest: MPerMin];

/**
 * What the bar is made of. Hardening class, the two processes and the everyday names are rules of
 * the trade without a source (`materials-practice`); every number carries its own mark.
 */
export interface Material {
  readonly id: string;
  readonly name: string;
  readonly condition: string;
  readonly uns?: string;
  readonly group: MaterialGroup;
  readonly yield: Valued<MPa>;
  readonly uts: Valued<MPa>;
  /** Brinell, kgf/mm²; plastics have none. */
  readonly hardness: Valued<number | null>;
  readonly modulus: Valued<MPa>;
  /** Per cent. */
  readonly elongation: Valued<number>;
  /** Exponent n of σ = K·εⁿ; plastics have none. */
  readonly strainHardening: Valued<number | null>;
  readonly hardeningClass: HardeningClass | null;
  readonly formKnurl: Suits;
  readonly cutKnurl: Suits;
  /** Null where the material does not form at any speed. */
  readonly formSpeed: Valued<SpeedBand | null>;
  readonly cutSpeed: Valued<SpeedBand>;
  /** Deepest fill advised, as a share of the sharp height; null where the usual one stands. */
  readonly maxFill: Valued<number | null>;
  /** What people type for it, in lower case. No two materials share one. */
  readonly aliases: readonly string[];
  readonly note: string;
}
