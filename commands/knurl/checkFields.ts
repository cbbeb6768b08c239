import type { z } from 'zod';
import * as words from './checkParameters.ts';
import { setupParameters } from './setupParameters.ts';

/** Everything that can be said to it: the set-up, and what was seen or measured. */
export const checkFields = setupParameters.extend({
  seam: words.seam,
  count: words.count,
  scrap: words.scrap,
  crest: words.crest,
  height: words.height,
  flat: words.flat,
  flats: words.flats,
});
export type CheckWords = z.infer<typeof checkFields>;
