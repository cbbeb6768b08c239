/** A figure cut to six significant digits, as the worked examples print theirs. */
export const sixDigits = (value: number): number => Number(value.toPrecision(6));
