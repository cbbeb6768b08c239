import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  basisOf,
  COARSEST_PITCH,
  countedWheelPitch,
  FINEST_PITCH,
  labelledPitch,
  onOwnBlank,
  type PitchSystem,
  STANDARD_DP,
  standardDp,
  workPitch,
} from '../../src/calc/pitch.ts';
import { toothCount } from '../../src/calc/teeth.ts';
import { degrees, inch, MM_PER_INCH, mm, OutOfRange, rad } from '../../src/calc/units.ts';
import { DIN_403_TEETH, NOT_NEAREST } from '../reference/whole-teeth.ts';

const SYSTEMS: readonly PitchSystem[] = ['metric', 'tpi', 'dp', 'module'];

describe('what a label measures', () => {
  it('20 TPI at 30° are 17.32 round the rim, 0.0500 in becomes 0.0577 in', () => {
    // evidence: transverse TPI = TPI·cos ψ (reported)
    const { normal, transverse } = workPitch({
      pitch: labelledPitch({ system: 'tpi', value: 20 }),
      basis: basisOf('tpi'),
      helix: degrees(30),
      setOver: false,
    });
    expect((MM_PER_INCH / transverse).toFixed(2)).toBe('17.32');
    expect((normal / MM_PER_INCH).toFixed(4)).toBe('0.0500');
    expect((transverse / MM_PER_INCH).toFixed(4)).toBe('0.0577');
  });

  it('modules 0.2, 0.3 and 0.5 are pitches of 0.628, 0.942 and 1.571 mm', () => {
    // evidence: JIS B 0951 (1962), table
    const pitches = [0.2, 0.3, 0.5].map((value) => labelledPitch({ system: 'module', value }));
    expect(pitches.map((pitch) => pitch.toFixed(3))).toEqual(['0.628', '0.942', '1.571']);
  });

  // evidence: N = P·D (Machinery's Handbook 31 p. 1059): diametral pitches count along the rim
  it.each(STANDARD_DP)('%d DP puts that many teeth on a 1 in blank, helical or not', (dp) => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1.2, noNaN: true }), (helix) => {
        const pitch = labelledPitch({ system: 'dp', value: dp });
        const { transverse } = workPitch({
          pitch,
          basis: basisOf('dp'),
          helix: rad(helix),
          setOver: false,
        });
        expect(toothCount(inch(1), transverse)).toBeCloseTo(dp, 9);
      }),
    );
  });

  it('every other label counts square to the tooth', () => {
    // evidence: DIN 403 (derived from its counts), JIS B 0951 (read), TPI (reported)
    expect(SYSTEMS.map(basisOf)).toEqual(['normal', 'normal', 'rim', 'normal']);
  });

  it('wheels are answered from 0.2 to 3.2 mm', () => {
    // evidence: judgement
    expect([FINEST_PITCH, COARSEST_PITCH]).toEqual([0.2, 3.2]);
  });
});

describe('DIN 403 tooth counts', () => {
  const exceptions = new Map<string, number>(
    NOT_NEAREST.map(({ diameter, pitch, wheels, nearest }) => [
      `${diameter} ${pitch} ${wheels}`,
      nearest,
    ]),
  );
  const wheels = DIN_403_TEETH.flatMap(({ diameter, pitch, axial, helical }) => [
    { diameter, pitch, wheel: 'axial', helix: 0, printed: axial },
    { diameter, pitch, wheel: 'helical', helix: 30, printed: helical },
  ]);

  // evidence: DIN 403 (January 1973); that they are π·d/t and π·d·cos 30°/t is derived
  it.each(wheels)('$wheel wheel of $diameter mm, pitch $pitch: $printed', (of) => {
    const { transverse } = workPitch({
      pitch: labelledPitch({ system: 'metric', value: of.pitch }),
      basis: basisOf('metric'),
      helix: degrees(of.helix),
      setOver: false,
    });
    const nearest = Math.round(toothCount(mm(of.diameter), transverse));
    const named = exceptions.get(`${of.diameter} ${of.pitch} ${of.wheel}`);
    expect(nearest).toBe(named ?? of.printed);
    expect(nearest === of.printed).toBe(named === undefined);
  });

  it('leave a label off by up to 2 % of the pitch', () => {
    // evidence: derived from the printed counts
    const off = wheels.map(({ diameter, pitch, helix, printed }) => {
      const rim = countedWheelPitch(mm(diameter), printed);
      const { normal } = workPitch({
        pitch: rim,
        basis: 'rim',
        helix: degrees(helix),
        setOver: false,
      });
      return Math.abs(normal / pitch - 1);
    });
    expect((100 * Math.max(...off)).toFixed(0)).toBe('2');
  });
});

