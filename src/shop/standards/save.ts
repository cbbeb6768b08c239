import type { SetupRequest, Window } from '../../calc/index.ts';
import type { Refusal } from '../../refusal.ts';
import type { KeptCard } from '../cards.ts';
import { remember } from '../history.ts';
import { outside } from '../limits.ts';
import { cleaned, keyOf, LONGEST_NAME, LONGEST_TEXT, textFault } from '../names.ts';
import { type Done, done, refused } from '../result.ts';
import type { ShopChange } from '../view.ts';
import { scopeOf } from './job.ts';
import { notNow, overtaken } from './judge.ts';
import {
  approvedOf,
  findStandard,
  lastOf,
  openOf,
  type Revision,
  readStandard,
  type Standard,
} from './standard.ts';
import { changing, moveRevision, type StandardWith } from './write.ts';

/** What a revision is made from. */
export type RevisionDraft = {
  readonly part: string;
  readonly card: KeptCard;
  /** Why it is not like the one before; it has to be said where one was approved before. */
  readonly why: string | null;
  /** Bars it may be made from, where they were said. */
  readonly bars: Window | null;
  /** The open revision that the person saw and that this one is to take the place of. */
  readonly over: number | null;
};

/** What the person asked for decides what may stand there already. */
export type Saving = 'save' | 'propose' | 'revise';

const WHY_EXAMPLES = ['because the new wheel leaves a cleaner crest'];
const PART_EXAMPLES = ['TH-2041-B'];

/** What is wrong with the words of it. */
const wordsFault = (part: string, why: string | null): Refusal | null =>
  textFault('part', part, LONGEST_NAME, PART_EXAMPLES) ??
  (why === null ? null : textFault('why', why, LONGEST_TEXT, WHY_EXAMPLES));

type StoppedCheck = { readonly name: string; readonly state: string };

/** The check that stops a set-up, where one does. */
const stopOf = ({ card }: KeptCard): string | null => {
  // What was kept is what was handed in: a card with its checks.
  const { checks = [] } = card as { readonly checks?: readonly StoppedCheck[] };
  return checks.find(({ state }) => state === 'stop')?.name ?? null;
};

/** Bars that are all thinner than the blank can be turned to nothing. */
const barsFault = ({ bars, card }: RevisionDraft): Refusal | null => {
  if (bars === null) return null;
  const { blank } = scopeOf(card.request as SetupRequest, card, null);
  return outside('bars', bars.high, [blank, Number.MAX_VALUE, 'mm']);
};

const cardFault = (card: KeptCard): Refusal | null => {
  if (card.kind !== 'setup') return { code: 'notFound', what: 'setUpCard', nearest: [] };
  const check = stopOf(card);
  return check === null ? null : { code: 'cardStopped', card: card.code, check };
};

/** The revision that the new one takes the place of, null where there is none open. */
type Replaced = Revision | null;

/** Whether a revision may be made now. */
const judge = async (
  change: ShopChange,
  saving: Saving,
  { why, over }: RevisionDraft,
  standard: Standard,
): Promise<Done<Replaced>> => {
  const open = openOf(standard);
  const [latest] = standard.revisions;
  const held = standard.revisions.some(({ approved }) => approved !== null);
  if (latest === undefined) return done(null);
  if (saving === 'save' && (held || latest.state === 'retired') && open === undefined)
    return refused(await notNow(change, 'save', standard, approvedOf(standard) ?? latest));
  if (saving === 'revise' && !held && latest.state !== 'retired')
    return refused(await notNow(change, 'revise', standard, latest));
  if (held && why === null)
    return refused({ code: 'missing', parameter: 'why', examples: WHY_EXAMPLES });
  if (open === undefined) {
    // Decided on since the person looked at it.
    if (over === null || over === latest.number) return done(null);
    return refused(await overtaken(change, standard, lastOf(latest)));
  }
  const isOwnDraft = open.state === 'draft' && open.made.by === change.by;
  if (over === open.number || (over === null && isOwnDraft)) return done(open);
  return refused(await overtaken(change, standard, lastOf(open)));
};

