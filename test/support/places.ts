/** Places for records: a file of its own, or a database of its own on the run's server. */
import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import pg from 'pg';
import { inject, onTestFinished } from 'vitest';
import { type Engine, MADE_TABLES, type StorePlace, TABLES } from '../../src/store/index.ts';

export const ENGINES: readonly Engine[] = ['sqlite', 'postgres'];

export type TestPlace = StorePlace & { readonly remove: () => Promise<void> };

/** A place that nobody has used. */
export const newPlace = async (engine: Engine): Promise<TestPlace> =>
  engine === 'sqlite' ? newFile() : await newDatabase();

/** A place without records; a database that another test of this file is through with will do. */
export const emptyPlace = async (engine: Engine): Promise<TestPlace> => {
  if (engine === 'sqlite') return newFile();
  const url = used.pop();
  const place = url === undefined ? await newDatabase() : { engine, url };
  return {
    ...place,
    remove: async () => {
      await onServer((client) => client.query(EMPTIED), place.url);
      used.push(place.url);
    },
  };
};

const used: string[] = [];
const EMPTIED = `truncate ${[...TABLES.map(({ name }) => name), ...MADE_TABLES].join(', ')}`;

/** A folder that is gone when the test is over. */
export const newFolder = (): string => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'wholetooth-test-'));
  onTestFinished(() => fs.rmSync(folder, { recursive: true, force: true }));
  return folder;
};

const newFile = (): TestPlace & { engine: 'sqlite' } => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'wholetooth-records-'));
  return {
    engine: 'sqlite',
    file: path.join(folder, 'wholetooth.db'),
    remove: () => {
      fs.rmSync(folder, { recursive: true, force: true });
      return Promise.resolve();
    },
  };
};

const newDatabase = async (): Promise<TestPlace & { engine: 'postgres' }> => {
  const name = `records_${randomBytes(8).toString('hex')}`;
  await onServer((client) => client.query(`create database ${name}`));
  const url = new URL(inject('postgres'));
  url.pathname = `/${name}`;
  return {
    engine: 'postgres',
    url: url.toString(),
    remove: () =>
      onServer((client) => client.query(`drop database if exists ${name} with (force)`)),
  };
};

/** Speaks to the server itself, past everything of ours. */
export const onServer = async (
  speak: (client: pg.Client) => Promise<unknown>,
  url = inject('postgres'),
): Promise<void> => {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await speak(client);
  } finally {
    await client.end();
  }
};
