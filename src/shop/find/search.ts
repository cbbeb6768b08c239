import { termsIn } from '../../store/index.ts';
import type { ShopView } from '../view.ts';
import { type Findable, kindTerm } from './put.ts';
import { MOST_WORDS, type Wanted, withSlips } from './spelt.ts';
import { wantedTerms } from './terms.ts';

/** Something that was found. */
export type Found = {
  readonly kind: Findable;
  readonly id: string;
  readonly code: string | null;
  readonly at: number;
  readonly approved: boolean;
};

export type FindOptions = {
  readonly limit: number;
  /** Only of this kind. */
  readonly kind?: Findable;
};

/**
 * So many of a term's newest are read, however many there are: with this the time to find stays
 * the same while the records grow. A term with fewer is known whole, and tells things apart.
 * Judgement: more than a phone shows, and few enough that a thousand entries cost no less.
 */
const NEWEST_OF_TERM = 24;
/** Entries of the commonest words that are looked through for what all words have in common. */
const DEEPEST = 2_000;
/** Entries whose terms are all looked at. Judgement. */
const MOST_WEIGHED = 48;

/** What a word that fits adds: rare words tell more, misspelt ones a little less. Judgement. */
const WEIGHT = { rare: 2, common: 1 } as const;
const SLIP = 0.7;
/** What fits less than this share of the best is not shown. Judgement. */
const LEAST_SHARE = 0.5;

type Places = ReadonlyMap<string, readonly number[]>;
type Word = Wanted & { readonly isRare: boolean };

const spelt = ({ typed, slips }: Wanted): readonly string[] => [typed, ...slips];

/**
 * What fits the words best, of this shop: by how many of them it has, approved before the others,
 * the newest first. A word may be one slip off; a number may not. Without a word it is the newest
 * of a kind.
 */
export const findEntries = async (
  view: ShopView,
  words: string,
  options: FindOptions,
): Promise<readonly Found[]> => {
  const typed = wantedTerms(words).slice(0, MOST_WORDS);
  const { kind, limit } = options;
  if (typed.length === 0) return kind === undefined ? [] : await newestOfKind(view, kind, limit);
  const wanted = await withSlips(view, typed);
  const newest = await newestPlaces(view, wanted.flatMap(spelt));
  const known = wanted.map((word) => ({ ...word, isRare: isKnownWhole(word, newest) }));
  const places = await candidates(view, known, newest, options);
  return weighed(await entriesAt(view, places), known, options);
};

/** Whether every entry that has the word was read. */
const isKnownWhole = (word: Wanted, newest: Places): boolean => {
  const counts = spelt(word).map((term) => newest.get(term)?.length ?? 0);
  return counts.some((count) => count > 0) && counts.every((count) => count < NEWEST_OF_TERM);
};

const newestOfKind = async (
  view: ShopView,
  kind: Findable,
  limit: number,
): Promise<readonly Found[]> => {
  const newest = await newestPlaces(view, [kindTerm(kind)]);
  const places = (newest.get(kindTerm(kind)) ?? []).slice(0, limit);
  return (await entriesAt(view, places)).map(foundOf);
};

const newestOfTerm = (view: ShopView, term: string, limit: number) =>
  view.db
    .selectFrom('find_term')
    .select(['term', 'place'])
    .where('shop', '=', view.id)
    .where('term', '=', term)
    .orderBy('place', 'desc')
    .limit(limit);

/** The newest of each term, read together. */
const newestPlaces = async (view: ShopView, terms: readonly string[]): Promise<Places> => {
  const newestOf = (term: string) =>
    view.db
      .selectFrom(newestOfTerm(view, term, NEWEST_OF_TERM).as('newest'))
      .select(['newest.term as term', 'newest.place as place']);
  const [first, ...others] = [...new Set(terms)];
  const places = new Map<string, number[]>();
  if (first === undefined) return places;
  const all = others.reduce((query, term) => query.unionAll(newestOf(term)), newestOf(first));
  for (const { term, place } of await all.execute()) {
    const of = places.get(term);
    if (of === undefined) places.set(term, [place]);
    else of.push(place);
  }
  for (const of of places.values()) of.sort((a, b) => b - a);
  return places;
};

/** Where the wanted entries may stand: with a rare word first, then with the most words. */
const candidates = async (
  view: ShopView,
  words: readonly Word[],
  newest: Places,
  options: FindOptions,
): Promise<readonly number[]> => {
  const weights = new Map<number, number>();
  for (const word of words) {
    const of = new Map<number, number>();
    for (const term of spelt(word)) {
      const weight = weightOf(word, term);
      for (const place of newest.get(term) ?? [])
        of.set(place, Math.max(weight, of.get(place) ?? 0));
    }
    for (const [place, weight] of of) weights.set(place, weight + (weights.get(place) ?? 0));
  }
  const seen = [...weights].sort(([a, left], [b, right]) => right - left || b - a);
  const places = seen.map(([place]) => place).slice(0, MOST_WEIGHED);
  return [...new Set([...(await furtherBack(view, words, newest, options)), ...places])];
};

