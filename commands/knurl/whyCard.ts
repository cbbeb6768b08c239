import {
  CHECK_NUMBERS,
  type Check,
  type CheckNumber,
  type Explained,
  type ExplainedVerb,
  type Figure,
  type FigureName,
  type Figures,
  SOURCES,
  type SourceId,
  type Subject,
  type Why,
  whyOf,
} from '../../src/calc/index.ts';
import {
  type Card,
  type Choice,
  type Line,
  label,
  line,
  type Part,
  type Row,
  row,
  type Sure,
} from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import { replaced, type Span } from '../../src/words/index.ts';
import { saidOf } from './whyWords.ts';
import { reworded } from './words.ts';

/** A card whose figures are asked about. */
export type Explaining = {
  readonly context: Context;
  readonly card: Card;
  readonly verb: ExplainedVerb;
  /** Everything that was meant by the name and stands on the card, the first being the answer. */
  readonly subjects: readonly [Subject, ...Subject[]];
  /** Where the name stands in the line. */
  readonly span: Span;
  readonly units: 'in' | 'mm';
};

/** Buttons for what goes in. Judgement: as many as fit above one thumb. */
const MOST_INPUTS = 4;

const isCheckNumber = (name: FigureName): name is CheckNumber =>
  CHECK_NUMBERS.some((each) => each === name);

const checkOf = ({ card }: Explaining, subject: Subject): Check | null =>
  'check' in subject ? (card.checks.find(({ name }) => name === subject.check) ?? null) : null;

/** The numbers that the subject can draw on: the check's own before the card's. */
const numbersFor = (e: Explaining): Figures => ({
  ...e.card.figures,
  ...checkOf(e, e.subjects[0])?.figures,
});

const whyFor = (e: Explaining, subject: Subject): Why | null =>
  whyOf(e.verb, subject, e.card.ways ?? []);

const sureOf = (e: Explaining, name: FigureName): Sure => {
  if (isCheckNumber(name)) return null;
  const why = whyFor(e, { figure: name });
  if (why === null) return null;
  return 'told' in why ? why.told : why.mark;
};

const headline = (e: Explaining): Line => {
  const [subject] = e.subjects;
  const check = checkOf(e, subject);
  if (check !== null) return line('whyCheck', { check });
  const name = 'figure' in subject ? subject.figure : 'infeed';
  const figure = e.card.figures[name];
  return figure ? line('whyFigure', { name, figure }) : line('whyNone', { subject });
};

const inputRow = (e: Explaining, symbol: string | null, name: FigureName): Row =>
  row('whyInput', { symbol, name, figure: numbersFor(e)[name] ?? null, sure: sureOf(e, name) });

const rowsOf = (e: Explaining, why: Explained): readonly Row[] => [
  ...Object.entries(why.inputs).map(([symbol, name]) => inputRow(e, symbol, name)),
  ...why.also.map((name) => inputRow(e, null, name)),
  ...Object.entries(why.through).map(([symbol, step]) => row('whyThrough', { symbol, step })),
  ...Object.entries(why.given).map(([symbol, given]) => row('whyGiven', { symbol, given })),
];

/** Sources that say no more than how sure they are. */
const isPlain = (id: SourceId): boolean => id === 'common-practice' || id === 'judgement';

const sourceLines = ({ sources }: Explained): readonly Line[] => {
  const named = sources.filter((id) => !isPlain(id));
  const marks = new Set(named.map((id) => SOURCES[id].mark));
  const plain = sources.filter((id) => isPlain(id) && !marks.has(SOURCES[id].mark));
  return [...named, ...plain].map((id) => {
    const { title, edition, mark } = SOURCES[id];
    return line('whySource', { title: isPlain(id) ? null : title, edition: edition ?? null, mark });
  });
};

const sureLine = ({ mark, sources }: Explained): Line =>
  line('whySure', { mark, weakest: sources.some((id) => SOURCES[id].mark !== mark) });

const formulaLines = (why: Explained): readonly Line[] => [
  // The sentence is about the whole formula, not about a part of it.
  ...(why.isWhole ? [line('whySays', { by: why.by })] : []),
  ...why.formula.map((text) => line('whyFormula', { text })),
  ...(why.remark === null ? [] : [line('whyRemark', { remark: why.remark })]),
  sureLine(why),
];

