import { framed, INK, type Key, keyBlock, MARGIN, SMALL, textBlock, WIDTH } from './frame.ts';
import type { FamilyRecord, Share, ShopRecordNumbers } from './numbers.ts';
import { circle, element, line, type Point, polygon, rect, text } from './svg.ts';
import type { WordsOf } from './words.ts';

const PLOT = { left: MARGIN + 12, right: WIDTH - MARGIN - 12 };
/** Height of a family's field: dots above, what is expected of the next part below. */
const FIELD = 52;
const DOTS = 32;
const EXPECTED = 42;
const DOT = 4;
/** Families that get a field of their own; the others are counted in words. Judgement. */
const MOST_FAMILIES = 6;
/** Shares beyond these are drawn at the edge, as an arrow: they would press the others together. Judgement. */
const SHOWN = { low: 0.6, high: 1.4 };
/** Distances between the marks of the scale, and how many there is room for. */
const STEPS = [0.05, 0.1, 0.2, 0.5];
const MOST_MARKS = 7;

type Scale = {
  readonly low: number;
  readonly high: number;
  readonly step: number;
  readonly x: (share: number) => number;
};

const within = (share: number): boolean => share >= SHOWN.low && share <= SHOWN.high;

/** Everything that is shown, with a little room on either side, between two marks of the scale. */
const scaleOf = ({ families, prior }: ShopRecordNumbers): Scale => {
  const all = families.flatMap(({ low, high, shares }) => [
    low,
    high,
    ...shares.map(({ share }) => share).filter(within),
  ]);
  const [least, most] = [Math.min(prior.low, ...all), Math.max(prior.high, ...all)];
  const step = STEPS.find((each) => (most - least) / each + 2 <= MOST_MARKS) ?? 1;
  const low = Math.floor((least - 0.01) / step) * step;
  const high = Math.ceil((most + 0.01) / step) * step;
  const x = (share: number): number =>
    PLOT.left + ((share - low) / (high - low)) * (PLOT.right - PLOT.left);
  return { low, high, step, x };
};

const marksOf = ({ low, high, step }: Scale): readonly number[] =>
  Array.from({ length: Math.round((high - low) / step) + 1 }, (_, i) => low + i * step);

const diamond = ([x, y]: Point): string =>
  polygon(
    [
      [x, y - 5],
      [x + 5, y],
      [x, y + 5],
      [x - 5, y],
    ],
    { fill: INK.panel, stroke: INK.warn, 'stroke-width': 2, 'data-figure': 'doubted' },
  );
const dot = (at: Point): string => circle(at, DOT, { fill: INK.ink, 'data-figure': 'measured' });

/** At the edge, pointing on: what it stands for lies further out than the scale goes. */
const beyond = ([x, y]: Point, way: 1 | -1, isDoubted: boolean): string =>
  polygon(
    [
      [x + way * 6, y],
      [x - way * 4, y - 5],
      [x - way * 4, y + 5],
    ],
    {
      fill: isDoubted ? INK.panel : INK.ink,
      stroke: isDoubted ? INK.warn : INK.ink,
      'stroke-width': 1.5,
      'data-figure': 'beyond',
    },
  );

const shareMark = ({ share, isDoubted }: Share, at: Point): string => {
  if (!within(share)) return beyond(at, share < SHOWN.low ? -1 : 1, isDoubted);
  return isDoubted ? diamond(at) : dot(at);
};

/** Parts of nearly one share stand on each other, closer together where there are many. */
const dotsOf = ({ shares }: FamilyRecord, { x, low, high }: Scale, top: number): string => {
  const columns = new Map<number, { readonly share: Share; readonly at: number }[]>();
  for (const share of shares) {
    const at = x(within(share.share) ? share.share : share.share < SHOWN.low ? low : high);
    const column = Math.round(at / (2 * DOT));
    columns.set(column, [...(columns.get(column) ?? []), { share, at }]);
  }
  return [...columns.values()]
    .map((column) => {
      const apart = Math.min(2 * DOT + 1, (DOTS - 2 * DOT - 4) / Math.max(1, column.length - 1));
      return column
        .map(({ share, at }, i) => shareMark(share, [at, top + DOTS - DOT - 1 - i * apart]))
        .join('');
    })
    .join('');
};

