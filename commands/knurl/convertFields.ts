import { z } from 'zod';
import { said } from '../../src/desk/index.ts';
import { freePitch, readPitch, samePitch } from '../../src/words/index.ts';
import * as words from './parameters.ts';
import { planFields } from './planFields.ts';

/** Nothing but a pitch has a number here, so one that says nothing about itself is the pitch. */
const pitch = said({
  name: 'pitch',
  read: readPitch,
  free: freePitch,
  keywords: ['pitch'],
  merge: samePitch,
  measures: ['length'],
  bare: true,
  examples: ['21tpi', '96dp', '0.8 pitch'],
});

/** Everything that can be said to a conversion. */
export const convertFields = z.object({
  pitch,
  pattern: words.pattern,
  tolerance: planFields.shape.tolerance,
  callout: words.callout,
  hand: words.hand,
  points: words.points,
  helix: words.helix,
  units: words.shown,
});
export type ConvertWords = z.infer<typeof convertFields>;
