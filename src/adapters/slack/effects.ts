import { z } from 'zod';
import { unreachable } from '../../card/index.ts';
import type { Effect, MessageAddress, Ring, Target } from '../../desk/index.ts';
import { type Book, type SpokenCard, speakCard } from '../../phrases/index.ts';
import type { Delivering, Delivery } from '../common/delivery.ts';
import { sentence } from '../common/spoken.ts';
import { faultText, isRefused } from './faults.ts';
import { type Message, render, type Ring as SlackRing } from './render.ts';
import type { Sender, Sent, Where } from './send.ts';

/** A place as the records name it: a channel, and a thread in it. */
const whereOf = (place: string): Where => {
  const [channel = '', thread = ''] = place.split('/');
  return { channel, thread: thread === '' ? null : thread };
};

const addressOf = ({ channel, message }: Sent, thread: string | null): MessageAddress => ({
  place: `${channel}/${thread ?? ''}`,
  message,
});
const sentOf = ({ place, message }: MessageAddress): Sent => ({
  channel: whereOf(place).channel,
  message,
});

const address = z.object({ place: z.string(), message: z.string() });

/** The message that is meant: it stands already, or the effect before this one left it. */
const addressedBy = ({ message }: Target, earlier: unknown): MessageAddress =>
  message ?? address.parse(earlier);

const ringsOf = ({ people, groups }: Ring): readonly SlackRing[] => [
  ...people.map((user) => ({ user })),
  ...groups.map((group) => ({ group })),
];

const messagesOf = (
  key: string,
  card: SpokenCard,
  ring: Ring = { people: [], groups: [] },
): readonly Message[] => render({ card, of: key, wasPrivate: false, rings: ringsOf(ring) });

/** Each post has a key of its own, so that a second try finds the first. */
const postAll = async (
  sender: Sender,
  where: Where,
  key: string,
  messages: readonly Message[],
  firstTried: number | null,
): Promise<MessageAddress> => {
  let first: Sent | null = null;
  for (const [index, message] of messages.entries()) {
    const sent = await sender.post(where, message, `${key}-${String(index)}`, firstTried);
    first ??= sent;
  }
  if (first === null) throw new Error('a card without a message');
  return addressOf(first, where.thread);
};

const act = async (
  sender: Sender,
  book: Book,
  effect: Effect,
  { earlier, firstTried }: Delivering,
): Promise<unknown> => {
  switch (effect.effect) {
    case 'post': {
      const messages = messagesOf(effect.key, speakCard(book, effect.card), effect.ring);
      const place = effect.place ?? address.parse(earlier).place;
      return await postAll(sender, whereOf(place), effect.key, messages, firstTried);
    }
    case 'pin':
      await sender.pin(sentOf(address.parse(earlier)));
      return earlier;
    case 'unpin': {
      const message = addressedBy(effect, earlier);
      await sender.unpin(sentOf(message));
      return message;
    }
    case 'thread': {
      // A thread begins with what is said in it.
      const above = address.parse(earlier);
      const where = { channel: whereOf(above.place).channel, thread: above.message };
      return await postAll(
        sender,
        where,
        effect.key,
        messagesOf(effect.key, sentence(effect.title)),
        firstTried,
      );
    }
    case 'notify': {
      const messages = messagesOf(effect.key, speakCard(book, effect.card));
      for (const person of effect.people)
        for (const [index, message] of messages.entries())
          await sender.direct(
            person,
            message,
            `${effect.key}-${person}-${String(index)}`,
            firstTried,
          );
      return null;
    }
    case 'edit': {
      const standing = addressedBy(effect, earlier);
      const [message] = messagesOf(effect.key, speakCard(book, effect.card));
      if (message !== undefined) await sender.edit(sentOf(standing), message);
      return standing;
    }
    default:
      return unreachable(effect);
  }
};

/** Makes an effect happen, once: its key tells a second try from a second message. */
export const deliverEffect = async (
  sender: Sender,
  book: Book,
  effect: Effect,
  delivering: Delivering,
): Promise<Delivery> => {
  try {
    return { delivered: true, outcome: await act(sender, book, effect, delivering) };
  } catch (error) {
    const final = isRefused(error, 'notThere', 'gone', 'refused');
    return { delivered: false, fault: faultText(error), final };
  }
};
