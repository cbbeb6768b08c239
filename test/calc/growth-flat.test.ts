import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  dialSlope,
  type Form,
  formedFlat,
  fullFormInfeed,
  heightFromInfeed,
  heightFromRise,
  sharpHeight,
  solidShare,
} from '../../src/calc/growth/index.ts';
import { degrees, mm, OutOfRange } from '../../src/calc/units.ts';
import {
  FROM_CREST_FLAT,
  FULL_FORM,
  OVER_FILLED,
  PARTIAL,
  TIP_FLAT,
} from '../reference/formed-growth.ts';
import { sixDigits } from '../support/digits.ts';
import { near } from '../support/near.ts';
import { simpson } from '../support/simpson.ts';

const FORMS: readonly Form[] = ['grooves', 'raised', 'sunk'];
const HF = mm(0.4);

const form = fc.constantFrom(...FORMS);
const sharp = fc.double({ min: 0.05, max: 2.5, noNaN: true }).map(mm);
const fillFrom = (min: number, max = 1) => fc.double({ min, max, noNaN: true });

describe('a formed knurl on flat work', () => {
  // evidence: worked examples A1
  describe.each(FULL_FORM)(
    'filled to an edge at $included°',
    ({ Hf, growth, infeed, ...wheel }) => {
      const exact = sharpHeight(mm(wheel.p), degrees(wheel.included));
      it.each(FORMS)('as %s', (form) => {
        const full = formedFlat(form, exact, exact);
        expect(sixDigits(exact)).toBe(Hf);
        expect(sixDigits(full.growth)).toBe(growth[form]);
        expect(sixDigits(full.infeed)).toBe(infeed[form]);
        expect(sixDigits(fullFormInfeed(form, exact))).toBe(infeed[form]);
      });
    },
  );

  // evidence: worked examples A2
  it.each(PARTIAL)('three quarters full as $form', (example) => {
    const { infeed, rise, growth } = formedFlat(example.form, mm(0.3), HF);
    expect(sixDigits(infeed)).toBe(example.infeed);
    expect(sixDigits(rise)).toBe(example.rise);
    expect(sixDigits(growth)).toBe(example.growth);
    expect(sixDigits(heightFromRise(example.form, rise, HF) ?? Number.NaN)).toBe(0.3);
    expect(sixDigits(heightFromInfeed(example.form, infeed, HF) ?? Number.NaN)).toBe(0.3);
    expect(sixDigits(dialSlope(example.form, 0.75))).toBe(example.dialSlope);
  });

  // evidence: worked examples A3 (half the growth of the diameter is the rise)
  it.each(FROM_CREST_FLAT)('read back from crest and blank as $form', (example) => {
    const height = heightFromRise(example.form, mm((19.9 - 19.7) / 2), HF) ?? mm(Number.NaN);
    expect(sixDigits(height)).toBe(example.height);
    expect(sixDigits(formedFlat(example.form, height, HF).infeed)).toBe(example.infeed);
    expect(sixDigits(height / HF)).toBe(example.fill);
  });

  // evidence: worked example A5
  it('under a wheel with flat tips', () => {
    const blunt = formedFlat('grooves', mm(TIP_FLAT.height), HF, TIP_FLAT.tipFlat);
    expect(sixDigits(blunt.infeed)).toBe(TIP_FLAT.infeed);
    expect(sixDigits(blunt.rise)).toBe(TIP_FLAT.rise);
  });

  // evidence: worked examples A8
  it.each(OVER_FILLED)('read back from too much or enough infeed as $form', (example) => {
    const height = heightFromInfeed(example.form, mm(0.15), HF);
    expect(sixDigits(fullFormInfeed(example.form, HF))).toBe(example.fullFormInfeed);
    expect(height === null ? null : sixDigits(height)).toBe(example.height);
  });
});

describe("DIN 82's diameter before knurling, d2 = d1 − k·t", () => {
  const factor = (of: Form, included: number): number => {
    const Hf = sharpHeight(mm(1), degrees(included));
    return formedFlat(of, Hf, Hf).growth;
  };

  // evidence: DIN 82 (January 1973), forms RAA RBL RBR, RGE RKE, RGV RKV; k at 90° as printed
  it.each<[Form, number, string]>([
    ['grooves', 1, '0.5'],
    ['raised', 2, '0.67'],
    ['sunk', 2, '0.33'],
  ])('is the full growth at 90° as %s', (of, places, printed) => {
    expect(factor(of, 90).toFixed(places)).toBe(printed);
  });

  // evidence: {1/2, 2/3, 1/3}·cot(α/2), derived from equal volume; the standard gives 90° only
  it.each<[Form, string]>([
    ['grooves', '0.384'],
    ['raised', '0.512'],
    ['sunk', '0.256'],
  ])('carries over to 105° as %s', (of, derived) => {
    expect(factor(of, 105).toFixed(3)).toBe(derived);
  });
});

