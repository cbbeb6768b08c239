import {
  atLeast,
  type Context,
  placeName,
  type Reply,
  refuse,
  type Visit,
} from '../../src/desk/index.ts';
import type { Suggestion } from '../../src/refusal.ts';
import {
  findCard,
  findResult,
  type KeptCard,
  type KeptResult,
  latestCards,
  latestResults,
  resultName,
  whoMay,
} from '../../src/shop/index.ts';
import type { ResultSaid } from './resultParameters.ts';
import { reworded } from './words.ts';

/** Cards by which a part is made. */
const isForPart = ({ kind }: KeptCard): boolean => kind === 'setup' || kind === 'check';

/** Cards that are looked through for the last one, and those that are offered. Judgement. */
const LOOKED_THROUGH = 20;
const OFFERED = 3;

const offered = (context: Context, cards: readonly KeptCard[]): readonly Suggestion[] =>
  cards.map(({ code, words }) => ({
    label: `${code}: ${words}`,
    words: reworded(context, [], `card ${code}`),
  }));

const noCard = (context: Context, code: string, nearest: readonly string[]): Reply =>
  refuse(
    { code: 'notFound', what: 'setupCard', word: code, nearest },
    nearest.map((near) => ({ label: near, words: reworded(context, ['code'], `card ${near}`) })),
  );

/** The card that was named, or the last one this person was given here. */
export const cardFor = async (
  context: Context,
  { shop, person }: Visit,
  code: string | undefined,
): Promise<KeptCard | Reply> => {
  if (code !== undefined) {
    const found = await findCard(shop, code);
    if (found.ok) return isForPart(found.value) ? found.value : noCard(context, code, []);
    return noCard(context, code, found.refusal.code === 'notFound' ? found.refusal.nearest : []);
  }
  const place = placeName(context.place);
  const own = await latestCards(shop, { limit: LOOKED_THROUGH, madeBy: person.id, place });
  const last = own.find(isForPart);
  if (last !== undefined) return last;
  // A part is often made by a card that somebody else asked for.
  const here = (await latestCards(shop, { limit: LOOKED_THROUGH, place })).filter(isForPart);
  return refuse(
    { code: 'missing', parameter: 'setupCard', examples: ['card K7M2X'] },
    offered(context, here.slice(0, OFFERED)),
  );
};

/** The result that was named, by its number or its card. */
const named = async (
  context: Context,
  { shop }: Visit,
  said: ResultSaid,
): Promise<KeptResult | Reply> => {
  const word = 'number' in said ? `R${String(said.number)}` : said.code;
  const nothing = refuse({ code: 'notFound', what: 'result', word, nearest: [] });
  if ('number' in said) {
    const found = await findResult(shop, said);
    return found.ok ? found.value : nothing;
  }
  const card = await findCard(shop, said.code);
  if (!card.ok) return noCard(context, said.code, []);
  const found = await findResult(shop, { card: card.value.id });
  return found.ok ? found.value : nothing;
};

/** The result that is meant: the one named, else the last this person logged. */
export const resultFor = async (
  context: Context,
  visit: Visit,
  said: ResultSaid | undefined,
): Promise<KeptResult | Reply> => {
  if (said !== undefined) return await named(context, visit, said);
  const { shop, person } = visit;
  const [last] = await latestResults(shop, { limit: 1, madeBy: person.id });
  return last ?? refuse({ code: 'missing', parameter: 'result', examples: ['R12'] });
};

/** The one that waits to be confirmed; of several it has to be said which. */
export const waitingResult = async (
  context: Context,
  visit: Visit,
  said: ResultSaid | undefined,
): Promise<KeptResult | Reply> => {
  if (said !== undefined) return await named(context, visit, said);
  const waiting = await latestResults(visit.shop, { limit: OFFERED, doubted: true });
  const [only] = waiting;
  if (only !== undefined && waiting.length === 1) return only;
  const names = waiting.map(({ number }) => resultName(number));
  return refuse(
    { code: 'missing', parameter: 'result', examples: names.length > 0 ? names : ['R12'] },
    names.map((name) => ({ label: name, words: reworded(context, [], name) })),
  );
};

/** Who has to be asked where somebody wants to change what another has logged; null where nobody. */
export const othersOwn = async (
  { shop, person, role }: Visit,
  result: KeptResult,
): Promise<Reply | null> =>
  result.madeBy === person.id || atLeast(role, 'engineer')
    ? null
    : refuse({ code: 'notAllowed', role: 'engineer', people: await whoMay(shop, 'engineer') });
