import { describe, expect, it } from 'vitest';
import { setUp } from '../../src/calc/setup/index.ts';
import { DANGEROUS, type Job, ORDINARY } from '../reference/jobs.ts';
import { requestOf } from '../support/setupRequest.ts';

const statesOf = ({ said }: Job) =>
  Object.fromEntries(setUp(requestOf(said)).checks.map(({ name, state }) => [name, state]));
const named = (jobs: readonly Job[]) =>
  jobs.map((job) => [`${job.job}: ${job.because}`, job] as const);

describe('jobs that shops do every day', () => {
  it.each(named(ORDINARY))('%s', (_, job) => {
    const states = statesOf(job);
    expect(states).toMatchObject(job.verdict);
    expect(Object.values(states)).not.toContain('stop');
  });
});

describe('jobs that spoil work', () => {
  it.each(named(DANGEROUS))('%s', (_, job) => {
    expect(Object.values(job.verdict)).not.toEqual([]);
    expect(statesOf(job)).toMatchObject(job.verdict);
  });

  it('each get a change that passes for what stops them', () => {
    for (const job of DANGEROUS) {
      const { checks, remedies } = setUp(requestOf(job.said));
      const stopped = checks.filter(({ name, state }) => state === 'stop' && name !== 'speed');
      for (const { name } of stopped) expect(remedies.map(({ check }) => check)).toContain(name);
    }
  });
});

describe('the table', () => {
  it('has at least thirty jobs, some of each', () => {
    expect(ORDINARY.length + DANGEROUS.length).toBeGreaterThanOrEqual(30);
    expect(DANGEROUS.length).toBeGreaterThanOrEqual(10);
  });
});
