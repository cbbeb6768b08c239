import { DEFAULT_MATERIAL_ID, MATERIALS, type Material } from '../calc/materials/index.ts';
import type { Suggestion } from '../refusal.ts';
import { plainText } from './characters.ts';
import { type Cursor, tokenAt } from './cursor.ts';
import { type Names, type Reader, took } from './reading.ts';
import { unitOf } from './unit.ts';

/**
 * What the words so far leave of the materials table. `stainless` leaves all stainless steels and
 * means 304 unless more is said; `303` leaves one.
 */
export type MaterialWords = {
  readonly ids: readonly string[];
  /** The one meant where nothing more is said. */
  readonly usual: string;
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
  ['alloy steel', idsWhere(startsWith('steel-CrMo')), 'steel-CrMo-ann'],
  ['tool steel', idsWhere(startsWith('tool')), 'tool-O1-ann'],
  ['stainless|stainless steel|ss', idsWhere(startsWith('ss')), 'ss304'],
  ['aluminium|aluminum|alu|ally', idsWhere((m) => m.group === 'aluminium'), 'al6061-T6'],
  ['brass', idsWhere((m) => m.group === 'brass'), 'brass360'],
  ['bronze', idsWhere((m) => m.group === 'bronze'), 'bronze932'],
  ['copper', idsWhere((m) => m.group === 'copper'), 'copper110'],
  ['titanium', idsWhere((m) => m.group === 'titanium'), 'ti-cp2'],
  [
    'cold drawn|cold rolled|cold finished|cd|cr|crs',
    idsWhere((m) => steels(m) && inCondition('cold')(m)),
    'steel-lowC-CD',
  ],
  [
    'hot rolled|hr|hrs',
    idsWhere((m) => steels(m) && inCondition('hot rolled')(m)),
    'steel-lowC-HR',
  ],
  ['1018|1020', ['steel-lowC-HR', 'steel-lowC-CD'], 'steel-lowC-CD'],
  ['1045', ['steel-medC-HR', 'steel-medC-CD'], 'steel-medC-CD'],
  ['4140', ['steel-CrMo-ann', 'steel-CrMo-PH'], 'steel-CrMo-ann'],
  ['17-4', ['ss17-4-A', 'ss17-4-H1150'], 'ss17-4-A'],
];

/** A condition said with a family it fits: `304 annealed`. Alone it says too little. */
const CONDITIONS: readonly (readonly [phrases: string, ids: readonly string[]])[] = [
  ['annealed', idsWhere(inCondition('annealed', 'solution'))],
  ['prehard|pre-hard|ph|quenched and tempered|q&t', ['steel-CrMo-PH', 'ss17-4-A', 'ss17-4-H1150']],
  ['h1150', ['ss17-4-H1150']],
  ['as cast|cast', idsWhere(inCondition('cast'))],
  ['leaded', ['steel-free-Pb', 'bronze932']],
  [
    'free machining|free cutting',
    ['steel-free-S', 'steel-free-Pb', 'ss303', 'ss416', 'brass360', 'al2011-T3', 'bronze544'],
  ],
];

const entry = (phrase: string, means: MaterialWords): Entry => ({
  phrase: phrase.split(' '),
  means,
});

const LEXICON: readonly Entry[] = [
  ...NARROWING.flatMap(([phrases, ids, usual]) =>
    phrases.split('|').map((phrase) => entry(phrase, { ids, usual })),
  ),
  ...CONDITIONS.flatMap(([phrases, ids]) =>
    phrases.split('|').map((phrase) => entry(phrase, { ids, usual: ids[0] ?? '' })),
  ),
];
const NARROWED = new Set(LEXICON.map((known) => known.phrase.join(' ')));
/** A row's own names; a word that narrows goes before a row that also lists it. */
const NAMED: readonly Entry[] = MATERIALS.flatMap((material) =>
  material.aliases
    .filter((alias) => !NARROWED.has(alias))
    .map((alias) => entry(alias, { ids: [material.id], usual: material.id })),
);
const ENTRIES: readonly Entry[] = [...LEXICON, ...NAMED];

/** First words, so that most places in a line cost one look. */
const BY_FIRST_WORD: ReadonlyMap<string, readonly Entry[]> = ENTRIES.reduce(
  (map, known) =>
    map.set(known.phrase[0] ?? '', [...(map.get(known.phrase[0] ?? '') ?? []), known]),
  new Map<string, readonly Entry[]>(),
);

/** Every word of a material's names, for offering the nearest. */
export const MATERIAL_PHRASES: readonly string[] = ENTRIES.map((known) => known.phrase.join(' '));

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

/** Numbers that a hardness can be, on either scale. */
const [SOFTEST, HARDEST] = [5, 750];

/** `416 rpm` is a speed, not a stainless steel. */
const isQuantity = (cursor: Cursor, used: number): boolean => {
  const last = tokenAt(cursor, used - 1);
  const next = tokenAt(cursor, used);
  const unit = next === undefined ? null : unitOf(next.text);
  if (last === undefined || !/^\d+$/u.test(last.text) || unit === null) return false;
  // In `1018 turns 18` the word announces the number behind it, unless that is a material too.
  const behind = tokenAt(cursor, used + 1)?.text ?? '';
  if (/^\d/u.test(behind) && !BY_FIRST_WORD.has(behind)) return false;
  // In `4140 HB 210` the scale belongs to the number behind it.
  const isScale = unit.measure === 'hb' || unit.measure === 'hrc';
  const hardness = isScale ? Number(tokenAt(cursor, used + 1)?.text) : Number.NaN;
  return next?.text !== 'in' && !(hardness >= SOFTEST && hardness <= HARDEST);
};

const ofTable: Reader<MaterialWords> = (cursor) => {
  const first = tokenAt(cursor);
  if (first === undefined) return null;
  let best: Entry | null = null;
  for (const known of BY_FIRST_WORD.get(first.text) ?? []) {
    const stands = known.phrase.every((word, i) => tokenAt(cursor, i)?.text === word);
    if (stands && known.phrase.length > (best?.phrase.length ?? 0)) best = known;
  }
  if (best === null || isQuantity(cursor, best.phrase.length)) return null;
  return took(best.means, best.phrase.length);
};

/** A name the shop has given goes before the general ones, unless they say more. */
const ofShop = (cursor: Cursor, { materials = [] }: Names): Entry | undefined =>
  materials
    .map(({ name, base }) =>
      entry(plainText(name).trim().replaceAll(/\s+/gu, ' '), {
        ids: [base],
        usual: base,
        own: name,
      }),
    )
    .filter((known) => known.phrase.every((word, i) => tokenAt(cursor, i)?.text === word))
    .sort((a, b) => b.phrase.length - a.phrase.length)[0];

export const freeMaterial: Reader<MaterialWords> = (cursor, names) => {
  const own = ofShop(cursor, names);
  const general = ofTable(cursor, names);
  const used = general !== null && 'used' in general ? general.used : 0;
  return own !== undefined && own.phrase.length >= used
    ? took(own.means, own.phrase.length)
    : general;
};

/** What two words about the material leave together; null where they exclude each other. */
export const narrowed = (a: MaterialWords, b: MaterialWords): MaterialWords | null => {
  const ids = a.ids.filter((id) => b.ids.includes(id));
  // The narrower word knows better what is usually meant.
  const order = a.ids.length <= b.ids.length ? [a, b] : [b, a];
  const usual = order.map((words) => words.usual).find((id) => ids.includes(id)) ?? ids[0];
  const own = a.own ?? b.own;
  if (usual === undefined) return null;
  return own === undefined ? { ids, usual } : { ids, usual, own };
};
