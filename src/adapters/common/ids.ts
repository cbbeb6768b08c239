/** What a button or a form stands for. Only names and numbers: the rest is in the records. */
export type ControlId = {
  /** The interaction whose answer carries it. */
  readonly of: string;
  /** It was asked in private, and what follows from it stays there. */
  readonly isPrivate: boolean;
  /** Whose answer it is, where a press does not tell by itself: in a direct message. */
  readonly shop?: string;
} & (
  | /** Sends a choice of the answer. */ { readonly control: 'press'; readonly choice: number }
  /** Shows its cautions in full. */
  | { readonly control: 'cautions' }
  /** Opens what was typed, to be corrected. */
  | { readonly control: 'correct' }
  /** Shows the answer to the one person it is for. */
  | { readonly control: 'show'; readonly person: string }
);

const LETTERS = { press: 'p', cautions: 'c', correct: 'w', show: 's' } as const;
const PRIVATE = '!';
const SHOP = '@';

/** What stands between a control's letter and the answer it belongs to. */
const detailOf = (control: ControlId): readonly string[] => {
  if (control.control === 'press') return [String(control.choice)];
  return control.control === 'show' ? [control.person] : [];
};

export const idOf = (control: ControlId): string =>
  [
    LETTERS[control.control] +
      (control.isPrivate ? PRIVATE : '') +
      (control.shop === undefined ? '' : SHOP + control.shop),
    ...detailOf(control),
    control.of,
  ].join(':');

const FORM = /^(?<letter>[pcws])(?<quiet>!?)(?:@(?<shop>\w+))?:(?<rest>.+)$/su;
const PRESS = /^(?<choice>\d{1,4}):(?<of>.+)$/su;
const SHOW = /^(?<person>\w+):(?<of>.+)$/su;

/** Null for an id that is none of ours: of an earlier program, or made up. */
export const readId = (id: string): ControlId | null => {
  const { letter, quiet, shop, rest } = FORM.exec(id)?.groups ?? {};
  if (rest === undefined) return null;
  const common = { isPrivate: quiet === PRIVATE, ...(shop === undefined ? {} : { shop }) };
  if (letter === LETTERS.press) {
    const { choice, of } = PRESS.exec(rest)?.groups ?? {};
    return of === undefined ? null : { ...common, of, control: 'press', choice: Number(choice) };
  }
  if (letter === LETTERS.show) {
    const { person, of } = SHOW.exec(rest)?.groups ?? {};
    if (of === undefined || person === undefined) return null;
    return { ...common, of, control: 'show', person };
  }
  return { ...common, of: rest, control: letter === LETTERS.cautions ? 'cautions' : 'correct' };
};
