import {
  figure,
  NO_FACTS,
  type RankedCause,
  STANDING_CAUTIONS,
  type SymptomId,
  type TroubleFacts,
} from '../../src/calc/index.ts';
import { type Card, type Choice, label, line, row } from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import { askChoices } from './nextMoves.ts';
import type { TroubleWords } from './troubleFields.ts';
import { reworded } from './words.ts';

type Troubled = {
  readonly context: Context;
  readonly said: TroubleWords;
  readonly symptom: SymptomId;
  readonly facts: TroubleFacts;
  readonly causes: readonly RankedCause[];
  /** Causes this shop has found behind the symptom. */
  readonly logged: number;
};

/** Causes told on the card; programs get all of them. */
const SHOWN = 5;

/** What only this verb reads, and what only a finished part says. */
const TROUBLE_WORDS = ['symptom', 'bite', 'partsOnWheel'] as const;
const PART_WORDS = ['count', 'crest', 'height', 'flat', 'flats'] as const;

const lineAs = (context: Context, verb: string, without: readonly string[]): string =>
  reworded(context, without, '').replace(/^(?:\/?knurl\s+)?trouble\b\s*/iu, `/knurl ${verb}`);

/** The same bar on the card of another verb. */
const choices = (context: Context): readonly Choice[] => [
  { label: label('setUpCard', {}), words: lineAs(context, '', [...TROUBLE_WORDS, ...PART_WORDS]) },
  ...(context.read.values.has('diameter')
    ? [{ label: label('checkCard', {}), words: lineAs(context, 'check ', TROUBLE_WORDS) }]
    : []),
  ...askChoices(context),
];

/** Causes of a symptom, what speaks for each in numbers, and one next move each. */
export const troubleCard = ({ context, said, symptom, facts, causes, logged }: Troubled): Card => {
  const [likeliest] = causes;
  if (likeliest === undefined) throw new Error(`no cause for ${symptom}`);
  return {
    verb: 'trouble',
    headline: line('troubleLikeliest', likeliest),
    parts: [
      {
        part: 'lines',
        lines: [
          line('troubleSeen', { symptom }),
          facts === NO_FACTS ? line('troubleByWords', {}) : line('troubleByNumbers', {}),
          ...(logged === 0 ? [] : [line('troubleCounts', { results: logged })]),
        ],
      },
      {
        part: 'rows',
        rows: causes
          .slice(0, SHOWN)
          .map((cause, index) => row('cause', { ...cause, place: index + 1 })),
      },
      { part: 'cautions', shown: [], rest: [], all: STANDING_CAUTIONS },
      { part: 'footing' },
    ],
    choices: facts === NO_FACTS ? [] : choices(context),
    pictures: [],
    figures: { chanceOfCause: figure(likeliest.chance, '1') },
    checks: [],
    cautions: STANDING_CAUTIONS,
    alternatives: [],
    lists: {
      causes: causes.map(({ cause, chance, prior, evidence, move }) => ({
        cause,
        chance,
        prior,
        evidence,
        move,
      })),
    },
    units: said.units ?? context.units,
  };
};
