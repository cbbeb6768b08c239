import type { Answer, Command } from '../../desk/index.ts';
import { type Book, type SpokenCard, speakCard, speakRefusal } from '../../phrases/index.ts';

/** An answer in words, whichever it is. */
export const spoken = (answer: Answer, book: Book): SpokenCard =>
  answer.kind === 'card'
    ? speakCard(book, answer.card)
    : speakRefusal(book, answer.units, answer.refusal, answer.choices);

/** A sentence by itself, in the form of a card. */
export const sentence = (text: string): SpokenCard => ({
  headline: text,
  parts: [],
  choicesTitle: '',
  choices: [],
});

/** Every caution of an answer in full, or null where it has none. */
export const cautionsOf = (answer: Answer | null, book: Book): SpokenCard | null => {
  if (answer?.kind !== 'card') return null;
  const texts = speakCard(book, answer.card).parts.flatMap((part) =>
    part.part === 'cautions' ? part.all : [],
  );
  if (texts.length === 0) return null;
  return {
    headline: book.chat.allCautions,
    parts: [{ part: 'own', texts }],
    choicesTitle: '',
    choices: [],
  };
};

/** Whether there is more to say about cautions than the card does. */
export const hasMoreCautions = (answer: Answer): boolean =>
  answer.kind === 'card' &&
  answer.card.parts.some((part) => part.part === 'cautions' && part.all.length > 0);

/** What a parameter is called on a form. */
export const parameterName = (book: Book, name: string): string => book.parameters[name] ?? name;

export const verbSummary = (book: Book, command: Command): string =>
  book.verbs[command.path.join(' ')] ?? command.path.join(' ');
