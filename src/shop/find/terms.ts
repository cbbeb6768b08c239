/**
 * What a thing is found by, made of the words in which it was told; and what is looked for, made
 * the same way of the words in which it is asked for.
 */

/** Most terms of one entry: what a note of 500 signs has, several times over. Judgement. */
export const MOST_TERMS = 150;
/** Longest term; of a longer word its beginning counts. Judgement. */
const LONGEST_TERM = 32;

/** Words that stand in every sentence and tell nothing apart; and units, which say what but not which. */
const UNTELLING = new Set(
  (
    'a an and are as at be but by can did do for from had has have how i if in into is it its ' +
    'me my no not of off on or our per show so some that the their them then there they this to ' +
    'too up us was we were what when where which who why with you your please find search ' +
    'mm cm inch inches ins'
  ).split(' '),
);

/** Denominators of sizes as they stand on a rule; another pair of numbers is a pair of numbers. */
const FRACTION =
  /(?<![\p{L}\p{N}.,/])(?:(?<whole>\d{1,2})[ -])?(?<top>\d{1,2})\/(?<bottom>2|4|8|16|32|64)(?![\d/])/gu;
const DECIMAL = /^(?<whole>\d*)\.(?<part>\d+)$/u;
const COMMA = /(?<=\d),(?=\d)(?!\d+\.\d)/gu;
const MARKS = /\p{M}+/gu;
/** Numbers with a unit right behind them: the number is what tells them apart. */
const NUMBER_AND_UNIT =
  /^(?<number>\d*\.?\d+)(?:mm|cm|in|inch|rpm|sfm|hb|hrc|thou|pitch|deg|pcs|teeth|t)$/u;
/** `21 tpi` and `21tpi` are one pitch, and not 21 of anything else. */
const PITCH_APART = /(?<=\d)\s+(?=(?:tpi|dp)(?![\p{L}\p{N}]))/gu;
const PITCH = /^(?<number>\d*\.?\d+)(?<unit>tpi|dp)$/u;
/** A word: letters and digits, with the dots, hyphens and strokes between them. */
const WORD = /\.?[\p{L}\p{N}]+(?:[./_+-][\p{L}\p{N}]+)*/gu;

/** Letters without their accents, one kind of every sign, in lower case. */
const folded = (text: string): string =>
  text
    .normalize('NFKD')
    .replace(MARKS, '')
    .toLowerCase()
    .replaceAll('ß', 'ss')
    .replaceAll(/[ø⌀'’`]/gu, (sign) => (sign === 'ø' || sign === '⌀' ? ' ' : ''))
    .replaceAll('\u2044', '/')
    .replaceAll(/[\u2010-\u2015\u2212]/gu, '-');

/** Judgement: a size is told to five places at most. */
const inDecimals = (whole: string | undefined, top: string, bottom: string): string =>
  String(Number((Number(whole ?? 0) + Number(top) / Number(bottom)).toFixed(5)));

/** `.875`, `0.8750` and `0.875` are one size. A whole number is kept as typed: it may be a name. */
const plainNumber = (word: string): string => {
  const parts = DECIMAL.exec(word)?.groups;
  if (parts === undefined) return word;
  const whole = (parts['whole'] ?? '').replace(/^0+(?=\d)/u, '') || '0';
  const part = (parts['part'] ?? '').replace(/0+$/u, '');
  return part === '' ? whole : `${whole}.${part}`;
};

const isTelling = (term: string): boolean => term !== '' && !UNTELLING.has(term);

/** The pieces of `WT-1042-B`, and the whole as one. */
const piecesOf = (word: string): readonly string[] => {
  if (DECIMAL.test(word)) return [plainNumber(word)];
  const pitch = PITCH.exec(word)?.groups;
  if (pitch !== undefined) {
    const number = plainNumber(pitch['number'] ?? '');
    return [number, number + (pitch['unit'] ?? '')];
  }
  const measured = NUMBER_AND_UNIT.exec(word)?.groups;
  if (measured !== undefined) return [plainNumber(measured['number'] ?? '')];
  const pieces = word.split(/[/_+-]/u).flatMap((piece) => piece.replace(/^\./u, '') || []);
  if (pieces.length < 2) return word.startsWith('.') ? pieces : [word];
  const whole = pieces.join('');
  // Digits written together would be another number.
  const joined = /^\d+$/u.test(whole) ? pieces.join('-') : whole;
  return [...pieces.flatMap(piecesOf), joined];
};

/** The words of a text, each with its terms, the whole of a word last. */
const wordsIn = (text: string): readonly (readonly string[])[] => {
  const plain = folded(text)
    .replace(COMMA, '.')
    .replace(PITCH_APART, '')
    .replace(FRACTION, (_, whole: string | undefined, top: string, bottom: string) =>
      inDecimals(whole, top, bottom),
    );
  const words = plain.match(WORD) ?? [];
  return words.map((word) =>
    piecesOf(word)
      .map((term) => Array.from(term).slice(0, LONGEST_TERM).join(''))
      .filter(isTelling),
  );
};

/** The terms in a text, in its order, each once. */
export const termsOf = (text: string): readonly string[] => [...new Set(wordsIn(text).flat())];

/** Whether there is anything in a text that can be looked for. */
export const hasWords = (text: string): boolean => termsOf(text).length > 0;

/** Shortest piece of a word that is looked for by itself. Judgement: `WT` is in every `WT-1042`. */
const SHORTEST_PIECE = 3;

/** What is looked for: as the terms of a text, but no piece that is too short to mean its word. */
export const wantedTerms = (text: string): readonly string[] => {
  const terms = wordsIn(text).flatMap((pieces) =>
    pieces.filter((piece, at) => at === pieces.length - 1 || piece.length >= SHORTEST_PIECE),
  );
  return [...new Set(terms)];
};