/** What is not among the newest of its words. Whatever has a rare word is among them already. */
const furtherBack = async (
  view: ShopView,
  words: readonly Word[],
  newest: Places,
  options: FindOptions,
): Promise<readonly number[]> => {
  if (options.kind === undefined) {
    return words.some(({ isRare }) => isRare) ? [] : await common(view, words, newest, options);
  }
  // One kind among many may have nothing under the newest of a word, not even of a rare one.
  const places = [...(await common(view, words, newest, options))];
  for (const word of words) places.push(...(await common(view, [word], newest, options)));
  return places;
};

const weightOf = (word: Word, term: string): number =>
  (word.isRare ? WEIGHT.rare : WEIGHT.common) * (term === word.typed ? 1 : SLIP);

/**
 * The newest entries that have all the words, and are of the kind: the rarest word's entries are
 * gone through, the newest first, and held against the others.
 */
const common = async (
  view: ShopView,
  words: readonly Word[],
  newest: Places,
  { kind, limit }: FindOptions,
): Promise<readonly number[]> => {
  const there = words.filter((word) => spelt(word).some((term) => newest.has(term)));
  const groups = there.map((word) => spelt(word).filter((term) => newest.has(term)));
  const [rarest, ...others] = [...groups].sort((a, b) => reach(a, newest) - reach(b, newest));
  if (rarest === undefined) return [];
  const tests = [...others, ...(kind === undefined ? [] : [[kindTerm(kind)]])];
  if (tests.length === 0) return [];
  const newestOf = (term: string) =>
    view.db
      .selectFrom(newestOfTerm(view, term, DEEPEST).as('newest'))
      .select('newest.place as place');
  const [first, ...more] = rarest;
  if (first === undefined) return [];
  let query = view.db
    .selectFrom(more.reduce((all, term) => all.union(newestOf(term)), newestOf(first)).as('rarest'))
    .select('rarest.place')
    .orderBy('rarest.place', 'desc')
    .limit(limit);
  for (const terms of tests) {
    query = query.where((test) =>
      test.exists(
        test
          .selectFrom('find_term')
          .select('find_term.place')
          .where('find_term.shop', '=', view.id)
          .where('find_term.term', 'in', [...terms])
          .whereRef('find_term.place', '=', 'rarest.place'),
      ),
    );
  }
  return (await query.execute()).map(({ place }) => place);
};

/** How far back the newest of these terms reach: the further, the fewer there are. */
const reach = (terms: readonly string[], newest: Places): number =>
  Math.max(...terms.map((term) => reachOf(newest.get(term) ?? [])));

const reachOf = (places: readonly number[]): number =>
  places.length < NEWEST_OF_TERM ? -1 : (places.at(-1) ?? -1);

type Entry = {
  readonly kind: string;
  readonly subject_id: string;
  readonly code: string | null;
  readonly at: number;
  readonly approved: number;
  readonly place: number;
  readonly terms: string;
};

const entriesAt = async (view: ShopView, places: readonly number[]): Promise<readonly Entry[]> =>
  places.length === 0
    ? []
    : await view.db
        .selectFrom('find_entry')
        .select(['kind', 'subject_id', 'code', 'at', 'approved', 'place', 'terms'])
        .where('shop', '=', view.id)
        .where('place', 'in', [...places])
        .orderBy('place', 'desc')
        .execute();

const foundOf = ({ kind, subject_id: id, code, at, approved }: Entry): Found => ({
  kind: kind as Findable,
  id,
  code,
  at,
  approved: approved === 1,
});

const weighed = (
  entries: readonly Entry[],
  words: readonly Word[],
  { kind, limit }: FindOptions,
): readonly Found[] => {
  const scored = entries
    .filter((entry) => kind === undefined || entry.kind === kind)
    .map((entry) => ({ entry, weight: fit(new Set(termsIn(entry.terms)), words) }))
    .sort((a, b) => b.weight - a.weight || b.entry.place - a.entry.place);
  const best = scored[0]?.weight ?? 0;
  return scored
    .filter(({ weight }) => weight > 0 && weight >= LEAST_SHARE * best)
    .slice(0, limit)
    .map(({ entry }) => foundOf(entry));
};

const fit = (terms: ReadonlySet<string>, words: readonly Word[]): number =>
  words.reduce((sum, word) => {
    const weights = spelt(word)
      .filter((term) => terms.has(term))
      .map((term) => weightOf(word, term));
    return sum + Math.max(0, ...weights);
  }, 0);
