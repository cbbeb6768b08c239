import { describe, expect, it } from 'vitest';
import { ask, cardFor, refusalFor, textOf } from '../../support/desk.ts';

const said = (text: string): string => text.replaceAll(/\s+/gu, ' ');
const INCH = 25.4;

type Told = {
  readonly wheel: string;
  readonly toothCount: number;
  readonly blankDiameter: number;
  readonly fill: number;
  readonly chanceTracks: number;
  readonly chanceLands: number;
  readonly limitedBy: string;
  readonly state: string;
};
const candidates = async (line: string, units: 'in' | 'mm' = 'in'): Promise<readonly Told[]> =>
  ((await cardFor(line, units)).card.lists?.['candidates'] ?? []) as readonly Told[];

describe('a plan', () => {
  const LINE = '/knurl plan finish 0.995-1.005 straight 96dp 303 long 0.5';

  it('leads with the best set-up and says whose wheels it has taken', async () => {
    const text = said(textOf(await cardFor(LINE), 200));
    expect(text).toMatch(/^Turn to 0\.9896 in, 95 teeth, wheel 96 DP straight/u);
    expect(text).toContain('the crib is the DIN 403 table and the DP wheels');
  });

  it('ranks its candidates by both chances, stopped ones last', async () => {
    for (const line of [LINE, '/knurl plan finish 0.995-1.005 straight 21tpi']) {
      const list = await candidates(line);
      const worth = list
        .filter(({ state }) => state !== 'stop')
        .map(({ chanceTracks, chanceLands }) => chanceTracks * chanceLands);
      expect(worth).toEqual([...worth].sort((a, b) => b - a));
      const firstStop = list.findIndex(({ state }) => state === 'stop');
      if (firstStop >= 0)
        expect(list.slice(firstStop).every(({ state }) => state === 'stop')).toBe(true);
    }
  });

  it('gives each candidate all that a program needs', async () => {
    for (const one of await candidates(LINE)) {
      expect(one.wheel).not.toBe('');
      expect(Number.isInteger(one.toothCount)).toBe(true);
      expect(one.blankDiameter).toBeLessThan(1.005 * INCH);
      expect(one.fill).toBeGreaterThanOrEqual(0.7);
      expect(one.fill).toBeLessThanOrEqual(0.97);
      expect(one.chanceTracks).toBeGreaterThanOrEqual(0);
      expect(one.chanceLands).toBeLessThanOrEqual(1);
      expect(one.limitedBy).not.toBe('');
    }
  });

  it('each choice is the card of its own candidate', async () => {
    for (const line of [LINE, '/knurl plan finish 19.8-20.1mm RGE 0.8 1018 long 15mm']) {
      const { card } = await cardFor(line);
      const list = (card.lists?.['candidates'] ?? []) as readonly Told[];
      const own = card.choices.filter(({ label }) => label.label === 'candidate');
      expect(own.length).toBeGreaterThan(0);
      for (const [place, { words }] of own.entries()) {
        const { figures } = (await cardFor(words)).card;
        expect(figures['toothCount']?.value, words).toBe(list[place]?.toothCount);
        expect(figures['blankDiameter']?.value, words).toBeCloseTo(
          list[place]?.blankDiameter ?? 0,
          6,
        );
      }
    }
  });
});

describe('where nothing passes', () => {
  // A slender diamond, 4 in out of the chuck: the bar bends whatever the wheel.
  const SLENDER = '/knurl plan finish 0.3-0.305 diamond 64dp long 2 out 4 1018';

  it('leads with the smallest change that would', async () => {
    const text = said(textOf(await cardFor(SLENDER), 200));
    expect(text).toMatch(/^Bring up the tailstock, then it passes: 0\.2813 in, 18 teeth/u);
    expect(text).toContain('Nothing in the crib passes for 0.3000 to 0.3050 in as it was asked.');
  });

  it('and its changes, sent back, pass', async () => {
    const { card } = await cardFor(SLENDER);
    const changes = card.choices.filter(({ label }) => label.label !== 'candidate');
    expect(changes.length).toBeGreaterThan(0);
    for (const { words } of changes) {
      const next = await cardFor(words);
      const stops = next.card.checks.filter(({ state }) => state === 'stop');
      expect(
        stops.map(({ name }) => name),
        words,
      ).toEqual([]);
    }
  });
});

describe('a plan that lacks something asks for it', () => {
  it.each([
    ['/knurl plan straight 96dp', 'in', 'finish'],
    ['/knurl plan finish 20 straight 0.8 pitch', 'mm', 'finish'],
    ['/knurl plan finish 0.995-1.005 96dp', 'in', 'pattern'],
  ] as const)('%s', async (line, units, parameter) => {
    const answer = await refusalFor(line, units);
    expect(answer.refusal).toMatchObject({ code: 'missing', parameter });
    expect(answer.choices.length).toBeGreaterThan(0);
    for (const { words } of answer.choices)
      expect((await ask(words, units)).kind, words).toBe('card');
  });
});
