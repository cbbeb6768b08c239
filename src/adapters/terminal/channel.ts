import { randomUUID } from 'node:crypto';
import { createInterface } from 'node:readline';
import type { Readable, Writable } from 'node:stream';
import type { Answer, Call, Desk } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { spoken } from '../common/spoken.ts';
import { cardText, printable, wrapped } from '../common/text.ts';
import { handOver, withFile } from './files.ts';
import { pictureLines } from './pictures.ts';
import { FIRST, moved, promptFor, type Speaker } from './speaker.ts';

/** Widest card that is still read at a glance, where the terminal would allow more. */
const READABLE_WIDTH = 100;
/** A phone held upright. */
export const PHONE_WIDTH = 48;

export const widthOf = (columns: number | undefined, phone: boolean): number =>
  phone ? PHONE_WIDTH : Math.min(columns ?? READABLE_WIDTH, READABLE_WIDTH);

/** Tells the lines of this run from those of every other: each acts once. */
const RUN = randomUUID();

/** A line typed in the terminal, as the desk takes it. */
export const terminalCall = (
  words: string,
  number: number,
  { person, place }: Speaker = FIRST,
): Call => ({
  shop: 'terminal',
  person,
  place,
  interactionId: `${RUN}-${String(number)}`,
  given: { words },
});

export type ChannelOptions = {
  readonly desk: Desk;
  readonly book: Book;
  readonly input: Readable;
  readonly output: Writable;
  /** A person is typing and sees it; what comes from a file is shown before its answer. */
  readonly interactive: boolean;
  /** What is said before anything is asked. */
  readonly opening?: readonly string[];
  /** Who speaks until somebody else does. */
  readonly speaker?: Speaker;
  readonly width: () => number;
  readonly onFault: (error: unknown) => void;
  /** Writes the pictures of the answer to a line and says where; null where none are wanted. */
  readonly pictures: ((answer: Answer, line: number) => Promise<readonly string[]>) | null;
  /** Where the files go that an answer hands over; null where none are wanted. */
  readonly files?: string | null;
  /** Brings about what an answer left to be done, and says how much that was. */
  readonly settle?: () => Promise<number>;
};

export const written = (output: Writable, text: string): Promise<void> =>
  new Promise((done) => {
    output.write(text, () => {
      done();
    });
  });

/** A sentence no wider than asked, going on under itself. */
export const sentenceText = (text: string, width: number): string =>
  wrapped(text, width - INDENT.length).join(`\n${INDENT}`);
const INDENT = '  ';

const pictured = async (
  { pictures, book, output, onFault }: ChannelOptions,
  answer: Answer,
  line: number,
): Promise<void> => {
  if (pictures === null) return;
  const paths = await pictures(answer, line).catch((error: unknown) => {
    onFault(error);
    return [];
  });
  const lines = pictureLines(answer, paths, book);
  if (lines.length > 0) await written(output, `${lines.join('\n')}\n\n`);
};

const filed = async (
  { desk, files = null, book, output, onFault }: ChannelOptions,
  call: Call,
  answer: Answer,
  line: number,
): Promise<void> => {
  if (files === null) return;
  try {
    const paths = await handOver(desk, call, answer, { folder: files, prefix: `${String(line)}-` });
    if (paths.length > 0)
      await written(output, `${paths.map(book.terminal.fileAt).join('\n')}\n\n`);
  } catch (error) {
    onFault(error);
    await written(output, `${book.terminal.noFiles}\n\n`);
  }
};

/** What happened besides stands under the card, before anything else is answered. */
const settled = async ({ settle, output, onFault }: ChannelOptions): Promise<void> => {
  try {
    if (settle !== undefined && (await settle()) > 0) await written(output, '\n');
  } catch (error) {
    // It is kept, and done with the next answer.
    onFault(error);
  }
};

const answered = async (options: ChannelOptions, call: Call, line: number): Promise<void> => {
  const { desk, book, output, width } = options;
  try {
    const answer = await desk.answer(call);
    await written(output, `${cardText(spoken(answer, book), width())}\n\n`);
    // The card stands already: nobody waits for a picture to read it.
    await pictured(options, answer, line);
    await filed(options, call, answer, line);
  } catch (error) {
    options.onFault(error);
    await written(output, `${book.terminal.fault}\n\n`);
  }
  await settled(options);
};

/** The local channel: one card a line, until the input ends. */
export const runChannel = async (options: ChannelOptions): Promise<void> => {
  const { book, input, output, interactive, width } = options;
  const { terminal } = book;
  const run = randomUUID();
  let { speaker = FIRST } = options;
  const { opening = terminal.opening } = options;
  const said = opening.map((text) => sentenceText(text, width()));
  if (said.length > 0) await written(output, `${said.join('\n')}\n\n`);
  const lines = createInterface({ input, crlfDelay: Number.POSITIVE_INFINITY });
  const prompt = async (typed: string): Promise<void> => {
    await written(output, `${promptFor(speaker, terminal.prompt)}${typed}`);
  };
  let number = 0;
  if (interactive) await prompt('');
  for await (const line of lines) {
    number += 1;
    if (!interactive) await prompt(`${printable(line)}\n`);
    const move = moved(line, speaker, terminal);
    const { words, file, attached } = await withFile(line);
    if (move !== null) {
      speaker = move.speaker;
      await written(output, `${sentenceText(move.said, width())}\n\n`);
    } else if (attached === null) {
      await written(output, `${sentenceText(terminal.noSuchFile(file ?? ''), width())}\n\n`);
    } else {
      // Every line of every conversation acts once.
      const interactionId = `${run}-${String(number)}`;
      const call = { ...terminalCall(words, number, speaker), interactionId, attached };
      await answered(options, call, number);
    }
    if (interactive) await prompt('');
  }
};
