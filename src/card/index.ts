export * from './card.ts';
export * from './lines.ts';
export type { CandidateSaid } from './planLines.ts';
export type { Sure, WhyLabels, WhyLines, WhyRows } from './whyLines.ts';
