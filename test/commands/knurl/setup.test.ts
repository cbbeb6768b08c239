import { describe, expect, it } from 'vitest';
import { cardFor, checkOf, figureOf, refusalFor, textOf } from '../../support/desk.ts';

const WORKED = '/knurl 1.000 straight 21tpi 1018';

/** The text with its line breaks taken back. */
const said = (text: string): string => text.replaceAll(/\s+/gu, ' ');
const block = (text: string, index: number): string => text.split('\n\n')[index] ?? '';

describe('the card for a 1.000 in bar of 1018, straight, 21 TPI', () => {
  // evidence: the card worked out by hand for this project's design, every printed figure
  it('leads with the line to act on, its window and the bar as it is', async () => {
    const text = textOf(await cardFor(WORKED));
    expect(said(block(text, 0))).toBe(
      'Turn to 0.9852 in: 65 teeth [25.025 mm] 0.9838 to 0.9867 tracks. ' +
        'Or leave it at 1.0000 in: 66 teeth, 0.03 of a tooth under. (as-is)',
    );
  });

  it('then the figures', async () => {
    const rows = said(block(textOf(await cardFor(WORKED)), 1));
    for (const part of [
      'Feed in 0.0118 in past touch, to start [0.301 mm]',
      'First turn 0.0043 in or more [0.109 mm]',
      'Stop when the crests keep a flat of 0.0048 in, or measure 1.0035 in',
      'over them (1.0010 to 1.0060)',
      'Run 288 rev/min (74 ft/min)',
      'Plunge 15 turns, the last 3 no infeed, 3 s',
    ])
      expect(rows).toContain(part);
  });

  it('then the checks', async () => {
    const checks = said(block(textOf(await cardFor(WORKED)), 2));
    for (const part of [
      'Tracking fine whole count',
      'Wheel watch label not proven: could be 1.6 teeth out; seam test?',
      'Fill fine 90 %',
      'Edge fine bevelled, plunge',
      'Material fine forms',
      'Speed fine at or under 100 ft/min',
    ])
      expect(checks).toContain(part);
  });

  it('then what it took by itself, the cautions and what goes before it', async () => {
    const text = said(textOf(await cardFor(WORKED)));
    expect(text).toContain('Wheel 20 x 8 x 6 mm, bevelled, taken; yours?');
    expect(text).toMatch(/Guard in place.*no gloves, loose sleeves.*Spindle stopped before/u);
    expect(text).toContain(
      "The shop's rules, the machine's manual and licensed practice go before this card.",
    );
  });

  it('in a metric shop says the same the other way round', async () => {
    const text = said(textOf(await cardFor('1.000 in straight 21tpi 1018', 'mm')));
    expect(text).toContain('Turn to 25.025 mm: 65 teeth [0.9852 in]');
    expect(text).toContain('24.987 to 25.063 tracks.');
  });
});

describe('what the card took by itself is said', () => {
  it('a helical TPI: which way, the count the other way, and that way as a choice', async () => {
    const taken = await cardFor('1.0 diamond 21tpi 1018');
    const top = said(block(textOf(taken), 0));
    expect(top).toContain('Pitch taken square to the teeth: 57 teeth. Meant along the rim: 65.');
    expect(top).toContain('Helix 30° taken.');
    const other = taken.card.choices.find(({ label }) => label.label === 'otherBasis');
    const rim = await cardFor(other!.words);
    expect(figureOf(rim, 'toothCount')).toBe(65);
    expect(said(textOf(rim))).toContain(
      'Pitch taken along the rim: 65 teeth. Meant square to the teeth: 57.',
    );
    const back = rim.card.choices.find(({ label }) => label.label === 'otherBasis');
    expect(figureOf(await cardFor(back!.words), 'toothCount')).toBe(57);
  });

  it.each(['1.0 diamond 96dp 1018', '1.0 diamond m0.3 1018', '1.0 straight 21tpi', '1.0 RGE 0.8'])(
    '%s: the pitch is not in doubt',
    async (line) => {
      expect(said(textOf(await cardFor(line)))).not.toContain('Pitch taken');
    },
  );

  it('no material: medium-carbon cold-drawn steel, the usual ones offered', async () => {
    const taken = await cardFor('1.0 straight 21tpi');
    expect(said(textOf(taken))).toContain(
      'No material named: Medium-carbon steel, 0.45 % C, cold drawn, taken.',
    );
    const offered = taken.card.choices.filter(({ label }) => label.label === 'material');
    expect(offered.length).toBeGreaterThan(3);
    for (const { words } of offered)
      expect(said(textOf(await cardFor(words)))).not.toContain('No material named');
  });

  it('diamond means raised points', async () => {
    const raised = await cardFor('1.0 diamond 21tpi 1018');
    const named = await cardFor('1.0 diamond raised 21tpi 1018');
    expect(raised.card.figures).toEqual(named.card.figures);
    const sunk = await cardFor('1.0 diamond sunk 21tpi 1018');
    expect(figureOf(sunk, 'growth')).toBeLessThan(figureOf(raised, 'growth'));
  });

  it('the wheel is the mirror of the pattern', async () => {
    // evidence: DIN 82 (a left-hand knurl needs a right-hand wheel, raised points an indented wheel)
    expect(said(textOf(await cardFor('1.0 diagonal left 96dp 1018')))).toContain(
      'Takes a right-hand wheel (left-hand knurl).',
    );
    expect(said(textOf(await cardFor('1.0 square 21tpi 1018')))).toContain(
      'Takes one crossed wheel with sunk points (square pattern, points raised).',
    );
  });
});

