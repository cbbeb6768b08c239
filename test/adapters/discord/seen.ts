/** A message as a person reads it. */
import { textsIn } from '../../platforms/discord/payloads.ts';
import type { Posted } from '../../platforms/discord/rooms.ts';

/** What is typed for Discord's eyes only is taken back. */
const plain = (text: string): string => text.replaceAll(/\\([^\p{L}\p{N}\s])/gu, '$1');

/** Everything that is read in a message. */
export const readIn = (message: Pick<Posted, 'body'>): string =>
  plain(textsIn(message.body).join('\n').replaceAll('**', ''));
