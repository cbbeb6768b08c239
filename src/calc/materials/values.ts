import type { SourceId } from '../sources.ts';
import { type MPa, mPerMin, mpa } from '../units.ts';
import type { SpeedBand, Valued } from './material.ts';

type TableId = Extract<SourceId, `materials-S${number}`>;
type Table = TableId extends `materials-${infer Name}` ? Name : never;

/** Stands in a published table that was seen. */
export const reported = <T>(table: Table, value: T): Valued<T> => ({
  value,
  mark: 'reported',
  source: `materials-${table}`,
});

/** Published, not looked up. */
export const remembered = <T>(value: T): Valued<T> => ({
  value,
  mark: 'from memory',
  source: 'materials-memory',
});

/** A rule of the trade. */
export const practice = <T>(value: T): Valued<T> => ({
  value,
  mark: 'common practice',
  source: 'materials-practice',
});

export const gpa = (value: number): MPa => mpa(value * 1000);

export const band = (slowest: number, fastest: number): SpeedBand => [
  mPerMin(slowest),
  mPerMin(fastest),
];
