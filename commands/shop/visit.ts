import { type Card, type Line, type Part, type Row } from '../../src/card/index.ts';
import { type Context, type Reply, refuse, type Visit } from '../../src/desk/index.ts';
import type { Refusal } from '../../src/refusal.ts';

/** For what a shop remembers there have to be records. */
export const visiting = async (
  context: Context,
  work: (visit: Visit) => Promise<Reply>,
): Promise<Reply> =>
  context.visit === null
    ? refuse({ code: 'unavailable', what: 'records', words: context.text })
    : await work(context.visit);

/** A refusal with whatever it offers as buttons. */
export const refused = (refusal: Refusal): Reply =>
  refuse(refusal, refusal.code === 'unclear' ? refusal.readings : []);

export type Told = {
  readonly verb: string;
  readonly headline: Line;
  readonly lines?: readonly Line[];
  readonly rows?: readonly Row[];
  readonly after?: readonly Line[];
  readonly choices?: Card['choices'];
  readonly lists?: NonNullable<Card['lists']>;
};

/** A card about the shop's own records: no figures, no checks, nothing to caution against. */
export const shopCard = ({ units }: Context, told: Told): Card => {
  const { lines = [], rows = [], after = [] } = told;
  const parts: Part[] = [];
  if (lines.length > 0) parts.push({ part: 'lines', lines });
  if (rows.length > 0) parts.push({ part: 'rows', rows });
  if (after.length > 0) parts.push({ part: 'lines', lines: after });
  return {
    verb: told.verb,
    headline: told.headline,
    parts,
    choices: told.choices ?? [],
    pictures: [],
    figures: {},
    checks: [],
    cautions: [],
    alternatives: [],
    ...(told.lists === undefined ? {} : { lists: told.lists }),
    units,
  };
};