describe('a wheel in hand', () => {
  it('given by size and count is believed over its label', async () => {
    // evidence: DIN 403: a wheel of 20 mm and t 1.0 has 63 teeth, π·20/63 = 0.99733 mm
    const counted = await cardFor('25 mm straight 1.0 pitch 1018 wheel 20mm 63 teeth');
    expect(figureOf(counted, 'transversePitch').toFixed(5)).toBe('0.99733');
    expect(checkOf(counted, 'wheel')).toBe('watch counted');
    expect(said(textOf(counted))).toContain('63 teeth on 0.7874 in, goes before its label');
    const alone = await cardFor('25 mm straight 1018 wheel 20mm 63 teeth');
    expect(figureOf(alone, 'blankDiameter')).toBe(figureOf(counted, 'blankDiameter'));
  });

  it('given by its size leaves the pitch as it is', async () => {
    const plain = await cardFor('25 mm straight 1.0 pitch 1018');
    const sized = await cardFor('25 mm straight 1.0 pitch 1018 wheel 20x8x6 bevel 1');
    expect(sized.card.figures).toEqual(plain.card.figures);
    expect(said(textOf(sized))).not.toContain('taken; yours?');
  });

  it('of another size changes what it rolls', async () => {
    // evidence: contact width 10 − 2 × 0.5 = 9 mm: a knurl of 8 mm plunges
    const wide = await cardFor('25 mm straight 1.0 pitch 1018 long 8mm wheel 20x10x6 bevel 0.5');
    expect(figureOf(wide, 'turns')).toBe(15);
    const narrow = await cardFor('25 mm straight 1.0 pitch 1018 long 8mm wheel 20x6x6 bevel 0.5');
    expect(figureOf(narrow, 'passes')).toBe(1);
  });
});

describe('tilt, class and callout', () => {
  it('a 160 DP straight wheel set over 30° on 1.000 in: 138 teeth, 0.996 in', async () => {
    // evidence: Machinery's Handbook 31 p. 1059
    const found = await cardFor('1.000 straight 160dp tilt 30 1018');
    expect(figureOf(found, 'toothCount')).toBe(138);
    expect((figureOf(found, 'blankDiameter') / 25.4).toFixed(3)).toBe('0.996');
  });

  it('a class brings its own window and says so', async () => {
    // evidence: class I ±0.0010 in at 96 DP (read)
    const text = said(textOf(await cardFor('1.000 straight 96dp class I 1018')));
    expect(text).toContain('0.9990 to 1.0010 tracks.');
    expect(text).toContain('The window is the blank tolerance of class I.');
  });

  it('RGE 0.8 is a raised diamond of 0.8 mm, square to the teeth', async () => {
    // evidence: DIN 82 (forms, read); DIN 403 counts (normal, derived)
    const called = await cardFor('20 mm RGE 0.8 1018', 'mm');
    const worded = await cardFor('20 mm diamond raised 0.8 pitch 1018', 'mm');
    expect(called.card.figures).toEqual(worded.card.figures);
  });
});

describe('finish', () => {
  it('alone asks for the blank', async () => {
    const found = await cardFor('/knurl finish 0.995-1.005 straight 96dp 1018');
    expect(figureOf(found, 'toothCount')).toBe(95);
    expect(checkOf(found, 'finish')).toBe('fine inside');
    expect(found.card.figures['stockToothCount']).toBeNull();
    expect(said(textOf(found))).toContain('For a finished 0.9950 to 1.0050.');
  });

  it.each(['finish 0.995 to 1.005', 'finish 1.000 ±0.005', 'finish 1.005 +0 -0.010'])(
    '%s is the same',
    async (print) => {
      const found = await cardFor(`${print} straight 96dp 1018`);
      expect(figureOf(found, 'toothCount')).toBe(95);
      expect(figureOf(found, 'crestDiameter') / 25.4).toBeCloseTo(1.0021, 4);
    },
  );

  it('that nothing meets is a stop that says by how much', async () => {
    const found = await cardFor('finish 0.995-1.005 straight 96dp 1018 0.97 bar');
    expect(checkOf(found, 'finish')).toBe('stop under');
    expect(said(textOf(found))).toMatch(
      /^Do not run this\. Print: crest 0\.\d{4} in under the limits/u,
    );
  });

  it('moves the fill and says so', async () => {
    const found = await cardFor('finish 0.9985-1.000 straight 96dp 1018 95 teeth');
    expect(figureOf(found, 'fill')).toBeLessThan(0.9);
    expect(figureOf(found, 'fill')).toBeGreaterThanOrEqual(0.7);
    expect(said(textOf(found))).toMatch(/For a finished 0\.9985 to 1\.0000: fill moved to [78]/u);
  });
});

