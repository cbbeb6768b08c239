import type { Kysely, Migration } from 'kysely';
import { shopAndPeople } from './0001-shop-and-people.ts';
import { registers } from './0002-registers.ts';
import { cardsAndEffects } from './0003-cards-and-effects.ts';
import { results } from './0004-results.ts';
import { standards } from './0005-standards.ts';
import { questions } from './0006-questions.ts';
import { find } from './0007-find.ts';
import { type Columns, columnsOf, type Engine } from './columns.ts';

type Step = (db: Kysely<unknown>, columns: Columns) => Promise<void>;

/** What happened to the form of the records, in order. A step that was released never changes. */
const STEPS: Readonly<Record<string, Step>> = {
  '0001-shop-and-people': shopAndPeople,
  '0002-registers': registers,
  '0003-cards-and-effects': cardsAndEffects,
  '0004-results': results,
  '0005-standards': standards,
  '0006-questions': questions,
  '0007-find': find,
};

export const stepNames: readonly string[] = Object.keys(STEPS).sort();

export const stepsFor = (engine: Engine): Record<string, Migration> => {
  const columns = columnsOf(engine);
  return Object.fromEntries(
    Object.entries(STEPS).map(([name, step]) => [
      name,
      { up: (db: Kysely<unknown>) => step(db, columns) },
    ]),
  );
};
