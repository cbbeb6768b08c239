import type { FindLabels, FindLines, FindRows, FoundKind } from '../../card/findLines.ts';
import type { LabelledText } from '../book.ts';
import type { Show } from '../show.ts';
import { howItWent } from './resultLines.ts';
import { momentText } from './shopNames.ts';

const KINDS: { readonly [K in FoundKind]: { readonly one: string; readonly many: string } } = {
  standard: { one: 'standard', many: 'standards' },
  card: { one: 'card', many: 'cards' },
  question: { one: 'question', many: 'questions' },
  result: { one: 'result', many: 'results' },
};

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
/** A question mark, or a full stop of somebody's own. */
const isEnded = (text: string): boolean => /[.!?…]$/u.test(text);
const quoted = (words: string): string => `“${words}”`;
const list = (items: readonly string[]): string =>
  items.length <= 1
    ? (items[0] ?? '')
    : `${items.slice(0, -1).join(', ')} or ${items.at(-1) ?? ''}`;

const counted = (kind: FoundKind | null, count: number): string => {
  const one = kind === null ? 'thing' : KINDS[kind].one;
  const many = kind === null ? 'things' : KINDS[kind].many;
  return `${String(count)} ${count === 1 ? one : many}`;
};

export const findLines: {
  readonly [K in keyof FindLines]: (values: FindLines[K], show: Show) => string;
} = {
  found: ({ count, more, kind }) =>
    more
      ? `The first ${counted(kind, count)} that fit, the best first:`
      : `${counted(kind, count)} ${count === 1 ? 'fits' : 'fit'}${count === 1 ? '' : ', the best first'}:`,
  foundOthers: ({ kind }) => `No ${KINDS[kind].one} fits; these are of other kinds.`,
  foundNothing: ({ words, kind }) =>
    kind === null
      ? `Nothing fits ${quoted(words)}.`
      : words === ''
        ? `No ${KINDS[kind].many} yet.`
        : `No ${KINDS[kind].one} fits ${quoted(words)}.`,
  foundNearest: ({ nearest }) => `This shop writes ${list(nearest)}.`,
  foundHow: () =>
    'Try fewer words, or others: a material, a pitch, a machine, a part number, a word of a note. One slip in a word does not matter; a number has to be right.',
  foundMore: () => 'More fit. Add a word to narrow it.',
};

export const findRows: {
  readonly [K in keyof FindRows]: (values: FindRows[K], show: Show) => LabelledText;
} = {
  foundThing: ({ kind, name, went, said, state, by, moment }) => ({
    label: name,
    text: [
      capital(KINDS[kind].one) + (state === null ? '' : `, ${state}`),
      [...(went === null ? [] : [howItWent(went)]), ...(said === '' ? [] : [said])].join(', '),
      `${by}, ${momentText(moment)}`,
    ]
      .filter((part) => part !== '')
      .map((part, at, parts) => (at === parts.length - 1 || isEnded(part) ? part : `${part}.`))
      .join(' '),
  }),
};

export const findLabels: {
  readonly [K in keyof FindLabels]: (values: FindLabels[K], show: Show) => string;
} = {
  openFound: ({ kind, name }) => `${capital(KINDS[kind].one)} ${name}`,
  findInstead: ({ word }) => `Find ${word}`,
};