describe('as-is', () => {
  it('makes the whole card for the bar', async () => {
    const left = await cardFor('/knurl 1.000 straight 21tpi 1018 as-is');
    expect(figureOf(left, 'blankDiameter')).toBe(25.4);
    expect(figureOf(left, 'toothCount')).toBe(66);
    expect(said(textOf(left))).toMatch(/^Leave it at 1\.0000 in: 66 teeth/u);
  });

  it('of a bar between two counts is a stop', async () => {
    const left = await cardFor('0.99 straight 21tpi 1018 as-is');
    expect(checkOf(left, 'tracking')).toBe('stop offWhole');
  });
});

describe('form or cut', () => {
  it('a metal that does not form is cut, and the card says so', async () => {
    const cut = await cardFor('1.0 straight 21tpi cast iron');
    expect(said(block(textOf(cut), 0))).toContain('does not form: worked out as a cut knurl.');
    expect(figureOf(cut, 'crestDiameter')).toBe(figureOf(cut, 'blankDiameter'));
    expect(checkOf(cut, 'material')).toBe('fine cuts');
  });

  it('asked to form it all the same: a stop, speed and time null', async () => {
    const stop = await cardFor('1.0 straight 21tpi cast iron form long 1');
    expect(said(textOf(stop))).toMatch(/^Do not run this\. Material: does not form/u);
    for (const name of ['surfaceSpeed', 'spindleSpeed', 'time'])
      expect(stop.card.figures[name]).toBeNull();
  });
});

describe('few teeth', () => {
  it('four: a stop with the smallest diameter that makes sense', async () => {
    const four = await cardFor('/knurl 0.1 14tpi straight');
    expect(checkOf(four, 'tracking')).toBe('stop fewTeeth');
    // evidence: 12 teeth of 14 TPI are 12/14/π = 0.27284 in, rounded up
    expect(said(textOf(four))).toContain('0.2729 in [6.931 mm] is the smallest');
  });

  it('two: out of range', async () => {
    const { refusal } = await refusalFor('/knurl 0.06 14tpi straight');
    expect(refusal).toMatchObject({ code: 'outOfRange', what: 'diameter', unit: 'mm' });
  });
});

describe('buttons', () => {
  it.each([WORKED, '1.5 diamond 33tpi 303 long 2 out 3', 'finish 24.9-25.1 mm RAA 1.0 brass'])(
    'of %s send lines that make cards, and the ones they say',
    async (line) => {
      const { card } = await cardFor(line);
      for (const { label, words, ask: form = [] } of card.choices) {
        const next = await cardFor(form.includes('symptom') ? `${words} double` : words);
        if (label.label === 'smaller' || label.label === 'larger') {
          expect(figureOf(next, 'toothCount')).toBe(label.values.toothCount);
          expect(figureOf(next, 'blankDiameter')).toBeCloseTo(label.values.blankDiameter, 9);
        }
        if (label.label === 'otherUnits') expect(next.card.units).toBe(label.values.units);
        if (label.label === 'asIs')
          expect(figureOf(next, 'blankDiameter')).toBeCloseTo(label.values.stock, 9);
      }
    },
  );

  it('a larger blank is offered where the bar allows one', async () => {
    const smaller = await cardFor('1.0 straight 21tpi 1018 60 teeth');
    const kinds = smaller.card.choices.map(({ label }) => label.label);
    expect(kinds).toContain('larger');
    const plain = await cardFor(WORKED);
    expect(plain.card.choices.map(({ label }) => label.label)).not.toContain('larger');
  });

  it('a stop comes with changes that lift it', async () => {
    const bent = await cardFor('0.375 straight 21tpi 304 out 4 long 1');
    expect(checkOf(bent, 'bending')).toMatch(/^stop/u);
    const remedies = bent.card.choices.filter(({ label }) => label.label === 'remedy');
    expect(remedies.length).toBeGreaterThan(0);
    for (const { words } of remedies)
      expect(checkOf(await cardFor(words), 'bending')).not.toMatch(/^stop/u);
  });
});

