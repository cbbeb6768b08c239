/** What is done to a question, with what is to be posted because of it, broken at every step. */
import { describe, expect, it } from 'vitest';
import {
  answeredEffects,
  askedEffects,
  reminderEffects,
  reopenedEffects,
  solvedEffects,
} from '../../../commands/knurl/questions/effects.ts';
import { type Effect, queued } from '../../../src/desk/index.ts';
import {
  answerQuestion,
  askQuestion,
  keepCard,
  openReminders,
  type Question,
  queueEffects,
  reopenQuestion,
  type ShopChange,
  solveQuestion,
  toTell,
} from '../../../src/shop/index.ts';
import type { Engine, Store } from '../../../src/store/index.ts';
import { good, newRecords, newShop, START, type TestShop, WORDS } from '../../support/records.ts';
import { breakAll, everything, newFuse } from './breaking.ts';
import { CARD } from './samples.ts';

type Prepared = { readonly card: string; readonly open: Question; readonly answered: Question };
type Work = (change: ShopChange, prepared: Prepared) => Promise<void>;

const queue = async (change: ShopChange, effects: readonly Effect[]): Promise<void> => {
  await queueEffects(change, effects.map(queued));
};

const asked = async (change: ShopChange, card: string): Promise<Question> => {
  const asking = { text: 'why does it double', card, place: 'questions/' };
  const question = good(await askQuestion(change, asking));
  const told = await toTell(change, 'engineer', change.by);
  await queue(change, await askedEffects(change, question, null, told));
  return question;
};

const answered = async (change: ShopChange, { id }: Question): Promise<Question> => {
  const done = good(await answerQuestion(change, id, 'turn slower'));
  await queue(change, await answeredEffects(change, done, null));
  return done.question;
};

const WORKS: Readonly<Record<string, Work>> = {
  ask: async (change, { card }) => {
    await asked(change, card);
  },
  answer: async (change, { open }) => {
    await answered(change, open);
  },
  solve: async (change, prepared) => {
    const solving = { role: 'engineer', accepted: null, words: 'the wheel was worn' } as const;
    const done = good(await solveQuestion(change, prepared.answered.id, solving));
    await queue(change, await solvedEffects(change, done, null));
  },
  reopen: async (change, prepared) => {
    const reopening = { role: 'engineer', words: 'again' } as const;
    const question = good(await reopenQuestion(change, prepared.answered.id, reopening));
    await queue(change, await reopenedEffects(change, question, 'again', change.by, null));
  },
};

const prepare = (shop: TestShop): Promise<Prepared> =>
  shop.change(async (change) => {
    const { id: card } = await keepCard(change, CARD);
    const open = await asked(change, card);
    return { card, open, answered: await answered(change, await asked(change, card)) };
  });

/** One look at what is due; the fault it met is thrown. */
const remind = async (store: Store): Promise<number> => {
  const faults: unknown[] = [];
  const { remindDue } = openReminders(store, {
    now: () => START + 5 * 3_600_000,
    words: WORDS,
    effectsOf: async (view, putUp) => (await reminderEffects(view, putUp)).map(queued),
    onFault: (fault) => faults.push(fault),
  });
  const count = await remindDue();
  const [fault] = faults;
  if (fault !== undefined) throw fault instanceof Error ? fault : new Error('no error');
  return count;
};

export const breakingQuestions = (engine: Engine): void => {
  describe('questions broken at every step', () => {
    it.each(Object.entries(WORKS))('%s is done whole or not at all', async (_, work) => {
      const fuse = newFuse(engine);
      const { store } = await newRecords(engine, { watch: fuse.watch });
      const shop = await newShop(store);
      const prepared = await prepare(shop);
      const before = await everything(store);
      const calls = await breakAll(fuse, store, before, () =>
        shop.change((change) => work(change, prepared)),
      );
      expect(await everything(store)).not.toEqual(before);
      expect(calls).toBeGreaterThan(5);
    });

    it('a reminder comes with the time of the next one, or not at all', async () => {
      const fuse = newFuse(engine);
      const { store } = await newRecords(engine, { watch: fuse.watch });
      await prepare(await newShop(store));
      const before = await everything(store);
      const calls = await breakAll(fuse, store, before, () => remind(store));
      expect(calls).toBeGreaterThan(5);
      const { reminders, remind_at } = await store.read
        .selectFrom('question')
        .select(['reminders', 'remind_at'])
        .where('remind_at', 'is not', null)
        .executeTakeFirstOrThrow();
      expect([reminders, remind_at]).toEqual([1, START + 9 * 3_600_000]);
      const posted = await store.read
        .selectFrom('effect')
        .select('key')
        .where('key', 'like', '%again 0.1')
        .execute();
      expect(posted).toHaveLength(1);
      expect(await remind(store)).toBe(0);
    });
  });
};