/** The standard of this part number, made where the shop has none yet. */
const standardFor = async (change: ShopChange, part: string): Promise<Standard> => {
  const before = await readStandard(change, part);
  if (before !== undefined) return before;
  const id = change.db.newId(change.at);
  await change.db
    .insertInto('standard')
    .values({
      shop: change.id,
      id,
      part,
      part_key: keyOf(change.words, part),
      version: 1,
      made_at: change.at,
      made_by: change.by,
      changed_at: change.at,
      changed_by: change.by,
    })
    .onConflict((oc) => oc.columns(['shop', 'part_key']).doNothing())
    .execute();
  // Somebody else may have made it in the same moment.
  const made = await readStandard(change, part);
  if (made === undefined) throw new Error('a standard that was made is gone');
  return made;
};

const insert = async (
  change: ShopChange,
  standard: Standard,
  { card, why, bars }: RevisionDraft,
  isProposed: boolean,
): Promise<void> => {
  const { wheel, machine, material } = card;
  // What was kept is what was handed in: the request that the card was worked out from.
  const scope = scopeOf(card.request as SetupRequest, { wheel, machine, material }, bars);
  const number = (standard.revisions[0]?.number ?? 0) + 1;
  const state = isProposed ? 'proposed' : 'draft';
  await change.db
    .insertInto('standard_revision')
    .values({
      shop: change.id,
      id: change.db.newId(change.at),
      standard: standard.id,
      number,
      state,
      card: card.id,
      pattern: scope.pattern.kind,
      base: scope.base,
      scope: JSON.stringify(scope),
      basis: null,
      why,
      made_at: change.at,
      made_by: change.by,
      proposed_at: isProposed ? change.at : null,
      proposed_by: isProposed ? change.by : null,
      approved_at: null,
      approved_by: null,
      review_at: null,
      ended_at: null,
      ended_by: null,
      ended_why: null,
    })
    .execute();
  const after = { part: standard.part, revision: number, state, why, card: card.code };
  await remember(change, 'standard', [
    { subjectId: standard.id, verb: 'added', before: null, after },
  ]);
};

/**
 * Makes the next revision of a part's standard from a card: a draft, or proposed at once. An open
 * revision that it takes the place of is kept, superseded.
 */
export const saveStandard = async (
  change: ShopChange,
  given: RevisionDraft,
  saving: Saving,
): Promise<Done<StandardWith>> => {
  const why = given.why === null ? null : cleaned(given.why);
  const draft = { ...given, part: cleaned(given.part), why };
  const fault = wordsFault(draft.part, why) ?? cardFault(draft.card) ?? barsFault(draft);
  if (fault !== null) return refused(fault);
  const standard = await standardBefore(change, draft.part, saving);
  if (!standard.ok) return standard;
  const result = await changing(
    change,
    standard.value,
    (read) => judge(change, saving, draft, read),
    async (replaced) => {
      if (replaced !== null) {
        const ended = { ended_at: change.at, ended_by: change.by, ended_why: why };
        await moveRevision(change, standard.value, replaced, { state: 'superseded', ...ended });
      }
      await insert(change, standard.value, draft, saving === 'propose');
    },
  );
  return result.ok ? done(newestOf(result.value.standard)) : result;
};

/** Only what there is can be revised. */
const standardBefore = async (
  change: ShopChange,
  part: string,
  saving: Saving,
): Promise<Done<Standard>> => {
  return saving === 'revise'
    ? await findStandard(change, part)
    : done(await standardFor(change, part));
};

const newestOf = (standard: Standard): StandardWith => {
  const [revision] = standard.revisions;
  if (revision === undefined) throw new Error('a standard without a revision');
  return { standard, revision };
};
