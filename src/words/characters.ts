/**
 * Phones turn quotes, dashes and spaces into typographic ones, and capitalise. Everything is
 * brought back to what a keyboard has, character for character, so that every position in the
 * result is the same position in what the person typed.
 */
const PLAIN: Readonly<Record<string, string>> = {
  '“': '"',
  '”': '"',
  '„': '"',
  '‟': '"',
  '″': '"',
  '‶': '"',
  '＂': '"',
  '‘': "'",
  '’': "'",
  '‛': "'",
  '′': "'",
  '´': "'",
  '`': "'",
  '‐': '-',
  '‑': '-',
  '‒': '-',
  '–': '-',
  '—': '-',
  '―': '-',
  '−': '-',
  '×': 'x',
  '✕': 'x',
  Ø: 'ø',
  '⌀': 'ø',
  '∅': 'ø',
  µ: 'u',
  μ: 'u',
  º: '°',
  '˚': '°',
  '⁄': '/',
  '∕': '/',
  '，': ',',
  '．': '.',
};

const plainCharacter = (character: string): string => {
  const plain = PLAIN[character];
  if (plain !== undefined) return plain;
  if (/\s/u.test(character)) return ' ';
  const lower = character.toLowerCase();
  // A few capitals grow when lowered; those keep their place instead.
  return lower.length === character.length ? lower : character;
};

/** The same text in plain, lower-case characters, position for position. */
export const plainText = (text: string): string => Array.from(text, plainCharacter).join('');
