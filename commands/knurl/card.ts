import { z } from 'zod';
import type { Figure, FigureName, Figures } from '../../src/calc/index.ts';
import { type Card, codedChoices, label, line, type Part, row } from '../../src/card/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  type Reply,
  refuse,
  said,
  type Visit,
} from '../../src/desk/index.ts';
import { findCard, type KeptCard, personById } from '../../src/shop/index.ts';
import { tokenAt } from '../../src/words/index.ts';
import { readCodeAt } from './codeWords.ts';
import { askedAbout } from './questions/index.ts';

const EXAMPLE = 'K7M2X';

const code = said<string>({
  name: 'code',
  read: readCodeAt,
  keywords: ['code', 'card'],
  suggests: 'cards',
  examples: [EXAMPLE],
});

/** A figure may come out a hair different on another machine; that is no other figure. */
const HAIR = 1e-9;

const same = (a: Figure | null | undefined, b: Figure | null | undefined): boolean => {
  if (!a || !b) return !a && !b;
  return a.unit === b.unit && Math.abs(a.value - b.value) <= HAIR * Math.max(1, Math.abs(a.value));
};

/** Figures that are not what they were, with both. */
const changes = (before: Figures, after: Figures) => {
  const names = [...new Set([...Object.keys(before), ...Object.keys(after)])] as FigureName[];
  return names
    .filter((name) => !same(before[name], after[name]))
    .map((name) => ({ name, before: before[name] ?? null, after: after[name] ?? null }));
};

/** What is said of a kept card before it is shown again. */
const today = async (context: Context, kept: KeptCard): Promise<readonly Part[]> => {
  const now = await context.again(kept.words);
  if ('refusal' in now) return [{ part: 'lines', lines: [line('cardNotToday', {})] }];
  const differing = changes(kept.figures as Figures, now.card.figures);
  if (differing.length === 0) return [{ part: 'lines', lines: [line('cardSame', {})] }];
  return [
    { part: 'lines', lines: [line('cardDiffers', { count: differing.length })] },
    { part: 'rows', rows: differing.map((each) => row('figureChanged', each)) },
  ];
};

const shownAgain = async (context: Context, visit: Visit, kept: KeptCard): Promise<Reply> => {
  const { settings, shop } = visit;
  const by = (await personById(shop, kept.madeBy))?.name ?? '';
  const { code: of, program, madeAt: at } = kept;
  const again = line('cardAgain', { code: of, by, program, at, zone: settings.timeZone });
  const card = kept.card as Card;
  const isWordsOfToday = { label: label('today', {}), words: kept.words };
  return cardReply({
    ...card,
    parts: [
      { part: 'lines', lines: [again] },
      ...(await today(context, kept)),
      ...(await askedAbout(shop, kept)),
      ...card.parts,
    ],
    choices: [isWordsOfToday, ...codedChoices(card.choices, of)],
  });
};

/** One card again, and whether it would come out the same today. */
export const card = defineCommand({
  path: ['knurl', 'card'],
  examples: [`/knurl card ${EXAMPLE}`],
  parameters: z.object({ code }),
  lead: { name: 'code', read: (cursor) => lead(cursor) },
  allowed: 'operator',
  run: async (context, given) => {
    const { visit } = context;
    if (visit === null) {
      return refuse({ code: 'unavailable', what: 'records', words: context.text });
    }
    if (given.code === undefined) {
      return refuse({ code: 'missing', parameter: 'code', examples: [EXAMPLE] });
    }
    const found = await findCard(visit.shop, given.code);
    if (found.ok) return await shownAgain(context, visit, found.value);
    const { refusal } = found;
    if (refusal.code !== 'notFound') return refuse(refusal);
    const choices = refusal.nearest.map((each) => ({ label: each, words: `/knurl card ${each}` }));
    return refuse({ ...refusal, word: given.code }, choices);
  },
});

const lead = (cursor: Parameters<typeof tokenAt>[0]) => {
  const word = tokenAt(cursor)?.text;
  // `code K7M2X`, as a form says it, is read with its keyword.
  if (word === undefined || word === 'code' || word === 'card') return null;
  const reading = readCodeAt(cursor, { wheels: [], machines: [] });
  return reading === null || 'refusal' in reading ? null : reading;
};
