/** A message as a person reads it. */

import { textsIn } from '../../platforms/discord/payloads.ts';
import { buttonsOf } from '../../platforms/discord/people.ts';
import type { Posted } from '../../platforms/discord/rooms.ts';

/** What is typed for Discord's eyes only is taken back. */
const plain = (text: string): string => text.replaceAll(/\\([^\p{L}\p{N}\s])/gu, '$1');

/** Everything that is read in a message. */
export const readIn = (message: Pick<Posted, 'body'>): string =>
  plain(textsIn(message.body).join('\n').replaceAll('**', ''));

/** A message line by line: to whom, what it says, its pictures in words, its buttons. */
export const seenAs = (message: Posted): string =>
  [
    message.only === null ? '(in the channel)' : '(to whoever asked alone)',
    textsIn(message.body).map(plain).join('\n\n'),
    ...message.files.map(({ name, alt }) => `${name}: ${alt}`),
    buttonsOf(message)
      .map(({ label }) => `[${label ?? ''}]`)
      .join(' '),
  ]
    .filter((each) => each !== '')
    .join('\n\n');

/** The same card twice has two codes. */
export const withoutCodes = (text: string): string =>
  text.replaceAll(/\b([Cc]ard|Question) [2346789CFHJKMPRTWXY]{5,12}\b/gu, '$1 CODE');
