import fs from 'node:fs';
import path from 'node:path';
import { config as loadEnvironment } from 'dotenv';
import { fill } from './demo/fill.ts';
import { OWNER } from './demo/said.ts';
import { localDeliveries, localDesk, runLocalChannel } from './localChannel.ts';
import { en } from './phrases/index.ts';
import { recordsFault } from './records.ts';
import { openStore, type StorePlace, storePlace } from './store/index.ts';

/** Beside the real records, never among them: a server is not asked. */
const demoFolder = (): string => path.resolve(process.env['WHOLETOOTH_DATA'] || '.data', 'demo');
const placeIn = (folder: string): StorePlace => storePlace({ WHOLETOOTH_DATA: folder });

/** Fills a folder that is put in its place once it is whole. */
const filled = async (folder: string): Promise<void> => {
  const half = `${folder}.${String(process.pid)}`;
  const clock = { now: Date.now() };
  const now = (): number => clock.now;
  const store = await openStore(placeIn(half));
  try {
    const { deliverDue: settle } = localDeliveries(store, now, () => Promise.resolve());
    await fill({ desk: localDesk(store, now), clock, settle });
  } catch (error) {
    await store.close();
    fs.rmSync(half, { recursive: true, force: true });
    throw error;
  }
  await store.close();
  fs.renameSync(half, folder);
};

/** A folder as a person would type it from where they are. */
const shown = (folder: string): string => {
  const near = path.relative(process.cwd(), folder);
  return near.startsWith('..') ? folder : near;
};

try {
  loadEnvironment({ quiet: true });
  const folder = demoFolder();
  const isThere = fs.existsSync(folder);
  if (!isThere) {
    process.stdout.write(`${en.terminal.demoFilling}\n`);
    await filled(folder);
  }
  const opening = en.terminal.demoOpening(shown(folder));
  await runLocalChannel(placeIn(folder), { as: OWNER, opening });
} catch (error) {
  const sentence = recordsFault(error);
  if (sentence === null) throw error;
  process.stderr.write(`${sentence}\n`);
  process.exitCode = 1;
}
