import { framed, INK, type Key, keyBlock, MARGIN, WIDTH } from './frame.ts';
import type { DevelopedPatternNumbers } from './numbers.ts';
import { type Attributes, element, line, type Point, rect } from './svg.ts';
import type { WordsOf } from './words.ts';

const LEFT = MARGIN + 2;
const RIGHT = WIDTH - MARGIN - 2;
const HEIGHT = 130;
/** Teeth shown side by side: more would run into each other on a phone. Judgement. */
const MOST_TEETH = 8;

/** Groove families by how they lean: along the work is up, round it is across. */
const leansOf = (n: DevelopedPatternNumbers): readonly number[] => {
  switch (n.families) {
    case 'straight':
      return [0];
    case 'left':
      return [0 - n.helix];
    case 'right':
      return [n.helix];
    case 'crossed':
      return [0 - n.helix, n.helix];
    case 'square':
      return [0];
  }
};

type Area = {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
};

/** One groove cut off where it leaves the area, or nothing where it only touches a corner. */
const clipped = (at: number, lean: number, a: Area): readonly [Point, Point] | null => {
  const slope = Math.tan(lean);
  const x = (y: number): number => at + (a.bottom - y) * slope;
  if (Math.abs(slope) < 1e-9)
    return at >= a.left - 1e-6 && at <= a.right + 1e-6
      ? [
          [at, a.bottom],
          [at, a.top],
        ]
      : null;
  const y = (across: number): number => a.bottom - (across - at) / slope;
  const ends = [y(a.left), y(a.right)].sort((p, q) => p - q);
  const from = Math.max(a.top, ends[0] ?? 0);
  const to = Math.min(a.bottom, ends[1] ?? 0);
  return to - from < 0.5
    ? null
    : [
        [x(to), to],
        [x(from), from],
      ];
};

const family = (
  n: DevelopedPatternNumbers,
  lean: number,
  pitch: number,
  shift: number,
  a: Area,
  more: Readonly<Record<string, string | number>>,
): string => {
  const reach = Math.ceil(((a.bottom - a.top) * Math.abs(Math.tan(lean))) / pitch) + 1;
  const teeth = shownTeeth(n);
  return Array.from({ length: teeth + 2 * reach + 1 }, (_, i) => {
    const at = a.left + (i - reach + shift) * pitch;
    const ends = clipped(at, lean, a);
    return ends === null ? '' : line(ends[0], ends[1], more);
  }).join('');
};

const shownTeeth = (n: DevelopedPatternNumbers): number => Math.min(n.toothCount, MOST_TEETH);

const FIRST = { stroke: INK.ink, 'stroke-width': 2.5 } as const;
const SECOND = { stroke: INK.warn, 'stroke-width': 2, 'stroke-dasharray': '6 4' } as const;

/** Grooves round the work, a pitch apart from the lower edge up. */
const rings = (a: Area, pitch: number, id: string, style: Attributes): string =>
  element(
    'g',
    { 'data-figure': id },
    Array.from({ length: Math.ceil((a.bottom - a.top) / pitch) - 1 }, (_, i) => {
      const y = a.bottom - (i + 1) * pitch;
      return line([a.left, y], [a.right, y], style);
    }).join(''),
  );

/** The knurl unrolled, its true angle and pitch, and where a second turn falls beside the first. */
export const developedPattern = (
  n: DevelopedPatternNumbers,
  words: WordsOf['developedPattern'],
): string => {
  const teeth = shownTeeth(n);
  const pitch = (RIGHT - LEFT) / teeth;
  const drawing = (top: number) => {
    const a: Area = { left: LEFT, right: RIGHT, top, bottom: top + HEIGHT };
    const first = leansOf(n).map((lean, i) =>
      element(
        'g',
        {
          'data-figure': 'firstTurn',
          'data-family': i,
          'data-teeth': teeth,
          'data-scale': (pitch / n.transversePitch).toFixed(6),
        },
        family(n, lean, pitch, 0, a, FIRST),
      ),
    );
    const across = n.families === 'square' ? rings(a, pitch, 'firstRings', FIRST) : '';
    const acrossAgain =
      n.families === 'square' && !n.tracks ? rings(a, pitch, 'secondRings', SECOND) : '';
    const second = n.tracks
      ? ''
      : leansOf(n)
          .map((lean) =>
            element(
              'g',
              { 'data-figure': 'secondTurn' },
              family(n, lean, pitch, n.toothError, a, SECOND),
            ),
          )
          .join('');
    const field = rect(LEFT, top, RIGHT - LEFT, HEIGHT, {
      fill: INK.work,
      stroke: INK.ink,
      'stroke-width': 1,
    });
    return { svg: field + first.join('') + across + acrossAgain + second, height: HEIGHT };
  };
  const stroke =
    (style: Readonly<Record<string, string | number>>): Key['symbol'] =>
    (x, y) =>
      line([x - 10, y], [x + 10, y], style);
  const none: Key['symbol'] = () => '';
  const keys: readonly Key[] = [
    { symbol: stroke(FIRST), said: words.first },
    ...(words.second === null || n.tracks ? [] : [{ symbol: stroke(SECOND), said: words.second }]),
    ...(words.rings === null ? [] : [{ symbol: none, said: words.rings }]),
    { symbol: none, said: words.angle },
    { symbol: none, said: words.pitch },
    { symbol: none, said: words.shown(teeth) },
  ];
  return framed('developedPattern', words.title, drawing, (top) => keyBlock(keys, top));
};
