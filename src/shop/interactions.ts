import type { Store } from '../store/index.ts';
import type { ShopChange, ShopView } from './view.ts';

export type Acted<A> = {
  /** False: it was done before, and this is the answer of then. */
  readonly first: boolean;
  readonly answer: A;
};

/**
 * Acts on an interaction once, however often the platform sends it and whichever process gets it.
 * The answer is kept in the same change as what was done, and given again to whoever comes later;
 * who comes at the same moment waits until the first is through.
 */
export const once = async <A>(
  change: ShopChange,
  interaction: string,
  act: () => Promise<A>,
): Promise<Acted<A>> => {
  const mine = await change.db
    .insertInto('interaction')
    .values({ shop: change.id, id: interaction, at: change.at, answer: null })
    .onConflict((oc) => oc.columns(['shop', 'id']).doNothing())
    .returning('id')
    .executeTakeFirst();
  if (mine === undefined) return { first: false, answer: await answerOf<A>(change, interaction) };
  const answer = await act();
  await change.db
    .updateTable('interaction')
    .set({ answer: JSON.stringify(answer) })
    .where('shop', '=', change.id)
    .where('id', '=', interaction)
    .execute();
  return { first: true, answer };
};

const answerOf = async <A>(change: ShopChange, interaction: string): Promise<A> => {
  const answer = await answerTo<A>(change, interaction);
  if (answer === null) throw new Error('an interaction was kept without its answer');
  return answer;
};

/** The answer an interaction got, or null where it is not known or was forgotten. */
export const answerTo = async <A>(view: ShopView, interaction: string): Promise<A | null> => {
  const row = await view.db
    .selectFrom('interaction')
    .select('answer')
    .where('shop', '=', view.id)
    .where('id', '=', interaction)
    .executeTakeFirst();
  const answer = row?.answer ?? null;
  return answer === null ? null : (JSON.parse(answer) as A);
};

/**
 * How long an answer is given again, and the buttons under it work. Judgement: platforms repeat
 * within the hour, and people press what they scroll back to within half a year.
 */
export const REPEATS_MS = 180 * 24 * 3_600_000;

/** Forgets answers that nobody will ask for again. What was done stays. */
export const forgetAnswers = async (store: Store, at: number): Promise<void> => {
  await store.transact(async (tx) => {
    await tx
      .deleteFrom('interaction')
      .where('at', '<', at - REPEATS_MS)
      .execute();
  });
};
