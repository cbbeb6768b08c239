import type { Check, CheckName, CheckOf, State } from '../calc/index.ts';
import type {
  Card,
  Label,
  LabelId,
  Labels,
  Line,
  LineId,
  Lines,
  Part,
  Row,
  RowId,
  Rows,
} from '../card/index.ts';
import type { Refusal, Suggestion } from '../refusal.ts';
import type { Book, LabelledText } from './book.ts';
import { type ShopUnits, type Show, showIn } from './show.ts';

/** A check in words: what was looked at, how it ends, and why. */
export type SpokenCheck = {
  readonly label: string;
  readonly state: State;
  readonly stateWord: string;
  readonly text: string;
};

export type SpokenChoice = { readonly label: string; readonly words: string };

/** A card in one language and one unit system, still without any platform's markup. */
export type SpokenPart =
  | { readonly part: 'lines'; readonly texts: readonly string[] }
  | { readonly part: 'rows'; readonly rows: readonly LabelledText[] }
  | { readonly part: 'checks'; readonly checks: readonly SpokenCheck[] }
  | {
      readonly part: 'cautions';
      /** Those this set-up calls for, the one that matters most first. */
      readonly shown: readonly string[];
      /** The standing ones in short. */
      readonly standing: string;
      /** Every caution in full, for whoever asks for more. */
      readonly all: readonly string[];
      /** Those that the short form leaves out. */
      readonly rest: readonly string[];
    }
  | { readonly part: 'own'; readonly texts: readonly string[] }
  | { readonly part: 'footing'; readonly text: string };

export type SpokenCard = {
  readonly headline: string;
  readonly parts: readonly SpokenPart[];
  readonly choicesTitle: string;
  readonly choices: readonly SpokenChoice[];
};

const sayLine = <K extends LineId>(
  book: Book,
  show: Show,
  said: { readonly line: K; readonly values: Lines[K] },
): string => book.lines[said.line](said.values, show);

const sayRow = <K extends RowId>(
  book: Book,
  show: Show,
  said: { readonly row: K; readonly values: Rows[K] },
): LabelledText => book.rows[said.row](said.values, show);

const sayLabel = <K extends LabelId>(
  book: Book,
  show: Show,
  said: { readonly label: K; readonly values: Labels[K] },
): string => book.labels[said.label](said.values, show);

const sayCheck = <N extends CheckName>(book: Book, show: Show, check: CheckOf<N>): string =>
  book.checks[check.name].say(check, show);

export const speakLine = (book: Book, show: Show, said: Line): string => sayLine(book, show, said);
export const speakLabel = (book: Book, show: Show, said: Label): string =>
  sayLabel(book, show, said);

const speakRow = (book: Book, show: Show, said: Row): LabelledText => sayRow(book, show, said);

const speakCheck = (book: Book, show: Show, check: Check): SpokenCheck => ({
  label: book.checks[check.name].label,
  state: check.state,
  stateWord: book.states[check.state],
  text: sayCheck(book, show, check),
});

const speakPart = (book: Book, show: Show, part: Part): SpokenPart => {
  switch (part.part) {
    case 'lines':
      return { part: 'lines', texts: part.lines.map((said) => speakLine(book, show, said)) };
    case 'rows':
      return { part: 'rows', rows: part.rows.map((said) => speakRow(book, show, said)) };
    case 'checks':
      return { part: 'checks', checks: part.checks.map((check) => speakCheck(book, show, check)) };
    case 'cautions':
      return {
        part: 'cautions',
        shown: part.shown.map((id) => book.cautions[id]),
        standing: book.standing,
        all: part.all.map((id) => book.cautions[id]),
        rest: part.rest.map((id) => book.cautions[id]),
      };
    case 'own':
      return part;
    case 'footing':
      return { part: 'footing', text: book.footing };
  }
};

/** The card in the words of one language, the shop's unit first. */
export const speakCard = (book: Book, card: Card): SpokenCard => {
  const show = showIn(card.units);
  return {
    headline: speakLine(book, show, card.headline),
    parts: card.parts.map((part) => speakPart(book, show, part)),
    choicesTitle: book.choices,
    choices: card.choices.map((choice) => ({
      label: speakLabel(book, show, choice.label),
      words: choice.words,
    })),
  };
};

/** A refusal as a short card: one sentence, and what could be sent instead. */
export const speakRefusal = (
  book: Book,
  units: ShopUnits,
  refusal: Refusal,
  choices: readonly Suggestion[],
): SpokenCard => ({
  headline: book.refusal(refusal, showIn(units)),
  parts: [],
  choicesTitle: book.choices,
  choices,
});
