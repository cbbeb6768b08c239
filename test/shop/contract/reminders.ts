/** Waiting questions come up again: at the right minute of the shop's clock, and each time once. */
import { describe, expect, it } from 'vitest';
import {
  answerQuestion,
  askQuestion,
  changeSetting,
  openReminders,
  type PutUp,
  reminderKey,
  reopenQuestion,
} from '../../../src/shop/index.ts';
import { type Engine, openStore, type Store } from '../../../src/store/index.ts';
import { good, newRecords, newShop, person, type TestShop, WORDS } from '../../support/records.ts';

const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
const BEN = person('Ben');

const effectsOf = (_: unknown, { question, number, isLast }: PutUp) =>
  Promise.resolve([
    {
      key: reminderKey(question.code, question.round, number),
      effect: { text: question.text, to: isLast ? 'supervisor' : 'engineer' },
    },
  ]);

const remindersOn = (store: Store, clock: { now: number }) =>
  openReminders(store, {
    now: () => clock.now,
    words: WORDS,
    effectsOf,
    onFault: (fault) => {
      throw fault instanceof Error ? fault : new Error(String(fault));
    },
  });

/** What was put up again: which question, when by the shop's clock, and for whom. */
const putUp = async (store: Store, zone: string): Promise<readonly string[]> => {
  const rows = await store.read
    .selectFrom('effect')
    .select(['effect', 'made_at'])
    .orderBy('made_at')
    .orderBy('id')
    .execute();
  const wall = new Intl.DateTimeFormat('sv-SE', {
    timeZone: zone,
    dateStyle: 'short',
    timeStyle: 'medium',
  });
  return rows.map(({ effect, made_at }) => {
    const { text, to } = JSON.parse(effect) as { text: string; to: string };
    return `${wall.format(made_at).slice(0, 16)} ${text} ${to}`;
  });
};

type Event = {
  readonly at: string;
  readonly act: (shop: TestShop, at: number) => Promise<unknown>;
};

/** Questions by the name they are asked under. */
type Asked = Map<string, string>;

const asks = (asked: Asked, at: string, text: string): Event => ({
  at,
  act: async (shop, now) => {
    const asking = { text, card: null, place: 'q/' };
    asked.set(
      text,
      good(await shop.changeBy(BEN, (change) => askQuestion(change, asking), now)).id,
    );
  },
});
const answers = (asked: Asked, at: string, text: string): Event => ({
  at,
  act: (shop, now) =>
    shop.changeBy(
      person('Ada'),
      async (change) => good(await answerQuestion(change, asked.get(text) ?? '', 'so')),
      now,
    ),
});
const reopens = (asked: Asked, at: string, text: string): Event => ({
  at,
  act: (shop, now) =>
    shop.changeBy(
      BEN,
      async (change) => {
        const reopening = { role: 'operator', words: '' } as const;
        return good(await reopenQuestion(change, asked.get(text) ?? '', reopening));
      },
      now,
    ),
});

/** Two processes look every minute; each is ended and begun again every few hours. */
const week = async (
  engine: Engine,
  zone: string,
  from: string,
  days: number,
  events: readonly Event[],
): Promise<readonly string[]> => {
  const { store, place } = await newRecords(engine);
  const shop = await newShop(store);
  await shop.change(async (change) => good(await changeSetting(change, 'timeZone', zone)));
  const clock = { now: Date.parse(from) };
  const end = clock.now + days * 24 * HOUR;
  const waiting = [...events];
  let others = await openStore(place, { connections: 2 });
  let both = [remindersOn(store, clock), remindersOn(others, clock)];
  for (; clock.now < end; clock.now += MINUTE) {
    while (waiting[0] !== undefined && Date.parse(waiting[0].at) <= clock.now)
      await waiting.shift()?.act(shop, clock.now);
    await Promise.all(both.map(({ remindDue }) => remindDue()));
    if (clock.now % (7 * HOUR) !== 0) continue;
    await others.close();
    others = await openStore(place, { connections: 2 });
    both = [remindersOn(store, clock), remindersOn(others, clock)];
  }
  await others.close();
  expect(waiting).toEqual([]);
  return await putUp(store, zone);
};

