import { DEFAULT_MATERIAL_ID, MATERIALS, type Material } from '../calc/materials/index.ts';
import type { Suggestion } from '../refusal.ts';
import { type Cursor, isAfterComma, moved, phraseAt, phraseOf, textAt } from './cursor.ts';
import { DESIGNATIONS, LOOKS_LIKE_A_SIZE } from './designations.ts';
import { quantityAt } from './quantity.ts';
import { type Names, type Reader, took } from './reading.ts';
import { tokensOf } from './tokens.ts';

/**
 * What the words so far leave of the materials table. `stainless` leaves all stainless steels and
 * means 304 unless more is said; `303` leaves one.
 */
export type MaterialWords = {
  readonly ids: readonly string[];
  /** The one meant where nothing more is said; null where that cannot be told. */
  readonly usual: string | null;
  /** The shop's own name for it, where that was said. */
  readonly own?: string;
};

type Entry = { readonly phrase: readonly string[]; readonly means: MaterialWords };

const idsWhere = (test: (material: Material) => boolean): readonly string[] =>
  MATERIALS.filter(test).map((material) => material.id);

const startsWith =
  (...starts: readonly string[]) =>
  (material: Material): boolean =>
    starts.some((start) => material.id.startsWith(start));

const steels = startsWith('steel', 'tool');
const inCondition =
  (...words: readonly string[]) =>
  (material: Material): boolean =>
    words.some((word) => material.condition.toLowerCase().includes(word));

/** Words that narrow the table without naming one row. Usual meanings: common practice. */
const NARROWING: readonly (readonly [phrases: string, ids: readonly string[], usual: string])[] = [
  ['steel', [...idsWhere(steels), ...idsWhere(startsWith('ss'))], DEFAULT_MATERIAL_ID],
  ['carbon steel', idsWhere(startsWith('steel-lowC', 'steel-medC')), DEFAULT_MATERIAL_ID],
  [
    'mild steel|mild|low carbon steel|low carbon',
    idsWhere(startsWith('steel-lowC')),
    'steel-lowC-CD',
  ],
  ['medium carbon steel|medium carbon|c45', idsWhere(startsWith('steel-medC')), 'steel-medC-CD'],
  [
    'alloy steel|chromoly|chrome moly|42crmo4|1.7225|scm440|en19|709m40',
    idsWhere(startsWith('steel-CrMo')),
    'steel-CrMo-ann',
  ],
  ['tool steel', idsWhere(startsWith('tool')), 'tool-O1-ann'],
  ['stainless|stainless steel|ss|inox', idsWhere(startsWith('ss')), 'ss304'],
  ['aluminium|aluminum|alu|ally|al', idsWhere((m) => m.group === 'aluminium'), 'al6061-T6'],
  ['brass', idsWhere((m) => m.group === 'brass'), 'brass360'],
  ['bronze', idsWhere((m) => m.group === 'bronze'), 'bronze932'],
  ['copper', idsWhere((m) => m.group === 'copper'), 'copper110'],
  ['titanium|ti', idsWhere((m) => m.group === 'titanium'), 'ti-cp2'],
  [
    'cold drawn|cold rolled|cold finished|cold drawn steel|cold rolled steel|cd|cr|crs',
    idsWhere((m) => steels(m) && inCondition('cold')(m)),
    'steel-lowC-CD',
  ],
  [
    'hot rolled|hot rolled steel|hr|hrs',
    idsWhere((m) => steels(m) && inCondition('hot rolled')(m)),
    'steel-lowC-HR',
  ],
  ['1018|1020', ['steel-lowC-HR', 'steel-lowC-CD'], 'steel-lowC-CD'],
  ['1045', ['steel-medC-HR', 'steel-medC-CD'], 'steel-medC-CD'],
  ['4140', ['steel-CrMo-ann', 'steel-CrMo-PH'], 'steel-CrMo-ann'],
  ['17-4', ['ss17-4-A', 'ss17-4-H1150'], 'ss17-4-A'],
];

/** A condition said with a family it fits: `304 annealed`. Alone it says too little, and is asked. */
const CONDITIONS: readonly (readonly [
  phrases: string,
  ids: readonly string[],
  usual: string | null,
])[] = [
  ['annealed', idsWhere(inCondition('annealed', 'solution')), null],
  [
    'prehard|pre-hard|ph|quenched and tempered|q&t',
    ['steel-CrMo-PH', 'ss17-4-A', 'ss17-4-H1150'],
    'steel-CrMo-PH',
  ],
  ['h1150', ['ss17-4-H1150'], 'ss17-4-H1150'],
  ['as cast|cast', idsWhere(inCondition('cast')), null],
  ['leaded', ['steel-free-Pb', 'bronze932'], null],
  [
    'free machining|free cutting|free-machining|free-cutting',
    ['steel-free-S', 'steel-free-Pb', 'ss303', 'ss416', 'brass360', 'al2011-T3', 'bronze544'],
    null,
  ],
];

const entry = (phrase: string, means: MaterialWords): Entry => ({
  phrase: phraseOf(phrase),
  means,
});

