/** Words that are the person's own: a name, a place, a rule. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type Cursor,
  leadingText,
  type Parameter,
  quoted,
  textOf,
  tokensOf,
  vocabularyOf,
} from '../../src/words/index.ts';

const pattern: Parameter<unknown> = {
  name: 'pattern',
  read: () => null,
  values: [
    ['straight', 'straight'],
    ['one piece', 'onePiece'],
  ],
  examples: [],
};
const place: Parameter<unknown> = {
  name: 'place',
  read: textOf(() => VOCABULARY),
  keywords: ['place'],
  examples: [],
};
const VOCABULARY = vocabularyOf([pattern, place]);

const cursorOf = (text: string): Cursor => ({ text, tokens: tokensOf(text), at: 0, units: 'in' });

describe('a text at the start of a line', () => {
  it.each([
    ['Old Faithful straight', 'Old Faithful', 2],
    ['Old Faithful', 'Old Faithful', 2],
    ['L 0.8 one piece', 'L 0.8', 2],
    ['the big one place drawer 3', 'the big one', 3],
    ['"Straight 21" straight', 'Straight 21', 2],
    ['“Straight 21” straight', 'Straight 21', 2],
    ['"5"" wheel" straight', '5" wheel', 2],
    ['5" wheel straight', '5" wheel', 2],
    ['Ümlaut-Rad (alt), straight', 'Ümlaut-Rad (alt', 2],
  ])('%s', (line, value, used) => {
    expect(leadingText(cursorOf(line), VOCABULARY)).toEqual({ value, used });
  });

  it('is none where something that can be read comes first', () => {
    expect(leadingText(cursorOf('straight Old Faithful'), VOCABULARY)).toBe(null);
    expect(leadingText(cursorOf(''), VOCABULARY)).toBe(null);
    expect(leadingText(cursorOf('place drawer'), VOCABULARY)).toBe(null);
  });

  it('in quotation marks comes back as it was, whatever it is', () => {
    const typed = fc
      .stringMatching(/^[a-zA-Z0-9 "'.,-]{1,30}$/u)
      .filter((text) => text.trim() !== '');
    fc.assert(
      fc.property(typed, (text) => {
        const line = `${quoted(text)} straight`;
        const read = leadingText(cursorOf(line), VOCABULARY);
        expect(read).toMatchObject({ value: text.trim() });
        const { used } = read as { used: number };
        expect(tokensOf(line)[used]?.text).toBe('straight');
      }),
    );
  });
});

describe('a text after its keyword', () => {
  it('takes at least one word, and goes on until something can be read', () => {
    const read = textOf(() => VOCABULARY);
    const names = { wheels: [], machines: [] };
    expect(read(cursorOf('drawer 3, left straight'), names)).toEqual({
      value: 'drawer 3, left',
      used: 3,
    });
    expect(read(cursorOf('straight straight'), names)).toEqual({ value: 'straight', used: 1 });
    expect(read(cursorOf(''), names)).toBe(null);
  });
});
