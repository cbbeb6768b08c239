import { breakMark, framed, INK, type Key, keyBlock, MARGIN, SMALL, WIDTH } from './frame.ts';
import type { StripMark, TrackingStripNumbers } from './numbers.ts';
import { circle, line, type Point, polygon, rect, text } from './svg.ts';
import type { WordsOf } from './words.ts';

const LEFT = MARGIN + 6;
const RIGHT = WIDTH - MARGIN - 6;
/** Under the strip: counts and diameters. */
const UNDER = 40;
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
const LIFT: { readonly [K in StripMark['what']]: number } = { blank: 0, bar: 30, part: 54 };
const ARROW = 16;
/** Room over the highest mark. */
const HEAD = 14;

/** How far under the top of the drawing the strip lies: no further than its marks need. */
const axisOf = ({ marks, next }: TrackingStripNumbers): number =>
  HEAD + Math.max(10, next === null ? 0 : ARROW, ...marks.map(({ what }) => LIFT[what]));

const pointsOf = (n: TrackingStripNumbers): readonly number[] => [
  ...n.marks.map((mark) => mark.diameter),
  ...(n.expected === null ? [] : [n.expected.low, n.expected.high]),
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

type Whole = { readonly diameter: number; readonly count: number | null };

/** Whole counts by their number, or as so many steps from one whose number nobody knows. */
const wholeCounts = (s: Stretch, { transversePitch, wholeAt }: TrackingStripNumbers) => {
  const step = transversePitch / Math.PI;
  const origin = wholeAt ?? 0;
  const least = wholeAt === null ? 1 : Math.ceil((step - origin) / step);
  const first = Math.max(least, Math.ceil((s.low - origin) / step - 1e-9));
  const last = Math.floor((s.high - origin) / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i): Whole => {
    const count = first + i;
    return { diameter: origin + count * step, count: wholeAt === null ? count : null };
  });
};

const wholeWords = (
  { diameter, count }: Whole,
  x: number,
  words: WordsOf['trackingStrip'],
  axis: number,
): string => {
  const under = (y: number, said: string, weight: 'bold' | 'regular'): string =>
    text([x, axis + y], said, { size: SMALL, weight, anchor: 'middle' }, { fill: INK.ink });
  return count === null
    ? under(24, words.diameter(diameter), 'regular')
    : under(22, words.count(count), 'bold') + under(37, words.diameter(diameter), 'regular');
};

const stretchSvg = (
  s: Stretch,
  n: TrackingStripNumbers,
  words: WordsOf['trackingStrip'],
  axis: number,
): string => {
  const scale = (s.right - s.left) / (s.high - s.low);
  const counts = wholeCounts(s, n).map((whole) => {
    const { diameter, count } = whole;
    const x = placeIn(s, diameter);
    const from = Math.max(s.left, placeIn(s, diameter - n.below));
    const to = Math.min(s.right, placeIn(s, diameter + n.above));
    // Words of a count at the very end would leave the strip.
    const hasRoom = x > s.left + 32 && x < s.right - 32;
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
        ...(count === null ? {} : { 'data-count': count }),
        'data-scale': scale.toFixed(6),
      }) +
      (hasRoom ? wholeWords(whole, x, words, axis) : '')
    );
  });
  return (
    line([s.left, axis], [s.right, axis], { stroke: INK.ink, 'stroke-width': 1.5 }) +
    counts.join('')
  );
};

const EXPECTED = {
  fill: INK.wheel,
  stroke: INK.ink,
  'stroke-width': 1,
  'stroke-dasharray': '4 3',
} as const;

/** What was expected over the crests, at the height of the part that is measured there. */
const expectedSvg = (
  { expected }: TrackingStripNumbers,
  stretches: readonly Stretch[],
  axis: number,
): string =>
  expected === null
    ? ''
    : stretches
        .map((s) => {
          const from = placeIn(s, Math.max(s.low, expected.low));
          const to = placeIn(s, Math.min(s.high, expected.high));
          return to <= from
            ? ''
            : rect(from, axis - LIFT.part - 9, to - from, 18, {
                ...EXPECTED,
                'data-figure': 'expected',
              });
        })
        .join('');

const arrow = (from: Point, to: Point): string => {
  const way = Math.sign(to[0] - from[0]) || 1;
  return (
    line(from, to, { stroke: INK.warn, 'stroke-width': 2.5, 'data-figure': 'next' }) +
    polygon([to, [to[0] - way * 8, to[1] - 5], [to[0] - way * 8, to[1] + 5]], { fill: INK.warn })
  );
};

const markSvg = (mark: StripMark, stretches: readonly Stretch[], axis: number): string => {
  const s = stretches.find((each) => mark.diameter >= each.low && mark.diameter <= each.high);
  if (s === undefined) return '';
  const x = placeIn(s, mark.diameter);
  const y = axis - LIFT[mark.what];
  // What is measured over the crests has no whole count under it.
  const stem =
    LIFT[mark.what] === 0 || mark.what === 'part'
      ? ''
      : line([x, y], [x, axis], {
          stroke: INK.ink,
          'stroke-width': 1.2,
          'stroke-dasharray': '3 2',
        });
  return stem + MARKS[mark.what](x, y);
};

const nextSvg = (n: TrackingStripNumbers, stretches: readonly Stretch[], axis: number): string => {
  if (n.next === null) return '';
  const { from, to } = n.next;
  const at = (diameter: number): number => {
    const s = stretches.find((each) => diameter >= each.low && diameter <= each.high);
    return s === undefined ? LEFT : placeIn(s, diameter);
  };
  const y = axis - ARROW;
  return arrow([at(from), y], [at(to), y]);
};

/** Diameter along the strip: whole counts, what tracks round each, and where this work is. */
export const trackingStrip = (n: TrackingStripNumbers, words: WordsOf['trackingStrip']): string => {
  const stretches = stretchesOf(n);
  const isBroken = stretches.length > 1;
  const drawing = (top: number) => {
    const axis = top + axisOf(n);
    return {
      svg:
        stretches.map((s) => stretchSvg(s, n, words, axis)).join('') +
        expectedSvg(n, stretches, axis) +
        nextSvg(n, stretches, axis) +
        n.marks.map((mark) => markSvg(mark, stretches, axis)).join('') +
        (isBroken ? breakMark(WIDTH / 2, top, axis + 14) : ''),
      height: axisOf(n) + UNDER,
    };
  };
  const keys: readonly Key[] = [
    ...n.marks.map((mark, i) => ({ symbol: MARKS[mark.what], said: words.marks[i] ?? '' })),
    {
      symbol: (x, y) =>
        rect(x - 8, y - 6, 16, 12, { fill: INK.good, stroke: INK.ink, 'stroke-width': 1 }),
      said: words.window,
    },
    ...(words.expected === null
      ? []
      : [
          {
            symbol: (x: number, y: number) => rect(x - 8, y - 6, 16, 12, EXPECTED),
            said: words.expected,
          },
        ]),
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
