import type { Card, Line } from '../../src/card/index.ts';
import { type Context, cardReply, type Reply, route, type Visit } from '../../src/desk/index.ts';
import {
  cardById,
  findIn,
  type KeptCard,
  type Logged,
  resultById,
  resultName,
  WHEELS,
} from '../../src/shop/index.ts';
import { tokensOf } from '../../src/words/index.ts';
import { resultCard, type Told } from './resultCard.ts';
import { SPOKEN } from './troubleParameters.ts';

/** The words of a card's line without the name of its verb. */
const wordsOf = ({ fleet }: Context, { words }: KeptCard): string => {
  const way = route(words, fleet);
  const skip = 'command' in way ? way.skip : 0;
  return words.slice(tokensOf(words)[skip]?.start ?? words.length);
};

const measured = ({ result }: Logged): string =>
  [
    result.teeth === null ? '' : `count ${String(result.teeth)}`,
    result.crest === null ? '' : `crest ${String(Number(result.crest.toFixed(4)))} mm`,
    result.toothHeight === null ? '' : `height ${String(Number(result.toothHeight.toFixed(4)))} mm`,
  ]
    .filter((words) => words !== '')
    .join(' ');

type Asked = { readonly trouble: Card | null; readonly troubleWords: string | null };

const NO_TROUBLE: Asked = { trouble: null, troubleWords: null };

/** What trouble says of the card and what was measured; of the card alone where that is too much. */
const troubleOf = async (context: Context, logged: Logged, card: KeptCard): Promise<Asked> => {
  const { symptom } = logged.result;
  const phrase = symptom === null ? undefined : SPOKEN[symptom][0];
  if (phrase === undefined) return NO_TROUBLE;
  const asked = `/knurl trouble ${phrase} ${wordsOf(context, card)}`;
  for (const troubleWords of [`${asked} ${measured(logged)}`.trim(), asked]) {
    const reply = await context.again(troubleWords);
    if ('card' in reply) return { trouble: reply.card, troubleWords };
  }
  return NO_TROUBLE;
};

const namesOf = async (visit: Visit, ids: readonly string[]): Promise<readonly string[]> => {
  const names: string[] = [];
  for (const id of ids) {
    const other = await resultById(visit.shop, id);
    if (other !== null) names.push(resultName(other.number));
  }
  return names;
};

const wheelName = async ({ shop }: Visit, id: string | null): Promise<string | null> => {
  if (id === null) return null;
  const found = await findIn(shop, WHEELS, id);
  return found.ok ? found.value.name : null;
};

/** The reply to whatever was done to a result. */
export const resultReply = async (
  context: Context,
  visit: Visit,
  did: Told['did'],
  logged: Logged,
  besides: { readonly worn?: number; readonly history?: readonly Line[] } = {},
): Promise<Reply> => {
  const card = await cardById(visit.shop, logged.result.card);
  if (card === null) throw new Error('a result without its card');
  const learned = await namesOf(visit, logged.others.learned);
  const doubted = await namesOf(visit, logged.others.doubted);
  return cardReply(
    resultCard({
      context,
      did,
      logged,
      card,
      others: { learned, doubted },
      wheel: await wheelName(visit, logged.result.wheel),
      worn: besides.worn ?? 0,
      ...(await troubleOf(context, logged, card)),
      history: besides.history ?? [],
    }),
  );
};
