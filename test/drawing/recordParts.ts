/** Parts of a shop as it measured them: two families that were learned, and a slip of the pen. */
import type { MeasuredPart } from '../../commands/knurl/recordPictures.ts';
import { growthFamily, type MaterialGroup, type Pattern } from '../../src/calc/index.ts';

export const measured = (
  pattern: Pattern,
  material: MaterialGroup,
  ...shares: readonly number[]
): readonly MeasuredPart[] =>
  shares.map((share) => ({
    pattern,
    material,
    family: growthFamily(pattern, material),
    share,
    confirmed: false,
  }));

export const RECORD_PARTS: readonly MeasuredPart[] = [
  ...measured({ kind: 'straight' }, 'steel', 0.9, 0.88, 0.93, 0.91, 0.86, 0.9, 0.895, 0.94, 0.9),
  ...measured({ kind: 'diamond', points: 'raised' }, 'brass', 1.02, 0.98, 1.05, 0.45),
  ...measured({ kind: 'diagonal', hand: 'left' }, 'stainless', 0.8),
  ...measured({ kind: 'straight' }, 'steel', 1.25),
];
