import type { ShopUnits } from './cursor.ts';
import { phraseOf } from './cursor.ts';
import type { Parameter } from './reading.ts';
import { UNIT_WORDS } from './unit.ts';

/** A parameter of any value: the reader hands values through without looking at them. */
export type AnyParameter = Parameter<unknown>;

export type PhraseMeaning =
  | { readonly kind: 'value'; readonly parameter: AnyParameter; readonly value: unknown }
  | { readonly kind: 'keyword'; readonly parameter: AnyParameter };

export type Phrases = readonly (readonly [readonly string[], PhraseMeaning])[];

/** What a set of parameters lets a person say; made once, used for every line. */
export type Vocabulary = {
  readonly parameters: readonly AnyParameter[];
  readonly phrases: ReadonlyMap<string, Phrases>;
  /** Parameters that are said without a keyword. */
  readonly free: readonly AnyParameter[];
  /** The one that takes a number that says nothing about itself. */
  readonly bare: AnyParameter | null;
  /** Every word that can be said, for offering the nearest to one that cannot. */
  readonly words: readonly string[];
};

/** `run-out`, `run out`: a dash in a phrase is a matter of taste. */
const spellings = (phrase: string): readonly string[] => [
  ...new Set([phrase, phrase.replaceAll('-', ' '), phrase.replaceAll(' ', '-')]),
];

const meaningsOf = (parameter: AnyParameter): readonly (readonly [string, PhraseMeaning])[] => [
  ...(parameter.values ?? []).map(
    ([phrase, value]) => [phrase, { kind: 'value', parameter, value }] as const,
  ),
  ...(parameter.keywords ?? []).map((phrase) => [phrase, { kind: 'keyword', parameter }] as const),
];

export const vocabularyOf = (
  parameters: readonly AnyParameter[],
  extraWords: readonly string[] = [],
): Vocabulary => {
  const phrases = new Map<string, Phrases>();
  const words = new Set<string>([...UNIT_WORDS.keys(), ...extraWords]);
  for (const [phrase, meaning] of parameters.flatMap(meaningsOf)) {
    words.add(phrase);
    for (const parts of spellings(phrase).map(phraseOf)) {
      const first = parts[0] ?? '';
      phrases.set(first, [...(phrases.get(first) ?? []), [parts, meaning]]);
    }
  }
  // A slip in the first word of `cold rolled` is nearest to that word, not to the whole.
  const single = [...words].flatMap(phraseOf).filter((word) => word.length > 3);
  return {
    parameters,
    phrases,
    free: parameters.filter(({ free, unannounced }) => (free ?? unannounced) !== undefined),
    bare: parameters.find((parameter) => parameter.bare === true) ?? null,
    words: [...new Set([...words, ...single])].filter((word) => word !== 'in'),
  };
};

/** Things to type for a parameter, in the shop's own units. */
export const examplesOf = (
  parameter: Pick<AnyParameter, 'examples' | 'metricExamples'>,
  units: ShopUnits,
): readonly string[] =>
  units === 'mm' ? (parameter.metricExamples ?? parameter.examples) : parameter.examples;
