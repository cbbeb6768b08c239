/**
 * A shop at work: changes its lists, keeps cards, has things posted, and says of each change that
 * it was kept, once it was. It goes on until it is killed.
 */
import { writeSync } from 'node:fs';
import { reminderEffects } from '../../commands/knurl/questions/effects.ts';
import { queued } from '../../src/desk/queued.ts';
import {
  addTo,
  approveStandard,
  confirmResult,
  correctResult,
  enterShop,
  findIn,
  importSheet,
  keepCard,
  latestResults,
  listOf,
  logResult,
  once,
  openOutbox,
  openReminders,
  queueEffects,
  type ResultContent,
  removeFrom,
  type ShopChange,
  saveStandard,
  WHEEL_SHEET,
  WHEELS,
  withdrawResult,
} from '../../src/shop/index.ts';
import { openStore, type StorePlace } from '../../src/store/index.ts';
import { CARD, SETUP_CARD, STRAIGHT } from '../shop/contract/samples.ts';
import { grown, keptFor } from '../support/results.ts';
import { requestOf } from '../support/setupRequest.ts';
import { draftOf } from '../support/standards.ts';
import { WORDS } from '../support/words.ts';
import { type Did, TALLY, WORN } from './did.ts';
import { postTo } from './post.ts';
import { questionOne } from './questions.ts';

type Told = { readonly place: StorePlace; readonly receiver: string; readonly run: string };
const { place, receiver, run } = JSON.parse(process.argv[2] ?? '') as Told;

const store = await openStore(place, { connections: 4 });
const outbox = openOutbox(store, {
  worker: run,
  deliver: postTo(receiver),
  now: Date.now,
  leaseMs: 1500,
  pollMs: 50,
  concurrency: 3,
});

/** The part whose standard is approved again and again. */
const PART = 'TH-2041-B';

/** The next revision of one part's standard, proposed and approved over the one before it. */
const approveNext = async (change: ShopChange): Promise<Pick<Did, 'cards' | 'approved'>> => {
  const { id, code } = await keepCard(change, SETUP_CARD);
  const proposed = await saveStandard(change, await draftOf(change, PART, id), 'propose');
  if (!proposed.ok) return { cards: [code], approved: [] };
  const which = { part: PART, revision: proposed.value.revision.number, reviewMonths: null };
  const approved = await approveStandard(change, which);
  if (!approved.ok) throw new Error(`not approved: ${approved.refusal.code}`);
  return { cards: [code], approved: [approved.value.revision.id] };
};

/** Every question that waits has waited long enough to come up once more. */
const reminders = openReminders(store, {
  now: () => Date.now() + 5 * 3_600_000,
  words: WORDS,
  effectsOf: async (view, putUp) => (await reminderEffects(view, putUp)).map(queued),
});

/** The kinds of change in their turn; those that build on each other come more often. */
const TURNS = [0, 6, 1, 6, 2, 3, 6, 4, 5, 7] as const;

