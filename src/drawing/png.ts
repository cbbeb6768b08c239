import { createHash } from 'node:crypto';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { renderAsync } from '@resvg/resvg-js';
import PQueue from 'p-queue';
import { pngOf } from './encode.ts';

const fonts = (): readonly string[] => {
  const folder = join(
    dirname(createRequire(import.meta.url).resolve('dejavu-fonts-ttf/package.json')),
    'ttf',
  );
  return ['DejaVuSans.ttf', 'DejaVuSans-Bold.ttf'].map((name) => join(folder, name));
};

/** What the renderer is told, whoever asks: only the shipped fonts, so that every machine draws the same. */
export const renderOptions = (width: number) => ({
  fitTo: { mode: 'width' as const, value: width },
  font: {
    loadSystemFonts: false,
    fontFiles: [...fonts()],
    defaultFontFamily: 'DejaVu Sans',
    sansSerifFamily: 'DejaVu Sans',
  },
});

/** Twice the dots of the narrowest phone. Judgement. */
export const PNG_WIDTH = 800;
/** Pictures drawn at once: more would take the processor from the answers. Judgement. */
const AT_ONCE = 2;
/** Pictures kept: about 50 kB each. Judgement. */
const MOST_KEPT = 200;

export type Renderer = (svg: string, width?: number) => Promise<Uint8Array>;

/** One picture, drawn and packed off the main thread. */
const made: Renderer = async (svg, wide = PNG_WIDTH) => {
  const image = await renderAsync(svg, renderOptions(wide));
  const { width, height, pixels } = image;
  return await pngOf({ width, height, pixels });
};

/** Makes pictures a few at a time, and the same one only once. */
export const openRenderer = (make: Renderer = made): Renderer => {
  const queue = new PQueue({ concurrency: AT_ONCE });
  const kept = new Map<string, Promise<Uint8Array>>();
  return (svg, width = PNG_WIDTH) => {
    const key = createHash('sha256')
      .update(`${String(width)} ${svg}`)
      .digest('hex');
    const known = kept.get(key);
    if (known !== undefined) return known;
    const making = queue.add(() => make(svg, width));
    kept.set(key, making);
    // One that failed is tried again the next time it is asked for.
    making.catch(() => kept.delete(key));
    const [oldest] = kept.keys();
    if (kept.size > MOST_KEPT && oldest !== undefined) kept.delete(oldest);
    return making;
  };
};
