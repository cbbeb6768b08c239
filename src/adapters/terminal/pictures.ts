import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Answer } from '../../desk/index.ts';
import type { Renderer } from '../../drawing/index.ts';
import type { Book } from '../../phrases/index.ts';
import { picturesWanted, sketchesOf } from '../common/draw.ts';

export type Writing = {
  readonly book: Book;
  readonly render: Renderer;
  readonly onFault: (error: unknown) => void;
};

/** Writes the pictures of an answer as SVG and PNG, and gives the paths of the PNGs that were. */
export const writePictures = async (
  answer: Answer,
  to: { readonly folder: string; readonly prefix: string },
  { book, render, onFault }: Writing,
): Promise<readonly string[]> => {
  const sketches = sketchesOf(answer, book);
  if (sketches.length === 0) return [];
  await mkdir(to.folder, { recursive: true });
  const written = await Promise.all(
    sketches.map(async ({ name, svg }) => {
      const path = join(to.folder, `${to.prefix}${name}`);
      try {
        await writeFile(`${path}.svg`, svg);
        await writeFile(`${path}.png`, await render(svg));
        return [`${path}.png`];
      } catch (error) {
        onFault(error);
        return [];
      }
    }),
  );
  return written.flat();
};

/** Where the pictures are, a line each; and where one is missing, that nothing else is. */
export const pictureLines = (
  answer: Answer,
  paths: readonly string[],
  { terminal }: Book,
): readonly string[] => [
  ...paths.map(terminal.pictureAt),
  ...(paths.length < picturesWanted(answer) ? [terminal.noPicture] : []),
];
