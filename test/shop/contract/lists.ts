/** Lists: what is added is there, under one name, and nothing of it is lost when it changes. */
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { mm, revPerMin } from '../../../src/calc/index.ts';
import {
  addTo,
  changeIn,
  findIn,
  historyOf,
  keepCard,
  listOf,
  MACHINES,
  MATERIALS_OF_SHOP,
  removeFrom,
  WHEELS,
  type Wheel,
} from '../../../src/shop/index.ts';
import type { Engine } from '../../../src/store/index.ts';
import {
  good,
  newRecords,
  newShop,
  person,
  refusalOf,
  START,
  type TestShop,
} from '../../support/records.ts';
import { CARD, ENGINE_LATHE, LEFT, STRAIGHT, TURRET } from './samples.ts';

const shopOn = async (engine: Engine): Promise<TestShop> =>
  newShop((await newRecords(engine)).store);

const addWheel = (shop: TestShop, wheel: Wheel = STRAIGHT) =>
  shop.change(async (change) => good(await addTo(change, WHEELS, wheel)));

export const lists = (engine: Engine): void => {
  describe('lists', () => {
    adding(engine);
    finding(engine);
    changing(engine);
    removing(engine);
    judging(engine);
  });
};

const adding = (engine: Engine): void => {
  it('give back what was put on them', async () => {
    const shop = await shopOn(engine);
    const wheel = await addWheel(shop);
    expect(wheel).toMatchObject({ ...STRAIGHT, version: 1, changedAt: START });
    await addWheel(shop, LEFT);
    await shop.change(async (change) => {
      good(await addTo(change, MACHINES, ENGINE_LATHE));
      good(await addTo(change, MACHINES, TURRET));
    });
    expect(await listOf(shop.view, WHEELS)).toMatchObject([LEFT, STRAIGHT]);
    expect(await listOf(shop.view, MACHINES)).toMatchObject([ENGINE_LATHE, TURRET]);
  });

  it('keep gears in order and each once', async () => {
    const shop = await shopOn(engine);
    const speeds = { list: [500, 60, 140, 60].map(revPerMin) };
    const machine = await shop.change(async (change) =>
      good(await addTo(change, MACHINES, { ...TURRET, speeds })),
    );
    expect(machine.speeds).toEqual({ list: [60, 140, 500] });
  });

  it('take a name once, whatever its capitals, spaces and dashes', async () => {
    const shop = await shopOn(engine);
    await addWheel(shop, { ...STRAIGHT, name: 'Wheel A-1' });
    for (const name of ['wheel a-1', ' WHEEL  A-1 ', 'Wheel A–1', 'wheel\u200b a\u20101']) {
      const twice = await shop.change((change) => addTo(change, WHEELS, { ...STRAIGHT, name }));
      expect(refusalOf(twice)).toMatchObject({ code: 'taken', what: 'wheel' });
    }
    expect(await listOf(shop.view, WHEELS)).toHaveLength(1);
  });

  it('take one of two who want the same name at the same moment', async () => {
    const shop = await shopOn(engine);
    const results = await Promise.all(
      Array.from({ length: 8 }, () => shop.change((change) => addTo(change, WHEELS, STRAIGHT))),
    );
    expect(results.filter(({ ok }) => ok)).toHaveLength(1);
    expect(await listOf(shop.view, WHEELS)).toHaveLength(1);
    expect(await historyOf(shop.view, 'wheel')).toHaveLength(1);
  });

  it('keep any name a person can type, as they typed it', async () => {
    const shop = await shopOn(engine);
    const names = fc.uniqueArray(fc.string({ unit: 'binary', minLength: 1, maxLength: 30 }), {
      maxLength: 12,
    });
    await fc.assert(
      fc.asyncProperty(names, async (typed) => {
        for (const name of typed) {
          const added = await shop.change((c) => addTo(c, WHEELS, { ...STRAIGHT, name }));
          if (!added.ok) continue;
          const found = await findIn(shop.view, WHEELS, name);
          expect(found).toMatchObject({ ok: true, value: { name: added.value.name } });
          expect(added.value.name).not.toMatch(/[\0\u202e]|^\s|\s$/u);
        }
      }),
      { numRuns: 15 },
    );
  });
};

