/** Formed knurls: where the metal goes. */
export * from './blunt.ts';
export { type Formed, formedFlat, heightFromInfeed, heightFromRise } from './flat.ts';
export { dialSlope, type Form, fullFormInfeed, solidShare } from './form.ts';
export * from './round.ts';
export * from './tooth.ts';
