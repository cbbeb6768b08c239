export * from './card.ts';
export * from './lines.ts';
