import { randomUUID } from 'node:crypto';
import { createInterface } from 'node:readline';
import type { Readable, Writable } from 'node:stream';
import type { Answer, Call, Desk } from '../../desk/index.ts';
import type { Book } from '../../phrases/index.ts';
import { spoken } from '../common/spoken.ts';
import { cardText } from '../common/text.ts';

/** Widest card that is still read at a glance, where the terminal would allow more. */
const READABLE_WIDTH = 100;
/** A phone held upright. */
export const PHONE_WIDTH = 48;

export const widthOf = (columns: number | undefined, phone: boolean): number =>
  phone ? PHONE_WIDTH : Math.min(columns ?? READABLE_WIDTH, READABLE_WIDTH);

/** Tells the lines of this run from those of every other: each acts once. */
const RUN = randomUUID();

/** A line typed in the terminal, as the desk takes it. */
export const terminalCall = (words: string, number: number): Call => ({
  shop: 'terminal',
  person: { id: 'terminal', name: 'terminal' },
  place: { channel: 'terminal', thread: null, isPrivate: false },
  interactionId: `${RUN}-${String(number)}`,
  given: { words },
});

export type ChannelOptions = {
  readonly desk: Desk;
  readonly book: Book;
  readonly input: Readable;
  readonly output: Writable;
  /** A person is typing: prompt and keep the conversation apart from the cards. */
  readonly interactive: boolean;
  readonly width: () => number;
  readonly onFault: (error: unknown) => void;
  /** Writes the pictures of the answer to a line and says where; null where none are wanted. */
  readonly pictures: ((answer: Answer, line: number) => Promise<readonly string[]>) | null;
};

const written = (output: Writable, text: string): Promise<void> =>
  new Promise((done) => {
    output.write(text, () => {
      done();
    });
  });

const pictured = async (
  { pictures, book, output, onFault }: ChannelOptions,
  answer: Answer,
  line: number,
): Promise<void> => {
  if (pictures === null) return;
  try {
    const paths = await pictures(answer, line);
    if (paths.length > 0)
      await written(output, `${paths.map(book.terminal.pictureAt).join('\n')}\n\n`);
  } catch (error) {
    onFault(error);
    await written(output, `${book.terminal.noPicture}\n\n`);
  }
};

/** The local channel: one card a line, until the input ends. */
export const runChannel = async (options: ChannelOptions): Promise<void> => {
  const { desk, book, input, output, interactive, width } = options;
  await written(output, `${book.terminal.opening.join('\n')}\n\n`);
  const lines = createInterface({ input, crlfDelay: Number.POSITIVE_INFINITY });
  const prompt = async (): Promise<void> => {
    if (interactive) await written(output, book.terminal.prompt);
  };
  let number = 0;
  await prompt();
  for await (const line of lines) {
    number += 1;
    try {
      const answer = await desk.answer(terminalCall(line, number));
      await written(output, `${cardText(spoken(answer, book), width())}\n\n`);
      // The card stands already: nobody waits for a picture to read it.
      await pictured(options, answer, number);
    } catch (error) {
      options.onFault(error);
      await written(output, `${book.terminal.fault}\n\n`);
    }
    await prompt();
  }
};
