/** Effects: written with the change, delivered after it, once, whatever happens in between. */
import { describe, expect, it } from 'vitest';
import {
  type Attempt,
  type Claimed,
  claimEffects,
  givenUp,
  givenUpSeen,
  isUnderWay,
  type Outbox,
  type OutboxOptions,
  openOutbox,
  type QueuedEffect,
  queueEffects,
} from '../../../src/shop/index.ts';
import { pauseAfter } from '../../../src/shop/outbox.ts';
import { type Engine, openStore, type Store } from '../../../src/store/index.ts';
import { newRecords, newShop, START, type TestShop } from '../../support/records.ts';

const HOUR = 3_600_000;
const YES: Attempt = { delivered: true };
const no = (more: Partial<Extract<Attempt, { delivered: false }>> = {}): Attempt => ({
  delivered: false,
  fault: 'the channel is closed',
  final: false,
  ...more,
});

const queue = (shop: TestShop, ...effects: readonly QueuedEffect[]) =>
  shop.change((change) => queueEffects(change, effects));

const post = (key: string, more: Partial<QueuedEffect> = {}): QueuedEffect => ({
  key,
  effect: { post: key },
  ...more,
});

/** An outbox with a clock that is set by hand, and what it was asked to deliver. */
const bench = (
  store: Store,
  answer: (effect: Claimed) => Attempt,
  more: Partial<OutboxOptions> = {},
) => {
  const clock = { now: START };
  const asked: string[] = [];
  const faults: unknown[] = [];
  const outbox: Outbox = openOutbox(store, {
    worker: 'w1',
    now: () => clock.now,
    onFault: (fault) => faults.push(fault),
    deliver: (effect) => {
      asked.push(`${effect.key} ${effect.attempt}`);
      return Promise.resolve(answer(effect));
    },
    ...more,
  });
  return { clock, asked, faults, outbox };
};

export const outbox = (engine: Engine): void => {
  describe('the outbox', () => {
    delivering(engine);
    failing(engine);
    sharing(engine);
  });
};

const delivering = (engine: Engine): void => {
  it('delivers what was queued, once and in its order', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('a'), post('b'), post('c'));
    const { outbox: box, asked } = bench(store, () => YES, { concurrency: 1 });
    expect(await box.deliverDue()).toBe(3);
    expect(await box.deliverDue()).toBe(0);
    expect(asked).toEqual(['a 1', 'b 1', 'c 1']);
  });

  it('queues a key once, in whatever change it comes', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    expect(await queue(shop, post('a'), post('b'), post('a'))).toEqual(['a', 'b']);
    expect(await queue(shop, post('a'))).toEqual([]);
    const other = await newShop(store, 'Other');
    expect(await queue(other, post('a'))).toEqual(['a']);
    const { outbox: box, asked } = bench(store, () => YES);
    await box.deliverDue();
    expect(asked.sort()).toEqual(['a 1', 'a 1', 'b 1']);
    expect(await queue(shop, post('a'))).toEqual([]);
  });

  it('queues nothing of a change that was not kept', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const failing = shop.change(async (change) => {
      await queueEffects(change, [post('a')]);
      throw new Error('half way');
    });
    await expect(failing).rejects.toThrow('half way');
    const { outbox: box } = bench(store, () => YES);
    expect(await box.deliverDue()).toBe(0);
  });

  it('pins a post after it was posted, and knows its message then', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('post'), post('pin', { after: 'post' }), post('tell', { after: 'pin' }));
    const seen: unknown[] = [];
    const { outbox: box, asked } = bench(store, (effect) => {
      seen.push(effect.earlier);
      return { delivered: true, outcome: { message: effect.key } };
    });
    await box.deliverDue();
    expect(asked).toEqual(['post 1', 'pin 1', 'tell 1']);
    expect(seen).toEqual([null, { message: 'post' }, { message: 'pin' }]);
    // What comes later finds it delivered.
    await queue(shop, post('unpin', { after: 'post' }));
    await box.deliverDue();
    expect(asked.at(-1)).toBe('unpin 1');
  });

  it('waits until an effect’s own time', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('reminder', { notBefore: START + 72 * HOUR }));
    const { outbox: box, clock, asked } = bench(store, () => no());
    clock.now = START + 72 * HOUR - 1;
    expect(await box.deliverDue()).toBe(0);
    clock.now = START + 72 * HOUR;
    expect(await box.deliverDue()).toBe(1);
    // Its day of trying begins now, not when it was queued.
    clock.now += 2000;
    await box.deliverDue();
    expect(asked).toEqual(['reminder 1', 'reminder 2']);
    expect(await givenUp(shop.view)).toEqual([]);
  });

  it('delivers on its own, as soon as it is told', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    const { outbox: box, asked } = bench(store, () => YES, { pollMs: 60_000, concurrency: 2 });
    box.start();
    await queue(shop, ...Array.from({ length: 9 }, (_, at) => post(`p${at}`)));
    box.nudge();
    await until(() => asked.length === 9);
    await box.stop();
    expect(new Set(asked).size).toBe(9);
  });
};

