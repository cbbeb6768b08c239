import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formedFlat, sharpHeight } from '../../src/calc/growth/index.ts';
import { formOf, wheelFor } from '../../src/calc/pattern.ts';
import { SOURCES } from '../../src/calc/sources.ts';
import {
  blankByStandard,
  blankFactor,
  DIN_82,
  DIN_FORMS,
  DIN_PITCHES,
  DIN_WIDE_INCLUDED,
  dinFormOf,
} from '../../src/calc/standards/index.ts';
import { degrees, mm, OutOfRange } from '../../src/calc/units.ts';

describe('DIN 82', () => {
  // evidence: DIN 82 (January 1973), table of forms: letters, meaning, wheels
  it.each([
    ['RAA', 'straight', ['AA', 'BL', 'BR']],
    ['RBL', 'diagonal left', ['BR', 'AA']],
    ['RBR', 'diagonal right', ['BL', 'AA']],
    ['RGE', 'diamond raised', ['GV', 'BL BR']],
    ['RGV', 'diamond sunk', ['GE']],
    ['RKE', 'square raised', ['KV']],
    ['RKV', 'square sunk', ['KE']],
  ] as const)('%s is %s', (form, meaning, wheels) => {
    const { pattern, tools } = DIN_82[form];
    expect(Object.values(pattern).join(' ')).toBe(meaning);
    expect(tools.map((tool) => tool.wheels.join(' '))).toEqual(wheels);
  });

  // evidence: DIN 82 section 2: a left-hand knurl needs a right-hand wheel
  it('names the wheel that is the mirror of the knurl, as the card does', () => {
    expect(wheelFor(DIN_82.RBL.pattern, false, false)).toBe('rightHelical');
    expect(DIN_82.RBL.tools[0].wheels).toEqual(['BR']);
    expect(wheelFor(DIN_82.RBR.pattern, false, false)).toBe('leftHelical');
    expect(DIN_82.RBR.tools[0].wheels).toEqual(['BL']);
  });

  // evidence: DIN 82 as reported: d2 = d1 − 0.5 t, − 0.67 t, − 0.33 t
  it.each([
    ['RAA', 19.6],
    ['RBL', 19.6],
    ['RBR', 19.6],
    ['RGE', 19.464],
    ['RGV', 19.736],
    ['RKE', 19.464],
    ['RKV', 19.736],
  ] as const)('%s 08 on 20 mm starts from %f mm', (form, blank) => {
    expect(blankByStandard({ form, finished: mm(20), pitch: mm(0.8) })).toBeCloseTo(blank, 9);
  });

  // evidence: volume kept, worked out by formedFlat, which knows nothing of the standard
  it.each(DIN_FORMS)('%s at 90° is the growth of a full tooth, rounded for print', (form) => {
    const full = sharpHeight(mm(1), degrees(90));
    const { growth } = formedFlat(formOf(DIN_82[form].pattern), full, full);
    expect(blankFactor(form, degrees(90))).toBe(Number(growth.toFixed(2)));
  });

  // evidence: equal volume at 105°: 0.384, 0.512, 0.256; derived, not in the standard
  it.each([
    ['RAA', 0.384],
    ['RGE', 0.512],
    ['RKV', 0.256],
  ] as const)('%s at 105° has the factor %f', (form, factor) => {
    expect(blankFactor(form, DIN_WIDE_INCLUDED)).toBeCloseTo(factor, 3);
  });

  it('has a factor that is the growth of a full tooth at any other profile', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...DIN_FORMS),
        fc.integer({ min: 60, max: 120 }).filter((angle) => angle !== 90),
        (form, angle) => {
          const full = sharpHeight(mm(0.8), degrees(angle));
          const { growth } = formedFlat(formOf(DIN_82[form].pattern), full, full);
          expect(blankFactor(form, degrees(angle))).toBeCloseTo(growth / 0.8, 12);
        },
      ),
    );
  });

  it('marks its printed factors as reported and the others as derived', () => {
    expect(SOURCES['din-82-blank'].mark).toBe('reported');
    expect(SOURCES['din-82-105'].mark).toBe('derived');
  });

  // evidence: DIN 82 (January 1973): 2.0 was dropped
  it('has six pitches', () => {
    expect(DIN_PITCHES).toEqual([0.5, 0.6, 0.8, 1, 1.2, 1.6]);
  });

  it('finds the letters of a pattern', () => {
    for (const form of DIN_FORMS) expect(dinFormOf(DIN_82[form].pattern)).toBe(form);
    expect(dinFormOf({ kind: 'diagonal', hand: null })).toBeNull();
  });

  it('refuses a part that would be all tooth, and names how much the tooth takes', () => {
    expect(() => blankByStandard({ form: 'RGE', finished: mm(0.5), pitch: mm(0.8) })).toThrow(
      expect.objectContaining({ what: 'finished', value: 0.5, min: 0.67 * 0.8 }),
    );
    expect(() => blankByStandard({ form: 'RGE', finished: mm(20), pitch: mm(0) })).toThrow(
      OutOfRange,
    );
    expect(() => blankFactor('RAA', degrees(10))).toThrow(OutOfRange);
  });
});
