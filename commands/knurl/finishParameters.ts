import { LARGEST_DIAMETER } from '../../src/calc/index.ts';
import { said } from '../../src/desk/index.ts';
import { lengthOf, smallLengthOf } from '../../src/words/index.ts';

/** Thickness of a coating that comes after the knurling. */
export const plate = said<number>({
  name: 'plate',
  read: smallLengthOf('plate', [0.0001, 1]),
  keywords: ['plate', 'plated', 'plating', 'coating', 'coated'],
  examples: ['plate 8um'],
});

/** The bore that the knurl is pressed into. */
export const fit = said<number>({
  name: 'fit',
  read: lengthOf('fit', [1, LARGEST_DIAMETER], { in: [0.06, 8], mm: [2, 200] }),
  keywords: ['fit', 'press fit', 'press into', 'fits'],
  examples: ['fit 10.00'],
});
