import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  capacityCheck,
  contactArc,
  contactModulus,
  drivePower,
  equivalentRadius,
  forceBand,
  hertzHalfWidth,
  leadingForce,
  meanWedgeShare,
  metalPressure,
  type Press,
  plasticPressure,
  plungeForce,
  pressedForce,
  pressOf,
  rollingPressure,
  TRAILING_PRESSURE,
  trailingForce,
  traverseForce,
  wedgeShare,
  wheelTorque,
  widthCheck,
} from '../../src/calc/force/index.ts';
import { type Form, solidShare } from '../../src/calc/growth/index.ts';
import { materialById } from '../../src/calc/materials/index.ts';
import {
  mm,
  mmPerRev,
  mpa,
  newton,
  newtonMm,
  OutOfRange,
  revPerMin,
  watt,
} from '../../src/calc/units.ts';
import { PLUNGE_TURN, TRAVERSE_LEADING, TRAVERSE_TRAILING } from '../reference/force.ts';
import { sixDigits } from '../support/digits.ts';
import { near } from '../support/near.ts';
import { simpson } from '../support/simpson.ts';

const radius = equivalentRadius(mm(PLUNGE_TURN.wheelDiameter), mm(PLUNGE_TURN.workDiameter));
const pressure = metalPressure(PLUNGE_TURN.hardness, PLUNGE_TURN.strainHardening);
const PRESSES: readonly Press[] = ['grooves', 'oneOfPair', 'crossedRaised', 'crossedSunk'];
const FORM_OF: Record<Press, Form> = {
  grooves: 'grooves',
  oneOfPair: 'raised',
  crossedRaised: 'raised',
  crossedSunk: 'sunk',
};
const fraction = fc.double({ min: 0.01, max: 1, noNaN: true });

describe('one turn of a plunge', () => {
  const arc = contactArc(radius, mm(PLUNGE_TURN.perTurn));
  const share = wedgeShare('grooves', PLUNGE_TURN.height / PLUNGE_TURN.sharpHeight);
  const force = pressedForce({ pressure, share, width: mm(PLUNGE_TURN.width), arc });

  // evidence: worked example C2
  it('has the radius, share, arc, pressure, force and torque of the worked example', () => {
    expect(sixDigits(radius)).toBe(PLUNGE_TURN.radius);
    near(share, PLUNGE_TURN.share, 1e-12);
    expect(sixDigits(arc)).toBe(PLUNGE_TURN.arc);
    expect(sixDigits(pressure)).toBe(PLUNGE_TURN.pressure);
    expect(sixDigits(force)).toBe(PLUNGE_TURN.force);
    const torque = wheelTorque({
      force,
      arc,
      wheelDiameter: mm(PLUNGE_TURN.wheelDiameter),
      workDiameter: mm(PLUNGE_TURN.workDiameter),
    });
    expect(sixDigits(torque)).toBe(PLUNGE_TURN.torque);
  });

  // evidence: two circles pressed together, their overlap at the chord, no formula of the model
  it('bears on the arc that two overlapping circles share', () => {
    const [a, b] = [PLUNGE_TURN.wheelDiameter / 2, PLUNGE_TURN.workDiameter / 2];
    const depth = 1e-4;
    const apart = a + b - depth;
    const toChord = (apart ** 2 + a ** 2 - b ** 2) / (2 * apart);
    near(contactArc(radius, mm(depth)), Math.sqrt(a ** 2 - toChord ** 2), 1e-4);
  });
});

describe('a traverse', () => {
  const { infeed, feed, lead, fill } = TRAVERSE_LEADING;
  const meanShare = meanWedgeShare('grooves', fill);
  const trail = { ...TRAVERSE_TRAILING, width: mm(8), lead: mm(1), modulus: mpa(205000) };

  // evidence: worked example C4
  it('has the leading force of the worked example', () => {
    const leading = { infeed: mm(infeed), feed: mmPerRev(feed), lead: mm(lead), radius };
    const force = leadingForce({ ...leading, pressure, meanShare });
    expect(sixDigits(meanShare)).toBe(TRAVERSE_LEADING.meanShare);
    expect(sixDigits(force / pressure)).toBe(TRAVERSE_LEADING.area);
    expect(sixDigits(force)).toBe(TRAVERSE_LEADING.force);
  });

  // evidence: worked example C4b
  it('has the following force of the worked example', () => {
    const mean = mpa(TRAILING_PRESSURE * pressure * trail.share);
    expect(sixDigits(mean)).toBe(TRAVERSE_TRAILING.meanPressure);
    const half = hertzHalfWidth(mean, radius, contactModulus(trail.modulus));
    expect(sixDigits(half)).toBe(TRAVERSE_TRAILING.halfWidth);
    expect(sixDigits(trailingForce({ ...trail, pressure, radius }))).toBe(TRAVERSE_TRAILING.force);
  });

  it('is the sum of both, over a lead of the bevel or the feed, whichever is longer', () => {
    const whole = {
      press: 'grooves',
      pressure,
      fill,
      width: mm(8),
      radius,
      infeed: mm(infeed),
      bevel: mm(1),
      modulus: mpa(205000),
    } as const;
    const sum = TRAVERSE_LEADING.force + TRAVERSE_TRAILING.force;
    near(traverseForce({ ...whole, feed: mmPerRev(feed) }).force, sum, 1e-5);
    const square = traverseForce({ ...whole, bevel: mm(0), feed: mmPerRev(0.5) }).force;
    const leading = leadingForce({
      pressure,
      meanShare,
      radius,
      infeed: mm(infeed),
      feed: mmPerRev(0.5),
      lead: mm(0.5),
    });
    const trailing = trailingForce({ ...trail, pressure, radius, lead: mm(0.5) });
    near(square, leading + trailing, 1e-12);
  });

  it('has nothing that follows where the lead is the whole wheel', () => {
    expect(trailingForce({ ...trail, pressure, radius, lead: mm(8) })).toBe(0);
  });
});

