import type { CheckName, CheckOf, Subject } from '../../calc/index.ts';
import type { WhyLabels, WhyLines, WhyRows } from '../../card/index.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { checks } from './checks.ts';
import { figureName, figureText } from './figureNames.ts';
import { formulaWords, givenBy } from './whyFormulas.ts';
import { givens, remarks, sourced, sureness, surenessOfAll } from './whyGiven.ts';

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

const subjectName = (subject: Subject): string =>
  'figure' in subject
    ? figureName(subject.figure)
    : `check of ${checks[subject.check].label.toLowerCase()}`;

const sayCheck = <N extends CheckName>(check: CheckOf<N>, show: Show): string =>
  checks[check.name].say(check, show);

const sureText = (sure: WhyRows['whyInput']['sure']): string => {
  if (sure === null) return '';
  if (sure === 'person') return ' (as you gave it)';
  return sure === 'machine' ? " (the machine's)" : ` (${sureness[sure]})`;
};

type WhyPhrases = { readonly [K in keyof WhyLines]: (values: WhyLines[K], show: Show) => string };

export const whyLines: WhyPhrases = {
  whyFigure: ({ name, figure }, show) =>
    `${capital(figureName(name))}: ${figureText(name, figure, show)}`,
  whyCheck: ({ check }, show) =>
    `${checks[check.name].label}: ${check.state}, ${sayCheck(check, show)}`,
  whyNone: ({ subject }) =>
    `There is no ${subjectName(subject)} on this card: it does not apply to what was said.`,
  whyTold: ({ told }) =>
    told === 'person'
      ? 'Taken as you gave it.'
      : "The machine's own step at or under what was wanted.",
  whySays: ({ by }) => formulaWords[by].says,
  whyFormula: ({ text }) => text,
  whyRemark: ({ remark }) => remarks[remark],
  whySource: ({ title, edition, mark }) =>
    title === null
      ? `${capital(surenessOfAll[mark])}.`
      : sourced[mark](edition === null ? title : `${title}, ${edition}`),
  whySure: ({ mark, weakest }) =>
    weakest
      ? `No surer than its weakest part: ${surenessOfAll[mark]}.`
      : `How sure: ${surenessOfAll[mark]}.`,
  whyAssumes: ({ by }) => formulaWords[by].assumes,
};

export const whyRows: {
  readonly [K in keyof WhyRows]: (values: WhyRows[K], show: Show) => LabelledText;
} = {
  whyInput: ({ symbol, name, figure, sure }, show) => {
    const value = figure === null ? '' : figureText(name, figure, show);
    const known = `${value}${sureText(sure)}`.trim();
    return symbol === null
      ? { label: capital(figureName(name)), text: known === '' ? 'not known' : known }
      : { label: symbol, text: `${figureName(name)} ${known}`.trim() };
  },
  whyThrough: ({ symbol, step }) => ({
    label: symbol,
    text: [givenBy(step.by), step.formula.join(';  ')].filter((part) => part !== '').join(': '),
  }),
  whyGiven: ({ symbol, given }) => ({ label: symbol, text: givens[given] }),
};

export const whyLabels: {
  readonly [K in keyof WhyLabels]: (values: WhyLabels[K], show: Show) => string;
} = {
  why: ({ subject }) => `Why ${subjectName(subject)}?`,
};
