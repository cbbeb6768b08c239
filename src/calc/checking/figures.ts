import type { Figure } from '../check.ts';
import { figure } from '../check.ts';
import type { Mm, UnitName } from '../units.ts';

/** The figures of every check, before, at the seam and after; one that does not apply is null. */
export const CHECK_FIGURES = {
  toothCount: '1',
  toothError: '1',
  diameterError: 'mm',
  blankWindowLow: 'mm',
  blankWindowHigh: 'mm',
  nextDiameter: 'mm',
  nextToothCount: '1',
  nextTakeOff: 'mm',
  pitch: 'mm',
  transversePitch: 'mm',
  countDoubt: '1',
  chanceTracks: '1',
  effectivePitch: 'mm',
  seamTakeOff: 'mm',
  seamDiameter: 'mm',
  seamTeethOff: '1',
  seamLabelChance: '1',
  marksTakeOff: 'mm',
  marksDiameter: 'mm',
  firstBite: 'mm',
  blankDiameter: 'mm',
  countedTeeth: '1',
  countExpected: '1',
  growthMeasured: 'mm',
  growthExpected: 'mm',
  growthFactor: '1',
  growthFactorExpected: '1',
  fillMeasured: '1',
  fillExpected: '1',
  fillFromCrest: '1',
  crestMeasured: 'mm',
  crestDiameter: 'mm',
  crestDiameterLow: 'mm',
  crestDiameterHigh: 'mm',
  cleanedDiameter: 'mm',
  rescueDiameter: 'mm',
  rescueToothCount: '1',
  rescueFill: '1',
  fillNear: '1',
  fillFar: '1',
  infeedNear: 'mm',
  infeedFar: 'mm',
  taper: 'mm',
  swivelAngle: 'rad',
} as const satisfies Record<string, UnitName>;
export type CheckFigureName = keyof typeof CHECK_FIGURES;
export type CheckFigures = Readonly<Record<CheckFigureName, Figure | null>>;

/** A blank that would do instead; the count is null where nobody counted. */
export type CheckAlternative = { readonly toothCount: number | null; readonly blankDiameter: Mm };

/** What to do next, as a number: the words for it are chosen elsewhere. */
export type PartMove<Id extends string> = {
  readonly id: Id;
  readonly number: number | null;
  readonly unit: UnitName;
};

export const checkFigures = (
  values: Partial<Record<CheckFigureName, number | null>>,
): CheckFigures => {
  const named = Object.entries(CHECK_FIGURES).map(([name, unit]) => {
    const value = values[name as CheckFigureName] ?? null;
    return [name, value === null ? null : figure(value, unit)] as const;
  });
  return Object.fromEntries(named) as Record<CheckFigureName, Figure | null>;
};
