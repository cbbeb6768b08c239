import type { Attachment } from 'discord.js';
import type { Answer, Attached, Call, Desk } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { LIMITS } from './limits.ts';
import { type Message, sentenceWith } from './render.ts';

/** Lists of a shop are far smaller. Judgement. */
const MOST_READ = 4 * 1024 * 1024;
const READ_PATIENCE_MS = 10_000;
const MEGABYTE = 1024 * 1024;

/** What may be a list, and no photograph of one. */
export const isTable = ({ name, contentType }: Attachment): boolean =>
  /\.(?:csv|tsv|txt)$/iu.test(name) || contentType?.startsWith('text/') === true;

/** A file that nobody reads, in a sentence. */
export class FileRefused extends Error {}

const textOf = async (book: Book, { url, name, size }: Attachment): Promise<Attached> => {
  if (size > MOST_READ)
    throw new FileRefused(book.discord.fileTooLarge(name, MOST_READ / MEGABYTE));
  const response = await fetch(url, {
    redirect: 'error',
    signal: AbortSignal.timeout(READ_PATIENCE_MS),
  });
  if (!response.ok) throw new Error(`HTTP ${String(response.status)}`);
  return { name, text: await response.text() };
};

/** The call with the files that came with it, as text. */
export const withFiles = async (
  book: Book,
  call: Call,
  attachments: readonly Attachment[],
): Promise<Call> =>
  attachments.length === 0
    ? call
    : { ...call, attached: await Promise.all(attachments.map((each) => textOf(book, each))) };

type Content = { readonly name: string; readonly bytes: Buffer };

/** Null where it is larger than a message holds; the rest of it is not made then. */
const contentOf = async (name: string, parts: AsyncIterable<string>): Promise<Content | null> => {
  const chunks: Buffer[] = [];
  let length = 0;
  for await (const part of parts) {
    const chunk = Buffer.from(part, 'utf8');
    length += chunk.length;
    if (length > LIMITS.files) return null;
    chunks.push(chunk);
  }
  return { name, bytes: Buffer.concat(chunks) };
};

/** The messages with the files that an answer names, for the one person who may have them. */
export const filesFor = async (
  desk: Desk,
  book: Book,
  call: Call,
  answer: Answer,
): Promise<readonly Message[]> => {
  const names = answer.kind === 'card' ? (answer.files ?? []) : [];
  const messages: Message[] = [];
  let together: Content[] = [];
  const done = (): void => {
    if (together.length > 0) messages.push(sentenceWith(book.discord.filesHere, together));
    together = [];
  };
  for (const name of names) {
    const parts = await desk.download(call, name);
    if (parts === null) continue;
    const content = await contentOf(name, parts);
    if (content === null) {
      const tooLarge = book.discord.fileTooLarge(name, LIMITS.files / MEGABYTE);
      messages.push(sentenceWith(tooLarge, []));
      continue;
    }
    const size = [...together, content].reduce((sum, { bytes }) => sum + bytes.length, 0);
    if (size > LIMITS.files || together.length === LIMITS.filesInMessage) done();
    together.push(content);
  }
  done();
  return messages;
};
