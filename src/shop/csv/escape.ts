/**
 * Spreadsheets take a cell that begins with one of these for a formula and run it. On the way out
 * such a cell gets an apostrophe before it, which they show as plain text; on the way in that
 * apostrophe is taken off again. A cell that looks escaped already gets one more, so that what was
 * kept and what comes back are always the same.
 * Source: OWASP, "CSV Injection" (the beginnings, tab and carriage return among them).
 */
const BEGINNINGS = '[=+\\-@\\t\\r\\n＝＋－＠]';
const FORMULA = new RegExp(`^'*${BEGINNINGS}`, 'u');
const ESCAPED = new RegExp(`^''*${BEGINNINGS}`, 'u');

export const escaped = (cell: string): string => (FORMULA.test(cell) ? `'${cell}` : cell);

export const unescaped = (cell: string): string => (ESCAPED.test(cell) ? cell.slice(1) : cell);
