import { Resvg } from '@resvg/resvg-js';
import { expect, test } from 'vitest';
import type { Picture } from '../../src/card/index.ts';
import { renderOptions } from '../../src/drawing/png.ts';
import { textWidth } from '../../src/drawing/text.ts';
import { type Box, boxOf, elementsOf, num, type Read, realWidth, textBox } from './read.ts';
import { manyChecks, manyPlans, manyRecords, manySetups, spokenIn, svgOf } from './setups.ts';

const MANY = 500;
/** Half a unit: what two strokes of a letter may touch. */
const TOUCH = 0.5;
const meets = (a: Box, b: Box): boolean =>
  a.left < b.right - TOUCH &&
  b.left < a.right - TOUCH &&
  a.top < b.bottom - TOUCH &&
  b.top < a.bottom - TOUCH;

const isPanel = (element: Read): boolean => element.name === 'rect' && element.at['rx'] === '8';
const isFilled = (element: Read): boolean =>
  element.at['fill'] !== 'none' && ['rect', 'circle', 'polygon'].includes(element.name);

const faultsOf = (svg: string): readonly string[] => {
  const [root, ...elements] = elementsOf(svg);
  const [width, height] = [num(root, 'width'), num(root, 'height')];
  const texts = elements
    .filter((each) => each.name === 'text')
    .map((each) => ({ said: each.inner, box: textBox(each) }));
  const shapes = elements
    .filter((each) => !isPanel(each))
    .flatMap((each) => {
      const box = boxOf(each);
      return box === null ? [] : [{ said: `${each.name} ${JSON.stringify(each.at)}`, box, each }];
    });
  const outside = [...texts, ...shapes]
    .filter(
      ({ box }) =>
        !(box.left >= 2 && box.right <= width - 2 && box.top >= 2 && box.bottom <= height - 2),
    )
    .map(({ said }) => `outside: ${said}`);
  const together = texts.flatMap((a, i) =>
    texts.slice(i + 1).flatMap((b) => (meets(a.box, b.box) ? [`${a.said} on ${b.said}`] : [])),
  );
  const covered = texts.flatMap((a) =>
    shapes
      .filter(({ each }) => isFilled(each))
      .flatMap(({ box, said }) => (meets(a.box, box) ? [`${a.said} on ${said}`] : [])),
  );
  return [...outside, ...together, ...covered];
};

const faultsIn = (list: readonly (readonly Picture[])[]): readonly string[] =>
  list.flatMap((pictures, i) =>
    spokenIn(i % 2 === 0 ? 'in' : 'mm', pictures).flatMap((spoken) =>
      faultsOf(svgOf(spoken)).map((fault) => `${String(i)} ${spoken.kind}: ${fault}`),
    ),
  );

test.each([
  ['set-ups', manySetups],
  ['checks', manyChecks],
  ['plans', manyPlans],
  ['records of a shop', manyRecords],
] as const)('nothing overlaps or leaves the frame for 500 %s in both unit systems', (_, many) => {
  const list = many(MANY);
  expect(list).toHaveLength(MANY);
  expect(list.every((pictures) => pictures.length > 0)).toBe(true);
  expect(faultsIn(list)).toEqual([]);
});

test('every picture has alt text that says its numbers, and at most three go with a card', () => {
  for (const pictures of [
    ...manySetups(60),
    ...manyChecks(20),
    ...manyPlans(20),
    ...manyRecords(20),
  ]) {
    expect(pictures.length).toBeLessThanOrEqual(3);
    for (const { alt } of spokenIn('mm', pictures)) expect(alt).toMatch(/\d/u);
  }
});

test('a text is taken to be as wide as the font and the renderer have it', () => {
  const said = [
    '0123456789. in mm',
    'Knurl 30.000 mm',
    'Closing nip: work and wheel',
    'Tooth height',
    '65 teeth (fine) 60° 90 %',
  ];
  for (const weight of ['regular', 'bold'] as const)
    for (const text of said) {
      const width = textWidth(text, 13, weight);
      expect(Math.abs(width - realWidth(text, 13, weight))).toBeLessThan(0.02 * text.length);
      // evidence: the renderer's own box of the drawn letters, which leaves out the space beside them
      const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="400" height="40"><text x="10" y="20" font-family="DejaVu Sans" font-size="13" font-weight="${weight === 'bold' ? 'bold' : 'normal'}">${text}</text></svg>`;
      const drawn = new Resvg(svg, renderOptions(400)).getBBox()?.width ?? 0;
      expect(Math.abs(drawn - width)).toBeLessThan(4);
    }
});
