import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { labelledPitch, workPitch } from '../../src/calc/pitch.ts';
import { GOST_PITCHES, JIS_MODULES, jisBlank } from '../../src/calc/standards/index.ts';
import { wholeToothDiameter } from '../../src/calc/teeth.ts';
import { degrees, mm, OutOfRange } from '../../src/calc/units.ts';

describe('JIS B 0951', () => {
  // evidence: JIS B 0951 (1962), table: m 0.2 0.3 0.5, t 0.628 0.942 1.571
  it('lists three modules and their pitches', () => {
    const pitches = JIS_MODULES.map((value) => labelledPitch({ system: 'module', value }));
    expect(pitches.map((t) => t.toFixed(3))).toEqual(['0.628', '0.942', '1.571']);
  });

  // evidence: D = n·m and D = n·m/cos 30° (read), worked out: 20.785 and 20.0
  it('gives the blank for a number of teeth', () => {
    const diamond = jisBlank({ kind: 'diamond', teeth: 60, module: mm(0.3) });
    expect(diamond.toFixed(3)).toBe('20.785');
    const straight = jisBlank({ kind: 'straight', teeth: 40, module: mm(0.5) });
    expect(straight).toBe(20);
  });

  it('agrees with the whole-tooth blank of the same module', () => {
    fc.assert(
      fc.property(
        fc.constantFrom('straight', 'diamond'),
        fc.integer({ min: 12, max: 400 }),
        fc.constantFrom(...JIS_MODULES),
        (kind, teeth, module) => {
          const { transverse } = workPitch({
            pitch: labelledPitch({ system: 'module', value: module }),
            basis: 'normal',
            helix: degrees(kind === 'diamond' ? 30 : 0),
            setOver: false,
          });
          const blank = jisBlank({ kind, teeth, module: mm(module) });
          expect(blank).toBeCloseTo(wholeToothDiameter(teeth, transverse), 9);
        },
      ),
    );
  });

  it('refuses two teeth', () => {
    expect(() => jisBlank({ kind: 'straight', teeth: 2, module: mm(0.3) })).toThrow(OutOfRange);
  });
});

describe('GOST 21474-75', () => {
  // evidence: GOST 21474-75, opening: straight 0.5 to 1.6, diamond the same and 2.0
  it('lists its pitches', () => {
    expect(GOST_PITCHES.straight).toEqual([0.5, 0.6, 0.8, 1, 1.2, 1.6]);
    expect(GOST_PITCHES.diamond).toEqual([...GOST_PITCHES.straight, 2]);
  });
});
