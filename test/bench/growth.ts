/**
 * What an answer costs in a shop with a thousand cards and in one with a million: the same lines
 * in turn, so that whatever else the machine does falls on both alike. The medians are to differ
 * by less than half as much again.
 *
 *     npm run bench:growth                 both engines
 *     npm run bench:growth -- sqlite 100000
 */
import { randomUUID } from 'node:crypto';
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { performance } from 'node:perf_hooks';
import pg from 'pg';
import { FLEET } from '../../commands/index.ts';
import { terminalCall } from '../../src/adapters/terminal/index.ts';
import type { Card } from '../../src/card/index.ts';
import { type Desk, openRecordsDesk } from '../../src/desk/index.ts';
import { CODE_SIGNS } from '../../src/shop/index.ts';
import { type CardTable, openStore, type Store, type StorePlace } from '../../src/store/index.ts';
import { startPostgres } from '../support/postgresServer.ts';

const FEW = 1_000;
const MANY = 1_000_000;
const ROUNDS = 150;
const WARM_UP = 20;
/** Rows in a statement, statements in a change: what loads quickest on both engines. */
const ROWS = 1_000;
const STATEMENTS = 20;
const CODE_LENGTH = 5;
const WHEELS = 12;
const MINUTE = 60_000;

type Shop = { readonly desk: Desk; readonly store: Store; readonly code: string };

const print = (line: string): void => void process.stdout.write(`${line}\n`);

const ask = async (desk: Desk, words: string): Promise<string> => {
  const call = { ...terminalCall(words, 1), interactionId: randomUUID() };
  const answer = await desk.answer(call);
  if (answer.kind === 'refusal') throw new Error(`refused: ${words}`);
  return JSON.stringify(answer.card.parts);
};

/** A code of its own for every number, as spread as chance would have them. */
const codeOf = (number: number): string => {
  const all = CODE_SIGNS.length ** CODE_LENGTH;
  let rest = (number * 1_000_003) % all;
  return Array.from({ length: CODE_LENGTH }, () => {
    const sign = CODE_SIGNS[rest % CODE_SIGNS.length] ?? '';
    rest = Math.floor(rest / CODE_SIGNS.length);
    return sign;
  }).join('');
};

/** Cards like one that was made, a minute apart, the last of them now; the older without their parts. */
const load = async (store: Store, like: CardTable, count: number): Promise<void> => {
  const before = like.made_at - count * MINUTE;
  const bare = JSON.stringify({
    ...(JSON.parse(like.card) as Card),
    parts: [],
    lists: {},
    ways: [],
  });
  for (let start = 0; start < count; start += ROWS * STATEMENTS)
    await store.transact(async (tx) => {
      const end = Math.min(start + ROWS * STATEMENTS, count);
      for (let at = start; at < end; at += ROWS) {
        const rows = Array.from({ length: Math.min(ROWS, end - at) }, (_, i): CardTable => {
          const made_at = before + (at + i) * MINUTE;
          const card = at + i >= count - FEW ? like.card : bare;
          const code = codeOf(at + i);
          // The card that was made has one of these by chance.
          const free = code === like.code ? codeOf(count) : code;
          return { ...like, id: tx.newId(made_at), made_at, code: free, card };
        });
        await tx.insertInto('card').values(rows).execute();
      }
    });
};

const shopWith = async (place: StorePlace, count: number): Promise<Shop> => {
  const store = await openStore(place);
  const options = { platform: 'terminal', program: 'bench', now: Date.now };
  const desk = openRecordsDesk(FLEET, store, options);
  for (let wheel = 1; wheel <= WHEELS; wheel += 1)
    await ask(desk, `/shop wheels add W${String(wheel)} straight 21 tpi`);
  await ask(desk, '1.000 straight wheel W1 1018');
  const like = await store.read.selectFrom('card').selectAll().executeTakeFirstOrThrow();
  const start = performance.now();
  await load(store, like, count);
  if (place.engine === 'postgres') {
    // The server does this by itself in a while.
    const client = new pg.Client({ connectionString: place.url });
    await client.connect();
    await client.query('analyze');
    await client.end();
  }
  const seconds = ((performance.now() - start) / 1000).toFixed(0);
  print(`  ${String(count)} cards loaded in ${seconds} s`);
  return { desk, store, code: codeOf(count - FEW / 2) };
};

const LINES: Readonly<Record<string, (code: string, round: number) => string>> = {
  setup: (_, round) => `${(1 + round / 1000).toFixed(3)} straight wheel W1 1018`,
  card: (code) => `/knurl card ${code}`,
  'wheel list': () => '/shop wheels',
};

const median = (times: readonly number[]): number =>
  times.toSorted((a, b) => a - b)[Math.floor(times.length / 2)] ?? Number.NaN;

const compare = async (shops: readonly [few: Shop, many: Shop]): Promise<void> => {
  for (const [name, line] of Object.entries(LINES)) {
    const times: [number[], number[]] = [[], []];
    for (let round = 0; round < ROUNDS + WARM_UP; round += 1)
      for (const [at, { desk, code }] of shops.entries()) {
        const start = performance.now();
        await ask(desk, line(code, round));
        if (round >= WARM_UP) times[at]?.push(performance.now() - start);
      }
    const [few, many] = [median(times[0]), median(times[1])];
    print(
      `  ${name.padEnd(12)} ${few.toFixed(2)} ms and ${many.toFixed(2)} ms: ${(many / few).toFixed(2)} times`,
    );
  }
};

const growth = async (places: readonly [StorePlace, StorePlace], most: number): Promise<void> => {
  const few = await shopWith(places[0], FEW);
  const many = await shopWith(places[1], most);
  try {
    await compare([few, many]);
  } finally {
    await few.store.close();
    await many.store.close();
  }
};

const inSqlite = async (most: number): Promise<void> => {
  const folder = fs.mkdtempSync(path.join(os.tmpdir(), 'wholetooth-bench-'));
  const placeOf = (name: string): StorePlace => ({
    engine: 'sqlite',
    file: path.join(folder, name),
  });
  try {
    await growth([placeOf('few.db'), placeOf('many.db')], most);
  } finally {
    fs.rmSync(folder, { recursive: true, force: true });
  }
};

const inPostgres = async (most: number): Promise<void> => {
  const server = await startPostgres();
  const placeOf = async (name: string): Promise<StorePlace> => {
    const client = new pg.Client({ connectionString: server.url });
    await client.connect();
    await client.query(`create database ${name}`);
    await client.end();
    const url = new URL(server.url);
    url.pathname = `/${name}`;
    return { engine: 'postgres', url: url.toString() };
  };
  try {
    await growth([await placeOf('few'), await placeOf('many')], most);
  } finally {
    await server.stop();
  }
};

const [engine = 'both', most = String(MANY)] = process.argv.slice(2);
for (const [name, run] of [
  ['sqlite', inSqlite],
  ['postgres', inPostgres],
] as const)
  if (engine === 'both' || engine === name) {
    print(`${name}:`);
    await run(Number(most));
  }
