import type { ShopWords } from '../../src/shop/index.ts';
import { materialNames, nearestOf, plainText } from '../../src/words/index.ts';
import { numberOf } from '../../src/words/numbers.ts';
import { unitOf } from '../../src/words/unit.ts';

/** How the shop's names are compared: as everything else that people type. */
export const WORDS: ShopWords = { plainText, nearestOf, numberOf, unitOf, materialNames };
