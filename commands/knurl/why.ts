import { z } from 'zod';
import { EXPLAINED, type ExplainedVerb, type Subject, whyOf } from '../../src/calc/index.ts';
import type { Card } from '../../src/card/index.ts';
import {
  type Command,
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  refuse,
  said,
} from '../../src/desk/index.ts';
import { check } from './check.ts';
import { plan } from './plan.ts';
import { setup } from './setup.ts';
import { setupParameters } from './setupParameters.ts';
import { trouble } from './trouble.ts';
import { absentCard, type Explaining, whyCard } from './whyCard.ts';
import { whatBrings } from './whyNeeds.ts';
import { type AskedAbout, figure, lead } from './whyParameters.ts';
import { FIGURE_EXAMPLES } from './whyWords.ts';
import { reworded, typed } from './words.ts';

const COMMANDS: Readonly<Record<ExplainedVerb, Command>> = { setup, check, plan, trouble };

const has = (verb: ExplainedVerb, parameter: string): boolean =>
  COMMANDS[verb].parameters.some(({ name }) => name === parameter);

/** Whatever can be said to a command whose card can be asked about. */
const others = new Map(
  EXPLAINED.flatMap((verb) => COMMANDS[verb].parameters.map((each) => [each.name, each] as const)),
);
const parameters = z.object({
  figure,
  ...setupParameters.shape,
  ...Object.fromEntries([...others].map(([name, each]) => [name, said(each)])),
});

/** What a line says besides the figure and the units it is to be shown in. */
const lineOf = ({ read }: Context): readonly string[] =>
  [...read.values.keys()].filter((name) => name !== 'figure' && name !== 'units');

const knows = (verb: ExplainedVerb, { subjects }: AskedAbout): boolean =>
  subjects.some((subject) => whyOf(verb, subject, []) !== null);

/** The command the line is for: the one it names, else one that its words or its figure need. */
const verbFor = (about: AskedAbout, line: readonly string[]): ExplainedVerb => {
  if (about.verb !== null) return about.verb;
  const allRead = EXPLAINED.filter((verb) => line.every((name) => has(verb, name)));
  return allRead.find((verb) => knows(verb, about)) ?? allRead[0] ?? 'setup';
};

/** A word that the command does not read is not dropped in silence. */
const stray = (context: Context, verb: ExplainedVerb, line: readonly string[]): Reply | null => {
  const name = line.find((each) => !has(verb, each));
  const [span] = name === undefined ? [] : (context.read.spans.get(name) ?? []);
  if (name === undefined || span === undefined) return null;
  const word = typed(context, name);
  return refuse({ code: 'unreadable', word, ...span, nearest: [] });
};

const onCard = (card: Card, verb: ExplainedVerb, subject: Subject): boolean =>
  'check' in subject
    ? card.checks.some(({ name }) => name === subject.check)
    : whyOf(verb, subject, []) !== null && Boolean(card.figures[subject.figure]);

/** What would bring the figure onto the card, where it has not been said. */
const broughtBy = (context: Context, subject: Subject, line: readonly string[]): Reply | null => {
  const name = whatBrings(subject);
  const examples = name === null ? [] : (others.get(name)?.examples ?? []);
  if (name === null || line.includes(name) || examples.length === 0) return null;
  return refuse(
    { code: 'missing', parameter: name, examples },
    examples.map((example) => ({ label: example, words: reworded(context, [], example) })),
  );
};

const explained = (
  context: Context,
  about: AskedAbout,
  card: Card,
  line: readonly string[],
): Reply => {
  const verb = EXPLAINED.find((each) => each === card.verb) ?? 'setup';
  const [first, ...more] = about.subjects.filter((subject) => onCard(card, verb, subject));
  const units = context.read.values.get('units') === undefined ? card.units : shownUnits(context);
  const explaining = { context, card, verb, span: about.span, units };
  if (first !== undefined)
    return cardReply(whyCard({ ...explaining, subjects: [first, ...more] } satisfies Explaining));
  const known = about.subjects.find((subject) => whyOf(verb, subject, []) !== null);
  const wanted = known ?? about.subjects[0];
  if (wanted === undefined) throw new Error('a name without a meaning');
  const brought = line.length === 0 ? null : broughtBy(context, wanted, line);
  return brought ?? cardReply(absentCard({ ...explaining, subjects: [wanted] }));
};

const shownUnits = ({ read, units }: Context): 'in' | 'mm' => {
  const shown = read.values.get('units');
  return shown === 'in' || shown === 'mm' ? shown : units;
};

/** A line to copy, in the shop's own units. */
const LINES = { in: '1.000 straight 21tpi 1018', mm: '25 straight 1.0 pitch 1018' } as const;

const nothingToExplain = (context: Context): Reply => {
  const words = reworded(context, [], LINES[context.units]);
  return refuse({ code: 'missing', parameter: 'explained', examples: [words] }, [
    { label: LINES[context.units], words },
  ]);
};

/** The card that is asked about: worked out from the line, or the last one. */
const cardAsked = async (
  context: Context,
  about: AskedAbout,
  line: readonly string[],
): Promise<Reply> => {
  if (line.length === 0 && about.verb === null)
    return context.last === null || !EXPLAINED.some((verb) => verb === context.last?.verb)
      ? nothingToExplain(context)
      : cardReply(context.last);
  const verb = verbFor(about, line);
  return (
    stray(context, verb, line) ??
    (await COMMANDS[verb].run(context, Object.fromEntries(context.read.values)))
  );
};

const run = async (context: Context, about: AskedAbout | undefined): Promise<Reply> => {
  if (about === undefined)
    return refuse({ code: 'missing', parameter: 'figure', examples: FIGURE_EXAMPLES });
  const line = lineOf(context);
  const reply = await cardAsked(context, about, line);
  return 'refusal' in reply ? reply : explained(context, about, reply.card, line);
};

/** Formula, inputs, sources and mark of any figure or check of a card. */
export const why = defineCommand({
  path: ['knurl', 'why'],
  examples: [
    '/knurl why infeed 1.000 straight 21tpi 1018',
    '/knurl why tracking 0.995 straight 21tpi',
    '/knurl why take off 0.995 21tpi straight seam 0.3',
  ],
  parameters,
  lead: { name: 'figure', read: lead },
  foremost: ['figure', 'diameter', 'pattern', 'pitch', 'material', 'length', 'stickout', 'bore'],
  allowed: 'operator',
  run: (context, given) => run(context, given.figure),
});
