import { plainText } from './characters.ts';

export type Span = { readonly start: number; readonly end: number };

/** A word of what was typed, in plain characters, with its place in the original. */
export type Token = Span & {
  readonly text: string;
  /** A comma or the like follows: what comes next belongs to something else. */
  readonly closed?: boolean;
};

/** Marks that wrap a word or end a sentence and mean nothing by themselves. */
const LEADING = /^[[{«‹!?&*_#]+/u;
const TRAILING = /[\]}»›!?&*_]+$/u;
/** A full stop ends a sentence: `1.0 in.`, `1.0.`; but `21.` is a number. */
const FULL_STOP = /^(.*[^\d.]|\d*[.,]\d+)\.+$/u;
/** What parts words by itself, wherever it stands; those of the first row also end a phrase. */
const PARTS_AND_CLOSES = ';|';
const PARTS = '=:()';

const FRACTION_BEFORE = /(?:^|[^\d.,])\d+\/\d+$/u;
const GROUPS_BY_POINT = /^\d{1,3}(?:\.\d{3})+$/u;
const GROUPS_BY_COMMA = /^\d{1,3}(?:,\d{3})+$/u;

/** Whether a comma stands in a number. Between two numbers it parts words. */
const isInNumber = (left: string, right: string): boolean => {
  if (!/^\d/u.test(right)) return false;
  const run = /[\d.,]*$/u.exec(left)?.[0] ?? '';
  if (run === '') return !/[\p{L}\p{N}"'°%]$/u.test(left);
  if (FRACTION_BEFORE.test(left)) return false;
  // `1.234,5` is a number; `1.000,21tpi` a size and a pitch.
  if (run.includes('.')) return GROUPS_BY_POINT.test(run) && /^\d+(?:mm|cm)?$/u.test(right);
  if (run.includes(',')) return GROUPS_BY_COMMA.test(run) && /^\d{3}(?!\d)/u.test(right);
  // `1,234.5` is a number; `25,1.0 pitch` a size and a pitch.
  return !/^\d+\.\d/u.test(right) || /^\d{3}\./u.test(right);
};

const SIZE_BEFORE = /^[\d.,/½⅓⅔¼¾⅕⅛⅜⅝⅞-]*[\d.½⅓⅔¼¾⅕⅛⅜⅝⅞](?:mm|cm|in|"|'')?$/u;

/** Whether an x stands between two sizes: `20x8x6`, `1.0"x21tpi`, `20x`. */
const isTimes = (left: string, right: string): boolean =>
  (left === '' || SIZE_BEFORE.test(left)) &&
  (right === '' ? left !== '' : /^[\d.½¼¾⅛⅜⅝⅞]/u.test(right));

/** Puts the pieces of one word into a list, what quotes it left out. */
class Pieces {
  readonly tokens: Token[] = [];
  /** A quote that was opened before a word and is still to be closed after one. */
  private quote: string | null = null;

  push(word: string, start: number, closed: boolean): void {
    const lead = LEADING.exec(word)?.[0].length ?? 0;
    const inner = word.slice(lead);
    const bare = inner.replace(TRAILING, '');
    const sentence = FULL_STOP.exec(bare)?.[1] ?? bare;
    const skipped = this.opened(sentence);
    const text = this.closing(sentence.slice(skipped));
    const from = start + lead + skipped;
    // The stops of `t.p.i.` end no sentence.
    const stopped = sentence.length < bare.length && !/\p{L}\./u.test(sentence);
    const ends = closed || stopped || /[!?]/u.test(inner.slice(bare.length));
    if (text === '') this.close(ends);
    else this.tokens.push({ text, start: from, end: from + text.length, closed: ends });
  }

  /** What stood alone, such as the comma of `1.0 , 21tpi`, ends the word before. */
  close(closed: boolean): void {
    const last = this.tokens.at(-1);
    if (closed && last !== undefined) this.tokens[this.tokens.length - 1] = { ...last, closed };
  }

  private opened(word: string): number {
    const first = word[0];
    if (word.length < 2 || (first !== '"' && first !== "'")) return 0;
    this.quote = first;
    return 1;
  }

  private closing(word: string): string {
    const last = word.at(-1);
    if (last !== '"' && last !== "'") return word;
    const stray = /^\p{L}/u.test(word.at(-2) ?? '') && !/\d/u.test(word);
    if (this.quote !== last && !stray) return word;
    this.quote = null;
    return word.slice(0, -1);
  }
}

const takeApart = (word: string, start: number, pieces: Pieces): void => {
  let from = 0;
  const cut = (at: number, closed: boolean): void => {
    if (at > from || closed) pieces.push(word.slice(from, at), start + from, closed);
    from = at + 1;
  };
  for (let at = 0; at < word.length; at += 1) {
    const sign = word[at] ?? '';
    if (PARTS_AND_CLOSES.includes(sign)) cut(at, true);
    else if (PARTS.includes(sign)) cut(at, false);
    else if (sign === ',') {
      if (!isInNumber(word.slice(from, at), word.slice(at + 1))) cut(at, true);
    } else if (
      sign === 'ø' ||
      (sign === 'x' && isTimes(word.slice(from, at), word.slice(at + 1)))
    ) {
      // A diameter sign and the x between two sizes are words of their own.
      cut(at, false);
      pieces.push(sign, start + at, false);
    }
  }
  cut(word.length, false);
};

const WORD = /\S+/gu;
/** Most words have nothing to take apart. */
const NEEDS_CARE = /[^a-z\d./"%-]|^x|[^a-z]x|[\d"]\D{1,2}x/u;

/** The words of a line, in order. */
export const tokensOf = (text: string, plain = plainText(text)): readonly Token[] => {
  const pieces = new Pieces();
  let end = 0;
  for (const match of plain.matchAll(WORD)) {
    // The end of a typed line ends a phrase; in plain characters it is a space like others.
    if (/[\n\r\u2028\u2029]/u.test(text.slice(end, match.index))) pieces.close(true);
    const word = match[0];
    end = match.index + word.length;
    if (NEEDS_CARE.test(word)) takeApart(word, match.index, pieces);
    else pieces.push(word, match.index, false);
  }
  return pieces.tokens;
};
