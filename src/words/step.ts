import type { Refusal } from '../refusal.ts';
import { byPhrase, keywordAlone, type Weighed } from './announced.ts';
import { byQuantity } from './bare.ts';
import { betweenTwo } from './between.ts';
import { type Cursor, moved, textAt, tokenAt } from './cursor.ts';
import { type Ear, isFound, type Step, stepOf } from './ear.ts';
import { quantityAt } from './quantity.ts';
import type { Token } from './tokens.ts';
import { unitOf } from './unit.ts';
import { unreadable } from './unreadable.ts';

/** Words people put between the ones that count. */
const FILLERS = new Set(
  [
    'a an the of for with and please pls thanks knurl knurls knurling knurled set up setup make do',
    'i me my we our us want need give get can you just have got using use is it this that be',
    'bar bars round rod shaft stock piece part blank size od outside pattern material matl mat',
    'dia diameter at to in by on',
  ].flatMap((line) => line.split(' ')),
);
/** Signs that part words or head a list. */
const MARKS = /^(?:[-/•·@→+]+|->|\.+|…)$/u;

/** How many words a refusal is about; one where it does not say. */
const wordsOf = (cursor: Cursor, refusal: Refusal): number => {
  const end = 'end' in refusal ? refusal.end : undefined;
  let words = 1;
  while ((tokenAt(cursor, words)?.start ?? Number.MAX_VALUE) < (end ?? 0)) words += 1;
  return words;
};

/** The parameter that reads what stands here without being announced; the longest reading. */
const byItself = (cursor: Cursor, ear: Ear): Weighed | null => {
  let best: Weighed | null = null;
  for (const parameter of ear.vocabulary.free) {
    const reading = (parameter.free ?? parameter.unannounced)?.(cursor, ear.names) ?? null;
    if (reading === null) continue;
    const words = 'refusal' in reading ? wordsOf(cursor, reading.refusal) : reading.used;
    if (words > (best?.words ?? 0)) best = { step: stepOf(cursor, parameter, reading), words };
  }
  return best;
};

/** The x of `1.0 x 21tpi` parts a size from what says itself what it is. */
const isPart = (cursor: Cursor, ear: Ear): boolean => {
  if (textAt(cursor) !== 'x' || textAt(cursor, 1) === 'x' || cursor.at === 0) return false;
  const next = ear.step(moved(cursor, 1));
  return isFound(next) && next.found.parameter.bare !== true;
};

/** A sign between two words; before a number it may be the number's own. */
const isMark = (cursor: Cursor): boolean => {
  const word = textAt(cursor);
  return MARKS.test(word) && !(word === '+' && quantityAt(moved(cursor, 1)) !== null);
};

/** A unit without a number: what it measures is missing. */
const loneUnit = (cursor: Cursor, ear: Ear): Step | null => {
  const measure = unitOf(textAt(cursor))?.measure;
  const parameter = ear.vocabulary.parameters.find((each) =>
    (each.measures ?? []).some((own) => own === measure),
  );
  if (measure === undefined || parameter === undefined || parameter.bare === true) return null;
  return keywordAlone(cursor, parameter, 1);
};

/** What stands at a place of the line. */
const stepAt = (cursor: Cursor, ear: Ear): Step => {
  const between = betweenTwo(cursor, ear);
  if (between !== null) return between;
  const phrase = byPhrase(cursor, ear);
  const own = byItself(cursor, ear);
  if (own !== null && own.words > (phrase?.words ?? 0)) return own.step;
  if (phrase !== null) return phrase.step;
  const quantity = byQuantity(cursor, ear);
  if (quantity !== null) return quantity;
  if (FILLERS.has(textAt(cursor)) || isMark(cursor) || isPart(cursor, ear)) return { skip: 1 };
  return loneUnit(cursor, ear) ?? unreadable(cursor, ear.vocabulary.words);
};

/**
 * What tells a place from every other: which commas are supposed before it makes no difference,
 * but for the one right before.
 */
const placeKey = ({ at, units }: Cursor, supposed: readonly number[]): string => {
  const ahead = supposed.filter((index) => index >= at - 1);
  return `${units} ${String(at)} ${ahead.join(' ')}`;
};

/**
 * What listens to a line with this vocabulary, in a shop with these names. A place is heard once:
 * who looks ahead over words that look ahead themselves would else hear the end of the line twice
 * as often with each of them.
 */
export const earFor = (vocabulary: Ear['vocabulary'], names: Ear['names']): Ear => {
  const heard = new WeakMap<readonly Token[], Map<string, Step>>();
  const hear = (cursor: Cursor): Step => {
    const { memory } = cursor;
    // What a reader has put in the place of the words that were typed is heard by itself.
    if (memory?.tokens !== cursor.tokens) return stepAt(cursor, ear);
    const known = heard.get(memory.typed) ?? new Map<string, Step>();
    heard.set(memory.typed, known);
    const key = placeKey(cursor, memory.supposed);
    const step = known.get(key) ?? stepAt(cursor, ear);
    known.set(key, step);
    return step;
  };
  const ear: Ear = { vocabulary, names, step: hear };
  return ear;
};