/** Formulas and figures that rest on the growth to expect. */
const OF_GROWTH: readonly string[] = ['growthBelief', 'growthBeforeResults'];
const GROWTH_FIGURES: readonly FigureName[] = ['growthFactor', 'growthFactorExpected'];

const restsOnGrowth = (why: Explained): boolean =>
  [why.by, ...Object.values(why.through).map(({ by }) => by)].some((by) =>
    OF_GROWTH.includes(by),
  ) || Object.values(why.inputs).some((name) => GROWTH_FIGURES.includes(name));

/** How many results stand behind the growth, as the card itself said it. */
const growthLinesOf = ({ card }: Explaining, why: Explained): readonly Line[] =>
  restsOnGrowth(why)
    ? card.parts
        .flatMap((part) => (part.part === 'lines' ? part.lines : []))
        .filter((said) => said.line === 'growthStands')
    : [];

const partsOf = (e: Explaining, why: Why): readonly Part[] =>
  'told' in why
    ? [{ part: 'lines', lines: [line('whyTold', { told: why.told })] }, { part: 'footing' }]
    : [
        { part: 'lines', lines: [...formulaLines(why), ...growthLinesOf(e, why)] },
        { part: 'rows', rows: rowsOf(e, why) },
        { part: 'lines', lines: sourceLines(why) },
        { part: 'lines', lines: [line('whyAssumes', { by: why.by })] },
        { part: 'footing' },
      ];

const inputsOf = (why: Why): readonly FigureName[] =>
  'told' in why ? [] : [...new Set([...Object.values(why.inputs), ...why.also])];

/** The figure asked about and what goes into it. */
const figuresOf = (e: Explaining, why: Why): Figures => {
  const [subject] = e.subjects;
  const numbers = numbersFor(e);
  const named = (names: readonly string[]): [string, Figure | null][] =>
    names.map((name) => [name, numbers[name] ?? null]);
  const own = 'figure' in subject ? named([subject.figure]) : [];
  const ofCheck = Object.entries(checkOf(e, subject)?.figures ?? {});
  return Object.fromEntries([...own, ...ofCheck, ...named(inputsOf(why))]);
};

/** The line that asks about something else of the same card. */
const asking = (e: Explaining, subject: Subject): Choice => ({
  label: label('why', { subject }),
  words: replaced(e.context.text, e.span, saidOf(subject)),
});

const unitsChoice = ({ context, units }: Explaining): Choice => {
  const turned = units === 'in' ? 'mm' : 'in';
  return {
    label: label('otherUnits', { units: turned }),
    words: reworded(context, ['units'], `show ${turned}`),
  };
};

const choicesOf = (e: Explaining, why: Why): readonly Choice[] => {
  const numbers = e.card.figures;
  const further = inputsOf(why)
    .filter((name) => !isCheckNumber(name) && numbers[name])
    .filter((name) => {
      const behind = whyFor(e, { figure: name });
      return behind !== null && !('told' in behind);
    })
    .slice(0, MOST_INPUTS);
  return [
    ...further.map((name) => asking(e, { figure: name })),
    ...e.subjects.slice(1).map((subject) => asking(e, subject)),
    unitsChoice(e),
  ];
};

const cardOf = (e: Explaining, parts: readonly Part[]): Card => ({
  verb: 'why',
  headline: headline(e),
  parts,
  choices: [],
  pictures: [],
  figures: {},
  checks: [],
  cautions: [],
  alternatives: [],
  units: e.units,
});

/** The card's figure or check: how it comes about, what goes into it, and how sure each is. */
export const whyCard = (e: Explaining): Card => {
  const why = whyFor(e, e.subjects[0]);
  if (why === null) return absentCard(e);
  const check = checkOf(e, e.subjects[0]);
  return {
    ...cardOf(e, partsOf(e, why)),
    choices: choicesOf(e, why),
    figures: figuresOf(e, why),
    checks: check === null ? [] : [check],
  };
};

/** Nothing on the card has that name. */
export const absentCard = (e: Explaining): Card => ({
  ...cardOf(e, [{ part: 'footing' }]),
  headline: line('whyNone', { subject: e.subjects[0] }),
});
