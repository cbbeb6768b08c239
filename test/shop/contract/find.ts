/** What a shop has told is found again by its words, also where a thumb slipped. */
import { describe, expect, it } from 'vitest';
import {
  addTo,
  dropFromFind,
  type Findable,
  type ForFind,
  type Found,
  findCard,
  findEntries,
  keepCard,
  MACHINES,
  nearestWords,
  putForFind,
  type ShopChange,
  WHEELS,
} from '../../../src/shop/index.ts';
import type { Engine } from '../../../src/store/index.ts';
import { good, newRecords, newShop, START, type TestShop } from '../../support/records.ts';
import { CARD, STRAIGHT, TURRET } from './samples.ts';

const MINUTE = 60_000;

const entry = (id: string, text: string, more: Partial<ForFind> = {}): ForFind => ({
  kind: 'question',
  id,
  code: null,
  at: START,
  approved: false,
  texts: [text],
  ...more,
});

const filled = async (engine: Engine, entries: readonly ForFind[]): Promise<TestShop> => {
  const shop = await newShop((await newRecords(engine)).store);
  await shop.change((change) => putAll(change, entries));
  return shop;
};

const putAll = async (change: ShopChange, entries: readonly ForFind[]): Promise<void> => {
  for (const each of entries) await putForFind(change, each);
};

const ids = (found: readonly Found[]): readonly string[] => found.map(({ id }) => id);

const found = async (shop: TestShop, words: string, kind?: Findable): Promise<readonly string[]> =>
  ids(await findEntries(shop.view, words, { limit: 10, ...(kind === undefined ? {} : { kind }) }));

