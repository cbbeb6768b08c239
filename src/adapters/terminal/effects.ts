import { createHash } from 'node:crypto';
import { z } from 'zod';
import { unreachable } from '../../card/index.ts';
import type { Effect, MessageAddress, Ring } from '../../desk/index.ts';
import { type Book, speakCard } from '../../phrases/index.ts';
import type { Delivering, Delivery } from '../common/delivery.ts';
import { nameOf } from './speaker.ts';

/** A message of the local channel; what it says is remembered by whoever waits for it. */
const message = z.object({
  place: z.string(),
  message: z.string(),
  says: z.string().optional(),
});
type Standing = z.infer<typeof message>;

/** Signs of a message's name: enough for a shop that is played in one terminal. Judgement. */
const SIGNS = 4;

/** The name of the message that an effect leaves: the same however often it is tried. */
const nameFor = (key: string): string =>
  createHash('sha256').update(key).digest('hex').slice(0, SIGNS);

/** `questions/3fa2` as it is typed after `/in`. */
const shown = (place: string): string => `#${place.replace(/^#/u, '').replace(/\/$/u, '')}`;

const threadOf = ({ place, message: above }: MessageAddress): string =>
  `${place.split('/')[0] ?? ''}/${above}`;

const rung = ({ people, groups }: Ring = { people: [], groups: [] }): readonly string[] =>
  [...people, ...groups].map(nameOf);

const said = (standing: Standing): string => standing.says ?? standing.message;

/** What happened, in a line, and what it leaves behind for the effects that wait for it. */
const acted = (
  effect: Effect,
  { earlier }: Delivering,
  book: Book,
): { readonly line: string; readonly outcome: Standing | null } => {
  const { terminal } = book;
  switch (effect.effect) {
    case 'post': {
      const place = effect.place ?? message.parse(earlier).place;
      const says = speakCard(book, effect.card).headline;
      const line = terminal.posted(shown(place), rung(effect.ring), says);
      return { line, outcome: { place, message: nameFor(effect.key), says } };
    }
    case 'pin': {
      const standing = message.parse(earlier);
      return { line: terminal.pinned(shown(standing.place), said(standing)), outcome: standing };
    }
    case 'unpin': {
      const standing = effect.message ?? message.parse(earlier);
      return { line: terminal.unpinned(shown(standing.place), said(standing)), outcome: standing };
    }
    case 'thread': {
      const place = threadOf(message.parse(earlier));
      const line = terminal.threadOpened(shown(place), effect.title);
      return { line, outcome: { place, message: nameFor(effect.key), says: effect.title } };
    }
    case 'notify': {
      const says = speakCard(book, effect.card).headline;
      return { line: terminal.told(effect.people.map(nameOf), says), outcome: null };
    }
    case 'edit': {
      const { place, message: name } = effect.message ?? message.parse(earlier);
      const { headline: says, parts } = speakCard(book, effect.card);
      const [first] = parts.flatMap((part) => (part.part === 'lines' ? part.texts : []));
      const line = terminal.edited(shown(place), says, first ?? null);
      return { line, outcome: { place, message: name, says } };
    }
    default:
      return unreachable(effect);
  }
};

/** Makes effects happen in the local channel: each is a line that says so. */
export const deliverBy =
  (book: Book, print: (line: string) => Promise<void>) =>
  async (effect: Effect, delivering: Delivering): Promise<Delivery> => {
    const { line, outcome } = acted(effect, delivering, book);
    await print(line);
    return { delivered: true, outcome };
  };
