import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Answer } from '../../desk/index.ts';
import type { Renderer } from '../../drawing/index.ts';
import type { Book } from '../../phrases/index.ts';
import { sketchesOf } from '../common/draw.ts';

/** Writes the pictures of an answer as SVG and PNG, and gives the paths of the PNGs. */
export const writePictures = async (
  answer: Answer,
  to: { readonly folder: string; readonly prefix: string },
  { book, render }: { readonly book: Book; readonly render: Renderer },
): Promise<readonly string[]> => {
  const sketches = sketchesOf(answer, book);
  if (sketches.length === 0) return [];
  await mkdir(to.folder, { recursive: true });
  return await Promise.all(
    sketches.map(async ({ name, svg }) => {
      const path = join(to.folder, `${to.prefix}${name}`);
      await writeFile(`${path}.svg`, svg);
      await writeFile(`${path}.png`, await render(svg));
      return `${path}.png`;
    }),
  );
};
