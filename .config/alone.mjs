/** One process at a time, across processes: a folder as a lock, with the owner's id inside. */
import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

const OWNER = 'owner.json';
const HEARTBEAT_MS = 2_000;
const SILENT_MS = 30_000;

/** Two starts at once must not install or build into each other: the second waits for the first.
 * @param {string} lock a folder that is there while somebody works
 * @param {() => Promise<void>} work */
export async function alone(lock, work) {
  await take(lock);
  const beat = setInterval(() => {
    const now = new Date();
    fs.utimes(lock, now, now, () => undefined);
  }, HEARTBEAT_MS);
  try {
    await work();
  } finally {
    clearInterval(beat);
    fs.rmSync(lock, { recursive: true, force: true });
  }
}

/** @param {string} lock */
async function take(lock) {
  fs.mkdirSync(path.dirname(lock), { recursive: true });
  let told = false;
  while (!tryMakeFolder(lock)) {
    if (isAbandoned(lock)) removeAbandoned(lock);
    else if (!told) {
      told = true;
      process.stderr.write('Another start is installing or building; waiting for it …\n');
    }
    await pause(100);
  }
  fs.writeFileSync(
    path.join(lock, OWNER),
    JSON.stringify({ pid: process.pid, host: os.hostname() }),
  );
}

/** @param {string} folder */
function tryMakeFolder(folder) {
  try {
    fs.mkdirSync(folder);
    return true;
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code === 'EEXIST') return false;
    throw error;
  }
}

/** Its owner has ended, or has given no sign of life for long (another container, a reused id).
 * @param {string} lock */
function isAbandoned(lock) {
  const touched = fs.statSync(lock, { throwIfNoEntry: false })?.mtimeMs;
  if (touched === undefined) return false;
  if (Date.now() - touched > SILENT_MS) return true;
  const owner = ownerOf(lock);
  return owner?.host === os.hostname() && !isAlive(owner.pid);
}

/** @param {string} lock
 * @returns {{ pid: number, host: string } | undefined} */
function ownerOf(lock) {
  try {
    /** @type {unknown} */
    const owner = JSON.parse(fs.readFileSync(path.join(lock, OWNER), 'utf8'));
    return /** @type {{ pid: number, host: string }} */ (owner);
  } catch {
    // Not yet written, or just removed: nobody is known to have ended.
    return undefined;
  }
}

/** @param {number} pid */
function isAlive(pid) {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return /** @type {NodeJS.ErrnoException} */ (error).code === 'EPERM';
  }
}

/** Of several that wait, one removes; it looks again first, so that it never removes a new lock.
 * @param {string} lock */
function removeAbandoned(lock) {
  const guard = `${lock}.removing`;
  if (!tryMakeFolder(guard)) {
    const made = fs.statSync(guard, { throwIfNoEntry: false })?.mtimeMs;
    if (made !== undefined && Date.now() - made > SILENT_MS)
      fs.rmSync(guard, { recursive: true, force: true });
    return;
  }
  try {
    if (isAbandoned(lock)) fs.rmSync(lock, { recursive: true, force: true });
  } finally {
    fs.rmSync(guard, { recursive: true, force: true });
  }
}
