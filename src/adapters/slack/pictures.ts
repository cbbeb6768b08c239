import type { Answer } from '../../desk/index.ts';
import type { Book, SpokenCard } from '../../phrases/index.ts';
import { picturesWanted } from '../common/draw.ts';
import type { Drawn } from '../common/pieces.ts';
import type { Message } from './render.ts';
import type { Sender, Sent, Where } from './send.ts';

/** Draws what an answer shows; nothing where it shows nothing. */
export type Draw = (answer: Answer) => Promise<readonly Drawn[]>;

type Picturing = {
  readonly sender: Sender;
  readonly where: Where;
  readonly draw: Draw;
  readonly onFault: (error: unknown) => void;
};

/** Sends every picture that can be made, in the card's own place; whether none is missing. */
export const sendPictures = async (
  { sender, where, draw, onFault }: Picturing,
  answer: Answer,
): Promise<boolean> => {
  const drawn = await draw(answer).catch((error: unknown) => {
    onFault(error);
    return [];
  });
  let sent = 0;
  for (const picture of drawn)
    try {
      await sender.picture(where, picture);
      sent += 1;
    } catch (error) {
      onFault(error);
    }
  return sent >= picturesWanted(answer);
};

/** The card, with the sentence that nothing is missing from it but the picture. */
export const withoutPicture = (card: SpokenCard, book: Book): SpokenCard => ({
  ...card,
  parts: [...card.parts, { part: 'own', texts: [book.terminal.noPicture] }],
});

/** Changes what stands into what is to stand; what is more than before is posted after it. */
export const change = async (
  sender: Sender,
  standing: readonly { readonly sent: Sent; readonly message: Message }[],
  messages: readonly Message[],
  post: (message: Message, index: number) => Promise<unknown>,
): Promise<void> => {
  for (const [index, message] of messages.entries()) {
    const before = standing[index];
    if (before === undefined) await post(message, index);
    else if (JSON.stringify(before.message) !== JSON.stringify(message))
      await sender.edit(before.sent, message);
  }
};
