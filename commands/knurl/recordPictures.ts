import {
  type GrowthResult,
  growthBeforeResults,
  growthBelief,
  growthInterval,
  type MaterialGroup,
  type Pattern,
  siftResults,
} from '../../src/calc/index.ts';
import type { Picture } from '../../src/card/index.ts';

/** A finished part that was measured, and what stood on it. */
export type MeasuredPart = GrowthResult & {
  readonly pattern: Pattern;
  readonly material: MaterialGroup;
};

type FamilyRecord = Extract<Picture, { kind: 'shopRecord' }>['numbers']['families'][number];

/** One hand of a diagonal grows like the other: they are one family. */
const eitherHand = (pattern: Pattern): Pattern =>
  pattern.kind === 'diagonal' ? { ...pattern, hand: null } : pattern;

/**
 * What the parts of a shop have measured, the family with the most parts first, beside what was
 * expected before any of them. The oldest result comes first, as it is learned from.
 */
export const recordPictures = (results: readonly MeasuredPart[]): readonly Picture[] => {
  const doubted = new Set<GrowthResult>(siftResults(results).doubted);
  const names = [...new Set(results.map(({ family }) => family))];
  const families = names.flatMap((name): readonly FamilyRecord[] => {
    const own = results.filter(({ family }) => family === name);
    const [first] = own;
    if (first === undefined) return [];
    const belief = growthBelief(results, name);
    return [
      {
        pattern: eitherHand(first.pattern),
        material: first.material,
        parts: belief.ofFamily,
        mean: belief.mean,
        ...growthInterval(belief),
        shares: own.map((each) => ({ share: each.share, isDoubted: doubted.has(each) })),
      },
    ];
  });
  if (families.length === 0) return [];
  const before = growthBeforeResults();
  const prior = { mean: before.mean, ...growthInterval(before) };
  const byParts = [...families].sort((a, b) => b.parts - a.parts);
  return [{ kind: 'shopRecord', numbers: { families: byParts, prior } }];
};
