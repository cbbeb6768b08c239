import { framed, INK, MARGIN, SMALL, textBlock } from './frame.ts';
import type { ToothFormNumbers } from './numbers.ts';
import { element, line, type Point, polygon, text } from './svg.ts';
import type { Named, WordsOf } from './words.ts';

/** The close-up stands in this box; names and numbers beside it. */
const BOX = { left: MARGIN + 2, width: 180, height: 226 };
const LABELS = 262;
const LABEL_STEP = 34;
/** Full teeth in the close-up: fewer are drawn larger. Judgement. */
const TEETH = 2;

/** A point by its radius and its angle from the top, the centre of the work being the origin. */
const polar = (radius: number, angle: number): Point => [
  radius * Math.sin(angle),
  -radius * Math.cos(angle),
];

/** How the section lies in millimetres, the middle groove at the top. */
const sectionOf = (n: ToothFormNumbers) => {
  const blank = n.blankDiameter / 2;
  const crest = n.crestDiameter / 2;
  const root = crest - n.toothHeight;
  const step = n.transversePitch / blank;
  const flat = (n.crestFlat * n.transversePitch) / n.pitch / crest;
  const teeth = TEETH;
  const grooves = Array.from({ length: teeth + 1 }, (_, i) => (i - teeth / 2) * step);
  const surface = grooves.flatMap((at, i): readonly Point[] => {
    const valley = polar(root, at);
    if (i === teeth) return [valley];
    const top = at + step / 2;
    return [valley, polar(crest, top - flat / 2), polar(crest, top + flat / 2)];
  });
  return { blank, crest, root, step, teeth, surface, half: (teeth / 2) * step };
};

type Section = ReturnType<typeof sectionOf>;

/** The wheel's own tooth in the middle groove: along its flanks, and as deep as it is sharp. */
const wheelTooth = (n: ToothFormNumbers, s: Section): readonly Point[] => {
  const [x, y] = s.surface.find((_, i) => i === 4) ?? [0, 0];
  // On very round and shallow work the crest falls away beside the groove.
  const slope = x / Math.max(-y - s.root, n.toothHeight * 0.3);
  const deep = n.sharpHeight * 1.15;
  return [
    [-slope * deep, -s.root - deep],
    [slope * deep, -s.root - deep],
    [0, -s.root],
  ];
};

const placedIn = (s: Section, wheel: readonly Point[], top: number) => {
  // The dashed circles reach a little further out than the grooves do.
  const ends = [-1, 1].map((side) => polar(Math.max(s.crest, s.blank), side * s.half));
  const all = [...s.surface, ...wheel, ...ends];
  const xs = all.map(([x]) => x);
  const ys = all.map(([, y]) => y);
  const [left, high] = [Math.min(...xs), Math.min(...ys)];
  const wide = Math.max(...xs) - left;
  const tall = Math.max(...ys) - high;
  // Room under the grooves for the body of the work.
  const scale = Math.min(BOX.width / wide, (BOX.height * 0.8) / tall);
  const inset = (BOX.width - wide * scale) / 2;
  const drop = Math.max(0, (BOX.height * 0.8 - tall * scale) / 2.5);
  const at = ([x, y]: Point): Point => [
    BOX.left + inset + (x - left) * scale,
    top + drop + (y - high) * scale,
  ];
  return { at, scale };
};

type Dimension = {
  readonly id: string;
  readonly from: number;
  readonly to: number;
  readonly said: Named;
};

const dimensionLine = ({ id, from, to }: Dimension, x: number, scale: number): string => {
  const tick = (y: number): string =>
    line([x - 4, y], [x + 4, y], { stroke: INK.mark, 'stroke-width': 1.5 });
  return (
    line([x, from], [x, to], {
      stroke: INK.mark,
      'stroke-width': 2,
      'data-figure': id,
      'data-scale': scale.toFixed(6),
    }) +
    tick(from) +
    tick(to)
  );
};

const labelAt = (said: Named, y: number): string =>
  text([LABELS, y], said.name, { size: SMALL }, { fill: INK.ink }) +
  text([LABELS, y + 15], said.value, { size: SMALL, weight: 'bold' }, { fill: INK.ink });

/** Names in the order of what they belong to, each with a line to it. */
const labelled = (
  of: readonly { readonly anchor: Point; readonly said: Named }[],
  top: number,
): string =>
  [...of]
    .sort((a, b) => a.anchor[1] - b.anchor[1])
    .map(({ anchor, said }, i) => {
      const y = top + 14 + i * LABEL_STEP;
      return (
        line(anchor, [LABELS - 4, y + 3], {
          stroke: INK.faint,
          'stroke-width': 0.8,
          'stroke-dasharray': '2 2',
        }) + labelAt(said, y)
      );
    })
    .join('');

