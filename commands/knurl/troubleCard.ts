import {
  figure,
  NO_FACTS,
  type RankedCause,
  STANDING_CAUTIONS,
  type SymptomId,
  type TroubleFacts,
} from '../../src/calc/index.ts';
import { type Card, line, row } from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import type { TroubleWords } from './troubleFields.ts';

type Troubled = {
  readonly context: Context;
  readonly said: TroubleWords;
  readonly symptom: SymptomId;
  readonly facts: TroubleFacts;
  readonly causes: readonly RankedCause[];
};

/** Causes told on the card; programs get all of them. */
const SHOWN = 5;

/** Causes of a symptom, what speaks for each in numbers, and one next move each. */
export const troubleCard = ({ context, said, symptom, facts, causes }: Troubled): Card => {
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
    choices: [],
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
