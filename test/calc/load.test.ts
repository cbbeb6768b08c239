import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bentInChuck, secondMoment } from '../../src/calc/bending/index.ts';
import type { CheckName } from '../../src/calc/check.ts';
import { CUT_RADIAL_SHARE, CUTTING_STIFFNESS, cutKnurl } from '../../src/calc/cut.ts';
import { equivalentRadius, metalPressure, wedgeShare } from '../../src/calc/force/index.ts';
import { materialById } from '../../src/calc/materials/index.ts';
import {
  DEFAULT_WHEEL,
  type SetupFigureName,
  type SetupRequest,
  setUp,
} from '../../src/calc/setup/index.ts';
import { inch, mm, mmPerRev, newton, newtonMm, OutOfRange, watt } from '../../src/calc/units.ts';
import { near } from '../support/near.ts';
import { requestOf } from '../support/setupRequest.ts';

const work = (said: Partial<SetupRequest> = {}) => setUp(requestOf(said));
const value = (said: Partial<SetupRequest>, name: SetupFigureName) =>
  work(said).figures[name]?.value ?? null;
const checkOf = (said: Partial<SetupRequest>, name: CheckName) =>
  work(said).checks.find((check) => check.name === name);
const diamond = { kind: 'diamond', points: 'raised' } as const;
const machine = { speeds: null, feeds: null, topSpeed: null, torque: null, power: null };

describe('an ordinary set-up with no stickout said', () => {
  const plain = work();

  it('has force, torque, power and pin, and nothing of bending, tube or machine', () => {
    const absent = ['deflection', 'bendingStress', 'ringStress', 'ringClosing'] as const;
    for (const name of absent) expect(plain.figures[name]).toBeNull();
    const there = ['radialForce', 'torque', 'power', 'pinHeatIndex', 'pinPressure'] as const;
    for (const name of there) expect(plain.figures[name]?.value).toBeGreaterThan(0);
    const names = plain.checks.map((check) => check.name);
    expect(names).toEqual(expect.arrayContaining(['pinHeat', 'pinPressure', 'width']));
    for (const name of ['bending', 'stickout', 'ring', 'capacity'] as const)
      expect(names).not.toContain(name);
    expect(plain.remedies).toEqual([]);
  });

  // evidence: by hand from the card's own figures: q φ b √(2 Req dz)
  it('has the force that its infeed a turn gives', () => {
    const { blankDiameter, infeedPerTurn, fill } = plain.figures;
    const radius = equivalentRadius(mm(20), mm(blankDiameter!.value));
    const arc = Math.sqrt(2 * radius * infeedPerTurn!.value);
    const share = wedgeShare('grooves', fill!.value);
    near(plain.figures.radialForce!.value, metalPressure(126, 0.1) * share * 6 * arc, 1e-12);
  });

  it('knows the force to a factor of 2', () => {
    const { radialForce, radialForceLow, radialForceHigh } = plain.figures;
    near(radialForceLow!.value, radialForce!.value / 2, 1e-12);
    near(radialForceHigh!.value, 2 * radialForce!.value, 1e-12);
  });

  it('turns the wheel as fast as its rim rolls', () => {
    const { wheelSpeed, spindleSpeed, blankDiameter } = plain.figures;
    near(wheelSpeed!.value, (spindleSpeed!.value * blankDiameter!.value) / 20, 1e-12);
  });
});

describe('wheels and sides', () => {
  const bent = { pattern: diamond, stickout: mm(50) };

  it('a diamond pushes with two wheels from one side, one crossed wheel with both families', () => {
    const pair = work(bent);
    const one = work({ ...bent, onePiece: true });
    expect(pair.load).toMatchObject({ wheelsOneSide: 2, wheels: 2 });
    expect(one.load).toMatchObject({ wheelsOneSide: 1, wheels: 1 });
    expect(pair.load.sideForce).toBe(2 * pair.load.radialForce);
    near(one.load.radialForce, pair.load.sideForce, 1e-12);
  });

  it('the bar is bent by all the wheels of its side', () => {
    const { figures, load } = work(bent);
    const beam = {
      force: newton(2 * figures.radialForce!.value),
      reach: mm(50 - 3),
      modulus: materialById('steel-lowC-CD')!.modulus.value,
      secondMoment: secondMoment(mm(figures.blankDiameter!.value), null),
    };
    near(figures.deflection!.value, bentInChuck(beam).deflection, 1e-12);
    near(load.bent!.deflection, figures.deflection!.value, 1e-12);
  });

  it('opposed wheels bend nothing and pinch a tube with one wheel a side', () => {
    const tube = { ...bent, stock: mm(40), bore: mm(30) };
    const opposed = work({ ...tube, layout: 'opposed' });
    expect(opposed.figures.deflection).toBeNull();
    expect(opposed.checks.find(({ name }) => name === 'bending')?.reason).toBe('opposed');
    near(opposed.figures.ringClosing!.value, value(tube, 'ringClosing')! / 2, 1e-12);
  });

  it('torque is that of all the wheels, and power follows the speed', () => {
    const { torque, power, spindleSpeed } = work(bent).figures;
    near(power!.value, (torque!.value * 2 * Math.PI * spindleSpeed!.value) / 60_000, 1e-12);
    const opposed = work({ layout: 'opposed' }).figures.torque!.value;
    near(opposed, 2 * work().figures.torque!.value, 1e-12);
  });
});