/** One of several kinds of change; what it did, and what is to happen because of it. */
const doSomething = async (change: ShopChange, interaction: string, kind: number): Promise<Did> => {
  const name = `wheel ${interaction}`;
  const key = `${interaction} post`;
  const did: Did = {
    interaction,
    wheels: [],
    removed: [],
    cards: [],
    results: [],
    withdrawn: [],
    approved: [],
    asked: [],
    answered: [],
    solved: [],
    effects: [key],
  };
  switch (kind) {
    case 0: {
      const added = await addTo(change, WHEELS, { ...STRAIGHT, name });
      return added.ok ? { ...did, wheels: [added.value.id] } : did;
    }
    case 1: {
      const rows = [1, 2, 3].map((row) => `${name} ${row},straight,21 tpi`);
      const file = ['name,form,pitch', ...rows].join('\n');
      await importSheet(change, WHEELS, WHEEL_SHEET, file, { units: 'mm' });
      const wheels: string[] = [];
      for (const row of [1, 2, 3]) {
        const wheel = await findIn(change, WHEELS, `${name} ${row}`);
        if (wheel.ok) wheels.push(wheel.value.id);
      }
      return { ...did, wheels };
    }
    case 2: {
      const [wheel] = (await listOf(change, WHEELS)).filter(
        ({ name: called }) => called !== TALLY && called !== WORN,
      );
      if (wheel === undefined) return did;
      const removed = await removeFrom(change, WHEELS, wheel.id, { evenInUse: true });
      return removed.ok ? { ...did, removed: [wheel.id] } : did;
    }
    case 3:
      return await logOne(change, did);
    case 4:
      return await changeOne(change, did);
    case 5:
      return { ...did, ...(await approveNext(change)), effects: [key, `${interaction} pin`] };
    case 6:
      return await questionOne(change, did);
    default: {
      const { code } = await keepCard(change, CARD);
      return { ...did, cards: [code], effects: [key, `${interaction} pin`] };
    }
  }
};

/** A part that came out, most of them as expected. */
const somePart = (): ResultContent => ({
  ...grown(Math.random() < 0.1 ? 1.6 : 0.85 + Math.random() / 5),
  partsRun: Math.floor(Math.random() * 50),
});

const logOne = async (change: ShopChange, did: Did): Promise<Did> => {
  const wheel = await findIn(change, WHEELS, WORN);
  if (!wheel.ok) return did;
  const card = await keptFor(change, requestOf(), wheel.value.id);
  const logged = await logResult(change, card, somePart());
  return logged.ok ? { ...did, cards: [card.code], results: [logged.value.result.id] } : did;
};

/** The last result is corrected, confirmed or taken back. */
const changeOne = async (change: ShopChange, did: Did): Promise<Did> => {
  const [last] = await latestResults(change, { limit: 1 });
  if (last === undefined) return did;
  switch (Math.floor(Math.random() * 3)) {
    case 0:
      await correctResult(change, last, somePart());
      return did;
    case 1:
      await confirmResult(change, last);
      return did;
    default: {
      const withdrawn = await withdrawResult(change, last);
      return withdrawn.ok ? { ...did, withdrawn: [last.id] } : did;
    }
  }
};

/** Everything in one change: the thing itself, one more on the tally, and what is to be posted. */
const act = (interaction: string, kind: number): Promise<Did> =>
  store.transact(async (tx) => {
    const shop = { platform: 'terminal', id: 'killed', name: 'Killed' };
    const who = { id: 'kim', name: 'Kim', groups: [], manages: null };
    const { change } = await enterShop(tx, WORDS, shop, who, Date.now());
    const { answer } = await once(change, interaction, async () => {
      const did = await doSomething(change, interaction, kind);
      const [post = ''] = did.effects;
      const pin = did.effects.find((each) => each.endsWith(' pin'));
      await queueEffects(change, [
        { key: post, effect: { post } },
        ...(pin === undefined ? [] : [{ key: pin, effect: { pin: post }, after: post }]),
      ]);
      await tx
        .updateTable('wheel')
        .set((eb) => ({ parts_run: eb('parts_run', '+', 1) }))
        .where('name', '=', TALLY)
        .execute();
      return did;
    });
    return answer;
  });

/** Straight to the pipe: what was said is said, whatever happens in the next moment. */
const say = (line: string): void => {
  writeSync(1, `${line}\n`);
};

outbox.start();
say('ready');
// Each life begins with another kind of change: however short they are, all kinds have their turn.
const first = Number(run.replace(/\D/gu, ''));
for (let at = 0; ; at += 1) {
  await reminders.remindDue();
  const did = await act(`${run}.${at}`, TURNS[(first + at) % TURNS.length] ?? 0);
  outbox.nudge();
  say(`kept ${JSON.stringify(did)}`);
  await new Promise((resolve) => setTimeout(resolve, Math.random() * 6));
}
