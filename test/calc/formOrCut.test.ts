import { describe, expect, it } from 'vitest';
import {
  type FormRating,
  formRating,
  formRatingByNumbers,
  materialCheck,
} from '../../src/calc/formOrCut.ts';
import { MATERIALS, type Material, materialById } from '../../src/calc/materials/index.ts';
import { OutOfRange } from '../../src/calc/units.ts';

const material = (id: string): Material => materialById(id)!;

describe('what forms, by numbers', () => {
  // evidence: common practice: elongation ≥ 12 % and HB ≤ 250; 5–12 % or 250–300; else not
  it.each<[number, number, FormRating]>([
    [12, 250, 'yes'],
    [40, 100, 'yes'],
    [11.9, 100, 'marginal'],
    [40, 251, 'marginal'],
    [5, 300, 'marginal'],
    [4.9, 100, 'no'],
    [40, 301, 'no'],
    [0, 600, 'no'],
  ])('%d %% and %d HB: %s', (elongation, hardness, rating) => {
    expect(formRatingByNumbers(elongation, hardness)).toBe(rating);
  });

  it('harder or more brittle is never better', () => {
    const order: readonly FormRating[] = ['no', 'marginal', 'yes'];
    for (let elongation = 0; elongation <= 40; elongation += 1)
      for (let hardness = 50; hardness <= 400; hardness += 10) {
        const here = order.indexOf(formRatingByNumbers(elongation, hardness));
        const harder = order.indexOf(formRatingByNumbers(elongation, hardness + 10));
        const tougher = order.indexOf(formRatingByNumbers(elongation + 1, hardness));
        expect(harder).toBeLessThanOrEqual(here);
        expect(tougher).toBeGreaterThanOrEqual(here);
      }
  });

  it('numbers that no metal has', () => {
    expect(() => formRatingByNumbers(-1, 100)).toThrow(OutOfRange);
    expect(() => formRatingByNumbers(20, Number.NaN)).toThrow(OutOfRange);
  });
});

describe('what forms, of this bar', () => {
  it('is what the table says where nothing was measured', () => {
    for (const each of MATERIALS) expect(formRating(each, null)).toBe(each.formKnurl);
  });

  // evidence: rating by elongation and hardness (common practice), table rating where it knows more
  it.each<[string, number, FormRating]>([
    ['steel-lowC-CD', 126, 'yes'],
    ['steel-lowC-CD', 260, 'marginal'],
    ['steel-lowC-CD', 320, 'no'],
    ['steel-CrMo-PH', 197, 'yes'],
    ['steel-CrMo-PH', 320, 'no'],
    // It flakes whatever its hardness: the table rates it below its numbers.
    ['bronze932', 60, 'marginal'],
    ['iron-grey30', 150, 'no'],
    // Nothing to compare a Brinell number of a plastic with.
    ['pom', 50, 'no'],
  ])('%s at %d HB: %s', (id, hardness, rating) => {
    expect(formRating(material(id), hardness)).toBe(rating);
  });
});

describe('the check on the material', () => {
  it.each<[string, number | null, 'form' | 'cut', string]>([
    ['steel-lowC-CD', null, 'form', 'fine forms'],
    ['steel-free-S', null, 'form', 'watch marginal'],
    ['ti-6-4', null, 'form', 'stop doesNotForm'],
    ['steel-lowC-CD', 320, 'form', 'stop doesNotForm'],
    ['ti-6-4', null, 'cut', 'fine cuts'],
    ['steel-lowC-CD', 320, 'cut', 'fine cuts'],
  ])('%s at %s HB to %s: %s', (id, hardness, process, expected) => {
    const found = materialCheck(material(id), hardness, process);
    expect(`${found.state} ${found.reason}`).toBe(expected);
    expect(found.figures['hardness']?.value).toBe(hardness ?? material(id).hardness.value);
  });

  it('says the hardness of a plastic does not apply', () => {
    expect(materialCheck(material('pom'), null, 'cut').figures['hardness']).toBeNull();
  });
});
