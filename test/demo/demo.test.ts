/** The invented shop, as a person opens it. */
import { spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { expect, it } from 'vitest';
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
  const count = async (table: 'wheel' | 'machine' | 'material' | 'rule' | 'card') =>
    (await store.read.selectFrom(table).select('id').execute()).length;
  expect(await count('wheel')).toBe(12);
  expect(await count('machine')).toBe(3);
  expect(await count('material')).toBe(3);
  expect(await count('rule')).toBe(4);
  expect(await count('card')).toBeGreaterThanOrEqual(6);
  // Whatever was left to be done is done.
  const states = await store.read.selectFrom('effect').select('state').distinct().execute();
  expect(states.filter(({ state }) => state !== 'delivered')).toEqual([]);
  await store.close();
}, 60_000);
