import { describe, expect, it } from 'vitest';
import type { Card } from '../../../src/card/index.ts';
import { ask, type CardAnswer, cardFor, checkOf, refusalFor, textOf } from '../../support/desk.ts';
import { mulberry32, oneOf } from '../../support/random.ts';

const said = (text: string): string => text.replaceAll(/\s+/gu, ' ');

const LOAD_FIGURES = [
  'radialForce',
  'radialForceLow',
  'radialForceHigh',
  'torque',
  'power',
  'deflection',
  'bendingStress',
  'ringStress',
  'ringClosing',
  'pinHeatIndex',
  'pinPressure',
  'wheelSpeed',
  'wheelWarmUp',
] as const;

describe('the loads on a set-up card', () => {
  it('come as figures of its own, each with its number', async () => {
    const { card } = await cardFor('/knurl 1.000 straight 21tpi 1018 long 1 out 3 bore 0.5');
    for (const name of LOAD_FIGURES) expect(card.figures[name]?.value, name).toBeGreaterThan(0);
    const { radialForce, radialForceLow, radialForceHigh } = card.figures;
    // The force is known to a factor of two.
    expect((radialForceHigh?.value ?? 0) / (radialForce?.value ?? 1)).toBeCloseTo(2, 9);
    expect((radialForceLow?.value ?? 0) / (radialForce?.value ?? 1)).toBeCloseTo(0.5, 9);
  });

  it('come as checks of their own', async () => {
    const answer = await cardFor('/knurl 1.000 straight 21tpi 1018 long 1.2 out 3.5 bore 0.5');
    for (const name of ['pinHeat', 'pinPressure', 'bending', 'ring', 'stickout', 'width'])
      expect(checkOf(answer, name), name).not.toBe('absent');
  });

  it('bending is not judged without the stickout, nor a wall without a bore', async () => {
    const answer = await cardFor('/knurl 1.000 straight 21tpi 1018');
    expect(checkOf(answer, 'bending')).toBe('absent');
    expect(checkOf(answer, 'ring')).toBe('absent');
  });

  it.each([
    ['out 3 tailstock', 'out 3 chuck'],
    ['out 3 centers', 'out 3'],
    ['out 3 opposed', 'out 3 one-sided'],
  ])('%s bends less than %s', async (stiffer, softer) => {
    const line = '/knurl 0.5 straight 21tpi 1018 long 1';
    const bend = async (more: string): Promise<number> =>
      (await cardFor(`${line} ${more}`)).card.figures['deflection']?.value ?? 0;
    expect(await bend(stiffer)).toBeLessThan(await bend(softer));
  });

  it('carbide pins carry more heat, a harder bar presses harder', async () => {
    const heat = async (more: string): Promise<number> =>
      (await cardFor(`/knurl 1.000 straight 21tpi 4140 ${more}`)).card.figures['pinHeatIndex']
        ?.value ?? 0;
    expect((await heat('')) / (await heat('pin 6mm carbide'))).toBeCloseTo(1.5, 9);
    expect(await heat('28 HRC')).toBeGreaterThan(await heat('HB 150'));
  });
});

