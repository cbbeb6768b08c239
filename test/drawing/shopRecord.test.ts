import { expect, test } from 'vitest';
import { recordPictures } from '../../commands/knurl/recordPictures.ts';
import { growthBeforeResults, growthBelief, growthInterval } from '../../src/calc/index.ts';
import { elementsOf, figure, figures, num, pointsOf, type Read } from './read.ts';
import { measured, RECORD_PARTS } from './recordParts.ts';
import { spokenIn, svgOf } from './setups.ts';

const drawn = (parts: Parameters<typeof recordPictures>[0]) => {
  const [spoken] = spokenIn('mm', recordPictures(parts));
  if (spoken?.kind !== 'shopRecord') throw new Error('no record is drawn');
  return { ...spoken, svg: svgOf(spoken) };
};

/** The share that stands at a place of the picture, by the marks of its scale. */
const shareAt = (svg: string): ((x: number) => number) => {
  const marks = figures(svg, 'mark');
  const [first, last] = [marks[0], marks.at(-1)];
  const [a, b] = [num(first, 'data-share'), num(last, 'data-share')];
  const [from, to] = [num(first, 'x1'), num(last, 'x1')];
  return (x) => a + ((x - from) / (to - from)) * (b - a);
};
const middleOf = (diamond: Read): number => {
  const xs = pointsOf(diamond).map(([x]) => x);
  return (Math.min(...xs) + Math.max(...xs)) / 2;
};
/** A tenth of a per cent. */
const same = (drawnShare: number, share: number): void =>
  expect(Math.abs(drawnShare - share)).toBeLessThan(0.001);

test('every part stands at its share, a doubted one by a shape of its own', () => {
  const { svg } = drawn(RECORD_PARTS);
  const share = shareAt(svg);
  const dots = figures(svg, 'measured').map((dot) => share(num(dot, 'cx')));
  const learned = RECORD_PARTS.map((part) => part.share).filter((each) => each > 0.6 && each < 1.2);
  // The key shows one dot more.
  expect(dots).toHaveLength(learned.length + 1);
  for (const each of learned)
    expect(Math.min(...dots.map((d) => Math.abs(d - each)))).toBeLessThan(0.001);
  const doubted = figures(svg, 'doubted');
  expect(doubted).toHaveLength(1 + 1);
  same(share(middleOf(doubted[0] as Read)), 1.25);
  expect(doubted.every(({ name }) => name === 'polygon')).toBe(true);
  expect(svg).toContain('Doubted');
});

test('what is expected of the next part stands where the growth model has it, and so does the prior', () => {
  const { svg, numbers } = drawn(RECORD_PARTS);
  const share = shareAt(svg);
  const intervals = figures(svg, 'interval');
  const means = figures(svg, 'mean');
  expect(numbers.families.map(({ parts }) => parts)).toEqual([9, 3, 1]);
  numbers.families.forEach((_, i) => {
    const family = ['straight × steel', 'diamond raised × brass', 'diagonal × stainless'][i] ?? '';
    const belief = growthBelief(RECORD_PARTS, family);
    const { low, high } = growthInterval(belief);
    same(share(num(intervals[i], 'x1')), low);
    same(share(num(intervals[i], 'x2')), high);
    same(share(num(means[i], 'x1')), belief.mean);
  });
  const { low, high } = growthInterval(growthBeforeResults());
  const prior = figure(svg, 'prior');
  same(share(num(prior, 'x')), low);
  same(share(num(prior, 'x') + num(prior, 'width')), high);
});

test('a share far out stands at the edge as an arrow, and the words say so', () => {
  const { svg } = drawn(RECORD_PARTS);
  const [arrow] = figures(svg, 'beyond');
  if (arrow === undefined) throw new Error('no arrow');
  const [tip = [0, 0], base = [0, 0]] = pointsOf(arrow);
  expect(tip[0]).toBeLessThan(base[0]);
  expect(svg).toContain('further out than drawn');
});

test('hundreds of parts of one share are all drawn, each in its field', () => {
  const { svg } = drawn(measured({ kind: 'straight' }, 'steel', ...Array<number>(300).fill(0.9)));
  const prior = figure(svg, 'prior');
  const dots = figures(svg, 'measured').slice(0, -1);
  expect(dots).toHaveLength(300);
  for (const dot of dots) {
    expect(num(dot, 'cy') - num(dot, 'r')).toBeGreaterThanOrEqual(num(prior, 'y'));
    expect(num(dot, 'cy') + num(dot, 'r')).toBeLessThan(num(figure(svg, 'interval'), 'y1'));
  }
});

test('what is not drawn is counted in words, and the alt text says what the picture shows', () => {
  const groups = [
    'steel',
    'stainless',
    'brass',
    'bronze',
    'copper',
    'zinc',
    'iron',
    'plastic',
  ] as const;
  const { svg, alt } = drawn(groups.flatMap((group) => measured({ kind: 'straight' }, group, 0.9)));
  expect(figures(svg, 'interval')).toHaveLength(6 + 1);
  expect(svg).toContain('2 more kinds are not drawn');
  expect(alt).toContain('Straight knurl, steel: 1 part; next');
  expect(alt).toContain('And 2 more');
  expect(elementsOf(svg)[0]?.at['data-picture']).toBe('shopRecord');
});

test('a shop without results has no picture of them', () => {
  expect(recordPictures([])).toEqual([]);
});
