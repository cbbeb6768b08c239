import type { Nothing } from './nothing.ts';
import type { Moment } from './shopLines.ts';

/** A question in short, as it stands in a list. */
export type QuestionInShort = {
  readonly code: string;
  readonly text: string;
  readonly by: string;
  readonly asked: Moment;
  readonly state: 'open' | 'answered' | 'solved' | 'reopened';
  /** The code of the card it is about. */
  readonly card: string | null;
};

/** Questions, what is answered to them, and who is told. */
export type QuestionLines = {
  /** Texts of headlines are shortened where they are long: the whole stands under them. */
  questionFrom: { readonly code: string; readonly by: string; readonly text: string };
  questionStands: {
    readonly state: QuestionInShort['state'];
    readonly answers: number;
    /** Which of them solved it, and who gave it. */
    readonly accepted: { readonly number: number; readonly by: string } | null;
  };
  questionAbout: { readonly card: string };
  questionAlone: Nothing;
  questionPutUp: { readonly code: string; readonly told: readonly string[] };
  questionNobody: Nothing;
  questionAgainAt: Moment;
  answerKept: { readonly code: string; readonly number: number; readonly asker: string | null };
  answerFrom: {
    readonly code: string;
    readonly number: number;
    readonly by: string;
    readonly text: string;
  };
  questionSolved: { readonly code: string; readonly number: number; readonly by: string };
  questionReopened: { readonly code: string; readonly by: string; readonly why: string };
  questionWaits: {
    readonly code: string;
    readonly by: string;
    readonly text: string;
    readonly since: Moment;
    /** For the how manieth time it comes up again. */
    readonly again: number;
    readonly isLast: boolean;
  };
  questionsUnsolved: { readonly waiting: number; readonly answered: number };
  questionsNone: Nothing;
  questionsMore: { readonly more: number };
};

export type QuestionRows = {
  questionItem: QuestionInShort;
  answerItem: {
    readonly number: number;
    readonly text: string;
    readonly by: string;
    readonly given: Moment;
    readonly isAccepted: boolean;
  };
};

export type QuestionLabels = {
  askEngineer: Nothing;
  answerIt: Nothing;
  solvedBy: { readonly number: number };
  solvedIt: Nothing;
  reopenIt: Nothing;
  questionShown: { readonly code: string };
};
