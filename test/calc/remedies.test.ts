import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { materialById } from '../../src/calc/materials/index.ts';
import {
  NARROWEST_FACE,
  REMEDY_KINDS,
  type RemedyKind,
  type SetupRequest,
  setUp,
} from '../../src/calc/setup/index.ts';
import { MM_PER_INCH, mm, mPerMin, OutOfRange, watt } from '../../src/calc/units.ts';
import { requestOf } from '../support/setupRequest.ts';

const diamond = { kind: 'diamond', points: 'raised' } as const;
const square = { kind: 'square', points: 'raised' } as const;
const STEELS = ['steel-lowC-CD', 'ss303', 'steel-CrMo-PH', 'al6061-T6', 'brass360', 'tool-O1-ann'];

const stopsOf = (request: SetupRequest): ReadonlySet<string> =>
  new Set(
    setUp(request)
      .checks.filter((check) => check.state === 'stop')
      .map((check) => check.name),
  );

/** Null where the request makes no sense, which others test. */
const worked = (request: SetupRequest) => {
  try {
    return setUp(request);
  } catch (error) {
    if (error instanceof OutOfRange) return null;
    throw error;
  }
};

const anyRequest = fc
  .record({
    pattern: fc.constantFrom({ kind: 'straight' } as const, diamond, square),
    pitch: fc.constantFrom(0.5, 0.8, 1, 1.6).map((value) => ({ system: 'metric', value }) as const),
    stock: fc.double({ min: 4, max: 60, noNaN: true }).map(mm),
    length: fc.option(fc.double({ min: 2, max: 60, noNaN: true }).map(mm)),
    out: fc.option(fc.double({ min: 1, max: 12, noNaN: true })),
    material: fc.constantFrom(...STEELS).map((id) => materialById(id)!),
    share: fc.option(fc.double({ min: 0.3, max: 0.95, noNaN: true })),
    support: fc.constantFrom('chuck', 'tailstock', 'centres'),
    layout: fc.constantFrom(null, 'opposed'),
    power: fc.option(fc.double({ min: 10, max: 200, noNaN: true })),
    speed: fc.option(fc.double({ min: 10, max: 200, noNaN: true })),
  })
  .map(({ out, share, power, speed, ...said }) =>
    requestOf({
      ...said,
      stickout: out === null ? null : mm(Math.max(out * said.stock, said.length ?? 0)),
      bore: share === null ? null : mm(share * said.stock),
      speed: speed === null ? null : mPerMin(speed),
      machine:
        power === null
          ? null
          : { speeds: null, feeds: null, topSpeed: null, torque: null, power: watt(power) },
    }),
  );

describe('a remedy, fed back in', () => {
  it('is no longer stopped, stops nothing else and never shortens the stickout below the knurl', () => {
    let tried = 0;
    const kinds = new Set<RemedyKind>();
    fc.assert(
      fc.property(anyRequest, (request) => {
        const result = worked(request);
        if (result === null) return;
        const before = stopsOf(request);
        for (const remedy of result.remedies) {
          tried += 1;
          kinds.add(remedy.kind);
          const after = stopsOf({ ...request, ...remedy.change });
          expect(after).not.toContain(remedy.check);
          for (const name of after) expect(before).toContain(name);
          if (remedy.kind === 'stickout')
            expect(remedy.number!.value).toBeGreaterThanOrEqual(request.length ?? 0);
        }
      }),
      { numRuns: 600, seed: 7 },
    );
    expect(tried).toBeGreaterThan(300);
    expect([...kinds].sort()).toEqual([...REMEDY_KINDS].sort());
  });

  it('is there for every stop of bending, tube and pin', () => {
    fc.assert(
      fc.property(anyRequest, (request) => {
        const result = worked(request);
        if (result === null) return;
        for (const check of result.checks) {
          const needsOne = ['bending', 'ring', 'pinHeat'].includes(check.name);
          if (check.state !== 'stop' || !needsOne) continue;
          expect(result.remedies.map((remedy) => remedy.check)).toContain(check.name);
        }
      }),
      { numRuns: 300, seed: 11 },
    );
  });

  it('holds as printed in inches and in millimetres', () => {
    fc.assert(
      fc.property(anyRequest, (request) => {
        const remedy = worked(request)?.remedies.find(({ kind }) => kind === 'stickout');
        if (remedy === undefined) return;
        const printed = Number((remedy.number!.value / MM_PER_INCH).toFixed(4)) * MM_PER_INCH;
        const after = stopsOf({ ...request, stickout: mm(printed) });
        expect(after).not.toContain('bending');
      }),
      { numRuns: 300, seed: 13 },
    );
  });
});

