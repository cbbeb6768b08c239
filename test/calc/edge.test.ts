import { describe, expect, it } from 'vitest';
import type { State } from '../../src/calc/check.ts';
import { type Edge, edgeCheck, type Travel } from '../../src/calc/edge.ts';
import type { Process } from '../../src/calc/speed.ts';

describe('edge of the wheel', () => {
  // evidence: square edges plunge only and one-piece crossed wheels too (from memory); bevelled may
  // travel, convex are for axial forming (common practice); other edges than square in a cut: judgement
  it.each<[Edge, Travel, Process, boolean, State, string]>([
    ['bevelled', 'plunge', 'form', false, 'fine', 'bevelledPlunge'],
    ['bevelled', 'traverse', 'form', false, 'fine', 'bevelledTravel'],
    ['square', 'plunge', 'form', false, 'fine', 'squarePlunge'],
    ['square', 'traverse', 'form', false, 'stop', 'squareTravel'],
    ['convex', 'plunge', 'form', false, 'watch', 'convexPlunge'],
    ['convex', 'traverse', 'form', false, 'fine', 'convexTravel'],
    ['bevelled', 'plunge', 'form', true, 'fine', 'bevelledPlunge'],
    ['bevelled', 'traverse', 'form', true, 'stop', 'onePieceTravel'],
    ['square', 'plunge', 'form', true, 'fine', 'squarePlunge'],
    ['square', 'traverse', 'form', true, 'stop', 'onePieceTravel'],
    ['convex', 'plunge', 'form', true, 'watch', 'convexPlunge'],
    ['convex', 'traverse', 'form', true, 'stop', 'onePieceTravel'],
    ['square', 'traverse', 'cut', false, 'fine', 'squareCut'],
    ['bevelled', 'traverse', 'cut', false, 'watch', 'notSquareCut'],
    ['convex', 'traverse', 'cut', false, 'watch', 'notSquareCut'],
    ['square', 'traverse', 'cut', true, 'stop', 'onePieceTravel'],
  ])('%s to %s, %s, crossed wheel %s: %s, %s', (edge, travel, process, onePiece, state, reason) => {
    expect(edgeCheck({ edge, travel, process, onePiece })).toEqual({
      name: 'edge',
      state,
      reason,
      figures: {},
    });
  });
});
