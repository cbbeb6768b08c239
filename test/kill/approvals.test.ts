/** The same proposal, approved by two people in two processes at the same time, a thousand times. */
import type { ChildProcess } from 'node:child_process';
import { expect, it, onTestFinished } from 'vitest';
import { enterShop, keepCard } from '../../src/shop/index.ts';
import type { Store } from '../../src/store/index.ts';
import { SETUP_CARD } from '../shop/contract/samples.ts';
import { ENGINES } from '../support/places.ts';
import { builtProgram, startProgram } from '../support/program.ts';
import { newRecords, person, START, WORDS } from '../support/records.ts';
import { bringTo } from '../support/standards.ts';

const TIMES = 1000;
const PEOPLE = ['one', 'two'];
type Answer = { readonly refusal: { readonly by: string } | null };

const partOf = (at: number): string => `P-${String(at)}`;

/** As many proposals as there are to be approved, in one change. */
const proposed = (store: Store): Promise<void> =>
  store.transact(async (tx) => {
    const shop = { platform: 'terminal', id: 'twice', name: 'Twice' };
    const { change } = await enterShop(tx, WORDS, shop, person('Kim'), START);
    const { id } = await keepCard(change, SETUP_CARD);
    for (let at = 0; at < TIMES; at += 1) await bringTo(change, partOf(at), 'proposed', id);
  });

it.each(ENGINES)(
  'two who approve at once leave one approval and one clear refusal in %s',
  async (engine) => {
    const { store, place } = await newRecords(engine);
    await proposed(store);
    const file = await builtProgram(new URL('./approveProgram.ts', import.meta.url));
    const programs = PEOPLE.map((name) => startProgram(file, { place, name }));
    const both = programs.map((program) => program.process);
    onTestFinished(() => {
      for (const each of both) each.kill('SIGKILL');
    });
    await Promise.all(both.map(heard));
    const winners: string[] = [];
    for (let at = 0; at < TIMES; at += 1) {
      const next = Promise.all(both.map(heard));
      for (const each of both) each.send(partOf(at));
      winners.push(winnerOf((await next) as [Answer, Answer], partOf(at)));
    }
    for (const each of both) each.disconnect();
    expect(await Promise.all(programs.map(({ ended }) => ended))).toEqual([0, 0]);
    // Both had their turn at being first, or they were not two at the same time.
    expect([...new Set(winners)].sort()).toEqual(PEOPLE);
    await expectOneEach(store, winners);
  },
  240_000,
);

const heard = (program: ChildProcess): Promise<unknown> =>
  new Promise((resolve) => program.once('message', resolve));

/** Who approved it: the other one is told who, and that nothing of theirs was done. */
const winnerOf = (answers: readonly [Answer, Answer], part: string): string => {
  const winner = answers.findIndex(({ refusal }) => refusal === null);
  const name = PEOPLE[winner] ?? '';
  const lost = answers[1 - winner];
  expect(lost?.refusal).toMatchObject({
    code: 'notNow',
    asked: 'approve',
    part,
    revision: 1,
    state: 'approved',
    by: name,
  });
  return name;
};

const expectOneEach = async (store: Store, winners: readonly string[]): Promise<void> => {
  const revisions = await store.read
    .selectFrom('standard_revision')
    .innerJoin('standard', 'standard.id', 'standard_revision.standard')
    .innerJoin('person', 'person.id', 'standard_revision.approved_by')
    .select(['standard.part', 'person.name', 'standard_revision.state'])
    .execute();
  const wanted = winners.map((name, at) => ({ part: partOf(at), name, state: 'approved' }));
  const byPart = (a: { part: string }, b: { part: string }) => (a.part < b.part ? -1 : 1);
  expect([...revisions].sort(byPart)).toEqual([...wanted].sort(byPart));
  const approvals = await store.read
    .selectFrom('history')
    .select('id')
    .where('subject', '=', 'standard')
    .where('after', 'like', '%"state":"approved"%')
    .execute();
  expect(approvals).toHaveLength(TIMES);
  const effects = await store.read.selectFrom('effect').select('key').execute();
  expect(effects).toHaveLength(TIMES);
};
