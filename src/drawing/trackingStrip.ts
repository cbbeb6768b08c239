import { breakMark, framed, INK, type Key, keyBlock, MARGIN, SMALL, WIDTH } from './frame.ts';
import type { StripMark, TrackingStripNumbers } from './numbers.ts';
import { circle, line, type Point, polygon, rect, text } from './svg.ts';
import type { WordsOf } from './words.ts';

const LEFT = MARGIN + 6;
const RIGHT = WIDTH - MARGIN - 6;
const HEIGHT = 118;
const AXIS = 78;
/** Whole counts side by side before the strip is broken in two: their numbers need the room. Judgement. */
const MOST_COUNTS = 4;

/** A piece of the strip: diameters from `low` to `high` between two places of the picture. */
type Stretch = {
  readonly low: number;
  readonly high: number;
  readonly left: number;
  readonly right: number;
};

/** A mark by its shape, so that no colour is needed to tell them apart. */
const MARKS: { readonly [K in StripMark['what']]: (x: number, y: number) => string } = {
  bar: (x, y) =>
    polygon(
      [
        [x - 7, y - 7],
        [x + 7, y - 7],
        [x, y + 6],
      ],
      { fill: INK.panel, stroke: INK.ink, 'stroke-width': 2 },
    ),
  blank: (x, y) => circle([x, y], 6, { fill: INK.ink }),
  part: (x, y) =>
    rect(x - 6, y - 6, 12, 12, { fill: INK.panel, stroke: INK.ink, 'stroke-width': 2 }),
};
/** How high each kind stands over the strip, so that two of one diameter do not hide each other. */
const LIFT: { readonly [K in StripMark['what']]: number } = { blank: 0, bar: 30, part: 52 };

const pointsOf = (n: TrackingStripNumbers): readonly number[] => [
  ...n.marks.map((mark) => mark.diameter),
  ...(n.next === null ? [] : [n.next.from, n.next.to]),
];

/** One stretch where everything is near, two with a break between them where it is not. */
const stretchesOf = (n: TrackingStripNumbers): readonly Stretch[] => {
  const step = n.transversePitch / Math.PI;
  const points = pointsOf(n);
  const [least, most] = [Math.min(...points), Math.max(...points)];
  const margin = 0.7 * step;
  const spread = most - least + 2 * margin;
  if (spread <= MOST_COUNTS * step) {
    // At least a whole count on either side.
    const extra = Math.max(0, 2.6 * step - spread) / 2;
    return [{ low: least - margin - extra, high: most + margin + extra, left: LEFT, right: RIGHT }];
  }
  const half = (RIGHT - LEFT - 20) / 2;
  return [
    { low: least - 0.8 * step, high: least + 0.8 * step, left: LEFT, right: LEFT + half },
    { low: most - 0.8 * step, high: most + 0.8 * step, left: RIGHT - half, right: RIGHT },
  ];
};

const placeIn = (s: Stretch, diameter: number): number =>
  s.left + ((diameter - s.low) / (s.high - s.low)) * (s.right - s.left);

const wholeCounts = (s: Stretch, step: number): readonly number[] => {
  const first = Math.max(1, Math.ceil(s.low / step - 1e-9));
  const last = Math.floor(s.high / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => first + i);
};

