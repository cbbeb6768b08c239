import { describe, expect, it } from 'vitest';
import {
  DEFAULT_MATERIAL_ID,
  isPolymer,
  MATERIALS,
  type Material,
  materialById,
  type Suits,
  USUAL_MATERIALS,
  type Valued,
} from '../../src/calc/materials/index.ts';
import { SOURCES } from '../../src/calc/sources.ts';

const material = (id: string): Material => {
  const found = materialById(id);
  if (!found) throw new Error(`no material ${id}`);
  return found;
};

const numbersOf = (of: Material): Valued<unknown>[] => [
  of.yield,
  of.uts,
  of.hardness,
  of.modulus,
  of.elongation,
  of.strainHardening,
  of.formSpeed,
  of.cutSpeed,
  of.maxFill,
];

/** What people type, apart from case, blanks and hyphens. */
const bare = (alias: string): string => alias.toLowerCase().replace(/[^\p{L}\d]/gu, '');

describe('the table of materials', () => {
  it('holds the bars shops buy', () => {
    expect(MATERIALS.map(({ id }) => id)).toEqual([
      ...['steel-lowC-HR', 'steel-lowC-CD', 'steel-free-S', 'steel-free-Pb', 'steel-medC-HR'],
      ...['steel-medC-CD', 'steel-CrMo-ann', 'steel-CrMo-PH', 'tool-O1-ann', 'tool-D2-ann'],
      ...['ss303', 'ss304', 'ss316', 'ss416', 'ss17-4-A', 'ss17-4-H1150'],
      ...['al6061-T6', 'al2011-T3', 'al2024-T351', 'al7075-T6', 'al356-T6'],
      ...['brass360', 'brass260', 'bronze932', 'bronze544', 'al-bronze954', 'copper110'],
      ...['iron-grey30', 'iron-ductile65', 'ti-cp2', 'ti-6-4', 'ni718-ann', 'ni400'],
      ...['zinc3', 'mg-az31', 'pom', 'pa66', 'peek'],
    ]);
  });

  // evidence: the published tables that the register names under materials-S1 to -S15, reported.
  // yield, tensile MPa; Brinell; modulus GPa; elongation %; null where that table is silent.
  it.each([
    ['steel-lowC-HR', 'materials-S1', 220, 400, 116, null, 25],
    ['steel-lowC-CD', 'materials-S1', 370, 440, 126, null, 15],
    ['steel-medC-HR', 'materials-S1', 310, 565, 163, null, null],
    ['steel-medC-CD', 'materials-S1', 530, 627, 179, null, null],
    ['steel-free-Pb', 'materials-S2', 415, 480, 165, null, 15],
    ['ss304', 'materials-S3', 205, 515, null, null, 40],
    ['ss303', 'materials-S4', 240, 620, 170, null, null],
    ['ss316', 'materials-S4', 205, 515, 165, null, null],
    ['ss17-4-A', 'materials-S4', 758, 1034, 320, null, null],
    ['ss416', 'materials-S5', 276, 517, null, null, 30],
    ['al6061-T6', 'materials-S6', 275, 310, 95, 69, 17],
    ['al2011-T3', 'materials-S6', 295, 380, 95, 70, 15],
    ['al2024-T351', 'materials-S6', 325, 470, 120, 73, 20],
    ['al7075-T6', 'materials-S6', 505, 570, 150, 72, 11],
    ['brass360', 'materials-S7', 310, 400, null, 97, 25],
    ['brass260', 'materials-S8', 350, 425, null, 112, 30],
    ['iron-ductile65', 'materials-S9', 310, 448, 170, null, 12],
    ['ti-6-4', 'materials-S10', 910, 1000, null, 114, 18],
    ['pom', 'materials-S11', 72, 72, null, 3, 50],
    ['pa66', 'materials-S12', 85, 85, null, 3, null],
  ] as const)('%s as %s prints it', (id, source, yieldMPa, uts, hardness, modulus, elongation) => {
    const of = material(id);
    const printed = (value: number): Valued<number> => ({ value, mark: 'reported', source });
    expect(of.yield).toEqual(printed(yieldMPa));
    expect(of.uts).toEqual(printed(uts));
    if (hardness !== null) expect(of.hardness).toEqual(printed(hardness));
    if (modulus !== null) expect(of.modulus).toEqual(printed(modulus * 1000));
    if (elongation !== null) expect(of.elongation).toEqual(printed(elongation));
  });

  // evidence: materials-S13 (tables of strain-hardening exponents), reported
  it.each([
    ['ss304', 0.44],
    ['al6061-T6', 0.05],
    ['al2024-T351', 0.16],
    ['mg-az31', 0.16],
  ])('%s hardens as tabled', (id, value) => {
    const { strainHardening } = material(id);
    expect(strainHardening).toEqual({ value, mark: 'reported', source: 'materials-S13' });
  });

  // evidence: the grade's own name in ASTM A536: 65 ksi tensile, 45 ksi yield, 12 %; 1 ksi is
  // 6.894757 MPa by the definitions of inch and pound
  it('ductile iron 65-45-12 keeps what its name says', () => {
    const iron = material('iron-ductile65');
    expect(Math.round(65 * 6.894757)).toBe(iron.uts.value);
    expect(Math.round(45 * 6.894757)).toBe(iron.yield.value);
    expect(iron.elongation.value).toBe(12);
  });

  // evidence: handbook rule, from memory: tensile strength of steel in MPa is about 3.45 HB
  it.each(
    MATERIALS.filter(({ group }) => group === 'steel' || group === 'stainless').map(
      ({ id, uts, hardness }) => [id, uts.value / (hardness.value ?? 0)] as const,
    ),
  )('%s: hardness and tensile strength belong together', (_, ratio) => {
    expect(ratio).toBeGreaterThan(3.45 * 0.8);
    expect(ratio).toBeLessThan(3.45 * 1.2);
  });

  it.each(MATERIALS.map((of) => [of.id, of] as const))('%s makes sense', (_, of) => {
    expect(of.yield.value).toBeGreaterThan(0);
    expect(of.uts.value).toBeGreaterThanOrEqual(of.yield.value);
    expect(of.modulus.value).toBeGreaterThanOrEqual(isPolymer(of) ? 1_000 : 40_000);
    expect(of.modulus.value).toBeLessThanOrEqual(isPolymer(of) ? 5_000 : 220_000);
    for (const band of [of.cutSpeed.value, of.formSpeed.value ?? of.cutSpeed.value]) {
      expect(band[0]).toBeGreaterThan(0);
      expect(band[1]).toBeGreaterThan(band[0]);
    }
    if (of.formSpeed.value === null) expect(of.formKnurl).toBe('no');
    expect(of.maxFill.value ?? 0.9).toBeGreaterThan(0.7);
    expect(of.maxFill.value ?? 0.9).toBeLessThanOrEqual(0.9);
  });

  it('never marks a value higher than its source is marked', () => {
    for (const of of MATERIALS) {
      for (const { mark, source } of numbersOf(of)) expect(SOURCES[source].mark).toBe(mark);
    }
  });

  it('knows plastics by having no Brinell hardness', () => {
    for (const of of MATERIALS) {
      expect(isPolymer(of)).toBe(of.hardness.value === null);
      expect(isPolymer(of)).toBe(of.strainHardening.value === null);
      expect(isPolymer(of)).toBe(of.hardeningClass === null);
    }
  });
});