const finding = (engine: Engine): void => {
  it('offer the nearest names, and never guess at a digit', async () => {
    const shop = await shopOn(engine);
    await addWheel(shop, { ...STRAIGHT, name: 'faithful 21' });
    await addWheel(shop, { ...STRAIGHT, name: 'faithful 25' });
    expect(await findIn(shop.view, WHEELS, 'FAITHFUL 21')).toMatchObject({ ok: true });
    const wanted = { code: 'notFound', what: 'wheel', nearest: ['faithful 21'] };
    expect(refusalOf(await findIn(shop.view, WHEELS, 'faithfull 21'))).toEqual(wanted);
    expect(refusalOf(await findIn(shop.view, WHEELS, 'faithful 22'))).toEqual({
      ...wanted,
      nearest: [],
    });
  });

  it('find by the id that a button carries', async () => {
    const shop = await shopOn(engine);
    const { id } = await addWheel(shop);
    expect(await findIn(shop.view, WHEELS, id)).toMatchObject({ ok: true, value: { id } });
  });
};

const changing = (engine: Engine): void => {
  it('change what is said, leave the rest and remember both', async () => {
    const shop = await shopOn(engine);
    const { id, version } = await addWheel(shop);
    const patch = { state: 'worn', partsRun: 2000 } as const;
    const after = await shop.changeBy(
      person('Ben'),
      async (change) => good(await changeIn(change, WHEELS, id, patch, version)),
      START + 60_000,
    );
    expect(after).toMatchObject({ ...STRAIGHT, ...patch, version: 2, changedAt: START + 60_000 });
    const [line, first] = await historyOf(shop.view, 'wheel', { id });
    expect(line).toMatchObject({
      verb: 'changed',
      before: { partsRun: 1250, state: 'good' },
      after: { partsRun: 2000, state: 'worn' },
    });
    expect(first).toMatchObject({ verb: 'added', before: null, after: { partsRun: 1250 } });
    expect(line?.by).not.toBe(first?.by);
  });

  it('tell the second of two who change the same thing who was first, and when', async () => {
    const shop = await shopOn(engine);
    const { id, version } = await addWheel(shop);
    const at = START + 3_600_000;
    await shop.changeBy(
      person('Ben'),
      async (change) => good(await changeIn(change, WHEELS, id, { place: 'bench' }, version)),
      at,
    );
    const late = await shop.change((c) => changeIn(c, WHEELS, id, { place: 'box' }, version));
    const stale = {
      code: 'stale',
      what: STRAIGHT.name,
      by: 'Ben',
      when: new Date(at).toISOString(),
    };
    expect(refusalOf(late)).toEqual(stale);
    expect(good(await findIn(shop.view, WHEELS, id)).place).toBe('bench');
  });

  it('keep names apart when one is renamed', async () => {
    const shop = await shopOn(engine);
    const { id } = await addWheel(shop);
    await addWheel(shop, LEFT);
    const taken = await shop.change((c) => changeIn(c, WHEELS, id, { name: 'l 0.8' }));
    expect(refusalOf(taken)).toMatchObject({ code: 'taken', name: 'l 0.8' });
    const itself = await shop.change((c) => changeIn(c, WHEELS, id, { name: 'OLD faithful' }));
    expect(good(itself).name).toBe('OLD faithful');
  });

  it('let one of many changes of one version through', async () => {
    const shop = await shopOn(engine);
    const { id, version } = await addWheel(shop);
    const results = await Promise.all(
      [1, 2, 3, 4, 5, 6].map((partsRun) =>
        shop.change((change) => changeIn(change, WHEELS, id, { partsRun }, version)),
      ),
    );
    expect(results.filter(({ ok }) => ok)).toHaveLength(1);
    expect(await historyOf(shop.view, 'wheel', { id })).toHaveLength(2);
  });
};

