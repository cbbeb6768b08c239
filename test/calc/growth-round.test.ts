import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  blankForCrest,
  type Form,
  formedFlat,
  formedRound,
  heightFromCrest,
  heightFromRoundInfeed,
  profileVariance,
} from '../../src/calc/growth/index.ts';
import { degrees, type Mm, mm, OutOfRange } from '../../src/calc/units.ts';
import { PARTIAL, ROUND } from '../reference/formed-growth.ts';
import { sixDigits } from '../support/digits.ts';
import { near } from '../support/near.ts';
import { simpson } from '../support/simpson.ts';

const FORMS: readonly Form[] = ['grooves', 'raised', 'sunk'];
const HF = mm(0.4);

/** The solid share written out again, so that the balance below is not held against itself. */
const SHARE: Record<Form, (g: number) => number> = {
  grooves: (g) => 1 - g,
  raised: (g) => (1 - g) * (1 - g),
  sunk: (g) => 1 - g * g,
};

type Work = { form: Form; blankDiameter: Mm; height: Mm; sharpHeight: Mm };

const workFrom = (least: number, most = 1): fc.Arbitrary<Work> =>
  fc
    .record({
      form: fc.constantFrom(...FORMS),
      sharpHeight: fc.double({ min: 0.05, max: 1.6, noNaN: true }),
      fill: fc.double({ min: least, max: most, noNaN: true }),
      overHeight: fc.double({ min: 4, max: 400, noNaN: true }),
    })
    .map(({ form, sharpHeight, fill, overHeight }) => ({
      form,
      blankDiameter: mm(overHeight * sharpHeight),
      height: mm(fill * sharpHeight),
      sharpHeight: mm(sharpHeight),
    }));

describe('a formed knurl on round work', () => {
  // evidence: worked examples A4
  it.each(ROUND)('of 6 mm, filled to an edge as $form', (example) => {
    const { form } = example;
    const blankDiameter = mm(6);
    const flat = formedFlat(form, HF, HF);
    expect(sixDigits(flat.infeed)).toBe(example.infeedFlat);
    expect(sixDigits(blankDiameter + flat.growth)).toBe(example.crestFlat);

    const round = formedRound({ form, blankDiameter, height: HF, sharpHeight: HF });
    expect(sixDigits(round.infeed)).toBe(example.infeed);
    expect(sixDigits(round.crestDiameter)).toBe(example.crest);
    expect(sixDigits(round.crestDiameter)).toBe(example.crestNumeric);

    const lost = profileVariance(form, HF, HF) / (blankDiameter / 2);
    expect(sixDigits(blankDiameter + flat.growth - lost)).toBe(example.crestFromVariance);

    const { crestDiameter } = round;
    const back = blankForCrest({ form, crestDiameter, height: HF, sharpHeight: HF });
    expect(sixDigits(back)).toBe(example.blankBack);
  });

  // evidence: worked examples A2, "variance"
  it.each(PARTIAL)('has the variance of its profile as $form', (example) => {
    expect(sixDigits(profileVariance(example.form, mm(0.3), HF))).toBe(example.variance);
  });
});

describe('laws of round work', () => {
  it('volume is kept between root and crest, added up ring by ring', () => {
    fc.assert(
      fc.property(workFrom(0.01), (work) => {
        const { rootRadius, crestDiameter } = formedRound(work);
        const ring = (u: number) =>
          SHARE[work.form](u / work.sharpHeight) * 2 * Math.PI * (rootRadius + u);
        const metal = Math.PI * rootRadius ** 2 + simpson(ring, 0, work.height, 40);
        near(metal, Math.PI * (work.blankDiameter / 2) ** 2, 1e-12);
        near(crestDiameter, 2 * (rootRadius + work.height), 1e-12);
      }),
    );
  });

  it('the variance is the second moment of the solid share about its mean', () => {
    fc.assert(
      fc.property(workFrom(0.05), ({ form, height, sharpHeight }) => {
        const share = (u: number) => SHARE[form](u / sharpHeight);
        const mean = simpson(share, 0, height, 20);
        const square = simpson((u) => 2 * u * share(u), 0, height, 20);
        near(profileVariance(form, height, sharpHeight), square - mean ** 2, 1e-9);
      }),
    );
  });

  it('rise and infeed make up the height', () => {
    fc.assert(
      fc.property(workFrom(0), (work) => {
        const { infeed, growth, rootRadius, crestDiameter } = formedRound(work);
        expect(infeed + growth / 2).toBeCloseTo(work.height, 12);
        expect(rootRadius + infeed).toBeCloseTo(work.blankDiameter / 2, 10);
        expect(crestDiameter - work.blankDiameter).toBeCloseTo(growth, 10);
      }),
    );
  });

  it('more height never takes less infeed, and the crest never falls', () => {
    fc.assert(
      fc.property(workFrom(0), fc.double({ min: 0, max: 1, noNaN: true }), (work, part) => {
        const low = formedRound({ ...work, height: mm(part * work.height) });
        const high = formedRound(work);
        expect(high.infeed).toBeGreaterThanOrEqual(low.infeed - 1e-14);
        expect(high.growth).toBeGreaterThanOrEqual(low.growth - 1e-14);
      }),
    );
  });

  it('grows a little less than flat work, and like it on a huge bar', () => {
    fc.assert(
      fc.property(workFrom(0.05), (work) => {
        const flat = formedFlat(work.form, work.height, work.sharpHeight);
        expect(formedRound(work).growth).toBeLessThan(flat.growth);
        const huge = formedRound({ ...work, blankDiameter: mm(1e6) });
        expect(huge.growth).toBeCloseTo(flat.growth, 5);
      }),
    );
  });

  it('the crest gives the blank back', () => {
    fc.assert(
      fc.property(workFrom(0), (work) => {
        const { crestDiameter } = formedRound(work);
        near(blankForCrest({ ...work, crestDiameter }), work.blankDiameter, 1e-12);
      }),
    );
  });

  it('the crest gives the height back', () => {
    fc.assert(
      fc.property(workFrom(0.1), (work) => {
        const { crestDiameter } = formedRound(work);
        near(heightFromCrest({ ...work, crestDiameter }) ?? Number.NaN, work.height, 1e-8);
      }),
    );
  });

  it('the infeed gives the height back where the dial still tells heights apart', () => {
    fc.assert(
      fc.property(workFrom(0.01, 0.95), (work) => {
        const { infeed } = formedRound(work);
        near(heightFromRoundInfeed({ ...work, infeed }) ?? Number.NaN, work.height, 1e-9);
      }),
    );
  });

  it('twice the size is twice every length', () => {
    fc.assert(
      fc.property(workFrom(0), (work) => {
        const once = formedRound(work);
        const twice = formedRound({
          form: work.form,
          blankDiameter: mm(2 * work.blankDiameter),
          height: mm(2 * work.height),
          sharpHeight: mm(2 * work.sharpHeight),
        });
        near(twice.rootRadius, 2 * once.rootRadius, 1e-12);
        near(twice.infeed, 2 * once.infeed, 1e-12);
        near(twice.crestDiameter, 2 * once.crestDiameter, 1e-12);
        near(twice.growth, 2 * once.growth, 1e-12);
      }),
    );
  });
});