describe('what cannot be names both of its numbers', () => {
  it.each([
    ['/knurl 1.000 straight 21tpi bore 1.2', 'bore', ['1.2000 in', '1.0000 in']],
    ['/knurl check 1.000 straight 21tpi bore 1.2', 'bore', ['1.2000 in', '1.0000 in']],
    ['/knurl check 1.000 straight 21tpi seam 0.3 bore 1.2', 'bore', ['1.2000 in', '1.0000 in']],
    ['/knurl check 1.000 straight 21tpi crest 1.01 bore 1.2', 'bore', ['1.2000 in', '1.0000 in']],
    ['/knurl trouble double 1.000 straight 21tpi bore 1.2', 'bore', ['1.2000 in', '1.0000 in']],
    ['/knurl 1.000 straight 21tpi bore 0.95', 'wall', ['0.0058 in', '0.0214 in']],
    ['/knurl 1.000 straight 21tpi bore 0.97', 'wall', ['0.0042 in', '0.0214 in']],
    ['/knurl 1.000 straight 21tpi long 2 out 1', 'stickout', ['1.0000 in', '2.0000 in']],
    [
      '/knurl plan finish 0.995-1.005 straight 96dp long 2 out 1',
      'stickout',
      ['1.0000 in', '2.0000 in'],
    ],
    ['/knurl check 1.000 straight 21tpi count 0', 'count', ['0', '3 to 9999']],
    ['/knurl check 1.000 straight 21tpi count 10000', 'count', ['10000', '3 to 9999']],
    ['/knurl check 0.9852 straight 21tpi crest 0.98', 'crestDiameter', ['0.9800 in', '0.9852 in']],
    ['/knurl check 0.9852 straight 21tpi crest 1.2', 'crestDiameter', ['1.2000 in', '1.0328 in']],
    ['/knurl check 1.000 straight 21tpi height 0.1', 'toothHeight', ['0.1000 in', '0.0238 in']],
    ['/knurl check 1.000 straight 21tpi seam 1.4', 'seam', ['1.4', '0 to 1']],
  ] as const)('%s', async (line, what, numbers) => {
    const answer = await refusalFor(line);
    expect(answer.refusal).toMatchObject({ code: 'outOfRange', what });
    const text = said(textOf(answer));
    for (const number of numbers) expect(text).toContain(number);
    expect(text).not.toMatch(/-\d|NaN|undefined/u);
  });

  it('a tooth of a cut knurl may stand at the blank: no growth is expected of it', async () => {
    const answer = await cardFor('/knurl check 0.9852 straight 21tpi 1018 cut long 1 crest 0.9850');
    expect(answer.card.verb).toBe('check');
  });

  it('limits the wrong way round are offered the right way round', async () => {
    for (const verb of ['', 'plan ']) {
      const answer = await refusalFor(`/knurl ${verb}finish 1.005-0.995 straight 96dp`);
      expect(answer.refusal).toMatchObject({ code: 'unclear', because: 'limitsReversed' });
      expect(textOf(answer)).toMatch(/0\.995 in to\s+1\.005 in/u);
      const [choice] = answer.choices;
      expect((await ask(choice?.words ?? '')).kind).toBe('card');
    }
  });

  it('class II on a diamond says what the class is for', async () => {
    for (const line of [
      '/knurl 1.000 diamond 96dp class II',
      '/knurl plan finish 0.995-1.005 diamond 96dp class II',
    ]) {
      const answer = await refusalFor(line);
      expect(answer.refusal).toMatchObject({ code: 'unclear', because: 'classStraightOnly' });
      expect(said(textOf(answer))).toContain('Classes II and III are for straight knurls only');
      for (const { words } of answer.choices) expect((await ask(words)).kind, words).toBe('card');
    }
  });
});

/** What the words of each remedy are meant to lift. */
const stopped = (card: Card): readonly string[] =>
  card.checks.filter((check) => check.state === 'stop').map((check) => check.name);

const remedies = (card: Card) => card.choices.filter(({ label }) => label.label === 'remedy');

const randomLine = (random: () => number): string => {
  const diameter = oneOf(random, [0.16, 0.2, 0.25, 0.3125, 0.375, 0.5, 0.75, 1, 1.5]);
  const length = oneOf(random, [0.25, 0.5, 1, 1.5, 2]);
  const out = length + oneOf(random, [0.25, 1, 2, 4, 8]);
  const bore = oneOf(random, [null, null, 0.5, 0.7]);
  return [
    `/knurl ${String(diameter)}`,
    oneOf(random, ['straight', 'diamond', 'diagonal left', 'square']),
    oneOf(random, ['21tpi', '30tpi', '33tpi', '0.8 pitch']),
    oneOf(random, ['1018', '304', '6061', 'brass', '4140 32 HRC']),
    oneOf(random, [`long ${String(length)}`, `long ${String(length)}`, '']),
    oneOf(random, [`out ${String(out)}`, `out ${String(out)}`, '']),
    bore === null ? '' : `bore ${(bore * diameter).toFixed(3)}`,
    oneOf(random, ['', '', 'turns 3', 'one-sided', 'speed 250 sfm', 'centers']),
  ].join(' ');
};

/** Lines drawn until so many of them are stopped with a remedy. */
const stoppedCards = async (count: number): Promise<readonly [string, CardAnswer][]> => {
  const random = mulberry32(3);
  const found: [string, CardAnswer][] = [];
  for (let tries = 0; found.length < count && tries < 40 * count; tries += 1) {
    const line = randomLine(random);
    const answer = await ask(line);
    if (answer.kind === 'card' && remedies(answer.card).length > 0) found.push([line, answer]);
  }
  return found;
};

describe('a stop is lifted by what the card offers for it', () => {
  it('over 150 stopped lines, every remedy sent back', async () => {
    const cards = await stoppedCards(150);
    expect(cards).toHaveLength(150);
    const failed: string[] = [];
    for (const [line, { card }] of cards) {
      const before = stopped(card);
      for (const { words } of remedies(card)) {
        const after = await ask(words);
        const still = after.kind === 'card' ? stopped(after.card) : ['refused'];
        if (before.every((name) => still.includes(name)) || still.includes('refused'))
          failed.push(`${line}\n  -> ${words}: ${still.join(', ')} of ${before.join(', ')}`);
      }
    }
    expect(failed).toEqual([]);
  }, 120_000);
});
