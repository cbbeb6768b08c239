import { element, rect, text } from './svg.ts';
import { linesOf } from './text.ts';

/** Width of every picture in its own units: one unit is one dot on a narrow phone. Judgement. */
export const WIDTH = 400;
export const MARGIN = 12;
/** Sizes that are still read at that width. Judgement. */
export const SMALL = 12;
const PLAIN = 13;
const TITLE = 15;
const LINE = 17;

/** Inks on a light panel of their own, so that a dark chat reads them as well as a light one. */
export const INK = {
  panel: '#fbf9f4',
  edge: '#8a8f94',
  ink: '#1b2126',
  faint: '#6b7278',
  work: '#cdd6dc',
  wheel: '#ecd9ae',
  good: '#bfe0c4',
  mark: '#0b4f7a',
  warn: '#a3231b',
} as const;

export type Block = { readonly svg: string; readonly height: number };

/** Lines of text one under the other from a height down. */
export const textBlock = (
  texts: readonly string[],
  top: number,
  style: { readonly size?: number; readonly bold?: boolean; readonly left?: number } = {},
): Block => {
  const { size = PLAIN, bold = false, left = MARGIN } = style;
  const weight = bold ? 'bold' : 'regular';
  const lines = texts.flatMap((said) => linesOf(said, WIDTH - MARGIN - left, size, weight));
  return {
    svg: lines
      .map((said, i) =>
        text([left, top + (i + 0.75) * LINE], said, { size, weight }, { fill: INK.ink }),
      )
      .join(''),
    height: lines.length * LINE,
  };
};

export type Key = {
  /** Drawn round the middle of its line, in a field this wide at the left margin. */
  readonly symbol: (x: number, y: number) => string;
  readonly said: string;
};
const SYMBOL = 26;

/** What the marks of the picture mean: shape first, words beside it. */
export const keyBlock = (keys: readonly Key[], top: number): Block => {
  let height = 0;
  const rows = keys.map(({ symbol, said }) => {
    const row = textBlock([said], top + height, { left: MARGIN + SYMBOL });
    const drawn = symbol(MARGIN + SYMBOL / 2 - 4, top + height + LINE / 2);
    height += row.height + 2;
    return drawn + row.svg;
  });
  return { svg: rows.join(''), height };
};

/** Title, the drawing from the given height down, and the words under it, on one panel. */
export const framed = (
  kind: string,
  title: string,
  drawing: (top: number) => Block,
  under: (top: number) => Block,
): string => {
  const head = textBlock([title], MARGIN - 2, { size: TITLE, bold: true });
  const top = MARGIN + head.height + 4;
  const middle = drawing(top);
  const below = under(top + middle.height + 6);
  const height = Math.ceil(top + middle.height + 6 + below.height + MARGIN);
  const panel = rect(1, 1, WIDTH - 2, height - 2, {
    rx: 8,
    fill: INK.panel,
    stroke: INK.edge,
    'stroke-width': 1.5,
  });
  return element(
    'svg',
    {
      xmlns: 'http://www.w3.org/2000/svg',
      viewBox: `0 0 ${String(WIDTH)} ${String(height)}`,
      width: WIDTH,
      height,
      'font-family': 'DejaVu Sans',
      'data-picture': kind,
    },
    panel + head.svg + middle.svg + below.svg,
  );
};

/** A line that says a length is not drawn in full: two strokes across it. */
export const breakMark = (x: number, top: number, bottom: number): string => {
  const steps = 6;
  const wave = (shift: number): string =>
    Array.from({ length: steps + 1 }, (_, i) => {
      const y = top + ((bottom - top) * i) / steps;
      return `${i === 0 ? 'M' : 'L'}${String(x + shift + (i % 2 === 0 ? -2 : 2))} ${y.toFixed(2)}`;
    }).join('');
  const shape = `${wave(-3)}${wave(3)
    .split(/(?=[ML])/u)
    .reverse()
    .join('')
    .replaceAll('M', 'L')}Z`;
  return (
    element('path', { d: shape, fill: INK.panel, 'data-break': 'gap' }) +
    [-3, 3]
      .map((shift) =>
        element('path', { d: wave(shift), fill: 'none', stroke: INK.ink, 'stroke-width': 1.2 }),
      )
      .join('')
  );
};
