import { describe, expect, it } from 'vitest';
import { ask, cardFor, refusalFor, textOf } from '../../support/desk.ts';

const said = (text: string): string => text.replaceAll(/\s+/gu, ' ');

type InSystem = {
  readonly system: string;
  readonly exact: number;
  readonly nearest: number;
  readonly error: number;
};
type Near = { readonly wheel: string; readonly pitch: number; readonly error: number };

const told = async (line: string) => {
  const { lists } = (await cardFor(line)).card;
  const pitches = (lists?.['pitches'] ?? []) as readonly InSystem[];
  return {
    of: (system: string) => pitches.find((each) => each.system === system),
    wheels: (lists?.['wheels'] ?? []) as readonly Near[],
  };
};

describe('a pitch in every system', () => {
  it('a straight one: p = t = 25.4/TPI = 25.4 π/DP = π m', async () => {
    const { of } = await told('/knurl convert 0.8 pitch');
    expect(of('metric')?.exact).toBeCloseTo(0.8, 12);
    expect(of('tpi')?.exact).toBeCloseTo(25.4 / 0.8, 9);
    expect(of('dp')?.exact).toBeCloseTo((25.4 * Math.PI) / 0.8, 9);
    expect(of('module')?.exact).toBeCloseTo(0.8 / Math.PI, 9);
  });

  it('states how far the nearest one that wheels are made in is off', async () => {
    const { of } = await told('/knurl convert 0.8 pitch');
    expect(of('dp')).toMatchObject({ nearest: 96 });
    expect(of('dp')?.error).toBeCloseTo((25.4 * Math.PI) / 96 / 0.8 - 1, 9);
    const text = said(textOf(await cardFor('/knurl convert 0.8 pitch'), 200));
    expect(text).toMatch(/^0\.8 mm pitch is 31\.75 TPI, 99\.75 DP, module 0\.2546/u);
    expect(text).toContain('nearest made 96 DP, 3.9 % coarser');
    expect(text).toContain('nearest made 32 TPI, 0.8 % finer');
  });

  // DP counts along the rim: at a helix of 30° it shrinks by its cosine.
  it('with a helix DP alone changes', async () => {
    const straight = await told('/knurl convert 21tpi straight');
    const diamond = await told('/knurl convert 21tpi diamond');
    expect((diamond.of('dp')?.exact ?? 0) / (straight.of('dp')?.exact ?? 1)).toBeCloseTo(
      Math.cos(Math.PI / 6),
      9,
    );
    expect(diamond.of('module')?.exact).toBeCloseTo(straight.of('module')?.exact ?? 0, 12);
  });

  it.each([
    ['0.8', 0.8],
    ['0.8mm', 0.8],
    ['m 0.3', Math.PI * 0.3],
    ['RGE 0.8', 0.8],
    ['32 tpi', 25.4 / 32],
  ] as const)('%s is read as a pitch', async (words, normal) => {
    expect((await told(`/knurl convert ${words}`)).of('metric')?.exact).toBeCloseTo(normal, 9);
  });
});

describe('the wheels that come near it', () => {
  it('lie within the tolerance, the nearest first, and suit the pattern', async () => {
    const { wheels } = await told('/knurl convert 21tpi diamond within 5%');
    const off = wheels.map(({ error }) => Math.abs(error));
    expect(off.length).toBeGreaterThan(0);
    expect(Math.max(...off)).toBeLessThanOrEqual(0.05 + 1e-9);
    expect(off).toEqual([...off].sort((a, b) => a - b));
    expect(wheels.every(({ wheel }) => /^GV|\+/u.test(wheel))).toBe(true);
  });

  it('where none does, the nearest is named and a tolerance that takes it in is offered', async () => {
    const answer = await cardFor('/knurl convert m 0.3');
    expect(said(textOf(answer))).toContain('No wheel comes within 3 %; the nearest is');
    const wider = await told(answer.card.choices[0]?.words ?? '');
    expect(wider.wheels.length).toBeGreaterThan(0);
  });
});

describe('a conversion that lacks or contradicts', () => {
  it.each([
    ['/knurl convert', 'missing', 'pitch'],
    ['/knurl convert RGE 0.8 1.0 pitch', 'unclear', 'pitch'],
    ['/knurl convert RGE 0.8 straight', 'unclear', 'pattern'],
    ['/knurl convert straight 21tpi helix 30', 'unclear', 'helix'],
  ] as const)('%s', async (line, code, about) => {
    const answer = await refusalFor(line);
    expect(answer.refusal.code).toBe(code);
    expect(Object.values(answer.refusal)).toContain(about);
    for (const { words } of answer.choices) {
      const next = await ask(words);
      expect(next.kind === 'card' ? 'card' : next.refusal.code, words).toMatch(
        /^(?:card|missing)$/u,
      );
    }
  });

  it('every choice of its cards is a card', async () => {
    for (const line of ['/knurl convert 0.8 pitch', '/knurl convert m 0.3'])
      for (const { words } of (await cardFor(line)).card.choices)
        expect((await cardFor(words)).card.verb).toBe('convert');
  });
});
