import { type CribWheel, dinCrib, dpCrib, type Pattern } from '../../src/calc/index.ts';
import type { Line } from '../../src/card/index.ts';
import { line } from '../../src/card/index.ts';
import type { Context } from '../../src/desk/index.ts';
import { cribFor, listOf, WHEELS } from '../../src/shop/index.ts';

/** Where the wheels come from: the shop entered them, or the tables of the standards stand in. */
export type Crib = {
  readonly crib: readonly CribWheel[];
  readonly kind: 'byStandard' | 'ofShop';
};

/** The shop's own wheels that can leave one of these patterns, or every standard one where it entered none. */
export const cribOfShop = async (
  { visit }: Pick<Context, 'visit'>,
  patterns: readonly Pattern[],
): Promise<Crib> => {
  const own = visit === null ? [] : await listOf(visit.shop, WHEELS);
  if (own.length === 0) return { crib: [...dinCrib(), ...dpCrib()], kind: 'byStandard' };
  return { crib: patterns.flatMap((pattern) => cribFor(own, pattern)), kind: 'ofShop' };
};

/** Which crib was looked through. */
export const cribLine = ({ kind, crib }: Crib): Line =>
  kind === 'byStandard'
    ? line('planCribByStandard', {})
    : line('planCribOfShop', { wheels: crib.length });
