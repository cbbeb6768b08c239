import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formedRound } from '../../src/calc/growth/index.ts';
import {
  type GrowthResult,
  growthBeforeResults,
  growthBelief,
  growthFamily,
  growthFromTallies,
  growthInterval,
  isDoubted,
  measuredGrowthShare,
  siftResults,
  tallyGrowth,
} from '../../src/calc/shopGrowth.ts';
import { mm, OutOfRange } from '../../src/calc/units.ts';
import { mulberry32, normalFrom, oneOf } from '../support/random.ts';
import { solve } from '../support/solve.ts';

// evidence: section of the model: priors N(0.95, 0.08²) and N(0, 0.04²), parts 0.05; written again
const [MEAN, SHOP, FAMILY, PART] = [0.95, 0.08, 0.04, 0.05];

const seen = (family: string, ...shares: number[]): GrowthResult[] =>
  shares.map((share) => ({ family, share, confirmed: false }));

describe('before any result', () => {
  // evidence: √(0.08² + 0.04² + 0.05²) = 0.1025, 80 % interval 0.819 to 1.081
  it('expects 0.95, between 0.819 and 1.081 in four parts of five', () => {
    const belief = growthBelief([], 'straight × steel');
    expect(belief.mean).toBeCloseTo(growthBeforeResults().mean, 12);
    expect(belief.sd).toBeCloseTo(growthBeforeResults().sd, 12);
    expect(belief.sd.toFixed(4)).toBe('0.1025');
    const { low, high } = growthInterval(belief);
    expect([low.toFixed(3), high.toFixed(3)]).toEqual(['0.819', '1.081']);
    expect(belief).toMatchObject({ results: 0, ofFamily: 0, doubted: 0 });
  });
});

/** The next part given all results, straight from the covariance of parts: no effect is estimated. */
const byCovariance = (results: readonly GrowthResult[], family: string) => {
  const together = (a: string, b: string) => SHOP ** 2 + (a === b ? FAMILY ** 2 : 0);
  const matrix = results.map((a, i) =>
    results.map((b, j) => together(a.family, b.family) + (i === j ? PART ** 2 : 0)),
  );
  const towards = results.map((a) => together(a.family, family));
  const weights = solve(matrix, towards);
  const mean = MEAN + results.reduce((sum, { share }, i) => sum + weights[i]! * (share - MEAN), 0);
  const known = towards.reduce((sum, t, i) => sum + t * weights[i]!, 0);
  return { mean, sd: Math.sqrt(SHOP ** 2 + FAMILY ** 2 + PART ** 2 - known) };
};

/** Mean and spread of μ + φ_a by adding up prior times likelihood over a grid of (μ, φ_a, φ_b). */
const byGrid = (a: readonly number[], b: readonly number[]) => {
  const grid = (middle: number, sd: number) =>
    Array.from({ length: 81 }, (_, i) => middle + (sd * 6 * (i - 40)) / 40);
  const bell = (x: number, middle: number, sd: number) => Math.exp(-(((x - middle) / sd) ** 2) / 2);
  const fits = (parts: readonly number[], at: number) =>
    parts.reduce((product, g) => product * bell(g, at, PART), 1);
  let [weight, sum, squares] = [0, 0, 0];
  for (const mu of grid(MEAN, SHOP))
    for (const phiA of grid(0, FAMILY)) {
      const left = bell(mu, MEAN, SHOP) * bell(phiA, 0, FAMILY) * fits(a, mu + phiA);
      let right = 0;
      for (const phiB of grid(0, FAMILY)) right += bell(phiB, 0, FAMILY) * fits(b, mu + phiB);
      weight += left * right;
      sum += left * right * (mu + phiA);
      squares += left * right * (mu + phiA) ** 2;
    }
  const mean = sum / weight;
  return { mean, sd: Math.sqrt(squares / weight - mean ** 2 + PART ** 2) };
};

