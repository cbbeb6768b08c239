import type { CautionId, Check, CheckAlternative, Figures, Way } from '../calc/index.ts';
import type { Picture } from '../drawing/index.ts';
import type { Label, Line, Row } from './lines.ts';

/** A button: what it says and the line it sends. */
export type Choice = {
  readonly label: Label;
  readonly words: string;
  /** Parameters of that line that have to be said first; a platform asks for them in a form. */
  readonly ask?: readonly string[];
  /** Its line ends in the code of the card it stands on, which is known once that is kept. */
  readonly ofCard?: true;
};

/** The choices of a card that is kept under a code, ready to be sent. */
export const codedChoices = (choices: readonly Choice[], code: string): readonly Choice[] =>
  choices.map(({ ofCard, ...choice }) =>
    ofCard === true ? { ...choice, words: `${choice.words} ${code}` } : choice,
  );

/** A drawing that answers the card's question; its words are said by the phrase book. */
export type { Picture } from '../drawing/index.ts';

/** What does not come of the request itself: a standard of the shop that covers it. */
type From = 'standard';

/**
 * The parts of a reply in reading order. Semantic, not visual: no markup, no colour, no unit
 * chosen. A new part is a compile error in every renderer until each has a form for it.
 */
export type Part =
  | { readonly part: 'lines'; readonly lines: readonly Line[]; readonly from?: From }
  | { readonly part: 'rows'; readonly rows: readonly Row[]; readonly from?: From }
  | { readonly part: 'checks'; readonly checks: readonly Check[] }
  | {
      readonly part: 'cautions';
      /** Those this set-up calls for, the one that matters most first. */
      readonly shown: readonly CautionId[];
      /** Called for too, but behind the others. */
      readonly rest: readonly CautionId[];
      readonly all: readonly CautionId[];
    }
  /** The shop's own words: rules, notes. Shown as typed, never as markup. */
  | { readonly part: 'own'; readonly texts: readonly string[] }
  /** Shop rules, the machine's manual and licensed practice go before this card. */
  | { readonly part: 'footing' };

/** The reply to a request. */
export type Card = {
  readonly verb: string;
  /** One line that can be acted on alone. */
  readonly headline: Line;
  readonly parts: readonly Part[];
  readonly choices: readonly Choice[];
  readonly pictures: readonly Picture[];
  readonly figures: Figures;
  readonly checks: readonly Check[];
  readonly cautions: readonly CautionId[];
  readonly alternatives: readonly CheckAlternative[];
  /** Tables of a verb's own, for programs: the candidates of a plan, the causes of a trouble. */
  readonly lists?: Readonly<Record<string, readonly unknown[]>>;
  /** In what ways its figures came about, for whoever asks why. */
  readonly ways?: readonly Way[];
  /** The unit shown first. */
  readonly units: 'in' | 'mm';
};

/** Fails to compile where a part of a closed union has no branch. */
export const unreachable = (part: never): never => {
  throw new Error(`no branch for ${JSON.stringify(part)}`);
};