describe('the smallest change', () => {
  const slender = requestOf({ stock: mm(10), stickout: mm(80) });

  it('is the largest stickout: a little more is stopped again', () => {
    const remedy = setUp(slender).remedies.find(({ kind }) => kind === 'stickout')!;
    const out = remedy.number!.value;
    expect(remedy.words).toBe(`out ${out} mm`);
    expect(stopsOf({ ...slender, stickout: mm(out + 0.2) })).toContain('bending');
  });

  it('is the widest face: the next half millimetre is stopped', () => {
    const remedy = setUp(slender).remedies.find(({ kind }) => kind === 'narrowerWheel')!;
    const face = remedy.number!.value;
    expect(remedy.words).toBe(`wheel 20x${face}x6 mm`);
    expect(face).toBeGreaterThanOrEqual(NARROWEST_FACE);
    const wider = { ...slender.wheel, face: mm(face + 0.5) };
    expect(stopsOf({ ...slender, wheel: wider })).toContain('bending');
  });

  it('is the fewest turns: one less is stopped', () => {
    const at = (stickout: number) => requestOf({ stock: mm(10), stickout: mm(stickout) });
    const found = Array.from({ length: 80 }, (_, i) => at(20 + i * 0.5)).find((request) =>
      setUp(request).remedies.some(({ kind }) => kind === 'moreTurns'),
    )!;
    const remedy = setUp(found).remedies.find(({ kind }) => kind === 'moreTurns')!;
    const turns = remedy.number!.value;
    expect(remedy.words).toBe(`${turns} turns`);
    expect(stopsOf({ ...found, turns: turns - 1 })).toContain('bending');
  });

  it('stands on the stopped check as numbers', () => {
    const { checks, remedies } = setUp(slender);
    const bending = checks.find(({ name }) => name === 'bending')!;
    const number = (kind: RemedyKind) => remedies.find((remedy) => remedy.kind === kind)!.number;
    expect(bending.figures['largestStickout']).toEqual(number('stickout'));
    expect(bending.figures['narrowerFace']).toEqual(number('narrowerWheel'));
  });

  it('slows a hot pin no less than the speed itself has to', () => {
    const hot = requestOf({
      stock: mm(200),
      pitch: { system: 'metric', value: 1.6 },
      material: materialById('steel-CrMo-ann')!,
      speed: mPerMin(90),
    });
    expect(stopsOf(hot)).toEqual(new Set(['speed', 'pinHeat']));
    const remedy = setUp(hot).remedies.find(({ kind }) => kind === 'slower')!;
    expect(stopsOf({ ...hot, ...remedy.change })).toEqual(new Set());
  });

  it('offers no cut where cutting cannot be: a crossed wheel does not travel', () => {
    const crossed = requestOf({ ...slender, pattern: square });
    const kinds = setUp(crossed).remedies.map(({ kind }) => kind);
    expect(kinds).toContain('opposed');
    expect(kinds).not.toContain('cut');
  });

  it('is a plug, or a cut, where a tube is too thin to be pinched', () => {
    const tube = requestOf({ stock: mm(25), bore: mm(22) });
    const kinds = setUp(tube).remedies.map(({ kind, check }) => `${check} ${kind}`);
    expect(kinds).toEqual(expect.arrayContaining(['ring plug', 'ring cut']));
  });
});
