import { materialById } from '../calc/index.ts';
import type { ShopChange } from './view.ts';

/** What of a card its words are taken from. */
type Told = {
  readonly kind: string;
  readonly words: string;
  readonly request: unknown;
  readonly wheel: string | null;
  readonly machine: string | null;
  readonly material: string | null;
};

type Known = Readonly<Record<string, unknown>>;

const isKnown = (value: unknown): value is Known => typeof value === 'object' && value !== null;

const within = (value: unknown, name: string): unknown =>
  isKnown(value) ? value[name] : undefined;

/** The words and numbers in a piece of a request. */
const saidIn = (value: unknown): readonly string[] => {
  if (typeof value === 'string' || typeof value === 'number') return [String(value)];
  return isKnown(value) ? Object.values(value).flatMap(saidIn) : [];
};

const pitchText = (pitch: unknown): string =>
  saidIn([within(pitch, 'value'), within(pitch, 'system')]).join(' ');

const idOf = (material: unknown): string => {
  const id = within(material, 'id');
  return typeof id === 'string' ? id : '';
};

/** What a card is found by: the person's own words, and what they stand for in all its names. */
export const cardTexts = async (change: ShopChange, told: Told): Promise<readonly string[]> => {
  const { request } = told;
  const id = idOf(within(request, 'material'));
  const material = materialById(id);
  return [
    told.words,
    told.kind,
    ...saidIn(within(request, 'pattern')),
    pitchText(within(request, 'pitch')),
    ...(await namesOf(change, told)),
    ...(material === undefined ? [] : [material.name, material.condition, material.group]),
    ...change.words.materialNames(id),
  ];
};

/** Names of what the shop's lists gave to it. */
const namesOf = async ({ db, id: shop }: ShopChange, told: Told): Promise<readonly string[]> => {
  const names: string[] = [];
  for (const list of ['wheel', 'machine', 'material'] as const) {
    const id = told[list];
    if (id === null) continue;
    const row = await db
      .selectFrom(list)
      .select('name')
      .where('shop', '=', shop)
      .where('id', '=', id)
      .executeTakeFirst();
    if (row !== undefined) names.push(row.name);
  }
  return names;
};
