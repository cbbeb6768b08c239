import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { SEAM_READING_SD, seamChance, seamTest } from '../../src/calc/checking/index.ts';
import { inch, mm, OutOfRange } from '../../src/calc/units.ts';
import { between, mulberry32, normalFrom, oneOf } from '../support/random.ts';
import { requestOf } from '../support/setupRequest.ts';
import { simpson } from '../support/simpson.ts';

const valueOf = (of: ReturnType<typeof seamTest>, name: keyof typeof of.figures): number =>
  of.figures[name]!.value;

/** 21 TPI straight on 0.995 in: one tooth of diameter is 1.209524/π = 0.385003 mm. */
const STEP = 25.4 / 21 / Math.PI;
const trial = (gap: number, scrap: boolean, count: number | null = null) =>
  seamTest(requestOf(), inch(0.995), { gap, scrap, count });

describe('the seam of a trial turn', () => {
  it('with the marks turned away takes one tooth more where the gap alone is too little', () => {
    // By hand: z1 = 0.09 × 1.209524 = 0.108857, twice that 0.217714; 0.3 × 0.385003 = 0.115501 is
    // less, 1.3 × 0.385003 = 0.500504 is more.
    const found = trial(0.3, false);
    expect(valueOf(found, 'firstBite')).toBeCloseTo(0.108857, 6);
    expect(valueOf(found, 'seamTakeOff')).toBeCloseTo(0.500504, 6);
    expect(valueOf(found, 'seamDiameter')).toBeCloseTo(25.273 - 0.500504, 6);
    expect(found.figures.effectivePitch).toBeNull();
    expect(found.kind).toBe('closes');
  });

  it('with the marks turned away takes only the gap where that is enough', () => {
    expect(valueOf(trial(0.6, false), 'seamTakeOff')).toBeCloseTo(0.6 * STEP, 9);
  });

  it('on scrap takes the gap and no more', () => {
    const found = trial(0.3, true);
    expect(valueOf(found, 'seamTakeOff')).toBeCloseTo(0.3 * STEP, 9);
    expect(found.figures.marksTakeOff).toBeNull();
  });

  it.each([0.95, 0.97, 1, 0])('a gap of %f is whole as it is', (gap) => {
    const found = trial(gap, false);
    expect(found.kind).toBe('whole');
    expect(valueOf(found, 'seamTakeOff')).toBe(0);
    expect(valueOf(found, 'seamDiameter')).toBeCloseTo(25.273, 9);
    // Whoever wants the marks gone all the same loses one tooth.
    expect(valueOf(found, 'marksTakeOff')).toBeCloseTo((gap === 0 ? 1 : gap) * STEP, 9);
  });

  it.each([0.02, 0.1])('a gap of %f is only centred', (gap) => {
    const found = trial(gap, false);
    expect(found.kind).toBe('centres');
    expect(valueOf(found, 'seamTakeOff')).toBeCloseTo(gap * STEP, 9);
    expect(valueOf(found, 'marksTakeOff')).toBeCloseTo((gap + 1) * STEP, 9);
  });

  it('with the marks counted proves the wheel', () => {
    // By hand: π × 25.273/(66 − 1 + 0.3) = 1.215888
    const found = trial(0.3, true, 66);
    expect(valueOf(found, 'effectivePitch')).toBeCloseTo(1.215888, 6);
    expect(valueOf(found, 'seamTakeOff')).toBeCloseTo((0.3 * 1.215888) / Math.PI, 6);
    expect(valueOf(found, 'nextToothCount')).toBe(65);
    expect(found.checks[1]).toMatchObject({ name: 'wheel', state: 'fine', reason: 'proven' });
  });

  it('warns that the work is turned by hand with the drive out', () => {
    expect(trial(0.3, false).cautions).toContain('handTurn');
  });

  it.each([
    ['a gap above one', () => trial(1.2, false), /seam 1\.2 1 is outside 0 to 1/],
    ['a gap below nothing', () => trial(-0.1, false), /seam -0\.1 1 is outside 0 to 1/],
    ['no marks', () => trial(0.3, false, 0), /counted 0 1 is outside 21 to 197/],
    ['10 000 marks', () => trial(0.3, false, 10_000), /counted 10000 1 is outside 21 to 197/],
    [
      'a bar with nothing left to turn away',
      () => seamTest(requestOf(), mm(1.3), { gap: 0.3, scrap: false, count: null }),
      /diameter 1\.3 mm is outside 1\.655\d* to 500 mm/,
    ],
  ])('refuses %s, naming both limits', (_, refused, said) => {
    expect(refused).toThrow(OutOfRange);
    expect(refused).toThrow(said);
  });
});