const stretchSvg = (
  s: Stretch,
  n: TrackingStripNumbers,
  words: WordsOf['trackingStrip'],
  top: number,
): string => {
  const step = n.transversePitch / Math.PI;
  const axis = top + AXIS;
  const scale = (s.right - s.left) / (s.high - s.low);
  const counts = wholeCounts(s, step).map((count) => {
    const diameter = count * step;
    const x = placeIn(s, diameter);
    const from = Math.max(s.left, placeIn(s, diameter - n.below));
    const to = Math.min(s.right, placeIn(s, diameter + n.above));
    // Words of a count at the very end would leave the strip.
    const hasRoom = x > s.left + 32 && x < s.right - 32;
    const words_ = hasRoom
      ? text(
          [x, axis + 22],
          words.count(count),
          { size: SMALL, weight: 'bold', anchor: 'middle' },
          {
            fill: INK.ink,
          },
        ) +
        text(
          [x, axis + 37],
          words.diameter(diameter),
          { size: SMALL, anchor: 'middle' },
          {
            fill: INK.ink,
          },
        )
      : '';
    return (
      rect(from, axis - 9, Math.max(0, to - from), 18, {
        fill: INK.good,
        stroke: INK.ink,
        'stroke-width': 1,
        'data-figure': 'window',
      }) +
      line([x, axis - 9], [x, axis + 9], {
        stroke: INK.ink,
        'stroke-width': 2,
        'data-figure': 'wholeCount',
        'data-count': count,
        'data-scale': scale.toFixed(6),
      }) +
      words_
    );
  });
  return (
    line([s.left, axis], [s.right, axis], { stroke: INK.ink, 'stroke-width': 1.5 }) +
    counts.join('')
  );
};

const arrow = (from: Point, to: Point): string => {
  const way = Math.sign(to[0] - from[0]) || 1;
  return (
    line(from, to, { stroke: INK.warn, 'stroke-width': 2.5, 'data-figure': 'next' }) +
    polygon([to, [to[0] - way * 8, to[1] - 5], [to[0] - way * 8, to[1] + 5]], { fill: INK.warn })
  );
};

const markSvg = (mark: StripMark, stretches: readonly Stretch[], top: number): string => {
  const s = stretches.find((each) => mark.diameter >= each.low && mark.diameter <= each.high);
  if (s === undefined) return '';
  const x = placeIn(s, mark.diameter);
  const axis = top + AXIS;
  const y = axis - LIFT[mark.what];
  const stem =
    LIFT[mark.what] === 0
      ? ''
      : line([x, y], [x, axis], {
          stroke: INK.ink,
          'stroke-width': 1.2,
          'stroke-dasharray': '3 2',
        });
  return stem + MARKS[mark.what](x, y);
};

const nextSvg = (n: TrackingStripNumbers, stretches: readonly Stretch[], top: number): string => {
  if (n.next === null) return '';
  const { from, to } = n.next;
  const at = (diameter: number): number => {
    const s = stretches.find((each) => diameter >= each.low && diameter <= each.high);
    return s === undefined ? LEFT : placeIn(s, diameter);
  };
  const y = top + AXIS - 16;
  return arrow([at(from), y], [at(to), y]);
};

/** Diameter along the strip: whole counts, what tracks round each, and where this work is. */
export const trackingStrip = (n: TrackingStripNumbers, words: WordsOf['trackingStrip']): string => {
  const stretches = stretchesOf(n);
  const isBroken = stretches.length > 1;
  const drawing = (top: number) => ({
    svg:
      stretches.map((s) => stretchSvg(s, n, words, top)).join('') +
      nextSvg(n, stretches, top) +
      n.marks.map((mark) => markSvg(mark, stretches, top)).join('') +
      (isBroken ? breakMark(WIDTH / 2, top + 8, top + AXIS + 14) : ''),
    height: HEIGHT,
  });
  const keys: readonly Key[] = [
    ...n.marks.map((mark, i) => ({ symbol: MARKS[mark.what], said: words.marks[i] ?? '' })),
    {
      symbol: (x, y) =>
        rect(x - 8, y - 6, 16, 12, { fill: INK.good, stroke: INK.ink, 'stroke-width': 1 }),
      said: words.window,
    },
    ...(words.next === null
      ? []
      : [
          {
            symbol: (x: number, y: number) => arrow([x + 9, y], [x - 9, y]),
            said: words.next,
          },
        ]),
    ...(isBroken
      ? [{ symbol: (x: number, y: number) => breakMark(x, y - 7, y + 7), said: words.broken }]
      : []),
  ];
  return framed('trackingStrip', words.title, drawing, (top) => keyBlock(keys, top));
};
