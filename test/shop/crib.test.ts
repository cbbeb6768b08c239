/** What a wheel of the crib can leave, and what a machine's dial shows of it. */
import { describe, expect, it } from 'vitest';
import {
  cribPitch,
  DEFAULT_WHEEL,
  mm,
  type Pattern,
  revPerMin,
  watt,
  wheelFor,
} from '../../src/calc/index.ts';
import {
  BARE_WHEEL,
  canLeave,
  cribFor,
  limitsOf,
  onDial,
  sizeOf,
  type Wheel,
} from '../../src/shop/index.ts';
import { ENGINE_LATHE, STRAIGHT } from './contract/samples.ts';

const wheel = (name: string, form: Wheel['form'], more: Partial<Wheel> = {}): Wheel => ({
  ...BARE_WHEEL,
  name,
  form,
  pitch: { system: 'metric', value: 0.8 },
  ...more,
});

const CRIB: readonly Wheel[] = [
  STRAIGHT,
  wheel('L', 'leftHelical'),
  wheel('R', 'rightHelical', { face: mm(6) }),
  wheel('R 1.0', 'rightHelical', { pitch: { system: 'metric', value: 1 } }),
  wheel('sunk', 'onePieceSunk'),
  wheel('raised', 'onePieceRaised'),
  wheel('broken', 'straight', { state: 'damaged' }),
  wheel('lent', 'straight', { state: 'away' }),
];

const names = (pattern: Pattern): readonly string[] =>
  cribFor(CRIB, pattern).map(({ name }) => name);

describe('the crib', () => {
  it('gives the wheels that leave a pattern, and pairs that are labelled alike', () => {
    expect(names({ kind: 'straight' })).toEqual(['Old Faithful']);
    expect(names({ kind: 'diagonal', hand: 'right' })).toEqual(['L']);
    expect(names({ kind: 'diagonal', hand: 'left' })).toEqual(['R', 'R 1.0']);
    expect(names({ kind: 'diagonal', hand: null })).toEqual(['L', 'R', 'R 1.0']);
    expect(names({ kind: 'diamond', points: 'raised' })).toEqual(['sunk', 'L + R']);
    expect(names({ kind: 'diamond', points: 'sunk' })).toEqual(['raised']);
    expect(names({ kind: 'square', points: 'raised' })).toEqual(['sunk']);
  });

  it('agrees with DIN 82 about which wheel forms what, as the set-up says it', () => {
    // source: DIN 82: a left-hand knurl needs a right-hand wheel, raised points a sunk wheel.
    const patterns: readonly Pattern[] = [
      { kind: 'straight' },
      { kind: 'diagonal', hand: 'left' },
      { kind: 'diagonal', hand: 'right' },
      { kind: 'square', points: 'raised' },
      { kind: 'square', points: 'sunk' },
    ];
    for (const pattern of patterns) {
      const form = wheelFor(pattern, true, false) as Wheel['form'];
      expect([form, canLeave(form, pattern)]).toEqual([form, true]);
    }
  });

  it('believes the count over the label, and the narrower face of a pair', () => {
    const [counted] = cribFor(CRIB, { kind: 'straight' });
    // 19.05 mm and 63 teeth: π · 19.05 / 63.
    expect(counted === undefined ? 0 : cribPitch(counted).normal).toBeCloseTo(0.949958, 6);
    const pair = cribFor(CRIB, { kind: 'diamond', points: 'raised' })[1];
    expect(pair?.size.face).toBe(6);
  });

  it('takes the usual size where nobody has measured, with a bore that fits', () => {
    expect(sizeOf(wheel('x', 'straight'))).toEqual(DEFAULT_WHEEL);
    expect(sizeOf(wheel('x', 'straight', { diameter: mm(10) })).bore).toBe(3);
  });
});

describe('a machine', () => {
  it('shows the infeed as its dial is marked', () => {
    expect(onDial({ dial: 'radius' }, mm(0.3))).toBe(0.3);
    expect(onDial({ dial: 'diameter' }, mm(0.3))).toBe(0.6);
  });

  it('gives the set-up its gears and its limits', () => {
    expect(limitsOf(ENGINE_LATHE)).toEqual({
      speeds: ENGINE_LATHE.speeds,
      feeds: ENGINE_LATHE.feeds,
      topSpeed: revPerMin(500),
      torque: null,
      power: watt(5500),
    });
  });
});
