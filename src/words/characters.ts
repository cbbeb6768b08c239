/**
 * Phones turn quotes, dashes and spaces into typographic ones, and capitalise. Everything is
 * brought back to what a keyboard has, character for character, so that every position in the
 * result is the same position in what the person typed.
 */
const PLAIN: ReadonlyMap<string, string> = new Map([
  ...Array.from('“”„‟″‶〃', (mark) => [mark, '"'] as const),
  ...Array.from('‘’‚‛′‵´`ʹʼ', (mark) => [mark, "'"] as const),
  ...Array.from('‐‑‒–—―−﹣', (mark) => [mark, '-'] as const),
  ...Array.from('×✕✖⨯', (mark) => [mark, 'x'] as const),
  // The diameter sign is not on a phone's keyboard; these are what people put for it.
  ...Array.from('Ø⌀∅Φφϕ', (mark) => [mark, 'ø'] as const),
  ...Array.from('µμ', (mark) => [mark, 'u'] as const),
  ...Array.from('º˚', (mark) => [mark, '°'] as const),
  ...Array.from('⁄∕', (mark) => [mark, '/'] as const),
]);

/** Characters that are not seen, such as the marks of text that runs the other way. */
const UNSEEN = /^[\p{Cf}\p{Cc}\u034f]$/u;
/** What joins two pictures into one belongs to them. */
const JOINER = '\u200d';
const SPACE = /^\s$/u;

const FIRST_WIDE = 0xff01;
const LAST_WIDE = 0xff5e;
/** Keyboards of eastern scripts have their own wide letters and digits, in the same order. */
const WIDER_BY = 0xff01 - 0x21;

const narrowed = (character: string): string => {
  const code = character.charCodeAt(0);
  return code >= FIRST_WIDE && code <= LAST_WIDE ? String.fromCharCode(code - WIDER_BY) : character;
};

const plainCharacter = (character: string): string => {
  const plain = PLAIN.get(character);
  if (plain !== undefined) return plain;
  if (character === JOINER) return character;
  if (SPACE.test(character) || UNSEEN.test(character)) return ' '.repeat(character.length);
  const narrow = narrowed(character);
  const lower = narrow.toLowerCase();
  // A few capitals grow when lowered; those keep their place instead.
  return lower.length === character.length ? lower : narrow;
};

/** What a keyboard types without help, apart from the backtick. */
const ALREADY_PLAIN = /^[ -_a-~]*$/u;

/** The same text in plain, lower-case characters, position for position. */
export const plainText = (text: string): string =>
  ALREADY_PLAIN.test(text) ? text.toLowerCase() : Array.from(text, plainCharacter).join('');
