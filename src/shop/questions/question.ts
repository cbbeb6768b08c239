import type { AnswerTable, QuestionTable } from '../../store/index.ts';

/** Where a question stands: open → answered → solved, or reopened, which waits as an open one does. */
export type QuestionState = 'open' | 'answered' | 'solved' | 'reopened';

export type Question = {
  readonly id: string;
  /** Its own, as readable as a card's. */
  readonly code: string;
  /** Word for word as it was asked. */
  readonly text: string;
  /** The id of the card it is about. */
  readonly card: string | null;
  readonly state: QuestionState;
  /** Counts what was done to it. */
  readonly version: number;
  readonly askedAt: number;
  /** The id of who asked. */
  readonly askedBy: string;
  /** Where it is put up: an adapter's own address. */
  readonly place: string;
  /** When it was asked, or reopened last. */
  readonly waitsSince: number;
  /** How often it was reopened. */
  readonly round: number;
  /** How often it was put up again since then. */
  readonly reminders: number;
  readonly remindAt: number | null;
  /** The number of the answer that solved it. */
  readonly accepted: number | null;
  readonly solvedAt: number | null;
  readonly solvedBy: string | null;
};

export type GivenAnswer = {
  readonly id: string;
  /** Counts the answers to one question, from 1. */
  readonly number: number;
  readonly text: string;
  readonly givenAt: number;
  /** The id of who gave it. */
  readonly givenBy: string;
};

/** Nobody has answered it since it was asked or reopened. */
export const isWaiting = ({ state }: Pick<Question, 'state'>): boolean =>
  state === 'open' || state === 'reopened';

export const questionOf = (row: QuestionTable): Question => ({
  id: row.id,
  code: row.code,
  text: row.text,
  card: row.card,
  state: row.state as QuestionState,
  version: row.version,
  askedAt: row.asked_at,
  askedBy: row.asked_by,
  place: row.place,
  waitsSince: row.waits_since,
  round: row.round,
  reminders: row.reminders,
  remindAt: row.remind_at,
  accepted: row.accepted,
  solvedAt: row.solved_at,
  solvedBy: row.solved_by,
});

export const answerOf = (row: AnswerTable): GivenAnswer => ({
  id: row.id,
  number: row.number,
  text: row.text,
  givenAt: row.given_at,
  givenBy: row.given_by,
});
