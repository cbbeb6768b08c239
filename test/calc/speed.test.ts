import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { State } from '../../src/calc/check.ts';
import { MATERIALS } from '../../src/calc/materials/index.ts';
import {
  type Band,
  speedCheck,
  speedLimit,
  spindleSpeed,
  startingSpeed,
  surfaceSpeed,
} from '../../src/calc/speed.ts';
import { feetPerMinute, mm, mPerMin, OutOfRange, revPerMin } from '../../src/calc/units.ts';
import { SPINDLE_SPEED } from '../reference/speed-and-feed.ts';
import { sixDigits } from '../support/digits.ts';

const band = (low: number, high: number): Band => [mPerMin(low), mPerMin(high)];

describe('spindle speed', () => {
  it('of 25 m/min on 20 mm', () => {
    // evidence: worked example E1
    const { speed, diameter, rotation } = SPINDLE_SPEED;
    expect(sixDigits(spindleSpeed(mPerMin(speed), mm(diameter)))).toBe(rotation);
  });

  const diameters = fc.double({ min: 1, max: 500, noNaN: true }).map(mm);
  const speeds = fc.double({ min: 0.1, max: 300, noNaN: true }).map(mPerMin);

  it('and surface speed are one another’s inverse', () => {
    fc.assert(
      fc.property(speeds, diameters, (speed, diameter) => {
        const back = surfaceSpeed(spindleSpeed(speed, diameter), diameter);
        expect(back / speed).toBeCloseTo(1, 12);
      }),
    );
  });

  it('halves on twice the bar', () => {
    fc.assert(
      fc.property(speeds, diameters, (speed, diameter) => {
        const half = spindleSpeed(speed, mm(2 * diameter));
        expect((2 * half) / spindleSpeed(speed, diameter)).toBeCloseTo(1, 12);
      }),
    );
  });

  it('makes no sense without a bar', () => {
    expect(() => spindleSpeed(mPerMin(20), mm(0))).toThrow(OutOfRange);
    expect(() => spindleSpeed(mPerMin(-1), mm(20))).toThrow(OutOfRange);
    expect(() => surfaceSpeed(revPerMin(-1), mm(20))).toThrow(OutOfRange);
  });
});

describe('speed to start with', () => {
  // evidence: 100 ft/min with hardened pins (common practice), 1.5 times that with carbide and a
  // quarter of the way up the band (judgement); worked by hand: 12 + (28 − 12)/4 and so on
  it.each([
    { of: band(12, 28), process: 'form', pin: 'hardened', limit: 28, start: 16 },
    { of: band(20, 40), process: 'form', pin: 'hardened', limit: 30.48, start: 22.62 },
    { of: band(25, 60), process: 'form', pin: 'carbide', limit: 45.72, start: 30.18 },
    { of: band(20, 40), process: 'form', pin: 'carbide', limit: 40, start: 25 },
    { of: band(50, 120), process: 'cut', pin: 'hardened', limit: 120, start: 67.5 },
    { of: band(40, 60), process: 'form', pin: 'hardened', limit: 30.48, start: 30.48 },
  ] as const)('$of to $process on $pin pins: $start, limit $limit', (row) => {
    expect(speedLimit(row.of, row.process, row.pin)).toBeCloseTo(row.limit, 9);
    expect(startingSpeed(row.of, row.process, row.pin)).toBeCloseTo(row.start, 9);
  });

  it('of every material lies in its band and at or under its limit', () => {
    for (const { id, formSpeed, cutSpeed } of MATERIALS)
      for (const pin of ['hardened', 'carbide'] as const)
        for (const process of ['form', 'cut'] as const) {
          const own = process === 'form' ? formSpeed.value : cutSpeed.value;
          if (own === null) continue;
          const start = startingSpeed(own, process, pin);
          expect(start, id).toBeLessThanOrEqual(speedLimit(own, process, pin) + 1e-9);
          expect(start, id).toBeGreaterThanOrEqual(own[0] - 1e-9);
          expect(start, id).toBeLessThanOrEqual(own[1]);
        }
  });
});

describe('the check on speed', () => {
  const limit = feetPerMinute(100);

  // evidence: at or under 100 ft/min (common practice), 1.5 times the limit stops (judgement)
  it.each<[number, State]>([
    [1, 'fine'],
    [100, 'fine'],
    [100.1, 'watch'],
    [150, 'watch'],
    [150.1, 'stop'],
  ])('%d ft/min: %s', (speed, state) => {
    const found = speedCheck(feetPerMinute(speed), limit);
    expect(found.state).toBe(state);
    expect(found.figures['surfaceSpeed']).toEqual({ value: feetPerMinute(speed), unit: 'm/min' });
  });
});
