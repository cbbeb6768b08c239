import { developedPattern } from './developedPattern.ts';
import type { PictureKind, PictureNumbers } from './numbers.ts';
import { planMap } from './planMap.ts';
import { setupSketch } from './setupSketch.ts';
import { shopRecord } from './shopRecord.ts';
import { toothForm } from './toothForm.ts';
import { trackingStrip } from './trackingStrip.ts';
import type { WordsOf } from './words.ts';

export type * from './numbers.ts';
export { openRenderer, PNG_WIDTH, type Renderer } from './png.ts';
export type { WordsOf } from './words.ts';

const DRAWINGS: {
  readonly [K in PictureKind]: (numbers: PictureNumbers[K], words: WordsOf[K]) => string;
} = { toothForm, trackingStrip, setupSketch, developedPattern, planMap, shopRecord };

/** A picture as SVG, from numbers in millimetres and words that are already chosen. */
export const drawPicture = <K extends PictureKind>(
  kind: K,
  numbers: PictureNumbers[K],
  words: WordsOf[K],
): string => DRAWINGS[kind](numbers, words);
