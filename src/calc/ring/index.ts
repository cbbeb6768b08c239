/** A tube that the wheels pinch. */
export * from './limits.ts';
export * from './thinRing.ts';
