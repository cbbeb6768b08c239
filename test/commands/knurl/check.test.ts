import { describe, expect, it } from 'vitest';
import { ask, type CardAnswer, cardFor, checkOf, figureOf, textOf } from '../../support/desk.ts';

const said = (text: string): string => text.replaceAll(/\s+/gu, ' ');
const headline = (answer: CardAnswer): string => said(textOf(answer, 200).split('\n')[0] ?? '');

describe('check before: will this blank track', () => {
  it('a blank that does is left, and its window is told', async () => {
    const answer = await cardFor('/knurl check 0.9852 straight 21tpi');
    expect(headline(answer)).toBe('Leave it at 0.9852 in: 65 teeth');
    expect(said(textOf(answer))).toContain('0.9838 to 0.9867 tracks.');
    expect(figureOf(answer, 'toothCount')).toBe(65);
    expect(figureOf(answer, 'toothError')).toBeCloseTo(-0.003, 3);
  });

  it('one that does not is turned to the next that does, whose window is told', async () => {
    // N = π · 0.995 · 21 = 65.644: nearest 66, next below 65 at 65/(21 π) = 0.98524 in
    const answer = await cardFor('/knurl check 0.995 straight 21tpi');
    expect(headline(answer)).toBe('Turn to 0.9852 in: 65 teeth; 0.0098 in comes off');
    const text = said(textOf(answer));
    expect(text).toContain('0.9950 in as it is: 0.36 of a tooth under 66.');
    expect(text).toContain('0.9838 to 0.9867 tracks.');
    expect(text).not.toContain('1.0019');
    expect(figureOf(answer, 'toothCount')).toBe(66);
    expect(figureOf(answer, 'toothError')).toBeCloseTo(Math.PI * 0.995 * 21 - 66, 9);
    expect(figureOf(answer, 'diameterError')).toBeCloseTo((0.995 - 66 / (21 * Math.PI)) * 25.4, 9);
    expect(figureOf(answer, 'nextDiameter')).toBeCloseTo((65 / (21 * Math.PI)) * 25.4, 9);
    expect(checkOf(answer, 'tracking')).toMatch(/^stop/u);
  });

  it('leads through the seam test in four lines with the infeed of the trial turn', async () => {
    const text = said(textOf(await cardFor('/knurl check 0.995 straight 21tpi')));
    expect(text).toMatch(/1\. Drive out, power off, one wheel only\./u);
    expect(text).toMatch(/2\. Press the wheel in 0\.0043 in, turn the work once round by hand/u);
    expect(text).toMatch(/3\. Look where the last mark meets the first/u);
    expect(text).toMatch(/4\. Send it: seam 0\.3/u);
  });

  it.each([
    '/knurl check 0.9852 straight 21tpi proven 65 at 0.9852',
    '/knurl check 1.000 straight 96dp',
  ])('%s: nothing is said of a label that is not in doubt', async (line) => {
    expect(said(textOf(await cardFor(line)))).not.toMatch(/label alone|1\. Drive out/u);
  });
});

