import { describe, expect, it } from 'vitest';
import { MATERIALS, materialById } from '../../src/calc/materials/index.ts';
import {
  type MachineLimits,
  type SetupFigureName,
  type SetupRequest,
  type SetupResult,
  setUp,
} from '../../src/calc/setup/index.ts';
import { feetPerMinute, mm, mmPerRev, mPerMin, revPerMin } from '../../src/calc/units.ts';
import { requestOf } from '../support/setupRequest.ts';

const valueOf = (result: SetupResult, name: SetupFigureName): number =>
  result.figures[name]?.value ?? Number.NaN;
const check = (result: SetupResult, name: string): string => {
  const found = result.checks.find((each) => each.name === name);
  return found === undefined ? 'absent' : `${found.state} ${found.reason}`;
};
const absent = (result: SetupResult, names: readonly SetupFigureName[]): void => {
  for (const name of names) expect(result.figures[name], name).toBeNull();
};
/** Metric 1.0 straight on a bar of 25 mm. */
const of = (id: string, said: Partial<SetupRequest> = {}): SetupResult =>
  setUp(
    requestOf({
      material: materialById(id)!,
      pitch: { system: 'metric', value: 1 },
      stock: mm(25),
      ...said,
    }),
  );

describe('a plunge', () => {
  // evidence: middle of 10–20, 8–15, 5–10 turns (common practice)
  it.each([
    ['steel-lowC-CD', 'low', 15],
    ['steel-medC-HR', 'medium', 12],
    ['ss304', 'high', 8],
  ] as const)('of %s, %s hardening: %d turns, no feed and no passes', (id, hardening, turns) => {
    expect(materialById(id)?.hardeningClass).toBe(hardening);
    const result = of(id);
    expect(result.motion.travel).toBe('plunge');
    expect(valueOf(result, 'turns')).toBe(turns);
    absent(result, ['feed', 'feedLow', 'feedHigh', 'passes']);
    expect(check(result, 'feed')).toBe('absent');
    expect(valueOf(result, 'time')).toBeCloseTo((60 * turns) / valueOf(result, 'spindleSpeed'), 9);
  });

  it('is what a knurl no longer than the contact width is', () => {
    // evidence: contact width 8 − 2 × 1 mm
    expect(of('steel-lowC-CD', { length: mm(6) }).motion.travel).toBe('plunge');
    expect(of('steel-lowC-CD', { length: mm(6.01) }).motion.travel).toBe('traverse');
    const square = { edge: 'square', length: mm(8) } as const;
    expect(of('steel-lowC-CD', square).motion.travel).toBe('plunge');
  });

  it('takes the turns that were asked for', () => {
    const result = of('steel-lowC-CD', { turns: 18, batch: 50 });
    expect(valueOf(result, 'turns')).toBe(18);
    const each = (60 * 18) / valueOf(result, 'spindleSpeed');
    expect(valueOf(result, 'time')).toBeCloseTo(50 * each, 9);
    const { infeed, firstBite, infeedPerTurn } = result.figures;
    expect(firstBite!.value + 14 * infeedPerTurn!.value).toBeCloseTo(infeed!.value, 9);
  });
});

