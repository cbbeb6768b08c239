import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { pinchedRing, ringCheck, ringWidth } from '../../src/calc/ring/index.ts';
import { mm, mpa, newton, OutOfRange } from '../../src/calc/units.ts';
import { PINCHED } from '../reference/force.ts';
import { sixDigits } from '../support/digits.ts';
import { near } from '../support/near.ts';
import { simpson } from '../support/simpson.ts';

const pinch = {
  force: newton(PINCHED.force),
  meanRadius: mm(PINCHED.meanRadius),
  wall: mm(PINCHED.wall),
  width: mm(PINCHED.width),
  modulus: mpa(PINCHED.modulus),
};

describe('a pinched ring', () => {
  // evidence: worked example C10
  it('closes, spreads and is stressed as in the worked example', () => {
    const ring = pinchedRing(pinch);
    expect(sixDigits(ring.momentUnder)).toBe(PINCHED.momentUnder);
    expect(sixDigits(ring.momentAside)).toBe(PINCHED.momentAside);
    expect(sixDigits(ring.closing)).toBe(PINCHED.closing);
    expect(sixDigits(ring.spreading)).toBe(PINCHED.spreading);
    expect(sixDigits(ring.stressUnder)).toBe(PINCHED.stressUnder);
    expect(sixDigits(ring.stressAside)).toBe(PINCHED.stressAside);
    expect(ring.stress).toBe(ring.stressUnder);
  });

  /**
   * The same by least work on a quarter of a curved bar. A quarter turn from the force the section
   * carries F/2 and a moment that keeps it from turning; angles run from there to the force.
   */
  it('agrees with least work on a quarter of the ring', () => {
    const { force: F, meanRadius: R } = pinch;
    const quarter = (curve: (angle: number) => number) => simpson(curve, 0, Math.PI / 2, 400);
    const free = (angle: number) => (F / -2) * R * (1 - Math.cos(angle));
    const aside = -quarter(free) / (Math.PI / 2);
    const moment = (angle: number) => aside + free(angle);
    const acrossUnit = (angle: number) => (R / -2) * (1 - Math.sin(angle));
    const stiffness = (pinch.modulus * pinch.width * pinch.wall ** 3) / 12;
    const energy = 4 * quarter((angle) => (moment(angle) ** 2 * R) / (2 * stiffness));
    const across = 4 * quarter((angle) => (moment(angle) * acrossUnit(angle) * R) / stiffness);
    const ring = pinchedRing(pinch);
    near(ring.momentAside, aside, 1e-9);
    near(ring.momentUnder, -moment(Math.PI / 2), 1e-9);
    near(ring.closing, (2 * energy) / F, 1e-9);
    near(ring.spreading, -across, 1e-9);
  });

  it('closes with the force, the cube of the radius and against the cube of the wall', () => {
    const k = fc.double({ min: 0.2, max: 5, noNaN: true });
    const once = pinchedRing(pinch).closing;
    fc.assert(
      fc.property(k, (n) => {
        near(pinchedRing({ ...pinch, force: newton(n * 1500) }).closing, n * once, 1e-9);
        const large = pinchedRing({ ...pinch, meanRadius: mm(n * 14), wall: mm(0.4) }).closing;
        near(large, n ** 3 * 125 * once, 1e-9);
      }),
    );
  });

  it('shares the load with the tube beside the wheel', () => {
    near(ringWidth(mm(6), mm(16), mm(1)), 6 + 12, 1e-12);
  });
});

describe('the check of a tube', () => {
  const at = (stress: number, closing: number, wall = 2) =>
    ringCheck({
      ring: { ...pinchedRing(pinch), stress: mpa(stress), closing: mm(closing) },
      wall: mm(wall),
      meanRadius: mm(14),
      yieldStrength: mpa(300),
      toothHeight: mm(0.5),
    });

  it('is fine to yield/1.5 and 10 % of the tooth, and stops where the low force passes more', () => {
    expect(at(200, 0.05)).toMatchObject({ state: 'fine', reason: 'holds' });
    expect(at(201, 0.05)).toMatchObject({ state: 'watch', reason: 'crushed' });
    expect(at(601, 0.05)).toMatchObject({ state: 'stop', reason: 'crushed' });
    expect(at(200, 0.051)).toMatchObject({ state: 'watch', reason: 'outOfRound' });
    expect(at(300, 0.301)).toMatchObject({ state: 'stop', reason: 'outOfRound' });
  });

  it('says where the wall is too thick for the formula, whatever the verdict', () => {
    expect(at(200, 0.05).figures['thinBelow']).toBeNull();
    const thick = at(200, 0.05, 4);
    expect(thick).toMatchObject({ state: 'fine', reason: 'thickWall' });
    expect(at(601, 0.05, 4).figures['thinBelow']).toEqual({ value: 0.2, unit: '1' });
  });

  it('is fine on a plug', () => {
    const plugged = ringCheck({
      ring: null,
      wall: mm(1),
      meanRadius: mm(14),
      yieldStrength: mpa(300),
      toothHeight: mm(0.5),
    });
    expect(plugged).toMatchObject({ state: 'fine', reason: 'plugged' });
  });
});

describe('senseless arguments', () => {
  it.each<[string, () => unknown]>([
    ['no wall', () => pinchedRing({ ...pinch, wall: mm(0) })],
    ['a wall thicker than the tube', () => pinchedRing({ ...pinch, wall: mm(29) })],
    ['a negative force', () => pinchedRing({ ...pinch, force: newton(-1) })],
    ['a negative width', () => ringWidth(mm(-1), mm(14), mm(2))],
  ])('refuse %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });
});
