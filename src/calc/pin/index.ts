/** The pin a wheel turns on. */
export * from './limits.ts';
export * from './pin.ts';