describe('a traverse', () => {
  const LONG = { length: mm(30) };

  // evidence: [b/most, b/fewest] in 0.13 to 0.76 and under 0.76 min(1, 1/p), the middle taken; b = 6,
  // p = 1: low [0.3, 0.6], medium [0.4, 0.75], high [0.6, 0.76]
  it.each([
    ['steel-lowC-CD', 0.3, 0.6, 0.45],
    ['steel-medC-HR', 0.4, 0.75, 0.575],
    ['ss304', 0.6, 0.76, 0.68],
  ] as const)('of %s: %d to %d, %d mm/rev', (id, low, high, feed) => {
    const result = of(id, LONG);
    expect(valueOf(result, 'feedLow')).toBeCloseTo(low, 12);
    expect(valueOf(result, 'feedHigh')).toBeCloseTo(high, 12);
    expect(valueOf(result, 'feed')).toBeCloseTo(feed, 12);
    expect(valueOf(result, 'turns')).toBeCloseTo(6 / feed, 12);
    expect(valueOf(result, 'passes')).toBe(1);
    absent(result, ['infeedPerTurn']);
    const time = (60 * (30 + 6)) / (feed * valueOf(result, 'spindleSpeed'));
    expect(valueOf(result, 'time')).toBeCloseTo(time, 9);
    expect(check(result, 'feed')).toBe('fine within');
    expect(valueOf(of(id, { ...LONG, batch: 7 }), 'time')).toBeCloseTo(7 * time, 9);
  });

  it('of a wide wheel at a coarse pitch has no feed that does: the cap, watched', () => {
    // evidence: 0.76/2 = 0.38 against 18/20 = 0.9 and more; 0.38 · 20 = 7.6 mm would do
    const wheel = { diameter: mm(20), face: mm(20), bore: mm(6), bevel: null };
    const result = of('steel-lowC-CD', {
      length: mm(60),
      wheel,
      pitch: { system: 'metric', value: 2 },
    });
    expect(valueOf(result, 'feed')).toBeCloseTo(0.38, 12);
    expect(check(result, 'feed')).toBe('watch noWindow');
    const found = result.checks.find(({ name }) => name === 'feed');
    expect(found?.figures['openingWidth']?.value).toBeCloseTo(7.6, 9);
  });

  it('of a narrow wheel has none either: never under 0.13', () => {
    // evidence: 1/10 = 0.10 is slower than 0.13
    const wheel = { diameter: mm(20), face: mm(1), bore: mm(6), bevel: mm(0) };
    const result = of('steel-lowC-CD', { ...LONG, wheel, edge: 'convex' });
    expect(valueOf(result, 'feed')).toBe(0.13);
    expect(check(result, 'feed')).toBe('watch noWindow');
  });

  it('takes the feed, or the turns, that were asked for', () => {
    const fed = of('steel-lowC-CD', { ...LONG, feed: mmPerRev(0.5) });
    expect(valueOf(fed, 'feed')).toBe(0.5);
    expect(check(fed, 'feed')).toBe('fine within');
    expect(check(of('steel-lowC-CD', { ...LONG, feed: mmPerRev(0.25) }), 'feed')).toBe(
      'watch asked',
    );
    const turned = of('steel-lowC-CD', { ...LONG, turns: 12 });
    expect(valueOf(turned, 'feed')).toBeCloseTo(0.5, 12);
    expect(valueOf(turned, 'turns')).toBeCloseTo(12, 12);
  });

  it('with square edges or a crossed wheel stops', () => {
    expect(check(of('steel-lowC-CD', { ...LONG, edge: 'square' }), 'edge')).toBe(
      'stop squareTravel',
    );
    const square = { pattern: { kind: 'square', points: 'raised' }, length: mm(30) } as const;
    expect(check(of('steel-lowC-CD', square), 'edge')).toBe('stop onePieceTravel');
    const diamond = { kind: 'diamond', points: 'raised' } as const;
    expect(check(of('steel-lowC-CD', { ...LONG, pattern: diamond }), 'edge')).toBe(
      'fine bevelledTravel',
    );
    const one = { ...LONG, pattern: diamond, onePiece: true };
    expect(check(of('steel-lowC-CD', one), 'edge')).toBe('stop onePieceTravel');
  });
});

describe('a cut', () => {
  it('travels at 0.15 mm/rev on square edges; its crest is the blank', () => {
    // evidence: 0.05 to 0.30, 0.15 unless said (judgement)
    const result = of('steel-lowC-CD', { process: 'cut', length: mm(30) });
    expect(result.motion.travel).toBe('traverse');
    expect(valueOf(result, 'feed')).toBe(0.15);
    expect([valueOf(result, 'feedLow'), valueOf(result, 'feedHigh')]).toEqual([0.05, 0.3]);
    expect(valueOf(result, 'crestDiameter')).toBe(valueOf(result, 'blankDiameter'));
    expect(valueOf(result, 'infeed')).toBe(valueOf(result, 'toothHeight'));
    expect(valueOf(result, 'fullInfeed')).toBe(valueOf(result, 'sharpHeight'));
    expect(valueOf(result, 'passes')).toBe(1);
    absent(result, ['turns', 'growthFactor', 'infeedPerTurn']);
    expect(check(result, 'edge')).toBe('fine squareCut');
    // Contact width of a wheel without bevels: all of its face.
    const time = (60 * (30 + 8)) / (0.15 * valueOf(result, 'spindleSpeed'));
    expect(valueOf(result, 'time')).toBeCloseTo(time, 9);
  });

  it('of unknown length takes unknown time', () => {
    absent(of('steel-lowC-CD', { process: 'cut' }), ['time']);
  });

  it('with other edges is watched, and so is another feed', () => {
    const cut = { process: 'cut', length: mm(30) } as const;
    expect(check(of('steel-lowC-CD', { ...cut, edge: 'bevelled' }), 'edge')).toBe(
      'watch notSquareCut',
    );
    expect(check(of('steel-lowC-CD', { ...cut, feed: mmPerRev(0.4) }), 'feed')).toBe('watch asked');
  });
});

