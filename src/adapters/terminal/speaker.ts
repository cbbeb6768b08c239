import type { Person, Place } from '../../desk/index.ts';
import type { TerminalPhrases } from '../../phrases/index.ts';

/** Who speaks in the local channel, and where. */
export type Speaker = { readonly person: Person; readonly place: Place };

/** Longer than any name; what is longer was pasted by mistake. Judgement. */
const LONGEST = 60;

/** The id of a person who is called so, however it is spelt. */
export const personId = (called: string): string =>
  called.normalize('NFC').trim().replaceAll(/\s+/gu, ' ').toLowerCase();

/** A name as names are written, where it was typed in a hurry. */
export const nameOf = (called: string): string => {
  const name = called.trim().replaceAll(/\s+/gu, ' ');
  return name === personId(name)
    ? name.replaceAll(/(?<=^|[\s-])\p{Ll}/gu, (letter) => letter.toUpperCase())
    : name;
};

const personOf = (called: string): Person => ({ id: personId(called), name: nameOf(called) });

/** `#questions/3fa2` is a thread of the channel `questions`. */
const placeOf = (typed: string): Place => {
  const [channel = '', thread = ''] = typed.replace(/^#/u, '').toLowerCase().split('/');
  return { channel, thread: thread === '' ? null : thread, isPrivate: false };
};

/** A place as it is typed and shown. */
export const placeText = ({ channel, thread }: Pick<Place, 'channel' | 'thread'>): string =>
  `#${channel}${thread === null ? '' : `/${thread}`}`;

/** Whoever opens the channel, where nobody says who they are. */
export const FIRST: Speaker = { person: personOf('terminal'), place: placeOf('floor') };

export const speakerCalled = (called: string): Speaker => ({ ...FIRST, person: personOf(called) });

/** What is typed before an answer: nothing of it where nobody has said who speaks or where. */
export const promptFor = ({ person, place }: Speaker, prompt: string): string => {
  const isFirst = person.id === FIRST.person.id;
  const isThere = placeText(place) === placeText(FIRST.place);
  const said = [...(isFirst ? [] : [person.name]), ...(isThere ? [] : [placeText(place)])];
  return `${said.join(' ')}${prompt}`;
};

/**
 * `/as Mara` and `/in #standards` change who speaks and where, and ask nothing of the desk; null
 * for every other line.
 */
export const moved = (
  line: string,
  speaker: Speaker,
  phrases: TerminalPhrases,
): { readonly speaker: Speaker; readonly said: string } | null => {
  const { verb, rest } = /^\s*\/(?<verb>as|in)(?:\s+(?<rest>.*))?$/iu.exec(line)?.groups ?? {};
  if (verb === undefined) return null;
  const typed = (rest ?? '').trim();
  const staying = (said: string) => ({ speaker, said });
  const where = (then: Speaker) => ({
    speaker: then,
    said: phrases.speaks(then.person.name, placeText(then.place)),
  });
  if (typed === '') return where(speaker);
  if (typed.length > LONGEST) return staying(phrases.tooLong);
  if (verb.toLowerCase() === 'as') return where({ ...speaker, person: personOf(typed) });
  return /^#?[^\s#/]+(?:\/[^\s#/]+)?$/u.test(typed)
    ? where({ ...speaker, place: placeOf(typed) })
    : staying(phrases.noChannel(typed));
};
