import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  bendingCheck,
  bentBetweenCentres,
  bentByTailstock,
  bentInChuck,
  bentWork,
  giveState,
  REACH_TO_CENTRE,
  type Support,
  secondMoment,
  sectionModulus,
  stickoutCheck,
  stressState,
} from '../../src/calc/bending/index.ts';
import { type Mm, mm, mpa, newton, OutOfRange } from '../../src/calc/units.ts';
import { BENT_BAR } from '../reference/force.ts';
import { sixDigits } from '../support/digits.ts';
import { near } from '../support/near.ts';
import { simpson } from '../support/simpson.ts';

const inertia = secondMoment(mm(BENT_BAR.diameter), null);
const bar = {
  force: newton(BENT_BAR.force),
  reach: mm(BENT_BAR.reach),
  modulus: mpa(BENT_BAR.modulus),
  secondMoment: inertia,
};
const span = mm(BENT_BAR.span);
const SUPPORTS: readonly Support[] = ['chuck', 'tailstock', 'centres'];

describe('a bent bar', () => {
  // evidence: worked example C6
  it('gives in the chuck as in the worked example', () => {
    const { deflection, moment } = bentInChuck(bar);
    expect(sixDigits(inertia)).toBe(BENT_BAR.secondMoment);
    expect(sixDigits(deflection)).toBe(BENT_BAR.chuck.deflection);
    expect(sixDigits(moment / sectionModulus(mm(12), null))).toBe(BENT_BAR.chuck.stress);
  });

  // evidence: worked example C7; in the middle also 7 F L³/(768 E I), as handbooks print it
  it('gives with a tailstock as in the worked example', () => {
    const { deflection, moment } = bentByTailstock({ ...bar, span });
    expect(sixDigits(deflection)).toBe(BENT_BAR.tailstock.deflection);
    expect(sixDigits(moment)).toBe(BENT_BAR.tailstock.moment);
    near(deflection, (7 * 2000 * 80 ** 3) / (768 * 205000 * inertia), 1e-12);
  });

  // evidence: worked example C9
  it('gives between centres as in the worked example', () => {
    expect(sixDigits(bentBetweenCentres({ ...bar, span }).deflection)).toBe(
      BENT_BAR.centres.deflection,
    );
  });

  it('stands as stiff as its section, integrated over the area', () => {
    const [outside, inside] = [15, 9];
    const radial = simpson((r) => r ** 3, inside / 2, outside / 2, 2);
    const round = simpson((angle) => Math.sin(angle) ** 2, 0, 2 * Math.PI, 64);
    near(secondMoment(mm(outside), mm(inside)), radial * round, 1e-12);
    near(sectionModulus(mm(outside), null), (Math.PI * outside ** 3) / 32, 1e-12);
  });
});

/**
 * The same bars by least work: with the moment M(x) of a force F, the work stored is ∫M²/(2EI) dx
 * and the force moves by twice that over F. A prop takes the force that makes the work least.
 */
const leastWork = (support: Support, a: number, L: number) => {
  const stiffness = bar.modulus * inertia;
  const pieces = (curve: (x: number) => number) =>
    simpson(curve, 0, a, 40) + simpson(curve, a, support === 'chuck' ? a : L, 40);
  const hanging = (x: number) => bar.force * Math.max(0, a - x);
  const held = (x: number) => L - x;
  const prop = pieces((x) => hanging(x) * held(x)) / pieces((x) => held(x) ** 2);
  const moments: Record<Support, (x: number) => number> = {
    chuck: hanging,
    tailstock: (x) => hanging(x) - prop * held(x),
    centres: (x) => (bar.force * (x < a ? x * (L - a) : a * (L - x))) / L,
  };
  const moment = moments[support];
  return {
    deflection: pieces((x) => moment(x) ** 2) / (stiffness * bar.force),
    moment: Math.max(Math.abs(moment(0)), Math.abs(moment(a))),
    // Slope under the force: ∫M/(EI) dx from the chuck, where it is nothing.
    slope: simpson(moment, 0, a, 40) / stiffness,
  };
};

const bentBy = (support: Support, a: Mm, L: Mm) => {
  const at = { ...bar, reach: a };
  switch (support) {
    case 'chuck':
      return bentInChuck(at);
    case 'tailstock':
      return bentByTailstock({ ...at, span: L });
    case 'centres':
      return bentBetweenCentres({ ...at, span: L });
  }
};

describe('the handbook formulas', () => {
  const share = fc.double({ min: 0.02, max: 0.98, noNaN: true });

  // evidence: Castigliano, integrated numerically
  it.each(SUPPORTS)('agree with least work, %s', (support) => {
    fc.assert(
      fc.property(share, fc.double({ min: 10, max: 500, noNaN: true }), (part, length) => {
        const [a, L] = [part * length, length];
        const work = leastWork(support, a, L);
        const bent = bentBy(support, mm(a), mm(L));
        near(bent.deflection, work.deflection, 1e-9);
        near(bent.moment, work.moment, 1e-9);
      }),
    );
  });

  it('let the deflection grow with the cube of the length', () => {
    const scale = fc.double({ min: 0.1, max: 10, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom(...SUPPORTS), share, scale, (support, part, k) => {
        const once = bentBy(support, mm(part * 80), mm(80)).deflection;
        near(bentBy(support, mm(k * part * 80), mm(k * 80)).deflection, k ** 3 * once, 1e-9);
      }),
    );
  });

  it('hold a bar by a tailstock stiffer than between centres, and that than by the chuck alone', () => {
    fc.assert(
      fc.property(share, (part) => {
        const [a, L] = [mm(part * 80), mm(80)];
        const [chuck, tailstock, centres] = SUPPORTS.map((s) => bentBy(s, a, L).deflection);
        expect(tailstock).toBeLessThan(chuck!);
        expect(tailstock).toBeLessThan(centres!);
      }),
    );
  });
});

