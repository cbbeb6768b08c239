import type { ResultTable } from '../../store/index.ts';
import type { KeptCard } from '../cards.ts';
import { cardTexts } from '../cardTexts.ts';
import { putForFind } from '../find/index.ts';
import type { ShopChange } from '../view.ts';
import { resultName } from './kept.ts';

/** `dullWheel` as it is looked for: dull wheel. */
const inWords = (name: string): string => name.replaceAll(/(?=[A-Z])/gu, ' ').toLowerCase();

/** Lets a result be found by what was said of it and by everything its card is found by. */
export const letFind = async (
  change: ShopChange,
  row: ResultTable,
  card: KeptCard,
): Promise<void> => {
  const { id, number, outcome, symptom, cause, note } = row;
  const said = [outcome, symptom, cause].flatMap((name) => (name === null ? [] : [inWords(name)]));
  await putForFind(change, {
    kind: 'result',
    id,
    code: resultName(number),
    at: row.made_at,
    approved: false,
    texts: ['result', ...said, note ?? '', card.code, ...(await cardTexts(change, card))],
  });
};
