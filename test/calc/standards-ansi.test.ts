import { describe, expect, it } from 'vitest';
import type { Pattern } from '../../src/calc/pattern.ts';
import { STANDARD_DP } from '../../src/calc/pitch.ts';
import { SOURCES } from '../../src/calc/sources.ts';
import {
  classEvidence,
  classSuits,
  DP_BY_PREFERENCE,
  DP_WHEEL_SIZES,
  dpCrib,
  dpWheelTeeth,
  finishLimits,
} from '../../src/calc/standards/index.ts';
import { classBlankTolerance, type KnurlClass } from '../../src/calc/tracking.ts';
import { inch, mm, OutOfRange } from '../../src/calc/units.ts';

const inThousandths = (length: number): string => (length / 25.4).toFixed(4);

describe('ANSI/ASME B94.6', () => {
  // evidence: class I read, Machinery's Handbook 31 p. 1060; classes II and III from memory
  it.each<[KnurlClass, string]>([
    ['I', '+0.0050 -0.0120, +0.0040 -0.0100, +0.0030 -0.0080, +0.0020 -0.0060'],
    ['II', '+0.0000 -0.0100, +0.0000 -0.0090, +0.0000 -0.0080, +0.0000 -0.0060'],
    ['III', '+0.0000 -0.0060, +0.0000 -0.0050, +0.0000 -0.0040, +0.0000 -0.0030'],
  ])('class %s: %s at 64, 96, 128, 160 DP', (knurlClass, printed) => {
    const nominal = inch(1);
    const rows = STANDARD_DP.map((dp) => {
      const { low, high } = finishLimits({ dp, knurlClass, nominal });
      return `+${inThousandths(high - nominal)} -${inThousandths(nominal - low)}`;
    });
    expect(rows.join(', ')).toBe(printed);
  });

  // evidence: class I blanks read, Machinery's Handbook 31 p. 1060; II and III from memory
  it.each<[KnurlClass, string]>([
    ['I', '0.0015/0.0015 0.0010/0.0010 0.0007/0.0007 0.0005/0.0005'],
    ['II', '0.0015/0.0015 0.0010/0.0010 0.0007/0.0007 0.0005/0.0005'],
    ['III', '0.0000/0.0015 0.0000/0.0010 0.0000/0.0007 0.0000/0.0005'],
  ])('class %s blanks: %s', (knurlClass, printed) => {
    const rows = STANDARD_DP.map((dp) => {
      const { above, below } = classBlankTolerance(dp, knurlClass);
      return `${inThousandths(above)}/${inThousandths(below)}`;
    });
    expect(rows.join(' ')).toBe(printed);
  });

  it('says how sure each class is, as the register does', () => {
    expect(classEvidence('I')).toEqual({ mark: 'read', source: 'asme-b94.6' });
    for (const knurlClass of ['II', 'III'] as const) {
      const { mark, source } = classEvidence(knurlClass);
      expect(mark).toBe('from memory');
      expect(SOURCES[source].mark).toBe(mark);
    }
  });

  // evidence: Machinery's Handbook 31 p. 1060: I straight, diagonal, raised diamond; II, III straight
  it.each<[Pattern, boolean, boolean]>([
    [{ kind: 'straight' }, true, true],
    [{ kind: 'diagonal', hand: 'left' }, true, false],
    [{ kind: 'diamond', points: 'raised' }, true, false],
    [{ kind: 'diamond', points: 'sunk' }, false, false],
    [{ kind: 'square', points: 'raised' }, false, false],
  ])('classes suit %o: I %s, II and III %s', (pattern, first, others) => {
    expect(classSuits('I', pattern)).toBe(first);
    expect(classSuits('II', pattern)).toBe(others);
    expect(classSuits('III', pattern)).toBe(others);
  });

  // evidence: wheel sizes and N = P × nominal diameter, from memory
  it('lists wheels with whole teeth', () => {
    expect(DP_WHEEL_SIZES.map(({ diameter }) => dpWheelTeeth(96, diameter))).toEqual([
      48, 60, 72, 84,
    ]);
    expect(DP_WHEEL_SIZES.map(({ name }) => name)).toEqual([
      '1/2 x 3/16 x 3/16',
      '5/8 x 1/4 x 1/4',
      '3/4 x 3/8 x 1/4',
      '7/8 x 3/8 x 1/4',
    ]);
  });

  // evidence: 96 preferred, 64 to be avoided (reported)
  it('prefers 96 and leaves 64 for last', () => {
    expect(DP_BY_PREFERENCE).toEqual([96, 128, 160, 64]);
  });

  it('is a crib of every pitch and size, by its label', () => {
    expect(new Set(dpCrib().map(({ name }) => name)).size).toBe(dpCrib().length);
    expect(dpCrib().every(({ teeth, pitch }) => teeth === null && pitch?.system === 'dp')).toBe(
      true,
    );
  });

  it('refuses a diameter its own tolerance would use up', () => {
    const call = () => finishLimits({ dp: 64, knurlClass: 'I', nominal: mm(0.2) });
    expect(call).toThrow(expect.objectContaining({ what: 'nominal', value: 0.2 }));
    expect(() => dpWheelTeeth(96, mm(0))).toThrow(OutOfRange);
  });
});
