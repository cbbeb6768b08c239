import { type MPa, mPerMin, mpa } from '../units.ts';
import { ALUMINIUM_ALLOYS } from './aluminium.ts';
import { COPPER_ALLOYS } from './copperAlloys.ts';
import type { Material, SpeedBand, Valued } from './material.ts';
import { OTHER_METALS } from './otherMetals.ts';
import { PLASTICS } from './plastics.ts';
import type { Band, Figure, Row } from './row.ts';
import { STAINLESS_STEELS } from './stainless.ts';
import { STEELS } from './steels.ts';

const valued = <T>([sheet, value]: Figure, as: (value: number) => T): Valued<T> =>
  sheet === 'M'
    ? { value: as(value), mark: 'from memory', source: 'materials-memory' }
    : { value: as(value), mark: 'reported', source: `materials-${sheet}` };

const practice = <T>(value: T): Valued<T> => ({
  value,
  mark: 'common practice',
  source: 'materials-practice',
});

const plain = (value: number): number => value;
const gpa = (value: number): MPa => mpa(value * 1000);
const band = ([slowest, fastest]: Band): SpeedBand => [mPerMin(slowest), mPerMin(fastest)];

const material = (row: Row): Material => ({
  ...row,
  yield: valued(row.yield, mpa),
  uts: valued(row.uts, mpa),
  hardness: row.hardness ? valued(row.hardness, plain) : practice(null),
  modulus: valued(row.modulus, gpa),
  elongation: valued(row.elongation, plain),
  strainHardening: row.strainHardening ? valued(row.strainHardening, plain) : practice(null),
  formSpeed: practice(row.formSpeed && band(row.formSpeed)),
  cutSpeed: practice(band(row.cutSpeed)),
  maxFill: practice(row.maxFill),
});

/** Bars as shops buy them. A bare grade means the condition it is usually sold in. */
export const MATERIALS: readonly Material[] = [
  ...STEELS,
  ...STAINLESS_STEELS,
  ...ALUMINIUM_ALLOYS,
  ...COPPER_ALLOYS,
  ...OTHER_METALS,
  ...PLASTICS,
].map(material);
