import { expect, test } from 'vitest';
import { formedRound, mm } from '../../src/calc/index.ts';
import { drawPicture, type PictureNumbers } from '../../src/drawing/index.ts';
import { en, showIn } from '../../src/phrases/index.ts';
import { elementsOf, figure, num, pointsOf } from './read.ts';

const candidate = (blank: number, fill: number, state: 'fine' | 'watch' | 'stop') =>
  ({ blankDiameter: mm(blank), fill, toothCount: 77, state, wheel: 'A' }) as const;

const numbers: PictureNumbers['planMap'] = {
  limits: { low: mm(19.9), high: mm(20.1) },
  candidates: [candidate(19.6, 0.9, 'fine'), candidate(19.8, 0.7, 'watch')],
  tooth: { form: 'grooves', sharpHeight: mm(0.4), growthMean: 0.8, process: 'form' },
};
const svg = drawPicture('planMap', numbers, en.pictures.planMap.words(numbers, showIn('mm')));

test('every corner of the band is a blank and a fill whose crest lies on a limit of the print', () => {
  const [a, b] = elementsOf(svg).filter((each) => each.name === 'circle');
  const across = (x: number): number =>
    19.6 + ((x - num(a, 'cx')) / (num(b, 'cx') - num(a, 'cx'))) * 0.2;
  const up = (y: number): number =>
    0.9 + ((y - num(a, 'cy')) / (num(b, 'cy') - num(a, 'cy'))) * -0.2;
  const corners = pointsOf(figure(svg, 'limits'));
  expect(corners.length).toBeGreaterThan(20);
  corners.forEach(([x, y], i) => {
    const [blank, fill] = [across(x), Math.min(1, up(y))];
    const { growth } = formedRound({
      form: 'grooves',
      blankDiameter: mm(blank),
      height: mm(fill * 0.4),
      sharpHeight: mm(0.4),
    });
    const limit = i < corners.length / 2 ? 19.9 : 20.1;
    expect(Math.abs(blank + 0.8 * growth - limit)).toBeLessThan(0.001 * 0.4);
  });
});

test('a candidate is told by its shape, and each state has its own', () => {
  const three = { ...numbers, candidates: [...numbers.candidates, candidate(19.7, 0.8, 'stop')] };
  const drawn = drawPicture('planMap', three, en.pictures.planMap.words(three, showIn('mm')));
  const circles = elementsOf(drawn).filter((each) => each.name === 'circle');
  expect(circles.filter((each) => each.at['stroke'] === undefined)).toHaveLength(1);
  expect(circles.filter((each) => each.at['stroke'] !== undefined)).toHaveLength(1);
  expect(drawn).toContain('Cross: stop.');
});
