import type { z } from 'zod';
import * as measured from './checkParameters.ts';
import { setupParameters } from './setupParameters.ts';
import * as words from './troubleParameters.ts';

/** Everything that can be said to it: the set-up, and what was seen or measured. */
export const troubleFields = setupParameters.extend({
  symptom: words.symptom,
  partsOnWheel: words.partsOnWheel,
  bite: words.biteTaken,
  count: measured.count,
  crest: measured.crest,
  height: measured.height,
  flat: measured.flat,
  flats: measured.flats,
});
export type TroubleWords = z.infer<typeof troubleFields>;
