/** A bar that wheels on one side push away. */
export * from './beam.ts';
export * from './limits.ts';
export * from './section.ts';
export * from './work.ts';
