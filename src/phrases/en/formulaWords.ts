/** What a formula works out, and what it takes for granted: the words of its card. */
export type FormulaWords = { readonly says: string; readonly assumes: string };