const failing = (engine: Engine): void => {
  it('tries again after growing pauses, and says which attempt it is', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('a'));
    const { outbox: box, clock, asked } = bench(store, ({ attempt }) => (attempt < 4 ? no() : YES));
    const pauses: number[] = [];
    for (let tries = 1; tries <= 4; tries += 1) {
      const since = clock.now;
      while ((await box.deliverDue()) === 0) clock.now += 100;
      pauses.push(clock.now - since);
    }
    expect(asked).toEqual(['a 1', 'a 2', 'a 3', 'a 4']);
    const [, first = 0, second = 0, third = 0] = pauses;
    // One, two, four seconds, each up to a fifth more.
    for (const [pause, wanted] of [
      [first, 1000],
      [second, 2000],
      [third, 4000],
    ] as const) {
      expect(pause).toBeGreaterThanOrEqual(wanted);
      expect(pause).toBeLessThanOrEqual(wanted * 1.2 + 100);
    }
    expect(pauseAfter(50, 0)).toBe(15 * 60_000);
  });

  it('keeps to the pause the platform asks for', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('a'));
    const { outbox: box, clock } = bench(store, () => no({ againAfterMs: 30_000 }));
    await box.deliverDue();
    clock.now += 29_999;
    expect(await box.deliverDue()).toBe(0);
    clock.now += 1;
    expect(await box.deliverDue()).toBe(1);
  });

  it('gives up after a day, visibly, and once', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('a'), post('pin', { after: 'a' }), post('tell', { after: 'pin' }));
    const noteOf = ({ key }: Claimed) =>
      key.startsWith('note') ? null : post(`note:${key}`, { effect: { note: key } });
    const {
      outbox: box,
      clock,
      asked,
    } = bench(store, ({ key }) => (key.startsWith('note') ? YES : no()), { noteOf });
    for (let hours = 0; hours <= 25; hours += 0.25) {
      clock.now = START + hours * HOUR;
      await box.deliverDue();
    }
    const gone = await givenUp(shop.view);
    expect(gone.map(({ key, fault }) => [key, fault])).toEqual([
      ['a', 'the channel is closed'],
      ['pin', 'the channel is closed'],
      ['tell', 'the channel is closed'],
    ]);
    expect(gone[0]?.givenUpAt).toBeGreaterThanOrEqual(START + 24 * HOUR);
    expect(asked.filter((line) => line.startsWith('note'))).toEqual(['note:a 1']);
    expect(asked.filter((line) => /^(pin|tell)/u.test(line))).toEqual([]);
    await shop.change((change) =>
      givenUpSeen(
        change,
        gone.map(({ id }) => id),
      ),
    );
    expect(await givenUp(shop.view)).toEqual([]);
  });

  it('gives up with it what waits for something that was given up long ago', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('a'));
    const { outbox: box, asked } = bench(store, () => no({ final: true }));
    await box.deliverDue();
    await queue(shop, post('unpin', { after: 'a' }), post('tell', { after: 'unpin' }));
    await box.deliverDue();
    expect(asked).toEqual(['a 1']);
    const gone = await givenUp(shop.view);
    expect(gone.map(({ key, fault }) => [key, fault])).toEqual([
      ['a', 'the channel is closed'],
      ['unpin', 'the channel is closed'],
      ['tell', 'the channel is closed'],
    ]);
    expect(await isUnderWay(shop.view, 'unpin')).toBe(false);
  });

  it('gives up at once where the platform will never take it', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('a'));
    const fault = 'no such channel'.padEnd(1000, '!');
    const { outbox: box, clock } = bench(store, () => no({ final: true, fault }));
    await box.deliverDue();
    clock.now += 48 * HOUR;
    expect(await box.deliverDue()).toBe(0);
    expect(await givenUp(shop.view)).toMatchObject([
      { key: 'a', attempts: 1, fault: fault.slice(0, 300) },
    ]);
  });

  it('takes a delivery that throws, or never answers, for one that failed', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('throws'), post('hangs'));
    let aborted = false;
    const { outbox: box, clock } = bench(store, () => YES, {
      leaseMs: 200,
      deliver: ({ key, attempt }, signal) => {
        if (attempt > 1) return Promise.resolve(YES);
        if (key === 'throws') return Promise.reject(new Error('socket hang up'));
        signal.addEventListener('abort', () => {
          aborted = true;
        });
        return new Promise(() => undefined);
      },
    });
    await box.deliverDue();
    expect(aborted).toBe(true);
    const rows = await store.read.selectFrom('effect').select(['key', 'last_fault']).execute();
    expect(rows.sort((a, b) => (a.key < b.key ? -1 : 1))).toEqual([
      { key: 'hangs', last_fault: 'no answer in time' },
      { key: 'throws', last_fault: 'socket hang up' },
    ]);
    clock.now += 5000;
    expect(await box.deliverDue()).toBe(2);
  });
};

