import type { QuestionStands } from '../../refusal.ts';
import type { QuestionState } from './question.ts';

/** What can be done with a question that was asked. */
export type Move = 'answer' | 'solve' | 'reopen';

type Standing = { readonly code: string; readonly state: QuestionState };

/**
 * The life of a question: where each move leads. What is not here is refused: a solved question
 * takes no answer before it is reopened, and one that waits has nothing to reopen.
 */
const LIFE: { readonly [S in QuestionState]: { readonly [M in Move]?: QuestionState } } = {
  open: { answer: 'answered', solve: 'solved' },
  answered: { answer: 'answered', solve: 'solved', reopen: 'reopened' },
  solved: { reopen: 'reopened' },
  reopened: { answer: 'answered', solve: 'solved' },
};

/** Where a move leads, or why it cannot be made; the words that came with it are not lost. */
export const moved = (
  { code: question, state }: Standing,
  move: Move,
  words: string,
): { readonly to: QuestionState } | { readonly refusal: QuestionStands } => {
  const to = LIFE[state][move];
  return to === undefined
    ? { refusal: { code: 'questionStands', question, state, move, words } }
    : { to };
};
