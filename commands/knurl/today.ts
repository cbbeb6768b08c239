import { z } from 'zod';
import {
  type Choice,
  label,
  line,
  type Part,
  type Row,
  row,
  type TodayPart,
} from '../../src/card/index.ts';
import { type Context, cardReply, defineCommand, type Visit } from '../../src/desk/index.ts';
import {
  listOf,
  MACHINES,
  personById,
  readStandard,
  type SetUp,
  type Some,
  setUpSince,
  standardsToDecide,
  standardsToReview,
  startOfYesterday,
  unsolvedQuestions,
  wrongSince,
} from '../../src/shop/index.ts';
import { shopCard, visiting } from '../shop/visit.ts';
import {
  excerpt,
  type Openable,
  openChoice,
  questionThing,
  resultThing,
  standardThing,
} from './foundThings.ts';

/** Most of each part. Judgement: five parts of four still fit under a thumb. */
const SHOWN = 4;

/** A part of the day's card: its rows, a button for each, and a line that lists all of it. */
type Told = {
  readonly about: TodayPart;
  readonly count: number;
  readonly rows: readonly Row[];
  readonly choices: readonly Choice[];
  readonly all: string;
};

const setUpTold = async (visit: Visit, since: number): Promise<Told> => {
  const { count, first } = await setUpSince(visit.shop, since, SHOWN);
  const machines = new Map((await listOf(visit.shop, MACHINES)).map(({ id, name }) => [id, name]));
  const rows: Row[] = [];
  for (const each of first) rows.push(await setUpRow(visit, each, machines));
  const choices = first.map(({ code }) => ({
    label: label('openFound', { kind: 'card', name: code }),
    words: `/knurl card ${code}`,
  }));
  return { about: 'setUp', count, rows, choices, all: '/knurl find cards' };
};

const setUpRow = async (
  { shop, settings }: Visit,
  { code, words, at, by: id, machine }: SetUp,
  machines: ReadonlyMap<string, string>,
): Promise<Row> => {
  const by = (await personById(shop, id))?.name ?? '';
  const name = machine === null ? undefined : machines.get(machine);
  return row('setUpHere', {
    where: name ?? by,
    code,
    said: excerpt(words),
    by: name === undefined ? null : by,
    moment: { at, zone: settings.timeZone },
  });
};

const thingsTold = (
  about: TodayPart,
  count: number,
  things: readonly Openable[],
  all: string,
): Told => ({
  about,
  count,
  rows: things.map(({ thing }) => row('foundThing', thing)),
  choices: things.map(openChoice),
  all,
});

const wrongTold = async (visit: Visit, since: number): Promise<Told> => {
  const { count, first } = await wrongSince(visit.shop, since, SHOWN);
  const things: Openable[] = [];
  for (const result of first) things.push(await resultThing(visit, result));
  return thingsTold('wrong', count, things, '/knurl result list');
};

/** Most questions that are counted. Judgement: beyond that it is a number nobody works off. */
const MOST_QUESTIONS = 100;

const questionsTold = async (visit: Visit): Promise<Told> => {
  const open = await unsolvedQuestions(visit.shop, { limit: MOST_QUESTIONS });
  const things: Openable[] = [];
  for (const question of open.slice(0, SHOWN)) things.push(await questionThing(visit, question));
  return thingsTold('questions', open.length, things, '/knurl questions');
};

const standardsTold = async (
  visit: Visit,
  about: 'decide' | 'review',
  { count, first }: Some<string>,
): Promise<Told> => {
  const things: Openable[] = [];
  for (const id of first) {
    const standard = await readStandard(visit.shop, id);
    const isOpen = about === 'decide';
    if (standard !== undefined) things.push(await standardThing(visit, standard, isOpen));
  }
  const all = about === 'decide' ? '/knurl standard list proposed' : '/knurl standard list';
  return thingsTold(about, count, things, all);
};

const partsOf = ({ about, count, rows }: Told): readonly Part[] => [
  { part: 'lines', lines: [line('todayPart', { about, count, more: count - rows.length })] },
  { part: 'rows', rows },
];

const choicesOf = ({ about, count, choices, all }: Told): readonly Choice[] =>
  count > choices.length
    ? [...choices, { label: label('todayAll', { about }), words: all }]
    : choices;

const countOf = (told: readonly Told[], about: TodayPart): number =>
  told.find((each) => each.about === about)?.count ?? 0;

const todayCard = (context: Context, { settings, shop }: Visit, told: readonly Told[]) => {
  const there = told.filter(({ count }) => count > 0);
  const none = told.filter(({ count }) => count === 0).map(({ about }) => about);
  const counts = {
    setUp: countOf(told, 'setUp'),
    wrong: countOf(told, 'wrong'),
    questions: countOf(told, 'questions'),
    decide: countOf(told, 'decide'),
    review: countOf(told, 'review'),
  };
  const card = shopCard(context, {
    verb: 'today',
    headline: line('today', { counts, at: shop.at, zone: settings.timeZone }),
    after: none.length === 0 ? [] : [line('todayNone', { about: none })],
    choices: there.flatMap(choicesOf),
  });
  return { ...card, parts: [...there.flatMap(partsOf), ...card.parts] };
};

/** What the shift that comes in has to know. */
export const today = defineCommand({
  path: ['knurl', 'today'],
  examples: ['/knurl today'],
  parameters: z.object({}),
  allowed: 'operator',
  run: (context) =>
    visiting(context, async (visit) => {
      const { shop, settings } = visit;
      const since = startOfYesterday(shop.at, settings.timeZone);
      const told = [
        await setUpTold(visit, since),
        await wrongTold(visit, since),
        await questionsTold(visit),
        await standardsTold(visit, 'decide', await standardsToDecide(shop, SHOWN)),
        await standardsTold(visit, 'review', await standardsToReview(shop, shop.at, SHOWN)),
      ];
      return cardReply(todayCard(context, visit, told));
    }),
});
