import { type Context, type Reply, refuse } from '../../src/desk/index.ts';
import { approvedOf, type Covering, findStandard, notNow } from '../../src/shop/index.ts';
import { lineFor } from './standardCards.ts';

type Refused = Extract<Reply, { readonly refusal: unknown }>;

/** The standard of the part number that was said: the revision that holds. */
export const pickedFor = async (
  { visit }: Context,
  part: string | undefined,
): Promise<Covering | Refused | null> => {
  if (part === undefined) return null;
  if (visit === null)
    return refuse({ code: 'notFound', what: 'standard', word: part, nearest: [] }) as Refused;
  const found = await findStandard(visit.shop, part);
  if (!found.ok) {
    const { refusal } = found;
    return refuse(refusal.code === 'notFound' ? { ...refusal, word: part } : refusal) as Refused;
  }
  const revision = approvedOf(found.value);
  if (revision !== undefined) return { standard: found.value, revision };
  const [latest] = found.value.revisions;
  if (latest === undefined) throw new Error('a standard without a revision');
  const refusal = await notNow(visit.shop, 'use', found.value, latest);
  const { part: label } = found.value;
  return { refusal, choices: [{ label, words: lineFor('show', label) }] };
};
