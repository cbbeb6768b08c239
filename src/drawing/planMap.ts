import { formedRound, mm } from '../calc/index.ts';
import { framed, INK, type Key, keyBlock, MARGIN, SMALL, WIDTH } from './frame.ts';
import type { MapCandidate, PlanMapNumbers } from './numbers.ts';
import { circle, line, type Point, polygon, rect, text } from './svg.ts';
import type { WordsOf } from './words.ts';

const PLOT = { left: MARGIN + 50, right: WIDTH - MARGIN - 16, height: 200, head: 26 };
const FILLS = { low: 0.65, high: 1.02 };
/** Candidates that get a number and a line in words. Judgement. */
const NUMBERED = 5;
const STEPS = 24;

/** Blank whose crest comes out at a diameter when the tooth is filled this far. */
const blankFor = (crest: number, fill: number, { tooth }: PlanMapNumbers): number => {
  if (tooth.process === 'cut') return crest;
  const height = mm(Math.min(1, fill) * tooth.sharpHeight);
  let blank = crest;
  for (let i = 0; i < 6; i += 1) {
    const { growth } = formedRound({
      form: tooth.form,
      blankDiameter: mm(blank),
      height,
      sharpHeight: tooth.sharpHeight,
    });
    blank = crest - tooth.growthMean * growth;
  }
  return blank;
};

const SHAPES: { readonly [S in MapCandidate['state']]: (x: number, y: number) => string } = {
  fine: (x, y) => circle([x, y], 5, { fill: INK.ink }),
  watch: (x, y) => circle([x, y], 5, { fill: INK.panel, stroke: INK.ink, 'stroke-width': 2 }),
  stop: (x, y) =>
    line([x - 5, y - 5], [x + 5, y + 5], { stroke: INK.warn, 'stroke-width': 2.5 }) +
    line([x - 5, y + 5], [x + 5, y - 5], { stroke: INK.warn, 'stroke-width': 2.5 }),
};

/** Numbers in a row over the plot, spread so that none hides another, each tied to its mark. */
const numbersOver = (points: readonly Point[], y: number): string => {
  const order = points
    .map((point, i) => ({ point, number: i + 1 }))
    .sort((a, b) => a.point[0] - b.point[0]);
  let least = PLOT.left + 8;
  const placed = order.map(({ point, number }) => {
    const x = Math.max(least, point[0]);
    least = x + 22;
    return { x, point, number };
  });
  const over = Math.max(0, (placed.at(-1)?.x ?? 0) - (PLOT.right + 2));
  return placed
    .map(({ x, point, number }, i) => {
      const at = Math.max(PLOT.left + 8 + i * 22, x - over);
      return (
        line([at, y + 4], point, { stroke: INK.faint, 'stroke-width': 0.9 }) +
        text(
          [at, y],
          String(number),
          { size: SMALL, weight: 'bold', anchor: 'middle' },
          { fill: INK.ink },
        )
      );
    })
    .join('');
};

/** Every candidate over its blank and its fill, and where the print's limits run between them. */
export const planMap = (n: PlanMapNumbers, words: WordsOf['planMap']): string => {
  const fills = Array.from(
    { length: STEPS + 1 },
    (_, i) => FILLS.low + ((1 - FILLS.low) * i) / STEPS,
  );
  const edge = (crest: number) => fills.map((fill) => [blankFor(crest, fill, n), fill] as const);
  const [low, high] = [edge(n.limits.low), edge(n.limits.high)];
  const all = [...low, ...high]
    .map(([blank]) => blank)
    .concat(n.candidates.map((c) => c.blankDiameter));
  const spare = Math.max(1e-3, (Math.max(...all) - Math.min(...all)) * 0.05);
  const [least, most] = [Math.min(...all) - spare, Math.max(...all) + spare];
  const drawing = (top: number) => {
    const [roof, floor] = [top + PLOT.head, top + PLOT.head + PLOT.height];
    const x = (blank: number): number =>
      PLOT.left + ((blank - least) / (most - least)) * (PLOT.right - PLOT.left);
    const y = (fill: number): number =>
      floor -
      ((Math.min(FILLS.high, Math.max(FILLS.low, fill)) - FILLS.low) / (FILLS.high - FILLS.low)) *
        PLOT.height;
    const at = ([blank, fill]: readonly [number, number]): Point => [x(blank), y(fill)];
    const band = polygon([...low.map(at), ...[...high].reverse().map(at)], {
      fill: INK.good,
      stroke: INK.ink,
      'stroke-width': 1.2,
      'stroke-dasharray': '5 3',
      'data-figure': 'limits',
    });
    const rules = [0.7, 0.8, 0.9, 1].map(
      (fill) =>
        line([PLOT.left, y(fill)], [PLOT.right, y(fill)], {
          stroke: INK.faint,
          'stroke-width': 0.6,
        }) +
        text(
          [PLOT.left - 5, y(fill) + 4],
          words.fill(fill),
          { size: SMALL, anchor: 'end' },
          { fill: INK.ink },
        ),
    );
    const ends = [least + spare, most - spare].map((blank, i) =>
      text(
        [i === 0 ? PLOT.left : PLOT.right, floor + 16],
        words.diameter(blank),
        { size: SMALL, anchor: i === 0 ? 'start' : 'end' },
        { fill: INK.ink },
      ),
    );
    const points = n.candidates.map((c) => at([c.blankDiameter, c.fill]));
    const marks = n.candidates.map((c, i) => {
      const point = points[i] ?? [0, 0];
      return SHAPES[c.state](point[0], point[1]);
    });
    return {
      svg:
        rect(PLOT.left, roof, PLOT.right - PLOT.left, PLOT.height, {
          fill: 'none',
          stroke: INK.ink,
          'stroke-width': 1.2,
        }) +
        band +
        rules.join('') +
        numbersOver(points.slice(0, NUMBERED), top + 12) +
        marks.join('') +
        ends.join(''),
      height: PLOT.head + PLOT.height + 20,
    };
  };
  const none: Key['symbol'] = () => '';
  const keys: readonly Key[] = [
    ...words.candidates.slice(0, NUMBERED).map((said, i) => ({
      symbol: (x: number, y: number) =>
        text(
          [x, y + 4],
          String(i + 1),
          { size: SMALL, weight: 'bold', anchor: 'middle' },
          { fill: INK.ink },
        ),
      said,
    })),
    {
      symbol: (x, y) =>
        rect(x - 8, y - 6, 16, 12, {
          fill: INK.good,
          stroke: INK.ink,
          'stroke-width': 1.2,
          'stroke-dasharray': '5 3',
        }),
      said: words.band,
    },
    { symbol: none, said: words.states },
    { symbol: none, said: words.diameterAxis },
    { symbol: none, said: words.fillAxis },
  ];
  return framed('planMap', words.title, drawing, (top) => keyBlock(keys, top));
};
