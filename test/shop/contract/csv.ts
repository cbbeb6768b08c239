/** Lists as files: what comes in, what is said of every line, and what goes out again. */
import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { degrees, mm } from '../../../src/calc/index.ts';
import { escaped, unescaped } from '../../../src/shop/csv/escape.ts';
import {
  addTo,
  BARE_MACHINE,
  BARE_WHEEL,
  changeSetting,
  EDGES,
  exportCsv,
  exportJson,
  historyOf,
  type Imported,
  type ImportReport,
  importSheet,
  keepCard,
  listOf,
  MACHINE_SHEET,
  MACHINES,
  machinesCsv,
  PIN_MATERIALS,
  WHEEL_FORMS,
  WHEEL_SHEET,
  WHEEL_STATES,
  WHEELS,
  type Wheel,
  wheelsCsv,
} from '../../../src/shop/index.ts';
import { type Engine, TABLES } from '../../../src/store/index.ts';
import { good, newRecords, newShop, type TestShop } from '../../support/records.ts';
import { CARD, ENGINE_LATHE, LEFT, STRAIGHT, TURRET } from './samples.ts';

const shopOn = async (engine: Engine): Promise<TestShop> =>
  newShop((await newRecords(engine)).store);

type How = { readonly units?: 'in' | 'mm'; readonly replace?: boolean };

const takeIn = (shop: TestShop, text: string, { units = 'mm', ...how }: How = {}) =>
  shop.change((change) => importSheet(change, WHEELS, WHEEL_SHEET, text, { units, ...how }));

const reportOf = (imported: Imported): ImportReport => {
  if (!imported.ok) throw new Error(`refused: ${JSON.stringify(imported.fault)}`);
  return imported.report;
};

export const csv = (engine: Engine): void => {
  describe('lists as files', () => {
    comingIn(engine);
    judged(engine);
    goingOut(engine);
  });
};

