import { textWidth, type Weight } from './text.ts';

type Value = number | string;
export type Attributes = Readonly<Record<string, Value>>;
export type Point = readonly [x: number, y: number];

const escaped = (text: string): string =>
  text
    // Control characters are not allowed in XML at all.
    .replaceAll(/\p{Cc}/gu, ' ')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');

/** Four decimals of a unit of the picture: far finer than a dot, and the same on every machine. */
const written = (value: Value): string =>
  typeof value === 'number' ? String(Number(value.toFixed(4)) + 0) : escaped(value);

export const element = (name: string, attributes: Attributes, inner = ''): string => {
  const said = Object.entries(attributes).map(([key, value]) => ` ${key}="${written(value)}"`);
  return inner === ''
    ? `<${name}${said.join('')}/>`
    : `<${name}${said.join('')}>${inner}</${name}>`;
};

export const line = (from: Point, to: Point, more: Attributes = {}): string =>
  element('line', { x1: from[0], y1: from[1], x2: to[0], y2: to[1], ...more });
export const rect = (x: number, y: number, width: number, height: number, more: Attributes) =>
  element('rect', { x, y, width, height, ...more });
export const circle = (center: Point, r: number, more: Attributes): string =>
  element('circle', { cx: center[0], cy: center[1], r, ...more });

const pair = ([x, y]: Point): string => `${written(x)},${written(y)}`;
export const polygon = (points: readonly Point[], more: Attributes): string =>
  element('polygon', { points: points.map(pair).join(' '), ...more });
export type TextStyle = {
  readonly size: number;
  readonly weight?: Weight;
  readonly anchor?: 'start' | 'middle' | 'end';
};

export const text = (at: Point, said: string, style: TextStyle, more: Attributes = {}): string =>
  element(
    'text',
    {
      x: at[0],
      y: at[1],
      'font-size': style.size,
      'font-weight': style.weight ?? 'regular',
      'text-anchor': style.anchor ?? 'start',
      ...more,
    },
    escaped(said),
  ).replace(' font-weight="regular"', '');

/** Where a text has to stand to stay between two sides. */
export const heldBetween = (
  x: number,
  said: string,
  style: TextStyle,
  [left, right]: readonly [number, number],
): number => {
  const half = textWidth(said, style.size, style.weight) / 2;
  return Math.min(Math.max(x, left + half), Math.max(left + half, right - half));
};
