/** Among a hundred thousand entries the one that was meant, also where a thumb slipped. */
import { describe, expect, it, onTestFinished } from 'vitest';
import { findEntries } from '../../src/shop/index.ts';
import type { Engine } from '../../src/store/index.ts';
import { ENGINES, newPlace } from '../support/places.ts';
import { toldShop, wantedId } from '../support/told/filled.ts';
import { ASKED } from '../support/told/index.ts';

const ENTRIES = 100_000;
const FIRST = 3;
/** So many of the fifty questions have to find theirs among the first three. */
const LEAST_FOUND = 45;

/** Asked of what a shop says every day: very many fit, and the newest are shown. */
const EVERYDAY = [
  'brass',
  'straight 21 tpi 1018',
  'bevel jig lever 303',
  'pepper mill lid bras diamond 0.8',
  'flaking stainless ada',
  'double track big lathe',
  '7/8 4140 trurret',
  'J-61234',
];

const MINUTES = 4;

const everythingFound = async (engine: Engine): Promise<readonly (readonly string[])[]> => {
  const place = await newPlace(engine);
  onTestFinished(place.remove);
  const { store, view } = await toldShop(place, ENTRIES);
  onTestFinished(store.close);
  const found: (readonly string[])[] = [];
  for (const words of [...ASKED.map(([, asked]) => asked), ...EVERYDAY]) {
    found.push((await findEntries(view, words, { limit: 10 })).map(({ id }) => id));
  }
  return found;
};

describe('among a hundred thousand entries', () => {
  it('finds what was meant among the first three, and on both engines the same', {
    timeout: MINUTES * 60_000,
  }, async () => {
    expect(ASKED).toHaveLength(50);
    const onEngines: (readonly (readonly string[])[])[] = [];
    for (const engine of ENGINES) onEngines.push(await everythingFound(engine));
    for (const found of onEngines) {
      const missed = ASKED.filter((_, at) => !found[at]?.slice(0, FIRST).includes(wantedId(at)));
      expect(missed.length, JSON.stringify(missed)).toBeLessThanOrEqual(ASKED.length - LEAST_FOUND);
      expect(found.slice(ASKED.length).every((ids) => ids.length > 0)).toBe(true);
    }
    expect(onEngines[1]).toEqual(onEngines[0]);
  });

  it('is asked with words of which one each is misspelt', () => {
    const wordsOf = (text: string): readonly string[] =>
      text.toLowerCase().match(/[\p{L}\p{N}]+/gu) ?? [];
    for (const [told, asked] of ASKED) {
      const said = new Set(wordsOf(told));
      expect([asked, wordsOf(asked).filter((word) => !said.has(word)).length]).toEqual([asked, 1]);
    }
  });
});