describe('laws of flat work', () => {
  it('rise and infeed make up the height, and growth is twice the rise', () => {
    fc.assert(
      fc.property(form, sharp, fillFrom(0), fillFrom(0, 0.3), (of, Hf, x, tipFlat) => {
        const H = mm(x * Hf * (1 - tipFlat));
        const { infeed, rise, growth } = formedFlat(of, H, Hf, tipFlat);
        near(infeed + rise, H, 1e-14);
        expect(growth).toBe(2 * rise);
        expect(infeed).toBeGreaterThanOrEqual(0);
        expect(rise).toBeGreaterThanOrEqual(0);
      }),
    );
  });

  it('more height never takes less infeed and never rises less', () => {
    fc.assert(
      fc.property(form, sharp, fillFrom(0), fillFrom(0), (of, Hf, a, b) => {
        const low = formedFlat(of, mm(Math.min(a, b) * Hf), Hf);
        const high = formedFlat(of, mm(Math.max(a, b) * Hf), Hf);
        expect(high.infeed).toBeGreaterThanOrEqual(low.infeed - 1e-15);
        expect(high.rise).toBeGreaterThanOrEqual(low.rise - 1e-15);
      }),
    );
  });

  it('the infeed is the solid share added up over the height, tip flat or not', () => {
    fc.assert(
      fc.property(form, sharp, fillFrom(0.05), fillFrom(0, 0.3), (of, Hf, x, tipFlat) => {
        const H = mm(x * Hf * (1 - tipFlat));
        const share = (u: number) => solidShare(of, mm(u), Hf, tipFlat);
        near(formedFlat(of, H, Hf, tipFlat).infeed, simpson(share, 0, H, 20), 1e-12);
      }),
    );
  });

  it('sunk points rise least, raised points most', () => {
    fc.assert(
      fc.property(sharp, fillFrom(0.01), (Hf, x) => {
        const rise = (of: Form) => formedFlat(of, mm(x * Hf), Hf).rise;
        expect(rise('sunk')).toBeLessThan(rise('grooves'));
        expect(rise('grooves')).toBeLessThan(rise('raised'));
      }),
    );
  });

  it('the rise gives the height back', () => {
    fc.assert(
      fc.property(form, sharp, fillFrom(1e-6), (of, Hf, x) => {
        const H = mm(x * Hf);
        near(heightFromRise(of, formedFlat(of, H, Hf).rise, Hf) ?? Number.NaN, H, 1e-9);
      }),
    );
  });

  it('the infeed gives the height back where the dial still tells heights apart', () => {
    fc.assert(
      fc.property(form, sharp, fillFrom(1e-6, 0.98), (of, Hf, x) => {
        const H = mm(x * Hf);
        near(heightFromInfeed(of, formedFlat(of, H, Hf).infeed, Hf) ?? Number.NaN, H, 1e-9);
      }),
    );
  });

  it('the height gives rise and infeed back up to full form', () => {
    fc.assert(
      fc.property(form, sharp, fillFrom(0), (of, Hf, part) => {
        const full = formedFlat(of, Hf, Hf);
        const fromRise = heightFromRise(of, mm(part * full.rise), Hf) ?? mm(Number.NaN);
        const fromInfeed = heightFromInfeed(of, mm(part * full.infeed), Hf) ?? mm(Number.NaN);
        near(formedFlat(of, fromRise, Hf).rise, part * full.rise, 1e-9);
        near(formedFlat(of, fromInfeed, Hf).infeed, part * full.infeed, 1e-9);
      }),
    );
  });

  it.each(FORMS)('full form comes back as full form and a hair more as over-filled: %s', (of) => {
    const full = formedFlat(of, HF, HF);
    expect(heightFromRise(of, full.rise, HF)).toBeCloseTo(HF, 7);
    expect(heightFromInfeed(of, full.infeed, HF)).toBeCloseTo(HF, 5);
    expect(heightFromRise(of, mm(full.rise + 1e-9), HF)).toBeNull();
    expect(heightFromInfeed(of, mm(full.infeed + 1e-9), HF)).toBeNull();
    expect(heightFromRise(of, mm(0), HF)).toBeCloseTo(0, 15);
    expect(heightFromInfeed(of, mm(0), HF)).toBeCloseTo(0, 15);
  });

  // The cosine of the raised inverse and the roots of the others lose their digits near zero.
  it.each(FORMS)('a shallow touch keeps its digits: %s', (of) => {
    const H = mm(1e-7 * HF);
    near(heightFromInfeed(of, formedFlat(of, H, HF).infeed, HF) ?? Number.NaN, H, 1e-9);
  });

  it('twice the size is twice every length', () => {
    fc.assert(
      fc.property(form, sharp, fillFrom(0), fillFrom(0, 0.3), (of, Hf, x, tipFlat) => {
        const H = mm(x * Hf * (1 - tipFlat));
        const once = formedFlat(of, H, Hf, tipFlat);
        const twice = formedFlat(of, mm(2 * H), mm(2 * Hf), tipFlat);
        near(twice.infeed, 2 * once.infeed, 1e-12);
        near(twice.growth, 2 * once.growth, 1e-12);
      }),
    );
  });

  it('the dial slope is the slope of crest against infeed', () => {
    fc.assert(
      fc.property(form, fillFrom(0.05, 0.9), (of, x) => {
        const step = 1e-5;
        const low = formedFlat(of, mm(x - step), mm(1));
        const high = formedFlat(of, mm(x + step), mm(1));
        const slope = (high.growth - low.growth) / (high.infeed - low.infeed);
        near(slope, dialSlope(of, x), 1e-3);
      }),
    );
  });

  it.each(FORMS)('the dial says nothing at full form: %s', (of) => {
    expect(dialSlope(of, 0)).toBe(0);
    expect(dialSlope(of, 1)).toBe(Number.POSITIVE_INFINITY);
    expect(solidShare(of, mm(0), HF)).toBe(1);
    expect(solidShare(of, HF, HF)).toBe(0);
    expect(solidShare(of, mm(3), HF, 0.2)).toBe(0);
  });
});

