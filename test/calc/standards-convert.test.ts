import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { cribPitch, wheelsWithin } from '../../src/calc/crib.ts';
import { convertPitch, dinCrib, dpCrib } from '../../src/calc/standards/index.ts';
import { degrees, mm, OutOfRange } from '../../src/calc/units.ts';

const STRAIGHT = degrees(0);

describe('a pitch in another system', () => {
  // evidence: 25.4 π/96 = 0.8312 mm (N = P·D, handbook) is 3.9 % coarser than 0.8
  it('0.8 mm has 96 DP for its nearest, 3.9 % coarser', () => {
    const { exact, nearest, error } = convertPitch({
      pitch: { system: 'metric', value: 0.8 },
      to: 'dp',
      helix: STRAIGHT,
    });
    expect(exact.value.toFixed(2)).toBe('99.75');
    expect(nearest).toEqual({ system: 'dp', value: 96 });
    expect(error).toBeCloseTo((25.4 * Math.PI) / 96 / 0.8 - 1, 12);
  });

  // evidence: 25.4/21 = 1.2095 mm
  it('21 TPI has 1.2 mm for its nearest, 0.8 % finer', () => {
    const { nearest, error } = convertPitch({
      pitch: { system: 'tpi', value: 21 },
      to: 'metric',
      helix: STRAIGHT,
    });
    expect(nearest.value).toBe(1.2);
    expect((100 * error).toFixed(2)).toBe('-0.79');
  });

  // evidence: JIS B 0951: m 0.3 is t = 0.942
  it('m 0.3 has 1.0 mm for its nearest, 6.1 % coarser', () => {
    const { nearest, error } = convertPitch({
      pitch: { system: 'module', value: 0.3 },
      to: 'metric',
      helix: degrees(30),
    });
    expect(nearest.value).toBe(1);
    expect(error).toBeCloseTo(1 / (0.3 * Math.PI) - 1, 12);
  });

  // evidence: reported: 20 TPI at 30° has 17.32 teeth to the inch along the rim, so DP 54.41
  it('DP runs along the rim, TPI square to the tooth', () => {
    const { exact } = convertPitch({
      pitch: { system: 'tpi', value: 20 },
      to: 'dp',
      helix: degrees(30),
    });
    expect(exact.value / Math.PI).toBeCloseTo(17.32, 2);
  });

  it('and back again is the same pitch', () => {
    const systems = fc.constantFrom('metric', 'tpi', 'dp', 'module');
    const helix = fc.double({ min: 0, max: 1, noNaN: true });
    const value = fc.double({ min: 0.3, max: 150, noNaN: true });
    fc.assert(
      fc.property(systems, systems, helix, value, (system, to, angle, number) => {
        const psi = degrees((angle * 180) / Math.PI);
        const there = convertPitch({ pitch: { system, value: number }, to, helix: psi });
        const back = convertPitch({ pitch: there.exact, to: system, helix: psi });
        expect(back.exact.value / number).toBeCloseTo(1, 10);
      }),
    );
  });

  it('has no nearer neighbour in the list', () => {
    const asked = { pitch: { system: 'metric', value: 0.7 }, helix: STRAIGHT } as const;
    expect(convertPitch({ ...asked, to: 'metric' }).nearest.value).not.toBe(0.5);
    expect(Math.abs(convertPitch({ ...asked, to: 'tpi' }).error)).toBeLessThan(0.02);
  });
});

describe('wheels of a crib within a tolerance', () => {
  const crib = [...dinCrib(), ...dpCrib()];

  it('come nearest first, each with its signed error', () => {
    const found = wheelsWithin({ normal: mm(0.8), tolerance: 0.05, crib });
    expect(found.length).toBeGreaterThan(0);
    const off = found.map(({ error }) => Math.abs(error));
    expect([...off].sort((a, b) => a - b)).toEqual(off);
    for (const { wheel, error } of found)
      expect(cribPitch(wheel).normal).toBeCloseTo(0.8 * (1 + error), 12);
    expect(found.some(({ wheel }) => wheel.pitch?.system === 'dp')).toBe(true);
  });

  it('leave out what lies outside, and nothing else', () => {
    const found = new Set(
      wheelsWithin({ normal: mm(0.8), tolerance: 0.02, crib }).map(({ wheel }) => wheel),
    );
    for (const wheel of crib)
      expect(found.has(wheel)).toBe(Math.abs(cribPitch(wheel).normal / 0.8 - 1) <= 0.02);
  });

  // evidence: DIN 403 prints 48 teeth on 15 mm for t 1.0: π·15/48 = 0.9817
  it('are judged by the count, not the label', () => {
    const [fine] = dinCrib().filter(
      ({ size, pitch, pattern }) =>
        size.diameter === 15 && pitch?.value === 1 && pattern.kind === 'straight',
    );
    expect(cribPitch(fine!).normal.toFixed(4)).toBe('0.9817');
    const strict = wheelsWithin({ normal: mm(1), tolerance: 0.01, crib: dinCrib() });
    expect(strict.map(({ wheel }) => wheel)).not.toContain(fine);
  });

  it('refuse a pitch of nothing and a tolerance under nothing', () => {
    expect(() => wheelsWithin({ normal: mm(0), tolerance: 0.1, crib })).toThrow(OutOfRange);
    expect(() => wheelsWithin({ normal: mm(1), tolerance: -0.1, crib })).toThrow(OutOfRange);
  });
});