describe('what forms', () => {
  const suits: readonly Suits[] = ['no', 'marginal', 'yes'];

  /** The rule of the trade by elongation and hardness alone (common practice). */
  const atBest = (of: Material): Suits => {
    const elongation = of.elongation.value;
    const hardness = of.hardness.value ?? 0;
    if (isPolymer(of) || elongation < 5 || hardness > 300) return 'no';
    return elongation < 12 || hardness > 250 ? 'marginal' : 'yes';
  };

  it('is never better than elongation and hardness allow', () => {
    const better = MATERIALS.filter(
      (of) => suits.indexOf(of.formKnurl) > suits.indexOf(atBest(of)),
    );
    expect(better.map(({ id }) => id)).toEqual([]);
  });

  it('is worse only where lead, carbides, graphite, galling, creep or work-hardening spoil it', () => {
    const worse = MATERIALS.filter((of) => of.formKnurl !== atBest(of));
    expect(worse.map(({ id }) => id)).toEqual([
      'tool-D2-ann',
      'bronze932',
      'al-bronze954',
      'iron-ductile65',
      'ti-cp2',
      'ni718-ann',
      'mg-az31',
    ]);
  });

  it('stays shallower where full crests flake', () => {
    const shallow = MATERIALS.filter(({ maxFill }) => maxFill.value !== null);
    expect(shallow.map(({ id, maxFill }) => [id, maxFill.value])).toEqual([
      ['steel-free-S', 0.85],
      ['al7075-T6', 0.8],
      ['brass360', 0.88],
    ]);
  });
});

