import { describe, expect, it } from 'vitest';
import { cribPitch, withPairs } from '../../src/calc/crib.ts';
import {
  DIN_403,
  DIN_PITCHES,
  dinCrib,
  dinWheelCode,
  dinWheelTeeth,
} from '../../src/calc/standards/index.ts';
import { mm, OutOfRange } from '../../src/calc/units.ts';

describe('DIN 403', () => {
  // evidence: DIN 403 (January 1973), table of teeth: first AA KE KV, second BL BR GE GV
  it.each([
    [15, '94/82 78/68 59/51 48/41 39/34 29/25'],
    [20, '126/109 105/91 79/68 63/54 52/45 39/34'],
  ])('a wheel of %d mm has %s teeth', (diameter, printed) => {
    const row = DIN_PITCHES.map((t) => {
      const axial = (['AA', 'KE', 'KV'] as const).map((form) =>
        dinWheelTeeth(form, mm(diameter), mm(t)),
      );
      const helical = (['BL', 'BR', 'GE', 'GV'] as const).map((form) =>
        dinWheelTeeth(form, mm(diameter), mm(t)),
      );
      expect(new Set(axial).size).toBe(1);
      expect(new Set(helical).size).toBe(1);
      return `${axial[0]}/${helical[0]}`;
    });
    expect(row.join(' ')).toBe(printed);
  });

  // evidence: DIN 403, widths (h9) and bores (G7)
  it('lists the widths and bores', () => {
    expect(DIN_403.map(({ widths, bore }) => [...widths, bore])).toEqual([
      [4, 5, 6, 4],
      [6, 8, 10, 6],
    ]);
  });

  // evidence: π·d/t and π·d·cos 30°/t; some printed counts are not the nearest whole number
  it('gives wheels whose pitch is off its label by at most 2.1 %, and one off by more than 1.5 %', () => {
    const off = dinCrib().map((wheel) =>
      Math.abs(cribPitch(wheel).normal / (wheel.pitch?.value ?? 0) - 1),
    );
    expect(Math.max(...off)).toBeLessThan(0.021);
    expect(Math.max(...off)).toBeGreaterThan(0.015);
  });

  // evidence: DIN 403, designation "Rändelrad BL 2006 F 08 DIN 403"
  it('writes size, edges and pitch as the designation does', () => {
    const code = dinWheelCode({ diameter: mm(20), width: mm(6), pitch: mm(0.8) });
    expect(`Rändelrad BL ${code} DIN 403`).toBe('Rändelrad BL 2006 F 08 DIN 403');
    const coarse = dinWheelCode({ diameter: mm(15), width: mm(4), pitch: mm(1.6) });
    expect(coarse).toBe('1504 F 16');
  });

  it('is a crib of every form, whose left and right wheels make pairs', () => {
    const crib = dinCrib();
    expect(new Set(crib.map(({ name }) => name)).size).toBe(7 * 6 * 6);
    const pairs = withPairs(crib).slice(crib.length);
    expect(pairs).toHaveLength(6 * 6);
    for (const pair of pairs) {
      expect(pair).toMatchObject({
        pattern: { kind: 'diamond', points: 'raised' },
        onePiece: false,
      });
      const [left, right] = pair.name.split(' + ').map((name) => crib.find((w) => w.name === name));
      expect([left?.pattern, right?.pattern]).toEqual([
        { kind: 'diagonal', hand: 'left' },
        { kind: 'diagonal', hand: 'right' },
      ]);
      expect(left?.teeth).toBe(right?.teeth);
      expect(left?.size).toEqual(right?.size);
    }
  });

  it('refuses a size or a pitch it does not list', () => {
    expect(() => dinWheelTeeth('AA', mm(25), mm(1))).toThrow(OutOfRange);
    expect(() => dinWheelTeeth('AA', mm(20), mm(2))).toThrow(
      expect.objectContaining({ what: 'pitch', value: 2, max: 1.6 }),
    );
  });
});
