import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { FIT_BITES_TO, finishedSizeMinusPlate, pressFit } from '../../src/calc/fits.ts';
import { mm, OutOfRange } from '../../src/calc/units.ts';

const limits = { low: mm(19.987), high: mm(20) };

describe('plating', () => {
  // evidence: a layer lies on both sides of a diameter: 8 µm take 16 µm
  it('takes twice its thickness off the target', () => {
    const { low, high } = finishedSizeMinusPlate(limits, mm(0.008));
    expect(low).toBeCloseTo(19.971, 12);
    expect(high).toBeCloseTo(19.984, 12);
    expect(finishedSizeMinusPlate(limits, mm(0))).toEqual(limits);
  });

  it('leaves the tolerance as wide as it was', () => {
    const thickness = fc.double({ min: 0, max: 0.1, noNaN: true });
    fc.assert(
      fc.property(thickness, (s) => {
        const { low, high } = finishedSizeMinusPlate(limits, mm(s));
        expect(high - low).toBeCloseTo(0.013, 12);
      }),
    );
  });

  it('refuses a layer of less than nothing and one thicker than the part', () => {
    expect(() => finishedSizeMinusPlate(limits, mm(-0.001))).toThrow(OutOfRange);
    expect(() => finishedSizeMinusPlate({ low: mm(0.5), high: mm(0.6) }, mm(0.3))).toThrow(
      expect.objectContaining({ what: 'finish', value: 0.5, min: 0.6 }),
    );
  });
});

describe('a press fit', () => {
  const fit = (crest: number) => pressFit({ bore: mm(10), crest: mm(crest), toothHeight: mm(0.3) });

  // evidence: judgement: 0.6 of the tooth height fine; interference is half the difference
  it.each([
    [9.9, 'stop', 'loose'],
    [10, 'stop', 'loose'],
    [10.05, 'fine', 'grips'],
    [10.36, 'fine', 'grips'],
    [10.37, 'watch', 'tight'],
    [10.6, 'watch', 'tight'],
    [10.61, 'stop', 'over'],
  ])('of a 0.3 mm tooth, crest %f in a 10 mm bore: %s, %s', (crest, state, reason) => {
    expect(fit(crest)).toMatchObject({ name: 'fit', state, reason });
  });

  it('shows the interference on a side, its share of the tooth and the largest crest that is fine', () => {
    const { figures } = fit(10.2);
    expect(figures['interference']?.value).toBeCloseTo(0.1, 12);
    expect(figures['interferenceShare']?.value).toBeCloseTo(1 / 3, 12);
    const largest = figures['largestCrest']?.value ?? 0;
    expect(largest).toBeCloseTo(10 + 2 * FIT_BITES_TO * 0.3, 12);
    expect(fit(largest).state).toBe('fine');
  });

  it('refuses no bore and no tooth', () => {
    expect(() => pressFit({ bore: mm(0), crest: mm(10), toothHeight: mm(0.3) })).toThrow(
      OutOfRange,
    );
    expect(() => pressFit({ bore: mm(10), crest: mm(10), toothHeight: mm(0) })).toThrow(OutOfRange);
  });
});