describe('names of materials', () => {
  it('have one id each', () => {
    expect(new Set(MATERIALS.map(({ id }) => id)).size).toBe(MATERIALS.length);
    for (const of of MATERIALS) expect(materialById(of.id)).toBe(of);
    expect(materialById('unobtainable')).toBeUndefined();
  });

  it('mean one material, however blanks and hyphens are typed', () => {
    const owner = new Map<string, string>();
    for (const { id, aliases } of MATERIALS) {
      for (const name of [id, ...aliases]) {
        expect([name, owner.get(bare(name)) ?? id]).toEqual([name, id]);
        owner.set(bare(name), id);
      }
    }
  });

  it('are written once and in lower case', () => {
    for (const { aliases } of MATERIALS) {
      expect(aliases).toEqual(aliases.map((alias) => alias.toLowerCase().trim()));
      expect(new Set(aliases).size).toBe(aliases.length);
    }
  });

  it('include the UNS number, for the condition a bare grade means', () => {
    const numbers = new Set(MATERIALS.flatMap(({ uns }) => uns ?? []));
    for (const uns of numbers) {
      const known = MATERIALS.filter(({ aliases }) => aliases.includes(uns.toLowerCase()));
      expect(known.map((of) => of.uns)).toEqual([uns]);
    }
  });

  it.each([
    ['crs', 'steel-lowC-CD'],
    ['mild steel', 'steel-lowC-CD'],
    ['hot rolled', 'steel-lowC-HR'],
    ['12l14', 'steel-free-Pb'],
    ['1045', 'steel-medC-CD'],
    ['4140', 'steel-CrMo-ann'],
    ['4140ph', 'steel-CrMo-PH'],
    ['drill rod', 'tool-O1-ann'],
    ['silver steel', 'tool-O1-ann'],
    ['stainless', 'ss304'],
    ['303 stainless', 'ss303'],
    ['17-4ph', 'ss17-4-A'],
    ['6061-t6', 'al6061-T6'],
    ['alu', 'al6061-T6'],
    ['free machining brass', 'brass360'],
    ['bronze', 'bronze932'],
    ['cast iron', 'iron-grey30'],
    ['ti64', 'ti-6-4'],
    ['grade 2 titanium', 'ti-cp2'],
    ['nylon', 'pa66'],
    ['s30400', 'ss304'],
  ])('"%s" is %s', (alias, id) => {
    expect(material(id).aliases).toContain(alias);
  });

  it('cover what is taken and what is offered', () => {
    expect(material(DEFAULT_MATERIAL_ID).condition).toBe('cold drawn');
    expect(USUAL_MATERIALS).toHaveLength(6);
    for (const id of USUAL_MATERIALS) expect(material(id).formKnurl).toBe('yes');
  });
});
