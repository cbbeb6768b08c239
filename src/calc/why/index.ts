/** Why a figure is what it is: the register of formulas, inputs and sources. */
export type { FormulaName } from './formulas.ts';
export { MARK_ORDER } from './marks.ts';
export {
  CHECK_NUMBERS,
  type CheckNumber,
  type FigureName,
  type Given,
  type Remark,
} from './origin.ts';
export { PLAN_FIGURES, TROUBLE_FIGURES } from './originsOfPlan.ts';
export { type Way, waysOfCheck, waysOfSetUp } from './ways.ts';
export {
  EXPLAINED,
  type Explained,
  type ExplainedVerb,
  type Step,
  type Subject,
  type Why,
  whyOf,
} from './why.ts';
