import type { TerminalPhrases } from '../book.ts';

const listed = (names: readonly string[]): string =>
  names.length < 2
    ? (names[0] ?? '')
    : `${names.slice(0, -1).join(', ')} and ${names.at(-1) ?? ''}`;

export const terminal: TerminalPhrases = {
  opening: [
    'Wholetooth, local channel: type a bar, a pattern and a pitch, such as 1.000 straight 21tpi 1018.',
    'No chat platform is connected; the README says how to connect Slack or Discord.',
    '/as Mara: Mara speaks from now on. /in #questions: in that channel.',
  ],
  prompt: '> ',
  speaks: (name, place) => `${name} speaks, in ${place}.`,
  tooLong: 'That is too long for a name. Type /as and a name, or /in and a channel.',
  noChannel: (typed) =>
    `"${typed}" is no channel. Type one word, such as /in #questions, or a thread, such as /in #questions/3fa2.`,
  demoFilling: 'Inventing a shop …',
  demoOpening: (folder) => [
    'Wholetooth, local channel of an invented shop: its people, parts and numbers are made up.',
    'Orla owns it, Mara supervises, Ben is the engineer, Kit, Dov and Sanna work the lathes.',
    'Try /knurl standard list, /knurl questions, /shop wheels, or /as Kit and 1.000 yellow bar straight wheel Fern on Bench lathe out 1.5.',
    `It is kept in ${folder}; remove that folder to begin again.`,
  ],
  posted: (place, rung, says) =>
    `→ Posted in ${place}${rung.length === 0 ? '' : `, for ${listed(rung)}`}: ${says}`,
  pinned: (place, says) => `→ Pinned in ${place}: ${says}`,
  unpinned: (place, says) => `→ Pin taken off in ${place}: ${says}`,
  threadOpened: (place, title) => `→ Thread ${place} opened: ${title}`,
  told: (people, says) => `→ ${listed(people)} told: ${says}`,
  edited: (place, says, under) =>
    `→ Changed in ${place}: ${says}${under === null ? '' : `${/[.!?…]$/u.test(says) ? '' : '.'} ${under}`}`,
  usage:
    'Give one line in quotes, such as: npm run --silent ask -- "/knurl 1.000 straight 21tpi 1018"',
  unitsArgument: '--units takes in or mm.',
  fault: 'Something went wrong here, not in what you typed. Nothing was changed; send it again.',
  fileAt: (path) => `File: ${path}`,
  noFiles: 'The files could not be written. Check the folder, then ask again.',
  noSuchFile: (path) => `There is no file ${path} to read. Nothing was taken in; check its name.`,
  pictureAt: (path) => `Picture: ${path}`,
  noPicture: 'A picture could not be shown. Nothing else is missing from the card.',
};