export const reminders = (engine: Engine): void => {
  describe('waiting questions', () => {
    it('come up again through a week in which the clock goes forward', async () => {
      // source: IANA time zone database: Berlin goes from +1 to +2 on Sunday 30 March 2025, 02:00.
      const asked: Asked = new Map();
      const events = [
        asks(asked, '2025-03-28T09:00+01:00', 'morning'),
        asks(asked, '2025-03-28T20:30+01:00', 'evening'),
        asks(asked, '2025-03-29T21:00+01:00', 'short night'),
        asks(asked, '2025-03-29T23:30+01:00', 'late'),
        asks(asked, '2025-03-30T03:30+02:00', 'early'),
        asks(asked, '2025-03-31T08:00+02:00', 'answered in time'),
        answers(asked, '2025-03-31T11:59+02:00', 'answered in time'),
        asks(asked, '2025-04-01T09:00+02:00', 'reopened'),
        answers(asked, '2025-04-01T14:00+02:00', 'reopened'),
        reopens(asked, '2025-04-02T21:30+02:00', 'reopened'),
      ];
      const seen = await week(engine, 'Europe/Berlin', '2025-03-28T00:00+01:00', 7, events);
      // Worked out by hand: four hours on, quiet from 22:00 to 06:00, then four hours on from there.
      expect([...seen].sort()).toEqual(
        [
          '2025-03-28 13:00 morning engineer',
          '2025-03-28 17:00 morning engineer',
          '2025-03-28 21:00 morning supervisor',
          '2025-03-29 06:00 evening engineer',
          '2025-03-29 10:00 evening engineer',
          '2025-03-29 14:00 evening supervisor',
          '2025-03-30 06:00 short night engineer',
          '2025-03-30 10:00 short night engineer',
          '2025-03-30 14:00 short night supervisor',
          '2025-03-30 06:00 late engineer',
          '2025-03-30 10:00 late engineer',
          '2025-03-30 14:00 late supervisor',
          '2025-03-30 07:30 early engineer',
          '2025-03-30 11:30 early engineer',
          '2025-03-30 15:30 early supervisor',
          '2025-04-01 13:00 reopened engineer',
          '2025-04-03 06:00 reopened engineer',
          '2025-04-03 10:00 reopened engineer',
          '2025-04-03 14:00 reopened supervisor',
        ].sort(),
      );
    }, 180_000);

    it('come up again after the night in which the clock goes back', async () => {
      // source: IANA time zone database: Chicago goes from -5 to -6 on Sunday 2 November 2025, 02:00.
      const asked: Asked = new Map();
      const events = [
        asks(asked, '2025-11-01T17:30-05:00', 'before the night'),
        asks(asked, '2025-11-01T21:00-05:00', 'long night'),
        asks(asked, '2025-11-02T01:30-05:00', 'first half past one'),
        asks(asked, '2025-11-02T01:30-06:00', 'second half past one'),
      ];
      const seen = await week(engine, 'America/Chicago', '2025-11-01T12:00-05:00', 2, events);
      expect([...seen].sort()).toEqual(
        [
          '2025-11-01 21:30 before the night engineer',
          '2025-11-02 06:00 before the night engineer',
          '2025-11-02 10:00 before the night supervisor',
          '2025-11-02 06:00 long night engineer',
          '2025-11-02 10:00 long night engineer',
          '2025-11-02 14:00 long night supervisor',
          '2025-11-02 06:00 first half past one engineer',
          '2025-11-02 10:00 first half past one engineer',
          '2025-11-02 14:00 first half past one supervisor',
          '2025-11-02 06:00 second half past one engineer',
          '2025-11-02 10:00 second half past one engineer',
          '2025-11-02 14:00 second half past one supervisor',
        ].sort(),
      );
    }, 180_000);

    it('come up once after a standstill, and again only after the time', async () => {
      const { store } = await newRecords(engine);
      const shop = await newShop(store);
      const asked: Asked = new Map();
      const start = Date.parse('2025-01-06T08:00Z');
      await asks(asked, '', 'forgotten').act(shop, start);
      const clock = { now: start + 50 * HOUR };
      const { remindDue } = remindersOn(store, clock);
      expect(await remindDue()).toBe(1);
      expect(await remindDue()).toBe(0);
      clock.now += 4 * HOUR - MINUTE;
      expect(await remindDue()).toBe(0);
      clock.now += MINUTE;
      expect(await remindDue()).toBe(1);
    });

    it('keep to quiet hours that were set after they were asked', async () => {
      const { store } = await newRecords(engine);
      const shop = await newShop(store);
      const start = Date.parse('2025-01-06T08:00Z');
      await asks(new Map(), '', 'at noon').act(shop, start);
      const quiet = { from: 11 * 60, to: 13 * 60 };
      await shop.change(async (change) => good(await changeSetting(change, 'quietHours', quiet)));
      const clock = { now: start + 4 * HOUR };
      const { remindDue } = remindersOn(store, clock);
      expect(await remindDue()).toBe(0);
      clock.now = start + 5 * HOUR - MINUTE;
      expect(await remindDue()).toBe(0);
      clock.now = start + 5 * HOUR;
      expect(await remindDue()).toBe(1);
      expect(await putUp(store, 'UTC')).toEqual(['2025-01-06 13:00 at noon engineer']);
    });

    it('come up by themselves while the program runs', async () => {
      const { store } = await newRecords(engine);
      const shop = await newShop(store);
      const start = Date.parse('2025-01-06T08:00Z');
      await asks(new Map(), '', 'by itself').act(shop, start);
      let queued = (): void => undefined;
      const told = new Promise<void>((resolve) => {
        queued = resolve;
      });
      const clock = { now: start };
      const running = openReminders(store, {
        now: () => clock.now,
        words: WORDS,
        effectsOf,
        onQueued: () => queued(),
        pollMs: 60_000,
      });
      running.start();
      clock.now = start + 4 * HOUR;
      running.nudge();
      await told;
      await running.stop();
      expect(await putUp(store, 'UTC')).toEqual(['2025-01-06 12:00 by itself engineer']);
    });
  });
};
