import { randomInt } from 'node:crypto';
import { enterTerms, leaveTerms, termsIn } from '../../store/index.ts';
import type { ShopChange } from '../view.ts';
import { MOST_TERMS, termsOf } from './terms.ts';

/** What can be found. */
export const FINDABLE = ['standard', 'card', 'question', 'result'] as const;
export type Findable = (typeof FINDABLE)[number];

/** Something that can be found, and what it is found by. */
export type ForFind = {
  readonly kind: Findable;
  readonly id: string;
  /** Its code that can be read aloud, where it has one. */
  readonly code: string | null;
  /** Of two that fit alike the newer one is shown first. */
  readonly at: number;
  /** The shop stands by it: it is shown before what fits alike. */
  readonly approved: boolean;
  /** Everything said in it, in any order: words, names, notes. */
  readonly texts: readonly string[];
};

/** The term of everything of a kind; no word that is typed is ever this. */
export const kindTerm = (kind: Findable): string => `#${kind}`;

const entryId = (kind: Findable, id: string): string => `${kind}:${id}`;

/** The terms of an entry; a text that is left out for length is a later one. */
export const entryTerms = ({ kind, code, texts }: ForFind): readonly string[] => {
  const said = [code ?? '', ...texts].flatMap(termsOf);
  return [...new Set([kindTerm(kind), ...said])].slice(0, MOST_TERMS);
};

/** Entries of one millisecond that find a place. */
const PER_MOMENT = 2 ** 11;
/** Moments are counted from here, and there is room for seventy years of them. */
const BEGINNING = Date.UTC(2020, 0, 1);
const MOMENTS = 2 ** 41;
/** Of so many tries one finds a free place, unless a millisecond had thousands of entries. */
const TRIES = 40;

/** Where an entry stands among all of its shop: approved ones first, then by their moment. */
export const placeOf = (approved: boolean, at: number, tie: number): number => {
  const moment = Math.min(Math.max(Math.floor(at) - BEGINNING, 0), MOMENTS - 1);
  return ((approved ? MOMENTS : 0) + moment) * PER_MOMENT + tie;
};

/**
 * Lets a thing be found by its words, or by its new words and not by the old ones, in the change
 * that made it so.
 */
export const putForFind = async (change: ShopChange, entry: ForFind): Promise<void> => {
  await dropFromFind(change, entry.kind, entry.id);
  const terms = entryTerms(entry);
  const row = {
    shop: change.id,
    id: entryId(entry.kind, entry.id),
    kind: entry.kind,
    subject_id: entry.id,
    code: entry.code,
    at: entry.at,
    approved: entry.approved ? 1 : 0,
    terms: terms.join(' '),
  };
  for (let tries = 0; tries < TRIES; tries += 1) {
    const place = placeOf(entry.approved, entry.at, randomInt(PER_MOMENT));
    const kept = await change.db
      .insertInto('find_entry')
      .values({ ...row, place })
      .onConflict((oc) => oc.columns(['shop', 'place']).doNothing())
      .returning('place')
      .executeTakeFirst();
    if (kept === undefined) continue;
    await enterTerms(change.db, [{ shop: change.id, place, terms }]);
    return;
  }
  throw new Error('no free place was found for an entry');
};

/** Lets a thing be found no more. */
export const dropFromFind = async (
  change: ShopChange,
  kind: Findable,
  id: string,
): Promise<void> => {
  const old = await change.db
    .deleteFrom('find_entry')
    .where('shop', '=', change.id)
    .where('id', '=', entryId(kind, id))
    .returning(['place', 'terms'])
    .executeTakeFirst();
  if (old === undefined) return;
  const { place, terms } = old;
  await leaveTerms(change.db, { shop: change.id, place, terms: termsIn(terms) });
};