const comingIn = (engine: Engine): void => {
  it('come in as a spreadsheet writes them, wherever the units are said', async () => {
    const shop = await shopOn(engine);
    // One wheel, written by five hands: headings with units, cells with units, semicolons with
    // decimal commas, tabs, inches.
    const files = [
      'name,form,pitch,face mm,bore mm,included angle deg\nA,straight,21 tpi,8,6.35,90\n',
      'Name,Form,Pitch,Face,Bore,Included angle\r\nB,Straight,21 TPI,"8 mm",6.35 mm,90°\r\n',
      '\ufeffname;kind;label;face (mm);hole;tooth angle\nC;straight;21 tpi;8,0;6,35;90\n',
      'wheel\ttype\tpitch tpi\twidth\tbore\tangle\nD\tSTRAIGHT\t21\t8\t6.35\t90\n',
      'name,form,pitch,face in,bore in,angle\nE,straight,21 tpi,0.31496062992125984,1/4,90\n',
    ];
    for (const file of files) expect(reportOf(await takeIn(shop, file)).added).toBe(1);
    for (const wheel of await listOf(shop.view, WHEELS)) {
      expect(wheel).toMatchObject({ form: 'straight', pitch: { system: 'tpi', value: 21 } });
      expect(wheel.face).toBeCloseTo(8, 12);
      expect(wheel.bore).toBeCloseTo(6.35, 12);
      expect(wheel.included).toBe(degrees(90));
    }
  });

  it('take bare lengths in the unit of the shop', async () => {
    const shop = await shopOn(engine);
    const file = 'name,form,pitch,diameter,teeth\nA,straight,,0.75,60\n';
    await takeIn(shop, file, { units: 'in' });
    expect((await listOf(shop.view, WHEELS))[0]?.diameter).toBeCloseTo(19.05, 12);
  });

  it('read every pitch system, and ask where a number alone could be any of them', async () => {
    const shop = await shopOn(engine);
    const file = `name,form,pitch
a,straight,21 tpi
b,straight,96 DP
c,straight,0.8 mm
d,straight,m0.3
e,straight,0.3 module
f,straight,21
g,straight,21 kg`;
    const report = reportOf(await takeIn(shop, file));
    const wheels = await listOf(shop.view, WHEELS);
    expect(wheels.map(({ pitch }) => pitch)).toEqual([
      { system: 'tpi', value: 21 },
      { system: 'dp', value: 96 },
      { system: 'metric', value: 0.8 },
      { system: 'module', value: 0.3 },
      { system: 'module', value: 0.3 },
    ]);
    expect(report.rows.slice(5).map(({ faults }) => faults)).toMatchObject([
      [
        {
          column: 'pitch',
          cell: '21',
          why: 'unclear',
          readings: ['21 tpi', '21 dp', '21 mm', '21 module'],
        },
      ],
      [{ column: 'pitch', cell: '21 kg', why: 'wrongUnit' }],
    ]);
  });

  it('take machines with their gears', async () => {
    const shop = await shopOn(engine);
    const file = `name,speeds rpm,feeds,dial,units,largest diameter,power
Big,"60, 90, 140",0.002 0.004 in/rev,radius,in,10 in,7.5 hp
Small,40-2500,0.05 to 0.4 mm/rev,diameter,mm,200 mm,1.5 kW
Odd,"60,90",,,,,
`;
    const imported = await shop.change((change) =>
      importSheet(change, MACHINES, MACHINE_SHEET, file, { units: 'mm' }),
    );
    const report = reportOf(imported);
    const [big, small] = await listOf(shop.view, MACHINES);
    expect(big).toMatchObject({
      name: 'Big',
      speeds: { list: [60, 90, 140] },
      feeds: { list: [0.0508, 0.1016] },
      dial: 'radius',
      units: 'in',
      largestDiameter: 254,
    });
    // 7.5 mechanical horsepower of 550 ft·lbf/s.
    expect(big?.power).toBeCloseTo(5592.749, 2);
    expect(small).toMatchObject({
      name: 'Small',
      speeds: { slowest: 40, fastest: 2500 },
      feeds: { slowest: 0.05, fastest: 0.4 },
      power: 1500,
    });
    expect(report.rows[2]).toMatchObject({
      line: 4,
      outcome: 'refused',
      faults: [{ column: 'speeds rpm', why: 'unclear', readings: ['60.90', '60 90'] }],
    });
  });

  it('come in once: what is there already and alike is said to be the same', async () => {
    const shop = await shopOn(engine);
    await shop.change(async (change) => {
      good(await addTo(change, WHEELS, STRAIGHT));
      good(await addTo(change, WHEELS, LEFT));
    });
    const report = reportOf(await takeIn(shop, await wheelsCsv(shop.view)));
    expect(report).toMatchObject({ added: 0, replaced: 0, same: 2, refused: 0 });
    expect(await historyOf(shop.view, 'wheel')).toHaveLength(2);
  });

  it('do not write over what differs unless that is said, and then remember what it was', async () => {
    const shop = await shopOn(engine);
    await shop.change(async (change) => good(await addTo(change, WHEELS, STRAIGHT)));
    const file = `name,form,parts run,state\nOLD FAITHFUL,straight,3000,worn\n`;
    const refused = reportOf(await takeIn(shop, file));
    expect(refused.rows).toMatchObject([
      { outcome: 'refused', faults: [{ why: 'differs', columns: ['parts run', 'state'] }] },
    ]);
    const replaced = reportOf(await takeIn(shop, file, { replace: true }));
    expect(replaced).toMatchObject({ replaced: 1, refused: 0 });
    // Columns that the file does not have stay as they are.
    const wanted = { ...STRAIGHT, name: 'OLD FAITHFUL', partsRun: 3000, state: 'worn' };
    expect(await listOf(shop.view, WHEELS)).toMatchObject([wanted]);
    expect((await historyOf(shop.view, 'wheel'))[0]).toMatchObject({ before: STRAIGHT });
  });
};

