import type { Suggestion } from '../refusal.ts';
import {
  type AnyParameter,
  MATERIAL_OFFERS,
  type Names,
  nearestOf,
  plainText,
  type Suggested,
} from '../words/index.ts';

const plainly = (names: readonly string[]): readonly Suggestion[] =>
  names.map((name) => ({ label: name, words: name }));

const offersOf = (kind: Suggested, names: Names): readonly Suggestion[] => {
  const { wheels, machines, materials = [], standards = [] } = names;
  const own = materials.map(({ name }) => name);
  if (kind === 'materials') return [...plainly(own), ...MATERIAL_OFFERS];
  const given: Partial<Record<Suggested, readonly string[]>> = {
    wheels,
    machines,
    standards,
    ownMaterials: own,
  };
  return plainly(given[kind] ?? []);
};

/** How well an offer answers what was typed: at its start, at a word's start, inside, or not. */
const rank = (typed: string, offer: string): number => {
  const at = offer.indexOf(typed);
  if (at === 0) return offer.length === typed.length ? 0 : 1;
  if (at < 0) return Number.POSITIVE_INFINITY;
  return offer[at - 1] === ' ' ? 2 : 3;
};

/** What it sends says more of an offer than what is shown beside it. */
const rankOf = (typed: string, { words, label }: Suggestion): number => {
  const byWords = rank(typed, plainText(words));
  return Number.isFinite(byWords) ? byWords : WORDS_RANKS + rank(typed, plainText(label));
};
const WORDS_RANKS = 4;

/** What may be meant by the few letters typed so far, the likeliest first. */
export const suggestionsFor = (
  parameter: AnyParameter,
  typed: string,
  names: Names,
  more: readonly Suggestion[] = [],
): readonly Suggestion[] => {
  const offers =
    parameter.suggests === undefined
      ? plainly([...new Set((parameter.values ?? []).map(([phrase]) => phrase))])
      : [...more, ...offersOf(parameter.suggests, names)];
  const plain = plainText(typed).trim();
  const ranked = offers
    .map((offer) => ({ offer, rank: rankOf(plain, offer) }))
    .filter((each) => Number.isFinite(each.rank))
    .sort((a, b) => a.rank - b.rank || a.offer.words.length - b.offer.words.length);
  if (ranked.length > 0) return ranked.map((each) => each.offer);
  const near = nearestOf(
    plain,
    offers.map((offer) => offer.words),
  );
  return offers.filter((offer) => near.includes(offer.words));
};
