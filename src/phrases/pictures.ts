import type { Card, Picture } from '../card/index.ts';
import type { PictureKind, PictureNumbers, WordsOf } from '../drawing/index.ts';
import type { Book } from './book.ts';
import { type Show, showIn } from './show.ts';

/** A picture with its words chosen, ready to be drawn. */
export type SpokenPictureOf<K extends PictureKind> = {
  readonly kind: K;
  readonly numbers: PictureNumbers[K];
  readonly words: WordsOf[K];
  /** Never left out. */
  readonly alt: string;
};
export type SpokenPicture = { [K in PictureKind]: SpokenPictureOf<K> }[PictureKind];

const speakPicture = <K extends PictureKind>(
  book: Book,
  show: Show,
  picture: { readonly kind: K; readonly numbers: PictureNumbers[K] },
): SpokenPictureOf<K> => {
  const { words, alt } = book.pictures[picture.kind];
  return {
    ...picture,
    words: words(picture.numbers, show),
    alt: alt(picture.numbers, show),
  };
};

/** The pictures of a card in the words of one language, the shop's unit. */
export const speakPictures = (book: Book, card: Card): readonly SpokenPicture[] => {
  const show = showIn(card.units);
  return card.pictures.map(
    (picture: Picture) => speakPicture(book, show, picture) as SpokenPicture,
  );
};