const sharing = (engine: Engine): void => {
  it('is shared by several processes without one effect being taken twice', async () => {
    const { store, place } = await newRecords(engine);
    const shop = await newShop(store);
    const keys = Array.from({ length: 60 }, (_, at) => `p${at}`);
    await queue(shop, ...keys.map((key) => post(key)));
    const others = [await openStore(place), await openStore(place)];
    const boxes = [store, ...others].map((each, at) =>
      bench(each, () => YES, { worker: `w${at}`, concurrency: 5 }),
    );
    await Promise.all(boxes.map(({ outbox: box }) => box.deliverDue()));
    const all = boxes.flatMap(({ asked }) => asked);
    expect(all.sort()).toEqual(keys.map((key) => `${key} 1`).sort());
    expect(boxes.flatMap(({ faults }) => faults)).toEqual([]);
    for (const other of others) await other.close();
  });

  it('takes on what another left lying, when its lease is over and not before', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('a'));
    const left = await claimEffects(store, { worker: 'dead', at: START, leaseMs: 60_000, most: 9 });
    expect(left).toHaveLength(1);
    const { outbox: box, clock, asked } = bench(store, () => YES);
    clock.now = START + 59_999;
    expect(await box.deliverDue()).toBe(0);
    clock.now = START + 60_000;
    expect(await box.deliverDue()).toBe(1);
    // The second attempt is told so, and looks before it posts again.
    expect(asked).toEqual(['a 2']);
  });

  it('does not let one that comes late undo what another has done', async () => {
    const { store } = await newRecords(engine);
    const shop = await newShop(store);
    await queue(shop, post('a'));
    const answers: ((attempt: Attempt) => void)[] = [];
    const slow = bench(store, () => YES, {
      deliver: () => new Promise<Attempt>((resolve) => answers.push(resolve)),
    });
    const first = slow.outbox.deliverDue();
    await until(() => answers.length === 1);
    const quick = bench(store, () => YES, { worker: 'w2' });
    quick.clock.now = START + 61_000;
    expect(await quick.outbox.deliverDue()).toBe(1);
    answers[0]?.(no({ final: true }));
    await first;
    expect(await givenUp(shop.view)).toEqual([]);
    const row = await store.read.selectFrom('effect').select('state').executeTakeFirstOrThrow();
    expect(row.state).toBe('delivered');
  });
};

const until = async (isSo: () => boolean): Promise<void> => {
  while (!isSo()) await new Promise((resolve) => setTimeout(resolve, 5));
};