export const finding = (engine: Engine): void => {
  describe('finding', () => {
    it('forgives one slip anywhere in a word: another letter, one missing, one more, two swapped', async () => {
      const shop = await filled(engine, [entry('a', 'Flaking on the tailstock bracket')]);
      const slips = ['bracket', 'vracket', 'racket', 'bbracket', 'rbacket', 'brackte', 'brackets'];
      for (const word of slips) expect([word, await found(shop, word)]).toEqual([word, ['a']]);
      for (const word of ['brakcte', 'brick', 'et']) {
        expect([word, await found(shop, word)]).toEqual([word, []]);
      }
    });

    it('never takes one digit for another', async () => {
      const shop = await filled(engine, [entry('a', '21 tpi on 0.875'), entry('b', 'job WT-1042')]);
      for (const word of [
        '12',
        '2',
        '211',
        '0.857',
        '0.87',
        'wt-1024',
        'wt1402',
        '1.042',
        '12 tpi',
        '12tpi',
      ]) {
        expect([word, await found(shop, word)]).toEqual([word, []]);
      }
      for (const word of ['21', '21tpi', '21 tpi', '21tip', '.875', '0.8750', '7/8', '0,875']) {
        expect([word, await found(shop, word)]).toEqual([word, ['a']]);
      }
      for (const word of ['wt-1042', 'wt1042', 'WT 1042', '1042', 'wr-1042']) {
        expect([word, await found(shop, word)]).toEqual([word, ['b']]);
      }
    });

    it('shows what has more of the words first, then what is approved, then what is newer', async () => {
      const shop = await filled(engine, [
        entry('old', 'brass knob', { at: START }),
        entry('new', 'brass knob', { at: START + 2 * MINUTE }),
        entry('approved', 'brass knob', { at: START + MINUTE, approved: true }),
        entry('best', 'brass knob for the lid', { at: START - MINUTE }),
        entry('half', 'steel knob', { at: START + 9 * MINUTE, approved: true }),
      ]);
      expect(await found(shop, 'brass knob lid')).toEqual(['best', 'approved', 'new', 'old']);
      expect(await found(shop, 'brass knob')).toEqual(['approved', 'new', 'old', 'best', 'half']);
    });

    it('puts a word that is spelt so before one that is nearly so', async () => {
      const shop = await filled(engine, [
        entry('lamp', 'lamp', { at: START + MINUTE, approved: true }),
        entry('clamp', 'clamp'),
      ]);
      expect(await found(shop, 'clamp')).toEqual(['clamp', 'lamp']);
    });

    it('keeps to a kind when asked, and shows its newest without a word', async () => {
      const shop = await filled(engine, [
        entry('q', 'flaking on 304'),
        entry('r1', 'flaking on 304', { kind: 'result' }),
        entry('r2', 'bent on brass', { kind: 'result', at: START + MINUTE }),
      ]);
      expect(await found(shop, '304', 'result')).toEqual(['r1']);
      expect(await found(shop, '', 'result')).toEqual(['r2', 'r1']);
      expect(await found(shop, '')).toEqual([]);
    });

    it('follows a thing that changes, and forgets one that is gone', async () => {
      const shop = await filled(engine, [entry('a', 'brass knob')]);
      await shop.change((change) => putForFind(change, entry('a', 'steel lever')));
      expect([await found(shop, 'knob'), await found(shop, 'lever')]).toEqual([[], ['a']]);
      await shop.change((change) => dropFromFind(change, 'question', 'a'));
      expect(await found(shop, 'lever')).toEqual([]);
      expect(await nearestWords(shop.view, 'livver')).toEqual([]);
    });

    it('offers the words of the shop that are two slips away', async () => {
      const shop = await filled(engine, [entry('a', 'tailstock quill')]);
      expect(await found(shop, 'tailstck')).toEqual(['a']);
      expect(await nearestWords(shop.view, 'talstck')).toEqual(['tailstock']);
      expect(await nearestWords(shop.view, 'zzzz 21')).toEqual([]);
    });

    it('finds a card by its words, its code, its wheel and machine, and its material in all its names', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const { id, code } = await shop.change(async (change) => {
        const wheel = good(await addTo(change, WHEELS, STRAIGHT)).id;
        const machine = good(await addTo(change, MACHINES, TURRET)).id;
        const request = {
          material: { id: 'ss304' },
          pattern: { kind: 'diamond', points: 'raised' },
          pitch: { system: 'tpi', value: 21 },
        };
        const words = '7/8 diamond 21 tpi 304 on turret 2';
        return await keepCard(change, { ...CARD, words, request, wheel, machine });
      });
      const asked = ['0.875', 'diamond', '21 tpi', '304', 'stainless', 'inox', '1.4301', 'sus304'];
      for (const words of [
        ...asked,
        code,
        code.toLowerCase(),
        'old faithful',
        'turret',
        'raised',
      ]) {
        expect([words, await found(shop, words)]).toEqual([words, [id]]);
      }
      expect(good(await findCard(shop.view, id)).code).toBe(code);
    });

    it('finds the one entry that has all of several common words, however old', async () => {
      const shop = await filled(engine, [entry('wanted', 'brass knob lid')]);
      const many = Array.from({ length: 330 }, (_, at) =>
        entry(`e${String(at)}`, ['brass knob', 'knob lid', 'brass lid'][at % 3] ?? '', {
          at: START + (at + 1) * MINUTE,
        }),
      );
      await shop.change((change) => putAll(change, many));
      expect((await found(shop, 'brass knob lid'))[0]).toBe('wanted');
      expect((await found(shop, 'brass knb lid'))[0]).toBe('wanted');
    });

    it('takes any text for words and nothing for a command', async () => {
      const shop = await filled(engine, [entry('a', '100% brass; "quoted" \\ knob')]);
      const nothing = [
        '',
        ' ',
        '%',
        "'",
        '"; drop table find_entry; --x',
        '_',
        '🙂',
        '\\',
        'the of',
      ];
      for (const words of nothing) expect([words, await found(shop, words)]).toEqual([words, []]);
      for (const words of ['100%', '"quoted"', "knob'", '🙂 brass']) {
        expect([words, await found(shop, words)]).toEqual([words, ['a']]);
      }
      expect(await found(shop, 'brass '.repeat(1_000))).toEqual(['a']);
      expect(await found(shop, `${'x'.repeat(6_000)} knob`)).toEqual(['a']);
      expect(
        await found(shop, Array.from({ length: 800 }, (_, at) => `w${at}y`).join(' ')),
      ).toEqual([]);
    });

    it('knows no other shop: not its entries, and not how it spells', async () => {
      const { store } = await newRecords(engine);
      const [mine, theirs] = [await newShop(store, 'Mine'), await newShop(store, 'Theirs')];
      await theirs.change((change) => putForFind(change, entry('t', 'secret gearbox')));
      await mine.change((change) => putForFind(change, entry('m', 'open drawer')));
      expect(await found(mine, 'gearbox')).toEqual([]);
      expect(await found(mine, 'gearbx drawer')).toEqual(['m']);
      expect(await nearestWords(mine.view, 'geaxxox gearbx sekret')).toEqual([]);
      expect(await nearestWords(theirs.view, 'geaxxox')).toEqual(['gearbox']);
    });
  });
};