const LEXICON: readonly Entry[] = [
  ...NARROWING.flatMap(([phrases, ids, usual]) =>
    phrases.split('|').map((phrase) => entry(phrase, { ids, usual })),
  ),
  ...CONDITIONS.flatMap(([phrases, ids, usual]) =>
    phrases.split('|').map((phrase) => entry(phrase, { ids, usual })),
  ),
];
const NARROWED = new Set(LEXICON.map((known) => known.phrase.join(' ')));
/** A row's own names; a word that narrows goes before a row that also lists it. */
const NAMED: readonly Entry[] = MATERIALS.flatMap((material) =>
  material.aliases
    .filter((alias) => !NARROWED.has(alias))
    // `2024-t3` is typed `2024 t3` as well.
    .flatMap((alias) => [...new Set([alias, alias.replace(/-(?=t\d)/u, ' ')])])
    .map((alias) => entry(alias, { ids: [material.id], usual: material.id })),
);
const ELSEWHERE: readonly Entry[] = DESIGNATIONS.flatMap(([names, id]) =>
  names.split('|').map((name) => entry(name, { ids: [id], usual: id })),
);
const ENTRIES: readonly Entry[] = [...LEXICON, ...NAMED, ...ELSEWHERE];

/** First words, so that most places in a line cost one look. */
const BY_FIRST_WORD: ReadonlyMap<string, readonly Entry[]> = ENTRIES.reduce(
  (map, known) =>
    map.set(known.phrase[0] ?? '', [...(map.get(known.phrase[0] ?? '') ?? []), known]),
  new Map<string, readonly Entry[]>(),
);

/** Every word of a material's names, for offering the nearest. */
export const MATERIAL_PHRASES: readonly string[] = ENTRIES.map((known) => known.phrase.join(' '));

/** What people call a row of the table, its family's names among them. */
export const materialNames = (id: string): readonly string[] =>
  ENTRIES.filter(({ means }) => means.ids.includes(id)).map((known) => known.phrase.join(' '));

const ROW_OF = new Map(
  MATERIALS.flatMap((row) => row.aliases.map((alias) => [alias, row] as const)),
);

/** A material by each of its names, with the row of the table it stands for. */
export const MATERIAL_OFFERS: readonly Suggestion[] = [...new Set(MATERIAL_PHRASES)].map(
  (words) => {
    const row = ROW_OF.get(words);
    return { label: row === undefined ? words : `${words}: ${row.name}, ${row.condition}`, words };
  },
);

/** `416 rpm` is a speed, not a stainless steel; in `416 rpm 200` the word announces the 200. */
const isQuantity = (cursor: Cursor, used: number): boolean => {
  const last = moved(cursor, used - 1);
  if (!/^\d+$/u.test(textAt(last))) return false;
  const quantity = quantityAt(last);
  if (quantity === null || !quantity.unitApart || textAt(last, quantity.used - 1) === 'in')
    return false;
  const after = moved(last, quantity.used);
  return isAfterComma(after) || quantityAt(after) === null;
};

/** Four-figure inch sizes are measured every day; a metric bar is never 1.4301. */
const isSize = (cursor: Cursor, { phrase }: Entry): boolean =>
  cursor.units === 'in' && LOOKS_LIKE_A_SIZE.test(phrase[0] ?? '');

const ofTable = (cursor: Cursor): Entry | null => {
  let best: Entry | null = null;
  for (const known of BY_FIRST_WORD.get(textAt(cursor)) ?? []) {
    const length = phraseAt(cursor, known.phrase);
    if (length > (best?.phrase.length ?? 0) && !isSize(cursor, known)) best = known;
  }
  return best === null || isQuantity(cursor, best.phrase.length) ? null : best;
};

/** A name the shop has given goes before the general ones, unless they say more. */
const ofShop = (cursor: Cursor, { materials = [] }: Names): Entry | null => {
  let best: Entry | null = null;
  for (const { name, base } of materials) {
    const phrase = tokensOf(name).map((token) => token.text);
    if (phraseAt(cursor, phrase) > (best?.phrase.length ?? 0))
      best = { phrase, means: { ids: [base], usual: base, own: name } };
  }
  return best;
};

export const freeMaterial: Reader<MaterialWords> = (cursor, names) => {
  const general = ofTable(cursor);
  const own = ofShop(cursor, names);
  const longer = own !== null && own.phrase.length >= (general?.phrase.length ?? 0) ? own : general;
  return longer === null ? null : took(longer.means, longer.phrase.length);
};

/** What two words about the material leave together; null where they exclude each other. */
export const narrowed = (a: MaterialWords, b: MaterialWords): MaterialWords | null => {
  const ids = a.ids.filter((id) => b.ids.includes(id));
  // The narrower word knows better what is usually meant.
  const order = a.ids.length <= b.ids.length ? [a, b] : [b, a];
  const usual = order.map((words) => words.usual).find((id) => id !== null && ids.includes(id));
  const only = ids.length === 1 ? (ids[0] ?? null) : null;
  if (ids.length === 0) return null;
  const own = a.own ?? b.own;
  return { ids, usual: usual ?? only, ...(own === undefined ? {} : { own }) };
};
