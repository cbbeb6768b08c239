import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  CHECK_FIGURES,
  chanceByLabel,
  checkBlank,
  provenPitch,
  proveWheel,
} from '../../src/calc/checking/index.ts';
import { degrees, inch, type Mm, mm, OutOfRange } from '../../src/calc/units.ts';
import { sixDigits } from '../support/digits.ts';
import { mulberry32 } from '../support/random.ts';
import { requestOf } from '../support/setupRequest.ts';

const valueOf = (of: ReturnType<typeof checkBlank>, name: keyof typeof of.figures): number =>
  of.figures[name]!.value;

describe('a blank before it is knurled', () => {
  it('of 25.4 mm at 1 mm straight is a fifth of a tooth under 80', () => {
    // evidence: worked examples B1
    const found = checkBlank(requestOf({ pitch: { system: 'metric', value: 1 } }), mm(25.4));
    expect(valueOf(found, 'toothCount')).toBe(80);
    expect(sixDigits(valueOf(found, 'toothError'))).toBe(-0.203547);
    expect(sixDigits(valueOf(found, 'nextDiameter'))).toBe(25.1465);
    expect(sixDigits(valueOf(found, 'diameterError'))).toBe(sixDigits(25.4 - 80 / Math.PI));
    expect(found.checks.map(({ name, state }) => `${name} ${state}`)).toEqual([
      'tracking stop',
      'wheel watch',
    ]);
  });

  it('of 25.4 mm at 1 mm diamond is a tenth of a tooth over 69, which lies below it', () => {
    // evidence: worked examples B2
    const diamond = requestOf({
      pattern: { kind: 'diamond', points: 'raised' },
      pitch: { system: 'metric', value: 1 },
    });
    const found = checkBlank(diamond, mm(25.4));
    expect(valueOf(found, 'toothCount')).toBe(69);
    expect(sixDigits(valueOf(found, 'toothError'))).toBe(0.105756);
    expect(sixDigits(valueOf(found, 'nextDiameter'))).toBe(25.3611);
    expect(valueOf(found, 'nextToothCount')).toBe(69);
    expect(valueOf(found, 'nextTakeOff')).toBeCloseTo(25.4 - 25.3611, 4);
  });

  it('of 16 mm under a counted wheel', () => {
    // evidence: worked examples B3
    const found = checkBlank(
      requestOf({ pitch: null, counted: { diameter: mm(19.05), teeth: 60 } }),
      mm(16),
    );
    expect(sixDigits(valueOf(found, 'toothError'))).toBe(0.393701);
    expect(sixDigits(valueOf(found, 'nextDiameter'))).toBe(15.875);
  });

  it('of 1.000 in under a 160 DP straight wheel set over 30° comes down to 0.996 in for 138', () => {
    // evidence: Machinery's Handbook 31, p. 1059: 138.56 teeth; 138 on 0.996 in
    const found = checkBlank(
      requestOf({ pitch: { system: 'dp', value: 160 }, tilt: degrees(30) }),
      inch(1),
    );
    const count = valueOf(found, 'toothCount') + valueOf(found, 'toothError');
    expect(count.toFixed(2)).toBe('138.56');
    expect(valueOf(found, 'nextToothCount')).toBe(138);
    expect((valueOf(found, 'nextDiameter') / 25.4).toFixed(3)).toBe('0.996');
  });

  it('of 20.785 mm takes 60 teeth of a diamond of module 0.3 as it is', () => {
    // evidence: JIS B 0951, D = n·m/cos 30°
    const found = checkBlank(
      requestOf({
        pattern: { kind: 'diamond', points: 'raised' },
        pitch: { system: 'module', value: 0.3 },
      }),
      mm((60 * 0.3) / Math.cos(Math.PI / 6)),
    );
    expect(valueOf(found, 'toothCount')).toBe(60);
    expect(Math.abs(valueOf(found, 'toothError'))).toBeLessThan(1e-9);
    expect(found.checks[0]).toMatchObject({ state: 'fine', reason: 'whole' });
    // The one it is on already is not the next one down.
    expect(valueOf(found, 'nextToothCount')).toBe(59);
  });

  it('keeps to the blank tolerance of a class that is called out', () => {
    // evidence: Machinery's Handbook 31, p. 1060: class I, 96 DP, blank ±0.0010 in
    const classI = requestOf({ pitch: { system: 'dp', value: 96 }, knurlClass: 'I' });
    const found = checkBlank(classI, inch(1));
    expect(valueOf(found, 'blankWindowLow') / 25.4).toBeCloseTo(0.999, 9);
    expect(valueOf(found, 'blankWindowHigh') / 25.4).toBeCloseTo(1.001, 9);
    expect(checkBlank(classI, inch(1.0009)).checks[0]!.state).toBe('fine');
    expect(checkBlank(classI, inch(1.0011)).checks[0]!.state).toBe('watch');
  });

  it('too thin for three teeth is refused with both limits', () => {
    const refusal = () => checkBlank(requestOf(), mm(1));
    expect(refusal).toThrow(OutOfRange);
    expect(refusal).toThrow(/diameter 1 mm is outside 1\.15\d* to 500 mm/);
  });
});

