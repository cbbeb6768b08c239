import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formedRound, sharpHeight } from '../../src/calc/growth/index.ts';
import { materialById } from '../../src/calc/materials/index.ts';
import { formOf, type Pattern } from '../../src/calc/pattern.ts';
import {
  resolvePitch,
  type SetupFigureName,
  type SetupRequest,
  type SetupResult,
  setUp,
} from '../../src/calc/setup/index.ts';
import { wholeToothDiameter } from '../../src/calc/teeth.ts';
import { inch, mm, OutOfRange } from '../../src/calc/units.ts';
import { requestOf } from '../support/setupRequest.ts';

const valueOf = (result: SetupResult, name: SetupFigureName): number =>
  result.figures[name]?.value ?? Number.NaN;
const finishOf = (result: SetupResult) => result.checks.find(({ name }) => name === 'finish');

/** Expected share of the static growth before a shop has any results of its own. */
const EXPECTED = 0.95;

/** Crest of every whole count, worked out one by one. */
const crestAt = (request: SetupRequest, teeth: number, fill: number): number => {
  const { normal, transverse } = resolvePitch(request);
  const sharp = sharpHeight(normal, request.included);
  const blankDiameter = wholeToothDiameter(teeth, transverse);
  if (request.process === 'cut') return blankDiameter;
  const form = formOf(request.pattern);
  const height = mm(fill * sharp);
  const { growth } = formedRound({ form, blankDiameter, height, sharpHeight: sharp });
  return blankDiameter + EXPECTED * growth;
};

const PATTERNS: readonly Pattern[] = [
  { kind: 'straight' },
  { kind: 'diagonal', hand: null },
  { kind: 'diamond', points: 'raised' },
  { kind: 'diamond', points: 'sunk' },
  { kind: 'square', points: 'raised' },
];

const prints = fc
  .record({
    pattern: fc.constantFrom(...PATTERNS),
    pitch: fc.double({ min: 0.4, max: 2, noNaN: true }),
    process: fc.constantFrom('form' as const, 'cut' as const),
    middle: fc.double({ min: 15, max: 100, noNaN: true }),
    spread: fc.double({ min: 0.002, max: 0.6, noNaN: true }),
    /** The bar beside it, as a share of the middle; null: none said. */
    bar: fc.option(fc.double({ min: 0.9, max: 1.2, noNaN: true }), { nil: null }),
  })
  .map(({ pattern, pitch, process, middle, spread, bar }) =>
    requestOf({
      pattern,
      process,
      pitch: { system: 'metric', value: pitch },
      stock: bar === null ? null : mm(bar * middle),
      finish: { low: mm(middle - spread / 2), high: mm(middle + spread / 2) },
    }),
  );

const isInside = (crest: number, { finish }: SetupRequest): boolean =>
  crest >= finish!.low - 1e-9 && crest <= finish!.high + 1e-9;

describe('a blank for a print', () => {
  it('is the whole count whose crest at the usual fill comes nearest the middle', () => {
    fc.assert(
      fc.property(prints, (request) => {
        const result = setUp(request);
        const target = (request.finish!.low + request.finish!.high) / 2;
        const taken = Math.abs(crestAt(request, result.blank.teeth, 0.9) - target);
        for (const other of [-3, -2, -1, 1, 2, 3]) {
          const teeth = result.blank.teeth + other;
          const { transverse } = resolvePitch(request);
          if (request.stock !== null && wholeToothDiameter(teeth, transverse) > request.stock)
            continue;
          const off = Math.abs(crestAt(request, teeth, 0.9) - target);
          expect(off).toBeGreaterThanOrEqual(taken - 1e-9);
        }
      }),
      { numRuns: 300 },
    );
  });

  it('is never more than the bar beside it', () => {
    fc.assert(
      fc.property(prints, (request) => {
        fc.pre(request.stock !== null);
        const blank = valueOf(setUp(request), 'blankDiameter');
        expect(blank).toBeLessThanOrEqual(request.stock * (1 + 1e-12));
      }),
    );
  });

  it('keeps the usual fill inside the limits; outside them the fill moves as far as it may', () => {
    fc.assert(
      fc.property(prints, (request) => {
        const result = setUp(request);
        const { teeth, tooth, fillMoved } = result.blank;
        const usual = crestAt(request, teeth, 0.9);
        expect(fillMoved).toBe(!isInside(usual, request) && request.process === 'form');
        if (!fillMoved) {
          expect(tooth.fill).toBe(0.9);
          return;
        }
        expect(tooth.fill).toBeGreaterThanOrEqual(0.7 - 1e-9);
        expect(tooth.fill).toBeLessThanOrEqual(0.92 + 1e-9);
        // Whatever fill could bring the crest nearer, it is the one taken.
        const target = (request.finish!.low + request.finish!.high) / 2;
        const off = Math.abs(tooth.crest - target);
        for (let fill = 0.7; fill <= 0.92; fill += 0.01)
          expect(Math.abs(crestAt(request, teeth, fill) - target)).toBeGreaterThan(off - 1e-6);
      }),
      { numRuns: 300 },
    );
  });

  it('stops where even that does not do, and says by how much', () => {
    fc.assert(
      fc.property(prints, (request) => {
        const result = setUp(request);
        const { low, high } = request.finish!;
        const crest = valueOf(result, 'crestDiameter');
        const check = finishOf(result)!;
        const outside = Math.max(low - crest, crest - high, 0);
        expect(check.state === 'stop').toBe(outside > 1e-9);
        expect(check.figures['outsideBy']?.value).toBeCloseTo(outside, 9);
        if (check.state === 'stop') expect(check.reason).toBe(crest > high ? 'over' : 'under');
        if (check.state === 'fine') {
          expect(valueOf(result, 'crestDiameterLow')).toBeGreaterThanOrEqual(low - 1e-9);
          expect(valueOf(result, 'crestDiameterHigh')).toBeLessThanOrEqual(high + 1e-9);
        }
      }),
      { numRuns: 300 },
    );
  });
});

