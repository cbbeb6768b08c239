import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import { MATERIAL_PHRASES, readLine, tokensOf, vocabularyOf } from '../../src/words/index.ts';

const setup = FLEET.find((command) => command.path.join(' ') === 'knurl setup');
if (setup === undefined) throw new Error('no set-up in the fleet');
const VOCABULARY = vocabularyOf(setup.parameters, MATERIAL_PHRASES);

const read = (line: string, units: 'in' | 'mm' = 'in') => {
  const result = readLine(line, VOCABULARY, units);
  if ('refusal' in result) throw new Error(`${line}: ${JSON.stringify(result.refusal)}`);
  return Object.fromEntries([...result.read.values].sort(([a], [b]) => a.localeCompare(b)));
};

/** Phrases that stand for themselves, so that their order says nothing. */
const PHRASES = [
  '1.000 in',
  'straight',
  '21tpi',
  '1018',
  'long 1.5',
  'out 3',
  'tailstock',
  'fill 85%',
  'batch 50',
  'wheel 20x8x6',
  'pin 6mm carbide',
  'runout 0.004',
  'angle 80',
  '200 rpm',
];

describe('reading a line', () => {
  it('does not depend on the order of its phrases', () => {
    const wanted = read(PHRASES.join(' '));
    fc.assert(
      fc.property(fc.shuffledSubarray(PHRASES, { minLength: PHRASES.length }), (order) => {
        expect(read(order.join(' '))).toEqual(wanted);
      }),
    );
  });

  it('gives one diameter whether it was typed in inches or in millimetres', () => {
    const size = fc.double({ min: 0.1, max: 7.5, noNaN: true });
    fc.assert(
      fc.property(size, (inches) => {
        const typed = inches.toFixed(4);
        const metric = (Number(typed) * 25.4).toFixed(8);
        const a = read(`${typed} straight 21tpi`)['diameter'];
        const b = read(`${metric} mm straight 21tpi`)['diameter'];
        const c = read(`${metric} straight 21tpi`, 'mm')['diameter'];
        expect(Math.abs(Number(a) - Number(b))).toBeLessThan(1e-7);
        expect(c).toBe(b);
      }),
    );
  });

  it('takes what a phone makes of a line for the line', () => {
    const phone: readonly (readonly [string, string])[] = [
      ['-', '–'],
      ['-', '—'],
      ['"', '”'],
      ['"', '″'],
      [' ', '\u00a0'],
      ['x', '×'],
    ];
    const plain = '1-1/4" straight 21tpi finish 1.195-1.205 wheel 20x8x6';
    const wanted = read(plain);
    for (const [from, to] of phone) expect(read(plain.replaceAll(from, to)), to).toEqual(wanted);
    expect(read(plain.toUpperCase())).toEqual(wanted);
  });

  it('points into what was typed, whatever that was', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 80 }), (line) => {
        for (const { start, end } of tokensOf(line)) {
          expect(start).toBeGreaterThanOrEqual(0);
          expect(end).toBeGreaterThan(start);
          expect(end).toBeLessThanOrEqual(line.length);
        }
        const result = readLine(line, VOCABULARY, 'in');
        if (!('refusal' in result) || result.refusal.code !== 'unreadable') return;
        const { word, start, end } = result.refusal;
        expect(line.slice(start, end)).toBe(word);
      }),
      { numRuns: 2000 },
    );
  });
});
