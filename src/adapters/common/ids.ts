/** What a button or a form stands for. Only names and numbers: the rest is in the records. */
export type ControlId = {
  /** The interaction whose answer carries it. */
  readonly of: string;
  /** It was asked in private, and what follows from it stays there. */
  readonly isPrivate: boolean;
} & (
  | /** Sends a choice of the answer. */ { readonly control: 'press'; readonly choice: number }
  /** Shows its cautions in full. */
  | { readonly control: 'cautions' }
  /** Opens what was typed, to be corrected. */
  | { readonly control: 'correct' }
);

const LETTERS = { press: 'p', cautions: 'c', correct: 'w' } as const;
const PRIVATE = '!';

export const idOf = (control: ControlId): string =>
  [
    LETTERS[control.control] + (control.isPrivate ? PRIVATE : ''),
    ...(control.control === 'press' ? [String(control.choice)] : []),
    control.of,
  ].join(':');

const FORM = /^(?<letter>[pcw])(?<quiet>!?):(?:(?<choice>\d{1,4}):)?(?<of>.+)$/u;

/** Null for an id that is none of ours: of an earlier program, or made up. */
export const readId = (id: string): ControlId | null => {
  const { letter, quiet, choice, of } = FORM.exec(id)?.groups ?? {};
  if (of === undefined) return null;
  const common = { of, isPrivate: quiet === PRIVATE };
  if (letter === LETTERS.press)
    return choice === undefined ? null : { ...common, control: 'press', choice: Number(choice) };
  if (letter === LETTERS.cautions) return { ...common, control: 'cautions' };
  return { ...common, control: 'correct' };
};