describe('what cannot be answered', () => {
  it.each([
    [
      '/knurl 19 diamond 21tpi',
      'unclear',
      ['/knurl 19 mm diamond 21tpi', '/knurl 19 in diamond 21tpi'],
    ],
    [
      '/knurl 1.0 21tpi 96dp straight',
      'unclear',
      ['/knurl 1.0 21tpi straight', '/knurl 1.0 96dp straight'],
    ],
    [
      '/knurl 1.0 straight',
      'missing',
      ['/knurl 1.0 straight 21tpi', '/knurl 1.0 straight 96dp', '/knurl 1.0 straight 1.0 pitch'],
    ],
    ['/knurl 1.0 straigt 21tpi', 'unreadable', ['/knurl 1.0 straight 21tpi']],
  ])('%s: %s', async (line, code, lines) => {
    const { refusal, choices } = await refusalFor(line);
    expect(refusal.code).toBe(code);
    expect(choices.map(({ words }) => words)).toEqual(lines);
    for (const { words } of choices) await cardFor(words);
  });

  it('a misspelt word is pointed at, and never taken', async () => {
    const line = '/knurl 1.0 straigt 21tpi';
    const { refusal } = await refusalFor(line);
    expect(refusal).toMatchObject({ code: 'unreadable', word: 'straigt', nearest: ['straight'] });
    if (refusal.code !== 'unreadable') return;
    expect(line.slice(refusal.start, refusal.end)).toBe('straigt');
  });

  it.each(['1.0 21tpi 1018', '21tpi 1.0'])('%s: which pattern, with choices', async (line) => {
    const { refusal, choices } = await refusalFor(line);
    expect(refusal).toMatchObject({ code: 'missing', parameter: 'pattern' });
    expect(choices.length).toBeGreaterThan(2);
    for (const { words } of choices) await cardFor(words);
  });

  it('no bar: three examples in the shop’s own unit', async () => {
    for (const units of ['in', 'mm'] as const) {
      const { refusal, choices } = await refusalFor('straight 21tpi 1018', units);
      expect(refusal).toMatchObject({ code: 'missing', parameter: 'diameter' });
      expect(choices).toHaveLength(3);
      for (const { words } of choices) await cardFor(words, units);
    }
  });

  it.each(['-1', '0', '1e99', 'NaN', 'Infinity', '-0.0', '1e-99', '.', '999999999999999999'])(
    '/knurl %s straight 21tpi: a sentence',
    async (typed) => {
      const text = textOf(await refusalFor(`/knurl ${typed} straight 21tpi`));
      expect(text).toMatch(/^\S.*[.?]/su);
      expect(text).not.toMatch(/Error|undefined|\bat .*:\d+/u);
    },
  );

  it('4000 characters: a sentence that says how many fit', async () => {
    const { refusal } = await refusalFor(`/knurl ${'x'.repeat(4000)}`);
    expect(refusal).toMatchObject({ code: 'outOfRange', what: 'textLength', max: 1000 });
  });

  it('an empty line: help', async () => {
    for (const line of ['', '   ', '/knurl', '\t']) {
      const { card } = await cardFor(line);
      expect(card.verb).toBe('help');
    }
  });

  it.each([
    ['1.0 straight left 21tpi', 'handNeedsDiagonal'],
    ['1.0 straight sunk 21tpi', 'pointsNeedCrossing'],
    ['1.0 straight helix 30 21tpi', 'helixNeedsHelical'],
    ['1.0 diamond helix 30 tilt 30 21tpi', 'tiltAndHelix'],
    ['1.0 square pattern tilt 30 21tpi', 'tiltNotSquare'],
    ['1.0 straight 21tpi class II', 'classNeedsDp'],
    ['1.0 diamond 96dp class II', 'classStraightOnly'],
    ['1.0 straight 21tpi square edge bevel 1 mm', 'squareEdgeHasNoBevel'],
    ['1.0 straight 21tpi speed 60 sfm 200 rpm', 'speedTwice'],
    ['1.0 straight 21tpi long 1 in turns 15 feed 0.012', 'feedTwice'],
    ['1.0 straight 21tpi as-is 60 teeth', 'countAndAsIs'],
    ['finish 1.005-0.995 straight 96dp', 'limitsReversed'],
  ])('%s: %s, with ways out', async (line, because) => {
    const { refusal, choices } = await refusalFor(line);
    expect(refusal).toMatchObject({ code: 'unclear', because });
    expect(choices.length).toBeGreaterThan(0);
    for (const { words } of choices) await cardFor(words);
  });
});

it('a square pattern that would have to travel is not sent to a pair, which leaves none', async () => {
  // It once said: take a pair or a shorter knurl, for squares as well.
  const answer = await cardFor('1.000 square 21tpi 1018 long 1');
  expect(checkOf(answer, 'edge')).toContain('stop');
  expect(said(textOf(answer, 200))).toContain('a shorter knurl, or for a diamond a pair');
});
