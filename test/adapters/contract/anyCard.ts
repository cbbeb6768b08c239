/** Cards of any size, with words of any kind in them: what every adapter has to bring across. */
import fc from 'fast-check';
import type { SpokenCard } from '../../../src/phrases/index.ts';

/** Words of any kind, and what has a meaning in a platform's markup. */
const wordsWith =
  (markup: readonly string[]) =>
  (most: number): fc.Arbitrary<string> =>
    fc
      .array(
        fc.oneof(
          { weight: 4, arbitrary: fc.string({ minLength: 1, maxLength: 12, unit: 'grapheme' }) },
          fc.constantFrom(...markup, '0.9852 in', '😀'),
        ),
        { minLength: 1, maxLength: most },
      )
      .map((each) => `w${each.join(' ')}`);

const anyPart = (words: (most: number) => fc.Arbitrary<string>) => {
  const short = words(4);
  const text = fc.oneof({ weight: 5, arbitrary: words(20) }, { weight: 1, arbitrary: words(900) });
  return fc.oneof(
    fc.record({ part: fc.constant('lines' as const), texts: fc.array(text, { maxLength: 12 }) }),
    fc.record({
      part: fc.constant('rows' as const),
      rows: fc.array(fc.record({ label: short, text }), { maxLength: 30 }),
    }),
    fc.record({
      part: fc.constant('checks' as const),
      checks: fc.array(
        fc.record({
          label: short,
          state: fc.constantFrom('fine' as const, 'watch' as const, 'stop' as const),
          stateWord: fc.constantFrom('fine', 'watch', 'stop'),
          text: words(60),
        }),
        { maxLength: 20 },
      ),
    }),
    fc.record({
      part: fc.constant('cautions' as const),
      shown: fc.array(text, { maxLength: 5 }),
      standing: text,
      all: fc.array(text, { maxLength: 5 }),
      rest: fc.array(text, { maxLength: 5 }),
    }),
    fc.record({ part: fc.constant('own' as const), texts: fc.array(text, { maxLength: 5 }) }),
    fc.record({ part: fc.constant('footing' as const), text }),
  );
};

export const anyCard = (markup: readonly string[]): fc.Arbitrary<SpokenCard> => {
  const words = wordsWith(markup);
  const text = fc.oneof({ weight: 5, arbitrary: words(20) }, { weight: 1, arbitrary: words(900) });
  return fc.record({
    headline: text,
    parts: fc.array(anyPart(words), { maxLength: 7 }),
    choicesTitle: fc.constant('Next'),
    choices: fc.array(fc.record({ label: text, words: text }), { maxLength: 40 }),
  });
};

const saidByPart = (each: SpokenCard['parts'][number]): readonly string[] => {
  switch (each.part) {
    case 'lines':
    case 'own':
      return each.texts;
    case 'rows':
      return each.rows.flatMap((row) => [row.label, row.text]);
    case 'checks':
      return each.checks.flatMap((one) => [one.label, one.stateWord, one.text]);
    case 'cautions':
      return [...each.shown, ...each.rest, each.standing];
    case 'footing':
      return [each.text];
  }
};

/** Everything that a card says and no message may lose. */
export const saidBy = (card: SpokenCard): readonly string[] => [
  card.headline,
  ...card.parts.flatMap(saidByPart),
];

/** A text may be parted anywhere where there is space. */
export const bare = (said: string): string => said.replaceAll(/\s+/gu, '');
