export * from './card.ts';
export * from './lines.ts';
export type { CandidateSaid } from './planLines.ts';
