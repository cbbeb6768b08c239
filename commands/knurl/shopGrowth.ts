import {
  type FamilyGrowth,
  growthFamily,
  type Process,
  type SetupRequest,
} from '../../src/calc/index.ts';
import { type Line, line } from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import { growthIn } from '../../src/shop/index.ts';

/** What this shop has seen of the growth of such a part; null where nothing is kept. */
export const growthFor = async (
  { visit }: Pick<Context, 'visit'>,
  { pattern, material }: SetupRequest,
): Promise<FamilyGrowth | null> =>
  visit === null ? null : await growthIn(visit.shop, growthFamily(pattern, material.group));

/** The request with the growth the shop has learned; before its first result the usual one stands. */
export const grownAs = (request: SetupRequest, growth: FamilyGrowth | null): SetupRequest => {
  if (growth === null || growth.results === 0) return request;
  const { mean, sd, results } = growth;
  return { ...request, growth: { mean, sd, results } };
};

/** How many results stand behind the crest that a card expects; a cut knurl does not grow. */
export const growthLines = (
  growth: FamilyGrowth | null,
  { pattern, material }: SetupRequest,
  process: Process,
): readonly Line[] => {
  if (growth === null || process === 'cut') return [];
  const { results, ofFamily, doubted } = growth;
  return [line('growthStands', { results, ofFamily, doubted, pattern, group: material.group })];
};
