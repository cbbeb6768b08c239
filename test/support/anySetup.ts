/** Set-ups over the whole range of what can be asked, for laws that hold of every one of them. */
import fc from 'fast-check';
import { MATERIALS } from '../../src/calc/materials/index.ts';
import type { Pattern } from '../../src/calc/pattern.ts';
import type { Pitch } from '../../src/calc/pitch.ts';
import { DEFAULT_WHEEL, resolvePitch, type SetupRequest } from '../../src/calc/setup/index.ts';
import { wholeToothDiameter } from '../../src/calc/teeth.ts';
import { degrees, MM_PER_INCH, mm, mPerMin } from '../../src/calc/units.ts';
import { requestOf } from './setupRequest.ts';

const real = (min: number, max: number): fc.Arbitrary<number> =>
  fc.double({ min, max, noNaN: true });
const maybe = <T>(what: fc.Arbitrary<T>): fc.Arbitrary<T | null> =>
  fc.option(what, { nil: null, freq: 1 });

const patterns = fc.constantFrom<Pattern[]>(
  { kind: 'straight' },
  { kind: 'diagonal', hand: 'left' },
  { kind: 'diagonal', hand: null },
  { kind: 'diamond', points: 'raised' },
  { kind: 'diamond', points: 'sunk' },
  { kind: 'square', points: 'raised' },
  { kind: 'square', points: 'sunk' },
);

/** A pitch of 0.4 to 2 mm as each system labels it. */
const pitches: fc.Arbitrary<Pitch> = real(0.4, 2).chain((t) =>
  fc.constantFrom<Pitch[]>(
    { system: 'metric', value: t },
    { system: 'tpi', value: MM_PER_INCH / t },
    { system: 'dp', value: (MM_PER_INCH * Math.PI) / t },
    { system: 'module', value: t / Math.PI },
  ),
);

const isHelical = ({ kind }: Pattern): boolean => kind === 'diagonal' || kind === 'diamond';

const angles = (pattern: Pattern): fc.Arbitrary<Pick<SetupRequest, 'helix' | 'tilt'>> => {
  const usual = { helix: null, tilt: null };
  const swivelled = real(1, 45).map((tilt) => ({ helix: null, tilt: degrees(tilt) }));
  const steep = real(5, 50).map((helix) => ({ helix: degrees(helix), tilt: null }));
  if (pattern.kind === 'square') return fc.constant(usual);
  return isHelical(pattern)
    ? fc.oneof(fc.constant(usual), steep, swivelled)
    : fc.oneof(fc.constant(usual), swivelled);
};

const besides = fc.record({
  alongRim: fc.boolean(),
  included: real(60, 120).map(degrees),
  material: fc.constantFrom(...MATERIALS),
  hardness: maybe(real(40, 500)),
  process: fc.constantFrom('form' as const, 'cut' as const, null),
  fill: maybe(real(0.1, 1)),
  length: maybe(real(1, 150).map(mm)),
  wheel: real(2, 20).map((face) => ({ ...DEFAULT_WHEEL, face: mm(face) })),
  edge: fc.constantFrom('bevelled' as const, 'square' as const, 'convex' as const, null),
  pin: fc.constantFrom('hardened' as const, 'carbide' as const),
  onePiece: fc.boolean(),
  layout: fc.constantFrom('oneSided' as const, 'opposed' as const, null),
  speed: maybe(real(1, 200).map(mPerMin)),
  turns: maybe(fc.integer({ min: 5, max: 60 })),
  batch: fc.integer({ min: 1, max: 1000 }),
  runout: maybe(real(0, 0.3).map(mm)),
  asIs: fc.boolean(),
});

/** A bar that takes this many teeth, whole or not. */
const barOf = (request: SetupRequest, teeth: number): SetupRequest['stock'] =>
  wholeToothDiameter(teeth, resolvePitch(request).transverse);

export const anySetup: fc.Arbitrary<SetupRequest> = fc
  .tuple(patterns, pitches, besides, real(14, 300))
  .chain(([pattern, pitch, beside, teeth]) =>
    angles(pattern).map((angle) => {
      const request = requestOf({ pattern, pitch, ...beside, ...angle });
      return { ...request, stock: barOf(request, teeth) };
    }),
  )
  .filter(({ stock }) => stock !== null && stock <= 500);
