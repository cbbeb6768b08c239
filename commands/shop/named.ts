import type { z } from 'zod';
import { type Lead, parameterOf, said } from '../../src/desk/index.ts';
import {
  type AnyParameter,
  knownName,
  leadingText,
  type Names,
  type Suggested,
  textOf,
  type Vocabulary,
  vocabularyOf,
} from '../../src/words/index.ts';

/** What a list's commands read besides the name: whatever of that stands in the line ends it. */
export type Others = () => readonly AnyParameter[];

const vocabulary = (others: Others): Vocabulary => vocabularyOf(others());

/** The records behind the fields of a command's parameters. */
export const recordsOf =
  (fields: Readonly<Record<string, z.core.$ZodType>>): Others =>
  () =>
    Object.values(fields).map(parameterOf);

/** The name of something, where it does not stand first: an option of a form. */
export const nameField = (others: Others, examples: readonly string[], suggests?: Suggested) =>
  said<string>({
    name: 'name',
    read: textOf(() => vocabulary(others)),
    keywords: ['name', 'named', 'called'],
    text: true,
    ...(suggests === undefined ? {} : { suggests }),
    examples,
  });

/** A new name, before anything that can be read. */
export const newName =
  (others: Others): Lead =>
  (cursor) => {
    const reading = leadingText(cursor, vocabulary(others));
    if (reading === null) return null;
    return 'refusal' in reading ? { ...reading, choices: [] } : reading;
  };

/** A name that is on the list; one that is not is taken as typed, so that it can be said so. */
export const oldName =
  (others: Others, known: (names: Names) => readonly string[]): Lead =>
  (cursor, names) => {
    const reading = knownName(known)(cursor, names);
    return reading !== null && 'value' in reading ? reading : newName(others)(cursor, names);
  };
