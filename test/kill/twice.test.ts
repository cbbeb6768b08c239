/** The same interactions, each sent to two processes at the same time, a thousand times. */
import type { ChildProcess } from 'node:child_process';
import { expect, it, onTestFinished } from 'vitest';
import { ENGINES } from '../support/places.ts';
import { builtProgram, startProgram } from '../support/program.ts';
import { newRecords } from '../support/records.ts';

const TIMES = 1000;
type Answer = { readonly first: boolean; readonly answer: { readonly by: string } };

it.each(ENGINES)(
  'twice-sent interactions take place once each in %s',
  async (engine) => {
    const { store, place } = await newRecords(engine);
    const names = ['one', 'two'];
    const file = await builtProgram(new URL('./twiceProgram.ts', import.meta.url));
    const programs = names.map((name) => startProgram(file, { place, name }));
    const both = programs.map((program) => program.process);
    onTestFinished(() => {
      for (const each of both) each.kill('SIGKILL');
    });
    await Promise.all(both.map(heard));
    const answers: [Answer, Answer][] = [];
    for (let at = 0; at < TIMES; at += 1) {
      const next = Promise.all(both.map(heard));
      for (const each of both) each.send(`i${at}`);
      answers.push((await next) as [Answer, Answer]);
    }
    for (const each of both) each.disconnect();
    expect(await Promise.all(programs.map(({ ended }) => ended))).toEqual([0, 0]);
    for (const [one, two] of answers) {
      expect([one.first, two.first].sort()).toEqual([false, true]);
      expect(one.answer).toEqual(two.answer);
    }
    // Both had their turn at being first, or they were not two at the same time.
    const firsts = new Set(answers.map(([one]) => one.answer.by));
    expect([...firsts].sort()).toEqual(names);
    const wheels = await store.read.selectFrom('wheel').select('name').execute();
    const effects = await store.read.selectFrom('effect').select('key').execute();
    expect(new Set(wheels.map(({ name }) => name)).size).toBe(TIMES);
    expect(wheels).toHaveLength(TIMES);
    expect(effects).toHaveLength(TIMES);
  },
  120_000,
);

const heard = (program: ChildProcess): Promise<unknown> =>
  new Promise((resolve) => program.once('message', resolve));
