import { postfixed } from './announced.ts';
import { type Cursor, isAfterComma, moved, plainOf, spanOf, withComma } from './cursor.ts';
import { type Ear, isFound, type Step } from './ear.ts';
import { partOf } from './edit.ts';
import { quantityAt } from './quantity.ts';
import { ask } from './range.ts';
import type { Measure, Quantity } from './unit.ts';

/** Units that announce a number as well: `rpm 200`, `HB 210`. */
const COUNTS: ReadonlySet<Measure> = new Set<Measure>([
  ...(['tpi', 'dp', 'hb', 'hrc', 'teeth', 'turns', 'rotation'] as const),
]);
const ANNOUNCING: ReadonlySet<Measure> = new Set<Measure>([...COUNTS, 'module', 'speed']);

/** The number behind the unit, which the unit may announce instead. */
const followingAt = (cursor: Cursor, quantity: Quantity, ear: Ear): Quantity | null => {
  const next = moved(cursor, quantity.used);
  const following = isAfterComma(next) ? null : quantityAt(next);
  if (following === null || following.unit !== null) return null;
  return postfixed(next, following, ear) === null ? following : null;
};

/** Counts have no decimals: in `21 tpi 10.16` only the first can be the pitch. */
const isNoCount = (cursor: Cursor, measure: Measure, { number }: Quantity): boolean =>
  COUNTS.has(measure) && !/^\d+$/u.test(partOf(plainOf(cursor), number));

const isOutside = (step: Step): boolean => 'refusal' in step && step.refusal.code === 'outOfRange';

/** Both ways, each with the comma that would have made it clear. */
const which = (cursor: Cursor, words: number, used: number, following: Quantity): Step | null => {
  const part = (from: number, length: number): string =>
    partOf(cursor.text, spanOf(moved(cursor, from), length));
  const [number, unit, other] = [
    part(0, words),
    part(words, used - words),
    part(used, following.used),
  ];
  const readings = [`${number} ${unit}, ${other}`, `${number}, ${unit} ${other}`];
  const span = spanOf(cursor, used + following.used);
  const asked = ask(cursor, 'number', 'keywordBetween', span, readings);
  return 'refusal' in asked ? asked : null;
};

/**
 * `1.0 tpi 21`, `25 rpm 200`: the word between two numbers belongs to one of them. Where only one
 * way makes sense it is that one; where both do, it is asked.
 */
export const betweenTwo = (cursor: Cursor, ear: Ear): Step | null => {
  const quantity = quantityAt(cursor);
  const measure = quantity?.unit?.measure;
  if (!quantity?.unitApart || measure === undefined || !ANNOUNCING.has(measure)) return null;
  const following = followingAt(cursor, quantity, ear);
  if (following === null) return null;
  const { used } = quantity;
  const words = quantity.mixed ? 2 : 1;
  const asUnit = withComma(cursor, used - 1);
  const asKeyword = withComma(cursor, words - 1);
  const [unit, rest] = [ear.step(asUnit), ear.step(moved(asUnit, used))];
  const isUnit = isFound(unit) && isFound(rest);
  // A number that says itself what it is, such as 304, needs no word in front.
  const isClear =
    isUnit && (rest.found.parameter.bare !== true || isNoCount(cursor, measure, following));
  if (isClear) return null;
  const first = ear.step(asKeyword);
  if (!isFound(first) || !isFound(ear.step(moved(asKeyword, words)))) return null;
  if (isUnit) return which(cursor, words, used, following);
  return isFound(unit) || isOutside(unit) ? first : null;
};
