/** What finding costs among a thousand entries and among a hundred thousand, on both engines. */
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { performance } from 'node:perf_hooks';
import pg from 'pg';
import { findEntries } from '../../src/shop/index.ts';
import type { StorePlace } from '../../src/store/index.ts';
import { startPostgres } from '../support/postgresServer.ts';
import { toldShop } from '../support/told/filled.ts';
import { ASKED } from '../support/told/index.ts';

const FEW = 1_000;
const MANY = 100_000;
const ROUNDS = 5;

export type FindTimes = {
  readonly engine: string;
  /** Medians, ms. */
  readonly few: number;
  readonly many: number;
};

const median = (times: readonly number[]): number =>
  [...times].sort((a, b) => a - b)[Math.floor(times.length / 2)] ?? 0;

const medianAt = async (place: StorePlace, count: number): Promise<number> => {
  const { store, view } = await toldShop(place, count);
  const times: number[] = [];
  for (let round = 0; round <= ROUNDS; round += 1) {
    for (const [, asked] of ASKED) {
      const start = performance.now();
      await findEntries(view, asked, { limit: 10 });
      // The first round reads everything for the first time.
      if (round > 0) times.push(performance.now() - start);
    }
  }
  await store.close();
  return median(times);
};

const inFiles = async (): Promise<FindTimes> => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'wholetooth-bench-'));
  const at = (count: number): StorePlace => ({
    engine: 'sqlite',
    file: path.join(folder, `${String(count)}.db`),
  });
  try {
    const few = await medianAt(at(FEW), FEW);
    return { engine: 'sqlite', few, many: await medianAt(at(MANY), MANY) };
  } finally {
    fs.rmSync(folder, { recursive: true, force: true });
  }
};

const onServer = async (): Promise<FindTimes> => {
  const server = await startPostgres();
  const fresh = async (name: string): Promise<StorePlace> => {
    const client = new pg.Client({ connectionString: server.url });
    await client.connect();
    await client.query(`create database ${name}`).finally(() => client.end());
    const url = new URL(server.url);
    url.pathname = `/${name}`;
    return { engine: 'postgres', url: url.toString() };
  };
  try {
    const few = await medianAt(await fresh('few'), FEW);
    return { engine: 'postgres', few, many: await medianAt(await fresh('many'), MANY) };
  } finally {
    await server.stop();
  }
};

export const benchFind = async (): Promise<readonly FindTimes[]> => [
  await inFiles(),
  await onServer(),
];
