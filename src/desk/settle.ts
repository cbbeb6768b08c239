import { type Card, codedChoices, line, type Part } from '../card/index.ts';
import {
  givenUp,
  givenUpSeen,
  keepCard,
  latestCards,
  oldestPins,
  queueEffects,
  rulesOnCard,
} from '../shop/index.ts';
import type { Place } from './call.ts';
import type { About, Context, Reply } from './command.ts';
import type { Effect } from './effect.ts';
import { queued } from './queued.ts';
import type { Visit } from './visit.ts';

/** A place as the records name it. */
export const placeName = ({ channel, thread }: Pick<Place, 'channel' | 'thread'>): string =>
  `${channel}/${thread ?? ''}`;

/** The last card this person was given in this place. */
export const lastCard = async ({ shop, person }: Visit, place: Place): Promise<Card | null> => {
  const wanted = { limit: 1, madeBy: person.id, place: placeName(place) };
  const [kept] = await latestCards(shop, wanted);
  // What was kept is what was handed in: a card of this program or an older one.
  return kept === undefined ? null : (kept.card as Card);
};

/** The part before which the shop's own words stand: the last that a card says. */
const beforeFooting = (card: Card, part: Part): Card => {
  const footing = card.parts.findIndex((each) => each.part === 'footing');
  const at = footing < 0 ? card.parts.length : footing;
  return { ...card, parts: [...card.parts.slice(0, at), part, ...card.parts.slice(at)] };
};

/** The shop's rules, the card kept under a code of its own, and that code on it. */
const keptCard = async (
  card: Card,
  about: About,
  context: Context,
  visit: Visit,
  program: string,
): Promise<Card> => {
  const rules = await rulesOnCard(visit.shop, about);
  const ruled = rules.length === 0 ? card : beforeFooting(card, { part: 'own', texts: rules });
  const { code } = await keepCard(visit.shop, {
    kind: card.verb,
    place: placeName(context.place),
    words: about.words ?? context.text,
    request: about.request,
    figures: card.figures,
    card: ruled,
    program,
    wheel: about.wheel,
    machine: about.machine,
    material: about.material,
  });
  const coded = { ...ruled, choices: codedChoices(ruled.choices, code) };
  return beforeFooting(coded, { part: 'lines', lines: [line('cardCode', { code })] });
};

/** What could not be delivered is said once, on whatever card comes next. */
const withNotes = async (card: Card, { shop, settings }: Visit): Promise<Card> => {
  const gone = await givenUp(shop);
  const last = gone.at(-1);
  if (last === undefined) return card;
  await givenUpSeen(
    shop,
    gone.map(({ id }) => id),
  );
  const { fault } = last;
  const zone = settings.timeZone;
  const isPin = gone.some(({ effect }) => (effect as Effect).effect === 'pin');
  const pins = isPin ? await oldestPins(shop) : null;
  const lines = [
    line('undelivered', { count: gone.length, fault }),
    ...(pins === null ? [] : [line('oldestPins', { pins: pins.map((pin) => ({ ...pin, zone })) })]),
  ];
  return { ...card, parts: [...card.parts, { part: 'lines', lines }] };
};

/** What is kept of a reply, and what the shop adds to it. Refusals leave nothing. */
export const settled = async (
  reply: Reply,
  context: Context,
  visit: Visit,
  program: string,
): Promise<Reply> => {
  if ('refusal' in reply) return reply;
  const { about, effects } = reply;
  const card =
    about === undefined ? reply.card : await keptCard(reply.card, about, context, visit, program);
  await queueEffects(visit.shop, effects.map(queued));
  const { files } = reply;
  return {
    card: await withNotes(card, visit),
    effects,
    ...(files === undefined ? {} : { files }),
  };
};
