import { describe, expect, it } from 'vitest';
import { ask, cardFor, checkOf, figureOf, refusalFor, textOf } from '../../support/desk.ts';

const said = (text: string): string => text.replaceAll(/\s+/gu, ' ');
const INCH = 25.4;

/** Pattern of each form, as the card names it, and the wheel it takes. */
// evidence: DIN 82, kinds of knurls: AA axial, BL and BR left and right, GE and GV diagonal
// crossed at 30° with points raised and sunk, KE and KV square with points raised and sunk
const FORMS = [
  ['RAA', 'straight knurl', 'a straight wheel'],
  ['RBL', 'left-hand knurl', 'a right-hand wheel'],
  ['RBR', 'right-hand knurl', 'a left-hand wheel'],
  ['RGE', 'diamond, points raised', 'a left-hand and a right-hand wheel'],
  ['RGV', 'diamond, points sunk', 'one crossed wheel with raised points'],
  ['RKE', 'square pattern, points raised', 'one crossed wheel with sunk points'],
  ['RKV', 'square pattern, points sunk', 'one crossed wheel with raised points'],
] as const;

describe('the seven forms of DIN 82', () => {
  it.each(FORMS)('%s is a %s from %s', async (form, pattern, wheel) => {
    for (const spelling of [
      `${form} 0,8`,
      `${form} 0.8`,
      `${form} 08`,
      `${form}08`,
      `${form.toLowerCase()} 0.8`,
      `DIN 82-${form} 0,8`,
      `DIN 82 ${form} 0.8`,
      `Rändel ${form} 08 DIN 82`,
    ]) {
      const answer = await cardFor(`20 ${spelling} brass`, 'mm');
      const text = said(textOf(answer, 200));
      expect(text, spelling).toContain(`Takes ${wheel} (${pattern}).`);
      expect(figureOf(answer, 'pitch'), spelling).toBeCloseTo(0.8, 9);
      // 90° where the designation names no angle: the sharp height is half the pitch.
      expect(figureOf(answer, 'sharpHeight'), spelling).toBeCloseTo(0.4, 9);
    }
  });

  it.each(['RGE 0.8 - 105', 'RGE 08-105', 'RGE 0,8 105°'])(
    '%s has flatter teeth',
    async (callout) => {
      const answer = await cardFor(`20 ${callout} brass`, 'mm');
      const half = (105 / 2) * (Math.PI / 180);
      expect(figureOf(answer, 'sharpHeight')).toBeCloseTo(0.4 / Math.tan(half), 6);
    },
  );

  it('is read wherever it stands, and whatever is beside it', async () => {
    for (const line of ['DIN 82-RAA 0.8 20 brass', '20 DIN 82-RAA 0.8 brass', 'brass 20 RAA 0.8'])
      expect(figureOf(await cardFor(line, 'mm'), 'toothCount'), line).toBe(78);
  });

  it.each([
    ['RGX 0.8', 'RGX', ['RGE', 'RGV']],
    ['DIN 82 RXA 0.8', 'RXA', ['RAA']],
    ['DIN 82', 'DIN 82', ['RAA', 'RBL', 'RBR', 'RGE', 'RGV', 'RKE', 'RKV']],
  ] as const)('%s: no such form, the nearest offered', async (callout, word, nearest) => {
    const answer = await refusalFor(`20mm ${callout}`);
    expect(answer.refusal).toMatchObject({ code: 'unreadable', word, nearest });
    expect(answer.choices.map(({ label }) => label)).toEqual(nearest);
    for (const { words } of answer.choices) {
      const next = await ask(words);
      expect(next.kind === 'card' ? 'card' : next.refusal.code).toMatch(/^(?:card|missing)$/u);
    }
  });
});

