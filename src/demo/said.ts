/** What somebody says in the demo's shop. */
export type Said = {
  readonly by: string;
  readonly line: string;
  readonly attached?: { readonly name: string; readonly text: string };
};

/** Everybody of the invented shop. */
export const OWNER = 'Orla';
export const SUPERVISOR = 'Mara';
export const ENGINEER = 'Ben';
export const OPERATORS = ['Kit', 'Dov', 'Sanna'] as const;
