import { type Context, cardReply, type Reply, said } from '../../src/desk/index.ts';
import type { Refusal } from '../../src/refusal.ts';
import { addTo, changeIn, findIn } from '../../src/shop/index.ts';
import { textOf, vocabularyOf } from '../../src/words/index.ts';
import { type Listed, nameless, thingCard, withWord } from './lists.ts';
import type { Others } from './named.ts';
import { refused, visiting } from './visit.ts';

type Name = 'wheel' | 'machine' | 'material' | 'rule';

/** What a thing is to be called from now on. */
export const renameField = (others: Others) =>
  said<string>({
    name: 'newName',
    read: textOf(() => vocabularyOf(others())),
    keywords: ['rename to', 'rename', 'new name'],
    text: true,
    examples: ['rename to "Old Faithful"'],
  });

/** Puts one on the list, and shows it. */
export const added = <N extends Name, T extends { readonly name: string }>(
  context: Context,
  of: Listed<N, T>,
  name: string | undefined,
  content: (name: string) => T | Refusal,
): Promise<Reply> =>
  visiting(context, async (visit) => {
    if (name === undefined) return refused(nameless(of.name));
    const wanted = content(name);
    if ('code' in wanted) return refused(wanted);
    const result = await addTo(visit.shop, of.register, wanted);
    return result.ok
      ? cardReply(await thingCard(context, visit, of, result.value, 'added'))
      : refused(result.refusal);
  });

/** Changes what was said of one, and shows it. */
export const changed = <N extends Name, T extends { readonly name: string }>(
  context: Context,
  of: Listed<N, T>,
  name: string | undefined,
  patch: Partial<T>,
): Promise<Reply> =>
  visiting(context, async (visit) => {
    if (name === undefined) return refused(nameless(of.name));
    const found = await findIn(visit.shop, of.register, name);
    if (!found.ok) return refused(withWord(found.refusal, name));
    if (Object.keys(patch).length === 0) {
      return refused({ code: 'missing', parameter: 'change', examples: [of.addLine] });
    }
    const { id, version } = found.value;
    const result = await changeIn(visit.shop, of.register, id, patch, version);
    return result.ok
      ? cardReply(await thingCard(context, visit, of, result.value, 'changed'))
      : refused(result.refusal);
  });
