import { describe, expect, it } from 'vitest';
import type { Form } from '../../src/calc/growth/index.ts';
import {
  formOf,
  type Pattern,
  usualHelix,
  type WheelKind,
  wheelFor,
} from '../../src/calc/pattern.ts';

const DIAMOND: Pattern = { kind: 'diamond', points: 'raised' };
const SUNK: Pattern = { kind: 'diamond', points: 'sunk' };
const SQUARE: Pattern = { kind: 'square', points: 'raised' };

describe('pattern and wheel', () => {
  // evidence: DIN 82 (forms, wheels and k: 0.5, 0.67, 0.33 by how the grooves meet; read, reported)
  it.each<[string, Pattern, Form, number]>([
    ['RAA', { kind: 'straight' }, 'grooves', 0],
    ['RBL', { kind: 'diagonal', hand: 'left' }, 'grooves', 30],
    ['RBR', { kind: 'diagonal', hand: 'right' }, 'grooves', 30],
    ['RGE', DIAMOND, 'raised', 30],
    ['RGV', SUNK, 'sunk', 30],
    ['RKE', SQUARE, 'raised', 0],
    ['RKV', { kind: 'square', points: 'sunk' }, 'sunk', 0],
  ])('%s', (_, pattern, form, helix) => {
    expect(formOf(pattern)).toBe(form);
    expect((usualHelix(pattern) * 180) / Math.PI).toBeCloseTo(helix, 12);
  });

  // evidence: DIN 82: a left-hand knurl needs a right-hand wheel, raised points an indented one (read)
  it.each<[string, Pattern, boolean, boolean, WheelKind]>([
    ['straight', { kind: 'straight' }, false, false, 'straight'],
    ['straight, set over', { kind: 'straight' }, false, true, 'straightSetOver'],
    ['left-hand', { kind: 'diagonal', hand: 'left' }, false, false, 'rightHelical'],
    ['right-hand', { kind: 'diagonal', hand: 'right' }, false, false, 'leftHelical'],
    ['of no said hand', { kind: 'diagonal', hand: null }, false, false, 'helical'],
    ['left-hand, set over', { kind: 'diagonal', hand: 'left' }, false, true, 'straightSetOver'],
    ['diamond', DIAMOND, false, false, 'helicalPair'],
    ['diamond, set over', DIAMOND, false, true, 'straightPairSetOver'],
    ['diamond from one wheel', DIAMOND, true, false, 'onePieceSunk'],
    ['sunk diamond from one wheel', SUNK, true, false, 'onePieceRaised'],
    ['square', SQUARE, false, false, 'onePieceSunk'],
    ['sunk square', { kind: 'square', points: 'sunk' }, false, false, 'onePieceRaised'],
  ])('%s', (_, pattern, onePiece, setOver, wheel) => {
    expect(wheelFor(pattern, onePiece, setOver)).toBe(wheel);
  });
});
