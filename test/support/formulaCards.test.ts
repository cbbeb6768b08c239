import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { arrowsOf, functionsOf, programOf } from './calcFunctions.ts';
import { defectsOf, type Known } from './formulaCards.ts';

/** The reader of formula cards is held against cards whose defects are known. */
const root = fileURLToPath(new URL('../..', import.meta.url));
const known: Known = { sources: new Set(['judgement']), units: new Set(['mm', 'mm²']) };
const scope = {
  area: ({ a, other }: { a: number; other: number }) => a * other,
  none: () => null,
  bend: () => {
    throw new RangeError('too far');
  },
};

const SOUND = `
/**
 * Area of a rectangle.
 *
 *     A = a · b
 *
 * Squares are rectangles.
 *
 * | symbol | meaning | unit | range |
 * | --- | --- | --- | --- |
 * | a | one side | mm | \\|a\\| ≥ 0 |
 * | b (other) | other side | mm | |
 * | → A | area | mm² | |
 *
 * Assumes square corners.
 *
 * @source judgement (the area
 *   of a rectangle)
 * @example area({ a: 1.5, other: 2.25 }) // 3.4 mm² (0.00523 in²)
 * @example none() // null
 */
export function area(of: { readonly a: number; readonly other?: number }): number {
  return of.a * (of.other ?? 1);
}
`;

/** A file with the sound card in which one thing was changed. */
const changed = (from: string, to: string): string => {
  if (!SOUND.includes(from)) throw new Error(`the sound card has no ${from}`);
  return SOUND.replace(from, to);
};