describe('the callouts of the others', () => {
  it.each([
    ['1.000 96 DP STRAIGHT', 96, (Math.PI * INCH) / 96],
    ['1.000 P96 straight', 96, (Math.PI * INCH) / 96],
    ['1.000 ASME B94.6 64 DP diagonal left', 64, (Math.PI * INCH) / 64],
    ['1.000 21 TPI straight', 66 - 1, INCH / 21],
    ['1.000 JIS B 0951 straight m 0.3', 84, Math.PI * 0.3],
    ['1.000 GOST 21474-75 straight 0.8', 99, 0.8],
  ] as const)('%s', async (line, teeth, transverse) => {
    const answer = await cardFor(line);
    expect(figureOf(answer, 'transversePitch')).toBeCloseTo(transverse, 9);
    expect(figureOf(answer, 'toothCount')).toBe(teeth);
  });

  // evidence: ASME B94.6 through the handbook: blank ±0.0010 in at 96 DP, class I
  it('a class narrows the window to its own tolerance and says so', async () => {
    const answer = await cardFor('1.000 96 DP straight class I');
    expect(figureOf(answer, 'blankWindowLow')).toBeCloseTo(0.999 * INCH, 3);
    expect(said(textOf(answer))).toContain('The window is the blank tolerance of class I.');
  });

  it.each(['I', 'II', 'III'] as const)(
    'class %s sets the finished limits of a nominal',
    async (own) => {
      const answer = await cardFor(`finish 1.000 96 DP straight class ${own}`);
      const limits = /For a finished (\d\.\d{4}) to (\d\.\d{4})/u.exec(said(textOf(answer)));
      expect(Number(limits?.[1])).toBeLessThan(1.0001);
      expect(Number(limits?.[2])).toBeGreaterThanOrEqual(1);
      expect(checkOf(answer, 'finish')).not.toBe('absent');
    },
  );
});

describe('words beside a callout', () => {
  it.each([
    ['20 RGE 0.8 straight', 'pattern'],
    ['20 RGE 0.8 sunk', 'pattern'],
    ['20 RBL 0.8 right', 'pattern'],
    ['20 RAA 0.8 1.0 pitch', 'pitch'],
    ['20 RGE 0.8 105° angle 90', 'angle'],
    ['20 RAA 0.8 21tpi', 'pitch'],
  ])('%s is a question about the %s', async (line, what) => {
    const answer = await refusalFor(line, 'mm');
    expect(answer.refusal).toMatchObject({ code: 'unclear', what });
    expect(answer.choices).toHaveLength(2);
    for (const { words } of answer.choices) {
      const next = await ask(words, 'mm');
      // What is left may still lack a pitch or a pattern, which is asked in turn.
      expect(next.kind === 'card' ? 'card' : next.refusal.code, words).toMatch(
        /^(?:card|missing)$/u,
      );
    }
  });

  it.each(['20 RGE 0.8 diamond', '20 RBL 0.8 left', '20 RAA 0.8 0.8 pitch', '20 RKV 1 sunk'])(
    '%s says the same twice and is a card',
    async (line) => {
      expect((await ask(line, 'mm')).kind).toBe('card');
    },
  );
});

describe('a callout with one diameter', () => {
  it('takes it as the bar, says so, and offers it as the finished size', async () => {
    const answer = await cardFor('20 RGE 0.8 brass', 'mm');
    expect(said(textOf(answer))).toContain(
      "20.000 mm taken as the bar; a drawing's size is the finished one",
    );
    const choice = answer.card.choices.find(({ label }) => label.label === 'finishedSize');
    const finished = await cardFor(choice?.words ?? '', 'mm');
    expect(figureOf(finished, 'blankDiameter')).toBeLessThan(figureOf(answer, 'blankDiameter'));
    expect(Math.abs(figureOf(finished, 'crestDiameter') - 20)).toBeLessThan(0.15);
  });

  it('words alone make no such offer', async () => {
    const { card } = await cardFor('20 straight 0.8 pitch brass', 'mm');
    expect(card.choices.some(({ label }) => label.label === 'finishedSize')).toBe(false);
  });
});

describe('plating and press fits', () => {
  it('plating takes its thickness off both sides of the finished limits', async () => {
    // 8 µm a side: 0.016 mm off the target on diameter.
    const plated = await cardFor('finish 19.9-20.1 straight 0.8 pitch brass plate 8um', 'mm');
    expect(said(textOf(plated))).toContain('For a finished 19.884 to 20.084');
    expect(said(textOf(plated))).toContain('Plating of 0.008 mm [0.0003 in] to come');
  });

  it('a press fit is judged by its interference against the tooth', async () => {
    const answer = await cardFor('10 fit 10.00 straight 0.8 pitch brass', 'mm');
    expect(checkOf(answer, 'fit')).toMatch(/^fine/u);
    const loose = await cardFor('10 fit 11.00 straight 0.8 pitch brass', 'mm');
    expect(checkOf(loose, 'fit')).not.toMatch(/^fine/u);
  });
});
