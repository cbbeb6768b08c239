import { createWriteStream } from 'node:fs';
import { mkdir, readFile } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Answer, Attached, Call, Desk } from '../../desk/index.ts';

/** A line that takes a file in, the file behind a sign as in a shell: only an import has one. */
const WITH_FILE = /^(?<words>\s*\/?shop\s.*\bimport\b.*?)\s*<\s*(?<path>\S.*?)\s*$/iu;

/** What was typed, and the file that goes with it; null where that cannot be read. */
export const withFile = async (
  line: string,
): Promise<{
  readonly words: string;
  readonly file: string | null;
  readonly attached: readonly Attached[] | null;
}> => {
  const { words, path } = WITH_FILE.exec(line)?.groups ?? {};
  if (words === undefined || path === undefined) return { words: line, file: null, attached: [] };
  const text = await readFile(path, 'utf8').catch(() => null);
  const attached = text === null ? null : [{ name: basename(path), text }];
  return { words, file: path, attached };
};

/** Writes the files that an answer names, for who may have them, and gives their paths. */
export const handOver = async (
  desk: Desk,
  call: Call,
  answer: Answer,
  to: { readonly folder: string; readonly prefix: string },
): Promise<readonly string[]> => {
  const names = answer.kind === 'card' ? (answer.files ?? []) : [];
  const paths: string[] = [];
  for (const name of names) {
    const pieces = await desk.download(call, name);
    if (pieces === null) continue;
    // Everything a shop has kept is for nobody else on this machine.
    await mkdir(to.folder, { recursive: true, mode: 0o700 });
    const path = join(to.folder, `${to.prefix}${name}`);
    await pipeline(Readable.from(pieces), createWriteStream(path, { mode: 0o600 }));
    paths.push(path);
  }
  return paths;
};