/** Section across the work to scale, the wheel's tooth in its groove, every height written. */
export const toothForm = (n: ToothFormNumbers, words: WordsOf['toothForm']): string => {
  const s = sectionOf(n);
  const wheel = wheelTooth(n, s);
  const drawing = (top: number) => {
    const placed = placedIn(s, wheel, top);
    const { at, scale } = placed;
    const floor = top + BOX.height;
    const outline = s.surface.map(at);
    const first = outline[0] ?? [0, 0];
    const last = outline.at(-1) ?? [0, 0];
    const body = polygon([...outline, [last[0], floor], [first[0], floor]], {
      fill: INK.work,
      stroke: 'none',
    });
    const edge = element('polyline', {
      points: outline.map(([x, y]) => `${x.toFixed(4)},${y.toFixed(4)}`).join(' '),
      fill: 'none',
      stroke: INK.ink,
      'stroke-width': 2,
      'data-teeth': s.teeth,
    });
    const arc = (
      radius: number,
      from: number,
      to: number,
      more: Record<string, string | number>,
    ) => {
      const [a, b] = [at(polar(radius, from)), at(polar(radius, to))];
      const r = radius * scale;
      const large = to - from > Math.PI ? 1 : 0;
      return element('path', {
        d: `M${a[0].toFixed(4)} ${a[1].toFixed(4)}A${r.toFixed(4)} ${r.toFixed(4)} 0 ${String(large)} 1 ${b[0].toFixed(4)} ${b[1].toFixed(4)}`,
        fill: 'none',
        ...more,
      });
    };
    const level = (radius: number): number => at([0, -radius])[1];
    const [crestY, blankY, rootY] = [level(s.crest), level(s.blank), level(s.root)];
    const infeedY = level(s.blank - n.infeed);
    const middle = at([0, 0])[0];
    const right = BOX.left + BOX.width;
    const dims: readonly (Dimension & { readonly x: number })[] = [
      ...(words.rise === null
        ? []
        : [{ id: 'rise', from: crestY, to: blankY, said: words.rise, x: right + 12 }]),
      { id: 'infeed', from: blankY, to: infeedY, said: words.infeed, x: right + 26 },
      { id: 'toothHeight', from: crestY, to: rootY, said: words.height, x: right + 40 },
    ];
    const extension = (y: number, to: number): string =>
      line([middle, y], [to, y], { stroke: INK.faint, 'stroke-width': 0.8 });
    const svg =
      body +
      edge +
      polygon(wheel.map(at), {
        fill: INK.wheel,
        'fill-opacity': 0.75,
        stroke: INK.ink,
        'stroke-width': 1.5,
        'stroke-linejoin': 'round',
      }) +
      arc(s.blank, -s.half, s.half, {
        stroke: INK.ink,
        'stroke-width': 1.2,
        'stroke-dasharray': '6 4',
        'data-figure': 'blankDiameter',
        'data-scale': scale.toFixed(6),
      }) +
      arc(s.crest, -s.half, s.half, {
        stroke: INK.faint,
        'stroke-width': 0.8,
        'stroke-dasharray': '1 3',
        'data-figure': 'crestDiameter',
        'data-scale': scale.toFixed(6),
      }) +
      arc(s.blank, 0, s.step, {
        stroke: INK.mark,
        'stroke-width': 3,
        'data-figure': 'transversePitch',
        'data-scale': scale.toFixed(6),
      }) +
      extension(crestY, right + 44) +
      extension(rootY, right + 44) +
      dims.map((d) => dimensionLine(d, d.x, scale)).join('') +
      labelled(
        [
          { anchor: at(polar(s.crest, s.step / 2)), said: words.crest },
          { anchor: at(polar(s.blank, s.half)), said: words.blank },
          { anchor: at(polar(s.blank, s.step * 0.75)), said: words.pitch },
          ...dims.map((d) => ({ anchor: [d.x, (d.from + d.to) / 2] as const, said: d.said })),
        ],
        top,
      );
    return { svg, height: BOX.height };
  };
  const under = (top: number) =>
    textBlock([`${words.flat.name} ${words.flat.value}`, words.wheel, words.shown(s.teeth)], top);
  return framed('toothForm', words.title, drawing, under);
};
