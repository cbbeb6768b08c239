/**
 * A shop at work is killed at random moments, again and again. Afterwards every change that was
 * acknowledged is there, no change is there in part, and everything that was to be posted was
 * posted, once.
 */
import { expect, it, onTestFinished } from 'vitest';
import { tallyGrowth } from '../../src/calc/index.ts';
import { addTo, changeSetting, enterShop, openOutbox, WHEELS } from '../../src/shop/index.ts';
import type { Engine, Store, StorePlace } from '../../src/store/index.ts';
import { STRAIGHT } from '../shop/contract/samples.ts';
import { builtProgram, type Program, startProgram } from '../support/program.ts';
import { good, newRecords, person, WORDS } from '../support/records.ts';
import { type Did, TALLY, WORN } from './did.ts';
import { postTo } from './post.ts';
import { questionsAreWhole, reminderKeys } from './questions.ts';
import { type Receiver, startReceiver } from './receiver.ts';

/** How often it is killed: a hundred times when that is what is asked for (npm run test:kill). */
const KILLS = process.env['MODE'] === 'kill' ? 100 : 15;
/** Two at a time, so that there is always one that goes on while the other dies. */
const LANES = 2;
/** When it dies: while it starts, once it has begun, or (mostly) in the middle of its work. */
const MOMENTS: readonly { readonly after: string | null; readonly ms: number }[] = [
  { after: 'kept ', ms: 300 },
  { after: null, ms: 500 },
  { after: 'kept ', ms: 150 },
  { after: 'ready', ms: 60 },
  { after: 'kept ', ms: 40 },
];

export const killContract = (engine: Engine): void => {
  it(
    `killed ${KILLS} times at work in ${engine}, a shop has lost nothing and said nothing twice`,
    async () => {
      const { store, place } = await newRecords(engine);
      const receiver = await startReceiver();
      const file = await builtProgram(new URL('./shopProgram.ts', import.meta.url));
      await putTally(store);
      const acknowledged = await work(file, { place, receiver: receiver.url });
      await deliverRest(store, receiver);
      const kept = await keptOf(store);
      everythingAcknowledgedIsThere(acknowledged, kept);
      await nothingIsThereInPart(store, kept);
      await resultsAreWhole(store, kept);
      await everyApprovalIsWhole(store, kept);
      await questionsAreWhole(store, kept);
      await everythingWasPostedOnce(store, kept, receiver);
      // Three in five are killed at work only after they have acknowledged something.
      expect(acknowledged.length).toBeGreaterThanOrEqual(KILLS * 0.6);
    },
    KILLS * 10_000,
  );
};

type Told = { readonly place: StorePlace; readonly receiver: string };

const work = async (file: string, told: Told): Promise<Did[]> => {
  const acknowledged: Did[] = [];
  let started = 0;
  const lane = async () => {
    while (started < KILLS) {
      const { after, ms } = MOMENTS[started % MOMENTS.length] ?? { after: null, ms: 0 };
      started += 1;
      const program = startProgram(file, { ...told, run: `r${started}` });
      acknowledged.push(...(await oneLife(program, after, Math.random() * ms)));
    }
  };
  await Promise.all(Array.from({ length: LANES }, lane));
  return acknowledged;
};

/** Lets it work for a moment and kills it; gives back what it had acknowledged by then. */
const oneLife = async (program: Program, after: string | null, ms: number): Promise<Did[]> => {
  const kill = () => program.process.kill('SIGKILL');
  onTestFinished(() => {
    kill();
  });
  if (after !== null) await program.says(after);
  await new Promise((resolve) => setTimeout(resolve, ms));
  kill();
  // Ended by the signal, not by itself.
  expect(await program.ended).toBe(null);
  return program.lines
    .filter((line) => line.startsWith('kept '))
    .map((line) => JSON.parse(line.slice('kept '.length)) as Did);
};

/** The wheel on which every interaction counts itself, and the one that results are of. */
const putTally = async (store: Store): Promise<void> => {
  const shop = { platform: 'terminal', id: 'killed', name: 'Killed' };
  await store.transact(async (tx) => {
    const { change } = await enterShop(tx, WORDS, shop, person('Kim'), Date.now());
    for (const name of [TALLY, WORN])
      good(await addTo(change, WHEELS, { ...STRAIGHT, name, partsRun: 0 }));
    // Reminders come at any hour at which this is run.
    good(await changeSetting(change, 'quietHours', null));
  });
};

/** Whoever comes after them delivers what they left, once their leases are over. */
const deliverRest = async (store: Store, receiver: Receiver): Promise<void> => {
  // Reminders were put down for the hours after, as the shop's clock was ahead for them.
  const LATER = 9 * 3_600_000;
  const outbox = openOutbox(store, {
    worker: 'last',
    deliver: postTo(receiver.url),
    now: () => Date.now() + LATER,
    onFault: (fault) => {
      throw fault instanceof Error ? fault : new Error(String(fault));
    },
  });
  await outbox.deliverDue();
};

/** What every interaction did, as the records have it. */
const keptOf = async (store: Store): Promise<Did[]> => {
  const rows = await store.read.selectFrom('interaction').select(['id', 'answer']).execute();
  return rows.map(({ answer }) => JSON.parse(answer ?? 'null') as Did);
};

