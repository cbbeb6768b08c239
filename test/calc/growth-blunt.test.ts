import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type Form,
  formedBlunt,
  formedFlat,
  greatestHeight,
  sharpHeight,
  tipLostArea,
  tipRecess,
} from '../../src/calc/growth/index.ts';
import { degrees, mm, OutOfRange } from '../../src/calc/units.ts';
import { ROUNDED_LIMIT, TIP_RADIUS } from '../reference/formed-growth.ts';
import { sixDigits } from '../support/digits.ts';
import { simpson } from '../support/simpson.ts';

const FORMS: readonly Form[] = ['grooves', 'raised', 'sunk'];
const P = mm(0.8);
const RIGHT_ANGLE = degrees(90);

const SHARE: Record<Form, (g: number) => number> = {
  grooves: (g) => 1 - g,
  raised: (g) => (1 - g) * (1 - g),
  sunk: (g) => 1 - g * g,
};

/** Height from which a rounded groove's flank is straight, and its width, laid out as drawn. */
const tangentOf = (rho: number, a: number): number => rho - rho * Math.sin(a);
const widthAt = (u: number, rho: number, a: number): number =>
  u < tangentOf(rho, a)
    ? 2 * Math.sqrt(Math.max(0, rho ** 2 - (rho - u) ** 2))
    : 2 * (rho * Math.cos(a) + (u - tangentOf(rho, a)) * Math.tan(a));

/** Infeed by adding up; u = ρ(1 − cos t) inside the arc takes the root's steep start away. */
const infeedOf = (form: Form, p: number, rho: number, a: number, height: number): number => {
  const share = (u: number) => SHARE[form](widthAt(u, rho, a) / p);
  const tangent = Math.min(height, tangentOf(rho, a));
  const last = rho === 0 ? 0 : Math.acos(1 - tangent / rho);
  const arc = simpson((t) => share(rho * (1 - Math.cos(t))) * rho * Math.sin(t), 0, last, 400);
  return arc + simpson(share, tangent, height, 20);
};

const wheel = fc
  .record({
    form: fc.constantFrom(...FORMS),
    p: fc.double({ min: 0.2, max: 3.2, noNaN: true }),
    degrees: fc.double({ min: 60, max: 120, noNaN: true }),
    radiusShare: fc.double({ min: 0, max: 0.9, noNaN: true }),
    heightShare: fc.double({ min: 0, max: 1, noNaN: true }),
  })
  .map((drawn) => {
    const included = degrees(drawn.degrees);
    const p = mm(drawn.p);
    const tipRadius = mm((drawn.radiusShare * p) / (2 * Math.cos(included / 2)));
    const most = greatestHeight({ p, included, tipRadius, rootRadius: mm(0) });
    return { form: drawn.form, p, included, tipRadius, height: mm(drawn.heightShare * most) };
  });

describe('a wheel with rounded tips', () => {
  // evidence: worked examples A6
  it('of 0.1 mm radius at pitch 0.8, straight, 0.3 high', () => {
    const tipRadius = mm(TIP_RADIUS.tipRadius);
    expect(sixDigits(tipRecess(tipRadius, RIGHT_ANGLE))).toBe(TIP_RADIUS.recess);
    expect(sixDigits(tipLostArea(tipRadius, RIGHT_ANGLE))).toBe(TIP_RADIUS.lostArea);
    const { infeed, rise, growth } = formedBlunt({
      form: 'grooves',
      p: P,
      included: RIGHT_ANGLE,
      height: mm(TIP_RADIUS.height),
      tipRadius,
    });
    expect(sixDigits(infeed)).toBe(TIP_RADIUS.infeed);
    expect(sixDigits(rise)).toBe(TIP_RADIUS.rise);
    expect(sixDigits(growth)).toBe(TIP_RADIUS.growth);
  });

  // evidence: worked example A7
  it('leaves less height, and rounded roots less again', () => {
    const radius = mm(ROUNDED_LIMIT.radius);
    const of = { p: P, included: RIGHT_ANGLE, tipRadius: radius };
    expect(sixDigits(greatestHeight({ ...of, rootRadius: radius }))).toBe(
      ROUNDED_LIMIT.greatestHeight,
    );
    expect(greatestHeight({ ...of, rootRadius: mm(0) })).toBeGreaterThan(
      ROUNDED_LIMIT.greatestHeight,
    );
  });
});