describe('laws of the pitch on the work', () => {
  const pitches = fc.double({ min: 0.2, max: 3.2, noNaN: true }).map(mm);
  const helices = fc.double({ min: 0, max: 1.2, noNaN: true }).map(rad);
  const bases = fc.constantFrom('normal' as const, 'rim' as const);

  it('the rim is never finer than square to the tooth, and the same without a helix', () => {
    fc.assert(
      fc.property(pitches, bases, helices, fc.boolean(), (pitch, basis, helix, setOver) => {
        const work = workPitch({ pitch, basis, helix, setOver });
        expect(work.transverse).toBeGreaterThanOrEqual(work.normal);
        expect(work.transverse * Math.cos(helix)).toBeCloseTo(work.normal, 9);
        const straight = workPitch({ pitch, basis, helix: rad(0), setOver });
        expect(straight).toEqual({ normal: pitch, transverse: pitch });
      }),
    );
  });

  it('a straight wheel set over keeps its pitch, whatever its label measures', () => {
    fc.assert(
      fc.property(pitches, bases, helices, (pitch, basis, helix) => {
        expect(workPitch({ pitch, basis, helix, setOver: true }).normal).toBe(pitch);
      }),
    );
  });

  it('one pitch has one length in every system', () => {
    fc.assert(
      fc.property(pitches, (t) => {
        const same = [
          { system: 'metric', value: t },
          { system: 'tpi', value: MM_PER_INCH / t },
          { system: 'dp', value: (MM_PER_INCH * Math.PI) / t },
          { system: 'module', value: t / Math.PI },
        ] as const;
        for (const pitch of same) expect(labelledPitch(pitch)).toBeCloseTo(t, 12);
      }),
    );
  });

  it('a wheel counted with the count of its pitch has that pitch', () => {
    fc.assert(
      fc.property(pitches, fc.integer({ min: 3, max: 500 }), (pitch, teeth) => {
        const diameter = mm((teeth * pitch) / Math.PI);
        expect(countedWheelPitch(diameter, teeth)).toBeCloseTo(pitch, 12);
      }),
    );
  });
});

describe('blanks of a diametral pitch', () => {
  // evidence: steps of 1/64 in for 64 and 128, 1/32 in for 96 and 160 (reported)
  it.each([
    [64, 1 / 64],
    [96, 1 / 32],
    [128, 1 / 64],
    [160, 1 / 32],
  ] as const)('%d DP is made for blanks in steps of %d in', (dp, step) => {
    const tolerance = mm(0.001);
    for (let k = 8; k < 200; k += 1) {
      expect(onOwnBlank(dp, inch(k * step), tolerance)).toBe(true);
      expect(onOwnBlank(dp, inch((k + 0.5) * step), tolerance)).toBe(false);
    }
  });

  it('off by just the tolerance is on it, whichever unit it was typed in', () => {
    // 3.751 in was, 95.2754 mm was not.
    for (const blank of [inch(3.751), mm(95.2754), inch(3.749), mm(95.2246)])
      expect(onOwnBlank(96, blank, inch(0.001))).toBe(true);
    expect(onOwnBlank(96, inch(3.7511), inch(0.001))).toBe(false);
  });

  it('other numbers are no pitch of the standard', () => {
    expect([64, 96, 128, 160].map(standardDp)).toEqual([...STANDARD_DP]);
    expect([63, 100, 21, 0].map(standardDp)).toEqual([null, null, null, null]);
  });
});

describe('pitches that make no sense', () => {
  it.each<[string, () => unknown]>([
    ...SYSTEMS.flatMap((system): [string, () => unknown][] =>
      [0, -1, Number.NaN, Number.POSITIVE_INFINITY].map((value) => [
        `${system} ${value}`,
        () => labelledPitch({ system, value }),
      ]),
    ),
    [
      'a helix of 70°',
      () => workPitch({ pitch: mm(1), basis: 'rim', helix: degrees(70), setOver: false }),
    ],
    [
      'a helix the other way',
      () => workPitch({ pitch: mm(1), basis: 'rim', helix: degrees(-5), setOver: false }),
    ],
    ['a wheel with two teeth', () => countedWheelPitch(mm(20), 2)],
    ['a wheel of no size', () => countedWheelPitch(mm(0), 60)],
  ])('%s', (_, call) => {
    expect(call).toThrow(OutOfRange);
  });
});