describe('the wedge share', () => {
  // evidence: the mean by integration over the infeed, dz = share dH, the share from growth
  it.each(PRESSES)('of %s has the mean that integration gives', (press) => {
    fc.assert(
      fc.property(fraction, (x) => {
        const solid = (u: number) => solidShare(FORM_OF[press], mm(u), mm(1));
        const depth = simpson(solid, 0, x, 400);
        const total = simpson((u) => wedgeShare(press, u) * solid(u), 0, x, 400);
        near(meanWedgeShare(press, x), total / depth, 1e-9);
      }),
    );
  });

  it('of two wheels of a pair is that of one crossed wheel', () => {
    fc.assert(
      fc.property(fraction, (x) => {
        near(2 * wedgeShare('oneOfPair', x), wedgeShare('crossedRaised', x), 1e-12);
      }),
    );
  });

  // evidence: the void share of growth: at the top of the tooth, what is
  // not solid is where the wheel stands in the work
  it.each(['grooves', 'crossedRaised', 'crossedSunk'] as const)(
    'of %s is what the wheel leaves void at the top of the tooth',
    (press) => {
      fc.assert(
        fc.property(fraction, (x) => {
          near(wedgeShare(press, x), 1 - solidShare(FORM_OF[press], mm(x), mm(1)), 1e-12);
        }),
      );
    },
  );

  it.each(PRESSES)('of %s grows with the fill and is nothing at none', (press) => {
    expect(wedgeShare(press, 0)).toBe(0);
    expect(meanWedgeShare(press, 0)).toBe(0);
    fc.assert(
      fc.property(fraction, fraction, (a, b) => {
        fc.pre(b - a > 1e-4);
        expect(wedgeShare(press, a)).toBeLessThan(wedgeShare(press, b));
        expect(meanWedgeShare(press, b)).toBeLessThan(wedgeShare(press, b));
      }),
    );
  });

  it('is that of the wheel: grooves, one of a pair, one crossed wheel', () => {
    expect(pressOf('grooves', false)).toBe('grooves');
    expect(pressOf('raised', true)).toBe('oneOfPair');
    expect(pressOf('raised', false)).toBe('crossedRaised');
    expect(pressOf('sunk', false)).toBe('crossedSunk');
  });
});

describe('pressure', () => {
  const steel = materialById('steel-lowC-CD')!;
  const acetal = materialById('pom')!;

  // evidence: definition of the Brinell number, kgf/mm², and of the kilogram-force
  it('is the Brinell number in MPa where the metal does not harden', () => {
    expect(metalPressure(100, 0)).toBe(980.665);
  });

  it('takes a hardness that was measured before the table’s', () => {
    expect(rollingPressure(steel, null)).toBe(metalPressure(126, 0.1));
    expect(rollingPressure(steel, 252)).toBe(2 * metalPressure(126, 0.1));
  });

  it('is three times yield on plastics, whatever was measured', () => {
    expect(rollingPressure(acetal, null)).toBe(plasticPressure(mpa(72)));
    expect(rollingPressure(acetal, 80)).toBe(216);
  });
});

