/** The invented shop, as a person opens it. */
import { spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { expect, it } from 'vitest';
import { mulberry32 } from '../../src/demo/chance.ts';
import { DAYS, season } from '../../src/demo/season.ts';
import { openStore } from '../../src/store/index.ts';
import { newFolder } from '../support/places.ts';

type Ran = { readonly code: number | null; readonly out: string; readonly err: string };

const demo = (data: string, lines: readonly string[]): Promise<Ran> =>
  new Promise((resolve) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'src/demo.ts', '--phone'], {
      // A server of real records is not asked: this one is not even there.
      env: { ...process.env, WHOLETOOTH_DATA: data, DATABASE_URL: 'postgres://127.0.0.1:1/real' },
    });
    let [out, err] = ['', ''];
    child.stdout.on('data', (chunk: Buffer) => (out += chunk.toString()));
    child.stderr.on('data', (chunk: Buffer) => (err += chunk.toString()));
    child.on('close', (code) => resolve({ code, out, err }));
    child.stdin.end(lines.map((line) => `${line}\n`).join(''));
  });

it('fills a shop of its own once, says that it is invented, and opens it', async () => {
  const data = newFolder();
  const first = await demo(data, ['/shop wheels', '/as kit', '/shop people']);
  expect(first).toMatchObject({ code: 0, err: '' });
  expect(first.out).toMatch(/^Inventing a shop/u);
  expect(first.out.replaceAll(/\s+/gu, ' ')).toContain('its people, parts and numbers are made up');
  expect(first.out).toContain('12 wheels:');
  expect(first.out).toMatch(/Kit +operator/u);
  // Nothing but the demo's own folder: the shop's real records are not touched, nor made.
  expect(fs.readdirSync(data)).toEqual(['demo']);

  const again = await demo(data, ['/shop people']);
  expect(again).toMatchObject({ code: 0, err: '' });
  expect(again.out).not.toContain('Inventing');
  expect(again.out).toContain('6 people:');

  const store = await openStore({ engine: 'sqlite', file: path.join(data, 'demo/wholetooth.db') });
  const count = async (table: 'wheel' | 'machine' | 'material' | 'rule' | 'card' | 'result') =>
    (await store.read.selectFrom(table).select('id').execute()).length;
  expect(await count('wheel')).toBe(12);
  expect(await count('machine')).toBe(3);
  expect(await count('material')).toBe(3);
  expect(await count('rule')).toBe(4);
  expect(await count('result')).toBe(200);
  const outcomes = await store.read.selectFrom('result').select('outcome').distinct().execute();
  const seen = outcomes.map(({ outcome }) => outcome).sort();
  expect(seen).toEqual(['bent', 'double', 'flaking', 'good', 'other', 'seized', 'shallow']);
  // A standard and a question in every state that there is.
  const revisions = await store.read.selectFrom('standard_revision').select('state').execute();
  expect([...new Set(revisions.map(({ state }) => state))].sort()).toEqual([
    'approved',
    'draft',
    'proposed',
    'retired',
    'superseded',
  ]);
  const questions = await store.read.selectFrom('question').select('state').execute();
  expect([...new Set(questions.map(({ state }) => state))].sort()).toEqual([
    'answered',
    'open',
    'reopened',
    'solved',
  ]);
  // Whatever was left to be done is done.
  const states = await store.read.selectFrom('effect').select('state').distinct().execute();
  expect(states.filter(({ state }) => state !== 'delivered')).toEqual([]);
  await store.close();
}, 120_000);

it('tells the same season every time, in the order of its days, and nothing of tomorrow', () => {
  const batches = season(mulberry32(7));
  expect(season(mulberry32(7))).toEqual(batches);
  expect(season(mulberry32(8))).not.toEqual(batches);
  const hours = batches.map(({ at }) => at);
  expect(hours).toEqual(hours.toSorted((a, b) => a - b));
  expect(hours.at(-1)).toBeLessThan((DAYS - 1) * 24 + 9);
  expect(batches.flatMap(({ results }) => results)).toHaveLength(200);
});