describe('after results', () => {
  it('agrees with the posterior added up over a grid', () => {
    const [a, b] = [
      [0.9, 0.97, 0.93],
      [0.84, 0.88],
    ];
    const results = [...seen('a', ...a), ...seen('b', ...b)];
    const grid = byGrid(a, b);
    const belief = growthBelief(results, 'a');
    expect(belief.mean).toBeCloseTo(grid.mean, 8);
    expect(belief.sd).toBeCloseTo(grid.sd, 8);
  });

  it('agrees with the dense solve over the covariance of the parts themselves', () => {
    const families = fc.constantFrom('a', 'b', 'c', 'd');
    const share = fc.double({ min: 0.8, max: 1.1, noNaN: true });
    const results = fc.array(fc.record({ family: families, share, confirmed: fc.constant(true) }), {
      maxLength: 30,
    });
    fc.assert(
      fc.property(results, families, (list, family) => {
        const belief = growthBelief(list, family);
        const dense = byCovariance(list, family);
        expect(belief.mean).toBeCloseTo(dense.mean, 9);
        expect(belief.sd).toBeCloseTo(dense.sd, 9);
      }),
    );
  });

  it('counts what stands behind it', () => {
    const results = [...seen('a', 0.9, 0.95), ...seen('b', 0.93)];
    expect(growthBelief(results, 'a')).toMatchObject({ results: 3, ofFamily: 2, doubted: 0 });
    expect(growthBelief(results, 'new')).toMatchObject({ results: 3, ofFamily: 0 });
  });

  it('moves a family that was never seen less than the one that was', () => {
    const results = seen('a', 0.85, 0.86, 0.84, 0.85);
    const own = growthBelief(results, 'a').mean;
    const other = growthBelief(results, 'b').mean;
    expect(own).toBeLessThan(other);
    expect(other).toBeLessThan(MEAN);
  });

  it('comes to the mean of a family as its parts add up, and never surer than a part varies', () => {
    const belief = growthBelief(seen('a', ...new Array<number>(2000).fill(0.9)), 'a');
    expect(belief.mean).toBeCloseTo(0.9, 3);
    expect(belief.sd).toBeGreaterThan(PART);
    expect(belief.sd).toBeLessThan(1.001 * PART);
  });
});

describe('a thousand shops drawn from the model', () => {
  it('see the next part inside the 80 % interval in 77 to 83 % of them', () => {
    const random = mulberry32(9);
    const normal = () => normalFrom(random);
    const names = ['a', 'b', 'c', 'd'] as const;
    let inside = 0;
    for (let shop = 0; shop < 1000; shop++) {
      const mu = MEAN + SHOP * normal();
      const effect = { a: 0, b: 0, c: 0, d: 0 };
      for (const name of names) effect[name] = FAMILY * normal();
      const part = (name: (typeof names)[number]) => mu + effect[name] + PART * normal();
      const results = Array.from({ length: 30 }, () => {
        const family = oneOf(random, names);
        return { family, share: part(family), confirmed: false };
      });
      const next = oneOf(random, names);
      const { low, high } = growthInterval(growthBelief(results, next));
      const share = part(next);
      if (share >= low && share <= high) inside += 1;
    }
    expect(inside).toBeGreaterThanOrEqual(770);
    expect(inside).toBeLessThanOrEqual(830);
  });
});

