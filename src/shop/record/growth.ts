import {
  type FamilyGrowth,
  type GrowthResult,
  growthFromTallies,
  MATERIALS,
  type MaterialGroup,
  type Pattern,
} from '../../calc/index.ts';
import { growthTallies } from '../results/growth.ts';
import { resultName } from '../results/kept.ts';
import type { ShopView } from '../view.ts';

/** A measured part: what it says of its family, and what people call the result. */
export type RecordedPart = GrowthResult & {
  readonly pattern: Pattern;
  readonly material: MaterialGroup;
  readonly result: string;
  readonly learned: boolean;
};

/** What a family of pattern and material has been seen to grow. */
export type RecordedFamily = {
  readonly family: string;
  readonly pattern: Pattern;
  readonly material: MaterialGroup;
  readonly growth: FamilyGrowth;
  /** Results that wait to be confirmed, by name. */
  readonly doubted: readonly string[];
};

const FAMILY =
  /^(?<kind>straight|diagonal|diamond|square)(?: (?<points>raised|sunk))? × (?<group>\w+)$/u;

const pointsOf = (word: string | undefined): 'raised' | 'sunk' =>
  word === 'sunk' ? 'sunk' : 'raised';

const patternOf = (kind: string | undefined, points: string | undefined): Pattern => {
  if (kind === 'diamond' || kind === 'square') return { kind, points: pointsOf(points) };
  // One hand grows like the other.
  return kind === 'diagonal' ? { kind, hand: null } : { kind: 'straight' };
};

/** Pattern and material of a family's name; null where an older program named it. */
const familyParts = (
  family: string,
): { readonly pattern: Pattern; readonly material: MaterialGroup } | null => {
  const said = FAMILY.exec(family)?.groups;
  const group = MATERIALS.find((material) => material.group === said?.['group'])?.group;
  if (said === undefined || group === undefined) return null;
  return { pattern: patternOf(said['kind'], said['points']), material: group };
};

/** Every result that stands and speaks of growth, the oldest first. */
export const recordedParts = async (view: ShopView): Promise<readonly RecordedPart[]> => {
  const rows = await view.db
    .selectFrom('result')
    .select(['number', 'family', 'share', 'learned', 'confirmed_at'])
    .where('shop', '=', view.id)
    .where('family', 'is not', null)
    .where('withdrawn_at', 'is', null)
    .orderBy('id')
    .execute();
  return rows.flatMap(({ number, family, share, learned, confirmed_at }) => {
    const parts = family === null ? null : familyParts(family);
    if (family === null || share === null || parts === null) return [];
    const said = { family, share, confirmed: confirmed_at !== null, learned: learned === 1 };
    return [{ ...said, ...parts, result: resultName(number) }];
  });
};

/** The families those parts are of, the one with the most results first. */
export const recordedFamilies = async (
  view: ShopView,
  parts: readonly RecordedPart[],
): Promise<readonly RecordedFamily[]> => {
  const tallies = await growthTallies(view);
  const families = [...new Map(parts.map((part) => [part.family, part])).values()];
  return families
    .map(({ family, pattern, material }) => {
      const waiting = parts.filter((part) => part.family === family && !part.learned);
      const doubted = waiting.map(({ result }) => result);
      const growth = growthFromTallies(tallies, family, doubted.length);
      return { family, pattern, material, growth, doubted };
    })
    .sort((a, b) => b.growth.ofFamily - a.growth.ofFamily || (a.family < b.family ? -1 : 1));
};