describe('work under the wheels', () => {
  const held = {
    force: newton(1500),
    modulus: mpa(205000),
    diameter: mm(12),
    bore: null,
    width: mm(20),
    stickout: mm(50),
  } as const;

  it('is loaded in the middle of a plunge', () => {
    const bent = bentWork({ ...held, support: 'chuck', travel: 'plunge' });
    const beam = bentInChuck({ ...bar, force: newton(1500), reach: mm(40) });
    expect(bent.deflection).toBe(beam.deflection);
    near(bent.stress, (1500 * 40 * 32) / (Math.PI * 12 ** 3), 1e-12);
  });

  // evidence: slope of the bent bar under the force, integrated, times the width of the knurl
  it('stands at a slope in a plunge, as far as the bar hangs free', () => {
    const bent = bentWork({ ...held, support: 'chuck', travel: 'plunge' });
    near(bent.depthDifference, ((leastWork('chuck', 40, 40).slope * 1500) / 2000) * 20, 1e-9);
    for (const support of ['tailstock', 'centres'] as const)
      expect(bentWork({ ...held, support, travel: 'plunge' }).depthDifference).toBe(0);
  });

  // evidence: the wheel moved along in 4000 small steps
  it.each(SUPPORTS)('is worst at the place a walk along the knurl finds, %s', (support) => {
    const out = fc.double({ min: 20, max: 300, noNaN: true });
    fc.assert(
      fc.property(out, fraction(), (stickout, part) => {
        const width = part * stickout;
        const L = mm(stickout + REACH_TO_CENTRE);
        const steps = Array.from({ length: 4001 }, (_, i) => stickout - width + (i * width) / 4000);
        const walked = steps.map((a) => bentBy(support, mm(a), L));
        const deflections = walked.map(({ deflection }) => (deflection * 1500) / 2000);
        const most = Math.max(...deflections);
        const bent = bentWork({
          ...held,
          support,
          travel: 'traverse',
          stickout: mm(stickout),
          width: mm(width),
        });
        near(bent.deflection, most, 1e-5);
        expect(Math.abs(bent.depthDifference - (most - Math.min(...deflections)))).toBeLessThan(
          1e-5 * most,
        );
        const moment = Math.max(...walked.map((bend) => (bend.moment * 1500) / 2000));
        near(bent.stress * sectionModulus(mm(12), null), moment, 1e-5);
      }),
      { numRuns: 30 },
    );
  });

  it('bends more with a bore', () => {
    const solid = bentWork({ ...held, support: 'chuck', travel: 'traverse' });
    const hollow = bentWork({ ...held, support: 'chuck', travel: 'traverse', bore: mm(9) });
    near(hollow.deflection, solid.deflection / (1 - 0.75 ** 4), 1e-12);
    near(hollow.stress, solid.stress / (1 - 0.75 ** 4), 1e-12);
  });
});

const fraction = () => fc.double({ min: 0.05, max: 1, noNaN: true });

describe('the check of bending', () => {
  const at = (stress: number, difference: number) =>
    bendingCheck({
      bent: { stress: mpa(stress), depthDifference: mm(difference), deflection: mm(1) },
      yieldStrength: mpa(300),
      infeed: mm(0.2),
    });

  it('is fine to yield/1.5 and 10 %, and stops where the low force passes yield or 30 %', () => {
    expect(at(200, 0.02)).toMatchObject({ state: 'fine', reason: 'holds' });
    expect(at(201, 0.02)).toMatchObject({ state: 'watch', reason: 'staysBent' });
    expect(at(600, 0.02)).toMatchObject({ state: 'watch', reason: 'staysBent' });
    expect(at(601, 0.02)).toMatchObject({ state: 'stop', reason: 'staysBent' });
    expect(at(200, 0.021)).toMatchObject({ state: 'watch', reason: 'pushedAway' });
    expect(at(300, 0.121)).toMatchObject({ state: 'stop', reason: 'pushedAway' });
    expect(stressState(mpa(601), mpa(300))).toBe('stop');
    expect(giveState(mm(0.119), mm(0.2))).toBe('watch');
  });

  it('has nothing to say of opposed wheels', () => {
    const check = bendingCheck({ bent: null, yieldStrength: mpa(300), infeed: mm(0.2) });
    expect(check).toMatchObject({ state: 'fine', reason: 'opposed' });
  });

  // evidence: common practice, three diameters
  it('watches a free end of more than three diameters', () => {
    const at = (out: number, support: Support, layout: 'oneSided' | 'opposed' = 'oneSided') =>
      stickoutCheck({ stickout: mm(out), diameter: mm(10), support, layout }).reason;
    expect(at(30, 'chuck')).toBe('short');
    expect(at(31, 'chuck')).toBe('long');
    expect(at(31, 'tailstock')).toBe('supported');
    expect(at(31, 'centres')).toBe('supported');
    expect(at(31, 'chuck', 'opposed')).toBe('opposed');
  });
});

describe('senseless arguments', () => {
  it.each<[string, () => unknown]>([
    ['a bore over the diameter', () => secondMoment(mm(10), mm(11))],
    ['no diameter', () => sectionModulus(mm(0), null)],
    ['a negative reach', () => bentInChuck({ ...bar, reach: mm(-1) })],
    ['a force past the tailstock', () => bentByTailstock({ ...bar, span: mm(30) })],
    ['a force past the centre', () => bentBetweenCentres({ ...bar, span: mm(30) })],
    ['a bar without stiffness', () => bentInChuck({ ...bar, secondMoment: 0 })],
  ])('refuse %s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });
});
