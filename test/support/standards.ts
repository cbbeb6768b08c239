/** Standards brought to any place in their lives, and jobs that they may cover. Programs use it too. */
import { mm, setUp } from '../../src/calc/index.ts';
import {
  approveStandard,
  type Done,
  findCard,
  type Job,
  jobOf,
  keepCard,
  type RevisionDraft,
  retireStandard,
  type ShopChange,
  type StandardState,
  type StandardWith,
  saveStandard,
} from '../../src/shop/index.ts';
import { SETUP_CARD } from '../shop/contract/samples.ts';
import { requestOf } from './setupRequest.ts';

/** The value of a result that has to be good. */
const good = <T>(result: Done<T>): T => {
  if (!result.ok) throw new Error(`refused: ${JSON.stringify(result.refusal)}`);
  return result.value;
};

/** What a revision is made from: a card of its own, or the one of this id. */
export const draftOf = async (
  change: ShopChange,
  part: string,
  card?: string,
): Promise<RevisionDraft> => {
  const id = card ?? (await keepCard(change, SETUP_CARD)).id;
  const why = 'it runs cleaner';
  return { part, card: good(await findCard(change, id)), why, bars: null, over: null };
};

/** Makes the next revision of a part and brings it to a place in its life. */
export const bringTo = async (
  change: ShopChange,
  part: string,
  state: StandardState,
  card?: string,
): Promise<StandardWith> => {
  const draft = await draftOf(change, part, card);
  const made = good(await saveStandard(change, draft, state === 'draft' ? 'save' : 'propose'));
  if (state === 'draft' || state === 'proposed') return made;
  const which = { part, revision: null };
  const approved = good(await approveStandard(change, { ...which, reviewMonths: null }));
  if (state === 'approved') return approved;
  if (state === 'retired')
    return good(await retireStandard(change, { ...which, why: 'no longer made' }));
  // Superseded by one that holds now: it is the older one that is given back.
  const { standard } = await bringTo(change, part, 'approved', card);
  const { number } = approved.revision;
  const revision = standard.revisions.find((each) => each.number === number);
  if (revision === undefined) throw new Error('a revision is gone');
  return { standard, revision };
};

/** The job of the sample card, as a line asks for it, but for what is said. */
export const jobLike = (said: Partial<Job> = {}): Job => {
  const request = requestOf();
  const of = { base: request.material.id, material: null, wheel: null, machine: null };
  const job = jobOf({ request, result: setUp(request), of, angleSaid: false });
  return { ...job, ...said };
};

export const inches = (value: number) => mm(value * 25.4);
