/** Programs of the tests' own, run as processes that can be killed. */
import { type ChildProcess, spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { build } from 'vite';
import { onTestFinished } from 'vitest';

export type Program = {
  readonly process: ChildProcess;
  /** Every whole line it has said so far. */
  readonly lines: readonly string[];
  /** The next line that begins so. */
  readonly says: (beginning: string) => Promise<string>;
  readonly ended: Promise<number | null>;
};

const root = fileURLToPath(new URL('../..', import.meta.url));

/** Translates programs once, so that a hundred of their lives do not each begin with that. */
export const builtFolder = async (
  sources: readonly URL[],
): Promise<{ readonly folder: string; readonly remove: () => void }> => {
  const above = path.join(root, 'dist', 'programs');
  fs.mkdirSync(above, { recursive: true });
  const folder = fs.mkdtempSync(path.join(above, 'one-'));
  await build({
    root,
    configFile: false,
    logLevel: 'silent',
    build: {
      ssr: true,
      rolldownOptions: { input: sources.map((source) => fileURLToPath(source)) },
      outDir: folder,
      target: 'node20',
      minify: false,
    },
  });
  return { folder, remove: () => fs.rmSync(folder, { recursive: true, force: true }) };
};

/** One program, for as long as the test runs. */
export const builtProgram = async (source: URL): Promise<string> => {
  const { folder, remove } = await builtFolder([source]);
  onTestFinished(remove);
  return path.join(folder, path.basename(source.pathname).replace(/\.ts$/u, '.js'));
};

/** Starts a built program. What it is told stands in its arguments, as JSON. */
export const startProgram = (file: string, told: unknown): Program => {
  const child = spawn(process.execPath, [file, JSON.stringify(told)], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'inherit', 'ipc'],
  });
  const lines: string[] = [];
  const waiting: { beginning: string; resolve: (line: string) => void }[] = [];
  if (child.stdout === null) throw new Error('a program without a voice');
  const reader = createInterface({ input: child.stdout });
  reader.on('line', (line) => {
    lines.push(line);
    for (const one of waiting.filter(({ beginning }) => line.startsWith(beginning))) {
      waiting.splice(waiting.indexOf(one), 1);
      one.resolve(line);
    }
  });
  const read = new Promise<void>((resolve) => reader.on('close', resolve));
  const exited = new Promise<number | null>((resolve) => child.on('exit', resolve));
  return {
    process: child,
    lines,
    says: (beginning) => {
      const line = lines.find((one) => one.startsWith(beginning));
      if (line !== undefined) return Promise.resolve(line);
      return new Promise((resolve, reject) => {
        waiting.push({ beginning, resolve });
        void exited.then((code) => {
          reject(new Error(`it ended (${String(code)}) without saying ${beginning}`));
        });
      });
    },
    // Whatever it said before it was killed has been read by then.
    ended: Promise.all([exited, read]).then(([code]) => code),
  };
};