const CHANGES: readonly (readonly [what: string, text: string, defects: readonly string[]])[] = [
  ['a sound card', SOUND, []],
  ['no card', SOUND.replace(/\/\*\*[^]*?\*\//, ''), ['has no formula card']],
  ['no full stop', changed('rectangle.\n', 'rectangle\n'), ['does not open with a sentence']],
  [
    'two sentences',
    changed('rectangle.\n', 'rectangle. Or not.\n'),
    ['opens with more than one sentence'],
  ],
  [
    'a formula that is not indented',
    changed('     A =', ' A ='),
    ['has no formula (a block indented by four spaces)'],
  ],
  [
    'another heading',
    changed('| unit |', '| units |'),
    ['table is not headed symbol | meaning | unit | range'],
  ],
  [
    'a property without a row',
    changed(' * | b (other) | other side | mm | |\n', ''),
    ['argument "other" has no row'],
  ],
  [
    'a row for an argument that is gone',
    changed('| → A', '| c (third) | third side | mm | |\n * | → A'),
    ['row "c (third)" explains no argument'],
  ],
  [
    'no result row',
    changed('| → A', '| A'),
    [
      'has no result row (its symbol begins with →)',
      '@example area({ a: 1.5, other: 2.25 }): no result is in mm²',
    ],
  ],
  [
    'a bare bar in a cell',
    changed('\\|a\\|', '|a|'),
    ['row "a" has 6 cells (a bar inside a cell is written \\|)'],
  ],
  ['no meaning', changed('| one side |', '| |'), ['row "a" has no meaning']],
  ['an unknown unit', changed('side | mm |', 'side | yd |'), ['row "a" has the unknown unit "yd"']],
  [
    'nothing assumed',
    changed('Assumes square', 'With square'),
    ['has no line beginning with "Assumes"'],
  ],
  [
    'no source',
    changed(' * @source judgement (the area\n *   of a rectangle)\n', ''),
    ['has no @source'],
  ],
  [
    'an unknown source',
    changed('judgement', 'hearsay'),
    ['@source hearsay is not in the register'],
  ],
  [
    'words behind the source',
    changed('judgement (the', 'judgement: (the'),
    ['@source judgement: is not in the register'],
  ],
  ['no example', SOUND.replace(/ \* @example.*\n/g, ''), ['has no @example']],
  [
    'an example without a result',
    changed(' // null', ''),
    ['@example none(): prints no result (// 1.25 mm)'],
  ],
  [
    'an example that does not agree',
    changed('3.4 mm²', '3.5 mm²'),
    ['@example area({ a: 1.5, other: 2.25 }): gives 3.375, printed 3.5 mm² (0.00523 in²)'],
  ],
  [
    'an example printed too fine',
    changed('3.4 mm²', '3.39 mm²'),
    ['@example area({ a: 1.5, other: 2.25 }): gives 3.375, printed 3.39 mm² (0.00523 in²)'],
  ],
  [
    'a result in another unit',
    changed('3.4 mm²', '3.4 mm'),
    ['@example area({ a: 1.5, other: 2.25 }): no result is in mm'],
  ],
  [
    'a result that is not null',
    changed('none() // null', 'none() // true'),
    ['@example none(): gives null, printed true'],
  ],
  [
    'a result nobody can read',
    changed('none() // null', 'none() // nothing'),
    ['@example none(): cannot read the printed result nothing'],
  ],
  [
    'an example that throws',
    changed('none() // null', 'bend() // null'),
    ['@example bend() throws: RangeError: too far'],
  ],
];

const fixture = (index: number): string => path.join(root, 'src', 'calc', `card${index}.ts`);

const SIGNATURES = `
type Length = number & { readonly length: 'mm' };
type Sides = { readonly a: number; readonly b: number };
type Shape = { readonly kind: 'round' } | { readonly kind: 'oval'; readonly long: boolean };
interface Timber { readonly name: string; readonly strength: { readonly value: number } }
export function plain(a: Length, b?: Length | null, ...more: readonly number[]): number;
export function alone(sides: Sides): number;
export function among(sides: Sides, times: number): number;
export function named(shape: Shape): string;
export function timber(wood: Timber): string;
export function bag(of: { readonly square: boolean }): string;
export function picked(wood: Pick<Timber, 'name'>): string;
export function taken({ a, b }: Sides): number;
export function listed(all: ReadonlyMap<string, Sides>): number;
/** One. */
export function twice(one: string): string;
/** Two. */
export function twice(one: number): number;
export function twice(both: string | number): string | number { return both; }
export const arrow = (a: number): number => a;
export const LIST = [1, 2];
const hidden = (a: number): number => a;
export { hidden as shown };
`;

describe('the reader of formula cards', () => {
  const unsaved = Object.fromEntries(CHANGES.map(([, text], index) => [fixture(index), text]));
  const program = programOf(root, [], { ...unsaved, [fixture(-1)]: SIGNATURES });

  it.each(CHANGES.map(([what, , defects], index) => [what, index, defects] as const))(
    'finds %s',
    (_, index, defects) => {
      const [fn, ...others] = functionsOf(program, [fixture(index)]);
      expect(others).toEqual([]);
      expect(defectsOf(fn!, known, scope)).toEqual(defects);
    },
  );

  it('knows which arguments a table has to explain', () => {
    const wanted = functionsOf(program, [fixture(-1)]).map((fn) => [
      fn.name,
      ...fn.arguments.map(({ explainedBy }) =>
        explainedBy.map((set) => set.join(' ')).join(' or '),
      ),
    ]);
    expect(wanted).toEqual([
      ['plain', 'a', 'b', 'more'],
      ['alone', 'a b'],
      ['among', 'a b or sides', 'times'],
      ['named', 'kind long or shape'],
      ['timber', 'name strength or wood'],
      ['bag', 'square'],
      ['picked', 'name'],
      ['taken', 'a b'],
      ['listed', 'all'],
      ['twice', 'one'],
      ['twice', 'one'],
    ]);
  });

  it('reads the card of every signature a caller sees', () => {
    const twice = functionsOf(program, [fixture(-1)]).filter(({ name }) => name === 'twice');
    expect(twice.map(({ comment }) => comment)).toEqual(['/** One. */', '/** Two. */']);
  });

  it('tells an arrow function from a value', () => {
    expect(arrowsOf(program, fixture(-1))).toEqual(['arrow', 'hidden']);
  });
});
