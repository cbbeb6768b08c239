/** What a number looks like in a shop: `0.875`, `.875`, `19,05`, `7/8`, `1-1/4`, `1½`, `1,234.5`. */
const VULGAR: ReadonlyMap<string, number> = new Map([
  ['½', 1 / 2],
  ['⅓', 1 / 3],
  ['⅔', 2 / 3],
  ['¼', 1 / 4],
  ['¾', 3 / 4],
  ['⅕', 1 / 5],
  ['⅛', 1 / 8],
  ['⅜', 3 / 8],
  ['⅝', 5 / 8],
  ['⅞', 7 / 8],
]);
const VULGAR_SET = [...VULGAR.keys()].join('');

/** More digits than this are a slip, not a size. */
const MOST_DIGITS = 15;

const MIXED = String.raw`(?:\d+-)?\d+/\d+`;
const WITH_VULGAR = String.raw`\d*-?[${VULGAR_SET}]`;
/** Thousands that can be nothing else: with a decimal sign as well, or more than once. */
const GROUPED = [
  String.raw`\d{1,3}(?:,\d{3})+\.\d+`,
  String.raw`\d{1,3}(?:\.\d{3})+,\d+`,
  String.raw`\d{1,3}(?:,\d{3}){2,}`,
].join('|');
const DECIMAL = String.raw`\d+[.,]\d+|[.,]\d+|\d+\.?`;
/** A number and what follows it without a space. */
export const NUMBER = `${MIXED}|${WITH_VULGAR}|${GROUPED}|${DECIMAL}`;

const WHOLE_NUMBER = new RegExp(`^(?:${NUMBER})$`, 'u');
const FRACTION = /^(?:(\d+)-)?(\d+)\/(\d+)$/u;
const IS_GROUPED = new RegExp(`^(?:${GROUPED})$`, 'u');
const EITHER = /^([1-9]\d{0,2})[.,](\d{3})$/u;

/** Fractions of an inch are halved and halved again; 30/30 is two helices, not one. */
const isHalved = (bottom: number): boolean => bottom >= 2 && Number.isInteger(Math.log2(bottom));

const fraction = (text: string): number | null => {
  const match = FRACTION.exec(text);
  if (match === null) return null;
  const [, whole = '0', top = '', bottom = ''] = match;
  const share = Number(top) / Number(bottom);
  if (share >= 1 && !(isHalved(Number(bottom)) && whole === '0')) return Number.NaN;
  return Number(whole) + share;
};

const vulgar = (text: string): number | null => {
  const share = VULGAR.get(text.slice(-1));
  if (share === undefined) return null;
  const whole = text.slice(0, -1).replace(/-$/u, '');
  return (whole === '' ? 0 : Number(whole)) + share;
};

/** The last of the two signs is the decimal one; with commas alone there is none. */
const grouped = (text: string): number => {
  const decimal = text.includes('.')
    ? Math.max(text.lastIndexOf('.'), text.lastIndexOf(','))
    : text.length;
  const whole = text.slice(0, decimal).replaceAll(/[.,]/gu, '');
  return Number(`${whole}.${text.slice(decimal + 1)}`);
};

const valueOf = (text: string): number =>
  fraction(text) ??
  vulgar(text) ??
  (IS_GROUPED.test(text) ? grouped(text) : Number(text.replace(',', '.')));

/** The value of a plain number, or null where it is not one. Digits are never guessed. */
export const numberOf = (text: string): number | null => {
  if (!WHOLE_NUMBER.test(text) || text.replaceAll(/\D/gu, '').length > MOST_DIGITS) return null;
  const value = valueOf(text);
  return Number.isFinite(value) ? value : null;
};

/**
 * The thousands that `1,200` or `1.200` may have been meant for, where it may. Read as a decimal
 * it is as good a number: only what it counts can tell the two apart.
 */
export const thousandsOf = (text: string): number | null => {
  const match = EITHER.exec(text);
  return match === null ? null : Number(`${match[1] ?? ''}${match[2] ?? ''}`);
};

/** The whole of `1 1/4`. More than two digits are a material or a count, not inches. */
export const isWhole = (text: string): boolean => /^\d{1,2}$/u.test(text);
export const isFractionUnderOne = (text: string): boolean => {
  const value = /^\d+\/\d+$/u.test(text) ? fraction(text) : (VULGAR.get(text) ?? null);
  return value !== null && value < 1;
};
