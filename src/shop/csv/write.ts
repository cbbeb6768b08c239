/** How values are written into a file, so that reading them gives the same values back. */

/** The shortest digits that read back as the same number. */
export const numberText = (value: number): string => String(value);

/** Degrees, as the heading says; ten digits hide that the angle was kept in radians. */
export const angleText = (radians: number): string =>
  String(Number(((radians * 180) / Math.PI).toPrecision(10)));

/** Words that are written as they are kept. */
export const wordsOf = <T extends string>(words: readonly T[]): Readonly<Record<T, T>> =>
  Object.fromEntries(words.map((word) => [word, word])) as Readonly<Record<T, T>>;

/** The first word for a value. */
export const wordOf = <T>(words: Readonly<Record<string, T>>, value: T): string =>
  Object.entries(words).find(([, meant]) => meant === value)?.[0] ?? '';

export const YES_NO: Readonly<Record<string, boolean>> = {
  yes: true,
  no: false,
  y: true,
  n: false,
  true: true,
  false: false,
};