describe('the limits of give', () => {
  it('are a tenth of the infeed for a bar and of the tooth for a tube', () => {
    const said = { stock: mm(40), bore: mm(34), stickout: mm(50) };
    const { infeed, toothHeight } = work(said).figures;
    const bending = checkOf(said, 'bending')!.figures;
    near(bending['differenceFineTo']!.value, 0.1 * infeed!.value, 1e-12);
    const ring = checkOf(said, 'ring')!.figures;
    near(ring['closingFineTo']!.value, 0.1 * toothHeight!.value, 1e-12);
  });

  // evidence: by hand, a ring as wide as 6 + 3 √(R t) between bore and groove root
  it('hold for the wall that is left under the groove root', () => {
    const { figures, checks } = work({ stock: mm(40), bore: mm(34) });
    const root = figures.blankDiameter!.value / 2 - figures.infeed!.value;
    const [t, R] = [root - 17, (root + 17) / 2];
    const width = 6 + 3 * Math.sqrt(R * t);
    const I = (width * t ** 3) / 12;
    const closing = (0.148779 * figures.radialForce!.value * R ** 3) / (205000 * I);
    near(figures.ringClosing!.value, closing, 1e-5);
    const ring = checks.find(({ name }) => name === 'ring')!;
    near(ring.figures['wallOverRadius']!.value, t / R, 1e-12);
  });
});

describe('a cut knurl', () => {
  const said = { process: 'cut', length: mm(20), stickout: mm(40) } as const;

  it('pushes with half its cutting force, far less than a formed one', () => {
    const { figures } = work(said);
    const cut = cutKnurl({
      form: 'grooves',
      blankDiameter: mm(figures.blankDiameter!.value),
      p: mm(figures.pitch!.value),
      included: requestOf().included,
      height: mm(figures.toothHeight!.value),
      feed: mmPerRev(figures.feed!.value),
      cuttingStiffness: CUTTING_STIFFNESS.value.steel,
    });
    near(figures.radialForce!.value, CUT_RADIAL_SHARE * cut.tangentialForce, 1e-12);
    const turned = (cut.tangentialForce * figures.blankDiameter!.value) / 2;
    near(figures.torque!.value, turned, 1e-12);
    expect(figures.radialForce!.value * 5).toBeLessThan(work().figures.radialForce!.value);
  });

  it('of unknown length says nothing of its width', () => {
    expect(checkOf({ process: 'cut' }, 'width')).toBeUndefined();
    expect(checkOf({ process: 'cut', stickout: mm(40) }, 'bending')?.state).toBe('fine');
  });
});

describe('what is measured or asked replaces what is assumed', () => {
  it('a hardness moves force, and only force, in proportion', () => {
    near(value({ hardness: 252 }, 'radialForce')!, 2 * value({}, 'radialForce')!, 1e-12);
  });

  it('a pin of its own diameter replaces the bore', () => {
    near(value({ pinDiameter: mm(3) }, 'pinPressure')!, 2 * value({}, 'pinPressure')!, 1e-12);
  });

  it('warms the wheel by the cut of one part, however many there are', () => {
    expect(value({ batch: 50 }, 'wheelWarmUp')).toBe(value({}, 'wheelWarmUp'));
  });

  it('a plastic that is formed all the same is pressed at three times yield', () => {
    const said = { material: materialById('pom')!, process: 'form' } as const;
    expect(value(said, 'radialForce')).toBeGreaterThan(0);
    for (const name of ['power', 'wheelSpeed', 'pinHeatIndex', 'wheelWarmUp'] as const)
      expect(value(said, name)).toBeNull();
    expect(checkOf(said, 'pinHeat')).toBeUndefined();
  });

  it('a plug carries the wall, and a bore of nothing is a solid bar', () => {
    expect(checkOf({ bore: mm(20), plug: true }, 'ring')?.reason).toBe('plugged');
    expect(value({ bore: mm(20), plug: true }, 'ringStress')).toBeNull();
    expect(checkOf({ bore: mm(0) }, 'ring')).toBeUndefined();
  });

  it('the machine is judged by what is known of it', () => {
    expect(checkOf({ machine }, 'capacity')).toBeUndefined();
    const weak = { machine: { ...machine, torque: newtonMm(1000) } };
    expect(checkOf(weak, 'capacity')).toMatchObject({ state: 'watch', reason: 'overTorque' });
    const strong = { machine: { ...machine, power: watt(3000) } };
    expect(checkOf(strong, 'capacity')?.state).toBe('fine');
  });
});