describe('the seam of a trial turn', () => {
  const LINE = '/knurl check 0.995 21tpi straight seam 0.3';

  it('tells how much comes off, to which diameter and how sure', async () => {
    // (s + 1) p/π with p = 25.4/21: 1.3 · 0.38500 = 0.50050 mm, past twice the bite of 0.109 mm
    const answer = await cardFor(LINE);
    expect(headline(answer)).toBe('Turn 0.0197 in off: to 0.9753 in [24.772 mm]');
    expect(figureOf(answer, 'seamTakeOff')).toBeCloseTo((1.3 * 25.4) / 21 / Math.PI, 9);
    expect(answer.card.figures['effectivePitch']).toBeNull();
    expect(said(textOf(answer))).toContain('Tracks 94 % of the time; by the label alone 18 %.');
    // The seam has spoken: the label is not put in doubt once more.
    expect(checkOf(answer, 'wheel')).toBe('absent');
    expect(checkOf(answer, 'seam')).toBe('fine closes');
  });

  it('on scrap the marks may stay, so only the gap comes off', async () => {
    const answer = await cardFor(`${LINE} scrap`);
    expect(figureOf(answer, 'seamTakeOff')).toBeCloseTo((0.3 * 25.4) / 21 / Math.PI, 9);
    expect(said(textOf(answer))).toContain('The marks stay');
  });

  it('with the count the wheel is proven, by a pair that says the same pitch again', async () => {
    const answer = await cardFor(`${LINE} scrap count 66`);
    // 66 marks and 0.3 of a gap: the circumference is 65.3 pitches.
    const pitch = (Math.PI * 0.995 * 25.4) / 65.3;
    expect(figureOf(answer, 'effectivePitch')).toBeCloseTo(pitch, 9);
    expect(said(textOf(answer))).toContain('proven 65 at 0.9904 in');
    const again = await cardFor(answer.card.choices[0]?.words ?? '');
    expect(figureOf(again, 'toothCount')).toBe(65);
    expect(Math.abs(figureOf(again, 'pitch') / pitch - 1)).toBeLessThan(1e-4);
    expect(checkOf(again, 'tracking')).toMatch(/^fine/u);
  });

  it('a count that no label explains is counted again before anything is turned', async () => {
    const answer = await cardFor('/knurl check 1.000 straight 21tpi seam 0.3 count 90');
    expect(said(textOf(answer))).toContain(
      '90 counted, about 66 by the label: too far apart. Count again before you turn.',
    );
    const [choice] = answer.card.choices;
    expect(choice?.words).not.toContain('90');
  });

  it.each([
    ['seam 0.98', 'Leave it at 0.9950 in: the seam is whole'],
    ['seam 0', 'Leave it at 0.9950 in: the seam is whole'],
    ['seam 0.05', 'Turn 0.0008 in off: to 0.9942 in [25.254 mm]'],
  ])('%s', async (seam, first) => {
    expect(headline(await cardFor(`/knurl check 0.995 21tpi straight ${seam}`))).toBe(first);
  });
});

describe('check after: the finished part', () => {
  const PART = '/knurl check 0.9852 straight 21tpi 1018';

  it.each([
    ['count 65 crest 1.0040', 'Right, keep it: 65 teeth on 0.9852 in', 'the same again'],
    [
      'count 66',
      'Keep it: the count is off',
      '0.9852 in holds 66 teeth as it is; for 65 turn to 0.9703 in',
    ],
    [
      'count 130',
      'Turn it down to 0.9549 in and knurl again: the count is off',
      'first turn 0.0043 in or more',
    ],
    ['count 90', 'Count again: the count is off', '65 was worked out'],
    [
      'crest 0.995',
      'Measure the flat on the crests: fill or growth is off',
      '0.0048 in means the fill is right',
    ],
    [
      'crest 1.008 flat 0.0005',
      'Turn it down to 0.9549 in and knurl again: the fill is off',
      'stop while the crests keep a flat of 0.0048 in',
    ],
    [
      'finish 0.995-1.000 crest 1.004 count 65',
      'Scrap it: fill or growth is off',
      'stop when it measures 0.9975 in',
    ],
    [
      'flats 0.004 and 0.012 over 1.0',
      'Keep it: the depth along the length is off',
      'swivel the tool by 0.04°, the shallow end deeper',
    ],
  ])('%s', async (measured, first, then) => {
    const answer = await cardFor(`${PART} ${measured}`);
    expect(headline(answer)).toBe(first);
    expect(said(textOf(answer))).toContain(then);
  });

  it('gives what was measured as figures', async () => {
    const answer = await cardFor(`${PART} count 65 crest 1.0040`);
    expect(figureOf(answer, 'countExpected')).toBe(65);
    expect(figureOf(answer, 'growthMeasured')).toBeCloseTo((1.004 - 0.9852) * 25.4, 9);
    expect(figureOf(answer, 'growthFactor')).toBeCloseTo(0.979, 3);
    expect(figureOf(answer, 'fillFromCrest')).toBeCloseTo(0.914, 3);
  });

  it('a spoiled part comes down to the next count that still meets the print, if there is one', async () => {
    const met = await cardFor(`${PART} count 130 finish 0.960-0.980`);
    expect(headline(met)).toMatch(/^Turn it down to 0\.9\d+ in and knurl again/u);
    expect(said(textOf(met))).toContain('meets the print.');
    const down = await cardFor(met.card.choices[0]?.words ?? '');
    expect(checkOf(down, 'tracking')).toMatch(/^fine/u);
    const lost = await cardFor(`${PART} count 130 finish 1.000-1.005`);
    expect(headline(lost)).toMatch(/^Scrap it/u);
  });

  it('no two rows or checks of one card share their name', async () => {
    for (const measured of ['count 65 crest 1.004 flat 0.005', 'flats 0.004 and 0.012 over 1.0']) {
      const text = textOf(await cardFor(`${PART} ${measured} finish 0.99-1.01`), 200);
      const names = [...text.matchAll(/^(\w[\w -]*?) {2,}\S/gmu)].map(([, name]) => name);
      expect(new Set(names).size, names.join(', ')).toBe(names.length);
    }
  });
});

