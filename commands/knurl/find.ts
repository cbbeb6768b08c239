import { z } from 'zod';
import { type Choice, type FoundKind, label, line, row } from '../../src/card/index.ts';
import {
  type Context,
  cardReply,
  defineCommand,
  type Lead,
  type Reply,
  refuse,
  said,
  type Visit,
} from '../../src/desk/index.ts';
import { type Found, findEntries, hasWords, nearestWords } from '../../src/shop/index.ts';
import { textOf, tokenAt, vocabularyOf } from '../../src/words/index.ts';
import { shopCard, visiting } from '../shop/visit.ts';
import { foundThing, type Openable, openChoice } from './foundThings.ts';

/** Most that one answer shows. Judgement: a phone's screen, scrolled once or twice. */
const SHOWN = 8;

/** Longest that is looked for. Judgement: more words find less. */
const LONGEST = 200;

const EXAMPLES = ['flaking 304', 'results brass', 'standard WT-1042'] as const;

/** May stand before what is looked for; a form says it. */
const KEYWORD = 'for';

const NO_WORDS = vocabularyOf([]);

const wanted = said<string>({
  name: 'wanted',
  read: textOf(() => NO_WORDS),
  keywords: [KEYWORD],
  text: true,
  examples: EXAMPLES,
});

/** Quotation marks around the whole say nothing more. */
const unquoted = (text: string): string => text.replace(/^"(?<inside>[^"]*)"$/u, '$<inside>');

/** Everything behind the verb is what is looked for, whatever it may mean elsewhere. */
const everything: Lead = (cursor) => {
  const skipped = tokenAt(cursor)?.text === KEYWORD ? 1 : 0;
  if (tokenAt(cursor, skipped) === undefined) return null;
  // From the end of the word before, so that a quotation mark that touches the first is not lost.
  const start = tokenAt(cursor, skipped - 1)?.end ?? 0;
  const text = cursor.text.slice(start).trim();
  return { value: unquoted(text), used: cursor.tokens.length - cursor.at };
};

/** Words that say what kind of thing is looked for. */
const KIND_WORDS: Readonly<Record<string, FoundKind>> = {
  card: 'card',
  cards: 'card',
  standard: 'standard',
  standards: 'standard',
  question: 'question',
  questions: 'question',
  answer: 'question',
  answers: 'question',
  result: 'result',
  results: 'result',
};

type Asked = { readonly words: string; readonly kind: FoundKind | null };

/** `standard 304`, `304 results`: the kind stands first or last. */
const askedFor = (text: string): Asked => {
  const words = text.trim().split(/\s+/u);
  const kindOf = (word = ''): FoundKind | undefined => KIND_WORDS[word.toLowerCase()];
  const first = kindOf(words[0]);
  if (first !== undefined) return { words: words.slice(1).join(' '), kind: first };
  const last = kindOf(words.at(-1));
  if (last !== undefined) return { words: words.slice(0, -1).join(' '), kind: last };
  return { words: text.trim(), kind: null };
};

const look = async (visit: Visit, { words, kind }: Asked): Promise<readonly Found[]> =>
  await findEntries(visit.shop, words, {
    limit: SHOWN + 1,
    ...(kind === null ? {} : { kind }),
  });

const thingsOf = async (visit: Visit, found: readonly Found[]): Promise<readonly Openable[]> => {
  const things: Openable[] = [];
  for (const each of found) {
    const thing = await foundThing(visit, each);
    if (thing !== null) things.push(thing);
  }
  return things;
};

/** The same question with the misspelt word as the shop writes it. */
const insteadChoices = (nearest: readonly string[]): readonly Choice[] =>
  nearest.map((word) => ({ label: label('findInstead', { word }), words: `/knurl find ${word}` }));

const nothingFound = async (context: Context, visit: Visit, asked: Asked): Promise<Reply> => {
  const nearest = await nearestWords(visit.shop, asked.words);
  return cardReply(
    shopCard(context, {
      verb: 'find',
      headline: line('foundNothing', asked),
      lines: [
        ...(nearest.length === 0 ? [] : [line('foundNearest', { nearest })]),
        line('foundHow', {}),
      ],
      choices: insteadChoices(nearest),
      lists: { found: [] },
    }),
  );
};

const foundCard = (
  context: Context,
  things: readonly Openable[],
  { kind }: Asked,
  isOther: boolean,
): Reply => {
  const shown = things.slice(0, SHOWN);
  const more = things.length > SHOWN;
  const first = shown[0]?.thing.kind ?? null;
  const isOfKind = shown.every(({ thing }) => thing.kind === first) ? first : null;
  return cardReply(
    shopCard(context, {
      verb: 'find',
      headline: line('found', { count: shown.length, more, kind: isOfKind }),
      lines: isOther && kind !== null ? [line('foundOthers', { kind })] : [],
      rows: shown.map(({ thing }) => row('foundThing', thing)),
      after: more ? [line('foundMore', {})] : [],
      choices: shown.map(openChoice),
      lists: { found: shown.map(({ thing }) => thing) },
    }),
  );
};

/** Cards, standards, questions and results by words; past a slip of the thumb. */
export const find = defineCommand({
  path: ['knurl', 'find'],
  examples: EXAMPLES.map((example) => `/knurl find ${example}`),
  parameters: z.object({ wanted }),
  lead: { name: 'wanted', read: everything },
  allowed: 'operator',
  run: (context, said) =>
    visiting(context, async (visit) => {
      const text = said.wanted ?? '';
      const value = Array.from(text).length;
      if (value > LONGEST)
        return refuse({
          code: 'outOfRange',
          what: 'wanted',
          value,
          min: 1,
          max: LONGEST,
          unit: 'characters',
        });
      const asked = askedFor(text);
      if (!hasWords(asked.words) && asked.kind === null)
        return refuse({ code: 'missing', parameter: 'wanted', examples: EXAMPLES });
      const things = await thingsOf(visit, await look(visit, asked));
      if (things.length > 0) return foundCard(context, things, asked, false);
      const other = { words: text, kind: null };
      const others =
        asked.kind === null || !hasWords(asked.words)
          ? []
          : await thingsOf(visit, await look(visit, other));
      return others.length > 0
        ? foundCard(context, others, asked, true)
        : await nothingFound(context, visit, asked);
    }),
});