describe('prints as shops have them', () => {
  const straight = requestOf({ pitch: { system: 'dp', value: 96 }, stock: null });

  it('finish 0.995 to 1.005 in, straight 96 DP', () => {
    // evidence: derived. A step is 1/96 in; blank N/96 in grows 0.95 · 0.81 · 0.5 p = 0.01259 in on
    // flat work: 94/96 in comes to 0.9917, 95/96 to 1.0021, 96/96 to 1.0125
    const result = setUp({ ...straight, finish: { low: inch(0.995), high: inch(1.005) } });
    expect(valueOf(result, 'toothCount')).toBe(95);
    expect((valueOf(result, 'crestDiameter') / 25.4).toFixed(3)).toBe('1.002');
    expect(result.blank.fillMoved).toBe(false);
    expect(finishOf(result)?.state).toBe('fine');
  });

  it('limits narrower than the spread are watched', () => {
    const result = setUp({ ...straight, finish: { low: inch(1.0015), high: inch(1.0025) } });
    expect(finishOf(result)).toMatchObject({ state: 'watch', reason: 'spread' });
  });

  it('a bar beside it is the cap: a stop that says by how much', () => {
    const result = setUp({
      ...straight,
      stock: inch(0.97),
      finish: { low: inch(0.995), high: inch(1.005) },
    });
    expect(valueOf(result, 'toothCount')).toBe(93);
    expect(valueOf(result, 'fill')).toBe(0.92);
    expect(finishOf(result)).toMatchObject({ state: 'stop', reason: 'under' });
    const short = finishOf(result)!.figures['outsideBy']!.value / 25.4;
    expect(short).toBeCloseTo(0.995 - valueOf(result, 'crestDiameter') / 25.4, 9);
    expect(short).toBeGreaterThan(0.01);
  });

  it('a fill that was asked for stays', () => {
    const result = setUp({
      ...straight,
      fill: 0.8,
      finish: { low: inch(1.004), high: inch(1.005) },
    });
    expect(valueOf(result, 'fill')).toBe(0.8);
    expect(result.blank.fillMoved).toBe(false);
  });

  it('a count that was asked for stays, and its fill moves', () => {
    const asked = { ...straight, wantedTeeth: 95, finish: { low: inch(0.9985), high: inch(1.0) } };
    const result = setUp(asked);
    expect(valueOf(result, 'toothCount')).toBe(95);
    expect(result.blank.fillMoved).toBe(true);
    expect(finishOf(result)?.state).not.toBe('stop');
    expect(valueOf(result, 'crestDiameter') / 25.4).toBeCloseTo(0.99925, 6);
  });

  it('a material’s own fill is as deep as it goes', () => {
    // evidence: 0.80 for 7075 (table of materials)
    const result = setUp({
      ...straight,
      material: materialById('al7075-T6')!,
      wantedTeeth: 95,
      finish: { low: inch(1.003), high: inch(1.004) },
    });
    expect(valueOf(result, 'fill')).toBeCloseTo(0.8, 9);
    expect(finishOf(result)).toMatchObject({ state: 'stop', reason: 'under' });
  });

  it('a larger blank is offered only up to what bar and print allow', () => {
    const print = { low: inch(0.995), high: inch(1.005) };
    const free = setUp({ ...straight, finish: print });
    expect(free.larger?.toothCount).toBe(96);
    expect(setUp({ ...straight, finish: print, stock: inch(0.99) }).larger).toBeNull();
    expect(setUp(requestOf({ wantedTeeth: 60 })).larger?.toothCount).toBe(61);
    expect(setUp(requestOf()).larger).toBeNull();
  });

  it('a print too small for three teeth is out of range', () => {
    const tiny = { low: mm(1), high: mm(1.1) };
    const pitch = { system: 'metric', value: 2 } as const;
    expect(() => setUp(requestOf({ stock: null, finish: tiny, pitch }))).toThrow(OutOfRange);
  });
});