describe('form or cut', () => {
  it('every material that does not form is cut without being asked, at its own speeds', () => {
    for (const { id, formKnurl, cutSpeed } of MATERIALS) {
      const result = of(id);
      const cuts = formKnurl === 'no';
      expect([result.process, result.switchedToCut], id).toEqual([cuts ? 'cut' : 'form', cuts]);
      if (!cuts) continue;
      const [low, high] = cutSpeed.value;
      // evidence: a quarter of the way up the band (judgement), no cap
      expect(valueOf(result, 'surfaceSpeed')).toBeCloseTo(low + 0.25 * (high - low), 9);
      expect(check(result, 'material')).toBe('fine cuts');
    }
  });

  it('a material that does not form, asked to be formed: a stop without speed or time', () => {
    for (const { id, formKnurl } of MATERIALS) {
      if (formKnurl !== 'no') continue;
      for (const length of [null, mm(30)]) {
        const result = of(id, { process: 'form', length });
        expect(check(result, 'material'), id).toBe('stop doesNotForm');
        expect(result.switchedToCut).toBe(false);
        absent(result, ['surfaceSpeed', 'spindleSpeed', 'time']);
        expect(check(result, 'speed')).toBe('absent');
      }
    }
  });

  it('a bar that was hardened is cut, and one that was softened is formed', () => {
    // evidence: HB over 300 does not form, 250 to 300 poorly (common practice)
    expect(of('steel-CrMo-ann', { hardness: 320 }).switchedToCut).toBe(true);
    expect(check(of('steel-CrMo-ann', { hardness: 270 }), 'material')).toBe('watch marginal');
    expect(of('ss17-4-A', { hardness: 290 }).process).toBe('form');
    const asked = of('steel-CrMo-ann', { hardness: 320, process: 'form' });
    expect(check(asked, 'material')).toBe('stop doesNotForm');
  });
});

describe('spindle speed and feed of the machine in hand', () => {
  const machine = (limits: Partial<MachineLimits>): MachineLimits => ({
    speeds: null,
    feeds: null,
    topSpeed: null,
    torque: null,
    power: null,
    ...limits,
  });
  const gears = { list: [60, 90, 160, 280, 450].map(revPerMin) };

  it('is the gear at or under the speed wanted', () => {
    const free = of('steel-lowC-CD');
    expect(valueOf(free, 'surfaceSpeed')).toBeCloseTo(22.62, 9);
    expect(valueOf(free, 'spindleSpeed')).toBeGreaterThan(280);
    const geared = of('steel-lowC-CD', { machine: machine({ speeds: gears }) });
    expect(valueOf(geared, 'spindleSpeed')).toBe(280);
    const exact = { rotation: revPerMin(160), machine: machine({ speeds: gears }) };
    expect(valueOf(of('steel-lowC-CD', exact), 'spindleSpeed')).toBe(160);
  });

  it('is the slowest gear where all are faster, and the check judges it', () => {
    const fast = { list: [900, 1200].map(revPerMin) };
    const geared = of('steel-lowC-CD', { machine: machine({ speeds: fast }) });
    expect(valueOf(geared, 'spindleSpeed')).toBe(900);
    expect(check(geared, 'speed')).toBe('stop farOverLimit');
  });

  it('is anything between the ends of a drive without gears', () => {
    const drive = { slowest: revPerMin(50), fastest: revPerMin(200) };
    const driven = (rotation: number) =>
      valueOf(
        of('steel-lowC-CD', {
          rotation: revPerMin(rotation),
          machine: machine({ speeds: drive }),
        }),
        'spindleSpeed',
      );
    expect([20, 123, 500].map(driven)).toEqual([50, 123, 200]);
  });

  it('feeds likewise', () => {
    const feeds = { list: [0.1, 0.2, 0.4, 0.8].map(mmPerRev) };
    const result = of('steel-lowC-CD', { length: mm(30), machine: machine({ feeds }) });
    expect(valueOf(result, 'feed')).toBe(0.4);
    expect(check(result, 'feed')).toBe('fine within');
  });

  // evidence: 100 ft/min with hardened pins (common practice), 1.5 times with carbide (judgement)
  it.each([
    ['hardened', 100, 'fine within'],
    ['hardened', 101, 'watch overLimit'],
    ['hardened', 151, 'stop farOverLimit'],
    ['carbide', 101, 'fine within'],
  ] as const)('%s pins at %d ft/min: %s', (pin, speed, expected) => {
    const result = of('steel-lowC-CD', { pin, speed: feetPerMinute(speed) });
    expect(valueOf(result, 'surfaceSpeed')).toBeCloseTo(feetPerMinute(speed), 9);
    expect(check(result, 'speed')).toBe(expected);
  });

  it('slower than the band is fine', () => {
    expect(check(of('steel-lowC-CD', { speed: mPerMin(1) }), 'speed')).toBe('fine within');
  });
});

describe('a bar that runs out', () => {
  // evidence: half the reading against the first bite: fine to a half, watch to one (judgement);
  // pitch 1, 90°: first bite 0.09 mm
  it.each([
    [0.09, 'fine within'],
    [0.1, 'watch close'],
    [0.18, 'watch close'],
    [0.19, 'stop over'],
  ] as const)('by %d mm: %s', (runout, expected) => {
    expect(check(of('steel-lowC-CD', { runout: mm(runout) }), 'runout')).toBe(expected);
  });

  it('is not looked at where nothing was said', () => {
    expect(check(of('steel-lowC-CD'), 'runout')).toBe('absent');
  });
});