/** The next part of a family: a line with its ends, and a stroke where the middle is. */
const expectedMark = (left: number, middle: number, right: number, y: number): string => {
  const stroke = { stroke: INK.mark, 'stroke-width': 2 };
  return (
    line([left, y], [right, y], { ...stroke, 'data-figure': 'interval' }) +
    line([left, y - 4], [left, y + 4], stroke) +
    line([right, y - 4], [right, y + 4], stroke) +
    line([middle, y - 6], [middle, y + 6], {
      stroke: INK.mark,
      'stroke-width': 3.5,
      'data-figure': 'mean',
    })
  );
};

const BAND = { fill: INK.wheel, stroke: INK.edge, 'stroke-width': 1, 'stroke-dasharray': '4 3' };

const fieldOf = (
  family: FamilyRecord,
  { prior }: ShopRecordNumbers,
  scale: Scale,
  top: number,
): string => {
  const { x } = scale;
  const band = rect(x(prior.low), top, x(prior.high) - x(prior.low), FIELD, {
    ...BAND,
    'data-figure': 'prior',
  });
  const marks = marksOf(scale).map((share) =>
    line([x(share), top], [x(share), top + FIELD], { stroke: INK.faint, 'stroke-width': 0.6 }),
  );
  return element(
    'g',
    { 'data-family': family.parts },
    band +
      marks.join('') +
      line([PLOT.left, top + FIELD], [PLOT.right, top + FIELD], {
        stroke: INK.ink,
        'stroke-width': 1.2,
      }) +
      dotsOf(family, scale, top) +
      expectedMark(x(family.low), x(family.mean), x(family.high), top + EXPECTED),
  );
};

const scaleMarks = (scale: Scale, words: WordsOf['shopRecord'], top: number): string =>
  marksOf(scale)
    .map((share) => {
      const x = scale.x(share);
      return (
        line([x, top], [x, top + 4], {
          stroke: INK.ink,
          'stroke-width': 1.2,
          'data-figure': 'mark',
          'data-share': share.toFixed(6),
        }) +
        text(
          [x, top + 17],
          words.share(share),
          { size: SMALL, anchor: 'middle' },
          { fill: INK.ink },
        )
      );
    })
    .join('');

const keysOf = (n: ShopRecordNumbers, words: WordsOf['shopRecord']): readonly Key[] => {
  const shares = n.families.flatMap((family) => family.shares);
  const hidden = n.families.length - MOST_FAMILIES;
  const none: Key['symbol'] = () => '';
  return [
    { symbol: (x, y) => dot([x, y]), said: words.measured },
    ...(shares.some(({ isDoubted }) => isDoubted)
      ? [{ symbol: (x: number, y: number) => diamond([x, y]), said: words.doubted }]
      : []),
    ...(shares.every(({ share }) => within(share))
      ? []
      : [{ symbol: (x: number, y: number) => beyond([x, y], 1, true), said: words.beyond }]),
    { symbol: (x, y) => expectedMark(x - 9, x, x + 9, y), said: words.expected },
    { symbol: (x, y) => rect(x - 8, y - 6, 16, 12, BAND), said: words.prior },
    { symbol: none, said: words.axis },
    ...(hidden > 0 ? [{ symbol: none, said: words.more(hidden) }] : []),
  ];
};

/** What parts have measured against what was expected of them, a field for each family. */
export const shopRecord = (n: ShopRecordNumbers, words: WordsOf['shopRecord']): string => {
  const scale = scaleOf(n);
  const drawing = (top: number) => {
    let y = top;
    const fields = n.families.slice(0, MOST_FAMILIES).map((family, i) => {
      const { name = '', value = '' } = words.families[i] ?? {};
      const head = textBlock([name], y, { bold: true });
      const said = textBlock([value], y + head.height);
      y += head.height + said.height + 3;
      const field = fieldOf(family, n, scale, y);
      y += FIELD + 8;
      return head.svg + said.svg + field;
    });
    return { svg: fields.join('') + scaleMarks(scale, words, y - 6), height: y + 16 - top };
  };
  return framed('shopRecord', words.title, drawing, (top) => keyBlock(keysOf(n, words), top));
};
