import { breakMark, framed, INK, type Key, keyBlock, MARGIN, SMALL, WIDTH } from './frame.ts';
import type { SetupSketchNumbers } from './numbers.ts';
import { circle, element, heldBetween, line, type Point, polygon, rect, text } from './svg.ts';
import type { WordsOf } from './words.ts';

/** The side view and the view on the end of the part, beside each other. */
const SIDE = { left: MARGIN + 4, right: 262 };
const END = { left: 280, right: WIDTH - MARGIN - 4 };
const MIDDLE = 92;
const HEIGHT = 232;
const CHUCK = 22;
/** Most that the part or a wheel may be drawn smaller than the other, and still be seen. Judgement. */
const LEAST_SHARE = 0.2;
const LEAST_LENGTH = 26;
const LEAST_WALL = 2.5;
/** Diameter that part and wheel keep when the lengths ask for a smaller scale. Judgement. */
const LEAST_DRAWN = 28;

type Drawn = { readonly size: number; readonly isTrue: boolean };
const atLeast = (size: number, least: number): Drawn =>
  size >= least ? { size, isTrue: true } : { size: least, isTrue: false };
/** What is drawn larger than it is has a dashed outline. */
const enlarged = (isTrue: boolean): Readonly<Record<string, string>> =>
  isTrue ? {} : { 'stroke-dasharray': '4 3' };
const atMost = (size: number, most: number): Drawn =>
  size <= most ? { size, isTrue: true } : { size: most, isTrue: false };

/** Part and wheel from the end, to one scale unless one of them would vanish. */
const endSizes = (n: SetupSketchNumbers) => {
  const wheels = n.opposed ? 2 : 1;
  const larger = Math.max(n.blankDiameter, n.wheelDiameter);
  const part = Math.max(n.blankDiameter, larger * LEAST_SHARE);
  const wheel = Math.max(n.wheelDiameter, larger * LEAST_SHARE);
  const room = 2 * MIDDLE - 24;
  const width = END.right - END.left - 20;
  const fitting = Math.min(room / (part + wheels * wheel), width / Math.max(part, wheel));
  // Rather smaller than broken, as long as the smaller of the two is still seen.
  const along = n.stickout ?? n.length * 1.5;
  const unbroken = (SIDE.right - SIDE.left - CHUCK - 28) / along;
  const smallest = LEAST_DRAWN / Math.min(part, wheel);
  const scale = Math.min(fitting, Math.max(unbroken, smallest));
  const wall =
    n.bore === null ? null : atLeast(((n.blankDiameter - n.bore) / 2) * scale, LEAST_WALL);
  const isPartTrue = part === n.blankDiameter;
  const isWheelTrue = wheel === n.wheelDiameter;
  const isTrue = isPartTrue && isWheelTrue && (wall?.isTrue ?? true);
  const sizes = { part: part * scale, wheel: wheel * scale, wall };
  return { ...sizes, scale, isPartTrue, isWheelTrue, isTrue, wheels };
};

/** Lengths along the part, broken where they would leave the view or be lost in it. */
const sideSizes = (n: SetupSketchNumbers, scale: number) => {
  const isBetweenCentres = n.support === 'centres';
  const start = SIDE.left + (isBetweenCentres ? 16 : CHUCK);
  const room = SIDE.right - start - 28;
  const shoulder = n.stickout === null ? null : Math.max(0, n.stickout - n.length);
  const free = shoulder === null ? 24 : shoulder * scale;
  const wanted = atLeast(n.length * scale, LEAST_LENGTH);
  // What fits as a whole is not broken; otherwise the knurl keeps the larger share.
  const fits = wanted.size + free <= room + 1e-6;
  const zone = atMost(wanted.size, fits ? room : room * 0.6);
  const gap = atMost(free, Math.max(0, room - zone.size) + 1e-6);
  return {
    start,
    zone: { size: zone.size, isTrue: zone.isTrue && wanted.isTrue },
    gap: { size: gap.size, isTrue: gap.isTrue || shoulder === null },
  };
};

/** Which way it goes: shown bent over a circle. */
const turning = (center: Point, r: number, from: number, to: number, id: string): string => {
  const at = (angle: number): Point => [
    center[0] + r * Math.cos(angle),
    center[1] + r * Math.sin(angle),
  ];
  const [a, b] = [at(from), at(to)];
  const way = to > from ? 1 : 0;
  const along = to + (way === 1 ? Math.PI / 2 : -Math.PI / 2);
  const tip: Point = [b[0] + 7 * Math.cos(along), b[1] + 7 * Math.sin(along)];
  const side = (turn: number): Point => [
    b[0] + 4.5 * Math.cos(along + turn),
    b[1] + 4.5 * Math.sin(along + turn),
  ];
  return (
    element('path', {
      d: `M${a.map((v) => v.toFixed(3)).join(' ')}A${r.toFixed(3)} ${r.toFixed(3)} 0 0 ${String(way)} ${b.map((v) => v.toFixed(3)).join(' ')}`,
      fill: 'none',
      stroke: INK.mark,
      'stroke-width': 2,
      'data-figure': id,
    }) + polygon([tip, side(Math.PI / 2), side(-Math.PI / 2)], { fill: INK.mark })
  );
};