const removing = (engine: Engine): void => {
  it('take off, give the name free, and remember what it was', async () => {
    const shop = await shopOn(engine);
    const { id } = await addWheel(shop);
    await shop.change(async (change) => good(await removeFrom(change, WHEELS, id)));
    expect(await listOf(shop.view, WHEELS)).toEqual([]);
    expect(refusalOf(await findIn(shop.view, WHEELS, id))).toMatchObject({ code: 'notFound' });
    const [line] = await historyOf(shop.view, 'wheel', { id });
    expect(line).toMatchObject({ verb: 'removed', before: STRAIGHT, after: null });
    const again = await addWheel(shop);
    expect(again.id).not.toBe(id);
  });

  it('name where a thing is in use before it goes, and what was made with it stays', async () => {
    const shop = await shopOn(engine);
    const { id } = await addWheel(shop);
    const code = await shop.change(
      async (change) => (await keepCard(change, { ...CARD, wheel: id })).code,
    );
    const refused = await shop.change((change) => removeFrom(change, WHEELS, id));
    expect(refusalOf(refused)).toEqual({
      code: 'inUse',
      what: 'wheel',
      name: STRAIGHT.name,
      where: [{ what: 'card', name: code }],
      more: false,
    });
    await shop.change(async (change) =>
      good(await removeFrom(change, WHEELS, id, { evenInUse: true })),
    );
    expect(await listOf(shop.view, WHEELS)).toEqual([]);
  });

  it('are not fooled by an old version', async () => {
    const shop = await shopOn(engine);
    const { id, version } = await addWheel(shop);
    await shop.change(async (change) => good(await changeIn(change, WHEELS, id, { partsRun: 9 })));
    const late = await shop.change((change) => removeFrom(change, WHEELS, id, { version }));
    expect(refusalOf(late)).toMatchObject({ code: 'stale' });
    expect(await listOf(shop.view, WHEELS)).toHaveLength(1);
  });
};

const judging = (engine: Engine): void => {
  it.each([
    ['a name of nothing', { name: ' \u200b ' }, { code: 'missing', parameter: 'name' }],
    ['a name without end', { name: 'x'.repeat(61) }, { what: 'name', value: 61, max: 60 }],
    ['a face in inches taken for mm', { face: mm(0.315) }, { what: 'face', unit: 'mm' }],
    ['a bore wider than the wheel', { bore: mm(19) }, { what: 'bore' }],
    ['a pin wider than the bore', { pinDiameter: mm(7) }, { what: 'pinDiameter', max: 6.35 }],
    ['bevels that meet', { bevel: mm(4) }, { what: 'bevel' }],
    ['half a tooth', { teeth: 62.5 }, { what: 'teeth', value: 62.5 }],
    ['parts run backwards', { partsRun: -1 }, { what: 'partsRun' }],
    ['no number at all', { diameter: mm(Number.NaN) }, { what: 'diameter' }],
    ['a pitch nobody makes', { pitch: { system: 'tpi', value: 2 } }, { what: 'pitch' }],
    ['no pitch and no count', { pitch: null, teeth: null, diameter: null }, { parameter: 'pitch' }],
    ['a count without a diameter', { pitch: null, diameter: null }, { parameter: 'diameter' }],
  ] as const)('refuse %s', async (_, wrong, refusal) => {
    const shop = await shopOn(engine);
    const given: Wheel = { ...STRAIGHT, ...wrong };
    const result = await shop.change((change) => addTo(change, WHEELS, given));
    expect(refusalOf(result)).toMatchObject(refusal);
    expect(await listOf(shop.view, WHEELS)).toEqual([]);
    expect(await historyOf(shop.view, 'wheel')).toEqual([]);
  });

  it('refuse a gearbox that runs backwards, and a material of no kind', async () => {
    const shop = await shopOn(engine);
    const speeds = { slowest: revPerMin(500), fastest: revPerMin(60) };
    const lathe = await shop.change((c) => addTo(c, MACHINES, { ...TURRET, speeds }));
    expect(refusalOf(lathe)).toMatchObject({ code: 'outOfRange', what: 'speeds', value: 60 });
    const bar = {
      name: 'our bar',
      base: 'no such bar',
      hardness: 210,
      elongation: null,
      note: null,
    };
    const material = await shop.change((c) => addTo(c, MATERIALS_OF_SHOP, bar));
    expect(refusalOf(material)).toMatchObject({ code: 'notFound', what: 'material' });
    const known = { ...bar, base: 'steel-medC-CD' };
    const kept = await shop.change(async (c) => good(await addTo(c, MATERIALS_OF_SHOP, known)));
    expect(kept).toMatchObject(known);
  });
};
