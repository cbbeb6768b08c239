import type { CheckName } from '../check.ts';
import { type Mark, SOURCES, type SourceId } from '../sources.ts';
import { FORMULAS, type FormulaName } from './formulas.ts';
import { weakestMark } from './marks.ts';
import type { FigureName, Given, Origins, Remark, Through, Told, Worked } from './origin.ts';
import { CHECK_FIGURE_ORIGINS } from './originsOfCheck.ts';
import { CHECK_ORIGINS } from './originsOfChecks.ts';
import { PLAN_ORIGINS, TROUBLE_ORIGINS } from './originsOfPlan.ts';
import { SETUP_ORIGINS } from './originsOfSetup.ts';
import type { Way } from './ways.ts';

/** The cards whose figures can be asked about. */
export const EXPLAINED = ['setup', 'check', 'plan', 'trouble'] as const;
export type ExplainedVerb = (typeof EXPLAINED)[number];

/** What is asked about on a card. */
export type Subject = { readonly figure: FigureName } | { readonly check: CheckName };

export type Step = { readonly by: FormulaName; readonly formula: readonly string[] };

/** Why a figure is what it is. */
export type Explained = Step & {
  /** The formula is all of its card's, not the part of it that gives this figure. */
  readonly isWhole: boolean;
  readonly inputs: Readonly<Record<string, FigureName>>;
  readonly also: readonly FigureName[];
  /** Symbols that are worked out on the way. */
  readonly through: Readonly<Record<string, Step>>;
  readonly given: Readonly<Record<string, Given>>;
  readonly remark: Remark | null;
  readonly sources: readonly SourceId[];
  /** The weakest of its sources' marks. */
  readonly mark: Mark;
};
export type Why = Explained | Pick<Told, 'told'>;

const FIGURE_ORIGINS: Readonly<
  Record<ExplainedVerb, Readonly<Partial<Record<FigureName, Origins>>>>
> = {
  setup: SETUP_ORIGINS,
  check: CHECK_FIGURE_ORIGINS,
  plan: PLAN_ORIGINS,
  trouble: TROUBLE_ORIGINS,
};

const originsOf = (verb: ExplainedVerb, subject: Subject): Origins | null => {
  if ('check' in subject) return CHECK_ORIGINS[subject.check];
  return FIGURE_ORIGINS[verb][subject.figure] ?? null;
};

const stepOf = (through: Through): Step =>
  typeof through === 'string'
    ? { by: through, formula: FORMULAS[through].formula }
    : { by: through[0], formula: [through[1]] };

const explained = (worked: Worked): Explained => {
  const through = Object.fromEntries(
    Object.entries(worked.through ?? {}).map(([symbol, each]) => [symbol, stepOf(each)]),
  );
  const names = [worked.by, ...Object.values(through).map(({ by }) => by)];
  const sources = [...new Set(names.flatMap((name) => FORMULAS[name].sources))];
  return {
    by: worked.by,
    formula: worked.parts ?? FORMULAS[worked.by].formula,
    isWhole: worked.parts === undefined,
    inputs: worked.inputs ?? {},
    also: worked.also ?? [],
    through,
    given: worked.given ?? {},
    remark: worked.remark ?? null,
    sources,
    mark: weakestMark(sources.map((id) => SOURCES[id].mark)),
  };
};

/**
 * Why a figure or a check of a card is what it is: formula, what goes into it, sources and mark.
 *
 *     the first origin in the register whose ways all hold
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | verb | whose card it is: setup, check, plan or trouble | - | |
 * | subject | the figure or the check | - | |
 * | ways | in what ways the card's figures came about | - | |
 * | → why | formula, inputs, sources and mark; told where it was said; null where the card has no such figure | - | |
 *
 * Assumes the register agrees with the formula cards.
 *
 * @source judgement (which figures are traced to which function)
 * @example whyOf('setup', { figure: 'crestFlat' }, []).formula // ["w = p (1 − x)"]
 * @example whyOf('setup', { figure: 'turns' }, ['turnsAsked']).told // "person"
 */
export function whyOf(verb: ExplainedVerb, subject: Subject, ways: readonly Way[]): Why | null {
  const origin = originsOf(verb, subject)?.find(({ when }) =>
    (when ?? []).every((way) => ways.includes(way)),
  );
  if (origin === undefined) return null;
  return 'told' in origin ? { told: origin.told } : explained(origin);
}
