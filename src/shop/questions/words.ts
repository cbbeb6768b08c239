import { findCard } from '../cards.ts';
import { cardTexts } from '../cardTexts.ts';
import { putForFind } from '../find/index.ts';
import { personById } from '../people.ts';
import type { ShopChange } from '../view.ts';
import { answersTo } from './look.ts';
import type { Question } from './question.ts';

const cardWords = async (change: ShopChange, card: string | null): Promise<readonly string[]> => {
  if (card === null) return [];
  const kept = await findCard(change, card);
  return kept.ok ? [kept.value.code, ...(await cardTexts(change, kept.value))] : [];
};

/** Lets a question be found by what was asked, what was answered and what it is about. */
export const putQuestionForFind = async (change: ShopChange, question: Question): Promise<void> => {
  const { id, code, text, card, state, askedAt: at, askedBy } = question;
  const asker = (await personById(change, askedBy))?.name ?? '';
  const answers = (await answersTo(change, id)).map((answer) => answer.text);
  const texts = [text, ...answers, asker, ...(await cardWords(change, card))];
  const approved = state === 'solved';
  await putForFind(change, { kind: 'question', id, code, at, approved, texts });
};