/** Where work and wheel run towards each other and draw in what comes near. */
const nipMark = (x: number, y: number): string =>
  polygon(
    [
      [x, y - 9],
      [x + 9, y + 7],
      [x - 9, y + 7],
    ],
    { fill: INK.panel, stroke: INK.warn, 'stroke-width': 2.5, 'stroke-linejoin': 'round' },
  ) +
  line([x, y - 3], [x, y + 2], { stroke: INK.warn, 'stroke-width': 2 }) +
  circle([x, y + 4.6], 1.1, { fill: INK.warn });

const endView = (n: SetupSketchNumbers, top: number): string => {
  const e = endSizes(n);
  const x = (END.left + END.right) / 2;
  const y = top + MIDDLE + (e.wheels === 2 ? 0 : (e.part + e.wheel) / 2 - e.part / 2);
  const r = e.part / 2;
  const wheelAt = (way: 1 | -1): string =>
    circle([x, y + way * (r + e.wheel / 2)], e.wheel / 2, {
      fill: INK.wheel,
      stroke: INK.ink,
      'stroke-width': 1.5,
      'data-figure': 'wheelDiameter',
      'data-scale': e.scale.toFixed(6),
      'data-true': String(e.isWheelTrue),
      ...enlarged(e.isWheelTrue),
    }) + circle([x, y + way * (r + e.wheel / 2)], 2, { fill: INK.ink });
  const nip = Math.max(8, Math.min(r, e.wheel / 2) * 0.55);
  return (
    circle([x, y], r, {
      fill: INK.work,
      stroke: INK.ink,
      'stroke-width': 2,
      'data-figure': 'blankDiameter',
      'data-scale': e.scale.toFixed(6),
      'data-true': String(e.isPartTrue),
      ...enlarged(e.isPartTrue),
    }) +
    (e.wall === null
      ? ''
      : circle([x, y], Math.max(1, r - e.wall.size), {
          fill: INK.panel,
          stroke: INK.ink,
          'stroke-width': 1.2,
          ...enlarged(e.wall.isTrue),
        })) +
    wheelAt(-1) +
    (n.opposed ? wheelAt(1) : '') +
    turning([x, y], Math.max(6, r * 0.62), Math.PI * 0.25, Math.PI * 1.1, 'rotation') +
    nipMark(x - nip - 8, y - r - 1) +
    (n.opposed ? nipMark(x + nip + 8, y + r + 1) : '')
  );
};

const hatch = (left: number, right: number, top: number, bottom: number): string => {
  const step = 7;
  const lines = Math.max(1, Math.floor((right - left) / step));
  return Array.from({ length: lines }, (_, i) =>
    line(
      [left + (i + 0.5) * ((right - left) / lines), top],
      [left + (i + 0.5) * ((right - left) / lines), bottom],
      {
        stroke: INK.ink,
        'stroke-width': 1.2,
      },
    ),
  ).join('');
};

/** A length under the view, in a row of its own, so that no two texts meet. */
const lengthRow = (
  from: number,
  to: number,
  y: number,
  said: string,
  id: string,
  isTrue: boolean,
  scale: number,
): string => {
  const tick = (x: number): string =>
    line([x, y - 5], [x, y + 5], { stroke: INK.mark, 'stroke-width': 1.5 });
  const style = { size: SMALL, anchor: 'middle' } as const;
  return (
    line([from, y], [to, y], {
      stroke: INK.mark,
      'stroke-width': 1.5,
      'data-figure': id,
      'data-scale': scale.toFixed(6),
      'data-true': String(isTrue),
      ...enlarged(isTrue),
    }) +
    tick(from) +
    tick(to) +
    text(
      [heldBetween((from + to) / 2, said, style, [SIDE.left, SIDE.right + 10]), y + 17],
      said,
      style,
      {
        fill: INK.ink,
      },
    )
  );
};

const holding = (
  n: SetupSketchNumbers,
  start: number,
  end: number,
  y: number,
  r: number,
): string => {
  const centre = (x: number, way: 1 | -1): string =>
    polygon(
      [
        [x, y],
        [x - way * 14, y - 7],
        [x - way * 14, y + 7],
      ],
      { fill: INK.ink },
    );
  if (n.support === 'centres') return centre(start, 1) + centre(end, -1);
  const jaw = Math.min(MIDDLE - 6, r + 12);
  const chuck = rect(SIDE.left, y - jaw, CHUCK, 2 * jaw, {
    fill: INK.edge,
    stroke: INK.ink,
    'stroke-width': 1.5,
  });
  return chuck + (n.support === 'tailstock' ? centre(end, -1) : '');
};