describe('laws of the seam', () => {
  it('take-off with marks is gap plus whole teeth, at least twice the bite, and no tooth too many', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.101, max: 0.949, noNaN: true }),
        fc.double({ min: 0.3, max: 2, noNaN: true }),
        fc.constantFrom('straight', 'diamond'),
        (gap, pitch, kind) => {
          const wheel = requestOf({
            pattern: kind === 'straight' ? { kind } : { kind: 'diamond', points: 'raised' },
            pitch: { system: 'metric', value: pitch },
          });
          const found = seamTest(wheel, mm(40), { gap, scrap: false, count: null });
          const step = valueOf(found, 'transversePitch') / Math.PI;
          const takeOff = valueOf(found, 'seamTakeOff');
          const wholeTeeth = takeOff / step - gap;
          expect(Math.abs(wholeTeeth - Math.round(wholeTeeth))).toBeLessThan(1e-9);
          const twiceTheBite = 2 * valueOf(found, 'firstBite');
          expect(takeOff).toBeGreaterThanOrEqual(twiceTheBite - 1e-9);
          if (wholeTeeth > 0.5) expect(takeOff - step).toBeLessThan(twiceTheBite + 1e-9);
        },
      ),
    );
  });

  it('a counted wheel is whole on the told diameter', () => {
    for (const gap of [0.15, 0.4, 0.9]) {
      const found = trial(gap, false, 66);
      const count = (Math.PI * valueOf(found, 'seamDiameter')) / valueOf(found, 'effectivePitch');
      expect(count).toBeCloseTo(Math.round(count), 9);
    }
  });
});

describe('how sure a seam is', () => {
  it('agrees with the two spreads added up point by point', () => {
    const bell = (e: number) =>
      Math.exp(-((e / SEAM_READING_SD) ** 2) / 2) / (SEAM_READING_SD * Math.sqrt(2 * Math.PI));
    for (const [left, doubt] of [
      [0, 0.026],
      [-0.03, 0.01],
      [0.02, 0.08],
    ] as const) {
      const within = (w: number) => simpson(bell, -0.1 - left - w, 0.1 - left - w, 400);
      const chance = simpson(within, -doubt, doubt, 400) / (2 * doubt);
      expect(seamChance(left, doubt)).toBeCloseTo(chance, 9);
    }
  });

  it('over 10 000 wheels is kept, where the label alone tracks once in five', () => {
    const random = mulberry32(20_260);
    const wheels = 10_000;
    let seamTracks = 0;
    let labelTracks = 0;
    let promised = 0;
    for (let i = 0; i < wheels; i += 1) {
      const label = oneOf(random, [0.5, 0.6, 0.8, 1, 1.2, 1.6]);
      const diamond = random() < 0.5;
      const request = requestOf({
        pattern: diamond ? { kind: 'diamond', points: 'raised' } : { kind: 'straight' },
        pitch: { system: 'metric', value: label },
      });
      // The wheel as it is: off its label, and rolling somewhere between surface and groove root.
      const rim = label / (diamond ? Math.cos(Math.PI / 6) : 1);
      const truePitch = rim * (1 + between(random, -0.02, 0.02));
      const rolling = random();
      const bite = 0.09 * label;
      const countOn = (diameter: number) => (Math.PI * (diameter - 2 * rolling * bite)) / truePitch;
      const tracksOn = (diameter: number) => {
        const count = countOn(diameter);
        return Math.abs(count - Math.round(count)) <= 0.1;
      };
      const diameter = between(random, 12, 60);
      const gap = (((countOn(diameter) + 0.05 * normalFrom(random)) % 1) + 1) % 1;
      const reading = { gap, scrap: random() < 0.5, count: null };
      const told = seamTest(request, mm(diameter), reading);
      if (tracksOn(valueOf(told, 'seamDiameter'))) seamTracks += 1;
      promised += valueOf(told, 'chanceTracks');
      if (tracksOn((Math.floor((Math.PI * diameter) / rim) * rim) / Math.PI)) labelTracks += 1;
    }
    const percent = (count: number) => `${((100 * count) / wheels).toFixed(1)} %`;
    console.log(
      `told from the seam ${percent(seamTracks)} track (promised ${percent(promised)}), by the label alone ${percent(labelTracks)}`,
    );
    expect(seamTracks).toBeGreaterThanOrEqual(0.9 * wheels);
    expect(labelTracks).toBeLessThan(0.35 * wheels);
    // What the card promises is what is kept.
    expect(Math.abs(seamTracks - promised)).toBeLessThan(0.015 * wheels);
  });
});
