import type { PictureKind, PictureNumbers, WordsOf } from '../drawing/index.ts';
import type { Show } from './show.ts';

/** What a picture says: the words in it, and the whole of it in a sentence for whoever cannot see it. */
export type PicturePhrases = {
  readonly [K in PictureKind]: {
    readonly words: (numbers: PictureNumbers[K], show: Show) => WordsOf[K];
    readonly alt: (numbers: PictureNumbers[K], show: Show) => string;
  };
};