/** How the part is held, where the knurl goes, from which side the wheels come, where it nips. */
export const setupSketch = (n: SetupSketchNumbers, words: WordsOf['setupSketch']): string => {
  const e = endSizes(n);
  const side = sideSizes(n, e.scale);
  const isBroken = !(e.isTrue && side.zone.isTrue && side.gap.isTrue);
  // A knurl too short to be seen is drawn longer; only one too long is cut.
  const isZoneCut = !side.zone.isTrue && side.zone.size !== LEAST_LENGTH;
  const isCutOut = isZoneCut || !side.gap.isTrue;
  const drawing = (top: number) => {
    const r = e.part / 2;
    const y = top + MIDDLE + (e.wheels === 2 ? 0 : e.wheel / 2);
    const from = side.start + side.gap.size;
    const to = from + side.zone.size;
    const slant = Math.max(2, Math.min(8, n.chamfer * e.scale, r * 0.5));
    const bar = polygon(
      [
        [side.start, y - r],
        [to - slant, y - r],
        [to, y - r + slant],
        [to, y + r - slant],
        [to - slant, y + r],
        [side.start, y + r],
      ],
      { fill: INK.work, stroke: INK.ink, 'stroke-width': 2, 'stroke-linejoin': 'round' },
    );
    const zone = hatch(from, to - slant, y - r, y + r);
    const face = Math.max(6, Math.min(n.wheelFace * e.scale, side.zone.size));
    // A wheel that travels starts half on the end; one that plunges stands over the knurl.
    const wheelAt = n.travel === 'traverse' ? to : (from + to) / 2;
    const wheels = (way: 1 | -1): string =>
      rect(wheelAt - face / 2, way === -1 ? y - r - e.wheel : y + r, face, e.wheel, {
        fill: INK.wheel,
        stroke: INK.ink,
        'stroke-width': 1.5,
        rx: 2,
      });
    const [cut, cutKnurl] = [
      side.gap.isTrue ? '' : breakMark(side.start + side.gap.size / 2, y - r - 5, y + r + 5),
      isZoneCut ? breakMark((from + to) / 2, y - r - 5, y + r + 5) : '',
    ];
    const arrowY = y - r - e.wheel / 2;
    const way =
      n.travel === 'traverse'
        ? line([wheelAt - face / 2 - 2, arrowY], [wheelAt - face / 2 - 20, arrowY], {
            stroke: INK.mark,
            'stroke-width': 2.5,
          }) +
          polygon(
            [
              [wheelAt - face / 2 - 28, arrowY],
              [wheelAt - face / 2 - 19, arrowY - 5],
              [wheelAt - face / 2 - 19, arrowY + 5],
            ],
            { fill: INK.mark, 'data-figure': 'travel' },
          )
        : polygon(
            [
              [wheelAt + face / 2 + 10, arrowY + 9],
              [wheelAt + face / 2 + 5, arrowY],
              [wheelAt + face / 2 + 15, arrowY],
            ],
            { fill: INK.mark, 'data-figure': 'travel' },
          ) +
          line([wheelAt + face / 2 + 10, arrowY - 10], [wheelAt + face / 2 + 10, arrowY], {
            stroke: INK.mark,
            'stroke-width': 2.5,
          });
    const rows = top + 2 * MIDDLE + 4;
    return {
      svg:
        holding(n, side.start, to, y, r) +
        bar +
        zone +
        cut +
        cutKnurl +
        wheels(-1) +
        (n.opposed ? wheels(1) : '') +
        way +
        lengthRow(from, to, rows, words.length, 'length', side.zone.isTrue, e.scale) +
        (words.stickout === null
          ? ''
          : lengthRow(
              side.start,
              to,
              rows + 26,
              words.stickout,
              'stickout',
              side.zone.isTrue && side.gap.isTrue,
              e.scale,
            )) +
        endView(n, top),
      height: HEIGHT - (words.stickout === null ? 26 : 0),
    };
  };
  const none: Key['symbol'] = () => '';
  const keys: readonly Key[] = [
    { symbol: nipMark, said: words.nip },
    {
      symbol: (x, y) =>
        rect(x - 8, y - 6, 16, 12, { fill: INK.wheel, stroke: INK.ink, 'stroke-width': 1.2 }),
      said: words.wheel,
    },
    { symbol: none, said: words.travel },
    { symbol: none, said: words.chamfer },
    ...(isCutOut
      ? [{ symbol: (x: number, y: number) => breakMark(x, y - 7, y + 7), said: words.cutOut }]
      : []),
    ...(isBroken
      ? [
          {
            symbol: (x: number, y: number) =>
              line([x - 9, y], [x + 9, y], {
                stroke: INK.ink,
                'stroke-width': 2,
                ...enlarged(false),
              }),
            said: words.notToScale,
          },
        ]
      : []),
  ];
  return framed('setupSketch', words.title, drawing, (top) => keyBlock(keys, top));
};
