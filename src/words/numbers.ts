/** What a number looks like in a shop: `0.875`, `.875`, `19,05`, `7/8`, `1-1/4`, `1½`. */
const VULGAR: Readonly<Record<string, number>> = {
  '½': 1 / 2,
  '⅓': 1 / 3,
  '⅔': 2 / 3,
  '¼': 1 / 4,
  '¾': 3 / 4,
  '⅕': 1 / 5,
  '⅛': 1 / 8,
  '⅜': 3 / 8,
  '⅝': 5 / 8,
  '⅞': 7 / 8,
};
const VULGAR_SET = Object.keys(VULGAR).join('');

/** More digits than this are a slip, not a size. */
const MOST_DIGITS = 15;

const MIXED = `(?:\\d+-)?\\d+/\\d+`;
const WITH_VULGAR = `\\d*-?[${VULGAR_SET}]`;
const DECIMAL = `\\d+[.,]\\d+|[.,]\\d+|\\d+\\.?`;
/** A number and what follows it without a space. */
export const NUMBER = `${MIXED}|${WITH_VULGAR}|${DECIMAL}`;

const fraction = (text: string): number | null => {
  const match = /^(?:(\d+)-)?(\d+)\/(\d+)$/u.exec(text);
  if (match === null) return null;
  const [, whole = '0', top = '', bottom = ''] = match;
  return Number(bottom) === 0 ? null : Number(whole) + Number(top) / Number(bottom);
};

const vulgar = (text: string): number | null => {
  const share = VULGAR[text.slice(-1)];
  if (share === undefined) return null;
  const whole = text.slice(0, -1).replace(/-$/u, '');
  return (whole === '' ? 0 : Number(whole)) + share;
};

/** The value of a plain number, or null where it is not one. Digits are never guessed. */
export const numberOf = (text: string): number | null => {
  if (text.replaceAll(/\D/gu, '').length > MOST_DIGITS) return null;
  if (!new RegExp(`^(?:${NUMBER})$`, 'u').test(text)) return null;
  const value = fraction(text) ?? vulgar(text) ?? Number(text.replace(',', '.'));
  return Number.isFinite(value) ? value : null;
};

/** A whole number or a fraction under one: the halves of `1 1/4`. */
export const isWhole = (text: string): boolean => /^\d{1,6}$/u.test(text);
export const isFractionUnderOne = (text: string): boolean => {
  const value = /^\d+\/\d+$/u.test(text) ? fraction(text) : (VULGAR[text] ?? null);
  return value !== null && value < 1;
};
