import type {
  Check,
  Figure,
  FigureName,
  FormulaName,
  Given,
  Mark,
  Remark,
  Step,
  Subject,
} from '../calc/index.ts';

/** How sure a number is: its mark, or who gave it; null where it is not traced any further. */
export type Sure = Mark | 'person' | 'machine' | null;

/** Why a figure or a check is what it is. */
export type WhyLines = {
  whyFigure: { readonly name: FigureName; readonly figure: Figure };
  whyCheck: { readonly check: Check };
  whyNone: { readonly subject: Subject };
  whyTold: { readonly told: 'person' | 'machine' };
  whySays: { readonly by: FormulaName };
  whyFormula: { readonly text: string };
  whyRemark: { readonly remark: Remark };
  whySource: {
    readonly title: string | null;
    readonly edition: string | null;
    readonly mark: Mark;
  };
  whySure: {
    readonly mark: Mark;
    /** The weakest of several. */
    readonly weakest: boolean;
  };
  whyAssumes: { readonly by: FormulaName };
};

export type WhyRows = {
  whyInput: {
    /** Null where the formula speaks of it in words. */
    readonly symbol: string | null;
    readonly name: FigureName;
    readonly figure: Figure | null;
    readonly sure: Sure;
  };
  whyThrough: { readonly symbol: string; readonly step: Step };
  whyGiven: { readonly symbol: string; readonly given: Given };
};

export type WhyLabels = {
  why: { readonly subject: Subject };
};
