import type {
  QuestionInShort,
  QuestionLabels,
  QuestionLines,
  QuestionRows,
} from '../../card/index.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { momentText } from './shopNames.ts';

const list = (items: readonly string[]): string =>
  items.length <= 1
    ? (items[0] ?? '')
    : `${items.slice(0, -1).join(', ')} and ${items.at(-1) ?? ''}`;

const questions = (count: number): string =>
  count === 1 ? '1 question' : `${String(count)} questions`;

const answers = (count: number): string => (count === 1 ? '1 answer' : `${String(count)} answers`);

const STATES: { readonly [S in QuestionInShort['state']]: string } = {
  open: 'waits for an answer',
  answered: 'answered, not yet solved',
  solved: 'solved',
  reopened: 'reopened, waits for an answer',
};

/** A row of a list is read at a glance; the whole text is on the question's own card. */
const IN_A_LIST = 120;
const inShort = (text: string): string => {
  const line = text.replaceAll('\n', ' ');
  const signs = Array.from(line);
  return signs.length <= IN_A_LIST ? line : `${signs.slice(0, IN_A_LIST - 1).join('')}…`;
};

const AGAIN = ['', '', ', a second time'];

export const questionLines: {
  readonly [K in keyof QuestionLines]: (values: QuestionLines[K], show: Show) => string;
} = {
  questionFrom: ({ code, by, text }) => `Question ${code} from ${by}: ${text}`,
  questionStands: ({ state, answers: count, accepted }) => {
    if (state === 'solved' && accepted !== null)
      return `Solved by answer ${String(accepted.number)}, from ${accepted.by}.`;
    if (state === 'answered') return `Has ${answers(count)}, not yet solved.`;
    return state === 'reopened'
      ? 'Reopened: waits for another answer.'
      : 'Open: waits for an answer.';
  },
  questionAbout: ({ card }) => `About card ${card}:`,
  questionAlone: () => 'No card is attached.',
  questionPutUp: ({ code, told }) =>
    told.length === 0
      ? `Question ${code} is put up.`
      : `Question ${code} is put up. Told: ${list(told)}.`,
  questionNobody: () =>
    'Nobody is named yet who could be told: an owner names engineers, such as /shop people add Ben engineer.',
  questionAgainAt: (moment) => `Without an answer it comes up again ${momentText(moment)}.`,
  answerKept: ({ code, number, asker }) =>
    asker === null
      ? `Answer ${String(number)} is kept with question ${code}.`
      : `Answer ${String(number)} is kept with question ${code}. Told: ${asker}.`,
  answerFrom: ({ code, number, by, text }) =>
    `Answer ${String(number)} to question ${code}, from ${by}: ${text}`,
  questionSolved: ({ code, number, by }) =>
    `Question ${code} is solved by answer ${String(number)}, from ${by}.`,
  questionReopened: ({ code, by, why }) =>
    `Question ${code} was reopened by ${by}${why === '' ? '.' : `: ${why}`}`,
  questionWaits: ({ code, by, text, since, again, isLast }) =>
    isLast
      ? `Nobody has answered question ${code} from ${by} since ${momentText(since)}: ${text}`
      : `Question ${code} from ${by} waits since ${momentText(since)}${AGAIN[again] ?? ''}: ${text}`,
  questionsUnsolved: ({ waiting, answered }) => {
    const waits = waiting === 1 ? 'waits' : 'wait';
    if (answered === 0) return `${questions(waiting)} ${waits} for an answer:`;
    if (waiting === 0) return `${questions(answered)} answered, not yet solved:`;
    return `${questions(waiting)} ${waits} for an answer, ${String(answered)} answered and not yet solved:`;
  },
  questionsNone: () => 'No question is open. Ask one: /knurl ask why does it double at the end',
  questionsMore: ({ more }) => `and ${String(more)} more.`,
};

export const questionRows: {
  readonly [K in keyof QuestionRows]: (values: QuestionRows[K], show: Show) => LabelledText;
} = {
  questionItem: ({ code, text, by, asked, state, card }) => ({
    label: code,
    text: `${inShort(text)} (${by}, ${momentText(asked)}${card === null ? '' : `, card ${card}`}; ${STATES[state]})`,
  }),
  answerItem: ({ number, text, by, given, isAccepted }) => ({
    label: isAccepted ? `Answer ${String(number)}, accepted` : `Answer ${String(number)}`,
    text: `${text} (${by}, ${momentText(given)})`,
  }),
};

export const questionLabels: {
  readonly [K in keyof QuestionLabels]: (values: QuestionLabels[K], show: Show) => string;
} = {
  askEngineer: () => 'Ask the engineer',
  answerIt: () => 'Answer',
  solvedBy: ({ number }) => `Solved by answer ${String(number)}`,
  solvedIt: () => 'Solved',
  reopenIt: () => 'Reopen',
  questionShown: ({ code }) => `Question ${code}`,
};
