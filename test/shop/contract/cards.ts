/** Cards: kept as they were made, found by a code that was heard over a machine. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { misheard, newCode } from '../../../src/shop/codes.ts';
import { CODE_SIGNS, findCard, keepCard, latestCards, readCode } from '../../../src/shop/index.ts';
import type { Engine } from '../../../src/store/index.ts';
import { quantityAt, tokensOf } from '../../../src/words/index.ts';
import { good, newRecords, newShop, person, refusalOf, START } from '../../support/records.ts';
import { CARD } from './samples.ts';

export const cards = (engine: Engine): void => {
  describe('cards', () => {
    it('come back as they were kept, by code and by id', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const { id, code } = await shop.change((change) => keepCard(change, CARD));
      const card = good(await findCard(shop.view, code));
      expect(card).toMatchObject({ ...CARD, id, code, madeAt: START });
      expect(good(await findCard(shop.view, id))).toEqual(card);
    });

    it('are found by a code as people write and say it', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const { code } = await shop.change((change) => keepCard(change, CARD));
      const lower = code.toLowerCase();
      for (const typed of [
        lower,
        ` ${lower} `,
        `${code.slice(0, 2)}-${code.slice(2)}`,
        `#${code}`,
      ]) {
        expect(good(await findCard(shop.view, typed)).code).toBe(code);
      }
    });

    it('offer the cards whose code differs in one letter, and none that differs in a digit', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const { code } = await shop.change((change) => keepCard(change, CARD));
      const [heard = ''] = misheard(code);
      const near = { code: 'notFound', what: 'card', nearest: [code] };
      expect(refusalOf(await findCard(shop.view, heard))).toEqual(near);
      const digit = /\d/u.exec(code)?.[0] ?? '';
      const other = code.replace(digit, digit === '2' ? '3' : '2');
      expect(refusalOf(await findCard(shop.view, other))).toEqual({ ...near, nearest: [] });
      expect(refusalOf(await findCard(shop.view, 'what card'))).toEqual({ ...near, nearest: [] });
    });

    it('are listed newest first, of one person or of all, page by page', async () => {
      const shop = await newShop((await newRecords(engine)).store);
      const codes: string[] = [];
      for (const [at, who] of ['Ada', 'Ben', 'Ada', 'Ben', 'Ben'].entries()) {
        const kept = await shop.changeBy(person(who), (c) => keepCard(c, CARD), START + at);
        codes.unshift(kept.code);
      }
      const all = await latestCards(shop.view, { limit: 10 });
      expect(all.map(({ code }) => code)).toEqual(codes);
      const [first, second] = await latestCards(shop.view, { limit: 2 });
      const next = await latestCards(shop.view, { limit: 2, before: second?.id ?? '' });
      expect(next.map(({ code }) => code)).toEqual(codes.slice(2, 4));
      const ben = await latestCards(shop.view, { limit: 10, madeBy: first?.madeBy ?? '' });
      expect(ben.map(({ code }) => code)).toEqual([codes[0], codes[1], codes[3]]);
    });
  });
};

/** The same for every engine. */
export const codes = (): void => {
  describe('codes', () => {
    it('hold nothing that is easily taken for something else', () => {
      expect(CODE_SIGNS).not.toMatch(/[0O1IL5S]/u);
      expect(new Set(CODE_SIGNS).size).toBe(CODE_SIGNS.length);
    });

    it('are read back as they were made, and are never a number, a word or a size', () => {
      for (let count = 0; count < 2000; count += 1) {
        const code = newCode(5 + (count % 4));
        expect(readCode(code.toLowerCase())).toBe(code);
        expect(code).toMatch(/\d/u);
        expect(code).toMatch(/[A-Z]/u);
        // `263FT` was once given out, and read as so many feet.
        const cursor = { text: code, tokens: tokensOf(code), at: 0, units: 'in' } as const;
        expect([code, quantityAt(cursor)?.unit ?? null]).toEqual([code, null]);
      }
    });

    it('are not seen in what people type besides', () => {
      const lines = ['1 in', '21 tpi', 'hello', '0.9852', 'wheel', '', '12345', 'straight 21 tpi'];
      for (const line of lines) expect([line, readCode(line)]).toEqual([line, null]);
      fc.assert(
        fc.property(fc.string(), (typed) => {
          const code = readCode(typed);
          return code === null || Array.from(code).every((sign) => CODE_SIGNS.includes(sign));
        }),
      );
    });
  });
};
