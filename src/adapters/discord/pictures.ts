import type { Answer } from '../../desk/index.ts';
import { picturesWanted } from '../common/draw.ts';
import type { Drawn } from '../common/pieces.ts';
import { isOver } from './faults.ts';
import { LIMITS } from './limits.ts';
import { type Message, pictured } from './render.ts';

/** Draws what an answer shows; nothing where it shows nothing. */
export type Draw = (answer: Answer) => Promise<readonly Drawn[]>;

/** A message that stands and can still be changed. */
export type Standing = {
  readonly message: Message;
  readonly change: (message: Message) => Promise<unknown>;
};

export type Picturing = {
  readonly draw: Draw;
  readonly noPicture: string;
  readonly onFault: (error: unknown) => void;
};

/** As many as a message holds. */
const fitting = (drawn: readonly Drawn[]): readonly Drawn[] => {
  let left: number = LIMITS.files;
  return drawn.filter(({ bytes }) => {
    if (bytes.length > left) return false;
    left -= bytes.length;
    return true;
  });
};

/**
 * The card stands already; its pictures are added to it when they are there. Where one cannot be
 * made or sent, the message says that nothing is missing but the picture.
 */
export const addPictures = async (
  { draw, noPicture, onFault }: Picturing,
  answer: Answer,
  { message, change }: Standing,
): Promise<void> => {
  const wanted = picturesWanted(answer);
  if (wanted === 0) return;
  const drawn = await draw(answer).catch((error: unknown) => {
    onFault(error);
    return [];
  });
  const shown = fitting(drawn).slice(0, LIMITS.galleryItems);
  const note = shown.length < wanted ? noPicture : null;
  try {
    await change(pictured(message, shown, note));
  } catch (error) {
    onFault(error);
    if (shown.length > 0 && !isOver(error))
      await change(pictured(message, [], noPicture)).catch(onFault);
  }
};
