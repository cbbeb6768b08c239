import { randomUUID } from 'node:crypto';
import type { Delivering, Delivery } from './adapters/common/delivery.ts';
import { type Card, type Line, line } from './card/index.ts';
import type { Effect } from './desk/index.ts';
import {
  type Attempt,
  type Carried,
  type Claimed,
  type NoteOf,
  type Outbox,
  oldestPins,
  openOutbox,
  type Store,
  settingsOf,
} from './shop/index.ts';

/** A platform of this process, and the shops on it that it can reach. */
export type Deliverer = Carried & {
  readonly deliver: (effect: Effect, delivering: Delivering) => Promise<Delivery>;
};

export type DeliveryOptions = {
  readonly now: () => number;
  /** For the log: the records could not be used. */
  readonly onFault: (error: unknown) => void;
  /** How many at a time; one keeps them in the order in which they were queued. */
  readonly concurrency?: number;
};

const NOTE = 'note:';

/** A card that says what was given up, and what it would have said. */
const noteCard = (headline: Line, lines: readonly Line[], units: Card['units']): Card => ({
  verb: 'notice',
  headline,
  parts: lines.length === 0 ? [] : [{ part: 'lines', lines }],
  choices: [],
  pictures: [],
  figures: {},
  checks: [],
  cautions: [],
  alternatives: [],
  units,
});

/** What it would have said, or which pins have stood longest where one more could not be set. */
const besides = async (
  effect: Effect,
  of: Parameters<NoteOf>[2],
  zone: string,
): Promise<readonly Line[]> => {
  if ('card' in effect) return [effect.card.headline];
  if (effect.effect !== 'pin') return [];
  return [line('oldestPins', { pins: (await oldestPins(of)).map((pin) => ({ ...pin, zone })) })];
};

/** What was given up is said in the shop's own channel for that, where it has one. */
const noteOf: NoteOf = async (claimed, fault, of) => {
  // What is said of a note that cannot be posted would go the way of the note.
  if (claimed.key.startsWith(NOTE)) return null;
  const { noticesChannel, units, timeZone: zone } = await settingsOf(of);
  if (noticesChannel === null) return null;
  const key = `${NOTE}${claimed.key}`;
  const gone = effectOf(claimed);
  const headline = line('givenUp', { what: gone.effect, attempts: claimed.attempt, fault });
  const card = noteCard(headline, await besides(gone, of, zone), units);
  const effect: Effect = { effect: 'post', key, place: `${noticesChannel}/`, card };
  return { key, effect };
};

/** What was queued is what a command handed in. */
const effectOf = ({ effect }: Claimed): Effect => effect as Effect;

const reaches = ({ platform, shops }: Carried, claimed: Claimed): boolean =>
  platform === claimed.platform && (shops === null || shops.includes(claimed.outside));

/**
 * Takes what was queued to the platforms of this process. What belongs to a shop that none of
 * them reaches waits for a process that does.
 */
export const openDeliveries = (
  store: Store,
  deliverers: readonly Deliverer[],
  { now, onFault, concurrency }: DeliveryOptions,
): Outbox => {
  const deliver = async (claimed: Claimed): Promise<Attempt> => {
    const deliverer = deliverers.find((each) => reaches(each, claimed));
    if (deliverer === undefined) throw new Error('an effect of a shop out of reach');
    const { outside: shop, earlier, attempt, firstAt } = claimed;
    const firstTried = attempt > 1 ? firstAt : null;
    return await deliverer.deliver(effectOf(claimed), { shop, earlier, firstTried });
  };
  return openOutbox(store, {
    worker: randomUUID(),
    carried: deliverers.map(({ platform, shops }) => ({ platform, shops })),
    deliver,
    noteOf,
    now,
    onFault,
    ...(concurrency === undefined ? {} : { concurrency }),
  });
};
