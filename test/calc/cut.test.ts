import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CUT_RADIAL_SHARE, CUTTING_STIFFNESS, cutKnurl } from '../../src/calc/cut.ts';
import type { Form } from '../../src/calc/growth/index.ts';
import { degrees, type Mm, mm, mmPerRev, mpa, OutOfRange } from '../../src/calc/units.ts';
import { PARTIAL } from '../reference/formed-growth.ts';
import { near } from '../support/near.ts';
import { simpson } from '../support/simpson.ts';

const FORMS: readonly Form[] = ['grooves', 'raised', 'sunk'];
const cut = {
  form: 'grooves',
  blankDiameter: mm(20),
  p: mm(0.8),
  included: degrees(90),
  height: mm(0.3),
  feed: mmPerRev(0.15),
  cuttingStiffness: CUTTING_STIFFNESS.value.steel,
} as const;

describe('a cut knurl', () => {
  it('keeps the diameter and takes its height as infeed', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...FORMS),
        fc.double({ min: 0, max: 0.4, noNaN: true }),
        (form, H) => {
          const { crestDiameter, infeed } = cutKnurl({ ...cut, form, height: mm(H) });
          expect(crestDiameter).toBe(cut.blankDiameter);
          expect(infeed).toBe(H);
        },
      ),
    );
  });

  // evidence: worked examples A2, whose rise is the void per area that leaves as chip here
  it.each(PARTIAL)('takes the void of the pattern as chip: $form', ({ form, rise }) => {
    const { chipArea, tangentialForce, radialForce } = cutKnurl({ ...cut, form });
    near(chipArea, 0.15 * rise, 1e-9);
    near(tangentialForce, 3500 * 0.15 * rise, 1e-9);
    expect(radialForce).toBe(CUT_RADIAL_SHARE * tangentialForce);
  });

  // evidence: the triangle of a V-groove, H² tan a over the pitch
  it('takes a triangle out of every pitch when straight', () => {
    const height = fc.double({ min: 0.01, max: 0.4, noNaN: true }).map(mm);
    const chip = (H: Mm) => cutKnurl({ ...cut, height: H }).chipArea;
    fc.assert(
      fc.property(height, (H) => {
        const groove = simpson((u) => 2 * u * Math.tan(Math.PI / 4), 0, H, 2);
        expect(chip(H)).toBeCloseTo((0.15 * groove) / 0.8, 12);
      }),
    );
  });

  it('loads the tool twice as hard at twice the feed or in metal twice as stiff', () => {
    const once = cutKnurl(cut);
    expect(cutKnurl({ ...cut, feed: mmPerRev(0.3) }).tangentialForce).toBeCloseTo(
      2 * once.tangentialForce,
      9,
    );
    expect(cutKnurl({ ...cut, cuttingStiffness: mpa(7000) }).radialForce).toBeCloseTo(
      2 * once.radialForce,
      9,
    );
  });
});

describe('the cutting stiffness', () => {
  it('is a judgement and says so', () => {
    expect(CUTTING_STIFFNESS.mark).toBe('judgement');
  });

  // evidence: none outside; the order is the trade's (nickel and steel stiffest, plastics softest)
  it('is lowest for plastics and highest for steel and nickel alloys', () => {
    const { steel, nickel, plastic, ...others } = CUTTING_STIFFNESS.value;
    expect(nickel).toBe(steel);
    for (const between of Object.values(others)) {
      expect(between).toBeGreaterThan(plastic);
      expect(between).toBeLessThan(steel);
    }
  });
});

describe('senseless arguments', () => {
  it.each<[string, () => unknown]>([
    ['a height over the sharp height', () => cutKnurl({ ...cut, height: mm(0.5) })],
    ['a negative height', () => cutKnurl({ ...cut, height: mm(-0.1) })],
    ['a blank that is all tooth', () => cutKnurl({ ...cut, blankDiameter: mm(0.5) })],
    ['no blank', () => cutKnurl({ ...cut, blankDiameter: mm(0), height: mm(0) })],
    ['no pitch', () => cutKnurl({ ...cut, p: mm(0) })],
    ['no feed', () => cutKnurl({ ...cut, feed: mmPerRev(0) })],
    ['a feed that is no number', () => cutKnurl({ ...cut, feed: mmPerRev(Number.NaN) })],
    ['metal without stiffness', () => cutKnurl({ ...cut, cuttingStiffness: mpa(0) })],
  ])('refuse %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });

  it('do not compile when their unit is another', () => {
    // @ts-expect-error a feed is no height
    expect(cutKnurl({ ...cut, height: mmPerRev(0.15) }).infeed).toBe(0.15);
    // @ts-expect-error a bare number has no unit
    expect(cutKnurl({ ...cut, cuttingStiffness: 3500 })).toEqual(cutKnurl(cut));
  });
});