describe('laws of the whole set-up', () => {
  const force = (said: Partial<SetupRequest>) => value(said, 'radialForce')!;

  it('force rises with width, hardness and infeed', () => {
    const width = fc.double({ min: 1, max: 5.9, noNaN: true });
    const hardness = fc.double({ min: 60, max: 240, noNaN: true });
    const fill = fc.double({ min: 0.5, max: 0.95, noNaN: true });
    fc.assert(
      fc.property(width, hardness, fill, (w, hb, x) => {
        const said = { length: mm(w), hardness: hb, fill: x };
        expect(force({ ...said, length: mm(w * 1.01) })).toBeGreaterThan(force(said));
        expect(force({ ...said, hardness: hb * 1.01 })).toBeGreaterThan(force(said));
        expect(force({ ...said, fill: x + 0.01 })).toBeGreaterThanOrEqual(force(said));
        expect(force({ ...said, length: mm(20), fill: x + 0.01 })).toBeGreaterThan(
          force({ ...said, length: mm(20) }),
        );
      }),
    );
  });

  it('deflection rises with the cube of the reach', () => {
    const out = fc.double({ min: 20, max: 100, noNaN: true });
    fc.assert(
      fc.property(out, (stickout) => {
        const at = (reach: number) => value({ stickout: mm(reach + 3) }, 'deflection')!;
        near(at(2 * stickout), 8 * at(stickout), 1e-9);
      }),
    );
  });

  it('is the same in inches and in millimetres', () => {
    const inches = work({ stock: inch(0.5), stickout: inch(2), bore: inch(0.25) });
    const metric = work({ stock: mm(12.7), stickout: mm(50.8), bore: mm(6.35) });
    expect(inches.checks).toEqual(metric.checks);
  });
});

describe('cautions', () => {
  const cautions = (said: Partial<SetupRequest>) => work(said).cautions;

  it('ask for support where bending is not fine', () => {
    expect(cautions({ stickout: mm(40) })).not.toContain('supportBar');
    expect(cautions({ stickout: mm(30), stock: mm(10) })).toEqual(
      expect.arrayContaining(['supportBar', 'forceUncertain']),
    );
  });

  it('say that the force is uncertain where a tube is not fine, and not on a plug', () => {
    expect(cautions({ bore: mm(22) })).toContain('forceUncertain');
    expect(cautions({ bore: mm(22), plug: true })).not.toContain('forceUncertain');
  });

  it('call the pin hot where it is, or where the wheel warms', () => {
    expect(cautions({})).not.toContain('hotPin');
    expect(cautions({ stock: inch(8) })).toContain('hotPin');
  });
});

describe('senseless input names both values', () => {
  const refused = (said: Partial<SetupRequest>) => {
    try {
      work(said);
    } catch (error) {
      if (error instanceof OutOfRange) return error;
      throw error;
    }
    throw new Error('it was not refused');
  };

  it('a bore larger than the bar, or than the blank it is turned to', () => {
    const { diameter } = work().blank;
    expect(refused({ bore: mm(26) })).toMatchObject({ what: 'bore', value: 26, max: inch(1) });
    expect(refused({ bore: mm(25.2) })).toMatchObject({ what: 'bore', value: 25.2, max: diameter });
  });

  it('a wall under the groove root thinner than the tooth', () => {
    const { tooth } = work().blank;
    const fault = refused({ bore: mm(24) });
    expect(fault).toMatchObject({ what: 'wall', min: tooth.height });
    near(fault.value, 25.0252 / 2 - tooth.infeed - 12, 1e-3);
  });

  it('a stickout shorter than the knurl', () => {
    const fault = refused({ length: mm(30), stickout: mm(25) });
    expect(fault).toMatchObject({ what: 'stickout', value: 25, min: 30 });
    expect(refused({ stickout: mm(5) })).toMatchObject({ what: 'stickout', min: 6 });
    expect(work({ length: mm(30), stickout: mm(30) }).figures.deflection).not.toBeNull();
  });

  it('a stickout longer than the bar', () => {
    const fault = refused({ stickout: mm(200), stockLength: mm(150) });
    expect(fault).toMatchObject({ what: 'stickout', value: 200, max: 150 });
  });

  it('a pin larger than the wheel', () => {
    expect(refused({ pinDiameter: mm(21) })).toMatchObject({ value: 21, max: 18 });
    // A pin as large as its wheel once left no wheel to warm and gave an endless warm-up.
    expect(refused({ pinDiameter: mm(20) })).toMatchObject({ value: 20, max: 18 });
    expect(DEFAULT_WHEEL.diameter).toBe(20);
  });
});
