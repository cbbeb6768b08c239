import type { Formula } from './formula.ts';
import { CHECK_FORMULAS } from './formulasOfChecks.ts';
import { LOAD_FORMULAS } from './formulasOfLoad.ts';
import { MOTION_FORMULAS } from './formulasOfMotion.ts';
import { PART_FORMULAS } from './formulasOfParts.ts';
import { PLAN_FORMULAS } from './formulasOfPlan.ts';
import { TOOTH_FORMULAS } from './formulasOfTooth.ts';

const ALL = {
  ...TOOTH_FORMULAS,
  ...MOTION_FORMULAS,
  ...LOAD_FORMULAS,
  ...CHECK_FORMULAS,
  ...PART_FORMULAS,
  ...PLAN_FORMULAS,
};

/** A function by the name it is exported under. */
export type FormulaName = keyof typeof ALL;

/** Every formula that a figure or a check is traced to, by its function. */
export const FORMULAS: Readonly<Record<FormulaName, Formula>> = ALL;