const judged = (engine: Engine): void => {
  it('say of every line what is wrong with it, and take the others', async () => {
    const shop = await shopOn(engine);
    const file = `name,form,pitch,teeth,diameter mm,face,bore,pin material,parts run,Farbe
good,straight,21 tpi,,,8 mm,,,,blue
,straight,21 tpi,,,,,,,
heavy,straight,21 tpi,,,8 kg,,,,
wordy,straight,21 tpi,,,wide,,,,
round,circular,21 tpi,,,,,,,
wide,straight,21 tpi,,,800,,,,
bare,straight,,,,,,,,
half,straight,,63,,,,,,
GOOD,straight,25 tpi,,,,,,,
thousand,straight,21 tpi,,,,,,"1,000",
tight,straight,21 tpi,,10,,9,,,
pin,straight,21 tpi,,,,,wood,,
`;
    const report = reportOf(await takeIn(shop, file));
    expect(report).toMatchObject({ added: 1, refused: 11, same: 0, replaced: 0 });
    expect(report.rows[0]).toMatchObject({ line: 2, name: 'good', outcome: 'added' });
    expect(report.rows.slice(1).map(({ line, faults }) => [line, faults[0]])).toMatchObject([
      [3, { column: 'name', why: 'missing' }],
      [4, { column: 'face mm', cell: '8 kg', why: 'wrongUnit' }],
      [5, { column: 'face mm', cell: 'wide', why: 'unreadable' }],
      [6, { column: 'form', cell: 'circular', why: 'notOneOf' }],
      [7, { column: 'face mm', cell: '800', why: 'outOfRange', value: 800, max: 60, unit: 'mm' }],
      [8, { column: 'pitch', why: 'missing' }],
      [9, { column: 'diameter mm', why: 'missing' }],
      [10, { column: 'name', cell: 'GOOD', why: 'twice', line: 2 }],
      [11, { column: 'parts run', cell: '1,000', why: 'unreadable' }],
      [12, { column: 'bore mm', cell: '9', why: 'outOfRange', max: 8 }],
      [13, { column: 'pin material', cell: 'wood', why: 'notOneOf', choices: PIN_MATERIALS }],
    ]);
    expect(report.ignored).toEqual([{ heading: 'Farbe', nearest: [] }]);
    expect(await listOf(shop.view, WHEELS)).toHaveLength(1);
  });

  it.each([
    ['nothing', '', { why: 'empty' }],
    ['headings alone', 'name,form,pitch\n', { why: 'empty' }],
    ['no name', 'form,pitch\nstraight,21 tpi\n', { why: 'columns', missing: ['name'] }],
    ['no form', 'name;pitch\nA;21 tpi\n', { why: 'columns', missing: ['form'] }],
    ['two names', 'name,Wheel,form\nA,B,straight\n', { why: 'columnTwice', column: 'Wheel' }],
    ['an open quote', 'name,form,pitch\n"A,straight,21 tpi\n', { why: 'notATable' }],
  ] as const)('with %s are not touched', async (_, file, fault) => {
    const shop = await shopOn(engine);
    expect(await takeIn(shop, file)).toMatchObject({ ok: false, fault });
    expect(await listOf(shop.view, WHEELS)).toEqual([]);
  });

  it('offer the column that a misspelt heading was meant for', async () => {
    const shop = await shopOn(engine);
    const file = 'name,form,pitch,place,bevell\nA,straight,21 tpi,box,1\n';
    expect(reportOf(await takeIn(shop, file)).ignored).toEqual([
      { heading: 'bevell', nearest: ['bevel'] },
    ]);
  });

  it('come in with 10 000 rows, and not with one more', async () => {
    const shop = await shopOn(engine);
    const rows = (count: number) =>
      Array.from({ length: count }, (_, at) => `W${at},straight,21 tpi,8 mm,drawer ${at % 40}`);
    const head = 'name,form,pitch,face,place';
    const tooMany = [head, ...rows(10_001)].join('\n');
    expect(await takeIn(shop, tooMany)).toEqual({
      ok: false,
      fault: { why: 'tooManyRows', most: 10_000 },
    });
    const report = reportOf(await takeIn(shop, [head, ...rows(10_000)].join('\n')));
    expect(report).toMatchObject({ added: 10_000, refused: 0 });
    expect(await listOf(shop.view, WHEELS)).toHaveLength(10_000);
  }, 60_000);

  it('with a formula in a cell keep it as the text it is, and never as a number', async () => {
    const shop = await shopOn(engine);
    const formula = '=HYPERLINK("http://example.invalid","click")';
    const cell = `"${formula.replaceAll('"', '""')}"`;
    const file = `name,form,pitch,place,face\n${cell},straight,21 tpi,+1+1,8\nB,straight,21 tpi,,=4+4\n`;
    const report = reportOf(await takeIn(shop, file));
    expect(report.rows[1]).toMatchObject({
      outcome: 'refused',
      faults: [{ column: 'face mm', cell: '=4+4', why: 'unreadable' }],
    });
    expect(await listOf(shop.view, WHEELS)).toMatchObject([{ name: formula, place: '+1+1' }]);
    const out = rowsIn(await wheelsCsv(shop.view));
    expect(out[1]?.[0]).toBe(`'${formula}`);
    expect(reportOf(await takeIn(shop, await wheelsCsv(shop.view)))).toMatchObject({ same: 1 });
  });
};