describe('laws of the force', () => {
  const plunge: Parameters<typeof plungeForce>[0] = {
    press: 'grooves',
    pressure,
    fill: 0.9,
    width: mm(6),
    radius,
    infeed: mm(0.3),
    bite: mm(0.1),
    perTurn: mm(0.02),
  };
  const traverse: Parameters<typeof traverseForce>[0] = {
    press: 'grooves',
    pressure,
    fill: 0.9,
    width: mm(6),
    radius,
    infeed: mm(0.3),
    feed: mmPerRev(0.3),
    bevel: mm(1),
    modulus: mpa(205000),
  };
  const more = fc.double({ min: 1.01, max: 10, noNaN: true });

  it('doubles with width in a plunge', () => {
    const once = plungeForce(plunge).force;
    near(plungeForce({ ...plunge, width: mm(12) }).force, 2 * once, 1e-12);
  });

  it('rises with hardness, width, infeed and wheel', () => {
    const p = (change: Partial<typeof plunge>) => plungeForce({ ...plunge, ...change }).force;
    const t = (change: Partial<typeof traverse>) => traverseForce({ ...traverse, ...change }).force;
    fc.assert(
      fc.property(more, (k) => {
        const raised = { pressure: mpa(k * pressure) };
        for (const change of [raised, { width: mm(k * 6) }, { radius: mm(k * radius) }]) {
          expect(p(change)).toBeGreaterThan(p({}));
          expect(t(change)).toBeGreaterThan(t({}));
        }
        expect(p({ perTurn: mm(k * 0.02) })).toBeGreaterThan(p({}));
        expect(t({ infeed: mm(k * 0.3) })).toBeGreaterThan(t({}));
        expect(t({ feed: mmPerRev(k * 0.3) })).toBeGreaterThan(t({}));
      }),
    );
  });

  it('is at least that of the first bite, and has its arc', () => {
    const { force, arc } = plungeForce({ ...plunge, perTurn: mm(0) });
    expect(arc).toBe(contactArc(radius, mm(0.1)));
    near(force, pressure * 0.2 * 6 * arc, 1e-12);
  });

  it('bites no deeper than the whole infeed', () => {
    const { arc } = plungeForce({ ...plunge, fill: 0.1, infeed: mm(0.05), perTurn: mm(0) });
    expect(arc).toBe(contactArc(radius, mm(0.05)));
  });

  it('is known to a factor of 2', () => {
    expect(forceBand(newton(3000))).toEqual({ low: 1500, expected: 3000, high: 6000 });
  });
});

describe('torque and power', () => {
  // evidence: the force runs through the wheel's axis and the middle of the arc; its lever about
  // the work's axis by plane geometry
  it('has the lever of a line through the wheel’s axis', () => {
    const [wheel, work, arc] = [10, 12.5, 0.4];
    const between = wheel + work;
    const lever = between * Math.sin(Math.atan2(arc / 2, wheel));
    const torque = wheelTorque({
      force: newton(1000),
      arc: mm(arc),
      wheelDiameter: mm(2 * wheel),
      workDiameter: mm(2 * work),
    });
    near(torque, 1000 * lever, 1e-3);
  });

  it('turns N·mm and rev/min into watts', () => {
    near(drivePower(newtonMm(1000), revPerMin(60 / (2 * Math.PI))), 1, 1e-12);
  });

  it('stops only where half the force is still too much', () => {
    const at = (torque: number, power: number | null) =>
      capacityCheck({
        torque: newtonMm(torque),
        power: power === null ? null : watt(power),
        torqueLimit: newtonMm(1000),
        powerLimit: watt(100),
      });
    expect(at(1000, 100)).toMatchObject({ state: 'fine', reason: 'within' });
    expect(at(1500, 50)).toMatchObject({ state: 'watch', reason: 'overTorque' });
    expect(at(2001, 50)).toMatchObject({ state: 'stop', reason: 'overTorque' });
    expect(at(500, 150)).toMatchObject({ state: 'watch', reason: 'overPower' });
    expect(at(1500, 201)).toMatchObject({ state: 'stop', reason: 'overPower' });
    expect(at(1000, null).state).toBe('fine');
  });

  // evidence: Machinery's Handbook, 31st edition, p. 1059: a knurl no wider than the blank
  it('watches a knurl wider than the blank is thick', () => {
    expect(widthCheck(mm(25), mm(25)).state).toBe('fine');
    expect(widthCheck(mm(25.1), mm(25)).state).toBe('watch');
  });
});

describe('senseless arguments', () => {
  it.each<[string, () => unknown]>([
    ['no hardness', () => metalPressure(0, 0.1)],
    ['an exponent over 1', () => metalPressure(100, 1.5)],
    ['a plastic without yield', () => plasticPressure(mpa(0))],
    ['a fill over 1', () => wedgeShare('grooves', 1.1)],
    ['a negative fill', () => meanWedgeShare('grooves', -0.1)],
    ['no wheel', () => equivalentRadius(mm(0), mm(25))],
    ['a negative infeed', () => contactArc(mm(5), mm(-0.1))],
    ['no modulus', () => contactModulus(mpa(0))],
    ['a pressure that is no number', () => hertzHalfWidth(mpa(Number.NaN), mm(5), mpa(1e5))],
    ['no width', () => pressedForce({ pressure, share: 0.5, width: mm(0), arc: mm(1) })],
    ['a negative force', () => forceBand(newton(-1))],
    ['a negative torque', () => drivePower(newtonMm(-1), revPerMin(100))],
  ])('refuse %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });

  it('do not compile when their unit is another', () => {
    // @ts-expect-error a width is no pressure
    expect(plasticPressure(mm(72))).toBe(216);
    // @ts-expect-error a torque is no force
    expect(forceBand(newtonMm(2)).low).toBe(1);
  });
});
