import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  type CautionFacts,
  type CautionId,
  CHOSEN_CAUTIONS,
  type ChosenCaution,
  cautionsFor,
  STANDING_CAUTIONS,
} from '../../src/calc/caution.ts';
import { MATERIALS } from '../../src/calc/materials/index.ts';
import { kelvin, mm, revPerMin } from '../../src/calc/units.ts';

/** A plain set-up of a 20 mm bar of steel, of which nothing more is known. */
const PLAIN: CautionFacts = {
  blankDiameter: mm(20),
  stickout: null,
  supported: false,
  stockLength: null,
  bore: null,
  fill: 0.9,
  materialFill: null,
  materialGroup: 'steel',
  rotation: revPerMin(300),
  machineTopSpeed: null,
  seamTest: false,
  warmUp: null,
  bending: null,
  ring: null,
  pinHeat: null,
};

const chosen = (facts: Partial<CautionFacts>): readonly CautionId[] =>
  cautionsFor({ ...PLAIN, ...facts }).slice(STANDING_CAUTIONS.length);

describe('standing cautions', () => {
  it('are these six', () => {
    // evidence: Navy engineman manual (sleeves, rings, eye protection, stopped to measure: read),
    // 29 CFR 1910.212 (guards: read), UK and New South Wales regulators (gloves: read); key out
    // (reported); oil from the outgoing side (common practice)
    expect([...STANDING_CAUTIONS].sort()).toEqual([
      'eyeProtection',
      'guardInPlace',
      'keyOut',
      'noLooseClothing',
      'oilFromOutgoingSide',
      'stopToMeasure',
    ]);
  });

  it('come first whatever is known, and alone where nothing calls for more', () => {
    expect(cautionsFor(PLAIN)).toEqual([...STANDING_CAUTIONS]);
    const nothing: CautionFacts = { ...PLAIN, fill: null, materialGroup: null, rotation: null };
    expect(cautionsFor(nothing)).toEqual([...STANDING_CAUTIONS]);
  });
});

/** What is known beside the plain set-up, and every caution beside the standing ones it calls for. */
const TABLE: readonly (readonly [
  what: string,
  facts: Partial<CautionFacts>,
  calls: readonly ChosenCaution[],
])[] = [
  // supportBar. evidence: over 3 diameters without support, or any bending not fine (common practice)
  ['sticks out 3 diameters', { stickout: mm(60) }, []],
  ['sticks out over 3 diameters', { stickout: mm(60.01) }, ['supportBar']],
  ['sticks out far, supported', { stickout: mm(200), supported: true }, []],
  ['bending fine', { stickout: mm(50), bending: 'fine' }, []],
  ['bending watch', { bending: 'watch' }, ['supportBar', 'forceUncertain']],
  ['bending stop', { bending: 'stop' }, ['supportBar', 'forceUncertain']],
  [
    'bending watch, supported',
    { supported: true, bending: 'watch' },
    ['supportBar', 'forceUncertain'],
  ],
  // forceUncertain. evidence: any of bending, ring, pinHeat not fine (judgement)
  ['wall fine', { bore: mm(10), ring: 'fine' }, ['tubePinch']],
  ['wall watch', { bore: mm(10), ring: 'watch' }, ['tubePinch', 'forceUncertain']],
  ['wall stop', { bore: mm(10), ring: 'stop' }, ['tubePinch', 'forceUncertain']],
  ['pin fine', { pinHeat: 'fine' }, []],
  ['pin watch', { pinHeat: 'watch' }, ['hotPin', 'forceUncertain']],
  ['pin stop', { pinHeat: 'stop' }, ['hotPin', 'forceUncertain']],
  // hotPin. evidence: pinHeat not fine, or warm-up over 60 K (judgement)
  ['wheel 60 K warmer', { warmUp: kelvin(60) }, []],
  ['wheel over 60 K warmer', { warmUp: kelvin(60.1) }, ['hotPin']],
  ['wheel over 60 K warmer, pin fine', { warmUp: kelvin(90), pinHeat: 'fine' }, ['hotPin']],
  // barBehindSpindle. evidence: bar said and longer than stickout + 300 mm (reported)
  ['bar of 300 mm', { stockLength: mm(300) }, []],
  ['bar over 300 mm', { stockLength: mm(301) }, ['barBehindSpindle']],
  ['bar of stickout + 300 mm', { stockLength: mm(350), stickout: mm(50) }, []],
  ['bar over that', { stockLength: mm(351), stickout: mm(50) }, ['barBehindSpindle']],
  // flaking. evidence: material with its own fill, or fill above 0.92 (common practice)
  ['material with its own fill', { materialFill: 0.88, fill: 0.8 }, ['flaking']],
  ['fill of 0.92', { fill: 0.92 }, []],
  ['fill above 0.92', { fill: 0.921 }, ['flaking']],
  // chuckSpeed. evidence: above 1500 rev/min or the machine's own limit (judgement)
  ['1500 rev/min', { rotation: revPerMin(1500) }, []],
  ['over 1500 rev/min', { rotation: revPerMin(1501) }, ['chuckSpeed']],
  ['at the machine’s limit', { machineTopSpeed: revPerMin(300) }, []],
  ['over the machine’s limit', { machineTopSpeed: revPerMin(299) }, ['chuckSpeed']],
  ['no speed, slow machine', { rotation: null, machineTopSpeed: revPerMin(1) }, []],
  // fireChips. evidence: titanium or magnesium (reported)
  ['titanium', { materialGroup: 'titanium' }, ['fireChips']],
  ['magnesium', { materialGroup: 'magnesium' }, ['fireChips']],
  // tubePinch. evidence: bore said (derived)
  ['bore', { bore: mm(5) }, ['tubePinch']],
  // handTurn. evidence: seam test (common practice)
  ['seam test', { seamTest: true }, ['handTurn']],
];

describe('cautions a set-up calls for', () => {
  it.each(TABLE)('%s', (_, facts, calls) => {
    expect([...chosen(facts)].sort()).toEqual([...calls].sort());
  });

  it('all have a row that calls for them', () => {
    expect(new Set(TABLE.flatMap(([, , calls]) => calls))).toEqual(new Set(CHOSEN_CAUTIONS));
  });

  it('chips burn of titanium and magnesium and of nothing else', () => {
    const groups = new Set(MATERIALS.map(({ group }) => group));
    const burning = [...groups].filter((materialGroup) =>
      chosen({ materialGroup }).includes('fireChips'),
    );
    expect(burning.sort()).toEqual(['magnesium', 'titanium']);
  });

  it('of several facts are those of each, once and in one order', () => {
    const rows = fc.subarray(TABLE.map((_, row) => row));
    fc.assert(
      fc.property(rows, (picked) => {
        // Facts that are each about something else, so that none undoes another.
        const seen = new Set<string>();
        const apart = picked
          .map((row) => TABLE[row]!)
          .filter(([what, facts]) => {
            const names = Object.keys(facts);
            // The length of the bar and the stickout are judged together.
            if (/bar|sticks|supported|machine/u.test(what)) return false;
            if (names.some((name) => seen.has(name))) return false;
            for (const name of names) seen.add(name);
            return true;
          });
        const together = chosen(
          apart.reduce<Partial<CautionFacts>>((all, [, facts]) => ({ ...all, ...facts }), {}),
        );
        const each = new Set(apart.flatMap(([, , calls]) => calls));
        expect(together).toEqual(CHOSEN_CAUTIONS.filter((id) => each.has(id)));
      }),
    );
  });
});
