/** What a shop remembers, whichever engine keeps it. */
import { describe } from 'vitest';
import type { Engine } from '../../../src/store/index.ts';
import { breaking } from './breaking.ts';
import { breakingQuestions } from './breakingQuestions.ts';
import { cards } from './cards.ts';
import { csv } from './csv.ts';
import { finding } from './find.ts';
import { interactions } from './interactions.ts';
import { isolation } from './isolation.ts';
import { lists } from './lists.ts';
import { outbox } from './outbox.ts';
import { people } from './people.ts';
import { questions } from './questions.ts';
import { reminders } from './reminders.ts';
import { results } from './results.ts';
import { settings } from './settings.ts';
import { standards } from './standards.ts';

export const shopContract = (engine: Engine): void => {
  describe(`a shop in ${engine}`, () => {
    lists(engine);
    people(engine);
    settings(engine);
    cards(engine);
    results(engine);
    questions(engine);
    reminders(engine);
    standards(engine);
    finding(engine);
    interactions(engine);
    outbox(engine);
    csv(engine);
    breaking(engine);
    breakingQuestions(engine);
    isolation(engine);
  });
};