const goingOut = (engine: Engine): void => {
  it('go out and come in again as they were', async () => {
    const one = await shopOn(engine);
    const length = (min: number, max: number) =>
      fc.double({ min, max, noNaN: true }).map((value) => mm(value));
    const maybe = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: null });
    const wheel: fc.Arbitrary<Wheel> = fc.record({
      name: fc.constant(''),
      form: fc.constantFrom(...WHEEL_FORMS),
      pitch: fc.record({
        system: fc.constant('tpi' as const),
        value: fc.double({ min: 10, max: 80, noNaN: true }),
      }),
      alongRim: fc.boolean(),
      proven: maybe(length(0.3, 3)),
      teeth: maybe(fc.integer({ min: 20, max: 200 })),
      diameter: maybe(length(20, 30)),
      face: maybe(length(6, 20)),
      bore: maybe(length(6, 8)),
      bevel: maybe(length(0.001, 2)),
      included: maybe(fc.integer({ min: 60, max: 120 }).map((angle) => degrees(angle))),
      helix: maybe(fc.constantFrom(degrees(30), degrees(45))),
      toothDepth: maybe(length(0.1, 1)),
      edge: maybe(fc.constantFrom(...EDGES)),
      pinDiameter: maybe(length(2, 5)),
      pinMaterial: maybe(fc.constantFrom(...PIN_MATERIALS)),
      place: maybe(fc.string({ minLength: 1, maxLength: 20 }).filter((said) => said.trim() !== '')),
      partsRun: fc.nat({ max: 100_000_000 }),
      state: fc.constantFrom(...WHEEL_STATES),
    });
    const [wheels = []] = fc.sample(fc.array(wheel, { minLength: 40, maxLength: 40 }), 1);
    await one.change(async (change) => {
      for (const [at, each] of wheels.entries()) {
        good(await addTo(change, WHEELS, { ...each, name: `W${at}` }));
      }
      good(await addTo(change, MACHINES, ENGINE_LATHE));
      good(await addTo(change, MACHINES, TURRET));
      good(await addTo(change, MACHINES, { ...BARE_MACHINE, name: '-bare' }));
    });
    const other = await shopOn(engine);
    expect(reportOf(await takeIn(other, await wheelsCsv(one.view)))).toMatchObject({ added: 40 });
    const machines = await machinesCsv(one.view);
    await other.change((change) =>
      importSheet(change, MACHINES, MACHINE_SHEET, machines, { units: 'in' }),
    );
    const bare = (items: readonly object[]) =>
      items.map((item) => ({ ...item, id: '', version: 0, changedAt: 0, changedBy: '' }));
    const close = (items: readonly object[]) =>
      JSON.parse(JSON.stringify(bare(items), rounded)) as unknown;
    expect(close(await listOf(other.view, WHEELS))).toEqual(close(await listOf(one.view, WHEELS)));
    expect(bare(await listOf(other.view, MACHINES))).toEqual(
      bare(await listOf(one.view, MACHINES)),
    );
  });

  it('never hold a cell that a spreadsheet would run', () => {
    fc.assert(
      fc.property(fc.string(), (cell) => {
        expect(unescaped(escaped(cell))).toBe(cell);
        expect(escaped(cell)).not.toMatch(/^[=+\-@\t\r]/u);
      }),
    );
    const nasty = fc.stringMatching(/^['=+\-@\t\r]{1,6}[a-z0-9]{0,4}$/u);
    fc.assert(
      fc.property(nasty, (cell) => {
        expect(unescaped(escaped(cell))).toBe(cell);
        expect(escaped(cell)).not.toMatch(/^[=+\-@\t\r]/u);
      }),
    );
  });

  it('hold everything of the shop and nothing of another', async () => {
    const { store } = await newRecords(engine);
    const mine = await newShop(store, 'Mine');
    const other = await newShop(store, 'Other');
    for (const shop of [mine, other]) {
      await shop.change(async (change) => {
        good(await addTo(change, WHEELS, { ...BARE_WHEEL, ...LEFT, name: `wheel of ${shop.id}` }));
        good(await addTo(change, MACHINES, { ...TURRET, name: `lathe of ${shop.id}` }));
        good(await changeSetting(change, 'noticesChannel', `channel of ${shop.id}`));
        await keepCard(change, { ...CARD, words: `card of ${shop.id}` });
      });
    }
    const json = await text(exportJson(mine.view));
    const read = JSON.parse(json) as Record<string, unknown[]>;
    expect(Object.keys(read)).toEqual(['wholetooth', ...TABLES.map(({ name }) => name)]);
    expect(read['card']).toMatchObject([{ words: `card of ${mine.id}`, card: CARD.card }]);
    expect(read['wheel']).toMatchObject([{ name: `wheel of ${mine.id}` }]);
    expect(json).not.toContain(other.id);
    const files = exportCsv(mine.view);
    expect(files.map(({ name }) => name)).toEqual(TABLES.map(({ name }) => `${name}.csv`));
    for (const { name, pieces } of files) {
      const file = await text(pieces);
      expect(file).not.toContain(other.id);
      const rows = rowsIn(file);
      const kept = read[name.replace('.csv', '')] ?? [];
      expect([name, Math.max(0, rows.length - 1)]).toEqual([name, kept.length]);
    }
  });
};

/** Angles are kept in radians and written in degrees: ten digits of them are the same. */
const rounded = (_: string, value: unknown): unknown =>
  typeof value === 'number' && !Number.isInteger(value) ? Number(value.toPrecision(9)) : value;

const text = async (pieces: AsyncIterable<string>): Promise<string> => {
  let all = '';
  for await (const piece of pieces) all += piece;
  return all;
};

/** Read by the other library, not by ours. */
const rowsIn = (file: string): string[][] => parse(file, { columns: false });
