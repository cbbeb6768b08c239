/** What becomes of a standard's pin where the channel has no room for one more. */
import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import { type Deliverer, openDeliveries } from '../../src/deliveries.ts';
import { type Effect, openRecordsDesk } from '../../src/desk/index.ts';
import { en, showIn } from '../../src/phrases/index.ts';
import { ENGINES } from '../support/places.ts';
import { newRecords, START } from '../support/records.ts';

type Post = Extract<Effect, { readonly effect: 'post' }>;

/** The lines of a posted card. */
const linesOf = ({ card }: Post): readonly string[] =>
  [card.headline, ...card.parts.flatMap((part) => (part.part === 'lines' ? part.lines : []))].map(
    ({ line, values }) => en.lines[line](values as never, showIn(card.units)),
  );

describe.each(ENGINES)('on %s', (engine) => {
  it('a pin that finds no room is said in the channel for that, with the oldest pins', async () => {
    const { store } = await newRecords(engine);
    const desk = openRecordsDesk(FLEET, store, {
      platform: 'slack',
      program: 'test',
      now: () => START,
    });
    const ask = (words: string) =>
      desk.answer({
        shop: 'T0SHOP',
        person: { id: 'U0INES', name: 'Ines' },
        place: { channel: 'C0FLOOR', thread: null, isPrivate: false },
        interactionId: randomUUID(),
        given: { words },
      });
    const done: Effect[] = [];
    const pins = { room: 1 };
    const deliverer: Deliverer = {
      platform: 'slack',
      shops: null,
      deliver: (effect, { earlier }) => {
        if (effect.effect === 'pin' && (pins.room -= 1) < 0)
          return Promise.resolve({ delivered: false, fault: 'too_many_pins', final: true });
        done.push(effect);
        const outcome = earlier ?? { place: 'C0FLOOR/', message: effect.key };
        return Promise.resolve({ delivered: true, outcome });
      },
    };
    const box = openDeliveries(store, [deliverer], {
      now: () => START,
      onFault: (error) => {
        throw error;
      },
      concurrency: 1,
    });
    await ask('/shop settings change notices C0NOTICES');
    for (const [part, line] of [
      ['A-1', '1.000 straight 21tpi 1018'],
      ['B-2', '1.250 straight 21tpi 1018'],
    ] as const) {
      await ask(line);
      await ask(`/knurl standard propose ${part}`);
      await ask(`/knurl standard approve ${part}`);
      await box.deliverDue();
    }
    const notes = done.filter(
      (each): each is Post => each.effect === 'post' && each.place === 'C0NOTICES/',
    );
    expect(notes.map(linesOf)).toEqual([
      [
        'A message could not be pinned: too_many_pins.',
        'Pinned longest: A-1 rev 1 (6 Jan 2025). None was taken off. If the channel is full, take one off yourself, then pin this one by hand.',
      ],
    ]);
    expect(done.filter(({ effect }) => effect === 'unpin')).toEqual([]);
  });
});