const anyBlank = fc.record({
  diameter: fc.double({ min: 8, max: 200, noNaN: true }),
  pitch: fc.double({ min: 0.3, max: 2, noNaN: true }),
});

describe('laws of a blank', () => {
  it('the next diameter is smaller, by less than a tooth, and is whole', () => {
    fc.assert(
      fc.property(anyBlank, ({ diameter, pitch }) => {
        const wheel = requestOf({ pitch: { system: 'metric', value: pitch } });
        const found = checkBlank(wheel, mm(diameter));
        const next = valueOf(found, 'nextDiameter') as Mm;
        expect(next).toBeLessThan(diameter);
        expect(diameter - next).toBeLessThanOrEqual(pitch / Math.PI + 1e-5);
        expect(Math.abs(valueOf(checkBlank(wheel, next), 'toothError'))).toBeLessThan(1e-7);
      }),
    );
  });

  it('diameter error and tooth error are one thing in two units', () => {
    fc.assert(
      fc.property(anyBlank, ({ diameter, pitch }) => {
        const found = checkBlank(
          requestOf({ pitch: { system: 'metric', value: pitch } }),
          mm(diameter),
        );
        const inTeeth = (valueOf(found, 'diameterError') * Math.PI) / pitch;
        expect(inTeeth).toBeCloseTo(valueOf(found, 'toothError'), 8);
      }),
    );
  });

  it('is the same said in inches and in millimetres', () => {
    const inches = checkBlank(requestOf({ pitch: { system: 'tpi', value: 20 } }), inch(0.75));
    const metric = checkBlank(requestOf({ pitch: { system: 'metric', value: 1.27 } }), mm(19.05));
    expect(valueOf(metric, 'toothError')).toBeCloseTo(valueOf(inches, 'toothError'), 9);
    expect(valueOf(metric, 'nextDiameter')).toBeCloseTo(valueOf(inches, 'nextDiameter'), 9);
  });
});

describe('a proven pair', () => {
  it('takes the place of the label', () => {
    const pitch = provenPitch(inch(0.9852), 65);
    const found = checkBlank(requestOf({ proven: pitch }), inch(0.9852));
    expect(valueOf(found, 'toothCount')).toBe(65);
    expect(Math.abs(valueOf(found, 'toothError'))).toBeLessThan(1e-9);
    expect(found.checks[1]).toMatchObject({ state: 'fine', reason: 'proven' });
    expect(valueOf(found, 'chanceTracks')).toBe(1);
  });

  it('from a scrap roll replaces the label, and moves the next diameter with it', () => {
    // By hand: π × 25.273/65 = 1.221500; 64 × 1.221500/π = 24.884185
    const found = proveWheel(requestOf(), inch(0.995), 65);
    expect(valueOf(found, 'effectivePitch')).toBeCloseTo(1.2215, 5);
    expect(Math.abs(valueOf(found, 'toothError'))).toBeLessThan(1e-9);
    expect(valueOf(found, 'nextDiameter')).toBeCloseTo(24.884185, 5);
    expect(found.checks[1]).toMatchObject({ state: 'fine', reason: 'proven' });
  });

  it.each([0, 10_000, 65.5])('of %f teeth on 0.995 in is refused, with both limits', (count) => {
    expect(() => proveWheel(requestOf(), inch(0.995), count)).toThrow(/outside 21 to 197/);
  });

  it('has every figure of a check, those that do not apply as null', () => {
    const found = proveWheel(requestOf(), inch(0.995), 65);
    expect(Object.keys(found.figures)).toEqual(Object.keys(CHECK_FIGURES));
    expect(found.figures.seamTakeOff).toBeNull();
    expect(found.figures.growthFactor).toBeNull();
  });

  it.each([0, 2, 10_000])('of %f teeth is refused', (count) => {
    expect(() => provenPitch(mm(20), count)).toThrow(OutOfRange);
  });
});

describe('the chance by the label alone', () => {
  it('is the share of counts near a whole one, counted out', () => {
    const random = mulberry32(11);
    for (const [error, doubt] of [
      [0, 1.625],
      [0.3, 0.15],
      [-0.45, 0.08],
      [0.05, 4],
    ] as const) {
      const draws = 200_000;
      let tracks = 0;
      for (let i = 0; i < draws; i += 1) {
        const count = error + doubt * (2 * random() - 1);
        if (Math.abs(count - Math.round(count)) <= 0.1) tracks += 1;
      }
      expect(Math.abs(chanceByLabel(error, doubt) - tracks / draws)).toBeLessThan(0.004);
    }
  });

  it('is certain where nothing is in doubt', () => {
    expect(chanceByLabel(0.1, 0)).toBe(1);
    expect(chanceByLabel(0.11, 0)).toBe(0);
  });
});