describe('a gross outlier', () => {
  const good = [...seen('a', 0.93, 0.96, 0.9, 0.94), ...seen('b', 0.88, 0.9)];
  const gross = { family: 'a', share: 1.9, confirmed: false };

  it('moves nothing until someone confirms it', () => {
    for (const family of ['a', 'b', 'c']) {
      const without = growthBelief(good, family);
      const kept = growthBelief([...good, gross], family);
      expect(kept).toEqual({ ...without, doubted: 1 });
      const confirmed = growthBelief([...good, { ...gross, confirmed: true }], family);
      expect(confirmed.mean).toBeGreaterThan(without.mean);
      expect(confirmed).toMatchObject({ results: 7, doubted: 0 });
    }
  });

  it('does not keep the results after it from being learned', () => {
    const after = seen('a', 0.95, 0.92);
    const withIt = growthBelief([...good, gross, ...after], 'a');
    expect(withIt).toEqual({ ...growthBelief([...good, ...after], 'a'), doubted: 1 });
  });

  it('stands apart as it is, wherever it came', () => {
    for (let place = 0; place <= good.length; place++) {
      const results = [...good.slice(0, place), gross, ...good.slice(place)];
      expect(siftResults(results)).toEqual({ learned: good, doubted: [gross] });
    }
  });

  it('begins beyond three standard deviations of the part that was expected', () => {
    const { mean, sd } = growthBelief(good, 'a');
    const at = (z: number) => siftResults([...good, ...seen('a', mean + z * sd)]).doubted.length;
    expect([at(2.999), at(3.001), at(-2.999), at(-3.001)]).toEqual([0, 1, 0, 1]);
  });
});

describe('what the results add up to', () => {
  it('says the same as all of them, to the last digit', () => {
    const families = ['a', 'b', 'c', 'never seen'];
    const share = fc.oneof(fc.double({ min: 0.7, max: 1.2, noNaN: true }), fc.constant(1.9));
    const one = fc.record({
      family: fc.constantFrom('a', 'b', 'c'),
      share,
      confirmed: fc.boolean(),
    });
    fc.assert(
      fc.property(fc.array(one, { maxLength: 40 }), (results) => {
        const waiting = siftResults(results).doubted.length;
        for (const family of families)
          expect(growthFromTallies(tallyGrowth(results), family, waiting)).toEqual(
            growthBelief(results, family),
          );
      }),
    );
  });

  it('doubts the next one where the sieve does', () => {
    const known = seen('a', 0.93, 0.96, 0.9);
    const shares = fc.double({ min: 0.5, max: 1.5, noNaN: true });
    fc.assert(
      fc.property(shares, (share) => {
        const isOdd = siftResults([...known, ...seen('a', share)]).doubted.length === 1;
        expect(isDoubted(share, growthBelief(known, 'a'))).toBe(isOdd);
      }),
    );
  });
});

describe('the measured share', () => {
  const work = {
    form: 'raised',
    blankDiameter: mm(20),
    height: mm(0.36),
    sharpHeight: mm(0.4),
  } as const;

  it('is what the crest shows of the static growth', () => {
    const { growth } = formedRound(work);
    const shares = fc.double({ min: 0.5, max: 1.5, noNaN: true });
    fc.assert(
      fc.property(shares, (share) => {
        const crestDiameter = mm(20 + share * growth);
        expect(measuredGrowthShare({ ...work, crestDiameter })).toBeCloseTo(share, 9);
      }),
    );
  });

  it('of a crest smaller than the blank is refused, with both values', () => {
    const call = () => measuredGrowthShare({ ...work, crestDiameter: mm(19.9) });
    expect(call).toThrow(
      expect.objectContaining({ what: 'crestDiameter', value: 19.9, min: 20, unit: 'mm' }),
    );
    expect(() => measuredGrowthShare({ ...work, crestDiameter: mm(20.2), height: mm(0) })).toThrow(
      OutOfRange,
    );
  });

  it('is kept by pattern and material', () => {
    expect(growthFamily({ kind: 'straight' }, 'steel')).toBe('straight × steel');
    expect(growthFamily({ kind: 'square', points: 'sunk' }, 'brass')).toBe('square sunk × brass');
    const hands = (['left', 'right'] as const).map((hand) =>
      growthFamily({ kind: 'diagonal', hand }, 'brass'),
    );
    expect(new Set(hands).size).toBe(1);
  });

  it('refuses a share that is no number', () => {
    expect(() => growthBelief(seen('a', Number.NaN), 'a')).toThrow(OutOfRange);
  });
});