describe('what a person can act on', () => {
  it.each([
    [
      'check 0.12 straight 14tpi',
      '0.1200 in holds too few teeth to roll: take a finer pitch, or 0.2729 in or more',
    ],
    [
      'check 1.000 diamond 21tpi 304 count 57 crest 1.02 height 0.018',
      'Feed in further, until the crests keep a flat of 0.0048 in: the fill is off',
    ],
  ])('%s', async (line, first) => {
    expect(headline(await cardFor(line))).toBe(first);
  });

  it('an angle to swivel by has no sign, whichever end is shallow', async () => {
    for (const flats of ['0.012 and 0.004', '0.004 and 0.012']) {
      const answer = await cardFor(`check 0.9852 straight 21tpi flats ${flats} over 1.0`);
      expect(said(textOf(answer))).toContain('swivel the tool by 0.04°');
    }
  });
});

describe('in a metric shop', () => {
  it('a check says millimetres first, and its choices are typed in them', async () => {
    const answer = await cardFor('/knurl check 20 straight 0.8 pitch', 'mm');
    expect(headline(answer)).toMatch(/^Turn to 19\.863 mm: 78 teeth; 0\.137 mm comes off$/u);
    const again = await cardFor(answer.card.choices[0]?.words ?? '', 'mm');
    expect(figureOf(again, 'toothCount')).toBe(78);
  });
});

describe('every choice of a check leads on', () => {
  it.each([
    '/knurl check 0.995 straight 21tpi',
    '/knurl check 0.9852 straight 21tpi',
    '/knurl check straight 21tpi',
    '/knurl check 0.995 21tpi straight seam 0.3',
    '/knurl check 0.995 21tpi straight seam 0.3 scrap count 66',
    '/knurl check 1.000 straight 21tpi seam 0.3 count 90',
    '/knurl check 0.9852 straight 21tpi 1018 count 66 crest 1.0040',
    '/knurl check 0.9852 straight 21tpi 1018 count 130',
    '/knurl check 0.9852 straight 21tpi proven 65 at 0.9852 count 64',
    'check 20mm RGE 0.8 brass crest 20.3mm',
  ])('%s', async (line) => {
    const answer = await ask(line);
    const choices = answer.kind === 'card' ? answer.card.choices : answer.choices;
    expect(choices.length).toBeGreaterThan(0);
    for (const { words } of choices) {
      const next = await ask(words);
      const code = next.kind === 'card' ? 'card' : next.refusal.code;
      expect(['card', 'missing', 'unclear'], words).toContain(code);
    }
  });
});
