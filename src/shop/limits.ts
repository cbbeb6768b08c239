import type { OutOfRangeRefusal } from '../refusal.ts';

/** Smallest and largest, and the unit they are meant in. */
export type Range = readonly [min: number, max: number, unit: string];

/** The first of these numbers that lies outside its range; what is not said is not judged. */
export const rangeFault = <K extends string>(
  ranges: Readonly<Record<K, Range>>,
  values: Readonly<Record<NoInfer<K>, number | null>>,
): OutOfRangeRefusal | null => {
  for (const what of Object.keys(ranges) as K[]) {
    const fault = outside(what, values[what], ranges[what]);
    if (fault !== null) return fault;
  }
  return null;
};

export const outside = (
  what: string,
  value: number | null,
  [min, max, unit]: Range,
): OutOfRangeRefusal | null =>
  value === null || (value >= min && value <= max)
    ? null
    : { code: 'outOfRange', what, value, min, max, unit };

/** Half a tooth cannot be counted. */
export const wholeFault = (
  what: string,
  value: number | null,
  [min, max, unit]: Range,
): OutOfRangeRefusal | null =>
  value === null || Number.isSafeInteger(value)
    ? null
    : { code: 'outOfRange', what, value, min, max, unit };