describe('senseless arguments', () => {
  it('take rounding noise on the sharp height for the sharp height', () => {
    const noisy = mm(HF * (1 + 5e-13));
    expect(noisy).toBeGreaterThan(HF);
    expect(formedFlat('raised', noisy, HF)).toEqual(formedFlat('raised', HF, HF));
  });

  it.each<[string, () => unknown]>([
    ['a height over the sharp height', () => formedFlat('grooves', mm(0.4001), HF)],
    ['a height over what a flat tip leaves', () => formedFlat('sunk', mm(0.37), HF, 0.1)],
    ['a negative height', () => formedFlat('grooves', mm(-0.1), HF)],
    ['a height that is no number', () => formedFlat('grooves', mm(Number.NaN), HF)],
    ['no sharp height', () => formedFlat('grooves', mm(0), mm(0))],
    ['a tip flat of more than the pitch', () => formedFlat('grooves', mm(0), HF, 1.1)],
    ['a level under the root', () => solidShare('grooves', mm(-0.1), HF)],
    ['a sharp height under nothing', () => solidShare('grooves', mm(0.1), mm(-1))],
    ['a tip flat that is no number', () => solidShare('grooves', mm(0.1), HF, Number.NaN)],
    ['a negative rise', () => heightFromRise('raised', mm(-0.1), HF)],
    ['a negative infeed', () => heightFromInfeed('raised', mm(-0.1), HF)],
    ['an infeed that is no number', () => heightFromInfeed('raised', mm(Number.NaN), HF)],
    ['a rise on no tooth', () => heightFromRise('raised', mm(0.1), mm(0))],
    ['an infeed of no tooth', () => fullFormInfeed('raised', mm(-0.4))],
    ['a fill over 1', () => dialSlope('raised', 1.1)],
    ['a fill of 75 for 75 %', () => dialSlope('raised', 75)],
  ])('refuse %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });

  it('do not compile when their unit is another', () => {
    // @ts-expect-error an angle is no height
    expect(() => formedFlat('grooves', degrees(90), HF)).toThrow(OutOfRange);
    // @ts-expect-error a bare number has no unit
    expect(heightFromRise('grooves', 0.1, HF)).toBeCloseTo(0.282843, 6);
    // @ts-expect-error the form is named, not the pattern
    expect(formedFlat('diamond', mm(0.3), HF).infeed).toBeNaN();
  });
});
