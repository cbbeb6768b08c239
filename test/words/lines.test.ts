import { describe, expect, it } from 'vitest';
import { FLEET } from '../../commands/index.ts';
import type { Refusal } from '../../src/refusal.ts';
import { MATERIAL_PHRASES, readLine, vocabularyOf } from '../../src/words/index.ts';
import { ask, cardFor, refusalFor } from '../support/desk.ts';
import { BAD, GOOD } from './table.ts';

const setup = FLEET.find((command) => command.path.join(' ') === 'knurl setup');
if (setup === undefined) throw new Error('no set-up in the fleet');
const VOCABULARY = vocabularyOf(setup.parameters, MATERIAL_PHRASES);

const DEGREES = new Set(['helix', 'tilt', 'angle']);

/** The value as the table writes it: angles in degrees, a material by its row. */
const asWritten = (name: string, value: unknown): unknown => {
  if (DEGREES.has(name) && typeof value === 'number') return (value * 180) / Math.PI;
  if (name === 'material' && typeof value === 'object' && value !== null && 'usual' in value)
    return value.usual;
  return value;
};

const closeTo = (wanted: unknown): unknown => {
  if (typeof wanted === 'number') return expect.closeTo(wanted, 9);
  if (typeof wanted !== 'object' || wanted === null) return wanted;
  return Object.fromEntries(Object.entries(wanted).map(([key, part]) => [key, closeTo(part)]));
};

describe('lines that read', () => {
  it.each(GOOD)('%s shop: %s', async (shop, line, reads) => {
    const result = readLine(line, VOCABULARY, shop);
    if ('refusal' in result) throw new Error(`refused: ${JSON.stringify(result.refusal)}`);
    for (const [name, wanted] of Object.entries(reads))
      expect(asWritten(name, result.read.values.get(name)), name).toEqual(closeTo(wanted));
    await cardFor(line, shop);
  });

  it('are at least a hundred and twenty with the others, forty of them wrong or unclear', () => {
    expect(GOOD.length + BAD.length).toBeGreaterThanOrEqual(120);
    expect(BAD.length).toBeGreaterThanOrEqual(40);
  });
});

const whatOf = (refusal: Refusal): string | null => {
  if ('what' in refusal) return refusal.what;
  return 'parameter' in refusal ? refusal.parameter : null;
};

describe('lines that are wrong or unclear', () => {
  it.each(BAD)('%s shop: %s', async (shop, line, code, says) => {
    const { refusal } = await refusalFor(line, shop);
    expect(refusal.code).toBe(code);
    if (says.what !== undefined) expect(whatOf(refusal)).toBe(says.what);
    if (says.nearest !== undefined)
      expect('nearest' in refusal && refusal.nearest).toEqual(says.nearest);
    if (says.readings !== undefined)
      expect(refusal.code === 'unclear' && refusal.readings.map(({ label }) => label)).toEqual(
        says.readings,
      );
    if (says.word === undefined) return;
    if (refusal.code !== 'unreadable') throw new Error(`not unreadable: ${refusal.code}`);
    expect(refusal.word).toBe(says.word);
    // It points at the word itself, in what was typed.
    expect(line.slice(refusal.start, refusal.end)).toBe(says.word);
  });

  it.each(BAD)('%s shop: what is offered instead of “%s” reads', async (shop, line) => {
    const { refusal, choices } = await refusalFor(line, shop);
    for (const { words } of choices) {
      expect(words.startsWith('/knurl')).toBe(true);
      const answer = await ask(words, shop);
      // A card, or another question; never the same one over again.
      if (answer.kind === 'refusal') expect(answer.refusal).not.toEqual(refusal);
    }
  });

  it('of four thousand characters are refused for their length', async () => {
    const { refusal } = await refusalFor(`1.0 straight 21tpi ${'very '.repeat(800)}`);
    expect(refusal).toMatchObject({ code: 'outOfRange', what: 'textLength', max: 1000 });
  });

  it.each(['', '   ', '/knurl', '/knurl help', 'help'])('%j is helped', async (line) => {
    expect((await cardFor(line)).card.verb).toBe('help');
  });
});
