/** Reads a drawn picture back: its elements, their places, and its texts as wide as the font has them. */
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';

export type Read = {
  readonly name: string;
  readonly at: Readonly<Record<string, string>>;
  readonly inner: string;
};
export type Box = {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
};

const plain = (text: string): string =>
  text
    .replaceAll('&lt;', '<')
    .replaceAll('&gt;', '>')
    .replaceAll('&quot;', '"')
    .replaceAll('&amp;', '&');

export const elementsOf = (svg: string): readonly Read[] =>
  [...svg.matchAll(/<(\w+)((?:\s[\w-]+="[^"]*")*)\s*\/?>([^<]*)/gu)].map(
    ([, name = '', rest = '', inner = '']) => ({
      name,
      at: Object.fromEntries(
        [...rest.matchAll(/([\w-]+)="([^"]*)"/gu)].map(([, key = '', value = '']) => [key, value]),
      ),
      inner: plain(inner),
    }),
  );

export const num = (element: Read | undefined, key: string): number => {
  const value = Number(element?.at[key]);
  if (Number.isNaN(value)) throw new Error(`no number ${key}`);
  return value;
};
export const figures = (svg: string, id: string): readonly Read[] =>
  elementsOf(svg).filter((element) => element.at['data-figure'] === id);
export const figure = (svg: string, id: string): Read => {
  const [first] = figures(svg, id);
  if (first === undefined) throw new Error(`no ${id} is drawn`);
  return first;
};
export const lengthOf = (line: Read): number =>
  Math.hypot(num(line, 'x2') - num(line, 'x1'), num(line, 'y2') - num(line, 'y1'));

export const pointsOf = (element: Read): readonly (readonly [number, number])[] =>
  (element.at['points'] ?? '').split(' ').map((pair) => {
    const [x = Number.NaN, y = Number.NaN] = pair.split(',').map(Number);
    return [x, y] as const;
  });

const SHAPES = {
  line: (e: Read) => [
    [num(e, 'x1'), num(e, 'y1')],
    [num(e, 'x2'), num(e, 'y2')],
  ],
  rect: (e: Read) => [
    [num(e, 'x'), num(e, 'y')],
    [num(e, 'x') + num(e, 'width'), num(e, 'y') + num(e, 'height')],
  ],
  circle: (e: Read) => [
    [num(e, 'cx') - num(e, 'r'), num(e, 'cy') - num(e, 'r')],
    [num(e, 'cx') + num(e, 'r'), num(e, 'cy') + num(e, 'r')],
  ],
  polygon: pointsOf,
  polyline: pointsOf,
  // Ends of the strokes; an arc bulges no further than its ends by more than the frame's margin.
  path: (e: Read) =>
    [
      ...(e.at['d'] ?? '').matchAll(/(?:[ML]|A[\d.]+ [\d.]+ 0 [01] [01] )(-?[\d.]+) (-?[\d.]+)/gu),
    ].map(([, x, y]) => [Number(x), Number(y)]),
} as const;

export const boxOf = (element: Read): Box | null => {
  const read = SHAPES[element.name as keyof typeof SHAPES] as
    | ((e: Read) => readonly (readonly number[])[])
    | undefined;
  const points = read?.(element) ?? [];
  if (points.length === 0) return null;
  const xs = points.map(([x = Number.NaN]) => x);
  const ys = points.map(([, y = Number.NaN]) => y);
  return {
    left: Math.min(...xs),
    right: Math.max(...xs),
    top: Math.min(...ys),
    bottom: Math.max(...ys),
  };
};

/** Advances of a TrueType font, by the tables its standard names: head, hhea, hmtx and cmap 4. */
const advancesOf = (file: string): ((letter: string) => number) => {
  const folder = dirname(createRequire(import.meta.url).resolve('dejavu-fonts-ttf/package.json'));
  const font = readFileSync(join(folder, 'ttf', file));
  const table = new Map<string, number>();
  for (let i = 0; i < font.readUInt16BE(4); i += 1)
    table.set(font.toString('ascii', 12 + 16 * i, 16 + 16 * i), font.readUInt32BE(20 + 16 * i));
  const start = (name: string): number => table.get(name) ?? 0;
  const em = font.readUInt16BE(start('head') + 18);
  const metrics = font.readUInt16BE(start('hhea') + 34);
  const maps = Array.from(
    { length: font.readUInt16BE(start('cmap') + 2) },
    (_, i) => start('cmap') + font.readUInt32BE(start('cmap') + 8 + 8 * i),
  );
  const map = maps.find((at) => font.readUInt16BE(at) === 4) ?? 0;
  const segments = font.readUInt16BE(map + 6) / 2;
  const glyph = (code: number): number => {
    for (let i = 0; i < segments; i += 1) {
      if (code > font.readUInt16BE(map + 14 + 2 * i)) continue;
      const first = font.readUInt16BE(map + 16 + 2 * (segments + i));
      if (code < first) return 0;
      const delta = font.readUInt16BE(map + 16 + 2 * (2 * segments + i));
      const place = map + 16 + 2 * (3 * segments + i);
      const offset = font.readUInt16BE(place);
      if (offset === 0) return (code + delta) & 0xffff;
      return font.readUInt16BE(place + offset + 2 * (code - first)) + delta;
    }
    return 0;
  };
  return (letter) => {
    const index = Math.min(glyph(letter.codePointAt(0) ?? 0), metrics - 1);
    return font.readUInt16BE(start('hmtx') + 4 * index) / em;
  };
};
const FONTS = { regular: advancesOf('DejaVuSans.ttf'), bold: advancesOf('DejaVuSans-Bold.ttf') };

export const realWidth = (text: string, size: number, weight: 'regular' | 'bold'): number =>
  Array.from(text).reduce((sum, letter) => sum + FONTS[weight](letter), 0) * size;

/** Where a text stands, by the advances of the real font and its usual heights. */
export const textBox = (element: Read): Box => {
  const size = num(element, 'font-size');
  const width = realWidth(
    element.inner,
    size,
    element.at['font-weight'] === 'bold' ? 'bold' : 'regular',
  );
  const [x, y] = [num(element, 'x'), num(element, 'y')];
  const left =
    { start: x, middle: x - width / 2, end: x - width }[element.at['text-anchor'] ?? 'start'] ?? x;
  return { left, right: left + width, top: y - 0.76 * size, bottom: y + 0.24 * size };
};
