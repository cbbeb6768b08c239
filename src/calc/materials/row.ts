import type { HardeningClass } from '../feed.ts';
import type { SourceId } from '../sources.ts';
import type { MaterialGroup, Suits } from './material.ts';

type TableId = Extract<SourceId, `materials-S${number}`>;

/** Where a number stands: a published table of the register, or M: remembered, not looked up. */
export type Sheet = (TableId extends `materials-${infer Table}` ? Table : never) | 'M';

export type Figure = readonly [sheet: Sheet, value: number];

/** Slowest and fastest, m/min. */
export type Band = readonly [slowest: number, fastest: number];

/** A material as it is written down: strengths in MPa, modulus in GPa, elongation in per cent. */
export interface Row {
  readonly id: string;
  readonly name: string;
  readonly condition: string;
  readonly uns?: string;
  readonly group: MaterialGroup;
  readonly yield: Figure;
  readonly uts: Figure;
  readonly hardness: Figure | null;
  readonly modulus: Figure;
  readonly elongation: Figure;
  readonly strainHardening: Figure | null;
  readonly hardeningClass: HardeningClass | null;
  readonly formKnurl: Suits;
  readonly cutKnurl: Suits;
  readonly formSpeed: Band | null;
  readonly cutSpeed: Band;
  readonly maxFill: number | null;
  readonly aliases: readonly string[];
  readonly note: string;
}
