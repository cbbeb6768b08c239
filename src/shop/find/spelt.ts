import { spellingsOf } from '../../store/index.ts';
import type { ShopView } from '../view.ts';
import { isOneSlip } from './slips.ts';
import { wantedTerms } from './terms.ts';

/** A word that is looked for: as it was typed, and as the shop spells what may be meant. */
export type Wanted = { readonly typed: string; readonly slips: readonly string[] };

/** Most terms a misspelt word stands for. Judgement: beyond that it is a guess at anything. */
const MOST_SLIPS = 12;
/** Words that are looked for; further ones of a long question are not. Judgement. */
export const MOST_WORDS = 10;
/** Most spellings looked at for a word that is offered. Judgement. */
const MOST_BEGUN_ALIKE = 4_000;
/** Most rows looked at for them: short words have very many neighbours. Judgement. */
const MOST_LOOKED_AT = 600;

/** The terms that the typed ones may have been meant for: one slip, of this shop's own words. */
export const withSlips = async (
  view: ShopView,
  typed: readonly string[],
): Promise<readonly Wanted[]> => {
  const spellings = [...new Set(typed.flatMap(spellingsOf))];
  if (spellings.length === 0) return [];
  const rows = await view.db
    .selectFrom('find_spelling')
    .select('term')
    .where('shop', '=', view.id)
    .where('spelling', 'in', spellings)
    .orderBy('spelling')
    .orderBy('term')
    .limit(MOST_LOOKED_AT)
    .execute();
  const known = [...new Set(rows.map(({ term }) => term))].sort();
  return typed.map((word) => ({
    typed: word,
    slips: known.filter((term) => isOneSlip(word, term)).slice(0, MOST_SLIPS),
  }));
};

/** Shortest word that another is offered for. Judgement: of three letters anything is near. */
const SHORTEST_OFFERED = 4;
/** Letters at the beginning that are taken for right. Judgement. */
const BEGINNING = 2;
/** Sorts behind every letter. */
const END = '\uffff';

/** Words of this shop that are two slips from what was typed: offered, never taken. */
export const nearestWords = async (view: ShopView, words: string): Promise<readonly string[]> => {
  const near: string[] = [];
  for (const word of wantedTerms(words).slice(0, MOST_WORDS)) {
    const start = Array.from(word).slice(0, BEGINNING).join('');
    if (Array.from(word).length < SHORTEST_OFFERED || /\p{N}/u.test(start)) continue;
    const rows = await view.db
      .selectFrom('find_spelling')
      .select('term')
      .where('shop', '=', view.id)
      .where('spelling', '>=', start)
      .where('spelling', '<', start + END)
      .orderBy('spelling')
      .orderBy('term')
      .limit(MOST_BEGUN_ALIKE)
      .execute();
    const known = new Set(rows.map(({ term }) => term));
    near.push(...view.words.nearestOf(word, known));
  }
  return await stillThere(view, [...new Set(near)]);
};

/** A word that only things had which are gone is not offered. */
const stillThere = async (view: ShopView, terms: readonly string[]): Promise<readonly string[]> => {
  if (terms.length === 0) return [];
  const rows = await view.db
    .selectFrom('find_term')
    .select('term')
    .distinct()
    .where('shop', '=', view.id)
    .where('term', 'in', [...terms])
    .execute();
  const there = new Set(rows.map(({ term }) => term));
  return terms.filter((term) => there.has(term));
};
