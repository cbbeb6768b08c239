import { describe, expect, it } from 'vitest';
import type { State } from '../../src/calc/check.ts';
import {
  DEFAULT_FILL,
  FULL_ENOUGH,
  fillCheck,
  OVER_FULL,
  SHALLOW_BELOW,
} from '../../src/calc/fill.ts';
import { MATERIALS } from '../../src/calc/materials/index.ts';
import { OutOfRange } from '../../src/calc/units.ts';

describe('fill', () => {
  it('is nine tenths unless said, fine from 0.70 to 0.92, watched to 0.97', () => {
    // evidence: common practice (0.90), judgement (the limits)
    expect([DEFAULT_FILL, SHALLOW_BELOW, FULL_ENOUGH, OVER_FULL]).toEqual([0.9, 0.7, 0.92, 0.97]);
  });

  it.each<[number, number | null, State, string]>([
    [0.1, null, 'watch', 'shallow'],
    [0.6999, null, 'watch', 'shallow'],
    [0.7, null, 'fine', 'within'],
    [0.9, null, 'fine', 'within'],
    [0.92, null, 'fine', 'within'],
    [0.9201, null, 'watch', 'deep'],
    [0.97, null, 'watch', 'deep'],
    [0.9701, null, 'stop', 'overFull'],
    [1, null, 'stop', 'overFull'],
    [0.85, 0.85, 'fine', 'within'],
    [0.8501, 0.85, 'watch', 'overMaterial'],
    [0.97, 0.85, 'watch', 'overMaterial'],
    [0.9701, 0.85, 'stop', 'overFull'],
    [0.6, 0.85, 'watch', 'shallow'],
    // A material's own limit never lifts the general one.
    [0.93, 0.95, 'watch', 'deep'],
  ])('%d where the material has %s: %s, %s', (fill, own, state, reason) => {
    const found = fillCheck(fill, own);
    expect([found.state, found.reason]).toEqual([state, reason]);
    expect(found.figures['fill']).toEqual({ value: fill, unit: '1' });
    expect(found.figures['fillHigh']?.value).toBe(Math.min(FULL_ENOUGH, own ?? FULL_ENOUGH));
  });

  it('a height over height is not spoilt by its last digit', () => {
    for (const sharp of [0.1, 0.3, 0.47, 0.6047619, 1.1])
      expect(fillCheck((0.7 * sharp) / sharp, null).state).toBe('fine');
  });

  it('what is advised for a material is itself fine', () => {
    for (const { maxFill } of MATERIALS)
      if (maxFill.value !== null)
        expect(fillCheck(Math.min(maxFill.value, DEFAULT_FILL), maxFill.value).state).toBe('fine');
  });

  it('is a share', () => {
    expect(() => fillCheck(-0.01, null)).toThrow(OutOfRange);
    expect(() => fillCheck(1.01, null)).toThrow(OutOfRange);
  });
});
