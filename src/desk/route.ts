import type { Refusal } from '../refusal.ts';
import { type AnyParameter, nearestOf, quoted, tokensOf } from '../words/index.ts';
import type { Options } from './call.ts';
import type { Command } from './command.ts';

/** The root and verb that are meant where none is said. */
const DEFAULT_ROOT = 'knurl';
const DEFAULT_VERB = 'setup';
const LIST = 'list';
/** What is done in a group of verbs where none of them is said: `/knurl result good`. */
const LOG = 'log';
const CHANGE = 'change';
const HELP: readonly string[] = [DEFAULT_ROOT, 'help'];

export type Route =
  /** The command, and how many words of the line were its name. */
  { readonly command: Command; readonly skip: number } | { readonly refusal: Refusal };

const startsWith = (words: readonly string[], path: readonly string[]): boolean =>
  path.every((part, index) => words[index] === part);

const find = (fleet: readonly Command[], path: readonly string[]): Command | undefined =>
  fleet.find((command) => command.path.join(' ') === path.join(' '));

/** The command with the longest name that these words begin with. */
const named = (
  fleet: readonly Command[],
  root: string,
  words: readonly string[],
): { readonly command: Command; readonly skip: number } | null => {
  const fits = fleet
    .filter((command) => command.path[0] === root && startsWith(words, command.path.slice(1)))
    .sort((a, b) => b.path.length - a.path.length)[0];
  return fits === undefined ? null : { command: fits, skip: fits.path.length - 1 };
};

/**
 * Which command a line is for. `/knurl` and the verb may both be left out: a missing verb means
 * the set-up, an empty line the help.
 */
export const route = (text: string, fleet: readonly Command[]): Route => {
  const tokens = tokensOf(text);
  const words = tokens.map((token) => token.text);
  const roots = [...new Set(fleet.map((command) => command.path[0]))];
  const first = words[0] ?? '';
  const slashed = first.startsWith('/');
  const root = slashed ? first.slice(1) : first;
  const isRoot = roots.includes(root);
  if (slashed && !isRoot) {
    const token = tokens[0] ?? { start: 0, end: 0 };
    const nearest = nearestOf(root, roots).map((name) => `/${name}`);
    return {
      refusal: { code: 'unreadable', word: first, start: token.start, end: token.end, nearest },
    };
  }
  const before = isRoot ? 1 : 0;
  const rest = words.slice(before);
  const asked = isRoot ? root : DEFAULT_ROOT;
  const found = rest.length > 0 ? named(fleet, asked, rest) : null;
  if (found !== null) return { command: found.command, skip: before + found.skip };
  const log = find(fleet, [asked, rest[0] ?? '', LOG]);
  if (log !== undefined) return { command: log, skip: before + 1 };
  // A list is shown where nothing is said to be done with it: `/shop wheels`.
  const list = find(fleet, [asked, rest[0] ?? '', LIST]);
  // Where nothing has to be named first, whatever is said is to be changed: `/shop settings units mm`.
  const change = rest.length > 1 ? find(fleet, [asked, rest[0] ?? '', CHANGE]) : undefined;
  if (change !== undefined && change.lead === undefined)
    return { command: change, skip: before + 1 };
  if (list !== undefined) return { command: list, skip: before + 1 };
  const fallback = rest.length === 0 ? HELP : [asked, DEFAULT_VERB];
  const command = find(fleet, fallback) ?? find(fleet, HELP);
  if (command === undefined) throw new Error('a fleet without a help');
  return { command, skip: before };
};

/** A field's value that says itself what it is: `long 1.5` in the field for the length. */
const isAnnounced = ({ keywords = [], postfix }: AnyParameter, typed: string): boolean => {
  const plain = typed.toLowerCase();
  return keywords.some(
    (keyword) =>
      plain.startsWith(`${keyword} `) || (postfix === true && plain.endsWith(` ${keyword}`)),
  );
};

const wordsFor = (
  parameter: AnyParameter,
  given: Options[string] | undefined,
  isLead: boolean,
): readonly string[] => {
  if (given === undefined || given === false) return [];
  if (given === true) return [parameter.values?.[0]?.[0] ?? ''];
  const isOpen = isLead || parameter.bare === true || parameter.free !== undefined;
  const keyword = isOpen ? '' : (parameter.keywords?.[0] ?? '');
  const typed = String(given).trim();
  if (parameter.text === true) return [`${keyword} ${quoted(typed)}`.trim()];
  return [isAnnounced(parameter, typed) ? typed : `${keyword} ${typed}`.trim()];
};

/**
 * The fields of a form, as words: first what has to stand first, unless something stands before
 * it already.
 */
export const wordsOf = (
  { parameters, lead }: Command,
  options: Options,
  isBehind = false,
): readonly string[] => {
  const isLead = ({ name }: AnyParameter): boolean => !isBehind && name === lead?.name;
  const ordered = [...parameters.filter(isLead), ...parameters.filter((each) => !isLead(each))];
  const parts = ordered.flatMap((each) => wordsFor(each, options[each.name], isLead(each)));
  const extra = options['words'];
  return [...parts, ...(extra === undefined ? [] : [String(extra)])];
};

/** The words of a form, as a line: one reader for everything that can be typed. */
export const lineOf = (command: Command, options: Options): string => {
  const { words, ...others } = options;
  // A whole line in the field for words is that line.
  const isWhole = typeof words === 'string' && words.trim().startsWith('/');
  if (isWhole && Object.keys(others).length === 0) return words.trim();
  return [`/${command.path.join(' ')}`, ...wordsOf(command, options)].join(' ');
};