describe('laws of blunt wheels', () => {
  it('the infeed is the solid share of the drawn groove added up', () => {
    fc.assert(
      fc.property(wheel, (of) => {
        const summed = infeedOf(of.form, of.p, of.tipRadius, of.included / 2, of.height);
        const { infeed, rise, growth } = formedBlunt(of);
        expect(infeed).toBeCloseTo(summed, 8);
        expect(infeed + rise).toBeCloseTo(of.height, 12);
        expect(growth).toBe(2 * rise);
      }),
    );
  });

  it.each(FORMS)('passes from arc to flank without a step: %s', (form) => {
    const tipRadius = mm(0.2);
    const tangent = tangentOf(tipRadius, Math.PI / 4);
    const at = (height: number) =>
      formedBlunt({ form, p: P, included: RIGHT_ANGLE, height: mm(height), tipRadius }).rise;
    expect(at(tangent * (1 + 1e-9))).toBeCloseTo(at(tangent * (1 - 1e-9)), 9);
    expect(at(0)).toBe(0);
  });

  it('is a sharp wheel when the radius is nothing', () => {
    fc.assert(
      fc.property(wheel, (drawn) => {
        const { form, p, included } = drawn;
        const sharp = sharpHeight(p, included);
        const height = mm(Math.min(drawn.height, sharp));
        const blunt = formedBlunt({ form, p, included, height, tipRadius: mm(0) });
        expect(blunt.rise).toBeCloseTo(formedFlat(form, height, sharp).rise, 12);
      }),
    );
  });

  it('displaces more than a sharp wheel at the same height', () => {
    fc.assert(
      fc.property(wheel, (of) => {
        const sharp = formedFlat(of.form, of.height, sharpHeight(of.p, of.included));
        expect(formedBlunt(of).rise).toBeGreaterThanOrEqual(sharp.rise - 1e-12);
      }),
    );
  });

  it('fills the whole pitch at its greatest height', () => {
    fc.assert(
      fc.property(wheel, (of) => {
        const most = greatestHeight({ ...of, rootRadius: mm(0) });
        expect(widthAt(most, of.tipRadius, of.included / 2)).toBeCloseTo(of.p, 10);
      }),
    );
  });

  it('twice the size is twice every length and four times every area', () => {
    fc.assert(
      fc.property(wheel, (of) => {
        const twice = {
          form: of.form,
          p: mm(2 * of.p),
          included: of.included,
          height: mm(2 * of.height),
          tipRadius: mm(2 * of.tipRadius),
        };
        const { tipRadius, included } = of;
        expect(formedBlunt(twice).rise).toBeCloseTo(2 * formedBlunt(of).rise, 11);
        expect(tipRecess(twice.tipRadius, included)).toBeCloseTo(
          2 * tipRecess(tipRadius, included),
          12,
        );
        expect(tipLostArea(twice.tipRadius, included)).toBeCloseTo(
          4 * tipLostArea(tipRadius, included),
          12,
        );
      }),
    );
  });
});

describe('senseless arguments', () => {
  const blunt = {
    form: 'raised',
    p: P,
    included: RIGHT_ANGLE,
    height: mm(0.3),
    tipRadius: mm(0.1),
  } as const;
  const rounded = { p: P, included: RIGHT_ANGLE, tipRadius: mm(0.1), rootRadius: mm(0.1) } as const;

  it.each<[string, () => unknown]>([
    ['a negative radius', () => tipRecess(mm(-0.1), RIGHT_ANGLE)],
    ['a radius that is no number', () => tipLostArea(mm(Number.NaN), RIGHT_ANGLE)],
    ['a height the radius does not leave', () => formedBlunt({ ...blunt, height: mm(0.36) })],
    ['a negative height', () => formedBlunt({ ...blunt, height: mm(-0.1) })],
    ['an arc wider than the pitch', () => formedBlunt({ ...blunt, tipRadius: mm(0.6) })],
    ['no pitch', () => formedBlunt({ ...blunt, p: mm(0) })],
    ['two arcs wider than the pitch', () => greatestHeight({ ...rounded, rootRadius: mm(0.5) })],
    ['a negative root', () => greatestHeight({ ...rounded, rootRadius: mm(-0.1) })],
  ])('refuse %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });

  it('do not compile when their unit is another', () => {
    // @ts-expect-error an angle is no radius, and a radius no angle
    expect(tipRecess(RIGHT_ANGLE, mm(0.1))).not.toBeCloseTo(tipRecess(mm(0.1), RIGHT_ANGLE), 1);
    // @ts-expect-error a bare number has no unit
    expect(tipLostArea(0.1, RIGHT_ANGLE)).toBe(tipLostArea(mm(0.1), RIGHT_ANGLE));
  });
});
