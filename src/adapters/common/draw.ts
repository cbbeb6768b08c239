import type { Answer } from '../../desk/index.ts';
import { drawPicture, type Renderer } from '../../drawing/index.ts';
import { type Book, speakPictures } from '../../phrases/index.ts';
import type { Drawn } from './pieces.ts';

export type Sketch = { readonly name: string; readonly svg: string; readonly alt: string };

/** The pictures of an answer as SVG, each with a name of its own and its alt text. */
export const sketchesOf = (answer: Answer, book: Book): readonly Sketch[] =>
  answer.kind === 'card'
    ? speakPictures(book, answer.card).map((spoken, i) => ({
        name: `${String(i + 1)}-${spoken.kind}`,
        svg: drawPicture(spoken.kind, spoken.numbers, spoken.words),
        alt: spoken.alt,
      }))
    : [];

/** How many pictures an answer has: where fewer are shown, the card says what is missing. */
export const picturesWanted = (answer: Answer): number =>
  answer.kind === 'card' ? answer.card.pictures.length : 0;

/** Draws what an answer shows; a picture that fails is told to whoever keeps count, and left out. */
export const openDraw =
  (book: Book, render: Renderer, onFault: (error: unknown) => void) =>
  async (answer: Answer): Promise<readonly Drawn[]> => {
    const drawn = await Promise.all(
      sketches(answer, book, onFault).map(async ({ name, svg, alt }) => {
        try {
          return [{ name: `${name}.png`, bytes: await render(svg), alt }];
        } catch (error) {
          onFault(error);
          return [];
        }
      }),
    );
    return drawn.flat();
  };

const sketches = (
  answer: Answer,
  book: Book,
  onFault: (error: unknown) => void,
): readonly Sketch[] => {
  try {
    return sketchesOf(answer, book);
  } catch (error) {
    onFault(error);
    return [];
  }
};
