import { unreachable } from '../../card/index.ts';
import type { Effect, MessageAddress, Ring } from '../../desk/index.ts';
import { type Book, type SpokenCard, speakCard } from '../../phrases/index.ts';
import type { Delivering, Delivery } from '../common/delivery.ts';
import { sentence } from '../common/spoken.ts';
import type { Sent } from './channels.ts';
import { faultText, isFinal, isRefused } from './faults.ts';
import { LIMITS } from './limits.ts';
import { addressIn, addressOf, channelOf, placeOf, sentOf, whereOf } from './places.ts';
import { type Message, render } from './render.ts';
import type { Sender } from './send.ts';

/** What stands in the way of an effect for good, in words. */
class Never extends Error {}

export type Delivers = {
  readonly sender: Sender;
  readonly book: Book;
  /** The server of a channel, where the client has heard of it. */
  readonly guildOf: (channel: string) => string | null;
};

type At = Delivers & Delivering;

/** No shop's message ever goes into another shop's server. */
const ownChannel = async (
  { sender, book, guildOf, shop }: At,
  channel: string,
): Promise<string> => {
  const guild = guildOf(channel) ?? (await sender.guildOf(channel));
  if (guild !== shop) throw new Never(book.discord.faults.notThere);
  return channel;
};

const messagesOf = (
  key: string,
  card: SpokenCard,
  { ring, shop }: { ring?: Ring | undefined; shop?: string } = {},
): readonly Message[] =>
  render({
    card,
    of: key,
    isPrivate: false,
    wasPrivate: false,
    ...(shop === undefined ? {} : { shop }),
    ...(ring === undefined ? {} : { rings: { users: ring.people, roles: ring.groups } }),
  });

/** Each post has a key of its own, so that a second try finds the first. */
const postAll = async (
  at: At,
  channel: string,
  key: string,
  messages: readonly Message[],
): Promise<Sent> => {
  let first: Sent | null = null;
  for (const [index, message] of messages.entries()) {
    const own = `${at.shop} ${key} ${String(index)}`;
    const sent = await at.sender.post(channel, message, own, { firstTried: at.firstTried });
    first ??= sent;
  }
  if (first === null) throw new Error('a card without a message');
  return first;
};

const said = async (
  at: At,
  place: string,
  key: string,
  messages: readonly Message[],
): Promise<MessageAddress> => {
  const channel = await ownChannel(at, channelOf(whereOf(place)));
  return addressOf(place, await postAll(at, channel, key, messages));
};

/** How many of the oldest pins are named where there is no room for one more. Judgement. */
const PINS_NAMED = 2;

const pin = async (at: At, message: MessageAddress): Promise<void> => {
  const { sender, book } = at;
  const { channel, message: id } = sentOf(message);
  try {
    await sender.pin({ channel: await ownChannel(at, channel), message: id });
  } catch (error) {
    if (!isRefused(error, 'pinsFull')) throw error;
    // None is taken off by itself: whoever keeps the channel chooses.
    const oldest = await sender.oldestPins(channel, PINS_NAMED).catch(() => []);
    throw new Never(book.discord.faults.pinsFull(LIMITS.pins, oldest));
  }
};

/**
 * Opens a thread under a message. In a thread there is none to open, and where the channel allows
 * none what belongs together stays together in the channel; then the title is said by itself.
 */
const thread = async (
  at: At,
  { key, title }: Extract<Effect, { readonly effect: 'thread' }>,
  above: MessageAddress,
): Promise<MessageAddress> => {
  const where = whereOf(above.place);
  const titled = (place: string) => said(at, place, key, messagesOf(key, sentence(title)));
  if (where.thread !== null) return await titled(above.place);
  const name = title.replaceAll(/\s+/gu, ' ').trim();
  const { channel, message } = sentOf(above);
  try {
    const opened = { channel: await ownChannel(at, channel), message };
    const place = placeOf({ channel, thread: await at.sender.thread(opened, name) });
    return name.length <= LIMITS.threadName ? { place, message } : await titled(place);
  } catch (error) {
    if (!isRefused(error, 'noThreadHere', 'missingPermission', 'missingAccess')) throw error;
    return await titled(above.place);
  }
};

/** To each of them alone; one who cannot be reached keeps nobody else from it. */
const notify = async (
  at: At,
  { key, people, card }: Extract<Effect, { readonly effect: 'notify' }>,
): Promise<void> => {
  const { sender, book, shop } = at;
  const { closed, notMember } = book.discord.faults;
  const messages = messagesOf(key, speakCard(book, card), { shop });
  const unreached: string[] = [];
  for (const person of people) {
    const member = await sender.member(shop, person);
    // Whoever has left the server hears no more of the shop.
    if (member === null) {
      unreached.push(notMember(person));
      continue;
    }
    try {
      await postAll(at, await sender.directChannel(person), key, messages);
    } catch (error) {
      if (!isRefused(error, 'cannotSendToPerson')) throw error;
      unreached.push(closed(member.name));
    }
  }
  if (unreached.length > 0) throw new Never(unreached.join(book.discord.faults.and));
};

/** What stands is changed in place; what does not fit there any more follows it. */
const edit = async (
  at: At,
  { key, card }: Extract<Effect, { readonly effect: 'edit' }>,
  standing: MessageAddress,
): Promise<void> => {
  const [message, ...rest] = messagesOf(key, speakCard(at.book, card));
  const { channel, message: id } = sentOf(standing);
  const own = await ownChannel(at, channel);
  if (message !== undefined) await at.sender.edit({ channel: own, message: id }, message);
  if (rest.length > 0) await postAll(at, own, key, rest);
};

const act = async (at: At, effect: Effect): Promise<unknown> => {
  const { earlier, book } = at;
  switch (effect.effect) {
    case 'post': {
      const messages = messagesOf(effect.key, speakCard(book, effect.card), { ring: effect.ring });
      return await said(at, effect.place ?? addressIn(earlier).place, effect.key, messages);
    }
    case 'pin':
      await pin(at, addressIn(earlier));
      return earlier;
    case 'unpin': {
      const message = effect.message ?? addressIn(earlier);
      const { channel, message: id } = sentOf(message);
      await at.sender.unpin({ channel: await ownChannel(at, channel), message: id });
      return message;
    }
    case 'thread':
      return await thread(at, effect, addressIn(earlier));
    case 'notify':
      await notify(at, effect);
      return null;
    case 'edit': {
      const standing = effect.message ?? addressIn(earlier);
      await edit(at, effect, standing);
      return standing;
    }
    default:
      return unreachable(effect);
  }
};

/** Why it was refused, in words where there are better ones than the platform's. */
const faultOf = (error: unknown, book: Book): string => {
  const { notThere, noPermission, messageGone } = book.discord.faults;
  if (error instanceof Never) return error.message;
  if (isRefused(error, 'unknownChannel', 'unknownGuild', 'missingAccess')) return notThere;
  if (isRefused(error, 'missingPermission')) return noPermission;
  if (isRefused(error, 'unknownMessage')) return messageGone;
  return faultText(error);
};

/** Makes an effect happen, once: its key tells a second try from a second message. */
export const deliverEffect = async (
  delivers: Delivers,
  effect: Effect,
  delivering: Delivering,
): Promise<Delivery> => {
  try {
    return { delivered: true, outcome: await act({ ...delivers, ...delivering }, effect) };
  } catch (error) {
    const fault = faultOf(error, delivers.book);
    return { delivered: false, fault, final: error instanceof Never || isFinal(error) };
  }
};
