import type { Answer } from '../../desk/index.ts';
import { type Book, speakCard, speakRefusal } from '../../phrases/index.ts';

const NOTHING = { figures: {}, checks: [], cautions: [], alternatives: [] } as const;

/** The answer for programs: numbers unrounded, in the program's own units, never read off the text. */
export const answerJson = (answer: Answer, book: Book): Readonly<Record<string, unknown>> => {
  if (answer.kind === 'refusal') {
    const spoken = speakRefusal(book, answer.units, answer.refusal, answer.choices);
    return {
      headline: spoken.headline,
      refusal: answer.refusal,
      ...NOTHING,
      choices: spoken.choices,
    };
  }
  const { card } = answer;
  const spoken = speakCard(book, card);
  return {
    headline: spoken.headline,
    refusal: null,
    figures: card.figures,
    checks: card.checks.map(({ name, state, figures }) => ({ name, state, figures })),
    cautions: card.cautions,
    alternatives: card.alternatives,
    choices: spoken.choices,
    ...card.lists,
  };
};