describe('a height read back from the part', () => {
  const blankDiameter = mm(20);
  const full = (form: Form) => formedRound({ form, blankDiameter, height: HF, sharpHeight: HF });

  it.each(FORMS)('is full form at full form and null beyond it: %s', (form) => {
    const { crestDiameter, infeed } = full(form);
    const of = { form, blankDiameter, sharpHeight: HF };
    expect(heightFromCrest({ ...of, crestDiameter })).toBeCloseTo(HF, 10);
    expect(heightFromCrest({ ...of, crestDiameter: mm(crestDiameter + 1e-9) })).toBeNull();
    expect(heightFromRoundInfeed({ ...of, infeed })).toBeCloseTo(HF, 10);
    expect(heightFromRoundInfeed({ ...of, infeed: mm(infeed + 1e-9) })).toBeNull();
  });

  it.each(FORMS)('is nothing where nothing was done: %s', (form) => {
    const of = { form, blankDiameter, sharpHeight: HF };
    expect(heightFromCrest({ ...of, crestDiameter: blankDiameter })).toBe(0);
    expect(heightFromCrest({ ...of, crestDiameter: mm(20 * (1 - 1e-15)) })).toBe(0);
    expect(heightFromRoundInfeed({ ...of, infeed: mm(0) })).toBe(0);
  });

  it('of a crest under the blank is refused, with the blank as the least', () => {
    const call = () =>
      heightFromCrest({
        form: 'raised',
        blankDiameter,
        crestDiameter: mm(19.99),
        sharpHeight: HF,
      });
    expect(call).toThrow(
      expect.objectContaining({ what: 'crestDiameter', value: 19.99, min: 20, unit: 'mm' }),
    );
  });
});

describe('senseless arguments', () => {
  const work = { form: 'raised', blankDiameter: mm(20), height: mm(0.3), sharpHeight: HF } as const;
  const crest = {
    form: 'raised',
    crestDiameter: mm(20),
    height: mm(0.3),
    sharpHeight: HF,
  } as const;

  it.each<[string, () => unknown]>([
    ['a blank that would be all teeth', () => formedRound({ ...work, blankDiameter: mm(0.2) })],
    ['no blank', () => formedRound({ ...work, blankDiameter: mm(0), height: mm(0) })],
    ['a blank that is no number', () => formedRound({ ...work, blankDiameter: mm(Number.NaN) })],
    ['a height over the sharp height', () => formedRound({ ...work, height: mm(0.41) })],
    ['a negative height', () => formedRound({ ...work, height: mm(-0.01) })],
    ['no sharp height', () => formedRound({ ...work, height: mm(0), sharpHeight: mm(0) })],
    ['a crest that is all tooth', () => blankForCrest({ ...crest, crestDiameter: mm(0.5) })],
    ['no crest', () => blankForCrest({ ...crest, crestDiameter: mm(0), height: mm(0) })],
    ['a crest of a tooth too high', () => blankForCrest({ ...crest, height: mm(0.5) })],
    ['a variance of a tooth too high', () => profileVariance('sunk', mm(0.5), HF)],
    [
      'a crest that is no number',
      () => heightFromCrest({ ...work, crestDiameter: mm(Number.NaN) }),
    ],
    [
      'a blank too thin to take full form',
      () => heightFromCrest({ ...work, blankDiameter: mm(0.2), crestDiameter: mm(0.3) }),
    ],
    [
      'a crest on no tooth',
      () => heightFromCrest({ ...work, crestDiameter: mm(20.1), sharpHeight: mm(0) }),
    ],
    ['a negative infeed', () => heightFromRoundInfeed({ ...work, infeed: mm(-0.01) })],
    [
      'an infeed into a blank too thin',
      () => heightFromRoundInfeed({ ...work, blankDiameter: mm(0.2), infeed: mm(0.01) }),
    ],
  ])('refuse %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });

  it('do not compile when their unit is another', () => {
    // @ts-expect-error an angle is no diameter
    expect(() => formedRound({ ...work, blankDiameter: degrees(10) })).toThrow(OutOfRange);
    // @ts-expect-error a bare number has no unit
    expect(blankForCrest({ ...crest, crestDiameter: 20 })).toBe(blankForCrest(crest));
  });
});
