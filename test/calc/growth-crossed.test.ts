/**
 * Crossed grooves laid on a surface and felt out at random: the mean height that is left must be
 * where the old surface lies, which is the infeed. Nothing of the solid shares is used.
 */
import { describe, expect, it } from 'vitest';
import { formedFlat, sharpHeight } from '../../src/calc/growth/index.ts';
import { degrees, mm } from '../../src/calc/units.ts';
import { mulberry32 } from '../support/random.ts';

const POINTS = 1e6;
const PITCH = 1;
/** Many thousand pitches, so that cut-off ones at the border do not count. */
const PATCH = 2e4;

/** A point's distance from the middle of the nearest groove of a family. */
const fromGroove = (across: number): number => {
  const pitches = across / PITCH;
  return Math.abs(pitches - Math.round(pitches)) * PITCH;
};

type Cut = { readonly included: number; readonly fill: number; readonly tipFlat: number };

const CUTS: readonly Cut[] = [
  { included: 90, fill: 0.35, tipFlat: 0 },
  { included: 90, fill: 0.75, tipFlat: 0 },
  { included: 90, fill: 1, tipFlat: 0 },
  { included: 70, fill: 0.9, tipFlat: 0 },
  { included: 90, fill: 0.6, tipFlat: 0.1 },
];

/** Surface over the groove root where one family alone has pressed: flank up to the crest's flat. */
const surfaceOf = ({ included, fill, tipFlat }: Cut) => {
  const slope = Math.tan(((included / 2) * Math.PI) / 180);
  const crest = (fill * PITCH) / (2 * slope);
  return (distance: number): number =>
    Math.min(crest, Math.max(0, distance - (tipFlat * PITCH) / 2) / slope);
};

type Means = { grooves: number; raised: number; sunk: number };

/** Mean surfaces of every cut, for two families whose normals stand at these angles. */
const feelOut = (first: number, second: number, seed: number): Means[] => {
  const next = mulberry32(seed);
  const surfaces = CUTS.map(surfaceOf);
  const sums = CUTS.map((): Means => ({ grooves: 0, raised: 0, sunk: 0 }));
  for (let i = 0; i < POINTS; i++) {
    const x = next() * PATCH;
    const y = next() * PATCH;
    const d1 = fromGroove(x * Math.cos(first) + y * Math.sin(first));
    const d2 = fromGroove(x * Math.cos(second) + y * Math.sin(second));
    for (const [k, surface] of surfaces.entries()) {
      const sum = sums[k]!;
      sum.grooves += surface(d1) / POINTS;
      // Raised points stand where neither family has pressed the metal away.
      sum.raised += Math.min(surface(d1), surface(d2)) / POINTS;
      // Sunk points lie only where the grooves of both families overlap.
      sum.sunk += Math.max(surface(d1), surface(d2)) / POINTS;
    }
  }
  return sums;
};

describe.each([
  { crossing: 'helices of 30° left and right', angles: [30, -30], seed: 82 },
  { crossing: 'helices of 45° left and right', angles: [45, -45], seed: 403 },
  { crossing: 'axial and round', angles: [0, 90], seed: 951 },
] as const)('$crossing', ({ angles, seed }) => {
  const means = feelOut(degrees(angles[0]), degrees(angles[1]), seed);

  it.each(CUTS.map((cut, k) => ({ ...cut, k })))(
    'leave their mean height at the infeed: $included°, fill $fill, tip flat $tipFlat',
    ({ included, fill, tipFlat, k }) => {
      const Hf = sharpHeight(mm(PITCH), degrees(included));
      for (const form of ['grooves', 'raised', 'sunk'] as const) {
        const { infeed } = formedFlat(form, mm(fill * Hf), Hf, tipFlat);
        expect(Math.abs(means[k]![form] - infeed)).toBeLessThan(5e-4 * PITCH);
      }
    },
  );
});
