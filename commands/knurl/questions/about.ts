import type { Part } from '../../../src/card/index.ts';
import { type KeptCard, questionsOnCard, type ShopView } from '../../../src/shop/index.ts';
import { acceptedRows } from './cards.ts';
import { questionRows } from './questions.ts';

/** Questions shown with a card. Judgement: the newest; all of them are found by their words. */
const SHOWN = 5;

/** What was asked about a card, and by what it was solved. */
export const askedAbout = async (view: ShopView, { id }: KeptCard): Promise<readonly Part[]> => {
  const questions = await questionsOnCard(view, id, SHOWN);
  const parts: Part[] = [];
  for (const question of questions) {
    const rows = await questionRows(view, [{ ...question, card: null }]);
    parts.push({ part: 'rows', rows: [...rows, ...(await acceptedRows(view, question))] });
  }
  return parts;
};