const everythingAcknowledgedIsThere = (acknowledged: readonly Did[], kept: readonly Did[]) => {
  const byInteraction = new Map(kept.map((did) => [did.interaction, did]));
  for (const did of acknowledged) expect(byInteraction.get(did.interaction)).toEqual(did);
  // What was kept without having been said is what was under way when it was killed: one each.
  expect(kept.length - acknowledged.length).toBeLessThanOrEqual(KILLS);
};

const nothingIsThereInPart = async (store: Store, kept: readonly Did[]): Promise<void> => {
  const wheels = await store.read
    .selectFrom('wheel')
    .select(['id', 'name', 'parts_run', 'removed_at'])
    .execute();
  const tally = wheels.find(({ name }) => name === TALLY);
  expect(tally?.parts_run).toBe(kept.length);
  const others = wheels.filter(({ name }) => name !== TALLY && name !== WORN);
  const ids = (rows: readonly { id: string }[]) => rows.map(({ id }) => id).sort();
  expect(ids(others)).toEqual(kept.flatMap((did) => did.wheels).sort());
  expect(ids(others.filter((wheel) => wheel.removed_at !== null))).toEqual(
    kept.flatMap((did) => did.removed).sort(),
  );
  const cards = await store.read.selectFrom('card').select('code').execute();
  expect(cards.map(({ code }) => code).sort()).toEqual(kept.flatMap((did) => did.cards).sort());
  const history = await store.read
    .selectFrom('history')
    .select(['verb', 'subject_id'])
    .where('subject', '=', 'wheel')
    .execute();
  const added = history.filter(({ verb }) => verb === 'added').map(({ subject_id }) => subject_id);
  expect(added.sort()).toEqual(ids(wheels));
};

/** Every result is there or not, and with it what was learned, what the wheel ran and what is found. */
const resultsAreWhole = async (store: Store, kept: readonly Did[]): Promise<void> => {
  const rows = await store.read.selectFrom('result').selectAll().orderBy('id').execute();
  expect(rows.length).toBeGreaterThan(0);
  expect(rows.map(({ id }) => id).sort()).toEqual(kept.flatMap((did) => did.results).sort());
  const standing = rows.filter((row) => row.withdrawn_at === null);
  const gone = rows.filter((row) => row.withdrawn_at !== null).map(({ id }) => id);
  expect(gone.sort()).toEqual(kept.flatMap((did) => did.withdrawn).sort());
  const numbers = rows.map(({ number }) => number).sort((a, b) => a - b);
  expect(numbers).toEqual(rows.map((_, at) => at + 1));
  const worn = await store.read
    .selectFrom('wheel')
    .select('parts_run')
    .where('name', '=', WORN)
    .executeTakeFirstOrThrow();
  expect(worn.parts_run).toBe(standing.reduce((sum, row) => sum + row.parts_run, 0));
  const learned = standing.map(({ family, share, confirmed_at }) => ({
    family: family ?? '',
    share: share ?? 0,
    confirmed: confirmed_at !== null,
  }));
  const tallies = await store.read
    .selectFrom('growth')
    .select(['family', 'count', 'sum'])
    .orderBy('first')
    .execute();
  expect(tallies).toEqual(tallyGrowth(learned));
  const found = await store.read
    .selectFrom('find_entry')
    .select('subject_id')
    .where('kind', '=', 'result')
    .execute();
  expect(found.map(({ subject_id }) => subject_id).sort()).toEqual(standing.map(({ id }) => id));
};

/** Every approval that was kept is whole: its revision, the one before it, and both in the history. */
const everyApprovalIsWhole = async (store: Store, kept: readonly Did[]): Promise<void> => {
  const wanted = kept.flatMap((did) => did.approved);
  const revisions = await store.read
    .selectFrom('standard_revision')
    .select(['id', 'number', 'state', 'basis'])
    .orderBy('number')
    .execute();
  expect(revisions.map(({ id }) => id).sort()).toEqual([...wanted].sort());
  expect(revisions.map(({ number }) => number)).toEqual(revisions.map((_, at) => at + 1));
  const states = revisions.map(({ state }) => state);
  expect(states).toEqual(
    states.map((_, at) => (at + 1 < states.length ? 'superseded' : 'approved')),
  );
  expect(revisions.filter(({ basis }) => basis === null)).toEqual([]);
  const steps = await store.read
    .selectFrom('history')
    .select('after')
    .where('subject', '=', 'standard')
    .execute();
  const counted = (state: string) =>
    steps.filter(({ after }) => after?.includes(`"state":"${state}"`)).length;
  expect(['proposed', 'approved', 'superseded'].map(counted)).toEqual([
    wanted.length,
    wanted.length,
    Math.max(0, wanted.length - 1),
  ]);
};

const everythingWasPostedOnce = async (
  store: Store,
  kept: readonly Did[],
  { posted }: Receiver,
): Promise<void> => {
  const reminded = await reminderKeys(store);
  expect(reminded.length).toBeGreaterThan(0);
  const wanted = [...kept.flatMap((did) => did.effects), ...reminded].sort();
  const effects = await store.read.selectFrom('effect').select(['key', 'state']).execute();
  expect(effects.map(({ key }) => key).sort()).toEqual(wanted);
  expect(effects.filter(({ state }) => state !== 'delivered')).toEqual([]);
  expect(posted.map(({ key }) => key).sort()).toEqual(wanted);
  for (const [at, { key, earlier }] of posted.entries()) {
    if (!key.endsWith(' pin')) continue;
    const message = posted.findIndex((one) => one.key === key.replace(' pin', ' post'));
    expect(message).toBeLessThan(at);
    expect(earlier).toEqual({ message });
  }
};
